import { radial } from "../radial";
import { type Bearing, requireBearing } from "./bearing";
import { filmPower, type Instant } from "./film-power";
import { type Journal, moveJournal, type Pace, type Place } from "./journal-motion";
import { type LoadPoint, loadCycle } from "./load-cycle";
import { type FilmModel, filmModelFor, mobility } from "./mobility";
import { requireWithin } from "./sound-input";

/** How the sleeve turns in the frame the loads are given in. */
export type SleeveMotion =
  | { sleeveFixed: true; sleeveSpeed?: undefined }
  | { sleeveFixed?: undefined; sleeveSpeed: number };

/** One bearing's duty over a cycle. */
export type OrbitDuty = SleeveMotion & {
  bearing: Bearing;
  /** Of the oil in the film, Pa·s. */
  viscosity: number;
  loads: readonly LoadPoint[];
  /** Of the crank, rad/s. */
  speed: number;
  /** `auto` where not given: what the bearing's length asks for. */
  film?: FilmModel | "auto";
};

/** Where the journal is at one crank angle. */
export interface OrbitPoint {
  /** Rad. */
  crankAngle: number;
  /** Eccentricity ratio along the rod or cylinder, towards where the load points. */
  ex: number;
  /** Eccentricity ratio 90° ahead of it in the sense the crank turns. */
  ey: number;
  /** Least film at this angle, m. */
  film: number;
}

/** The path of a journal over one cycle and what follows from it. */
export interface Orbit {
  /** m */
  leastFilm: number;
  /** Crank angle of the least film, rad. */
  leastFilmAngle: number;
  /** Heat made in the film, mean over the cycle, W. */
  meanPower: number;
  orbit: OrbitPoint[];
  /** Cycles run, the last one shown. */
  cycles: number;
  /** Whether the last two cycles agree; where not, the film is still moving, as under a load at half journal speed. */
  converged: boolean;
  /** The film model that was used. */
  model: FilmModel;
  /** Whether the journal came closer than the film model is known for (ε above 0.99). */
  outsideRange: boolean;
}

const mostCycles = 40;
const mostSteps = 200_000;
/** Two cycles agree where no film differs by more than this share, and no place by more than this of the clearance. */
const agreement = 1e-3;
const closestKnown = 0.99;

/**
 * The orbit of a journal over an engine cycle by Booker's mobility method, run until two cycles agree.
 * The frame is that of the loads: with `sleeveFixed` the bearing's own (the rod or the block), in which the journal
 * turns at the crank's speed or at the `journalSpeed` of the points; a sleeve that turns in that frame has a
 * `sleeveSpeed`. The film is carried round at the mean of the two as seen in the frame, so a frame that turns itself
 * (a rod, or one that follows a turning load) needs nothing more than speeds seen from it.
 * Range: L/D to 1.5; rigid parts, one viscosity, a film full of oil. Expected error of the film against the Reynolds
 * equation: 1 % to ε 0.99 with the finite film. Real bearings bend, starve and heat, so a film of a few micrometres
 * serves to compare builds, not to promise one.
 * @throws EngineeringError for input outside physical range, and as `loadCycle` and `mobility`
 */
export function orbit(duty: OrbitDuty): Orbit {
  const { bearing, viscosity, speed } = duty;
  requireBearing(bearing);
  requireWithin(viscosity, "viscosity", { from: 1e-5, to: 100, unit: "Pa·s" });
  requireWithin(speed, "speed", { from: 0.1, to: 1e4, unit: "rad/s" });
  const { sleeveSpeed = 0 } = duty;
  requireWithin(sleeveSpeed, "sleeveSpeed", { from: -1e4, to: 1e4, unit: "rad/s" });
  const lengthToDiameter = bearing.length / bearing.diameter;
  const model = duty.film === undefined || duty.film === "auto" ? filmModelFor(lengthToDiameter) : duty.film;
  const relativeClearance = bearing.clearance / bearing.diameter;
  const journal: Journal = {
    mobility: mobility(lengthToDiameter, model),
    ease: relativeClearance ** 2 / (viscosity * bearing.length * bearing.diameter),
  };
  const { cycle, points } = loadCycle(duty.loads, speed);
  const instants = points.map((point) => ({
    crankAngle: point.crankAngle,
    drive: { x: point.x, y: point.y, meanSpeed: (point.journalSpeed + sleeveSpeed) / 2 },
    slidingSpeed: point.journalSpeed - sleeveSpeed,
  }));
  const run = runToAgreement(journal, instants, cycle / points.length / speed);
  const radius = radial(bearing.clearance);
  const samples = instants.map(({ crankAngle }, index) => {
    const { x, y } = run.places[index]!;
    return { crankAngle, ex: x, ey: y, film: radius * (1 - Math.hypot(x, y)) };
  });
  const thinnest = samples.reduce((least, sample) => (sample.film < least.film ? sample : least));
  const heat = instants.reduce(
    (sum, instant, index) => sum + filmPower(bearing, viscosity, journal, run.places[index]!, instant),
    0,
  );
  return {
    leastFilm: thinnest.film,
    leastFilmAngle: thinnest.crankAngle,
    meanPower: heat / instants.length,
    orbit: samples,
    cycles: run.cycles,
    converged: run.converged,
    model,
    outsideRange: thinnest.film < radius * (1 - closestKnown),
  };
}

/**
 * Share of the cycle, 0–1, in which the film is below a limit, m; straight lines between the samples.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function shareBelow(samples: readonly OrbitPoint[], limit: number): number {
  requireWithin(limit, "limit", { from: 1e-12, to: 1, unit: "m" });
  const below = samples.reduce((sum, { film }, index) => {
    const next = samples[(index + 1) % samples.length]!.film;
    const [low, high] = film < next ? [film, next] : [next, film];
    if (high < limit) return sum + 1;
    return low < limit ? sum + (limit - low) / (high - low) : sum;
  }, 0);
  return below / samples.length;
}

/** Runs whole cycles from the middle of the bearing until two agree, or the bounds are reached. */
function runToAgreement(journal: Journal, instants: readonly Instant[], duration: number) {
  const pace: Pace = { left: mostSteps, step: duration };
  let place: Place = { x: 0, y: 0 };
  let places: Place[] = [];
  for (let cycles = 1; ; cycles++) {
    const before = places;
    places = instants.map(({ drive }, index) => {
      const here = place;
      const next = instants[(index + 1) % instants.length]!.drive;
      place = moveJournal(journal, here, drive, next, duration, pace);
      return here;
    });
    const converged = pace.left > 0 && agree(before, places);
    if (converged || cycles === mostCycles || pace.left <= 0) return { places, cycles, converged };
  }
}

function agree(before: readonly Place[], after: readonly Place[]): boolean {
  return (
    before.length === after.length &&
    after.every(({ x, y }, index) => {
      const old = before[index]!;
      const film = 1 - Math.hypot(x, y);
      const change = Math.abs(film - (1 - Math.hypot(old.x, old.y)));
      return change <= agreement * film && Math.hypot(x - old.x, y - old.y) <= agreement;
    })
  );
}
