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

const turn = 2 * Math.PI;
/** Firings nearer than this are one and the same. */
const together = 0.01 * degrees;

/**
 * Crank angle of firing for each cylinder, by number, rad, 0 to under one cycle: its throw points along its axis once
 * a turn; of its turns it fires in the one nearest to even firing that the order allows.
 * @throws EngineeringError `crank-layout` where a cylinder has no throw or more than one, `firing-order` where the
 *   order is not one of all cylinders or cannot be fired by these throws in one cycle
 */
export function firingAngles({ axes, throws, firingOrder }: CrankLayout): number[] {
  const count = axes.length;
  const hung = throws.flatMap((each) => each.cylinders);
  if (!eachOnce(hung, count)) {
    throw new EngineeringError("crank-layout", "layout.throws", "Every cylinder must run on one throw.");
  }
  if (!eachOnce(firingOrder, count)) {
    throw new EngineeringError(
      "firing-order",
      "layout.firingOrder",
      "Every cylinder must fire once in the order.",
    );
  }
  const topAngle = (number: number) => {
    const hanging = throws.find((each) => each.cylinders.includes(number))!;
    return cycleAngle(axes[number - 1]! - hanging.angle, turn);
  };
  const first = topAngle(firingOrder[0]!);
  const angles = new Array<number>(count);
  let last = Number.NEGATIVE_INFINITY;
  firingOrder.forEach((number, place) => {
    const top = topAngle(number);
    const even = first + (place * engineCycleAngle) / count;
    const nearest = top + turn * Math.ceil((even - top) / turn - 0.5);
    const later = Math.ceil((last + together - nearest) / turn);
    last = nearest + turn * Math.max(0, later);
    if (last - first > engineCycleAngle - together) {
      throw new EngineeringError(
        "firing-order",
        "layout.firingOrder",
        `With these throws the order ${firingOrder.join("-")} does not fit into two turns of the crank.`,
      );
    }
    angles[number - 1] = last;
  });
  return angles.map((angle) => cycleAngle(angle, engineCycleAngle));
}

const eachOnce = (numbers: readonly number[], count: number) =>
  numbers.length === count &&
  Array.from({ length: count }, (_, index) => index + 1).every((n) => numbers.includes(n));
