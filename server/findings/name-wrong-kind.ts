/**
 * A name stands for something of another sort than is needed here, for example a reaction where a substance is needed.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameWrongKind: Rule<FactOf<'name/wrong-kind'>> = {
  severity: 'error',
  message: ({ name, is, needed }) => `${quoted(name)} is ${articled(is)}, but ${articled(needed)} is needed here.`,
};

/** `an engine` for `a engine`: the sort may be any kind's word. */
const articled = (sort: string): string => sort.replace(/^a (?=[aeiou])/, 'an ');
