import { v7 } from "uuid";

/** A new row's id: a version 7 UUID in hex without hyphens, so that ids sort by the time they were made. */
export function newId(): string {
  return v7().replaceAll("-", "");
}

/** An instant as the database keeps it: UTC, ISO 8601, milliseconds. */
export function instant(at: Date = new Date()): string {
  return at.toISOString();
}
