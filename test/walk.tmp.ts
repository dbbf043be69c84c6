import { openBrowser, signIn } from "./support/browser";
const A = process.env.A ?? "http://localhost:3111";
const [width, dark] = [Number(process.env.W ?? 1280), process.env.DARK === "1"];
const tag = `${width}${dark ? "d" : ""}`;
const b = await openBrowser({ width, dark, height: width > 1000 ? 900 : 1100 });
const page = await b.context.newPage();
const shot = async (n: string, path?: string) => {
  if (path) { const r = await page.goto(A + path); if ((r?.status() ?? 0) >= 400) console.log(n, path, r?.status()); }
  await page.waitForTimeout(150);
  await page.screenshot({ path: `/tmp/shots/${n}-${tag}.png`, fullPage: true });
  const w = await page.evaluate(() => document.documentElement.scrollWidth);
  if (w > width) console.log("OVERFLOW", n, w);
};
await signIn(page, A, process.env.WHO ?? "owner@example.test");
await shot("bench", "/");
await shot("engines", "/engines");
const eng = await page.getByRole("link", { name: "Engine 12" }).first().getAttribute("href");
await shot("engine", eng!);
const fit = await page.locator(`a[href*="/fits/"]`).nth(1).getAttribute("href");
await shot("fit", fit!);
await page.goto(A + eng!);
const builds = await page.locator(`a[href^="/builds/"]`).evaluateAll((l) => l.map((a) => a.getAttribute("href")));
const last = builds[0]!;
await shot("build", last);
await shot("sheet", last + "/sheet");
await shot("runs", last + "/runs");
for (const e of ["Engine 12", "Engine 4", "Engine 9"]) {
  await page.goto(A + "/engines");
  const l = page.getByRole("link", { name: e, exact: true });
  if (!(await l.count())) continue;
  await l.click(); await page.waitForTimeout(300);
  const bs = await page.locator(`nav[aria-label="The ladder"] a`).evaluateAll((l) => l.map((a) => a.getAttribute("href")));
  const st = await page.locator("main").innerText();
  console.log(e, bs.length, st.split("\n").slice(0, 8).join(" | "));
  for (const bb of bs) { const t0 = Date.now(); const r = await page.goto(A + bb + "/review"); console.log(e, bb, r?.status(), Date.now() - t0, "ms"); if (r?.status() === 200) { await shot("review-" + e.replace(" ", ""), bb + "/review"); await shot("teardown-" + e.replace(" ", ""), bb + "/teardown"); break; } }
}
for (const p of ["oils", "gauges", "calculators", "shop", "account", "oils/new", "gauges/new", "engines/new", "calculators/units?quantity=2.1000+in", "calculators/clearance?bore-front-vertical=2.1025&journal-front-a=53.34+mm&boreTemperature=22&journalTemperature=22"]) await shot(p.replace(/[/?=+&].*/, "") + (p.includes("/") ? "-" + p.split(/[/?]/)[1] : ""), "/" + p);
console.log(b.errors);
await b.close();
