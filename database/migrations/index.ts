import type { Migration } from "kysely";
import { theLoop } from "./0001-the-loop";

/** Every migration in order. They only go forwards, and one that has landed is never changed. */
export const migrations: Record<string, Migration> = {
  "0001-the-loop": theLoop,
};
