type Range = readonly [number, number];

/** The ranges from which the hidden truth of a simulated shop is drawn. Lengths in µm, hours in h. */
export interface Family {
  name: string;
  /** Critical clearance over the usual one, at the reference viscosity and without a coating; negative: below it. */
  criticalFromUsual: Range;
  /** Clearance over which the excess wear grows e-fold. */
  slope: Range;
  /** Base wear rate, µm/h. */
  baseRate: Range;
  /** Shift of the critical clearance per e-fold of viscosity. */
  viscosityShift: Range;
  /** What a coating takes off the critical clearance. */
  coatingBenefit: Range;
  /** What a coating's first run wears once. */
  beddingIn: Range;
  positions: Range;
  hours: Range;
  /** Standard deviation of one diameter's measurement. */
  gauge: number;
  /** Standard deviation of a position from its target. */
  scatter: number;
  misgraded: number;
  /** Chance that a teardown carries debris damage on one position. */
  debris: number;
  /** Chance that a reading of clearance is mistyped. */
  mistyped: number;
}

const usual: Family = {
  name: "usual",
  criticalFromUsual: [-28, -10],
  slope: [2, 4],
  baseRate: [0.05, 0.2],
  viscosityShift: [3, 8],
  coatingBenefit: [0, 4],
  beddingIn: [1, 4],
  positions: [8, 8],
  hours: [4, 9],
  gauge: 0.7,
  scatter: 1.2,
  misgraded: 0.1,
  debris: 0.1,
  mistyped: 0.002,
};

/** The families of simulated shops, the usual one first. */
export const families: readonly Family[] = [
  usual,
  { ...usual, name: "dusty, much debris", debris: 0.35 },
  { ...usual, name: "very steep limit", slope: [1, 2] },
  // As far above the usual clearance as a first build at the usual can be without failing at once.
  { ...usual, name: "limit above the usual", criticalFromUsual: [-3, 2.5], coatingBenefit: [0, 0] },
  { ...usual, name: "rough gauges", gauge: 1.4 },
  { ...usual, name: "mistyped readings", mistyped: 0.03 },
];

/** Every range wider than the specification's: to see whether what was tuned holds where it was not. */
export const widerFamily: Family = {
  ...usual,
  name: "wider than specified",
  criticalFromUsual: [-34, -4],
  slope: [1.5, 5],
  baseRate: [0.02, 0.4],
  viscosityShift: [0, 12],
  coatingBenefit: [0, 6],
  positions: [4, 8],
  hours: [3, 12],
};
