import { judgeData, lastUncertainty } from "./data";
import { isDistressed } from "./judged-build";
import type { WeighedBuild } from "./likeness";
import { oilWasChanged } from "./one-at-a-time";
import type { CompleteRules } from "./rules";
import { oddWears } from "./signs";
import type { Action } from "./types";
import type { Said } from "./words";
import { inSentence } from "./words";

/** What a person should know beside the proposal. */
export function cautionsOf(
  builds: readonly WeighedBuild[],
  { action, target }: { action: Action; target: number },
  rules: CompleteRules,
): Said[] {
  const last = builds.at(-1);
  if (!last) return [];
  return [
    ...setAside(last, builds, rules),
    ...leftOut(last),
    ...positionsOf(last, builds),
    ...(action === "find-cause" && (last.distressed.length > 0 || (worstOfAll(last) ?? 0) >= rules.stopGrade)
      ? [{ code: "not-this-clearance-again" as const, values: { target } }]
      : []),
    ...eventsOf(last),
    ...(action === "open" ? changedOil(builds) : []),
    ...evidenceAtHand(builds),
  ];
}

/** Where the grades alone opened the fit: what was wrong with the rest of the build. */
function setAside(last: WeighedBuild, builds: readonly WeighedBuild[], rules: CompleteRules): Said[] {
  if (!isDistressed(last)) return [];
  const poor = judgeData(builds, rules);
  return [
    ...(poor
      ? [{ code: "poor-data-too" as const, values: { because: inSentence(poor.reason, "inch").text } }]
      : []),
    ...last.elsewhere.slice(0, 1).map(({ position, damage, look }) => ({
      code: "elsewhere-too" as const,
      values: { position, damage, look },
    })),
  ];
}

function leftOut({ leftOut, iteration }: WeighedBuild): Said[] {
  return leftOut.map(({ code, position, stage, value, likely }) => ({
    code,
    values: { build: iteration.build, position, stage, value, likely },
  }));
}

function positionsOf(last: WeighedBuild, builds: readonly WeighedBuild[]): Said[] {
  const { build } = last.iteration;
  const odd = [...oddWears(last)].filter(
    (position) => !last.elsewhere.some((damaged) => damaged.position === position),
  );
  const expected = Math.max(...builds.map(({ positions }) => positions.length));
  const measured = last.iteration.positions.filter(({ assembled, tornDown }) => assembled && tornDown).length;
  const assumed = last.iteration.positions.some(({ uncertainty }) => !uncertainty || !(uncertainty > 0));
  return [
    ...(odd.length > 0
      ? [{ code: "odd-position" as const, values: { build, positions: odd.join(", ") } }]
      : []),
    ...(measured < expected
      ? [{ code: "missing-positions" as const, values: { build, missing: expected - measured, expected } }]
      : []),
    ...(assumed
      ? [{ code: "uncertainty-assumed" as const, values: { uncertainty: lastUncertainty(last) } }]
      : []),
  ];
}

function worstOfAll({ positions }: WeighedBuild): number | null {
  const grades = positions.flatMap(({ grade }) => (grade === null ? [] : [grade]));
  return grades.length > 0 ? Math.max(...grades) : null;
}

function eventsOf({ iteration: { build, events } }: WeighedBuild): Said[] {
  return events.length > 0 ? [{ code: "event-seen", values: { build, events: events.join(", ") } }] : [];
}

function changedOil(builds: readonly WeighedBuild[]): Said[] {
  const changed = oilWasChanged(builds);
  return changed ? [{ code: "oil-changed-too", values: changed }] : [];
}

function evidenceAtHand(builds: readonly WeighedBuild[]): Said[] {
  const full = builds.filter(({ weight }) => weight === 1).length;
  return [
    ...(full < builds.length
      ? [{ code: "unlike-evidence" as const, values: { count: builds.length - full, of: builds.length } }]
      : []),
    ...(full < 2 ? [{ code: "little-evidence" as const, values: { count: full } }] : []),
  ];
}
