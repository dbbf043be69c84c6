import { solveReynolds } from "./reynolds";

/** Lengths of the film table, in diameters. */
export const tableLengths = [0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.6, 0.75, 0.9, 1.1, 1.3, 1.5];

/** Its √(1 − ε), rising evenly from the eccentricity ratio 0.99 to a centred journal. */
export const tableOpennesses = Array.from({ length: 31 }, (_, index) =>
  Number((0.1 + 0.03 * index).toFixed(2)),
);

const mesh = { around: 480, along: 32 };

/**
 * One film of the table, in 1e-5: logarithm of the load number 1/(2πS) over ε; attitude, rad; inflow; side flow over ε;
 * peak pressure times √(1 − ε). In this form every quantity is finite and even from a centred journal to ε 0.99.
 */
export function tableFilm(lengthToDiameter: number, openness: number): number[] {
  const eccentricityRatio = Math.max(1e-6, 1 - openness ** 2);
  const film = solveReynolds({ eccentricityRatio, lengthToDiameter }, mesh);
  return [
    -Math.log(2 * Math.PI * film.sommerfeld * eccentricityRatio),
    film.attitude,
    film.inflow,
    film.sideFlow / eccentricityRatio,
    film.peakPressure * openness,
  ].map((value) => Math.round(1e5 * value));
}
