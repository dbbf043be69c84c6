import type { damageTerms, runEvents } from "../trade/condition";

/** Units of the sentences; the numbers beside them stay SI. */
export type Units = "inch" | "metric";

/** What is known of one fit of one engine, oldest build first. Lengths in m, diametral, at 20 °C. */
export interface History {
  fit: FitOfHistory;
  iterations: Iteration[];
  /** Film predicted at several clearances for this fit's duty and present oil, in any order. */
  film?: FilmPoint[];
}

export interface FitOfHistory {
  /** A fit kind by name: `big-end`, `intake-stem` … */
  kind: string;
  nominal: number;
  /** How many places the fit has; not given, the most that any build measured. */
  positions?: number;
  /** Never left, whatever the evidence says. */
  hardLimits?: { least: number; most: number };
  /** `isNew`: the first of the given builds is the first run on this coating. */
  coating?: { kind: string; isNew: boolean } | null;
  /** Arithmetic mean roughness Ra of both faces, m. */
  finishes?: { bore?: number; journal?: number };
  /** How the clearance changes from 20 °C to running hot and to a cold start, signed, m. */
  temperatureChange?: { hot: number; cold: number };
}

/** One trip round the loop: built, run, torn down. */
export interface Iteration {
  build: number;
  /** Day of assembly, ISO 8601, where known. */
  date?: string;
  target: number;
  /** Hours run between assembly and teardown; null where nobody wrote them down. */
  hours: number | null;
  starts?: number;
  oil: OilOfRun | null;
  events: readonly (RunEvent | (string & {}))[];
  /** The kind of coating that this build ran on, null for none; not given, the fit's present one. */
  coating?: string | null;
  positions: PositionOfBuild[];
}

export type RunEvent = (typeof runEvents)[number];
export type Damage = (typeof damageTerms)[number];

export interface OilOfRun {
  name: string;
  grade?: string | null;
  /** Kinematic viscosity at 40 and 100 °C, mm²/s. */
  kv40?: number | null;
  kv100?: number | null;
  /** Oil temperature seen in the run, °C. */
  temperatureC?: number | null;
  /** At that temperature, Pa·s. */
  dynamicViscosity?: number | null;
}

export interface PositionOfBuild {
  position: number;
  assembled: MeasuredFit | null;
  tornDown: MeasuredFit | null;
  /** Expanded (about 95 %) uncertainty of one clearance, m. */
  uncertainty?: number | null;
  /** False where nobody knows how warm the parts were when measured. */
  temperatureKnown?: boolean;
  /** Condition grade 0–4; null where nobody graded it. */
  grade: number | null;
  /** A damage term of ISO 7146-1 in kebab case. */
  damage: Damage | (string & {}) | null;
  /** One of the coating states: `intact`, `polished`, `worn-at-edge`, `worn-through`, `flaking`. */
  coatingState?: string | null;
}

/** Clearance, and where they were measured apart the bore and the journal, m. */
export interface MeasuredFit {
  clearance: number;
  bore?: number;
  journal?: number;
}

export interface FilmPoint {
  clearance: number;
  /** Least film over the cycle or at the working point, m. */
  leastFilm?: number;
  /** Least film over combined Rq. */
  lambda: number;
}

/** The shop's rules; each one not given takes the default in `rules.ts`. */
export interface Rules {
  /** The clearance that the shop starts this fit with, m; not given, the first build's target. */
  usual?: number;
  /** The largest change of target in one build towards closing, m. */
  largestStep?: number;
  /** Fewer hours than these say nothing about a clearance. */
  leastHours?: number;
  /** A clearance-related grade at or over this opens the fit. */
  stopGrade?: number;
  /** A wear rate this many times the engine's own baseline opens the fit, where it is also significant. */
  wearRateRise?: number;
  /** Least film over combined Rq that a target may be predicted to have. */
  lambdaFloor?: number;
  /** Clean builds at the usual clearance before the first step on a new coating. */
  baselineRuns?: number;
  /** Whether oil and clearance may change in the same build. */
  moveOilAndClearance?: boolean;
}

export type Action = "close" | "hold" | "open" | "settled" | "measure-again" | "find-cause";

/** A sentence with the code and the numbers (SI) it was made from. */
export interface Statement {
  code: string;
  text: string;
  values: Record<string, number | string>;
}

export interface NextStep {
  action: Action;
  /** What the next change is about. `settled` about `oil` says: this clearance is done, the oil may be next. */
  subject: "clearance" | "oil";
  /** Signed change of target, m; negative closes. */
  step: number;
  /** What the next build aims at, m. */
  target: number;
  /**
   * 0 to 1, by the model: that the target brings no distress (close), that the fit wants to be wider (open), that it
   * lies within a tenth of the best (hold, settled). 0 where the data do not allow a judgement.
   */
  confidence: number;
  reasons: Statement[];
  cautions: Statement[];
  /** What would change this answer. */
  wouldChange: string[];
  /** What the program cannot see. */
  cannotSee: string[];
  evidence: Evidence;
}

export interface Evidence {
  /** Every build, in order, and what it counted for. */
  builds: BuildEvidence[];
  /** Expanded uncertainty of one clearance that was reckoned with, m. */
  uncertainty: number;
  /** How far positions lie from their target, 1 standard deviation, m. */
  buildScatter: number;
  /** The closest target that came down clean, and the widest that did not, on the present oil; m. */
  knownGood: number | null;
  knownBad: number | null;
  /** Steady wear rate of the clean builds at and near the usual clearance, m/h. */
  baselineRate: number | null;
  /** Where the limit probably lies; null where no build could be counted. */
  posterior: Posterior | null;
  /** What each target that was considered is expected to cost, in the cost of one rebuild. */
  considered: { target: number; expectedCost: number; chanceOfDistress: number }[];
}

export interface BuildEvidence {
  build: number;
  /** Mean of the usable positions as assembled, m. */
  clearance: number | null;
  worstGrade: number | null;
  /** Mean over the usable positions, m/h, with its standard uncertainty. */
  wearRate: number | null;
  wearRateUncertainty: number | null;
  /** 0 to 1: what share of its evidence was counted. */
  weight: number;
  /** Why it counted less or not at all. */
  why: string | null;
}

/** The belief about the hidden critical clearance on the present oil. */
export interface Posterior {
  median: number;
  /** Central bands of the limit, narrowest first: "7 in 10 that it lies between". */
  bands: { share: number; from: number; to: number }[];
  /** Evenly spaced; density in 1/m, area 1. */
  density: { clearance: number; density: number }[];
  /** How soon wear rises below the limit: the clearance over which its excess grows e-fold, m. */
  slope: number;
  /** Steady wear rate far above the limit, m/h; null where no wear could be counted. */
  baseRate: number | null;
  /** The clearance that the evidence makes best: above the limit by twice the slope and the build scatter, m. */
  best: number;
}
