import { beforeAll, describe, expect, it } from "vitest";
import { type ApiAnswer, type ApiCaller, apiCaller } from "#test/support/api";
import { engineBody } from "#test/support/api-bodies";
import { openShopOfTests, type ShopOfTests } from "#test/support/shop-of-tests";
import { assignEngine } from "~/models/engine.server";

let shop: ShopOfTests;
let builder: ApiCaller;
let chief: ApiCaller;
let tuner: ApiCaller;
let engine: string;
let fit: string;

beforeAll(async () => {
  shop = await openShopOfTests();
  builder = apiCaller(shop.tokens.builder);
  chief = apiCaller(shop.tokens["crew-chief"]);
  tuner = apiCaller(shop.tokens.tuner);
});

const made = async (answer: Promise<ApiAnswer>, status = 201) => {
  const { status: found, body } = await answer;
  expect([found, body.errors ?? body.detail]).toEqual([status, undefined]);
  return body;
};

/** Two big ends measured front and rear: bores as given in the units of three people, journals at 2.1000 in. */
const sheet = (bores: [front: string, rear: string][], journal = "2.1000 in") =>
  bores.flatMap(([front, rear], index) => [
    ...(["front", "rear"] as const).flatMap((plane) =>
      ["vertical", "plus45", "minus45"].map((axis) => ({
        fit,
        position: index + 1,
        feature: "bore",
        plane,
        axis,
        value: plane === "front" ? front : rear,
        temperature: "20 degC",
      })),
    ),
    ...(["front", "rear"] as const).flatMap((plane) =>
      ["a", "b"].map((axis) => ({
        fit,
        position: index + 1,
        feature: "journal",
        plane,
        axis,
        value: journal,
        temperature: "68 degF",
      })),
    ),
  ]);

const state = (build: string, to: string, version: number, call = builder) =>
  call("POST", `/builds/${build}/state`, { body: { to, version } });

describe.sequential("the loop, by scripts alone", () => {
  let build: string;
  let gauge: string;

  it("begins with an oil, a gauge, and an engine of one fit", async () => {
    await made(
      tuner("POST", "/oils", {
        body: { name: "Oil A", kv40: "160 cSt", kv100: "18.5 cSt", density15: "0.87 g/cm3" },
      }),
    );
    const { items } = (await builder("GET", "/oils?units=metric")).body;
    expect(items).toMatchObject([
      { name: "Oil A", kv100: { si: 18.5e-6, text: "18.50 cSt" }, density15: { si: 870 }, hths: null },
    ]);
    const figure = { resolution: "0.00002 in", calibration: "0.00001 in", repeatability: "0.00001 in" };
    gauge = (
      await made(builder("POST", "/gauges", { body: { name: "Gauge 1", kind: "bore gauge", ...figure } }))
    ).id;
    expect((await builder("GET", `/gauges/${gauge}`)).body.resolution).toEqual({
      si: 5.08e-7,
      text: "20.0 µin",
    });
    const answer = await made(builder("POST", "/engines", { body: engineBody() }));
    engine = answer.id;
    fit = answer.fits[0].id;
    expect(answer.fits).toMatchObject([{ kind: "big-end", positions: [1, 2], usual: { text: "0.0025 in" } }]);
    expect(answer.bore.si).toBe(0.081);
    await assignEngine(shop.scopes.owner, engine, shop.scopes["crew-chief"].personId);
  });

  it("starts a build at the usual clearance, on an oil by its name", async () => {
    const answer = await made(builder("POST", `/engines/${engine}/builds`, { body: { oil: "Oil A" } }));
    build = answer.id;
    expect(answer).toMatchObject({ number: 1, state: "measuring", oil: { name: "Oil A" } });
    // The window is three tenths either side of the aim (common practice), inside the hard limits.
    expect(answer.targets).toMatchObject([
      {
        fit,
        least: { text: "0.0022 in" },
        aim: { si: 0.0000635, text: "0.0025 in" },
        most: { text: "0.0028 in" },
      },
    ]);
    expect(answer.readings.assembly).toEqual({ due: 20, done: 0 });
    const again = await builder("POST", `/engines/${engine}/builds`, { body: {} });
    expect([again.status, again.body.code]).toEqual([409, "build-in-hand"]);
  });

  it("does not sign an empty sheet", async () => {
    expect((await state(build, "assembled", 1)).body.code).toBe("nothing-measured");
  });

  it("takes readings in thou, mm and microns, each by itself", async () => {
    const readings = sheet([
      ["2102.5 thou", "53.4035 mm"],
      ["53403.5 um", "2.1025 in"],
    ]);
    const { results } = await made(
      builder("POST", `/builds/${build}/readings`, {
        body: {
          stage: "assembly",
          readings: [...readings, { fit, value: "2.1 in" }, 7, { ...readings[0], value: "2.1025" }],
        },
      }),
      200,
    );
    expect(results.map(({ status }: { status: string }) => status)).toEqual([
      ...readings.map(() => "accepted"),
      "refused",
      "refused",
      "refused",
    ]);
    expect(results[22]).toMatchObject({ index: 22, errors: [{ path: "value", code: "no-unit" }] });
    const listed = (await builder("GET", `/builds/${build}/readings?stage=assembly&units=metric`)).body;
    expect(listed.items).toHaveLength(20);
    expect(listed.next).toBeNull();
    const [first] = listed.items;
    expect(first).toMatchObject({
      position: 1,
      typed: "2102.5 thou",
      value: { si: 0.0534035, text: "53.4035 mm" },
    });
  });

  it("warns of a slip, supersedes, and says what could not be measured", async () => {
    const [first] = sheet([["2.1205 in", "2.1025 in"]]);
    const post = (reading: object) =>
      made(
        builder("POST", `/builds/${build}/readings`, { body: { stage: "assembly", readings: [reading] } }),
        200,
      );
    const slip = (await post(first!)).results[0];
    expect(slip.status).toBe("accepted");
    expect(slip.warnings[0].message).toMatch(/^2\.1205 in looks like 2\.1025 in/);
    const { value: _, ...place } = first!;
    await post({ ...place, state: "not-accessible", reason: "the rod is still on" });
    await post({ ...first!, value: "2.1025 in", gauge });
    const { items } = (await builder("GET", `/builds/${build}/readings`)).body;
    const here = items.filter(
      (item: { position: number; plane: string; axis: string; feature: string }) =>
        item.position === 1 && item.plane === "front" && item.axis === "vertical" && item.feature === "bore",
    );
    expect(here.map((item: { state: string; superseded: boolean }) => [item.state, item.superseded])).toEqual(
      [
        ["measured", true],
        ["measured", true],
        ["not-accessible", true],
        ["measured", false],
      ],
    );
    expect(here[1].warnings).toHaveLength(1);
    expect(here[3].gauge).toBe(gauge);
    expect((await builder("GET", `/builds/${build}`)).body.readings.assembly).toEqual({ due: 20, done: 20 });
  });

  it("refuses what the engine, the shop and the day do not have, by its index", async () => {
    const [first] = sheet([["2.1025 in", "2.1025 in"]]);
    const readings = [
      { ...first!, position: 3 },
      { ...first!, fit: "0".repeat(32) },
      { ...first!, gauge: "0".repeat(32) },
      { ...first!, temperature: "300 degC" },
      { ...first!, value: "-2 in" },
      { ...first!, repeat: 21 },
    ];
    const { results } = await made(
      builder("POST", `/builds/${build}/readings`, { body: { stage: "assembly", readings } }),
      200,
    );
    expect(results.map(({ errors }: { errors: { path: string }[] }) => errors[0]!.path)).toEqual([
      "position",
      "fit",
      "gauge",
      "temperature",
      "value",
      "repeat",
    ]);
  });

  it("does not take the teardown's readings before the teardown", async () => {
    const body = { stage: "teardown", readings: sheet([["2.1025 in", "2.1025 in"]]) };
    const { status, body: problem } = await builder("POST", `/builds/${build}/readings`, { body });
    expect([status, problem.code]).toEqual([409, "not-torn-down"]);
  });

  it("signs the sheet, after which it is frozen", async () => {
    expect((await state(build, "running", 1)).body).toMatchObject({ status: 409, code: "step-not-allowed" });
    expect((await state(build, "assembled", 7)).body).toMatchObject({ status: 409, code: "lost-update" });
    const assembled = await made(state(build, "assembled", 1), 200);
    expect(assembled).toMatchObject({ state: "assembled", version: 2, signatures: [{ stage: "assembly" }] });
    const late = sheet([["2.1030 in", "2.1030 in"]]).slice(0, 1);
    const { results } = await made(
      builder("POST", `/builds/${build}/readings`, { body: { stage: "assembly", readings: late } }),
      200,
    );
    expect(results).toMatchObject([{ status: "refused", errors: [{ code: "sheet-signed" }] }]);
  });

  it("runs, and refuses a run of tomorrow, of negative hours, or with oil at 300 °C", async () => {
    const run = {
      kind: "dyno",
      started: "2026-05-30T16:10:00+02:00",
      hours: 3.5,
      oil: "Oil A",
      oilTemperature: "221 degF",
      topSpeed: "9150 rpm",
      pressureIdle: "32 psi",
      pressureAtSpeed: { pressure: "4.7 bar", speed: "8500 rpm" },
      events: ["pressure-dip", "pressure-dip"],
    };
    const post = (change: object) => tuner("POST", `/builds/${build}/runs`, { body: { ...run, ...change } });
    const tomorrow = new Date(Date.now() + 86_400_000).toISOString();
    const bad: [object, string, string][] = [
      [{ started: tomorrow }, "started", "in-the-future"],
      [{ started: "2026-05-30T16:10:00" }, "started", "wrong-type"],
      [{ hours: -1 }, "hours", "too-small"],
      [{ oilTemperature: "300 degC" }, "oilTemperature", "out-of-range"],
      [{ oil: "Oil B" }, "oil", "unknown-oil"],
      [{ topSpeed: 9150 }, "topSpeed", "no-unit"],
    ];
    for (const [change, path, code] of bad) {
      const { status, body } = await post(change);
      expect([status, body.errors]).toEqual([422, [expect.objectContaining({ path, code })]]);
    }
    const answer = await made(post({}));
    expect(answer).toMatchObject({
      started: "2026-05-30T14:10:00.000Z",
      topSpeed: { text: "9150 rpm" },
      oilTemperature: { text: "105.0 °C" },
      pressureAtSpeed: { pressure: { si: 470_000 } },
      events: ["pressure-dip"],
    });
    const running = (await builder("GET", `/builds/${build}`)).body;
    expect([running.state, running.runs.length]).toEqual(["running", 1]);
  });

  it("is torn down, measured again and graded", async () => {
    const { version } = (await builder("GET", `/builds/${build}`)).body;
    await made(state(build, "torn-down", version), 200);
    const worn = sheet(
      [
        ["2.10252 in", "2.10252 in"],
        ["2.10252 in", "2.10252 in"],
      ],
      "2.09999 in",
    );
    const { results } = await made(
      builder("POST", `/builds/${build}/readings`, { body: { stage: "teardown", readings: worn } }),
      200,
    );
    expect(results.every(({ status }: { status: string }) => status === "accepted")).toBe(true);
    for (const position of [1, 2]) {
      const finding = { fit, position, grade: 1, damage: "polishing", note: "Even, no loose metal." };
      const answer = await made(builder("POST", `/builds/${build}/findings`, { body: finding }));
      expect(answer).toMatchObject({ ...finding, coatingState: null });
    }
    const nowhere = await builder("POST", `/builds/${build}/findings`, {
      body: { fit, position: 9, grade: 1 },
    });
    expect(nowhere.body.errors).toMatchObject([{ path: "position", code: "unknown-position" }]);
  });

  // By hand: built at 2.1025 − 2.1000, come down at 2.10252 − 2.09999.
  it("gives a history that the calculator takes as it is, with the same answer as the stored proposal", async () => {
    const history = await made(builder("GET", `/engines/${engine}/fits/${fit}/history`), 200);
    const [iteration] = history.iterations;
    expect(iteration).toMatchObject({
      build: 1,
      hours: 3.5,
      target: { text: "0.0025 in" },
      events: ["pressure-dip"],
    });
    expect(iteration.oil).toMatchObject({ name: "Oil A", temperature: { text: "105.0 °C" } });
    expect(iteration.positions).toHaveLength(2);
    for (const { assembled, tornDown } of iteration.positions) {
      expect(assembled.clearance.si).toBeCloseTo(0.0025 * 0.0254, 11);
      expect(tornDown.clearance.si).toBeCloseTo(0.00253 * 0.0254, 11);
    }
    const reckoned = await made(builder("POST", "/calc/next-step", { body: history }), 200);
    const stored = await made(builder("GET", `/engines/${engine}/fits/${fit}/next-step`), 200);
    expect(stored).toMatchObject({ version: 1, stale: false, signed: null, build: { id: build, number: 1 } });
    expect(reckoned.action).toBe(stored.action);
    expect(reckoned.target.si).toBeCloseTo(stored.target.si, 12);
    expect(stored.reasons.length).toBeGreaterThan(0);
    expect(stored.evidence.builds).toHaveLength(1);
  });

  it("knows a proposal to be stale once the evidence has changed, and works it out again", async () => {
    const path = `/engines/${engine}/fits/${fit}/next-step`;
    const finding = { fit, position: 2, grade: 2, damage: "scoring" };
    await made(builder("POST", `/builds/${build}/findings`, { body: finding }));
    expect((await builder("GET", path)).body).toMatchObject({ version: 1, stale: true });
    const sign = { decision: "accept", version: 1 };
    expect((await chief("POST", `${path}/sign`, { body: sign })).body).toMatchObject({
      status: 409,
      code: "stale",
    });
    expect(await made(builder("POST", path), 200)).toMatchObject({ version: 2, stale: false });
  });

  it("is signed by the engine's crew chief, who must give a reason for a change", async () => {
    const path = `/engines/${engine}/fits/${fit}/next-step/sign`;
    const change = { decision: "change", target: "24 tenths", version: 2 };
    expect((await builder("POST", path, { body: change })).status).toBe(403);
    expect((await chief("POST", path, { body: change })).body.errors).toMatchObject([{ path: "reason" }]);
    const outside = { ...change, target: "0.0040 in", reason: "just so" };
    expect((await chief("POST", path, { body: outside })).body.errors).toMatchObject([{ path: "target" }]);
    const signed = await made(chief("POST", path, { body: { ...change, reason: "Half the step." } }), 200);
    expect(signed).toMatchObject({
      decision: "change",
      target: { text: "0.0024 in" },
      person: "The crew-chief",
    });
    expect((await chief("POST", path, { body: { ...change, reason: "again" } })).body.code).toBe(
      "already-signed",
    );
  });

  it("is reviewed, and the next build aims at what was signed", async () => {
    const { version } = (await chief("GET", `/builds/${build}`)).body;
    expect((await state(build, "reviewed", version)).status).toBe(403);
    await made(state(build, "reviewed", version, chief), 200);
    const next = await made(builder("POST", `/engines/${engine}/builds`, { body: {} }));
    expect(next).toMatchObject({
      number: 2,
      state: "measuring",
      targets: [{ fit, aim: { text: "0.0024 in" } }],
    });
    const { builds } = (await builder("GET", `/engines/${engine}`)).body;
    expect(builds.map(({ number, state: at }: { number: number; state: string }) => [number, at])).toEqual([
      [2, "measuring"],
      [1, "reviewed"],
    ]);
  });
});

describe("lists in parts", () => {
  it("give every engine once, whatever the size of the parts", async () => {
    for (let count = 0; count < 6; count++) {
      await made(builder("POST", "/engines", { body: engineBody(`Engine ${count}`) }));
    }
    const whole = (await builder("GET", "/engines")).body.items.map(({ id }: { id: string }) => id);
    const parts: string[] = [];
    let next: string | null = "";
    while (next !== null) {
      const { body } = await builder("GET", `/engines?limit=2${next && `&cursor=${next}`}`);
      expect(body.items.length).toBeLessThanOrEqual(2);
      parts.push(...body.items.map(({ id }: { id: string }) => id));
      next = body.next;
    }
    expect(parts).toEqual(whole);
    expect(parts.length).toBeGreaterThanOrEqual(6);
  });

  it("refuse a cursor that is none", async () => {
    expect((await builder("GET", "/oils?cursor=nowhere")).body.errors).toMatchObject([{ path: "cursor" }]);
  });
});
