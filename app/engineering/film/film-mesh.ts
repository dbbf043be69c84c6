/** How many steps a film is cut into. */
export interface MeshSize {
  around: number;
  /** From the middle of the bearing to its edge; the other half is its mirror image. */
  along: number;
}

/** Nodes along one direction, with the cell around each. */
export interface Nodes {
  place: Float64Array;
  /** Half-way to the next node. */
  face: Float64Array;
  /** Of the cell around each node. */
  width: Float64Array;
}

/**
 * Nodes around the bearing from the widest gap (0) by way of the thinnest film (π) to 2π, crowded about the thinnest
 * film the more the thinner it is.
 */
export function nodesAround(eccentricityRatio: number, count: number): Nodes {
  const crowding = Math.min(0.93, Math.max(0.5, 1 - 0.6 * Math.sqrt(1 - eccentricityRatio)));
  return nodesAt(count, (index) => {
    const even = (2 * Math.PI * index) / count;
    return even + crowding * Math.sin(even);
  });
}

/** Nodes from the middle of the bearing (0) to its edge (1), crowded at the edge, where the pressure falls to nothing. */
export function nodesAlong(count: number): Nodes {
  return nodesAt(count, (index) => Math.sin((index / count) * (Math.PI / 2)));
}

function nodesAt(count: number, placeOf: (index: number) => number): Nodes {
  const place = Float64Array.from({ length: count + 1 }, (_, index) => placeOf(index));
  const face = Float64Array.from({ length: count }, (_, index) => (place[index]! + place[index + 1]!) / 2);
  const width = place.map((at, index) => (face[index] ?? at) - (face[index - 1] ?? at));
  return { place, face, width };
}
