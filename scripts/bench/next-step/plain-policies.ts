import type { Iteration } from "../../../app/engineering/next-step/types";
import type { Policy } from "./season";

const fixedStep = 5.08e-6;

/** A plain shop leaves a position with debris damage out: the builder sees that it is not the clearance. */
function worstGrade({ positions }: Iteration): number {
  return Math.max(
    ...positions
      .filter(({ damage }) => damage !== "embedded-particles" && damage !== "scoring")
      .map(({ grade }) => grade ?? 0),
  );
}

/** Closes 0.0002 in after every clean teardown; at the first grade 3 goes back one step and stops. */
export const fixedSteps: Policy = (shop, iterations) => {
  const last = iterations.at(-1);
  if (!last) return { target: shop.usual, done: false };
  if (worstGrade(last) >= 3) return { target: last.target + fixedStep, done: true };
  const target = last.target - fixedStep;
  return target < shop.fit.hardLimits!.least ? { target: last.target, done: true } : { target, done: false };
};

/** Bisects between the usual and the least clearance: up on grade 2 or worse, down on better, until within half a step. */
export const halving: Policy = (shop, iterations) => {
  let low = shop.fit.hardLimits!.least;
  let high = shop.usual;
  for (const iteration of iterations) {
    if (worstGrade(iteration) >= 2) low = Math.max(low, iteration.target);
    else high = Math.min(high, iteration.target);
  }
  if (iterations.length === 0) return { target: shop.usual, done: false };
  if (low >= high || high - low < fixedStep / 2) return { target: Math.max(low, high), done: true };
  return { target: (low + high) / 2, done: false };
};

/** Never steps at all: what timidity costs. */
export const neverStepping: Policy = (shop, iterations) => ({
  target: shop.usual,
  done: iterations.length > 0,
});

/** Knows the truth, and closes by no more than a shop's step: the least that any policy could pay. */
export const knowingTheTruth: Policy = (shop, iterations) => {
  const last = iterations.at(-1);
  if (!last) return { target: shop.usual, done: false };
  const target = Math.max(last.target - fixedStep, shop.best);
  return Math.abs(last.target - shop.best) < 1e-9
    ? { target: shop.best, done: true }
    : { target, done: false };
};
