import { type Kysely, Migrator, sql } from "kysely";
import { migrations } from "./migrations";

/**
 * Brings a database up to this program's tables.
 * Refuses one that a newer program has written: an old program would not know what it must not break.
 */
export async function migrate<Tables>(database: Kysely<Tables>): Promise<string[]> {
  await refuseNewer(database);
  const migrator = new Migrator({ db: database, provider: { getMigrations: async () => migrations } });
  const { error, results } = await migrator.migrateToLatest();
  if (error) throw error;
  return (results ?? []).map((result) => result.migrationName);
}

async function refuseNewer<Tables>(database: Kysely<Tables>): Promise<void> {
  const table = await sql<{
    name: string;
  }>`SELECT name FROM sqlite_master WHERE name = 'kysely_migration'`.execute(database);
  if (table.rows.length === 0) return;
  const applied = await sql<{ name: string }>`SELECT name FROM kysely_migration`.execute(database);
  const unknown = applied.rows.filter((row) => !(row.name in migrations)).map((row) => row.name);
  if (unknown.length > 0) {
    throw new Error(
      `This database was written by a newer Tenthbook (${unknown.join(", ")}). Start that version, or restore a backup made before it.`,
    );
  }
}
