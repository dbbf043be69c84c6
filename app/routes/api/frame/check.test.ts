import { describe, expect, it } from "vitest";
import { z } from "zod";
import { check, pathText } from "./check";
import type { Problem } from "./problem.server";

const schema = z.strictObject({
  name: z.string().min(2).max(4),
  list: z.array(z.strictObject({ count: z.int().min(1).max(3), ratio: z.number().optional() })).max(2),
});

const errorsOf = (value: unknown) => {
  try {
    check(schema, value);
  } catch (error) {
    return (error as Problem).more.errors!.map(({ path, code, message }) => [path, code, message]);
  }
  return [];
};

describe("what is wrong with a body", () => {
  it("is said for every place, with a code and a sentence", () => {
    expect(errorsOf({ name: "a", list: [{ count: 4, ratio: "x" }, { more: 1 }] })).toEqual([
      ["name", "too-small", "This must be at least 2 characters long."],
      ["list[0].count", "too-large", "This must be at most 3."],
      ["list[0].ratio", "wrong-type", "This must be a number."],
      ["list[1].count", "missing", "This is missing."],
      ["list[1]", "unknown-field", "There is no field more here."],
    ]);
    expect(errorsOf([])).toEqual([["", "wrong-type", "This must be an object."]]);
    expect(errorsOf({ name: "abc", list: [1, 2, 3] }).at(-1)).toEqual([
      "list",
      "too-large",
      "This must be at most 2 entries long.",
    ]);
  });

  it("is nothing where nothing is wrong", () => {
    const value = { name: "abc", list: [{ count: 2 }] };
    expect(check(schema, value)).toEqual(value);
  });

  it("stands at a place that JavaScript could read", () => {
    expect(pathText(["readings", 2, "value"])).toBe("readings[2].value");
    expect(pathText([])).toBe("");
  });
});
