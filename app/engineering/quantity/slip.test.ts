import fc from "fast-check";
import { expect, test } from "vitest";
import { parseQuantity } from "./parse";
import { checkSlip, type Expectation } from "./slip";
import type { UnitName } from "./units";

const pm = (text: string) => parseQuantity(text, "length").picometres!;

/** A main of 2.4500 in with 2.5 thou: its journal's box, good within ten thou. */
const journal: Expectation = { expected: pm("2.4500 in"), nominal: pm("2.4500 in"), band: pm("10 thou") };
const bore: Expectation = { ...journal, expected: pm("2.4525 in") };
const metricJournal: Expectation = {
  expected: pm("53.340 mm"),
  nominal: pm("53.340 mm"),
  band: pm("0.2 mm"),
};

const slip = (typed: string, expectation: Expectation, unit: UnitName = "in") =>
  checkSlip(pm(typed), expectation, unit);

// Common practice, no source: the slips that a shop sees, each with the value that was meant.
test.each<[string, string, Expectation, string, string]>([
  ["metric typed in an inch box", "62.23 in", journal, "wrong-unit", "2.45 in"],
  ["inches typed in a metric box", "2.1 mm", metricJournal, "wrong-unit", "53.34 mm"],
  ["metres for millimetres", "53.34 m", metricJournal, "wrong-unit", "53.34 mm"],
  ["the decimal mark one place off", "24.5 in", journal, "factor-of-ten", "2.45 in"],
  ["no decimal mark at all", "24503 in", journal, "factor-of-ten", "2.4503 in"],
  ["digits swapped", "2.4947 in", journal, "swapped-digits", "2.4497 in"],
  ["digits swapped over the mark", "4.2503 in", journal, "swapped-digits", "2.4503 in"],
  ["a digit typed twice", "2.44502 in", { ...journal, band: pm("2 thou") }, "doubled-digit", "2.4502 in"],
  ["a digit typed twice before the mark", "22.4503 in", journal, "doubled-digit", "2.4503 in"],
  ["a digit dropped", "2.503 in", journal, "dropped-digit", "2.4503 in"],
  ["the first digit dropped", ".4503 in", journal, "dropped-digit", "2.4503 in"],
  [
    "hundredths for thousandths",
    "2.475 in",
    { ...bore, band: pm("2 thou") },
    "hundredth-for-thousandth",
    "2.4525 in",
  ],
  ["a turn of an inch micrometer", "2.4752 in", journal, "micrometer-turn", "2.4502 in"],
  ["a turn of an inch micrometer back", "2.4252 in", journal, "micrometer-turn", "2.4502 in"],
  ["a turn of a metric micrometer", "53.842 mm", metricJournal, "micrometer-turn", "53.342 mm"],
  ["a turn of a calliper's dial", "2.5503 in", journal, "calliper-turn", "2.4503 in"],
  ["the wrong sign of an offset", "2.4475 in", { ...bore, band: pm("1 thou") }, "sign", "2.4525 in"],
  ["a minus that is none", "-2.4503 in", journal, "sign", "2.4503 in"],
])("%s: %s", (_slip, typed, expectation, code, meant) => {
  const unit = typed.endsWith("mm") || typed.endsWith(" m") ? "mm" : "in";
  const found = slip(typed, expectation, unit);
  expect(found).toMatchObject({ code, suggestion: pm(meant) });
  expect(found?.message).toContain(" looks like ");
});

test.each<[string, string, string]>([
  ["2.5 um", "wrong-unit", "63.5 um"],
  ["25 um", "wrong-unit", "63.5 um"],
  ["635 um", "factor-of-ten", "63.5 um"],
  ["-63.5 um", "sign", "63.5 um"],
])("a clearance of 63.5 µm typed as %s", (typed, code, meant) => {
  const clearance = { expected: pm("63.5 um"), band: pm("30 um") };
  expect(slip(typed, clearance, "um")).toMatchObject({ code, suggestion: pm(meant) });
});

test("bore and journal exchanged, where the band is narrow enough to see it", () => {
  const tight: Expectation = { ...bore, band: pm("1.5 thou"), counterpart: pm("2.4500 in") };
  expect(slip("2.4501 in", tight)).toMatchObject({ code: "exchanged-parts" });
  expect(slip("2.4501 in", tight)?.suggestion).toBeUndefined();
  // 25 thou apart is also one turn of the micrometer: whichever lands nearer is named.
  const apart: Expectation = { expected: pm("2.1250 in"), band: pm("5 thou"), counterpart: pm("2.1000 in") };
  expect(slip("2.1000 in", apart)?.code).toBe("exchanged-parts");
  expect(slip("2.1004 in", { ...apart, last: pm("2.1254 in") })?.code).toBe("micrometer-turn");
});

test("the sentence names the value, what it looks like and why", () => {
  expect(slip("2.4947 in", journal)?.message).toBe("2.4947 in looks like 2.4497 in with two digits swapped.");
  expect(slip("2.46155 in", journal)?.message).toContain("2.46155 in");
});

test("what no slip explains is far off, without a suggestion", () => {
  const found = slip("3.1416 in", { ...journal, band: pm("0.1 thou") });
  expect(found).toEqual({
    code: "far-off",
    message: "3.1416 in is 0.6916 in from what this box expects, 2.4500 in.",
  });
});

test("last time's reading, or the column's middle, settles which explanation is nearest", () => {
  // Read back to 2.4452 by a turn, to 2.4500 by a dropped zero, to 2.4480 by hundredths.
  const typed = "2.4700 in";
  const wide = { expected: pm("2.4500 in"), nominal: pm("2.4480 in"), band: pm("6 thou") };
  expect(slip(typed, { ...wide, last: pm("2.4450 in") })?.code).toBe("micrometer-turn");
  expect(slip(typed, { ...wide, last: pm("2.4502 in") })?.code).toBe("hundredth-for-thousandth");
  const column = ["2.4449 in", "2.4451 in", "2.4450 in", "9.9 in"].map(pm);
  expect(slip(typed, { ...wide, column })?.code).toBe("micrometer-turn");
});

test("inside the band nothing is a slip, outside it something always is said, and what is suggested lies inside", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 100_000_000_000 }),
      fc.integer({ min: 1_000_000, max: 1_000_000_000 }),
      fc.integer({ min: -200_000_000_000, max: 200_000_000_000 }),
      fc.constantFrom<UnitName>("in", "mm", "thou", "um"),
      (expected, band, value, unit) => {
        const found = checkSlip(value, { expected, band }, unit);
        if (Math.abs(value - expected) <= band) expect(found).toBeNull();
        else {
          expect(found?.message).toBeTruthy();
          if (found?.suggestion !== undefined)
            expect(Math.abs(found.suggestion - expected)).toBeLessThanOrEqual(band);
        }
      },
    ),
    { numRuns: 500 },
  );
});

test("neighbouring digits swapped are put right wherever the swap leaves the band", () => {
  const expected = pm("2.4497 in");
  for (const typed of ["4.2497", "2.4947"]) {
    expect(slip(`${typed} in`, { expected, band: pm("1 thou") })).toMatchObject({
      code: "swapped-digits",
      suggestion: expected,
    });
  }
});
