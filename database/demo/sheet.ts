import { instant } from "#database/id";
import type { Stage } from "#database/schema";
import { hashSheet, sheetContent } from "~/models/sheet.server";
import { type Bench, type DemoBuild, type DemoFit, noteHistory } from "./bench";
import { stationsOf } from "./parts";
import { type DemoReading, fillBox, type SheetInHand } from "./reading";

/** Starts a sheet of a build on a day, so many days ago. */
export function startSheet(
  { calendar, random }: Bench,
  stage: Stage,
  build: DemoBuild,
  daysAgo: number,
  boxesLeft = Number.POSITIVE_INFINITY,
): SheetInHand {
  const roomC = Math.min(23, Math.max(20, 21.4 + random.normal(0.7)));
  return { stage, build, at: calendar.at(daysAgo, 8), boxesLeft, temperatureC: Math.round(10 * roomC) / 10 };
}

/** Measures every position of a fit as its parts are; gives the readings that stand, in the order of their ids. */
export function measureParts(bench: Bench, fit: DemoFit, sheet: SheetInHand): DemoReading[] {
  const standing: DemoReading[] = [];
  for (const [index, { id: positionId }] of fit.positions.entries()) {
    for (const [feature, parts] of [
      ["bore", fit.bores],
      ["journal", fit.journals],
    ] as const) {
      for (const [place, { plane, axis }] of stationsOf(fit.kind, feature).entries()) {
        if (sheet.boxesLeft-- <= 0) return standing;
        standing.push(
          fillBox(bench, fit, sheet, { positionId, feature, plane, axis }, parts[index]![place]!),
        );
      }
    }
  }
  return standing;
}

/** Signs a stage of a build: what is on it is frozen from then on. */
export function signSheet(
  bench: Bench,
  { stage, build }: Pick<SheetInHand, "stage" | "build">,
  at: Date,
  readings: readonly DemoReading[],
  findings: Parameters<typeof sheetContent>[3] = [],
): void {
  const { rows, shop } = bench;
  const person = shop.personOf("builder");
  rows.add("sheet_signature", {
    id: rows.idAt(at),
    shop_id: shop.id,
    build_id: build.id,
    stage,
    content_hash: hashSheet(sheetContent(build.id, stage, readings, findings)),
    person_id: person,
    signed_at: instant(at),
  });
  noteHistory(bench, at, person, {
    subjectKind: "build",
    subjectId: build.id,
    what: `signed the ${stage} sheet of build ${build.number}`,
    to: { readings: readings.length, findings: findings.length },
  });
}
