import { type SliderCrank, sliderCrank } from "./slider-crank";

/** One cylinder with its moving masses. */
export interface Cylinder extends SliderCrank {
  bore: number;
  /** Piston, rings, pin and the rod's share at the wrist pin, kg. */
  reciprocatingMass: number;
  /** The rod's share at the big end, shells included, kg. */
  rotatingMass: number;
}

/** The load of a big end at one crank angle, in the frame of its rod. */
export interface BigEndLoad {
  /** Force of the journal on the rod, N: x from the big end towards the wrist pin. */
  x: number;
  /** 90° ahead of x in the sense the crank turns, N. */
  y: number;
  /** Of the crankpin as seen from the rod, rad/s. */
  journalSpeed: number;
  /** From the cylinder's axis to the rod, in the sense the crank turns, rad. */
  frameAngle: number;
}

/**
 * Load of a big end from gas force and the two masses of the rod: the reciprocating one is pushed along the cylinder,
 * the rotating one is held on its circle. It is what the journal presses on the shell with, so that the journal moves
 * towards it: gas presses the rod's shell (+x), inertia at top dead centre its cap (−x).
 * @param crankAngle rad, 0 where the throw points along the cylinder
 * @param gasForce of the piston towards the crank, N
 * Expected error: the two-mass rod leaves out a small couple; rigid parts, no pin or ring friction.
 * Source: C. F. Taylor, The Internal-Combustion Engine, vol. 2, ch. 8 (from memory); the balance of forces itself.
 */
export function bigEndLoad(
  cylinder: Cylinder,
  crankAngle: number,
  speed: number,
  gasForce: number,
): BigEndLoad {
  const motion = sliderCrank(cylinder, crankAngle, speed);
  const alongRod = (gasForce - cylinder.reciprocatingMass * motion.acceleration) / Math.cos(motion.rodAngle);
  const centrifugal = cylinder.rotatingMass * (cylinder.stroke / 2) * speed ** 2;
  const throwFromRod = crankAngle + motion.rodAngle;
  return {
    x: alongRod - centrifugal * Math.cos(throwFromRod),
    y: -centrifugal * Math.sin(throwFromRod),
    journalSpeed: speed + motion.rodAngularVelocity,
    frameAngle: -motion.rodAngle,
  };
}
