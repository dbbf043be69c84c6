import type { Bearing } from "../cycle/bearing";
import { radial } from "../radial";
import type { FilmCurves } from "./film-table";

/** A bearing as its films see it: one land, or two that share the load where a groove parts them. */
export interface RunningBearing extends Bearing {
  /** Of one land, m. */
  length: number;
  lands: 1 | 2;
  /** Of the journal, rad/s. */
  speed: number;
  /** On all lands, N. */
  load: number;
}

/** A steady film at one viscosity, in SI. */
export interface WorkingPoint {
  /** (R/C)² µ N / P, C the radial clearance, N revolutions per second, P the specific load. */
  sommerfeld: number;
  eccentricityRatio: number;
  leastFilm: number;
  /** From the load line to the least film, in the turn's direction, rad. */
  attitude: number;
  frictionCoefficient: number;
  /** At the journal's surface, N, and what it takes, W. */
  frictionForce: number;
  frictionPower: number;
  /** Oil the turning journal carries in at the widest gap, and what leaves at the edges by film pressure, m³/s. */
  inflow: number;
  sideFlow: number;
  /** Above the surroundings, Pa. */
  peakPressure: number;
  specificLoad: number;
  /** True beyond an eccentricity ratio of 0.99: then `leastFilm` and friction are those of 0.99, the film at most so thick. */
  outsideRange: boolean;
}

/** The film of a bearing at one viscosity, Pa·s; `curves` are those of its L/D. Errors: as `filmCurves`. */
export function workingPoint(bearing: RunningBearing, viscosity: number, curves: FilmCurves): WorkingPoint {
  const { diameter, length, lands, speed, load } = bearing;
  const clearance = radial(bearing.clearance);
  const radius = diameter / 2;
  const turns = speed / (2 * Math.PI);
  const specificLoad = load / (lands * length * diameter);
  const film = curves.under(((radius / clearance) ** 2 * viscosity * turns) / specificLoad);
  const frictionCoefficient = (film.friction * clearance) / radius;
  const flow = lands * radius * clearance * turns * length;
  return {
    sommerfeld: film.sommerfeld,
    eccentricityRatio: film.eccentricityRatio,
    leastFilm: clearance * (1 - film.eccentricityRatio),
    attitude: film.attitude,
    frictionCoefficient,
    frictionForce: frictionCoefficient * load,
    frictionPower: frictionCoefficient * load * speed * radius,
    inflow: flow * film.inflow,
    sideFlow: flow * film.sideFlow,
    peakPressure: specificLoad * film.peakPressure,
    specificLoad,
    outsideRange: film.outsideRange,
  };
}
