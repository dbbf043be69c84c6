import { describe, expect, it } from "vitest";
import { apiCaller } from "#test/support/api";
import { describeCalls } from "./describe-calls.server";
import { endpoints } from "./endpoints";

interface Operation {
  operationId: string;
  parameters: { name: string; in: string }[];
  responses: Record<string, { content: Record<string, unknown> }>;
  requestBody?: { content: { "application/json": { schema: object; example?: unknown } } };
  security?: unknown[];
}

const description = (await apiCaller()("GET", "/openapi.json")).body as {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, object> };
};

const operations = Object.entries(description.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
);

// The rules of the OpenAPI Specification 3.1.0; no independent validator is installed, so the ones that a generator of
// clients trips over are held here by their sections.
describe("the description as OpenAPI 3.1", () => {
  it("has every call once, under a name of its own (4.8.10)", () => {
    expect(description.openapi).toMatch(/^3\.1\.\d+$/);
    expect(operations).toHaveLength(endpoints.length);
    const names = operations.map(({ operation }) => operation.operationId);
    expect(new Set(names).size).toBe(names.length);
  });

  it("declares every part of a path, and none twice (4.8.9, 4.8.12)", () => {
    for (const { path, operation } of operations) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
      const declared = operation.parameters.filter((parameter) => parameter.in === "path");
      expect(declared.map(({ name }) => name)).toEqual(inPath);
      const all = operation.parameters.map((parameter) => `${parameter.in} ${parameter.name}`);
      expect(new Set(all).size).toBe(all.length);
    }
  });

  it("refers to nothing that is not there (4.8.23)", () => {
    const text = JSON.stringify(description);
    const references = [...text.matchAll(/"\$ref":"([^"]+)"/g)].map(([, reference]) => reference!);
    expect(references.length).toBeGreaterThan(100);
    for (const reference of new Set(references)) {
      const name = /^#\/components\/schemas\/([A-Za-z0-9._-]+)$/.exec(reference)?.[1];
      expect(description.components.schemas[name ?? ""], reference).toBeDefined();
    }
  });

  it("says which calls need no token, and what goes wrong in the others", () => {
    for (const { path, operation } of operations) {
      const isOpen = path === "/health" || path === "/openapi.json";
      expect(operation.security?.length === 0).toBe(isOpen);
      expect("401" in operation.responses).toBe(!isOpen);
      for (const [status, { content }] of Object.entries(operation.responses)) {
        const type = Number(status) < 400 ? "application/json" : "application/problem+json";
        expect(Object.keys(content)).toEqual([type]);
      }
    }
  });

  it("has an example for every call with a body", () => {
    for (const { path, operation } of operations) {
      const content = operation.requestBody?.content["application/json"];
      if (content) expect(content.example, path).toBeDefined();
    }
  });

  it("shows a quantity on its way in as text, and on its way out as number and text", () => {
    const { Quantity } = description.components.schemas;
    expect(Quantity).toMatchObject({ required: ["si", "text"] });
    const schema = description.paths["/engines"]!.post!.requestBody!.content["application/json"].schema;
    expect(schema).toMatchObject({ properties: { bore: { type: "string" } }, additionalProperties: false });
  });
});

describe("the page's list of calls", () => {
  it("has each call with the fields that its checks know", () => {
    const calls = describeCalls().groups.flatMap((group) => group.calls);
    expect(calls).toHaveLength(endpoints.length);
    const readings = calls.find(
      ({ path, method }) => path === "/builds/{build}/readings" && method === "POST",
    )!;
    const paths = readings.body.map((field) => field.path);
    expect(paths).toEqual(expect.arrayContaining(["stage", "readings[].fit", "readings[].value"]));
    const engine = calls.find(({ path, method }) => path === "/engines" && method === "POST")!;
    expect(engine.body.find(({ path }) => path === "fits[].length")).toMatchObject({ needed: false });
    expect(engine.body.find(({ path }) => path === "layout.form")).toMatchObject({
      type: "inline · V · flat",
    });
    expect(engine.answer.find(({ path }) => path === "fits[].hardLimits.least")).toMatchObject({
      type: "quantity",
    });
  });
});
