// Joins a client's connection to the open documents: says what the server can do and publishes findings with the
// version they belong to. Knows no transport, so that stdio, ipc, a worker and the tests use the same function.
// Invariant: a list is replaced, never cleared first, and cleared for good when its document closes.
// Source: Language Server Protocol 3.18.
import { TextDocuments, TextDocumentSyncKind } from 'vscode-languageserver';
import type { Connection, InitializeResult } from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';

/** Answers on the connection until it ends. Returns once listening has begun. */
export function serve(connection: Connection): void {
  const documents = new TextDocuments(TextDocument);

  connection.onInitialize((): InitializeResult => ({
    capabilities: { textDocumentSync: TextDocumentSyncKind.Incremental },
    serverInfo: { name: 'stokehold' },
  }));

  documents.onDidChangeContent(({ document }) => {
    void connection.sendDiagnostics({ uri: document.uri, version: document.version, diagnostics: [] });
  });
  documents.onDidClose(({ document }) => {
    void connection.sendDiagnostics({ uri: document.uri, diagnostics: [] });
  });

  documents.listen(connection);
  connection.listen();
}
