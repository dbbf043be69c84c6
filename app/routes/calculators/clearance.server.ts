import { positionClearance } from "~/engineering/clearance/position-clearance";
import { EngineeringError } from "~/engineering/engineering-error";
import {
  clearanceText,
  clearanceUnit,
  clearanceUnitName,
  diameterUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { parseQuantity } from "~/engineering/quantity/parse";
import { referenceTemperatureC } from "~/engineering/temperature/expansion";
import { findMaterial } from "~/engineering/temperature/materials";
import { fitKind, type Station, stationName } from "~/engineering/trade/fit-kinds";
import {
  clearanceUncertainty,
  type GaugeSpecification,
  unknownGauge,
} from "~/engineering/uncertainty/clearance-uncertainty";
import type { FieldError } from "~/models/refusal";

const stations = fitKind("main").stations;

const fieldOf = (station: Station) => `${station.feature}-${station.plane}-${station.axis}`;

const gaugeFields = (["bore", "journal"] as const).flatMap((feature) =>
  (["resolution", "calibration", "repeatability"] as const).map((part) => ({
    name: `${feature}-${part}`,
    label: `${feature === "bore" ? "Bore" : "Journal"} gauge, ${part}`,
  })),
);

/**
 * The clearance page's answer from its address, so that a link gives the inputs and the result again.
 * A field that cannot be read is named and the rest is kept.
 */
export function calculateClearance(asked: URLSearchParams, units: PageUnits) {
  const typed = Object.fromEntries(asked);
  const errors: FieldError[] = [];
  const page = {
    typed,
    errors,
    unit: clearanceUnit(units),
    extra: gaugeFields,
    stations: {
      bore: stations
        .filter((one) => one.feature === "bore")
        .map((one) => ({ name: fieldOf(one), label: stationName(one) })),
      journal: stations
        .filter((one) => one.feature === "journal")
        .map((one) => ({ name: fieldOf(one), label: stationName(one) })),
    },
  };

  const read = <Value>(name: string, parse: (text: string) => Value): Value | undefined => {
    const text = typed[name]?.trim() ?? "";
    if (text === "") return undefined;
    try {
      return parse(text);
    } catch (error) {
      if (!(error instanceof EngineeringError)) throw error;
      errors.push({ path: name, code: error.code, message: error.message });
      return undefined;
    }
  };
  const part = (feature: "bore" | "journal") => ({
    material: read(`${feature}Material`, findMaterial) ?? findMaterial("steel-4340"),
    temperatureC: read(
      `${feature}Temperature`,
      (text) => parseQuantity(text, "temperature", { defaultUnit: "degC" }).si,
    ),
    readings: stations
      .filter((station) => station.feature === feature)
      .flatMap((station) => {
        const value = read(
          fieldOf(station),
          (text) => parseQuantity(text, "length", { defaultUnit: diameterUnitName(units) }).si,
        );
        return value === undefined ? [] : [{ ...station, value }];
      }),
    gauge: gaugeOf((name) =>
      read(
        `${feature}-${name}`,
        (text) => parseQuantity(text, "small-length", { defaultUnit: clearanceUnitName(units) }).si,
      ),
    ),
  });
  const bore = part("bore");
  const journal = part("journal");
  if (errors.length > 0 || bore.readings.length + journal.readings.length === 0)
    return { ...page, result: undefined };
  try {
    return {
      ...page,
      result: answer(bore, journal, typed.method === "comparative" ? "comparative" : "absolute", units),
    };
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    errors.push({ path: "", code: error.code, message: error.message });
    return { ...page, result: undefined };
  }
}

function gaugeOf(read: (name: string) => number | undefined): GaugeSpecification {
  return {
    resolution: read("resolution") ?? unknownGauge.resolution,
    calibration: read("calibration") ?? unknownGauge.calibration,
    repeatability: read("repeatability") ?? unknownGauge.repeatability,
  };
}

interface MeasuredPart {
  material: ReturnType<typeof findMaterial>;
  temperatureC: number | undefined;
  readings: (Station & { value: number })[];
  gauge: GaugeSpecification;
}

function answer(
  bore: MeasuredPart,
  journal: MeasuredPart,
  method: "absolute" | "comparative",
  units: PageUnits,
) {
  const warm = (part: MeasuredPart) =>
    part.readings.map((reading) => ({ ...reading, temperatureC: part.temperatureC }));
  const clearance = positionClearance({
    bore: warm(bore),
    journal: warm(journal),
    boreExpansion: bore.material.expansion,
    journalExpansion: journal.material.expansion,
  });
  const offset = (part: MeasuredPart) =>
    Math.abs((part.temperatureC ?? referenceTemperatureC) - referenceTemperatureC);
  const uncertainty = clearanceUncertainty({
    boreGauge: bore.gauge,
    journalGauge: journal.gauge,
    method,
    nominal: clearance.journal ?? clearance.bore ?? 0,
    bore: bore.material,
    journal: journal.material,
    temperatureOffset: clearance.at20 ? Math.max(offset(bore), offset(journal)) : undefined,
  });
  const text = (value: number | undefined, extra = 0) =>
    value === undefined ? "–" : clearanceText(picometres(value), units, extra);
  const missing = [
    ...clearance.missing,
    ...(clearance.at20
      ? []
      : ["A temperature is not given: readings stand as they were read, not at 20 °C."]),
    ...(clearance.interference
      ? ["The bore is smaller than the journal somewhere: this is an interference."]
      : []),
  ];
  return {
    missing,
    rows: [
      { what: "vertical", value: text(clearance.vertical) },
      { what: "least", value: text(clearance.least) },
      { what: "most", value: text(clearance.most) },
      { what: "mean", value: text(clearance.mean) },
      { what: "sure to, about 95 %", value: `± ${text(uncertainty.expanded, 1)}` },
      { what: "bore out of round", value: text(clearance.boreOutOfRound) },
      { what: "bore taper, front less rear", value: text(clearance.boreTaper) },
      { what: "journal out of round", value: text(clearance.journalOutOfRound) },
      { what: "journal taper, front less rear", value: text(clearance.journalTaper) },
    ],
    budget: uncertainty.budget.map((line) => ({ what: line.what, value: text(line.uncertainty, 1) })),
  };
}
