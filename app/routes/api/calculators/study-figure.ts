import { z } from "zod";
import { amount } from "../frame/quantity-in";

const length = amount("small-length");

/**
 * A figure of a study that is about no unit in particular: a length with its unit, or a plain number.
 * Gives the number, and whether it is a length in m.
 */
export const studyFigure = z
  .unknown()
  .transform((given, context): { value: number; isLength: boolean } => {
    if (typeof given === "number" && Number.isFinite(given)) return { value: given, isLength: false };
    const checked = length.safeParse(given);
    if (checked.success) return { value: checked.data, isLength: true };
    context.addIssue({
      code: "custom",
      message: checked.error.issues[0]!.message,
      params: { code: "wrong-type" },
    });
    return z.NEVER;
  })
  .meta({
    type: ["string", "object", "number"],
    description: "A length with its unit, or in all places a plain number.",
    examples: ["2.10012 in", 0.29],
  });
