import { filmMap } from "../../app/engineering/film/film-map";
import { steadyFilm } from "../../app/engineering/film/steady-film";

/** One measured speed: what was done, the goal of engineering.md and the time it took, s. */
export interface Measurement {
  what: string;
  goal: number;
  seconds: number;
}

const bearing = { diameter: 0.05334, length: 0.022, clearance: 63.5e-6 };
const duty = {
  ...bearing,
  speed: 7200 * (Math.PI / 30),
  load: 9000,
  roughness: { bore: 2e-7, journal: 5e-8 },
};
const oil = { kv40: 110, kv100: 16.2, density15: 865, hths: 0.0041 };

/** The speed goals of the steady film. */
export function bench(): Measurement[] {
  return [
    {
      what: "one steady film point with heat balance",
      goal: 0.2e-3,
      seconds: typically(200, () => steadyFilm({ ...duty, oil, supplyTemperatureC: 95 })),
    },
    {
      what: "film map 60 × 40",
      goal: 0.3,
      seconds: typically(1, () =>
        filmMap({
          ...duty,
          clearances: { from: 30e-6, to: 100e-6, count: 60 },
          viscosities: { from: 3e-3, to: 30e-3, count: 40 },
        }),
      ),
    },
  ];
}

/** The middle of 15 runs of so many repeats after the compiler has warmed to it, s a repeat. */
function typically(repeats: number, work: () => unknown): number {
  const run = () => {
    const start = performance.now();
    for (let repeat = 0; repeat < repeats; repeat++) work();
    return (performance.now() - start) / 1000 / repeats;
  };
  for (let round = 0; round < 5; round++) run();
  return Array.from({ length: 15 }, run).sort((a, b) => a - b)[7]!;
}
