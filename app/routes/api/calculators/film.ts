import { z } from "zod";
import { steadyFilm } from "~/engineering/film/steady-film";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import { bearingSize, clearanceIn, roughnessIn, speedIn, viscosityIn } from "./bearing-in";
import { oilData } from "./oil-in";

export const postFilm = endpoint({
  method: "POST",
  path: "/calc/film",
  who: "token",
  title: "The oil film of a plain bearing at a steady speed and load",
  about:
    "Give the load or the specific load; the viscosity in the film, or an oil with the temperature it comes at. `outsideRange` and `assumptions` say what the numbers rest on.",
  body: z.strictObject({
    ...bearingSize,
    clearance: clearanceIn,
    speed: speedIn,
    load: amount("force", { over: 0 }).optional(),
    specificLoad: amount("pressure", { over: 0 }).optional(),
    viscosity: viscosityIn.optional(),
    oil: oilData.optional(),
    supplyTemperature: amount("temperature").optional(),
    roughness: roughnessIn.optional(),
  }),
  answer: z.object({
    sommerfeld: z.number(),
    eccentricityRatio: z.number(),
    leastFilm: quantityOut,
    attitude: z.number(),
    frictionCoefficient: z.number(),
    frictionForce: quantityOut,
    frictionPower: quantityOut,
    sideFlow: quantityOut,
    temperatureRise: quantityOut,
    effectiveTemperature: quantityOut.nullable(),
    effectiveViscosity: quantityOut,
    peakPressure: quantityOut,
    specificLoad: quantityOut,
    lambda: z.number().nullable(),
    regime: z.enum(["boundary", "mixed", "full"]).nullable(),
    converged: z.boolean(),
    outsideRange: z.boolean(),
    assumptions: z.array(z.string()),
  }),
  example: {
    diameter: "2.1000 in",
    length: "0.85 in",
    clearance: "0.0025 in",
    speed: "7200 rpm",
    load: "12 kN",
    oil: { kv40: "110 cSt", kv100: "16.2 cSt" },
    supplyTemperature: "95 degC",
    roughness: { bore: "12 uin", journal: "4 uin" },
  },
  handle: ({ body: { supplyTemperature, ...duty }, say }) => {
    const film = steadyFilm({ ...duty, supplyTemperatureC: supplyTemperature });
    const { effectiveTemperatureC } = film;
    return {
      ...film,
      leastFilm: say.fine(film.leastFilm),
      frictionForce: say.force(film.frictionForce),
      frictionPower: say.power(film.frictionPower),
      sideFlow: say.flow(film.sideFlow),
      temperatureRise: say.rise(film.temperatureRise),
      effectiveTemperature: effectiveTemperatureC === null ? null : say.temperature(effectiveTemperatureC),
      effectiveViscosity: say.viscosity(film.effectiveViscosity),
      peakPressure: say.stress(film.peakPressure),
      specificLoad: say.stress(film.specificLoad),
    };
  },
});
