/** What a film answers to a journal pushed through it: the load, and where it points. */
export interface SqueezeLoad {
  /** Load over speed, as the inverse of a mobility: F (C/R)² C / (µ L D V), C the radial clearance. */
  impedance: number;
  /** From the line of centres to the load, rad, positive towards the direction of the push. */
  angle: number;
}

interface Mesh {
  around: number;
  /** Rows from the middle of the bearing to its edge; the other half is its mirror image. */
  along: number;
}

const fineEnough: Mesh = { around: 240, along: 20 };

/**
 * The load of a finite-length oil film whose journal is pushed, without turning, in any direction: the Reynolds
 * equation by finite volumes, with the pressure nowhere below zero and free to begin and end where it will
 * (the film of a moving journal has no fixed start). A journal that also turns at mean speed ω̄ is pushed by
 * de/dt − ω̄ × e, so this one answer serves every motion; pushed square to the line of centres it is the steady bearing.
 * Range: eccentricity ratio 0–0.998, L/D 0.1–1.5. Error with the usual mesh: 0.3 % of the load.
 * It takes about a tenth of a second; pages use the table that `scripts/mobility-table.ts` makes from it.
 * Source: O. Pinkus & B. Sternlicht, Theory of Hydrodynamic Lubrication (1961), the equation; cavitation as a
 * complementarity problem solved by projected over-relaxation, C. Cryer (1971) (both from memory).
 */
export function squeezeFilm(
  eccentricityRatio: number,
  direction: number,
  lengthToDiameter: number,
  mesh: Mesh = fineEnough,
): SqueezeLoad {
  const ring = meshAround(eccentricityRatio, mesh.around);
  const edge = meshAlong(mesh.along);
  const pressure = solve(ring, edge, direction, 1 / lengthToDiameter ** 2);
  let x = 0;
  let y = 0;
  for (let i = 0; i < mesh.around; i++) {
    for (let j = 0; j < mesh.along; j++) {
      const force = pressure[i * mesh.along + j]! * ring.width[i]! * edge.width[j]!;
      x += force * Math.cos(ring.angle[i]!);
      y += force * Math.sin(ring.angle[i]!);
    }
  }
  return { impedance: 6 * Math.hypot(x, y), angle: Math.atan2(y, x) };
}

interface Ring {
  angle: Float64Array;
  width: Float64Array;
  /** Film thickness over radial clearance, cubed, at the cells and at the faces after them. */
  cube: Float64Array;
  faceCube: Float64Array;
  /** Distance from each cell to the next. */
  step: Float64Array;
}

/** Cells around the bearing, crowded at the thinnest film (angle 0) the more the thinner it is. */
function meshAround(eccentricityRatio: number, count: number): Ring {
  const crowding = Math.min(0.93, Math.max(0.5, 1 - 0.6 * Math.sqrt(1 - eccentricityRatio)));
  const place = (index: number) => {
    const even = (2 * Math.PI * index) / count - Math.PI;
    return even - crowding * Math.sin(even);
  };
  const at = (of: (index: number) => number) => Float64Array.from({ length: count }, (_, index) => of(index));
  const cube = (angle: number) => (1 - eccentricityRatio * Math.cos(angle)) ** 3;
  return {
    angle: at(place),
    width: at((index) => place(index + 0.5) - place(index - 0.5)),
    cube: at((index) => cube(place(index))),
    faceCube: at((index) => cube(place(index + 0.5))),
    step: at((index) => place(index + 1) - place(index)),
  };
}

interface Rows {
  width: Float64Array;
  /** Distance from each row to the next, the last one to the edge. */
  step: Float64Array;
}

/** Rows from the middle (0) to the edge (1), crowded at the edge, where the pressure falls to nothing. */
function meshAlong(count: number): Rows {
  const face = (index: number) => Math.sin((index / count) * (Math.PI / 2));
  const middle = (index: number) => (index < count ? (face(index) + face(index + 1)) / 2 : 1);
  return {
    width: Float64Array.from({ length: count }, (_, index) => face(index + 1) - face(index)),
    step: Float64Array.from({ length: count }, (_, index) => middle(index + 1) - middle(index)),
  };
}

const sweeps = 4000;
const relaxation = 1.85;
const settled = 1e-7;

/** The pressures, cell by cell, in 12 µ V R²/C³; bounded sweeps, each cell kept at or above zero. */
function solve(ring: Ring, rows: Rows, direction: number, slenderness: number): Float64Array {
  const around = ring.angle.length;
  const along = rows.width.length;
  const pressure = new Float64Array(around * along);
  let largest = 0;
  for (let sweep = 0; sweep < sweeps; sweep++) {
    let change = 0;
    for (let i = 0; i < around; i++) {
      const before = i === 0 ? around - 1 : i - 1;
      const after = i === around - 1 ? 0 : i + 1;
      const flowAfter = ring.faceCube[i]! / ring.step[i]!;
      const flowBefore = ring.faceCube[before]! / ring.step[before]!;
      const flowAlong = slenderness * ring.cube[i]! * ring.width[i]!;
      const squeezed = Math.cos(ring.angle[i]! - direction) * ring.width[i]!;
      for (let j = 0; j < along; j++) {
        const cell = i * along + j;
        const width = rows.width[j]!;
        const outward = flowAlong / rows.step[j]!;
        const inward = j === 0 ? 0 : flowAlong / rows.step[j - 1]!;
        const sum =
          width * (flowAfter * pressure[after * along + j]! + flowBefore * pressure[before * along + j]!) +
          (j === along - 1 ? 0 : outward * pressure[cell + 1]!) +
          (j === 0 ? 0 : inward * pressure[cell - 1]!) +
          squeezed * width;
        const balanced = sum / (width * (flowAfter + flowBefore) + outward + inward);
        const old = pressure[cell]!;
        const next = Math.max(0, old + relaxation * (balanced - old));
        pressure[cell] = next;
        change = Math.max(change, Math.abs(next - old));
        largest = Math.max(largest, next);
      }
    }
    if (change <= settled * largest) break;
  }
  return pressure;
}
