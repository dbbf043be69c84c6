import { afterEach, beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { openShopOfTests, type ShopOfTests } from "#test/support/shop-of-tests";
import { EngineeringError } from "~/engineering/engineering-error";
import { conflict, invalid, notFound, Refusal } from "~/models/refusal";
import { answerCall } from "./answer.server";
import { endpoint } from "./endpoint";

let shop: ShopOfTests;

beforeAll(async () => {
  shop = await openShopOfTests();
});

/** What a call answers whose work ends in this error, or with this value. */
async function answerOf(work: () => unknown, who: "token" | "engine:write" = "token", key?: string) {
  const call = endpoint({
    method: "POST",
    path: "/trial",
    who,
    title: "A trial",
    body: z.strictObject({}),
    answer: z.object({ value: z.number() }),
    handle: async () => (await work()) as { value: number },
  });
  const request = new Request("http://localhost/api/v1/trial", {
    method: "POST",
    headers: {
      Authorization: `Bearer ${shop.tokens.owner}`,
      "Content-Type": "application/json",
      ...(key ? { "Idempotency-Key": key } : {}),
    },
    body: "{}",
  });
  const response = await answerCall([call], request, "1a2b3c4d");
  return { status: response.status, body: await response.json() };
}

const thrown = (error: unknown) => () => {
  throw error;
};

describe("what goes wrong in a call", () => {
  it.each([
    [notFound("engine"), 404, "not-found"],
    [conflict("lost-update", "Someone was faster."), 409, "lost-update"],
    [invalid({ path: "a", code: "bad", message: "It is bad." }), 422, "bad"],
    [new Refusal("not-allowed", "not-yours", "This is not yours."), 403, "not-yours"],
  ])("is answered by its kind: %s", async (error, status, code) => {
    expect(await answerOf(thrown(error))).toMatchObject({
      status,
      body: { status, code, detail: error.message },
    });
  });

  it("says where, as the engineering core named it", async () => {
    const error = new EngineeringError("outside-range", "points[1].temperatureC", "It is too hot.");
    const { status, body } = await answerOf(thrown(error));
    expect(status).toBe(422);
    expect(body.errors).toEqual([
      { path: "points[1].temperature", code: "outside-range", message: "It is too hot." },
    ]);
  });
});

describe("a failure of the program", () => {
  let logged: ReturnType<typeof vi.spyOn>;

  beforeEach(() => {
    logged = vi.spyOn(console, "error").mockImplementation(() => undefined);
  });

  afterEach(() => {
    logged.mockClear();
  });

  it("is answered with a reference that the log has, and nothing of what broke", async () => {
    const { status, body } = await answerOf(thrown(new Error("SELECT secret FROM person")));
    expect([status, body.reference]).toEqual([500, "1a2b3c4d"]);
    expect(JSON.stringify(body)).not.toContain("secret");
    expect(logged).toHaveBeenCalledWith(expect.stringContaining("1a2b3c4d"), expect.any(Error));
  });

  it("is what an answer becomes that is not as described: no NaN goes out", async () => {
    expect((await answerOf(() => ({ value: Number.NaN }))).status).toBe(500);
    expect((await answerOf(() => ({ value: "1" }))).status).toBe(500);
  });

  // SQLite's result codes, https://www.sqlite.org/rescode.html
  it.each([
    ["SQLITE_FULL", 507],
    ["SQLITE_BUSY", 503],
    ["SQLITE_CORRUPT", 503],
  ])("of the machine under it, %s, is said in a sentence", async (code, status) => {
    const { status: found, body } = await answerOf(thrown(Object.assign(new Error("disk"), { code })));
    expect([found, body.code]).toEqual([status, "machine-trouble"]);
  });

  it("gives the Idempotency-Key back, so that the same request can be sent again", async () => {
    expect((await answerOf(thrown(new Error("once")), "engine:write", "key-a")).status).toBe(500);
    const again = await answerOf(() => ({ value: 1 }), "engine:write", "key-a");
    expect(again).toEqual({ status: 200, body: { value: 1 } });
    const third = await answerOf(thrown(new Error("never asked")), "engine:write", "key-a");
    expect(third).toEqual(again);
  });
});

it("an answer leaves out what nobody described", async () => {
  expect((await answerOf(() => ({ value: 1, passwordHash: "x" }))).body).toEqual({ value: 1 });
});
