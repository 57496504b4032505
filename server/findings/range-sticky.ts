/**
 * Of the wall temperatures given, some lie where the condensed salts are partly molten: what meets such a wall sticks and
 * grows. Salts mixed melt far below each of them alone; from about 15 % of melt on they stick.
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText } from '../wording/quantities.ts';
import { listed, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeSticky: Rule<FactOf<'range/sticky'>> = {
  severity: 'warning',
  message: ({ from, to, firstMelting, sticky, uncertaintyK, leading, mostlyElse }) => {
    const walls =
      from.value === to.value
        ? `On walls of ${celsiusText(from)}`
        : `On walls from ${celsiusText(from)} to ${celsiusText(to)}`;
    const melts = `it begins to melt at ${celsiusText(firstMelting)} (± ${formatNumber(uncertaintyK)} K)`;
    const sticks = sticky ? ` and sticks from ${celsiusText(sticky)} on` : '';
    return sentences(
      `${walls} the deposit (${listed(leading)}) is sticky: ${melts}${sticks}.`,
      mostlyElse && 'Less than half of it is salt, and what stays solid stiffens it.',
      'Keep walls colder than that, or so hot that nothing condenses.',
    );
  },
};
