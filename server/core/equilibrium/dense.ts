// Small dense linear systems in flat arrays, for the inner loop: equilibrated, then eliminated with row pivoting, in place.
// Knows nothing of chemistry and allocates nothing. Invariant: a matrix that is singular to working precision is reported,
// never divided through. Method: symmetric equilibration by the square roots of the rows' largest entries, Gaussian
// elimination with partial pivoting.

import { at } from './entry.ts';

/** What `solveDense` works in; `size` is the largest system it can take. */
export interface DenseWork {
  readonly scale: Float64Array;
}

export function denseWork(size: number): DenseWork {
  return { scale: new Float64Array(size) };
}

/**
 * Solves `matrix` x = `right` for a matrix of `size` rows stored with row length `stride`, symmetric or nearly so in the size of
 * its entries; `right` becomes x and
 * the matrix is used up. Returns the smallest pivot over the largest after equilibration; 0 means singular, and then
 * `right` is worthless.
 */
export function solveDense(
  matrix: Float64Array,
  stride: number,
  size: number,
  right: Float64Array,
  work: DenseWork,
): number {
  const { scale } = work;
  for (let row = 0; row < size; row += 1) {
    let largest = 0;
    const start = row * stride;
    for (let column = 0; column < size; column += 1) {
      const entry = Math.abs(at(matrix, start + column));
      if (entry > largest) largest = entry;
    }
    if (!(largest > 0) || largest === Infinity) return 0;
    scale[row] = 1 / Math.sqrt(largest);
  }
  for (let row = 0; row < size; row += 1) {
    const start = row * stride;
    const own = at(scale, row);
    for (let column = 0; column < size; column += 1) {
      matrix[start + column] = at(matrix, start + column) * own * at(scale, column);
    }
    right[row] = at(right, row) * own;
  }
  let smallest = Infinity;
  let largestPivot = 0;
  for (let column = 0; column < size; column += 1) {
    let best = column;
    let bestEntry = Math.abs(at(matrix, column * stride + column));
    for (let row = column + 1; row < size; row += 1) {
      const entry = Math.abs(at(matrix, row * stride + column));
      if (entry > bestEntry) {
        best = row;
        bestEntry = entry;
      }
    }
    if (!(bestEntry > 0)) return 0;
    if (bestEntry < smallest) smallest = bestEntry;
    if (bestEntry > largestPivot) largestPivot = bestEntry;
    const start = column * stride;
    if (best !== column) {
      const other = best * stride;
      for (let k = column; k < size; k += 1) {
        const held = at(matrix, start + k);
        matrix[start + k] = at(matrix, other + k);
        matrix[other + k] = held;
      }
      const held = at(right, column);
      right[column] = at(right, best);
      right[best] = held;
    }
    const inverse = 1 / at(matrix, start + column);
    for (let row = column + 1; row < size; row += 1) {
      const rowStart = row * stride;
      const factor = at(matrix, rowStart + column) * inverse;
      if (factor === 0) continue;
      for (let k = column + 1; k < size; k += 1) {
        matrix[rowStart + k] = at(matrix, rowStart + k) - factor * at(matrix, start + k);
      }
      right[row] = at(right, row) - factor * at(right, column);
    }
  }
  for (let row = size - 1; row >= 0; row -= 1) {
    const start = row * stride;
    let sum = at(right, row);
    for (let k = row + 1; k < size; k += 1) sum -= at(matrix, start + k) * at(right, k);
    right[row] = sum / at(matrix, start + row);
  }
  for (let row = 0; row < size; row += 1) right[row] = at(right, row) * at(scale, row);
  return smallest / largestPivot;
}
