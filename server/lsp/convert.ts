// Offsets into lines and columns and back, and plain records into the protocol's: the only place that does either.
// Columns are counted in UTF-16 units, as strings are, so that no character is ever split. Knows no connection.
// Invariant: whatever the offset or position (beyond the end, negative, not a number), the answer lies in the text.
// Source: Language Server Protocol 3.18, "Position" and "Range".
import {
  CodeActionKind,
  DiagnosticSeverity,
  MarkupKind,
  SymbolKind,
  type CodeAction,
  type Diagnostic,
  type DocumentSymbol,
  type Hover,
  type Location,
  type Position,
  type Range,
  type SymbolInformation,
  type TextEdit,
  type WorkspaceEdit,
} from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import type { QuickFix } from '../features/code-actions.ts';
import type { PlainDiagnostic } from '../features/diagnostics.ts';
import type { TextChange } from '../features/formatting.ts';
import { asMarkdown, asPlainText, type HoverText } from '../features/hover-text.ts';
import type { OutlineSymbol } from '../features/symbols.ts';
import type { Severity } from '../findings/finding.ts';
import type { Place } from '../scenario/scenario.ts';

/** The text of any file that a place may point into. */
export interface PlacedText {
  readonly uri: string;
  /** null when the file is not open: then it has no version. */
  readonly version: number | null;
  readonly document: TextDocument;
}

/** Finds the text behind an address; undefined when the evaluation did not reach it. */
export type TextOf = (path: string) => PlacedText | undefined;

/** A text that is not open, for converting places in it. */
export function closedText(uri: string, text: string): PlacedText {
  return { uri, version: null, document: TextDocument.create(uri, 'stokehold', 0, text) };
}

export function offsetAt(document: TextDocument, position: Position): number {
  const line = wholeNumber(position.line);
  // `TextDocument` reads a column beyond the line's end as the line's end, but a negative one as the file's start.
  return document.offsetAt({ line, character: wholeNumber(position.character) });
}

export function rangeOf(document: TextDocument, start: number, end: number): Range {
  const first = wholeNumber(start);
  return { start: document.positionAt(first), end: document.positionAt(Math.max(first, wholeNumber(end))) };
}

export function toDiagnostic(diagnostic: PlainDiagnostic, textOf: TextOf, withRelated: boolean): Diagnostic | null {
  const text = textOf(diagnostic.place.path);
  if (!text) return null;
  const related = diagnostic.related.flatMap(({ place, message }) => {
    const location = locationOf(place, textOf);
    return location ? [{ location, message }] : [];
  });
  return {
    range: rangeOf(text.document, diagnostic.place.start, diagnostic.place.end),
    severity: SEVERITIES[diagnostic.severity],
    code: diagnostic.code,
    source: 'stokehold',
    message: diagnostic.message,
    ...(withRelated && related.length > 0 ? { relatedInformation: related } : {}),
  };
}

export function toHover(hover: HoverText, document: TextDocument, markdown: boolean): Hover {
  return {
    contents: markdown
      ? { kind: MarkupKind.Markdown, value: asMarkdown(hover) }
      : { kind: MarkupKind.PlainText, value: asPlainText(hover) },
    range: rangeOf(document, hover.place.start, hover.place.end),
  };
}

export function toTextEdit(change: TextChange, document: TextDocument): TextEdit {
  return { range: rangeOf(document, change.start, change.end), newText: change.newText };
}

export function toDocumentSymbol(symbol: OutlineSymbol, document: TextDocument): DocumentSymbol {
  return {
    name: symbol.name,
    detail: symbol.detail,
    kind: SYMBOL_KINDS[symbol.role],
    range: rangeOf(document, symbol.place.start, symbol.place.end),
    selectionRange: rangeOf(document, symbol.namePlace.start, symbol.namePlace.end),
  };
}

/** For clients that know the older, flat list only. */
export function toSymbolInformation(symbol: OutlineSymbol, uri: string, document: TextDocument): SymbolInformation {
  return {
    name: symbol.name,
    kind: SYMBOL_KINDS[symbol.role],
    location: { uri, range: rangeOf(document, symbol.place.start, symbol.place.end) },
  };
}

/** The fix as an action of the client; null when one of its edits points into a file that is not at hand. */
export function toCodeAction(
  fix: QuickFix,
  diagnostic: Diagnostic | null,
  textOf: TextOf,
  withVersions: boolean,
): CodeAction | null {
  const edits = new Map<PlacedText, TextEdit[]>();
  for (const { place, newText } of fix.edits) {
    const text = textOf(place.path);
    if (!text) return null;
    const edit = { range: rangeOf(text.document, place.start, place.end), newText };
    edits.set(text, [...(edits.get(text) ?? []), edit]);
  }
  return {
    title: fix.title,
    kind: CodeActionKind.QuickFix,
    ...(diagnostic ? { diagnostics: [diagnostic] } : {}),
    ...(fix.preferred ? { isPreferred: true } : {}),
    edit: toWorkspaceEdit(edits, withVersions),
  };
}

/** Edits by text as the client takes them; with versions where it knows those. */
export function toWorkspaceEdit(edits: ReadonlyMap<PlacedText, TextEdit[]>, withVersions: boolean): WorkspaceEdit {
  const entries = [...edits];
  if (!withVersions) return { changes: Object.fromEntries(entries.map(([text, list]) => [text.uri, list])) };
  return {
    documentChanges: entries.map(([{ uri, version }, list]) => ({ textDocument: { uri, version }, edits: list })),
  };
}

/** The place as a client finds it; null when its text is not at hand. */
export function locationOf(place: Place, textOf: TextOf): Location | null {
  const text = textOf(place.path);
  return text ? { uri: text.uri, range: rangeOf(text.document, place.start, place.end) } : null;
}

function wholeNumber(value: number): number {
  return Number.isFinite(value) ? Math.max(0, Math.trunc(value)) : value === Infinity ? Number.MAX_SAFE_INTEGER : 0;
}

const SEVERITIES: Readonly<Record<Severity, DiagnosticSeverity>> = {
  error: DiagnosticSeverity.Error,
  warning: DiagnosticSeverity.Warning,
  information: DiagnosticSeverity.Information,
  hint: DiagnosticSeverity.Hint,
};

const SYMBOL_KINDS: Readonly<Record<OutlineSymbol['role'], SymbolKind>> = {
  title: SymbolKind.File,
  definition: SymbolKind.Class,
  value: SymbolKind.Variable,
  expectation: SymbolKind.Boolean,
};
