// npm run token -- --email builder@example.test [--scope read|write] [--name ...]: prints an API token of a local installation.
import { parseArgs } from "node:util";
import { database } from "#database/connection";
import { migrate } from "#database/migrate";
import { findPersonByEmail } from "~/models/person.server";
import { insertToken } from "~/models/token.server";

// The token needs only the database; an installation's cookie secret is not asked for here.
process.env.DEMO ??= "1";

const { values } = parseArgs({
  options: {
    email: { type: "string" },
    scope: { type: "string", default: "write" },
    name: { type: "string", default: "made by npm run token" },
  },
});

const fail = (sentence: string): never => {
  console.error(sentence);
  process.exit(1);
};

if (!values.email) fail("Say whose token: npm run token -- --email builder@example.test");
if (values.scope !== "read" && values.scope !== "write") fail("The scope is read or write.");
await migrate(database());
const person = await findPersonByEmail(values.email as string);
if (!person)
  fail(`Nobody here has the address ${values.email}. Start the program once, so that the demo is there.`);
else {
  const scope = { shopId: person.shopId, personId: person.id, role: person.role };
  console.log(await insertToken(scope, values.name, values.scope as "read" | "write"));
}
await database().destroy();
