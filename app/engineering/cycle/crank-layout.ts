import { EngineeringError } from "../engineering-error";
import { degrees, engineCycleAngle } from "./crank-angle";
import { cycleAngle } from "./round-the-cycle";

/** One throw of a crank. */
export interface CrankThrow {
  /** At crank angle 0, rad from the block's x, in the sense the crank turns. */
  angle: number;
  /** Numbers of the cylinders whose rods run on it. */
  cylinders: readonly number[];
}

/**
 * How the cylinders of an engine hang on its crank. The block's frame looks along the crank: x midway between the
 * banks, y 90° ahead in the sense the crank turns.
 */
export interface CrankLayout {
  /** Of each cylinder's axis from x, rad, by number: 0 inline, half the bank angle either side in a V. */
  axes: readonly number[];
  /** From the front to the back. */
  throws: readonly CrankThrow[];
  /** Numbers of the cylinders as they fire. */
  firingOrder: readonly number[];
  mains: number;
}

/**
 * Crank angle of firing for each cylinder, by number, rad, 0 to under one cycle: its throw points along its axis once
 * a turn, and the firing order says which turn.
 * @throws EngineeringError `crank-layout` where a cylinder has no throw or more than one, `firing-order` where the
 *   order is not one of all cylinders or cannot be fired by these throws in one cycle
 */
export function firingAngles({ axes, throws, firingOrder }: CrankLayout): number[] {
  const count = axes.length;
  const numbers = throws.flatMap((each) => each.cylinders);
  if (!eachOnce(numbers, count)) {
    throw new EngineeringError("crank-layout", "layout.throws", "Every cylinder must run on one throw.");
  }
  if (!eachOnce(firingOrder, count)) {
    throw new EngineeringError(
      "firing-order",
      "layout.firingOrder",
      "Every cylinder must fire once in the order.",
    );
  }
  const angles = new Array<number>(count);
  let last = Number.NEGATIVE_INFINITY;
  for (const number of firingOrder) {
    const hanging = throws.find((each) => each.cylinders.includes(number))!;
    const top = cycleAngle(axes[number - 1]! - hanging.angle, 2 * Math.PI);
    // Two cylinders may fire together, so a thousandth of a degree early still counts as now.
    const first = angles[firingOrder[0]! - 1] ?? top;
    const turns = Math.max(0, Math.ceil((last - top - 1e-3 * degrees) / (2 * Math.PI)));
    last = top + turns * 2 * Math.PI;
    if (!(last - first < engineCycleAngle)) {
      throw new EngineeringError(
        "firing-order",
        "layout.firingOrder",
        `With these throws the order ${firingOrder.join("-")} does not fit into two turns of the crank.`,
      );
    }
    angles[number - 1] = last;
  }
  return angles.map((angle) => cycleAngle(angle, engineCycleAngle));
}

const eachOnce = (numbers: readonly number[], count: number) =>
  numbers.length === count &&
  Array.from({ length: count }, (_, index) => index + 1).every((n) => numbers.includes(n));
