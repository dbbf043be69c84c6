import { type Family, families, widerFamily } from "./family";
import { followingTheNextStep } from "./next-step-policy";
import { fixedSteps, halving, knowingTheTruth, neverStepping } from "./plain-policies";
import { type Policy, playSeason, type Season } from "./season";
import { Shop } from "./shop";

/** Seeds that constants were set on, and seeds that nothing was ever set on. */
export const seeds = { tuning: 1_000, untouched: 500_000 } as const;

export type SeedSet = keyof typeof seeds;

/** One policy on one family of shops: means over the shops, shares from 0 to 1. */
export interface PolicyRow {
  family: string;
  policy: string;
  shops: number;
  /** Share of shops with any grade 4, and with any but in the first build, whose clearance no policy chose. */
  grade4: number;
  grade4Chosen: number;
  /** Builds with grade 3 as the worst. */
  grade3: number;
  rebuilds: number;
  /** From the best clearance at the end, in tenths. */
  tenthsFromBest: number;
  cost: number;
  /** Cost over that of the better plain policy. */
  costShare: number;
}

const policies: Record<string, Policy> = {
  "fixed steps": fixedSteps,
  halving,
  "next step": followingTheNextStep,
  "never stepping": neverStepping,
  "knowing the truth": knowingTheTruth,
};

const plain = ["fixed steps", "halving"];

const tenth = 2.54e-6;

/** Plays every policy on every family. Deterministic: the same seeds give the same table. */
export function benchNextStep(seedSet: SeedSet = "untouched", shops = 500): PolicyRow[] {
  return [...families, widerFamily].flatMap((family) => {
    const rows = Object.entries(policies).map(([name, policy]) =>
      rowOf(family, name, playAll(family, policy, seeds[seedSet], shops)),
    );
    const better = Math.min(...rows.filter(({ policy }) => plain.includes(policy)).map(({ cost }) => cost));
    return rows.map((row) => ({ ...row, costShare: row.cost / better }));
  });
}

function playAll(family: Family, policy: Policy, firstSeed: number, shops: number): Season[] {
  return Array.from({ length: shops }, (_, index) => playSeason(new Shop(family, firstSeed + index), policy));
}

function rowOf(family: Family, policy: string, seasons: readonly Season[]): Omit<PolicyRow, "costShare"> {
  const mean = (of: (season: Season) => number) =>
    seasons.reduce((sum, season) => sum + of(season), 0) / seasons.length;
  return {
    family: family.name,
    policy,
    shops: seasons.length,
    grade4: mean(({ grade4 }) => (grade4 > 0 ? 1 : 0)),
    grade4Chosen: mean(({ grade4Chosen }) => (grade4Chosen > 0 ? 1 : 0)),
    grade3: mean(({ grade3 }) => grade3),
    rebuilds: mean(({ rebuilds }) => rebuilds),
    tenthsFromBest: mean(({ distance }) => distance / tenth),
    cost: mean(({ cost }) => cost),
  };
}
