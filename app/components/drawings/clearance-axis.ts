import { clearanceUnitName, type PageUnits } from "~/engineering/quantity/figures";
import { formatLength } from "~/engineering/quantity/format";
import { picometres } from "~/engineering/quantity/length";
import { fromCore, toCore } from "~/engineering/quantity/units";
import { niceTicks, type Span } from "./scale";

/** A mark on an axis: its value and how it is written. */
export interface Tick {
  value: number;
  text: string;
}

/** Ticks for a span of clearances (m), round in the page's unit, with no more decimals than tell them apart. */
export function clearanceTicks({ from, to }: Span, units: PageUnits, count: number): Tick[] {
  const unit = clearanceUnitName(units);
  const values = niceTicks(fromCore(from, unit), fromCore(to, unit), count);
  const step = values.length > 1 ? values[1]! - values[0]! : 1;
  const needed = Math.max(0, Math.ceil(-Math.log10(step) - 1e-9));
  // A thousandth of an inch and its tenths: the trade writes four decimals even where two would do.
  const decimals = units === "inch" ? Math.max(4, needed) : needed;
  return values.map((value) => {
    const there = toCore(value, unit);
    return {
      value: there,
      text: formatLength(picometres(there), unit, decimals, { dropLeadingZero: units === "inch" }),
    };
  });
}

/** Ticks for plain numbers, with no more decimals than tell them apart. */
export function plainTicks({ from, to }: Span, count: number): Tick[] {
  const values = niceTicks(from, to, count);
  const step = values.length > 1 ? values[1]! - values[0]! : 1;
  const decimals = Math.max(0, Math.ceil(-Math.log10(step) - 1e-9));
  return values.map((value) => ({ value, text: value.toFixed(decimals) }));
}
