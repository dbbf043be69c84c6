/** A root as far as it was found. */
export interface Root {
  place: number;
  converged: boolean;
}

/** Where to look, and when it is near enough: by the function's value. */
export interface Search {
  low: number;
  high: number;
  tolerance: number;
}

const rounds = 100;

/**
 * The root of a rising function between two places, by false position (the Illinois rule), in at most a hundred rounds.
 * Where the function has one sign at both ends, the nearer end is the answer, not converged unless within tolerance.
 */
export function risingRoot(valueAt: (place: number) => number, { low, high, tolerance }: Search): Root {
  let below = valueAt(low);
  let above = valueAt(high);
  if (below >= 0) return { place: low, converged: below <= tolerance };
  if (above <= 0) return { place: high, converged: above >= -tolerance };
  let kept: "low" | "high" | undefined;
  for (let round = 0; round < rounds; round++) {
    const place = (low * above - high * below) / (above - below);
    const value = valueAt(place);
    if (Math.abs(value) <= tolerance) return { place, converged: true };
    if (value > 0) {
      [high, above] = [place, value];
      if (kept === "low") below /= 2;
      kept = "low";
    } else {
      [low, below] = [place, value];
      if (kept === "high") above /= 2;
      kept = "high";
    }
  }
  return { place: (low + high) / 2, converged: false };
}
