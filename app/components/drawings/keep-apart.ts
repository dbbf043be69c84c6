interface Place {
  x: number;
  y: number;
}

const directions = 12;
const rings = 6;

/**
 * Places near the given ones that lie at least `distance` from each other, in order: the first stays, later ones give
 * way to the nearest free place round their own. With more of them than there is room for, the last ones overlap.
 */
export function keepApart(places: readonly Place[], distance: number): Place[] {
  const taken: Place[] = [];
  for (const own of places) {
    taken.push(candidates(own, distance).find((place) => isFree(place, taken, distance)) ?? own);
  }
  return taken;
}

function candidates(own: Place, distance: number): Place[] {
  const around = Array.from({ length: rings * directions }, (_, index) => {
    const radius = distance * (0.55 + 0.45 * (1 + Math.floor(index / directions)));
    // Upwards first: what stands over its true place is read as belonging to it.
    const angle = -Math.PI / 2 + ((index % directions) * 2 * Math.PI) / directions;
    return { x: own.x + radius * Math.cos(angle), y: own.y + radius * Math.sin(angle) };
  });
  return [own, ...around];
}

function isFree(place: Place, taken: readonly Place[], distance: number): boolean {
  return taken.every(({ x, y }) => Math.hypot(place.x - x, place.y - y) >= distance - 1e-9);
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
