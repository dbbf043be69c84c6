import { z } from "zod";
import { readAnything } from "~/models/health.server";
import { endpoint } from "../frame/endpoint";

/** Whether the program and its database answer. */
export const getHealth = endpoint({
  method: "GET",
  path: "/health",
  who: "everyone",
  title: "Whether the program and its database answer",
  answer: z.object({ status: z.literal("ok") }),
  handle: async () => {
    await readAnything();
    return { status: "ok" as const };
  },
});
