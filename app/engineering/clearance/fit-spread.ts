/** How even the positions of one fit are, m. */
export interface FitSpread {
  /** Loosest less tightest. */
  spread: number;
  mean: number;
  tightest: { position: number; clearance: number };
  loosest: { position: number; clearance: number };
}

/** The spread of a fit's clearances over its positions; `undefined` for fewer than two that are measured. */
export function fitSpread(
  positions: readonly { position: number; clearance: number | undefined }[],
): FitSpread | undefined {
  const measured = positions.flatMap(({ position, clearance }) =>
    clearance === undefined ? [] : [{ position, clearance }],
  );
  if (measured.length < 2) return undefined;
  const tightest = measured.reduce((least, one) => (one.clearance < least.clearance ? one : least));
  const loosest = measured.reduce((most, one) => (one.clearance > most.clearance ? one : most));
  return {
    spread: loosest.clearance - tightest.clearance,
    mean: measured.reduce((sum, { clearance }) => sum + clearance, 0) / measured.length,
    tightest,
    loosest,
  };
}
