// Jobs in real workers and on the thread: the same answers, one run a key, cancelled soon, and a fault costs one job.
// Nothing here is timed: what has to happen soon is shown by something that could not happen otherwise.
import { afterEach, describe, expect, it } from 'vitest';
import { JobRunner, type RunnerOptions } from '../../../server/jobs/runner.ts';
import { bundledWorker, countedWorkers, type CountedWorkers } from '../../support/job-workers.ts';
import { gibbsEnergies, jobTable } from '../../support/job-table.ts';

const NEVER_MS = 1e6;
const bundle = bundledWorker();
const runners: JobRunner<typeof jobTable>[] = [];

function runner(options: RunnerOptions): JobRunner<typeof jobTable> {
  // No spare unless a test asks for one, so that workers can be counted.
  const made = new JobRunner(jobTable, { spareAfterMs: NEVER_MS, graceMs: NEVER_MS, ...options });
  runners.push(made);
  return made;
}

afterEach(() => {
  for (const one of runners.splice(0)) one.close();
});

const curve = (phase: string, count = 50): { phase: string; temperaturesK: Float64Array } => ({
  phase,
  temperaturesK: Float64Array.from({ length: count }, (_, index) => 300 + 7 * index),
});
const never = (): boolean => false;
/** Resolves once the job has been handed over. */
const begun = async (workers: CountedWorkers, name: string): Promise<void> => {
  while (!workers.posted.includes(name)) await turn();
};
const turn = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 1));

describe('answers', () => {
  it('are those of the function, in a worker and on the thread', async () => {
    const input = curve('Al2O3(cr,alpha)');
    const expected = gibbsEnergies(input, never);
    expect(expected?.[0]).toBeLessThan(-1.6e6);
    const workers = countedWorkers(bundle);
    expect(await runner(workers).runJob('gibbsEnergies', 'alumina', input)).toEqual(expected);
    expect(workers.posted).toEqual(['gibbsEnergies']);
    expect(await runner({}).runJob('gibbsEnergies', 'alumina', input)).toEqual(expected);
  });

  it('are the same for any number of workers, each in its place', async () => {
    const phases = ['NaOH(cr)', 'Na2CO3(cr)', 'H2O(g)', 'CO2(g)', 'Al2O3(cr,alpha)', 'Na(g)', 'O2(g)', 'N2(g)'];
    const inputs = Array.from({ length: 40 }, (_, index) => curve(phases[index % 8] ?? '', 5 + index));
    const expected = inputs.map((input) => gibbsEnergies(input, never));
    for (const workers of [1, 2, 3]) {
      const counted = countedWorkers(bundle);
      const pool = runner({ startWorker: counted.startWorker, workers });
      const found = await Promise.all(
        inputs.map((input, block) => pool.runJob('gibbsEnergies', `block ${block}`, input)),
      );
      expect(found).toEqual(expected);
      expect(counted.started).toBe(workers);
    }
  });
});

describe('one key', () => {
  it('is one run for all who ask while it is under way', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    const input = curve('H2O(g)');
    const [first, second, other] = await Promise.all([
      one.runJob('gibbsEnergies', 'steam', input),
      one.runJob('gibbsEnergies', 'steam', input),
      one.runJob('gibbsEnergies', 'oxygen', curve('O2(g)')),
    ]);
    expect(second).toBe(first);
    expect(other).not.toEqual(first);
    expect(workers.posted).toHaveLength(2);
  });

  it('is not cancelled while somebody still waits', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    const impatient = new AbortController();
    const input = curve('H2O(g)');
    const left = one.runJob('gibbsEnergies', 'steam', input, impatient.signal);
    const stayed = one.runJob('gibbsEnergies', 'steam', input);
    impatient.abort(new Error('enough'));
    await expect(left).rejects.toThrow('enough');
    expect(await stayed).toEqual(gibbsEnergies(input, never));
    expect(workers.posted).toHaveLength(1);
  });
});

describe('a cancelled job', () => {
  it('that heeds its flag leaves its worker to the next', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    // So that the worker has started, and is at it when it is told to stop.
    await one.runJob('gibbsEnergies', 'before', curve('H2O(g)'));
    const cancel = new AbortController();
    const endless = one.runJob('endless', '', undefined, cancel.signal);
    await new Promise((resolve) => setTimeout(resolve, 50));
    cancel.abort();
    await expect(endless).rejects.toThrow('aborted');
    await one.runJob('gibbsEnergies', 'after', curve('H2O(g)'));
    expect([workers.started, workers.ended, workers.lost]).toEqual([1, 0, 0]);
  });

  it('that heeds nothing is ended, and the spare takes its place', async () => {
    const workers = countedWorkers(bundle);
    const one = runner({ startWorker: workers.startWorker, graceMs: 100, spareAfterMs: 0 });
    const cancel = new AbortController();
    const deaf = one.runJob('deaf', '', undefined, cancel.signal);
    while (workers.started < 2) await turn();
    cancel.abort();
    await expect(deaf).rejects.toThrow('aborted');
    await one.runJob('gibbsEnergies', 'after', curve('H2O(g)'));
    expect(workers.ended).toBe(1);
    expect(workers.posted).toEqual(['deaf', 'gibbsEnergies']);
  });

  it('is ended at once where no memory is shared', async () => {
    const workers = countedWorkers(bundle);
    const one = runner({ startWorker: workers.startWorker, sharesMemory: false });
    const cancel = new AbortController();
    const endless = one.runJob('endless', '', undefined, cancel.signal);
    await begun(workers, 'endless');
    cancel.abort();
    await expect(endless).rejects.toThrow('aborted');
    expect(workers.ended).toBe(1);
    await one.runJob('gibbsEnergies', 'after', curve('H2O(g)'));
    expect(workers.started).toBe(2);
  });

  it('that waits for its turn is never begun', async () => {
    for (const options of [countedWorkers(bundle), {}]) {
      const one = runner(options);
      const cancel = new AbortController();
      const first = one.runJob('gibbsEnergies', 'first', curve('H2O(g)'));
      const ending = one.runJob('deaf', '', undefined, cancel.signal);
      cancel.abort();
      await expect(ending).rejects.toThrow('aborted');
      await first;
      await one.runJob('gibbsEnergies', 'after', curve('O2(g)'));
      await expect(one.runJob('deaf', '', undefined, cancel.signal)).rejects.toThrow('aborted');
    }
  });

  it('does not answer who asks for the same again', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    const [cancel, again] = [new AbortController(), new AbortController()];
    const first = one.runJob('endless', '', undefined, cancel.signal);
    await begun(workers, 'endless');
    cancel.abort();
    const second = one.runJob('endless', '', undefined, again.signal);
    await expect(first).rejects.toThrow('aborted');
    while (workers.posted.length < 2) await turn();
    again.abort(new Error('again'));
    await expect(second).rejects.toThrow('again');
  });
});

describe('a fault', () => {
  const after = async (one: JobRunner<typeof jobTable>): Promise<void> => {
    const input = curve('O2(g)');
    expect(await one.runJob('gibbsEnergies', 'after', input)).toEqual(gibbsEnergies(input, never));
  };

  it.each(['worker', 'thread'])('of the job itself is told with its words (%s)', async (where) => {
    const workers = countedWorkers(bundle);
    const one = runner(where === 'worker' ? workers : {});
    const failing = one.runJob('throwing', '', { message: 'no such phase' });
    await expect(failing).rejects.toThrow('no such phase');
    await expect(failing).rejects.toHaveProperty('stack', expect.stringContaining('throwing'));
    await expect(one.runJob('silent', '', undefined)).rejects.toThrow("the job 'silent' gave no answer");
    await expect(one.runJob('nothing' as 'silent', '', undefined)).rejects.toThrow("there is no job 'nothing'");
    await after(one);
    expect(workers.lost).toBe(0);
  });

  it('that ends the worker costs its own job only, and the next has a new worker', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    const ending = one.runJob('ending', '', undefined);
    const waiting = after(one);
    await expect(ending).rejects.toThrow("the worker ended under the job 'ending': it ended with code 3");
    await waiting;
    expect([workers.started, workers.lost]).toEqual([2, 1]);
  });

  it('that fills the memory ends the worker and not the program', async () => {
    const workers = countedWorkers(bundle, 24);
    const one = runner(workers);
    await expect(one.runJob('filling', '', undefined)).rejects.toThrow(
      /the worker ended under the job 'filling': .*memory/,
    );
    await after(one);
    expect(workers.lost).toBe(1);
  });

  it('of what cannot be copied is told, on the way there and back', async () => {
    const workers = countedWorkers(bundle);
    const one = runner(workers);
    await expect(one.runJob('unsendable', '', undefined)).rejects.toThrow('could not be cloned');
    const input = { message: (() => 'x') as unknown as string };
    await expect(one.runJob('throwing', '', input)).rejects.toThrow('could not be cloned');
    await after(one);
    expect(workers.started).toBe(1);
  });
});

describe('the spare', () => {
  it('is started only some time after a job has begun, and does no work', async () => {
    const workers = countedWorkers(bundle);
    const one = runner({ startWorker: workers.startWorker, spareAfterMs: 0 });
    await turn();
    expect(workers.started).toBe(0);
    const first = one.runJob('gibbsEnergies', 'first', curve('H2O(g)'));
    expect(workers.started).toBe(1);
    await first;
    while (workers.started < 2) await turn();
    await one.runJob('gibbsEnergies', 'second', curve('H2O(g)'));
    await turn();
    expect(workers.started).toBe(2);
  });
});

describe('without workers', () => {
  it('a bundle that is not there is told once, and the thread does the work', async () => {
    const workers = countedWorkers(`${bundle}.gone`);
    const logged: string[] = [];
    const one = runner({ startWorker: workers.startWorker, log: (message) => logged.push(message), workers: 2 });
    const inputs = ['H2O(g)', 'O2(g)', 'N2(g)'].map((phase) => curve(phase));
    const found = await Promise.all(inputs.map((input, index) => one.runJob('gibbsEnergies', String(index), input)));
    expect(found).toEqual(inputs.map((input) => gibbsEnergies(input, never)));
    expect(logged).toEqual([expect.stringContaining('Cannot find module')]);
    await one.runJob('gibbsEnergies', 'more', curve('O2(g)'));
    expect(workers.started).toBe(2);
  });

  it('a host that forbids them is told once, and the thread does the work', async () => {
    const logged: string[] = [];
    const one = runner({
      startWorker() {
        throw new Error('not allowed here');
      },
      log: (message) => logged.push(message),
    });
    const input = curve('O2(g)');
    expect(await one.runJob('gibbsEnergies', '', input)).toEqual(gibbsEnergies(input, never));
    expect(logged).toEqual([expect.stringContaining('not allowed here')]);
  });
});

it('closing tells those who wait, and those who come', async () => {
  const one = runner(countedWorkers(bundle));
  const endless = one.runJob('endless', '', undefined);
  one.close();
  await expect(endless).rejects.toThrow('the program is ending');
  await expect(one.runJob('endless', '', undefined)).rejects.toThrow('the program is ending');
});
