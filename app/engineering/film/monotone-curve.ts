/** A curve through points that rises and falls only where they do, with a smooth slope. */
export interface MonotoneCurve {
  values: ArrayLike<number>;
  slopes: Float64Array;
}

/**
 * The cubic through at least three points, `places` rising, whose slopes never overshoot.
 * Source: F. Fritsch & J. Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300–304, the weighted harmonic mean, and its
 * usual three-point slope at the ends (both from memory).
 */
export function monotoneCurve(places: ArrayLike<number>, values: ArrayLike<number>): MonotoneCurve {
  const last = places.length - 1;
  const step = (i: number) => places[i + 1]! - places[i]!;
  const rise = (i: number) => (values[i + 1]! - values[i]!) / step(i);
  const slopes = new Float64Array(places.length);
  slopes[0] = endSlope(step(0), step(1), rise(0), rise(1));
  slopes[last] = endSlope(step(last - 1), step(last - 2), rise(last - 1), rise(last - 2));
  for (let i = 1; i < last; i++) {
    const before = rise(i - 1);
    const after = rise(i);
    if (before * after <= 0) continue;
    const weight = 2 * step(i) + step(i - 1);
    const other = step(i) + 2 * step(i - 1);
    slopes[i] = (weight + other) / (weight / before + other / after);
  }
  return { values, slopes };
}

function endSlope(step: number, nextStep: number, rise: number, nextRise: number): number {
  const slope = ((2 * step + nextStep) * rise - step * nextRise) / (step + nextStep);
  if (slope * rise <= 0) return 0;
  return rise * nextRise <= 0 && Math.abs(slope) > 3 * Math.abs(rise) ? 3 * rise : slope;
}

/** A place between the points that several curves share: the point before it, and what each end counts there. */
export interface Spot {
  before: number;
  valueBefore: number;
  valueAfter: number;
  slopeBefore: number;
  slopeAfter: number;
}

/** Finds a place, from the first point to the last, once for all curves over the same places. */
export function spotAt(places: ArrayLike<number>, place: number): Spot {
  let before = 0;
  let after = places.length - 1;
  while (after - before > 1) {
    const middle = (before + after) >> 1;
    if (places[middle]! <= place) before = middle;
    else after = middle;
  }
  const step = places[after]! - places[before]!;
  const part = (place - places[before]!) / step;
  const rest = 1 - part;
  return {
    before,
    valueBefore: rest * rest * (1 + 2 * part),
    valueAfter: part * part * (1 + 2 * rest),
    slopeBefore: rest * rest * part * step,
    slopeAfter: -part * part * rest * step,
  };
}

/** A curve's value at a spot of its places. */
export function valueAt({ values, slopes }: MonotoneCurve, spot: Spot): number {
  const { before } = spot;
  return (
    spot.valueBefore * values[before]! +
    spot.valueAfter * values[before + 1]! +
    spot.slopeBefore * slopes[before]! +
    spot.slopeAfter * slopes[before + 1]!
  );
}
