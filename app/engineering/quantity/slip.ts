import { formatLength } from "./format";

/** What a box expects, all in picometres. */
export interface Expectation {
  /** What stands there if all is well. */
  expected: number;
  /** How far from it a good reading may lie. */
  band: number;
  /** What the other part's box expects: a bore's journal, a journal's bore. */
  counterpart?: number;
}

/** A likely slip of the hand, named in one sentence. It warns and never blocks. */
export interface Slip {
  code:
    | "wrong-unit"
    | "factor-of-ten"
    | "swapped-digits"
    | "dropped-digit"
    | "doubled-digit"
    | "micrometer-turn"
    | "calliper-turn"
    | "sign"
    | "exchanged-parts"
    | "far-off";
  message: string;
  /** What was probably meant, pm. */
  suggestion?: number;
}

interface Candidate extends Omit<Slip, "message"> {
  suggestion: number;
  why: string;
}

const inch = 25_400_000_000;
const millimetre = 1_000_000_000;

/**
 * Whether a reading looks like a slip, and which: of the explanations that would bring it into the band, the one that
 * lands nearest to what is expected. Common practice names the slips: a wrong unit, a factor of ten, one turn of a
 * micrometer (0.025 in or 0.5 mm), one turn of a calliper's dial (0.100 in), swapped, dropped or doubled digits.
 */
export function checkSlip(value: number, expectation: Expectation, unit: "in" | "mm" = "in"): Slip | null {
  const { expected, band, counterpart } = expectation;
  if (Math.abs(value - expected) <= band) return null;
  const text = (picometres: number) => `${formatLength(picometres, unit, unit === "in" ? 4 : 3)} ${unit}`;
  const candidates: Candidate[] = [
    ...scaled(value),
    ...turned(value),
    ...mistyped(value, unit),
    ...mirrored(value, expected),
  ];
  const best = candidates
    .filter((candidate) => Math.abs(candidate.suggestion - expected) <= band)
    .sort((one, other) => Math.abs(one.suggestion - expected) - Math.abs(other.suggestion - expected))[0];
  // Bore and journal lie so close that the exchange explains a reading only when it sits on the other part's size.
  if (
    counterpart !== undefined &&
    Math.abs(value - counterpart) <= Math.min(band, Math.abs(expected - counterpart) / 4)
  ) {
    return {
      code: "exchanged-parts",
      message: `${text(value)} is what the other part of this fit measures. Bore and journal exchanged?`,
    };
  }
  if (!best) {
    return {
      code: "far-off",
      message: `${text(value)} is ${text(Math.abs(value - expected))} from what this box expects, ${text(expected)}.`,
    };
  }
  return {
    code: best.code,
    message: `${text(value)} looks like ${text(best.suggestion)} ${best.why}.`,
    suggestion: best.suggestion,
  };
}

function scaled(value: number): Candidate[] {
  const factor = (code: Slip["code"], by: number, why: string): Candidate => ({
    code,
    suggestion: Math.round(value * by),
    why,
  });
  return [
    factor("wrong-unit", 25.4, "typed in the wrong unit, inches for millimetres"),
    factor("wrong-unit", 1 / 25.4, "typed in the wrong unit, millimetres for inches"),
    factor("wrong-unit", 1000, "typed in the wrong unit, a thousandth of what it is"),
    factor("wrong-unit", 1 / 1000, "typed in the wrong unit, a thousand times what it is"),
    factor("factor-of-ten", 10, "with the decimal mark one place off"),
    factor("factor-of-ten", 1 / 10, "with the decimal mark one place off"),
    factor("factor-of-ten", 100, "with the decimal mark two places off"),
    factor("factor-of-ten", 1 / 100, "with the decimal mark two places off"),
  ];
}

function turned(value: number): Candidate[] {
  const turn = (code: Slip["code"], by: number, why: string): Candidate[] =>
    [by, -by].map((step) => ({ code, suggestion: value + step, why }));
  return [
    ...turn("micrometer-turn", inch * 0.025, "read one turn of the micrometer off, 0.025 in"),
    ...turn("micrometer-turn", millimetre * 0.5, "read one turn of the micrometer off, 0.5 mm"),
    ...turn("calliper-turn", inch * 0.1, "read one turn of the dial off, 0.100 in"),
  ];
}

function mirrored(value: number, expected: number): Candidate[] {
  return [{ code: "sign", suggestion: 2 * expected - value, why: "with the sign of the dial turned round" }];
}

/** Neighbouring digits swapped, one digit lost or typed twice, in the digits as they stand in the page's unit. */
function mistyped(value: number, unit: "in" | "mm"): Candidate[] {
  const decimals = unit === "in" ? 5 : 4;
  const digits = formatLength(Math.abs(value), unit, decimals).replace(".", "");
  const one = unit === "in" ? inch : millimetre;
  const lengthOf = (text: string) => Math.round((Number(text) * one) / 10 ** decimals);
  const found: Candidate[] = [];
  for (let at = 0; at < digits.length; at++) {
    if (at + 1 < digits.length && digits[at] !== digits[at + 1]) {
      const swapped = `${digits.slice(0, at)}${digits[at + 1]}${digits[at]}${digits.slice(at + 2)}`;
      found.push({ code: "swapped-digits", suggestion: lengthOf(swapped), why: "with two digits swapped" });
    }
    if (at > 0 && digits[at] === digits[at - 1]) {
      const without = `${digits.slice(0, at)}${digits.slice(at + 1)}0`;
      found.push({ code: "doubled-digit", suggestion: lengthOf(without), why: "with a digit typed twice" });
    }
    for (let digit = 0; digit <= 9; digit++) {
      const inserted = `${digits.slice(0, at)}${digit}${digits.slice(at, -1)}`;
      found.push({ code: "dropped-digit", suggestion: lengthOf(inserted), why: `with a ${digit} dropped` });
    }
  }
  return found;
}
