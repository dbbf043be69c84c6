import { EngineeringError } from "../engineering-error";
import type { OilData } from "./oil-data";
import { requireOil } from "./oil-data";
import { referenceOils } from "./viscosity-index-table";

/** How little an oil's viscosity changes with temperature. */
export interface ViscosityIndex {
  /** As the standard reports it: a whole number, a half to the even one. */
  index: number;
  /** Before rounding. */
  unrounded: number;
  /** Procedure A gives indices to 100, B those over it. */
  procedure: "A" | "B";
}

/**
 * Viscosity index of an oil from KV40 and KV100.
 * Range: KV100 from 2 mm²/s; below, the index is not defined and is refused.
 * Source: ASTM D2270 (as in a public program that cites D2270-10(2016)), its table read by straight lines to
 * KV100 70 and its formulas above.
 * @throws EngineeringError as `requireOil`; `outside-range` below KV100 2
 */
export function viscosityIndex(oil: Pick<OilData, "kv40" | "kv100">): ViscosityIndex {
  requireOil(oil);
  const { kv40, kv100 } = oil;
  if (kv100 < 2) {
    throw new EngineeringError(
      "outside-range",
      "kv100",
      "A viscosity index is defined from a KV100 of 2 mm²/s upwards.",
    );
  }
  const { low, high } = referenceViscosities(kv100);
  const procedure = kv40 < high ? "B" : "A";
  const unrounded =
    procedure === "A"
      ? (100 * (low - kv40)) / (low - high)
      : ((high / kv40) ** (1 / Math.log10(kv100)) - 1) / 0.00715 + 100;
  return { index: halfToEven(unrounded), unrounded, procedure };
}

/** KV40 of the two oils that share this KV100 and have index 0 (low) and 100 (high). */
function referenceViscosities(kv100: number): { low: number; high: number } {
  const last = referenceOils[referenceOils.length - 1]!;
  if (kv100 > last[0]) {
    return {
      low: 0.8353 * kv100 ** 2 + 14.67 * kv100 - 216,
      high: 0.1684 * kv100 ** 2 + 11.85 * kv100 - 97,
    };
  }
  const above = Math.max(
    1,
    referenceOils.findIndex(([hot]) => hot >= kv100),
  );
  const [hot, low, high] = referenceOils[above - 1]!;
  const [nextHot, nextLow, nextHigh] = referenceOils[above]!;
  const part = (kv100 - hot) / (nextHot - hot);
  return { low: low + part * (nextLow - low), high: high + part * (nextHigh - high) };
}

function halfToEven(value: number): number {
  const floor = Math.floor(value);
  if (value - floor !== 0.5) return Math.round(value);
  return floor % 2 === 0 ? floor : floor + 1;
}
