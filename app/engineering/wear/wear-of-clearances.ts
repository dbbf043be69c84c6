import { oddOneOut } from "./odd-one-out";
import { judgeWear } from "./position-wear";
import { wearRate } from "./wear-rate";

/** A position's clearance as built and as torn down, m, with the expanded uncertainty of one clearance. */
export interface ClearanceBeforeAfter {
  position: number;
  assembled: number;
  tornDown: number;
  uncertainty: number;
}

/** The wear of one position per hour, as a bar with its limits. */
export interface PositionWearRate {
  position: number;
  /** m/h; null where the clearance has shrunk by more than the gauges can err: a measuring slip. */
  rate: number | null;
  from: number | null;
  to: number | null;
  /** False where the wear is less than the gauges can see; `to` is then the most it can be. */
  measurable: boolean;
  odd: boolean;
}

/**
 * Wear per hour of each position of one build, from clearances alone: what a build tells where bore and journal were
 * not kept apart. Empty where the build has not run.
 */
export function wearOfClearances(
  positions: readonly ClearanceBeforeAfter[],
  hours: number | null,
): PositionWearRate[] {
  if (hours === null || !(hours > 0) || positions.length === 0) return [];
  const worn = positions.map(({ position, assembled, tornDown, uncertainty }) => {
    // A growth is the difference of two clearances; independent errors add in squares.
    const wear = judgeWear(tornDown - assembled, Math.SQRT2 * uncertainty);
    return { position, wear, ...wearRate(wear, hours) };
  });
  const deviation = Math.max(...positions.map(({ uncertainty }) => uncertainty)) / Math.SQRT2;
  const odd = oddOneOut(
    worn.map(({ wear }) => wear.wear),
    deviation,
  );
  return worn.map(({ position, rate, limits, measurable }, index) => ({
    position,
    rate,
    from: limits?.from ?? null,
    to: limits?.to ?? null,
    measurable,
    odd: odd?.index === index,
  }));
}
