import { z } from "zod";
import { filmMap } from "~/engineering/film/film-map";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import { bearingSize, clearanceIn, roughnessIn, speedIn, viscosityIn } from "./bearing-in";

const count = z.int().min(2).max(100);
const grid = <Cell extends z.ZodType>(cell: Cell) => z.array(z.array(cell));

export const postMap = endpoint({
  method: "POST",
  path: "/calc/map",
  who: "token",
  title: "The oil film over clearance and viscosity at one duty",
  about:
    "From, to and how many values, both ends among them. A row for each clearance, in it a value for each viscosity.",
  body: z.strictObject({
    bearing: z.strictObject({
      ...bearingSize,
      clearance: clearanceIn.optional().meta({ description: "Not used: the map goes over clearances." }),
    }),
    speed: speedIn,
    load: amount("force", { over: 0 }).optional(),
    specificLoad: amount("pressure", { over: 0 }).optional(),
    clearances: z.tuple([clearanceIn, clearanceIn, count]),
    viscosities: z.tuple([viscosityIn, viscosityIn, count]),
    roughness: roughnessIn.optional(),
  }),
  answer: z.object({
    clearances: z.array(quantityOut),
    viscosities: z.array(quantityOut),
    leastFilm: grid(quantityOut),
    lambda: grid(z.number()).nullable(),
    frictionPower: grid(quantityOut),
    outsideRange: grid(z.boolean()),
  }),
  example: {
    bearing: { diameter: "2.1000 in", length: "0.85 in" },
    speed: "7200 rpm",
    load: "12 kN",
    clearances: ["0.0015 in", "0.0030 in", 4],
    viscosities: ["6 mPa s", "15 mPa s", 3],
    roughness: { bore: "12 uin", journal: "4 uin" },
  },
  handle: ({ body: { bearing, clearances, viscosities, ...duty }, say }) => {
    const { diameter, length } = bearing;
    const map = filmMap({
      ...duty,
      diameter,
      length,
      clearances: axis(clearances),
      viscosities: axis(viscosities),
    });
    return {
      clearances: map.clearances.map(say.clearance),
      viscosities: map.viscosities.map(say.viscosity),
      leastFilm: map.leastFilm.map((row) => row.map(say.fine)),
      lambda: map.lambda,
      frictionPower: map.frictionPower.map((row) => row.map(say.power)),
      outsideRange: map.outsideRange,
    };
  },
});

const axis = ([from, to, steps]: readonly [number, number, number]) => ({ from, to, count: steps });
