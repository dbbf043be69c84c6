import { EngineeringError } from "~/engineering/engineering-error";
import { type Decimal, readNumber } from "~/engineering/quantity/number";
import { parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import type { QuantityKind } from "~/engineering/quantity/units";

/** What a sum is made of: quantities with their units, plain numbers, and the signs between them. */
export type Term =
  | { type: "quantity"; quantity: Quantity }
  | { type: "number"; number: Decimal }
  | { type: "sign"; sign: string };

const signs: Record<string, string> = {
  "+": "+",
  "-": "-",
  "−": "-",
  "*": "*",
  "×": "*",
  "/": "/",
  "÷": "/",
  "(": "(",
  ")": ")",
};

// A rule's fraction has no space round its stroke and a unit behind it; a word of a unit never starts with a digit, so
// that the stroke of `in/2` divides and that of `rad/s` belongs to the unit.
const number = /(?:\d+ )?\d+\/\d+(?=\s*[\p{L}"″”'])|[\d.,]+/uy;
const word = /[\p{L}°"″”'][\p{L}"″”']*(?:-\p{L}+)?(?:\^?[23²³])?/u.source;
const unit = new RegExp(`\\s*(${word}(?:[ ·⋅]${word})*(?:/${word})?)`, "uy");

/**
 * Cuts a sum into its terms, each quantity read exactly as `parseQuantity` reads it.
 * @throws EngineeringError `not-a-sum` for anything but quantities, numbers, + − × ÷ and brackets; those of
 * `parseQuantity` for a term that cannot be read
 */
export function termsOf(text: string, kind: QuantityKind): Term[] {
  const terms: Term[] = [];
  let at = 0;
  const take = (pattern: RegExp): RegExpExecArray | null => {
    pattern.lastIndex = at;
    const match = pattern.exec(text);
    if (match) at = pattern.lastIndex;
    return match;
  };
  while (at < text.length) {
    const sign = signs[text[at]!];
    if (sign) terms.push({ type: "sign", sign });
    if (sign || /\s/.test(text[at]!)) {
      at += 1;
      continue;
    }
    const [figures] = take(number) ?? [];
    if (figures === undefined) throw notASum();
    const [, unitText] = take(unit) ?? [];
    terms.push(
      unitText === undefined
        ? { type: "number", number: readNumber(figures) }
        : { type: "quantity", quantity: parseQuantity(`${figures} ${unitText}`, kind) },
    );
  }
  return terms;
}

/** What is said where a field takes sums of quantities and got something else. */
export function notASum(): EngineeringError {
  return new EngineeringError(
    "not-a-sum",
    "value",
    "This is no sum of quantities. Type numbers with units, + − × ÷ and brackets, such as 2.1018 in - 53.322 mm.",
  );
}
