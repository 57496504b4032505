// The meanings at an offset are those of the whole file's list that hold it or end there, whatever was edited before.
import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { MemoStore } from '../../../server/jobs/memo.ts';
import type { Answer } from '../../../server/scenario/answer.ts';
import { evaluate } from '../../../server/scenario/evaluate.ts';
import { meaningsAt } from '../../../server/scenario/meanings.ts';
import type { PlacedMeaning } from '../../../server/scenario/scenario.ts';

const short = ({ place, meaning }: PlacedMeaning): string =>
  `${place.start}-${place.end} ${meaning.kind} ${'name' in meaning ? meaning.name : ''}`;

const readerOf = (text: string) => (path: string) =>
  path === 'main.stoke' ? { text } : ({ fault: 'missing' } as const);

it('at every offset, before and after edits', () => {
  const written = readFileSync('examples/constructs.stoke', 'utf8');
  const store = new MemoStore<Answer>();
  let found = 0;
  for (const text of [written, `# moved\n${written}`, `let a = 3 kg;expect a > 1 kg;let b = a\n${written}`]) {
    const [file] = evaluate('main.stoke', readerOf(text), { answers: store.run('test') }).files;
    // Another evaluation, so that what is asked for one by one is not what the list has made.
    const all = evaluate('main.stoke', readerOf(text)).files[0]?.meanings ?? [];
    if (!file) throw new Error('no file');
    const differing: number[] = [];
    for (let offset = 0; offset <= text.length; offset++) {
      const wanted = all.filter(({ place }) => place.start <= offset && offset <= place.end).map(short);
      const meanings = meaningsAt(file, offset).map(short);
      if (meanings.join() !== wanted.join()) differing.push(offset);
      found += meanings.length;
    }
    expect(differing).toEqual([]);
  }
  expect(found).toBeGreaterThan(100);
});
