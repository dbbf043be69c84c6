import type { Code } from "./words";

/** A thing to say, before it is put into words: its code and its numbers, SI. */
export interface Said {
  code: Code;
  values: Record<string, number | string>;
}

/** What a guard decides, when it decides. */
export interface Verdict {
  action: "open" | "hold" | "measure-again" | "find-cause";
  target: number;
  reason: Said;
}
