import { z } from "zod";
import { type Endpoint, writes } from "./endpoint";
import { apiRoot } from "./find-endpoint";
import { type ProblemStatus, problemTitles } from "./problem.server";

type Json = Record<string, unknown>;

/** The OpenAPI 3.1 description of the calls, made from the schemas that check them. */
export function openApi(endpoints: readonly Endpoint[]): Json {
  const components: Json = { Problem: jsonSchema(problem, "output", {}) };
  const paths: Record<string, Json> = {};
  for (const endpoint of endpoints) {
    paths[endpoint.path] ??= {};
    paths[endpoint.path]![endpoint.method.toLowerCase()] = operation(endpoint, components);
  }
  return {
    openapi: "3.1.0",
    info: {
      title: "Tenthbook",
      version: "1",
      description: "The clearance logbook of a competition-engine shop.",
    },
    servers: [{ url: apiRoot }],
    security: [{ token: [] }],
    tags: [{ name: "calculators" }, { name: "shop" }],
    paths,
    components: {
      securitySchemes: { token: { type: "http", scheme: "bearer" } },
      schemas: components,
    },
  };
}

function operation(endpoint: Endpoint, components: Json): Json {
  return {
    operationId: operationId(endpoint),
    summary: endpoint.title,
    ...(endpoint.about && { description: endpoint.about }),
    tags: [endpoint.who === "token" ? "calculators" : "shop"],
    ...(endpoint.who === "everyone" && { security: [] }),
    parameters: parameters(endpoint, components),
    ...(endpoint.body && {
      requestBody: {
        required: true,
        content: {
          "application/json": {
            schema: jsonSchema(endpoint.body, "input", components),
            ...(endpoint.example !== undefined && { example: endpoint.example }),
          },
        },
      },
    }),
    responses: responses(endpoint, components),
  };
}

/** A name for a call that programs made from the description use: `postBuildsRuns`. */
export function operationId({ method, path }: Pick<Endpoint, "method" | "path">): string {
  const words = path.replace(/\{\w+\}/g, "").match(/[A-Za-z0-9]+/g) ?? [];
  const one = /\}$/.test(path) ? ["one"] : [];
  return [method.toLowerCase(), ...one.map(capital), ...words.map(capital)].join("");
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

function parameters(endpoint: Endpoint, components: Json): Json[] {
  const inPath = [...endpoint.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
    name,
    in: "path",
    required: true,
    schema: { type: "string" },
  }));
  if (endpoint.who === "everyone") return inPath;
  const inQuery = Object.entries(endpoint.query.shape).map(([name, schema]) => ({
    name,
    in: "query",
    schema: jsonSchema(schema as z.ZodType, "input", components),
  }));
  const key = {
    name: "Idempotency-Key",
    in: "header",
    description: "The same key and body gives the first answer again; it is kept for a day.",
    schema: { type: "string", maxLength: 200 },
  };
  return [...inPath, ...inQuery, ...(writes(endpoint) ? [key] : [])];
}

function responses(endpoint: Endpoint, components: Json): Json {
  const content = { "application/json": { schema: jsonSchema(endpoint.answer, "output", components) } };
  const problems = problemStatuses(endpoint).map((status) => [
    String(status),
    {
      description: problemTitles[status],
      content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } },
    },
  ]);
  return {
    [endpoint.status ?? 200]: { description: endpoint.status === 201 ? "Created" : "Done", content },
    ...Object.fromEntries(problems),
  };
}

function problemStatuses(endpoint: Endpoint): ProblemStatus[] {
  const mayFail: [boolean, ProblemStatus[]][] = [
    [endpoint.who !== "everyone", [401, 403, 422, 429]],
    [endpoint.path.includes("{"), [404]],
    [endpoint.body !== undefined, [400, 413, 415]],
    [writes(endpoint), [409]],
    [true, [500, 503]],
  ];
  return mayFail.flatMap(([applies, statuses]) => (applies ? statuses : [])).sort((a, b) => a - b);
}

const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.string().meta({ description: "Stable, for programs." }),
  errors: z.array(z.object({ path: z.string(), code: z.string(), message: z.string() })).optional(),
  reference: z.string().optional().meta({ description: "Under which the log has a failure of the program." }),
});

// A schema with an `id` stands once among the components, and the others refer to it there.
function jsonSchema(schema: z.ZodType, io: "input" | "output", components: Json): Json {
  const { $schema: _, $defs, ...own } = z.toJSONSchema(schema, { io });
  for (const [name, component] of Object.entries($defs ?? {})) components[name] = amongComponents(component);
  return amongComponents(own);
}

function amongComponents(schema: unknown): Json {
  const text = JSON.stringify(schema).replaceAll('"#/$defs/', '"#/components/schemas/');
  return JSON.parse(text) as Json;
}
