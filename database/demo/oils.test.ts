import { expect, test } from "vitest";
import { shearedShare } from "~/engineering/oil/high-shear";
import { gradeOf } from "~/engineering/oil/j300";
import { viscosityIndex } from "~/engineering/oil/viscosity-index";
import { demoOils } from "./oils";

// SAE J300 (January 2015, read in secondary pages) by the core's own check; an engine oil's viscosity index lies
// between 90 and 220 (common practice, no source).
test.each(demoOils)("$name is what its label says", ({ grade, kv40, kv100, density15, hthsPaS }) => {
  expect(gradeOf({ kv100, hths: hthsPaS, label: grade }).disagreements).toEqual([]);
  const index = viscosityIndex({ kv40, kv100 });
  expect(index.index).toBeGreaterThan(90);
  expect(index.index).toBeLessThan(220);
  expect(shearedShare({ kv40, kv100, density15, hths: hthsPaS })).toBeLessThan(1);
});
