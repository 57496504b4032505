import { expect, test } from 'vitest';
import { folderWith, runIn } from '../../support/command-run.ts';

async function told(...words: string[]): Promise<string> {
  return (await runIn(folderWith({}), ['catalogue', ...words])).out;
}

test('a list, one line a substance', async () => {
  const lines = (await told()).trimEnd().split('\n');
  expect(lines.find((line) => line.startsWith('methanol'))).toMatch(/^methanol +CH3OH\(l\)/);
  expect(lines.at(-1)).toMatch(/^\d+ entries\./);
});

test.each([['sodium'], ['Na'], ['Na(cr)']])('%s is found, and every number has its source', async (word) => {
  const [cards = '', sources = ''] = (await told(word)).split('\nSources\n');
  const numbers = cards.split('\n').filter((line) => /^ {2}(?!also|reacts as|Caution,)/.test(line));
  const listed = sources.split('\n').flatMap((line) => /^ {2}\[(\d+)\] {2}\S/.exec(line)?.[1] ?? []);
  expect(numbers.length).toBeGreaterThan(1);
  for (const line of numbers) expect(listed).toContain(/^ {2}\S.* {2,}\S.* {2,}\[(\d+)\]$/.exec(line)?.[1]);
});

test('hazards stand below the numbers, the caution above them, both once', async () => {
  const text = await told('sodium');
  expect(
    text.match(/Caution, sodium: water makes flammable gas that may take fire; burns skin and eyes\./g),
  ).toHaveLength(1);
  expect(text).toMatch(/Screening only: .* competent person approves the design\./);
  expect(text).toMatch(/^ {2}Carried as {2,}UN 1391 ALKALI METAL DISPERSION, class 4\.3, .* {2}\[\d+\]$/m);
  expect(text).toMatch(/^ {2}Never with {2,}water,/m);
  expect(text).toContain('reacts as alkali metal');
  expect(text.toLowerCase()).not.toMatch(/\bsafe\b/);
});

test('what all phases share is told once', async () => {
  expect((await told('sodium')).match(/Melting point/g)).toHaveLength(1);
});

test('a phase asked for is the only one told', async () => {
  expect((await told('water')).match(/^water/gm)?.length).toBeGreaterThan(1);
  expect((await told('H2O(g)')).match(/^water/gm)).toHaveLength(1);
});

test('part of a name finds all that have it', async () => {
  const text = await told('oil');
  expect(text).toContain('gas_oil');
});

test('what is not there is answered with what is near', async () => {
  const ran = await runIn(folderWith({}), ['catalogue', 'metanol']);
  expect(ran).toMatchObject({ code: 1, out: '' });
  expect(ran.problem).toContain('Did you mean `methanol`');
});
