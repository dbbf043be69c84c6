import type { BuildState, Environment, Role } from "#database/schema";
import type { FitKindName } from "~/engineering/trade/fit-kinds";
import type { Layout } from "~/engineering/trade/layout";
import type { GaugeSet } from "./gauges";
import type { DemoOilName } from "./oils";

/** A fit of the demo as its builder typed it in. */
export interface FitSpec {
  kind: FitKindName;
  nominal: string;
  length: string;
  usual: string;
  least: string;
  most: string;
  tolerance: string;
  limitsSource: string;
  boreMaterial: string;
  journalMaterial: string;
  boreFinish: string;
  journalFinish: string;
  /** The coating that the fit got, and the first build that ran on it. */
  coating?: { kind: "dry-film" | "hard-carbon" | "chromium-nitride"; fromBuild: number };
}

/** A step that the crew chief made larger than was proposed, past the limit that nobody knew. */
export interface StepTooFar {
  afterBuild: number;
  fit: FitKindName;
  /** How many slopes past the critical clearance the target lands. */
  slopesPast: number;
  reason: string;
}

/** Dirt in the oil that marked one position, whatever its clearance. */
export interface Dirt {
  build: number;
  fit: FitKindName;
  position: number;
}

/** An engine of the demo and what happens to it in its season; what comes of it is for the wear model and the core. */
export interface EngineSpec extends Layout {
  name: string;
  bore: string;
  stroke: string;
  rodLength: string;
  revLimitRpm: number;
  duty: string;
  environment: Environment;
  /** How it is run: sprints on a circuit, or long stages in dust. */
  running: "circuit" | "stages";
  gauges: GaugeSet;
  fits: readonly FitSpec[];
  builds: number;
  /** The state of its last build; all before are reviewed. */
  endsAs: Extract<BuildState, "measuring" | "running" | "torn-down">;
  daysBetweenBuilds: number;
  oils: readonly { fromBuild: number; oil: DemoOilName }[];
  /** The roles that are assigned to it. */
  assigned: readonly Extract<Role, "crew-chief" | "viewer">[];
  tooFar?: StepTooFar;
  dirt?: Dirt;
}
