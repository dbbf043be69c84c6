import type { Fraction, MathJsInstance, MathNode, OperatorNode, Unit } from "mathjs";
import { EngineeringError } from "~/engineering/engineering-error";
import { formatLength } from "~/engineering/quantity/format";
import { metres } from "~/engineering/quantity/length";
import { largest, type ParseOptions, parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import {
  isUnitOf,
  picometresIn,
  type QuantityKind,
  toCore,
  type UnitName,
} from "~/engineering/quantity/units";
import { notASum, type Term, termsOf } from "./expression-terms";

const longest = 200;

/**
 * Reads what a person types into a calculator's field: a quantity, or a sum of them such as `2.1018 in - 53.322 mm` or
 * `0.0025 in / 2`. Sums are reckoned in exact fractions; a length is then the nearest whole picometre. It carries the
 * unit of its first term. Bare numbers are summed in the default unit, but not together with quantities.
 * @throws EngineeringError those of `parseQuantity`; `not-a-sum` for functions, names, powers or assignments, for
 * quantities that do not add up to one of this kind, and for sums of temperatures
 */
export async function evaluateQuantity(
  text: string,
  kind: QuantityKind,
  options: ParseOptions = {},
): Promise<Quantity> {
  const typed = text.trim();
  if (typed.length > longest)
    throw new EngineeringError("too-long", "value", "This is too long to be one sum.");
  try {
    return parseQuantity(typed, kind, options);
  } catch (error) {
    if (!(error instanceof EngineeringError) || !looksLikeSum(typed)) throw error;
  }
  if (kind === "temperature")
    throw new EngineeringError("not-a-sum", "value", "Temperatures do not add up; type one value.");
  return sum(typed, kind, options.defaultUnit);
}

/** Something between or around values that a single one does not have; a sign in front is its own. */
function looksLikeSum(typed: string): boolean {
  return /\S\s*[+\-−*×/÷^=]|[()[\]{};=]/u.test(typed);
}

async function sum(typed: string, kind: QuantityKind, defaultUnit: UnitName | undefined): Promise<Quantity> {
  const terms = termsOf(typed, kind);
  if (terms.every((term) => term.type === "sign")) throw notASum();
  const first = terms.find((term) => term.type === "quantity");
  const unit = first?.quantity.unit ?? defaultUnit;
  if (!unit) throw new EngineeringError("no-unit", "value", "Say the units in this sum.");
  const math = await mathjs();
  const result = reckon(math, terms);
  const total = first ? ofBaseUnit(math, result) : ofNumbers(math, result, unit);
  const decimals = Math.max(...terms.map(decimalsOf));
  if (!isUnitOf(unit, "length")) return { kind, si: notTooLarge(total.valueOf()), typed, unit, decimals };
  const picometres = nearestWhole(total);
  return {
    kind,
    si: metres(picometres),
    picometres,
    typed,
    unit,
    decimals: shown(picometres, unit, decimals),
  };
}

function decimalsOf(term: Term): number {
  if (term.type === "sign") return 0;
  return term.type === "number" ? term.number.decimals : term.quantity.decimals;
}

/**
 * mathjs sees only names and signs. Every quantity is a multiple of one base unit, in pm or the core's unit, so that
 * mathjs keeps count of its powers and refuses to add a plain number or an area to it.
 */
function reckon(math: MathJsInstance, terms: readonly Term[]): unknown {
  const values: Record<string, unknown> = {};
  const written = terms.map((term, index) => {
    if (term.type === "sign") return term.sign;
    const name = `v${index}`;
    values[name] =
      term.type === "number"
        ? math.fraction(`${term.number.digits}/${10n ** BigInt(term.number.decimals)}`)
        : math.unit(math.fraction(term.quantity.picometres ?? term.quantity.si), "m");
    return name;
  });
  try {
    const node = math.parse(written.join(" "));
    node.traverse(refuseAllButSums);
    return node.compile().evaluate(values);
  } catch {
    // A bracket that does not close, a division by nothing, a length and a number added: mathjs's words are not ours.
    throw notASum();
  }
}

/** Two values side by side are a slip, not a product: `2 1 mm` is no 2 mm. */
function refuseAllButSums(node: MathNode): void {
  if (node.type === "SymbolNode" || node.type === "ParenthesisNode") return;
  if (node.type !== "OperatorNode" || (node as OperatorNode).implicit) throw notASum();
}

function ofBaseUnit(math: MathJsInstance, result: unknown): Fraction {
  if (!math.isUnit(result) || !(result as Unit).equalBase(math.unit("m"))) throw notASum();
  return (result as Unit).toNumeric("m") as unknown as Fraction;
}

function ofNumbers(math: MathJsInstance, result: unknown, unit: UnitName): Fraction {
  if (!math.isFraction(result)) throw notASum();
  const one = isUnitOf(unit, "length") ? Number(picometresIn(unit)) : toCore(1, unit);
  return math.multiply(result, math.fraction(one)) as Fraction;
}

function nearestWhole(total: Fraction): number {
  const whole = Number(total.round().valueOf());
  return Number.isSafeInteger(whole) ? whole : notTooLarge(Number.POSITIVE_INFINITY);
}

function notTooLarge(value: number): number {
  if (Math.abs(value) <= largest) return value;
  throw new EngineeringError("too-large", "value", "This is larger than anything in an engine.");
}

/** As many decimals as were typed, and up to four more where the result needs them. */
function shown(picometres: number, unit: UnitName, typed: number): number {
  const text = formatLength(picometres, unit, typed + 4);
  const spare = /0*$/.exec(text)?.[0].length ?? 0;
  return typed + 4 - Math.min(4, spare);
}

let loaded: Promise<MathJsInstance> | undefined;

/** Loaded when the first sum is typed: its single file takes a tenth of a second, its 1500 modules more than one. */
function mathjs(): Promise<MathJsInstance> {
  loaded ??= import("mathjs/lib/browser/math.js").then(({ default: { all, create } }) =>
    create(all!, { number: "Fraction" }),
  );
  return loaded;
}
