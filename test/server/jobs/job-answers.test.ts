// What jobs answer for open documents: asked, waited for, asked again; kept while in use, cancelled when nobody asks any
// more. On this thread, where the order of things is certain.
import { beforeEach, describe, expect, it } from 'vitest';
import { JobAnswers, type JobAnswersRun } from '../../../server/jobs/job-answers.ts';
import { JobRunner } from '../../../server/jobs/runner.ts';

let ran: string[];
const table = {
  doubled: (input: number): number | null => {
    ran.push(`doubled ${input}`);
    return 2 * input;
  },
  failing: (input: string): string | null => {
    ran.push(`failing ${input}`);
    throw new Error(input);
  },
};
let answers: JobAnswers;
const ask = (run: JobAnswersRun, input: number): number | undefined =>
  run.ask(table.doubled, String(input), input).kept?.value;

beforeEach(() => {
  ran = [];
  answers = new JobAnswers(new JobRunner(table));
});

describe('asking', () => {
  it('gives nothing at first, and the answer once there is news', async () => {
    const run = answers.run('a');
    expect(ask(run, 2)).toBeUndefined();
    expect(ran).toEqual([]);
    const { id } = run.ask(table.doubled, '2', 2);
    expect([run.isDone(id), run.keyNow(id)]).toEqual([false, null]);
    await run.news();
    expect(run.isDone(id)).toBe(true);
    expect(ask(run, 2)).toBe(4);
    expect(run.keyNow(id)).toBe(run.ask(table.doubled, '2', 2).kept?.key);
    run.finish();
    expect(ran).toEqual(['doubled 2']);
  });

  it('is news for each that ends, none of it lost', async () => {
    const run = answers.run('a');
    const inputs = [1, 2, 3];
    for (const input of inputs) ask(run, input);
    while (inputs.some((input) => ask(run, input) === undefined)) await run.news();
    run.finish();
    expect(ran).toEqual(['doubled 1', 'doubled 2', 'doubled 3']);
  });

  it('throws what the job failed with, to all who ask, and the next run tries again', async () => {
    const first = answers.run('a');
    first.ask(table.failing, 'x', 'broken');
    ask(first, 1);
    while (ask(first, 1) === undefined) await first.news();
    for (let time = 0; time < 2; time++) expect(() => first.ask(table.failing, 'x', 'broken')).toThrow('broken');
    first.finish();
    const second = answers.run('a');
    const { id, kept } = second.ask(table.failing, 'x', 'broken');
    expect(kept).toBeUndefined();
    while (!second.isDone(id)) await second.news();
    second.abandon();
    expect(ran).toEqual(['failing broken', 'doubled 1', 'failing broken']);
  });

  it('refuses a function that is in no table', () => {
    const other = (input: number): number => input;
    expect(() => answers.run('a').ask(other, '', 1)).toThrow('not in the table of jobs');
  });
});

describe('from one run to the next', () => {
  const answered = async (user: string, ...inputs: number[]): Promise<void> => {
    const run = answers.run(user);
    for (const input of inputs) while (ask(run, input) === undefined) await run.news();
    run.finish();
  };

  it('an answer is kept while it is used', async () => {
    await answered('a', 1, 2);
    const second = answers.run('a');
    expect([ask(second, 1), ran]).toEqual([2, ['doubled 1', 'doubled 2']]);
    second.finish();
    expect(answers.size).toBe(1);
    expect(ask(answers.run('a'), 2)).toBeUndefined();
  });

  it('asking for its key is using it', async () => {
    await answered('a', 1);
    const second = answers.run('a');
    expect(second.keyNow('\ndoubled\n1')).not.toBeNull();
    second.finish();
    expect(answers.size).toBe(1);
  });

  it('an answer is shared, and goes with the last document that uses it', async () => {
    await answered('a', 1);
    await answered('b', 1);
    expect([answers.size, ran]).toEqual([1, ['doubled 1']]);
    answers.drop('a');
    expect(answers.size).toBe(1);
    answers.drop('b');
    expect(answers.size).toBe(0);
  });

  it('a job begun by a run that was given up goes on, and answers the next', async () => {
    const first = answers.run('a');
    ask(first, 1);
    const news = first.news();
    first.abandon();
    const second = answers.run('a');
    expect(ask(second, 1)).toBeUndefined();
    await Promise.race([news, second.news()]);
    while (ask(second, 1) === undefined) await second.news();
    second.finish();
    expect(ran).toEqual(['doubled 1']);
  });

  it('a job that the next run does not ask for is cancelled', async () => {
    const first = answers.run('a');
    ask(first, 1);
    void first.news();
    first.abandon();
    const second = answers.run('a');
    ask(second, 2);
    while (ask(second, 2) === undefined) await second.news();
    second.finish();
    expect(ran).toEqual(['doubled 2']);
  });

  it('a job is cancelled when its document is closed, unless another wants it, too', async () => {
    const [first, second] = [answers.run('a'), answers.run('b')];
    for (const input of [1, 2]) ask(first, input);
    ask(second, 2);
    const told = first.news();
    void second.news();
    answers.drop('a');
    await told;
    while (ask(second, 2) === undefined) await second.news();
    expect(ran).toEqual(['doubled 2']);
  });
});
