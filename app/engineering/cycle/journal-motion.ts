import type { Mobility } from "./mobility";

/** Place of a journal in its clearance, in radial clearances from the middle. */
export interface Place {
  x: number;
  y: number;
}

/** What drives a journal at one instant. */
export interface Drive {
  /** Load of the journal on the sleeve, N. */
  x: number;
  y: number;
  /** Mean of the journal's and the sleeve's angular velocity in the frame of the load, rad/s. */
  meanSpeed: number;
}

/** How one bearing lets its journal move. */
export interface Journal {
  mobility: Mobility;
  /** (C/R)² / (µ L D), C the radial clearance: speed per load at mobility 1, 1/(N s). */
  ease: number;
}

/** Steps an integration may still take, and the last step that was fine enough, s. */
export interface Pace {
  left: number;
  step: number;
}

/** Share of the film that one step may be wrong by. */
const tolerance = 1e-4;

/**
 * The speed of the journal's centre, in radial clearances a second: de/dt = F (C/R)² / (µ L D) · M + ω̄ × e.
 * Source: J. F. Booker, J. Basic Engineering 87 (1965) 537–546.
 */
export function journalVelocity(journal: Journal, x: number, y: number, drive: Drive): Place {
  return velocityBetween(journal, x, y, drive, drive, 0);
}

/** The same, part of the way from one drive to the next. */
function velocityBetween(
  { mobility, ease }: Journal,
  x: number,
  y: number,
  from: Drive,
  to: Drive,
  part: number,
): Place {
  const forceX = from.x + part * (to.x - from.x);
  const forceY = from.y + part * (to.y - from.y);
  const meanSpeed = from.meanSpeed + part * (to.meanSpeed - from.meanSpeed);
  const force = Math.sqrt(forceX * forceX + forceY * forceY);
  if (force === 0) return { x: -meanSpeed * y, y: meanSpeed * x };
  const unitX = forceX / force;
  const unitY = forceY / force;
  const { along, across } = mobility(x * unitX + y * unitY, y * unitX - x * unitY);
  const pace = ease * force;
  return {
    x: pace * (along * unitX - across * unitY) - meanSpeed * y,
    y: pace * (along * unitY + across * unitX) + meanSpeed * x,
  };
}

/**
 * Moves a journal through one stretch of time, load and speed changing evenly from one drive to the other.
 * A Rosenbrock pair of second order with steps chosen by its error: it stays stable however thin the film, where
 * motion is stiff. Where the pace runs out of steps the journal stays where it got to.
 * Source: L. Shampine & M. Reichelt, The MATLAB ODE Suite, SIAM J. Sci. Comput. 18 (1997), its pair of orders 2 and 3.
 */
export function moveJournal(
  journal: Journal,
  start: Place,
  from: Drive,
  to: Drive,
  duration: number,
  pace: Pace,
): Place {
  let place = start;
  let time = 0;
  let speed = velocityBetween(journal, place.x, place.y, from, to, 0);
  while (time < duration && pace.left > 0) {
    pace.left--;
    const rest = duration - time;
    const step = Math.min(pace.step, rest);
    const trial = rosenbrockStep(journal, place, speed, from, to, time, step, duration);
    const error = errorInFilms(trial.errorX, trial.errorY, trial.place);
    if (error <= tolerance) {
      time = step === rest ? duration : time + step;
      place = trial.place;
      speed = trial.velocity;
    }
    const factor = Math.min(4, Math.max(0.2, 0.85 * Math.cbrt(tolerance / error)));
    // A step cut short by the end of the stretch only says that longer ones may do, not that they must be shorter.
    if (error > tolerance || step * factor > pace.step || step === pace.step) pace.step = step * factor;
  }
  return place;
}

/** An error against the film: towards the wall by its thickness, along the wall by the width of the thin place. */
function errorInFilms(errorX: number, errorY: number, { x, y }: Place): number {
  const eccentricity = Math.sqrt(x * x + y * y);
  const film = 1 - eccentricity;
  if (!(film > 0)) return Number.POSITIVE_INFINITY;
  const least = 1e-9;
  if (eccentricity === 0) return Math.max(Math.abs(errorX), Math.abs(errorY), least);
  const outward = Math.abs(errorX * x + errorY * y) / eccentricity;
  const sideways = Math.abs(errorY * x - errorX * y) / eccentricity;
  const worst = Math.max(outward / film, sideways / Math.sqrt(film), least);
  return Number.isNaN(worst) ? Number.POSITIVE_INFINITY : worst;
}

const diagonal = 1 / (2 + Math.SQRT2);
const errorWeight = 6 + Math.SQRT2;

/** One step, with the velocity at its end and what it may be wrong by. */
function rosenbrockStep(
  journal: Journal,
  { x, y }: Place,
  now: Place,
  from: Drive,
  to: Drive,
  time: number,
  step: number,
  duration: number,
) {
  const part = time / duration;
  const small = 1e-4 * Math.max(1e-9, 1 - Math.sqrt(x * x + y * y));
  const besideX = velocityBetween(journal, x + small, y, from, to, part);
  const besideY = velocityBetween(journal, x, y + small, from, to, part);
  // The matrix I − step · diagonal · ∂(velocity)/∂(place), its inverse times the determinant below.
  const share = (step * diagonal) / small;
  const a = 1 - share * (besideX.x - now.x);
  const b = -share * (besideY.x - now.x);
  const c = -share * (besideX.y - now.y);
  const d = 1 - share * (besideY.y - now.y);
  const scale = 1 / (a * d - b * c);

  const soon = velocityBetween(journal, x, y, from, to, part + (step / duration) * 1e-3);
  const driftX = (soon.x - now.x) * diagonal * 1e3;
  const driftY = (soon.y - now.y) * diagonal * 1e3;

  const startX = now.x + driftX;
  const startY = now.y + driftY;
  const firstX = scale * (d * startX - b * startY);
  const firstY = scale * (a * startY - c * startX);

  const middle = velocityBetween(
    journal,
    x + (step / 2) * firstX,
    y + (step / 2) * firstY,
    from,
    to,
    (time + step / 2) / duration,
  );
  const secondX = firstX + scale * (d * (middle.x - firstX) - b * (middle.y - firstY));
  const secondY = firstY + scale * (a * (middle.y - firstY) - c * (middle.x - firstX));

  const place = { x: x + step * secondX, y: y + step * secondY };
  const last = velocityBetween(journal, place.x, place.y, from, to, (time + step) / duration);
  const endX = last.x - errorWeight * (secondX - middle.x) - 2 * (firstX - now.x) + driftX;
  const endY = last.y - errorWeight * (secondY - middle.y) - 2 * (firstY - now.y) + driftY;
  const thirdX = scale * (d * endX - b * endY);
  const thirdY = scale * (a * endY - c * endX);
  return {
    place,
    velocity: last,
    errorX: (step / 6) * (firstX - 2 * secondX + thirdX),
    errorY: (step / 6) * (firstY - 2 * secondY + thirdY),
  };
}
