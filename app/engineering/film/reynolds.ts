import { requireWithin } from "../cycle/sound-input";
import type { MeshSize } from "./film-mesh";
import { type FilmPressure, type FilmShape, filmPressure } from "./film-pressure";

/** A steady film in numbers without dimension: C radial clearance, N revolutions per second, P load over length and diameter. */
export interface FilmSolution {
  /** S = (R/C)² µ N / P. */
  sommerfeld: number;
  /** From the load line to the thinnest film, rad. */
  attitude: number;
  /** Friction coefficient at the journal times R/C, the whole turn filled. */
  friction: number;
  /** Oil carried in at the widest gap, over R C N L. */
  inflow: number;
  /** Oil that leaves at both edges, over R C N L. */
  sideFlow: number;
  /** Peak pressure over P. */
  peakPressure: number;
  /** Of the peak, and of the end of the film in the middle of the bearing, from the widest gap, rad. */
  peakAngle: number;
  filmEnd: number;
  converged: boolean;
}

const usualMesh: MeshSize = { around: 240, along: 20 };

/**
 * A steady plain bearing by the Reynolds equation, finite length, the film torn where pressure and gradient vanish
 * (`filmPressure`), some thousandths of a second a film.
 * Range: eccentricity ratio 1e-6–0.99, L/D 0.02–100. Error with the usual mesh: under 0.3 % for L/D to 2.
 * Source: O. Reynolds (1886) with the boundary of H. Swift (1932) and W. Stieber (1933); the friction from the shear
 * stress at the journal in closed form, (R/C) f = 2π² S/√(1−ε²) + ε sin φ/2, as the published tables count it.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function solveReynolds(
  { eccentricityRatio, lengthToDiameter }: FilmShape,
  mesh = usualMesh,
): FilmSolution {
  requireWithin(eccentricityRatio, "eccentricityRatio", { from: 1e-6, to: 0.99, unit: "of the clearance" });
  requireWithin(lengthToDiameter, "lengthToDiameter", { from: 0.02, to: 100, unit: "diameters" });
  const shape = { eccentricityRatio, lengthToDiameter };
  const film = filmPressure(shape, mesh);
  const force = forceOf(film);
  const size = Math.hypot(force.outward, force.sideways);
  const sommerfeld = 1 / (6 * Math.PI * eccentricityRatio * size);
  const attitude = Math.atan2(force.sideways, force.outward);
  const peak = peakOf(film);
  return {
    sommerfeld,
    attitude,
    friction: frictionOf(eccentricityRatio, sommerfeld, attitude),
    inflow: inflowOf(shape, film),
    sideFlow: sideFlowOf(shape, film),
    peakPressure: (2 * peak.pressure) / size,
    peakAngle: peak.angle,
    filmEnd: filmEndOf(film),
    converged: film.converged,
  };
}

/** Friction coefficient at the journal times R/C; exact for a film filled all round. */
export function frictionOf(eccentricityRatio: number, sommerfeld: number, attitude: number): number {
  return (
    (2 * Math.PI ** 2 * sommerfeld) / Math.sqrt(1 - eccentricityRatio ** 2) +
    (eccentricityRatio * Math.sin(attitude)) / 2
  );
}

/** Force on the journal away from the thinnest film and square to it, per unit of the pressures' scale. */
function forceOf({ around, along, values }: FilmPressure): { outward: number; sideways: number } {
  const rows = along.place.length - 1;
  let outward = 0;
  let sideways = 0;
  for (let i = 1; i < around.place.length - 1; i++) {
    let column = 0;
    for (let j = 0; j < rows; j++) column += values[i * rows + j]! * along.width[j]!;
    outward -= column * around.width[i]! * Math.cos(around.place[i]!);
    sideways += column * around.width[i]! * Math.sin(around.place[i]!);
  }
  return { outward, sideways };
}

/** The flow through the first face after the widest gap; between them nothing is lost but the square of a step. */
function inflowOf({ eccentricityRatio }: FilmShape, { around, along, values }: FilmPressure): number {
  const rows = along.place.length - 1;
  const gap = 1 + eccentricityRatio * Math.cos(around.face[0]!);
  let slope = 0;
  for (let j = 0; j < rows; j++) slope += (values[rows + j]! * along.width[j]!) / around.place[1]!;
  return Math.PI * (gap - eccentricityRatio * gap ** 3 * slope);
}

/** What reaches the edge: the flow into the edge's half cells and what the wedge adds in them. */
function sideFlowOf(
  { eccentricityRatio, lengthToDiameter }: FilmShape,
  { around, along, values }: FilmPressure,
): number {
  const rows = along.place.length - 1;
  const step = along.place[rows]! - along.place[rows - 1]!;
  let flow = 0;
  for (let i = 1; i < around.place.length - 1; i++) {
    const pressure = values[i * rows + rows - 1]!;
    if (pressure === 0) continue;
    const angle = around.place[i]!;
    const gap = 1 + eccentricityRatio * Math.cos(angle);
    const wedge = (Math.sin(angle) * step) / 2;
    flow += around.width[i]! * ((gap ** 3 * pressure) / (step * lengthToDiameter ** 2) + wedge);
  }
  return Math.PI * eccentricityRatio * flow;
}

/** The highest pressure and its angle, by the parabola through the highest node and its neighbours. */
function peakOf({ around, along, values }: FilmPressure): { pressure: number; angle: number } {
  const rows = along.place.length - 1;
  let top = 1;
  for (let i = 1; i < around.place.length - 1; i++) if (values[i * rows]! > values[top * rows]!) top = i;
  const [before, at, after] = [top - 1, top, top + 1].map((i) => around.place[i]!) as [
    number,
    number,
    number,
  ];
  const [low, high, next] = [top - 1, top, top + 1].map((i) => values[i * rows]!) as [number, number, number];
  const rise = (high - low) / (at - before);
  const fall = (next - high) / (after - at);
  const bend = (fall - rise) / (after - before);
  const angle = (before + at) / 2 - rise / (2 * bend);
  return { angle, pressure: low + rise * (angle - before) + bend * (angle - before) * (angle - at) };
}

/** Where the film tears in the middle: the square root of the pressure falls there in a straight line. */
function filmEndOf({ around, along, values }: FilmPressure): number {
  const rows = along.place.length - 1;
  let last = around.place.length - 2;
  while (last > 2 && values[last * rows] === 0) last--;
  const end = Math.sqrt(values[last * rows]!);
  const before = Math.sqrt(values[(last - 1) * rows]!);
  const step = around.place[last]! - around.place[last - 1]!;
  return Math.min(around.place[last + 1]!, around.place[last]! + (step * end) / (before - end));
}
