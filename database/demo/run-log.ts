import type { Insertable } from "kysely";
import { instant } from "#database/id";
import type { RunTable } from "#database/schema";
import { dynamicViscosity } from "~/engineering/oil/viscosity";
import { metres } from "~/engineering/quantity/length";
import { toCore } from "~/engineering/quantity/units";
import type { runEvents, runKinds } from "~/engineering/trade/condition";
import { type Bench, type DemoBuild, noteHistory, noteMove } from "./bench";
import { demoOil } from "./oils";

interface PlannedRun {
  kind: (typeof runKinds)[number];
  hours: readonly [number, number];
  /** Days after the build was started. */
  day: number;
  lapMinutes?: number;
}

const firstRunDay = 2;

// No source: what such engines are run for between two teardowns.
const plans: Record<Bench["spec"]["running"], readonly PlannedRun[]> = {
  circuit: [
    { kind: "dyno", hours: [0.8, 1.2], day: firstRunDay },
    { kind: "practice", hours: [1, 1.6], day: 5, lapMinutes: 1.7 },
    { kind: "qualifying", hours: [0.4, 0.6], day: 6, lapMinutes: 1.6 },
    { kind: "race", hours: [1.4, 2.2], day: 7, lapMinutes: 1.7 },
    { kind: "race", hours: [1.4, 2.2], day: 12, lapMinutes: 1.7 },
  ],
  stages: [
    { kind: "dyno", hours: [0.8, 1.2], day: firstRunDay },
    { kind: "test", hours: [1, 2], day: 6 },
    { kind: "race", hours: [3.2, 4.8], day: 9, lapMinutes: 38 },
  ],
};

/** The last day on which a build runs, counted from its start. */
export const lastRunDay = 12;

/** A run as histories need it: its row and its oil. */
export type DemoRun = ReturnType<typeof logRun>;

/** Logs the runs of a build up to a day after its start, and gives them. */
export function runBuild(bench: Bench, build: DemoBuild, upToDay = lastRunDay): DemoRun[] {
  const firstAt = bench.calendar.at(build.daysAgo - firstRunDay, 13);
  noteMove(bench, firstAt, bench.shop.personOf("tuner"), build, ["assembled", "running"]);
  return plans[bench.spec.running]
    .filter((plan) => plan.day <= upToDay)
    .map((plan) => logRun(bench, build, plan));
}

function logRun(bench: Bench, build: DemoBuild, plan: PlannedRun) {
  const { rows, calendar, shop, spec, random } = bench;
  const at = calendar.at(build.daysAgo - plan.day, 13);
  const hours = Math.round(10 * random.between(plan.hours)) / 10;
  const topSpeed = spec.revLimitRpm - 50 * random.whole([1, 6]);
  const { clearance, usual } = crankClearance(bench);
  // A closer bearing shears its oil harder; a few degrees over the range of a season (no source).
  const oilTemperatureC = Math.round(
    100 + 9 * (usual / clearance - 1) + random.normal(1.2) + (plan.kind === "dyno" ? 0 : 3),
  );
  const viscosity = dynamicViscosity(demoOil(build.oil), oilTemperatureC);
  const pressure = (rpm: number) => readPressure(bench, oilPressure(rpm, viscosity, clearance));
  const seen = eventOf(bench, build, plan, clearance / usual);
  const row = {
    id: rows.idAt(at),
    shop_id: shop.id,
    build_id: build.id,
    kind: plan.kind,
    started_at: instant(at),
    hours,
    laps: plan.lapMinutes === undefined ? null : Math.round((hours * 60) / plan.lapMinutes),
    starts: random.whole([1, 4]),
    top_speed_rpm: topSpeed,
    oil_id: shop.oilIds.get(build.oil)!,
    oil_temperature_c: oilTemperatureC,
    pressure_idle_pa: pressure(950),
    pressure_at_speed_pa: pressure(topSpeed),
    pressure_at_speed_rpm: topSpeed,
    events_json: JSON.stringify(seen ? [seen.event] : []),
    note: seen?.note ?? "",
    person_id: shop.personOf("tuner"),
    created_at: instant(at),
  } satisfies Insertable<RunTable>;
  rows.add("run", row);
  noteHistory(bench, at, row.person_id, {
    subjectKind: "run",
    subjectId: row.id,
    what: `logged a ${row.kind} run of ${row.hours} h`,
  });
  return { ...row, ...oilColumns(build.oil) };
}

/** What a race says about the parts: dirt where the engine's story has it, now and then a dip while it is loose. */
function eventOf({ spec, random }: Bench, build: DemoBuild, plan: PlannedRun, looseness: number) {
  const event = (name: (typeof runEvents)[number], note: string) => ({ event: name, note });
  const dips = random.chance(looseness > 0.9 ? 0.2 : 0.02);
  if (plan.kind !== "race") return undefined;
  if (spec.dirt?.build === build.number)
    return event("debris", "Air box opened on the stage; dust behind the filter.");
  return dips ? event("pressure-dip", "Pressure dipped in a long corner and came back.") : undefined;
}

/** What a history takes of the oil beside a run. */
function oilColumns(name: DemoBuild["oil"]) {
  const { grade, kv40, kv100, density15 } = demoOil(name);
  return { name, grade, kv40, kv100, density15 };
}

/** The clearance that the oil leaks through and its usual value, m: what the mains aim at. */
function crankClearance({ fits }: Bench) {
  const mains = fits.find((fit) => fit.spec.kind === "main")!;
  return { clearance: metres(mains.aim.pm), usual: metres(mains.row.usual_pm) };
}

/**
 * Oil pressure, Pa: a pump of fixed displacement against a leak that grows as clearance³ over viscosity, held down by
 * its relief valve. The proportion is arithmetic of a slot's flow; the constants have no source.
 */
function oilPressure(rpm: number, viscosity: number, clearance: number): number {
  const relief = 6.6e5;
  const leak = 14e5 * (rpm / 7000) * (viscosity / 0.0135) * (68e-6 / clearance) ** 3;
  return (relief * leak) / (relief + leak);
}

/** As the gauge on the dash is read: whole psi, or tenths of a bar. */
function readPressure({ spec }: Bench, pascals: number): number {
  const psi = toCore(1, "psi");
  return spec.gauges === "inch" ? Math.round(pascals / psi) * psi : Math.round(pascals / 1e4) * 1e4;
}
