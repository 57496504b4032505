/**
 * A function is called with more or fewer values than it takes.
 */
import { counted, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameArguments: Rule<FactOf<'name/arguments'>> = {
  severity: 'error',
  message: ({ name, takes, given }) => `${quoted(name)} is given ${counted(given, 'value')}. It takes ${takes}.`,
};
