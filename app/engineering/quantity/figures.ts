import { type FormatOptions, format, formatLength } from "./format";
import type { UnitName } from "./units";

/** The two systems a page can show: what was typed stays as it was whichever is chosen. */
export type PageUnits = "inch" | "metric";

/** The unit of clearances, wear and steps, for parsing. */
export function clearanceUnitName(units: PageUnits): "in" | "um" {
  return units === "inch" ? "in" : "um";
}

/** The same as it stands in a table's head. */
export function clearanceUnit(units: PageUnits): string {
  return units === "inch" ? "in" : "µm";
}

/** The unit of bores and journals, for parsing and for heads. */
export function diameterUnitName(units: PageUnits): "in" | "mm" {
  return units === "inch" ? "in" : "mm";
}

/** A clearance, wear or step from picometres: ".00245" in inches, "62.2" in µm. */
export function clearanceText(picometres: number, units: PageUnits, extraDecimals = 0): string {
  const inches: FormatOptions = { dropLeadingZero: true };
  return units === "inch"
    ? formatLength(picometres, "in", 5 + extraDecimals, inches)
    : formatLength(picometres, "um", 1 + extraDecimals);
}

/** A bore or journal from picometres: "2.10000" in inches, "53.3400" in mm. */
export function diameterText(picometres: number, units: PageUnits): string {
  return formatLength(picometres, diameterUnitName(units), units === "inch" ? 5 : 4);
}

/** The unit of oil pressure. */
export function pressureUnit(units: PageUnits): UnitName & ("psi" | "bar") {
  return units === "inch" ? "psi" : "bar";
}

/** Oil pressure from Pa; empty where there is none. */
export function pressureText(pascals: number | null, units: PageUnits): string {
  if (pascals === null) return "";
  return format(pascals, pressureUnit(units), units === "inch" ? 0 : 1);
}

/** The day of an instant, as year-month-day. */
export function dayText(instant: string): string {
  return instant.slice(0, 10);
}
