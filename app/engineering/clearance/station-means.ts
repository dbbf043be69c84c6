import { EngineeringError } from "../engineering-error";
import { at20 } from "../temperature/expansion";
import type { Station } from "../trade/fit-kinds";

/** One reading of a bore or a journal. Readings at the same plane and axis are repeats and count as their mean. */
export interface DiameterReading extends Pick<Station, "plane" | "axis"> {
  /** Diameter as read, m. */
  value: number;
  /** What the part had when it was read, °C. */
  temperatureC?: number | undefined;
}

/** What one plane and axis measures: its repeats averaged, at 20 °C where that can be known. */
export interface StationMean extends Pick<Station, "plane" | "axis"> {
  /** m */
  value: number;
  /** False where a temperature or the expansion is not known, so that it stands as it was read. */
  at20: boolean;
}

/**
 * The stations of one part, each with its repeats averaged and brought to 20 °C where temperature and expansion are
 * known (ISO 1).
 * @param expansion linear coefficient of the part, per °C
 * @throws EngineeringError `not-positive` for a diameter that is not over zero, `outside-range` for a temperature
 */
export function stationMeans(
  readings: readonly DiameterReading[],
  expansion: number | undefined,
  feature: Station["feature"],
): StationMean[] {
  const found = new Map<string, { sum: number; count: number; mean: StationMean }>();
  for (const [index, { plane, axis, value, temperatureC }] of readings.entries()) {
    if (!(value > 0 && Number.isFinite(value))) {
      throw new EngineeringError("not-positive", `${feature}[${index}].value`, "A diameter is over zero.");
    }
    const known = temperatureC !== undefined && expansion !== undefined;
    const key = `${plane} ${axis}`;
    const station = found.get(key) ?? { sum: 0, count: 0, mean: { plane, axis, value: 0, at20: true } };
    station.sum += known ? at20(value, temperatureC, expansion) : value;
    station.count += 1;
    station.mean.value = station.sum / station.count;
    station.mean.at20 &&= known;
    found.set(key, station);
  }
  return [...found.values()].map(({ mean }) => mean);
}

/** The mean of stations, m; there must be one. */
export function meanOf(stations: readonly StationMean[]): number {
  return stations.reduce((sum, station) => sum + station.value, 0) / stations.length;
}
