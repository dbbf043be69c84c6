import { nextStep } from "../../../app/engineering/next-step/next-step";
import type { Iteration } from "../../../app/engineering/next-step/types";
import { type Measurement, typically } from "../typically";
import { families } from "./family";
import { Shop } from "./shop";

/** The speed goal of the next step, in under a second. */
export function bench(): Measurement[] {
  const shop = new Shop(families[0]!, 7);
  const iterations: Iteration[] = [];
  for (let build = 0; build < 50; build++) {
    // Down in half tenths to a clearance that then holds, as the history of a long-lived fit looks.
    iterations.push(shop.build(Math.max(shop.best, shop.usual - build * 1.27e-6)).iteration);
  }
  const history = { fit: shop.fit, iterations };
  return [
    {
      what: "next step for a fit with 50 builds × 8 positions",
      goal: 0.005,
      seconds: typically(5, () => nextStep(history, { usual: shop.usual })),
    },
  ];
}
