import { z } from "zod";
import { convert } from "~/engineering/quantity/convert";
import { endpoint } from "../frame/endpoint";
import { anyQuantity } from "../frame/quantity-in";

export const postConvert = endpoint({
  method: "POST",
  path: "/calc/convert",
  who: "token",
  title: "A quantity in other units, exact",
  body: z.strictObject({
    quantity: anyQuantity,
    to: z.array(z.string().max(40)).min(1).max(50).optional().meta({
      description: "Units by their names; all units of the quantity where none are named.",
    }),
  }),
  answer: z.object({ values: z.array(z.object({ unit: z.string(), number: z.number(), text: z.string() })) }),
  example: { quantity: "2.1000 in", to: ["mm", "um", "thou"] },
  handle: ({ body: { quantity, to } }) => ({
    // A unit is named back as it was asked for, so that a script finds it.
    values: convert(quantity, to).map((value, index) => ({ ...value, unit: to?.[index] ?? value.unit })),
  }),
});
