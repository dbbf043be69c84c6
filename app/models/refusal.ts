/** One thing that is wrong with what a person typed, and where. */
export interface FieldError {
  path: string;
  code: string;
  message: string;
}

/**
 * Why a model did not do what it was asked: a person's matter, not the program's.
 * Routes turn it into a sentence beside the field or the API's problem details.
 */
export class Refusal extends Error {
  override readonly name = "Refusal";

  constructor(
    readonly kind: "not-found" | "not-allowed" | "conflict" | "invalid",
    readonly code: string,
    message: string,
    readonly errors: FieldError[] = [],
  ) {
    super(message);
  }
}

/** The thing is not there, or the person may not know that it is. */
export function notFound(what: string): Refusal {
  return new Refusal("not-found", "not-found", `There is no such ${what}.`);
}

/** The step cannot be taken now; the sentence says why. */
export function conflict(code: string, message: string): Refusal {
  return new Refusal("conflict", code, message);
}

/** What was sent is wrong; each error says where. */
export function invalid(...errors: FieldError[]): Refusal {
  return new Refusal(
    "invalid",
    errors[0]?.code ?? "invalid",
    errors.map((error) => error.message).join(" "),
    errors,
  );
}
