/**
 * An entry of a duty that nothing in it uses: a service speed where no leg has a speed, a hotel load beside a test cycle.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const dutyUnused: Rule<FactOf<'duty/unused'>> = {
  severity: 'warning',
  message: ({ entry }) => `Nothing in this duty uses ${quoted(entry)}. Take it out, or let a leg need it.`,
};
