// Works out claims, as they stand behind `expect`: a comparison, or a value within a tolerance of another. Where that fails
// the cause has been said and null is returned. Knows no statements. Invariant: numbers that differ by floating-point
// rounding only count as equal, in every claim.

import type { Comparison, Expression, Within } from '../../grammar/tree.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { describeDimension, sameDimension } from '../core/quantity/dimension.ts';
import {
  compare,
  isFault,
  quantityFrom,
  quantityOf,
  standardUncertainty,
  type Quantity,
} from '../core/quantity/quantity.ts';
import { fromSi } from '../core/quantity/read-unit.ts';
import type { Context, Unknowable } from './context.ts';
import { evaluateExpression, referredFigure } from './expressions.ts';
import { readUnitWords, reportFault } from './read-quantity.ts';

/** Whether a claim holds, and what was found on its left side. */
export interface ClaimAnswer {
  readonly holds: boolean;
  readonly found: Quantity;
  readonly unit: string | null;
  readonly limit: Quantity;
  readonly tolerance: Quantity | null;
}

/** A comparison or `within`; null when it could not be worked out. */
export function evaluateClaim(claim: Comparison | Within, context: Context): ClaimAnswer | null {
  const referred = claim.left.kind === 'reference' ? referredFigure(claim.left, context) : null;
  const found =
    claim.left.kind === 'reference' ? (referred?.quantity ?? null) : evaluateExpression(claim.left, context);
  const unit = referred?.unit ?? null;
  const right = claim.kind === 'within' ? targetOf(claim) : claim.right;
  const limit = evaluateExpression(right, context);
  if (!found || !limit) return null;
  const order = compare(found, limit);
  if (typeof order !== 'number') return reportFault(order, claim.left.span, right.span, context);
  if (claim.kind === 'comparison') {
    return { holds: holds(claim.operator, found.value, limit.value), found, unit, limit, tolerance: null };
  }
  const tolerance = readTolerance(claim, limit, context);
  if (!tolerance) return null;
  return {
    holds:
      Math.abs(found.value - limit.value) <= tolerance.value * (1 + nearEnough) || areEqual(found.value, limit.value),
    found,
    unit,
    limit,
    tolerance,
  };
}

/** In `within 34 ± 1 MJ/kg` the unit behind the tolerance belongs to both numbers, as in any literal with `±`. */
function targetOf({ target, tolerance }: Within): Expression {
  const unit = tolerance?.unit;
  if (target.kind !== 'quantity' || target.unit || !unit || unit.tokens.some(({ text }) => text === '%')) return target;
  return { ...target, unit };
}

/** Two numbers that differ by less than this, relative, count as equal: they differ by floating-point rounding only. */
const nearEnough = 1e-9;

function areEqual(found: number, limit: number): boolean {
  return Math.abs(found - limit) <= nearEnough * Math.max(Math.abs(found), Math.abs(limit));
}

function holds(operator: Comparison['operator'], found: number, limit: number): boolean {
  const isEqual = areEqual(found, limit);
  switch (operator) {
    case '<':
      return found < limit && !isEqual;
    case '<=':
      return found < limit || isEqual;
    case '>':
      return found > limit && !isEqual;
    case '>=':
      return found > limit || isEqual;
    case '=':
      return isEqual;
  }
}

/**
 * The tolerance of a `within`, by the rules of a written uncertainty (relative, percentage points, a difference). Behind a
 * name or a sum it must bring its own unit; a percentage is then relative.
 */
function readTolerance(claim: Within, target: Quantity, context: Context): Unknowable {
  const { tolerance } = claim;
  if (!tolerance) return null; // the grammar has said that it is missing
  const right = targetOf(claim);
  const written = right.kind === 'quantity' ? right : null;
  const unit = written ? readUnitWords(written.unit, context) : knownUnit(describeDimension(target.dimension).si);
  const own = tolerance.unit && readUnitWords(tolerance.unit, context);
  if (!unit || own === null) return null;
  const value = fromSi(target.value, unit);
  const read = quantityFrom(value, unit, {
    number: tolerance.number.value,
    ...(own && { unit: own }),
    input: 'tolerance',
  });
  if (isFault(read)) return reportFault(read, claim.target.span, tolerance.span, context);
  const { dimension } = read;
  const isTemperature = sameDimension(dimension, knownUnit('K').dimension);
  return quantityOf(
    standardUncertainty(read),
    dimension,
    undefined,
    isTemperature ? 'temperature-difference' : 'plain',
  );
}
