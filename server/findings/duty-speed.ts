/**
 * A leg goes faster than the service speed. The power follows from the propeller law all the same; beyond the service
 * speed the resistance of a hull rises faster than that.
 */
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const dutySpeed: Rule<FactOf<'duty/speed'>> = {
  severity: 'warning',
  message: ({ leg, speed, service }) =>
    `${quoted(leg)} goes ${quantityText(speed, 'kn')}, above the service speed of ${quantityText(service, 'kn')}. The propeller law underestimates the power there. Lower the speed, or raise the \`exponent\` of the service speed.`,
};
