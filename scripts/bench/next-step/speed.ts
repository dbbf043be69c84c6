import { nextStep } from "../../../app/engineering/next-step/next-step";
import type { Iteration } from "../../../app/engineering/next-step/types";
import { families } from "./family";
import { Shop } from "./shop";

/** The middle time of one proposal for a fit with 50 builds × 8 positions. */
export function bench(): Array<{ what: string; goal: number; seconds: number }> {
  const shop = new Shop(families[0]!, 7);
  const iterations: Iteration[] = [];
  for (let build = 0; build < 50; build++) {
    // Down in half tenths to a clearance that holds: the length that a long-lived fit's history has.
    iterations.push(shop.build(Math.max(shop.best, shop.usual - build * 1.27e-6)).iteration);
  }
  const times = Array.from({ length: 60 }, () => {
    const start = performance.now();
    nextStep({ fit: shop.fit, iterations }, { usual: shop.usual });
    return (performance.now() - start) / 1000;
  }).sort((a, b) => a - b);
  return [{ what: "next step for a fit with 50 builds × 8 positions", goal: 0.005, seconds: times[30]! }];
}
