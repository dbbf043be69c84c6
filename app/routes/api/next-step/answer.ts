import { z } from "zod";
import type { Evidence, NextStep, Posterior } from "~/engineering/next-step/types";
import { quantityOut, type Say } from "../frame/quantity-out";

const statement = z.object({
  code: z.string(),
  text: z.string(),
  values: z.record(z.string(), z.union([z.number(), z.string()])).meta({ description: "SI." }),
});

const optional = quantityOut.nullable();

const evidence = z.object({
  builds: z.array(
    z.object({
      build: z.int(),
      clearance: optional,
      worstGrade: z.int().nullable(),
      wearRate: optional,
      wearRateUncertainty: optional,
      weight: z.number().meta({ description: "0 to 1: what share of its evidence was counted." }),
      why: z.string().nullable().meta({ description: "Why it counted less or not at all." }),
    }),
  ),
  uncertainty: quantityOut,
  buildScatter: quantityOut,
  knownGood: optional,
  knownBad: optional,
  baselineRate: optional,
  posterior: z
    .object({
      median: quantityOut,
      bands: z.array(z.object({ share: z.number(), from: quantityOut, to: quantityOut })),
      density: z
        .array(z.object({ clearance: z.number(), density: z.number() }))
        .meta({ description: "Of the clearance where the limit lies, in m and 1/m." }),
      slope: quantityOut,
      baseRate: optional,
      best: quantityOut,
    })
    .nullable(),
  considered: z.array(
    z.object({ target: quantityOut, expectedCost: z.number(), chanceOfDistress: z.number() }),
  ),
});

/** A next step as the API answers it. */
export const nextStepAnswer = {
  action: z.enum(["close", "hold", "open", "settled", "measure-again", "find-cause"]),
  subject: z.enum(["clearance", "oil"]),
  step: quantityOut.meta({ description: "Signed; negative closes." }),
  target: quantityOut,
  confidence: z.number(),
  reasons: z.array(statement),
  cautions: z.array(statement),
  wouldChange: z.array(z.string()),
  cannotSee: z.array(z.string()),
  evidence,
};

const answer = z.object(nextStepAnswer);

/** A next step with its quantities said. */
export function sayNextStep(found: NextStep, say: Say): z.input<typeof answer> {
  return {
    ...found,
    step: say.clearance(found.step),
    target: say.clearance(found.target),
    evidence: sayEvidence(found.evidence, say),
  };
}

function sayEvidence(found: Evidence, say: Say): z.input<typeof evidence> {
  const orNull = (value: number | null, as: (si: number) => z.infer<typeof quantityOut>) =>
    value === null ? null : as(value);
  return {
    builds: found.builds.map((build) => ({
      ...build,
      clearance: orNull(build.clearance, say.clearance),
      wearRate: orNull(build.wearRate, say.wearRate),
      wearRateUncertainty: orNull(build.wearRateUncertainty, say.wearRate),
    })),
    uncertainty: say.fine(found.uncertainty),
    buildScatter: say.fine(found.buildScatter),
    knownGood: orNull(found.knownGood, say.clearance),
    knownBad: orNull(found.knownBad, say.clearance),
    baselineRate: orNull(found.baselineRate, say.wearRate),
    posterior: found.posterior && sayPosterior(found.posterior, say),
    considered: found.considered.map(({ target, ...rest }) => ({ target: say.clearance(target), ...rest })),
  };
}

function sayPosterior({ median, bands, density, slope, baseRate, best }: Posterior, say: Say) {
  return {
    median: say.clearance(median),
    bands: bands.map(({ share, from, to }) => ({ share, from: say.clearance(from), to: say.clearance(to) })),
    density,
    slope: say.fine(slope),
    baseRate: baseRate === null ? null : say.wearRate(baseRate),
    best: say.clearance(best),
  };
}
