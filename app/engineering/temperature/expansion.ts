import { EngineeringError } from "../engineering-error";

/** Dimensions are given at this temperature, °C. Source: ISO 1 (the value from memory). */
export const referenceTemperatureC = 20;

/** Where a handbook's mean coefficient holds well enough for a diameter, °C; beyond it metals expand more per degree. */
export const expansionRangeC = { least: -40, most: 200 } as const;

/**
 * A diameter at 20 °C from one measured at another temperature: d20 = d / (1 + α (t − 20)).
 * Linear expansion, free of restraint.
 * @param diameter m, as measured at `temperatureC`
 * @param expansion linear coefficient per °C, 0 to 1e-4
 * @throws EngineeringError `outside-range` for a temperature outside −40…200 °C or a coefficient that no metal has
 */
export function at20(diameter: number, temperatureC: number, expansion: number): number {
  const { least, most } = expansionRangeC;
  if (!(temperatureC >= least && temperatureC <= most)) {
    throw new EngineeringError(
      "outside-range",
      "temperature",
      "Parts are measured between −40 and 200 °C; look at the temperature and its unit.",
    );
  }
  return diameter / growth(temperatureC, expansion);
}

/**
 * A diameter at a temperature from the one at 20 °C: d = d20 (1 + α (t − 20)). From −60 to 800 °C, which is a valve's
 * stem under its head; outside `expansionRangeC` it is an extrapolation, and the caller says so.
 * @throws EngineeringError `outside-range`
 */
export function atTemperature(diameterAt20: number, temperatureC: number, expansion: number): number {
  if (!(temperatureC >= -60 && temperatureC <= 800)) {
    throw new EngineeringError(
      "outside-range",
      "temperatureC",
      "Parts of an engine lie between −60 and 800 °C; look at the temperature and its unit.",
    );
  }
  return diameterAt20 * growth(temperatureC, expansion);
}

function growth(temperatureC: number, expansion: number): number {
  if (!(expansion >= 0 && expansion <= 1e-4)) {
    throw new EngineeringError(
      "outside-range",
      "expansion",
      "A metal expands by 0 to 100 millionths per °C; look at the coefficient.",
    );
  }
  return 1 + expansion * (temperatureC - referenceTemperatureC);
}
