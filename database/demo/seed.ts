import { hash } from "argon2";
import { database } from "#database/connection";
import { Calendar } from "./calendar";
import { engine4 } from "./engines/engine-4";
import { engine9 } from "./engines/engine-9";
import { engine12 } from "./engines/engine-12";
import { engineOfSecondShop } from "./engines/engine-of-second-shop";
import { demoPassword, demoSignIns } from "./people";
import { Rows } from "./rows";
import { playSeason } from "./season";
import { setUpShop } from "./set-up-shop";

/**
 * Fills a new database with the invented shops, their season counted back from `now`; does nothing where a shop is
 * there already. The same clock gives the same rows, but for the salt of the password.
 */
export async function seedDemo(now = new Date()): Promise<void> {
  const known = await database().selectFrom("shop").select("id").limit(1).executeTakeFirst();
  if (known) return;
  // Hashing is slow on purpose; the demo's people share one password, so they share its hash too.
  const passwordHash = await hash(demoPassword);
  const rows = new Rows();
  const calendar = new Calendar(now);
  const isOther = ({ email }: { email: string }) => email === "other@example.test";
  const people = demoSignIns.map(({ email, name, role }) => ({ email, name, role }));
  const setUp = (name: string, crew: typeof people) => setUpShop(rows, calendar, name, crew, passwordHash);

  const shop = setUp(
    "Ferrand Race Engines",
    people.filter((person) => !isOther(person)),
  );
  for (const engine of [engine12, engine4, engine9]) playSeason(rows, calendar, shop, engine);
  const second = setUp("Bekele Engines", people.filter(isOther));
  playSeason(rows, calendar, second, engineOfSecondShop);

  await database()
    .transaction()
    .execute((transaction) => rows.insert(transaction));
}
