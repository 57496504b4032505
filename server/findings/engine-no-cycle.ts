/**
 * The engine has no cycle with these entries: gas that stays would fill the cylinder, or a state of the cycle lies beyond the
 * temperatures that there are data for.
 */
import { celsiusText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

const states = {
  intake: 'filling the cylinder',
  compression: 'compression',
  combustion: 'combustion',
  expansion: 'expansion',
  'blow-down': 'the blow-down of the exhaust',
  exhaust: 'the exhaust',
  residual: 'the residual gas',
} as const;

export const engineNoCycle: Rule<FactOf<'engine/no-cycle'>> = {
  severity: 'error',
  message: (fact) => {
    if (fact.why === 'no-fresh-gas') {
      return 'Gas that stays at this exhaust pressure would fill the whole cylinder, so no fresh gas comes in. Lower the exhaust pressure or raise the boost pressure.';
    }
    const { state, side, limit } = fact;
    return side === null || limit === null
      ? `There is no state for ${states[state]} with these entries. Check temperatures, λ and the compression ratio.`
      : `For ${states[state]} it would be ${side === 'below' ? 'colder' : 'hotter'} than all data (${celsiusText(limit)}). Check temperatures, λ and the compression ratio.`;
  },
};
