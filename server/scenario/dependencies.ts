// Which names a statement speaks of, and the order in which named things can be worked out. Looks at syntax alone, with
// the entry tables to tell a name from a listed word. A cycle of names is found here, once, at the name that closes it.
// Invariant: the walk is iterative and its time linear in the mentions; whatever is in the order follows all it speaks of,
// but for names on a cycle.

import type { Expression, Line, Span, Statement, Word } from '../../grammar/tree.ts';
import { expressionsIn } from '../../grammar/walk.ts';
import { entryWordNamesThing } from './kinds/registry.ts';

export interface Mention {
  readonly name: string;
  readonly span: Span;
}

/** The names a statement mentions, in order, with repeats. */
export function mentionsOf(statement: Statement): Mention[] {
  const mentions: Mention[] = [];
  switch (statement.kind) {
    case 'let':
      if (statement.value) mentionsInExpression(statement.value, mentions);
      break;
    case 'expect':
      if (statement.claim) mentionsInExpression(statement.claim, mentions);
      break;
    case 'definition':
      for (const line of statement.lines) mentionsInLine(line, statement.keyword.text, mentions);
      break;
    default:
  }
  return mentions;
}

function mentionsInLine(line: Line, kind: string, mentions: Mention[]): void {
  if (line.kind === 'portion') {
    if (line.amount.kind !== 'rest') mentionsInExpression(line.amount, mentions);
    if (line.substance) mentionsInExpression(line.substance, mentions);
  } else if (line.kind === 'equation') {
    for (const term of [...line.left, ...line.right]) mentionsInExpression(term.species, mentions);
  } else if (line.kind === 'entry') {
    for (const phrase of line.phrases) {
      for (const item of phrase.items) {
        if (item.kind === 'connective') continue;
        if (item.kind === 'word' && !entryWordNamesThing(kind, line.words, item.text)) continue;
        mentionsInExpression(item, mentions);
      }
    }
  }
}

function mentionsInExpression(expression: Expression, mentions: Mention[]): void {
  const name = (word: Word | undefined): void => {
    if (word) mentions.push({ name: word.text, span: word.span });
  };
  for (const item of expressionsIn(expression)) {
    if (item.kind === 'word') name(item);
    else if (item.kind === 'reference') {
      name(item.row);
      name(item.name);
    } else if (item.kind === 'membership') {
      name(item.substance);
      name(item.name);
    }
  }
}

export interface Ordered {
  /** Names in an order in which each follows all it mentions; those on a cycle are left out. */
  readonly order: readonly string[];
  readonly cycles: readonly Cycle[];
}

/** A way from a name back to itself. */
export interface Cycle {
  readonly by: string;
  /** In `by`: what closes the ring. */
  readonly mention: Mention;
  /** The names on the way, the first again at the end; of a long ring its start and its end. */
  readonly path: readonly string[];
  /** How many names of a long ring are left out before the last two. */
  readonly leftOut: number;
}

/** Orders named things by their mentions (names that are not keys of the map are ignored). */
export function orderByMentions(things: ReadonlyMap<string, readonly Mention[]>): Ordered {
  const order: string[] = [];
  const cycles: Cycle[] = [];
  const state = new Map<string, number | 'done'>();
  for (const root of things.keys()) {
    if (state.has(root)) continue;
    // `reaches` is the lowest place on the stack that a mention found so far leads back to.
    const stack = [{ name: root, next: 0, reaches: Infinity }];
    state.set(root, 0);
    for (let top = stack.at(-1); top; top = stack.at(-1)) {
      const mention = things.get(top.name)?.[top.next++];
      const known = mention && state.get(mention.name);
      if (!mention) {
        stack.pop();
        state.set(top.name, 'done');
        const below = stack.at(-1);
        if (below) below.reaches = Math.min(below.reaches, top.reaches);
        if (top.reaches > stack.length) order.push(top.name);
      } else if (typeof known === 'number') {
        top.reaches = Math.min(top.reaches, known);
        cycles.push({ by: top.name, mention, ...wayRound(stack, known) });
      } else if (known === undefined && things.has(mention.name)) {
        state.set(mention.name, stack.length);
        stack.push({ name: mention.name, next: 0, reaches: Infinity });
      }
    }
  }
  return { order, cycles };
}

const mostOfStart = 4;

/** The ring from a place on the stack to its top. In full it could be as long as the scenario, for each of its names. */
function wayRound(stack: readonly { readonly name: string }[], from: number): Pick<Cycle, 'path' | 'leftOut'> {
  const nameAt = (place: number): string[] => stack.slice(place, place + 1).map(({ name }) => name);
  const start = stack.slice(from, from + mostOfStart).map(({ name }) => name);
  const leftOut = stack.length - from - mostOfStart - 1;
  return leftOut > 0
    ? { path: [...start, ...nameAt(stack.length - 1), ...nameAt(from)], leftOut }
    : { path: [...stack.slice(from), ...stack.slice(from, from + 1)].map(({ name }) => name), leftOut: 0 };
}
