import { z } from "zod";

/** One field of a body or an answer, as the page `/api` lists it. */
export interface FieldLine {
  /** Where it stands: `readings[].value`. */
  path: string;
  type: string;
  needed: boolean;
  what: string;
}

interface JsonSchema {
  $ref?: string;
  $defs?: Record<string, JsonSchema>;
  type?: string | string[];
  enum?: unknown[];
  const?: unknown;
  anyOf?: JsonSchema[];
  items?: JsonSchema;
  properties?: Record<string, JsonSchema>;
  required?: string[];
  description?: string;
}

/** The fields of a schema in the order they are written, those within others by their whole path. */
export function fieldsOf(schema: z.ZodType, io: "input" | "output"): FieldLine[] {
  const root = z.toJSONSchema(schema, { io }) as JsonSchema;
  return within(root, "", root.$defs ?? {});
}

type Definitions = Record<string, JsonSchema>;

function within(schema: JsonSchema, path: string, definitions: Definitions): FieldLine[] {
  const { items, properties = {}, required = [] } = resolved(schema, definitions);
  if (items) return within(items, `${path}[]`, definitions);
  return Object.entries(properties).flatMap(([name, property]) => {
    const here = path ? `${path}.${name}` : name;
    const line = {
      path: here,
      type: typeText(property, definitions),
      needed: required.includes(name),
      what: resolved(property, definitions).description ?? "",
    };
    return isQuantity(property) ? [line] : [line, ...within(property, here, definitions)];
  });
}

/** A schema behind its reference, and behind a choice of which the first is the one to tell of. */
function resolved(schema: JsonSchema, definitions: Definitions): JsonSchema {
  if (schema.$ref) return { ...definitions[schema.$ref.replace("#/$defs/", "")]!, ...withoutRef(schema) };
  const [first] = schema.anyOf ?? [];
  return first
    ? { ...resolved(first, definitions), ...(schema.description && { description: schema.description }) }
    : schema;
}

const withoutRef = ({ $ref: _, ...rest }: JsonSchema): JsonSchema => rest;

const isQuantity = (schema: JsonSchema): boolean =>
  schema.$ref === "#/$defs/Quantity" || (schema.anyOf?.some(isQuantity) ?? false);

function typeText(schema: JsonSchema, definitions: Definitions): string {
  if (isQuantity(schema)) return orNull(schema, "quantity");
  if (schema.anyOf) {
    const texts = schema.anyOf.map((one) => typeText(one, definitions)).filter(Boolean);
    return [...new Set(texts)].join(" or ");
  }
  const { type, enum: choices, const: only, items } = resolved(schema, definitions);
  if (only !== undefined) return String(only);
  if (choices) return choices.join(" · ");
  if (items) return `list of ${typeText(items, definitions) || "anything"}`;
  if (Array.isArray(type)) return "text";
  return typeWords[type ?? ""] ?? type ?? "";
}

const orNull = (schema: JsonSchema, text: string) =>
  schema.anyOf?.some(({ type }) => type === "null") ? `${text} or null` : text;

const typeWords: Record<string, string> = {
  string: "text",
  integer: "whole number",
  boolean: "true or false",
};
