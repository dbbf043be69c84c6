import type { SheetBox } from "~/components/sheet/boxes";
import { boxKey } from "~/components/sheet/boxes";
import type { RowFigures, TypedBox } from "~/components/sheet/judgement";
import { type PositionClearance, positionClearance } from "~/engineering/clearance/position-clearance";
import { againstWindow, type WindowPlace } from "~/engineering/clearance/window";
import { EngineeringError } from "~/engineering/engineering-error";
import {
  clearanceText,
  diameterText,
  diameterUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { formatLength } from "~/engineering/quantity/format";
import { metres, picometres } from "~/engineering/quantity/length";
import { checkSlip } from "~/engineering/quantity/slip";
import { referenceTemperatureC } from "~/engineering/temperature/expansion";
import { readBoxText } from "~/engineering/trade/box-text";
import { slipExpectation } from "~/engineering/trade/slip-expectation";
import { clearanceUncertainty, unknownGauge } from "~/engineering/uncertainty/clearance-uncertainty";
import type { GaugeChoice, Sheet } from "./sheet-view.server";

/** What the boxes of a sheet are judged by. */
export interface Judge {
  sheet: Sheet;
  units: PageUnits;
  temperatureC: number | undefined;
  boreGauge: GaugeChoice | undefined;
  journalGauge: GaugeChoice | undefined;
}

type Standing = (key: string) => number | null;

/** Reads a box as the server will: its value, or a sentence on what is wrong; and the slip that it looks like. */
export function readSheetBox(judge: Judge, box: SheetBox, text: string): TypedBox {
  const unit = diameterUnitName(judge.units);
  try {
    const content = readBoxText(text, unit, judge.sheet.nominalPm);
    if (content.state !== "measured") return { valuePm: null };
    const valuePm = content.value.picometres as number;
    const { nominalPm, aimPm } = judge.sheet;
    const slip = checkSlip(valuePm, slipExpectation(nominalPm, aimPm, box.station.feature), unit);
    if (!slip) return { valuePm };
    const suggestion =
      slip.suggestion === undefined ? undefined : formatLength(slip.suggestion, unit, unit === "in" ? 5 : 4);
    return { valuePm, warning: { message: slip.message, ...(suggestion ? { suggestion } : {}) } };
  } catch (error) {
    if (error instanceof EngineeringError) return { valuePm: null, error: error.message };
    throw error;
  }
}

/** The clearance of a position from what stands in its boxes. */
export function rowClearance(
  judge: Judge,
  positionId: string,
  standing: Standing,
): PositionClearance | undefined {
  const { sheet, temperatureC } = judge;
  const readings = (feature: "bore" | "journal") =>
    sheet.stations
      .filter((station) => station.feature === feature)
      .flatMap((station) => {
        const value = standing(boxKey(positionId, station));
        return value === null || value <= 0 ? [] : [{ ...station, value: metres(value), temperatureC }];
      });
  const measured = { bore: readings("bore"), journal: readings("journal") };
  if (measured.bore.length + measured.journal.length === 0) return undefined;
  try {
    return positionClearance({
      ...measured,
      boreExpansion: sheet.boreExpansion.expansion,
      journalExpansion: sheet.journalExpansion.expansion,
    });
  } catch (error) {
    // A temperature out of range is said at its own field; the clearances wait for a better one.
    if (error instanceof EngineeringError) return undefined;
    throw error;
  }
}

const windows: Record<WindowPlace, RowFigures["window"]> = {
  inside: { word: "✓ inside", tone: "ok" },
  under: { word: "! under", tone: "watch" },
  over: { word: "! over", tone: "watch" },
  "under-limit": { word: "× under limit", tone: "stop" },
  "over-limit": { word: "× over limit", tone: "stop" },
};

/** A row's last columns. */
export function rowFigures(judge: Judge, row: readonly SheetBox[], standing: Standing): RowFigures {
  const { sheet, units } = judge;
  const clearance = rowClearance(judge, row[0]!.position.id, standing);
  const text = (value: number | undefined) =>
    value === undefined ? "–" : clearanceText(picometres(value), units);
  const vertical = clearance?.vertical;
  const place = vertical === undefined ? undefined : againstWindow(vertical, sheet.window, sheet.limits);
  return {
    vertical: text(vertical),
    taper: text(larger(clearance?.boreTaper, clearance?.journalTaper)),
    outOfRound: text(larger(clearance?.boreOutOfRound, clearance?.journalOutOfRound)),
    uncertainty: vertical === undefined ? "" : `± ${text(expandedUncertainty(judge, row, standing))}`,
    window: place ? windows[place] : { word: "", tone: "none" },
  };
}

function larger(one: number | undefined, other: number | undefined): number | undefined {
  if (one === undefined) return other === undefined ? undefined : Math.abs(other);
  return Math.max(Math.abs(one), Math.abs(other ?? 0));
}

function expandedUncertainty(judge: Judge, row: readonly SheetBox[], standing: Standing): number {
  const { sheet, temperatureC } = judge;
  const filled = row.filter((box) => standing(box.key) !== null).map((box) => box.station);
  const bores = filled.filter((station) => station.feature === "bore");
  return clearanceUncertainty({
    boreGauge: judge.boreGauge ?? unknownGauge,
    journalGauge: judge.journalGauge ?? unknownGauge,
    method: sheet.method,
    nominal: metres(sheet.nominalPm),
    bore: sheet.boreExpansion,
    journal: sheet.journalExpansion,
    temperatureOffset: temperatureC === undefined ? undefined : temperatureC - referenceTemperatureC,
    readings: {
      bore: Math.max(1, bores.filter((station) => station.axis === "vertical").length || bores.length),
      journal: Math.max(1, filled.length - bores.length),
    },
  }).expanded;
}

/** What the box in hand should hold by the build's target, and how far from it a good part may be. */
export function expectedValue({ sheet, units }: Judge, box: SheetBox): { value: string; band: string } {
  const { expected } = slipExpectation(sheet.nominalPm, sheet.aimPm, box.station.feature);
  const tolerance = picometres(sheet.window.most - sheet.window.aim);
  return { value: diameterText(expected, units), band: clearanceText(tolerance, units) };
}
