// npm start: from a fresh clone to a served product with plain Node. Installs and builds only what is missing or stale.
import { ensureBuilt, ensureInstalled } from "./ready.mjs";

const installation = process.argv.includes("--installation");
if (!installation) process.env.DEMO ??= "1";
process.env.NODE_ENV ??= "production";

ensureInstalled();
ensureBuilt();

try {
  const { serve, demoSignIns, demoPassword } = await import("../build/server/index.js");
  const { server, address } = await serve(new URL("../build/client", import.meta.url).pathname);
  console.log(`Tenthbook is served on ${address}`);
  if (process.env.DEMO === "1") {
    console.log(`\nThe demo's people, all with the password  ${demoPassword}\n`);
    for (const { email, what } of demoSignIns) console.log(`  ${email.padEnd(24)} ${what}`);
  }
  for (const signal of ["SIGINT", "SIGTERM"]) {
    process.on(signal, () => {
      server.close(() => process.exit(0));
      server.closeIdleConnections();
      setTimeout(() => process.exit(0), 3000).unref();
    });
  }
} catch (error) {
  console.error(`Tenthbook cannot start. ${error instanceof Error ? error.message : error}`);
  process.exit(1);
}
