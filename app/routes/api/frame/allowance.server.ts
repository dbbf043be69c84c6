import { Problem } from "./problem.server";

/**
 * How many calls a token may make in a minute, and at once after a minute's rest: more than a gauge, a logger or a
 * script of a shop needs, and about what one process can answer, so that no token keeps the others out for long.
 */
export const callsPerMinute = 12_000;

interface Allowance {
  left: number;
  at: number;
}

const allowances = new Map<string, Allowance>();

/**
 * Counts a call against its token's allowance, which fills up evenly.
 * Kept in memory: the product is one process, and a restart only gives everyone a full allowance.
 * @throws Problem 429 with `Retry-After` where nothing is left
 */
export function countCall(token: string, now = Date.now()): void {
  const perMillisecond = callsPerMinute / 60_000;
  const known = allowances.get(token);
  const left = known
    ? Math.min(callsPerMinute, known.left + (now - known.at) * perMillisecond)
    : callsPerMinute;
  if (left < 1) {
    const seconds = Math.ceil((1 - left) / perMillisecond / 1000);
    throw new Problem(
      429,
      "too-many-calls",
      `More than ${callsPerMinute} calls a minute; wait ${seconds} s.`,
      {
        headers: { "Retry-After": String(seconds) },
      },
    );
  }
  allowances.set(token, { left: left - 1, at: now });
  if (allowances.size > 1000) forgetTheRested(now);
}

// A token that has rested for a minute has its full allowance again, which is what an unknown one has.
function forgetTheRested(now: number): void {
  for (const [token, { at }] of allowances) if (now - at > 60_000) allowances.delete(token);
}
