import { describe, expect, it } from "vitest";
import { apiCaller } from "#test/support/api";
import { openShopOfTests } from "#test/support/shop-of-tests";
import { endpoints } from "../endpoints";

describe("the examples", () => {
  it("of every calculator are answered", async () => {
    const call = apiCaller((await openShopOfTests()).readToken);
    const calculators = endpoints.filter(({ who }) => who === "token");
    expect(calculators.map(({ path }) => path)).toEqual(
      "convert clearance oil film cycle wear fit-line next-step gauge-study map"
        .split(" ")
        .map((one) => `/calc/${one}`),
    );
    for (const { path, example } of calculators) {
      for (const units of ["inch", "metric"]) {
        const { status, body } = await call("POST", `${path}?units=${units}`, { body: example });
        expect([path, status, body.errors]).toEqual([path, 200, undefined]);
      }
    }
  });
});
