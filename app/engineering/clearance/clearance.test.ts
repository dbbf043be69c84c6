import fc from "fast-check";
import { expect, test } from "vitest";
import { fitSpread } from "./fit-spread";
import { positionClearance } from "./position-clearance";
import type { DiameterReading } from "./station-means";
import { againstWindow } from "./window";

const read = (
  plane: DiameterReading["plane"],
  axis: DiameterReading["axis"],
  millimetres: number,
  temperatureC?: number,
): DiameterReading => ({ plane, axis, value: millimetres / 1000, temperatureC });

const micrometres = (value: number | undefined) => Math.round(value! * 1e9) / 1e3;

test("repeats at one station count as their mean, and not twice", () => {
  const { vertical, bore } = positionClearance({
    bore: [
      read("front", "vertical", 53.4),
      read("front", "vertical", 53.402),
      read("rear", "vertical", 53.404),
    ],
    journal: [read("front", "a", 53.34), read("rear", "a", 53.34)],
  });
  expect(micrometres(bore! - 0.05)).toBe(3402.5);
  expect(micrometres(vertical)).toBe(62.5);
});

test("the vertical clearance pairs bore and journal in the same plane", () => {
  // Only the front of the bore is measured: the journal's larger rear has nothing to do with it.
  const { vertical, most, least } = positionClearance({
    bore: [read("front", "vertical", 53.4)],
    journal: [read("front", "a", 53.34), read("front", "b", 53.338), read("rear", "a", 53.35)],
  });
  expect(micrometres(vertical)).toBe(61);
  expect(micrometres(least)).toBe(50);
  expect(micrometres(most)).toBe(62);
});

test("where no plane is shared, the means stand for it", () => {
  const { vertical } = positionClearance({
    bore: [read("front", "vertical", 53.4)],
    journal: [read("rear", "a", 53.34)],
  });
  expect(micrometres(vertical)).toBe(60);
});

test("a valve guide has no load line: its two directions stand for it, and its bell mouth shows", () => {
  const guide = (["front", "rear"] as const).flatMap((plane) => [
    read(plane, "a", 7.06),
    read(plane, "b", 7.062),
  ]);
  const result = positionClearance({
    bore: [...guide, read("middle", "a", 7.04), read("middle", "b", 7.042)],
    journal: [read("front", "a", 7), read("middle", "a", 6.998), read("rear", "a", 7)],
  });
  expect(result.boreShape).toBe("hourglass");
  expect(result.journalShape).toBe("hourglass");
  expect(micrometres(result.vertical)).toBe(55);
  expect(result.missing).toEqual([
    "The journal is measured in one direction only: its out-of-round is not known.",
  ]);
});

test("a journal thick in the middle is a barrel, and a straight taper is neither", () => {
  const journal = (front: number, middle: number, rear: number) =>
    positionClearance({
      bore: [],
      journal: [read("front", "a", front), read("middle", "a", middle), read("rear", "a", rear)],
    });
  expect(journal(53.338, 53.34, 53.339).journalShape).toBe("barrel");
  expect(journal(53.338, 53.339, 53.34)).toMatchObject({ journalShape: "even" });
  expect(micrometres(journal(53.338, 53.339, 53.34).journalTaper)).toBe(-2);
  expect(journal(53.34, 53.34, 53.34).journalShape).toBe("even");
});

test("out-of-round is taken within a plane and does not pass for taper", () => {
  const { boreOutOfRound, boreTaper } = positionClearance({
    bore: [read("front", "vertical", 53.4), read("front", "plus45", 53.41), read("rear", "vertical", 53.402)],
    journal: [],
  });
  expect(micrometres(boreOutOfRound)).toBe(10);
  expect(micrometres(boreTaper)).toBe(-2);
});

test("warm parts of unlike metals are brought to 20 °C first", () => {
  const warm = positionClearance({
    bore: [read("front", "vertical", 60.06, 30)],
    journal: [read("front", "a", 60, 30)],
    boreExpansion: 21.5e-6,
    journalExpansion: 12.3e-6,
  });
  // By hand: 60 µm − 60.06 mm × 21.5e-6 × 10 + 60 mm × 12.3e-6 × 10 = 60 − 12.913 + 7.380 = 54.467; second-order terms
  // are 3 nm.
  expect(warm.vertical! * 1e6).toBeCloseTo(54.467, 2);
  expect(warm.at20).toBe(true);
});

test("a reading without its temperature or its metal stands as it was read, and that is said", () => {
  const bore = [read("front", "vertical", 60.06, 30)];
  const journal = [read("front", "a", 60)];
  expect(positionClearance({ bore, journal, boreExpansion: 21.5e-6, journalExpansion: 12.3e-6 }).at20).toBe(
    false,
  );
  const asRead = positionClearance({ bore, journal });
  expect(asRead.at20).toBe(false);
  expect(micrometres(asRead.vertical)).toBe(60);
});

test("what is missing is said, and what can be given is given", () => {
  const result = positionClearance({
    bore: [read("front", "plus45", 53.4), read("rear", "plus45", 53.4)],
    journal: [read("front", "a", 53.34), read("rear", "a", 53.34), read("front", "b", 53.34)],
  });
  expect(result.vertical).toBeUndefined();
  expect(micrometres(result.mean)).toBe(60);
  expect(result.missing).toEqual([
    "The bore is measured in one direction only: its out-of-round is not known.",
    "The bore is not measured across the load line (vertical).",
  ]);
  expect(positionClearance({ bore: [], journal: [] })).toEqual({
    at20: true,
    interference: false,
    missing: ["No bore is measured.", "No journal is measured."],
  });
});

test("an interference is given and marked; what is no diameter is refused with its place", () => {
  const tight = positionClearance({
    bore: [read("front", "vertical", 22)],
    journal: [read("front", "a", 22.02)],
  });
  expect(tight.interference).toBe(true);
  expect(micrometres(tight.vertical)).toBe(-20);
  for (const value of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) {
    expect(() =>
      positionClearance({
        bore: [read("front", "vertical", 22), read("rear", "vertical", value)],
        journal: [],
      }),
    ).toThrow(expect.objectContaining({ code: "not-positive", field: "bore[1].value" }));
  }
  expect(() =>
    positionClearance({ bore: [read("front", "vertical", 22, 900)], journal: [], boreExpansion: 12e-6 }),
  ).toThrow(expect.objectContaining({ code: "outside-range" }));
});

test("least, mean and most stand in that order for any grid, and the vertical lies between them", () => {
  const grid = (axes: DiameterReading["axis"][]) =>
    fc.array(
      fc
        .tuple(
          fc.constantFrom("front", "middle", "rear"),
          fc.constantFrom(...axes),
          fc.double({ min: 50, max: 51, noNaN: true }),
        )
        .map(([plane, axis, value]) => read(plane as DiameterReading["plane"], axis, value)),
      { minLength: 1, maxLength: 12 },
    );
  fc.assert(
    fc.property(grid(["vertical", "plus45", "minus45", "horizontal"]), grid(["a", "b"]), (bore, journal) => {
      const { least, mean, most, vertical } = positionClearance({ bore, journal });
      const hair = 1e-12;
      expect(mean).toBeGreaterThanOrEqual(least! - hair);
      expect(mean).toBeLessThanOrEqual(most! + hair);
      if (vertical !== undefined) {
        expect(vertical).toBeGreaterThanOrEqual(least! - hair);
        expect(vertical).toBeLessThanOrEqual(most! + hair);
      }
    }),
    { numRuns: 300 },
  );
});

test("a fit's spread names its tightest and its loosest position", () => {
  expect(
    fitSpread([
      { position: 1, clearance: 62e-6 },
      { position: 2, clearance: 58e-6 },
      { position: 3, clearance: undefined },
      { position: 4, clearance: 66e-6 },
    ]),
  ).toEqual({
    spread: expect.closeTo(8e-6, 15),
    mean: expect.closeTo(62e-6, 15),
    tightest: { position: 2, clearance: 58e-6 },
    loosest: { position: 4, clearance: 66e-6 },
  });
  expect(fitSpread([{ position: 1, clearance: 62e-6 }])).toBeUndefined();
});

test("a window's own limits lie inside it", () => {
  const inch = 0.0254;
  const window = { least: 0.0022 * inch, aim: 0.0025 * inch, most: 0.0028 * inch };
  const limits = { least: 0.0012 * inch, most: 0.0032 * inch };
  const place = (inches: number) => againstWindow(inches * inch, window, limits);
  expect(place(0.0025)).toBe("inside");
  expect(place(2.1022 - 2.1)).toBe("inside");
  expect(place(2.1028 - 2.1)).toBe("inside");
  expect(place(0.00219)).toBe("under");
  expect(place(0.00281)).toBe("over");
  expect(place(0.0012)).toBe("under");
  expect(place(0.00119)).toBe("under-limit");
  expect(place(0.00321)).toBe("over-limit");
});
