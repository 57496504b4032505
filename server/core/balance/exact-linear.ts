// Exact linear algebra over the rationals, for systems as small as a chemical equation: row reduction, null space, and
// whether a system has a non-negative solution. Knows no chemistry. Invariant: results are exact, there is no tolerance.
// Source: Gauss-Jordan elimination; the two-phase simplex method with Bland's rule (Bland 1977), which cannot cycle.

import Fraction from 'fraction.js';

/** Rows of equal length. */
export type Matrix = readonly (readonly Fraction[])[];

/**
 * A decimal or whole number as the fraction its decimal text means (0.947 is 947/1000), to twelve digits, so that a sum
 * such as 0.1 + 0.2 is three tenths. Not a finite number counts as 0.
 */
export function exactNumber(value: number): Fraction {
  if (Number.isSafeInteger(value)) return value === 0 ? zero : value === 1 ? one : new Fraction(value);
  return new Fraction(Number.isFinite(value) ? String(Number(value.toPrecision(12))) : 0);
}

export const zero = new Fraction(0);
export const one = new Fraction(1);

/** Reduced row echelon form, with the pivot column of each of its non-zero rows. */
export function reduceRows(matrix: Matrix): { readonly rows: Matrix; readonly pivots: readonly number[] } {
  const rows = matrix.map((row) => [...row]);
  const columnCount = rows[0]?.length ?? 0;
  const pivots: number[] = [];
  for (let column = 0; column < columnCount && pivots.length < rows.length; column += 1) {
    const top = pivots.length;
    const found = rows.findIndex((row, index) => index >= top && !at(row, column).equals(0));
    if (found < 0) continue;
    [rows[top], rows[found]] = [rows[found] ?? [], rows[top] ?? []];
    const divisor = at(rows[top] ?? [], column);
    rows[top] = (rows[top] ?? []).map((value) => value.div(divisor));
    rows.forEach((row, index) => {
      const factor = at(row, column);
      if (index !== top && !factor.equals(0)) rows[index] = subtractRow(row, rows[top] ?? [], factor);
    });
    pivots.push(column);
  }
  return { rows: rows.slice(0, pivots.length), pivots };
}

/** A basis of all x with `matrix · x = 0`; one vector for each column that is no pivot. */
export function nullSpace(matrix: Matrix, columnCount: number): readonly (readonly Fraction[])[] {
  const { rows, pivots } = reduceRows(matrix);
  const free = range(columnCount).filter((column) => !pivots.includes(column));
  return free.map((freeColumn) =>
    range(columnCount).map((column) => {
      if (column === freeColumn) return one;
      const row = pivots.indexOf(column);
      return row < 0 ? zero : at(rows[row] ?? [], freeColumn).neg();
    }),
  );
}

/**
 * The least `cost · x` over all x ≥ 0 with `matrix · x = rightSide`, and an x that reaches it. `infeasible` when no such x
 * exists, `unbounded` when the cost has no least value.
 */
export function minimise(
  matrix: Matrix,
  rightSide: readonly Fraction[],
  cost: readonly Fraction[],
): { readonly kind: 'least'; readonly x: readonly Fraction[] } | { readonly kind: 'infeasible' | 'unbounded' } {
  const columnCount = cost.length;
  const rowCount = matrix.length;
  // Phase one: an artificial variable a row, all rows with a right side of at least zero; their sum must come to zero.
  const tableau = matrix.map((row, index) => {
    const right = rightSide[index] ?? zero;
    const sign = right.lt(0) ? one.neg() : one;
    const artificial = range(rowCount).map((column) => (column === index ? one : zero));
    return [...row.map((value) => value.mul(sign)), ...artificial, right.mul(sign)];
  });
  const basis = range(rowCount).map((row) => columnCount + row);
  const artificialCost = [...range(columnCount).map(() => zero), ...range(rowCount).map(() => one)];
  runSimplex(tableau, basis, artificialCost, columnCount + rowCount);
  const left = basis.reduce(
    (sum, column, row) => (column >= columnCount ? sum.add(lastOf(tableau[row] ?? [])) : sum),
    zero,
  );
  if (left.gt(0)) return { kind: 'infeasible' };
  driveOutArtificials(tableau, basis, columnCount);
  const fullCost = [...cost, ...range(rowCount).map(() => zero)];
  if (!runSimplex(tableau, basis, fullCost, columnCount)) return { kind: 'unbounded' };
  const x = range(columnCount).map((column) => {
    const row = basis.indexOf(column);
    return row < 0 ? zero : lastOf(tableau[row] ?? []);
  });
  return { kind: 'least', x };
}

/** Pivots until no column among the first `usable` lowers the cost; false when it falls without end. */
function runSimplex(tableau: Fraction[][], basis: number[], cost: readonly Fraction[], usable: number): boolean {
  for (;;) {
    const entering = range(usable).find((column) => {
      if (basis.includes(column)) return false;
      const priced = basis.reduce(
        (sum, basic, row) => sum.add(at(cost, basic).mul(at(tableau[row] ?? [], column))),
        zero,
      );
      return at(cost, column).lt(priced);
    });
    if (entering === undefined) return true;
    let leaving: number | undefined;
    let least: Fraction | undefined;
    tableau.forEach((row, index) => {
      const value = at(row, entering);
      if (!value.gt(0)) return;
      const ratio = lastOf(row).div(value);
      const tie = least !== undefined && ratio.equals(least) && (basis[index] ?? 0) < (basis[leaving ?? 0] ?? 0);
      if (least === undefined || ratio.lt(least) || tie) [least, leaving] = [ratio, index];
    });
    if (leaving === undefined) return false;
    pivot(tableau, basis, leaving, entering);
  }
}

/** Artificial variables still in the basis stand at zero; they leave for a real column, or their row says nothing. */
function driveOutArtificials(tableau: Fraction[][], basis: number[], columnCount: number): void {
  for (let row = tableau.length - 1; row >= 0; row -= 1) {
    if ((basis[row] ?? 0) < columnCount) continue;
    const column = range(columnCount).find((candidate) => !at(tableau[row] ?? [], candidate).equals(0));
    if (column !== undefined) pivot(tableau, basis, row, column);
    else {
      tableau.splice(row, 1);
      basis.splice(row, 1);
    }
  }
}

function pivot(tableau: Fraction[][], basis: number[], row: number, column: number): void {
  const divisor = at(tableau[row] ?? [], column);
  const pivotRow = (tableau[row] ?? []).map((value) => value.div(divisor));
  tableau[row] = pivotRow;
  tableau.forEach((other, index) => {
    const factor = at(other, column);
    if (index !== row && !factor.equals(0)) tableau[index] = subtractRow(other, pivotRow, factor);
  });
  basis[row] = column;
}

function subtractRow(row: readonly Fraction[], other: readonly Fraction[], factor: Fraction): Fraction[] {
  return row.map((value, column) => value.sub(at(other, column).mul(factor)));
}

function at(row: readonly Fraction[], column: number): Fraction {
  return row[column] ?? zero;
}

function lastOf(row: readonly Fraction[]): Fraction {
  return at(row, row.length - 1);
}

function range(count: number): number[] {
  return Array.from({ length: count }, (_, index) => index);
}
