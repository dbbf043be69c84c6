import { nextStep } from "../../../app/engineering/next-step/next-step";
import type { Policy } from "./season";

/**
 * Does what the function proposes. A shop that is told to find a cause or to measure again does so, and builds again
 * to the same target: that rebuild costs what any other does.
 */
export const followingTheNextStep: Policy = (shop, iterations) => {
  const { action, target } = nextStep({ fit: shop.fit, iterations: [...iterations] }, { usual: shop.usual });
  return { target, done: action === "settled" };
};
