import { z } from "zod";
import { EngineeringError } from "~/engineering/engineering-error";
import { parseAnyQuantity } from "~/engineering/quantity/convert";
import { parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import { type QuantityKind, toCore } from "~/engineering/quantity/units";
import { readProgramNumber } from "./program-number";
import { described, exampleOf, type Limits, rangeText } from "./quantity-words";

/** A quantity that is kept as it was typed: text with its unit. */
export const quantity = (kind: QuantityKind, limits: Limits = {}) =>
  z
    .unknown()
    .transform((given, context): Quantity => {
      if (typeof given !== "string") return refuse(context, notText(given, kind));
      return orRefuse(context, () => within(read(given, kind), limits));
    })
    .meta({ type: "string", ...described(kind, limits) });

/** A quantity to reckon with, in the core's units: text with its unit, or as an answer of the API gave it. */
export const amount = (kind: QuantityKind, limits: Limits = {}) =>
  z
    .unknown()
    .transform((given, context): number => {
      if (typeof given === "string") return orRefuse(context, () => within(read(given, kind), limits).si);
      const answered = answeredQuantity.safeParse(given);
      if (!answered.success) return refuse(context, notText(given, kind));
      return orRefuse(context, () => within({ kind, si: coreOf(answered.data.si, kind) }, limits).si);
    })
    .meta({ type: ["string", "object"], ...described(kind, limits) });

/** A quantity of whatever kind its unit says. */
export const anyQuantity = z
  .unknown()
  .transform((given, context): Quantity => {
    if (typeof given !== "string") return refuse(context, notText(given, "length"));
    return orRefuse(context, () => readProgramNumber(given, parseAnyQuantity));
  })
  .meta({ type: "string", description: "With any unit.", examples: ["2.1000 in"] });

const answeredQuantity = z.strictObject({ si: z.number(), text: z.string() });

const coreOf = (si: number, kind: QuantityKind) => (kind === "kinematic-viscosity" ? toCore(si, "m2/s") : si);

const read = (text: string, kind: QuantityKind) =>
  readProgramNumber(text, (written) => parseQuantity(written, kind));

interface Fault {
  code: string;
  message: string;
}

function notText(given: unknown, kind: QuantityKind): Fault {
  if (given === undefined) return { code: "missing", message: "This is missing." };
  const like = `"${exampleOf(kind)}"`;
  if (typeof given === "number") {
    return {
      code: "no-unit",
      message: `A bare number says no unit; send text with its unit, such as ${like}.`,
    };
  }
  return { code: "wrong-type", message: `This must be text with its unit, such as ${like}.` };
}

function refuse(context: z.RefinementCtx, { code, message }: Fault): never {
  context.addIssue({ code: "custom", message, params: { code } });
  return z.NEVER;
}

function orRefuse<T>(context: z.RefinementCtx, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    return refuse(context, error);
  }
}

function within<Q extends { si: number; kind: QuantityKind }>(quantity: Q, limits: Limits): Q {
  const { si, kind } = quantity;
  const { over, least, most } = limits;
  const isIn = si > (over ?? -Infinity) && si >= (least ?? -Infinity) && si <= (most ?? Infinity);
  if (isIn) return quantity;
  throw new EngineeringError(
    "out-of-range",
    "value",
    `This must be ${rangeText(kind, limits)}; look at the value and its unit.`,
  );
}
