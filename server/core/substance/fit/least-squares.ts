// A dense linear least-squares solver with equality constraints, for problems of a few hundred rows and a few dozen unknowns.
// The constraints are eliminated by Householder reflections of their transpose, the rest is a Householder QR of the rows.
// Knows nothing of temperatures. Invariant: constraints hold to rounding; a constraint that follows from earlier ones is left out.
// Source: Golub and Van Loan, Matrix Computations, 4th ed. (2013), 5.3 (QR) and 6.2.3 (equality constraints by null space).

/** Linear equations `coefficients · x = target`, row-major, `targets.length` rows of `unknowns` numbers. */
export interface LinearRows {
  readonly coefficients: Float64Array;
  readonly targets: Float64Array;
}

/**
 * The x (length `unknowns`) that makes the squares of `rows` least while `constraints` hold exactly. Neither argument is
 * changed. A direction that no row sees is given the value nearest zero that the elimination finds.
 */
export function solveLeastSquares(rows: LinearRows, constraints: LinearRows, unknowns: number): Float64Array {
  const scales = columnScales(rows, constraints, unknowns);
  const reflectors = reflectConstraints(constraints, unknowns, scales);
  const rotated = new Float64Array(unknowns);
  solveConstraints(reflectors, rotated);

  const rowCount = rows.targets.length;
  const bound = reflectors.kept.length;
  const free = unknowns - bound;
  const matrix = new Float64Array(rowCount * free);
  const targets = Float64Array.from(rows.targets);
  const row = new Float64Array(unknowns);
  for (let i = 0; i < rowCount; i += 1) {
    for (let j = 0; j < unknowns; j += 1) row[j] = at(rows.coefficients, i * unknowns + j) / at(scales, j);
    for (const { vector } of reflectors.kept) reflect(row, vector);
    let known = 0;
    for (let j = 0; j < bound; j += 1) known += at(row, j) * at(rotated, j);
    targets[i] = at(targets, i) - known;
    for (let j = 0; j < free; j += 1) matrix[i * free + j] = at(row, bound + j);
  }
  rotated.set(solveRows(matrix, targets, rowCount, free), bound);
  for (let k = bound - 1; k >= 0; k -= 1) {
    const reflector = reflectors.kept[k];
    if (reflector !== undefined) reflect(rotated, reflector.vector);
  }
  for (let j = 0; j < unknowns; j += 1) rotated[j] = at(rotated, j) / at(scales, j);
  return rotated;
}

interface Reflector {
  /** Unit vector v of the reflection 1 - 2 v vᵀ. */
  readonly vector: Float64Array;
  /** The constraint's row after all reflections: zero beyond its own place. */
  readonly reduced: Float64Array;
  readonly target: number;
}

interface Reflectors {
  readonly kept: Reflector[];
}

const negligible = 1e-11;

/** Scales that give every column of rows and constraints together a length of one. */
function columnScales(rows: LinearRows, constraints: LinearRows, unknowns: number): Float64Array {
  const squares = new Float64Array(unknowns);
  for (const part of [rows, constraints])
    part.coefficients.forEach((value, index) => {
      squares[index % unknowns] = at(squares, index % unknowns) + value * value;
    });
  return squares.map((square) => (square > 0 ? Math.sqrt(square) : 1));
}

function reflectConstraints(constraints: LinearRows, unknowns: number, scales: Float64Array): Reflectors {
  const kept: Reflector[] = [];
  constraints.targets.forEach((target, index) => {
    const reduced = new Float64Array(unknowns);
    let largest = 0;
    for (let j = 0; j < unknowns; j += 1) {
      reduced[j] = at(constraints.coefficients, index * unknowns + j) / at(scales, j);
      largest = Math.max(largest, Math.abs(at(reduced, j)));
    }
    for (const { vector } of kept) reflect(reduced, vector);
    const place = kept.length;
    const vector = householderVector(reduced, place, largest * negligible);
    if (vector === undefined) return;
    reflect(reduced, vector);
    kept.push({ vector, reduced, target });
  });
  return { kept };
}

/** Forward substitution: the first components of the rotated unknowns, one for each constraint. */
function solveConstraints({ kept }: Reflectors, rotated: Float64Array): void {
  kept.forEach(({ reduced, target }, place) => {
    let rest = target;
    for (let j = 0; j < place; j += 1) rest -= at(reduced, j) * at(rotated, j);
    rotated[place] = rest / at(reduced, place);
  });
}

/** QR of the row-major matrix in place, then back substitution. */
function solveRows(matrix: Float64Array, targets: Float64Array, rowCount: number, columns: number): Float64Array {
  const column = new Float64Array(rowCount);
  const diagonal = new Float64Array(columns);
  const steps = Math.min(rowCount, columns);
  for (let k = 0; k < steps; k += 1) {
    for (let i = 0; i < rowCount; i += 1) column[i] = at(matrix, i * columns + k);
    const vector = householderVector(column, k, negligible);
    if (vector === undefined) continue;
    for (let j = k; j < columns; j += 1) {
      let product = 0;
      for (let i = k; i < rowCount; i += 1) product += at(vector, i) * at(matrix, i * columns + j);
      for (let i = k; i < rowCount; i += 1)
        matrix[i * columns + j] = at(matrix, i * columns + j) - 2 * product * at(vector, i);
    }
    reflect(targets, vector);
    diagonal[k] = at(matrix, k * columns + k);
  }
  const solution = new Float64Array(columns);
  for (let k = steps - 1; k >= 0; k -= 1) {
    if (diagonal[k] === 0) continue;
    let rest = at(targets, k);
    for (let j = k + 1; j < columns; j += 1) rest -= at(matrix, k * columns + j) * at(solution, j);
    solution[k] = rest / at(diagonal, k);
  }
  return solution;
}

/** The unit vector whose reflection clears `values` beyond `place`; undefined when there is nothing above `threshold`. */
function householderVector(values: Float64Array, place: number, threshold: number): Float64Array | undefined {
  let square = 0;
  for (let i = place; i < values.length; i += 1) square += at(values, i) ** 2;
  const length = Math.sqrt(square);
  if (length <= threshold) return undefined;
  const vector = new Float64Array(values.length);
  for (let i = place; i < values.length; i += 1) vector[i] = at(values, i);
  vector[place] = at(vector, place) + (at(values, place) >= 0 ? length : -length);
  let norm = 0;
  for (let i = place; i < vector.length; i += 1) norm += at(vector, i) ** 2;
  norm = Math.sqrt(norm);
  for (let i = place; i < vector.length; i += 1) vector[i] = at(vector, i) / norm;
  return vector;
}

function reflect(values: Float64Array, vector: Float64Array): void {
  let product = 0;
  for (let i = 0; i < values.length; i += 1) product += at(values, i) * at(vector, i);
  for (let i = 0; i < values.length; i += 1) values[i] = at(values, i) - 2 * product * at(vector, i);
}

/** An element of an array whose index is known to be inside. */
function at(values: Float64Array, index: number): number {
  return values[index] ?? Number.NaN;
}
