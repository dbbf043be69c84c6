import { formatLength } from "./format";
import { picometresIn, type UnitName } from "./units";

/** The slips of the hand that a value can be put right from. */
export type SlipCode =
  | "wrong-unit"
  | "factor-of-ten"
  | "hundredth-for-thousandth"
  | "micrometer-turn"
  | "calliper-turn"
  | "sign"
  | "swapped-digits"
  | "doubled-digit"
  | "dropped-digit";

/** What would have to be put right, and what the value was then. */
export interface Explanation {
  code: SlipCode;
  /** pm */
  suggestion: number;
  /** How the sentence about it ends. */
  why: string;
  /** In how many things it is free to choose: a digit and its place make almost any value out of any other. */
  free: 0 | 1 | 2;
}

/** All that a value could have been meant as, likely or not; offsets count from the nominal size. */
export function explanations(value: number, nominal: number, unit: UnitName): Explanation[] {
  return [...scaled(value), ...offset(value, nominal), ...turned(value), ...mistyped(value, unit)];
}

const scales: readonly [SlipCode, number, string][] = [
  ["wrong-unit", 25.4, "typed in the wrong unit, inches for mm or thou for µm"],
  ["wrong-unit", 1 / 25.4, "typed in the wrong unit, mm for inches or µm for thou"],
  ["wrong-unit", 2.54, "typed in the wrong unit, tenths for µm"],
  ["wrong-unit", 1 / 2.54, "typed in the wrong unit, µm for tenths"],
  ["wrong-unit", 1000 / 25.4, "typed in the wrong unit, µm for µin or mm for thou"],
  ["wrong-unit", 25.4 / 1000, "typed in the wrong unit, µin for µm or thou for mm"],
  ["wrong-unit", 1000, "typed in the wrong unit, a thousandth of what it is"],
  ["wrong-unit", 1 / 1000, "typed in the wrong unit, a thousand times what it is"],
  ["factor-of-ten", 10, "with the decimal mark one place off"],
  ["factor-of-ten", 1 / 10, "with the decimal mark one place off"],
  ["factor-of-ten", 100, "with the decimal mark two places off"],
  ["factor-of-ten", 1 / 100, "with the decimal mark two places off"],
  ["factor-of-ten", 1e-4, "without its decimal mark"],
  ["factor-of-ten", 1e-5, "without its decimal mark"],
];

function scaled(value: number): Explanation[] {
  return scales.map(([code, by, why]) => ({ code, suggestion: Math.round(value * by), why, free: 0 }));
}

function offset(value: number, nominal: number): Explanation[] {
  const explain = (code: SlipCode, suggestion: number, why: string): Explanation => ({
    code,
    suggestion,
    why,
    free: 0,
  });
  const minus = explain("sign", -value, "with the sign turned round");
  // From zero, ten times too much is a decimal mark and named as one.
  if (nominal === 0) return [minus];
  const from = value - nominal;
  return [
    minus,
    explain("sign", nominal - from, "with the sign turned round"),
    explain(
      "hundredth-for-thousandth",
      nominal + Math.round(from / 10),
      "with hundredths typed for thousandths",
    ),
  ];
}

const turns: readonly [SlipCode, number, string][] = [
  ["micrometer-turn", 635_000_000, "read one turn of the micrometer off, 0.025 in"],
  ["micrometer-turn", 500_000_000, "read one turn of the micrometer off, 0.5 mm"],
  ["calliper-turn", 2_540_000_000, "read one turn of the dial off, 0.100 in"],
];

function turned(value: number): Explanation[] {
  return turns.flatMap(([code, turn, why]) =>
    [turn, -turn].map((by): Explanation => ({ code, suggestion: value + by, why, free: 0 })),
  );
}

/** Digits with the place of their decimal mark, and what was done to those typed to get them. */
interface Digits {
  digits: string;
  point: number;
  code: SlipCode;
  why: string;
  free: Explanation["free"];
}

const mostDecimals = 6;

/** Neighbouring digits swapped, one digit lost or typed twice, in the digits as they stand in this unit. */
function mistyped(value: number, unit: UnitName): Explanation[] {
  const text = formatLength(Math.abs(value), unit, mostDecimals).replace(/\.?0+$/, "");
  const [whole = "", behind = ""] = text.split(".");
  const perUnit = Number(picometresIn(unit)) * Math.sign(value);
  const typed = whole + behind;
  return [
    ...swapped(typed, whole.length),
    ...doubled(typed, whole.length),
    ...dropped(typed, whole.length),
  ].map(({ digits, point, code, why, free }) => ({
    code,
    suggestion: Math.round((Number(digits) * perUnit) / 10 ** (digits.length - point)),
    why,
    free,
  }));
}

function swapped(typed: string, point: number): Digits[] {
  return [...typed.slice(1)].flatMap((digit, before): Digits[] => {
    const other = typed[before]!;
    if (digit === other) return [];
    const digits = typed.slice(0, before) + digit + other + typed.slice(before + 2);
    return [{ digits, point, code: "swapped-digits", why: "with two digits swapped", free: 1 }];
  });
}

function doubled(typed: string, point: number): Digits[] {
  return [...typed.slice(1)].flatMap((digit, before): Digits[] => {
    if (digit !== typed[before]) return [];
    const digits = typed.slice(0, before) + typed.slice(before + 1);
    const without = before + 1 < point ? point - 1 : point;
    return [{ digits, point: without, code: "doubled-digit", why: "with a digit typed twice", free: 1 }];
  });
}

function dropped(typed: string, point: number): Digits[] {
  const found: Digits[] = [];
  for (let at = 0; at <= typed.length; at++) {
    for (let digit = 0; digit <= 9; digit++) {
      const digits = `${typed.slice(0, at)}${digit}${typed.slice(at)}`;
      const put = (where: number) =>
        found.push({ digits, point: where, code: "dropped-digit", why: `with a ${digit} dropped`, free: 2 });
      // Before the decimal mark a digit moves it; right at the mark it may belong on either side.
      if (at <= point) put(point + 1);
      if (at >= point) put(point);
    }
  }
  return found;
}
