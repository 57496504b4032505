// Gives each open document its evaluation, always of the text as it is now: at once where nothing changed, otherwise by
// evaluating again, fetching used files first. An evaluation is kept with every text it read, and counts as current while
// all of them still read the same: nothing is invalidated by hand. Knows no protocol messages.
// Invariant: an answer is never older than the request, and an exception of the evaluation is caught here, once.
import type { Finding } from '../findings/finding.ts';
import { findingsOf } from '../findings/registry.ts';
import { evaluate } from '../scenario/evaluate.ts';
import type { ReadAnswer } from '../scenario/files.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { addressOf, folderOf, isInside, uriOf } from './addresses.ts';
import { closedText, type PlacedText, type TextOf } from './convert.ts';
import type { OpenDocuments } from './documents.ts';
import type { UsedFiles } from './files.ts';

export interface Evaluated {
  readonly uri: string;
  readonly address: string;
  /** The text and version this belongs to. */
  readonly document: TextDocument;
  /** null when the evaluation failed by a fault of the program. */
  readonly scenario: EvaluatedScenario | null;
  readonly findings: readonly Finding[];
  readonly textOf: TextOf;
  /** Every file the evaluation asked for, with what it was told. */
  readonly read: ReadonlyMap<string, ReadAnswer>;
}

/** A chain of files is followed one link a round; one this long has lost its reader. */
const MOST_ROUNDS = 100;

export class Evaluations {
  readonly #kept = new Map<string, Evaluated>();

  constructor(
    private readonly documents: OpenDocuments,
    private readonly files: UsedFiles,
    /** Addresses of the workspace's folders. */
    private readonly folders: () => readonly string[],
    private readonly log: (message: string) => void,
  ) {}

  /** The evaluation of the document as it is when this resolves; null when it is not open. Never rejects. */
  async current(uri: string): Promise<Evaluated | null> {
    for (let round = 1; ; round++) {
      const copy = this.documents.copy(uri);
      if (!copy) return null;
      const evaluated = this.#keptFor(copy) ?? this.#evaluate(copy);
      const wanted = evaluated.scenario?.wanted ?? [];
      if (wanted.length === 0 || round === MOST_ROUNDS) {
        this.#kept.set(uri, evaluated);
        return evaluated;
      }
      await Promise.all(wanted.map((address) => this.files.fetch(address, uriOf(address) ?? address)));
    }
  }

  /** The document is closed: its evaluation goes, and with it the used files that no other evaluation read. */
  drop(uri: string): void {
    this.#kept.delete(uri);
    const needed = new Set<string>();
    for (const { read } of this.#kept.values()) for (const address of read.keys()) needed.add(address);
    this.files.keepOnly(needed);
  }

  /** The open documents whose evaluation asked for this file. */
  readersOf(address: string): readonly string[] {
    return [...this.#kept.values()].filter(({ read }) => read.has(address)).map(({ uri }) => uri);
  }

  #keptFor(copy: TextDocument): Evaluated | undefined {
    const kept = this.#kept.get(copy.uri);
    if (kept?.document.version !== copy.version) return undefined;
    const reader = this.#reader(copy);
    for (const [address, answer] of kept.read) if (!isSame(reader(address), answer)) return undefined;
    return kept;
  }

  #evaluate(copy: TextDocument): Evaluated {
    const address = addressOf(copy.uri);
    const read = new Map<string, ReadAnswer>();
    const reader = this.#reader(copy);
    const texts = new Map<string, PlacedText>();
    const textOf = (path: string): PlacedText | undefined => texts.get(path);
    const own = { uri: copy.uri, address, document: copy, textOf, read };
    texts.set(address, { uri: copy.uri, version: copy.version, document: copy });
    try {
      const scenario = evaluate(address, (path) => {
        const answer = reader(path);
        read.set(path, answer);
        return answer;
      });
      for (const file of scenario.files)
        if (file.path !== address) texts.set(file.path, this.#placed(file.path, file.tree.text));
      return { ...own, scenario, findings: findingsOf(scenario) };
    } catch (error) {
      // A fault of ours. It is said in the document too, because otherwise old answers would pass for current ones.
      const detail = error instanceof Error ? (error.stack ?? error.message) : String(error);
      this.log(`The evaluation of ${copy.uri} failed: ${detail}`);
      return { ...own, scenario: null, findings: [failed(address, error)] };
    }
  }

  /** Reads for one document: itself, then open documents, then fetched files, inside its limit. */
  #reader(copy: TextDocument): (path: string) => ReadAnswer {
    const own = addressOf(copy.uri);
    const limits = this.#limits(own);
    return (path) => {
      if (path === own) return { text: copy.getText() };
      if (uriOf(path) === null) {
        return { fault: 'unreadable', detail: 'This document has no folder yet. Save it first.' };
      }
      if (!isInside(path, limits)) return { fault: 'outside' };
      const open = this.documents.at(path);
      return open ? { text: open.getText() } : this.files.get(path);
    };
  }

  /** The workspace's folders; for a document in none of them, its own folder. */
  #limits(address: string): readonly string[] {
    const folders = this.folders();
    if (isInside(address, folders)) return folders;
    const folder = folderOf(address);
    return folder === null ? folders : [folder];
  }

  #placed(path: string, text: string): PlacedText {
    const open = this.documents.at(path);
    const closed = closedText(open?.uri ?? uriOf(path) ?? path, text);
    return open?.getText() === text ? { ...closed, version: open.version } : closed;
  }
}

function isSame(first: ReadAnswer, second: ReadAnswer): boolean {
  if (first === 'wanted' || second === 'wanted') return first === second;
  if ('text' in first) return 'text' in second && first.text === second.text;
  return !('text' in second) && first.fault === second.fault && first.detail === second.detail;
}

function failed(path: string, error: unknown): Finding {
  const message = error instanceof Error ? error.message : String(error);
  return {
    code: 'program/failed',
    severity: 'error',
    message: `This file could not be worked out, by a fault of the program itself (${message}). Please report it.`,
    place: { path, start: 0, end: 0 },
    related: [],
    fixes: [],
    acknowledged: false,
  };
}
