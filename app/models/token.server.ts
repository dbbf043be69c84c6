import { createHash, randomBytes } from "node:crypto";
import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { TokenScope } from "#database/schema";
import { findPersonInShop, type Person } from "./person.server";
import { notFound } from "./refusal";
import type { Scope } from "./scope";

// A token has 256 random bits, so a plain hash keeps it: there is nothing to guess (OWASP ASVS 6.5.2).
const hashed = (token: string) => createHash("sha256").update(token).digest("hex");

/** Makes a token; its text is shown this once and never again. */
export async function insertToken(scope: Scope, name: string, tokenScope: TokenScope): Promise<string> {
  const token = `tb_${randomBytes(32).toString("base64url")}`;
  await database()
    .insertInto("token")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      person_id: scope.personId,
      name,
      token_hash: hashed(token),
      scope: tokenScope,
      created_at: instant(),
      last_used_at: null,
      revoked_at: null,
    })
    .execute();
  return token;
}

/** The person's own tokens in this shop, newest first. */
export function listTokens(scope: Scope) {
  return database()
    .selectFrom("token")
    .select(["id", "name", "scope", "created_at", "last_used_at", "revoked_at"])
    .where("person_id", "=", scope.personId)
    .where("shop_id", "=", scope.shopId)
    .orderBy("created_at", "desc")
    .limit(100)
    .execute();
}

/** Ends a token of the person's own. */
export async function revokeToken(scope: Scope, id: string): Promise<void> {
  const result = await database()
    .updateTable("token")
    .set({ revoked_at: instant() })
    .where("id", "=", id)
    .where("person_id", "=", scope.personId)
    .where("shop_id", "=", scope.shopId)
    .where("revoked_at", "is", null)
    .executeTakeFirst();
  if (result.numUpdatedRows === 0n) throw notFound("token");
}

/** Who a token speaks for, and whether it may write; nobody where it is unknown or revoked. */
export async function findTokenHolder(
  token: string,
): Promise<{ person: Person; scope: TokenScope } | undefined> {
  const row = await database()
    .selectFrom("token")
    .select(["id", "person_id", "shop_id", "scope", "last_used_at"])
    .where("token_hash", "=", hashed(token))
    .where("revoked_at", "is", null)
    .executeTakeFirst();
  if (!row) return undefined;
  const person = await findPersonInShop(row.person_id, row.shop_id);
  if (!person) return undefined;
  await noteUse(row.id, row.last_used_at);
  return { person, scope: row.scope };
}

// To the minute is enough to see that a token is used; a write at every request would halve the API's speed.
async function noteUse(id: string, lastUsedAt: string | null): Promise<void> {
  const aMinuteAgo = Date.now() - 60_000;
  if (lastUsedAt && new Date(lastUsedAt).getTime() > aMinuteAgo) return;
  await database().updateTable("token").set({ last_used_at: instant() }).where("id", "=", id).execute();
}
