interface Place {
  x: number;
  y: number;
}

const directions = 16;
const rings = 8;

/**
 * A place for a label beside each of these places: `away` from all of them and from `others`, and `apart` from the
 * other labels, to the right where that is free. With more of them than there is room for, the last ones overlap.
 */
export function besideEach(
  places: readonly Place[],
  away: number,
  apart: number,
  others: readonly Place[] = [],
): Place[] {
  const occupied = [...places, ...others];
  const taken: Place[] = [];
  for (const own of places) {
    const around = candidates(own, away);
    const free = around.find(
      (candidate) =>
        occupied.every((place) => distance(place, candidate) >= away * 0.99) &&
        taken.every((place) => distance(place, candidate) >= apart),
    );
    taken.push(free ?? around[0]!);
  }
  return taken;
}

const distance = (one: Place, other: Place): number => Math.hypot(one.x - other.x, one.y - other.y);

function candidates(own: Place, away: number): Place[] {
  return Array.from({ length: rings * directions }, (_, index) => {
    const radius = away * (1 + 0.5 * Math.floor(index / directions));
    const turn = index % directions;
    // From the right, by turns upwards and downwards, to the left.
    const steps = turn % 2 === 0 ? -turn / 2 : (turn + 1) / 2;
    const angle = (steps * 2 * Math.PI) / directions;
    return { x: own.x + radius * Math.cos(angle), y: own.y + radius * Math.sin(angle) };
  });
}

/** Heights for labels beside each other's lines: in the same order, at least `gap` apart, inside the span where they fit. */
export function stackApart(heights: readonly number[], gap: number, top: number, bottom: number): number[] {
  const order = heights.map((height, index) => ({ height, index })).sort((a, b) => a.height - b.height);
  const stacked = [...heights];
  let above = top - gap;
  for (const { height, index } of order) {
    above = Math.max(height, above + gap);
    stacked[index] = above;
  }
  let below = bottom + gap;
  for (const { index } of order.reverse()) {
    below = Math.min(stacked[index]!, below - gap);
    stacked[index] = below;
  }
  return stacked;
}
