/**
 * A name stands for something of another sort than is needed here, for example a reaction where a substance is needed.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameWrongKind: Rule<FactOf<'name/wrong-kind'>> = {
  severity: 'error',
  message: ({ name, is, needed }) => `${quoted(name)} is ${is}, but ${needed} is needed here.`,
};
