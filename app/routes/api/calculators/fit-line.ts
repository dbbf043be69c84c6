import { z } from "zod";
import { fitLine } from "~/engineering/wear/fit-line";
import { endpoint } from "../frame/endpoint";

// Squares of what is summed must stay far inside a number's range.
const plain = z.number().min(-1e60).max(1e60);

export const postFitLine = endpoint({
  method: "POST",
  path: "/calc/fit-line",
  who: "token",
  title: "The straight line of least squares, as the wear trend has it",
  about: "Plain numbers in any unit. What the points cannot give is null.",
  body: z.strictObject({
    points: z.array(z.strictObject({ x: plain, y: plain })).max(10_000),
    throughOrigin: z.boolean().default(false),
  }),
  answer: z.object({
    slope: z.number(),
    intercept: z.number(),
    slopeStandardError: z.number().nullable(),
    interceptStandardError: z.number().nullable(),
    residualStandardDeviation: z.number().nullable(),
    r2: z.number().nullable(),
    degreesOfFreedom: z.int(),
  }),
  example: {
    points: [
      { x: 0, y: 0.1 },
      { x: 1, y: 1.9 },
      { x: 2, y: 4.2 },
    ],
  },
  handle: ({ body: { points, throughOrigin } }) => fitLine(points, { throughOrigin }),
});
