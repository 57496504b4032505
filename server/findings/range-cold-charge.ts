/**
 * Air is taken at a pressure that it would hardly have so cold: compression heats it. A flame worked out from cold air is
 * too cold by about as much.
 */
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeColdCharge: Rule<FactOf<'range/cold-charge'>> = {
  severity: 'information',
  message: ({ temperature, pressure, compressed }) =>
    `The air comes in at ${celsiusText(temperature)} and ${quantityText(pressure, 'bar')}. Was its compression forgotten? Without loss and cooling it would be at about ${celsiusText(compressed)}; give that with \`oxidant state:\`.`,
};
