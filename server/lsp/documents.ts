// The documents open in the editor, found by the client's URI or by address, with what happens to them as plain calls.
// The protocol library keeps the texts in step; this adds the address, and the copy of a text that stays as it is while
// the document moves on. Knows no evaluation. Invariant: a copy's version and text belong together.
import { TextDocuments, type Connection } from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { addressOf } from './addresses.ts';
import { wellFormed } from './well-formed.ts';

export interface DocumentEvents {
  opened(uri: string): void;
  changed(uri: string): void;
  saved(uri: string): void;
  closed(uri: string): void;
}

export class OpenDocuments {
  readonly #documents = new TextDocuments(TextDocument);
  readonly #uriOfAddress = new Map<string, string>();

  /** Follows the client's notifications from now on. */
  listen(connection: Connection, events: DocumentEvents): void {
    const openedNow = new Set<string>();
    this.#documents.onDidOpen(({ document }) => {
      this.#uriOfAddress.set(addressOf(document.uri), document.uri);
      openedNow.add(document.uri);
    });
    this.#documents.onDidChangeContent(({ document }) => {
      // An opened document is announced by the library as opened and then, at once, as changed.
      if (openedNow.delete(document.uri)) events.opened(document.uri);
      else events.changed(document.uri);
    });
    this.#documents.onDidSave(({ document }) => {
      events.saved(document.uri);
    });
    this.#documents.onDidClose(({ document }) => {
      const address = addressOf(document.uri);
      if (this.#uriOfAddress.get(address) === document.uri) this.#uriOfAddress.delete(address);
      events.closed(document.uri);
    });
    this.#documents.listen(wellFormed(connection));
  }

  get(uri: string): TextDocument | undefined {
    return this.#documents.get(uri);
  }

  /** The open document at an address, however the client spells its URI. */
  at(address: string): TextDocument | undefined {
    const uri = this.#uriOfAddress.get(address);
    return uri === undefined ? undefined : this.#documents.get(uri);
  }

  /** The document as it is now, in a copy that no later change reaches. */
  copy(uri: string): TextDocument | undefined {
    const document = this.#documents.get(uri);
    return document && TextDocument.create(document.uri, document.languageId, document.version, document.getText());
  }

  uris(): readonly string[] {
    return this.#documents.keys();
  }
}
