// What a job is: a named pure function of plain data that may take long, and the messages that carry one to a worker and
// its answer back. Knows no thread and no scenario. Invariants: input and output are what `structuredClone` copies, and
// the output follows from the input alone, so that it is the same on any thread and for any number of them.

/**
 * Works `input` out. Asks `shouldStop` every few milliseconds and gives null, at once, when it says yes; never otherwise.
 * An exception is a fault of the program.
 */
export type Job<Input, Output> = (input: Input, shouldStop: () => boolean) => Output | null;

/** Jobs by name. */
export type JobTable = Readonly<Record<string, Job<never, unknown>>>;

export type JobName<Table extends JobTable> = keyof Table & string;
export type InputOf<Table extends JobTable, Name extends JobName<Table>> = Parameters<Table[Name]>[0];
export type OutputOf<Table extends JobTable, Name extends JobName<Table>> = Exclude<ReturnType<Table[Name]>, null>;

/** To a worker: one job at a time. It stops once the first number of `flag` is not 0; null where no memory is shared. */
export interface JobMessage {
  readonly name: string;
  readonly input: unknown;
  readonly flag: Int32Array<SharedArrayBuffer> | null;
}

/** From a worker: that it has started, and then one answer a job. */
export type WorkerMessage =
  | { readonly kind: 'ready' }
  | { readonly kind: 'done'; readonly output: unknown }
  | { readonly kind: 'stopped' }
  | { readonly kind: 'failed'; readonly message: string; readonly stack: string | undefined };

/** A worker as the thread that started it sees it, in Node or in a browser. */
export interface JobWorker {
  /** Throws what `structuredClone` throws for an input that is no plain data. */
  post(message: JobMessage): void;
  /** Ends it at once, whatever it is doing. */
  end(): void;
}

/** Hears of a worker. After `ended` nothing more comes. */
export interface JobWorkerEvents {
  message(message: WorkerMessage): void;
  /** It has ended by itself: it could not start, ran out of memory, or was ended by what it ran. */
  ended(reason: string): void;
}

/** Starts a worker; throws where the host allows none. */
export type StartWorker = (events: JobWorkerEvents) => JobWorker;
