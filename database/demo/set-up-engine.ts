import { instant } from "#database/id";
import { metres } from "~/engineering/quantity/length";
import { parseQuantity } from "~/engineering/quantity/parse";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { fitsOfLayout } from "~/engineering/trade/layout";
import { fitColumns } from "~/models/engine.server";
import { lengthColumns } from "~/models/length-columns";
import { type Bench, type DemoFit, type DemoShop, noteHistory } from "./bench";
import type { Calendar } from "./calendar";
import type { EngineSpec, FitSpec } from "./engine-spec";
import { makePart, type Part, stationsOf } from "./parts";
import { Random } from "./random";
import type { Rows } from "./rows";
import { drawTruth, micron } from "./wear-model";

/** Adds an engine with its fits and positions, before its first build. */
export function setUpEngine(
  rows: Rows,
  calendar: Calendar,
  shop: DemoShop,
  spec: EngineSpec,
  daysAgo: number,
): Bench {
  const at = calendar.at(daysAgo, 9);
  const engineId = rows.idAt(at);
  const length = (text: string) => parseQuantity(text, "length");
  rows.add("engine", {
    id: engineId,
    shop_id: shop.id,
    name: spec.name,
    form: spec.form,
    cylinders: spec.cylinders,
    mains: spec.mains,
    valves_per_cylinder: spec.valvesPerCylinder,
    ...lengthColumns("bore", length(spec.bore)),
    ...lengthColumns("stroke", length(spec.stroke)),
    ...lengthColumns("rod_length", length(spec.rodLength)),
    rev_limit_rpm: spec.revLimitRpm,
    duty: spec.duty,
    environment: spec.environment,
    created_at: instant(at),
    version: 1,
  });
  for (const role of spec.assigned) {
    rows.add("engine_assignment", {
      id: rows.idAt(at),
      shop_id: shop.id,
      engine_id: engineId,
      person_id: shop.personOf(role),
      created_at: instant(at),
    });
  }
  const bench: Bench = {
    rows,
    calendar,
    shop,
    spec,
    engineId,
    fits: [],
    random: Random.named(`${spec.name}, runs`),
    signer: shop.personOf(spec.assigned.includes("crew-chief") ? "crew-chief" : "owner"),
  };
  for (const fit of spec.fits) bench.fits.push(setUpFit(bench, fit, at));
  noteHistory(bench, at, shop.personOf("owner"), {
    subjectKind: "engine",
    subjectId: engineId,
    what: `set up ${spec.name}`,
  });
  return bench;
}

function setUpFit({ rows, shop, spec: engine, engineId, fits }: Bench, spec: FitSpec, at: Date): DemoFit {
  const small = (text: string) => parseQuantity(text, "small-length");
  const row: DemoFit["row"] = {
    id: rows.idAt(at),
    shop_id: shop.id,
    engine_id: engineId,
    kind: spec.kind,
    sort_order: fits.length,
    ...fitColumns(
      {
        kind: spec.kind,
        nominal: parseQuantity(spec.nominal, "length"),
        length: parseQuantity(spec.length, "length"),
        usual: small(spec.usual),
        least: small(spec.least),
        most: small(spec.most),
        tolerance: small(spec.tolerance),
        boreFinish: small(spec.boreFinish),
        journalFinish: small(spec.journalFinish),
        limitsSource: spec.limitsSource,
        boreMaterial: spec.boreMaterial,
        journalMaterial: spec.journalMaterial,
      },
      spec.kind,
    ),
    method: "absolute",
    created_at: instant(at),
    version: 1,
  };
  rows.add("fit", row);
  const count = fitsOfLayout(engine).find((fit) => fit.kind === spec.kind)!.positions;
  const positions = Array.from({ length: count }, (_, index) => ({
    id: rows.idAt(at),
    number: index + 1,
    fitId: row.id,
  }));
  for (const { id, number } of positions) {
    rows.add("position", { id, shop_id: shop.id, fit_id: row.id, number, retired_at: null });
  }
  const random = Random.named(`${engine.name}, ${spec.kind}`);
  const kind = fitKind(spec.kind);
  return {
    spec,
    row,
    kind,
    positions,
    truth: drawTruth(random, spec.kind, metres(row.usual_pm), engine.environment === "dusty"),
    random,
    journals: positions.map(() => newJournal(kind, row, random)),
    bores: [],
    aim: { pm: row.usual_pm, signOffId: null },
    iterations: [],
  };
}

/** A journal as the grinder leaves it: a little under its nominal size. */
export function newJournal(kind: DemoFit["kind"], row: DemoFit["row"], random: Random): Part {
  const size = metres(row.nominal_pm) - random.between([6 * micron, 12 * micron]);
  return makePart(stationsOf(kind, "journal"), size, random);
}
