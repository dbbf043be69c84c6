import type { Selectable } from "kysely";
import type { BuildState, FitTable, Role } from "#database/schema";
import type { Iteration } from "~/engineering/next-step/types";
import type { FitKind } from "~/engineering/trade/fit-kinds";
import { moveInWords } from "~/models/build.server";
import type { Fit } from "~/models/fit.server";
import type { Gauge } from "~/models/gauge.server";
import type { ShopRules } from "~/models/shop.server";
import type { Calendar } from "./calendar";
import type { EngineSpec, FitSpec } from "./engine-spec";
import type { DemoGauge } from "./gauges";
import type { DemoOilName } from "./oils";
import type { Part } from "./parts";
import type { Random } from "./random";
import type { Rows } from "./rows";
import type { Truth } from "./wear-model";

/** A shop of the demo once it is set up. */
export interface DemoShop {
  id: string;
  rules: ShopRules;
  /** Whoever has the role; the owner where nobody has. */
  personOf: (role: Role) => string;
  gauges: (DemoGauge & { row: Gauge })[];
  oilIds: Map<DemoOilName, string>;
}

/** A fit in the course of its season. */
export interface DemoFit {
  spec: FitSpec;
  /** Its row as it stands: a coating changes it. */
  row: Selectable<FitTable>;
  kind: FitKind;
  positions: Fit["positions"];
  truth: Truth;
  /** Its own stream, so that another fit's draws move nothing here. */
  random: Random;
  /** The parts in the engine, a position each. Journals stay from build to build, bores are chosen for each. */
  journals: Part[];
  bores: Part[];
  /** What the next build aims at. */
  aim: { pm: number; signOffId: string | null };
  /** Every build so far, as the next step sees it. */
  iterations: Iteration[];
}

/** An engine on the bench, with all that its season is written to. */
export interface Bench {
  rows: Rows;
  calendar: Calendar;
  shop: DemoShop;
  spec: EngineSpec;
  engineId: string;
  fits: DemoFit[];
  /** For what concerns the whole engine: its runs. */
  random: Random;
  /** Who signs its next steps. */
  signer: string;
}

/** A build in the course of its iteration. */
export interface DemoBuild {
  id: string;
  number: number;
  createdAt: string;
  /** The day it was started, in days before today. */
  daysAgo: number;
  oil: DemoOilName;
}

/** A fit as the models know it. */
export function fitOf({ row, positions }: DemoFit): Fit {
  return { ...row, positions };
}

/** Whether a build of a fit runs on its coating. */
export function isCoated({ spec }: DemoFit, build: Pick<DemoBuild, "number">): boolean {
  return spec.coating !== undefined && build.number >= spec.coating.fromBuild;
}

/** Writes a change into the history, as the models do; readings and findings keep their own person and time. */
export function noteHistory(
  { rows, shop, engineId }: Pick<Bench, "rows" | "shop" | "engineId">,
  at: Date,
  personId: string,
  change: { subjectKind: string; subjectId: string; what: string; from?: unknown; to?: unknown },
): void {
  const json = (value: unknown) => (value === undefined ? null : JSON.stringify(value));
  rows.add("history", {
    id: rows.idAt(at),
    shop_id: shop.id,
    engine_id: engineId,
    person_id: personId,
    subject_kind: change.subjectKind,
    subject_id: change.subjectId,
    what: change.what,
    from_json: json(change.from),
    to_json: json(change.to),
    happened_at: at.toISOString(),
  });
}

/** Writes into the history that a build has gone a step further. */
export function noteMove(
  bench: Bench,
  at: Date,
  personId: string,
  build: Pick<DemoBuild, "id" | "number">,
  [from, to]: readonly [BuildState, BuildState],
): void {
  const what = moveInWords(build.number, to);
  noteHistory(bench, at, personId, { subjectKind: "build", subjectId: build.id, what, from, to });
}
