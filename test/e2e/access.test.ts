import { connect } from "node:net";
import { afterAll, beforeAll, expect, test } from "vitest";
import { demoPassword } from "#database/demo/people";
import { type RunningServer, startServer } from "#test/support/server";
import { may, type Permission, permissions, type Role, roles } from "~/access/permissions";

let server: RunningServer;
const cookies = new Map<string, string>();

const emails: Record<Role, string> = {
  owner: "owner@example.test",
  builder: "builder@example.test",
  "crew-chief": "chief@example.test",
  tuner: "tuner@example.test",
  viewer: "viewer@example.test",
};

beforeAll(async () => {
  server = await startServer();
  for (const email of [...Object.values(emails), "other@example.test"])
    cookies.set(email, await signIn(email));
});

afterAll(() => server?.stop());

async function signIn(email: string, password = demoPassword): Promise<string> {
  const response = await post("/sign-in", { email, password });
  expect(response.status, email).toBe(302);
  return response.headers.get("set-cookie")?.split(";")[0] ?? "";
}

function get(path: string, cookie = ""): Promise<Response> {
  return fetch(server.address + path, { headers: { Cookie: cookie }, redirect: "manual" });
}

function post(
  path: string,
  fields: Record<string, string>,
  cookie = "",
  headers: Record<string, string> = {},
) {
  return fetch(server.address + path, {
    method: "POST",
    body: new URLSearchParams(fields),
    headers: { Cookie: cookie, Origin: server.address, ...headers },
    redirect: "manual",
  });
}

/** The addresses of the engine, its first fit and its latest build, as a person's pages link to them. */
async function addressesOf(email: string, engine: string) {
  const cookie = cookies.get(email)!;
  const engines = await (await get("/engines", cookie)).text();
  const engineId = new RegExp(`href="/engines/([0-9a-f]{32})"[^>]*>${engine}<`).exec(engines)?.[1];
  if (!engineId) throw new Error(`${email} sees no ${engine}`);
  const page = await (await get(`/engines/${engineId}`, cookie)).text();
  const fitId = /\/fits\/([0-9a-f]{32})/.exec(page)?.[1];
  const buildIds = [...page.matchAll(/href="\/builds\/([0-9a-f]{32})"/g)].map((match) => match[1]);
  return {
    engine: `/engines/${engineId}`,
    fit: `/engines/${engineId}/fits/${fitId}`,
    build: `/builds/${buildIds[0]}`,
  };
}

/** Every page and who may open it; pages of an engine also ask whether the engine is theirs. */
const pages: [string, Permission | "signed in"][] = [
  ["/", "signed in"],
  ["/engines", "engine:read"],
  ["/engines/new", "engine:write"],
  ["/oils", "oil:read"],
  ["/oils/new", "oil:write"],
  ["/gauges", "gauge:read"],
  ["/gauges/new", "gauge:write"],
  ["/calculators", "signed in"],
  ["/calculators/units", "signed in"],
  ["/calculators/clearance", "signed in"],
  ["/shop", "shop:read"],
  ["/account", "signed in"],
];

test.each(pages)("%s opens for whom the permission table says", async (path, permission) => {
  const signedOut = await get(path);
  expect(signedOut.status).toBe(302);
  expect(signedOut.headers.get("location")).toMatch(/^\/sign-in/);
  for (const role of roles) {
    const { status } = await get(path, cookies.get(emails[role]));
    const allowed = permission === "signed in" || may(role, permission);
    expect(status, role).toBe(allowed ? 200 : 403);
  }
});

test("an engine's pages open for its shop, and of the crew chiefs and viewers for those it is assigned to", async () => {
  const engine12 = await addressesOf("owner@example.test", "Engine 12");
  const engine9 = await addressesOf("owner@example.test", "Engine 9");
  const seen = async (paths: Awaited<ReturnType<typeof addressesOf>>, email: string) => {
    const list = [paths.engine, paths.fit, paths.build, `${paths.build}/sheet`, `${paths.build}/runs`];
    return Promise.all(list.map(async (path) => (await get(path, cookies.get(email))).status));
  };
  for (const role of ["owner", "builder", "tuner", "crew-chief"] as const) {
    expect(await seen(engine12, emails[role]), role).toEqual([200, 200, 200, 200, 200]);
  }
  expect(await seen(engine9, emails["crew-chief"])).toEqual([404, 404, 404, 404, 404]);
  expect(await seen(engine9, emails.viewer)).toEqual([404, 404, 404, 404, 404]);
  // Another shop's person learns nothing: what is there answers like what is not.
  expect(await seen(engine12, "other@example.test")).toEqual([404, 404, 404, 404, 404]);
  const missing = "0".repeat(32);
  const nothing = {
    engine: `/engines/${missing}`,
    fit: `/engines/${missing}/fits/${missing}`,
    build: `/builds/${missing}`,
  };
  expect(await seen(nothing, emails.owner)).toEqual([404, 404, 404, 404, 404]);
});

test("a change is refused by role, by shop, signed out, and from another site", async () => {
  const { engine, build } = await addressesOf("owner@example.test", "Engine 12");
  const changes: [string, Record<string, string>, Permission][] = [
    [engine, { intent: "start", note: "" }, "build:write"],
    [engine, { intent: "assign", personId: "0".repeat(32) }, "shop:write"],
    [`${build}/sheet`, { intent: "entries", fit: "", entries: "[]" }, "reading:write"],
    [`${build}/runs`, { kind: "test" }, "run:write"],
    [`${build}/teardown`, { intent: "finding" }, "finding:write"],
    [`${build}/review`, { intent: "sign" }, "proposal:sign"],
    ["/oils/new", { name: "" }, "oil:write"],
    ["/gauges/new", { name: "" }, "gauge:write"],
    ["/engines/new", { name: "" }, "engine:write"],
    ["/shop", { version: "1" }, "shop:write"],
  ];
  for (const [path, fields, permission] of changes) {
    expect((await post(path, fields)).status, `signed out ${path}`).toBe(302);
    for (const role of roles) {
      const cookie = cookies.get(emails[role]);
      const { status } = await post(path, fields, cookie);
      // Who may gets as far as the form's own refusal or the engine's; who may not gets no further than 403.
      if (may(role, permission)) expect([200, 302, 400, 404, 409], `${role} ${path}`).toContain(status);
      else expect(status, `${role} ${path}`).toBe(403);
      for (const origin of ["https://elsewhere.example.test", "null", ""]) {
        const foreign = await post(path, fields, cookie, { Origin: origin });
        expect(foreign.status, `${role} ${path} from ${origin || "nowhere"}`).toBeGreaterThanOrEqual(400);
        expect(foreign.status).toBeLessThan(404);
      }
    }
    if (path !== "/oils/new" && path !== "/gauges/new" && path !== "/engines/new" && path !== "/shop") {
      expect((await post(path, fields, cookies.get("other@example.test"))).status, `other shop ${path}`).toBe(
        404,
      );
    }
  }
  expect(Object.keys(permissions).length).toBeGreaterThan(10);
});

test("signing out ends the session itself, not only the cookie", async () => {
  const cookie = await signIn("tuner@example.test");
  expect((await get("/oils", cookie)).status).toBe(200);
  expect((await post("/sign-out", {}, cookie)).status).toBe(302);
  expect((await get("/oils", cookie)).status).toBe(302);
});

test("the way back after signing in leads only to pages of ours", async () => {
  const credentials = { email: "tuner@example.test", password: demoPassword };
  const back = async (to: string) =>
    (await post(`/sign-in?back=${encodeURIComponent(to)}`, credentials)).headers.get("location");
  expect((await get("/oils?after=x")).headers.get("location")).toBe(
    `/sign-in?back=${encodeURIComponent("/oils?after=x")}`,
  );
  expect(await back("/oils?after=x")).toBe("/oils?after=x");
  for (const elsewhere of [
    "https://elsewhere.example.test",
    "//elsewhere.example.test",
    "/\\elsewhere.example.test",
  ]) {
    expect(await back(elsewhere)).toBe("/");
  }
});

test("a wrong password says the same as an unknown address, and too many tries have to wait", async () => {
  const attempt = async (email: string) => (await post("/sign-in", { email, password: "wrong" })).text();
  const sentence = "This e-mail address and password do not belong together.";
  expect(await attempt("builder@example.test")).toContain(sentence);
  expect(await attempt("nobody@example.test")).toContain(sentence);
  for (let tries = 0; tries < 8; tries++) await attempt("viewer@example.test");
  const throttled = await post("/sign-in", { email: "viewer@example.test", password: demoPassword });
  expect(throttled.status).toBe(429);
  // A stranger's tries keep the stranger out, and no one else: another person signs in from the same place.
  await signIn("builder@example.test");
});

test("cookies and headers are those of a guarded page", async () => {
  const response = await post("/sign-in", { email: "tuner@example.test", password: demoPassword });
  expect(response.headers.get("set-cookie")).toMatch(/HttpOnly; SameSite=Lax/);
  const page = await get("/", cookies.get("owner@example.test"));
  const policy = page.headers.get("content-security-policy") ?? "";
  expect(policy).toMatch(/script-src 'self' 'nonce-[A-Za-z0-9+/=]{22,}'/);
  expect(policy).not.toMatch(/script-src[^;]*unsafe-inline/);
  expect(page.headers.get("x-content-type-options")).toBe("nosniff");
  expect((await get("/no/such/page", cookies.get("owner@example.test"))).status).toBe(404);
});

test("a method nobody uses, a body without end and a form too large are answered, and the product goes on", async () => {
  const { hostname, port } = new URL(server.address);
  const answerTo = (head: string) =>
    new Promise<string>((resolve, reject) => {
      const socket = connect(Number(port), hostname === "localhost" ? "127.0.0.1" : hostname);
      let text = "";
      socket.on("data", (chunk) => {
        text += chunk;
      });
      socket.on("close", () => resolve(text));
      socket.on("error", reject);
      socket.write(`${head}\r\nHost: ${hostname}:${port}\r\nConnection: close\r\n\r\n`);
    });
  expect(await answerTo("TRACE / HTTP/1.1")).toMatch(/^HTTP\/1.1 501/);
  expect(await answerTo("POST /sign-in HTTP/1.1\r\nTransfer-Encoding: chunked")).toMatch(/^HTTP\/1.1 411/);
  expect(await answerTo("POST /sign-in HTTP/1.1\r\nContent-Length: 99999999")).toMatch(/^HTTP\/1.1 413/);
  expect((await get("/sign-in")).status).toBe(200);
});

test("the API answers a stranger in its own words, not as a page", async () => {
  const response = await fetch(`${server.address}/api/v1/calc/convert`, { method: "POST", body: "{}" });
  expect(response.status).toBe(401);
  expect(response.headers.get("content-type")).toContain("application/problem+json");
});
