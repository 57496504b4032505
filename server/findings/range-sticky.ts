/**
 * Of the wall temperatures given, some lie where the condensed salts are partly molten: what meets such a wall sticks and
 * grows. Vapour that froze in the gas and condenses on the wall counts too. Salts mixed melt far below each of them alone; from about 15 % of melt on they stick. Where the salts' melting
 * together is not known, that is said instead.
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText } from '../wording/quantities.ts';
import { speciesText } from '../wording/species.ts';
import { capitalised, listed, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeSticky: Rule<FactOf<'range/sticky'>> = {
  severity: 'warning',
  message: ({ from, to, firstMelting, sticky, uncertaintyK, leading, vapours, validity }) => {
    const walls =
      from.value === to.value
        ? `on walls of ${celsiusText(from)}`
        : `on walls from ${celsiusText(from)} to ${celsiusText(to)}`;
    const deposit = `the deposit (${listed(leading)})`;
    const about = uncertaintyK === null ? '' : ` (± ${formatNumber(uncertaintyK)} K)`;
    const melts = firstMelting && `it begins to melt at ${celsiusText(firstMelting)}${about}`;
    const isOfSome = validity.includes('eutectic-of-some');
    return sentences(
      sticky
        ? `${capitalised(walls)} ${deposit} is sticky: ${melts ? `${melts} and ` : 'it '}sticks from ${celsiusText(sticky)} on.`
        : `Whether ${deposit} is sticky ${walls} is not known: ${melts ? `${melts}, but how much of it is then molten is not published` : 'how its salts melt together is not published'}.`,
      vapours.length > 0 &&
        `Among it is ${listed(vapours.map(speciesText))} that froze as vapour in the gas and condenses where it is colder.`,
      isOfSome && 'That is the first melting of some of its salts; together they may melt earlier.',
      validity.includes('traces-left-out') &&
        'It is judged without traces of other salts, which can make it stick some 30 K earlier.',
      validity.includes('much-else') && 'Less than half of it is salt, and what stays solid stiffens it.',
      sticky
        ? 'Keep walls colder than that, or so hot that nothing condenses.'
        : 'Look at a trial deposit before relying on such walls.',
    );
  },
};
