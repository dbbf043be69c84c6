import { allBearings, engineCycle } from "../../app/engineering/cycle/engine-cycle";
import { crankOf, usualLayout } from "../../app/engineering/cycle/engine-layouts";
import { orbit } from "../../app/engineering/cycle/orbit";

/** One measured speed: what was done, the goal of engineering.md and the time it took, s. */
export interface Measurement {
  what: string;
  goal: number;
  seconds: number;
}

const engine = {
  bore: 0.1,
  stroke: 0.09,
  rodLength: 0.15,
  reciprocatingMass: 0.55,
  rotatingMass: 0.4,
  peakPressure: 90e5,
  peakAngle: (14 * Math.PI) / 180,
  speed: 6000 * (Math.PI / 30),
};
const bigEnd = { diameter: 0.05334, length: 0.022, clearance: 63.5e-6 };
const main = { diameter: 0.0622, length: 0.024, clearance: 68.6e-6 };
const viscosity = 0.008;

/** The speed goals of the film over the engine cycle, in 2 s at most. */
export function bench(): Measurement[] {
  const { loads } = engineCycle({ engine, bearing: bigEnd, viscosity });
  const layout = crankOf(usualLayout("V", 8), 5);
  const bigEnds = Array.from({ length: 8 }, (_, index) => ({
    ...bigEnd,
    clearance: bigEnd.clearance + index * 1e-6,
  }));
  const mains = Array.from({ length: 5 }, (_, index) => ({
    ...main,
    clearance: main.clearance + index * 1e-6,
  }));
  return [
    {
      what: "one bearing's orbit to convergence, 720° at 1°",
      goal: 5e-3,
      seconds: typically(() =>
        orbit({ bearing: bigEnd, viscosity, loads, speed: engine.speed, sleeveFixed: true }),
      ),
    },
    {
      what: "all bearings of a V8",
      goal: 60e-3,
      seconds: typically(() => allBearings({ engine, layout, bigEnds, mains, viscosity })),
    },
  ];
}

/** The middle of 15 runs after the compiler has warmed to it, s. */
function typically(work: () => unknown): number {
  for (let round = 0; round < 5; round++) work();
  const times = Array.from({ length: 15 }, () => {
    const start = performance.now();
    work();
    return (performance.now() - start) / 1000;
  });
  return times.sort((a, b) => a - b)[7]!;
}
