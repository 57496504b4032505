// Completions, their documentation and signatures into the protocol's records, each in the form the client takes. Offsets
// are turned into positions by convert.ts. Knows no connection. Invariant: items keep the order of their ranks.
import {
  CompletionItemKind,
  InsertTextFormat,
  MarkupKind,
  type CompletionItem as ProtocolItem,
  type CompletionList,
  type MarkupContent,
  type Range,
  type SignatureHelp,
} from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import type { Signature } from '../features/completion-functions.ts';
import type {
  Completion,
  CompletionItem,
  CompletionRole,
  CompletionSubject,
  Documentation,
} from '../features/completion-item.ts';
import { asMarkdown, asPlainText } from '../features/hover-text.ts';
import type { CompletionAbilities } from './abilities.ts';
import { rangeOf } from './convert.ts';

export function toCompletionList(
  { items, end, wordEnd, isIncomplete }: Completion,
  document: TextDocument,
  uri: string,
  able: CompletionAbilities,
): CompletionList {
  const ranges = new Map<number, { insert: Range; replace: Range }>();
  const rangesFrom = (start: number): { insert: Range; replace: Range } => {
    const known = ranges.get(start);
    const made = known ?? { insert: rangeOf(document, start, end), replace: rangeOf(document, start, wordEnd) };
    ranges.set(start, made);
    return made;
  };
  const sorted = [...items].sort((left, right) => left.rank - right.rank);
  return {
    isIncomplete,
    items: sorted.map((item, index) => toItem(item, index, rangesFrom(item.start), uri, able)),
  };
}

/** What is behind an item that a client asks about again, if it is one of ours. */
export function subjectOf(data: unknown): { uri: string; subject: CompletionSubject } | null {
  if (typeof data !== 'object' || data === null || !('uri' in data) || !('subject' in data)) return null;
  const { uri, subject } = data;
  return typeof uri === 'string' && isSubject(subject) ? { uri, subject } : null;
}

export function toDocumentation(documentation: Documentation, markdown: boolean): MarkupContent {
  return markdown
    ? { kind: MarkupKind.Markdown, value: asMarkdown(documentation) }
    : { kind: MarkupKind.PlainText, value: asPlainText(documentation) };
}

export function toSignatureHelp(signature: Signature, markdown: boolean): SignatureHelp {
  const { label, parameters, active, documentation } = signature;
  const { origin, lines } = documentation;
  return {
    signatures: [
      {
        label,
        documentation: toDocumentation({ title: origin ?? '', origin: null, lines }, markdown),
        parameters: parameters.map(([start, end]) => ({ label: [start, end] })),
        activeParameter: active,
      },
    ],
    activeSignature: 0,
    activeParameter: active,
  };
}

function toItem(
  item: CompletionItem,
  index: number,
  { insert, replace }: { readonly insert: Range; readonly replace: Range },
  uri: string,
  able: CompletionAbilities,
): ProtocolItem {
  const { label, role, detail, filter, documentation, subject, continues } = item;
  const snippet = able.snippets ? item.snippet : undefined;
  const newText = snippet ?? item.insert;
  return {
    label,
    kind: KINDS[role],
    sortText: String(index).padStart(4, '0'),
    insertTextFormat: snippet === undefined ? InsertTextFormat.PlainText : InsertTextFormat.Snippet,
    textEdit: able.insertReplace ? { newText, insert, replace } : { newText, range: insert },
    ...(detail === '' ? {} : able.labelDetails ? { labelDetails: { description: detail } } : { detail }),
    ...(filter === undefined ? {} : { filterText: filter }),
    ...(documentation ? { documentation: toDocumentation(documentation, able.markdown) } : {}),
    ...(subject ? { data: { uri, subject } } : {}),
    ...(continues && able.suggestCommand !== null
      ? { command: { title: 'Suggest', command: able.suggestCommand } }
      : {}),
  };
}

function isSubject(subject: unknown): subject is CompletionSubject {
  if (typeof subject !== 'object' || subject === null || !('kind' in subject)) return false;
  const has = (key: string): boolean => typeof Reflect.get(subject, key) === 'string';
  switch (subject.kind) {
    case 'catalogue':
      return has('name') && has('phase');
    case 'name':
      return has('name');
    case 'figure':
      return has('of') && has('id');
    default:
      return false;
  }
}

const KINDS: Readonly<Record<CompletionRole, CompletionItemKind>> = {
  kind: CompletionItemKind.Struct,
  keyword: CompletionItemKind.Keyword,
  entry: CompletionItemKind.Property,
  word: CompletionItemKind.EnumMember,
  unit: CompletionItemKind.Unit,
  substance: CompletionItemKind.Constant,
  element: CompletionItemKind.Constant,
  definition: CompletionItemKind.Class,
  value: CompletionItemKind.Variable,
  figure: CompletionItemKind.Field,
  share: CompletionItemKind.Field,
  function: CompletionItemKind.Function,
};
