import fc from "fast-check";
import { expect, test } from "vitest";
import { at20, atTemperature } from "./expansion";
import { hotClearance } from "./hot-clearance";
import { findMaterial, materials } from "./materials";

const refused = (code: string, field?: string) =>
  expect.objectContaining({ code, ...(field ? { field } : {}) });

test("bringing a diameter to 20 °C and back gives it again", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-3, max: 0.5, noNaN: true }),
      fc.double({ min: -40, max: 200, noNaN: true }),
      fc.constantFrom(...materials),
      (diameter, temperatureC, { expansion }) => {
        const again = atTemperature(at20(diameter, temperatureC, expansion), temperatureC, expansion);
        // A picometre on half a metre: the last bits of a double.
        expect(Math.abs(again - diameter)).toBeLessThan(1e-12);
      },
    ),
  );
});

test("a part that was measured warm is smaller at 20 °C, a cold one larger", () => {
  expect(at20(0.06, 35, 12.3e-6)).toBeLessThan(0.06);
  expect(at20(0.06, 5, 12.3e-6)).toBeGreaterThan(0.06);
  expect(at20(0.06, 20, 12.3e-6)).toBe(0.06);
});

test("a temperature that is no part's, and a coefficient that is no metal's, are refused", () => {
  for (const temperatureC of [-41, 201, Number.NaN, Number.POSITIVE_INFINITY]) {
    expect(() => at20(0.06, temperatureC, 12e-6)).toThrow(refused("outside-range", "temperature"));
  }
  for (const expansion of [12.3, -1e-6, Number.NaN]) {
    expect(() => at20(0.06, 30, expansion)).toThrow(refused("outside-range", "expansion"));
  }
  expect(() => atTemperature(0.06, 900, 12e-6)).toThrow(refused("outside-range", "temperatureC"));
});

test("materials have a key of their own, and a coefficient with its uncertainty and source", () => {
  expect(new Set(materials.map(({ key }) => key)).size).toBe(materials.length);
  for (const { expansion, uncertainty, source } of materials) {
    expect(expansion).toBeGreaterThan(8e-6);
    expect(expansion).toBeLessThan(25e-6);
    expect(uncertainty / expansion).toBeCloseTo(0.03 / Math.sqrt(3), 12);
    expect(source).not.toBe("");
  }
  expect(findMaterial("aluminium-2618").source).toBe("from memory");
  expect(() => findMaterial("unobtainium")).toThrow(refused("unknown-material"));
  const own = { key: "own", name: "Own", expansion: 9e-6, uncertainty: 1e-7, source: "the shop" };
  expect(findMaterial("own", [own])).toBe(own);
});

const steel = 12.3e-6;
const aluminium = 21.5e-6;
const back = 11.7e-6;

test("a shell's wall takes clearance away as it warms", () => {
  const input = {
    clearance: 63.5e-6,
    journalDiameter: 53.34e-3,
    housing: { expansion: steel, temperatureC: 20 },
    journal: { expansion: steel, temperatureC: 20 },
  };
  const warmShell = { expansion: back, temperatureC: 120 };
  const found = hotClearance({ ...input, shellWall: 1.5e-3, shell: warmShell });
  // By hand: two walls of 1.5 mm by 100 °C, 3 mm × 11.7e-6 × 100 = 3.51 µm.
  expect(found.clearance).toBeCloseTo(63.5e-6 - 3.51e-6, 12);
  expect(found.outsideRange).toBe(false);
  expect(hotClearance({ ...input, shellWall: 0, shell: warmShell }).clearance).toBeCloseTo(63.5e-6, 15);
});

test("one material at one temperature keeps the clearance but for its own growth", () => {
  const part = { expansion: steel, temperatureC: 120 };
  const { clearance } = hotClearance({
    clearance: 63.5e-6,
    journalDiameter: 53.34e-3,
    shellWall: 1.5e-3,
    housing: part,
    shell: part,
    journal: part,
  });
  expect(clearance).toBeCloseTo(63.5e-6 * (1 + steel * 100), 15);
});

test("a journal hotter than its housing closes the fit, and says so as a negative clearance", () => {
  const { clearance, journalGrowth } = hotClearance({
    clearance: 20e-6,
    journalDiameter: 60e-3,
    shellWall: 0,
    housing: { expansion: steel, temperatureC: 80 },
    shell: { expansion: back, temperatureC: 80 },
    journal: { expansion: steel, temperatureC: 130 },
  });
  expect(journalGrowth).toBeCloseTo(60e-3 * steel * 110, 12);
  expect(clearance).toBeLessThan(0);
});

test("beyond a handbook's range the answer is given and marked", () => {
  const stem = hotClearance({
    clearance: 60e-6,
    journalDiameter: 7e-3,
    shellWall: 0,
    housing: { expansion: aluminium, temperatureC: 120 },
    shell: { expansion: back, temperatureC: 700 },
    journal: { expansion: 8.6e-6, temperatureC: 450 },
  });
  expect(stem.outsideRange).toBe(true);
  // A shell that is not there does not count.
  expect(
    hotClearance({
      clearance: 60e-6,
      journalDiameter: 7e-3,
      shellWall: 0,
      housing: { expansion: aluminium, temperatureC: 120 },
      shell: { expansion: back, temperatureC: 700 },
      journal: { expansion: 8.6e-6, temperatureC: 150 },
    }).outsideRange,
  ).toBe(false);
});

test("impossible parts are refused", () => {
  const part = { expansion: steel, temperatureC: 20 };
  const sound = {
    clearance: 50e-6,
    journalDiameter: 0.05,
    shellWall: 1e-3,
    housing: part,
    shell: part,
    journal: part,
  };
  expect(() => hotClearance({ ...sound, clearance: Number.NaN })).toThrow(
    refused("not-a-number", "clearance"),
  );
  expect(() => hotClearance({ ...sound, journalDiameter: 0 })).toThrow(
    refused("not-positive", "journalDiameter"),
  );
  expect(() => hotClearance({ ...sound, shellWall: -1e-3 })).toThrow(refused("negative", "shellWall"));
  expect(() => hotClearance({ ...sound, shell: { ...part, temperatureC: 5000 } })).toThrow(
    refused("outside-range"),
  );
});
