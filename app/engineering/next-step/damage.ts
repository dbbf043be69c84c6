import type { PositionOfBuild } from "./types";

/**
 * Damage terms of ISO 7146-1 that clearance does not explain, with where a builder looks first (common practice).
 * Every other term, and damage without a term, is held against the clearance: the careful way round.
 */
const causes: Record<string, string> = {
  "embedded-particles": "dirt in the oil: filter, cleaning, what shed it",
  "particle-migration-tracks": "dirt in the oil: filter, cleaning, what shed it",
  scoring: "dirt in the oil: filter, cleaning, what shed it",
  "wire-wool": "dirt in the oil: filter, cleaning, what shed it",
  debris: "dirt in the oil: filter, cleaning, what shed it",
  contamination: "dirt in the oil: filter, cleaning, what shed it",
  corrosion: "fuel, water or acid in the oil",
  "edge-loading": "alignment, taper or a fillet that rides",
  misalignment: "alignment of the bores, a bent rod or crank",
  "detonation-marks": "detonation: spark, fuel, knock record",
  "fatigue-cracks": "overload or detonation, or a clearance too wide",
  "cavitation-erosion": "oil feed and speed",
  "fluid-erosion": "oil feed and speed",
  "electric-arc-craters": "stray current through the bearing",
  "frictional-corrosion": "crush and the housing: the shell moves",
  "bond-failure": "the shell itself: bond and batch",
  blisters: "the shell itself: bond and batch",
  deposits: "oil and its temperature",
  starvation: "the oil way to this position",
};

/** What to look at for a damage that clearance does not explain; null where clearance may explain it. */
export function causeElsewhere({
  damage,
  coatingState,
}: Pick<PositionOfBuild, "damage" | "coatingState">): string | null {
  if (damage !== null && Object.hasOwn(causes, damage)) return causes[damage]!;
  return coatingState === "flaking" ? "the coating's bond: finish and cleaning before coating, batch" : null;
}
