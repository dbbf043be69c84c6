import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import { renderToPipeableStream } from "react-dom/server";
import {
  type EntryContext,
  type HandleErrorFunction,
  type RouterContextProvider,
  ServerRouter,
} from "react-router";
import { configuration } from "#database/configuration";
import { nonceContext, referenceContext } from "~/access/who.server";
import { logError } from "~/services/error-log.server";

/** How long a page may take to render before it is given up. */
export const streamTimeout = 10_000;

export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  entry: EntryContext,
  context: RouterContextProvider,
): Promise<Response> {
  const nonce = context.get(nonceContext);
  setSecurityHeaders(headers, nonce);
  return new Promise((resolve, reject) => {
    let answer = status;
    let begun = false;
    // Robots take the whole page at once; people get it as soon as its shell stands.
    const ready = isbot(request.headers.get("user-agent")) || entry.isSpaMode ? "onAllReady" : "onShellReady";
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={entry} url={request.url} nonce={nonce} />,
      {
        nonce,
        [ready]() {
          begun = true;
          const body = new PassThrough();
          headers.set("Content-Type", "text/html; charset=utf-8");
          resolve(new Response(createReadableStreamFromReadable(body), { headers, status: answer }));
          pipe(body);
        },
        onShellError: reject,
        onError(error: unknown) {
          answer = 500;
          if (begun) logError(context.get(referenceContext), request, error);
        },
      },
    );
    setTimeout(abort, streamTimeout + 1000);
  });
}

function setSecurityHeaders(headers: Headers, nonce: string): void {
  const policy = [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}'`,
    // React writes style attributes (drawings' sizes); a style cannot run anything.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ];
  headers.set("Content-Security-Policy", policy.join("; "));
  headers.set("X-Content-Type-Options", "nosniff");
  headers.set("Referrer-Policy", "same-origin");
  headers.set("Cross-Origin-Opener-Policy", "same-origin");
  headers.set("Cache-Control", "no-store");
  if (configuration().baseUrl?.startsWith("https:")) {
    headers.set("Strict-Transport-Security", "max-age=31536000; includeSubDomains");
  }
}

/** Writes an error of the program to the log, under the reference number that the person sees. */
export const handleError: HandleErrorFunction = (error, { request, context }) => {
  if (!request.signal.aborted) logError(context.get(referenceContext), request, error);
};
