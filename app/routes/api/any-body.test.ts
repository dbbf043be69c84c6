import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { apiCaller } from "#test/support/api";
import { engineBody } from "#test/support/api-bodies";
import { openShopOfTests, type ShopOfTests } from "#test/support/shop-of-tests";
import { insertToken } from "~/models/token.server";
import { endpoints } from "./endpoints";

let shop: ShopOfTests;
let ids: Record<string, string>;

beforeAll(async () => {
  shop = await openShopOfTests();
  const call = apiCaller(shop.tokens.owner);
  const engine = (await call("POST", "/engines", { body: engineBody() })).body;
  const build = (await call("POST", `/engines/${engine.id}/builds`, { body: {} })).body.id;
  ids = { engine: engine.id, build, fit: engine.fits[0].id, oil: "none", gauge: "none" };
});

/** What people and programs send by mistake or on purpose. */
const odd = fc.oneof(
  fc.constantFrom(
    "",
    " ",
    "1e308 in",
    "1e-300 m",
    "-1e-12 mm",
    "0 in",
    "-0 rpm",
    "9".repeat(60),
    "99999999 m",
    "1e15 Pa",
    "0.0000000001 mPa s",
    "1e9 rpm",
    "NaN in",
    "∞ mm",
    "2.1,000 in",
    "-273.16 degC",
    "1e14 K",
    "12 kN",
    "5 mPa s",
    "300 degC",
    "0.001 rpm",
    "1 nm",
    "9000 m",
    "\u0000",
    "\ud800",
    "__proto__",
    "2026-02-31T25:00:00Z",
    "9999-12-31T23:59:59Z",
    "x".repeat(300),
  ),
  fc.constantFrom(0, -0, -1, 0.5, 1e300, -1e300, 5e-324, 2 ** 53, 1e60, 3, 100),
  fc.constantFrom(
    null,
    true,
    [],
    {},
    [null],
    [[]],
    { si: 1, text: "" },
    { si: 1e300, text: "x" },
    { si: -1 },
  ),
  fc.json().map((text) => JSON.parse(text) as unknown),
);

type Path = (string | number)[];

/** Every place in a value, the value itself first. */
function placesOf(value: unknown, path: Path = []): Path[] {
  if (typeof value !== "object" || value === null) return [path];
  return [path, ...Object.entries(value).flatMap(([key, inner]) => placesOf(inner, [...path, key]))];
}

/** The value with one place replaced, taken out or put in twice. */
function changed(value: unknown, [step, ...rest]: Path, into: unknown): unknown {
  if (step === undefined) return into;
  if (Array.isArray(value))
    return value.map((one, index) => (index === Number(step) ? changed(one, rest, into) : one));
  return { ...(value as object), [step]: changed((value as Record<string, unknown>)[step], rest, into) };
}

const oddBody = (example: unknown) => {
  const places = placesOf(example);
  const change = fc.tuple(fc.constantFrom(...places), odd);
  return fc.array(change, { minLength: 1, maxLength: 3 }).map((changes) =>
    changes.reduce((body, [place, into]) => {
      // An earlier change may have taken the place away.
      try {
        return changed(body, place, into);
      } catch {
        return body;
      }
    }, example),
  );
};

const withBody = endpoints.filter(({ body }) => body !== undefined);

describe("whatever is sent", () => {
  it.each(withBody.map((endpoint) => [endpoint.path, endpoint] as const))(
    "%s answers with what it describes or says what is wrong",
    async (path, { example }) => {
      const call = apiCaller(await insertToken(shop.scopes.owner, path, "write"));
      const here = path.replace(/\{(\w+)\}/g, (_, name: string) => ids[name]!);
      const seen = new Set<number>();
      await fc.assert(
        fc.asyncProperty(oddBody(example), async (body) => {
          const { status, body: answer } = await call("POST", here, { body });
          seen.add(status);
          expect(status, JSON.stringify(answer)).toBeLessThan(429);
          if (status === 422) expect(answer.errors.length).toBeGreaterThan(0);
        }),
        { numRuns: 60 },
      );
      expect(seen).toContain(422);
    },
    60_000,
  );

  it("is refused with 400 or 422 where it is no text of JSON at all", async () => {
    const call = apiCaller(shop.tokens.owner);
    await fc.assert(
      fc.asyncProperty(fc.string({ unit: "binary" }), async (body) => {
        const { status } = await call("POST", "/calc/convert", { body });
        expect([400, 422]).toContain(status);
      }),
      { numRuns: 200 },
    );
  });

  it("stands in a query without harm", async () => {
    const call = apiCaller(shop.tokens.tuner);
    await fc.assert(
      fc.asyncProperty(fc.webQueryParameters(), async (query) => {
        const { status } = await call("GET", `/engines?${query}`);
        expect([200, 422]).toContain(status);
      }),
      { numRuns: 200 },
    );
  });
});
