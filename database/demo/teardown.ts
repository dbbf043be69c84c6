import type { Insertable } from "kysely";
import { instant } from "#database/id";
import type { FindingTable } from "#database/schema";
import type { DamageTerm } from "~/engineering/trade/condition";
import { type Bench, type DemoBuild, type DemoFit, isCoated } from "./bench";
import { sizeOfRecord, stationsOf, wornPart } from "./parts";
import { criticalAt, gradeOfRise, micron, seenGrade, wearRise } from "./wear-model";

/** What running did to one position. */
interface Wear {
  grade: number;
  dirty: boolean;
}

/** A finding as signatures and histories need it. */
export type DemoFinding = Insertable<FindingTable> & { damage: string | null; coating_state: string | null };

/** Wears the parts of a fit as its build was run: by its clearance, the oil, its coating, and dirt where there was any. */
export function wearParts(
  { spec }: Bench,
  build: DemoBuild,
  fit: DemoFit,
  run: { hours: number; viscosity: number },
): Wear[] {
  const { truth, random } = fit;
  const bore = stationsOf(fit.kind, "bore");
  const journal = stationsOf(fit.kind, "journal");
  const critical = criticalAt(truth, run.viscosity, isCoated(fit, build));
  const beddingIn = fit.spec.coating?.fromBuild === build.number ? truth.beddingIn : 0;
  return fit.positions.map(({ number }, index) => {
    const clearance = sizeOfRecord(bore, fit.bores[index]!) - sizeOfRecord(journal, fit.journals[index]!);
    const rise = wearRise(truth, clearance, critical);
    const { dirt } = spec;
    const dirty = dirt?.build === build.number && dirt.fit === fit.spec.kind && dirt.position === number;
    const wear =
      truth.baseRate * rise * run.hours +
      beddingIn * random.between([0.8, 1.2]) +
      (dirty ? random.between([4, 7]) * micron : 0);
    fit.bores[index] = wornPart(bore, fit.bores[index]!, truth.boreShare * wear);
    fit.journals[index] = wornPart(journal, fit.journals[index]!, (1 - truth.boreShare) * wear);
    const grade = gradeOfRise(rise);
    return { grade: dirty ? Math.max(grade, 3) : seenGrade(random, grade), dirty };
  });
}

/** Writes down what is seen on every position of a fit; gives the findings. */
export function findParts(bench: Bench, build: DemoBuild, fit: DemoFit, wears: readonly Wear[], at: Date) {
  const { rows, shop } = bench;
  return fit.positions.map((position, index): DemoFinding => {
    const wear = wears[index]!;
    const finding = {
      id: rows.idAt(at),
      shop_id: shop.id,
      build_id: build.id,
      fit_id: fit.row.id,
      position_id: position.id,
      grade: wear.grade,
      ...look(fit, wear),
      coating_state: isCoated(fit, build) ? coatingStateOf(wear.grade) : null,
      supersedes_id: null,
      person_id: shop.personOf("builder"),
      found_at: instant(at),
    };
    rows.add("finding", finding);
    return finding;
  });
}

const shellKinds = ["main", "big-end"];

function look(fit: DemoFit, { grade, dirty }: Wear) {
  const { random, spec } = fit;
  const isShell = shellKinds.includes(spec.kind);
  const place = isShell ? `crown of the ${spec.kind === "main" ? "lower" : "upper"} shell` : fit.kind.bore;
  const share = (from: number, to: number) => Math.round(20 * random.between([from, to])) / 20;
  const found = (damage: DamageTerm | null, area_share: number | null, note: string, cause = "") => ({
    damage,
    place: damage ? place : "",
    area_share,
    cause,
    note,
  });
  if (dirty) {
    return found(
      "embedded-particles",
      share(0.1, 0.2),
      "Hard specks all round, the neighbours clean. The magnet holds grit, not steel.",
      "Dust behind the air filter: the box was opened on the stage.",
    );
  }
  if (grade <= 1) return found(null, null, isShell && grade === 1 ? "Even grey, fading at the joints." : "");
  if (grade === 2) return found("polishing", share(0.1, 0.3), "");
  if (!isShell) return found("wear-by-friction", share(0.2, 0.5), "Bright streaks along the load side.");
  return found("wiping", share(0.2, 0.5), "Smeared and tinted where the load is.", "Too close for this oil.");
}

function coatingStateOf(grade: number): string {
  if (grade >= 4) return "worn-through";
  if (grade === 3) return "worn-at-edge";
  return grade === 2 ? "polished" : "intact";
}
