import type { Insertable } from "kysely";
import { instant } from "#database/id";
import type { Feature, ReadingTable, Stage } from "#database/schema";
import { formatLength } from "~/engineering/quantity/format";
import { picometres } from "~/engineering/quantity/length";
import { parseQuantity } from "~/engineering/quantity/parse";
import { checkSlip } from "~/engineering/quantity/slip";
import { atTemperature } from "~/engineering/temperature/expansion";
import { findMaterial } from "~/engineering/temperature/materials";
import { slipExpectation } from "~/engineering/trade/slip-expectation";
import type { ReadingWarning, StandingReading } from "~/models/reading.server";
import type { Bench, DemoBuild, DemoFit } from "./bench";
import type { GaugeSet } from "./gauges";
import { readingNoise } from "./wear-model";

/** A reading as far as signatures and histories need it. */
export type DemoReading = Pick<
  StandingReading,
  "id" | "positionId" | "stage" | "feature" | "plane" | "axis" | "state" | "valuePm" | "typed"
> &
  Pick<StandingReading, "temperatureC" | "gaugeId">;

/** A stage of a build's sheet while it is filled in. */
export interface SheetInHand {
  stage: Stage;
  build: DemoBuild;
  /** When the last box was typed. */
  at: Date;
  /** How many boxes are still filled; the rest stays empty. */
  boxesLeft: number;
  /** The parts have soaked in one room, °C. */
  temperatureC: number;
}

export type Box = Pick<DemoReading, "positionId" | "feature" | "plane" | "axis">;

const secondsABox = 14;

/** How often a builder swaps two digits, is warned and puts it right at once. */
const slipRate = 0.003;

/** Reads a diameter with the gauge for it and types it in; gives the reading that stands. */
export function fillBox(
  bench: Bench,
  fit: DemoFit,
  sheet: SheetInHand,
  box: Box,
  diameterAt20: number,
): DemoReading {
  const { row, random } = fit;
  const gauge = gaugeFor(bench, fit, box.feature);
  const { expansion } = findMaterial(box.feature === "bore" ? row.bore_material : row.journal_material);
  const seen = atTemperature(diameterAt20, sheet.temperatureC, expansion) + random.normal(readingNoise);
  const valuePm = Math.round(picometres(seen) / gauge.resolution_pm) * gauge.resolution_pm;
  const typed = asTyped(bench.spec.gauges, valuePm);
  const type = (what: Typed, warnings: ReadingWarning[], supersedes: string | null) =>
    writeReading(bench, fit, sheet, { ...box, gaugeId: gauge.id }, what, warnings, supersedes);
  const slip = random.chance(slipRate) ? slipIn(typed, fit, box.feature) : undefined;
  const first = slip && type(slip.typed, [slip.warning], null);
  return type(typed, [], first?.id ?? null);
}

interface Typed {
  value_pm: number;
  typed: string;
  unit: "in" | "mm";
  decimals: number;
}

const finest = { inch: { unit: "in", decimals: 5 }, metric: { unit: "mm", decimals: 4 } } as const;

/** The digits as a builder types them: the last one left out where it is a nought. */
function asTyped(set: GaugeSet, valuePm: number): Typed {
  const { unit, decimals: most } = finest[set];
  const decimals = formatLength(valuePm, unit, most).endsWith("0") ? most - 1 : most;
  return { value_pm: valuePm, typed: formatLength(valuePm, unit, decimals), unit, decimals };
}

/** The same with the first two digits behind the point that differ swapped, where the sheet warns of that. */
function slipIn({ typed, unit, decimals }: Typed, { row, aim }: DemoFit, feature: Feature) {
  const swapped = typed.replace(/(\.\d*?)(\d)(?!\2)(\d)/, "$1$3$2");
  const { picometres: valuePm } = parseQuantity(swapped, "length", { defaultUnit: unit });
  const slip = checkSlip(valuePm!, slipExpectation(row.nominal_pm, aim.pm, feature));
  if (!slip) return undefined;
  return {
    typed: { value_pm: valuePm!, typed: swapped, unit, decimals },
    warning: { code: slip.code, message: slip.message },
  };
}

function writeReading(
  { rows, shop }: Bench,
  fit: DemoFit,
  sheet: SheetInHand,
  { gaugeId, ...box }: Box & { gaugeId: string },
  what: Typed,
  warnings: ReadingWarning[],
  supersedes: string | null,
): DemoReading {
  sheet.at = new Date(sheet.at.getTime() + secondsABox * 1000);
  const { stage, temperatureC } = sheet;
  const row = {
    id: rows.idAt(sheet.at),
    shop_id: shop.id,
    build_id: sheet.build.id,
    fit_id: fit.row.id,
    position_id: box.positionId,
    stage,
    feature: box.feature,
    plane: box.plane,
    axis: box.axis,
    repeat: 1,
    state: "measured",
    ...what,
    reason: null,
    temperature_c: temperatureC,
    gauge_id: gaugeId,
    warnings_json: JSON.stringify(warnings),
    supersedes_id: supersedes,
    person_id: shop.personOf("builder"),
    taken_at: instant(sheet.at),
  } satisfies Insertable<ReadingTable>;
  rows.add("reading", row);
  return {
    ...box,
    id: row.id,
    stage,
    state: row.state,
    valuePm: what.value_pm,
    typed: what.typed,
    temperatureC,
    gaugeId,
  };
}

function gaugeFor({ shop, spec }: Bench, { spec: { kind } }: DemoFit, feature: Feature) {
  const parts = kind === "main" || kind === "big-end" ? "crank" : "small";
  const fitting = shop.gauges.find(
    (gauge) => gauge.set === spec.gauges && gauge.feature === feature && gauge.parts === parts,
  );
  return fitting!.row;
}
