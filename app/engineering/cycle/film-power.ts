import { radial } from "../radial";
import type { Bearing } from "./bearing";
import { type Drive, type Journal, journalVelocity, type Place } from "./journal-motion";

/** What acts on a film at one crank angle. */
export interface Instant {
  crankAngle: number;
  drive: Drive;
  /** Of the journal over the sleeve, rad/s. */
  slidingSpeed: number;
}

/**
 * Heat made in the film at one instant, W: the work of the load on the journal's motion through the film, and shear
 * all round it, F · (de/dt − ω̄ × e) + 2 π µ R³ L Δω² / (C √(1 − ε²)). Its steady form is the bearing's friction.
 * Expected error: shear counts the film as full all round, so it reads high where the film has broken.
 * Source: dissipation of the Reynolds film, its pressure-driven and its shear part (own derivation; agrees with the
 * friction column of M. Khonsari & J. Booser, Applied Tribology, finite-bearing table, which counts likewise).
 */
export function filmPower(
  bearing: Bearing,
  viscosity: number,
  journal: Journal,
  place: Place,
  { drive, slidingSpeed }: Instant,
): number {
  const clearance = radial(bearing.clearance);
  const squeeze = journalVelocity(journal, place.x, place.y, { ...drive, meanSpeed: 0 });
  const pressed = (drive.x * squeeze.x + drive.y * squeeze.y) * clearance;
  const eccentricity = Math.hypot(place.x, place.y);
  const sheared =
    (2 * Math.PI * viscosity * (bearing.diameter / 2) ** 3 * bearing.length * slidingSpeed ** 2) /
    (clearance * Math.sqrt(1 - eccentricity ** 2));
  return pressed + sheared;
}
