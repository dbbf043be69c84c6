import { isRouteErrorResponse } from "react-router";
import type { SheetAnswer } from "~/components/sheet/use-sender";

/** A server that does not answer must not cost what was typed: the sheet keeps it and sends it again. */
export async function orUnreachable<T>(answer: Promise<T>): Promise<T | SheetAnswer> {
  try {
    return await answer;
  } catch (error) {
    // `fetch` rejects with a TypeError when no answer comes; 503 and 507 are a server that cannot write just now.
    const cannotWrite = isRouteErrorResponse(error) && (error.status === 503 || error.status === 507);
    if (error instanceof TypeError || cannotWrite) return { unreachable: true };
    throw error;
  }
}
