import { requireWithin } from "../cycle/sound-input";
import { risingRoot } from "./false-position";
import { films, lengthToDiameters, opennesses } from "./film-table.generated";
import { monotoneCurve, spotAt, valueAt } from "./monotone-curve";
import { type FilmSolution, frictionOf } from "./reynolds";

/** Limits of the table; both ends are in it. */
export const tableRange = {
  lengthToDiameter: { from: 0.15, to: 1.5, unit: "diameters" },
  eccentricityRatio: { from: 0, to: 0.99, unit: "of the clearance" },
} as const;

/** A film of the table, in the same numbers as `solveReynolds`. */
export type TableFilm = Omit<FilmSolution, "peakAngle" | "filmEnd" | "converged"> & {
  eccentricityRatio: number;
  /** True where the load asks for more than an eccentricity ratio of 0.99: the film at 0.99 is given. */
  outsideRange: boolean;
};

/** Every film of one bearing, from the table. */
export interface FilmCurves {
  /** The film that a Sommerfeld number, above zero, asks for. */
  under: (sommerfeld: number) => TableFilm;
  /** The film at an eccentricity ratio above 0 and up to 0.99. */
  at: (eccentricityRatio: number) => TableFilm;
}

/**
 * The steady films of a bearing by its length, from the table that `scripts/film-table.ts` makes with `solveReynolds`.
 * Between the table's films the curves are monotone. Error against the solver: under 0.2 %.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range` beyond L/D 0.15–1.5
 */
export function filmCurves(lengthOverDiameter: number): FilmCurves {
  // A length of exactly so many diameters may come out a rounding beside it.
  const lengthToDiameter = Number(lengthOverDiameter.toPrecision(12));
  requireWithin(lengthToDiameter, "length", tableRange.lengthToDiameter);
  const { capacity, attitude, inflow, sideFlow, peak } = curvesFor(lengthToDiameter);
  const loadAt = (eccentricityRatio: number) =>
    eccentricityRatio *
    closedCapacity(eccentricityRatio, lengthToDiameter) *
    Math.exp(valueAt(capacity, spotAt(opennesses, openness(eccentricityRatio))));
  const most = tableRange.eccentricityRatio.to;
  const heaviest = loadAt(most);

  const filmAt = (eccentricityRatio: number, sommerfeld: number, outsideRange: boolean): TableFilm => {
    const open = openness(eccentricityRatio);
    const spot = spotAt(opennesses, open);
    const angle = valueAt(attitude, spot);
    return {
      eccentricityRatio,
      sommerfeld,
      attitude: angle,
      friction: frictionOf(eccentricityRatio, sommerfeld, angle),
      inflow: valueAt(inflow, spot),
      sideFlow: eccentricityRatio * valueAt(sideFlow, spot),
      peakPressure: valueAt(peak, spot) / open,
      outsideRange,
    };
  };

  return {
    at: (eccentricityRatio) => {
      requireWithin(eccentricityRatio, "eccentricityRatio", { ...tableRange.eccentricityRatio, from: 1e-12 });
      return filmAt(eccentricityRatio, 1 / (2 * Math.PI * loadAt(eccentricityRatio)), false);
    },
    under: (sommerfeld) => {
      const load = 1 / (2 * Math.PI * sommerfeld);
      return load > heaviest
        ? filmAt(most, sommerfeld, true)
        : filmAt(eccentricityUnder(load, loadAt), sommerfeld, false);
    },
  };
}

/** Root of one minus the eccentricity ratio: the table's coordinate, even where films are thin. */
const openness = (eccentricityRatio: number) => Math.sqrt(1 - eccentricityRatio);

/** The table's five quantities over openness, rising, at one L/D; the first as what `closedCapacity` lacks of it. */
function curvesFor(lengthToDiameter: number) {
  const spot = spotAt(logLengths, Math.log(lengthToDiameter));
  const nodes = (quantity: number) => overLength[quantity]!.map((curve) => valueAt(curve, spot));
  const lacking = nodes(0).map(
    (value, node) => value - Math.log(closedCapacity(1 - opennesses[node]! ** 2, lengthToDiameter)),
  );
  return {
    capacity: monotoneCurve(opennesses, lacking),
    attitude: monotoneCurve(opennesses, nodes(1)),
    inflow: monotoneCurve(opennesses, nodes(2)),
    sideFlow: monotoneCurve(opennesses, nodes(3)),
    peak: monotoneCurve(opennesses, nodes(4)),
  };
}

const logLengths = lengthToDiameters.map(Math.log);

/** By quantity and openness, the curve over the logarithm of L/D. */
const overLength = films[0]!.map((_, quantity) =>
  opennesses.map((_, node) =>
    monotoneCurve(
      logLengths,
      films.map((film) => film[quantity]![node]! / 1e5),
    ),
  ),
);

/**
 * Load number 1/(2πS) over the eccentricity ratio by closed forms, within 13 % of the finite bearing: the short bearing
 * (Ocvirk) and the long one with half a film (Sommerfeld), one after the other like two springs.
 */
function closedCapacity(eccentricityRatio: number, lengthToDiameter: number): number {
  const square = eccentricityRatio ** 2;
  const open = 1 - square;
  const short = (lengthToDiameter ** 2 / 2) * (Math.sqrt(Math.PI ** 2 * open + 16 * square) / open ** 2);
  const long = (3 * Math.sqrt(Math.PI ** 2 * open + 4 * square)) / ((2 + square) * open);
  return 1 / (1 / short + 1 / long);
}

/**
 * The eccentricity ratio that carries a load number up to the table's heaviest, sought over ln(ε/(1−ε)), in which the
 * logarithm of the load is nearly straight.
 */
function eccentricityUnder(load: number, loadAt: (eccentricityRatio: number) => number): number {
  const most = tableRange.eccentricityRatio.to;
  // The load grows faster than the eccentricity ratio, which bounds the answer from both sides.
  const tiny = 1e-9;
  const { place } = risingRoot((place) => Math.log(loadAt(ratioAt(place)) / load), {
    low: placeOf((load * most) / loadAt(most)),
    high: placeOf(Math.min(most, (load * tiny) / loadAt(tiny))),
    tolerance: 1e-12,
  });
  return ratioAt(place);
}

const placeOf = (eccentricityRatio: number) => Math.log(eccentricityRatio / (1 - eccentricityRatio));
const ratioAt = (place: number) => 1 / (1 + Math.exp(-place));
