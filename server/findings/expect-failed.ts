/**
 * A claim written with `expect` does not hold. The value found and the distance to the limit are given. It is an error,
 * so that a check in a pipeline fails with it.
 */
import { canBeIn, knownUnit } from '../core/quantity/convert.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { distanceText, quantityText } from '../wording/quantities.ts';
import { unitOfClaim } from '../wording/written-unit.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const expectFailed: Rule<FactOf<'expect/failed'>> = {
  severity: 'error',
  message: ({ claim, found, unit, limit, tolerance }, { place, file }) => {
    // In the unit the claim is written in, so that found and limit are compared at sight.
    const told = unitOfClaim(place, found, file) ?? unit;
    const shown = `${quoted(claim)} does not hold: found ${quantityText(found, told)}`;
    const difference = found.value - limit.value;
    if (difference === 0) return `${shown}, exactly the limit.`;
    const side = difference > 0 ? 'above' : 'below';
    const distance = `${distanceText(found, limit, told)} ${side} ${quantityText(limit, told)}`;
    return tolerance === null
      ? `${shown}, ${distance}.`
      : `${shown}, ${distance}, where ${quantityText(tolerance, toleranceUnit(tolerance, told))} is allowed.`;
  },
};

/** A tolerance on a temperature is a difference, which has no scale such as degC. */
function toleranceUnit(tolerance: Quantity, told: string | null): string | null {
  return told !== null && canBeIn(tolerance, knownUnit(told)) ? told : null;
}
