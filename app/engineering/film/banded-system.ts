/**
 * A symmetric positive definite system whose entries lie within `bandwidth` of the diagonal, solved by Cholesky's
 * factors. Lower half only, row by row: the entry of row k and column k − d stands at `k·(bandwidth + 1) + bandwidth − d`.
 */
export interface BandedSystem {
  bandwidth: number;
  entries: Float64Array;
  right: Float64Array;
}

/** Solves the first `size` unknowns of the system in place: `right` becomes the solution, `entries` the factors. */
export function solveBanded({ bandwidth, entries, right }: BandedSystem, size: number): void {
  const width = bandwidth + 1;
  for (let row = 0; row < size; row++) {
    const rowStart = row * width + bandwidth - row;
    const first = Math.max(0, row - bandwidth);
    for (let column = first; column <= row; column++) {
      const columnStart = column * width + bandwidth - column;
      let sum = entries[rowStart + column]!;
      for (let k = first; k < column; k++) sum -= entries[rowStart + k]! * entries[columnStart + k]!;
      entries[rowStart + column] = column === row ? Math.sqrt(sum) : sum / entries[columnStart + column]!;
    }
    let value = right[row]!;
    for (let k = first; k < row; k++) value -= entries[rowStart + k]! * right[k]!;
    right[row] = value / entries[rowStart + row]!;
  }
  for (let row = size - 1; row >= 0; row--) {
    const rowStart = row * width + bandwidth - row;
    const value = right[row]! / entries[rowStart + row]!;
    right[row] = value;
    for (let k = Math.max(0, row - bandwidth); k < row; k++) right[k]! -= entries[rowStart + k]! * value;
  }
}
