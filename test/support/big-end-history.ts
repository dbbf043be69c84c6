import type { History, Iteration, PositionOfBuild } from "~/engineering/next-step/types";

export const thou = 25.4e-6;
export const tenth = thou / 10;
export const usual = 2.5 * thou;
export const oil = { name: "A", grade: "50", kv40: 110, kv100: 16.2, temperatureC: 105 };

/** Hundredths of a tenth by which eight positions miss their target, and by which gauges scatter at teardown. */
const misses = [20, -35, 5, 40, -15, -30, 25, -10];
const noise = [10, -20, 15, 5, -10, 20, -15, -5];

/** Eight big ends as a careful shop builds and measures them, worn by `wear` of a tenth, all of one grade. */
export function bigEnds(
  target: number,
  { grade = 1, wear = 0.15, damage = null }: { grade?: number; wear?: number; damage?: string | null } = {},
): PositionOfBuild[] {
  return misses.map((miss, index) => {
    const assembled = target + (miss / 100) * tenth;
    return {
      position: index + 1,
      assembled: { clearance: assembled },
      tornDown: { clearance: assembled + (wear + noise[index]! / 100) * tenth },
      uncertainty: 0.6 * tenth,
      grade,
      damage,
      coatingState: "intact",
    };
  });
}

/** One build of them; `change` says what was different. */
export function build(number: number, target: number, change: Partial<Iteration> = {}): Iteration {
  return { build: number, target, hours: 6.5, oil, events: [], positions: bigEnds(target), ...change };
}

/** The positions with one of them changed. */
export function withPosition(
  positions: PositionOfBuild[],
  number: number,
  change: Partial<PositionOfBuild>,
): PositionOfBuild[] {
  return positions.map((position) => (position.position === number ? { ...position, ...change } : position));
}

/** A fit without a coating that ran these builds. */
export function bigEndHistory(...iterations: Iteration[]): History {
  return {
    fit: {
      kind: "big-end",
      nominal: 0.05334,
      hardLimits: { least: 1.0 * thou, most: 3.2 * thou },
      coating: null,
    },
    iterations,
  };
}
