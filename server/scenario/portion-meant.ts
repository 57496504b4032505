// An entry that was meant as a portion: `sodium: 30 %`, `rest: gas_oil`. It is asked only of entries the
// kind's table does not know, in kinds that take portions. Invariant: what it offers is a portion this language reads,
// with the amount and the substance as the user wrote them.

import type { Entry } from '../../grammar/tree.ts';
import type { Context } from './context.ts';
import { materialNamed } from './materials.ts';

/** The portion an entry would be without its colon; null where its words name no substance, or its value no amount. */
export function portionMeant(entry: Entry, context: Context): string | null {
  const [phrase, ...otherPhrases] = entry.phrases;
  const [value, ...others] = phrase?.items ?? [];
  if (!value || otherPhrases.length > 0 || others.length > 0) return null;
  const text = context.written(value.span);
  if (entry.words === 'rest') return value.kind === 'word' ? `rest ${text}` : null;
  if (value.kind !== 'quantity') return null;
  const word = { kind: 'word', form: 'name', text: entry.words, span: entry.wordsSpan } as const;
  if (!materialNamed(word, context, 'quiet')) return null;
  return `${text} ${/^[a-z0-9_]+$/i.test(entry.words) ? entry.words : `'${entry.words}'`}`;
}
