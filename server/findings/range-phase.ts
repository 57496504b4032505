/**
 * A portion that is solid, liquid or gas where it is stored although it is not so at 25 °C: it melts, freezes or boils in
 * between. Its energy and density here are those of the phase at 25 °C.
 */
import { celsiusText } from '../wording/quantities.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const VERBS = {
  'solid liquid': 'melts',
  'liquid solid': 'freezes',
  'liquid gas': 'boils',
  'gas liquid': 'condenses',
} as const;

export const rangePhase: Rule<FactOf<'range/phase'>> = {
  severity: 'information',
  message: ({ substance, state: { phase, temperature, changed } }) => {
    const passage = `${changed?.from ?? ''} ${phase}`;
    const verb = Object.entries(VERBS).find(([key]) => key === passage)?.[1];
    const at = changed?.at ? ` at ${celsiusText(changed.at)}` : '';
    return sentences(
      `${quoted(substance)} is ${phase === 'gas' ? 'a gas' : phase} at ${celsiusText(temperature)}${verb ? `: it ${verb}${at}` : ''}.`,
      changed && `Its energy and density here are those of the ${changed.from} at 25 °C.`,
    );
  },
};
