// Which names a statement speaks of, and the order in which named things can be worked out. Looks at syntax alone, with
// the entry tables to tell a name from a listed word. A cycle of names is found here, once, at the name that closes it.
// Invariant: the walk is iterative; every named thing comes after all it speaks of, or is in `cyclic`.

import type { Expression, Line, Span, Statement, Word } from '../../grammar/tree.ts';
import { entryNamesThings } from './kinds/registry.ts';

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
    const bareWords = entryNamesThings(kind, line.words);
    for (const phrase of line.phrases) {
      for (const item of phrase.items) {
        if (item.kind === 'connective' || (item.kind === 'word' && !bareWords)) continue;
        mentionsInExpression(item, mentions);
      }
    }
  }
}

/** Adds the names an expression mentions. Iterative: an expression may be nested as deeply as the grammar allows. */
export function mentionsInExpression(expression: Expression, mentions: Mention[]): void {
  const rest: Expression[] = [expression];
  const name = (word: Word | undefined): void => {
    if (word) mentions.push({ name: word.text, span: word.span });
  };
  for (let item = rest.pop(); item; item = rest.pop()) {
    switch (item.kind) {
      case 'word':
        name(item);
        break;
      case 'reference':
        name(item.name);
        if (item.at) rest.push(item.at);
        break;
      case 'membership':
        name(item.name);
        break;
      case 'call':
        rest.push(...item.arguments);
        break;
      case 'bracket':
        if (item.inner) rest.push(item.inner);
        break;
      case 'unary':
        rest.push(item.operand);
        break;
      case 'binary':
      case 'comparison':
        rest.push(item.right, item.left);
        break;
      case 'within':
        rest.push(item.target, item.left);
        break;
      default:
    }
  }
}

export interface Ordered {
  /** Names in an order in which each follows all it mentions; those on a cycle are left out. */
  readonly order: readonly string[];
  readonly cycles: readonly { readonly by: string; readonly mention: Mention; readonly path: readonly string[] }[];
  /** Names on a cycle: nothing can be said of them. */
  readonly cyclic: ReadonlySet<string>;
}

/** Orders named things by their mentions (names that are not keys of the map are ignored). */
export function orderByMentions(things: ReadonlyMap<string, readonly Mention[]>): Ordered {
  const order: string[] = [];
  const cycles: { by: string; mention: Mention; path: string[] }[] = [];
  const cyclic = new Set<string>();
  const state = new Map<string, 'open' | 'done'>();
  for (const root of things.keys()) {
    if (state.has(root)) continue;
    const stack = [{ name: root, next: 0 }];
    state.set(root, 'open');
    for (let top = stack.at(-1); top; top = stack.at(-1)) {
      const mention = things.get(top.name)?.[top.next++];
      if (!mention) {
        stack.pop();
        state.set(top.name, 'done');
        if (!cyclic.has(top.name)) order.push(top.name);
      } else if (state.get(mention.name) === 'open') {
        const path = stack.slice(stack.findIndex((entry) => entry.name === mention.name)).map((entry) => entry.name);
        for (const name of path) cyclic.add(name);
        cycles.push({ by: top.name, mention, path: [...path, mention.name] });
      } else if (things.has(mention.name) && !state.has(mention.name)) {
        state.set(mention.name, 'open');
        stack.push({ name: mention.name, next: 0 });
      }
    }
  }
  return { order, cycles, cyclic };
}
