import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import { conflict } from "./refusal";
import type { Scope } from "./scope";

/** An answer as it was given the first time. */
export interface KeptAnswer {
  status: number;
  json: string;
}

// The status of a claim whose answer is not there yet; no answer has it.
const unanswered = 0;

const keptFor = 24 * 60 * 60 * 1000;

/**
 * Claims a person's idempotency key for a request, before its work begins: whoever comes second does not do it again.
 * @returns the answer that the same request got under this key; undefined where the key is now claimed for it
 * @throws Refusal `conflict` where the key stands for another request, or the first has no answer yet
 */
export async function claimKey(
  scope: Scope,
  key: string,
  requestHash: string,
): Promise<KeptAnswer | undefined> {
  await forgetOldKeys();
  const claimed = await database()
    .insertInto("idempotency")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      person_id: scope.personId,
      key,
      request_hash: requestHash,
      status: unanswered,
      answer_json: "null",
      created_at: instant(),
    })
    .onConflict((taken) => taken.columns(["person_id", "shop_id", "key"]).doNothing())
    .executeTakeFirst();
  if (claimed.numInsertedOrUpdatedRows === 1n) return undefined;
  const first = await ofKey(scope, key).executeTakeFirst();
  if (first && first.request_hash !== requestHash) {
    throw conflict("key-used", "This Idempotency-Key was used for another request. Use a new key for each.");
  }
  if (!first || first.status === unanswered) {
    throw conflict(
      "key-in-progress",
      "The first request with this Idempotency-Key has no answer yet. If it never gets one, look whether it was done before you send it with a new key.",
    );
  }
  return { status: first.status, json: first.answer_json };
}

/** Keeps the answer of the request that claimed the key. */
export async function keepAnswer(scope: Scope, key: string, answer: KeptAnswer): Promise<void> {
  await database()
    .updateTable("idempotency")
    .set({ status: answer.status, answer_json: answer.json })
    .where("person_id", "=", scope.personId)
    .where("shop_id", "=", scope.shopId)
    .where("key", "=", key)
    .execute();
}

/** Gives the key back where the program failed at the request, so that it can be sent again. */
export async function releaseKey(scope: Scope, key: string): Promise<void> {
  await database()
    .deleteFrom("idempotency")
    .where("person_id", "=", scope.personId)
    .where("shop_id", "=", scope.shopId)
    .where("key", "=", key)
    .where("status", "=", unanswered)
    .execute();
}

function ofKey(scope: Scope, key: string) {
  return database()
    .selectFrom("idempotency")
    .select(["request_hash", "status", "answer_json"])
    .where("person_id", "=", scope.personId)
    .where("shop_id", "=", scope.shopId)
    .where("key", "=", key);
}

// An id begins with the milliseconds of its making in hex (RFC 9562, UUID version 7),
// so the old ones are found by the primary key, at the cost of those that go.
async function forgetOldKeys(): Promise<void> {
  const oldest = (Date.now() - keptFor).toString(16).padStart(12, "0");
  await database().deleteFrom("idempotency").where("id", "<", oldest).execute();
}
