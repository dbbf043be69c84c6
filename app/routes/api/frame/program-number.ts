import { EngineeringError } from "~/engineering/engineering-error";
import type { Quantity } from "~/engineering/quantity/parse";
import { findUnit, picometresIn } from "~/engineering/quantity/units";

const numberAndUnit = /^\s*([+-]?\d+(?:\.\d+)?(?:e[+-]?\d{1,3})?)(?![\d.,])(.*)$/is;

/**
 * Reads a quantity that a program wrote: with an exponent (`6.35e-05 m`), or with the last digits of a binary fraction
 * (`2.1025999999999998 in`), which are rounded to what can be kept exactly: 8 decimals of an inch, a picometre in
 * metric units. What a person would type is read as it is.
 * @throws EngineeringError as `parse`
 */
export function readProgramNumber(text: string, parse: (text: string) => Quantity): Quantity {
  const [, number = "", unit = ""] = numberAndUnit.exec(text) ?? [];
  const plain = /e/i.test(number) ? `${decimalText(Number(number), mostDecimals)}${unit}` : text;
  try {
    return parse(plain);
  } catch (error) {
    const isTooFine = error instanceof EngineeringError && error.code === "too-fine";
    if (!isTooFine || number === "") throw error;
    return parse(`${decimalText(Number(number), exactDecimals(unit))}${unit}`);
  }
}

const mostDecimals = 18;

/** How many decimals of a unit of length are whole picometres, whatever the digits. */
function exactDecimals(written: string): number {
  const unit = findUnit(written, "length");
  if (!unit || unit === "wrong") return mostDecimals;
  const zeros = /0*$/.exec(picometresIn(unit).toString())![0];
  return zeros.length;
}

function decimalText(number: number, decimals: number): string {
  const text = number.toFixed(decimals);
  return text.includes(".") ? text.replace(/\.?0+$/, "") : text;
}
