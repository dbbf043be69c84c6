import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";

/** An oil by its data sheet. */
export interface OilData {
  /** Kinematic viscosities at 40 and 100 °C, mm²/s. */
  kv40: number;
  kv100: number;
  /** Density at 15 °C, kg/m³; `usualDensity15` where it is not known. */
  density15?: number | undefined;
  /** Viscosity at 150 °C and a shear rate of 10⁶ /s, Pa·s. */
  hths?: number | undefined;
}

/** Refuses a kinematic viscosity that no oil or fuel of an engine has, mm²/s. */
export function requireViscosity(kinematic: number, field: string): void {
  requireWithin(kinematic, field, { from: 0.21, to: 1e5, unit: "mm²/s" });
}

/** Refuses a temperature at which an engine oil is solid or burns, °C. */
export function requireOilTemperature(temperatureC: number, field: string): void {
  requireWithin(temperatureC, field, { from: -40, to: 250, unit: "°C" });
}

/**
 * Refuses an oil whose viscosities cannot be true.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, `viscosity-order`
 */
export function requireOil({ kv40, kv100 }: Pick<OilData, "kv40" | "kv100">): void {
  requireViscosity(kv40, "kv40");
  requireViscosity(kv100, "kv100");
  if (kv100 >= kv40) {
    throw new EngineeringError(
      "viscosity-order",
      "kv100",
      `An oil is thinner at 100 °C than at 40 °C, but KV100 is ${kv100} and KV40 ${kv40} mm²/s. Are the two exchanged?`,
    );
  }
}
