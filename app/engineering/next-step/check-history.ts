import { EngineeringError } from "../engineering-error";
import type { History, Rules } from "./types";

/** Refuses what no shop can have: a poor reading is judged, but a target, a limit or a rule must be possible. */
export function checkHistory({ fit, iterations }: History, rules: Rules): void {
  iterations.forEach(({ target }, index) => {
    positive(target, `iterations[${index}].target`, "A target clearance is above zero.");
  });
  const { hardLimits } = fit;
  if (hardLimits && !(hardLimits.least >= 0 && hardLimits.most > hardLimits.least)) {
    throw new EngineeringError(
      "limits-crossed",
      "fit.hardLimits",
      "The most clearance allowed is more than the least, and neither is below zero.",
    );
  }
  for (const name of ["usual", "largestStep", "wearRateRise"] as const) {
    if (rules[name] !== undefined)
      positive(rules[name], `rules.${name}`, "This rule is a number above zero.");
  }
  for (const name of ["leastHours", "stopGrade", "lambdaFloor", "baselineRuns"] as const) {
    const value = rules[name];
    if (value !== undefined && !(value >= 0 && Number.isFinite(value))) {
      throw new EngineeringError("negative", `rules.${name}`, "This rule is a number, not below zero.");
    }
  }
  if (rules.usual === undefined && iterations.length === 0) {
    positive(fit.nominal, "fit.nominal", "A fit without builds needs its nominal size or a usual clearance.");
  }
}

function positive(value: number, field: string, sentence: string): void {
  if (!(value > 0) || !Number.isFinite(value)) throw new EngineeringError("not-positive", field, sentence);
}
