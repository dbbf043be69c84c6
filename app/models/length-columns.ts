import type { Quantity } from "~/engineering/quantity/parse";

type LengthColumns<Name extends string> = Record<`${Name}_pm`, number> & Record<`${Name}_typed`, string>;

/** A length for the database: exact picometres, and beside them what was typed with its unit. */
export function lengthColumns<Name extends string>(name: Name, quantity: Quantity): LengthColumns<Name> {
  return {
    [`${name}_pm`]: quantity.picometres,
    [`${name}_typed`]: withUnit(quantity),
  } as LengthColumns<Name>;
}

/** The same for a length that need not be there. */
export function optionalLengthColumns<Name extends string>(
  name: Name,
  quantity: Quantity | undefined,
): Record<`${Name}_pm`, number | null> & Record<`${Name}_typed`, string | null> {
  if (quantity) return lengthColumns(name, quantity);
  return { [`${name}_pm`]: null, [`${name}_typed`]: null } as Record<`${Name}_pm`, null> &
    Record<`${Name}_typed`, null>;
}

// A bare number took its unit from the page; years later only the unit beside it says which.
function withUnit(quantity: Quantity): string {
  return /[\p{L}"”]/u.test(quantity.typed) ? quantity.typed : `${quantity.typed} ${quantity.unit}`;
}
