import { writeFileSync } from "node:fs";
import { tableFilm, tableLengths, tableOpennesses } from "../app/engineering/film/table-film";

// Makes app/engineering/film/film-table.generated.ts from the Reynolds equation. Run with `npm run film-table`;
// it takes about a minute.

const films = tableLengths.map((lengthToDiameter) => {
  const nodes = tableOpennesses.map((openness) => tableFilm(lengthToDiameter, openness));
  console.log(`L/D ${lengthToDiameter}`);
  return nodes[0]!.map((_, quantity) => nodes.map((node) => node[quantity]));
});

writeFileSync(
  new URL("../app/engineering/film/film-table.generated.ts", import.meta.url),
  `// Made by scripts/film-table.ts; not to be edited.

/** Lengths the table knows, in diameters. */
export const lengthToDiameters: readonly number[] = [${tableLengths.join(", ")}];

/** The √(1 − ε) it knows. */
export const opennesses: readonly number[] = [
  ${tableOpennesses.join(", ")},
];

/** By length, quantity (as in table-film.ts) and openness, in 1e-5. */
export const films: readonly (readonly (readonly number[])[])[] = [
${films.map((film) => `  [\n${film.map((values) => `    [${values.join(", ")}],`).join("\n")}\n  ],`).join("\n")}
];
`,
);
