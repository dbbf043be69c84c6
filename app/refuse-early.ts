import type { IncomingMessage, ServerResponse } from "node:http";

const methods = new Set(["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"]);

/** A form of the product is far below this; files get a route of their own when there are any. */
const largestForm = 2 * 1024 * 1024;

/**
 * Answers what must not reach the framework's listener, which keeps a body of any size and has no word for some
 * methods. The API reads its bodies with a limit of its own; a browser's form always says its length.
 * @returns true where the request is answered
 */
export function refuseEarly(request: IncomingMessage, response: ServerResponse): boolean {
  if (!methods.has(request.method ?? "")) return answer(response, 501, "This method is not known here.");
  if (request.url?.startsWith("/api/v1/") || request.method === "GET" || request.method === "HEAD")
    return false;
  const length = request.headers["content-length"];
  if (request.headers["transfer-encoding"] !== undefined) {
    return answer(response, 411, "Say how long the form is (Content-Length).");
  }
  if (Number(length ?? 0) > largestForm)
    return answer(response, 413, "This form is larger than any of ours.");
  return false;
}

function answer(response: ServerResponse, status: number, sentence: string): true {
  // The rest of the body is not read; the connection ends with the answer.
  response.writeHead(status, { "Content-Type": "text/plain; charset=utf-8", Connection: "close" });
  response.end(sentence);
  return true;
}
