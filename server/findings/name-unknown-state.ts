/**
 * A figure is asked for at a temperature at which it is not told: a burn has states at the temperatures of its
 * `cooled to`, and at no other.
 */
import type { Quantity } from '../core/quantity/quantity.ts';
import { celsiusText } from '../wording/quantities.ts';
import { listed, quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameUnknownState: Rule<FactOf<'name/unknown-state'>> = {
  severity: 'error',
  message: ({ text, owner, kind, states }) =>
    sentences(
      states.length === 0
        ? `${quoted(owner)} has no state at ${quoted(text)}.`
        : `${quoted(owner)} has no state at ${quoted(text)}, only at ${listed(told(states))}.`,
      kind === 'burn' && 'List the temperature in its definition, under `cooled to`.',
    ),
};

const mostTold = 6;

function told(states: readonly Quantity[]): string[] {
  const first = states.slice(0, mostTold).map(celsiusText);
  return states.length > mostTold ? [...first, `${states.length - mostTold} more`] : first;
}
