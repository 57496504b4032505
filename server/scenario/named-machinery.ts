// From a word to a definition of one kind that does work: an engine, a duty, a service, by name. Says at the word what it
// could not make of it, unless the cause has been said elsewhere. Knows no entries.

import type { Word } from '../../grammar/tree.ts';
import { near, type Context } from './context.ts';
import type { Machinery } from './machinery.ts';

export type MachineryKind = 'engine' | 'duty' | 'service';
export type MachineryOf<Kind extends MachineryKind> = Extract<Machinery, { readonly machinery: Kind }>;

/** What a word stands for; null where that could not be worked out, undefined where it is no definition of the kind (said). */
export function machineryNamed<Kind extends MachineryKind>(
  word: Word,
  kind: Kind,
  context: Context,
): MachineryOf<Kind> | null | undefined {
  const isOfKind = (machinery: Machinery | null): machinery is MachineryOf<Kind> => machinery?.machinery === kind;
  const named = context.scope.lookup(word.text);
  if (named?.kind === 'unknown') return null;
  if (!named) {
    const suggestions = near(word.text, context.scope.names());
    context.report(word.span, { code: 'name/unknown', what: 'definition', word: word.text, near: suggestions });
    return undefined;
  }
  if (named.kind !== 'value') {
    context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
  }
  if (named.kind === 'value' || named.definition.kind !== kind) {
    const is = named.kind === 'value' ? 'a number' : `a ${named.definition.kind}`;
    context.report(word.span, { code: 'name/wrong-kind', name: word.text, is, needed: `a ${kind}` });
    return undefined;
  }
  const machinery = named.kind === 'definition' ? named.machinery : null;
  return isOfKind(machinery) ? machinery : null;
}
