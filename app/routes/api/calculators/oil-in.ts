import { z } from "zod";
import { amount } from "../frame/quantity-in";

const kinematic = amount("kinematic-viscosity", { over: 0 });

/** What an oil's data sheet says beside its viscosities. */
const rest = {
  density15: amount("density", { over: 0 }).optional(),
  hths: amount("dynamic-viscosity", { over: 0 }).optional(),
};

/** An oil by its data sheet. */
export const oilData = z.strictObject({ kv40: kinematic, kv100: kinematic, ...rest });

/** An oil by its viscosities at 40 and 100 °C, or at two other temperatures. */
export const oilFields = {
  kv40: kinematic.optional(),
  kv100: kinematic.optional(),
  points: z
    .array(z.strictObject({ temperature: amount("temperature"), kinematic }))
    .length(2)
    .optional()
    .meta({ description: "Two measured viscosities, in place of kv40 and kv100." }),
  ...rest,
};
