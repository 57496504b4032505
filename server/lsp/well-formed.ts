// Lets the notifications about documents through that have the form the protocol gives them, and tells of the others. The
// protocol library believes whatever it is sent, and a "text" without a length would keep every reader of it going for
// ever. Knows no documents. Invariant: behind it an address is a string, a text is a string, and a place counts from zero.
// Source: Language Server Protocol 3.18, "Text Document Synchronization".
import { Range, type Connection, type TextDocuments } from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';

type TextDocumentConnection = Parameters<TextDocuments<TextDocument>['listen']>[0];

/** The connection as far as documents need it, without what makes no sense. */
export function wellFormed(connection: Connection): TextDocumentConnection {
  const only = <Params>(
    what: string,
    fits: (params: unknown) => boolean,
    handler: (params: Params) => unknown,
  ): ((params: Params) => void) => {
    return (params) => {
      if (fits(params)) handler(params);
      else connection.console.error(`${what} was passed over: it has not the form of the protocol.`);
    };
  };
  return {
    onDidOpenTextDocument: (handler) =>
      connection.onDidOpenTextDocument(only('An opened document', isOpening, handler)),
    onDidChangeTextDocument: (handler) => connection.onDidChangeTextDocument(only('A change', isChange, handler)),
    onDidCloseTextDocument: (handler) =>
      connection.onDidCloseTextDocument(only('A closed document', hasDocument, handler)),
    onDidSaveTextDocument: (handler) =>
      connection.onDidSaveTextDocument(only('A saved document', hasDocument, handler)),
    onWillSaveTextDocument: (handler) =>
      connection.onWillSaveTextDocument(only('A document to be saved', hasDocument, handler)),
    onWillSaveTextDocumentWaitUntil: (handler) => connection.onWillSaveTextDocumentWaitUntil(handler),
  };
}

function isOpening(params: unknown): boolean {
  const document = documentIn(params);
  return document !== null && 'text' in document && typeof document.text === 'string' && hasVersion(document);
}

function isChange(params: unknown): boolean {
  const document = documentIn(params);
  if (document === null || !hasVersion(document) || !hasKey(params, 'contentChanges')) return false;
  const { contentChanges } = params;
  return Array.isArray(contentChanges) && contentChanges.every(isContentChange);
}

function isContentChange(change: unknown): boolean {
  if (!hasKey(change, 'text') || typeof change.text !== 'string') return false;
  return !hasKey(change, 'range') || change.range === undefined || Range.is(change.range);
}

function hasDocument(params: unknown): boolean {
  return documentIn(params) !== null;
}

/** Any whole number: that versions rise is the client's business, the last text sent counts. */
function hasVersion(document: object): boolean {
  return 'version' in document && Number.isInteger(document.version);
}

function documentIn(params: unknown): object | null {
  if (!hasKey(params, 'textDocument')) return null;
  const document = params.textDocument;
  return hasKey(document, 'uri') && typeof document.uri === 'string' ? document : null;
}

function hasKey<Key extends string>(value: unknown, key: Key): value is Record<Key, unknown> {
  return typeof value === 'object' && value !== null && key in value;
}
