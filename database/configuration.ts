import { z } from "zod";

const schema = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(3000),
  HOST: z.string().min(1).default("127.0.0.1"),
  DATA_DIR: z.string().min(1).default("./data"),
  BASE_URL: z.url({ protocol: /^https?$/ }).optional(),
  SESSION_SECRET: z.string().min(32, "must have at least 32 characters").optional(),
  DEMO: z.enum(["0", "1"]).default("0"),
});

/** Everything the program takes from its environment, checked once. Nothing else reads `process.env`. */
export interface Configuration {
  port: number;
  host: string;
  dataDirectory: string;
  /** The address people use, behind a proxy too; decides whether cookies are `Secure`. */
  baseUrl: string | undefined;
  sessionSecret: string;
  demo: boolean;
}

/** Reads and checks an environment; throws one sentence per mistake. */
export function readConfiguration(environment: Record<string, string | undefined>): Configuration {
  const parsed = schema.safeParse(environment);
  if (!parsed.success) {
    const mistakes = parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The configuration is not usable.\n${mistakes.join("\n")}`);
  }
  const values = parsed.data;
  const demo = values.DEMO === "1";
  if (!demo && !values.SESSION_SECRET) {
    throw new Error(
      "SESSION_SECRET is missing: a real installation signs its cookies with a secret of 32 characters or more. (npm start, the demo, needs none.)",
    );
  }
  return {
    port: values.PORT,
    host: values.HOST,
    dataDirectory: values.DATA_DIR,
    baseUrl: values.BASE_URL,
    sessionSecret: values.SESSION_SECRET ?? "demo-only: cookies of invented people in an invented shop",
    demo,
  };
}

let current: Configuration | undefined;

/** The running program's configuration, read on first use. */
export function configuration(): Configuration {
  current ??= readConfiguration(process.env);
  return current;
}
