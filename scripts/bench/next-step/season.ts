import type { Iteration } from "../../../app/engineering/next-step/types";
import type { Shop } from "./shop";

/** What a policy says after a teardown: build again to a target, or stop and stay at it. */
export interface Decision {
  target: number;
  done: boolean;
}

/** Decides on the season so far; called first with no iteration. */
export type Policy = (shop: Shop, iterations: readonly Iteration[]) => Decision;

export interface Season {
  rebuilds: number;
  grade3: number;
  grade4: number;
  /** Grade 4 in any build but the first, whose clearance no policy chose. */
  grade4Chosen: number;
  /** From the best, m. */
  distance: number;
  cost: number;
}

const mostRebuilds = 12;
const tenth = 2.54e-6;

/** Plays one season. Cost: a rebuild 1, a build with grade 3 10, with grade 4 50, each tenth from the best at the end 5. */
export function playSeason(shop: Shop, policy: Policy): Season {
  const iterations: Iteration[] = [];
  let decision = policy(shop, iterations);
  let grade3 = 0;
  let grade4 = 0;
  let grade4Chosen = 0;
  let built = decision.target;
  while (!decision.done && iterations.length < mostRebuilds) {
    built = decision.target;
    const { iteration, truth } = shop.build(built);
    iterations.push(iteration);
    if (truth.worstGrade === 3) grade3 += 1;
    if (truth.worstGrade === 4) {
      grade4 += 1;
      if (iterations.length > 1) grade4Chosen += 1;
    }
    decision = policy(shop, iterations);
  }
  const end = decision.done ? decision.target : built;
  const distance = Math.abs(end - shop.best);
  const rebuilds = iterations.length;
  const cost = rebuilds + 10 * grade3 + 50 * grade4 + 5 * (distance / tenth);
  return { rebuilds, grade3, grade4, grade4Chosen, distance, cost };
}
