// npm run dev: the demo with hot reload.
import { ensureInstalled, run } from "./ready.mjs";

process.env.DEMO ??= "1";
ensureInstalled();
run("node_modules/.bin/tsx", ["scripts/prepare.ts"]);
run(process.execPath, ["node_modules/@react-router/dev/bin.js", "dev", "--port", process.env.PORT ?? "3000"]);
