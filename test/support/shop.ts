import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { openDatabase, setDatabase } from "#database/connection";
import { migrate } from "#database/migrate";
import type { Role } from "~/access/permissions";
import { insertPerson, insertShop } from "~/models/person.server";

/** A data directory with one empty shop and one person of each role given; the password is everyone's. */
export async function emptyShop(roles: readonly Role[]) {
  const dataDirectory = mkdtempSync(join(tmpdir(), "tenthbook-shop-"));
  const database = setDatabase(openDatabase(join(dataDirectory, "tenthbook.sqlite")));
  await migrate(database);
  const password = "a long enough password";
  const shopId = await insertShop("Test shop");
  for (const role of roles) {
    await insertPerson(shopId, { email: `${role}@shop.example.test`, name: `The ${role}`, password, role });
  }
  await database.destroy();
  return { dataDirectory, password, email: (role: Role) => `${role}@shop.example.test` };
}
