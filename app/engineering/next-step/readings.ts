import { median } from "simple-statistics";
import { type CompleteRules, tenth } from "./rules";
import type { Iteration, PositionOfBuild } from "./types";

/** Standard deviation of a position from its target in a careful build, m (common practice: half a tenth). */
export const usualScatter = tenth / 2;

/** Expanded uncertainty of one clearance where none was given, m (two diameters of 0.7 µm each). */
const usualUncertainty = 0.8 * tenth;

/** A position whose readings can be used, lengths in m. */
export interface UsablePosition
  extends Pick<PositionOfBuild, "position" | "grade" | "damage" | "coatingState"> {
  /** As assembled; null where the reading was left out and only the target stands in. */
  clearance: number | null;
  /** Growth of the clearance; null where a reading is missing or was left out. */
  wear: number | null;
  /** Standard uncertainty of one clearance: as stated, or as readings are seen to scatter where that is more. */
  standardUncertainty: number;
}

/** A reading that was left out, and what it probably is. */
export interface LeftOut {
  position: number;
  stage: "assembly" | "teardown";
  code: "typing-slip" | "negative-wear" | "interference";
  value: number;
  /** The slip that would explain it, in words; empty where none does. */
  likely: string;
}

export interface Readings {
  positions: UsablePosition[];
  leftOut: LeftOut[];
}

/** The middle standard uncertainty of one clearance in a build, m. */
export function readingDeviation({ positions }: Pick<Readings, "positions">): number {
  return median(positions.map(({ standardUncertainty }) => standardUncertainty));
}

/** Expanded uncertainty of one clearance of a position, m: as given, or the usual one. */
export function expandedUncertainty({ uncertainty }: PositionOfBuild): number {
  return uncertainty && uncertainty > 0 && Number.isFinite(uncertainty) ? uncertainty : usualUncertainty;
}

/**
 * The readings of a build, with those left out that cannot be what was there: a clearance far from its target and from
 * the others, a teardown far from its assembly, wear that is negative beyond what the gauges can err.
 * @param noise how much readings are seen to scatter, 1 standard deviation, m
 */
export function sortReadings(iteration: Iteration, { largestStep }: CompleteRules, noise: number): Readings {
  const leftOut: LeftOut[] = [];
  const centre = centreOf(iteration, 3 * largestStep);
  const positions = iteration.positions.map((position): UsablePosition => {
    const stated = expandedUncertainty(position) / 2;
    const standardUncertainty = Math.min(Math.max(stated, noise), 3 * stated);
    const farOff = Math.max(2 * largestStep, 5 * Math.hypot(standardUncertainty, usualScatter));
    const leave = (stage: LeftOut["stage"], code: LeftOut["code"], value: number, expected: number) => {
      leftOut.push({ position: position.position, stage, code, value, likely: likelySlip(value / expected) });
      return null;
    };
    const clearance = read(position.assembled, centre, farOff, (code, value) =>
      leave("assembly", code, value, centre),
    );
    const expected = clearance ?? centre;
    const tornDown = read(position.tornDown, expected, wearOf(position, farOff), (code, value) =>
      leave("teardown", code, value, expected),
    );
    let wear = clearance === null || tornDown === null ? null : tornDown - clearance;
    // Three standard deviations of a difference of two clearances: what the gauges hardly ever err.
    if (wear !== null && wear < -3 * Math.SQRT2 * standardUncertainty) {
      wear = leave("teardown", "negative-wear", wear, expected);
    }
    const { position: number, grade, damage, coatingState } = position;
    return { position: number, grade, damage, coatingState, clearance, wear, standardUncertainty };
  });
  return { positions, leftOut };
}

/** The target, unless most positions agree on another place, which is then judged as such. */
function centreOf({ target, positions }: Iteration, near: number): number {
  const read = positions
    .flatMap(({ assembled }) => (assembled ? [assembled.clearance] : []))
    .filter(Number.isFinite);
  if (read.length === 0) return target;
  const middle = median(read);
  return Math.abs(middle - target) > near ? middle : target;
}

/** A failed bearing can wear far; a good one that seems to has been mistyped. */
function wearOf({ grade }: PositionOfBuild, farOff: number): number {
  return (grade ?? 0) >= 3 ? 10 * farOff : farOff;
}

function read(
  measured: PositionOfBuild["assembled"],
  expected: number,
  farOff: number,
  leave: (code: LeftOut["code"], value: number) => null,
): number | null {
  if (!measured || !Number.isFinite(measured.clearance)) return null;
  if (measured.clearance <= 0) return leave("interference", measured.clearance);
  if (Math.abs(measured.clearance - expected) > farOff) return leave("typing-slip", measured.clearance);
  return measured.clearance;
}

const slips: [ratio: number, words: string][] = [
  [10, "ten times what it should be"],
  [0.1, "a tenth of what it should be"],
  [100, "a hundred times what it should be"],
  [0.01, "a hundredth of what it should be"],
  [25.4, "inches and millimetres swapped"],
  [1 / 25.4, "inches and millimetres swapped"],
  [2, "diametral for radial"],
  [0.5, "radial for diametral"],
];

function likelySlip(ratio: number): string {
  return slips.find(([slip]) => ratio > 0 && Math.abs(Math.log(ratio / slip)) < 0.15)?.[1] ?? "";
}
