import { z } from "zod";
import { absenceText } from "~/engineering/trade/box-text";
import { type Build, findBuild, listTargets, type Target } from "~/models/build.server";
import { type Fit, listFits } from "~/models/fit.server";
import { type Gauge, listGauges } from "~/models/gauge.server";
import { conflict, type FieldError, invalid, Refusal } from "~/models/refusal";
import type { Scope } from "~/models/scope";
import { recordEntry } from "~/models/sheet-entry.server";
import { fieldErrors, sentenceOf } from "../frame/check";
import { endpoint } from "../frame/endpoint";
import { amount, quantity } from "../frame/quantity-in";
import { line, name } from "./answers";
import { positionOfEngine } from "./position-of-engine.server";
import { box, stages, warning } from "./reading-box";

const partTemperature = amount("temperature", { least: -40, most: 200 });

const reading = z
  .strictObject({
    fit: name,
    position: z.int().min(1),
    ...box,
    value: quantity("length", { over: 0, most: 2 }).optional(),
    temperature: partTemperature.optional(),
    gauge: name.optional(),
    repeat: z.int().min(1).max(20).default(1),
    state: z.enum(["measured", "not-measured", "not-accessible"]).default("measured"),
    reason: line(200).default(""),
  })
  .refine(({ state, value }) => (state === "measured") === (value !== undefined), {
    path: ["value"],
    error: "A measured reading has a value, and one that is not measured has none.",
    params: { code: "value-and-state" },
  })
  .meta({ id: "NewReading" });

type NewReading = z.output<typeof reading>;

// One that is not so must not keep the others from being written down: it is refused by itself, with its index.
const orRefused = z.unknown().transform((given): FieldError[] => {
  const checked = reading.safeParse(given, { reportInput: true, error: sentenceOf });
  return checked.success ? [] : fieldErrors(checked.error);
});

const result = z.object({
  index: z.int(),
  status: z.enum(["accepted", "refused"]),
  id: z.string().optional(),
  warnings: z.array(warning).optional(),
  errors: z.array(z.object({ path: z.string(), code: z.string(), message: z.string() })).optional(),
});

type Result = z.infer<typeof result>;

export const postReadings = endpoint({
  method: "POST",
  path: "/builds/{build}/readings",
  who: "reading:write",
  title: "Writes readings down, each accepted or refused by itself",
  about:
    "Accepted means on disk. A value that looks like a slip is accepted with a warning; a second reading of the same place supersedes the first, which stays in the record. A place that was not measured says so in `state`.",
  body: z.strictObject({
    stage: stages,
    readings: z
      .array(z.union([reading, orRefused]))
      .min(1)
      .max(1000),
  }),
  answer: z.object({ results: z.array(result) }),
  example: {
    stage: "assembly",
    readings: [
      {
        fit: "the id of a fit",
        position: 1,
        feature: "bore",
        plane: "front",
        axis: "vertical",
        value: "2.1025 in",
        temperature: "20.5 degC",
      },
    ],
  },
  handle: async ({ scope, params, body }) => {
    const build = await findBuild(scope, params.build);
    refuseTooEarly(build, body.stage);
    const [fits, targets, gauges] = await Promise.all([
      listFits(scope, build.engine_id),
      listTargets(scope, build.id),
      listGauges(scope),
    ]);
    const sheet = { build, fits, targets, gauges, stage: body.stage };
    const results: Result[] = [];
    for (const [index, given] of body.readings.entries()) {
      const what = Array.isArray(given) ? refused(given) : await writeDown(scope, sheet, given);
      results.push({ index, ...what });
    }
    return { results };
  },
});

function refuseTooEarly({ state, number }: Build, stage: z.infer<typeof stages>): void {
  if (stage === "assembly" || state === "torn-down" || state === "reviewed") return;
  throw conflict(
    "not-torn-down",
    `Build ${number} is not torn down yet; what it came down with is measured after that.`,
  );
}

const refused = (errors: FieldError[]) => ({ status: "refused" as const, errors });

interface Sheet {
  build: Build;
  fits: Fit[];
  targets: Target[];
  gauges: Gauge[];
  stage: z.infer<typeof stages>;
}

async function writeDown(scope: Scope, sheet: Sheet, given: NewReading): Promise<Omit<Result, "index">> {
  try {
    const { fit, position } = positionOfEngine(sheet.fits, given);
    const { feature, plane, axis, repeat, state, value, temperature, gauge, reason } = given;
    const aim = sheet.targets.find((target) => target.fitId === fit.id)?.aim_pm ?? fit.usual_pm;
    const entry = {
      box: { stage: sheet.stage, fitId: fit.id, positionId: position.id, feature, plane, axis, repeat },
      typed: state === "measured" ? value!.typed : absenceText(state, reason),
      // Every value of the API names its unit; this one is never taken.
      defaultUnit: "in" as const,
      temperatureC: temperature,
      gaugeId: gauge === undefined ? undefined : gaugeOfShop(sheet.gauges, gauge),
    };
    const entered = await recordEntry(scope, sheet.build, fit, entry, aim);
    if (entered.status === "refused") {
      return refused([{ path: "value", code: entered.code, message: entered.message }]);
    }
    const warnings = entered.warnings.length > 0 ? { warnings: entered.warnings } : {};
    return { status: "accepted", id: entered.readingId!, ...warnings };
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return refused(
      error.errors.length > 0 ? error.errors : [{ path: "", code: error.code, message: error.message }],
    );
  }
}

function gaugeOfShop(gauges: readonly Gauge[], id: string): string {
  if (gauges.some((gauge) => gauge.id === id)) return id;
  throw invalid({ path: "gauge", code: "unknown-gauge", message: "The shop has no such gauge." });
}
