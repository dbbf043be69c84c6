import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { type BrowserContext, chromium, type Page } from "playwright-core";
import { demoPassword } from "#database/demo/people";

/** A browser of its own with a new profile; every console error of its pages is kept. */
export interface TestBrowser {
  context: BrowserContext;
  errors: string[];
  close: () => Promise<void>;
}

/** Starts Debian's Chromium, headless, with nothing that reaches for the network. */
export async function openBrowser(
  options: { javaScript?: boolean; width?: number; height?: number; dark?: boolean } = {},
): Promise<TestBrowser> {
  const profile = mkdtempSync(join(tmpdir(), "tenthbook-profile-"));
  const context = await chromium.launchPersistentContext(profile, {
    executablePath: process.env.CHROMIUM ?? "/usr/bin/chromium",
    headless: true,
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
    viewport: { width: options.width ?? 1280, height: options.height ?? 900 },
    javaScriptEnabled: options.javaScript ?? true,
    colorScheme: options.dark ? "dark" : "light",
  });
  const errors: string[] = [];
  const watch = (page: Page) => {
    page.on("console", (message) => {
      if (message.type() === "error") errors.push(message.text());
    });
    page.on("pageerror", (error) => errors.push(error.message));
  };
  for (const page of context.pages()) watch(page);
  context.on("page", watch);
  const close = async () => {
    await context.close();
    rmSync(profile, { recursive: true, force: true });
  };
  return { context, errors, close };
}

/** Signs one of the demo's people in and waits for their bench. */
export async function signIn(
  page: Page,
  address: string,
  email: string,
  password = demoPassword,
): Promise<void> {
  await page.goto(`${address}/sign-in`);
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL(`${address}/`);
}
