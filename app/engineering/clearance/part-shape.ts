import type { Station } from "../trade/fit-kinds";
import { meanOf, type StationMean } from "./station-means";

/** The form of a part along its length. A bell-mouthed guide, wide at both ends, is an hourglass. */
export type Shape = "barrel" | "hourglass" | "even";

/** How far a bore or a journal is from a cylinder, m; absent where too little is measured. */
export interface PartShape {
  /** Largest difference of two axes in one plane. */
  outOfRound?: number;
  /** Front less rear: positive where the front is larger. */
  taper?: number;
  shape?: Shape;
}

// A picometre is finer than anything measured: what differs by less is the same after a sum of floats.
const same = 1e-12;

/** The shape of one part from its stations. Planes are compared on the axes that both have, so that out-of-round does
 * not pass for taper. */
export function partShape(stations: readonly StationMean[]): PartShape {
  const spreads = (["front", "middle", "rear"] as const).flatMap((plane) => {
    const values = stations.filter((station) => station.plane === plane).map(({ value }) => value);
    return values.length > 1 ? [Math.max(...values) - Math.min(...values)] : [];
  });
  const taper = planeDifference(stations, "front", "rear");
  const shape = shapeAlong(
    planeDifference(stations, "middle", "front"),
    planeDifference(stations, "middle", "rear"),
  );
  return {
    ...(spreads.length > 0 && { outOfRound: Math.max(...spreads) }),
    ...(taper !== undefined && { taper }),
    ...(shape && { shape }),
  };
}

function planeDifference(
  stations: readonly StationMean[],
  plane: Station["plane"],
  other: Station["plane"],
): number | undefined {
  const at = (which: Station["plane"], axis: Station["axis"]) =>
    stations.find((station) => station.plane === which && station.axis === axis);
  const shared = stations.filter((station) => station.plane === plane && at(other, station.axis));
  if (shared.length === 0) return undefined;
  return meanOf(shared) - meanOf(shared.map(({ axis }) => at(other, axis)!));
}

function shapeAlong(overFront: number | undefined, overRear: number | undefined): Shape | undefined {
  if (overFront === undefined || overRear === undefined) return undefined;
  if (overFront > same && overRear > same) return "barrel";
  return overFront < -same && overRear < -same ? "hourglass" : "even";
}
