import { z } from "zod";

/** When a part was measured: before it ran, or after. */
export const stages = z.enum(["assembly", "teardown"]);

/** Where on a position a reading was taken. */
export const box = {
  feature: z.enum(["bore", "journal"]),
  plane: z.enum(["front", "middle", "rear"]),
  axis: z.enum(["vertical", "plus45", "minus45", "horizontal", "a", "b"]),
};

/** What looks like a slip; it is kept with the reading. */
export const warning = z.object({ code: z.string(), message: z.string() });
