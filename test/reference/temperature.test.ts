import { expect, test } from "vitest";
import { at20 } from "~/engineering/temperature/expansion";
import { hotClearance } from "~/engineering/temperature/hot-clearance";
import { findMaterial } from "~/engineering/temperature/materials";

// Callister, Fundamentals of Materials Science and Engineering, 3rd ed., table B.6, and a handbook's table of aluminium
// casting and forging alloys: millionths per °C, as read in collections of them. Aluminium 2618 is from memory.
test.each([
  ["gray-iron", 11.4],
  ["ductile-iron-60-40-18", 11.2],
  ["ductile-iron-80-55-06", 10.6],
  ["steel-1020", 11.7],
  ["steel-1040", 11.3],
  ["steel-4140", 12.3],
  ["steel-4340", 12.3],
  ["aluminium-356", 21.5],
  ["aluminium-319", 21.5],
  ["aluminium-4032", 19.4],
  ["aluminium-2218", 22.3],
  ["aluminium-a132", 19.0],
  ["aluminium-2024", 22.9],
  ["aluminium-6061", 23.6],
  ["aluminium-2618", 22.3],
  ["cartridge-brass-c26000", 19.9],
  ["free-cutting-brass-c36000", 20.5],
  ["bearing-bronze-c93200", 18.0],
  ["phosphor-bronze-c51000", 17.8],
  ["titanium-6al-4v", 8.6],
])("%s expands by %d millionths per °C", (key, expected) => {
  expect(findMaterial(key).expansion * 1e6).toBeCloseTo(expected, 10);
});

// Computed independently from d20 = d / (1 + α Δt), ISO 1's reference temperature; 12 figures, so to a tenth of a nm.
test.each([
  [60, 35, "gray-iron", 59.98974175416],
  [60, 35, "aluminium-356", 59.9806562383631],
])("%d mm read at %d °C in %s is %d mm at 20 °C", (millimetres, temperatureC, material, expected) => {
  const diameter = at20(millimetres / 1000, temperatureC, findMaterial(material).expansion);
  expect(diameter * 1000).toBeCloseTo(expected, 10);
});

// Common knowledge of the measuring room, and by hand: 100 mm × 11.5e-6 × 1 °C = 1.15 µm.
test("a steel of 100 mm is 1.15 µm longer for each degree", () => {
  expect((0.1 - at20(0.1, 21, 11.5e-6)) * 1e6).toBeCloseTo(1.15, 4);
});

// By hand: an inch-sized case of a shop, 2.5 in × 11.5e-6 × 5 °C = 3.65 µm, 0.00014 in.
test("a steel journal of 2.5 in read 5 °C warm reads 0.00014 in too large", () => {
  const journal = 2.5 * 0.0254;
  expect((journal - at20(journal, 25, 11.5e-6)) / 0.0254).toBeCloseTo(0.00014, 5);
});

// Computed independently: bore 60.060 mm (21.5e-6) on a journal of 60.000 mm (12.3e-6) at 100 °C, 104.2632 µm.
test("an aluminium housing on a steel journal opens from 60 to 104.26 µm at 100 °C", () => {
  const { clearance } = hotClearance({
    clearance: 60e-6,
    journalDiameter: 0.06,
    shellWall: 0,
    housing: { expansion: findMaterial("aluminium-356").expansion, temperatureC: 100 },
    shell: { expansion: 0, temperatureC: 100 },
    journal: { expansion: findMaterial("steel-4340").expansion, temperatureC: 100 },
  });
  expect(clearance * 1e6).toBeCloseTo(104.2632, 6);
});
