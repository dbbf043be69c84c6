import { formatLength } from "./format";
import { type Explanation, explanations, type SlipCode } from "./slip-explanations";
import type { UnitName } from "./units";

/** What a box expects, all in picometres. */
export interface Expectation {
  /** What stands there if all is well. */
  expected: number;
  /** How far from it a good reading may lie: inside, nothing is a slip. */
  band: number;
  /** The size that offsets are counted from; a value typed without one is counted from zero. */
  nominal?: number;
  /** What stood in this box last time. */
  last?: number;
  /** What stands in the other boxes of its column. */
  column?: readonly number[];
  /**
   * What the other part's box expects: a bore's journal, a journal's bore. An exchange can only be seen where the
   * band is narrower than the difference of the two.
   */
  counterpart?: number;
}

/** A likely slip of the hand, named in one sentence. It warns and never blocks. */
export interface Slip {
  code: SlipCode | "exchanged-parts" | "far-off";
  message: string;
  /** What was probably meant, pm. */
  suggestion?: number;
}

/**
 * Whether a reading looks like a slip, and which: of the explanations that bring it into the band, the one that lands
 * nearest to what the box expects. A digit too few or too many can explain almost anything, so it must land nearer
 * by a part of the band than a slip that needs no such luck. The list of slips is common practice, no source.
 * @param value what was typed, pm
 * @param unit the unit that the sentence and the digits are looked at in
 */
export function checkSlip(value: number, expectation: Expectation, unit: UnitName = "in"): Slip | null {
  const { expected, band, counterpart, nominal = 0 } = expectation;
  if (Math.abs(value - expected) <= band) return null;
  const said = (picometres: number) => lengthText(picometres, unit);
  const target = likelyValue(expectation);
  const best = explanations(value, nominal, unit)
    .filter(({ suggestion }) => Math.abs(suggestion - expected) <= band)
    .map((explanation) => ({ ...explanation, reach: reach(explanation, target, band) }))
    .sort((one, other) => one.reach - other.reach)[0];
  if (counterpart !== undefined && sitsOn(value, counterpart, expected, band, best?.reach)) {
    return {
      code: "exchanged-parts",
      message: `${said(value)} is what the other part of this fit measures. Bore and journal exchanged?`,
    };
  }
  if (!best) {
    return {
      code: "far-off",
      message: `${said(value)} is ${said(Math.abs(value - expected))} from what this box expects, ${said(expected)}.`,
    };
  }
  return {
    code: best.code,
    message: `${said(value)} looks like ${said(best.suggestion)} ${best.why}.`,
    suggestion: best.suggestion,
  };
}

/** Last time's reading says more than the middle of the column, and that more than the drawing. */
function likelyValue({ expected, band, last, column = [] }: Expectation): number {
  const inBand = (value: number) => Math.abs(value - expected) <= band;
  if (last !== undefined && inBand(last)) return last;
  const others = column.filter(inBand).sort((one, other) => one - other);
  return others[Math.floor(others.length / 2)] ?? expected;
}

const luck = 0.1;

/** How far an explanation lands from the likely value, pm, with a part of the band added for the luck it needs. */
function reach({ suggestion, free }: Explanation, target: number, band: number): number {
  return Math.abs(suggestion - target) + free * luck * band;
}

/** Bore and journal lie close, so the exchange explains a reading only when it sits on the other part's size. */
function sitsOn(
  value: number,
  counterpart: number,
  expected: number,
  band: number,
  rival = Number.POSITIVE_INFINITY,
): boolean {
  const distance = Math.abs(value - counterpart);
  return distance <= Math.min(band, Math.abs(expected - counterpart) / 4) && distance <= rival;
}

const shownDecimals: Partial<Record<UnitName, readonly [least: number, most: number]>> = {
  in: [4, 6],
  thou: [1, 3],
  mm: [3, 5],
  um: [1, 2],
};

function lengthText(picometres: number, unit: UnitName): string {
  const [least, most] = shownDecimals[unit] ?? [0, 2];
  const [whole = "", behind = ""] = formatLength(picometres, unit, most).split(".");
  const kept = behind.slice(0, least) + behind.slice(least).replace(/0+$/, "");
  return `${kept ? `${whole}.${kept}` : whole} ${unit}`;
}
