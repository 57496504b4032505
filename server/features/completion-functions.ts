// Offers the functions an expression may call, and tells of the one that is being called: its signature, its help and the
// argument the cursor is in. All of it stands in the table of functions. Reads tokens, because the call is unfinished as a
// rule. Invariant: inside brackets that belong to no known function there is nothing to tell.
import { CloseBracket, Comma, endOf, lex, OpenBracket, WordToken } from '../../grammar/tokens.ts';
import type { SyntaxTree } from '../../grammar/tree.ts';
import { functions } from '../scenario/functions.ts';
import type { CompletionItem, Documentation } from './completion-item.ts';

export function functionItems(start: number): CompletionItem[] {
  return [...functions].map(([name, { signature, help }], index) => ({
    label: name,
    role: 'function',
    detail: signature,
    insert: `${name}(`,
    snippet: `${name}(\${1})`,
    start,
    rank: 80 + index,
    documentation: { title: signature, origin: help, lines: [] },
  }));
}

export interface Signature {
  readonly label: string;
  /** Where each parameter stands in the label. */
  readonly parameters: readonly (readonly [start: number, end: number])[];
  readonly active: number;
  readonly documentation: Documentation;
}

/** The call the offset stands in; null outside of one. */
export function signatureAt({ text }: Pick<SyntaxTree, 'text'>, offset: number): Signature | null {
  const from = Math.max(0, text.lastIndexOf('\n', offset - 1) + 1);
  const { tokens, comments } = lex(text.slice(from, offset));
  if (comments.length > 0) return null;
  const open: { name: string | null; arguments: number }[] = [];
  for (const [index, token] of tokens.entries()) {
    const before = tokens[index - 1];
    if (token.tokenType === OpenBracket) {
      const isCall = before?.tokenType === WordToken && endOf(before) === token.startOffset;
      open.push({ name: isCall ? before.image : null, arguments: 0 });
    } else if (token.tokenType === CloseBracket) open.pop();
    else if (token.tokenType === Comma) {
      const call = open.at(-1);
      if (call) call.arguments++;
    }
  }
  // A bracket in an argument belongs to the call around it.
  const call = open.findLast(({ name }) => name !== null);
  const known = call && functions.get(call.name ?? '');
  if (!call || !known) return null;
  const parameters = parametersOf(known.signature);
  return {
    label: known.signature,
    parameters,
    active: Math.min(call.arguments, Math.max(0, parameters.length - 1)),
    documentation: { title: known.signature, origin: known.help, lines: [] },
  };
}

function parametersOf(signature: string): [number, number][] {
  const open = signature.indexOf('(') + 1;
  const inside = signature.slice(open, signature.lastIndexOf(')'));
  return [...inside.matchAll(/[^,\s]+/g)].map(({ index, 0: word }) => [open + index, open + index + word.length]);
}
