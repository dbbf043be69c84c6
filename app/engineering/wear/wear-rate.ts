import { EngineeringError } from "../engineering-error";
import type { Interval } from "./line";
import type { FeatureWear } from "./position-wear";

export interface WearRate {
  /** m/h; null where the wear is a measuring slip. */
  rate: number | null;
  /** Limits at about 95 %, m/h, never below zero: metal does not grow back. */
  limits: Interval | null;
  /** False: the wear is less than the gauges can see, and `limits.to` is the most it can be. */
  measurable: boolean;
}

/**
 * Wear per hour, m/h, with its limits.
 * @param hours run between assembly and teardown, above zero
 * @throws EngineeringError `not-positive`
 */
export function wearRate({ wear, uncertainty, verdict }: FeatureWear, hours: number): WearRate {
  if (!(hours > 0) || !Number.isFinite(hours)) {
    throw new EngineeringError(
      "not-positive",
      "hours",
      "A wear rate needs hours above zero; write them in the run log.",
    );
  }
  if (verdict === "slip") return { rate: null, limits: null, measurable: false };
  return {
    rate: wear / hours,
    limits: { from: Math.max(0, wear - uncertainty) / hours, to: (Math.max(0, wear) + uncertainty) / hours },
    measurable: verdict === "worn",
  };
}
