// Starts workers as threads of this process, under Node, from a bundle. Knows no job. Invariants: a worker that works keeps
// the process alive and an idle one does not; one that needs more memory than it may have ends, and the process goes on.
// Source: Node's documentation of `worker_threads`.
import { Worker } from 'node:worker_threads';
import type { StartWorker, WorkerMessage } from './job.ts';

/** More than any job may need, in MB: what a runaway one fills before it is ended. */
const LARGEST_HEAP_MB = 256;

/** Starts workers from the bundle of that name; a bundle that is not there is told as one that ended. */
export function nodeWorkers(bundle: string, largestHeapMb = LARGEST_HEAP_MB): StartWorker {
  return (events) => {
    const worker = new Worker(bundle, {
      // Standard output is the client's line; whatever a worker prints must not get into it.
      stdout: true,
      // What the server was started with (an inspector's port, say) is not for its workers.
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: largestHeapMb },
    });
    worker.stdout.resume();
    worker.unref();
    let isOver = false;
    const over = (reason: string): void => {
      if (isOver) return;
      isOver = true;
      events.ended(reason);
    };
    worker.on('message', (message: WorkerMessage) => {
      if (isOver) return;
      if (message.kind !== 'ready') worker.unref();
      events.message(message);
    });
    worker.on('error', (error: unknown) => over(error instanceof Error ? error.message : String(error)));
    worker.on('exit', (code) => over(`it ended with code ${code}`));
    return {
      post(message) {
        worker.postMessage(message);
        worker.ref();
      },
      end() {
        isOver = true;
        void worker.terminate();
      },
    };
  };
}
