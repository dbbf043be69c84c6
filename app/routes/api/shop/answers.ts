import { z } from "zod";

/** What every stored object has: its id, and the version that an update names. */
export const stored = { id: z.string(), version: z.int() };

/** Text that a person reads again: one line, no control characters. */
export const line = (most = 120) =>
  z
    .string()
    .trim()
    .max(most)
    .regex(/^\P{Cc}*$/u, "This must not have line breaks or control characters.");

/** A line that must say something. */
export const name = line().min(1);

/** A remark, of several lines if need be. */
export const remark = z
  .string()
  .trim()
  .max(2000)
  .regex(/^[\P{Cc}\n\t]*$/u, "This must not have control characters.")
  .default("");
