// What a worker does: says that it is ready, then answers one job after another. Shared by the entries of all hosts, and
// by tests with tables of their own. Knows no host; keeps nothing from one job to the next but what core has read of its
// property tables. Invariant: one answer a message, whatever the job does.
import type { Job, JobMessage, JobTable, WorkerMessage } from './job.ts';

/** The worker's end of the line to the thread that started it. */
export interface JobPort {
  post(message: WorkerMessage): void;
  listen(take: (message: JobMessage) => void): void;
}

/** Answers jobs of this table for as long as the worker lives. */
export function serveJobs(table: JobTable, port: JobPort): void {
  port.listen((message) => {
    try {
      port.post(answerJob(table, message));
    } catch (error) {
      // Its own fault, or an output that cannot be copied.
      port.post(failure(error));
    }
  });
  port.post({ kind: 'ready' });
}

function answerJob(table: JobTable, { name, input, flag }: JobMessage): WorkerMessage {
  let isStopped = false;
  const output = jobNamed(table, name)(input, () => (isStopped ||= flag !== null && Atomics.load(flag, 0) !== 0));
  if (output !== null) return { kind: 'done', output };
  if (isStopped) return { kind: 'stopped' };
  throw new Error(noAnswer(name));
}

/** The job of that name, for input that has come as plain data. */
export function jobNamed(table: JobTable, name: string): Job<unknown, unknown> {
  const job = Object.hasOwn(table, name) ? table[name] : undefined;
  if (!job) throw new Error(`there is no job '${name}'`);
  return job as Job<unknown, unknown>;
}

/** What is wrong with a job that gives null although nobody told it to stop. */
export function noAnswer(name: string): string {
  return `the job '${name}' gave no answer`;
}

function failure(error: unknown): WorkerMessage {
  const { message, stack } = error instanceof Error ? error : new Error(String(error));
  return { kind: 'failed', message, stack };
}
