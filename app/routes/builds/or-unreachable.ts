import type { SheetAnswer } from "~/components/sheet/use-sender";

/** A server that does not answer must not cost what was typed: the sheet keeps it and sends it again. */
export async function orUnreachable<T>(answer: Promise<T>): Promise<T | SheetAnswer> {
  try {
    return await answer;
  } catch (error) {
    // `fetch` rejects with a TypeError when no answer comes; anything else is the server's own word.
    if (error instanceof TypeError) return { unreachable: true };
    throw error;
  }
}
