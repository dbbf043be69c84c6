import { cleanup, render, screen, within } from "@testing-library/react";
import type { ComponentProps } from "react";
import { afterEach, expect, test } from "vitest";
import { BoreView } from "./bore-view";

afterEach(cleanup);

const inch = 0.0254;
const given: ComponentProps<typeof BoreView> = {
  title: "Main 2, front",
  units: "inch",
  nominal: 2.45 * inch,
  bore: [
    { axis: "vertical", value: 2.4521 * inch },
    { axis: "plus45", value: 2.4524 * inch },
    { axis: "minus45", value: 2.4523 * inch },
  ],
  journal: [
    { axis: "a", value: 2.4497 * inch },
    { axis: "b", value: 2.4497 * inch },
  ],
};

test("the section names every measured axis with its diameter", () => {
  render(<BoreView {...given} />);
  const words = screen.getByRole("img").textContent;
  for (const part of [
    "vertical 90°",
    "2.45210",
    "+45°",
    "2.45240",
    "−45°",
    "2.45230",
    "A 2.44970",
    "B 2.44970",
  ]) {
    expect(words).toContain(part);
  }
});

test("the least and the most clearance stand in the summary and every diameter in the table", () => {
  render(<BoreView {...given} />);
  expect(
    screen.getAllByText(/Clearance from \.00240 to \.00270 in over 3 measured axes\./).length,
  ).toBeGreaterThan(0);
  const rows = within(screen.getByRole("table", { hidden: true })).getAllByRole("row", { hidden: true });
  expect(rows.map((row) => [...row.children].map((cell) => cell.textContent))).toEqual([
    ["axis", "diameter, in"],
    ["bore, vertical 90°", "2.45210"],
    ["bore, +45°", "2.45240"],
    ["bore, −45°", "2.45230"],
    ["journal, A", "2.44970"],
    ["journal, B", "2.44970"],
  ]);
});

test("the page's units run through the section", () => {
  render(<BoreView {...given} units="metric" />);
  // 2.4521 in × 25.4 mm/in, exact by definition of the inch.
  expect(screen.getByRole("img").textContent).toContain("62.2833");
  expect(screen.getByRole("columnheader", { name: "diameter, mm", hidden: true })).toBeTruthy();
});

test("how much larger the clearance is drawn is said", () => {
  // 46 px for the widest gap of .0027 in, 74 px for the journal's 2.4497 in: 46/.0027 ÷ 74/2.4497 = 564.
  render(<BoreView {...given} />);
  expect(screen.getByRole("img").textContent).toContain("clearance drawn 560 times larger");
});

test.each([
  ["a bore alone", { journal: [] }],
  ["a journal alone", { bore: [] }],
  ["one axis each", { bore: given.bore.slice(0, 1), journal: given.journal.slice(0, 1) }],
  ["no clearance at all", { bore: [{ axis: "vertical" as const, value: 2.4497 * inch }] }],
  ["a bore smaller than its journal", { bore: [{ axis: "vertical" as const, value: 2.4 * inch }] }],
  ["a bore ten times too large", { bore: [{ axis: "horizontal" as const, value: 24.5 * inch }] }],
])("the section stands with %s", (_what, part) => {
  const { container } = render(<BoreView {...given} {...part} />);
  const paths = [...container.querySelectorAll("path")].map((path) => path.getAttribute("d") ?? "");
  expect(paths.length).toBeGreaterThan(3);
  for (const path of paths) {
    expect(path).not.toMatch(/NaN|Infinity/);
    for (const number of path.match(/-?\d+(\.\d+)?/g) ?? [])
      expect(Math.abs(Number(number))).toBeLessThan(460);
  }
});

test("nothing measured draws nothing", () => {
  const { container } = render(<BoreView {...given} bore={[]} journal={[]} />);
  expect(container.innerHTML).toBe("");
});

test("wear since the build is shaded, and its figures are in the table", () => {
  const shaded = (container: Element) => container.querySelectorAll("[data-wear]").length;
  expect(shaded(render(<BoreView {...given} />).container)).toBe(0);
  cleanup();
  const { container } = render(
    <BoreView {...given} boreAsBuilt={[{ axis: "vertical", value: 2.452 * inch }]} />,
  );
  expect(shaded(container)).toBe(1);
  expect(screen.getByRole("rowheader", { name: "bore as built, vertical 90°", hidden: true })).toBeTruthy();
});

test("the clearance of each axis stands at its far end, and a worn journal is shaded too", () => {
  const { container } = render(
    <BoreView {...given} journalAsBuilt={[{ axis: "a", value: 2.4498 * inch }]} />,
  );
  const words = screen.getByRole("img").textContent;
  for (const clearance of [".00240", ".00270", ".00260"]) expect(words).toContain(clearance);
  expect(container.querySelectorAll("[data-wear]").length).toBe(1);
});
