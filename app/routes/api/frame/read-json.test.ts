import { describe, expect, it } from "vitest";
import { discardBody, mostBytes, readJson } from "./read-json";

/** A request whose body comes in parts of 100 kB, as from a client that goes on sending; tells what became of it. */
function sending(parts: number) {
  const sent = { parts: 0, cancelled: false };
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (sent.parts === parts) return controller.close();
      sent.parts += 1;
      controller.enqueue(new TextEncoder().encode(" ".repeat(100_000)));
    },
    cancel() {
      sent.cancelled = true;
    },
  });
  const headers = { "Content-Type": "application/json" };
  const init = { method: "POST", headers, body, duplex: "half" };
  return { request: new Request("http://localhost/", init as RequestInit), sent };
}

describe("reading JSON", () => {
  it("gives the value and the text it stood in", async () => {
    const headers = { "Content-Type": "application/json" };
    const request = new Request("http://localhost/", { method: "POST", headers, body: ' {"µ": [1]}' });
    expect(await readJson(request)).toEqual({ value: { µ: [1] }, text: ' {"µ": [1]}' });
  });

  it("refuses bytes that are no UTF-8", async () => {
    const headers = { "Content-Type": "application/json" };
    const body = new Uint8Array([0x22, 0xff, 0x22]);
    const request = new Request("http://localhost/", { method: "POST", headers, body });
    await expect(readJson(request)).rejects.toMatchObject({ status: 400, code: "not-utf-8" });
  });

  it("stops keeping a body once it is too large, though its length was not declared", async () => {
    const { request, sent } = sending(1000);
    await expect(readJson(request)).rejects.toMatchObject({ status: 413 });
    expect(sent.parts).toBeLessThan(mostBytes / 100_000 + 5);
    expect(sent.cancelled).toBe(false);
  });

  it("drops the rest of a body to its end, without cancelling it", async () => {
    const { request, sent } = sending(50);
    await readJson(request).catch(() => undefined);
    discardBody(request);
    await expect.poll(() => sent.parts).toBe(50);
    expect(sent.cancelled).toBe(false);
  });
});
