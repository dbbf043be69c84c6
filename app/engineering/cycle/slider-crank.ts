import { EngineeringError } from "../engineering-error";
import { requireWithin } from "./sound-input";

/** The geometry of one crank throw, rod and cylinder. */
export interface SliderCrank {
  /** Bore-wise travel of a crank without offset: twice the throw radius, m. */
  stroke: number;
  /** Between the centres of the rod, m. */
  rodLength: number;
  /** Of the cylinder's axis from the crank's, m; positive to the side the crankpin moves to after top dead centre. */
  pinOffset?: number;
}

/** Where the piston and rod are at one crank angle, and how they move. */
export interface SliderCrankMotion {
  /** Of the piston down from its top dead centre, m. */
  displacement: number;
  /** Of the piston, downwards, m/s. */
  velocity: number;
  /** Of the piston, downwards, m/s². */
  acceleration: number;
  /** Of the rod from the cylinder's axis, rad; positive while the crankpin is on the side it turns to. */
  rodAngle: number;
  /** Rate of the rod angle, rad/s: the rod turns against the crank while this is positive. */
  rodAngularVelocity: number;
  /** Rate of the rod's angular velocity, rad/s². */
  rodAngularAcceleration: number;
}

/**
 * Exact motion of piston and rod at a crank angle, from the closed form of the linkage and its derivatives.
 * @param crankAngle rad, 0 where the throw points along the cylinder
 * @param speed of the crank, rad/s
 * Error: rounding only. Source: J. B. Heywood, Internal Combustion Engine Fundamentals, eq. 2.4–2.5, with the pin
 * offset carried through (from memory).
 */
export function sliderCrank(
  { stroke, rodLength, pinOffset = 0 }: SliderCrank,
  crankAngle: number,
  speed: number,
): SliderCrankMotion {
  const radius = stroke / 2;
  const cosine = Math.cos(crankAngle);
  const sine = Math.sin(crankAngle);
  const rodSine = (radius * sine - pinOffset) / rodLength;
  const rodCosine = Math.sqrt(1 - rodSine * rodSine);
  const rodSpeed = (radius * cosine * speed) / (rodLength * rodCosine);
  const rodAcceleration =
    (rodLength * rodSine * rodSpeed ** 2 - radius * sine * speed ** 2) / (rodLength * rodCosine);
  return {
    displacement: topHeight(radius, rodLength, pinOffset) - (radius * cosine + rodLength * rodCosine),
    velocity: radius * speed * sine + rodLength * rodSine * rodSpeed,
    acceleration:
      radius * speed ** 2 * cosine + rodLength * (rodCosine * rodSpeed ** 2 + rodSine * rodAcceleration),
    rodAngle: Math.asin(rodSine),
    rodAngularVelocity: rodSpeed,
    rodAngularAcceleration: rodAcceleration,
  };
}

/** The piston's travel between its dead centres, m: the stroke, or a little more with a pin offset. */
export function pistonTravel({ stroke, rodLength, pinOffset = 0 }: SliderCrank): number {
  const radius = stroke / 2;
  return topHeight(radius, rodLength, pinOffset) - Math.sqrt((rodLength - radius) ** 2 - pinOffset ** 2);
}

/** Height of the wrist pin over the crank's axis at top dead centre, m: crank and rod in one line. */
const topHeight = (radius: number, rodLength: number, pinOffset: number) =>
  Math.sqrt((rodLength + radius) ** 2 - pinOffset ** 2);

/**
 * Refuses a linkage that no engine has or that cannot turn.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, or `rod-too-short`
 */
export function requireSliderCrank({ stroke, rodLength, pinOffset = 0 }: SliderCrank): void {
  requireWithin(stroke, "engine.stroke", { from: 0.005, to: 3, unit: "m" });
  requireWithin(rodLength, "engine.rodLength", { from: 0.005, to: 6, unit: "m" });
  requireWithin(pinOffset, "engine.pinOffset", { from: -0.5, to: 0.5, unit: "m" });
  if (rodLength < 1.1 * (stroke / 2 + Math.abs(pinOffset))) {
    throw new EngineeringError(
      "rod-too-short",
      "engine.rodLength",
      "The rod must be longer than half the stroke with the pin offset, and a tenth more, or the crank cannot turn.",
    );
  }
}
