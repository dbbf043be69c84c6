import { cleanup, render, screen } from "@testing-library/react";
import type { ComponentProps } from "react";
import { MemoryRouter } from "react-router";
import { afterEach, describe, expect, it } from "vitest";
import { Ladder } from "./ladder";
import { oilTone } from "./oil-tone";

afterEach(cleanup);

const inch = 0.0254;
const rungs: ComponentProps<typeof Ladder>["rungs"] = [
  { id: "c", build: 3, state: "measuring", hours: 0, events: [], step: -0.0001 * inch, to: "/builds/c" },
  {
    id: "b",
    build: 2,
    state: "torn-down",
    hours: 5.9,
    oil: "10W-40",
    kv100: 14.2,
    grade: 3,
    events: ["debris", "pressure-dip"],
    step: 0,
    to: "/builds/b",
  },
  {
    id: "a",
    build: 1,
    state: "reviewed",
    hours: 6.4,
    oil: "20W-50",
    kv100: 18,
    grade: 1,
    events: [],
    to: "/builds/a",
  },
];

const show = (given = rungs) =>
  render(
    <MemoryRouter>
      <Ladder title="The ladder" rungs={given} current="b" />
    </MemoryRouter>,
  );

describe("the ladder", () => {
  it("has a link for every build, the newest on top, and marks the one in hand", () => {
    show();
    const links = screen.getAllByRole("link");
    expect(links.map((link) => link.textContent)).toEqual(["Build 3", "Build 2", "Build 1"]);
    expect(links.map((link) => link.getAttribute("href"))).toEqual(["/builds/c", "/builds/b", "/builds/a"]);
    expect(links.map((link) => link.getAttribute("aria-current"))).toEqual([null, "page", null]);
  });

  it("says hours, oil, grade, what happened and the step in words", () => {
    show();
    const [newest, middle, first] = screen.getAllByRole("listitem").map((item) => item.textContent);
    expect(newest).toContain("closed .0001");
    expect(newest).toContain("measuring");
    expect(middle).toContain("5.9 h");
    expect(middle).toContain("10W-40");
    expect(middle).toContain("debris, pressure dip");
    expect(middle).toContain("held");
    expect(screen.getByRole("img", { name: "grade 3, distressed" })).toBeTruthy();
    expect(first).not.toMatch(/held|closed|opened/);
  });

  it("teaches where no build is yet", () => {
    show([]);
    expect(screen.getByText(/its first rung comes with the first build/)).toBeTruthy();
  });
});

describe("the tone of an oil", () => {
  it("goes from pale to dark over the grades of SAE J300, and has none where nothing is known", () => {
    expect(oilTone(6.1)).toBe("color-mix(in oklab, var(--oil-middle) 0%, var(--oil-thin))");
    expect(oilTone(26.1)).toBe("color-mix(in oklab, var(--oil-thick) 100%, var(--oil-middle))");
    expect(oilTone(60)).toBe(oilTone(26.1));
    expect(oilTone(undefined)).toBe("var(--line)");
    expect(oilTone(0)).toBe("var(--line)");
  });
});
