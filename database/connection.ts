import { mkdirSync } from "node:fs";
import { join } from "node:path";
import SqliteDatabase from "better-sqlite3";
import { type Driver, Kysely, SqliteDialect, type Transaction } from "kysely";
import { configuration } from "./configuration";
import type { Schema } from "./schema";

/** The open database. */
export type Database = Kysely<Schema>;

/** Inside a transaction only this may be used: the plain database would wait for the one connection for ever. */
export type DatabaseTransaction = Transaction<Schema>;

/** Opens a database file (or `:memory:`) with the settings that make a commit durable. */
export function openDatabase(file: string): Database {
  const sqlite = new SqliteDatabase(file);
  sqlite.pragma("journal_mode = WAL");
  sqlite.pragma("synchronous = FULL");
  sqlite.pragma("foreign_keys = ON");
  sqlite.pragma("busy_timeout = 5000");
  sqlite.pragma("trusted_schema = OFF");
  return new Kysely<Schema>({ dialect: new RollingBackDialect(sqlite) });
}

/**
 * SQLite rolls a transaction back by itself when the disk is full or fails. A second ROLLBACK is then an error that would
 * hide the first one, and the person would not learn what happened.
 */
class RollingBackDialect extends SqliteDialect {
  constructor(private readonly sqlite: SqliteDatabase.Database) {
    super({ database: sqlite });
  }

  override createDriver(): Driver {
    const driver = super.createDriver();
    const rollback = driver.rollbackTransaction.bind(driver);
    driver.rollbackTransaction = async (connection) => {
      if (this.sqlite.inTransaction) await rollback(connection);
    };
    return driver;
  }
}

// One connection for the process; on globalThis so that the development server's reloads keep it.
const held = globalThis as { tenthbookDatabase?: Database | undefined };

/** The program's own database, in its data directory, opened on first use. */
export function database(): Database {
  if (!held.tenthbookDatabase) {
    const directory = configuration().dataDirectory;
    mkdirSync(directory, { recursive: true });
    held.tenthbookDatabase = openDatabase(join(directory, "tenthbook.sqlite"));
  }
  return held.tenthbookDatabase;
}

/** Puts another database in the program's place, for tests; returns it. */
export function setDatabase(other: Database): Database {
  held.tenthbookDatabase = other;
  return other;
}
