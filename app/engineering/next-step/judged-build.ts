import { mean } from "simple-statistics";
import { coatingOf } from "./coating";
import { causeElsewhere } from "./damage";
import { faultOf } from "./fault";
import { gaugeNoise } from "./gauge-noise";
import { type Readings, sortReadings, type UsablePosition } from "./readings";
import type { CompleteRules } from "./rules";
import type { FitOfHistory, History, Iteration } from "./types";
import type { Said } from "./words";

/** Damage on one position that clearance does not explain, and where to look. */
export interface DamageElsewhere {
  position: number;
  damage: string;
  look: string;
}

/** One build as it was judged by itself, before it is weighed against the others. Lengths in m. */
export interface JudgedBuild extends Readings {
  iteration: Iteration;
  /** Mean of the positions whose assembled readings can be used. */
  clearance: number | null;
  /** Why the readings of this build cannot be used at all. */
  fault: Said | null;
  elsewhere: DamageElsewhere[];
  /** Positions that clearance may have brought to the shop's stop grade, or through their coating. */
  distressed: UsablePosition[];
  /** The worst grade that clearance may have brought about; null where nothing was graded. */
  worstGrade: number | null;
  /** How many positions came down marked (grade 2) or worse, as far as clearance may have brought it about. */
  marked: number;
  /** The first run on a coating wears more than those after it. */
  beddingIn: boolean;
}

/** Events that put a load on the parts which no clearance is chosen for. */
const overloads = ["over-rev", "detonation"];

/** Judges every build by itself. */
export function judgeBuilds({ fit, iterations }: History, rules: CompleteRules): JudgedBuild[] {
  const expected = fit.positions ?? Math.max(1, ...iterations.map(({ positions }) => positions.length));
  const firstOnCoating = firstRunOnCoating(fit, iterations);
  const noise = gaugeNoise(iterations);
  return iterations.map((iteration, index) => {
    const readings = sortReadings(iteration, rules, noise);
    const clearances = readings.positions.flatMap(({ clearance }) => (clearance === null ? [] : [clearance]));
    const ofClearance = readings.positions.filter((position) => causeElsewhere(position) === null);
    const distressed = ofClearance.filter(
      ({ grade, coatingState }) => (grade ?? 0) >= rules.stopGrade || coatingState === "worn-through",
    );
    const grades = ofClearance.flatMap(({ grade }) => (grade === null ? [] : [grade]));
    return {
      ...readings,
      iteration,
      clearance: clearances.length > 0 ? mean(clearances) : null,
      fault: faultOf(iteration, readings, { expected, singleKnown: fit.positions === 1, rules }),
      elsewhere: damageElsewhere(iteration, readings, distressed),
      distressed,
      worstGrade: grades.length > 0 ? Math.max(...grades) : null,
      marked: grades.filter((grade) => grade >= 2).length,
      beddingIn: index === firstOnCoating,
    };
  });
}

/** Which build was the first run on the fit's present coating; −1 where none is known to be. */
function firstRunOnCoating(fit: FitOfHistory, iterations: readonly Iteration[]): number {
  const present = coatingOf({}, fit);
  if (present === null) return -1;
  const first = iterations.findIndex((iteration) => coatingOf(iteration, fit) === present);
  return first > 0 || fit.coating?.isNew ? first : -1;
}

function damageElsewhere(
  { events }: Iteration,
  { positions }: Readings,
  distressed: readonly UsablePosition[],
): DamageElsewhere[] {
  const byTerm = positions.flatMap((position) => {
    const look = causeElsewhere(position);
    // A light mark is normal wear of its kind; from "marked" on somebody has to know where it came from.
    return look !== null && (position.grade ?? 2) >= 2
      ? [{ position: position.position, damage: position.damage ?? "flaking", look }]
      : [];
  });
  if (byTerm.length > 0) return byTerm;
  if (events.includes("debris")) {
    return [{ position: 0, damage: "debris", look: "dirt in the oil: filter, cleaning, what shed it" }];
  }
  const overload = events.find((event) => overloads.includes(event));
  return overload !== undefined && distressed.length > 0
    ? [{ position: distressed[0]!.position, damage: overload, look: "the run itself: what loaded the parts" }]
    : [];
}

/** Whether a build came down with nothing that speaks against its clearance. */
export function isClean({ distressed, worstGrade }: JudgedBuild): boolean {
  return distressed.length === 0 && worstGrade !== null;
}

/**
 * Whether the eye alone opens the fit: distress that clearance may have brought about, in a run without overload, on
 * parts of this engine. It needs no gauge, so no poor reading sets it aside.
 */
export function isDistressed({ iteration, distressed, fault }: JudgedBuild): boolean {
  const overloaded = iteration.events.some((event) => overloads.includes(event));
  return distressed.length > 0 && !overloaded && fault?.code !== "another-engine";
}
