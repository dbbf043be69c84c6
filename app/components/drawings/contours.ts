/** A point in the units of its axes. */
export interface Point {
  x: number;
  y: number;
}

/** A quantity on a grid: `values[i][j]` at `xs[i]`, `ys[j]`, both rising. */
export interface Field {
  xs: readonly number[];
  ys: readonly number[];
  values: readonly (readonly number[])[];
}

/** An edge of the grid that a contour crosses; the same from both cells beside it. */
type EdgeName = string;

interface Crossing {
  edge: EdgeName;
  at: Point;
}

/**
 * The lines on which a quantity has one value, by marching squares with straight lines in each cell; exact where the
 * quantity is a plane. Cells with a corner that is no finite number are left out. Source: the method is Lorensen and
 * Cline's marching cubes (1987) in two dimensions (from memory); a saddle is cut by the mean of its corners.
 */
export function contourLines({ xs, ys, values }: Field, level: number): Point[][] {
  const segments: [Crossing, Crossing][] = [];
  for (let i = 0; i + 1 < xs.length; i++) {
    for (let j = 0; j + 1 < ys.length; j++) {
      segments.push(...cellSegments({ xs, ys, values }, i, j, level));
    }
  }
  return joined(segments);
}

function cellSegments(
  { xs, ys, values }: Field,
  i: number,
  j: number,
  level: number,
): [Crossing, Crossing][] {
  // Corners in order round the cell; an edge goes from each to the next.
  const corners = [
    [i, j],
    [i + 1, j],
    [i + 1, j + 1],
    [i, j + 1],
  ].map(([a, b]) => ({ name: `${a},${b}`, x: xs[a!]!, y: ys[b!]!, value: values[a!]?.[b!] ?? Number.NaN }));
  if (!corners.every(({ value }) => Number.isFinite(value))) return [];

  const crossings = corners.flatMap((corner, index): Crossing[] => {
    const next = corners[(index + 1) % 4]!;
    if (corner.value >= level === next.value >= level) return [];
    const share = (level - corner.value) / (next.value - corner.value);
    const edge = [corner.name, next.name].sort().join(" ");
    return [
      {
        edge,
        at: { x: corner.x + share * (next.x - corner.x), y: corner.y + share * (next.y - corner.y) },
      },
    ];
  });
  if (crossings.length === 2) return [[crossings[0]!, crossings[1]!]];
  if (crossings.length < 4) return [];

  const [first, second, third, fourth] = crossings as [Crossing, Crossing, Crossing, Crossing];
  const mean = corners.reduce((sum, { value }) => sum + value, 0) / 4;
  // Where the middle goes with the first corner, the lines cut the two corners beside it off.
  return mean >= level === corners[0]!.value >= level
    ? [
        [first, second],
        [third, fourth],
      ]
    : [
        [fourth, first],
        [second, third],
      ];
}

/** Pieces joined end to end into as few lines as there are. */
function joined(segments: readonly [Crossing, Crossing][]): Point[][] {
  const left = new Set(segments);
  const byEdge = new Map<EdgeName, [Crossing, Crossing][]>();
  for (const segment of segments) {
    for (const { edge } of segment) byEdge.set(edge, [...(byEdge.get(edge) ?? []), segment]);
  }
  const grow = (from: Crossing): Point[] => {
    const line: Point[] = [];
    let end = from;
    for (;;) {
      const next = byEdge.get(end.edge)?.find((segment) => left.has(segment));
      if (!next) return line;
      left.delete(next);
      end = next[0].edge === end.edge ? next[1] : next[0];
      line.push(end.at);
    }
  };
  const lines: Point[][] = [];
  for (const segment of segments) {
    if (!left.delete(segment)) continue;
    const [start, end] = segment;
    lines.push([...grow(start).reverse(), start.at, end.at, ...grow(end)]);
  }
  return lines;
}
