import { positionClearance } from "~/engineering/clearance/position-clearance";
import { metres } from "~/engineering/quantity/length";
import { referenceTemperatureC } from "~/engineering/temperature/expansion";
import { findMaterial } from "~/engineering/temperature/materials";
import {
  clearanceUncertainty,
  type GaugeSpecification,
  unknownGauge,
} from "~/engineering/uncertainty/clearance-uncertainty";
import type { Fit } from "./fit.server";
import type { Gauge } from "./gauge.server";
import type { StandingReading } from "./reading.server";

/** A reading as far as its position's clearance needs it. */
export type MeasuredReading = Pick<
  StandingReading,
  "positionId" | "feature" | "plane" | "axis" | "valuePm" | "temperatureC" | "gaugeId"
>;

/** What a position's readings give, m at 20 °C; `undefined` where they do not give it. */
export interface MeasuredPosition {
  positionId: string;
  /** The clearance of record: vertical, or the mean where the load line was not measured. */
  clearance: number | undefined;
  bore: number | undefined;
  journal: number | undefined;
  /** Expanded, about 95 %. */
  uncertainty: number;
  temperatureKnown: boolean;
}

/** The clearances of a fit's positions from readings of one stage. */
export function measureFit(
  fit: Pick<Fit, "positions" | "nominal_pm" | "bore_material" | "journal_material" | "method">,
  readings: readonly MeasuredReading[],
  gauges: readonly Gauge[],
): MeasuredPosition[] {
  const bore = findMaterial(fit.bore_material);
  const journal = findMaterial(fit.journal_material);
  return fit.positions.flatMap((position) => {
    const measured = readings.filter(
      (reading) => reading.positionId === position.id && reading.valuePm !== null,
    );
    if (measured.length === 0) return [];
    const of = (feature: "bore" | "journal") => measured.filter((reading) => reading.feature === feature);
    const result = positionClearance({
      bore: of("bore").map(asDiameter),
      journal: of("journal").map(asDiameter),
      boreExpansion: bore.expansion,
      journalExpansion: journal.expansion,
    });
    const temperatures = measured.flatMap((reading) => reading.temperatureC ?? []);
    const uncertainty = clearanceUncertainty({
      boreGauge: specification(gauges, of("bore")),
      journalGauge: specification(gauges, of("journal")),
      method: fit.method,
      nominal: metres(fit.nominal_pm),
      bore,
      journal,
      temperatureOffset: result.at20
        ? Math.max(...temperatures.map((temperature) => Math.abs(temperature - referenceTemperatureC)))
        : undefined,
      readings: { bore: Math.max(1, onLoadLine(of("bore"))), journal: Math.max(1, of("journal").length) },
    });
    return {
      positionId: position.id,
      clearance: result.vertical ?? result.mean,
      bore: result.bore,
      journal: result.journal,
      uncertainty: uncertainty.expanded,
      temperatureKnown: result.at20,
    };
  });
}

function asDiameter(reading: MeasuredReading) {
  return {
    plane: reading.plane,
    axis: reading.axis,
    value: metres(reading.valuePm as number),
    temperatureC: reading.temperatureC ?? undefined,
  };
}

function onLoadLine(readings: MeasuredReading[]): number {
  return readings.filter((reading) => reading.axis === "vertical").length || readings.length;
}

function specification(gauges: readonly Gauge[], readings: MeasuredReading[]): GaugeSpecification {
  const gauge = gauges.find((candidate) => candidate.id === readings[0]?.gaugeId);
  if (!gauge) return unknownGauge;
  return {
    resolution: metres(gauge.resolution_pm),
    calibration: metres(gauge.calibration_pm),
    repeatability: metres(gauge.repeatability_pm),
  };
}
