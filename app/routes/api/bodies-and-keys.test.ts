import { beforeAll, describe, expect, it } from "vitest";
import { type ApiCaller, apiCaller } from "#test/support/api";
import { engineBody } from "#test/support/api-bodies";
import { openShopOfTests, type ShopOfTests } from "#test/support/shop-of-tests";
import { claimKey } from "~/models/idempotency.server";
import { mostBytes } from "./frame/read-json";

let shop: ShopOfTests;
let call: ApiCaller;

beforeAll(async () => {
  shop = await openShopOfTests();
  call = apiCaller(shop.tokens.owner);
});

describe("a body", () => {
  it("that is no JSON is 400", async () => {
    for (const body of ["{", "", "{'a': 1}", "\u0000", "[1,]"]) {
      const { status, body: problem } = await call("POST", "/engines", { body });
      expect([body, status, problem.code]).toEqual([body, 400, "broken-json"]);
    }
  });

  it("that is not declared as JSON in UTF-8 is 415", async () => {
    const types = ["text/plain", "application/x-www-form-urlencoded", "application/json; charset=latin1", ""];
    for (const type of types) {
      const { status } = await call("POST", "/engines", { body: "{}", headers: { "Content-Type": type } });
      expect([type, status]).toEqual([type, 415]);
    }
    const utf8 = { body: "{}", headers: { "Content-Type": "Application/JSON; Charset=UTF-8" } };
    expect((await call("POST", "/engines", utf8)).status).toBe(422);
    const packed = { body: "{}", headers: { "Content-Encoding": "gzip" } };
    expect((await call("POST", "/engines", packed)).status).toBe(415);
  });

  it("over a megabyte is 413, and one of a megabyte is read", async () => {
    const filler = (bytes: number) => `{"name":"${"x".repeat(bytes - 11)}"}`;
    expect((await call("POST", "/engines", { body: filler(mostBytes + 1) })).status).toBe(413);
    expect((await call("POST", "/engines", { body: filler(mostBytes) })).status).toBe(422);
  });

  it("that names no field it should, or one that is not there, is 422 with each error's place", async () => {
    const { layout, bore, ...rest } = engineBody();
    const body = { ...rest, layout: { ...layout, cylinders: 2.5, form: "W" }, stroke: "58.2", colour: "red" };
    const { status, headers, body: problem } = await call("POST", "/engines", { body });
    expect(bore).toBeDefined();
    expect(status).toBe(422);
    expect(headers.get("Content-Type")).toBe("application/problem+json");
    const errors = problem.errors.map(({ path, code }: { path: string; code: string }) => `${path} ${code}`);
    expect(errors).toEqual([
      "layout.form not-one-of-these",
      "layout.cylinders wrong-type",
      "bore missing",
      "stroke no-unit",
      " unknown-field",
    ]);
    expect(problem.errors.every(({ message }: { message: string }) => message.endsWith("."))).toBe(true);
  });

  it("with a bare number where a unit is needed is 422", async () => {
    const { body } = await call("POST", "/engines", { body: { ...engineBody(), bore: 81 } });
    expect(body.errors).toMatchObject([{ path: "bore", code: "no-unit" }]);
  });
});

describe("an address", () => {
  it("that the API does not have is 404, with a method that it does not take 405", async () => {
    expect((await call("GET", "/nothing")).body).toMatchObject({ status: 404, code: "no-such-call" });
    expect((await call("GET", "/parts")).status).toBe(404);
    const { status, headers } = await call("DELETE", "/engines");
    expect([status, headers.get("Allow")]).toEqual([405, "GET, HEAD, POST, OPTIONS"]);
  });

  it("tells its methods to OPTIONS", async () => {
    const { status, headers } = await call("OPTIONS", "/health");
    expect([status, headers.get("Allow")]).toEqual([204, "GET, HEAD, OPTIONS"]);
  });

  it("with a query that the call does not have is 422", async () => {
    expect((await call("GET", "/engines?unit=metric")).body.errors).toMatchObject([
      { code: "unknown-field" },
    ]);
    expect((await call("GET", "/engines?units=cubits")).body.errors).toMatchObject([{ path: "units" }]);
    expect((await call("GET", "/engines?limit=0")).body.errors).toMatchObject([{ path: "limit" }]);
  });

  it("answers nothing that another site's page could read as its own", async () => {
    const { headers } = await call("GET", "/engines");
    expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(headers.get("Cache-Control")).toBe("no-store");
    expect(headers.get("Access-Control-Allow-Origin")).toBeNull();
  });
});

describe("an Idempotency-Key", () => {
  const keyed = (key: string, body: unknown) => ({ body, headers: { "Idempotency-Key": key } });
  const engines = async () => (await call("GET", "/engines")).body.items.length;

  it("gets the first answer again, and the work is done once", async () => {
    const before = await engines();
    const body = engineBody("Sent twice");
    const first = await call("POST", "/engines", keyed("key-1", body));
    const again = await call("POST", "/engines", keyed("key-1", body));
    expect(first.status).toBe(201);
    expect([again.status, again.body]).toEqual([first.status, first.body]);
    expect(await engines()).toBe(before + 1);
  });

  it("gets a refusal again too", async () => {
    const body = engineBody("Sent twice");
    const first = await call("POST", "/engines", keyed("key-2", body));
    expect([first.status, first.body.code]).toEqual([409, "name-taken"]);
    const again = await call("POST", "/engines", keyed("key-2", body));
    expect([again.status, again.body]).toEqual([409, first.body]);
    expect(again.headers.get("Content-Type")).toBe("application/problem+json");
  });

  it("with another body or another address is 409", async () => {
    const other = await call("POST", "/engines", keyed("key-1", engineBody("Another")));
    expect([other.status, other.body.code]).toEqual([409, "key-used"]);
    const elsewhere = await call(
      "POST",
      "/oils",
      keyed("key-1", { name: "Oil", kv40: "100 cSt", kv100: "12 cSt" }),
    );
    expect([elsewhere.status, elsewhere.body.code]).toEqual([409, "key-used"]);
  });

  it("is each person's own", async () => {
    const builder = apiCaller(shop.tokens.builder);
    expect((await builder("POST", "/engines", keyed("key-1", engineBody("The builder's")))).status).toBe(201);
  });

  it("does the work once for requests at the same time", async () => {
    const before = await engines();
    const body = engineBody("Sent at once");
    const answers = await Promise.all(
      Array.from({ length: 8 }, () => call("POST", "/engines", keyed("key-3", body))),
    );
    const statuses = answers.map(({ status }) => status);
    expect(statuses.filter((status) => status === 201).length).toBeGreaterThanOrEqual(1);
    for (const { status, body: answer } of answers) {
      if (status !== 201) expect([status, answer.code]).toEqual([409, "key-in-progress"]);
    }
    expect(await engines()).toBe(before + 1);
  });

  it("whose first request never got an answer is 409 until it is forgotten", async () => {
    const { createHash } = await import("node:crypto");
    const body = JSON.stringify(engineBody("Broken off"));
    const hash = createHash("sha256").update(`POST /api/v1/engines\n${body}`).digest("hex");
    await claimKey(shop.scopes.owner, "key-4", hash);
    const { status, body: problem } = await call("POST", "/engines", keyed("key-4", body));
    expect([status, problem.code]).toEqual([409, "key-in-progress"]);
  });

  it("that was sent with a body that is not valid can be used again", async () => {
    expect((await call("POST", "/engines", keyed("key-5", {}))).status).toBe(422);
    expect((await call("POST", "/engines", keyed("key-5", engineBody("Mended")))).status).toBe(201);
  });

  it("that is none is 400", async () => {
    for (const key of ["", "a b", "x".repeat(201)]) {
      expect((await call("POST", "/engines", keyed(key, engineBody("Never")))).status).toBe(400);
    }
  });
});
