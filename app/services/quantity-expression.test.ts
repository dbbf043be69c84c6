import { execFileSync } from "node:child_process";
import fc from "fast-check";
import { expect, test } from "vitest";
import { EngineeringError } from "~/engineering/engineering-error";
import { evaluateQuantity } from "./quantity-expression.server";

const pm = async (text: string, options = {}) => (await evaluateQuantity(text, "length", options)).picometres;

// By hand, in exact units: 1 in = 25.4 mm.
test.each([
  ["2.1018 in - 53.322 mm", 63_720_000],
  ["0.0025 in / 2", 31_750_000],
  ["0.0025in/2", 31_750_000],
  ["2.5 thou + 3 tenths", 71_120_000],
  ["(2.1025 in + 2.1023 in) / 2 − 2.1 in", 60_960_000],
  ["2 × 0.75 mm + 53.34 mm", 54_840_000_000],
  ["3 mm * 2 in ÷ 1 in", 6_000_000_000],
  ["-0.0025 in + 1 thou", -38_100_000],
  ["1 7/8 in - 1 mm", 46_625_000_000],
  ["1/2 in + 1/4 in", 19_050_000_000],
  ["12 µin + 0.4 μm", 704_800],
  ['2.1"-2.0975"', 63_500_000],
  ["53,34 mm - 53,30 mm", 40_000_000],
  ["0.1 mm + 0.2 mm - 0.3 mm", 0],
  ["1 mm / 3", 333_333_333],
  ["2 mm / 3", 666_666_667],
])("%s is reckoned exactly", async (text, expected) => {
  expect(await pm(text)).toBe(expected);
});

test("a single quantity is read as everywhere else, offsets from a nominal too", async () => {
  expect(await evaluateQuantity("2.1000 in", "length")).toMatchObject({
    unit: "in",
    decimals: 4,
    typed: "2.1000 in",
  });
  expect(await pm("-.0002", { defaultUnit: "in", nominal: 53_340_000_000 })).toBe(53_334_920_000);
  expect((await evaluateQuantity("95 degC", "temperature")).si).toBe(95);
});

test("a sum carries the unit of its first term, and the decimals that its result needs", async () => {
  expect(await evaluateQuantity("0.0025 in / 2", "small-length")).toEqual({
    kind: "small-length",
    si: 3.175e-5,
    picometres: 31_750_000,
    typed: "0.0025 in / 2",
    unit: "in",
    decimals: 5,
  });
  expect(await evaluateQuantity("2.10 in - 2.05 in", "length")).toMatchObject({ unit: "in", decimals: 2 });
});

test("bare numbers are summed in the page's unit, and never with quantities", async () => {
  expect(await pm("2.1025 - 2.1", { defaultUnit: "in" })).toBe(63_500_000);
  await expect(pm("2.1025 - 2.1")).rejects.toMatchObject({ code: "no-unit" });
  await expect(pm("2.1025 in - 2.1", { defaultUnit: "in" })).rejects.toMatchObject({ code: "not-a-sum" });
});

test("other kinds add up too", async () => {
  expect((await evaluateQuantity("60 psi - 0.5 bar", "pressure")).si).toBeCloseTo(363_685.4375901, 6);
  expect((await evaluateQuantity("10 mm2/s + 6.2 cSt", "kinematic-viscosity")).si).toBeCloseTo(16.2, 12);
  expect((await evaluateQuantity("3000 rpm + 2 * 1500 rpm", "speed")).si).toBeCloseTo(200 * Math.PI, 9);
  await expect(evaluateQuantity("999999999 MPa * 99999", "pressure")).rejects.toMatchObject({
    code: "too-large",
  });
  expect((await evaluateQuantity("40 lbf ft / 2", "torque")).si).toBeCloseTo(27.116358966628, 9);
});

test.each([
  ["=1+1", "not-a-sum"],
  ["sqrt(4 mm)", "not-a-sum"],
  ["a = 2 mm", "not-a-sum"],
  ["pi * 2 mm", "not-a-sum"],
  ["v0 + 1 mm", "not-a-sum"],
  ["2 mm ^ 2", "not-a-sum"],
  ["2 mm; 3 mm", "not-a-sum"],
  ["[1 mm, 2 mm]", "not-a-sum"],
  ['import("fs") + 1 mm', "not-a-sum"],
  ["2 mm (3)", "not-a-sum"],
  ["2 mm * 3 mm", "not-a-sum"],
  ["2 mm / 1 mm", "not-a-sum"],
  ["2 ÷ 1 mm", "not-a-sum"],
  ["2(1 mm + 1 mm)", "not-a-sum"],
  ["(1 mm)(2)", "not-a-sum"],
  ["2 1 mm + 1 mm", "not-a-sum"],
  ["1 234.5 mm + 1 mm", "not-a-sum"],
  ["2 mm + 1", "not-a-sum"],
  ["2 mm / 0", "not-a-sum"],
  ["2 mm / (1 - 1)", "not-a-sum"],
  ["(2 mm + 1 mm", "not-a-sum"],
  ["2 mm +", "not-a-sum"],
  ["+ - * /", "not-a-sum"],
  ["2 mm + 3 psi", "wrong-unit"],
  ["2 mm + 3 furlongs", "wrong-unit"],
  ["1,234 mm + 1 mm", "ambiguous"],
  ["9000 m + 9000 m", "too-large"],
  ["2 mm to in", "wrong-unit"],
  ["1e3 mm + 1 mm", "not-a-number"],
  ["🔧 + 1 mm", "not-a-sum"],
  [`${"(".repeat(150)}1 mm`, "not-a-sum"],
  ["1 mm + ".repeat(200_000), "too-long"],
])("%.30s is refused as %s", async (text, code) => {
  await expect(pm(text)).rejects.toMatchObject({ name: "EngineeringError", code });
});

test("temperatures do not add up", async () => {
  await expect(evaluateQuantity("95 degC - 20 degC", "temperature")).rejects.toMatchObject({
    code: "not-a-sum",
  });
});

test("whatever is typed gives a finite length or a sentence, and nothing else", async () => {
  const piece = fc.constantFrom(
    ..."0123456789.,+-*/()^=;[]v_ ",
    " mm",
    " in",
    "µm",
    '"',
    "sqrt",
    "import",
    " + ",
    " - ",
  );
  const scribble = fc.array(piece, { maxLength: 14 }).map((pieces) => pieces.join(""));
  await fc.assert(
    fc.asyncProperty(scribble, async (text) => {
      try {
        const { picometres } = await evaluateQuantity(text, "length", { defaultUnit: "in" });
        expect(Number.isSafeInteger(picometres)).toBe(true);
      } catch (error) {
        expect(error).toBeInstanceOf(EngineeringError);
      }
    }),
    { numRuns: 1000 },
  );
});

test("mathjs is loaded by the first sum, and not by the server's start or a single quantity", () => {
  const script = `
    import { createRequire } from "node:module";
    const { cache } = createRequire(process.cwd() + "/");
    const isLoaded = () => Object.keys(cache).some((file) => file.includes("mathjs"));
    const { evaluateQuantity } = await import("./app/services/quantity-expression.server.ts");
    await evaluateQuantity("2.1 in", "length");
    const before = isLoaded();
    await evaluateQuantity("2.1 in - 1 thou", "length");
    console.log(before, isLoaded());`;
  const answer = execFileSync(process.execPath, ["--import", "tsx", "--input-type=module", "-e", script]);
  expect(answer.toString().trim()).toBe("false true");
});
