// A profile of logged power in a duty: its file is found by the rules of `use`, its rows make a leg, what is wrong is said at
// the path, and a changed file asks its duty and what rests on that, and nothing else.
import { describe, expect, test } from 'vitest';
import { readProfile } from '../../../server/core/duty/profile.ts';
import { MemoStore } from '../../../server/jobs/memo.ts';
import type { Answer } from '../../../server/scenario/answer.ts';
import { evaluate, evaluateInSteps, type ReadAnswer } from '../../../server/scenario/evaluate.ts';
import type { WorkElsewhere } from '../../../server/scenario/long-work.ts';
import type { EvaluatedScenario } from '../../../server/scenario/scenario.ts';
import { figureOf } from '../../support/facts.ts';

const ENGINE = `engine main {
  maximum continuous rating: 2 MW
  fuel: gas_oil
  specific fuel consumption: 231 g/kWh at 10 %, 209 g/kWh at 50 %, 205 g/kWh at 100 %
  idle consumption: 40 kg/h
}
`;
const profiled = (path: string, more = ''): string =>
  `${ENGINE}duty run {\n  profile: "${path}" on main\n${more}}\nlet work = energy of run\nlet other = 2 h\n`;
const CSV = 'time (min), power (kW)\n0, 600\n30, 1200\n60, 0\n90, 0\n';

function reading(
  files: Readonly<Record<string, string>>,
  unread: readonly string[] = [],
): (path: string) => ReadAnswer {
  return (path) => {
    const text = files[path];
    if (unread.includes(path)) return 'wanted';
    return text === undefined ? { fault: 'missing' } : { text };
  };
}

const codesOf = ({ files }: EvaluatedScenario): string[] =>
  files.flatMap(({ facts }) => facts.map(({ fact }) => fact.code).filter((code) => !code.startsWith('hazard/')));

describe('the rows', () => {
  test('are a leg beside others: time, energy and what runs meanwhile', () => {
    const text = profiled('x.csv', '  wait: 1 h at 50 % on main\n  hotel load: 100 kW on main\n');
    const scenario = evaluate('a.stoke', reading({ 'a.stoke': text, 'x.csv': CSV }));
    expect(codesOf(scenario)).toEqual([]);
    expect(figureOf(scenario, 'run', 'hours')).toBeCloseTo(1.5 + 1, 9);
    // 600 kW and 1200 kW for half an hour each, half an hour at nothing, an hour at 1 MW; 100 kW all the while.
    const workJ = scenario.files[0]?.values.find(({ name }) => name === 'work')?.quantity?.value;
    expect((workJ ?? NaN) / 3.6e6).toBeCloseTo(300 + 600 + 1000 + 250, 6);
  });

  test('above the rating are told as any leg is', () => {
    const csv = CSV.replace('1200', '2100');
    expect(codesOf(evaluate('a.stoke', reading({ 'a.stoke': profiled('x.csv'), 'x.csv': csv })))).toEqual([
      'engine/overload',
    ]);
  });
});

describe('the file', () => {
  test.each([
    ['x.csv', 'a.stoke', 'x.csv'],
    ['logs/x.csv', 'in/a.stoke', 'in/logs/x.csv'],
    ['../x.csv', 'in/a.stoke', 'x.csv'],
  ])('%s in %s is %s', (path, root, address) => {
    expect(codesOf(evaluate(root, reading({ [root]: profiled(path), [address]: CSV })))).toEqual([]);
  });

  test('belongs to the folder of the file that names it, and not of the one that is asked about', () => {
    const files = { 'a.stoke': 'use "in/b.stoke"\n', 'in/b.stoke': profiled('x.csv'), 'in/x.csv': CSV };
    expect(codesOf(evaluate('a.stoke', reading(files)))).toEqual([]);
  });

  test.each(['none.csv', '/etc/x.csv', 'file:///x.csv', ''])('%j is not there, and nothing else is said', (path) => {
    const scenario = evaluate('a.stoke', reading({ 'a.stoke': profiled(path) }));
    expect(codesOf(scenario)).toEqual(['name/missing-file']);
  });

  test('that is not there hides no name that is not there', () => {
    const text = `${profiled('none.csv')}let lost = nothing_like_this\n`;
    expect(codesOf(evaluate('a.stoke', reading({ 'a.stoke': text }))).sort()).toEqual([
      'name/missing-file',
      'name/unknown',
    ]);
  });

  test('that is still to be fetched is wanted', () => {
    const scenario = evaluate('a.stoke', reading({ 'a.stoke': profiled('x.csv') }, ['x.csv']));
    expect(scenario.wanted).toEqual(['x.csv']);
    expect(codesOf(scenario)).toEqual([]);
  });

  test('that cannot be read names its row at the path', () => {
    const text = profiled('x.csv');
    const scenario = evaluate('a.stoke', reading({ 'a.stoke': text, 'x.csv': CSV.replace('1200', '') }));
    const [told] = scenario.files[0]?.facts ?? [];
    expect(told?.fact).toEqual({ code: 'duty/profile', path: 'x.csv', why: 'gap', row: 3, text: '30,' });
    expect(text.slice(told?.place.start, told?.place.end)).toBe('"x.csv"');
    expect(scenario.files[0]?.facts).toHaveLength(1);
  });

  test.each(['"x.csv"', 'on main', '"x.csv" on', '3 kW on main', '"x.csv" on main on main'])(
    '`profile: %s` is told and makes no leg',
    (value) => {
      const text = `${ENGINE}duty run {\n  profile: ${value}\n}\n`;
      const scenario = evaluate('a.stoke', reading({ 'a.stoke': text, 'x.csv': CSV }));
      expect(codesOf(scenario)).toHaveLength(1);
      expect(figureOf(scenario, 'run', 'hours')).toBeUndefined();
    },
  );
});

describe('a changed file', () => {
  test('asks the duty and what rests on it, and nothing else; an unchanged one asks nothing', () => {
    const store = new MemoStore<Answer>();
    const next = (csv: string): { asked: string[]; scenario: EvaluatedScenario } => {
      const asked: string[] = [];
      const run = store.run('test');
      const scenario = evaluate('a.stoke', reading({ 'a.stoke': profiled('x.csv'), 'x.csv': csv }), {
        answers: {
          recall: (question, keyNow) => run.recall(question, keyNow),
          keep: (question, lookedUp, answer) => {
            asked.push(
              question
                .split(/[ :{=]/)
                .slice(0, 2)
                .join(' '),
            );
            return run.keep(question, lookedUp, answer);
          },
        },
      });
      run.finish();
      return { asked, scenario };
    };
    expect(next(CSV).asked).toEqual(['engine main', 'duty run', 'let work', 'let other']);
    expect(next(`${CSV}`).asked).toEqual([]);
    const changed = next(CSV.replace('600', '800'));
    expect(changed.asked).toEqual(['duty run', 'let work']);
    const work = changed.scenario.files[0]?.values.find(({ name }) => name === 'work')?.quantity?.value;
    expect((work ?? NaN) / 3.6e6).toBeCloseTo(400 + 600, 6);
  });

  test('is read elsewhere in an editor: until then the duty is silent', () => {
    const asked: unknown[] = [];
    let isDone = false;
    const elsewhere: WorkElsewhere = {
      ask: (work, _key, input) => {
        asked.push(work);
        return { id: '\nprofile', kept: isDone ? { key: 1, value: work(input, () => false) as never } : undefined };
      },
      keyNow: () => (isDone ? 1 : null),
      isDone: () => isDone,
    };
    const steps = evaluateInSteps('a.stoke', reading({ 'a.stoke': profiled('x.csv'), 'x.csv': CSV }), {}, elsewhere);
    for (;;) {
      const step = steps.next();
      if (step.done) {
        expect(figureOf(step.value, 'run', 'hours')).toBeCloseTo(1.5, 9);
        break;
      }
      if (!step.value.waits) continue;
      expect(codesOf(step.value.soFar())).toEqual([]);
      isDone = true;
    }
    expect(asked).toEqual([readProfile, readProfile]);
  });
});
