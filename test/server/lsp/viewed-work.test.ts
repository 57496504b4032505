// Long work for a view: done once, waited for a little, cancelled when the text moves on; on the real job of a burn's path.
import { describe, expect, it } from 'vitest';
import { hover } from '../../../server/features/hover.ts';
import { asPlainText } from '../../../server/features/hover-text.ts';
import { jobs } from '../../../server/jobs/jobs.ts';
import { JobRunner, type AnyJobRunner } from '../../../server/jobs/runner.ts';
import { ViewedWork } from '../../../server/lsp/viewed-work.ts';
import type { TableWork } from '../../../server/scenario/scenario.ts';
import { evaluateFixture } from '../../support/features.ts';

const URI = 'file:///ships/main.stoke';
const BURN = `blend slurry {
  30 % mass sodium
  rest methanol
}
burn fur$0nace {
  fuel: slurry
  oxidant: air
  lambda: 1.5
  cooled to: 300 degC
}
`;
const job = (): null => null;

interface Begun {
  readonly signal: AbortSignal | undefined;
  readonly end: (value: unknown) => void;
  readonly fail: (error: Error) => void;
}

function byHand(): { runner: AnyJobRunner; begun: Begun[] } {
  const begun: Begun[] = [];
  const runner: AnyJobRunner = {
    nameOf: () => 'job',
    runNamed: (_name, _key, _input, signal) =>
      new Promise((resolve, reject) => {
        signal?.addEventListener('abort', () => reject(new Error('cancelled')));
        begun.push({ signal, end: resolve, fail: reject });
      }),
  };
  return { runner, begun };
}

function workOf(key: string): { work: TableWork; found: () => unknown } {
  let found: unknown = null;
  return {
    found: () => found,
    work: { isDone: () => found !== null, ask: (longWork) => (found = longWork(job, key, 1)) !== null },
  };
}

describe('the hover of a burn', () => {
  it('says that the path is being worked out, and tells it once the work is done', async () => {
    const { scenario, file, start } = evaluateFixture(BURN);
    const told = (): string[] => {
      const found = hover(scenario, file, start);
      return found ? asPlainText(found).split('\n') : [];
    };
    const first = hover(scenario, file, start);
    expect(told()).toContain('Condenses as it cools: being worked out …');
    expect(first?.awaits).toHaveLength(1);
    await new ViewedWork(new JobRunner(jobs)).bring(URI, first?.awaits ?? []);
    expect(told().find((line) => line.startsWith('Condenses'))).toMatch(/^Condenses as it cools: Na2CO3\(l\) from 1\d\d\d °C, Na2CO3\(cr\) from 8\d\d(\.\d)? °C/); // prettier-ignore
    expect(hover(scenario, file, start)?.awaits).toEqual([]);
  });

  it('tells what the command line tells', async () => {
    const [viewed, read] = [evaluateFixture(BURN), evaluateFixture(BURN)].map(({ scenario }) =>
      scenario.files[0]?.definitions.find(({ kind }) => kind === 'burn')?.tables.filter(({ work }) => work),
    );
    await new ViewedWork(new JobRunner(jobs)).bring(URI, viewed?.flatMap(({ work }) => work ?? []) ?? []);
    expect(viewed?.every(({ work }) => work?.isDone())).toBe(true);
    expect(read?.some(({ work }) => work?.isDone())).toBe(false);
    expect(viewed?.map(({ rows }) => rows)).toEqual(read?.map(({ rows }) => rows));
    expect(viewed?.map(({ rows }) => rows.length > 2)).toEqual([true, true]);
  });
});

describe('the work itself', () => {
  it('is done once for all who look', async () => {
    const { runner, begun } = byHand();
    const viewed = new ViewedWork(runner);
    const [one, two] = [workOf('a'), workOf('a')];
    const both = Promise.all([viewed.bring(URI, [one.work]), viewed.bring(URI, [two.work])]);
    expect(begun).toHaveLength(1);
    begun[0]?.end(7);
    await both;
    expect([one.found(), two.found()]).toEqual([7, 7]);
  });

  it('goes on when it takes too long to wait for, and is there for the next to look', async () => {
    const { runner, begun } = byHand();
    const viewed = new ViewedWork(runner, 5);
    const { work, found } = workOf('a');
    await viewed.bring(URI, [work]);
    expect([found(), begun[0]?.signal?.aborted]).toEqual([null, false]);
    begun[0]?.end(7);
    await viewed.bring(URI, [work]);
    expect([found(), begun.length]).toEqual([7, 1]);
  });

  it('is cancelled when the text moves on; nobody is told of that as a fault', async () => {
    const { runner, begun } = byHand();
    const viewed = new ViewedWork(runner, 60_000);
    const { work, found } = workOf('a');
    const waiting = viewed.bring(URI, [work]);
    viewed.cancel(URI);
    await waiting;
    expect([found(), begun[0]?.signal?.aborted]).toEqual([null, true]);
  });

  it('is tried again after a fault, which is told', async () => {
    const { runner, begun } = byHand();
    const viewed = new ViewedWork(runner);
    const { work, found } = workOf('a');
    const waiting = viewed.bring(URI, [work]);
    begun[0]?.fail(new Error('out of memory'));
    await expect(waiting).rejects.toThrow('out of memory');
    const again = viewed.bring(URI, [work]);
    begun[1]?.end(7);
    await again;
    expect(found()).toBe(7);
  });
});
