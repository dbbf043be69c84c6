import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { WearAgainstClearance } from "./wear-against-clearance";

afterEach(cleanup);

const points = [
  { build: 4, clearance: 60e-6, rate: 0.2e-6, uncertainty: 0.05e-6, grade: 1 },
  { build: 5, clearance: 55e-6, rate: 0.6e-6, uncertainty: 0.1e-6 },
];

/** Every place of every mark of a drawing. */
function placesOf(container: Element): string {
  return [...container.querySelectorAll("svg *")]
    .flatMap((mark) => ["d", "cx", "cy", "x", "y", "width"].map((name) => mark.getAttribute(name) ?? ""))
    .join(" ");
}

test("the range of wear stands in the summary and each build in the table", () => {
  render(<WearAgainstClearance title="Big ends" units="metric" points={points} />);
  expect(screen.getAllByText(/2 builds; wear from 0\.200 to 0\.600 µm\/h\./).length).toBeGreaterThan(0);
  const rows = within(screen.getByRole("table", { hidden: true })).getAllByRole("row", { hidden: true });
  expect(rows.map((row) => [...row.children].map((cell) => cell.textContent))).toEqual([
    ["build", "clearance, µm", "wear, µm/h", "sure to ±, µm/h", "worst grade"],
    ["Build 4", "60.0", "0.200", "0.050", "1"],
    ["Build 5", "55.0", "0.600", "0.100", "–"],
  ]);
});

test("the tighter build lies left of the looser one, the faster wear above the slower", () => {
  const { container } = render(<WearAgainstClearance title="Big ends" units="inch" points={points} />);
  const place = (build: number) => {
    const label = [...container.querySelectorAll("text")].find(
      (text) => text.textContent === String(build) && text.classList.contains("fill-mute"),
    )!;
    return { x: Number(label.getAttribute("x")), y: Number(label.getAttribute("y")) };
  };
  expect(place(5).x).toBeLessThan(place(4).x);
  expect(place(5).y).toBeLessThan(place(4).y);
});

test("where the limit probably lies is said in words and with its clearances", () => {
  render(
    <WearAgainstClearance
      title="Big ends"
      units="metric"
      points={points}
      likelyLimit={{ from: 45e-6, to: 52e-6, share: 0.7 }}
    />,
  );
  expect(screen.getByRole("img").textContent).toContain("limit probably here, 7 in 10");
  expect(screen.getAllByText(/limit probably here, 7 in 10: 45\.0 to 52\.0 µm\./).length).toBeGreaterThan(0);
});

test.each([
  ["one build", points.slice(0, 1)],
  ["equal builds", [points[0]!, { ...points[0]!, build: 5 }]],
  ["no wear and no uncertainty", [{ build: 1, clearance: 60e-6, rate: 0, uncertainty: 0 }]],
  ["a rate that may be below nothing", [{ build: 1, clearance: 60e-6, rate: 0.01e-6, uncertainty: 0.2e-6 }]],
])("the drawing stands with %s", (_what, given) => {
  const { container } = render(<WearAgainstClearance title="Mains" units="inch" points={given} />);
  expect(container.querySelector("svg")).toBeTruthy();
  expect(placesOf(container)).not.toMatch(/NaN|Infinity/);
});

test("no build draws nothing", () => {
  const { container } = render(<WearAgainstClearance title="Mains" units="inch" points={[]} />);
  expect(container.innerHTML).toBe("");
});
