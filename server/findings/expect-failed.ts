/**
 * A claim written with `expect` does not hold. The value found and the distance to the limit are given. It is an error,
 * so that a check in a pipeline fails with it.
 */
import { distanceText, quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const expectFailed: Rule<FactOf<'expect/failed'>> = {
  severity: 'error',
  message: ({ claim, found, unit, limit, tolerance }) => {
    const shown = `${quoted(claim)} does not hold: found ${quantityText(found, unit)}`;
    const difference = found.value - limit.value;
    if (difference === 0) return `${shown}, exactly the limit.`;
    const side = difference > 0 ? 'above' : 'below';
    const distance = `${distanceText(found, limit, unit)} ${side} ${quantityText(limit, unit)}`;
    return tolerance === null
      ? `${shown}, ${distance}.`
      : `${shown}, ${distance}, where ${quantityText(tolerance, unit)} is allowed.`;
  },
};
