import { z } from "zod";
import { EngineeringError } from "~/engineering/engineering-error";
import { parseAnyQuantity } from "~/engineering/quantity/convert";
import { formatWithUnit } from "~/engineering/quantity/format";
import { parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import { type QuantityKind, toCore, type UnitName, unitsOf } from "~/engineering/quantity/units";
import { readProgramNumber } from "./program-number";

/** Where a quantity may lie, in the core's units (SI; °C; mm²/s). */
interface Limits {
  /** It must be greater than this. */
  over?: number;
  least?: number;
  most?: number;
}

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
      const si = typeof given === "string" ? undefined : answeredQuantity.safeParse(given).data?.si;
      if (typeof given !== "string" && si === undefined) return refuse(context, notText(given, kind));
      return orRefuse(context, () => {
        const core = si === undefined ? read(given as string, kind).si : coreOf(si, kind);
        return within({ kind, si: core }, limits).si;
      });
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

const lengthAmount = amount("small-length");

/**
 * A figure of a study that is about no unit in particular: a length with its unit, or a plain number.
 * Gives the number, and whether it is a length in m.
 */
export const figure = z
  .unknown()
  .transform((given, context): { value: number; isLength: boolean } => {
    if (typeof given === "number" && Number.isFinite(given)) return { value: given, isLength: false };
    const length = lengthAmount.safeParse(given);
    if (length.success) return { value: length.data, isLength: true };
    return refuse(context, { code: "wrong-type", message: length.error.issues[0]!.message });
  })
  .meta({
    type: ["string", "object", "number"],
    description: "A length with its unit, or in all places a plain number.",
    examples: ["2.10012 in", 0.29],
  });

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
  const like = `"${examples[kind]}"`;
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

function rangeText(kind: QuantityKind, { over, least, most }: Limits): string {
  const text = (limit: number) => {
    const [, number, label] = /^(\S+) (.*)$/.exec(formatWithUnit(limit, commonUnits[kind], 6)) ?? [];
    return `${Number(number)} ${label}`;
  };
  const bounds = [
    over === undefined ? "" : `over ${text(over)}`,
    least === undefined ? "" : `at least ${text(least)}`,
    most === undefined ? "" : `at most ${text(most)}`,
  ];
  return bounds.filter(Boolean).join(" and ");
}

function described(kind: QuantityKind, limits: Limits) {
  const range = rangeText(kind, limits);
  return {
    description: `With its unit: ${unitsOf(kind).join(", ")}${range && `; ${range}`}.`,
    examples: [examples[kind]],
  };
}

const commonUnits: Record<QuantityKind, UnitName> = {
  "small-length": "mm",
  length: "mm",
  finish: "um",
  temperature: "degC",
  pressure: "bar",
  "dynamic-viscosity": "mPa s",
  "kinematic-viscosity": "cSt",
  speed: "rpm",
  force: "N",
  mass: "kg",
  time: "h",
  torque: "N m",
  density: "kg/m3",
};

const examples: Record<QuantityKind, string> = {
  "small-length": "25 tenths",
  length: "2.1000 in",
  finish: "8 uin",
  temperature: "95 degC",
  pressure: "60 psi",
  "dynamic-viscosity": "12 mPa s",
  "kinematic-viscosity": "16.2 cSt",
  speed: "7200 rpm",
  force: "12 kN",
  mass: "520 g",
  time: "6.5 h",
  torque: "60 lbf ft",
  density: "870 kg/m3",
};
