import { beforeAll, describe, expect, it } from "vitest";
import { apiCaller } from "#test/support/api";
import { engineBody } from "#test/support/api-bodies";
import { openShopOfTests, type ShopOfTests } from "#test/support/shop-of-tests";
import { may, permissions, type Role, roles } from "~/access/permissions";
import { assignEngine } from "~/models/engine.server";
import { insertToken, listTokens, revokeToken } from "~/models/token.server";
import { endpoints } from "./endpoints";

let shop: ShopOfTests;
let engine: { id: string; fits: { id: string }[] };
let build: string;

beforeAll(async () => {
  shop = await openShopOfTests();
  const call = apiCaller(shop.tokens.owner);
  engine = (await call("POST", "/engines", { body: engineBody() })).body;
  build = (await call("POST", `/engines/${engine.id}/builds`, { body: {} })).body.id;
});

describe("who has no valid token", () => {
  it("is asked for one, as RFC 6750 says", async () => {
    const { status, headers, body } = await apiCaller()("GET", "/engines");
    expect(status).toBe(401);
    expect(headers.get("WWW-Authenticate")).toBe('Bearer realm="Tenthbook"');
    expect(headers.get("Content-Type")).toBe("application/problem+json");
    expect(body).toMatchObject({ status: 401, code: "no-token" });
  });

  it.each([
    ["one that nobody has", "tb_nobody"],
    ["an empty one", ""],
    ["one with a space", "a b"],
    ["one of 5000 characters", "x".repeat(5000)],
  ])("is refused with %s", async (_, token) => {
    const { status, headers } = await apiCaller()("GET", "/engines", {
      headers: { Authorization: `Bearer ${token}` },
    });
    expect(status).toBe(401);
    expect(headers.get("WWW-Authenticate")).toContain('error="invalid_token"');
  });

  it("cannot sign in with a cookie or a name and password instead", async () => {
    const headers = { Authorization: `Basic ${btoa("owner:of the tests")}`, Cookie: "tenthbook=1" };
    expect((await apiCaller()("GET", "/engines", { headers })).status).toBe(401);
  });

  it("may only ask whether the program answers, and for the description", async () => {
    expect((await apiCaller()("GET", "/health")).body).toEqual({ status: "ok" });
    expect((await apiCaller()("GET", "/openapi.json")).status).toBe(200);
    const open = endpoints.filter((endpoint) => endpoint.who === "everyone").map((endpoint) => endpoint.path);
    expect(open).toEqual(["/health", "/openapi.json"]);
  });

  it("has nothing left once its token is revoked", async () => {
    const scope = shop.scopes.builder;
    const token = await insertToken(scope, "to be revoked", "write");
    expect((await apiCaller(token)("GET", "/engines")).status).toBe(200);
    const made = (await listTokens(scope)).find(({ name }) => name === "to be revoked");
    await revokeToken(scope, made!.id);
    expect((await apiCaller(token)("GET", "/engines")).status).toBe(401);
  });
});

describe("a token that may only read", () => {
  it("reads and reckons", async () => {
    const call = apiCaller(shop.readToken);
    expect((await call("GET", "/engines")).status).toBe(200);
    expect((await call("GET", `/builds/${build}`)).status).toBe(200);
  });

  it("is refused every write, before its body is looked at", async () => {
    const call = apiCaller(shop.readToken);
    const writing = endpoints.filter(({ method, who }) => method === "POST" && who !== "token");
    expect(writing.length).toBeGreaterThan(5);
    for (const { path } of writing) {
      const { status, body, headers } = await call("POST", filled(path), { body: "{" });
      expect([path, status, body.code]).toEqual([path, 403, "read-only-token"]);
      expect(headers.get("WWW-Authenticate")).toContain('error="insufficient_scope"');
    }
  });
});

const filled = (path: string) =>
  path.replace("{engine}", engine.id).replace("{build}", build).replace("{fit}", engine.fits[0]!.id);

describe.each(roles)("a %s", (role: Role) => {
  it("is refused exactly what the table of permissions does not give", async () => {
    if (role === "crew-chief" || role === "viewer") {
      await assignEngine(shop.scopes.owner, engine.id, shop.scopes[role].personId);
    }
    const call = apiCaller(shop.tokens[role]);
    for (const { method, path, who } of endpoints) {
      if (!(who in permissions)) continue;
      // An empty body is no answer's body: who may do it gets past the door and is told so.
      const { status } = await call(method, filled(path), method === "POST" ? { body: "[]" } : {});
      const allowed = may(role, who as keyof typeof permissions);
      expect([method, path, status === 403], `${method} ${path} gave ${status}`).toEqual([
        method,
        path,
        !allowed,
      ]);
    }
  });

  it("takes a build only to the states that its role signs", async () => {
    const call = apiCaller(shop.tokens[role]);
    const allowed = {
      assembled: may(role, "sheet:sign"),
      running: may(role, "run:write"),
      "torn-down": may(role, "build:write"),
      reviewed: may(role, "proposal:sign"),
    };
    for (const [to, isAllowed] of Object.entries(allowed)) {
      // No one has seen version 99, so that nothing moves whoever asks.
      const { status } = await call("POST", `/builds/${build}/state`, { body: { to, version: 99 } });
      expect([to, status]).toEqual([to, isAllowed ? 409 : 403]);
    }
  });
});

describe("another shop", () => {
  it("is answered exactly as for ids that nobody has", async () => {
    const call = apiCaller(shop.otherToken);
    const nowhere = "0".repeat(32);
    const paths = endpoints.filter(({ path }) => path.includes("{"));
    for (const { method, path, example } of paths) {
      const sent = method === "POST" ? { body: example ?? "" } : {};
      const foreign = await call(method, filled(path), sent);
      const missing = await call(method, path.replaceAll(/\{\w+\}/g, nowhere), sent);
      expect([path, foreign.status]).toEqual([path, 404]);
      expect(foreign.body).toEqual(missing.body);
    }
  });

  it("sees none of this shop's engines, oils or gauges in its lists", async () => {
    const call = apiCaller(shop.otherToken);
    for (const path of ["/engines", "/oils", "/gauges"]) {
      expect((await call("GET", path)).body).toEqual({ items: [], next: null });
    }
  });
});

describe("a crew chief", () => {
  it("knows nothing of an engine that is not theirs", async () => {
    const call = apiCaller(shop.tokens["crew-chief"]);
    const other = (await apiCaller(shop.tokens.owner)("POST", "/engines", { body: engineBody("Not theirs") }))
      .body;
    expect((await call("GET", `/engines/${other.id}`)).status).toBe(404);
    const names = (await call("GET", "/engines")).body.items.map((item: { name: string }) => item.name);
    expect(names).not.toContain("Not theirs");
  });
});
