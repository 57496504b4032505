/**
 * A temperature below absolute zero (0 K, −273.15 °C, −459.67 °F), or one at which this version has no data: enthalpies and
 * entropies are known at 25 °C alone.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeTemperature: Rule<FactOf<'range/temperature'>> = {
  severity: ({ why }) => (why === 'below-absolute-zero' ? 'error' : 'warning'),
  message: ({ text, why }) =>
    why === 'below-absolute-zero'
      ? `${quoted(text)} is below absolute zero (−273.15 °C). Is the sign or the unit wrong?`
      : `Nothing is known here at ${quoted(text)}: this version works reactions out at 25 °C only. Leave the temperature out, or write \`25 degC\`.`,
};
