import { z } from "zod";
import { gradeOf } from "~/engineering/oil/j300";
import type { OilData } from "~/engineering/oil/oil-data";
import { oilAt, oilFromPoints } from "~/engineering/oil/viscosity";
import { viscosityIndex } from "~/engineering/oil/viscosity-index";
import { invalid } from "~/models/refusal";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import { oilFields } from "./oil-in";

const body = z.strictObject({
  ...oilFields,
  temperatures: z.array(amount("temperature")).max(200).default([]),
  label: z
    .string()
    .max(20)
    .optional()
    .meta({ description: "What the can says; the winter grade is only there." }),
});

export const postOilCalculation = endpoint({
  method: "POST",
  path: "/calc/oil",
  who: "token",
  title: "An oil's viscosities and density at any temperature, its viscosity index and grade",
  about: "ASTM D341, D2270 and SAE J300. The winter grade is checked against kv100 only.",
  body,
  answer: z.object({
    points: z.array(
      z.object({
        temperature: quantityOut,
        kinematic: quantityOut,
        dynamic: quantityOut,
        density: quantityOut,
        outsideRange: z.boolean(),
      }),
    ),
    viscosityIndex: z.number().nullable(),
    grade: z.object({
      winter: z.string().optional(),
      summer: z.string().optional(),
      disagreements: z.array(z.string()),
    }),
  }),
  example: {
    kv40: "110 cSt",
    kv100: "16.2 cSt",
    density15: "868 kg/m3",
    temperatures: ["40 degC", "105 degC"],
  },
  handle: ({ body: given, say }) => {
    const oil = oilOf(given);
    return {
      points: given.temperatures.map((temperatureC) => {
        const { kinematic, dynamic, density, outsideRange } = oilAt(oil, temperatureC);
        return {
          temperature: say.temperature(temperatureC),
          kinematic: say.kinematic(kinematic),
          dynamic: say.viscosity(dynamic),
          density: say.density(density),
          outsideRange,
        };
      }),
      // The standard defines the index from 2 mm²/s at 100 °C on; thinner oils have none.
      viscosityIndex: oil.kv100 < 2 ? null : viscosityIndex(oil).index,
      grade: gradeOf({ kv100: oil.kv100, hths: oil.hths, label: given.label }),
    };
  },
});

function oilOf({ kv40, kv100, points, density15, hths }: z.output<typeof body>): OilData {
  const rest = { density15, hths };
  if (points && kv40 === undefined && kv100 === undefined) {
    const [first, second] = points.map(({ temperature, kinematic }) => ({
      temperatureC: temperature,
      kinematic,
    }));
    return oilFromPoints(first!, second!, rest);
  }
  if (!points && kv40 !== undefined && kv100 !== undefined) return { kv40, kv100, ...rest };
  throw invalid({ path: "", code: "missing", message: "Give kv40 and kv100, or in their place two points." });
}
