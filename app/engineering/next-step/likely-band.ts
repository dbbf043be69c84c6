import type { NextStep } from "./types";

/** The band of the belief that is worth drawing: "7 in 10 that the limit lies here"; undefined where nothing is believed yet. */
export function likelyLimit(answer: NextStep): { share: number; from: number; to: number } | undefined {
  const bands = answer.evidence.posterior?.bands ?? [];
  return bands.find((band) => band.share >= 0.65 && band.share <= 0.75) ?? bands[0];
}
