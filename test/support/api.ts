import { expect } from "vitest";
import { endpoints } from "~/routes/api/endpoints";
import { answerCall } from "~/routes/api/frame/answer.server";

/** An answer of the API, its JSON read. */
export interface ApiAnswer {
  status: number;
  headers: Headers;
  // biome-ignore lint/suspicious/noExplicitAny: a test reads the fields it expects, and fails where they are not there
  body: any;
}

interface Sent {
  /** Sent as JSON; text is sent as it is. */
  body?: unknown;
  headers?: Record<string, string>;
}

/** Calls the API as a script with this token would, or without one. */
export function apiCaller(token?: string) {
  return async (method: string, path: string, { body, headers }: Sent = {}): Promise<ApiAnswer> => {
    const request = new Request(`http://localhost/api/v1${path}`, {
      method,
      headers: {
        ...(token === undefined ? {} : { Authorization: `Bearer ${token}` }),
        ...(body === undefined ? {} : { "Content-Type": "application/json" }),
        ...headers,
      },
      ...(body === undefined ? {} : { body: typeof body === "string" ? body : JSON.stringify(body) }),
    });
    const response = await answerCall(endpoints, request);
    const text = await response.text();
    return { status: response.status, headers: response.headers, body: text ? JSON.parse(text) : undefined };
  };
}

export type ApiCaller = ReturnType<typeof apiCaller>;

/** The calculators as a script with this token uses them. */
export function calculators(token: string) {
  const call = apiCaller(token);
  return {
    /** The answer to a body that must be taken. */
    calculate: async (path: string, body: unknown) => {
      const { status, body: answer } = await call("POST", `/calc/${path}`, { body });
      expect([status, answer.errors]).toEqual([200, undefined]);
      return answer;
    },
    /** The errors of a body that must be refused. */
    refused: async (path: string, body: unknown) => {
      const { status, body: answer } = await call("POST", `/calc/${path}`, { body });
      expect(status).toBe(422);
      return answer.errors as { path: string; code: string; message: string }[];
    },
  };
}

export type Calculators = ReturnType<typeof calculators>;
