/** Two neighbours on a cycle and how far between them, 0 at the first to 1 at the second. */
export interface Between {
  before: number;
  after: number;
  part: number;
}

/** A crank angle brought into one cycle, from 0 to just under its length. */
export function cycleAngle(crankAngle: number, cycle: number): number {
  const turned = crankAngle % cycle;
  return turned < 0 ? turned + cycle : turned;
}

/**
 * Finds the neighbours of any angle among points that go once round a cycle.
 * @param angles rising, rad, from the first to less than one cycle after it
 */
export function placeOnCycle(angles: readonly number[], cycle: number): (crankAngle: number) => Between {
  const first = angles[0]!;
  const last = angles.length - 1;
  return (crankAngle) => {
    const turned = cycleAngle(crankAngle - first, cycle);
    let low = 0;
    let high = last;
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (angles[middle]! - first <= turned) low = middle;
      else high = middle - 1;
    }
    const next = low === last ? cycle : angles[low + 1]! - first;
    const start = angles[low]! - first;
    return { before: low, after: low === last ? 0 : low + 1, part: (turned - start) / (next - start) };
  };
}
