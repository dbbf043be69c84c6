import type { Bracket } from "./bracket";
import type { CompleteRules } from "./rules";
import type { FilmPoint, History } from "./types";
import type { Said } from "./words";

/** The least change of target that is worth a build, and what limits each target; m. */
export interface Margins {
  bracket: Bracket;
  /** What can be measured. */
  leastStep: number;
  rules: CompleteRules;
}

/** Lengths are kept to the picometre; what differs by less is the same. */
const picometre = 1e-12;

/** The fourth guard: why a target may not be gone to; null where it may. */
export function marginAt(
  target: number,
  { fit, film }: History,
  { bracket, leastStep, rules }: Margins,
): Said | null {
  const { least, most } = fit.hardLimits ?? { least: 0, most: Number.POSITIVE_INFINITY };
  if (target < least - picometre) return { code: "hard-limit-least", values: { target, least } };
  if (target > most + picometre) return { code: "hard-limit-most", values: { target, most } };
  if (fit.temperatureChange) {
    const { hot, cold } = fit.temperatureChange;
    const tightest = target + Math.min(hot, cold);
    if (tightest < leastStep) {
      return { code: hot < cold ? "closes-hot" : "closes-cold", values: { target, tightest } };
    }
  }
  const { knownBad } = bracket;
  if (knownBad !== null && target < knownBad + leastStep - 1e-9) {
    return { code: "near-known-bad", values: { target, knownBad } };
  }
  const lambda = film ? lambdaAt(film, target) : null;
  if (lambda !== null && lambda < rules.lambdaFloor) {
    return { code: "film-too-thin", values: { target, lambda, floor: rules.lambdaFloor } };
  }
  return null;
}

/** The film parameter predicted at a clearance, between the points given; null outside them. */
export function lambdaAt(film: readonly FilmPoint[], clearance: number): number | null {
  const points = [...film].sort((a, b) => a.clearance - b.clearance);
  const above = points.findIndex((point) => point.clearance >= clearance - 1e-9);
  const [high, low] = [points[above], points[above - 1]];
  if (!high) return null;
  if (!low) return Math.abs(high.clearance - clearance) < 1e-9 ? high.lambda : null;
  const part = (clearance - low.clearance) / (high.clearance - low.clearance);
  return low.lambda + part * (high.lambda - low.lambda);
}
