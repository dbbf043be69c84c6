import { z } from "zod";
import { notValid } from "./problem.server";

/** The query of a list that is given in parts. */
export const pageQuery = {
  cursor: z.string().max(100).optional().meta({ description: "The `next` of the part before." }),
  limit: z.coerce.number().int().min(1).max(500).default(200),
};

interface Query {
  cursor?: string | undefined;
  limit: number;
}

/** A part of a list as it is answered; `next` is null with the last one. */
export const paged = <Item extends z.ZodType>(item: Item) =>
  z.object({ items: z.array(item), next: z.string().nullable() });

interface Page<Item> {
  items: Item[];
  next: string | null;
}

/** The part of a list that follows the cursor, the id of the last item given before. */
export function pageOf<Row extends { id: string }, Item>(
  rows: readonly Row[],
  { cursor, limit }: Query,
  answer: (row: Row) => Item,
): Page<Item> {
  const before = cursor === undefined ? -1 : rows.findIndex(({ id }) => id === cursor);
  if (cursor !== undefined && before === -1) {
    throw notValid([{ path: "cursor", code: "unknown-cursor", message: "This is no `next` of this list." }]);
  }
  return firstOf(rows.slice(before + 1), limit, answer);
}

/** The first part of the rows; `next` says whether there are more than these. */
export function firstOf<Row extends { id: string }, Item>(
  rows: readonly Row[],
  limit: number,
  answer: (row: Row) => Item,
): Page<Item> {
  const here = rows.slice(0, limit);
  return { items: here.map(answer), next: rows.length > limit ? here.at(-1)!.id : null };
}
