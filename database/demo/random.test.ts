import { expect, test } from "vitest";
import { Random } from "./random";

// ISO/IEC 14882 (C++), [rand.predef]: "The 10000th consecutive invocation of a default-constructed object of type
// minstd_rand produces the value 399268537"; its generator is this one, its seed 1. Quoted from memory; exact.
test("the ten-thousandth number of the stream is the standard's", () => {
  const random = new Random(1);
  let value = 0;
  for (let draw = 0; draw < 10_000; draw++) value = random.next();
  expect(value).toBe(399_268_537);
});

// Mean 0 and standard deviation 1 by definition of the normal; with 20 000 draws their standard errors are 0.007 and
// 0.005, and four of them are allowed.
test("normal draws have their mean and standard deviation", () => {
  const random = Random.named("a stream");
  const draws = Array.from({ length: 20_000 }, () => random.normal(1));
  const mean = draws.reduce((sum, draw) => sum + draw, 0) / draws.length;
  const variance = draws.reduce((sum, draw) => sum + (draw - mean) ** 2, 0) / (draws.length - 1);
  expect(Math.abs(mean)).toBeLessThan(0.028);
  expect(Math.abs(Math.sqrt(variance) - 1)).toBeLessThan(0.02);
});
