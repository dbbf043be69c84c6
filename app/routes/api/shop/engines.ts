import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import { fitKindNames } from "~/engineering/trade/fit-kinds";
import { listBuilds } from "~/models/build.server";
import { findEngine, insertEngine, listEngines } from "~/models/engine.server";
import { listFits } from "~/models/fit.server";
import type { Scope } from "~/models/scope";
import { endpoint } from "../frame/endpoint";
import { firstOf, paged, pageQuery } from "../frame/page";
import { amount, quantity } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";
import { inRpm, rpmOf } from "../frame/speed";
import { name, stored } from "./answers";
import { buildStates } from "./build-states";
import { fitAnswer, sayFit } from "./fit-answer";

const forms = z.enum(["inline", "V", "flat"]);
const environments = z.enum(["clean", "dusty"]);

const layout = z.strictObject({
  form: forms,
  cylinders: z.int().min(1).max(16),
  mains: z.int().min(1).max(17),
  valvesPerCylinder: z.int().min(2).max(6),
});

const buildInList = z.object({ id: z.string(), number: z.int(), state: buildStates });

const engineAnswer = z
  .object({
    ...stored,
    name: z.string(),
    layout: z.object(layout.shape),
    bore: quantityOut,
    stroke: quantityOut,
    rodLength: quantityOut,
    revLimit: quantityOut,
    environment: environments,
    fits: z.array(fitAnswer),
    builds: z.array(buildInList),
  })
  .meta({ id: "Engine" });

async function sayEngine(scope: Scope, id: string, say: Say): Promise<z.input<typeof engineAnswer>> {
  const row = await findEngine(scope, id);
  const [fits, builds] = await Promise.all([listFits(scope, id), listBuilds(scope, id)]);
  return {
    id,
    version: row.version,
    name: row.name,
    layout: {
      form: row.form,
      cylinders: row.cylinders,
      mains: row.mains,
      valvesPerCylinder: row.valves_per_cylinder,
    },
    bore: say.length(metres(row.bore_pm)),
    stroke: say.length(metres(row.stroke_pm)),
    rodLength: say.length(metres(row.rod_length_pm)),
    revLimit: say.speed(rpmOf(row.rev_limit_rpm)),
    environment: row.environment,
    fits: fits.map((one) => sayFit(one, say)),
    builds: builds.map(({ id: buildId, number, state }) => ({ id: buildId, number, state })),
  };
}

export const getEngines = endpoint({
  method: "GET",
  path: "/engines",
  who: "engine:read",
  title: "The engines you may see, each with its latest build",
  query: pageQuery,
  answer: paged(
    z.object({
      ...stored,
      name: z.string(),
      form: forms,
      cylinders: z.int(),
      environment: environments,
      build: buildInList.nullable(),
    }),
  ),
  handle: async ({ scope, query: { cursor, limit } }) => {
    const rows = await listEngines(scope, { after: cursor, most: limit + 1 });
    return firstOf(rows, limit, ({ buildId, buildNumber, buildState, ...row }) => ({
      ...row,
      build: buildId === null ? null : { id: buildId, number: buildNumber!, state: buildState! },
    }));
  },
});

export const getEngine = endpoint({
  method: "GET",
  path: "/engines/{engine}",
  who: "engine:read",
  title: "One engine with its fits and builds",
  answer: engineAnswer,
  handle: ({ scope, params, say }) => sayEngine(scope, params.engine, say),
});

const size = quantity("length", { over: 0, most: 2 });
const clearance = quantity("small-length", { least: 0, most: 0.01 });

export const postEngine = endpoint({
  method: "POST",
  path: "/engines",
  who: "engine:write",
  title: "Sets an engine up with its fits and their positions",
  about:
    "Fits that are not given take the layout's usual set, whose limits are only a place to start: put the parts maker's in.",
  body: z.strictObject({
    name,
    layout,
    bore: size,
    stroke: size,
    rodLength: size,
    revLimit: amount("speed", { over: 0, most: rpmOf(30_000) }),
    environment: environments,
    fits: z
      .array(
        z.strictObject({
          kind: z.enum(fitKindNames),
          nominal: size,
          length: size.optional(),
          usual: clearance,
          hardLimits: z.strictObject({ least: clearance, most: clearance }),
        }),
      )
      .min(1)
      .max(fitKindNames.length)
      .optional(),
  }),
  status: 201,
  answer: engineAnswer,
  example: {
    name: "Engine 7",
    layout: { form: "V", cylinders: 8, mains: 5, valvesPerCylinder: 2 },
    bore: "4.125 in",
    stroke: "3.25 in",
    rodLength: "6.000 in",
    revLimit: "9200 rpm",
    environment: "clean",
    fits: [
      {
        kind: "big-end",
        nominal: "2.1000 in",
        length: "0.85 in",
        usual: "0.0025 in",
        hardLimits: { least: "0.0010 in", most: "0.0032 in" },
      },
    ],
  },
  handle: async ({ scope, body, say }) => {
    const { layout: given, revLimit, fits, ...rest } = body;
    const id = await insertEngine(scope, {
      ...rest,
      ...given,
      revLimitRpm: inRpm(revLimit),
      duty: "",
      fits: fits?.map(({ hardLimits, ...one }) => ({ ...one, ...hardLimits })),
    });
    return sayEngine(scope, id, say);
  },
});
