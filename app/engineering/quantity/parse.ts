import { EngineeringError } from "../engineering-error";
import { metres } from "./length";
import {
  findUnit,
  isUnitOf,
  picometresIn,
  type QuantityKind,
  toCore,
  type UnitName,
  unitLabel,
  unitsOf,
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

/** A decimal number as its digits and how many of them stand behind the point: exact, whatever its length. */
interface Decimal {
  digits: bigint;
  decimals: number;
  signed: boolean;
}

const longest = 60;
const mostDecimals = 18;

/**
 * Reads a quantity as a builder types it: `2.1000`, `53,34 mm`, `25 tenths`, `1 7/8 in`, `+3 tenths` from a nominal.
 * Lengths are read digit by digit, so that what is stored is exactly what was typed.
 * @throws EngineeringError with a stable code: `empty`, `too-long`, `not-a-number`, `ambiguous`, `no-unit`,
 * `wrong-unit`, `too-large`, `too-fine`
 */
export function parseQuantity(text: string, kind: QuantityKind, options: ParseOptions = {}): Quantity {
  const typed = text.trim();
  if (typed === "") throw fault("empty", "Type a value.");
  if (typed.length > longest) throw fault("too-long", "This is too long to be one value.");
  const { number, unitText } = split(typed);
  const decimal = readNumber(number);
  const unit = readUnit(unitText, kind, options.defaultUnit);
  if (isUnitOf(unit, "length")) return lengthQuantity(typed, kind, decimal, unit, options.nominal);
  const value = Number(decimal.digits) / 10 ** decimal.decimals;
  const si = toCore(value, unit);
  if (!Number.isFinite(si) || Math.abs(si) > 1e15)
    throw fault("too-large", "This value is larger than anything in an engine.");
  if (kind === "temperature" && si < -273.15) throw fault("too-small", "Nothing is colder than −273.15 °C.");
  return { kind, si, typed, unit, decimals: decimal.decimals };
}

function fault(code: string, message: string): EngineeringError {
  return new EngineeringError(code, "value", message);
}

const numberForm = /^([+\-\u2212]?\s*(?:\d[\d.,\u2019' \u00A0\u202F]*|[.,]\d+)(?:\s*\/\s*\d+)?)(.*)$/su;

function split(typed: string): { number: string; unitText: string } {
  const match = numberForm.exec(typed);
  if (!match)
    throw fault(
      "not-a-number",
      `"${shortened(typed)}" is no number. Type a value such as 2.1000 in or 53.34 mm.`,
    );
  return { number: match[1]!.trim(), unitText: match[2]!.trim() };
}

function shortened(typed: string): string {
  return typed.length > 24 ? `${typed.slice(0, 24)}…` : typed;
}

function readNumber(text: string): Decimal {
  const signed = /^[+\-\u2212]/.test(text);
  const negative = /^[-\u2212]/.test(text);
  const body = text.replace(/^[+\-\u2212]\s*/, "");
  const fraction = /^(?:(\d+)[ \u00A0\u202F]+)?(\d+)\s*\/\s*(\d+)$/.exec(body);
  const decimal = fraction ? readFraction(fraction) : readDecimal(body);
  return { ...decimal, digits: negative ? -decimal.digits : decimal.digits, signed };
}

/** `1 7/8`: exact where the denominator is a power of two or five, as on any rule; anything else is refused. */
function readFraction([, whole = "0", numerator, denominator]: RegExpExecArray): Omit<Decimal, "signed"> {
  const bottom = BigInt(denominator!);
  for (let decimals = 0; decimals <= 10; decimals++) {
    const scaled = BigInt(numerator!) * 10n ** BigInt(decimals);
    if (bottom > 0n && scaled % bottom === 0n) {
      return { digits: BigInt(whole) * 10n ** BigInt(decimals) + scaled / bottom, decimals };
    }
  }
  throw fault("not-a-number", "Type a fraction in halves down to 1/1024, or a decimal number.");
}

function readDecimal(body: string): Omit<Decimal, "signed"> {
  const text = body.replace(/[ \u00A0\u202F\u2019']/g, "");
  if (
    /[ \u00A0\u202F\u2019']/.test(body) &&
    !/^\d{1,3}(?:[ \u00A0\u202F\u2019']\d{3})+(?:[.,]\d+)?$/.test(body)
  ) {
    throw fault("not-a-number", "There is a space inside this number; type it as one.");
  }
  refuseAmbiguous(text);
  const plain = /^\d{1,3}(?:,\d{3})+\.\d*$/.test(text)
    ? text.replaceAll(",", "")
    : /^\d{1,3}(?:\.\d{3})+,\d*$/.test(text)
      ? text.replaceAll(".", "").replace(",", ".")
      : text.replace(",", ".");
  const [, whole = "", , behind = ""] = /^(\d*)(\.(\d*))?$/.exec(plain) ?? [];
  if (whole === "" && behind === "") throw fault("not-a-number", `"${shortened(body)}" is no number.`);
  if (behind.length > mostDecimals) throw fault("too-fine", "This has more decimals than any gauge shows.");
  return { digits: BigInt(whole + behind), decimals: behind.length };
}

/** `1,234` is one and a bit to one person and twelve hundred to another: neither is guessed. */
function refuseAmbiguous(text: string): void {
  const one = /^([1-9]\d{0,2}),(\d{3})$/.exec(text);
  if (one) {
    throw fault(
      "ambiguous",
      `${text} can be read as ${one[1]}.${one[2]} or ${one[1]}${one[2]}. Type it with a point, or without the comma.`,
    );
  }
  const several = /^\d{1,3}([.,])\d{3}(?:\1\d{3})+$/.test(text);
  if (several) {
    const digits = text.replace(/[.,]/g, "");
    throw fault(
      "ambiguous",
      `${text} can be read as ${digits} or as a slip in the decimal mark. Type it without the marks between.`,
    );
  }
}

function readUnit(written: string, kind: QuantityKind, defaultUnit: UnitName | undefined): UnitName {
  const choices = unitsOf(kind).map(unitLabel).join(", ");
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

function lengthQuantity(
  typed: string,
  kind: QuantityKind,
  decimal: Decimal,
  unit: UnitName,
  nominal: number | undefined,
): Quantity {
  const scaled = decimal.digits * picometresIn(unit);
  const divisor = 10n ** BigInt(decimal.decimals);
  if (scaled % divisor !== 0n)
    throw fault("too-fine", "This is finer than a picometre, which no gauge shows.");
  const exact = scaled / divisor + (decimal.signed && nominal !== undefined ? BigInt(nominal) : 0n);
  const value = Number(exact);
  if (!Number.isSafeInteger(value))
    throw fault("too-large", "This length is larger than anything in an engine.");
  return { kind, si: metres(value), picometres: value, typed, unit, decimals: decimal.decimals };
}
