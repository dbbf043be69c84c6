import { EngineeringError } from "../engineering-error";
import { degrees, engineCycleAngle } from "./crank-angle";
import { placeOnCycle } from "./round-the-cycle";
import { requireWithin } from "./sound-input";

/** The load of a bearing at one crank angle, in the frame the bearing is looked at in. */
export interface LoadPoint {
  /** Rad. */
  crankAngle: number;
  /** Force of the journal on the sleeve along the rod or cylinder, N. */
  x: number;
  /** The same, 90° ahead of x in the sense the crank turns, N. */
  y: number;
  /** Of the journal in that frame, rad/s, where it is not the crank's speed: a rod swings under its crankpin. */
  journalSpeed?: number;
}

/** A load at every degree of one cycle. */
export interface LoadCycle {
  /** Rad, one or two turns. */
  cycle: number;
  points: Required<LoadPoint>[];
}

const most = 100_000;
const widestGap = 30 * degrees;

/**
 * Checks the loads of one cycle (one turn or two, with or without the closing point) and gives them at every degree,
 * by straight lines between the points.
 * @param speed of the crank, rad/s: the journal's where a point does not say otherwise
 * @throws EngineeringError `too-few-points`, `too-many-points`, `not-a-number`, `outside-range`, `unsorted`, `gap`,
 *   `angle-unit`, `wrong-span`
 */
export function loadCycle(loads: readonly LoadPoint[], speed: number): LoadCycle {
  requireCount(loads.length);
  loads.forEach(requireSound);
  requireRising(loads);
  const cycle = cycleOf(loads);
  const first = loads[0]!.crankAngle;
  const open = loads.filter((point) => point.crankAngle - first < cycle - 1e-9);
  const place = placeOnCycle(
    open.map((point) => point.crankAngle),
    cycle,
  );
  const count = Math.round(cycle / degrees);
  const points = Array.from({ length: count }, (_, index) => {
    const crankAngle = index * degrees;
    const { before, after, part } = place(crankAngle);
    const [from, to] = [open[before]!, open[after]!];
    const between = (a: number, b: number) => (1 - part) * a + part * b;
    return {
      crankAngle,
      x: between(from.x, to.x),
      y: between(from.y, to.y),
      journalSpeed: between(from.journalSpeed ?? speed, to.journalSpeed ?? speed),
    };
  });
  return { cycle, points };
}

function requireCount(count: number): void {
  if (count < 12) {
    throw new EngineeringError(
      "too-few-points",
      "loads",
      `A load cycle needs a point at least every 30° of crank angle; this has ${count} points.`,
    );
  }
  if (count > most) {
    throw new EngineeringError(
      "too-many-points",
      "loads",
      `A load cycle may have at most ${most} points; this has ${count}. Thin it out.`,
    );
  }
}

function requireSound(point: LoadPoint, index: number): void {
  const field = `loads[${index}]`;
  requireWithin(point.crankAngle, `${field}.crankAngle`, { from: -1e4, to: 1e4, unit: "rad" });
  requireWithin(point.x, `${field}.x`, { from: -1e9, to: 1e9, unit: "N" });
  requireWithin(point.y, `${field}.y`, { from: -1e9, to: 1e9, unit: "N" });
  if (point.journalSpeed !== undefined) {
    requireWithin(point.journalSpeed, `${field}.journalSpeed`, { from: -1e4, to: 1e4, unit: "rad/s" });
  }
}

function requireRising(loads: readonly LoadPoint[]): void {
  for (let index = 1; index < loads.length; index++) {
    if (!(loads[index]!.crankAngle > loads[index - 1]!.crankAngle)) {
      throw new EngineeringError(
        "unsorted",
        `loads[${index}].crankAngle`,
        `The crank angles must rise; point ${index + 1} does not lie after the one before it.`,
      );
    }
  }
}

/** One turn or two, whichever the points cover without a gap. */
function cycleOf(loads: readonly LoadPoint[]): number {
  const span = loads.at(-1)!.crankAngle - loads[0]!.crankAngle;
  const roundingRoom = 1e-6;
  if (span > engineCycleAngle + roundingRoom) {
    const inDegrees = Math.abs(span - 720) < 31 || Math.abs(span - 360) < 31;
    throw new EngineeringError(
      inDegrees ? "angle-unit" : "wrong-span",
      "loads",
      inDegrees
        ? `The crank angles cover ${span.toFixed(0)} rad, which looks like degrees; give them in rad.`
        : `The crank angles cover ${span.toFixed(1)} rad; a cycle is one turn (6.283) or two (12.566).`,
    );
  }
  const cycle = span <= 2 * Math.PI + roundingRoom ? 2 * Math.PI : engineCycleAngle;
  if (cycle - span > widestGap + roundingRoom) {
    throw new EngineeringError(
      "wrong-span",
      "loads",
      `The crank angles cover ${(span / degrees).toFixed(0)}°; they must go once round 360° or 720°.`,
    );
  }
  const wide = loads.findIndex(
    (point, index) => index > 0 && point.crankAngle - loads[index - 1]!.crankAngle > widestGap + roundingRoom,
  );
  if (wide > 0) {
    throw new EngineeringError(
      "gap",
      `loads[${wide}].crankAngle`,
      `There is a gap of more than 30° of crank angle before point ${wide + 1}.`,
    );
  }
  return cycle;
}
