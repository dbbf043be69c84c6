import type { z } from "zod";
import type { FieldError } from "~/models/refusal";
import { notValid } from "./problem.server";

/** A value as its schema gives it. @throws Problem 422 with every error, its place, code and sentence */
export function check<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const checked = schema.safeParse(value, { reportInput: true, error: sentenceOf });
  if (checked.success) return checked.data;
  throw notValid(fieldErrors(checked.error));
}

/** What zod found wrong, as the API says it. */
export function fieldErrors(error: z.ZodError, under: PropertyKey[] = []): FieldError[] {
  return error.issues.map((issue) => ({
    path: pathText([...under, ...issue.path]),
    code: codeOf(issue),
    message: issue.message,
  }));
}

/** A place in a body as JavaScript writes it: `readings[2].value`; empty for the body itself. */
export function pathText(path: PropertyKey[]): string {
  return path.reduce<string>((text, step) => {
    if (typeof step === "number") return `${text}[${step}]`;
    return text === "" ? String(step) : `${text}.${String(step)}`;
  }, "");
}

const codes: Partial<Record<string, string>> = {
  invalid_type: "wrong-type",
  invalid_value: "not-one-of-these",
  invalid_format: "wrong-format",
  invalid_union: "wrong-type",
  too_small: "too-small",
  too_big: "too-large",
  not_multiple_of: "not-whole",
  unrecognized_keys: "unknown-field",
};

function codeOf(issue: z.core.$ZodIssue): string {
  if (isMissing(issue)) return "missing";
  if (issue.code === "custom") return String(issue.params?.code ?? "not-valid");
  return codes[issue.code] ?? "not-valid";
}

const isMissing = (issue: { input?: unknown; code: string }) =>
  issue.input === undefined && issue.code !== "custom";

/** zod's errors as sentences for whoever writes a script against the API. */
export function sentenceOf(issue: z.core.$ZodRawIssue): string {
  if (isMissing(issue)) return "This is missing.";
  switch (issue.code) {
    case "invalid_type":
      return `This must be ${nouns[issue.expected] ?? issue.expected}.`;
    case "invalid_value":
      return `This must be one of: ${issue.values.map(String).join(", ")}.`;
    case "unrecognized_keys":
      return `There is no field ${issue.keys.join(", ").slice(0, 200)} here.`;
    case "too_small":
      return `This must be ${issue.inclusive ? "at least" : "over"} ${issue.minimum}${counted(issue.origin)}.`;
    case "too_big":
      return `This must be ${issue.inclusive ? "at most" : "under"} ${issue.maximum}${counted(issue.origin)}.`;
    default:
      return issue.message ?? "This is not what the call takes.";
  }
}

const nouns: Partial<Record<string, string>> = {
  string: "text",
  number: "a number",
  int: "a whole number",
  boolean: "true or false",
  object: "an object",
  array: "a list",
};

const counted = (origin: string) =>
  origin === "string" ? " characters long" : origin === "array" ? " entries long" : "";
