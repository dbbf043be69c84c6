/** A straight map from values to places on a drawing. Equal ends map everything to the middle, never to NaN. */
export function linearScale(from: number, to: number, start: number, end: number): (value: number) => number {
  if (from === to) return () => (start + end) / 2;
  return (value) => start + ((value - from) / (to - from)) * (end - start);
}

/** Round values inside a span for its ticks: steps of 1, 2 or 5 times a power of ten, about `count` of them. */
export function niceTicks(from: number, to: number, count: number): number[] {
  const span = to - from;
  if (!(span > 0)) return [from];
  const rough = span / Math.max(1, count);
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((candidate) => candidate >= rough * 0.999)!;
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => (first + index) * step);
}

/** A span from and to. */
export interface Span {
  from: number;
  to: number;
}

/**
 * The span that shows all of these values with some air around them, at least `least` wide on each side where they are
 * all equal; from 0 to 2 × `least` where there are none.
 */
export function spanOf(values: readonly number[], least: number, air = 0.08): Span {
  if (values.length === 0) return { from: 0, to: 2 * least };
  const low = Math.min(...values);
  const high = Math.max(...values);
  const margin = Math.max((high - low) * air, high === low ? least : 0);
  return { from: low - margin, to: high + margin };
}

/** A place on a drawing to a tenth of a pixel: finer is only longer. */
export function place(value: number): number {
  return Math.round(value * 10) / 10;
}

/** A path through places on a drawing. */
export function pathThrough(points: readonly { x: number; y: number }[]): string {
  return points.map(({ x, y }, index) => `${index === 0 ? "M" : "L"}${place(x)} ${place(y)}`).join("");
}
