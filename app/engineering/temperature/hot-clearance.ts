import { EngineeringError } from "../engineering-error";
import { atTemperature } from "./expansion";

/** A part at its own temperature. */
export interface WarmPart {
  /** Linear expansion, per °C. */
  expansion: number;
  temperatureC: number;
}

export interface HotClearanceInput {
  /** Diametral clearance at 20 °C, m. */
  clearance: number;
  /** Journal diameter at 20 °C, m. */
  journalDiameter: number;
  /** Wall of one shell at 20 °C, m; 0 where the journal runs in the housing itself. */
  shellWall: number;
  housing: WarmPart;
  shell: WarmPart;
  journal: WarmPart;
}

/**
 * Diametral clearance with each part at its own temperature, m: the housing's bore grows, the shell's wall thickens
 * inwards from it, the journal grows. Free expansion: crush and restraint by a stiffer neighbour are not reckoned.
 * Negative is an interference.
 * @throws EngineeringError `not-positive`, `negative`, `outside-range`
 */
export function hotClearance(input: HotClearanceInput): number {
  const { clearance, journalDiameter, shellWall, housing, shell, journal } = input;
  if (!(journalDiameter > 0))
    throw new EngineeringError("not-positive", "journalDiameter", "A journal has a diameter over zero.");
  if (!(shellWall >= 0))
    throw new EngineeringError("negative", "shellWall", "A shell's wall is not under zero.");
  const housingBore = journalDiameter + clearance + 2 * shellWall;
  return (
    atTemperature(housingBore, housing.temperatureC, housing.expansion) -
    2 * atTemperature(shellWall, shell.temperatureC, shell.expansion) -
    atTemperature(journalDiameter, journal.temperatureC, journal.expansion)
  );
}
