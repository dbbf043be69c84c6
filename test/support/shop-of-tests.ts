import { openDatabase, setDatabase } from "#database/connection";
import { migrate } from "#database/migrate";
import { type Role, roles } from "~/access/permissions";
import { insertPerson, insertShop } from "~/models/person.server";
import type { Scope } from "~/models/scope";
import { insertToken } from "~/models/token.server";

/** A shop in an empty database in memory, with a person and a writing token of every role. */
export interface ShopOfTests {
  scopes: Record<Role, Scope>;
  tokens: Record<Role, string>;
  /** The owner's second token, which may only read. */
  readToken: string;
  /** A writing token of the owner of another shop. */
  otherToken: string;
  otherScope: Scope;
}

/** Puts a new database in the program's place, and two shops in it. */
export async function openShopOfTests(): Promise<ShopOfTests> {
  await migrate(setDatabase(openDatabase(":memory:")));
  const shopId = await insertShop("Bench of the tests");
  const people = await Promise.all(roles.map(async (role) => [role, await hire(shopId, role)] as const));
  const scopes = Object.fromEntries(people) as Record<Role, Scope>;
  const made = await Promise.all(
    roles.map(async (role) => [role, await insertToken(scopes[role], "tests", "write")] as const),
  );
  const otherScope = await hire(await insertShop("Another shop"), "owner");
  return {
    scopes,
    tokens: Object.fromEntries(made) as Record<Role, string>,
    readToken: await insertToken(scopes.owner, "tests, reading", "read"),
    otherToken: await insertToken(otherScope, "tests", "write"),
    otherScope,
  };
}

async function hire(shopId: string, role: Role): Promise<Scope> {
  const email = `${role}-of-${shopId}@example.test`;
  const personId = await insertPerson(shopId, { email, name: `The ${role}`, password: "of the tests", role });
  return { shopId, personId, role };
}
