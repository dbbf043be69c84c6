/** Where a clearance lies against a build's target window and the fit's hard limits. */
export type WindowPlace = "inside" | "under" | "over" | "under-limit" | "over-limit";

/** The target of a fit in a build, m. */
export interface TargetWindow {
  least: number;
  aim: number;
  most: number;
}

// A picometre is finer than anything measured: what differs by less is the same length after a sum of floats.
const same = 1e-12;

/** Where a clearance lies, m. The limits themselves are still inside. */
export function againstWindow(
  clearance: number,
  window: TargetWindow,
  limits: { least: number; most: number },
): WindowPlace {
  if (clearance < limits.least - same) return "under-limit";
  if (clearance > limits.most + same) return "over-limit";
  if (clearance < window.least - same) return "under";
  return clearance > window.most + same ? "over" : "inside";
}
