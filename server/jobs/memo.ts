// Keeps answers to questions by content: a question is a text, and an answer to it counts again only where everything it
// looked up on its way still has the key it had. Knows nothing of what is asked and never invalidates anything: an edit
// makes another question, and an answer that no open version uses any more goes. Invariants: an answer is found only by
// exactly what it was made from; two keys are equal only if the answers are; what a user's last finished run used is kept.

/** Stands for an answer in the keys of those that look it up; never given twice. */
export type Key = number | string;

export interface Kept<Value> {
  readonly key: number;
  readonly value: Value;
}

/** What one run of questions asks and gives. */
export interface MemoRun<Value> {
  /** The answer kept for a question, if all it looked up has that key now (`keyNow` is asked for each). */
  recall(question: string, keyNow: (lookedUp: string) => Key | null): Kept<Value> | undefined;
  /** Keeps an answer with the keys of what it looked up. */
  keep(question: string, lookedUp: ReadonlyMap<string, Key>, value: Value): Kept<Value>;
  /** All was asked: what the user's runs before used, and this one did not, may go. */
  finish(): void;
  /** The run is given up: what it used so far is kept beside that of the last finished run. */
  abandon(): void;
}

interface Entry<Value> extends Kept<Value> {
  readonly question: string;
  readonly lookedUp: ReadonlyMap<string, Key>;
  /** How many sets of used entries it is in. */
  users: number;
}

interface Used<Value> {
  readonly finished: ReadonlySet<Entry<Value>>;
  readonly abandoned: ReadonlySet<Entry<Value>>;
}

export class MemoStore<Value> {
  readonly #entries = new Map<string, Entry<Value>[]>();
  readonly #used = new Map<string, Used<Value>>();
  #nextKey = 0;

  /** How many answers are kept. */
  get size(): number {
    let size = 0;
    for (const entries of this.#entries.values()) size += entries.length;
    return size;
  }

  /** Begins a run for a user (an open document), which ends with `finish` or `abandon`. */
  run(user: string): MemoRun<Value> {
    const used = new Set<Entry<Value>>();
    return {
      recall: (question, keyNow) => {
        const entry = this.#entries.get(question)?.find(({ lookedUp }) => isCurrent(lookedUp, keyNow));
        if (entry) used.add(entry);
        return entry;
      },
      keep: (question, lookedUp, value) => {
        const entry = { question, lookedUp, key: this.#nextKey++, value, users: 0 };
        const others = this.#entries.get(question);
        if (others) others.push(entry);
        else this.#entries.set(question, [entry]);
        used.add(entry);
        return entry;
      },
      finish: () => {
        this.#replace(user, { finished: used, abandoned: new Set() });
      },
      abandon: () => {
        this.#replace(user, { finished: this.#used.get(user)?.finished ?? new Set(), abandoned: used });
      },
    };
  }

  /** The user is gone (its document is closed), and with it what it alone used. */
  drop(user: string): void {
    this.#replace(user, null);
  }

  #replace(user: string, next: Used<Value> | null): void {
    const before = this.#used.get(user);
    if (next) this.#used.set(user, next);
    else this.#used.delete(user);
    // Counted up before counted down, so that what is in both never reaches nothing.
    for (const entries of next ? [next.finished, next.abandoned] : []) for (const entry of entries) entry.users++;
    for (const entries of before ? [before.finished, before.abandoned] : []) {
      for (const entry of entries) if (--entry.users === 0) this.#forget(entry);
    }
  }

  #forget(entry: Entry<Value>): void {
    const others = this.#entries.get(entry.question)?.filter((other) => other !== entry) ?? [];
    if (others.length > 0) this.#entries.set(entry.question, others);
    else this.#entries.delete(entry.question);
  }
}

function isCurrent(lookedUp: ReadonlyMap<string, Key>, keyNow: (lookedUp: string) => Key | null): boolean {
  for (const [name, key] of lookedUp) if (keyNow(name) !== key) return false;
  return true;
}
