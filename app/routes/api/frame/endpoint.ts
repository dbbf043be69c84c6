import { z } from "zod";
import type { Permission } from "~/access/permissions";
import type { Scope } from "~/models/scope";
import { type Say, type Units, unitsQuery } from "./quantity-out";

/** The names in braces of a path: `/builds/{build}/runs` has `build`. */
type Names<Path extends string> = Path extends `${string}{${infer Name}}${infer Rest}`
  ? Name | Names<Rest>
  : never;

type Shape = z.ZodRawShape;

/** What a call brings to its endpoint, all of it checked. */
export interface Call<Path extends string, Query extends Shape, Body extends z.ZodType> {
  scope: Scope;
  params: Record<Names<Path>, string>;
  query: z.output<z.ZodObject<Query>>;
  body: z.output<Body>;
  units: Units;
  /** A quantity as this caller's units show it. */
  say: Say;
}

interface Said<Path extends string, Body extends z.ZodType, Answer extends z.ZodType> {
  method: "GET" | "POST";
  /** Below `/api/v1`, as OpenAPI writes it: `/builds/{build}/runs`. */
  path: Path;
  /** What the call does, in a line. */
  title: string;
  /** What a caller should know besides the fields. */
  about?: string;
  body?: Body;
  answer: Answer;
  /** 200 where it is not given. */
  status?: 201;
  /** A body that is answered with `status`; the page and the OpenAPI document show it. */
  example?: z.input<Body>;
}

/** `everyone`; whoever has a `token`, for calls that keep nothing; or whose role has a permission. */
type Answering<Path extends string, Query extends Shape, Body extends z.ZodType, Answer extends z.ZodType> =
  | { who: "everyone"; handle: () => Promise<z.input<Answer>> }
  | {
      who: "token" | Permission;
      handle: (call: Call<Path, Query, Body>) => z.input<Answer> | Promise<z.input<Answer>>;
    };

/**
 * One call of the API: the object that its requests are checked against, its answers are made by,
 * and its OpenAPI description and its entry on the page `/api` are made from.
 */
export type Endpoint = Said<string, z.ZodType, z.ZodType> &
  Answering<string, Shape, z.ZodType, z.ZodType> & {
    /** With the units that every call can be asked for. */
    query: z.ZodObject<{ units: typeof unitsQuery }>;
  };

/** Defines a call; the types of its handler follow from its path and schemas. */
export function endpoint<
  Path extends string,
  Answer extends z.ZodType,
  Query extends Shape = Record<never, never>,
  Body extends z.ZodType = z.ZodUndefined,
>(definition: Said<Path, Body, Answer> & { query?: Query } & Answering<Path, Query, Body, Answer>): Endpoint {
  const query = z.strictObject({ ...definition.query, units: unitsQuery });
  return { ...definition, query } as unknown as Endpoint;
}

/** Whether a call writes to the shop's data; such a call needs a token that may write. */
export function writes(call: Pick<Endpoint, "method" | "who">): boolean {
  return call.method === "POST" && call.who !== "token";
}
