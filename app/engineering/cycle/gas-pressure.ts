import { EngineeringError } from "../engineering-error";
import { degrees, engineCycleAngle } from "./crank-angle";
import { cycleAngle } from "./round-the-cycle";
import { pistonTravel, type SliderCrank, sliderCrank } from "./slider-crank";
import { requireWithin } from "./sound-input";

/** What the closed gas model is drawn from. */
export interface GasCycle {
  /** Highest cylinder pressure, absolute, Pa. */
  peakPressure: number;
  /** Crank angle of the highest pressure after the throw points along the cylinder, rad. */
  peakAngle: number;
  /** Largest over least volume; 12 where it is not given (common practice for a competition engine). */
  compressionRatio?: number;
  /** In the cylinder at bottom dead centre before compression, absolute, Pa. */
  intakePressure?: number;
}

/** Cylinder pressure by crank angle, and what was taken for it. */
export interface CylinderPressure {
  /** Absolute pressure, Pa, at a crank angle, rad; 0 is top dead centre of firing. */
  at: (crankAngle: number) => number;
  compressionRatio: number;
  intakePressure: number;
}

/** Pressure of the surroundings, of the crankcase and in the open exhaust, Pa (ISO 2533 standard atmosphere). */
export const ambientPressure = 101_325;

// Polytropic exponents of compression and expansion: 1.3 ± 0.05 in Heywood, section 9.2 (from memory).
const compressionExponent = 1.32;
const expansionExponent = 1.27;
// Visible burn from 40° before the peak, exhaust valve open 50° before bottom, blown down 30° after it, and the change
// to intake pressure over 40° from the upper dead centre (common practice, no source).
const burnLength = 40 * degrees;
const exhaustOpens = 130 * degrees;
const blownDown = 210 * degrees;
const intakeReached = 400 * degrees;

/**
 * Four-stroke cylinder pressure from its peak: polytropic compression, a smooth burn that arrives at the peak
 * pressure exactly at its angle, polytropic expansion, blow-down, exhaust and intake at constant pressure.
 * Where the intake pressure is not given it is the surroundings', or less where the peak would not be at least twice
 * the compression pressure (the engine is then taken as throttled); the result says what was taken.
 * Range: peak 1–500 bar at 0–60°, compression ratio 4–25. Expected error: the peak is exact; away from it 10–20 %,
 * so put in a pressure trace where there is one (common practice, no source).
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, `peak-below-compression`
 */
export function gasPressure(crank: SliderCrank, gas: GasCycle): CylinderPressure {
  const { peakPressure, peakAngle, compressionRatio = 12 } = gas;
  requireWithin(peakPressure, "engine.peakPressure", { from: 1e5, to: 5e7, unit: "Pa" });
  requireWithin(peakAngle, "engine.peakAngle", { from: 0, to: 60 * degrees, unit: "rad" });
  requireWithin(compressionRatio, "engine.compressionRatio", { from: 4, to: 25, unit: "" });
  const volume = cylinderVolume(crank, compressionRatio);
  const bottom = volume(Math.PI);
  const rise = (bottom / volume(0)) ** compressionExponent;
  const intakePressure = gas.intakePressure ?? Math.min(ambientPressure, peakPressure / 2 / rise);
  requireWithin(intakePressure, "engine.intakePressure", { from: 1, to: 1e6, unit: "Pa" });
  if (intakePressure * rise > peakPressure) {
    throw new EngineeringError(
      "peak-below-compression",
      "engine.peakPressure",
      "The peak pressure is below what compression alone gives from this intake pressure.",
    );
  }

  const compressed = (angle: number) => intakePressure * (bottom / volume(angle)) ** compressionExponent;
  const expanded = (angle: number) => peakPressure * (volume(peakAngle) / volume(angle)) ** expansionExponent;
  const at = (crankAngle: number) => {
    const turned = cycleAngle(crankAngle, engineCycleAngle);
    const angle = turned >= 3 * Math.PI ? turned - engineCycleAngle : turned;
    if (angle < peakAngle - burnLength) return compressed(angle);
    if (angle < peakAngle) {
      const share = smoothStep((angle - peakAngle) / burnLength + 1);
      return compressed(angle) + share * (peakPressure - compressed(angle));
    }
    if (angle < exhaustOpens) return expanded(angle);
    if (angle < 2 * Math.PI) {
      const share = smoothStep((angle - exhaustOpens) / (blownDown - exhaustOpens));
      return expanded(exhaustOpens) + share * (ambientPressure - expanded(exhaustOpens));
    }
    const share = smoothStep((angle - 2 * Math.PI) / (intakeReached - 2 * Math.PI));
    return ambientPressure + share * (intakePressure - ambientPressure);
  };
  return { at, compressionRatio, intakePressure };
}

/** Volume over the bore's area, m, by crank angle. */
function cylinderVolume(crank: SliderCrank, compressionRatio: number) {
  const clearanceHeight = pistonTravel(crank) / (compressionRatio - 1);
  return (crankAngle: number) => clearanceHeight + sliderCrank(crank, crankAngle, 0).displacement;
}

/** From 0 to 1 without a kink at either end, and held beyond them. */
const smoothStep = (part: number) => (1 - Math.cos(Math.PI * Math.min(1, Math.max(0, part)))) / 2;
