import type { Endpoint } from "./endpoint";
import { Problem } from "./problem.server";

/** Where the API begins. */
export const apiRoot = "/api/v1";

type Found = { endpoint: Endpoint; params: Record<string, string> } | { allowed: string };

/**
 * The endpoint of a method and an address, with the address's parts that its path names;
 * for OPTIONS the methods that the address takes.
 * @throws Problem 404 where no endpoint has this address, 405 with `Allow` where none has this method there
 */
export function findEndpoint(endpoints: readonly Endpoint[], method: string, pathname: string): Found {
  const here = endpoints.flatMap((endpoint) => {
    const match = patternOf(endpoint.path).exec(pathname);
    return match ? [{ endpoint, params: { ...match.groups } }] : [];
  });
  if (here.length === 0) throw new Problem(404, "no-such-call", `The API has no ${pathname.slice(0, 200)}.`);
  const allowed = allowedMethods(here.map(({ endpoint }) => endpoint.method));
  if (method === "OPTIONS") return { allowed };
  const wanted = method === "HEAD" ? "GET" : method;
  const found = here.find(({ endpoint }) => endpoint.method === wanted);
  if (found) return found;
  throw new Problem(405, "method-not-allowed", `${method} is not possible here, only ${allowed}.`, {
    headers: { Allow: allowed },
  });
}

const allowedMethods = (methods: string[]) =>
  [
    ...(methods.includes("GET") ? ["GET", "HEAD"] : []),
    ...methods.filter((one) => one !== "GET"),
    "OPTIONS",
  ].join(", ");

const patterns = new Map<string, RegExp>();

function patternOf(path: string): RegExp {
  let pattern = patterns.get(path);
  if (!pattern) {
    const source = path.replaceAll(".", "\\.").replace(/\{(\w+)\}/g, "(?<$1>[^/]+)");
    pattern = new RegExp(`^${apiRoot}${source}/?$`);
    patterns.set(path, pattern);
  }
  return pattern;
}
