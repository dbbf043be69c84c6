import { expect, test } from "vitest";
import { positionClearance } from "~/engineering/clearance/position-clearance";
import { type FitKindName, fitKind } from "~/engineering/trade/fit-kinds";
import { makePart, type Part, sizeOfRecord, stationsOf, wornPart } from "./parts";
import { Random } from "./random";

const random = Random.named("parts of the tests");

function clearanceOf(kind: FitKindName, bore: Part, journal: Part) {
  const read = (feature: "bore" | "journal", part: Part) =>
    stationsOf(fitKind(kind), feature).map((station, index) => ({ ...station, value: part[index]! }));
  return positionClearance({ bore: read("bore", bore), journal: read("journal", journal) }).vertical!;
}

const kinds: FitKindName[] = [
  "main",
  "big-end",
  "pin-in-piston",
  "pin-in-rod",
  "intake-stem",
  "exhaust-stem",
];

// Arithmetic of a bore and a journal that are measured without error; 1 fm is what sums of doubles at 50 mm leave.
test.each(kinds)(
  "%s: parts made for a clearance have it by the product's own reckoning, new and worn",
  (kind) => {
    const bores = stationsOf(fitKind(kind), "bore");
    const journals = stationsOf(fitKind(kind), "journal");
    const journal = makePart(journals, 0.05, random);
    const bore = makePart(bores, sizeOfRecord(journals, journal) + 60e-6, random);
    expect(Math.abs(clearanceOf(kind, bore, journal) - 60e-6)).toBeLessThan(1e-15);

    const worn = clearanceOf(kind, wornPart(bores, bore, 3e-6), wornPart(journals, journal, 1e-6));
    expect(Math.abs(worn - 64e-6)).toBeLessThan(1e-15);
  },
);
