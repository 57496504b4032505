// The unit a person wrote, so that an answer comes back in it: the unit of a value given as one quantity, and the unit on
// the right side of a claim. Reads the syntax tree and works nothing out. Invariant: the unit told fits the quantity it is
// told for; where the text gives none that does, there is none.

import type { Expression, Quantity as WrittenQuantity, Statement } from '../../grammar/tree.ts';
import { canBeIn } from '../core/quantity/convert.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { readUnit } from '../core/quantity/read-unit.ts';
import { sectionAt } from '../scenario/place.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';

/** The unit of the `let` at this place, if its value is one quantity and `quantity` fits that unit; otherwise null. */
export function unitOfValue(place: Place, quantity: Quantity, file: EvaluatedFile): string | null {
  const statement = statementAt(place, file);
  if (statement?.kind !== 'let' || statement.value?.kind !== 'quantity') return null;
  return unitFitting(statement.value, quantity);
}

/** The unit on the right side of the `expect` at this place, if `quantity` fits it; otherwise null. */
export function unitOfClaim(place: Place, quantity: Quantity, file: EvaluatedFile): string | null {
  const statement = statementAt(place, file);
  const claim = statement?.kind === 'expect' ? statement.claim : undefined;
  const limit = limitOf(claim);
  return limit ? unitFitting(limit, quantity) : null;
}

function statementAt(place: Place, file: EvaluatedFile): Statement | undefined {
  return sectionAt(file.tree, place.start)?.section.statement;
}

function limitOf(claim: Expression | undefined): WrittenQuantity | null {
  const limit = claim?.kind === 'comparison' ? claim.right : claim?.kind === 'within' ? claim.target : undefined;
  return limit?.kind === 'quantity' ? limit : null;
}

function unitFitting(written: WrittenQuantity, quantity: Quantity): string | null {
  if (!written.unit) return null;
  const reading = readUnit(written.unit.tokens);
  return reading.ok && canBeIn(quantity, reading.unit) ? reading.unit.text : null;
}
