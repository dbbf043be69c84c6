import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, test } from "vitest";
import { FormVisitor } from "#test/support/forms";
import { type RunningServer, startServer } from "#test/support/server";
import { emptyShop } from "#test/support/shop";

let shop: Awaited<ReturnType<typeof emptyShop>>;
let server: RunningServer;
let owner: FormVisitor;
let engine: string;
let oilId: string;

const installation = (dataDirectory: string) => ({
  DEMO: "0",
  SESSION_SECRET: "a secret of the tests, thirty-two characters long",
  DATA_DIR: dataDirectory,
});

const newEngine = {
  name: "Engine 3",
  form: "inline",
  cylinders: "1",
  mains: "2",
  valvesPerCylinder: "2",
  bore: "96 mm",
  stroke: "70 mm",
  rodLength: "140 mm",
  revLimitRpm: "9000",
  duty: "",
  environment: "clean",
};

beforeAll(async () => {
  shop = await emptyShop(["owner"]);
  server = await startServer(installation(shop.dataDirectory));
  owner = new FormVisitor(server);
  await owner.signIn(shop.email("owner"), shop.password);
  await owner.send("/oils/new", {
    name: "Oil",
    grade: "30",
    kv40: "95",
    kv100: "11",
    density15: "",
    hths: "",
    note: "",
  });
  engine = (await owner.send("/engines/new", newEngine)).location;
  oilId = /<option value="([0-9a-f]{32})">Oil, 30/.exec((await owner.open(engine)).text)?.[1] ?? "";
});

afterAll(async () => {
  await server?.stop();
  rmSync(shop.dataDirectory, { recursive: true, force: true });
});

/** The page as words: entities of quotation marks and signs read as a person sees them. */
const words = (html: string) =>
  html.replaceAll("&quot;", '"').replaceAll("&#x27;", "'").replaceAll("&gt;", ">").replaceAll("<!-- -->", "");

test.each([
  ["an unknown unit", { bore: "96 furlongs" }, "is no unit that is known here", "96 furlongs"],
  ["a unit of something else", { stroke: "70 psi" }, "is not a unit for this", "70 psi"],
  ["nonsense", { rodLength: "long" }, '"long" is no number', "long"],
  ["two readings of one text", { bore: "1,234 mm" }, "can be read as 1.234 or 1234", "1,234 mm"],
  ["no name", { name: " " }, "Give the engine a name.", "96 mm"],
  ["more mains than the layout has", { mains: "9" }, "1 cylinders have at most 2 mains", "9"],
])(
  "setting an engine up with %s: a sentence, and all that was typed",
  async (_what, change, sentence, kept) => {
    const refused = await owner.send("/engines/new", { ...newEngine, name: "Engine 4", ...change });
    expect(refused.status).toBe(400);
    expect(words(refused.text)).toContain(sentence);
    expect(refused.text).toContain(`value="${kept}"`);
  },
);

test("an engine's name is taken once", async () => {
  const refused = await owner.send("/engines/new", newEngine);
  expect(refused.status).toBe(409);
  expect(refused.text).toContain("already has an engine called Engine 3");
});

test("an oil that is thicker hot than cold is refused", async () => {
  const refused = await owner.send("/oils/new", {
    name: "Odd",
    grade: "30",
    kv40: "11",
    kv100: "95",
    note: "",
  });
  expect(refused.status).toBe(400);
  expect(refused.text).toContain("Are they exchanged?");
});

test("a fit's limits enclose its usual clearance", async () => {
  const page = await owner.open(engine);
  const fit = /\/fits\/[0-9a-f]{32}/.exec(page.text)?.[0];
  const refused = await owner.send(`${engine}${fit}`, {
    nominal: "2.45 in",
    length: "",
    usual: "0.0010 in",
    least: "0.0014 in",
    most: "0.0035 in",
    limitsSource: "maker",
    tolerance: "0.0003 in",
    boreMaterial: "steel-4340",
    journalMaterial: "steel-4340",
    boreFinish: "",
    journalFinish: "",
    coating: "",
    method: "absolute",
    version: "1",
  });
  expect(refused.status).toBe(400);
  expect(refused.text).toContain("The least clearance is over the usual clearance.");
});

test("a build's sheet, run log and teardown name what is wrong, and keep the rest", async () => {
  const started = await owner.send(engine, { intent: "start", oilId, note: "" });
  const build = started.location.replace("/sheet", "");
  const sheet = await owner.open(started.location);
  const fit = /name="fit" value="([0-9a-f]{32})"/.exec(sheet.text)?.[1] ?? "";
  const boxes = [...sheet.text.matchAll(/name="([0-9a-f]{32}\.(?:bore|journal)\.[a-z.0-9]+)"/g)].map(
    (match) => match[1]!,
  );
  const form = { fit, temperature: "21", boreGauge: "", journalGauge: "" };

  // Without script the whole sheet comes as one form: what can be read is saved, what cannot stays with its sentence.
  const mixed = await owner.send(started.location, {
    ...form,
    [boxes[0]!]: "2.4527",
    [boxes[1]!]: "two and a half",
    [boxes[2]!]: "not measured: oil hole",
    [boxes[3]!]: "0",
    [boxes[4]!]: "24.527",
  });
  expect(words(mixed.text)).toContain('"two and a half" is no number');
  expect(words(mixed.text)).toContain("A diameter is over zero.");
  const again = await owner.open(started.location);
  expect(again.text).toContain('value="2.4527"');
  expect(again.text).toContain('value="not measured: oil hole"');
  expect(words(again.text)).toContain("24.5270 in looks like 2.4527 in with the decimal mark one place off.");

  const hot = await owner.send(started.location, { ...form, temperature: "300 degC", [boxes[5]!]: "2.4527" });
  expect(hot.status).toBe(400);
  expect(hot.text).toContain("Parts are measured between −40 and 200 °C");

  // Someone else has filled the box since this page was made: nothing is overwritten.
  const stale = await owner.send(started.location, {
    ...form,
    [boxes[0]!]: "2.4999",
    [`was.${boxes[0]!}`]: "",
  });
  expect(words(stale.text)).toContain("Someone else has changed this box meanwhile: it says 2.4527 now.");
  expect((await owner.open(started.location)).text).toContain('value="2.4527"');

  // A position that was taken out of use meanwhile takes no reading any more.
  const second = boxes.find((box) => !box.startsWith(boxes[0]!.split(".")[0]!))!;
  await owner.send(`${engine}/fits/${fit}`, { intent: "retire", positionId: second.split(".")[0]! });
  const retired = await owner.send(started.location, { ...form, [second]: "2.4527" });
  expect(words(retired.text)).toContain("This position was taken out of use");

  expect((await owner.send(`${build}/runs`, { kind: "test" })).status).toBe(400);
  expect((await owner.send(started.location, { intent: "sign", version: "1" })).text).toContain(
    "boxes are blank",
  );
  const signed = await owner.send(started.location, { intent: "sign", version: "1", accept: "blank" });
  expect(signed.status).toBe(302);

  // The sheet is signed: a form that was open before writes nothing any more.
  const late = await owner.send(started.location, { ...form, [boxes[6]!]: "2.4500" });
  expect(late.text).toContain("The sheet is signed and frozen");
  const twice = await owner.send(started.location, { intent: "sign", version: "1", accept: "blank" });
  expect(twice.status).toBe(409);

  const run = {
    kind: "test",
    startedAt: "2026-11-01",
    hours: "5",
    oilId,
    oilTemperature: "104",
    note: "kept",
  };
  const runs: [Record<string, string>, string][] = [
    [{ hours: "-3" }, "Hours are a number from 0 to 1000."],
    [{ startedAt: "2099-01-01" }, "This day is in the future"],
    [{ startedAt: "2026-13-45" }, "There is no such day."],
    [{ oilTemperature: "300" }, "Oil runs between −40 and 200 °C"],
    [{ oilId: "0".repeat(32) }, "The shop has no such oil"],
    [{ pressureIdle: "12 mm" }, "is not a unit for this"],
  ];
  for (const [change, sentence] of runs) {
    const refused = await owner.send(`${build}/runs`, { ...run, ...change });
    expect(refused.status, sentence).toBe(400);
    expect(words(refused.text)).toContain(sentence);
    expect(refused.text).toContain('value="kept"');
  }
  expect((await owner.open(`${build}/runs`)).text).toContain("No run is logged yet.");
  expect((await owner.send(`${build}/runs`, run)).status).toBe(200);
  expect((await owner.open(`${build}/teardown`)).status).toBe(404);

  expect((await owner.send(build, { to: "torn-down", version: "1" })).status).toBe(409);
  expect((await owner.send(build, { to: "torn-down", version: "3" })).status).toBe(200);
  const grade = await owner.send(`${build}/teardown`, {
    intent: "finding",
    fit,
    positionId: boxes[0]!.split(".")[0]!,
    grade: "7",
  });
  expect(grade.status).toBe(400);
  expect(grade.text).toContain("Grade the part, 0 to 4.");
});

test("a database file that is none stops the start with a sentence", async () => {
  const dataDirectory = mkdtempSync(join(tmpdir(), "tenthbook-dead-"));
  writeFileSync(
    join(dataDirectory, "tenthbook.sqlite"),
    "this is no database, but it is long enough to look at".repeat(40),
  );
  await expect(startServer(installation(dataDirectory))).rejects.toThrow(
    /Tenthbook cannot start\. file is not a database/,
  );
  rmSync(dataDirectory, { recursive: true, force: true });
});
