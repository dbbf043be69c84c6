import { boxKey } from "~/components/sheet/boxes";
import type { BoxState } from "~/components/sheet/sheet-store";
import { diameterUnitName, type PageUnits } from "~/engineering/quantity/figures";
import { formatLength } from "~/engineering/quantity/format";
import { metres } from "~/engineering/quantity/length";
import { findMaterial } from "~/engineering/temperature/materials";
import { absenceText } from "~/engineering/trade/box-text";
import { fitKind, type Station } from "~/engineering/trade/fit-kinds";
import type { Target } from "~/models/build.server";
import type { Fit } from "~/models/fit.server";
import type { Gauge } from "~/models/gauge.server";
import type { StandingReading } from "~/models/reading.server";

/** A reading as its box shows it: as it was typed where its unit is the page's, else in the page's unit. */
export function shownReading(reading: StandingReading, units: PageUnits): string {
  if (reading.state === "not-measured" || reading.state === "not-accessible") {
    return absenceText(reading.state, reading.reason);
  }
  const unit = diameterUnitName(units);
  if (reading.valuePm === null) return "";
  if (reading.unit === unit) return formatLength(reading.valuePm, unit, reading.decimals ?? 4);
  return formatLength(reading.valuePm, unit, unit === "in" ? 5 : 4);
}

/** The states of the boxes that hold something, by their keys. */
export function boxStates(readings: StandingReading[], units: PageUnits): [string, BoxState][] {
  return readings
    .filter((reading) => reading.repeat === 1)
    .map((reading) => {
      const warnings = JSON.parse(reading.warningsJson) as { message: string }[];
      return [
        boxKey(reading.positionId, reading),
        {
          text: shownReading(reading, units),
          readingId: reading.id,
          valuePm: reading.valuePm,
          status: "saved",
          ...(warnings[0] ? { warning: { message: warnings[0].message } } : {}),
        },
      ];
    });
}

/** What the grid needs to know of a fit: its places and words, and what its boxes are judged by. */
export function sheetOf(fit: Fit, target: Target | undefined, readings: StandingReading[]) {
  const kind = fitKind(fit.kind);
  return {
    id: fit.id,
    name: kind.name,
    position: kind.position,
    bore: kind.bore,
    journal: kind.journal,
    positions: fit.positions.map(({ id, number }) => ({ id, number })),
    stations: withExtraStations(kind.stations, readings),
    nominalPm: fit.nominal_pm,
    aimPm: target?.aim_pm ?? fit.usual_pm,
    window: {
      least: metres(target?.least_pm ?? fit.least_pm),
      aim: metres(target?.aim_pm ?? fit.usual_pm),
      most: metres(target?.most_pm ?? fit.most_pm),
    },
    limits: { least: metres(fit.least_pm), most: metres(fit.most_pm) },
    method: fit.method,
    boreExpansion: expansionOf(fit.bore_material),
    journalExpansion: expansionOf(fit.journal_material),
  };
}

function expansionOf(material: string) {
  const { expansion, uncertainty } = findMaterial(material);
  return { expansion, uncertainty };
}

export type Sheet = ReturnType<typeof sheetOf>;

// A gauge or a script may have measured at stations that the usual sheet does not have; nothing measured is hidden.
function withExtraStations(stations: readonly Station[], readings: StandingReading[]): Station[] {
  const extra = readings.filter(
    (reading) =>
      !stations.some(
        (station) =>
          station.feature === reading.feature &&
          station.plane === reading.plane &&
          station.axis === reading.axis,
      ),
  );
  const unique = new Map(
    extra.map(({ feature, plane, axis }) => [
      `${feature} ${plane} ${axis}`,
      { feature, plane, axis } as Station,
    ]),
  );
  const all = [...stations, ...unique.values()];
  return [
    ...all.filter((station) => station.feature === "bore"),
    ...all.filter((station) => station.feature === "journal"),
  ];
}

/** A gauge as the uncertainty takes it. */
export function gaugeChoice(gauge: Gauge) {
  return {
    id: gauge.id,
    name: gauge.name,
    kind: gauge.kind,
    resolution: metres(gauge.resolution_pm),
    calibration: metres(gauge.calibration_pm),
    repeatability: metres(gauge.repeatability_pm),
  };
}

export type GaugeChoice = ReturnType<typeof gaugeChoice>;
