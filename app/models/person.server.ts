import { hash, verify } from "argon2";
import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { PageUnits } from "#database/schema";
import type { Role } from "~/access/permissions";
import { invalid } from "./refusal";
import type { Scope } from "./scope";
import { usualRules } from "./shop.server";

/** A person as the pages know them: who, in which shop, in which role. */
export interface Person {
  id: string;
  name: string;
  email: string;
  role: Role;
  shopId: string;
  shopName: string;
  units: PageUnits;
  theme: "system" | "light" | "dark";
}

const personInShop = () =>
  database()
    .selectFrom("membership")
    .innerJoin("person", "person.id", "membership.person_id")
    .innerJoin("shop", "shop.id", "membership.shop_id")
    .select([
      "person.id",
      "person.name",
      "person.email",
      "person.units",
      "person.theme",
      "membership.role",
      "membership.shop_id as shopId",
      "shop.name as shopName",
    ]);

/** The person of a session in its shop; nobody where the membership has ended. */
export function findPersonInShop(personId: string, shopId: string): Promise<Person | undefined> {
  return personInShop()
    .where("person.id", "=", personId)
    .where("membership.shop_id", "=", shopId)
    .executeTakeFirst();
}

/** The person with an address, in the shop they joined first. */
export function findPersonByEmail(email: string): Promise<Person | undefined> {
  return personInShop().where("person.email", "=", email).orderBy("membership.created_at").executeTakeFirst();
}

/** Everyone of the shop, owners first, for the shop's page. */
export function listPeople(scope: Scope) {
  return database()
    .selectFrom("membership")
    .innerJoin("person", "person.id", "membership.person_id")
    .select(["person.id", "person.name", "person.email", "membership.role"])
    .where("membership.shop_id", "=", scope.shopId)
    .orderBy("person.name")
    .execute();
}

// Verified when there is no such person, so that the answer takes as long as for one who is there.
const nobodysPassword = hash("nobody has this password");

/** Whether the password is the person's; takes as long when there is no such person. */
export async function passwordMatches(email: string, password: string): Promise<boolean> {
  const person = await database()
    .selectFrom("person")
    .select("password_hash")
    .where("email", "=", email)
    .executeTakeFirst();
  const matches = await verify(person?.password_hash ?? (await nobodysPassword), password);
  return matches && person !== undefined;
}

export interface NewPerson {
  email: string;
  name: string;
  password: string;
  role: Role;
}

/** Adds a person to a shop. */
export async function insertPerson(shopId: string, person: NewPerson): Promise<string> {
  const id = newId();
  const passwordHash = await hash(person.password);
  await database()
    .transaction()
    .execute(async (transaction) => {
      await transaction
        .insertInto("person")
        .values({
          id,
          email: person.email,
          name: person.name,
          password_hash: passwordHash,
          units: "inch",
          theme: "system",
          created_at: instant(),
          version: 1,
        })
        .execute();
      await transaction
        .insertInto("membership")
        .values({
          id: newId(),
          shop_id: shopId,
          person_id: id,
          role: person.role,
          created_at: instant(),
          version: 1,
        })
        .execute();
    });
  return id;
}

/** Makes a shop with the usual rules. */
export async function insertShop(name: string): Promise<string> {
  const id = newId();
  await database()
    .insertInto("shop")
    .values({
      id,
      name,
      ...usualRules,
      created_at: instant(),
      version: 1,
    })
    .execute();
  return id;
}

/** What a person sets for themselves. */
export async function updatePreferences(
  scope: Scope,
  preferences: { units?: PageUnits; theme?: "system" | "light" | "dark" },
): Promise<void> {
  if (Object.keys(preferences).length === 0)
    throw invalid({ path: "", code: "empty", message: "Nothing to set." });
  await database().updateTable("person").set(preferences).where("id", "=", scope.personId).execute();
}
