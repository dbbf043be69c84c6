import { requireWithin } from "./sound-input";

/** A plain bearing, film all round: a groove in the loaded half is not in it. */
export interface Bearing {
  /** m */
  diameter: number;
  /** Of the film along the axis, m. */
  length: number;
  /** Diametral, m. */
  clearance: number;
}

/** @throws EngineeringError `not-a-number`, `not-positive`, `outside-range` */
export function requireBearing({ diameter, length, clearance }: Bearing): void {
  requireWithin(diameter, "bearing.diameter", { from: 1e-3, to: 2, unit: "m" });
  requireWithin(length, "bearing.length", { from: 1e-4, to: 2, unit: "m" });
  requireWithin(clearance, "bearing.clearance", { from: 1e-7, to: diameter / 20, unit: "m" });
}
