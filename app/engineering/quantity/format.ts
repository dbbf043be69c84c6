import { EngineeringError } from "../engineering-error";
import { picometres } from "./length";
import { fromCore, isUnitOf, picometresIn, type UnitName, unitLabel } from "./units";

export interface FormatOptions {
  /** Writes .0024 for 0.0024, as the trade writes inches. */
  dropLeadingZero?: boolean;
}

/**
 * A length in a unit with so many decimals, from exact picometres: rounded half to even (ISO 80000-1, rule A),
 * in whole-number arithmetic, so that no digit comes from a binary fraction.
 */
export function formatLength(
  picometres: number,
  unit: UnitName,
  decimals: number,
  options: FormatOptions = {},
): string {
  if (!Number.isSafeInteger(picometres)) {
    throw new EngineeringError("not-a-number", "value", "A stored length is a whole number of picometres.");
  }
  const divisor = picometresIn(unit);
  const scaled = BigInt(Math.abs(picometres)) * 10n ** BigInt(decimals);
  const rounded = halfToEven(scaled, divisor);
  return compose(rounded, decimals, picometres < 0 && rounded !== 0n, options);
}

function halfToEven(numerator: bigint, divisor: bigint): bigint {
  const whole = numerator / divisor;
  const twice = (numerator % divisor) * 2n;
  if (twice < divisor || (twice === divisor && whole % 2n === 0n)) return whole;
  return whole + 1n;
}

function compose(
  digits: bigint,
  decimals: number,
  negative: boolean,
  { dropLeadingZero }: FormatOptions,
): string {
  const text = digits.toString().padStart(decimals + 1, "0");
  const whole = text.slice(0, text.length - decimals);
  const behind = decimals > 0 ? `.${text.slice(-decimals)}` : "";
  return `${negative ? "-" : ""}${dropLeadingZero && whole === "0" && behind ? "" : whole}${behind}`;
}

/**
 * A quantity of the core (SI; mm²/s; °C) in a unit with so many decimals; lengths through their nearest picometre.
 * @throws EngineeringError `not-a-number` for NaN or infinity: they are never shown
 */
export function format(value: number, unit: UnitName, decimals: number, options: FormatOptions = {}): string {
  if (!Number.isFinite(value))
    throw new EngineeringError("not-a-number", "value", "This value is no number.");
  if (isUnitOf(unit, "length")) return formatLength(picometres(value), unit, decimals, options);
  const text = fromCore(value, unit).toFixed(decimals);
  return Number(text) === 0 ? text.replace("-", "") : text;
}

/** The same with the unit behind it: "0.0025 in", "105.0 °C". */
export function formatWithUnit(value: number, unit: UnitName, decimals: number): string {
  return `${format(value, unit, decimals)} ${unitLabel(unit)}`;
}
