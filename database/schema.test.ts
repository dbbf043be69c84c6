import { sql } from "kysely";
import { afterAll, beforeAll, expect, test } from "vitest";
import { type Database, openDatabase } from "./connection";
import { migrate } from "./migrate";

let database: Database;

beforeAll(async () => {
  database = openDatabase(":memory:");
  await migrate(database);
});

afterAll(() => database.destroy());

interface Column {
  name: string;
  type: string;
  notnull: number;
}

async function tables(): Promise<{ name: string; sql: string }[]> {
  const result = await sql<{ name: string; sql: string }>`
    SELECT name, sql FROM sqlite_master
    WHERE type = 'table' AND name NOT LIKE 'sqlite_%' AND name NOT LIKE 'kysely_%'`.execute(database);
  return result.rows;
}

async function columns(table: string): Promise<Column[]> {
  const result = await sql<Column>`SELECT name, type, "notnull" FROM pragma_table_info(${table})`.execute(
    database,
  );
  return result.rows;
}

test("every table is STRICT, named in whole lower-case words, with a text id", async () => {
  const all = await tables();
  expect(all.length).toBeGreaterThanOrEqual(22);
  for (const table of all) {
    expect(table.sql, table.name).toMatch(/\) STRICT$/);
    expect(table.name).toMatch(/^[a-z]+(_[a-z]+)*$/);
    expect((await columns(table.name))[0], table.name).toMatchObject({ name: "id", type: "TEXT" });
  }
});

test("a row of a shop says which shop", async () => {
  const ofNoShop = new Set(["shop", "person", "session", "sign_in_attempt"]);
  for (const table of await tables()) {
    const shopId = (await columns(table.name)).find((column) => column.name === "shop_id");
    if (ofNoShop.has(table.name)) continue;
    expect(shopId, table.name).toMatchObject({ type: "TEXT", notnull: 1 });
  }
});

test("a length in picometres is an integer with what was typed beside it", async () => {
  // Computed lengths were never typed: a proposal's, a target's, the shop's largest step; a reading's box has one value.
  const computed = new Set(["target", "proposal", "shop", "reading"]);
  for (const table of await tables()) {
    const all = await columns(table.name);
    for (const column of all.filter(({ name }) => name.endsWith("_pm"))) {
      expect(column.type, `${table.name}.${column.name}`).toBe("INTEGER");
      if (computed.has(table.name)) continue;
      const typed = all.find(({ name }) => name === column.name.replace(/_pm$/, "_typed"));
      expect(typed, `${table.name}.${column.name}`).toBeDefined();
    }
  }
});

test("instants end in _at, days in _on, JSON in _json, and each reference is a real foreign key", async () => {
  const foreignKeys = await sql<{ table: string; from: string }>`
    SELECT m.name AS "table", f."from" AS "from" FROM sqlite_master m, pragma_foreign_key_list(m.name) f
    WHERE m.type = 'table'`.execute(database);
  const known = new Set(foreignKeys.rows.map((row) => `${row.table}.${row.from}`));
  for (const table of await tables()) {
    for (const column of await columns(table.name)) {
      expect(column.name).toMatch(/^[a-z0-9]+(_[a-z0-9]+)*$/);
      // `subject_id` names a row of whichever table `subject_kind` says, so no foreign key can hold it.
      if (column.name.endsWith("_id") && column.name !== "subject_id") {
        expect(known, `${table.name}.${column.name}`).toContain(`${table.name}.${column.name}`);
      }
      if (/_(at|on|json)$/.test(column.name))
        expect(column.type, `${table.name}.${column.name}`).toBe("TEXT");
    }
  }
});

test("every foreign key that a query follows has an index", async () => {
  const unindexed = await sql<{ table: string; from: string }>`
    SELECT m.name AS "table", f."from" AS "from" FROM sqlite_master m, pragma_foreign_key_list(m.name) f
    WHERE m.type = 'table' AND f."from" IN ('engine_id', 'build_id', 'fit_id', 'proposal_id', 'supersedes_id')
      AND NOT EXISTS (
        SELECT 1 FROM pragma_index_list(m.name) l, pragma_index_info(l.name) i WHERE i.name = f."from"
      )`.execute(database);
  expect(unindexed.rows).toEqual([]);
});

test("facts are append-only even for raw SQL", async () => {
  const triggers = await sql<{ name: string }>`SELECT name FROM sqlite_master WHERE type = 'trigger'`.execute(
    database,
  );
  const names = triggers.rows.map((row) => row.name);
  for (const table of [
    "reading",
    "finding",
    "run",
    "target",
    "proposal",
    "sign_off",
    "sheet_signature",
    "history",
  ]) {
    expect(names).toContain(`${table}_never_updated`);
    expect(names).toContain(`${table}_never_deleted`);
  }
});

test("a database of a newer program is refused", async () => {
  const newer = openDatabase(":memory:");
  await migrate(newer);
  await sql`INSERT INTO kysely_migration (name, timestamp) VALUES ('9999-from-the-future', '2099')`.execute(
    newer,
  );
  await expect(migrate(newer)).rejects.toThrow(/newer Tenthbook/);
  await newer.destroy();
});
