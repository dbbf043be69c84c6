import { mean } from "simple-statistics";
import type { Bracket } from "./bracket";
import { lastUncertainty } from "./data";
import type { WeighedBuild } from "./likeness";
import type { Prospect } from "./look-ahead";
import { oddWears } from "./signs";
import type { BuildEvidence, Evidence } from "./types";

const micron = 1e-6;

interface Drawn extends Pick<Evidence, "buildScatter" | "baselineRate" | "posterior"> {
  bracket: Bracket;
  considered: readonly Prospect[];
}

/** The numbers that an answer was made from, to be kept with it. */
export function evidenceOf(builds: readonly WeighedBuild[], drawn: Drawn): Evidence {
  const last = builds.at(-1);
  return {
    builds: builds.map(evidenceOfBuild),
    uncertainty: last ? lastUncertainty(last) : 0,
    buildScatter: drawn.buildScatter,
    ...drawn.bracket,
    baselineRate: drawn.baselineRate,
    posterior: drawn.posterior,
    considered: drawn.considered.map(({ target, expectedCost, distress }) => ({
      target: target * micron,
      expectedCost,
      chanceOfDistress: distress,
    })),
  };
}

function evidenceOfBuild(build: WeighedBuild): BuildEvidence {
  const { iteration, clearance, worstGrade, weight, why, positions } = build;
  const odd = oddWears(build);
  const worn = positions.filter(({ position, wear }) => wear !== null && !odd.has(position));
  const hours = iteration.hours ?? 0;
  const rated = worn.length > 0 && hours > 0;
  const deviation = Math.SQRT2 * Math.max(0, ...worn.map(({ standardUncertainty }) => standardUncertainty));
  return {
    build: iteration.build,
    clearance,
    worstGrade,
    wearRate: rated ? mean(worn.map(({ wear }) => wear!)) / hours : null,
    wearRateUncertainty: rated ? deviation / Math.sqrt(worn.length) / hours : null,
    weight,
    why,
  };
}
