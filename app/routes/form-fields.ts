import { z } from "zod";
import { EngineeringError } from "~/engineering/engineering-error";
import { parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import type { QuantityKind, UnitName } from "~/engineering/quantity/units";
import type { FieldError } from "~/models/refusal";

/** A line of text that must be there. */
export const text = (missing: string, most = 120) =>
  z.string().trim().min(1, missing).max(most, `At most ${most} characters.`);

/** A line of text that may be empty. */
export const note = (most = 2000) => z.string().trim().max(most, `At most ${most} characters.`).default("");

/** A quantity with its unit, or in the page's unit where none is typed. */
export const quantity = (kind: QuantityKind, defaultUnit: UnitName) =>
  z.string({ error: "Type a value." }).transform((typed, context) => read(typed, kind, defaultUnit, context));

/** A quantity that may be left blank. */
export const optionalQuantity = (kind: QuantityKind, defaultUnit: UnitName) =>
  z
    .string()
    .transform((typed, context) =>
      typed.trim() === "" ? undefined : read(typed, kind, defaultUnit, context),
    )
    .optional();

function read(
  typed: string,
  kind: QuantityKind,
  defaultUnit: UnitName,
  context: z.core.$RefinementCtx,
): Quantity {
  try {
    return parseQuantity(typed, kind, { defaultUnit });
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    context.addIssue({ code: "custom", message: error.message, params: { code: error.code } });
    return z.NEVER;
  }
}

const numberForm = /^[+-]?\d+([.,]\d+)?$/;

const number = z
  .string()
  .trim()
  .regex(numberForm, "Type a number.")
  .transform((typed) => Number(typed.replace(",", ".")));

/** A plain number between two bounds, comma or point. */
export const numberBetween = (least: number, most: number, message: string) =>
  number.pipe(z.number().min(least, message).max(most, message));

/** A whole number between two bounds. */
export const wholeBetween = (least: number, most: number, message: string) =>
  number.pipe(z.number().int(message).min(least, message).max(most, message));

/** A number between two bounds, left blank where there is none. */
export const optionalNumber = (least: number, most: number, message: string) =>
  z
    .string()
    .trim()
    .refine((typed) => typed === "" || numberForm.test(typed), "Type a number.")
    .transform((typed) => (typed === "" ? undefined : Number(typed.replace(",", "."))))
    .refine((value) => value === undefined || (value >= least && value <= most), message)
    .optional();

/** A form's fields by their names; a name that is there several times is a list. */
export function fieldsOf(form: FormData): Record<string, string | string[]> {
  const fields: Record<string, string | string[]> = {};
  for (const name of new Set(form.keys())) {
    const values = form.getAll(name).filter((value) => typeof value === "string");
    fields[name] = values.length > 1 ? values : (values[0] ?? "");
  }
  return fields;
}

/** What zod found, as sentences beside fields. */
export function fieldErrors(error: z.ZodError): FieldError[] {
  return error.issues.map((issue) => ({
    path: issue.path.join("."),
    code: (issue.code === "custom" && (issue.params?.code as string)) || issue.code,
    message: issue.message,
  }));
}
