// Finds the pieces of one phase's curve: as few as meet the aim, with joins where the rows ask for them and as few terms as do.
// Every transition is a join from the start; others are tried at each row and moved until nothing improves.
// Knows no phase's name. Invariant: the answer depends on the rows alone, so the same tables give the same data.

import { constraintEquations, countUnknowns, equationsPerRow, rowEquations } from './equations.ts';
import type { Anchor, GibbsPoint, Piece } from './equations.ts';
import { solveLeastSquares } from './least-squares.ts';
import type { LinearRows } from './least-squares.ts';
import { referenceTemperatureK } from './source-table.ts';
import type { SourceRow, Stretch } from './source-table.ts';

export interface FittedPieces {
  readonly pieces: readonly Piece[];
  /** Seven terms of cp/R a piece; those not used are zero. */
  readonly terms: readonly Float64Array[];
  readonly anchor: Anchor;
  /** The worst of all residuals as a share of its limit. */
  readonly worst: number;
}

/** A fit is good enough where no residual is above this share of its limit; between this and 1 more pieces are tried. */
const aim = 0.5;
/** Terms are dropped while the residuals stay below this share, or below what they are. */
const aimOfTerms = 0.3;
const mostJoins = 6;

/** Terms in the order in which a piece gets them: constant, t, t^-2, t^2, t^-1, t^3, t^4. */
const termOrder = [2, 3, 0, 4, 1, 5, 6];

/** Fits one phase. Needs at least one stretch with two rows. */
export function choosePieces(stretches: readonly Stretch[], gibbsPoints: readonly GibbsPoint[]): FittedPieces {
  let best: FittedPieces | undefined;
  // Where rows are few, terms beyond their number follow enthalpy and entropy; they are allowed only when nothing else helps.
  for (const extraTerms of [0, 1, 2]) {
    const found = addJoins(stretches, gibbsPoints, extraTerms);
    if (best === undefined || found.worst < best.worst) best = found;
    if (best.worst <= 1) break;
  }
  if (best === undefined) throw new Error('no stretch to fit');
  return dropTerms(best, gibbsPoints);
}

/** Joins of the layout, one list of row indices a stretch. */
type Joins = readonly (readonly number[])[];

function addJoins(stretches: readonly Stretch[], gibbsPoints: readonly GibbsPoint[], extraTerms: number): FittedPieces {
  const solve = (joins: Joins): FittedPieces => solvePieces(layOut(stretches, joins, extraTerms), gibbsPoints);
  let joins: Joins = stretches.map(() => []);
  let current = solve(joins);
  let best = current;
  for (let count = 1; count <= mostJoins && current.worst > aim; count += 1) {
    const candidates = stretches.flatMap((stretch, index) =>
      stretch.rows.slice(1, -1).map((_, place) => ({ index, place: place + 1 })),
    );
    let next: { joins: Joins; fitted: FittedPieces } | undefined;
    for (const { index, place } of candidates) {
      if (joins[index]?.includes(place)) continue;
      const tried = joins.map((list, stretch) => (stretch === index ? [...list, place].sort((a, b) => a - b) : list));
      const fitted = solve(tried);
      if (next === undefined || fitted.worst < next.fitted.worst) next = { joins: tried, fitted };
    }
    if (next === undefined) break;
    next = moveJoins(next, solve, stretches);
    joins = next.joins;
    current = next.fitted;
    const needed = best.worst > 1 ? 0.98 : 0.8;
    if (current.worst < best.worst * needed) best = current;
  }
  return best;
}

/** Moves one join at a time to the row where the worst residual is least, until none moves. */
function moveJoins(
  start: { joins: Joins; fitted: FittedPieces },
  solve: (joins: Joins) => FittedPieces,
  stretches: readonly Stretch[],
): { joins: Joins; fitted: FittedPieces } {
  let best = start;
  for (let pass = 0, moved = true; moved && pass < 4; pass += 1) {
    moved = false;
    for (const [stretch, list] of best.joins.entries()) {
      for (let k = 0; k < list.length; k += 1) {
        const from = (best.joins[stretch]?.[k - 1] ?? 0) + 1;
        const to = best.joins[stretch]?.[k + 1] ?? (stretches[stretch]?.rows.length ?? 0) - 1;
        for (let place = from; place < to; place += 1) {
          const tried = best.joins.map((old, index) =>
            index === stretch ? old.map((each, position) => (position === k ? place : each)) : old,
          );
          const fitted = solve(tried);
          if (fitted.worst < best.fitted.worst * 0.999) {
            best = { joins: tried, fitted };
            moved = true;
          }
        }
      }
    }
  }
  return best;
}

/** Takes terms away, last piece first, while the fit stays within its aim or hardly changes. */
function dropTerms(fitted: FittedPieces, gibbsPoints: readonly GibbsPoint[]): FittedPieces {
  let best = fitted;
  const allowed = Math.max(aimOfTerms, fitted.worst * 1.02);
  for (let index = fitted.pieces.length - 1; index >= 0; index -= 1) {
    for (;;) {
      const length = best.pieces[index]?.terms.length ?? 0;
      if (length <= 1) break;
      const pieces = best.pieces.map((piece, k) => (k === index ? { ...piece, terms: usedTerms(length - 1) } : piece));
      const tried = solvePieces(pieces, gibbsPoints);
      if (!(tried.worst <= allowed)) break;
      best = tried;
    }
  }
  return best;
}

function layOut(stretches: readonly Stretch[], joins: Joins, extraTerms: number): readonly Piece[] {
  return stretches.flatMap((stretch, index) => {
    const ends = [0, ...(joins[index] ?? []), stretch.rows.length - 1];
    return ends.slice(1).map((end, k): Piece => {
      const rows = stretch.rows.slice(ends[k] ?? 0, end + 1);
      const begins = k > 0 ? ('join' as const) : stretch.begins;
      const terms = usedTerms(mostTerms(rows, extraTerms));
      const range = { fromK: rows[0]?.temperatureK ?? 0, toK: rows.at(-1)?.temperatureK ?? 0 };
      return { rows, ...range, terms, ...(begins === undefined ? {} : { begins }) };
    });
  });
}

/**
 * As many terms as rows say what the heat capacity is; extra ones only where every row does, or nothing would hold them. In a
 * narrow piece high powers are all alike: seven would be huge numbers that cancel.
 */
function mostTerms(rows: readonly SourceRow[], extraTerms: number): number {
  const isNarrow = (rows.at(-1)?.temperatureK ?? 0) < 1.3 * (rows[0]?.temperatureK ?? 0);
  const telling = rows.filter((row) => row.setAside?.includes('heatCapacity') !== true).length;
  return Math.min(isNarrow ? 5 : termOrder.length, Math.max(1, telling + (telling === rows.length ? extraTerms : 0)));
}

function usedTerms(count: number): readonly number[] {
  return termOrder.slice(0, count).sort((a, b) => a - b);
}

function solvePieces(pieces: readonly Piece[], gibbsPoints: readonly GibbsPoint[]): FittedPieces {
  const anchor = anchorOf(pieces);
  const equations = rowEquations(pieces, anchor);
  const unknowns = countUnknowns(pieces);
  const constraints = constraintEquations(pieces, anchor, gibbsPoints);
  const solution = solveLeastSquares(equations, constraints, unknowns);
  let worst = 0;
  equations.targets.forEach((_, equation) => {
    if (equation % equationsPerRow === equationsPerRow - 1) return; // entropy is a weight, not a limit
    worst = Math.max(worst, residualOf(equations, equation, solution));
  });
  // With too few terms constraints contradict each other, and the solver leaves out the later ones.
  constraints.targets.forEach((_, equation) => {
    worst = Math.max(worst, residualOf(constraints, equation, solution) / mostOffConstraint);
  });
  let offset = 0;
  const terms = pieces.map((piece) => {
    const all = new Float64Array(termOrder.length);
    for (const term of piece.terms) all[term] = solution[offset++] ?? 0;
    return all;
  });
  return { pieces, terms, anchor, worst: Number.isNaN(worst) ? Number.POSITIVE_INFINITY : worst };
}

/** What cp/R or G/RT may be off where they must hold exactly, before that counts as much as a residual at its limit. */
const mostOffConstraint = 1e-5;

function residualOf({ coefficients, targets }: LinearRows, equation: number, solution: Float64Array): number {
  let residual = -(targets[equation] ?? 0);
  for (let j = 0; j < solution.length; j += 1)
    residual += (coefficients[equation * solution.length + j] ?? 0) * (solution[j] ?? 0);
  return Math.abs(residual);
}

/** The row at 298.15 K, in the upper piece where two meet there; else the last row. */
function anchorOf(pieces: readonly Piece[]): Anchor {
  for (let piece = pieces.length - 1; piece >= 0; piece -= 1) {
    const row = pieces[piece]?.rows.find(isReference);
    if (row !== undefined) return { row, piece };
  }
  const row = pieces.at(-1)?.rows.at(-1);
  if (row === undefined) throw new Error('a phase without rows');
  return { row, piece: pieces.length - 1 };
}

function isReference(row: SourceRow): boolean {
  return row.temperatureK === referenceTemperatureK;
}
