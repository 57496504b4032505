// A person at work on two files joined by `use`, as a model: what the texts are, what is open, what can be undone. Each act
// goes to a server that lives as long as the session; what that answers is compared with what a server says that has just
// been started on the same texts. Knows no generator. Invariant: the model's texts are those the server was told of.
import { isDeepStrictEqual } from 'node:util';
import {
  CancellationTokenSource,
  CompletionRequest,
  DefinitionRequest,
  HoverRequest,
  RenameRequest,
  ResponseError,
  type CancellationToken,
  type Diagnostic,
  type TextDocumentPositionParams,
  type TextEdit,
  type WorkspaceEdit,
} from 'vscode-languageserver/node';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { expect } from 'vitest';
import { TEMPO } from '../../server/lsp/stepping.ts';
import { ProtocolClient } from './protocol-client.ts';

export const MAIN = 'file:///ships/main.stoke';
export const HOUSE = 'file:///ships/house.stoke';
export type File = typeof MAIN | typeof HOUSE;

/** Shares of a text's length, from 0 to 1, stand for places, so that an act makes sense whatever the text is. */
export type Act =
  | { readonly do: 'type'; readonly file: File; readonly at: number; readonly deleted: number; readonly text: string }
  | { readonly do: 'undo'; readonly file: File }
  | { readonly do: 'rename'; readonly at: number; readonly name: string }
  | { readonly do: 'open or close the used file' }
  | { readonly do: 'race'; readonly asks: readonly Ask[]; readonly at: number; readonly text: string };

export interface Ask {
  readonly what: 'hover' | 'completion' | 'definition';
  readonly at: number;
  readonly cancel: boolean;
}

export class EditingSession {
  readonly #texts = new Map<string, string>();
  readonly #before = new Map<string, string[]>();
  readonly #disk = new Map<string, string>();
  #isHouseOpen = false;
  #client: ProtocolClient | null = null;

  constructor(main: string, house: string) {
    this.#texts.set(MAIN, main);
    this.#texts.set(HOUSE, house);
    this.#disk.set(HOUSE, house);
  }

  async start(): Promise<void> {
    this.#client = await this.#served(this.#disk);
    await this.#client.open(MAIN, this.#text(MAIN));
  }

  async stop(): Promise<void> {
    await this.#live().stop();
  }

  async act(act: Act): Promise<void> {
    switch (act.do) {
      case 'type': {
        const text = this.#text(act.file);
        const start = Math.floor(act.at * text.length);
        await this.#replace(act.file, start, start + act.deleted, act.text);
        break;
      }
      case 'undo': {
        const text = this.#before.get(act.file)?.pop();
        if (text !== undefined) await this.#become(act.file, text, false);
        break;
      }
      case 'rename':
        await this.#rename(act.at, act.name);
        break;
      case 'open or close the used file':
        await this.#toggleHouse();
        break;
      case 'race':
        await this.#race(act);
    }
  }

  /** Every answer at the places is that of a server that has just been started. */
  async check(places: readonly number[]): Promise<void> {
    const fresh = await this.#fresh();
    try {
      for (const uri of [MAIN, HOUSE]) await this.#sameFindings(uri, findingsIn(fresh, uri));
      for (const place of places) {
        for (const uri of this.#isHouseOpen ? [MAIN, HOUSE] : [MAIN]) {
          for (const what of ['hover', 'completion', 'definition'] as const) {
            const at = this.#position(uri, place);
            const [live, expected] = await Promise.all([ask(this.#live(), what, at), ask(fresh, what, at)]);
            same(live, expected, `the ${what} at ${JSON.stringify(at.position)} of ${uri}`);
          }
        }
      }
    } finally {
      await fresh.stop();
    }
  }

  async #sameFindings(uri: string, expected: readonly Diagnostic[]): Promise<void> {
    const live = this.#live();
    const wanted = sorted(expected);
    const isThere = (): boolean => isDeepStrictEqual(sorted(findingsIn(live, uri)), wanted);
    if (!live.published.some((params) => params.uri === uri) && wanted.length === 0) return;
    await live.diagnostics(uri, isThere).catch(() => {
      same(sorted(findingsIn(live, uri)), wanted, `the findings of ${uri}`);
    });
  }

  /** Asks, some of it cancelled, and types at once: each answer is that of the text before or after. */
  async #race({ asks, at, text }: Extract<Act, { do: 'race' }>): Promise<void> {
    const places = asks.map((one) => this.#position(MAIN, one.at));
    const before = await this.#answers(asks, places);
    const running = asks.map(async ({ what, cancel }, index) => {
      const source = new CancellationTokenSource();
      const place = places[index] ?? this.#position(MAIN, 0);
      const answer = ask(this.#live(), what, place, source.token).catch((error: unknown) => {
        if (cancel && error instanceof ResponseError) return 'cancelled';
        throw error;
      });
      if (cancel) source.cancel();
      return answer;
    });
    const start = Math.floor(at * this.#text(MAIN).length);
    await this.#replace(MAIN, start, start, text);
    const answers = await Promise.all(running);
    const after = await this.#answers(asks, places);
    answers.forEach((answer, index) => {
      if (answer === 'cancelled' || isDeepStrictEqual(answer, before[index])) return;
      same(answer, after[index], `an answer while typing (${asks[index]?.what})`);
    });
  }

  async #answers(asks: readonly Ask[], places: readonly TextDocumentPositionParams[]): Promise<unknown[]> {
    const fresh = await this.#fresh();
    const answers = await Promise.all(
      asks.map(({ what }, index) => ask(fresh, what, places[index] ?? this.#position(MAIN, 0))),
    );
    await fresh.stop();
    return answers;
  }

  async #rename(share: number, newName: string): Promise<void> {
    const at = { ...this.#position(MAIN, share), newName };
    const fresh = await this.#fresh();
    const [live, expected] = await Promise.all(
      [this.#live(), fresh].map((client) =>
        client.connection.sendRequest(RenameRequest.type, at).catch((error: unknown) => String(error)),
      ),
    );
    await fresh.stop();
    same(withoutVersions(live), withoutVersions(expected), `a rename at ${JSON.stringify(at.position)}`);
    if (typeof live !== 'object' || live === null) return;
    for (const change of live.documentChanges ?? []) {
      if (!('edits' in change)) continue;
      const { uri } = change.textDocument;
      const document = TextDocument.create(uri, 'stokehold', 0, this.#text(uri));
      const edits = change.edits.filter((edit): edit is TextEdit => 'newText' in edit);
      await this.#become(uri, TextDocument.applyEdits(document, edits), true);
    }
  }

  async #toggleHouse(): Promise<void> {
    const text = this.#text(HOUSE);
    if (this.#isHouseOpen) {
      // Saved as it is closed.
      this.#disk.set(HOUSE, text);
      await this.#live().close(HOUSE);
    } else await this.#live().open(HOUSE, text);
    this.#isHouseOpen = !this.#isHouseOpen;
  }

  async #replace(uri: string, start: number, end: number, newText: string): Promise<void> {
    const text = this.#text(uri);
    await this.#become(uri, text.slice(0, start) + newText + text.slice(end), true);
  }

  /** The file has another text: typed where it is open, else written on the disk, with word of it. */
  async #become(uri: string, text: string, canBeUndone: boolean): Promise<void> {
    const old = this.#text(uri);
    if (canBeUndone) this.#before.set(uri, [...(this.#before.get(uri) ?? []), old]);
    this.#texts.set(uri, text);
    if (uri === MAIN || this.#isHouseOpen) {
      await this.#live().edit(uri, old, text);
      return;
    }
    this.#disk.set(uri, text);
    await this.#live().connection.sendNotification('workspace/didChangeWatchedFiles', { changes: [{ uri, type: 2 }] });
  }

  /** A server that has just been started on the texts as they are, its findings complete. */
  async #fresh(): Promise<ProtocolClient> {
    const fresh = await this.#served(new Map(this.#disk));
    if (this.#isHouseOpen) {
      await fresh.open(HOUSE, this.#text(HOUSE));
      await fresh.diagnosticsOf(HOUSE, 1);
    }
    await fresh.open(MAIN, this.#text(MAIN));
    await fresh.diagnosticsOf(MAIN, 1);
    // What it says of the other file has come too once it has answered.
    await ask(fresh, 'hover', this.#position(MAIN, 0));
    return fresh;
  }

  async #served(files: Map<string, string>): Promise<ProtocolClient> {
    // Lists that are not complete would pass for ones that are.
    const tempo = { ...TEMPO, quickAfterMs: Infinity };
    const client = ProtocolClient.inProcess({ files, folders: ['file:///ships'], host: { tempo } });
    await client.initialize();
    return client;
  }

  #live(): ProtocolClient {
    return this.#client ?? expect.fail('The session has not been started.');
  }

  #text(uri: string): string {
    return this.#texts.get(uri) ?? '';
  }

  #position(uri: string, share: number): TextDocumentPositionParams {
    const text = this.#text(uri);
    const document = TextDocument.create(uri, 'stokehold', 0, text);
    return { textDocument: { uri }, position: document.positionAt(Math.floor(share * text.length)) };
  }
}

async function ask(
  { connection }: ProtocolClient,
  what: Ask['what'],
  at: TextDocumentPositionParams,
  token?: CancellationToken,
): Promise<unknown> {
  switch (what) {
    case 'hover':
      return connection.sendRequest(HoverRequest.type, at, token);
    case 'completion':
      return connection.sendRequest(CompletionRequest.type, at, token);
    case 'definition':
      return connection.sendRequest(DefinitionRequest.type, at, token);
  }
}

function findingsIn(client: ProtocolClient, uri: string): readonly Diagnostic[] {
  return client.published.filter((params) => params.uri === uri).at(-1)?.diagnostics ?? [];
}

function sorted(diagnostics: readonly Diagnostic[]): readonly Diagnostic[] {
  return [...diagnostics].sort((one, other) => (JSON.stringify(one) < JSON.stringify(other) ? -1 : 1));
}

function withoutVersions(edit: WorkspaceEdit | string | null | undefined): unknown {
  if (typeof edit !== 'object') return edit;
  return edit?.documentChanges?.map((change) => ('edits' in change ? [change.textDocument.uri, change.edits] : change));
}

function same(live: unknown, fresh: unknown, what: string): void {
  if (!isDeepStrictEqual(live, fresh)) expect(live, what).toStrictEqual(fresh);
}
