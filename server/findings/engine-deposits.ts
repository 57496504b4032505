/**
 * Hot metal in the way of the products lies where their salts are partly molten: what meets it sticks and grows, blocks
 * nozzles, upsets valves and blades, and lets no heat through. From about 15 % of melt on a deposit sticks.
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText } from '../wording/quantities.ts';
import { metalText } from '../wording/metal.ts';
import { listed, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineDeposits: Rule<FactOf<'engine/deposits'>> = {
  severity: 'warning',
  message: ({ from, to, firstMelting, sticky, uncertaintyK, salts, validity }) => {
    const about = uncertaintyK === null ? '' : ` (± ${formatNumber(uncertaintyK)} K)`;
    const melts = firstMelting && `it begins to melt at ${celsiusText(firstMelting)}${about}`;
    const metal = metalText(from, to);
    return sentences(
      sticky
        ? `On ${metal} the deposit (${listed(salts)}) is sticky: ${melts ? `${melts} and ` : 'it '}sticks from ${celsiusText(sticky)} on.`
        : `Whether the deposit (${listed(salts)}) sticks to ${metal} is not known: ${melts ?? 'how its salts melt together is not published'}.`,
      validity.includes('eutectic-of-some') &&
        'That is the first melting of some of its salts; together they may melt earlier.',
      validity.includes('traces-left-out') &&
        'It is judged without traces of other salts, which can make it stick some 30 K earlier.',
      'Keep the metal colder than that, take the solids out before it, or use less alkali.',
    );
  },
};
