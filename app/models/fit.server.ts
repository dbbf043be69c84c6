import { database } from "#database/connection";
import { findEngine, fitColumns, type NewFit } from "./engine.server";
import { recordHistory } from "./history.server";
import { conflict, notFound } from "./refusal";
import type { Scope } from "./scope";
import { isVisible } from "./visible-engines.server";

/** An engine's fits with their positions, in the order their parts lie on the bench. */
export async function listFits(scope: Scope, engineId: string) {
  const rows = await database()
    .selectFrom("fit")
    .selectAll()
    .where("fit.engine_id", "=", engineId)
    .where("fit.shop_id", "=", scope.shopId)
    .orderBy("sort_order")
    .execute();
  const positions = await database()
    .selectFrom("position")
    .innerJoin("fit", "fit.id", "position.fit_id")
    .select(["position.id", "position.number", "position.fit_id as fitId"])
    .where("fit.engine_id", "=", engineId)
    .where("position.shop_id", "=", scope.shopId)
    .where("position.retired_at", "is", null)
    .orderBy("position.number")
    .execute();
  return rows.map((fit) => ({
    ...fit,
    positions: positions.filter((position) => position.fitId === fit.id),
  }));
}

export type Fit = Awaited<ReturnType<typeof listFits>>[number];

/** One fit of an engine this person may see. @throws Refusal `not-found` */
export async function findFit(scope: Scope, engineId: string, fitId: string): Promise<Fit> {
  await findEngine(scope, engineId);
  const fit = (await listFits(scope, engineId)).find((candidate) => candidate.id === fitId);
  if (!fit) throw notFound("fit");
  return fit;
}

/** Whether the shop has a fit and this person may see its engine; gives the engine's id. */
export async function findEngineOfFit(scope: Scope, fitId: string): Promise<string> {
  const row = await database()
    .selectFrom("fit")
    .innerJoin("engine", "engine.id", "fit.engine_id")
    .select("engine.id")
    .where("fit.id", "=", fitId)
    .where(isVisible(scope))
    .executeTakeFirst();
  if (!row) throw notFound("fit");
  return row.id;
}

/** Changes what is known of a fit. @throws Refusal `conflict` where someone else changed it meanwhile */
export async function updateFit(
  scope: Scope,
  fit: Fit,
  change: Omit<NewFit, "kind"> & { method: "absolute" | "comparative" },
  version: number,
): Promise<void> {
  const { coated_since_build: _, ...columns } = fitColumns(
    { ...change, kind: fit.kind as NewFit["kind"] },
    "",
  );
  await database()
    .transaction()
    .execute(async (transaction) => {
      const latest = await transaction
        .selectFrom("build")
        .select((build) => build.fn.max("number").as("number"))
        .where("engine_id", "=", fit.engine_id)
        .executeTakeFirst();
      const coatingChanged = columns.coating !== fit.coating;
      const coatedSince = coatingChanged
        ? columns.coating && (latest?.number ?? 0) + 1
        : fit.coated_since_build;
      const result = await transaction
        .updateTable("fit")
        .set({
          ...columns,
          coated_since_build: coatedSince || null,
          method: change.method,
          version: version + 1,
        })
        .where("id", "=", fit.id)
        .where("shop_id", "=", scope.shopId)
        .where("version", "=", version)
        .executeTakeFirst();
      if (result.numUpdatedRows === 0n) {
        throw conflict(
          "lost-update",
          "Someone changed this fit while you were typing. Look at it again, then save.",
        );
      }
      await recordHistory(transaction, scope, {
        engineId: fit.engine_id,
        subjectKind: "fit",
        subjectId: fit.id,
        what: "changed a fit",
        from: fit,
        to: columns,
      });
    });
}

/** Takes a position out of use; what was measured at it stays. @throws Refusal `not-found` */
export async function retirePosition(scope: Scope, fit: Fit, positionId: string): Promise<void> {
  await database()
    .transaction()
    .execute(async (transaction) => {
      const result = await transaction
        .updateTable("position")
        .set({ retired_at: new Date().toISOString() })
        .where("id", "=", positionId)
        .where("fit_id", "=", fit.id)
        .where("shop_id", "=", scope.shopId)
        .where("retired_at", "is", null)
        .executeTakeFirst();
      if (result.numUpdatedRows === 0n) throw notFound("position");
      await recordHistory(transaction, scope, {
        engineId: fit.engine_id,
        subjectKind: "position",
        subjectId: positionId,
        what: "took a position out of use",
      });
    });
}
