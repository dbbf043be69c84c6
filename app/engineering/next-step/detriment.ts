import { median, medianAbsoluteDeviation } from "simple-statistics";
import { wearRise } from "./baseline";
import { isDistressed } from "./judged-build";
import type { WeighedBuild } from "./likeness";
import type { CompleteRules } from "./rules";
import type { Said } from "./words";

/** Oil hotter than before by this much at like duty is not chance, °C (common practice, no source). */
const hotterBy = 10;

export interface Detriment {
  reasons: Said[];
  /** Failed, through its coating, or most positions: not to be met half-way. */
  severe: boolean;
}

/** The third guard: what says that the last build went too far. Null where nothing does. */
export function judgeDetriment(builds: readonly WeighedBuild[], rules: CompleteRules): Detriment | null {
  const last = builds.at(-1)!;
  const { build } = last.iteration;
  const reasons: Said[] = [];
  let severe = false;
  if (isDistressed(last)) {
    const { distressed, positions } = last;
    const through = distressed.filter(({ coatingState }) => coatingState === "worn-through");
    const graded = distressed.filter(({ grade }) => (grade ?? 0) >= rules.stopGrade);
    const worst = graded.reduce((most, { grade }) => Math.max(most, grade!), 0);
    if (graded.length > 0) {
      const { damage } = graded.find(({ grade }) => grade === worst)!;
      reasons.push({
        code: "grade-at-stop",
        values: {
          build,
          grade: worst,
          positions: listed(graded),
          damage: damage ?? "",
          stop: rules.stopGrade,
        },
      });
    }
    if (through.length > 0)
      reasons.push({ code: "coating-worn-through", values: { build, positions: listed(through) } });
    severe = worst >= 4 || through.length > 0 || distressed.length * 2 > positions.length;
  }
  const worn = last.weight > 0 ? wearRise(builds, rules.wearRateRise) : null;
  if (worn) reasons.push({ code: "wear-rate-risen", values: { build, ...worn } });
  const hotter = oilHotter(builds);
  if (hotter) reasons.push(hotter);
  return reasons.length > 0 ? { reasons, severe } : null;
}

const listed = (positions: readonly { position: number }[]) =>
  positions.map(({ position }) => position).join(", ");

/** Oil hotter than in the wider builds on the same oil, by more than chance: a sign of a fit too close. */
function oilHotter(builds: readonly WeighedBuild[]): Said | null {
  const { iteration } = builds.at(-1)!;
  const now = iteration.oil?.temperatureC;
  const before = builds
    .slice(0, -1)
    .filter(
      ({ weight, like, iteration: { target } }) => weight > 0 && like && target > iteration.target + 1e-8,
    )
    .flatMap(({ iteration: { oil } }) => (oil?.temperatureC == null ? [] : [oil.temperatureC]));
  if (now == null || before.length < 2) return null;
  const usual = median(before);
  const chance = 3 * 1.4826 * medianAbsoluteDeviation(before);
  return now - usual > Math.max(hotterBy, chance)
    ? { code: "oil-hotter", values: { build: iteration.build, nowC: now, beforeC: usual } }
    : null;
}
