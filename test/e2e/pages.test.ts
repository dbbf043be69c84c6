import axe from "axe-core";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { openBrowser, signIn } from "#test/support/browser";
import { type RunningServer, startServer } from "#test/support/server";

let server: RunningServer;

beforeAll(async () => {
  server = await startServer();
});

afterAll(() => server?.stop());

/** A small study: two parts, two people, two trials. */
const studyLines = ["1 A 1 2.1001", "1 A 2 2.1002", "2 A 1 2.1011", "2 A 2 2.1012"]
  .concat(["1 B 1 2.1002", "1 B 2 2.1002", "2 B 1 2.1012", "2 B 2 2.1013"])
  .join("\n");

/** The addresses of every page, those of an engine by the demo's own links. */
async function addresses(page: Page): Promise<string[]> {
  const hrefs = (selector: string) =>
    page.locator(selector).evaluateAll((links) => links.map((link) => link.getAttribute("href") as string));
  await page.goto(`${server.address}/engines`);
  await page.getByRole("link", { name: "Engine 12" }).click();
  await page.getByRole("heading", { name: "Engine 12" }).waitFor();
  const engine = new URL(page.url()).pathname;
  const [fit] = await hrefs('a[href*="/fits/"]');
  const [build] = await hrefs('nav[aria-label="The ladder"] a');
  await page.goto(`${server.address}/engines`);
  await page.getByRole("link", { name: "Engine 4" }).click();
  await page.getByRole("heading", { name: "Engine 4" }).waitFor();
  const [inHand] = await hrefs('nav[aria-label="The ladder"] a');
  return [
    "/",
    "/engines",
    "/engines/new",
    engine,
    fit!,
    build!,
    `${build}/sheet`,
    `${inHand}/sheet`,
    `${build}/runs`,
    `${build}/teardown`,
    `${build}/review`,
    "/oils",
    "/oils/new",
    "/gauges",
    "/gauges/new",
    "/calculators",
    "/calculators/units?quantity=2.1000+in",
    "/calculators/clearance?bore-front-vertical=2.1025&journal-front-a=53.34+mm",
    "/calculators/oil?kv40=100&kv100=11",
    "/calculators/film?diameter=1.5&length=1.5&clearance=.003&speed=1800&load=500+lbf&viscosity=27.579&boreRoughness=12&journalRoughness=8",
    "/calculators/cycle?bore=4.125&stroke=3.25&rodLength=6&reciprocatingMass=620&rotatingMass=480&speed=8500&peakPressure=95&diameter=2.1&length=.85&clearance=.0025&viscosity=9",
    "/calculators/map?diameter=2.1&length=.85&clearanceFrom=.0015&clearanceTo=.003&viscosityFrom=6&viscosityTo=15&speed=7200&load=12000&boreRoughness=12&journalRoughness=4",
    `/calculators/gauge-study?readings=${encodeURIComponent(studyLines)}`,
    "/shop",
    "/account",
    "/api",
  ];
}

/** What axe finds against WCAG 2.2 AA, target sizes with it: each as its rule and the element. */
async function violations(page: Page): Promise<string[]> {
  // The page's policy lets no other script in, and this one is the test's own, put in from outside the page.
  await page.evaluate(axe.source);
  return page.evaluate(async () => {
    const checker = (window as unknown as { axe: typeof axe }).axe;
    const found = await checker.run(document, {
      runOnly: ["wcag2a", "wcag2aa", "wcag21aa", "wcag22aa"],
      rules: { "target-size": { enabled: true } },
    });
    return found.violations.flatMap(({ id, nodes }) =>
      nodes.map((node) => `${id}: ${node.html.slice(0, 160)}`),
    );
  });
}

test.each([
  [1280, "light"],
  [1280, "dark"],
  [820, "light"],
  [820, "dark"],
] as const)(
  "every page at %d px, %s: no violation, no overflow, no error",
  { timeout: 300_000 },
  async (width, theme) => {
    const browser = await openBrowser({ width, dark: theme === "dark" });
    try {
      const page = await browser.context.newPage();
      await signIn(page, server.address, "owner@example.test");
      for (const path of await addresses(page)) {
        const response = await page.goto(server.address + path, { waitUntil: "load" });
        expect(response?.status(), path).toBe(200);
        expect(await violations(page), path).toEqual([]);
        expect(await page.evaluate(() => document.documentElement.scrollWidth), path).toBeLessThanOrEqual(
          width,
        );
        expect(await page.title(), path).toMatch(/Tenthbook$/);
      }
      expect(browser.errors).toEqual([]);
    } finally {
      await browser.close();
    }
  },
);

test("pages arrive rendered: without script they say the same, and the sheet is a form", async () => {
  const browser = await openBrowser({ javaScript: false });
  try {
    const page = await browser.context.newPage();
    await signIn(page, server.address, "builder@example.test");
    await page.getByRole("link", { name: "Go on measuring" }).click();
    await page.getByRole("button", { name: "Save the sheet" }).waitFor();
    expect(await page.getByRole("textbox", { name: /^Main 1, bore, front 90°/ }).inputValue()).toMatch(
      /^\d\.\d+$/,
    );
    expect(browser.errors).toEqual([]);
  } finally {
    await browser.close();
  }
});
