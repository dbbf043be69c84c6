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
 * @throws EngineeringError `not-a-number` for what is no whole number of picometres; `outside-range` for decimals
 * that are not a whole number from 0 to 100; `wrong-unit` for a unit of something else
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
  refuseUnsound(decimals);
  const digits = halfToEven(BigInt(Math.abs(picometres)) * tenToThe(decimals), picometresIn(unit));
  return compose(digits, decimals, picometres < 0, options);
}

/**
 * A quantity of the core (SI; mm²/s; °C) in a unit with so many decimals; lengths through their nearest picometre.
 * Other kinds are rounded half to even on 15 significant figures in decimal, which is what was typed and not the
 * binary fraction next to it: 1.35 with one decimal is 1.4.
 * @throws EngineeringError `not-a-number` for NaN or infinity, which are never shown; `outside-range` for decimals
 */
export function format(value: number, unit: UnitName, decimals: number, options: FormatOptions = {}): string {
  if (!Number.isFinite(value)) {
    throw new EngineeringError("not-a-number", "value", "This value is no number.");
  }
  if (isUnitOf(unit, "length")) return formatLength(picometres(value), unit, decimals, options);
  refuseUnsound(decimals);
  const there = fromCore(value, unit);
  const [mantissa = "", exponent = "0"] = Math.abs(there)
    .toExponential(significantFigures - 1)
    .split("e");
  const figures = BigInt(mantissa.replace(".", ""));
  const shift = Number(exponent) - (significantFigures - 1);
  const digits =
    shift >= 0
      ? figures * tenToThe(shift) * tenToThe(decimals)
      : halfToEven(figures * tenToThe(decimals), tenToThe(-shift));
  return compose(digits, decimals, there < 0, options);
}

/** The same with the unit behind it: "0.0025 in", "105.0 °C". */
export function formatWithUnit(
  value: number,
  unit: UnitName,
  decimals: number,
  options: FormatOptions = {},
): string {
  return `${format(value, unit, decimals, options)} ${unitLabel(unit)}`;
}

const significantFigures = 15;

const tenToThe = (power: number): bigint => 10n ** BigInt(power);

function refuseUnsound(decimals: number): void {
  if (Number.isInteger(decimals) && decimals >= 0 && decimals <= 100) return;
  throw new EngineeringError("outside-range", "decimals", "Decimals are a whole number from 0 to 100.");
}

function halfToEven(numerator: bigint, divisor: bigint): bigint {
  const whole = numerator / divisor;
  const twice = (numerator % divisor) * 2n;
  if (twice < divisor || (twice === divisor && whole % 2n === 0n)) return whole;
  return whole + 1n;
}

/** Puts the point and the sign to whole digits; a zero has no sign. */
function compose(
  digits: bigint,
  decimals: number,
  negative: boolean,
  { dropLeadingZero }: FormatOptions,
): string {
  const text = digits.toString().padStart(decimals + 1, "0");
  const whole = text.slice(0, text.length - decimals);
  const behind = decimals > 0 ? `.${text.slice(-decimals)}` : "";
  const sign = negative && digits !== 0n ? "-" : "";
  return `${sign}${dropLeadingZero && whole === "0" && behind ? "" : whole}${behind}`;
}
