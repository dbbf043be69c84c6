import { EngineeringError } from "../engineering-error";
import {
  cosineSteps,
  lengthToDiameters,
  mobilityCorrections,
  thinnessSteps,
} from "./mobility-table.generated";
import { type MobilityVector, moesMobility, openGap } from "./moes-mobility";

/** Mobility at a place of the journal, given as eccentricity ratios along the load and 90° ahead of it. */
export type Mobility = (along: number, across: number) => MobilityVector;

/** Which film model a mobility comes from. */
export type FilmModel = "short" | "finite";

// A length of exactly so many diameters may come out a rounding beside it.
const shortest = lengthToDiameters[0]! * (1 - 1e-9);
const longest = lengthToDiameters[lengthToDiameters.length - 1]! * (1 + 1e-9);

/** The film model that a bearing's length asks for: finite from L/D 0.1, the shortest of its table; short below. */
export function filmModelFor(lengthToDiameter: number): FilmModel {
  return lengthToDiameter < shortest ? "short" : "finite";
}

/**
 * The mobility of a plain bearing with a film all round: de/dt = F (C/R)² / (µ L D) · M + ω̄ × e, with e in radial
 * clearances, C the radial clearance and ω̄ the mean of the journal's and the sleeve's angular velocity.
 * @throws EngineeringError `outside-range` for a finite film outside L/D 0.1–1.5
 */
export function mobility(lengthToDiameter: number, model: FilmModel): Mobility {
  return model === "short" ? shortMobility(lengthToDiameter) : finiteMobility(lengthToDiameter);
}

/**
 * Booker's curve fit of the short bearing whose film breaks at ambient pressure.
 * Expected error against the exact short bearing: up to 2.4 % in steady load, 6 % in the vector below ε 0.8; the short
 * bearing itself carries more than a finite one, the more so the thinner the film (18 % at L/D 0.25, ε 0.8).
 * Source: J. F. Booker, J. Basic Engineering 87 (1965) 537–546, as in P. Flores (2006), seen in a public program.
 */
function shortMobility(lengthToDiameter: number): Mobility {
  const slenderness = 1 / lengthToDiameter ** 2;
  return (along, across) => {
    const gap = openGap(along);
    const root = Math.sqrt(gap);
    return {
      along: (slenderness / Math.PI) * gap * gap * root,
      across: -((4 * slenderness) / Math.PI ** 2) * across * gap * root,
    };
  };
}

/**
 * The finite bearing: Moes' sum of a short and a long bearing's mobility, set right by a table from the Reynolds
 * equation (`squeezeFilm`). Moes alone is up to 60 % fast at ε 0.98; with the table the vector is within 1 % to ε 0.99, 4 % beyond.
 * Range: L/D 0.1–1.5, ε to 0.9975; beyond, the last correction holds.
 * Source: H. Moes' formula as in D. Childs, H. Moes, H. van Leeuwen, J. Lubrication Technology 99 (1977) 198–210
 * (from memory; it tends to Booker's fit for a short bearing, and the table closes what it lacks).
 */
function finiteMobility(lengthToDiameter: number): Mobility {
  const corrections = correctionsFor(lengthToDiameter);
  return (along, across) => {
    const fit = moesMobility(along, across, lengthToDiameter);
    const eccentricity = Math.sqrt(along * along + across * across);
    if (eccentricity === 0) return correct(fit, corrections, 0, 1, 0);
    const scale = 1 / (eccentricity * Math.sqrt(fit.along * fit.along + fit.across * fit.across));
    const outward = (along * fit.along + across * fit.across) * scale;
    const sideways = (along * fit.across - across * fit.along) * scale;
    return correct(fit, corrections, outward, thinness(eccentricity), sideways);
  };
}

/** How open the film is, 1 in the centre, 0 at contact: the table's coordinate, even where films are thin. */
const thinness = (eccentricity: number) => Math.sqrt(Math.max(0, 1 - eccentricity));

/**
 * Stretches and turns a mobility by the table's factor: `outward` and `sideways` are the cosine and sine of the
 * angle from the line of centres to the mobility.
 */
function correct(
  { along, across }: MobilityVector,
  corrections: Float64Array,
  outward: number,
  open: number,
  sideways: number,
): MobilityVector {
  const row = open * (thinnessSteps - 1);
  const column = ((outward + 1) / 2) * (cosineSteps - 1);
  const i = Math.max(0, Math.min(thinnessSteps - 2, Math.floor(row)));
  const j = Math.max(0, Math.min(cosineSteps - 2, Math.floor(column)));
  const down = row - i;
  const right = column - j;
  const first = 2 * (i * cosineSteps + j);
  const below = first + 2 * cosineSteps;
  const weights = [(1 - down) * (1 - right), (1 - down) * right, down * (1 - right), down * right] as const;
  const stretch =
    weights[0] * corrections[first]! +
    weights[1] * corrections[first + 2]! +
    weights[2] * corrections[below]! +
    weights[3] * corrections[below + 2]!;
  const turn =
    sideways *
    (weights[0] * corrections[first + 1]! +
      weights[1] * corrections[first + 3]! +
      weights[2] * corrections[below + 1]! +
      weights[3] * corrections[below + 3]!);
  return { along: along * stretch - across * turn, across: across * stretch + along * turn };
}

/** The table at one L/D: cubic through the four nearest lengths (Lagrange). */
function correctionsFor(lengthToDiameter: number): Float64Array {
  if (!(lengthToDiameter >= shortest && lengthToDiameter <= longest)) {
    throw new EngineeringError(
      "outside-range",
      "bearing.length",
      `The finite film is known for a length of ${lengthToDiameters[0]} to ${lengthToDiameters.at(-1)} diameters, not ${lengthToDiameter.toPrecision(3)}.`,
    );
  }
  const below = lengthToDiameters.findLastIndex((length) => length <= lengthToDiameter);
  const start = Math.max(0, Math.min(lengthToDiameters.length - 4, below - 1));
  const near = lengthToDiameters.slice(start, start + 4);
  const corrections = new Float64Array(2 * thinnessSteps * cosineSteps);
  near.forEach((length, index) => {
    const others = near.filter((_, other) => other !== index);
    const weight = others.reduce((w, other) => (w * (lengthToDiameter - other)) / (length - other), 1);
    mobilityCorrections[start + index]!.forEach((perMille, cell) => {
      corrections[cell]! += (weight * perMille) / 1000;
    });
  });
  return corrections;
}
