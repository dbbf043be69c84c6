import { EngineeringError } from "../engineering-error";
import { at20 } from "../temperature/expansion";
import type { Station } from "../trade/fit-kinds";

/** One reading of a bore or a journal, m. */
export interface DiameterReading extends Pick<Station, "plane" | "axis"> {
  value: number;
  temperatureC?: number | undefined;
}

export interface PositionReadings {
  bore: readonly DiameterReading[];
  journal: readonly DiameterReading[];
  /** Linear expansion per °C; with a temperature it brings the reading to 20 °C. */
  boreExpansion?: number | undefined;
  journalExpansion?: number | undefined;
}

/** What the readings of one position give, m; `undefined` where they do not give it. */
export interface PositionClearance {
  /** Across the load line: the vertical bore less the mean journal; the reading of record. */
  vertical?: number;
  /** Smallest bore less largest journal, and the other way round. */
  least?: number;
  most?: number;
  mean?: number;
  bore?: number;
  journal?: number;
  boreOutOfRound?: number;
  journalOutOfRound?: number;
  /** Front less rear: positive where the front is larger. */
  boreTaper?: number;
  journalTaper?: number;
  boreShape?: Shape;
  journalShape?: Shape;
  /** False where a reading's temperature or the part's expansion is not known, so that it stands as it was read. */
  at20: boolean;
  /** The bore is smaller than the journal somewhere. */
  interference: boolean;
  missing: string[];
}

export type Shape = "barrel" | "hourglass" | "even";

/**
 * Clearance of one position from any grid of readings. Repeats at one station are averaged first; every diameter is
 * brought to 20 °C where its temperature and expansion are known (ISO 1). A journal turns, so that the load line meets
 * all of it in turn: the vertical clearance takes the mean of the journal's axes, the least its largest.
 * @throws EngineeringError `not-positive` for a diameter that is not over zero, `outside-range` for a temperature
 */
export function positionClearance(readings: PositionReadings): PositionClearance {
  const bore = stations(readings.bore, readings.boreExpansion, "bore");
  const journal = stations(readings.journal, readings.journalExpansion, "journal");
  const result: PositionClearance = {
    at20: bore.every((station) => station.at20) && journal.every((station) => station.at20),
    interference: false,
    missing: [],
  };
  if (bore.length === 0) result.missing.push("No bore is measured.");
  if (journal.length === 0) result.missing.push("No journal is measured.");
  Object.assign(result, shapeOf("bore", bore), shapeOf("journal", journal));
  if (bore.length === 0 || journal.length === 0) return result;

  const boreValues = bore.map((station) => station.value);
  const journalValues = journal.map((station) => station.value);
  result.least = Math.min(...boreValues) - Math.max(...journalValues);
  result.most = Math.max(...boreValues) - Math.min(...journalValues);
  result.mean = mean(boreValues) - mean(journalValues);
  result.interference = result.least < 0;
  const loadLine = bore.filter((station) => station.axis === "vertical");
  // A guide has no load line that anyone marks: its two directions stand for it.
  const onLine =
    loadLine.length > 0 ? loadLine : bore.filter((station) => station.axis === "a" || station.axis === "b");
  if (onLine.length > 0) result.vertical = mean(onLine.map((station) => station.value)) - mean(journalValues);
  else result.missing.push("The bore is not measured across the load line (vertical).");
  return result;
}

interface StationMean extends Pick<Station, "plane" | "axis"> {
  value: number;
  at20: boolean;
}

function stations(
  readings: readonly DiameterReading[],
  expansion: number | undefined,
  field: string,
): StationMean[] {
  const byStation = new Map<
    string,
    { place: Pick<Station, "plane" | "axis">; values: number[]; at20: boolean }
  >();
  for (const [index, { plane, axis, value, temperatureC }] of readings.entries()) {
    if (!(value > 0 && Number.isFinite(value))) {
      throw new EngineeringError("not-positive", `${field}[${index}].value`, "A diameter is over zero.");
    }
    const known = temperatureC !== undefined && expansion !== undefined;
    const key = `${plane} ${axis}`;
    const station = byStation.get(key) ?? { place: { plane, axis }, values: [], at20: true };
    station.values.push(known ? at20(value, temperatureC, expansion) : value);
    station.at20 &&= known;
    byStation.set(key, station);
  }
  return [...byStation.values()].map(({ place, values, at20 }) => ({ ...place, value: mean(values), at20 }));
}

function shapeOf(feature: "bore" | "journal", measured: StationMean[]) {
  if (measured.length === 0) return {};
  const planes = ["front", "middle", "rear"] as const;
  const values = new Map(
    planes.map((plane) => [plane, measured.filter((station) => station.plane === plane).map((s) => s.value)]),
  );
  const spreads = [...values.values()]
    .filter((list) => list.length > 1)
    .map((list) => Math.max(...list) - Math.min(...list));
  const taper = planeDifference(measured, "front", "rear");
  const front = values.get("front")!;
  const middle = values.get("middle")!;
  const rear = values.get("rear")!;
  return {
    [feature]: mean(measured.map((station) => station.value)),
    ...(spreads.length > 0 ? { [`${feature}OutOfRound`]: Math.max(...spreads) } : {}),
    ...(taper === undefined ? {} : { [`${feature}Taper`]: taper }),
    ...(front.length > 0 && middle.length > 0 && rear.length > 0
      ? { [`${feature}Shape`]: shape(mean(front), mean(middle), mean(rear)) }
      : {}),
  };
}

/** Mean difference of two planes over the axes that both have, so that out-of-round does not pass for taper. */
function planeDifference(
  measured: StationMean[],
  one: Station["plane"],
  other: Station["plane"],
): number | undefined {
  const differences = measured
    .filter((station) => station.plane === one)
    .flatMap((station) => {
      const opposite = measured.find(
        (candidate) => candidate.plane === other && candidate.axis === station.axis,
      );
      return opposite ? [station.value - opposite.value] : [];
    });
  return differences.length > 0 ? mean(differences) : undefined;
}

function shape(front: number, middle: number, rear: number): Shape {
  if (middle > Math.max(front, rear)) return "barrel";
  return middle < Math.min(front, rear) ? "hourglass" : "even";
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
