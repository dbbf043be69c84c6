import { z } from "zod";
import { gaugeStudy, type StudyResult } from "~/engineering/uncertainty/gauge-study";
import { invalid } from "~/models/refusal";
import { endpoint } from "../frame/endpoint";
import { quantityOut, type Say } from "../frame/quantity-out";
import { studyFigure } from "./study-figure";

const named = z.union([z.string().min(1).max(60), z.int()], {
  error: "This must be text or a whole number.",
});

const share = z.object({
  standardDeviation: z.union([quantityOut, z.number()]),
  percentOfStudy: z.number(),
  percentOfTolerance: z.number().optional(),
});

const shares = {
  repeatability: share,
  reproducibility: share,
  gauge: share,
  partToPart: share,
  total: share,
};

const result = z.object({
  ...shares,
  distinctCategories: z.int().nullable(),
  verdict: z.enum(["good", "conditional", "not-good-enough"]),
});

const row = z.object({ sumOfSquares: z.number(), degreesOfFreedom: z.number() });

export const postGaugeStudy = endpoint({
  method: "POST",
  path: "/calc/gauge-study",
  who: "token",
  title: "A gauge's repeatability and reproducibility, by average and range and by analysis of variance",
  about:
    "Every person measures every part as often; 2 to 20 parts, up to 10 people, 2 to 10 trials. Values are lengths with their unit, or all of them plain numbers.",
  body: z.strictObject({
    readings: z
      .array(z.strictObject({ part: named, person: named, trial: named, value: studyFigure }))
      .min(1)
      .max(2000),
    tolerance: studyFigure.optional(),
  }),
  answer: z.object({
    averageAndRange: result,
    anova: result.extend({
      table: z.object({
        people: row,
        parts: row,
        interaction: row,
        repeats: row,
        interactionProbability: z.number().optional(),
        pooled: z.boolean(),
      }),
    }),
    cautions: z.array(z.string()),
  }),
  example: {
    readings: ["A", "B"].flatMap((person) =>
      [1, 2].flatMap((part) =>
        [1, 2].map((trial) => ({ part, person, trial, value: `2.1000${part + (trial % 2)} in` })),
      ),
    ),
    tolerance: "0.0005 in",
  },
  handle: ({ body: { readings, tolerance }, say }) => {
    const isLength = readings[0]!.value.isLength;
    const figures = [...readings.map(({ value }) => value), ...(tolerance ? [tolerance] : [])];
    if (figures.some((one) => one.isLength !== isLength)) {
      throw invalid({
        path: "readings",
        code: "mixed-units",
        message: "Give all values with their unit, or none of them, and the tolerance likewise.",
      });
    }
    const study = gaugeStudy(
      readings.map(({ part, person, trial, value }) => ({
        part: String(part),
        person: String(person),
        trial: String(trial),
        value: value.value,
      })),
      tolerance?.value,
    );
    return {
      averageAndRange: sayResult(study.averageAndRange, isLength, say),
      anova: { ...sayResult(study.anova, isLength, say), table: study.anova.table },
      cautions: study.cautions,
    };
  },
});

function sayResult(found: StudyResult, isLength: boolean, say: Say): z.input<typeof result> {
  const sayShare = (of: keyof typeof shares) => ({
    ...found[of],
    standardDeviation: isLength ? say.fine(found[of].standardDeviation) : found[of].standardDeviation,
  });
  return {
    repeatability: sayShare("repeatability"),
    reproducibility: sayShare("reproducibility"),
    gauge: sayShare("gauge"),
    partToPart: sayShare("partToPart"),
    total: sayShare("total"),
    distinctCategories: found.distinctCategories,
    verdict: found.verdict,
  };
}
