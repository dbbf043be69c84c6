import { permissions, roleNames } from "~/access/permissions";
import { endpoints } from "./endpoints";
import { callsPerMinute } from "./frame/allowance.server";
import type { Endpoint } from "./frame/endpoint";
import { type FieldLine, fieldsOf } from "./frame/fields";
import { operationId } from "./frame/openapi";
import { problemTitles } from "./frame/problem.server";
import { mostBytes } from "./frame/read-json";

/** A call as the page `/api` shows it. */
export interface CallDescription {
  id: string;
  method: string;
  path: string;
  title: string;
  about: string | undefined;
  who: string;
  query: FieldLine[];
  body: FieldLine[];
  example: string | undefined;
  status: number;
  answer: FieldLine[];
}

/** The calls of the API for people, from the objects that answer them; worked out once. */
export function describeCalls(): ReturnType<typeof workOut> {
  described ??= workOut();
  return described;
}

let described: ReturnType<typeof workOut> | undefined;

function workOut() {
  const of = (calculators: boolean) =>
    endpoints.filter(({ who }) => (who === "token") === calculators).map(describe);
  return {
    groups: [
      { title: "Calculators", calls: of(true) },
      { title: "The shop's own data", calls: of(false) },
    ],
    problems: Object.entries(problemTitles).map(([status, title]) => ({ status, title })),
    limits: { megabytes: mostBytes / 1_000_000, callsPerMinute },
  };
}

function describe(endpoint: Endpoint): CallDescription {
  return {
    id: operationId(endpoint),
    method: endpoint.method,
    path: endpoint.path,
    title: endpoint.title,
    about: endpoint.about,
    who: whoText(endpoint.who),
    query: endpoint.who === "everyone" ? [] : fieldsOf(endpoint.query, "input"),
    body: endpoint.body ? fieldsOf(endpoint.body, "input") : [],
    example: endpoint.example === undefined ? undefined : JSON.stringify(endpoint.example, null, 2),
    status: endpoint.status ?? 200,
    // Only some answers have fields that are known beforehand: the description of the API is not described in itself.
    answer: fieldsOf(endpoint.answer, "output"),
  };
}

function whoText(who: Endpoint["who"]): string {
  if (who === "everyone") return "Needs no token.";
  if (who === "token") return "Needs any token; nothing is stored.";
  return `For ${permissions[who].map((role) => roleNames[role].toLowerCase()).join(", ")}.`;
}
