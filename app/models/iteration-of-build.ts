import type { Iteration, OilOfRun, PositionOfBuild } from "~/engineering/next-step/types";
import { dynamicViscosity } from "~/engineering/oil/viscosity";
import { metres } from "~/engineering/quantity/length";
import type { Fit } from "./fit.server";
import type { Gauge } from "./gauge.server";
import { type MeasuredPosition, type MeasuredReading, measureFit } from "./measured-fit";

/** A build that was torn down, with what a fit aimed at in it. */
export interface BuildOfHistory {
  number: number;
  createdAt: string;
  aim_pm: number;
  coating: string | null;
}

/** What was seen of one fit in one build; of readings and findings only those that stand. */
export interface EvidenceOfBuild {
  readings: readonly (MeasuredReading & { stage: "assembly" | "teardown" })[];
  findings: readonly FindingOfHistory[];
  /** In the order they were run. */
  runs: readonly RunOfHistory[];
}

interface FindingOfHistory {
  position_id: string;
  grade: number;
  damage: string | null;
  coating_state: string | null;
}

interface RunOfHistory {
  hours: number;
  starts: number | null;
  events_json: string;
  oil_id: string;
  oil_temperature_c: number | null;
  name: string;
  grade: string;
  kv40: number;
  kv100: number;
  density15: number | null;
}

/** One trip round the loop as the next step takes it, for one fit. */
export function iterationOfBuild(
  fit: Fit,
  build: BuildOfHistory,
  { readings, findings, runs }: EvidenceOfBuild,
  gauges: readonly Gauge[],
): Iteration {
  const measuredAt = (stage: "assembly" | "teardown") =>
    measureFit(
      fit,
      readings.filter((reading) => reading.stage === stage),
      gauges,
    );
  const assembled = measuredAt("assembly");
  const tornDown = measuredAt("teardown");
  return {
    build: build.number,
    date: build.createdAt.slice(0, 10),
    target: metres(build.aim_pm),
    hours: runs.length > 0 ? runs.reduce((sum, run) => sum + run.hours, 0) : null,
    starts: runs.reduce((sum, run) => sum + (run.starts ?? 0), 0),
    oil: oilOfRuns(runs),
    events: [...new Set(runs.flatMap((run) => JSON.parse(run.events_json) as string[]))],
    coating: build.coating,
    positions: fit.positions.map((position): PositionOfBuild => {
      const finding = findings.find((row) => row.position_id === position.id);
      const before = assembled.find((row) => row.positionId === position.id);
      const after = tornDown.find((row) => row.positionId === position.id);
      return {
        position: position.number,
        assembled: measured(before),
        tornDown: measured(after),
        uncertainty: before?.uncertainty ?? null,
        temperatureKnown: (before?.temperatureKnown ?? true) && (after?.temperatureKnown ?? true),
        grade: finding?.grade ?? null,
        damage: finding?.damage ?? null,
        coatingState: finding?.coating_state ?? null,
      };
    }),
  };
}

function measured(position: MeasuredPosition | undefined) {
  if (position?.clearance === undefined) return null;
  return {
    clearance: position.clearance,
    ...(position.bore === undefined ? {} : { bore: position.bore }),
    ...(position.journal === undefined ? {} : { journal: position.journal }),
  };
}

/** The oil of a build: the one it ran longest on, at the mean temperature that was seen, weighted by hours. */
function oilOfRuns(runs: readonly RunOfHistory[]): OilOfRun | null {
  const hoursOf = (list: readonly RunOfHistory[]) => list.reduce((sum, run) => sum + run.hours, 0);
  const runsOn = (oilId: string) => runs.filter((run) => run.oil_id === oilId);
  const oil = [...runs].sort((a, b) => hoursOf(runsOn(b.oil_id)) - hoursOf(runsOn(a.oil_id)))[0];
  if (!oil) return null;
  const seen = runsOn(oil.oil_id).filter((run) => run.oil_temperature_c !== null);
  const hours = hoursOf(seen);
  const temperatureC =
    seen.length === 0
      ? null
      : hours > 0
        ? seen.reduce((sum, run) => sum + run.hours * run.oil_temperature_c!, 0) / hours
        : seen[0]!.oil_temperature_c;
  return {
    name: oil.name,
    grade: oil.grade,
    kv40: oil.kv40,
    kv100: oil.kv100,
    temperatureC,
    dynamicViscosity: temperatureC === null ? null : dynamicAt(oil, temperatureC),
  };
}

function dynamicAt({ kv40, kv100, density15 }: RunOfHistory, temperatureC: number): number {
  return dynamicViscosity({ kv40, kv100, density15: density15 ?? undefined }, temperatureC);
}
