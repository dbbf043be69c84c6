import { solveBanded } from "./banded-system";
import { type MeshSize, type Nodes, nodesAlong, nodesAround } from "./film-mesh";

/** Where a journal runs in its bearing. */
export interface FilmShape {
  /** Offset of the journal over the radial clearance: the film is 1 + ε cos θ radial clearances thick. */
  eccentricityRatio: number;
  lengthToDiameter: number;
}

export interface FilmPressure {
  around: Nodes;
  along: Nodes;
  /** By node around and along, in 6 µ ω (R/C)² ε, C the radial clearance; zero where the film is torn. */
  values: Float64Array;
  /** Nodes of a whole film. */
  pressed: Uint8Array;
  /** False where the torn part still changed when the rounds ran out. */
  converged: boolean;
}

const coarsest = 60;
const rounds = 60;

/**
 * Pressure of a steady film that begins at the widest gap and tears where pressure and gradient vanish together
 * (Swift–Stieber): the Reynolds equation by finite volumes as a complementarity problem, pressure ≥ 0. The set of
 * nodes under pressure is improved round by round, each a direct solution, from the answer on a mesh half as fine;
 * the matrix is an M-matrix, so the rounds close in on the one answer.
 * Source of the method: M. Hintermüller, K. Ito, K. Kunisch, SIAM J. Optim. 13 (2002), primal-dual active sets (from memory).
 */
export function filmPressure(shape: FilmShape, size: MeshSize): FilmPressure {
  const around = nodesAround(shape.eccentricityRatio, size.around);
  const along = nodesAlong(size.along);
  const cells = conductances(shape, around, along);
  const pressed = firstGuess(shape, size);
  const values = new Float64Array(pressed.length);
  for (let round = 0; round < rounds; round++) {
    solvePressed(cells, size.along, pressed, values);
    if (!adjustPressed(cells, size.along, pressed, values)) {
      return { around, along, values, pressed, converged: true };
    }
  }
  return { around, along, values, pressed, converged: false };
}

/** Nodes under pressure to begin with: those of a mesh half as fine, on the coarsest those where the gap narrows. */
function firstGuess(shape: FilmShape, { around, along }: MeshSize): Uint8Array {
  const pressed = new Uint8Array((around + 1) * along);
  if (around <= coarsest || around % 2 === 1 || along % 2 === 1) {
    return pressed.fill(1, along, Math.ceil(around / 2) * along);
  }
  const coarse = filmPressure(shape, { around: around / 2, along: along / 2 }).pressed;
  for (let i = 1; i < around; i++) {
    const column = Math.max(1, i >> 1) * (along / 2);
    for (let j = 0; j < along; j++) pressed[i * along + j] = coarse[column + (j >> 1)]!;
  }
  return pressed;
}

/** How easily oil flows from each node to the next one around and along, and what the wedge brings in. */
interface Conductances {
  /** From column i to i + 1, per unit of width along. */
  onward: Float64Array;
  /** Along the bearing in column i, per unit of 1/step. */
  sideways: Float64Array;
  /** What the narrowing gap brings into column i, per unit of width along. */
  source: Float64Array;
  rowWidth: Float64Array;
  /** 1/step from row j to j + 1. */
  rowStep: Float64Array;
}

function conductances(
  { eccentricityRatio, lengthToDiameter }: FilmShape,
  around: Nodes,
  along: Nodes,
): Conductances {
  const cube = (angle: number) => (1 + eccentricityRatio * Math.cos(angle)) ** 3;
  const slenderness = 1 / lengthToDiameter ** 2;
  const { place, face, width } = around;
  return {
    onward: face.map((angle, i) => cube(angle) / (place[i + 1]! - place[i]!)),
    sideways: place.map((angle, i) => slenderness * cube(angle) * width[i]!),
    source: place.map((angle, i) => Math.cos(face[i - 1] ?? angle) - Math.cos(face[i] ?? angle)),
    rowWidth: along.width,
    rowStep: along.face.map((_, j) => 1 / (along.place[j + 1]! - along.place[j]!)),
  };
}

/** Solves the nodes under pressure, with zero at all others. Column 0 is the film's start and never under pressure. */
function solvePressed(cells: Conductances, rows: number, pressed: Uint8Array, values: Float64Array): void {
  const { onward, sideways, source, rowWidth, rowStep } = cells;
  const width = rows + 1;
  const size = pressed.lastIndexOf(1) + 1;
  const entries = new Float64Array(size * width);
  values.fill(0);
  for (let node = 0; node < size; node++) {
    const diagonal = node * width + rows;
    if (!pressed[node]) {
      entries[diagonal] = 1;
      continue;
    }
    const i = Math.floor(node / rows);
    const j = node - i * rows;
    const inward = j === 0 ? 0 : sideways[i]! * rowStep[j - 1]!;
    entries[diagonal] = rowWidth[j]! * (onward[i - 1]! + onward[i]!) + inward + sideways[i]! * rowStep[j]!;
    if (pressed[node - rows]) entries[diagonal - rows] = -onward[i - 1]! * rowWidth[j]!;
    if (j > 0 && pressed[node - 1]) entries[diagonal - 1]! -= inward;
    values[node] = source[i]! * rowWidth[j]!;
  }
  solveBanded({ bandwidth: rows, entries, right: values }, size);
}

/** Lets go of nodes that would pull, takes on torn ones that would be filled; says whether any changed. */
function adjustPressed(
  cells: Conductances,
  rows: number,
  pressed: Uint8Array,
  values: Float64Array,
): boolean {
  const { onward, sideways, source, rowWidth, rowStep } = cells;
  let changed = false;
  const columns = onward.length;
  const next = pressed.slice();
  for (let i = 1; i < columns; i++) {
    for (let j = 0; j < rows; j++) {
      const node = i * rows + j;
      if (pressed[node]) {
        if (values[node]! < 0) next[node] = 0;
      } else {
        const inflow =
          rowWidth[j]! * (onward[i - 1]! * values[node - rows]! + onward[i]! * values[node + rows]!) +
          (j === 0 ? 0 : sideways[i]! * rowStep[j - 1]! * values[node - 1]!) +
          (j === rows - 1 ? 0 : sideways[i]! * rowStep[j]! * values[node + 1]!) +
          source[i]! * rowWidth[j]!;
        if (inflow > 0) next[node] = 1;
      }
      if (next[node] !== pressed[node]) changed = true;
    }
  }
  pressed.set(next);
  for (let node = 0; node < values.length; node++) if (values[node]! < 0) values[node] = 0;
  return changed;
}
