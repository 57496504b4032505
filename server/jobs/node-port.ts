// A worker's line to the thread that started it, under Node. Knows no job.
import type { MessagePort } from 'node:worker_threads';
import type { JobMessage } from './job.ts';
import type { JobPort } from './serve-jobs.ts';

/** `parentPort` of `node:worker_threads`, which is null in a program that was not started as a worker. */
export function nodePort(parentPort: MessagePort | null): JobPort {
  if (!parentPort) throw new Error('This program is a part of the language server and is started by it.');
  return {
    post: (message) => parentPort.postMessage(message),
    listen: (take) => void parentPort.on('message', (message: JobMessage) => take(message)),
  };
}
