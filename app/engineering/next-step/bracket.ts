import { isClean } from "./judged-build";
import type { WeighedBuild } from "./likeness";

/** Between which targets the limit was seen to lie, on the present oil and coating; m. */
export interface Bracket {
  /** The closest target that came down clean, above every one that did not. */
  knownGood: number | null;
  /** The widest target that came down distressed. */
  knownBad: number | null;
}

/** The bracket of the builds that count in full. */
export function bracketOf(builds: readonly WeighedBuild[]): Bracket {
  const counted = builds.filter(({ weight, like }) => weight > 0 && like);
  const bad = counted
    .filter(({ distressed }) => distressed.length > 0)
    .map(({ iteration }) => iteration.target);
  const knownBad = bad.length > 0 ? Math.max(...bad) : null;
  const good = counted
    .filter((build) => isClean(build) && (knownBad === null || build.iteration.target > knownBad))
    .map(({ iteration }) => iteration.target);
  return { knownGood: good.length > 0 ? Math.min(...good) : null, knownBad };
}
