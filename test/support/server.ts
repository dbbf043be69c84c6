import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** A running product of its own: its address, its data, and how to end it. */
export interface RunningServer {
  address: string;
  dataDirectory: string;
  process: ChildProcess;
  stop: () => Promise<void>;
}

/** Starts the built product as `npm start` does, on a free port, with a data directory that goes with it. */
export async function startServer(environment: Record<string, string> = {}): Promise<RunningServer> {
  const dataDirectory = environment.DATA_DIR ?? mkdtempSync(join(tmpdir(), "tenthbook-"));
  const child = spawn(process.execPath, ["scripts/start.mjs"], {
    // The test runner has variables of its own, a BASE_URL among them; the product gets only what is meant for it.
    env: {
      PATH: process.env.PATH,
      HOME: process.env.HOME,
      NODE_ENV: "production",
      PORT: "0",
      DEMO: "1",
      DATA_DIR: dataDirectory,
      ...environment,
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let output = "";
  const address = await new Promise<string>((resolve, reject) => {
    const read = (chunk: Buffer) => {
      output += chunk;
      const served = /served on (http:\S+)/.exec(output);
      if (served?.[1]) resolve(served[1]);
    };
    child.stdout?.on("data", read);
    child.stderr?.on("data", read);
    child.once("exit", (code) => reject(new Error(`the server ended with ${code}:\n${output}`)));
  });
  const stop = async () => {
    if (child.exitCode === null && child.signalCode === null) {
      const ended = new Promise((resolve) => child.once("exit", resolve));
      child.kill("SIGTERM");
      await ended;
    }
    if (!environment.DATA_DIR) rmSync(dataDirectory, { recursive: true, force: true });
  };
  return { address, dataDirectory, process: child, stop };
}
