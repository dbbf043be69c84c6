/** The condition grades of a part at teardown, by number. */
export const conditionGrades = ["as new", "normal polish", "marked", "distressed", "failed"] as const;

/**
 * Damage terms: appearances a plain bearing can show, in kebab case.
 * Source: ISO 7146-1:2019 by its public scope; the term list is recalled, not read from the standard.
 */
export const damageTerms = [
  "deposits",
  "creep-deformation",
  "thermal-cycling",
  "melting-out",
  "seizure",
  "wiping",
  "overheating",
  "wear-by-friction",
  "fatigue-cracks",
  "frictional-corrosion",
  "polishing",
  "scoring",
  "mixed-lubrication",
  "worn-material",
  "discoloration",
  "corrosion",
  "fluid-erosion",
  "embedded-particles",
  "particle-migration-tracks",
  "wire-wool",
  "electric-arc-craters",
  "cavitation-erosion",
  "blisters",
  "bond-failure",
  "edge-loading",
  "misalignment",
  "detonation-marks",
  "starvation",
] as const;

export type DamageTerm = (typeof damageTerms)[number];

/** The state of a coating at teardown. */
export const coatingStates = ["intact", "polished", "worn-at-edge", "worn-through", "flaking"] as const;

/** What can happen in a run that says something about the parts. */
export const runEvents = [
  "pressure-dip",
  "over-temperature",
  "over-rev",
  "debris",
  "fuel-dilution",
  "detonation",
] as const;

/** The kinds of run between assembly and teardown. */
export const runKinds = ["dyno", "test", "practice", "qualifying", "race"] as const;

/** A kebab-case term as words: "wear by friction". */
export function inWords(term: string): string {
  return term.replaceAll("-", " ");
}
