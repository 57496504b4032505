// When a document is looked at again: at once when it is opened, and after a pause in the typing when it changes. Knows
// no evaluation; it is handed what to do. Invariant: at most one look at a document is waiting, each look ends before
// the next one at the same document starts, and the last change of a document is always looked at.

export class Schedule {
  readonly #waiting = new Map<string, ReturnType<typeof setTimeout>>();
  readonly #running = new Set<string>();
  readonly #again = new Set<string>();

  constructor(
    /** Looks at one document. Must not reject. */
    private readonly look: (uri: string) => Promise<void>,
  ) {}

  /** Look at the document once nothing more has happened to it for this long. */
  after(pauseMs: number, uri: string): void {
    clearTimeout(this.#waiting.get(uri));
    this.#waiting.set(
      uri,
      setTimeout(() => {
        this.#waiting.delete(uri);
        void this.#run(uri);
      }, pauseMs),
    );
  }

  /** Nothing more is to be done for the document. */
  drop(uri: string): void {
    clearTimeout(this.#waiting.get(uri));
    this.#waiting.delete(uri);
    this.#again.delete(uri);
  }

  /** The connection is closing. */
  dropAll(): void {
    for (const uri of [...this.#waiting.keys()]) this.drop(uri);
  }

  async #run(uri: string): Promise<void> {
    if (this.#running.has(uri)) {
      this.#again.add(uri);
      return;
    }
    this.#running.add(uri);
    await this.look(uri);
    this.#running.delete(uri);
    if (this.#again.delete(uri)) await this.#run(uri);
  }
}
