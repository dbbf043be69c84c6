/** Limits of a winter grade that KV100 can show. */
export interface WinterGrade {
  grade: string;
  /** mm²/s. */
  leastKv100: number;
}

/** Limits of a summer grade. */
export interface SummerGrade {
  grade: string;
  /** KV100 from and below, mm²/s. */
  leastKv100: number;
  belowKv100: number;
  /** Least viscosity at 150 °C and 10⁶ /s, Pa·s; for a 40 it depends on the winter grade beside it, "" for none. */
  leastHths: (winter: string) => number;
}

// Both lists: SAE J300 of January 2015, read in secondary pages; grades as in the 2021 edition.

export const winterGrades: readonly WinterGrade[] = [
  { grade: "0W", leastKv100: 3.8 },
  { grade: "5W", leastKv100: 3.8 },
  { grade: "10W", leastKv100: 4.1 },
  { grade: "15W", leastKv100: 5.6 },
  { grade: "20W", leastKv100: 5.6 },
  { grade: "25W", leastKv100: 9.3 },
];

const always = (pascalSeconds: number) => () => pascalSeconds;
const thinWinterGrades = ["0W", "5W", "10W"];

export const summerGrades: readonly SummerGrade[] = [
  { grade: "8", leastKv100: 4, belowKv100: 6.1, leastHths: always(1.7e-3) },
  { grade: "12", leastKv100: 5, belowKv100: 7.1, leastHths: always(2e-3) },
  { grade: "16", leastKv100: 6.1, belowKv100: 8.2, leastHths: always(2.3e-3) },
  { grade: "20", leastKv100: 6.9, belowKv100: 9.3, leastHths: always(2.6e-3) },
  { grade: "30", leastKv100: 9.3, belowKv100: 12.5, leastHths: always(2.9e-3) },
  {
    grade: "40",
    leastKv100: 12.5,
    belowKv100: 16.3,
    leastHths: (winter) => (thinWinterGrades.includes(winter) ? 3.5e-3 : 3.7e-3),
  },
  { grade: "50", leastKv100: 16.3, belowKv100: 21.9, leastHths: always(3.7e-3) },
  { grade: "60", leastKv100: 21.9, belowKv100: 26.1, leastHths: always(3.7e-3) },
];

/** Whether a figure reaches a limit, forgiving what unit conversion does to its last bits. */
export const hasEnough = (value: number, limit: number): boolean => value >= limit * (1 - 1e-9);
