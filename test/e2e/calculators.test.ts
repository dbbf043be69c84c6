import { afterAll, beforeAll, expect, test } from "vitest";
import { demoPassword } from "#database/demo/people";
import { FormVisitor } from "#test/support/forms";
import { type RunningServer, startServer } from "#test/support/server";

let server: RunningServer;
let visitor: FormVisitor;

beforeAll(async () => {
  server = await startServer();
  visitor = new FormVisitor(server);
  await visitor.signIn("tuner@example.test", demoPassword);
});

afterAll(() => server?.stop());

/** The value of a row of a result, as the page says it before script. */
async function row(path: string, what: string): Promise<string | undefined> {
  const { status, text } = await visitor.open(path);
  expect(status, path).toBe(200);
  const cells = text.replaceAll("<!-- -->", "");
  return new RegExp(`<th scope="row">${what}</th><td>([^<]*)</td>`).exec(cells)?.[1];
}

// Shigley, Mechanical Engineering Design, examples 12-1 to 12-4 (inputs as commonly printed, results recalled): µ 4 µreyn
// (27.579 mPa·s), 30 rev/s, 500 lbf, r 0.75 in, c 0.0015 in radial, l 1.5 in: S 0.135, h0 about 0.00064 in by the
// finite-difference solution, P 222 psi. Chart readings hold to 3 %.
test("the film of the textbook's bearing", async () => {
  const film =
    "/calculators/film?diameter=1.5&length=1.5&clearance=.003&speed=1800&load=500+lbf&viscosity=27.579";
  expect(Number(await row(film, "Sommerfeld number"))).toBeCloseTo(0.135, 3);
  expect(Number.parseFloat((await row(film, "least film")) ?? "") / 641).toBeCloseTo(1, 1.5);
  expect(Number.parseFloat((await row(film, "specific load")) ?? "")).toBeCloseTo(222, 0);
});

// ASTM D2270-10 worked example: 73.3 and 8.86 mm²/s have a viscosity index of 92.
test("an oil's viscosity index", async () => {
  expect(await row("/calculators/oil?kv40=73.3&kv100=8.86", "viscosity index")).toBe("92");
});

test("sums of quantities are reckoned in a field", async () => {
  const sum =
    "/calculators/film?diameter=1.5&length=1.5&clearance=1.503+in+-+1.5+in&speed=1800&load=500+lbf&viscosity=27.579";
  const plain = sum.replace("1.503+in+-+1.5+in", "0.003");
  expect(await row(sum, "least film")).toBe(await row(plain, "least film"));
});

test.each([
  ["film?diameter=1.5&length=1.5&clearance=0&speed=1800&load=500&viscosity=20", "clearance"],
  ["film?diameter=1.5&length=-1&clearance=.003&speed=1800&load=500&viscosity=20", "length"],
  ["film?diameter=1e308&length=1&clearance=.003&speed=1800&load=500&viscosity=20", "diameter"],
  ["film?diameter=1.5&length=1&clearance=.003&speed=NaN&load=500&viscosity=20", "speed"],
  ["oil?kv40=11&kv100=100", "Are the two exchanged"],
  ["oil?kv40=100&kv100=11&temperature=-80", "temperature"],
  [
    "map?diameter=2&length=1&clearanceFrom=.001&clearanceTo=.003&viscosityFrom=0&viscosityTo=10&speed=6000&load=900",
    "viscosity",
  ],
  ["gauge-study?readings=1+A+1", "needs four things"],
  ["units?quantity=1,234+in", "can be read as 1.234 or 1234"],
])("%s is refused with a sentence", async (path, word) => {
  const { status, text } = await visitor.open(`/calculators/${path}`);
  expect(status).toBe(200);
  expect(text).toContain("There is a problem");
  expect(text).toContain(word);
  expect(text).not.toMatch(/>(NaN|Infinity)/);
});

test("a pressure trace is taken in place of the peak, and refused with a sentence where it has a gap", async () => {
  const common =
    "cycle?bore=4.125&stroke=3.25&rodLength=6&reciprocatingMass=620&rotatingMass=480&speed=8500&diameter=2.1&length=.85&clearance=.0025&viscosity=9";
  const line = (angle: number) => `${angle};${(2 + 90 * Math.exp(-(((angle - 12) / 40) ** 2))).toFixed(3)}`;
  const trace = Array.from({ length: 360 }, (_, index) => line(index * 2)).join("\n");
  const least = await row(`/calculators/${common}&trace=${encodeURIComponent(trace)}`, "least film");
  expect(least).toMatch(/^\d+\.\d µin$/);
  const gap = trace
    .split("\n")
    .filter((_, index) => index < 100 || index > 140)
    .join("\n");
  const { text } = await visitor.open(`/calculators/${common}&trace=${encodeURIComponent(gap)}`);
  expect(text).toContain("There is a problem");
});
