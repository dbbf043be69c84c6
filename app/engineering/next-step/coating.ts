import type { FitOfHistory, Iteration } from "./types";

/** The kind of coating that a build ran on; null for none. */
export function coatingOf({ coating }: Pick<Iteration, "coating">, fit: FitOfHistory): string | null {
  return coating === undefined ? (fit.coating?.kind ?? null) : coating;
}
