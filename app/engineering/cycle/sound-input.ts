import { EngineeringError } from "../engineering-error";

/** A physical range that an input must lie in, both ends included, in SI. */
interface Range {
  from: number;
  to: number;
  unit: string;
}

/**
 * Refuses a number that is none, or outside what any engine has.
 * @throws EngineeringError `not-a-number`, `not-positive` (where the range is above zero) or `outside-range`
 */
export function requireWithin(value: number, field: string, range: Range): void {
  if (!(value >= range.from && value <= range.to)) refuse(value, field, range);
}

function refuse(value: number, field: string, { from, to, unit }: Range): never {
  const name = field
    .split(".")
    .at(-1)!
    .replace(/[A-Z]/g, (capital) => ` ${capital.toLowerCase()}`);
  if (typeof value !== "number" || Number.isNaN(value)) {
    throw new EngineeringError("not-a-number", field, `The ${name} is not a number.`);
  }
  if (from > 0 && value <= 0) {
    throw new EngineeringError("not-positive", field, `The ${name} must be above zero.`);
  }
  throw new EngineeringError(
    "outside-range",
    field,
    `The ${name} must lie between ${from} and ${to} ${unit}; ${value.toPrecision(3)} is outside.`,
  );
}
