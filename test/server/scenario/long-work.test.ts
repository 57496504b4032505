// Long work in an evaluation: what is said before it is done, what is asked again when it is, and that it comes to the same
// as work done on the spot.
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { JobAnswers, type JobAnswersRun } from '../../../server/jobs/job-answers.ts';
import { MemoStore } from '../../../server/jobs/memo.ts';
import { JobRunner } from '../../../server/jobs/runner.ts';
import type { Answer } from '../../../server/scenario/answer.ts';
import { evaluate, evaluateInSteps } from '../../../server/scenario/evaluate.ts';
import type * as registry from '../../../server/scenario/kinds/registry.ts';
import type { EvaluatedScenario } from '../../../server/scenario/scenario.ts';
import { figureOf, valueOf } from '../../support/facts.ts';
import { sumUpTo } from '../../support/job-table.ts';
import { compareOf } from '../../support/long-work-kind.ts';

let worked: number[];
const counted = vi.hoisted<{ work: typeof sumUpTo }>(() => ({ work: () => null }));
vi.mock('../../../server/scenario/kinds/registry.ts', async (original) => {
  const real = await original<typeof registry>();
  return { ...real, kindOf: (word: string) => (word === 'compare' ? compareOf(counted.work) : real.kindOf(word)) };
});

const MAIN = '/main.stoke';
const TEXT = `compare a {
  of: 4
}
let twice = 2 * total of a
let more = twice + 1 m
let apart = 3 kg
compare b {
  of: 100
}
let both = twice + total of b
expect both = 5070
`;

/** Evaluations of one document, one after another, with long work done elsewhere. */
class Editing {
  readonly #answers = new MemoStore<Answer>();
  readonly #jobs = new JobAnswers(new JobRunner({ sumUpTo: counted.work }));

  async evaluate(text: string, wait?: (soFar: EvaluatedScenario) => void): Promise<EvaluatedScenario> {
    const answers = this.#answers.run('main');
    const work: JobAnswersRun = this.#jobs.run('main');
    const steps = evaluateInSteps(MAIN, () => ({ text }), { answers }, work);
    for (;;) {
      const step = steps.next();
      if (step.done) {
        answers.finish();
        work.finish();
        return step.value;
      }
      if (!step.value.waits) continue;
      wait?.(step.value.soFar());
      await work.news();
    }
  }
}

const codes = (scenario: EvaluatedScenario): string[] =>
  scenario.files.flatMap(({ facts }) => facts.map(({ fact }) => fact.code));

let editing: Editing;
beforeEach(() => {
  worked = [];
  counted.work = (last, shouldStop) => {
    worked.push(last);
    return sumUpTo(last, shouldStop);
  };
  editing = new Editing();
});

describe('long work', () => {
  it('is done on the spot where nobody else does it', () => {
    const scenario = evaluate(MAIN, () => ({ text: TEXT }));
    expect(figureOf(scenario, 'a', 'total')).toBe(10);
    expect([worked, codes(scenario)]).toEqual([[4, 100], ['unit/mismatch']]); // prettier-ignore
  });

  it('done elsewhere comes to the same', async () => {
    const there = evaluate(MAIN, () => ({ text: TEXT }));
    const elsewhere = await editing.evaluate(TEXT);
    expect(JSON.stringify(elsewhere)).toBe(JSON.stringify(there));
    expect(elsewhere.files[0]?.facts).toEqual(there.files[0]?.facts);
    expect(valueOf(elsewhere, 'both')).toBe(5070);
  });

  it('leaves all else answered meanwhile, and what rests on it silent', async () => {
    const waited: EvaluatedScenario[] = [];
    await editing.evaluate(`${TEXT}let wrong = nothing_known + total of a\n`, (soFar) => waited.push(soFar));
    const [first] = waited;
    if (!first) throw new Error('it did not wait');
    expect(codes(first)).toEqual(['name/unknown']);
    expect([valueOf(first, 'apart'), valueOf(first, 'twice'), valueOf(first, 'both')]).toEqual([3, null, null]);
    expect(first.files[0]?.expectations[0]?.holds).toBeNull();
    expect(figureOf(first, 'a', 'total')).toBeUndefined();
  });

  it('is asked again only by those it was for, once each', async () => {
    await editing.evaluate(TEXT);
    expect(worked).toEqual([4, 100]);
  });

  it('is not done again for an edit elsewhere, or for one that leaves its input alone', async () => {
    await editing.evaluate(TEXT);
    let waits = 0;
    const edits = [TEXT.replace('3 kg', '4 kg'), TEXT.replace('of: 4', 'of:  4'), `# before\n${TEXT}`, TEXT];
    for (const text of edits) {
      const scenario = await editing.evaluate(text, () => waits++);
      expect(JSON.stringify(scenario)).toBe(JSON.stringify(evaluate(MAIN, () => ({ text }))));
    }
    expect(waits).toBe(0);
  });

  it('is done anew for another input, alone', async () => {
    await editing.evaluate(TEXT);
    worked = [];
    const scenario = await editing.evaluate(TEXT.replace('of: 4', 'of: 5'));
    expect(worked).toEqual([5]);
    expect(figureOf(scenario, 'a', 'total')).toBe(15);
    expect(valueOf(scenario, 'both')).toBe(5080);
  });

  it('that fails is a fault told at its statement, and tried again the next time', async () => {
    const text = TEXT.replace('of: 4', 'of: 13');
    const scenario = await editing.evaluate(text);
    expect(codes(scenario)).toEqual(['program/failed']);
    expect(scenario.files[0]?.facts[0]?.fact).toMatchObject({ message: 'thirteen is not summed' });
    expect(codes(evaluate(MAIN, () => ({ text })))).toEqual(['program/failed']);
    worked = [];
    expect(codes(await editing.evaluate(text))).toEqual(['program/failed']);
    expect(worked).toEqual([13]);
  });

  it('is not waited for while a used file is still to be fetched', async () => {
    const read = (path: string): { text: string } | 'wanted' =>
      path === MAIN ? { text: `use "other.stoke"\n${TEXT}` } : 'wanted';
    const run = new JobAnswers(new JobRunner({ sumUpTo: counted.work })).run('main');
    const steps = evaluateInSteps(MAIN, read, {}, run);
    for (;;) {
      const step = steps.next();
      if (!step.done) expect(step.value.waits).toBe(false);
      else {
        expect(step.value.wanted).toEqual(['/other.stoke']);
        break;
      }
    }
    run.finish();
    await Promise.resolve();
    expect(worked).toEqual([]);
  });
});
