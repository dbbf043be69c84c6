import { meanOfValues, type StudyDeviations, type StudyTable } from "./gauge-study-table";

/**
 * The average-and-range method: standard deviations from ranges and differences of averages, each times a factor for
 * how many values the range is of (AIAG, Measurement Systems Analysis, 4th ed.; K1, K2, K3 there).
 */
export function averageAndRange({ people, parts, trials, values }: StudyTable): StudyDeviations {
  const ranges = values.flat().map(range);
  const repeatability = meanOfValues(ranges) * rangeFactors.ofTrials(trials.length);
  const between =
    people.length > 1
      ? range(values.map((byPart) => meanOfValues(byPart.flat()))) *
        rangeFactors.ofPeopleOrParts(people.length)
      : 0;
  // The averages of people scatter with the gauge's own repeats too: that part is not theirs.
  const reproducibility = Math.sqrt(
    Math.max(0, between ** 2 - repeatability ** 2 / (parts.length * trials.length)),
  );
  const partMeans = parts.map((_, part) => meanOfValues(values.flatMap((byPart) => byPart[part]!)));
  const partToPart = range(partMeans) * rangeFactors.ofPeopleOrParts(parts.length);
  const gauge = Math.hypot(repeatability, reproducibility);
  return { repeatability, reproducibility, gauge, partToPart, total: Math.hypot(gauge, partToPart) };
}

function range(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

// Standard deviation per range of 2, 3, 4 … normal values, to the four decimals that AIAG prints. Where many ranges are
// averaged it is 1/d2 (K1, by trials); for a single range 1/d2*, d2* = √(d2² + d3²) (K2 by people, K3 by parts). Three
// are printed in the worked example; the others follow from the normal distribution, as the test does once more.
const manyRanges = [0.8862, 0.5908, 0.4857, 0.4299, 0.3946, 0.3698, 0.3512, 0.3367, 0.3249];
const oneRange = [
  // biome-ignore lint/suspicious/noApproximativeNumericConstant: the factor of two values as it is printed
  0.7071, 0.5231, 0.4467, 0.403, 0.3742, 0.3534, 0.3375, 0.3249, 0.3146, 0.3059, 0.2985, 0.2921, 0.2864,
  0.2814, 0.277, 0.2729, 0.2692, 0.2659, 0.2628,
];

/** The factors of the average-and-range method for so many trials (2 to 10), people or parts (2 to 20). */
export const rangeFactors = {
  ofTrials: (count: number): number => manyRanges[count - 2]!,
  ofPeopleOrParts: (count: number): number => oneRange[count - 2]!,
};
