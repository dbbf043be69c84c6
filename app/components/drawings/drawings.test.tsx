import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { ClearanceByBuild } from "./clearance-by-build";
import { ConditionGlyph } from "./condition-glyph";
import { FitStrip } from "./fit-strip";
import { linearScale, niceTicks } from "./scale";
import { WearBars } from "./wear-bars";

afterEach(cleanup);

const inch = 0.0254;
const strip = {
  title: "Big ends",
  window: { least: 0.0022 * inch, aim: 0.0025 * inch, most: 0.0028 * inch },
  limits: { least: 0.0012 * inch, most: 0.0032 * inch },
};

/** Every number of every path, circle and rectangle of a drawing. */
function figuresOf(container: Element): string {
  const attributes = ["d", "cx", "cy", "x", "y", "width", "height", "r"];
  return [...container.querySelectorAll("svg *")]
    .flatMap((element) => attributes.map((name) => element.getAttribute(name) ?? ""))
    .join(" ");
}

test("a condition says its grade and its word", () => {
  render(<ConditionGlyph grade={3} />);
  expect(screen.getByRole("img", { name: "grade 3, distressed" })).toBeTruthy();
});

test("each grade breaks more of the shell's face", () => {
  const pieces = [0, 1, 2, 3, 4].map((grade) => {
    const { container } = render(<ConditionGlyph grade={grade} />);
    // Each piece is an arc of its own in the one path that is drawn in the grade's colour and the arc's weight.
    const face = container.querySelectorAll("path")[1]?.getAttribute("d") ?? "";
    return face.match(/A/g)?.length;
  });
  expect(pieces).toEqual([1, 1, 2, 3, 4]);
});

test("as new and normal polish are told apart without their number: one has the line of its polish", () => {
  const paths = [0, 1].map((grade) => {
    const { container } = render(<ConditionGlyph grade={grade} />);
    return container.querySelectorAll("path").length;
  });
  expect(paths).toEqual([2, 3]);
});

test("with its word beside it, a condition is not read twice", () => {
  const { container } = render(<ConditionGlyph grade={2} word />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toBe("grade 2");
  expect(container.textContent).toContain("marked");
});

/** What someone who cannot see a drawing is told. */
function summaryOf(drawing: Element): string {
  return document.getElementById(drawing.getAttribute("aria-describedby")!)?.textContent ?? "";
}

test("the fit strip says its figures in words and in a table", () => {
  render(
    <FitStrip
      {...strip}
      units="inch"
      positions={[
        { number: 1, assembled: 0.0025 * inch, tornDown: 0.0026 * inch },
        { number: 2, assembled: 0.0024 * inch },
      ]}
      likelyLimit={{ from: 0.0016 * inch, to: 0.0019 * inch, share: 0.7 }}
      step={{ from: 0.0025 * inch, to: 0.0023 * inch }}
    />,
  );
  const name = summaryOf(screen.getByRole("img", { name: "Big ends" }));
  expect(name).toContain("Aim .00250 in, window .00220 to .00280");
  expect(name).toContain("2 positions as built from .00240 to .00250");
  expect(name).toContain("7 in 10 that the limit lies from .00160 to .00190");
  expect(name).toContain("next step: close by .0002, from .00250 to .00230");
  const rows = within(screen.getByRole("table", { hidden: true })).getAllByRole("row", { hidden: true });
  expect(rows.map((row) => [...row.children].map((cell) => cell.textContent))).toEqual([
    ["position", "as built, in", "torn down, in", "wear, in"],
    ["1", ".00250", ".00260", ".00010"],
    ["2", ".00240", "–", "–"],
  ]);
});

test("the page's units run through the whole strip", () => {
  render(<FitStrip {...strip} units="metric" positions={[{ number: 1, assembled: 0.0025 * inch }]} />);
  expect(summaryOf(screen.getByRole("img"))).toContain("Aim 63.5 µm");
});

test.each([
  ["no position", []],
  ["one position", [{ number: 1, assembled: 0.0025 * inch }]],
  ["a position only torn down", [{ number: 1, tornDown: 0.0025 * inch }]],
  ["a position a thousand times off", [{ number: 1, assembled: 2.5 * inch }]],
])("the strip stands with %s", (_what, positions) => {
  const { container } = render(<FitStrip {...strip} units="inch" positions={positions} />);
  expect(figuresOf(container)).not.toMatch(/NaN|Infinity/);
  for (const circle of container.querySelectorAll("circle")) {
    expect(Number(circle.getAttribute("cx"))).toBeGreaterThanOrEqual(20);
    expect(Number(circle.getAttribute("cx"))).toBeLessThanOrEqual(710);
  }
});

test("wear that the gauges cannot see is said with its bound, and the odd one out by name", () => {
  render(
    <WearBars
      title="Wear"
      units="metric"
      bars={[
        { position: 1, rate: 0.2e-6, from: 0.1e-6, to: 0.3e-6, measurable: true, odd: false },
        { position: 2, rate: 0.01e-6, from: 0, to: 0.11e-6, measurable: false, odd: false },
        { position: 3, rate: 0.9e-6, from: 0.8e-6, to: 1e-6, measurable: true, odd: true },
        { position: 4, rate: null, from: null, to: null, measurable: false, odd: false },
      ]}
    />,
  );
  const drawing = screen.getByRole("img");
  expect(drawing.textContent).toContain("not measurable, under 0.110 µm/h");
  expect(drawing.textContent).toContain("odd one out");
  expect(drawing.textContent).toContain("a measuring slip");
  expect(summaryOf(drawing)).toContain("position 3 is the odd one out");
});

test("clearance by build stands with no build, one build, and equal values", () => {
  const build = {
    build: 1,
    target: 60e-6,
    positions: [{ number: 1, assembled: 60e-6, tornDown: 60e-6 }],
    grade: 1,
  };
  expect(render(<ClearanceByBuild title="Mains" units="inch" builds={[]} />).container.innerHTML).toBe("");
  for (const builds of [[build], [build, { ...build, build: 2, oil: "thin" }]]) {
    const { container } = render(<ClearanceByBuild title="Mains" units="inch" builds={builds} />);
    expect(figuresOf(container)).not.toMatch(/NaN|Infinity/);
  }
});

test("a scale maps its ends to its ends, and equal ends to the middle", () => {
  const scale = linearScale(2, 4, 0, 100);
  expect([scale(2), scale(3), scale(4)]).toEqual([0, 50, 100]);
  expect(linearScale(2, 2, 0, 100)(2)).toBe(50);
});

test("ticks are round and inside", () => {
  expect(niceTicks(0.0014, 0.003, 8).map((tick) => Number(tick.toFixed(6)))).toEqual([
    0.0014, 0.0016, 0.0018, 0.002, 0.0022, 0.0024, 0.0026, 0.0028, 0.003,
  ]);
  expect(niceTicks(5, 5, 4)).toEqual([5]);
});
