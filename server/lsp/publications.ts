// Decides which findings the client is shown for which file. Each open document tells what it found in itself and in the
// files it uses; a file's list is what all of them say of it, each finding once. Knows no timing and no evaluation.
// Invariants: a list replaces the one before and is never cleared first; a list goes out only for the text it was made
// from; the same list is not sent twice for one version; what no open document speaks of any more is cleared.
import type { Diagnostic } from 'vscode-languageserver';

/** What one open document says of one file. */
export interface Said {
  readonly uri: string;
  /** The text the ranges belong to. */
  readonly text: string;
  readonly diagnostics: readonly Diagnostic[];
}

/** The open document at an address, if there is one. */
export type OpenAt = (
  address: string,
) => { readonly uri: string; readonly version: number; getText(): string } | undefined;

export type Send = (uri: string, version: number | null, diagnostics: readonly Diagnostic[]) => void;

interface Sent {
  readonly uri: string;
  readonly version: number | null;
  readonly diagnostics: readonly Diagnostic[];
}

export class Publications {
  /** By the speaking document's address, then by the file's address. */
  readonly #said = new Map<string, ReadonlyMap<string, Said>>();
  readonly #sent = new Map<string, Sent>();

  constructor(
    private readonly openAt: OpenAt,
    private readonly send: Send,
  ) {}

  /** What the open document `speaker` now says, in place of all it said before. */
  replace(speaker: string, said: ReadonlyMap<string, Said>): void {
    const before = this.#said.get(speaker);
    this.#said.set(speaker, said);
    for (const address of new Set([...said.keys(), ...(before?.keys() ?? [])])) this.#publish(address);
  }

  /** The document is closed: it says nothing more, and its own list is cleared. */
  close(speaker: string): void {
    const before = this.#said.get(speaker);
    this.#said.delete(speaker);
    // What others say of this file was said of the text that was open; they will look at the file again and say it anew.
    this.#clear(speaker);
    for (const address of before?.keys() ?? []) if (address !== speaker) this.#publish(address);
  }

  #publish(address: string): void {
    const open = this.openAt(address);
    const own = this.#said.get(address)?.get(address);
    // An open document's list waits for its own evaluation of the text as it is now.
    if (open && own?.text !== open.getText()) return;
    const said = [...(own ? [own] : []), ...this.#saidByOthers(address)].filter(
      ({ text }) => !own || text === own.text,
    );
    const uri = open?.uri ?? said[0]?.uri;
    if (uri === undefined) {
      this.#clear(address);
      return;
    }
    const diagnostics = once(said.flatMap((one) => one.diagnostics));
    const next: Sent = { uri, version: open?.version ?? null, diagnostics };
    const last = this.#sent.get(address);
    // The same list for a newer version is sent: the editor has moved its marks with the edits in between, and a mark whose
    // text was deleted and typed again is gone although the list is the same.
    if (last?.uri === next.uri && last.version === next.version && isSame(last.diagnostics, diagnostics)) return;
    if (last && last.uri !== next.uri) this.#clear(address);
    // A closed file without findings that never had any need not be spoken of.
    if (!open && !this.#sent.has(address) && diagnostics.length === 0) return;
    this.#sent.set(address, next);
    this.send(next.uri, next.version, diagnostics);
  }

  *#saidByOthers(address: string): Iterable<Said> {
    for (const [speaker, said] of this.#said) {
      const one = speaker === address ? undefined : said.get(address);
      if (one) yield one;
    }
  }

  #clear(address: string): void {
    const last = this.#sent.get(address);
    if (!last) return;
    this.#sent.delete(address);
    this.send(last.uri, null, []);
  }
}

/** Each finding once. Those that begin at one place and bear one code are few, so only they are compared in full. */
function once(diagnostics: readonly Diagnostic[]): Diagnostic[] {
  const seen = new Map<string, Diagnostic[]>();
  return diagnostics.filter((diagnostic) => {
    const { range, code } = diagnostic;
    const key = `${range.start.line} ${range.start.character} ${String(code)}`;
    const others = seen.get(key);
    if (!others) seen.set(key, [diagnostic]);
    else if (others.some((other) => saysTheSame(other, diagnostic))) return false;
    else others.push(diagnostic);
    return true;
  });
}

/** Of two that begin at one place. */
function saysTheSame(first: Diagnostic, second: Diagnostic): boolean {
  const [end, otherEnd] = [first.range.end, second.range.end];
  return first.message === second.message && end.line === otherEnd.line && end.character === otherEnd.character;
}

function isSame(first: readonly Diagnostic[], second: readonly Diagnostic[]): boolean {
  return first.length === second.length && JSON.stringify(first) === JSON.stringify(second);
}
