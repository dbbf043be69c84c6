import { data } from "react-router";
import { type FieldError, Refusal } from "~/models/refusal";
import { machineTrouble } from "~/services/error-log.server";

const statuses = { "not-found": 404, "not-allowed": 403, conflict: 409, invalid: 400 } as const;

/** For loaders: what the model refuses becomes the page that says so. */
export async function orPage<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    throw asPage(error);
  }
}

function asPage(error: unknown): unknown {
  if (error instanceof Refusal) return data(error.message, { status: statuses[error.kind] });
  const trouble = machineTrouble(error);
  return trouble ? data(trouble.sentence, { status: trouble.status }) : error;
}

/** What a form gets back when it was not accepted: sentences beside the fields, and all that was typed. */
export interface FormRefusal {
  errors: FieldError[];
  values: Record<string, string>;
}

/** A form that was not accepted, answered with what was typed. */
export function refuseForm(errors: FieldError[], form: FormData, status: 400 | 409 | 422 | 429 = 400) {
  return data<FormRefusal>({ errors, values: typedValues(form) }, { status });
}

/**
 * For actions: does the work of a form; what a person can mend comes back beside the fields,
 * what they cannot becomes the page that says so.
 */
export async function orFormErrors<T>(form: FormData, work: () => Promise<T>) {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof Refusal) || error.kind === "not-found" || error.kind === "not-allowed") {
      throw asPage(error);
    }
    const errors =
      error.errors.length > 0 ? error.errors : [{ path: "", code: error.code, message: error.message }];
    return refuseForm(errors, form, statuses[error.kind] as 400 | 409);
  }
}

function typedValues(form: FormData): Record<string, string> {
  const values: Record<string, string> = {};
  for (const [name, value] of form.entries()) {
    if (typeof value !== "string" || name === "password") continue;
    values[name] = name in values ? `${values[name]},${value}` : value;
  }
  return values;
}
