import { clearanceText, clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import type { DrawingTable } from "./drawing";
import { stepWords } from "./step-words";

/** A position of a fit; clearances in m. */
export interface StripPosition {
  number: number;
  assembled?: number | undefined;
  tornDown?: number | undefined;
}

/** What a fit strip shows; all lengths in m. */
export interface StripFigures {
  units: PageUnits;
  window: { least: number; aim: number; most: number };
  positions: readonly StripPosition[];
  /** Where the limit probably lies, with the chance that it does, 0 to 1. */
  likelyLimit?: { from: number; to: number; share: number } | undefined;
  /** The signed or proposed change of the aim. */
  step?: { from: number; to: number } | undefined;
}

/** "7 in 10" for 0.7. */
export const inTen = (share: number): string => `${Math.round(share * 10)} in 10`;

/** What a fit strip shows, as one sentence. */
export function stripSummary({ units, window, positions, likelyLimit, step }: StripFigures): string {
  const unit = clearanceUnit(units);
  const text = (value: number) => clearanceText(picometres(value), units);
  const range = (values: number[]) => `${text(Math.min(...values))} to ${text(Math.max(...values))}`;
  const built = positions.flatMap(({ assembled }) => assembled ?? []);
  const torn = positions.flatMap(({ tornDown }) => tornDown ?? []);
  return [
    `Aim ${text(window.aim)} ${unit}, window ${text(window.least)} to ${text(window.most)}`,
    built.length > 0
      ? `${built.length} ${built.length === 1 ? "position" : "positions"} as built from ${range(built)}`
      : "no position measured yet",
    torn.length > 0 && `${torn.length} torn down from ${range(torn)}`,
    likelyLimit &&
      `${inTen(likelyLimit.share)} that the limit lies from ${text(likelyLimit.from)} to ${text(likelyLimit.to)}`,
    step && `next step: ${stepWords(step, units)}, from ${text(step.from)} to ${text(step.to)}`,
  ]
    .filter(Boolean)
    .join("; ")
    .concat(".");
}

/** The positions of a fit strip as a table. */
export function stripTable({ units, positions }: StripFigures): DrawingTable {
  const unit = clearanceUnit(units);
  const text = (value: number | undefined) =>
    value === undefined ? "–" : clearanceText(picometres(value), units);
  return {
    head: ["position", `as built, ${unit}`, `torn down, ${unit}`, `wear, ${unit}`],
    rows: positions.map(({ number, assembled, tornDown }) => [
      number,
      text(assembled),
      text(tornDown),
      text(assembled === undefined || tornDown === undefined ? undefined : tornDown - assembled),
    ]),
  };
}
