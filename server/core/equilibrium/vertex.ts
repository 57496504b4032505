// The vertex of least energy: which independent phases alone, each taken pure, could hold all elements at the least Gibbs
// energy. Its phases are the basis in which the balances are then written, its amounts and potentials the start of the search.
// Knows no mixing entropy: it is a start, not an answer. Invariant: amounts are not negative and reproduce the elements given;
// when they cannot, the elements to blame are named, and no state of these phases exists at all.
// Method: primal simplex on the full tableau with artificial phases at a high cost, steepest cost per atom first, the
// first of equals against cycling (Dantzig; Bland's rule once the objective has stood still).

import { at, at32 } from './entry.ts';
import type { Work } from './work.ts';

const artificialCost = 1e6;
const tolerance = 1e-9;

/**
 * Finds the vertex for the present `cost`. On return `basis`, `nu`, `amounts` and `rank` are set. Returns undefined when it is
 * found, else the element rows that no combination of the admitted phases can hold.
 */
export function findVertex(work: Work): readonly number[] | undefined {
  start(work);
  descend(work);
  const blamed = blamedRows(work);
  if (blamed.length > 0) return blamed;
  replaceArtificials(work);
  takeAmountsOfBasis(work);
  return undefined;
}

/**
 * Writes the balances in the most abundant independent phases of a state (mol of each phase); false when it has too few. The
 * result depends on nothing but the state, the amounts given and the phases admitted.
 */
export function takeBasis(work: Work, amountsMol: Float64Array): boolean {
  const { width, nu, basis } = work;
  start(work);
  for (let count = 0; count < work.rank; count += 1) {
    let best = -1;
    let most = 0;
    let row = -1;
    forEachPhase(work, (phase) => {
      const amount = at(amountsMol, phase);
      if (!(amount > most)) return;
      let own = -1;
      let size = tolerance;
      for (let k = 0; k < work.rank; k += 1) {
        const entry = Math.abs(at(nu, phase * width + k));
        if (at32(basis, k) < 0 && entry > size) {
          size = entry;
          own = k;
        }
      }
      if (own < 0) return;
      best = phase;
      most = amount;
      row = own;
    });
    if (best < 0) break;
    pivot(work, best, row);
  }
  replaceArtificials(work);
  takeAmountsOfBasis(work);
  markForced(work);
  return true;
}

function start(work: Work): void {
  const { set, width, nu, given, amounts, basis } = work;
  nu.set(set.atoms);
  const chargeRow = set.hasCharge ? width - 1 : -1;
  // Absent elements have no row: their phases are not admitted.
  let rank = 0;
  work.inverse.fill(0);
  for (let row = 0; row < width; row += 1) {
    if (row !== chargeRow && at(given, row) === 0) continue;
    if (rank !== row) forEachPhase(work, (phase) => (nu[phase * width + rank] = at(set.atoms, phase * width + row)));
    amounts[rank] = at(given, row);
    basis[rank] = -1 - row;
    work.inverse[row * width + rank] = 1;
    rank += 1;
  }
  work.rank = rank;
  work.isForced.fill(0);
}

/** How far below equilibrium a phase that cannot be there is put, over RT. */
export const forcedDown = 250;

/** Marks the empty balances that every phase could only add to. */
export function markForced(work: Work): void {
  const { rank, width, nu, amounts, isForced } = work;
  isForced.fill(0);
  for (let k = 0; k < rank; k += 1) {
    if (at(amounts, k) !== 0) continue;
    let isOneSided = true;
    forEachPhase(work, (phase) => (isOneSided &&= at(nu, phase * width + k) >= 0));
    if (isOneSided) isForced[k] = 1;
  }
}

function descend(work: Work): void {
  const { rank } = work;
  let still = 0;
  let objective = Infinity;
  const mostPivots = 60 + 40 * rank;
  for (let count = 0; count < mostPivots; count += 1) {
    const entering = enteringPhase(work, still > 2 * rank);
    if (entering < 0) return;
    const row = leavingRow(work, entering);
    if (row < 0) return;
    pivot(work, entering, row);
    const now = presentObjective(work);
    still = now < objective - 1e-13 * Math.abs(objective) ? 0 : still + 1;
    objective = Math.min(objective, now);
  }
}

function presentObjective({ rank, basis, amounts, cost }: Work): number {
  let sum = 0;
  for (let k = 0; k < rank; k += 1) {
    const phase = at32(basis, k);
    sum += at(amounts, k) * (phase < 0 ? artificialCost : at(cost, phase));
  }
  return sum;
}

/** The phase whose entering lowers the energy most, per atom; -1 when none does. */
function enteringPhase(work: Work, firstOnly: boolean): number {
  const { set, width, rank, nu, basis, cost, spare } = work;
  for (let k = 0; k < rank; k += 1) {
    const phase = at32(basis, k);
    spare[k] = phase < 0 ? artificialCost : at(cost, phase);
  }
  let best = -1;
  let steepest = 0;
  const lists = [work.gases, work.condensed] as const;
  const counts = [work.gasCount, work.condensedCount] as const;
  for (let which = 0; which < 2; which += 1) {
    const list = lists[which] as Int32Array;
    const count = counts[which] as number;
    for (let index = 0; index < count; index += 1) {
      const phase = at32(list, index);
      let reduced = at(cost, phase);
      const column = phase * width;
      for (let k = 0; k < rank; k += 1) reduced -= at(nu, column + k) * at(spare, k);
      if (reduced > -1e-8) continue;
      const slope = reduced / at(set.atomCount, phase);
      if (slope < steepest) {
        best = phase;
        if (firstOnly) return best;
        steepest = slope;
      }
    }
  }
  return best;
}

/** The basis phase that runs out first as the entering one grows; an artificial one at nothing leaves at once. */
function leavingRow({ rank, nu, width, basis, amounts }: Work, entering: number): number {
  let best = -1;
  let least = Infinity;
  let size = 0;
  for (let k = 0; k < rank; k += 1) {
    const entry = at(nu, entering * width + k);
    const isIdle = at32(basis, k) < 0 && at(amounts, k) <= 0;
    if (isIdle ? Math.abs(entry) <= tolerance : entry <= tolerance) continue;
    const ratio = isIdle ? 0 : at(amounts, k) / entry;
    if (ratio < least || (ratio === least && Math.abs(entry) > size)) {
      best = k;
      least = ratio;
      size = Math.abs(entry);
    }
  }
  return best;
}

function pivot(work: Work, entering: number, row: number): void {
  const { width, rank, nu, amounts, spare, basis } = work;
  const own = entering * width;
  const inverse = 1 / at(nu, own + row);
  for (let k = 0; k < rank; k += 1) spare[k] = at(nu, own + k);
  const lists = [work.gases, work.condensed] as const;
  const counts = [work.gasCount, work.condensedCount] as const;
  for (let which = 0; which < 2; which += 1) {
    const list = lists[which] as Int32Array;
    const count = counts[which] as number;
    for (let index = 0; index < count; index += 1) {
      pivotColumn(nu, at32(list, index) * width, row, rank, inverse, spare);
    }
  }
  for (let element = 0; element < width; element += 1)
    pivotColumn(work.inverse, element * width, row, rank, inverse, spare);
  const moved = at(amounts, row) * inverse;
  for (let k = 0; k < rank; k += 1) {
    const left = at(amounts, k) - moved * at(spare, k);
    // What is left of a difference of equals is nothing.
    amounts[k] = Math.abs(left) <= 4e-15 * Math.abs(at(amounts, k)) ? 0 : left;
  }
  amounts[row] = moved;
  basis[row] = entering;
}

/** One column after the entering phase, whose own is `entering`, has taken a row. */
function pivotColumn(
  columns: Float64Array,
  start: number,
  row: number,
  rank: number,
  inverse: number,
  entering: Float64Array,
): void {
  const taken = at(columns, start + row) * inverse;
  if (taken === 0) return;
  for (let k = 0; k < rank; k += 1) columns[start + k] = clean(at(columns, start + k) - taken * at(entering, k));
  columns[start + row] = clean(taken);
}

/**
 * The amounts of the finished basis from the elements given, at one stroke: what the steps on the way left of a rare element,
 * after plentiful ones had passed through its balance, is not good enough. Where several basis phases share a rare element with
 * plentiful ones, each of their amounts carries the rounding of these; what that leaves of the rare element's own balance is
 * shared out once more, so that every element adds up to its own last digits.
 */
function takeAmountsOfBasis({ set, width, rank, given, inverse, amounts, basis, spare }: Work): void {
  for (let k = 0; k < rank; k += 1) {
    let sum = 0;
    let size = 0;
    for (let row = 0; row < width; row += 1) {
      const part = at(given, row) * at(inverse, row * width + k);
      sum += part;
      size += Math.abs(part);
    }
    amounts[k] = Math.abs(sum) <= 2e-15 * size ? 0 : sum;
  }
  for (let row = 0; row < width; row += 1) {
    let left = at(given, row);
    for (let k = 0; k < rank; k += 1) left -= at(set.atoms, at32(basis, k) * width + row) * at(amounts, k);
    spare[row] = left;
  }
  for (let k = 0; k < rank; k += 1) {
    if (at(amounts, k) === 0) continue;
    let sum = 0;
    for (let row = 0; row < width; row += 1) sum += at(spare, row) * at(inverse, row * width + k);
    amounts[k] = at(amounts, k) + sum;
  }
}

/** Entries are small fractions: what elimination leaves below this is rounding. */
function clean(entry: number): number {
  return Math.abs(entry) < 1e-11 ? 0 : entry;
}

/** Element rows whose artificial phase is needed beyond rounding. */
function blamedRows({ rank, basis, amounts, given }: Work): number[] {
  const rows: number[] = [];
  for (let k = 0; k < rank; k += 1) {
    const phase = at32(basis, k);
    if (phase < 0 && at(amounts, k) > 1e-11 * Math.max(at(given, -1 - phase), 1e-300)) rows.push(-1 - phase);
  }
  return rows;
}

/** Idle artificial phases give way to the real one that costs least; a row that has none depends on others and is dropped. */
function replaceArtificials(work: Work): void {
  const { width, nu, basis, cost } = work;
  for (let row = 0; row < work.rank;) {
    if (at32(basis, row) >= 0) {
      row += 1;
      continue;
    }
    let best = -1;
    let least = Infinity;
    forEachPhase(work, (phase) => {
      const entry = Math.abs(at(nu, phase * width + row));
      if (entry <= tolerance) return;
      let reduced = at(cost, phase);
      let isShared = false;
      for (let k = 0; k < work.rank; k += 1) {
        const other = at32(basis, k);
        const own = at(nu, phase * width + k);
        if (other >= 0) reduced -= own * at(cost, other);
        else isShared ||= k !== row && Math.abs(own) > tolerance;
      }
      // One that stands in a single idle row first: an ion is left to the balance of charge.
      const ratio = Math.abs(reduced) / entry + (isShared ? 1e6 : 0);
      if (ratio < least) {
        best = phase;
        least = ratio;
      }
    });
    if (best >= 0) {
      pivot(work, best, row);
      row += 1;
    } else dropRow(work, row);
  }
}

function dropRow(work: Work, row: number): void {
  const { width, nu, basis, amounts } = work;
  work.rank -= 1;
  for (let k = row; k < work.rank; k += 1) {
    basis[k] = at32(basis, k + 1);
    amounts[k] = at(amounts, k + 1);
    for (let element = 0; element < width; element += 1) {
      work.inverse[element * width + k] = at(work.inverse, element * width + k + 1);
    }
  }
  forEachPhase(work, (phase) => {
    for (let k = row; k < work.rank; k += 1) nu[phase * width + k] = at(nu, phase * width + k + 1);
  });
}

function forEachPhase(work: Work, visit: (phase: number) => void): void {
  for (let index = 0; index < work.gasCount; index += 1) visit(at32(work.gases, index));
  for (let index = 0; index < work.condensedCount; index += 1) visit(at32(work.condensed, index));
}
