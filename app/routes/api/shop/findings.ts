import { z } from "zod";
import { coatingStates, damageTerms } from "~/engineering/trade/condition";
import { findBuild } from "~/models/build.server";
import { insertFinding } from "~/models/finding.server";
import { listFits } from "~/models/fit.server";
import { endpoint } from "../frame/endpoint";
import { line, name, remark } from "./answers";
import { positionOfEngine } from "./position-of-engine.server";

const found = {
  fit: name,
  position: z.int().min(1),
  grade: z
    .int()
    .min(0)
    .max(4)
    .meta({ description: "0 as new, 1 normal polish, 2 marked, 3 distressed, 4 failed." }),
  damage: z.enum(damageTerms).nullish().meta({ description: "A damage term of ISO 7146-1." }),
  cause: line(500).default(""),
  coatingState: z.enum(coatingStates).nullish(),
  note: remark,
};

export const postFinding = endpoint({
  method: "POST",
  path: "/builds/{build}/findings",
  who: "finding:write",
  title: "Writes down what was found on a part at teardown",
  about: "A second finding on the same position corrects the first, which stays in the record.",
  body: z.strictObject(found),
  status: 201,
  answer: z
    .object({
      id: z.string(),
      fit: z.string(),
      position: z.int(),
      grade: z.int(),
      damage: z.string().nullable(),
      cause: z.string(),
      coatingState: z.string().nullable(),
      note: z.string(),
    })
    .meta({ id: "Finding" }),
  example: {
    fit: "the id of a fit",
    position: 3,
    grade: 2,
    damage: "wear-by-friction",
    coatingState: "polished",
    note: "Bright band in the loaded half, no loose metal.",
  },
  handle: async ({ scope, params, body }) => {
    const build = await findBuild(scope, params.build);
    const { fit, position } = positionOfEngine(await listFits(scope, build.engine_id), body);
    const { damage, coatingState, grade, cause, note } = body;
    const id = await insertFinding(scope, build, {
      fitId: fit.id,
      positionId: position.id,
      grade,
      damage: damage ?? undefined,
      place: "",
      cause,
      coatingState: coatingState ?? undefined,
      note,
    });
    return {
      id,
      fit: fit.id,
      position: position.number,
      grade,
      damage: damage ?? null,
      cause,
      coatingState: coatingState ?? null,
      note,
    };
  },
});
