import type { PageUnits } from "~/engineering/quantity/figures";
import { format } from "~/engineering/quantity/format";
import { fromCore, toCore } from "~/engineering/quantity/units";
import { plainTicks, type Tick } from "./clearance-axis";
import type { Span } from "./scale";

// Wear is a hundredth of a clearance: in inches it is spoken of in tenths (0.0001 in), and so written.
const unitOf = (units: PageUnits) => (units === "inch" ? "tenths" : "um");

/** The unit of wear per hour on a page. */
export function wearUnit(units: PageUnits): string {
  return units === "inch" ? "tenths/h" : "µm/h";
}

/** A wear rate (m/h) in that unit; a dash where there is none. */
export function wearText(rate: number | null, units: PageUnits): string {
  return rate === null ? "–" : format(rate, unitOf(units), units === "inch" ? 2 : 3);
}

/** Ticks for a span of wear rates (m/h), round in that unit. */
export function wearTicks({ from, to }: Span, units: PageUnits, count: number): Tick[] {
  const unit = unitOf(units);
  return plainTicks({ from: fromCore(from, unit), to: fromCore(to, unit) }, count).map(({ value, text }) => ({
    value: toCore(value, unit),
    text,
  }));
}
