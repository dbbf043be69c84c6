import { createHash } from "node:crypto";
import { claimKey, type KeptAnswer, keepAnswer, releaseKey } from "~/models/idempotency.server";
import type { Scope } from "~/models/scope";
import { Problem } from "./problem.server";

/** An answer before it is sent: its status and its JSON. */
export type JsonAnswer = KeptAnswer;

/**
 * Does the work of a write once, however often the request comes with the same `Idempotency-Key`:
 * the same key and body get the first answer again. Without a key the work is done each time.
 * @throws Refusal `conflict` for the key with another body, or while the first request is not answered
 */
export async function onlyOnce(
  scope: Scope,
  request: Request,
  body: string,
  work: () => Promise<JsonAnswer>,
): Promise<JsonAnswer> {
  const key = request.headers.get("Idempotency-Key");
  if (key === null) return work();
  if (!/^[\x21-\x7e]{1,200}$/.test(key)) {
    throw new Problem(400, "bad-key", "An Idempotency-Key has 1 to 200 visible ASCII characters, no spaces.");
  }
  const { pathname } = new URL(request.url);
  const hash = createHash("sha256").update(`${request.method} ${pathname}\n${body}`).digest("hex");
  const first = await claimKey(scope, key, hash);
  if (first) return first;
  const answer = await orRelease(scope, key, work);
  await keepAnswer(scope, key, answer);
  return answer;
}

// Only where the work failed: where it was done and just its answer could not be kept, the key stays claimed.
async function orRelease(scope: Scope, key: string, work: () => Promise<JsonAnswer>): Promise<JsonAnswer> {
  try {
    return await work();
  } catch (error) {
    await releaseKey(scope, key);
    throw error;
  }
}
