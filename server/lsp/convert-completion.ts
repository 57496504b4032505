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
  const ranges = new Map<number, EditRange>();
  const rangeFrom = (start: number): EditRange => {
    const insert = (): Range => rangeOf(document, start, end);
    const known = ranges.get(start);
    const made =
      known ?? (able.insertReplace ? { insert: insert(), replace: rangeOf(document, start, wordEnd) } : insert());
    ranges.set(start, made);
    return made;
  };
  const sorted = [...items].sort((left, right) => left.rank - right.rank);
  // Nearly all begin at one place, the word at the cursor.
  const common = able.defaultRange ? sorted[0]?.start : undefined;
  return {
    isIncomplete,
    ...(common === undefined ? {} : { itemDefaults: { editRange: rangeFrom(common) } }),
    items: sorted.map((item, index) => {
      const range = item.start === common ? null : rangeFrom(item.start);
      return toItem(item, index, range, uri, able);
    }),
  };
}

/** One for both, or one each for what is inserted and what is replaced. */
type EditRange = Range | { readonly insert: Range; readonly replace: Range };

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
  /** null: the list's own. */
  range: EditRange | null,
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
    ...textOf(newText, range, label),
    ...(detail === '' ? {} : able.labelDetails ? { labelDetails: { description: detail } } : { detail }),
    ...(filter === undefined ? {} : { filterText: filter }),
    ...(documentation ? { documentation: toDocumentation(documentation, able.markdown) } : {}),
    ...(subject ? { data: { uri, subject } } : {}),
    ...(continues && able.suggestCommand !== null
      ? { command: { title: 'Suggest', command: able.suggestCommand } }
      : {}),
  };
}

function textOf(
  newText: string,
  range: EditRange | null,
  label: string,
): Pick<ProtocolItem, 'textEdit' | 'textEditText'> {
  if (range) return { textEdit: 'insert' in range ? { newText, ...range } : { newText, range } };
  return newText === label ? {} : { textEditText: newText };
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
