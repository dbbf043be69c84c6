import { randomBytes } from "node:crypto";
import { countCall } from "./allowance.server";
import { type Caller, findCaller, requirePermission, requireWriting } from "./bearer.server";
import { check } from "./check";
import { type Endpoint, writes } from "./endpoint";
import { findEndpoint } from "./find-endpoint";
import { answerHeaders } from "./headers";
import { type JsonAnswer, onlyOnce } from "./only-once.server";
import { asProblem, problemDetails, problemResponse } from "./problem.server";
import { sayIn } from "./quantity-out";
import { discardBody, readJson } from "./read-json";

/**
 * Answers a call of the API; whatever goes wrong in it is answered as a problem, never thrown.
 * @param reference the number under which the log has what nobody expected
 */
export async function answerCall(
  endpoints: readonly Endpoint[],
  request: Request,
  reference = randomBytes(4).toString("hex"),
): Promise<Response> {
  try {
    const { pathname, searchParams } = new URL(request.url);
    const found = findEndpoint(endpoints, request.method, pathname);
    if ("allowed" in found) return new Response(null, { status: 204, headers: { Allow: found.allowed } });
    const { endpoint, params } = found;
    if (endpoint.who === "everyone") return answered(await jsonOf(endpoint, endpoint.handle()));

    const caller = await findCaller(request);
    countCall(caller.token);
    requireRights(endpoint, caller);
    const query = check(endpoint.query, Object.fromEntries(searchParams));
    const sent = endpoint.body ? await readJson(request) : { value: undefined, text: "" };
    const body = endpoint.body && check(endpoint.body, sent.value);
    const say = sayIn(query.units);
    const { scope } = caller;
    const work = () =>
      jsonOf(endpoint, endpoint.handle({ scope, params, query, body, units: query.units, say }));
    if (!writes(endpoint)) return answered(await work());
    return answered(await onlyOnce(scope, request, sent.text, () => orRefusal(work, request, reference)));
  } catch (error) {
    return problemResponse(asProblem(error, request, reference));
  } finally {
    discardBody(request);
  }
}

function requireRights(endpoint: Endpoint, caller: Caller): void {
  if (writes(endpoint)) requireWriting(caller);
  if (endpoint.who !== "token" && endpoint.who !== "everyone") requirePermission(caller.scope, endpoint.who);
}

// The schema that describes an answer also makes it: a number that is none, or a field nobody described, cannot go out.
async function jsonOf(endpoint: Endpoint, given: unknown): Promise<JsonAnswer> {
  return { status: endpoint.status ?? 200, json: JSON.stringify(endpoint.answer.parse(await given)) };
}

// A refusal is an answer too, and the same request gets it again; a failure of the program is not.
async function orRefusal(work: () => Promise<JsonAnswer>, request: Request, reference: string) {
  try {
    return await work();
  } catch (error) {
    const problem = asProblem(error, request, reference);
    if (problem.status >= 500) throw problem;
    return { status: problem.status, json: JSON.stringify(problemDetails(problem)) };
  }
}

function answered({ status, json }: JsonAnswer): Response {
  const type = status < 400 ? "application/json" : "application/problem+json";
  return new Response(json, { status, headers: { ...answerHeaders, "Content-Type": type } });
}
