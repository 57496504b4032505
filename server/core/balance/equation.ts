// Balances a chemical equation: finds the whole-number coefficients that conserve every element and the charge, exactly.
// Knows no energies and no preferred chemistry: where several balances exist it says how many directions there are and offers
// the smallest. Invariant: coefficients that are returned conserve everything and are positive whole numbers without a
// common divisor. Method: null space of the element matrix over the rationals; smallest sum by search from an exact bound.

import Fraction from 'fraction.js';
import { total } from '../quantity/total.ts';
import type { Formula } from '../substance/formula.ts';
import { countOfElement, elementsOfFormulas } from './elements.ts';
import { minimise, nullSpace, one, reduceRows, zero } from './exact-linear.ts';
import type { Matrix } from './exact-linear.ts';

export interface BalancedCoefficients {
  readonly left: readonly number[];
  readonly right: readonly number[];
}

export type Balance =
  /** The only balance, apart from multiples. */
  | { readonly kind: 'unique'; readonly coefficients: BalancedCoefficients }
  /** `dimension` independent balances; the one offered has the smallest sum found, `smallest` when that is proven. */
  | {
      readonly kind: 'several';
      readonly dimension: number;
      readonly coefficients: BalancedCoefficients;
      readonly smallest: boolean;
    }
  | { readonly kind: 'none'; readonly why: NoBalance };

export type NoBalance =
  /** A side is empty. */
  | { readonly reason: 'empty-side'; readonly side: 'left' | 'right' }
  /** Elements (or `charge`) that stand on one side only. */
  | { readonly reason: 'one-sided'; readonly elements: readonly { element: string; side: 'left' | 'right' }[] }
  /** These species would have to stand on the other side. */
  | { readonly reason: 'wrong-side'; readonly species: readonly SpeciesPlace[] }
  /** These species can take no part whatever the rest. */
  | { readonly reason: 'takes-no-part'; readonly species: readonly SpeciesPlace[] }
  /** Each element stands on both sides, yet no amounts fit; these elements conflict. */
  | { readonly reason: 'conflict'; readonly elements: readonly string[] }
  /** The coefficients would be too large to be meant (above 10^9). */
  | { readonly reason: 'too-large' };

export interface SpeciesPlace {
  readonly side: 'left' | 'right';
  readonly index: number;
  readonly formula: Formula;
}

/**
 * Balances `left -> right`, with every species taking part. Phases are not looked at: H2O(l) and H2O(g) are two species
 * with the same atoms. Returns the reason when there is no balance.
 */
export function balanceEquation(left: readonly Formula[], right: readonly Formula[]): Balance {
  if (left.length === 0) return none({ reason: 'empty-side', side: 'left' });
  if (right.length === 0) return none({ reason: 'empty-side', side: 'right' });
  const places: readonly SpeciesPlace[] = [
    ...left.map((formula, index): SpeciesPlace => ({ side: 'left', index, formula })),
    ...right.map((formula, index): SpeciesPlace => ({ side: 'right', index, formula })),
  ];
  const elements = elementsOfFormulas(places.map((place) => place.formula));
  const oneSided = elements.flatMap((element) => oneSidedElement(element, places) ?? []);
  if (oneSided.length > 0) return none({ reason: 'one-sided', elements: oneSided });

  const matrix: Matrix = elements.map((element) =>
    places.map(({ formula, side }) => countOfElement(formula, element).mul(side === 'left' ? 1 : -1)),
  );
  const basis = nullSpace(matrix, places.length);
  const [only] = basis;
  if (only === undefined) return none({ reason: 'conflict', elements: conflictingElements(matrix, elements) });
  if (basis.length === 1) return balanceOfDirection(only, places);
  return balanceOfSeveral(matrix, basis.length, places);
}

function none(why: NoBalance): Balance {
  return { kind: 'none', why };
}

function oneSidedElement(element: string, places: readonly SpeciesPlace[]) {
  const holding = places.filter(({ formula }) => !countOfElement(formula, element).equals(0));
  const signs = new Set(
    holding.map(({ formula, side }) => (countOfElement(formula, element).gt(0) === (side === 'left') ? 1 : -1)),
  );
  // Charge may balance within one side (Na+ with Cl-); atoms cannot, so for them sign and side are the same thing.
  const [first] = holding;
  return first !== undefined && signs.size === 1 ? { element, side: first.side } : undefined;
}

function balanceOfDirection(direction: readonly Fraction[], places: readonly SpeciesPlace[]): Balance {
  const idle = places.filter((_, index) => (direction[index] ?? zero).equals(0));
  if (idle.length > 0) return none({ reason: 'takes-no-part', species: idle });
  const positive = places.filter((_, index) => (direction[index] ?? zero).gt(0));
  const negative = places.filter((_, index) => (direction[index] ?? zero).lt(0));
  if (positive.length > 0 && negative.length > 0) {
    return none({ reason: 'wrong-side', species: positive.length < negative.length ? positive : negative });
  }
  const coefficients = wholeNumbers(negative.length > 0 ? direction.map((value) => value.neg()) : direction);
  if (coefficients === undefined) return none({ reason: 'too-large' });
  return { kind: 'unique', coefficients: splitSides(coefficients, places) };
}

function balanceOfSeveral(matrix: Matrix, dimension: number, places: readonly SpeciesPlace[]): Balance {
  // All coefficients at least one, y = x - 1 ≥ 0: matrix · y = -matrix · 1. Any positive balance scales to such an x.
  const rightSide = matrix.map((row) => row.reduce((sum, value) => sum.add(value), zero).neg());
  const least = minimise(
    matrix,
    rightSide,
    places.map(() => one),
  );
  if (least.kind !== 'least') return none({ reason: 'takes-no-part', species: idleSpecies(matrix, places) });
  const relaxed = least.x.map((value) => value.add(1));
  const whole = wholeNumbers(relaxed);
  const lowerBound = relaxed
    .reduce((sum, value) => sum.add(value), zero)
    .ceil()
    .valueOf();
  const searched = smallestWholeBalance(matrix, places.length, lowerBound, whole);
  if (searched.best === undefined) return none({ reason: 'too-large' });
  return {
    kind: 'several',
    dimension,
    coefficients: splitSides(searched.best, places),
    smallest: searched.proven,
  };
}

const mostTrials = 10_000;

/**
 * Tries whole numbers for the free species by rising sum; the pivot species then follow. Stops once no smaller total can
 * come, or after `mostTrials`, when `start` or the best so far is returned unproven.
 */
function smallestWholeBalance(
  matrix: Matrix,
  columnCount: number,
  lowerBound: number,
  start: readonly number[] | undefined,
): { readonly best: readonly number[] | undefined; readonly proven: boolean } {
  const { rows, pivots } = reduceRows(matrix);
  const free = Array.from({ length: columnCount }, (_, column) => column).filter((column) => !pivots.includes(column));
  const weights = rows.map((row) => free.map((column) => (row[column] ?? zero).neg().valueOf()));
  let best = start;
  let bestSum = start === undefined ? Infinity : total(start);
  let trials = 0;
  for (let freeSum = free.length; freeSum + pivots.length <= bestSum; freeSum += 1) {
    for (const values of compositionsOfSum(freeSum, free.length)) {
      trials += 1;
      if (trials > mostTrials) return { best, proven: false };
      const pivotValues = weights.map((row) =>
        row.reduce((sum, weight, index) => sum + weight * (values[index] ?? 0), 0),
      );
      // Weights are exact small ratios turned to doubles; a whole number is off by rounding only.
      if (!pivotValues.every((value) => value > 0.5 && Math.abs(value - Math.round(value)) < 1e-9)) continue;
      const sum = freeSum + total(pivotValues.map(Math.round));
      if (sum >= bestSum) continue;
      const candidate = new Array<number>(columnCount).fill(0);
      free.forEach((column, index) => (candidate[column] = values[index] ?? 0));
      pivots.forEach((column, index) => (candidate[column] = Math.round(pivotValues[index] ?? 0)));
      [best, bestSum] = [candidate, sum];
      if (bestSum <= lowerBound) return { best, proven: true };
    }
  }
  return { best, proven: true };
}

/** All lists of `count` whole numbers of at least 1 with the given sum. */
function* compositionsOfSum(sum: number, count: number): Generator<readonly number[]> {
  if (count === 1) {
    yield [sum];
    return;
  }
  for (let first = 1; first <= sum - count + 1; first += 1) {
    for (const others of compositionsOfSum(sum - first, count - 1)) yield [first, ...others];
  }
}

/** Species whose coefficient is zero in every balance without negative coefficients. */
function idleSpecies(matrix: Matrix, places: readonly SpeciesPlace[]): readonly SpeciesPlace[] {
  const noCost = places.map(() => zero);
  return places.filter((_, index) => {
    const fixed = places.map((__, column) => (column === index ? one : zero));
    const rightSide = [...matrix.map(() => zero), one];
    return minimise([...matrix, fixed], rightSide, noCost).kind === 'infeasible';
  });
}

/** Elements without which (one at a time) a balance would exist; all of them when no single one is to blame. */
function conflictingElements(matrix: Matrix, elements: readonly string[]): readonly string[] {
  const columnCount = matrix[0]?.length ?? 0;
  const blamed = elements.filter((_, index) => {
    const [direction] = nullSpace(
      matrix.filter((__, row) => row !== index),
      columnCount,
    );
    return direction !== undefined && (direction.every((v) => v.gt(0)) || direction.every((v) => v.lt(0)));
  });
  return blamed.length > 0 ? blamed : elements;
}

const largestCoefficient = 1e9;

/** Scales positive fractions to whole numbers without a common divisor; undefined above `largestCoefficient`. */
function wholeNumbers(fractions: readonly Fraction[]): readonly number[] | undefined {
  const scale = fractions.reduce((sum, value) => sum.lcm(new Fraction(1n, value.d).inverse()), one);
  const scaled = fractions.map((value) => value.mul(scale));
  const divisor = scaled.reduce((common, value) => common.gcd(value), zero);
  const whole = scaled.map((value) => value.div(divisor).valueOf());
  return whole.every((value) => Number.isInteger(value) && value <= largestCoefficient) ? whole : undefined;
}

function splitSides(coefficients: readonly number[], places: readonly SpeciesPlace[]): BalancedCoefficients {
  const leftCount = places.filter((place) => place.side === 'left').length;
  return { left: coefficients.slice(0, leftCount), right: coefficients.slice(leftCount) };
}
