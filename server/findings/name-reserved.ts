/**
 * A definition or value is named by a word that already means something: a word of the language (`rest`, `per`) or a
 * unit (`bar`, `t`). Read as a name it would be misread elsewhere, so it cannot be one.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const meanings = {
  'reserved-word': 'a word of the language',
  unit: 'a unit',
} as const;

export const nameReserved: Rule<FactOf<'name/reserved'>> = {
  severity: 'error',
  message: ({ name, why }) =>
    `${quoted(name)} is ${meanings[why]} and cannot be a name. Choose another, for example ${quoted(`${name}_1`)}.`,
  fixes: ({ name }, { place }) => [
    { title: `Rename to \`${name}_1\``, preferred: false, edits: [{ place, newText: `${name}_1` }] },
  ],
};
