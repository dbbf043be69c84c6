import { z } from "zod";

/** Where a build stands in its loop. */
export const buildStates = z
  .enum(["measuring", "assembled", "running", "torn-down", "reviewed"])
  .meta({ id: "BuildState" });
