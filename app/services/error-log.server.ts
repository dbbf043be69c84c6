/** Writes an error of the program to the log, under the reference number that the person sees. */
export function logError(reference: string, request: Request, error: unknown): void {
  const { pathname } = new URL(request.url);
  console.error(`[${reference}] ${request.method} ${pathname}`, error);
}

/**
 * What an error of the machine under the program means to a person, in a sentence; undefined for any other.
 * The codes are SQLite's result codes, https://www.sqlite.org/rescode.html
 */
export function machineTrouble(error: unknown): { status: number; sentence: string } | undefined {
  const code = error instanceof Error && "code" in error ? String(error.code) : "";
  const trouble = troubles.find(({ codes }) => codes.some((prefix) => code.startsWith(prefix)));
  return trouble && { status: trouble.status, sentence: trouble.sentence };
}

const troubles = [
  {
    codes: ["SQLITE_FULL", "ENOSPC"],
    status: 507,
    sentence: "The disk of this installation is full: this was not saved. What was saved before is safe.",
  },
  {
    codes: ["SQLITE_CORRUPT", "SQLITE_NOTADB", "SQLITE_CANTOPEN", "SQLITE_IOERR"],
    status: 503,
    sentence:
      "The logbook's file cannot be read. The owner of this installation has to look at it before anyone goes on.",
  },
  {
    codes: ["SQLITE_READONLY", "EROFS", "EACCES"],
    status: 503,
    sentence: "The logbook's file may not be written to: this was not saved.",
  },
  {
    codes: ["SQLITE_BUSY"],
    status: 503,
    sentence: "Another program holds the logbook's file: this was not saved. Try again in a moment.",
  },
];
