import type { MiddlewareFunction } from "react-router";
import { configuration } from "#database/configuration";

const harmless = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Refuses a change that another site's page sent with this person's cookie.
 * The framework's own check lets a request without `Origin` pass and skips resource routes; this one does neither.
 * The JSON API takes no cookie, only a token, and is not asked.
 */
export const guardOrigin: MiddlewareFunction<Response> = async ({ request }) => {
  if (harmless.has(request.method) || new URL(request.url).pathname.startsWith("/api/v1/")) return;
  const origin = request.headers.get("Origin");
  const ours = configuration().baseUrl ? new URL(configuration().baseUrl as string).origin : undefined;
  const sameHost =
    origin !== null && origin !== "null" && URL.canParse(origin) && isOurs(new URL(origin), request, ours);
  if (!sameHost) {
    throw new Response("This was not sent from a page of Tenthbook. Load the page again and repeat it.", {
      status: 403,
      headers: { "Content-Type": "text/plain; charset=utf-8" },
    });
  }
};

function isOurs(origin: URL, request: Request, ours: string | undefined): boolean {
  return ours ? origin.origin === ours : origin.host === new URL(request.url).host;
}
