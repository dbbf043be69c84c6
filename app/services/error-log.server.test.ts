import { sql } from "kysely";
import { expect, test } from "vitest";
import { openDatabase } from "#database/connection";
import { machineTrouble } from "./error-log.server";

test("a full disk inside a transaction is told from any other error, though SQLite has rolled back by itself", async () => {
  const database = openDatabase(":memory:");
  await sql`CREATE TABLE page (content TEXT)`.execute(database);
  // A database that may not grow stands for a disk that is full: SQLite answers both with SQLITE_FULL.
  await sql`PRAGMA max_page_count = 4`.execute(database);
  const fill = database.transaction().execute(async (transaction) => {
    for (let row = 0; row < 100; row++) {
      await sql`INSERT INTO page VALUES (${"x".repeat(1000)})`.execute(transaction);
    }
  });
  const error = await fill.catch((caught: unknown) => caught);
  expect(machineTrouble(error)).toMatchObject({ status: 507 });
  expect(machineTrouble(error)?.sentence).toContain("this was not saved");
  await database.destroy();
});

test.each([
  ["SQLITE_CORRUPT", 503],
  ["SQLITE_IOERR_WRITE", 503],
  ["SQLITE_READONLY", 503],
  ["SQLITE_BUSY", 503],
  ["ENOSPC", 507],
])("%s is the machine's matter", (code, status) => {
  expect(machineTrouble(Object.assign(new Error("no"), { code }))?.status).toBe(status);
});

test("anything else is not", () => {
  expect(machineTrouble(new Error("no"))).toBeUndefined();
  expect(
    machineTrouble(Object.assign(new Error("no"), { code: "SQLITE_CONSTRAINT_UNIQUE" })),
  ).toBeUndefined();
});
