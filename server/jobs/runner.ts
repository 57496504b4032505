// Runs jobs: in workers where the host has them, otherwise on this thread, with the same answers. Two requests of one key
// are one run; a run that nobody waits for any more is stopped by the flag it watches, where memory is shared, or else by
// ending its worker. Keeps no answers (job-answers.ts) and knows no host. Invariants: an answer is that of the job's own
// function; a fault costs the run it happened in; no run holds up another for more than `graceMs` once it is cancelled.
import { Crew, type Handed, type Outcome } from './crew.ts';
import type { InputOf, JobName, JobTable, OutputOf, StartWorker } from './job.ts';
import { jobNamed, noAnswer } from './serve-jobs.ts';

export interface RunnerOptions {
  /** Without it, jobs run on this thread. */
  readonly startWorker?: StartWorker | undefined;
  /** How many jobs may run at once. */
  readonly workers?: number;
  /** Hears, once, why there are no workers where there should be some. */
  readonly log?: (message: string) => void;
  /** A cancelled job that has not stopped after this long is ended. */
  readonly graceMs?: number;
  readonly spareAfterMs?: number;
  /** Whether a worker sees this thread's memory; not so in a browser's page that is not isolated. */
  readonly sharesMemory?: boolean;
}

interface Asker {
  readonly resolve: (output: unknown) => void;
  readonly reject: (error: Error) => void;
}

interface Run {
  readonly question: string;
  readonly name: string;
  readonly input: unknown;
  readonly askers: Set<Asker>;
  readonly flag: Int32Array<SharedArrayBuffer> | null;
  handed: Handed | null;
}

/** A runner as one sees it who does not know its table. */
export interface AnyJobRunner {
  /** The name a job has in the table; throws for one that is not there. */
  nameOf(job: unknown): string;
  runNamed(name: string, key: string, input: unknown, signal?: AbortSignal): Promise<unknown>;
}

export class JobRunner<Table extends JobTable> implements AnyJobRunner {
  readonly #runs = new Map<string, Run>();
  #queue: Run[] = [];
  #crew: Crew | null;
  #isOnThread = false;
  #isClosed = false;
  readonly #log: (message: string) => void;
  readonly #graceMs: number;
  readonly #sharesMemory: boolean;

  constructor(
    private readonly table: Table,
    { startWorker, workers = 1, log, graceMs = 100, spareAfterMs = 300, sharesMemory }: RunnerOptions = {},
  ) {
    this.#crew = startWorker ? new Crew(startWorker, workers, spareAfterMs) : null;
    this.#log = log ?? (() => undefined);
    this.#graceMs = graceMs;
    this.#sharesMemory = sharesMemory ?? typeof SharedArrayBuffer === 'function';
  }

  /**
   * What the job of that name gives for `input`, of which `key` says all: equal keys, equal inputs. Rejects with the
   * signal's reason once that is aborted, and with an Error where the job failed.
   */
  runJob<Name extends JobName<Table>>(
    name: Name,
    key: string,
    input: InputOf<Table, Name>,
    signal?: AbortSignal,
  ): Promise<OutputOf<Table, Name>> {
    return this.runNamed(name, key, input, signal) as Promise<OutputOf<Table, Name>>;
  }

  /** The same, for a name that is known to be there. */
  runNamed(name: string, key: string, input: unknown, signal?: AbortSignal): Promise<unknown> {
    return new Promise((resolve, reject) => {
      if (this.#isClosed) throw new Error('the program is ending');
      signal?.throwIfAborted();
      const run = this.#runOf(name, key, input);
      const leave = (): void => {
        run.askers.delete(asker);
        reject(asError(signal?.reason));
        if (run.askers.size === 0) this.#cancel(run);
      };
      const asker: Asker = {
        resolve: (output) => {
          signal?.removeEventListener('abort', leave);
          resolve(output);
        },
        reject: (error) => {
          signal?.removeEventListener('abort', leave);
          reject(error);
        },
      };
      signal?.addEventListener('abort', leave, { once: true });
      run.askers.add(asker);
      this.#next();
    });
  }

  nameOf(job: unknown): string {
    for (const name of Object.keys(this.table)) if (this.table[name] === job) return name;
    throw new Error('this computation is not in the table of jobs');
  }

  /** Ends the workers and whatever they do; who waits is told that the program is ending. */
  close(): void {
    this.#isClosed = true;
    this.#crew?.close();
    this.#queue = [];
    for (const run of [...this.#runs.values()]) this.#fail(run, new Error('the program is ending'));
  }

  #runOf(name: string, key: string, input: unknown): Run {
    const question = `${name}\n${key}`;
    const known = this.#runs.get(question);
    if (known) return known;
    const flag = this.#sharesMemory ? new Int32Array(new SharedArrayBuffer(4)) : null;
    const run: Run = { question, name, input, askers: new Set(), flag, handed: null };
    this.#runs.set(question, run);
    this.#queue.push(run);
    return run;
  }

  /** Hands over what waits, as far as there is room. */
  #next(): void {
    if (!this.#crew) {
      void this.#runOnThread();
      return;
    }
    while (this.#queue.length > 0 && this.#crew?.hasRoom) {
      const run = this.#queue.shift();
      if (run) this.#handOver(run, this.#crew);
    }
  }

  #handOver(run: Run, crew: Crew): void {
    const message = { name: run.name, input: run.input, flag: run.flag };
    try {
      run.handed = crew.hand(message, (outcome) => {
        this.#take(run, outcome);
        this.#next();
      });
    } catch (error) {
      // An input that cannot be copied is the job's fault; a worker that cannot be started is nobody's.
      if (isUncloneable(error)) this.#fail(run, error);
      else this.#stayOnThread(asError(error).message);
    }
  }

  #take(run: Run, outcome: Outcome): void {
    run.handed = null;
    switch (outcome.kind) {
      case 'done':
        return this.#finish(run, outcome.output);
      case 'failed':
        return this.#fail(run, withStack(outcome.message, outcome.stack));
      case 'stopped':
        return this.#fail(run, new Error(noAnswer(run.name)));
      case 'lost':
        if (!outcome.isReady) return this.#stayOnThread(outcome.reason);
        return this.#fail(run, new Error(`the worker ended under the job '${run.name}': ${outcome.reason}`));
    }
  }

  /** No worker can be had: what was begun, what waits and all to come is run here. */
  #stayOnThread(reason: string): void {
    if (this.#isClosed) return;
    this.#log(`Long computations run on the server's own thread: ${reason}`);
    this.#crew?.close();
    this.#crew = null;
    for (const run of this.#runs.values()) run.handed = null;
    this.#queue = [...this.#runs.values()];
    this.#next();
  }

  /** One run after another, with a turn for other messages before each. */
  async #runOnThread(): Promise<void> {
    if (this.#isOnThread) return;
    this.#isOnThread = true;
    for (;;) {
      await new Promise((resolve) => setTimeout(resolve, 0));
      const run = this.#queue.shift();
      if (!run) break;
      try {
        // Nobody can cancel meanwhile: what would tell has to wait as well.
        const output = jobNamed(this.table, run.name)(run.input, () => false);
        if (output === null) throw new Error(noAnswer(run.name));
        this.#finish(run, output);
      } catch (error) {
        this.#fail(run, asError(error));
      }
    }
    this.#isOnThread = false;
  }

  #finish(run: Run, output: unknown): void {
    this.#forget(run);
    for (const { resolve } of run.askers) resolve(output);
  }

  #fail(run: Run, error: Error): void {
    this.#forget(run);
    for (const { reject } of run.askers) reject(error);
  }

  /** Nobody waits any more. Who asks from now on gets a run of its own. */
  #cancel(run: Run): void {
    this.#forget(run);
    this.#queue = this.#queue.filter((other) => other !== run);
    if (!run.handed) return;
    if (!run.flag) {
      this.#end(run);
      return;
    }
    Atomics.store(run.flag, 0, 1);
    setTimeout(() => this.#end(run), this.#graceMs);
  }

  #end(run: Run): void {
    run.handed?.end();
    run.handed = null;
    this.#next();
  }

  #forget(run: Run): void {
    if (this.#runs.get(run.question) === run) this.#runs.delete(run.question);
  }
}

function isUncloneable(error: unknown): error is Error {
  return error instanceof Error && error.name === 'DataCloneError'; // HTML Standard, "Safe passing of structured data"
}

function asError(thrown: unknown): Error {
  return thrown instanceof Error ? thrown : new Error(String(thrown));
}

function withStack(message: string, stack: string | undefined): Error {
  const error = new Error(message);
  if (stack !== undefined) error.stack = stack;
  return error;
}
