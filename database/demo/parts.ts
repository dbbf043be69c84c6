import type { Feature } from "#database/schema";
import type { FitKind, Station } from "~/engineering/trade/fit-kinds";
import type { Random } from "./random";
import { micron } from "./wear-model";

/** A bore or a journal: its diameter at 20 °C at each of its kind's stations, m. */
export type Part = number[];

/** Where a bore or a journal of a kind is measured. */
export function stationsOf(kind: FitKind, feature: Feature): readonly Station[] {
  return kind.stations.filter((station) => station.feature === feature);
}

/** A part of a size, with a little taper and roundness of its own that leave its clearance of record as it is. */
export function makePart(stations: readonly Station[], size: number, random: Random): Part {
  const taper = random.normal(0.4 * micron);
  const towardsJoint = random.between([5 * micron, 8 * micron]);
  const shape = stations.map(({ plane, axis }) => {
    const along = plane === "front" ? taper : plane === "rear" ? -taper : 0;
    // Shells are made looser towards the parting line.
    const relief = axis === "plus45" || axis === "minus45" ? towardsJoint : 0;
    return along + relief + random.normal(0.3 * micron);
  });
  const ofRecord = shape.filter((_, index) => isOfRecord(stations, index));
  const mean = ofRecord.reduce((sum, offset) => sum + offset, 0) / ofRecord.length;
  return shape.map((offset) => size + offset - mean);
}

/** The part after it has worn, m on the diameter: a bore mostly along its load line, a journal all round. */
export function wornPart(stations: readonly Station[], part: Part, wear: number): Part {
  const sign = stations[0]!.feature === "bore" ? 1 : -1;
  return part.map((diameter, index) => diameter + sign * wear * (isOfRecord(stations, index) ? 1 : 0.3));
}

/** The size that a part's clearance is reckoned with: along the load line where it has one. */
export function sizeOfRecord(stations: readonly Station[], part: Part): number {
  const ofRecord = part.filter((_, index) => isOfRecord(stations, index));
  return ofRecord.reduce((sum, diameter) => sum + diameter, 0) / ofRecord.length;
}

function isOfRecord(stations: readonly Station[], index: number): boolean {
  const { feature, axis } = stations[index]!;
  if (feature === "journal") return true;
  return axis === "vertical" || axis === "a" || axis === "b";
}
