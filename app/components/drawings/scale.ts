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

/** A place on a drawing to a tenth of a pixel: finer is only longer. */
export function place(value: number): number {
  return Math.round(value * 10) / 10;
}
