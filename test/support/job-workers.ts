// Starts the worker of the tests, bundled as the product's is, and keeps account of what was started, handed over and ended.
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { build } from 'esbuild';
import { afterAll, beforeAll } from 'vitest';
import type { StartWorker } from '../../server/jobs/job.ts';
import { nodeWorkers } from '../../server/jobs/node-worker.ts';

/** A way to start workers that counts. */
export interface CountedWorkers {
  readonly startWorker: StartWorker;
  started: number;
  /** Names of the jobs handed over, in order. */
  readonly posted: string[];
  /** Ended by the runner. */
  ended: number;
  /** Ended by themselves. */
  lost: number;
}

/** Bundles the worker before the tests of a file; gives the path of the bundle. */
export function bundledWorker(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'stokehold-worker-'));
  const outfile = path.join(folder, 'worker.cjs');
  beforeAll(async () => {
    const entry = path.resolve(import.meta.dirname, 'job-worker.ts');
    const options = { bundle: true, platform: 'node', format: 'cjs', target: 'node20', logLevel: 'warning' } as const;
    await build({ ...options, entryPoints: [entry], outfile });
  }, 60_000);
  afterAll(() => rmSync(folder, { recursive: true }));
  return outfile;
}

export function countedWorkers(bundle: string, largestHeapMb?: number): CountedWorkers {
  const start = nodeWorkers(bundle, largestHeapMb);
  const counted: CountedWorkers = {
    started: 0,
    posted: [],
    ended: 0,
    lost: 0,
    startWorker(events) {
      counted.started++;
      const worker = start({
        message: (message) => events.message(message),
        ended: (reason) => {
          counted.lost++;
          events.ended(reason);
        },
      });
      return {
        post: (message) => {
          counted.posted.push(message.name);
          worker.post(message);
        },
        end: () => {
          counted.ended++;
          worker.end();
        },
      };
    },
  };
  return counted;
}
