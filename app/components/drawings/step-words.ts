import { clearanceText, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";

/** The size of a step (m, either sign) without a last zero that says nothing: ".0001", ".00015", "2.5". */
export function stepSize(step: number, units: PageUnits): string {
  const text = clearanceText(picometres(Math.abs(step)), units);
  return units === "inch" ? text.replace(/0$/, "") : text;
}

/** The step in words: "close by .0001", "hold". */
export function stepWords({ from, to }: { from: number; to: number }, units: PageUnits): string {
  if (picometres(to - from) === 0) return "hold";
  return `${to < from ? "close" : "open"} by ${stepSize(to - from, units)}`;
}
