import { EngineeringError } from "~/engineering/engineering-error";
import { type FieldError, Refusal } from "~/models/refusal";
import { logError, machineTrouble } from "~/services/error-log.server";
import { answerHeaders } from "./headers";

/** The titles of the API's problems, one a status. */
export const problemTitles = {
  400: "Not readable",
  401: "No valid token",
  403: "Not allowed",
  404: "Not found",
  405: "Method not allowed",
  409: "Conflict",
  413: "Too large",
  415: "Not JSON",
  422: "Not valid",
  429: "Too many calls",
  500: "Failure of the program",
  503: "Not available now",
  507: "Disk full",
} as const;

export type ProblemStatus = keyof typeof problemTitles;

interface More {
  errors?: FieldError[];
  headers?: Record<string, string>;
  /** Under which the log has a failure of the program. */
  reference?: string;
}

/** Why a call is not answered as asked; thrown anywhere in a call, it becomes the answer. */
export class Problem extends Error {
  override readonly name = "Problem";

  /** @param code stable, kebab-case, for programs; @param message a sentence for people */
  constructor(
    readonly status: ProblemStatus,
    readonly code: string,
    message: string,
    readonly more: More = {},
  ) {
    super(message);
  }
}

/** A problem's members as RFC 9457 (Problem Details for HTTP APIs) names them, with ours: `code`, `errors`, `reference`. */
export function problemDetails(problem: Problem) {
  return {
    type: `/api#problem-${problem.status}`,
    title: problemTitles[problem.status],
    status: problem.status,
    detail: problem.message,
    code: problem.code,
    ...(problem.more.errors && { errors: problem.more.errors }),
    ...(problem.more.reference && { reference: problem.more.reference }),
  };
}

/** A problem as an answer. */
export function problemResponse(problem: Problem): Response {
  return new Response(JSON.stringify(problemDetails(problem)), {
    status: problem.status,
    headers: { ...answerHeaders, "Content-Type": "application/problem+json", ...problem.more.headers },
  });
}

const refusalStatuses = { "not-found": 404, "not-allowed": 403, conflict: 409, invalid: 422 } as const;

/** Whatever was thrown in a call, as a problem; what nobody expected goes to the log and is told without its detail. */
export function asProblem(error: unknown, request: Request, reference: string): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof Refusal) {
    const errors = error.kind === "invalid" ? { errors: error.errors } : {};
    return new Problem(refusalStatuses[error.kind], error.code, error.message, errors);
  }
  if (error instanceof EngineeringError) return notValid([fieldError(error)]);
  logError(reference, request, error);
  const trouble = machineTrouble(error);
  if (trouble) {
    return new Problem(trouble.status as 503 | 507, "machine-trouble", trouble.sentence, { reference });
  }
  const sentence = `Something broke on our side. What was saved before is safe; the log has it under ${reference}.`;
  return new Problem(500, "program-failure", sentence, { reference });
}

/** What was sent is JSON but not what the call takes. */
export function notValid(errors: FieldError[]): Problem {
  return new Problem(422, "not-valid", errors.map((error) => error.message).join(" "), { errors });
}

/** What the engineering core refuses, as an error of the field it names. */
export function fieldError({ code, field, message }: EngineeringError): FieldError {
  // The core names a temperature with its unit, as `supplyTemperatureC`; the API takes it with any unit.
  return { path: field.replace(/([tT]emperature)C\b/g, "$1"), code, message };
}
