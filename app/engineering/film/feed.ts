import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";
import { radial } from "../radial";
import { tableRange } from "./film-table";
import type { RunningBearing } from "./working-point";

/** How oil under pressure comes into a bearing: through a hole at the widest gap, or a groove all round its middle; m. */
export type Feed = { kind: "hole"; diameter: number } | { kind: "groove"; width: number };

/**
 * The bearing as its feed parts it: a groove all round makes two shorter lands of it, each with half the load.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function partedBearing(bearing: RunningBearing, feed: Feed | undefined): RunningBearing {
  const { diameter, length } = bearing;
  if (!feed) return bearing;
  if (feed.kind === "hole") {
    requireWithin(feed.diameter, "feed.diameter", { from: length / 1000, to: 0.7 * length, unit: "m" });
    return bearing;
  }
  const widest = length - 2 * tableRange.lengthToDiameter.from * diameter;
  if (widest <= 0) {
    throw new EngineeringError(
      "outside-range",
      "feed.width",
      `A bearing of ${(length / diameter).toPrecision(2)} diameters is too short to be parted by a groove: each land must be at least ${tableRange.lengthToDiameter.from} diameters long.`,
    );
  }
  requireWithin(feed.width, "feed.width", { from: length / 1000, to: widest, unit: "m" });
  return { ...bearing, length: (length - feed.width) / 2, lands: 2 };
}

/**
 * Oil that the supply pressure, Pa above the surroundings, drives through a bearing, m³/s; `bearing` as parted by the feed.
 * - groove: π pₛ R C³ (1 + 1.5 ε²) / (3 µ l'), C the radial clearance, l' one land. Source: Shigley's Mechanical
 *   Engineering Design, pressure-fed bearings (from memory; its example 12-6 checks it).
 * - hole: π pₛ (2C)³ (1 + ε)³ / (48 µ ln(l/d) q), q = 1.204 + 0.368 d/l − 1.046 (d/l)² + 1.942 (d/l)³, d the hole.
 *   Source: ISO 7902-2 / DIN 31652-2, hole opposite to the load (from memory, not checked against the printed standard).
 */
export function pressureFlow(
  feed: Feed,
  supplyPressure: number,
  bearing: RunningBearing,
  viscosity: number,
  eccentricityRatio: number,
): number {
  const clearance = radial(bearing.clearance);
  const drive = (Math.PI * supplyPressure * clearance ** 3) / viscosity;
  if (feed.kind === "groove") {
    const radius = bearing.diameter / 2;
    return (drive * radius * (1 + 1.5 * eccentricityRatio ** 2)) / (3 * bearing.length);
  }
  const share = feed.diameter / bearing.length;
  const resistance = 1.204 + 0.368 * share - 1.046 * share ** 2 + 1.942 * share ** 3;
  return (drive * (1 + eccentricityRatio) ** 3) / (6 * Math.log(1 / share) * resistance);
}
