import { EngineeringError } from "../engineering-error";
import { parseQuantity, type Quantity } from "./parse";
import {
  findUnit,
  fromCore,
  picometresIn,
  type QuantityKind,
  type UnitName,
  unitLabel,
  unitsOf,
} from "./units";

/** A quantity in one unit. */
export interface Converted {
  unit: UnitName;
  number: number;
  text: string;
}

// One kind of each dimension: its units tell what a quantity is of.
const kinds: readonly QuantityKind[] = [
  "length",
  "temperature",
  "pressure",
  "dynamic-viscosity",
  "kinematic-viscosity",
  "speed",
  "force",
  "mass",
  "time",
  "torque",
  "density",
];

/**
 * Reads a quantity whose unit says what it is of: `2.1 in`, `95 degC`, `60 psi`. A bare `nm` is a nanometre.
 * @throws EngineeringError as `parseQuantity`
 */
export function parseAnyQuantity(text: string): Quantity {
  let first: unknown;
  for (const kind of kinds) {
    try {
      return parseQuantity(text, kind);
    } catch (error) {
      if (!(error instanceof EngineeringError) || error.code !== "wrong-unit") throw error;
      first ??= error;
    }
  }
  throw first;
}

/**
 * A quantity in other units of its dimension: in all of them where none are named. Lengths are divided as whole
 * picometres, so that each number is the nearest there is; texts carry the digits of the number and no more.
 * @throws EngineeringError `wrong-unit` for a unit of something else
 */
export function convert(quantity: Quantity, to: readonly string[] = unitsOf(quantity.kind)): Converted[] {
  return to.map((written, index) => {
    const unit = findUnit(written, quantity.kind);
    if (!unit || unit === "wrong") {
      const choices = unitsOf(quantity.kind).map(unitLabel).join(", ");
      throw new EngineeringError(
        "wrong-unit",
        `to[${index}]`,
        `"${written.slice(0, 24)}" is no unit of this quantity; say ${choices}.`,
      );
    }
    const number =
      quantity.picometres === undefined
        ? Number(fromCore(quantity.si, unit).toPrecision(15))
        : quantity.picometres / Number(picometresIn(unit));
    return { unit, number, text: `${plain(number)} ${unitLabel(unit)}` };
  });
}

/** A number without an exponent: 0.0000001, not 1e-7. */
function plain(number: number): string {
  const text = String(number);
  if (!text.includes("e")) return text;
  const [digits = "", exponent = "0"] = text.split("e");
  const decimals = Math.max(0, (digits.split(".")[1]?.length ?? 0) - Number(exponent));
  return number.toFixed(Math.min(100, decimals));
}
