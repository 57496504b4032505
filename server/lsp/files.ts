// Keeps the texts of used files that are not open in the editor. Each is asked for once, through a question handed in (to
// the client, or to a reader of the host), and kept until something says that it may have changed. Never reads a file
// itself and decides nothing about limits. Invariant: every question ends, by answer, by fault or by the clock, and an
// answer that was asked for before a change is not kept as news from after it.
import type { ReadAnswer } from '../scenario/files.ts';

/** What a used file turned out to be: never `wanted`. */
export type FileAnswer = Exclude<ReadAnswer, 'wanted'>;

/**
 * Asks for a file by its URI. May fail or never answer; the caller copes. `limits` are the addresses of the folders that
 * the file must lie in, for those who can see where a link leads.
 */
export type AskForFile = (uri: string, limits: readonly string[]) => Promise<unknown>;

/** After this long without an answer a file counts as unreadable, so that the rest is still worked out. */
const LONGEST_WAIT_MS = 5000;

/** What is known of one file. Documents with other limits may be told otherwise, so answers are kept by limits. */
interface Known {
  readonly answers: Map<string, FileAnswer>;
  readonly asked: Map<string, Promise<void>>;
}

export class UsedFiles {
  readonly #ask: AskForFile;
  readonly #waitMs: number;
  readonly #known = new Map<string, Known>();

  constructor(ask: AskForFile, waitMs: number = LONGEST_WAIT_MS) {
    this.#ask = ask;
    this.#waitMs = waitMs;
  }

  /** What is known of the file now. */
  get(address: string, limits: readonly string[] = []): ReadAnswer {
    return this.#known.get(address)?.answers.get(keyOf(limits)) ?? 'wanted';
  }

  /** Asks for a file that is not known. Resolves, and never rejects, when it is known or was changed meanwhile. */
  fetch(address: string, uri: string, limits: readonly string[] = []): Promise<void> {
    const known: Known = this.#known.get(address) ?? { answers: new Map(), asked: new Map() };
    this.#known.set(address, known);
    const key = keyOf(limits);
    if (known.answers.has(key)) return Promise.resolve();
    const running = known.asked.get(key);
    if (running) return running;
    // An answer on its way when the file changes goes with what was known before, where nobody looks any more.
    const question = this.#answer(uri, limits).then((answer) => {
      known.asked.delete(key);
      known.answers.set(key, answer);
    });
    known.asked.set(key, question);
    return question;
  }

  /** The file may have changed: what was known of it no longer counts. */
  forget(address: string): void {
    this.#known.delete(address);
  }

  /** Everything but these may go. */
  keepOnly(addresses: ReadonlySet<string>): void {
    for (const [address, { asked }] of this.#known) {
      if (!addresses.has(address) && asked.size === 0) this.#known.delete(address);
    }
  }

  /** All that is known by heart, so that it can be asked for again. */
  addresses(): readonly string[] {
    return [...this.#known.keys()];
  }

  async #answer(uri: string, limits: readonly string[]): Promise<FileAnswer> {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const patience = new Promise<FileAnswer>((resolve) => {
      timer = setTimeout(() => {
        resolve({ fault: 'unreadable', detail: 'No answer came in time.' });
      }, this.#waitMs);
    });
    try {
      return await Promise.race([this.#ask(uri, limits).then(asFileAnswer), patience]);
    } catch (error) {
      return { fault: 'unreadable', detail: error instanceof Error ? error.message : 'It could not be read.' };
    } finally {
      clearTimeout(timer);
    }
  }
}

/** An address holds no newline. */
function keyOf(limits: readonly string[]): string {
  return limits.join('\n');
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
