// Amounts of the elements a little off the ones given, inside what a certificate allows: where these are in the exact proportions
// of some phases, what is left for all others is a difference of equals, and rounding decides it. A little of everything that
// may form is added instead, so that no balance is empty and every amount has digits of its own.
// Knows no energy. Invariant: what is added can be formed, and no element changes by more than `largestShift` of itself.
// Method: perturbation of degenerate linear programs (Charnes 1952), by phases rather than by elements.

import type { Work } from './work.ts';

/** A third of what a certificate allows, so that rounding has the rest. */
const largestShift = 3e-11;
/** Fractional parts of its multiples are spread evenly: no two phases are added in a simple proportion. */
const goldenRatio = 0.6180339887498949;

/** mol of each element row, for the phases admitted to `work`; `elementMol` is what was given. */
export function offProportion(work: Work, elementMol: Float64Array): Float64Array {
  const { set, width } = work;
  const rows = set.hasCharge ? width - 1 : width;
  const added = new Float64Array(width);
  const add = (phase: number): void => {
    const column = phase * width;
    if (rows < width && set.atoms[column + rows] !== 0) return;
    let most = Infinity;
    for (let row = 0; row < rows; row += 1) {
      const atoms = set.atoms[column + row] ?? 0;
      if (atoms > 0) most = Math.min(most, (elementMol[row] ?? 0) / atoms);
    }
    if (most === Infinity) return;
    const mol = most * (0.5 + 0.5 * ((phase * goldenRatio) % 1));
    for (let row = 0; row < rows; row += 1) added[row] = (added[row] ?? 0) + mol * (set.atoms[column + row] ?? 0);
  };
  for (let index = 0; index < work.gasCount; index += 1) add(work.gases[index] ?? 0);
  for (let index = 0; index < work.condensedCount; index += 1) add(work.condensed[index] ?? 0);
  let largest = 0;
  for (let row = 0; row < rows; row += 1) {
    const given = elementMol[row] ?? 0;
    if (given > 0) largest = Math.max(largest, (added[row] ?? 0) / given);
  }
  return elementMol.map((given, row) => given + (largest > 0 ? (largestShift / largest) * (added[row] ?? 0) : 0));
}
