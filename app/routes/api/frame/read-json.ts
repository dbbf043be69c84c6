import { Problem } from "./problem.server";

/** The largest body the API reads: a sheet of a thousand readings takes a fifth of it. */
export const mostBytes = 1_000_000;

/**
 * The JSON of a request's body.
 * @returns the value, and the text it was read from
 * @throws Problem 415 where it is not declared as JSON, 413 where it is too large, 400 where it is not JSON
 */
export async function readJson(request: Request): Promise<{ value: unknown; text: string }> {
  refuseOtherThanJson(request.headers);
  const text = await readText(request);
  try {
    return { value: JSON.parse(text), text };
  } catch (error) {
    const where = error instanceof SyntaxError ? error.message : "it cannot be parsed";
    throw new Problem(400, "broken-json", `The body is not JSON: ${where.slice(0, 200)}.`);
  }
}

function refuseOtherThanJson(headers: Headers): void {
  const [type, ...parameters] = (headers.get("Content-Type") ?? "").toLowerCase().split(";");
  const charset = parameters.map((parameter) => parameter.trim()).find((one) => one.startsWith("charset="));
  const isUtf8 = charset === undefined || /^charset="?utf-8"?$/.test(charset);
  if (type?.trim() === "application/json" && isUtf8 && !headers.has("Content-Encoding")) return;
  throw new Problem(415, "not-json", "Send the body as application/json in UTF-8, not compressed.", {
    headers: { Accept: "application/json" },
  });
}

// Counted as it comes in: the length that a request declares need not be the length that it has.
async function readText(request: Request): Promise<string> {
  if (Number(request.headers.get("Content-Length")) > mostBytes) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  const reader = request.body?.getReader();
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    bytes += part.value.byteLength;
    if (bytes > mostBytes) {
      reader?.releaseLock();
      throw tooLarge();
    }
    chunks.push(part.value);
  }
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(chunks));
  } catch {
    throw new Problem(400, "not-utf-8", "The body is not UTF-8 text.");
  }
}

function tooLarge(): Problem {
  return new Problem(413, "too-large", `A body has at most ${mostBytes / 1_000_000} MB. Send it in parts.`);
}

/**
 * Reads what nobody wants of a body to its end and drops it. The framework's adapter keeps all that is not read, and
 * brings the process down where a stream is cancelled that its client still sends to.
 */
export function discardBody({ body }: Request): void {
  // A client that breaks off is no matter of ours any more.
  if (body && !body.locked) body.pipeTo(new WritableStream()).catch(() => {});
}
