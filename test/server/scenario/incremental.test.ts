// An evaluation that takes what it can from the one before gives the very answers of a fresh one, after any edit; and
// what an edit asks again is counted: a comment nothing, a number only what rests on it, a new name those that speak of it.
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { isDeepStrictEqual } from 'node:util';
import fc from 'fast-check';
import { describe, expect, it, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { MemoStore } from '../../../server/jobs/memo.ts';
import type { Answer } from '../../../server/scenario/answer.ts';
import { evaluate, evaluateInSteps } from '../../../server/scenario/evaluate.ts';
import type { AnswerStore } from '../../../server/scenario/questions.ts';
import type { EvaluatedScenario } from '../../../server/scenario/scenario.ts';
import { carryOver, significantText } from '../../../server/scenario/significant-text.ts';

type Texts = ReadonlyMap<string, string>;
const MAIN = 'main.stoke';

/** Evaluates one version after another and counts what each asks anew. */
class Editing {
  readonly store = new MemoStore<Answer>();
  asked: string[] = [];
  #last: EvaluatedScenario | null = null;

  next(texts: Texts): EvaluatedScenario {
    const run = this.store.run('test');
    this.asked = [];
    const answers: AnswerStore = {
      recall: (question, keyNow) => run.recall(question, keyNow),
      keep: (question, lookedUp, answer) => {
        this.asked.push(question.split(/[ :{]/).slice(0, 2).join(' '));
        return run.keep(question, lookedUp, answer);
      },
    };
    const trees = new Map((this.#last?.files ?? []).map((file) => [file.path, file.tree]));
    const scenario = evaluate(MAIN, readerOf(texts), { trees, answers });
    run.finish();
    this.#last = scenario;
    return scenario;
  }

  /** The next version of the one file, compared with a fresh evaluation. */
  type(text: string): void {
    const texts = new Map([[MAIN, text]]);
    expectSame(this.next(texts), evaluate(MAIN, readerOf(texts)));
  }
}

function readerOf(texts: Texts) {
  return (file: string) => {
    const text = texts.get(file);
    return text === undefined ? ({ fault: 'missing' } as const) : { text };
  };
}

function expectSame(incremental: EvaluatedScenario, fresh: EvaluatedScenario): void {
  if (!isDeepStrictEqual(incremental, fresh)) expect(incremental).toStrictEqual(fresh);
  // What is put into words once must be the words for the text as it is now.
  expect(findingsOf(incremental)).toEqual(findingsOf(fresh));
}

const TEXT = `# A small house.
let share = 30 %
let other = 2 kg * 3

## Thick.
blend slurry {
  (share) mass sodium
  rest    methanol        # the rest
}
blend thin {
  50 % mass slurry
  rest      water
}
blend apart {
  50 % mass methanol
  rest      water
}
reaction carbonate {
  2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)
}
engine main { cycle: diesel }
expect density of thin > 1 kg/m3
expect other = 6 kg
expect unheard_of = 6 kg
`;

describe('what an edit asks again', () => {
  const edits: [string, string, string, string[]][] = [
    ['nothing', '', '', []],
    ['a comment', '# the rest', '# what is left, and much more of it', []],
    [
      'a new comment inside',
      'rest      water\n}\nblend apart',
      'rest      water # see above\n\n # so\n}\nblend apart',
      [],
    ],
    ['a doc comment', '## Thick.', '## Thick, and\n## brown.', []],
    ['a title above all', '# A small house.', '# A small house.\n\nscenario "House"\n', []],
    ['blank space at a line’s end and start', '  (share) mass sodium\n', '(share) mass sodium   \n', []],
    ['a number that others rest on', '30 %', '31 %', ['let share', 'blend slurry', 'blend thin', 'expect density']],
    ['a number that nothing rests on', '50 % mass methanol', '40 % mass methanol', ['blend apart']],
    ['a number of a claim', '> 1 kg/m3', '> 2 kg/m3', ['expect density']],
    ['a kind that is not evaluated', 'cycle: diesel', 'cycle: otto', ['engine main']],
    // The claim of an unheard-of name went through all names for one that may be meant.
    ['a name that one claim mentions', 'other', 'another', ['let another', 'expect another', 'expect unheard_of']],
    ['a name nobody mentions', 'blend apart', 'blend aside', ['blend aside', 'expect unheard_of']],
    ['a new definition', 'engine main', 'blend new { rest water }\nengine main', ['blend new', 'expect unheard_of']],
    [
      'a definition less',
      'let share = 30 %\n',
      '',
      ['blend slurry', 'blend thin', 'expect density', 'expect unheard_of'],
    ],
  ];

  test.each(edits)('%s', (_, from, to, expected) => {
    const editing = new Editing();
    editing.type(TEXT);
    const { size } = editing.store;
    editing.type(TEXT.replaceAll(from, to));
    expect([...editing.asked].sort()).toEqual([...expected].sort());
    editing.type(TEXT);
    expect(editing.store.size).toBe(size);
  });

  it('counts a first evaluation in full', () => {
    const editing = new Editing();
    editing.type(TEXT);
    expect(editing.asked).toHaveLength(10);
  });

  it('a used file is kept too, and tells what it offers by name', () => {
    const texts = new Map([
      [MAIN, 'use "house.stoke"\nblend fuel { 20 % mass syrup; rest water }\nlet far = 3 kg\n'],
      ['house.stoke', 'blend syrup {\n  10 % mass sodium # dear\n  rest      methanol\n}\n'],
    ]);
    const editing = new Editing();
    editing.next(texts);
    texts.set('house.stoke', '# Moved down.\nblend syrup {\n  10 % mass sodium\n  rest      methanol\n}\n');
    expectSame(editing.next(texts), evaluate(MAIN, readerOf(texts)));
    expect(editing.asked).toEqual([]);
    texts.set('house.stoke', 'blend syrup {\n  11 % mass sodium\n  rest      methanol\n}\n');
    expectSame(editing.next(texts), evaluate(MAIN, readerOf(texts)));
    expect(editing.asked).toEqual(['blend syrup', 'blend fuel']);
  });
});

describe('an evaluation under way', () => {
  it('tells at once what is known by heart, and nothing that rests on an edit', () => {
    const store = new MemoStore<Answer>();
    const finish = (text: string): EvaluatedScenario => {
      const run = store.run('test');
      const scenario = evaluate(MAIN, () => ({ text }), { answers: run });
      run.finish();
      return scenario;
    };
    finish(TEXT);
    const edited = TEXT.replace('30 %', '31 %').replace('other =', 'other = nothing_known *');
    const steps = evaluateInSteps(MAIN, () => ({ text: edited }), { answers: store.run('test') });
    const step = steps.next();
    if (step.done) throw new Error('one statement cannot be all');
    const soFar = step.value.soFar();
    expect(soFar.files[0]?.definitions.map(({ name }) => name)).toEqual(['apart', 'carbonate', 'main']);
    expect(soFar.files[0]?.tree.text).toBe(edited);
  });
});

describe('edits at random', () => {
  const folder = path.resolve('examples');
  const examples = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.stoke'));
  const textOf = new Map(examples.map((name) => [name, readFileSync(path.join(folder, name), 'utf8')]));

  const snippets = [
    '#', '# a remark\n', '\n', ' ', '\r\n', '"', "'", '{', '}', '(', ')', ';', '1', '50 %', ' kg', 'water', 'rest ', '##\n', '+', '->', ':',
    'let water = 3\n', 'blend slurry {\n', 'expect 1 kg > 2 m\n', 'use "main.stoke"\n', '± 2 %', 'sodium', '\u00a0', ',',
  ]; // prettier-ignore
  const edit = fc.record({
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    removed: fc.oneof(fc.constant(0), fc.nat(3), fc.nat(80)),
    snippet: fc.oneof(fc.constant(''), fc.constantFrom(...snippets)),
    moved: fc.boolean(),
  });
  const session = fc.record({
    name: fc.constantFrom(...examples),
    edits: fc.array(edit, { minLength: 3, maxLength: 12 }),
  });

  it('leave nothing behind that a fresh evaluation would not say', () => {
    const holds = fc.property(session, ({ name, edits }) => {
      const editing = new Editing();
      let text = textOf.get(name) ?? '';
      editing.type(text);
      for (const { at, removed, snippet, moved } of edits) {
        const start = Math.floor(at * text.length);
        const cut = text.slice(start, start + removed);
        const rest = text.slice(0, start) + snippet + text.slice(start + removed);
        text = moved ? rest + cut : rest;
        editing.type(text);
      }
    });
    fc.assert(holds, { numRuns: 60 });
  }, 120_000);
});

describe('significant text', () => {
  it('leaves out comments, blank lines and blank space around lines', () => {
    const text = 'blend a {  # one\n\n  3 %  mass x\t\r\n# two\n  rest "# no comment" # three\n}';
    expect(significantText(text).text).toBe('blend a {\n3 %  mass x\nrest "# no comment"\n}');
  });

  it('knows an ion before a comment from one before a space', () => {
    expect(significantText('2 Na+#').text).not.toBe(significantText('2 Na+ #').text);
  });

  it('carries an offset over to the same word', () => {
    const [from, to] = ['let a = 3 kg', '# so\nlet a = 3 kg # it is'];
    const [source, target] = [significantText(from), significantText(to)];
    for (let offset = 0; offset <= from.length; offset++) expect(carryOver(offset, source, target)).toBe(offset + 5);
    for (let offset = 5; offset <= 17; offset++) expect(carryOver(offset, target, source)).toBe(offset - 5);
  });
});
