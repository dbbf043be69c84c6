import type { StationMean } from "./station-means";

/** The form of a part along its length. A bell-mouthed guide, wide at both ends, is an hourglass. */
export type Shape = "barrel" | "hourglass" | "even";

/** How far a bore or a journal is from a cylinder, m; absent where too little is measured. */
export interface PartShape {
  /** Largest difference of two axes in one plane. */
  outOfRound: number | undefined;
  /** Front less rear: positive where the front is larger. */
  taper: number | undefined;
  shape: Shape | undefined;
}

// A picometre is finer than anything measured: what differs by less is the same after a sum of floats.
const same = 1e-12;

/** The shape of one part from its stations. Planes are compared on the axes that both have, so that out-of-round does
 * not pass for taper. */
export function partShape(stations: readonly StationMean[]): PartShape {
  const front = stations.filter(({ plane }) => plane === "front");
  const middle = stations.filter(({ plane }) => plane === "middle");
  const rear = stations.filter(({ plane }) => plane === "rear");
  const measuredRound = [front, middle, rear].filter((plane) => plane.length > 1);
  return {
    outOfRound: measuredRound.length > 0 ? Math.max(...measuredRound.map(rangeOf)) : undefined,
    taper: difference(front, rear),
    shape: shapeAlong(difference(middle, front), difference(middle, rear)),
  };
}

function rangeOf(stations: readonly StationMean[]): number {
  const values = stations.map(({ value }) => value);
  return Math.max(...values) - Math.min(...values);
}

function difference(plane: readonly StationMean[], other: readonly StationMean[]): number | undefined {
  let sum = 0;
  let shared = 0;
  for (const { axis, value } of plane) {
    const opposite = other.find((station) => station.axis === axis);
    if (!opposite) continue;
    sum += value - opposite.value;
    shared += 1;
  }
  return shared > 0 ? sum / shared : undefined;
}

function shapeAlong(overFront: number | undefined, overRear: number | undefined): Shape | undefined {
  if (overFront === undefined || overRear === undefined) return undefined;
  if (overFront > same && overRear > same) return "barrel";
  return overFront < -same && overRear < -same ? "hourglass" : "even";
}
