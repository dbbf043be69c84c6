/** One measured speed: what was done, the goal of engineering.md and the time it took, s. */
export interface Measurement {
  what: string;
  goal: number;
  seconds: number;
}

/** The middle of 15 runs of so many repeats after the compiler has warmed to it, s a repeat. */
export function typically(repeats: number, work: (repeat: number) => unknown): number {
  const run = () => {
    const start = performance.now();
    for (let repeat = 0; repeat < repeats; repeat++) work(repeat);
    return (performance.now() - start) / 1000 / repeats;
  };
  for (let round = 0; round < 5; round++) run();
  return Array.from({ length: 15 }, run).sort((a, b) => a - b)[7]!;
}
