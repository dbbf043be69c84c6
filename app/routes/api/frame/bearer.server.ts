import { may, type Permission, roleNames } from "~/access/permissions";
import type { Scope } from "~/models/scope";
import { findTokenHolder } from "~/models/token.server";
import { Problem } from "./problem.server";

/** Who calls, and whether their token may write. */
export interface Caller {
  scope: Scope;
  writes: boolean;
  /** The token, as the limit on calls counts it. */
  token: string;
}

/**
 * Who a request's bearer token speaks for (RFC 6750, The OAuth 2.0 Authorization Framework: Bearer Token Usage).
 * @throws Problem 401 where there is no token, or one that is unknown or revoked
 */
export async function findCaller(request: Request): Promise<Caller> {
  const header = request.headers.get("Authorization");
  if (header === null) {
    throw notSignedIn("no-token", "This call needs a token: Authorization: Bearer <token>.", "");
  }
  const token = /^Bearer +([\w-]{1,200}) *$/i.exec(header)?.[1];
  const holder = token === undefined ? undefined : await findTokenHolder(token);
  if (token === undefined || !holder) {
    const sentence = "This token is unknown or was revoked. Make another on your account's page.";
    throw notSignedIn("unknown-token", sentence, ', error="invalid_token"');
  }
  const { id: personId, shopId, role } = holder.person;
  return { scope: { personId, shopId, role }, writes: holder.scope === "write", token };
}

function notSignedIn(code: string, sentence: string, challenge: string): Problem {
  return new Problem(401, code, sentence, {
    headers: { "WWW-Authenticate": `Bearer realm="Tenthbook"${challenge}` },
  });
}

/** @throws Problem 403 where the token may only read */
export function requireWriting(caller: Caller): void {
  if (caller.writes) return;
  throw new Problem(403, "read-only-token", "This token may only read; this call writes.", {
    headers: { "WWW-Authenticate": 'Bearer realm="Tenthbook", error="insufficient_scope", scope="write"' },
  });
}

/** @throws Problem 403 where the caller's role does not have this permission */
export function requirePermission(scope: Scope, permission: Permission): void {
  if (may(scope.role, permission)) return;
  const sentence = `A ${roleNames[scope.role].toLowerCase()} of this shop may not do this.`;
  throw new Problem(403, "role-not-allowed", sentence);
}
