import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { findBuild, insertBuild, listTargets } from "~/models/build.server";
import { findEngine } from "~/models/engine.server";
import { listFits } from "~/models/fit.server";
import { countStanding } from "~/models/reading.server";
import { listRuns } from "~/models/run.server";
import type { Scope } from "~/models/scope";
import { listSignatures, takeBuildFurther } from "~/models/sheet.server";
import { requirePermission } from "../frame/bearer.server";
import { endpoint } from "../frame/endpoint";
import { quantityOut, type Say } from "../frame/quantity-out";
import { name, remark, stored } from "./answers";
import { buildStates } from "./build-states";
import { oilOfShop } from "./oil-of-shop.server";
import { runAnswer, sayRun } from "./runs";

const progress = z.object({ due: z.int(), done: z.int() });

const buildAnswer = z
  .object({
    ...stored,
    engine: z.string(),
    number: z.int(),
    state: buildStates,
    oil: z.object({ id: z.string(), name: z.string() }).nullable(),
    note: z.string(),
    targets: z.array(
      z.object({
        fit: z.string(),
        kind: z.string(),
        least: quantityOut,
        aim: quantityOut,
        most: quantityOut,
      }),
    ),
    runs: z.array(runAnswer),
    readings: z.object({ assembly: progress, teardown: progress }),
    signatures: z.array(z.object({ stage: z.string(), person: z.string(), signedAt: z.string() })),
  })
  .meta({ id: "Build" });

async function sayBuild(scope: Scope, id: string, say: Say): Promise<z.input<typeof buildAnswer>> {
  const row = await findBuild(scope, id);
  const [fits, targets, runs, counts, signatures] = await Promise.all([
    listFits(scope, row.engine_id),
    listTargets(scope, id),
    listRuns(scope, id),
    countStanding(scope, id),
    listSignatures(scope, id),
  ]);
  const due = total(fits.map((fit) => fit.positions.length * fitKind(fit.kind).stations.length));
  const done = (stage: string) => total(fits.map((fit) => counts.get(`${fit.id} ${stage}`) ?? 0));
  return {
    id,
    version: row.version,
    engine: row.engine_id,
    number: row.number,
    state: row.state,
    oil: row.oil_id === null ? null : { id: row.oil_id, name: row.oilName ?? "" },
    note: row.note,
    targets: targets.map((target) => ({
      fit: target.fitId,
      kind: fits.find((fit) => fit.id === target.fitId)!.kind,
      least: say.clearance(metres(target.least_pm)),
      aim: say.clearance(metres(target.aim_pm)),
      most: say.clearance(metres(target.most_pm)),
    })),
    runs: runs.map((one) => sayRun(one, say)),
    readings: {
      assembly: { due, done: done("assembly") },
      teardown: { due, done: done("teardown") },
    },
    signatures: signatures.map(({ stage, personName, signedAt }) => ({
      stage,
      person: personName,
      signedAt,
    })),
  };
}

const total = (counts: number[]) => counts.reduce((sum, count) => sum + count, 0);

export const postBuild = endpoint({
  method: "POST",
  path: "/engines/{engine}/builds",
  who: "build:write",
  title: "Starts the next build of an engine",
  about: "Each fit aims at what was signed last. `oil` is the id or the name of an oil of the shop.",
  body: z.strictObject({ oil: name.optional(), note: remark }),
  status: 201,
  answer: buildAnswer,
  example: { oil: "Oil A", note: "New shells on all big ends." },
  handle: async ({ scope, params, body, say }) => {
    // First the engine: who may not know of it learns nothing of the oil either.
    await findEngine(scope, params.engine);
    const oilId = body.oil === undefined ? undefined : await oilOfShop(scope, body.oil);
    return sayBuild(scope, await insertBuild(scope, params.engine, { oilId, note: body.note }), say);
  },
});

export const getBuild = endpoint({
  method: "GET",
  path: "/builds/{build}",
  who: "engine:read",
  title: "A build with its targets, state, runs and how many readings are due and done",
  answer: buildAnswer,
  handle: ({ scope, params, say }) => sayBuild(scope, params.build, say),
});

// Who may take a build to each state: who signs what that step closes.
const permissionFor = {
  assembled: "sheet:sign",
  running: "run:write",
  "torn-down": "build:write",
  reviewed: "proposal:sign",
} as const;

export const postState = endpoint({
  method: "POST",
  path: "/builds/{build}/state",
  who: "engine:read",
  title: "Takes a build one step round its loop",
  about:
    "`assembled` signs and freezes the assembly sheet (owner, builder), `reviewed` the teardown sheet (owner, crew chief). `version` is the build's as you saw it.",
  body: z.strictObject({
    to: z.enum(["assembled", "running", "torn-down", "reviewed"]),
    version: z.int().min(1),
  }),
  answer: buildAnswer,
  example: { to: "assembled", version: 1 },
  handle: async ({ scope, params, body, say }) => {
    const row = await findBuild(scope, params.build);
    requirePermission(scope, permissionFor[body.to]);
    await takeBuildFurther(scope, row, body.to, body.version);
    return sayBuild(scope, params.build, say);
  },
});
