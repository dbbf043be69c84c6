import { expect, test } from "vitest";
import { orbit } from "~/engineering/cycle/orbit";
import { solveReynolds } from "~/engineering/film/reynolds";

// A constant load must settle to the steady bearing. The two come from different solutions of the Reynolds equation:
// the cycle's by relaxation with a free start of the film, the steady one by active sets from the widest gap, itself
// checked against published tables. Tolerance 1 % of film and friction: the cycle's own.
test.each([
  [0.2, 0.6],
  [0.3, 0.98],
  [0.4, 0.85],
  [0.75, 0.7],
  [0.75, 0.9],
  [1, 0.2],
  [1.25, 0.8],
  [1.5, 0.95],
])("the cycle's steady limit is the steady film, L/D %d, ε %d", (lengthToDiameter, eccentricityRatio) => {
  const { sommerfeld, friction } = solveReynolds({ eccentricityRatio, lengthToDiameter });
  const [radius, clearance, viscosity, turns] = [0.025, 25e-6, 0.01, 50];
  const load =
    ((viscosity * turns * 4 * radius ** 2 * lengthToDiameter) / sommerfeld) * (radius / clearance) ** 2;
  const speed = 2 * Math.PI * turns;
  const settled = orbit({
    bearing: { diameter: 2 * radius, length: 2 * radius * lengthToDiameter, clearance: 2 * clearance },
    viscosity,
    loads: Array.from({ length: 72 }, (_, index) => ({ crankAngle: (index * Math.PI) / 18, x: load, y: 0 })),
    speed,
    sleeveFixed: true,
  });
  expect(Math.abs(settled.leastFilm / clearance / (1 - eccentricityRatio) - 1)).toBeLessThan(0.01);
  const coefficient = settled.meanPower / (load * speed * radius);
  expect(Math.abs((coefficient * radius) / clearance / friction - 1)).toBeLessThan(0.01);
});
