import type { Expectation } from "../quantity/slip";

/**
 * What a box of a bore or a journal expects, pm. Makers name either the journal or the bore by the nominal size, so a
 * good reading lies within the nominal give or take a few clearances; ten thou on big parts, less on small ones
 * (common practice, no source).
 */
export function slipExpectation(nominal: number, aim: number, feature: "bore" | "journal"): Expectation {
  const bore = nominal + (feature === "bore" ? aim : 0);
  return { expected: bore, band: Math.max(4 * Math.abs(aim), Math.round(nominal * 0.002)) };
}
