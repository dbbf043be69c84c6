import type { Said } from "./words";

/** What a guard decides, when it decides. */
export interface Verdict {
  action: "open" | "hold" | "measure-again" | "find-cause";
  target: number;
  reason: Said;
}
