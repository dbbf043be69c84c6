import { z } from "zod";
import type { FeatureWear } from "~/engineering/wear/position-wear";
import type { Trend } from "~/engineering/wear/trend";
import { type WearOfBuild, wearOfBuilds } from "~/engineering/wear/wear-of-builds";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";

const diameter = amount("length", { over: 0, most: 2 });
const diameters = z.strictObject({ bore: diameter, journal: diameter });

const optional = quantityOut.nullable();
const part = z.object({
  wear: quantityOut,
  uncertainty: quantityOut,
  verdict: z.enum(["worn", "not-measurable", "slip"]),
  bound: optional.meta({ description: "Not measurable: the most that the wear can be." }),
});
const interval = z.object({ from: quantityOut, to: quantityOut }).nullable();
const odd = z.object({ position: z.int(), robustZ: z.number() });

export const postWear = endpoint({
  method: "POST",
  path: "/calc/wear",
  who: "token",
  title: "Wear by build and position, its trend over hours, and the odd position out",
  about:
    "Diameters at 20 °C; `uncertainty` is the expanded one (about 95 %) of one diameter. Wear less than the gauges can see is not measurable and has a bound; negative beyond it, it is a measuring slip. The trend is wear over the hours of a build, slips left out: its slope is the steady rate, its intercept the bedding-in.",
  body: z.strictObject({
    builds: z
      .array(
        z.strictObject({
          hours: z.number().max(1e6),
          positions: z
            .array(z.strictObject({ position: z.int().min(1), assembled: diameters, tornDown: diameters }))
            .max(200),
          uncertainty: amount("small-length", { over: 0, most: 0.01 }),
        }),
      )
      .min(1)
      .max(500),
  }),
  answer: z.object({
    builds: z.array(
      z.object({
        hours: z.number(),
        positions: z.array(
          z.object({
            position: z.int(),
            ...part.shape,
            bore: part,
            journal: part,
            rate: optional,
            rateLimits: interval,
            measurable: z.boolean(),
          }),
        ),
        oddOneOut: odd.nullable(),
      }),
    ),
    trend: z
      .object({
        slope: quantityOut,
        intercept: quantityOut,
        slopeStandardError: optional,
        interceptStandardError: optional,
        residualStandardDeviation: optional,
        confidence95: interval,
      })
      .nullable(),
    oddOneOut: z
      .object({ build: z.int(), ...odd.shape })
      .nullable()
      .meta({ description: "Of the last build that has one; builds are counted from 1." }),
  }),
  example: {
    builds: [
      {
        hours: 6.5,
        uncertainty: "0.00004 in",
        positions: [
          {
            position: 1,
            assembled: { bore: "2.1025 in", journal: "2.1000 in" },
            tornDown: { bore: "2.10263 in", journal: "2.09995 in" },
          },
        ],
      },
    ],
  },
  handle: ({ body, say }) => {
    const { builds, trend } = wearOfBuilds(body.builds);
    const last = builds.findLastIndex(({ oddOneOut }) => oddOneOut !== null);
    return {
      builds: builds.map((build) => sayBuild(build, say)),
      trend: trend && sayTrend(trend, say),
      oddOneOut: last === -1 ? null : { build: last + 1, ...builds[last]!.oddOneOut! },
    };
  },
});

function sayBuild({ hours, positions, oddOneOut }: WearOfBuild, say: Say) {
  return {
    hours,
    oddOneOut,
    positions: positions.map(({ position, bore, journal, clearance, rate, limits, measurable }) => ({
      position,
      ...sayPart(clearance, say),
      bore: sayPart(bore, say),
      journal: sayPart(journal, say),
      rate: rate === null ? null : say.wearRate(rate),
      rateLimits: limits && { from: say.wearRate(limits.from), to: say.wearRate(limits.to) },
      measurable,
    })),
  };
}

function sayPart({ wear, uncertainty, verdict, bound }: FeatureWear, say: Say) {
  return {
    wear: say.fine(wear),
    uncertainty: say.fine(uncertainty),
    verdict,
    bound: bound === null ? null : say.fine(bound),
  };
}

function sayTrend(trend: Trend, say: Say) {
  const { slopeStandardError, interceptStandardError, residualStandardDeviation, confidence95 } = trend;
  return {
    slope: say.wearRate(trend.slope),
    intercept: say.fine(trend.intercept),
    slopeStandardError: slopeStandardError === null ? null : say.wearRate(slopeStandardError),
    interceptStandardError: interceptStandardError === null ? null : say.fine(interceptStandardError),
    residualStandardDeviation:
      residualStandardDeviation === null ? null : say.fine(residualStandardDeviation),
    confidence95: confidence95 && {
      from: say.wearRate(confidence95.from),
      to: say.wearRate(confidence95.to),
    },
  };
}
