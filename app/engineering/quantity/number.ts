import { EngineeringError } from "../engineering-error";

/** A decimal number as its digits and how many of them stand behind the point: exact, whatever its length. */
export interface Decimal {
  digits: bigint;
  decimals: number;
  /** Whether a sign was typed. */
  signed: boolean;
}

const mostDecimals = 18;

/**
 * Reads a number as people type it: point or comma, digits grouped by spaces, a rule's fraction (`1 7/8`), a sign.
 * @param text without spaces around it
 * @throws EngineeringError `not-a-number`; `ambiguous` with both readings named; `too-fine` over 18 decimals
 */
export function readNumber(text: string): Decimal {
  const signed = /^[+\-\u2212]/.test(text);
  const negative = signed && text[0] !== "+";
  const body = signed ? text.slice(1).trimStart() : text;
  const fraction = /^(?:(\d+)\s+)?(\d+)\s*\/\s*(\d+)$/.exec(body);
  const { digits, decimals } = fraction ? readFraction(fraction) : readDecimal(body);
  return { digits: negative ? -digits : digits, decimals, signed };
}

type Unsigned = Omit<Decimal, "signed">;

/** `1 7/8`: exact where the denominator is a power of two or five, as on any rule; anything else is refused. */
function readFraction([, whole = "0", numerator, denominator]: RegExpExecArray): Unsigned {
  const bottom = BigInt(denominator!);
  for (let decimals = 0; decimals <= 10; decimals++) {
    const scaled = BigInt(numerator!) * 10n ** BigInt(decimals);
    if (bottom > 0n && scaled % bottom === 0n) {
      return { digits: BigInt(whole) * 10n ** BigInt(decimals) + scaled / bottom, decimals };
    }
  }
  throw fault("not-a-number", "Type a fraction in halves down to 1/1024, or a decimal number.");
}

const plain = /^(?:\d+[.,]?\d*|[.,]\d+)$/;
const groupedBySpaces = /^\d{1,3}(?:[ \u00A0\u2009\u202F\u2019']\d{3})+(?:[.,]\d+)?$/;
const groupedByCommas = /^\d{1,3}(?:,\d{3})+\.\d*$/;
const groupedByPoints = /^\d{1,3}(?:\.\d{3})+,\d*$/;

function readDecimal(body: string): Unsigned {
  refuseAmbiguous(body);
  if (plain.test(body)) return decimalOf(body);
  if (groupedBySpaces.test(body)) return decimalOf(body.replace(/[^\d.,]/g, ""));
  if (groupedByCommas.test(body)) return decimalOf(body.replaceAll(",", ""));
  if (groupedByPoints.test(body)) return decimalOf(body.replaceAll(".", ""));
  if (/\d\s/.test(body)) throw fault("not-a-number", "There is a space inside this number; type it as one.");
  throw fault("not-a-number", `"${body}" is no number.`);
}

function decimalOf(text: string): Unsigned {
  const [whole = "", behind = ""] = text.replace(",", ".").split(".");
  if (behind.length > mostDecimals) throw fault("too-fine", "This has more decimals than any gauge shows.");
  return { digits: BigInt(whole + behind), decimals: behind.length };
}

/** `1,234` is one and a bit to one person and twelve hundred to another: neither is guessed. */
function refuseAmbiguous(body: string): void {
  const one = /^([1-9]\d{0,2}),(\d{3})$/.exec(body);
  const several = /^\d{1,3}([.,])\d{3}(?:\1\d{3})+$/.test(body);
  if (one) {
    throw fault(
      "ambiguous",
      `${body} can be read as ${one[1]}.${one[2]} or ${one[1]}${one[2]}. Type it with a point, or without the comma.`,
    );
  }
  if (several) {
    throw fault(
      "ambiguous",
      `${body} can be read as ${body.replace(/[.,]/g, "")} or as a slip in the decimal mark. Type it without the marks between.`,
    );
  }
}

function fault(code: string, message: string): EngineeringError {
  return new EngineeringError(code, "value", message);
}
