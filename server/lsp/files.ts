// Keeps the texts of used files that are not open in the editor. Each is asked for once, through a question handed in (to
// the client, or to a reader of the host), and kept until something says that it may have changed. Never reads a file
// itself and decides nothing about limits. Invariant: every question ends, by answer, by fault or by the clock, and an
// answer that was asked for before a change is not kept as news from after it.
import type { ReadAnswer } from '../scenario/files.ts';

/** What a used file turned out to be: never `wanted`. */
export type FileAnswer = Exclude<ReadAnswer, 'wanted'>;

/** Asks for a file by its URI. May fail or never answer; the caller copes. */
export type AskForFile = (uri: string) => Promise<unknown>;

/** After this long without an answer a file counts as unreadable, so that the rest is still worked out. */
const LONGEST_WAIT_MS = 5000;

export class UsedFiles {
  readonly #ask: AskForFile;
  readonly #waitMs: number;
  readonly #kept = new Map<string, FileAnswer>();
  readonly #asked = new Map<string, Promise<void>>();
  /** Raised at each change of a file, so that an answer on its way when the file changed is not kept. */
  readonly #changes = new Map<string, number>();

  constructor(ask: AskForFile, waitMs: number = LONGEST_WAIT_MS) {
    this.#ask = ask;
    this.#waitMs = waitMs;
  }

  /** What is known of the file now. */
  get(address: string): ReadAnswer {
    return this.#kept.get(address) ?? 'wanted';
  }

  /** Asks for a file that is not known. Resolves, and never rejects, when it is known or was changed meanwhile. */
  fetch(address: string, uri: string): Promise<void> {
    if (this.#kept.has(address)) return Promise.resolve();
    const running = this.#asked.get(address);
    if (running) return running;
    const change = this.#changes.get(address) ?? 0;
    const question = this.#answer(uri).then((answer) => {
      this.#asked.delete(address);
      if ((this.#changes.get(address) ?? 0) === change) this.#kept.set(address, answer);
    });
    this.#asked.set(address, question);
    return question;
  }

  /** The file may have changed: what was known of it no longer counts. */
  forget(address: string): void {
    this.#kept.delete(address);
    // Counted only while a question is on its way: otherwise the map would grow with every file ever saved.
    if (this.#asked.has(address)) this.#changes.set(address, (this.#changes.get(address) ?? 0) + 1);
    else this.#changes.delete(address);
  }

  /** Everything but these may go. */
  keepOnly(addresses: ReadonlySet<string>): void {
    for (const address of [...this.#kept.keys()]) if (!addresses.has(address)) this.#kept.delete(address);
  }

  /** All that is known by heart, so that it can be asked for again. */
  addresses(): readonly string[] {
    return [...this.#kept.keys()];
  }

  async #answer(uri: string): Promise<FileAnswer> {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const patience = new Promise<FileAnswer>((resolve) => {
      timer = setTimeout(() => {
        resolve({ fault: 'unreadable', detail: 'No answer came in time.' });
      }, this.#waitMs);
    });
    try {
      return await Promise.race([this.#ask(uri).then(asFileAnswer), patience]);
    } catch (error) {
      return { fault: 'unreadable', detail: error instanceof Error ? error.message : 'It could not be read.' };
    } finally {
      clearTimeout(timer);
    }
  }
}

/** Checks an answer that came from outside. */
export function asFileAnswer(answer: unknown): FileAnswer {
  if (typeof answer === 'object' && answer !== null) {
    if ('text' in answer && typeof answer.text === 'string') return { text: answer.text };
    if ('fault' in answer && (answer.fault === 'missing' || answer.fault === 'outside')) return { fault: answer.fault };
    if ('detail' in answer && typeof answer.detail === 'string') return { fault: 'unreadable', detail: answer.detail };
  }
  return { fault: 'unreadable' };
}
