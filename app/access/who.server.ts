import { randomBytes } from "node:crypto";
import {
  createContext,
  data,
  type MiddlewareFunction,
  type RouterContextProvider,
  redirect,
} from "react-router";
import { findPersonInShop, type Person } from "~/models/person.server";
import type { Scope } from "~/models/scope";
import { logError, machineTrouble } from "~/services/error-log.server";
import { sessions } from "~/services/session.server";
import { may, type Permission } from "./permissions";

/** The signed-in person of this request, or nobody. Set once by the root's middleware. */
export const whoContext = createContext<Person | null>(null);

/** The address a request came from, set by the server. */
export const addressContext = createContext<string>("unknown");

/** The nonce that this response's inline scripts carry. */
export const nonceContext = createContext<string>("");

/** The number under which the log has whatever goes wrong in this request. */
export const referenceContext = createContext<string>("");

/** Gives a request its nonce and its reference number. */
export const markRequest: MiddlewareFunction<Response> = ({ context }) => {
  context.set(nonceContext, randomBytes(16).toString("base64"));
  context.set(referenceContext, randomBytes(4).toString("hex"));
};

/** Finds who asks, for every request that reaches a loader or an action. */
export const findWho: MiddlewareFunction<Response> = async ({ request, context }) => {
  try {
    const session = await sessions().getSession(request.headers.get("Cookie"));
    const personId = session.get("personId");
    const shopId = session.get("shopId");
    if (personId && shopId) context.set(whoContext, (await findPersonInShop(personId, shopId)) ?? null);
  } catch (error) {
    // Without its database the program can do nothing; the person is told so instead of being signed out.
    const trouble = machineTrouble(error);
    if (!trouble) throw error;
    logError(context.get(referenceContext), request, error);
    throw data(`${trouble.sentence} (Reference ${context.get(referenceContext)}.)`, {
      status: trouble.status,
    });
  }
};

interface Asked {
  request: Request;
  context: Readonly<RouterContextProvider>;
}

/** Everyone signed in; a stranger is sent to sign in, with the way back. */
export function requireSignedIn({ request, context }: Asked): { person: Person; scope: Scope } {
  const person = context.get(whoContext);
  if (!person) {
    const url = new URL(request.url);
    // A form sent without a session comes back to the page it stood on, not to a URL that only takes posts.
    const back =
      request.method === "GET"
        ? url.pathname.replace(/\.data$/, "").replace(/^\/_root$/, "/") + withoutRoutes(url)
        : "/";
    throw redirect(back === "/" ? "/sign-in" : `/sign-in?back=${encodeURIComponent(back)}`);
  }
  return { person, scope: { shopId: person.shopId, personId: person.id, role: person.role } };
}

// `_routes` is how the framework asks for some loaders only; it is not part of the address a person sees.
function withoutRoutes(url: URL): string {
  url.searchParams.delete("_routes");
  return url.search;
}

/** A person who may do this; anyone else signed in gets 403. Which rows they may touch is for the model to say. */
export function requirePerson(asked: Asked, permission: Permission): { person: Person; scope: Scope } {
  const known = requireSignedIn(asked);
  if (!may(known.person.role, permission)) {
    throw data("Your role in this shop does not allow this.", { status: 403 });
  }
  return known;
}
