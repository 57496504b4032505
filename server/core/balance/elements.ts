// Sums of atoms on the two sides of a written equation, with what is missing on each.
// Knows no energies and changes no coefficient. Invariant: an equation's sums are exact, `balanced` has no tolerance.
// Charge is conserved like an element and is listed under `charge`.

import type Fraction from 'fraction.js';
import type { Formula } from '../substance/formula.ts';
import { exactNumber, zero } from './exact-linear.ts';

/** A coefficient as written: a number, or numerator and denominator. */
export type Coefficient = number | readonly [number, number];

export interface EquationTerm {
  readonly coefficient: Coefficient;
  readonly formula: Formula;
}

/** One line of an equation's account. `difference` is right less left: positive when the left side lacks atoms. */
export interface ElementSum {
  /** An element symbol, or `charge`. */
  readonly element: string;
  readonly left: number;
  readonly right: number;
  readonly difference: number;
}

/** The sums of both sides, elements in order of first appearance, charge last where any species carries one. */
export function equationElements(
  left: readonly EquationTerm[],
  right: readonly EquationTerm[],
): { readonly sums: readonly ElementSum[]; readonly balanced: boolean } {
  const elements = elementsOfFormulas([...left, ...right].map((term) => term.formula));
  const sums = elements.map((element) => ({
    element,
    left: sumOfSide(left, element),
    right: sumOfSide(right, element),
  }));
  return {
    sums: sums.map((sum) => ({
      element: sum.element,
      left: sum.left.valueOf(),
      right: sum.right.valueOf(),
      difference: sum.right.sub(sum.left).valueOf(),
    })),
    balanced: sums.every((sum) => sum.left.equals(sum.right)),
  };
}

/** What must be conserved among these formulas: their elements, and `charge` where one of them is charged. */
export function elementsOfFormulas(formulas: readonly Formula[]): readonly string[] {
  const elements = new Set(formulas.flatMap((formula) => [...formula.composition.keys()]));
  return formulas.some((formula) => formula.charge !== 0) ? [...elements, chargeElement] : [...elements];
}

/** Exact atoms of an element (or elementary charges) in one formula unit. */
export function countOfElement(formula: Formula, element: string): Fraction {
  return exactNumber(element === chargeElement ? formula.charge : (formula.composition.get(element) ?? 0));
}

const chargeElement = 'charge';

function sumOfSide(side: readonly EquationTerm[], element: string): Fraction {
  return side.reduce((sum, term) => {
    const count = countOfElement(term.formula, element);
    return count === zero ? sum : sum.add(exactCoefficient(term.coefficient).mul(count));
  }, zero);
}

function exactCoefficient(coefficient: Coefficient): Fraction {
  if (typeof coefficient === 'number') return exactNumber(coefficient);
  const [numerator, denominator] = coefficient;
  return denominator === 0 ? zero : exactNumber(numerator).div(exactNumber(denominator));
}
