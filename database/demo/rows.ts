import type { Insertable } from "kysely";
import { v7 } from "uuid";
import type { DatabaseTransaction } from "#database/connection";
import type { Schema } from "#database/schema";
import { Random } from "./random";

/** The tables that the demo fills, each behind those that its rows point at. */
const tables = [
  "shop",
  "person",
  "membership",
  "gauge",
  "oil",
  "engine",
  "engine_assignment",
  "fit",
  "position",
  "build",
  "run",
  "reading",
  "finding",
  // A signature freezes its sheet, so it comes behind all that it signs.
  "sheet_signature",
  "proposal",
  "sign_off",
  "target",
  "history",
] as const;

type DemoTable = (typeof tables)[number];

// SQLite takes 32 766 values a statement; far fewer a time are quicker, for Kysely writes the statement out.
const valuesAtOnce = 2000;

/** The demo's rows, collected in memory and then written in one go. */
export class Rows {
  private readonly rows = new Map<DemoTable, object[]>(tables.map((table) => [table, []]));
  private readonly random = Random.named("ids");
  private made = 0;

  /** An id as `newId` makes them, but of the row's own past time and fixed by the demo's seed. */
  idAt(at: Date): string {
    const random = Uint8Array.from({ length: 16 }, () => this.random.next() % 256);
    return v7({ msecs: at.getTime(), seq: this.made++, random }).replaceAll("-", "");
  }

  /** Adds a row; it may still be changed until all are written. */
  add<Table extends DemoTable>(table: Table, row: Insertable<Schema[Table]>): void {
    this.rows.get(table)!.push(row);
  }

  /** Writes every row. */
  async insert(transaction: DatabaseTransaction): Promise<void> {
    for (const table of tables) {
      const rows = this.rows.get(table)!;
      const size = Math.max(1, Math.floor(valuesAtOnce / Object.keys(rows[0] ?? {}).length));
      for (let from = 0; from < rows.length; from += size) {
        await transaction
          .insertInto(table)
          .values(rows.slice(from, from + size) as never)
          .execute();
      }
    }
  }
}
