import { z } from "zod";
import { nextStep } from "~/engineering/next-step/next-step";
import { endpoint } from "../frame/endpoint";
import { nextStepAnswer, sayNextStep } from "./answer";
import { historyOf } from "./history-in";
import { historyIn } from "./history-shape";

export const postNextStep = endpoint({
  method: "POST",
  path: "/calc/next-step",
  who: "token",
  title: "What the next build of a fit should aim at, and why",
  about:
    "Iterations oldest first, as GET of a fit's history gives them. It is advice to a qualified builder: the parts makers' limits and the rules of the event come first, and `cannotSee` lists what it cannot know.",
  body: historyIn,
  answer: z.object(nextStepAnswer),
  example: {
    fit: {
      kind: "big-end",
      nominal: "2.1000 in",
      hardLimits: { least: "0.0010 in", most: "0.0032 in" },
      coating: { kind: "dry-film", isNew: true },
    },
    rules: {
      usual: "0.0025 in",
      largestStep: "0.0002 in",
      leastHours: 2,
      stopGrade: 3,
      baselineRuns: 1,
    },
    iterations: [
      {
        build: 1,
        target: "0.0025 in",
        hours: 6.5,
        oil: { name: "A", kv40: "110 cSt", kv100: "16.2 cSt", temperature: "105 degC" },
        events: [],
        positions: [
          {
            position: 1,
            assembled: { clearance: "0.00252 in" },
            tornDown: { clearance: "0.00254 in" },
            uncertainty: "0.00005 in",
            grade: 1,
            damage: null,
            coatingState: "intact",
          },
        ],
      },
    ],
  },
  handle: ({ body, units, say }) => sayNextStep(nextStep(historyOf(body), body.rules, units), say),
});
