import { beforeAll, describe, expect, it } from "vitest";
import { type Calculators, calculators } from "#test/support/api";
import { openShopOfTests } from "#test/support/shop-of-tests";
import { endpoints } from "../endpoints";

let calculate: Calculators["calculate"];
let refused: Calculators["refused"];

beforeAll(async () => {
  ({ calculate, refused } = calculators((await openShopOfTests()).readToken));
});

describe("/calc/next-step", () => {
  const example = endpoints.find(({ path }) => path === "/calc/next-step")!.example as {
    iterations: object[];
  };

  it("starts a fit without builds at the shop's usual clearance", async () => {
    const answer = await calculate("next-step", { ...example, iterations: [] });
    expect(answer).toMatchObject({
      action: "hold",
      target: { text: "0.0025 in" },
      reasons: [{ code: "start-at-usual" }],
    });
  });

  it("says its sentences in the caller's units", async () => {
    const { reasons, target } = await calculate("next-step?units=metric", { ...example, iterations: [] });
    expect(target.text).toBe("63.5 µm");
    expect(reasons[0].text).toContain("µm");
  });

  it("takes rules that are not given from the usual ones, and refuses one that nobody knows", async () => {
    const { rules: _, ...bare } = example as unknown as { rules: unknown };
    expect((await calculate("next-step", bare)).action).toBeDefined();
    expect(await refused("next-step", { ...example, rules: { largestSteps: "0.0002 in" } })).toMatchObject([
      { path: "rules", code: "unknown-field" },
    ]);
  });
});
