import { EngineeringError } from "../engineering-error";
import { parseQuantity, type Quantity } from "../quantity/parse";
import type { UnitName } from "../quantity/units";

/** What a person put in a box. Blank, zero, not measured and not accessible are four different things. */
export type BoxContent =
  | { state: "blank" }
  | { state: "measured"; value: Quantity }
  | { state: "not-measured" | "not-accessible"; reason: string };

const words = {
  "not-measured": /^(?:not measured|n\/?m|-)(?:[ :,]+(.*))?$/iu,
  "not-accessible": /^(?:not accessible|n\/?a)(?:[ :,]+(.*))?$/iu,
} as const;

/** How "not measured" and "not accessible" stand in a box, their reason behind them. */
export function absenceText(state: "not-measured" | "not-accessible", reason: string | null): string {
  return `${state.replace("-", " ")}${reason ? `: ${reason}` : ""}`;
}

/**
 * Reads what was typed into a box. A bare number takes the column's unit; a sign makes it an offset from the nominal.
 * @throws EngineeringError with a sentence for the box
 */
export function readBoxText(typed: string, defaultUnit: UnitName, nominalPm: number): BoxContent {
  const text = typed.trim();
  if (text === "") return { state: "blank" };
  for (const state of ["not-measured", "not-accessible"] as const) {
    const match = words[state].exec(text);
    if (match) return { state, reason: match[1]?.trim() ?? "" };
  }
  const value = parseQuantity(text, "length", { defaultUnit, nominal: nominalPm });
  if (value.si <= 0) {
    throw new EngineeringError(
      "not-positive",
      "value",
      "A diameter is over zero. Leave the box blank, or type nm for not measured.",
    );
  }
  return { state: "measured", value };
}
