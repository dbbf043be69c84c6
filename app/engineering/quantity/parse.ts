import { EngineeringError } from "../engineering-error";
import { metres } from "./length";
import { type Decimal, readNumber } from "./number";
import {
  findUnit,
  isUnitOf,
  picometresIn,
  type QuantityKind,
  toCore,
  type UnitName,
  unitLabel,
  usualUnits,
} from "./units";

/** A quantity as it was typed and as the core takes it. */
export interface Quantity {
  kind: QuantityKind;
  /** SI; kinematic viscosity in mm²/s, temperature in °C. */
  si: number;
  /** Exact, for lengths. */
  picometres?: number;
  /** What was typed, without the spaces around it. */
  typed: string;
  /** The unit it was typed in, or the default where none was. */
  unit: UnitName;
  /** Digits behind the decimal mark as typed. */
  decimals: number;
}

export interface ParseOptions {
  /** The unit of a bare number; without it a bare number is refused. */
  defaultUnit?: UnitName;
  /** Nominal size, pm: a value with a sign is then an offset from it. */
  nominal?: number;
}

const longest = 60;
// Twelve figures come back unchanged through any of the units' factors in double precision; no instrument shows more.
const mostFigures = 10n ** 12n;

/** No quantity of an engine is larger than this in the core's units, lengths apart. */
export const largest = 1e15;

const absoluteZeroC = -273.15;

/**
 * Reads a quantity as a builder types it: `2.1000`, `53,34 mm`, `25 tenths`, `1 7/8 in`, `+3 tenths` from a nominal.
 * Lengths are read digit by digit, so that what is stored is exactly what was typed; other kinds take up to twelve
 * figures. Written out again in their unit and decimals, all give the typed digits.
 * @throws EngineeringError with a stable code: `empty`, `too-long`, `not-a-number`, `ambiguous`, `no-unit`,
 * `wrong-unit`, `too-large`, `too-small` (a temperature), `too-fine` (a length under 1 pm, or too many figures)
 */
export function parseQuantity(text: string, kind: QuantityKind, options: ParseOptions = {}): Quantity {
  const typed = text.trim();
  if (typed === "") throw fault("empty", "Type a value.");
  if (typed.length > longest) throw fault("too-long", "This is too long to be one value.");
  const { number, unitText } = split(typed);
  const decimal = readNumber(number);
  const unit = readUnit(unitText, kind, options.defaultUnit);
  const read = { kind, typed, unit, decimals: decimal.decimals };
  if (isUnitOf(unit, "length")) return { ...read, ...lengthOf(decimal, unit, options.nominal) };
  return { ...read, si: coreValue(decimal, unit, kind) };
}

function fault(code: string, message: string): EngineeringError {
  return new EngineeringError(code, "value", message);
}

const numberThenUnit =
  /^([+\-\u2212]?\s*(?:\d(?:[\d.,\u2019' \u00A0\u2009\u202F]*[\d.,])?|[.,]\d+)(?:\s*\/\s*\d+)?)(.*)$/su;

function split(typed: string): { number: string; unitText: string } {
  const [, number, unit] = numberThenUnit.exec(typed) ?? [];
  if (number === undefined || unit === undefined) {
    throw fault(
      "not-a-number",
      `"${shortened(typed)}" is no number. Type a value such as 2.1000 in or 53.34 mm.`,
    );
  }
  const unitText = unit.trim();
  if (/^e[+\-\u2212]?\d/i.test(unitText))
    throw fault("not-a-number", "Write the number out, without an exponent.");
  return { number, unitText };
}

function shortened(typed: string): string {
  return typed.length > 24 ? `${typed.slice(0, 24)}…` : typed;
}

function readUnit(written: string, kind: QuantityKind, defaultUnit: UnitName | undefined): UnitName {
  const choices = usualUnits(kind).map(unitLabel).join(", ");
  if (written === "") {
    if (defaultUnit) return defaultUnit;
    throw fault("no-unit", `Say the unit: ${choices}.`);
  }
  const unit = findUnit(written, kind);
  if (unit === "wrong")
    throw fault("wrong-unit", `"${shortened(written)}" is not a unit for this; type ${choices}.`);
  if (!unit)
    throw fault("wrong-unit", `"${shortened(written)}" is no unit that is known here; type ${choices}.`);
  return unit;
}

function lengthOf(
  { digits, decimals, signed }: Decimal,
  unit: UnitName,
  nominal: number | undefined,
): { si: number; picometres: number } {
  const scaled = digits * picometresIn(unit);
  const divisor = 10n ** BigInt(decimals);
  if (scaled % divisor !== 0n) {
    throw fault("too-fine", "This is finer than a picometre, which no gauge shows.");
  }
  const exact = scaled / divisor + (signed && nominal !== undefined ? BigInt(nominal) : 0n);
  const picometres = Number(exact);
  if (!Number.isSafeInteger(picometres)) {
    throw fault("too-large", "This length is larger than anything in an engine.");
  }
  return { si: metres(picometres), picometres };
}

function coreValue({ digits, decimals }: Decimal, unit: UnitName, kind: QuantityKind): number {
  if (digits >= mostFigures || -digits >= mostFigures) {
    throw decimals > 0
      ? fault("too-fine", "This has more figures than any instrument shows.")
      : fault("too-large", "This value is larger than anything in an engine.");
  }
  const value = toCore(Number(`${digits}e-${decimals}`), unit);
  if (Math.abs(value) > largest) throw fault("too-large", "This value is larger than anything in an engine.");
  // The last bits of a conversion may put absolute zero itself a hair under it.
  if (kind === "temperature" && value < absoluteZeroC - 1e-9)
    throw fault("too-small", "Nothing is colder than −273.15 °C.");
  return value === 0 ? 0 : value;
}
