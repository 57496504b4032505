// What jobs have answered for the open documents, and what they are still to answer. An evaluation asks, goes on without
// what is not there yet, waits, and asks again; its jobs outlive it, so that typing elsewhere does not start them anew.
// Knows no scenario. Invariants: an answer is kept for as long as what a document last used rests on it; a job that the
// evaluation behind the one that wanted it does not ask for is cancelled; a failure is told and never kept.
import type { Job } from './job.ts';
import { MemoStore, type Key, type MemoRun } from './memo.ts';
import type { AnyJobRunner } from './runner.ts';

/** What is there of an answer. */
export interface Asked<Output> {
  /** Names the question, begins with a newline, and has a key for as long as its answer is kept. */
  readonly id: string;
  /** undefined while the job is to be done. */
  readonly kept: { readonly key: Key; readonly value: Output } | undefined;
}

/** A job that is wanted, begun or not. */
interface Wanted {
  readonly start: (signal: AbortSignal) => Promise<unknown>;
  cancel: AbortController | null;
  outcome: { readonly value: unknown } | { readonly error: unknown } | null;
}

/** What one user wants, from one of its runs to the next. */
interface User {
  readonly wanted: Map<string, Wanted>;
  /** A job has ended since somebody last asked whether one has. */
  hasNews: boolean;
  /** Called when one ends. */
  wake: () => void;
}

export class JobAnswers {
  readonly #store = new MemoStore<unknown>();
  readonly #users = new Map<string, User>();

  constructor(private readonly runner: AnyJobRunner) {}

  /** How many answers are kept. */
  get size(): number {
    return this.#store.size;
  }

  /** Begins a run for a user (an open document), which ends with `finish` or `abandon`; one at a time for each. */
  run(name: string): JobAnswersRun {
    const user = this.#users.get(name) ?? { wanted: new Map<string, Wanted>(), hasNews: false, wake: () => undefined };
    this.#users.set(name, user);
    return new JobAnswersRun(this.runner, this.#store.run(name), user);
  }

  /** The user is gone: what it alone wanted is cancelled, and what it alone used goes. */
  drop(name: string): void {
    for (const { cancel } of this.#users.get(name)?.wanted.values() ?? []) cancel?.abort();
    this.#users.delete(name);
    this.#store.drop(name);
  }
}

export class JobAnswersRun {
  readonly #asked = new Set<string>();

  constructor(
    private readonly runner: AnyJobRunner,
    private readonly memo: MemoRun<unknown>,
    private readonly user: User,
  ) {}

  /** What `job`, one of the runner's table, gives for `input`, if it is there by now. Throws where the job failed. */
  ask<Input, Output>(job: Job<Input, Output>, key: string, input: Input): Asked<Output> {
    const name = this.runner.nameOf(job);
    const id = `\n${name}\n${key}`;
    const { wanted } = this.user;
    this.#asked.add(id);
    const kept = this.memo.recall(id, nothingLookedUp);
    if (kept) return { id, kept: kept as Asked<Output>['kept'] };
    const outcome = wanted.get(id)?.outcome;
    if (outcome && 'error' in outcome) throw outcome.error;
    if (outcome) {
      wanted.delete(id);
      return { id, kept: this.memo.keep(id, new Map(), outcome.value) as Asked<Output>['kept'] };
    }
    if (!wanted.has(id)) {
      const start = (signal: AbortSignal): Promise<unknown> => this.runner.runNamed(name, key, input, signal);
      wanted.set(id, { start, cancel: null, outcome: null });
    }
    return { id, kept: undefined };
  }

  /** The key of an answer that is kept, which is used from now on; null for one that is not. */
  keyNow(id: string): Key | null {
    return this.memo.recall(id, nothingLookedUp)?.key ?? null;
  }

  /** Whether a question that has been asked would now be answered. */
  isDone(id: string): boolean {
    const wanted = this.user.wanted.get(id);
    return !wanted || wanted.outcome !== null;
  }

  /**
   * Nothing more can be asked: begins what is to be done, cancels what only runs before this one wanted, and resolves
   * when a job has ended; sometimes once more than that.
   */
  news(): Promise<void> {
    this.#cancelOthers();
    for (const wanted of this.user.wanted.values()) if (!wanted.cancel) this.#begin(wanted);
    return new Promise((resolve) => {
      this.user.wake = resolve;
      // Whoever heard of it may have been called away before looking, so it counts until somebody asks again.
      if (this.user.hasNews) resolve();
      this.user.hasNews = false;
    });
  }

  /** All was asked and answered. */
  finish(): void {
    this.#cancelOthers();
    this.user.wanted.clear();
    this.memo.finish();
  }

  /** The run is given up; what it began goes on, for the next to ask for. */
  abandon(): void {
    this.memo.abandon();
  }

  #begin(wanted: Wanted): void {
    const cancel = new AbortController();
    wanted.cancel = cancel;
    const ended = (outcome: NonNullable<Wanted['outcome']>): void => {
      wanted.outcome = outcome;
      this.user.hasNews = true;
      this.user.wake();
    };
    wanted.start(cancel.signal).then(
      (value) => ended({ value }),
      (error: unknown) => ended({ error }),
    );
  }

  #cancelOthers(): void {
    for (const [id, { cancel }] of this.user.wanted) {
      if (this.#asked.has(id)) continue;
      cancel?.abort();
      this.user.wanted.delete(id);
    }
  }
}

const nothingLookedUp = (): null => null;
