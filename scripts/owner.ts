// npm run owner -- --shop "Name" --name "Person" --email person@shop: the first shop and its owner of a real installation.
import { randomBytes } from "node:crypto";
import { parseArgs } from "node:util";
import { database } from "#database/connection";
import { migrate } from "#database/migrate";
import { findPersonByEmail, insertPerson, insertShop } from "~/models/person.server";

// Only the database is needed; an installation's cookie secret is not asked for here.
process.env.DEMO ??= "1";

const { values } = parseArgs({
  options: { shop: { type: "string" }, name: { type: "string" }, email: { type: "string" } },
});

if (!values.shop || !values.name || !values.email) {
  console.error(
    'Say all three: npm run owner -- --shop "Name of the shop" --name "Your name" --email you@your.shop',
  );
  process.exit(1);
}
await migrate(database());
if (await findPersonByEmail(values.email)) {
  console.error(`${values.email} is known here already.`);
  process.exit(1);
}
const password = randomBytes(12).toString("base64url");
const shopId = await insertShop(values.shop);
await insertPerson(shopId, { email: values.email, name: values.name, password, role: "owner" });
console.log(`${values.name} owns ${values.shop}. The password, shown this once: ${password}`);
await database().destroy();
