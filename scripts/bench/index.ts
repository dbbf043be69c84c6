// npm run bench [-- --json] [-- next-step]: measures the core on this machine and prints each goal beside its figure.
import { bench as clearance } from "./clearance";
import { bench as cycle } from "./cycle";
import { bench as film } from "./film";
import { bench as nextStep } from "./next-step/speed";
import { bench as quantity } from "./quantity";

/** One thing that was timed, in seconds. */
interface Timed {
  what: string;
  goal: number;
  seconds: number;
}

const [subject] = process.argv.slice(2).filter((argument) => !argument.startsWith("--"));
const asJson = process.argv.includes("--json");

if (subject === "next-step") {
  await import("./next-step/index");
} else {
  report([...quantity(), ...clearance(), ...film(), ...cycle(), ...nextStep()]);
}

function report(timed: Timed[]): void {
  if (asJson) {
    console.log(JSON.stringify(timed, null, 2));
    return;
  }
  const duration = (seconds: number) =>
    seconds < 1e-3 ? `${(seconds * 1e6).toFixed(1)} µs` : `${(seconds * 1e3).toFixed(2)} ms`;
  for (const { what, goal, seconds } of timed) {
    const verdict = seconds <= goal ? "met" : "MISSED";
    console.log(
      `${verdict.padEnd(7)} ${duration(seconds).padStart(10)}  goal ${duration(goal).padStart(10)}  ${what}`,
    );
  }
}
