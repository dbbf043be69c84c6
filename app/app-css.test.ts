import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";

// Source of the ratios and of the formulas for them: W3C, WCAG 2.2, success criteria 1.4.3 (text 4.5:1) and 1.4.11
// (marks 3:1), "relative luminance" and "contrast ratio".
const tokens = new Map(
  [
    ...readFileSync("app/app.css", "utf8").matchAll(
      /--([\w-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g,
    ),
  ].map(([, name, light, dark]) => [name!, { light: light!, dark: dark! }]),
);

function luminance(colour: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red! + 0.7152 * green! + 0.0722 * blue!;
}

function contrast(one: string, other: string): number {
  const [lighter, darker] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (lighter! + 0.05) / (darker! + 0.05);
}

const grounds = ["plate", "plate-deep", "paper", "layout-wash", "ok-wash", "watch-wash", "stop-wash"];
const texts = ["ink", "mute", "layout", "bronze", "ok", "watch", "stop"];

function check(mark: string, ground: string, least: number): void {
  for (const theme of ["light", "dark"] as const) {
    const ratio = contrast(tokens.get(mark)![theme], tokens.get(ground)![theme]);
    expect(ratio, `${mark} on ${ground}, ${theme}`).toBeGreaterThanOrEqual(least);
  }
}

describe("the tokens' contrast in both themes", () => {
  it("is reckoned as the standard does: black on white is 21, #777777 on white 4.48", () => {
    expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 6);
    // A figure often quoted for this grey, from memory.
    expect(contrast("#777777", "#ffffff")).toBeCloseTo(4.48, 2);
  });

  it.each(texts.flatMap((text) => grounds.map((ground) => [text, ground])))(
    "text of %s on %s has 4.5:1",
    (text, ground) => check(text, ground, 4.5),
  );

  it.each(grounds)("edges and marks of line-strong on %s have 3:1", (ground) =>
    check("line-strong", ground, 3),
  );

  it.each(["layout", "layout-deep"])("words on a button of %s have 4.5:1", (button) =>
    check("on-layout", button, 4.5),
  );

  it.each(["oil-thin", "oil-middle", "oil-thick"])("the bronze edge around %s has 3:1 on the page", (oil) => {
    expect(tokens.get(oil)).toBeDefined();
    check("bronze", "plate", 3);
    check("bronze", "paper", 3);
  });
});
