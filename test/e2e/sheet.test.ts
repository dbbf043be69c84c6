import { afterAll, beforeAll, expect, test } from "vitest";
import { openBrowser, signIn } from "#test/support/browser";
import { type RunningServer, startServer } from "#test/support/server";

let server: RunningServer;

beforeAll(async () => {
  server = await startServer();
});

afterAll(() => server?.stop());

test("what is typed while the server is away waits, says so, and is there once it is back", async () => {
  const browser = await openBrowser();
  try {
    const page = await browser.context.newPage();
    await signIn(page, server.address, "builder@example.test");
    await page.getByRole("link", { name: "Go on measuring" }).click();
    await page.getByRole("heading", { name: /build 8/ }).waitFor();
    // The last fit of the half-filled sheet is the one that is still empty.
    await page.getByRole("link", { name: /^Exhaust valve stems/ }).click();
    await page.getByRole("heading", { name: /exhaust valve stems/ }).waitFor();
    await page.context().setOffline(true);
    await page
      .getByRole("row", { name: /^Exhaust 1\b/ })
      .locator("input")
      .first()
      .click();
    for (const value of ["0.2776", "0.2777", "0.2776"]) {
      await page.keyboard.type(value);
      await page.keyboard.press("Enter");
    }
    await page.getByText("The server cannot save just now: 3 waiting").waitFor();
    expect(await page.getByText("All saved").count()).toBe(0);
    await page.context().setOffline(false);
    await page.getByText("All saved").waitFor();
    await page.reload();
    const boxes = page.getByRole("row", { name: /^Exhaust 1\b/ }).locator("input");
    expect([
      await boxes.nth(0).inputValue(),
      await boxes.nth(1).inputValue(),
      await boxes.nth(2).inputValue(),
    ]).toEqual(["0.2776", "0.2777", "0.2776"]);
  } finally {
    await browser.close();
  }
});
