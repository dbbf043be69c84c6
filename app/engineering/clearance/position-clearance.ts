import { type PartShape, partShape, type Shape } from "./part-shape";
import { type DiameterReading, meanOf, type StationMean, stationMeans } from "./station-means";

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
  /** Mean diameters. */
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
  /** What was not measured, and what is therefore not known. */
  missing: string[];
}

/**
 * Clearance of one position from any grid of readings. Repeats at one station are averaged first; every diameter is
 * brought to 20 °C where its temperature and expansion are known (ISO 1).
 *
 * A journal turns, so that the load line meets all of it in turn: the vertical clearance takes the mean of the
 * journal's axes, in the same plane where both are measured there; the least clearance takes its largest reading.
 *
 * Absolute and comparative measuring give the same sum: a bore gauge that was zeroed on the journal's micrometer
 * setting shows the clearance, and the bore is written as that setting with what the dial added. They differ in their
 * uncertainty (`clearanceUncertainty`).
 * @throws EngineeringError `not-positive` for a diameter that is not over zero, `outside-range` for a temperature
 */
export function positionClearance(readings: PositionReadings): PositionClearance {
  const bore = stationMeans(readings.bore, readings.boreExpansion, "bore");
  const journal = stationMeans(readings.journal, readings.journalExpansion, "journal");
  const boreShape = partShape(bore);
  const journalShape = partShape(journal);
  const extremes = extremeClearances(bore, journal);
  return {
    vertical: verticalClearance(bore, journal),
    least: extremes.least,
    most: extremes.most,
    mean: extremes.mean,
    bore: meanIfAny(bore),
    journal: meanIfAny(journal),
    boreOutOfRound: boreShape.outOfRound,
    journalOutOfRound: journalShape.outOfRound,
    boreTaper: boreShape.taper,
    journalTaper: journalShape.taper,
    boreShape: boreShape.shape,
    journalShape: journalShape.shape,
    at20: bore.every((station) => station.at20) && journal.every((station) => station.at20),
    interference: (extremes.least ?? 0) < 0,
    missing: [
      ...missingOf("bore", bore, boreShape),
      ...missingOf("journal", journal, journalShape),
      ...(bore.length > 0 && loadLine(bore).length === 0
        ? ["The bore is not measured across the load line (vertical)."]
        : []),
    ],
  };
}

function meanIfAny(stations: readonly StationMean[]): number | undefined {
  return stations.length > 0 ? meanOf(stations) : undefined;
}

function extremeClearances(
  bore: readonly StationMean[],
  journal: readonly StationMean[],
): Pick<PositionClearance, "least" | "most" | "mean"> {
  if (bore.length === 0 || journal.length === 0) return {};
  const bores = bore.map(({ value }) => value);
  const journals = journal.map(({ value }) => value);
  return {
    least: Math.min(...bores) - Math.max(...journals),
    most: Math.max(...bores) - Math.min(...journals),
    mean: meanOf(bore) - meanOf(journal),
  };
}

/** The bore's stations across the load line. A guide has none that anyone marks: its two directions stand for it. */
function loadLine(bore: readonly StationMean[]): StationMean[] {
  const vertical = bore.filter(({ axis }) => axis === "vertical");
  return vertical.length > 0 ? vertical : bore.filter(({ axis }) => axis === "a" || axis === "b");
}

function verticalClearance(
  bore: readonly StationMean[],
  journal: readonly StationMean[],
): number | undefined {
  const across = loadLine(bore);
  if (across.length === 0 || journal.length === 0) return undefined;
  const shared = across.filter(({ plane }) => journal.some((station) => station.plane === plane));
  if (shared.length === 0) return meanOf(across) - meanOf(journal);
  const planes = new Set(shared.map(({ plane }) => plane));
  let sum = 0;
  for (const plane of planes) {
    const inPlane = (station: StationMean) => station.plane === plane;
    sum += meanOf(shared.filter(inPlane)) - meanOf(journal.filter(inPlane));
  }
  return sum / planes.size;
}

function missingOf(
  part: "bore" | "journal",
  stations: readonly StationMean[],
  { outOfRound, taper }: PartShape,
): string[] {
  if (stations.length === 0) return [`No ${part} is measured.`];
  return [
    ...(outOfRound === undefined
      ? [`The ${part} is measured in one direction only: its out-of-round is not known.`]
      : []),
    ...(taper === undefined
      ? [`The ${part} is not measured front and rear on one axis: its taper is not known.`]
      : []),
  ];
}
