// Measures what a worker costs and how soon it does what it should: its memory with all property tables read, the first job
// of a cold start, a job's way there and back, and how soon a cancelled job makes room for the next. The worker is the
// product's own with the jobs of the tests, bundled and minified (its path is the second argument).
import { nodeWorkers } from '../../server/jobs/node-worker.ts';
import { JobRunner } from '../../server/jobs/runner.ts';
import { jobTable } from '../support/job-table.ts';
import { print, quantile } from './measured.ts';

const POOL = 4;
const ROUNDS = 200;
const CANCELS = 9;
const NEVER_MS = 1e6;
const bundle = process.argv[3];
if (!bundle) throw new Error('the second argument is the worker to start');
const startWorker = nodeWorkers(bundle);
const make = (workers: number, spareAfterMs = NEVER_MS): JobRunner<typeof jobTable> =>
  new JobRunner(jobTable, { startWorker, workers, spareAfterMs });
const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));
let nextKey = 0;
const key = (): string => String(nextKey++);
async function timedMs(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

await memory();
await ways();
await cancels('a job that heeds its flag', 'endless', 100);
await cancels('a job that heeds nothing', 'deaf', undefined);
process.exit(0);

async function memory(): Promise<void> {
  const before = process.memoryUsage.rss();
  const pool = make(POOL);
  // All at once, so that each has a worker of its own; several times, as code that runs grows a little.
  for (let round = 0; round < 5; round++) {
    await Promise.all(Array.from({ length: POOL }, () => pool.runJob('everyPhase', key(), 300 + 200 * round)));
  }
  await pause(500);
  const perWorkerMb = (process.memoryUsage.rss() - before) / POOL / 1e6;
  const note = `resident memory of ${POOL} workers, shared out, garbage and all`;
  print({ name: 'memory of a worker with all property tables read', value: perWorkerMb, unit: 'MB', budget: 40, note });
  pool.close();
}

async function ways(): Promise<void> {
  const cold: number[] = [];
  for (let round = 0; round < CANCELS; round++) {
    const one = make(1);
    cold.push(await timedMs(() => one.runJob('sumUpTo', key(), 10)));
    one.close();
  }
  print({ name: 'first job with the start of its worker, median', value: quantile(cold, 0.5), unit: 'ms' });
  const one = make(1);
  const warm: number[] = [];
  for (let round = 0; round < ROUNDS; round++) warm.push(await timedMs(() => one.runJob('sumUpTo', key(), 10)));
  print({ name: 'a small job there and back, median', value: quantile(warm, 0.5), unit: 'ms' });
  one.close();
}

/** From the cancellation to the answer of the job behind; the longest of all. */
async function cancels(what: string, name: 'endless' | 'deaf', budget: number | undefined): Promise<void> {
  const one = make(1, 0);
  const found: number[] = [];
  for (let round = 0; round < CANCELS; round++) {
    await one.runJob('sumUpTo', key(), 10);
    const cancel = new AbortController();
    const cancelled = one.runJob(name, key(), undefined, cancel.signal).catch(() => undefined);
    const behind = one.runJob('sumUpTo', key(), 10);
    // Long enough for it to be at it, and for the spare to have started.
    await pause(600);
    found.push(
      await timedMs(async () => {
        cancel.abort();
        await cancelled;
        await behind;
      }),
    );
  }
  const note = budget === undefined ? 'its worker is ended after 100 ms, and the spare takes over' : '';
  const value = Math.max(...found);
  print({ name: `from cancelling ${what} to the next answer, longest`, value, unit: 'ms', budget, note });
  one.close();
}
