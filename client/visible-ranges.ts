// Tells the language server which lines of each scenario are on the screen, so that of a file that is very large the
// server reads what is looked at. Knows nothing of sizes: which files are too large is the server's question.
// Invariant: the server hears of each document after it was opened there, and again whenever other lines are shown.
import { window, type Disposable, type TextDocument } from 'vscode';
import type { LanguageClient, Middleware } from 'vscode-languageclient/node';

const LANGUAGE = 'stokehold';

/** Tells of every document the client opens, on its first start and on every later one. */
export function tellingWhenOpened(client: () => LanguageClient | undefined): Middleware {
  return {
    didOpen: async (document, next) => {
      await next(document);
      tell(client(), document);
    },
  };
}

/** Tells whenever other lines come into sight. */
export function tellWhatIsVisible(client: () => LanguageClient | undefined): Disposable[] {
  return [
    window.onDidChangeTextEditorVisibleRanges(({ textEditor }) => {
      tell(client(), textEditor.document);
    }),
    window.onDidChangeVisibleTextEditors((editors) => {
      for (const document of new Set(editors.map((editor) => editor.document))) tell(client(), document);
    }),
  ];
}

function tell(client: LanguageClient | undefined, document: TextDocument): void {
  if (!client?.isRunning() || document.languageId !== LANGUAGE) return;
  const converter = client.code2ProtocolConverter;
  const ranges = window.visibleTextEditors
    .filter((editor) => editor.document === document)
    .flatMap((editor) => editor.visibleRanges.map((range) => converter.asRange(range)));
  // A server that is just going away needs not be told.
  client
    .sendNotification('stokehold/visibleRanges', { uri: converter.asUri(document.uri), ranges })
    .catch(() => undefined);
}
