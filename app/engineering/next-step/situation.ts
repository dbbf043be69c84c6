/** What the next build starts from. Lengths in µm, hours in h. */
export interface Situation {
  /** The target of the last build. */
  current: number;
  positions: number;
  /** Standard deviation of a position from its target. */
  scatter: number;
  /** Standard uncertainty of the wear of one position. */
  wearUncertainty: number;
  hours: number;
  largestStep: number;
  hardLeast: number;
  hardMost: number;
}
