/**
 * The tanks of a service do not hold the fuel it has to carry, reserve included. It is worked out as if they did.
 */
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const serviceTank: Rule<FactOf<'service/tank'>> = {
  severity: 'warning',
  message: ({ fuel, needed, capacity, leg }) => {
    const runsOut = leg === null ? 'The reserve would be short.' : `It would run out on ${quoted(leg)}.`;
    return `The tanks hold ${quantityText(capacity, 'm3')}, but ${quantityText(needed, 'm3')} are needed for ${fuel} with its reserve. ${runsOut} Bunker more often, carry less reserve or give the tanks more room.`;
  },
};
