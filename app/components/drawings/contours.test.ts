import { describe, expect, it } from "vitest";
import { contourLines, type Field } from "./contours";

const range = (from: number, to: number, count: number) =>
  Array.from({ length: count }, (_, index) => from + ((to - from) * index) / (count - 1));

function fieldOf(quantity: (x: number, y: number) => number, count = 11): Field {
  const xs = range(0, 2, count);
  const ys = range(-1, 1, count);
  return { xs, ys, values: xs.map((x) => ys.map((y) => quantity(x, y))) };
}

describe("contours", () => {
  it("of a plane are its own straight line, from edge to edge in one piece", () => {
    // x + 2y = 0.9: elementary geometry; it enters at (2, −0.55) and leaves at (0, 0.45).
    const lines = contourLines(
      fieldOf((x, y) => x + 2 * y),
      0.9,
    );
    expect(lines).toHaveLength(1);
    for (const { x, y } of lines[0]!) expect(x + 2 * y).toBeCloseTo(0.9, 12);
    const ends = [lines[0]![0]!, lines[0]!.at(-1)!].sort((a, b) => a.x - b.x);
    expect(ends[0]!.x).toBeCloseTo(0, 12);
    expect(ends[0]!.y).toBeCloseTo(0.45, 12);
    expect(ends[1]!.x).toBeCloseTo(2, 12);
    expect(ends[1]!.y).toBeCloseTo(-0.55, 12);
  });

  it("of a bowl are closed and lie on the circle, as near as straight pieces can", () => {
    const lines = contourLines(
      fieldOf((x, y) => (x - 1) ** 2 + y ** 2, 81),
      0.49,
    );
    expect(lines).toHaveLength(1);
    const line = lines[0]!;
    expect(Math.hypot(line[0]!.x - line.at(-1)!.x, line[0]!.y - line.at(-1)!.y)).toBeLessThan(1e-9);
    // Cells of 1/40: a chord of a circle of 0.7 leaves it by at most 1/40² ÷ (8 × 0.7), about 0.0001.
    for (const { x, y } of line) expect(Math.abs(Math.hypot(x - 1, y) - 0.7)).toBeLessThan(2e-4);
  });

  it("of a saddle are two pieces that do not cross", () => {
    const lines = contourLines(
      {
        xs: [0, 1],
        ys: [0, 1],
        values: [
          [0, 1],
          [1, 0],
        ],
      },
      0.6,
    );
    expect(lines).toHaveLength(2);
    // The mean of the corners, 0.5, lies below: each high corner is cut off by itself.
    for (const line of lines) {
      const sides = line.map(({ x, y }) => Math.sign(x - y));
      expect(new Set(sides).size).toBe(1);
    }
  });

  it("are none where the level is never reached, where all is flat, and where nothing is known", () => {
    expect(
      contourLines(
        fieldOf(() => 1),
        2,
      ),
    ).toEqual([]);
    expect(
      contourLines(
        fieldOf(() => 1),
        1,
      ),
    ).toEqual([]);
    expect(
      contourLines(
        fieldOf(() => Number.NaN),
        1,
      ),
    ).toEqual([]);
    expect(contourLines({ xs: [], ys: [], values: [] }, 1)).toEqual([]);
    expect(contourLines({ xs: [1], ys: [1], values: [[1]] }, 1)).toEqual([]);
  });

  it("leave out what is no number and keep the rest", () => {
    const lines = contourLines(
      fieldOf((x, y) => (x < 0.5 ? Number.NaN : x + 2 * y)),
      0.9,
    );
    const points = lines.flat();
    expect(points.length).toBeGreaterThan(4);
    for (const { x, y } of points) {
      expect(x).toBeGreaterThanOrEqual(0.6 - 1e-12);
      expect(x + 2 * y).toBeCloseTo(0.9, 12);
    }
  });
});
