import type { ColumnType } from "kysely";

/** Set when the row is written and never again. */
type Fixed<T> = ColumnType<T, T, never>;

/** Integer picometres, exact. What was typed stands in the `_typed` column beside it. */
type Picometres = number;

/** UTC, ISO 8601. */
type Instant = string;

/** 0 or 1: the driver refuses booleans. */
type Flag = 0 | 1;

export type Role = "owner" | "builder" | "crew-chief" | "tuner" | "viewer";
export type PageUnits = "inch" | "metric";
export type EngineForm = "inline" | "V" | "flat";
export type Environment = "clean" | "dusty";
export type BuildState = "measuring" | "assembled" | "running" | "torn-down" | "reviewed";
export type Stage = "assembly" | "teardown";
export type Feature = "bore" | "journal";
export type Plane = "front" | "middle" | "rear";
export type Axis = "vertical" | "plus45" | "minus45" | "horizontal" | "a" | "b";
export type ReadingState = "measured" | "not-measured" | "not-accessible" | "withdrawn";
export type MeasuringMethod = "absolute" | "comparative";
export type Decision = "accept" | "change" | "decline";
export type TokenScope = "read" | "write";

export interface ShopTable {
  id: Fixed<string>;
  name: string;
  largest_step_pm: Picometres;
  least_hours: number;
  stop_grade: number;
  baseline_runs: number;
  wear_rate_rise: number;
  created_at: Fixed<Instant>;
  version: number;
}

export interface PersonTable {
  id: Fixed<string>;
  email: string;
  name: string;
  password_hash: string;
  units: PageUnits;
  theme: "system" | "light" | "dark";
  created_at: Fixed<Instant>;
  version: number;
}

export interface MembershipTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  person_id: Fixed<string>;
  role: Role;
  created_at: Fixed<Instant>;
  version: number;
}

export interface SessionTable {
  id: Fixed<string>;
  person_id: string | null;
  shop_id: string | null;
  data_json: string;
  created_at: Fixed<Instant>;
  expires_at: Instant;
}

export interface SignInAttemptTable {
  id: Fixed<string>;
  email: Fixed<string>;
  address: Fixed<string>;
  succeeded: Fixed<Flag>;
  attempted_at: Fixed<Instant>;
}

export interface EngineTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  name: string;
  form: Fixed<EngineForm>;
  cylinders: Fixed<number>;
  mains: Fixed<number>;
  valves_per_cylinder: Fixed<number>;
  bore_pm: Picometres;
  bore_typed: string;
  stroke_pm: Picometres;
  stroke_typed: string;
  rod_length_pm: Picometres;
  rod_length_typed: string;
  rev_limit_rpm: number;
  duty: string;
  environment: Environment;
  created_at: Fixed<Instant>;
  version: number;
}

export interface EngineAssignmentTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  engine_id: Fixed<string>;
  person_id: Fixed<string>;
  created_at: Fixed<Instant>;
}

export interface FitTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  engine_id: Fixed<string>;
  kind: Fixed<string>;
  sort_order: number;
  nominal_pm: Picometres;
  nominal_typed: string;
  length_pm: Picometres | null;
  length_typed: string | null;
  usual_pm: Picometres;
  usual_typed: string;
  least_pm: Picometres;
  least_typed: string;
  most_pm: Picometres;
  most_typed: string;
  limits_source: string;
  tolerance_pm: Picometres;
  tolerance_typed: string;
  bore_material: string;
  journal_material: string;
  bore_finish_pm: Picometres | null;
  bore_finish_typed: string | null;
  journal_finish_pm: Picometres | null;
  journal_finish_typed: string | null;
  coating: string | null;
  coated_since_build: number | null;
  method: MeasuringMethod;
  created_at: Fixed<Instant>;
  version: number;
}

export interface PositionTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  fit_id: Fixed<string>;
  number: Fixed<number>;
  retired_at: Instant | null;
}

export interface BuildTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  engine_id: Fixed<string>;
  number: Fixed<number>;
  state: BuildState;
  oil_id: string | null;
  note: string;
  created_at: Fixed<Instant>;
  created_by: Fixed<string>;
  torn_down_at: Instant | null;
  version: number;
}

export interface TargetTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  build_id: Fixed<string>;
  fit_id: Fixed<string>;
  least_pm: Fixed<Picometres>;
  aim_pm: Fixed<Picometres>;
  most_pm: Fixed<Picometres>;
  coating: Fixed<string | null>;
  sign_off_id: Fixed<string | null>;
  created_at: Fixed<Instant>;
}

export interface ReadingTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  build_id: Fixed<string>;
  fit_id: Fixed<string>;
  position_id: Fixed<string>;
  stage: Fixed<Stage>;
  feature: Fixed<Feature>;
  plane: Fixed<Plane>;
  axis: Fixed<Axis>;
  repeat: Fixed<number>;
  state: Fixed<ReadingState>;
  value_pm: Fixed<Picometres | null>;
  typed: Fixed<string>;
  unit: Fixed<string | null>;
  decimals: Fixed<number | null>;
  reason: Fixed<string | null>;
  temperature_c: Fixed<number | null>;
  gauge_id: Fixed<string | null>;
  warnings_json: Fixed<string>;
  supersedes_id: Fixed<string | null>;
  person_id: Fixed<string>;
  taken_at: Fixed<Instant>;
}

export interface SheetSignatureTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  build_id: Fixed<string>;
  stage: Fixed<Stage>;
  content_hash: Fixed<string>;
  person_id: Fixed<string>;
  signed_at: Fixed<Instant>;
}

export interface GaugeTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  name: string;
  kind: string;
  serial: string;
  resolution_pm: Picometres;
  resolution_typed: string;
  calibration_pm: Picometres;
  calibration_typed: string;
  repeatability_pm: Picometres;
  repeatability_typed: string;
  due_on: string | null;
  created_at: Fixed<Instant>;
  version: number;
}

export interface OilTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  name: string;
  grade: string;
  kv40: number;
  kv100: number;
  density15: number | null;
  hths_pa_s: number | null;
  note: string;
  created_at: Fixed<Instant>;
  version: number;
}

export interface RunTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  build_id: Fixed<string>;
  kind: Fixed<string>;
  started_at: Fixed<Instant>;
  hours: Fixed<number>;
  laps: Fixed<number | null>;
  starts: Fixed<number | null>;
  top_speed_rpm: Fixed<number | null>;
  oil_id: Fixed<string>;
  oil_temperature_c: Fixed<number | null>;
  pressure_idle_pa: Fixed<number | null>;
  pressure_at_speed_pa: Fixed<number | null>;
  pressure_at_speed_rpm: Fixed<number | null>;
  events_json: Fixed<string>;
  note: Fixed<string>;
  person_id: Fixed<string>;
  created_at: Fixed<Instant>;
}

export interface FindingTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  build_id: Fixed<string>;
  fit_id: Fixed<string>;
  position_id: Fixed<string>;
  grade: Fixed<number>;
  damage: Fixed<string | null>;
  place: Fixed<string>;
  area_share: Fixed<number | null>;
  cause: Fixed<string>;
  coating_state: Fixed<string | null>;
  note: Fixed<string>;
  supersedes_id: Fixed<string | null>;
  person_id: Fixed<string>;
  found_at: Fixed<Instant>;
}

export interface ProposalTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  fit_id: Fixed<string>;
  build_id: Fixed<string>;
  action: Fixed<string>;
  subject: Fixed<string>;
  step_pm: Fixed<Picometres>;
  target_pm: Fixed<Picometres>;
  answer_json: Fixed<string>;
  history_json: Fixed<string>;
  history_hash: Fixed<string>;
  person_id: Fixed<string>;
  proposed_at: Fixed<Instant>;
}

export interface SignOffTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  proposal_id: Fixed<string>;
  fit_id: Fixed<string>;
  build_id: Fixed<string>;
  decision: Fixed<Decision>;
  target_pm: Fixed<Picometres>;
  target_typed: Fixed<string>;
  reason: Fixed<string>;
  content_hash: Fixed<string>;
  person_id: Fixed<string>;
  signed_at: Fixed<Instant>;
}

export interface HistoryTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  engine_id: Fixed<string | null>;
  person_id: Fixed<string>;
  subject_kind: Fixed<string>;
  subject_id: Fixed<string>;
  what: Fixed<string>;
  from_json: Fixed<string | null>;
  to_json: Fixed<string | null>;
  happened_at: Fixed<Instant>;
}

export interface TokenTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  person_id: Fixed<string>;
  name: Fixed<string>;
  token_hash: Fixed<string>;
  scope: Fixed<TokenScope>;
  created_at: Fixed<Instant>;
  last_used_at: Instant | null;
  revoked_at: Instant | null;
}

export interface IdempotencyTable {
  id: Fixed<string>;
  shop_id: Fixed<string>;
  person_id: Fixed<string>;
  key: Fixed<string>;
  request_hash: Fixed<string>;
  /** 0 while the request has no answer yet. */
  status: number;
  answer_json: string;
  created_at: Fixed<Instant>;
}

/** Every table by its name. A test compares this with the migrated database. */
export interface Schema {
  shop: ShopTable;
  person: PersonTable;
  membership: MembershipTable;
  session: SessionTable;
  sign_in_attempt: SignInAttemptTable;
  engine: EngineTable;
  engine_assignment: EngineAssignmentTable;
  fit: FitTable;
  position: PositionTable;
  build: BuildTable;
  target: TargetTable;
  reading: ReadingTable;
  sheet_signature: SheetSignatureTable;
  gauge: GaugeTable;
  oil: OilTable;
  run: RunTable;
  finding: FindingTable;
  proposal: ProposalTable;
  sign_off: SignOffTable;
  history: HistoryTable;
  token: TokenTable;
  idempotency: IdempotencyTable;
}
