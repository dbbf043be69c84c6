import { isSameTarget } from "./data";
import { isClean } from "./judged-build";
import { isSameOil, type WeighedBuild } from "./likeness";
import type { Said } from "./words";

/** Which oil gave way to which in the last build; null where it did not change. */
export function oilWasChanged(builds: readonly WeighedBuild[]): Said["values"] | null {
  const last = builds.at(-1)?.iteration;
  const before = builds.at(-2)?.iteration;
  if (!last?.oil || !before?.oil || isSameOil(before.oil, last.oil)) return null;
  return { build: last.build, from: before.oil.name, to: last.oil.name };
}

/** A clearance that has run clean twice on this oil is settled on it: then the oil may be the next change. */
export function oilNext(builds: readonly WeighedBuild[]): Said | null {
  const last = builds.at(-1)!;
  const clean = builds.filter(
    (build) =>
      build.weight > 0 &&
      build.like &&
      isClean(build) &&
      isSameTarget(build.iteration.target, last.iteration.target),
  );
  return clean.length >= 2 && last.iteration.oil
    ? { code: "oil-next", values: { runs: clean.length, oil: last.iteration.oil.name } }
    : null;
}
