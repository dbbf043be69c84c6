import { EngineeringError } from "../engineering-error";

/** Dimensions are given at this temperature, °C. Source: ISO 1. */
export const referenceTemperatureC = 20;

/**
 * A diameter at 20 °C from one measured at another temperature: d20 = d / (1 + α (t − 20)).
 * Linear expansion, free of restraint; valid from −40 to 200 °C, where handbook coefficients hold.
 * @param diameter m, as measured at `temperatureC`
 * @param expansion linear coefficient per °C
 * @throws EngineeringError `outside-range` for a temperature outside −40…200 °C
 */
export function at20(diameter: number, temperatureC: number, expansion: number): number {
  return diameter / growth(temperatureC, expansion);
}

/** A diameter at a temperature from the one at 20 °C: d = d20 (1 + α (t − 20)). */
export function atTemperature(diameterAt20: number, temperatureC: number, expansion: number): number {
  return diameterAt20 * growth(temperatureC, expansion);
}

function growth(temperatureC: number, expansion: number): number {
  if (!(temperatureC >= -40 && temperatureC <= 200)) {
    throw new EngineeringError(
      "outside-range",
      "temperature",
      "Parts are reckoned with between −40 and 200 °C; look at the temperature and its unit.",
    );
  }
  return 1 + expansion * (temperatureC - referenceTemperatureC);
}
