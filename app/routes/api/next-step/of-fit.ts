import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import { findFit } from "~/models/fit.server";
import { fitHistory } from "~/models/fit-history.server";
import {
  latestTornDown,
  proposalFor,
  recomputeProposal,
  rulesFor,
  type StoredProposal,
} from "~/models/proposal.server";
import type { SignOff } from "~/models/sign-off.server";
import { signProposal } from "~/models/sign-proposal.server";
import { endpoint } from "../frame/endpoint";
import { quantity } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";
import { nextStepAnswer, sayNextStep } from "./answer";
import { sayHistory } from "./history-out";
import { historyOut } from "./history-shape";

export const getHistory = endpoint({
  method: "GET",
  path: "/engines/{engine}/fits/{fit}/history",
  who: "engine:read",
  title: "A fit's builds that were torn down, oldest first, as /calc/next-step takes them",
  answer: historyOut,
  handle: async ({ scope, params, say }) => {
    const fit = await findFit(scope, params.engine, params.fit);
    return sayHistory(await fitHistory(scope, fit), await rulesFor(scope, fit), say);
  },
});

const signed = z.object({
  decision: z.enum(["accept", "change", "decline"]),
  target: quantityOut,
  reason: z.string(),
  person: z.string(),
  signedAt: z.string(),
});

function saySigned({ decision, targetPm, reason, personName, signedAt }: SignOff, say: Say) {
  return { decision, target: say.clearance(metres(targetPm)), reason, person: personName, signedAt };
}

const proposalAnswer = z
  .object({
    id: z.string(),
    version: z.int().meta({ description: "How often it was worked out; a signature names the one it saw." }),
    build: z.object({ id: z.string(), number: z.int() }),
    proposedAt: z.string(),
    stale: z
      .boolean()
      .meta({ description: "The evidence has changed since; work it out again before it is signed." }),
    ...nextStepAnswer,
    signed: signed.nullable(),
  })
  .meta({ id: "Proposal" });

function sayProposal(proposal: StoredProposal, say: Say): z.input<typeof proposalAnswer> {
  const { id, version, buildId, buildNumber, proposedAt, stale, answer, signOff } = proposal;
  return {
    id,
    version,
    build: { id: buildId, number: buildNumber },
    proposedAt,
    stale,
    ...sayNextStep(answer, say),
    signed: signOff ? saySigned(signOff, say) : null,
  };
}

export const getNextStep = endpoint({
  method: "GET",
  path: "/engines/{engine}/fits/{fit}/next-step",
  who: "engine:read",
  title: "The stored proposal for a fit with its evidence, and whether it is stale",
  answer: proposalAnswer,
  handle: async ({ scope, params, say }) => {
    const fit = await findFit(scope, params.engine, params.fit);
    return sayProposal(await proposalFor(scope, fit, await latestTornDown(scope, params.engine)), say);
  },
});

export const postNextStepOfFit = endpoint({
  method: "POST",
  path: "/engines/{engine}/fits/{fit}/next-step",
  who: "proposal:ask",
  title: "Works the proposal for a fit out again, where its evidence has changed",
  answer: proposalAnswer,
  handle: async ({ scope, params, say }) => {
    const fit = await findFit(scope, params.engine, params.fit);
    return sayProposal(await recomputeProposal(scope, fit, await latestTornDown(scope, params.engine)), say);
  },
});

export const postSignature = endpoint({
  method: "POST",
  path: "/engines/{engine}/fits/{fit}/next-step/sign",
  who: "proposal:sign",
  title: "Signs the proposal for a fit: the next build aims at what was signed",
  about:
    "A change needs its target and a reason, a refusal a reason; the fit then holds its target. A signature is written once. The version is that of the proposal you saw.",
  body: z.strictObject({
    decision: z.enum(["accept", "change", "decline"]),
    target: quantity("small-length", { over: 0, most: 0.01 }).optional(),
    reason: z.string().trim().max(2000).optional(),
    version: z.int().min(1),
  }),
  answer: signed,
  example: {
    decision: "change",
    target: "0.0024 in",
    reason: "Half the step: a new pump went in.",
    version: 1,
  },
  handle: async ({ scope, params, body, say }) => {
    const fit = await findFit(scope, params.engine, params.fit);
    return saySigned(await signProposal(scope, fit, await latestTornDown(scope, params.engine), body), say);
  },
});
