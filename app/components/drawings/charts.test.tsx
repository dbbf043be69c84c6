import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { FilmMap } from "./film-map";
import { FitStrip } from "./fit-strip";
import { OrbitDrawing } from "./orbit-drawing";
import { PolarLoad } from "./polar-load";
import { ViscosityChart } from "./viscosity-chart";

afterEach(cleanup);

const inch = 0.0254;
const degree = Math.PI / 180;

/** Every place of every mark of a drawing. */
function placesOf(container: Element): string {
  const names = ["d", "cx", "cy", "x", "y", "width", "height", "r"];
  return [...container.querySelectorAll("svg *")]
    .flatMap((mark) => names.map((name) => mark.getAttribute(name) ?? ""))
    .join(" ");
}

function rowsOf(): (string | null)[][] {
  const table = screen.getByRole("table", { hidden: true });
  return within(table)
    .getAllByRole("row", { hidden: true })
    .map((row) => [...row.children].map((cell) => cell.textContent));
}

function summaryOf(): string {
  return (
    document.getElementById(screen.getByRole("img").getAttribute("aria-describedby")!)?.textContent ?? ""
  );
}

describe("the film map", () => {
  // A film that grows evenly with both: its contours are straight.
  const clearances = [40e-6, 50e-6, 60e-6, 70e-6];
  const viscosities = [5e-3, 10e-3, 15e-3];
  const leastFilm = clearances.map((clearance) =>
    viscosities.map((viscosity) => clearance / 50 + viscosity / 1e4),
  );
  const builds = [
    { build: 1, clearance: 65e-6, viscosity: 12e-3, grade: 1 },
    { build: 2, clearance: 60e-6, viscosity: 12e-3, grade: 2 },
  ];

  it("gives its builds and the next step in words and as a table", () => {
    render(
      <FilmMap
        title="Film"
        units="metric"
        {...{ clearances, viscosities, leastFilm, builds }}
        limitFilm={1.5e-6}
        next={{ clearance: 57.5e-6, viscosity: 12e-3 }}
      />,
    );
    expect(summaryOf()).toBe(
      "2 of this engine's builds, the last at 60.0 µm and 12.0 mPa·s; the next step leads to 57.5 µm and 12.0 mPa·s; the limit line is a film of 1.5 µm.",
    );
    expect(rowsOf()).toEqual([
      ["build", "clearance, µm", "viscosity, mPa·s", "grade"],
      ["Build 1", "65.0", "12.0", "1"],
      ["Build 2", "60.0", "12.0", "2"],
      ["next", "57.5", "12.0", "–"],
    ]);
    expect(screen.getByRole("img").textContent).toContain("limit: 1.5 µm");
  });

  it.each([
    ["no build", { builds: [] }],
    ["the same film everywhere", { leastFilm: clearances.map(() => viscosities.map(() => 2e-6)) }],
    ["nothing known", { leastFilm: clearances.map(() => viscosities.map(() => Number.NaN)) }],
    [
      "all builds at one place",
      { builds: [builds[0]!, { ...builds[0]!, build: 2 }, { ...builds[0]!, build: 3 }] },
    ],
  ])("stands with %s", (_what, part) => {
    const { container } = render(
      <FilmMap
        title="Film"
        units="inch"
        {...{ clearances, viscosities, leastFilm, builds }}
        limitFilm={1.5e-6}
        {...part}
      />,
    );
    expect(container.querySelector("svg")).toBeTruthy();
    expect(placesOf(container)).not.toMatch(/NaN|Infinity/);
  });
});

describe("the viscosity chart", () => {
  const oils = [
    { name: "Bench forty", kv40: 95, kv100: 14.2, ranAtC: 104 },
    { name: "Bench thirty", kv40: 62, kv100: 10.5 },
  ];

  it("lays both measured points of an oil on its straight line: the axes are those of ASTM D341", () => {
    const { container } = render(<ViscosityChart title="Oils" oils={oils.slice(0, 1)} />);
    const [startX, startY, endX, endY] = (
      container
        .querySelector('path[stroke-width="3"]')!
        .getAttribute("d")!
        .match(/-?\d+(\.\d+)?/g) ?? []
    ).map(Number) as [number, number, number, number];
    const points = [...container.querySelectorAll('circle[r="4"]')];
    expect(points).toHaveLength(2);
    for (const point of points) {
      const share = (Number(point.getAttribute("cx")) - startX) / (endX - startX);
      // Places are rounded to 0.1 px.
      expect(Math.abs(startY + share * (endY - startY) - Number(point.getAttribute("cy")))).toBeLessThan(0.2);
    }
  });

  it("names the thinnest and the thickest, and gives each oil's figures", () => {
    render(<ViscosityChart title="Oils" oils={oils} />);
    expect(summaryOf()).toBe(
      "2 oils; at 100 °C the thinnest is Bench thirty with 10.50 mm²/s, the thickest Bench forty with 14.20.",
    );
    const [, forty, thirty] = rowsOf();
    expect(forty!.slice(0, 4)).toEqual(["Bench forty", "95.0", "14.20", "104"]);
    expect(thirty).toEqual(["Bench thirty", "62.0", "10.50", "–", "–"]);
  });

  it("draws nothing of no oil, and two oils alike with both their names", () => {
    expect(render(<ViscosityChart title="Oils" oils={[]} />).container.innerHTML).toBe("");
    const { container } = render(
      <ViscosityChart title="Oils" oils={[oils[0]!, { ...oils[0]!, name: "Its twin" }]} />,
    );
    expect(placesOf(container)).not.toMatch(/NaN|Infinity/);
    expect(container.textContent).toContain("Its twin");
  });
});

describe("the polar load diagram", () => {
  it("points x up and y to the right, and names the greatest load with its angle", () => {
    const loads = Array.from({ length: 720 }, (_, angle) => ({
      crankAngle: angle * degree,
      x: 1000 * Math.cos(angle * degree),
      y: 1000 * Math.sin(angle * degree) + (angle === 450 ? 500 : 0),
    }));
    const { container } = render(
      <PolarLoad title="Big end" loads={loads} direction="towards the wrist pin" />,
    );
    expect(summaryOf()).toBe("The greatest load is 1.5 kN at 450° of crank angle.");
    const tip = container.querySelector("circle.stroke-layout")!;
    expect(Number(tip.getAttribute("cx"))).toBeGreaterThan(300);
    expect(Number(tip.getAttribute("cy"))).toBeCloseTo(222, 0);
    expect(rowsOf().slice(1, 3)).toEqual([
      ["0", "1.0", "1.0", "0.0"],
      ["30", "1.0", "0.9", "0.5"],
    ]);
  });

  it("draws nothing of no load", () => {
    const none = [0, 180, 360, 540].map((angle) => ({ crankAngle: angle * degree, x: 0, y: 0 }));
    expect(render(<PolarLoad title="Main" loads={[]} direction="up" />).container.innerHTML).toBe("");
    expect(render(<PolarLoad title="Main" loads={none} direction="up" />).container.innerHTML).toBe("");
  });
});

describe("the orbit", () => {
  const circle = Array.from({ length: 721 }, (_, angle) => ({
    crankAngle: angle * degree,
    ex: 0.8 * Math.cos(angle * degree),
    ey: 0.8 * Math.sin(angle * degree),
    film: angle === 300 ? 4e-6 : 5e-6,
  }));

  it("says the least film and where, and gives the figures of the cycle", () => {
    render(<OrbitDrawing title="Main" orbit={circle} direction="towards the cylinder" limitFilm={1e-6} />);
    expect(summaryOf()).toBe("The least film is 4.0 µm at 300° of crank angle; the limit is 1.0 µm.");
    expect(rowsOf()[11]).toEqual(["300", "4.00", "0.800", "0.400", "-0.693"]);
  });

  it.each([
    ["one point", circle.slice(0, 1)],
    ["a journal that rests in the middle", circle.map((point) => ({ ...point, ex: 0, ey: 0 }))],
    ["one turn", circle.slice(0, 361)],
  ])("stands with %s", (_what, orbit) => {
    const { container } = render(<OrbitDrawing title="Main" orbit={orbit} direction="up" />);
    expect(placesOf(container)).not.toMatch(/NaN|Infinity/);
  });

  it("draws nothing of no orbit", () => {
    expect(render(<OrbitDrawing title="Main" orbit={[]} direction="up" />).container.innerHTML).toBe("");
  });
});

describe("the fit strip in a line", () => {
  const window = { least: 0.0022 * inch, aim: 0.0025 * inch, most: 0.0028 * inch };

  it("says in words what it has no letters for", () => {
    render(
      <FitStrip
        title="Mains"
        units="inch"
        size="line"
        window={window}
        positions={[{ number: 1, assembled: 0.0025 * inch }]}
      />,
    );
    expect(summaryOf()).toBe(
      "Aim .00250 in, window .00220 to .00280; 1 position as built from .00250 to .00250.",
    );
    expect(screen.getByRole("img").querySelectorAll("text")).toHaveLength(0);
  });

  it("stands with a window of nothing and no hard limits", () => {
    const { container } = render(
      <FitStrip
        title="Mains"
        units="inch"
        size="full"
        window={{ least: 0, aim: 0, most: 0 }}
        positions={[{ number: 1, assembled: 0, tornDown: 0 }]}
        step={{ from: 0, to: 0 }}
      />,
    );
    expect(placesOf(container)).not.toMatch(/NaN|Infinity/);
    expect(container.textContent).toContain("hold");
  });

  it("points to a slip beyond its end and says which and how much", () => {
    render(
      <FitStrip
        title="Mains"
        units="inch"
        window={window}
        positions={[
          { number: 1, assembled: 0.0025 * inch },
          { number: 2, assembled: 0.045 * inch },
        ]}
      />,
    );
    expect(screen.getByRole("img").textContent).toContain("2, off this scale: .04500");
  });
});
