import { type Kysely, sql } from "kysely";

/** Runs statements so that all of them stand or none: Kysely does not roll a failed SQLite migration back. */
export async function inOneTransaction(database: Kysely<unknown>, statements: string[]): Promise<void> {
  await database.transaction().execute(async (transaction) => {
    for (const statement of statements) await sql.raw(statement).execute(transaction);
  });
}
