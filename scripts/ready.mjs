// What has to stand before anything runs: the packages, and a build that is newer than its sources.
import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";

const root = new URL("..", import.meta.url).pathname;
const note = (name) => join(root, "node_modules", ".tenthbook", name);

/** Runs a command in the project's folder, its output shown. */
export function run(command, args, options = {}) {
  execFileSync(command, args, { cwd: root, stdio: "inherit", ...options });
}

/** Installs the packages where the lock file is not the one that they were installed from. */
export function ensureInstalled() {
  const lock = createHash("sha256")
    .update(readFileSync(join(root, "package-lock.json")))
    .digest("hex");
  if (existsSync(note("installed")) && readFileSync(note("installed"), "utf8") === lock) return;
  console.log("Installing the packages; the first time takes about two minutes.");
  // Development packages too: the build needs them, whatever NODE_ENV says.
  run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund"]);
  remember("installed", lock);
}

/** Builds where a source is not the one that was built. */
export function ensureBuilt() {
  const sources = hashOf(
    ["app", "database", "public"]
      .flatMap((folder) => filesBelow(join(root, folder)))
      .concat(
        ["package-lock.json", "vite.config.ts", "react-router.config.ts"].map((file) => join(root, file)),
      ),
  );
  const built = existsSync(join(root, "build/server/index.js"));
  if (built && existsSync(note("built")) && readFileSync(note("built"), "utf8") === sources) return;
  console.log("Building.");
  run(process.execPath, [join(root, "node_modules/@react-router/dev/bin.js"), "build"], {
    env: { ...process.env, NODE_ENV: "production" },
  });
  remember("built", sources);
}

function filesBelow(folder) {
  return readdirSync(folder, { withFileTypes: true })
    .flatMap((entry) =>
      entry.isDirectory() ? filesBelow(join(folder, entry.name)) : [join(folder, entry.name)],
    )
    .sort();
}

// Size and time of change tell a changed file in a few milliseconds; their content would take a hundred.
function hashOf(files) {
  const hash = createHash("sha256");
  for (const file of files) {
    const { size, mtimeMs } = statSync(file);
    hash.update(`${file}\0${size}\0${mtimeMs}\0`);
  }
  return hash.digest("hex");
}

function remember(name, value) {
  mkdirSync(join(root, "node_modules", ".tenthbook"), { recursive: true });
  writeFileSync(note(name), value);
}
