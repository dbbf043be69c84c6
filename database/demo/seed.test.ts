import { sql } from "kysely";
import { beforeAll, expect, test } from "vitest";
import { type Database, openDatabase, setDatabase } from "#database/connection";
import { migrate } from "#database/migrate";
import { nextStep } from "~/engineering/next-step/next-step";
import type { History } from "~/engineering/next-step/types";
import { parseQuantity } from "~/engineering/quantity/parse";
import { findUnit, type UnitName } from "~/engineering/quantity/units";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { listEngines } from "~/models/engine.server";
import { listFindings } from "~/models/finding.server";
import { listFits } from "~/models/fit.server";
import { fitHistory, hashHistory } from "~/models/fit-history.server";
import { findPersonByEmail, passwordMatches } from "~/models/person.server";
import { rulesFor } from "~/models/proposal.server";
import { listStandingReadings } from "~/models/reading.server";
import type { Scope } from "~/models/scope";
import { hashSheet, sheetContent } from "~/models/sheet.server";
import { demoPassword } from "./people";
import { seedDemo } from "./seed";

const now = new Date("2026-10-14T03:20:00Z");

let database: Database;
let seconds: number;

beforeAll(async () => {
  database = await seeded(now);
}, 60_000);

async function seeded(clock: Date): Promise<Database> {
  const fresh = setDatabase(openDatabase(":memory:"));
  await migrate(fresh);
  const start = performance.now();
  await seedDemo(clock);
  seconds = (performance.now() - start) / 1000;
  return fresh;
}

async function scopeOf(email: string): Promise<Scope> {
  setDatabase(database);
  const person = (await findPersonByEmail(email))!;
  return { shopId: person.shopId, personId: person.id, role: person.role };
}

const enginesSeenBy = async (email: string) =>
  (await listEngines(await scopeOf(email), { most: 100 })).map(({ name }) => name).sort();

test("it is filled in well under ten seconds", () => {
  expect(seconds).toBeLessThan(10);
});

test("each sees what is theirs", async () => {
  const all = ["Engine 12", "Engine 4", "Engine 9"];
  expect(await enginesSeenBy("owner@example.test")).toEqual(all);
  expect(await enginesSeenBy("builder@example.test")).toEqual(all);
  expect(await enginesSeenBy("chief@example.test")).toEqual(["Engine 12", "Engine 4"]);
  expect(await enginesSeenBy("viewer@example.test")).toEqual(["Engine 12"]);
  expect(await enginesSeenBy("other@example.test")).toEqual(["Engine A"]);
  expect(await passwordMatches("viewer@example.test", demoPassword)).toBe(true);
});

test("a second start leaves the demo as it is", async () => {
  const count = () => database.selectFrom("history").select("id").execute();
  const before = await count();
  setDatabase(database);
  await seedDemo(now);
  expect(await count()).toEqual(before);
});

test("every row points at rows that are there", async () => {
  const { rows } = await sql`PRAGMA foreign_key_check`.execute(database);
  expect(rows).toEqual([]);
  const integrity = await sql<{ integrity_check: string }>`PRAGMA integrity_check`.execute(database);
  expect(integrity.rows).toEqual([{ integrity_check: "ok" }]);
});

test("every build has the readings and findings of its state", async () => {
  const scopes = [await scopeOf("owner@example.test"), await scopeOf("other@example.test")];
  const ended = new Map<string, string[]>();
  for (const scope of scopes) {
    for (const engine of await listEngines(scope, { most: 100 })) {
      const fits = await listFits(scope, engine.id);
      const positions = fits.reduce((sum, fit) => sum + fit.positions.length, 0);
      const boxes = fits.reduce(
        (sum, fit) => sum + fit.positions.length * fitKind(fit.kind).stations.length,
        0,
      );
      const builds = await database
        .selectFrom("build")
        .selectAll()
        .where("engine_id", "=", engine.id)
        .orderBy("number")
        .execute();
      ended.set(
        engine.name,
        builds.map(({ state }) => state),
      );
      for (const build of builds) {
        const at = async (stage: "assembly" | "teardown") =>
          (await listStandingReadings(scope, build.id, stage)).length;
        const tornDown = build.state === "torn-down" || build.state === "reviewed";
        const half = build.state === "measuring" ? Math.round(boxes / 2) : boxes;
        expect([await at("assembly"), await at("teardown")]).toEqual([half, tornDown ? boxes : 0]);
        expect((await listFindings(scope, build.id)).length).toBe(tornDown ? positions : 0);
      }
    }
  }
  const reviewed = (count: number) => Array.from({ length: count }, () => "reviewed");
  expect(Object.fromEntries(ended)).toEqual({
    "Engine 12": [...reviewed(8), "torn-down"],
    "Engine 4": [...reviewed(7), "measuring"],
    "Engine 9": [...reviewed(6), "running"],
    "Engine A": [...reviewed(1), "running"],
  });
});

test("every reading is what its typed text says, and slips were put right", async () => {
  const readings = await database.selectFrom("reading").selectAll().execute();
  const superseded = new Set(readings.map((reading) => reading.supersedes_id));
  const wrong = readings.filter(({ typed, unit, decimals, value_pm }) => {
    const read = parseQuantity(typed, "length", { defaultUnit: findUnit(unit!, "length") as UnitName });
    return read.picometres !== value_pm || read.decimals !== decimals;
  });
  expect(readings.length).toBeGreaterThan(10_000);
  expect(wrong).toEqual([]);
  const slips = readings.filter(({ warnings_json }) => warnings_json !== "[]");
  expect(slips.length).toBeGreaterThan(0);
  expect(slips.filter(({ id }) => !superseded.has(id))).toEqual([]);
});

test("nothing lies in the future, and ids lie in the order of their time", async () => {
  const tables = await sql<{ name: string }>`
    SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'kysely_%'`.execute(database);
  const latest: string[] = [];
  for (const { name } of tables.rows) {
    const columns = await sql<{ name: string }>`SELECT name FROM pragma_table_info(${name})`.execute(
      database,
    );
    for (const column of columns.rows.filter((each) => each.name.endsWith("_at"))) {
      const { rows } = await sql<{ latest: string | null }>`
        SELECT max(${sql.ref(column.name)}) AS latest FROM ${sql.table(name)}`.execute(database);
      if (rows[0]?.latest) latest.push(rows[0].latest);
    }
  }
  expect(latest.length).toBeGreaterThan(15);
  expect(latest.filter((instant) => instant > now.toISOString())).toEqual([]);
  const ids = await database.selectFrom("reading").select(["id", "taken_at"]).orderBy("id").execute();
  const times = ids.map(({ taken_at }) => taken_at);
  expect(times).toEqual([...times].sort());
});

test("the same clock gives the same rows, but for the salt of the password", async () => {
  const content = async (from: Database) => {
    const tables = [
      "person",
      "reading",
      "finding",
      "run",
      "proposal",
      "sign_off",
      "target",
      "history",
    ] as const;
    const all = await Promise.all(
      tables.map((table) => from.selectFrom(table).selectAll().orderBy("id").execute()),
    );
    return JSON.stringify(all, (key, value) => (key === "password_hash" ? "" : value));
  };
  const again = await seeded(now);
  expect((await content(again)) === (await content(database))).toBe(true);
  await again.destroy();
}, 60_000);

test("signed sheets are those that were signed", async () => {
  const scope = await scopeOf("owner@example.test");
  const signatures = await database
    .selectFrom("sheet_signature")
    .selectAll()
    .where("shop_id", "=", scope.shopId)
    .execute();
  // Two of each reviewed build, two of the one that waits, one of the one that runs.
  expect(signatures.length).toBe(2 * (8 + 7 + 6) + 2 + 1);
  for (const { build_id, stage, content_hash } of signatures.slice(0, 12)) {
    const readings = await listStandingReadings(scope, build_id, stage);
    const findings = stage === "teardown" ? await listFindings(scope, build_id) : [];
    expect(hashSheet(sheetContent(build_id, stage, readings, findings))).toBe(content_hash);
  }
});

test("every past proposal is what the next step says of what the database holds", async () => {
  const scope = await scopeOf("owner@example.test");
  let replayed = 0;
  for (const engine of await listEngines(scope, { most: 100 })) {
    const fits = await listFits(scope, engine.id);
    for (const fit of fits.filter(({ kind }) => kind === "big-end" || kind === "pin-in-rod")) {
      for (const proposal of await proposalsOf(fit.id)) {
        const stored = JSON.parse(proposal.history_json) as History;
        const coating = stored.fit.coating?.kind ?? null;
        const history = await fitHistory(scope, { ...fit, coating }, proposal.number);
        expect(hashHistory(history)).toBe(proposal.history_hash);
        expect(JSON.stringify(nextStep(history, await rulesFor(scope, fit)))).toBe(proposal.answer_json);
        replayed++;
      }
    }
  }
  expect(replayed).toBe(2 * (8 + 7 + 6));
}, 60_000);

test("every build aims at what was signed after the one before", async () => {
  const rows = await database
    .selectFrom("target")
    .innerJoin("build", "build.id", "target.build_id")
    .innerJoin("fit", "fit.id", "target.fit_id")
    .leftJoin("sign_off", "sign_off.id", "target.sign_off_id")
    .select(["build.number", "fit.usual_pm", "target.aim_pm", "sign_off.target_pm"])
    .execute();
  expect(rows.filter(({ aim_pm, target_pm, usual_pm }) => aim_pm !== (target_pm ?? usual_pm))).toEqual([]);
  expect(rows.filter(({ number, target_pm }) => (number === 1) !== (target_pm === null))).toEqual([]);
});

test("the big ends that went too far are opened again", async () => {
  const proposals = await proposalsOf(await fitNamed("Engine 12", "big-end"));
  const [before, tooFar] = [
    proposals.find(({ number }) => number === 3)!,
    proposals.find(({ number }) => number === 4)!,
  ];
  expect([before.action, before.decision]).toEqual(["close", "change"]);
  expect(before.reason).not.toBe("");
  expect(before.signed_pm).toBeLessThan(before.target_pm);
  const torn = (JSON.parse(tooFar.history_json) as History).iterations.at(-1)!.positions;
  expect(torn.some(({ grade, damage }) => grade === 3 && damage === "wiping")).toBe(true);
  expect(tooFar.action).toBe("open");
  expect(tooFar.signed_pm).toBeGreaterThan(before.signed_pm);
});

test("dirt on one big end asks for its cause and moves nothing", async () => {
  const proposals = await proposalsOf(await fitNamed("Engine 4", "big-end"));
  const dirty = proposals.find(({ number }) => number === 3)!;
  const torn = (JSON.parse(dirty.history_json) as History).iterations.at(-1)!;
  expect(torn.positions.map(({ damage }) => damage === "embedded-particles")).toEqual([
    false,
    false,
    true,
    false,
  ]);
  expect(torn.events).toContain("debris");
  expect([dirty.action, dirty.step_pm]).toEqual(["find-cause", 0]);
});

test("the review that waits has its teardown signed and nothing decided", async () => {
  const waiting = await database.selectFrom("build").selectAll().where("state", "=", "torn-down").execute();
  expect(waiting.length).toBe(1);
  const of = (table: "sheet_signature" | "proposal" | "sign_off") =>
    database.selectFrom(table).select("id").where("build_id", "=", waiting[0]!.id).execute();
  expect((await of("sheet_signature")).length).toBe(2);
  expect([...(await of("proposal")), ...(await of("sign_off"))]).toEqual([]);
});

async function fitNamed(engine: string, kind: string): Promise<string> {
  const row = await database
    .selectFrom("fit")
    .innerJoin("engine", "engine.id", "fit.engine_id")
    .select("fit.id")
    .where("engine.name", "=", engine)
    .where("fit.kind", "=", kind)
    .executeTakeFirstOrThrow();
  return row.id;
}

function proposalsOf(fitId: string) {
  return database
    .selectFrom("proposal")
    .innerJoin("build", "build.id", "proposal.build_id")
    .innerJoin("sign_off", "sign_off.proposal_id", "proposal.id")
    .select([
      "build.number",
      "action",
      "step_pm",
      "proposal.target_pm",
      "history_json",
      "history_hash",
      "answer_json",
    ])
    .select(["sign_off.decision", "sign_off.reason", "sign_off.target_pm as signed_pm"])
    .where("proposal.fit_id", "=", fitId)
    .orderBy("build.number")
    .execute();
}
