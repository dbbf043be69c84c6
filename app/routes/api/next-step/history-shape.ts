import { z } from "zod";
import type { QuantityKind } from "~/engineering/quantity/units";
import { coatingStates, damageTerms, runEvents } from "~/engineering/trade/condition";
import { fitKindNames } from "~/engineering/trade/fit-kinds";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import type { Limits } from "../frame/quantity-words";

/**
 * What the next step is worked out from. One shape for both ways, so that the history that the API gives is what the
 * calculator takes; only the quantities are text on the way in.
 */
function historyShape<Quantity extends z.ZodType>(
  quantity: (kind: QuantityKind, limits?: Limits) => Quantity,
) {
  const clearance = quantity("small-length", { least: -0.01, most: 0.01 });
  const target = quantity("small-length", { over: 0, most: 0.01 });
  const viscosity = quantity("kinematic-viscosity", { over: 0 });
  const diameter = quantity("length", { over: 0, most: 2 });
  const finish = quantity("finish", { over: 0, most: 0.001 });
  const measured = z
    .strictObject({ clearance, bore: diameter.optional(), journal: diameter.optional() })
    .nullish();
  const position = z.strictObject({
    position: z.int().min(1).max(1000),
    assembled: measured,
    tornDown: measured,
    uncertainty: quantity("small-length", { least: 0, most: 0.01 })
      .nullish()
      .meta({ description: "Expanded, about 95 %, of one clearance." }),
    temperatureKnown: z.boolean().optional(),
    grade: z.int().min(0).max(4).nullish(),
    damage: z.enum(damageTerms).nullish(),
    coatingState: z.enum(coatingStates).nullish(),
  });
  const oil = z.strictObject({
    name: z.string().max(120),
    grade: z.string().max(40).nullish(),
    kv40: viscosity.nullish(),
    kv100: viscosity.nullish(),
    temperature: quantity("temperature", { least: -40, most: 200 }).nullish(),
    dynamicViscosity: quantity("dynamic-viscosity", { over: 0 })
      .nullish()
      .meta({ description: "At that temperature." }),
  });
  const iteration = z.strictObject({
    build: z.int().min(0).max(1e6),
    date: z.iso.date().optional(),
    target,
    hours: z.number().min(0).max(10_000).nullish(),
    starts: z.int().min(0).optional(),
    oil: oil.nullish(),
    events: z.array(z.enum(runEvents)).max(50).default([]),
    coating: z.string().max(120).nullish(),
    positions: z.array(position).max(200),
  });
  const fit = z.strictObject({
    kind: z.enum(fitKindNames),
    nominal: diameter,
    positions: z.int().min(1).max(200).optional(),
    hardLimits: z.strictObject({ least: clearance, most: clearance }).optional(),
    coating: z.strictObject({ kind: z.string().max(120), isNew: z.boolean() }).nullish(),
    finishes: z
      .strictObject({ bore: finish.optional(), journal: finish.optional() })
      .optional()
      .meta({ description: "Ra." }),
  });
  const rules = z.strictObject({
    usual: target.optional(),
    largestStep: quantity("small-length", { over: 0, most: 0.001 }).optional(),
    leastHours: z.number().min(0).max(10_000).optional(),
    stopGrade: z.int().min(1).max(4).optional(),
    wearRateRise: z.number().min(0.1).max(1000).optional(),
    lambdaFloor: z.number().min(0).max(1000).optional(),
    baselineRuns: z.int().min(0).max(100).optional(),
    moveOilAndClearance: z.boolean().optional(),
  });
  return { fit, rules, iterations: z.array(iteration).max(500) };
}

const asked = historyShape(amount);

/** What `/calc/next-step` takes; rules not given take the usual ones. */
export const historyIn = z.strictObject({ ...asked, rules: asked.rules.default({}) });

/** What a fit's history answers. */
export const historyOut = z.object(historyShape(() => quantityOut));

export type HistoryIn = z.output<typeof historyIn>;
export type HistoryOut = z.input<typeof historyOut>;
