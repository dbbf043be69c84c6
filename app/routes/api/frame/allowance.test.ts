import { describe, expect, it } from "vitest";
import { callsPerMinute, countCall } from "./allowance.server";

describe("the allowance of a token", () => {
  const start = Date.UTC(2026, 4, 30);

  it("is a minute's calls at once, then 429 with the wait until the next one", () => {
    for (let call = 0; call < callsPerMinute; call++) countCall("busy", start);
    expect(() => countCall("busy", start)).toThrow(
      expect.objectContaining({ status: 429, more: { headers: { "Retry-After": "1" } } }),
    );
  });

  it("fills up evenly, to a minute's calls and no more", () => {
    const tenSeconds = 10_000;
    for (let call = 0; call < callsPerMinute / 6; call++) countCall("busy", start + tenSeconds);
    expect(() => countCall("busy", start + tenSeconds)).toThrow();
    const nextDay = start + 86_400_000;
    for (let call = 0; call < callsPerMinute; call++) countCall("busy", nextDay);
    expect(() => countCall("busy", nextDay)).toThrow();
  });

  it("is each token's own, however many there are", () => {
    for (let token = 0; token < 3000; token++) countCall(`token ${token}`, start + token);
    expect(() => countCall("idle", start + 3000)).not.toThrow();
  });
});
