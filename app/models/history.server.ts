import type { DatabaseTransaction } from "#database/connection";
import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Scope } from "./scope";

interface Change {
  engineId?: string | null;
  subjectKind: string;
  subjectId: string;
  /** A verb phrase a person reads: "signed the assembly sheet". */
  what: string;
  from?: unknown;
  to?: unknown;
}

/** Writes down who changed what, in the transaction of the change itself, so that neither stands without the other. */
export async function recordHistory(
  transaction: DatabaseTransaction,
  scope: Scope,
  change: Change,
): Promise<void> {
  await transaction
    .insertInto("history")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      engine_id: change.engineId ?? null,
      person_id: scope.personId,
      subject_kind: change.subjectKind,
      subject_id: change.subjectId,
      what: change.what,
      from_json: change.from === undefined ? null : JSON.stringify(change.from),
      to_json: change.to === undefined ? null : JSON.stringify(change.to),
      happened_at: instant(),
    })
    .execute();
}

/** The latest changes to an engine and what belongs to it, newest first. */
export function listEngineHistory(scope: Scope, engineId: string, most = 20) {
  return database()
    .selectFrom("history")
    .innerJoin("person", "person.id", "history.person_id")
    .select(["history.id", "history.what", "history.happened_at as happenedAt", "person.name as personName"])
    .where("history.engine_id", "=", engineId)
    .where("history.shop_id", "=", scope.shopId)
    .orderBy("history.happened_at", "desc")
    .limit(most)
    .execute();
}
