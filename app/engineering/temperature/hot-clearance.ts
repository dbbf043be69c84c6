import { EngineeringError } from "../engineering-error";
import { atTemperature, expansionRangeC } from "./expansion";

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

/** A clearance with its parts warm, and what each part gave to it, m; the three add up to the change. */
export interface HotClearance {
  /** Diametral, m; negative is an interference. */
  clearance: number;
  housingGrowth: number;
  /** Of both walls: they thicken inwards and take clearance away. */
  shellGrowth: number;
  journalGrowth: number;
  /** A temperature lies beyond where a handbook's coefficient holds. */
  outsideRange: boolean;
}

/**
 * Diametral clearance with each part at its own temperature: the housing's bore grows, the shell's wall thickens
 * inwards from it, the journal grows. Free expansion: crush, and restraint by a stiffer neighbour, are not reckoned;
 * both take clearance away from what this gives for a soft housing.
 * @throws EngineeringError `not-positive`, `negative`, `not-a-number`, `outside-range`
 */
export function hotClearance(input: HotClearanceInput): HotClearance {
  const { clearance, journalDiameter, shellWall, housing, shell, journal } = input;
  if (!Number.isFinite(clearance))
    throw new EngineeringError("not-a-number", "clearance", "The clearance at 20 °C is no number.");
  if (!(journalDiameter > 0 && journalDiameter < 1e3))
    throw new EngineeringError("not-positive", "journalDiameter", "A journal has a diameter over zero.");
  if (!(shellWall >= 0 && shellWall < 1e3))
    throw new EngineeringError("negative", "shellWall", "A shell's wall is not under zero.");
  const housingGrowth = grown(journalDiameter + clearance + 2 * shellWall, housing);
  const shellGrowth = grown(2 * shellWall, shell);
  const journalGrowth = grown(journalDiameter, journal);
  return {
    clearance: clearance + housingGrowth - shellGrowth - journalGrowth,
    housingGrowth,
    shellGrowth,
    journalGrowth,
    outsideRange: [housing, ...(shellWall > 0 ? [shell] : []), journal].some(
      ({ temperatureC }) => temperatureC < expansionRangeC.least || temperatureC > expansionRangeC.most,
    ),
  };
}

function grown(size: number, { expansion, temperatureC }: WarmPart): number {
  return atTemperature(size, temperatureC, expansion) - size;
}
