/**
 * The consumption was measured on a heating value that the engine's fuel does not have, and no other fuel is named. It is
 * carried over by energy alone, as if the exhaust took away the same share with either fuel.
 */
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineMeasuredFuel: Rule<FactOf<'engine/measured-fuel'>> = {
  severity: 'warning',
  message: ({ fuel, measured, own }) =>
    `The consumption was measured on ${quantityText(measured, 'MJ/kg')}, but ${quoted(fuel)} has ${quantityText(own, 'MJ/kg')}. Was it another fuel? Name it, as in \`measured on: gas_oil, ${quantityText(measured, 'MJ/kg')}\`: then the heat that leaves with the exhaust is counted for both.`,
};
