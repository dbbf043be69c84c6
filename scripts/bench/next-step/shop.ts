import type { FitOfHistory, Iteration, PositionOfBuild } from "../../../app/engineering/next-step/types";
import type { Family } from "./family";
import { Random } from "./random";

const micron = 1e-6;
const usualClearance = 63.5;
const hardLeast = 25.4;
const hardMost = 81.28;

/** What one build did in truth, which the shop never learns. */
export interface BuildTruth {
  /** Grade of each position that the clearance brought about, without misgrading and debris. */
  worstGrade: number;
}

/** A simulated shop with a hidden truth. It builds to a target and reports what a real shop would see. */
export class Shop {
  readonly fit: FitOfHistory;
  readonly usual = usualClearance * micron;
  private readonly random: Random;
  private readonly positions: number;
  private readonly slope: number;
  private readonly baseRate: number;
  private readonly critical: number;
  private readonly viscosityShift: number;
  private readonly beddingIn: number;
  private builds = 0;

  constructor(
    private readonly family: Family,
    seed: number,
  ) {
    const random = new Random(seed);
    this.random = random;
    const coated = random.chance(0.6);
    this.positions = random.whole(family.positions);
    this.slope = random.between(family.slope);
    this.baseRate = Math.exp(random.between([Math.log(family.baseRate[0]), Math.log(family.baseRate[1])]));
    this.viscosityShift = random.between(family.viscosityShift);
    const benefit = random.between(family.coatingBenefit);
    this.critical = usualClearance + random.between(family.criticalFromUsual) - (coated ? benefit : 0);
    this.beddingIn = coated ? random.between(family.beddingIn) : 0;
    this.fit = {
      kind: "big-end",
      nominal: 53_340 * micron,
      hardLimits: { least: hardLeast * micron, most: hardMost * micron },
      coating: coated ? { kind: "dry-film", isNew: true } : null,
    };
  }

  /** The best clearance: above the limit by two slopes and 1.6 times the build scatter, not below the hard limit. */
  get best(): number {
    return Math.max(this.critical + 2 * this.slope + 1.6 * this.family.scatter, hardLeast) * micron;
  }

  /** Builds to the target, runs, tears down. */
  build(target: number): { iteration: Iteration; truth: BuildTruth } {
    const { random, family } = this;
    this.builds += 1;
    const hours = Math.round(random.between(family.hours) * 10) / 10;
    const temperatureC = Math.round(105 + random.normal(3));
    // About 2.5 % of viscosity per °C near 105 °C (ASTM D341 for an oil of this grade).
    const viscosityRatio = Math.exp(-0.025 * (temperatureC - 105));
    const critical = this.critical + this.viscosityShift * Math.log(viscosityRatio);
    const dirty = random.chance(family.debris) ? random.whole([1, this.positions]) : 0;
    let worstGrade = 0;
    const positions = Array.from({ length: this.positions }, (_, index): PositionOfBuild => {
      const clearance = target / micron + random.normal(family.scatter);
      const rise = 1 + Math.exp((critical - clearance) / this.slope);
      const grade = gradeOf(rise);
      worstGrade = Math.max(worstGrade, grade);
      const isDirty = index + 1 === dirty;
      const wear =
        this.baseRate * rise * hours +
        (this.builds === 1 ? this.beddingIn * random.between([0.8, 1.2]) : 0) +
        (isDirty ? random.between([1, 8]) : 0);
      return {
        position: index + 1,
        assembled: { clearance: this.read(clearance) },
        tornDown: { clearance: this.read(clearance + wear) },
        uncertainty: 2 * Math.SQRT2 * family.gauge * micron,
        grade: this.graded(isDirty ? Math.max(grade, random.whole([2, 4])) : grade),
        damage: isDirty ? random.pick(["embedded-particles", "scoring"]) : damageOf(grade),
        coatingState: this.fit.coating
          ? grade >= 4
            ? "worn-through"
            : grade >= 2
              ? "polished"
              : "intact"
          : null,
      };
    });
    const dips = random.chance(0.02 + Math.max(0, (target / micron - this.best / micron) / 200));
    const iteration: Iteration = {
      build: this.builds,
      target,
      hours,
      oil: { name: "Oil A", grade: "50", kv40: 120, kv100: 16.5, temperatureC },
      events: [...(dips ? ["pressure-dip"] : []), ...(dirty && random.chance(0.5) ? ["debris"] : [])],
      positions,
    };
    return { iteration, truth: { worstGrade } };
  }

  /** A clearance as read and typed, m. */
  private read(clearance: number): number {
    const { random, family } = this;
    const read = clearance + random.normal(Math.SQRT2 * family.gauge);
    // To the hundredth of a thou, as the dial of a bore gauge is read.
    const rounded = Math.round(read / 0.254) * 0.254;
    return rounded * micron * (random.chance(family.mistyped) ? random.pick([10, 0.1, 25.4, 1 / 25.4]) : 1);
  }

  private graded(grade: number): number {
    const { random, family } = this;
    if (!random.chance(family.misgraded)) return grade;
    return Math.min(4, Math.max(0, grade + random.pick([-1, 1])));
  }
}

function gradeOf(rise: number): number {
  if (rise < 1.5) return 1;
  if (rise < 3) return 2;
  return rise < 8 ? 3 : 4;
}

function damageOf(grade: number): string | null {
  if (grade >= 4) return "wiping";
  if (grade === 3) return "wear-by-friction";
  return grade === 2 ? "polishing" : null;
}
