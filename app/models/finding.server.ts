import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Build } from "./build.server";
import { recordHistory } from "./history.server";
import { conflict, notFound } from "./refusal";
import type { Scope } from "./scope";

/** What the builder saw on one part at teardown. */
export interface NewFinding {
  fitId: string;
  positionId: string;
  grade: number;
  damage?: string | undefined;
  place: string;
  /** Share of the area, 0 to 1. */
  areaShare?: number | undefined;
  cause: string;
  coatingState?: string | undefined;
  note: string;
}

/** The findings of a build that stand, one a position at the most. */
export async function listFindings(scope: Scope, buildId: string) {
  const rows = await database()
    .selectFrom("finding")
    .selectAll("finding")
    .where("finding.build_id", "=", buildId)
    .where("finding.shop_id", "=", scope.shopId)
    .orderBy("finding.id")
    .execute();
  const superseded = new Set(rows.map((row) => row.supersedes_id));
  return rows.filter((row) => !superseded.has(row.id));
}

export type Finding = Awaited<ReturnType<typeof listFindings>>[number];

/** Writes a finding down; the one it corrects stays in the record. @throws Refusal */
export async function insertFinding(scope: Scope, build: Build, finding: NewFinding): Promise<string> {
  if (build.state === "reviewed") {
    throw conflict("reviewed", `Build ${build.number} is reviewed; its findings are closed.`);
  }
  if (build.state !== "torn-down") {
    throw conflict(
      "not-torn-down",
      `Build ${build.number} is not torn down yet; findings come after the teardown.`,
    );
  }
  const position = await database()
    .selectFrom("position")
    .innerJoin("fit", "fit.id", "position.fit_id")
    .select("position.number")
    .where("position.id", "=", finding.positionId)
    .where("fit.id", "=", finding.fitId)
    .where("fit.engine_id", "=", build.engine_id)
    .executeTakeFirst();
  if (!position) throw notFound("position on this engine");
  const signed = await database()
    .selectFrom("sheet_signature")
    .select("id")
    .where("build_id", "=", build.id)
    .where("stage", "=", "teardown")
    .executeTakeFirst();
  if (signed) throw conflict("sheet-signed", "The teardown sheet is signed; its findings are closed.");
  const standing = (await listFindings(scope, build.id)).find(
    (row) => row.position_id === finding.positionId,
  );
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      await transaction
        .insertInto("finding")
        .values({
          id,
          shop_id: scope.shopId,
          build_id: build.id,
          fit_id: finding.fitId,
          position_id: finding.positionId,
          grade: finding.grade,
          damage: finding.damage ?? null,
          place: finding.place,
          area_share: finding.areaShare ?? null,
          cause: finding.cause,
          coating_state: finding.coatingState ?? null,
          note: finding.note,
          supersedes_id: standing?.id ?? null,
          person_id: scope.personId,
          found_at: instant(),
        })
        .execute();
      await recordHistory(transaction, scope, {
        engineId: build.engine_id,
        subjectKind: "finding",
        subjectId: id,
        what: standing ? "corrected a finding" : "wrote down a finding",
        from: standing && { grade: standing.grade, damage: standing.damage },
        to: { position: position.number, grade: finding.grade, damage: finding.damage },
      });
    });
  return id;
}
