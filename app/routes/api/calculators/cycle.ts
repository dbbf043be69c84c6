import { z } from "zod";
import { engineCycle } from "~/engineering/cycle/engine-cycle";
import { orbit, shareBelow } from "~/engineering/cycle/orbit";
import { shearedLine } from "~/engineering/oil/high-shear";
import { requireOilTemperature } from "~/engineering/oil/oil-data";
import { invalid } from "~/models/refusal";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import { bearingSize, clearanceIn, speedIn, viscosityIn } from "./bearing-in";
import { oilData } from "./oil-in";

const size = amount("length", { over: 0 });
const mass = amount("mass", { least: 0 });
const force = amount("force");
const angle = z.number().meta({ description: "rad" });

const body = z.strictObject({
  bearing: z.strictObject({ ...bearingSize, clearance: clearanceIn }),
  viscosity: viscosityIn.optional(),
  oil: oilData.optional(),
  temperature: amount("temperature").optional().meta({ description: "Of the oil in the film." }),
  loads: z
    .array(z.strictObject({ crankAngle: angle, x: force, y: force }))
    .max(10_000)
    .optional()
    .meta({ description: "In the bearing's frame, x along the rod or cylinder; one turn or two." }),
  speed: speedIn.optional(),
  sleeveFixed: z.literal(true).default(true),
  engine: z
    .strictObject({
      bore: size,
      stroke: size,
      rodLength: size,
      reciprocatingMass: mass,
      rotatingMass: mass,
      peakPressure: amount("pressure", { over: 0 }),
      peakAngle: angle,
      speed: speedIn,
      compressionRatio: z.number().optional(),
      intakePressure: amount("pressure", { over: 0 }).optional(),
    })
    .optional(),
  filmLimit: amount("finish", { over: 0 })
    .optional()
    .meta({ description: "Asks for the share of the cycle below it." }),
});

type Given = z.output<typeof body>;

export const postCycle = endpoint({
  method: "POST",
  path: "/calc/cycle",
  who: "token",
  title: "The oil film of a bearing over the engine's cycle",
  about:
    "Give loads with their speed, or an engine, whose big end is then reckoned; the viscosity in the film, or an oil with its temperature there. Crank angle 0 of an engine is top dead centre of firing. Real bearings bend, starve and heat: these films serve to compare builds, not to promise one.",
  body,
  answer: z.object({
    leastFilm: quantityOut,
    leastFilmAngle: z.number(),
    shareBelow: z.number().optional(),
    meanPower: quantityOut,
    converged: z.boolean(),
    outsideRange: z.boolean(),
    loads: z.array(z.object({ crankAngle: z.number(), x: quantityOut, y: quantityOut })).optional(),
    orbit: z.array(z.object({ crankAngle: z.number(), ex: z.number(), ey: z.number(), film: quantityOut })),
  }),
  example: {
    bearing: { diameter: "53.34 mm", length: "21.6 mm", clearance: "0.0025 in" },
    oil: { kv40: "110 cSt", kv100: "16.2 cSt" },
    temperature: "110 degC",
    engine: {
      bore: "4.125 in",
      stroke: "3.25 in",
      rodLength: "6.000 in",
      reciprocatingMass: "620 g",
      rotatingMass: "480 g",
      peakPressure: "95 bar",
      peakAngle: 0.21,
      speed: "8500 rpm",
    },
    filmLimit: "1 um",
  },
  handle: ({ body: given, say }) => {
    const film = { bearing: given.bearing, viscosity: viscosityOf(given) };
    const { loads, ...cycle } = given.engine
      ? engineCycle({ ...film, engine: given.engine })
      : { ...orbit({ ...film, ...loadsOf(given), sleeveFixed: true }), loads: undefined };
    return {
      leastFilm: say.fine(cycle.leastFilm),
      leastFilmAngle: cycle.leastFilmAngle,
      ...(given.filmLimit !== undefined && { shareBelow: shareBelow(cycle.orbit, given.filmLimit) }),
      meanPower: say.power(cycle.meanPower),
      converged: cycle.converged,
      outsideRange: cycle.outsideRange,
      loads: loads?.map(({ crankAngle, x, y }) => ({ crankAngle, x: say.force(x), y: say.force(y) })),
      orbit: cycle.orbit.map((point) => ({ ...point, film: say.fine(point.film) })),
    };
  },
});

function viscosityOf({ viscosity, oil, temperature }: Given): number {
  if (viscosity !== undefined && !oil) return viscosity;
  if (viscosity === undefined && oil && temperature !== undefined) {
    requireOilTemperature(temperature, "temperature");
    return shearedLine(oil)(temperature);
  }
  throw invalid({
    path: "viscosity",
    code: "missing",
    message: "Give the viscosity in the film, or an oil with its temperature there.",
  });
}

function loadsOf({ loads, speed }: Given) {
  if (loads && speed !== undefined) return { loads, speed };
  throw invalid({ path: "loads", code: "missing", message: "Give loads with their speed, or an engine." });
}
