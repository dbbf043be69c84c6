import type { Bearing } from "../cycle/bearing";
import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";
import type { OilData } from "../oil/oil-data";
import type { Supply } from "./heat-balance";
import type { Roughness } from "./roughness";

/** A plain bearing at one steady speed and load. */
export interface Duty extends Bearing {
  /** Of the journal, rad/s. */
  speed: number;
  /** N; or `specificLoad`, load over length and diameter, Pa. */
  load?: number | undefined;
  specificLoad?: number | undefined;
}

/** A bearing at a steady duty with its oil: either its viscosity in the film, or an oil and what temperature it comes at. */
export interface SteadyDuty extends Duty, Supply {
  /** In the film, Pa·s. */
  viscosity?: number | undefined;
  oil?: OilData | undefined;
  supplyTemperatureC?: number | undefined;
  roughness?: Roughness | undefined;
}

/** Refuses a clearance that no bearing of this diameter has, m diametral. */
export function requireClearance(clearance: number, diameter: number, field: string): void {
  requireWithin(clearance, field, { from: 1e-7, to: diameter / 20, unit: "m" });
}

/** Refuses a viscosity that no oil has, Pa·s. */
export function requireDynamicViscosity(viscosity: number, field: string): void {
  requireWithin(viscosity, field, { from: 1e-5, to: 1e3, unit: "Pa·s" });
}

/**
 * The load of a duty, N, once its numbers are sound.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`; `missing` or `said-twice` of the load
 */
export function soundLoad({ diameter, length, speed, load, specificLoad }: Omit<Duty, "clearance">): number {
  requireWithin(diameter, "diameter", { from: 1e-3, to: 2, unit: "m" });
  requireWithin(length, "length", { from: 1e-4, to: 3, unit: "m" });
  requireWithin(speed, "speed", { from: 1e-2, to: 1e5, unit: "rad/s" });
  if (load !== undefined && specificLoad !== undefined) {
    throw new EngineeringError("said-twice", "load", "Give the load or the specific load, not both.");
  }
  if (specificLoad !== undefined) {
    requireWithin(specificLoad, "specificLoad", { from: 1e-3, to: 1e11, unit: "Pa" });
    return specificLoad * length * diameter;
  }
  if (load === undefined) {
    throw new EngineeringError("missing", "load", "Give the load on the bearing, or its specific load.");
  }
  requireWithin(load, "load", { from: 1e-6, to: 1e9, unit: "N" });
  return load;
}
