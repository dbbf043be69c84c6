import { requireWithin } from "../cycle/sound-input";

/** Finish of the two surfaces, arithmetic mean roughness Ra, m. */
export interface Roughness {
  bore: number;
  journal: number;
}

/** What carries the load: the surfaces, both, or the oil alone. */
export type Regime = "boundary" | "mixed" | "full";

/** Root mean square over arithmetic mean roughness, of heights spread like a bell: √(π/2), exact for such a surface. */
export const rootMeanSquareOverMean = Math.sqrt(Math.PI / 2);

/**
 * Root mean square roughness of both surfaces together, m: √(Rq₁² + Rq₂²), Rq = 1.2533 Ra.
 * Range: Ra 0.1 nm–0.1 mm each.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function combinedRoughness({ bore, journal }: Roughness): number {
  const range = { from: 1e-10, to: 1e-4, unit: "m" };
  requireWithin(bore, "roughness.bore", range);
  requireWithin(journal, "roughness.journal", range);
  return rootMeanSquareOverMean * Math.hypot(bore, journal);
}

/** Film parameter λ: least film over the roughness of both surfaces, m over m (from memory; usual in handbooks). */
export const filmParameter = (leastFilm: number, roughness: Roughness): number =>
  leastFilm / combinedRoughness(roughness);

/** The regime of a film parameter: boundary below 1, mixed to 3, full above. Authors differ on the limits (from memory). */
export function regimeOf(lambda: number): Regime {
  if (lambda < 1) return "boundary";
  return lambda <= 3 ? "mixed" : "full";
}
