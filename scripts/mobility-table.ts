import { writeFileSync } from "node:fs";
import { moesMobility } from "../app/engineering/cycle/moes-mobility";
import { squeezeFilm } from "../app/engineering/cycle/squeeze-film";

// Makes app/engineering/cycle/mobility-table.generated.ts: what Moes' mobility must be stretched and turned by to
// agree with the Reynolds equation. Run with `npx tsx scripts/mobility-table.ts`; it takes a quarter of an hour.

const lengthToDiameters = [0.1, 0.15, 0.2, 0.3, 0.4, 0.5, 0.65, 0.8, 1, 1.25, 1.5];
const thinnessSteps = 21;
const cosineSteps = 21;
const mesh = { around: 360, along: 24 };

/** Directions of push, closest about 90°, where the answer changes most. */
const pushes = Array.from({ length: 49 }, (_, index) => {
  const even = (Math.PI * (index + 0.1)) / 48.2;
  return even + 0.25 * Math.sin(2 * even);
});

interface Correction {
  cosine: number;
  stretch: number;
  turn: number;
}

function correctionAt(eccentricity: number, push: number, lengthToDiameter: number): Correction {
  const { impedance, angle } = squeezeFilm(eccentricity, push, lengthToDiameter, mesh);
  const along = eccentricity * Math.cos(angle);
  const across = -eccentricity * Math.sin(angle);
  const fit = moesMobility(along, across, lengthToDiameter);
  const size = Math.hypot(fit.along, fit.across);
  const cosine = (along * fit.along + across * fit.across) / (eccentricity * size);
  const sine = (along * fit.across - across * fit.along) / (eccentricity * size);
  const ratio = 1 / (impedance * size);
  const turn = push - angle - Math.atan2(fit.across, fit.along);
  return { cosine, stretch: ratio * Math.cos(turn), turn: (ratio * Math.sin(turn)) / sine };
}

function row(eccentricity: number, lengthToDiameter: number): number[] {
  const found = pushes
    .map((push) => correctionAt(eccentricity, push, lengthToDiameter))
    .sort((a, b) => a.cosine - b.cosine);
  return Array.from({ length: cosineSteps }, (_, index) => (2 * index) / (cosineSteps - 1) - 1).flatMap(
    (cosine) => {
      const after = found.findIndex((each, place) => place > 0 && each.cosine >= cosine);
      const high = found.at(after)!; // the last one, where the cosine is beyond them all
      const low = found[found.indexOf(high) - 1]!;
      const part = Math.max(0, Math.min(1, (cosine - low.cosine) / (high.cosine - low.cosine)));
      return [
        low.stretch + part * (high.stretch - low.stretch),
        low.turn + part * (high.turn - low.turn),
      ].map((value) => Math.round(1000 * value));
    },
  );
}

const tables = lengthToDiameters.map((lengthToDiameter) => {
  const rows = Array.from({ length: thinnessSteps }, (_, index) => {
    // At the very wall the solver has no mesh fine enough, and in the very centre there is no line of centres.
    const thinness = Math.max(1, index) / (thinnessSteps - 1);
    return row(Math.max(1e-3, 1 - thinness ** 2), lengthToDiameter);
  });
  console.log(`L/D ${lengthToDiameter}`);
  return rows.map((values) => `    ${values.join(", ")},`).join("\n");
});

writeFileSync(
  new URL("../app/engineering/cycle/mobility-table.generated.ts", import.meta.url),
  `// Made by scripts/mobility-table.ts; not to be edited.

/** Lengths the table knows, in diameters. */
export const lengthToDiameters = [${lengthToDiameters.join(", ")}];

/** Rows: √(1 − ε) from 0 to 1 in even steps. */
export const thinnessSteps = ${thinnessSteps};

/** Columns: cosine of the angle from the line of centres to Moes' mobility, −1 to 1 in even steps. */
export const cosineSteps = ${cosineSteps};

/** By length, row and column: stretch of Moes' mobility and its turn over the sine of that angle, in thousandths. */
export const mobilityCorrections: readonly (readonly number[])[] = [
${tables.map((table) => `  [\n${table}\n  ],`).join("\n")}
];
`,
);
