// npm test: installs what is missing, then every check the project has. The last line says how many passed and failed.
import { execFileSync, spawnSync } from "node:child_process";
import { existsSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ensureBuilt, ensureInstalled } from "./ready.mjs";

const root = new URL("..", import.meta.url).pathname;

ensureInstalled();
ensureChromium();
ensureBuilt();

const checks = [
  check("types of the routes", "react-router", ["typegen"]),
  check("type check", "tsc", []),
  check("lint and format", "biome", ["check", "."]),
  check("arrows between the folders", "depcruise", [
    "app",
    "database",
    "scripts",
    "--config",
    "dependency-cruiser.config.cjs",
  ]),
];
const tests = runTests();

const passed = checks.filter(Boolean).length + tests.passed;
const failed = checks.filter((ok) => !ok).length + tests.failed;
console.log(`\n${passed} passed, ${failed} failed`);
process.exit(failed > 0 || tests.passed === 0 ? 1 : 0);

function check(name, command, args) {
  const { status, stdout, stderr } = spawnSync(join(root, "node_modules/.bin", command), args, {
    cwd: root,
    encoding: "utf8",
    maxBuffer: 64 << 20,
  });
  console.log(`${status === 0 ? "passed" : "FAILED"}  ${name}`);
  if (status !== 0) console.log(stdout, stderr);
  return status === 0;
}

function runTests() {
  const report = join(tmpdir(), `tenthbook-tests-${process.pid}.json`);
  const { status } = spawnSync(
    join(root, "node_modules/.bin/vitest"),
    ["run", "--reporter=default", "--reporter=json", `--outputFile.json=${report}`, ...process.argv.slice(2)],
    { cwd: root, stdio: "inherit" },
  );
  if (!existsSync(report)) return { passed: 0, failed: 1 };
  const { numPassedTests, numFailedTests, numFailedTestSuites, testResults } = JSON.parse(
    readFileSync(report, "utf8"),
  );
  rmSync(report);
  // A file that could not be loaded has no tests to count, but it has failed.
  const unloaded = testResults.filter(
    (file) => file.status === "failed" && file.assertionResults.length === 0,
  ).length;
  const failed = numFailedTests + unloaded;
  const unexplained = status !== 0 && failed === 0 ? Math.max(1, numFailedTestSuites) : 0;
  return { passed: numPassedTests, failed: failed + unexplained };
}

/** The browser tests drive Debian's Chromium; where there is none, the system's package manager brings it. */
function ensureChromium() {
  const found = ["chromium", "chromium-browser", "google-chrome"].some(
    (name) => spawnSync("which", [name]).status === 0,
  );
  if (found) return;
  console.log("Installing Chromium for the browser tests.");
  const sudo = process.getuid?.() === 0 ? [] : ["sudo"];
  const apt = (...args) =>
    execFileSync([...sudo, "apt-get"][0], [...sudo, "apt-get", ...args].slice(1), { stdio: "inherit" });
  apt("update", "-qq");
  apt("install", "-y", "-qq", "--no-install-recommends", "chromium");
}
