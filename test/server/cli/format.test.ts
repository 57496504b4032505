import { readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { folderWith, runIn } from '../../support/command-run.ts';

const SHAPELESS = 'blend fuel {\n30 % mass ethanol\n  rest    methanol\n}\n';
const SHAPED = 'blend fuel {\n  30 % mass  ethanol\n  rest       methanol\n}\n';

test('in place, and a file in shape is left alone', async () => {
  const folder = folderWith({ 'a.stoke': SHAPELESS, 'b.stoke': SHAPED });
  const before = statSync(path.join(folder, 'b.stoke')).mtimeMs;
  const ran = await runIn(folder, ['format', 'a.stoke', 'b.stoke']);
  expect(ran).toEqual({ code: 0, problem: '', out: 'formatted a.stoke\n1 file formatted, 1 file already in shape\n' });
  expect(readFileSync(path.join(folder, 'a.stoke'), 'utf8')).toBe(SHAPED);
  expect(statSync(path.join(folder, 'b.stoke')).mtimeMs).toBe(before);
});

test('a byte order mark and the line ends stay', async () => {
  const folder = folderWith({ 'a.stoke': `\ufeff${SHAPELESS.replaceAll('\n', '\r\n')}` });
  await runIn(folder, ['format', 'a.stoke']);
  expect(readFileSync(path.join(folder, 'a.stoke'), 'utf8')).toBe(`\ufeff${SHAPED.replaceAll('\n', '\r\n')}`);
});

test('--check writes nothing', async () => {
  const folder = folderWith({ 'a.stoke': SHAPELESS });
  expect(await runIn(folder, ['format', '--check', 'a.stoke'])).toMatchObject({
    code: 1,
    out: 'a.stoke would change\n',
  });
  expect(readFileSync(path.join(folder, 'a.stoke'), 'utf8')).toBe(SHAPELESS);
});

test('standard input goes to standard output, and nothing else does', async () => {
  expect(await runIn(folderWith({}), ['format', '-'], { input: SHAPELESS })).toEqual({
    code: 0,
    problem: '',
    out: SHAPED,
  });
  expect(await runIn(folderWith({}), ['format', '-'], { input: SHAPED })).toEqual({
    code: 0,
    problem: '',
    out: SHAPED,
  });
});

test('a broken text is given back whole', async () => {
  const broken = 'blend fuel {\n  30 % mass (\nlet = "\n';
  const ran = await runIn(folderWith({}), ['format', '-'], { input: broken });
  expect(ran.out.replace(/\s+/g, '')).toBe(broken.replace(/\s+/g, ''));
});

test('the shipped examples are in shape', async () => {
  const ran = await runIn(path.resolve('examples'), ['format', '--check', 'dunlin.stoke', 'house/suppliers.stoke']);
  expect(ran).toMatchObject({ code: 0, out: '2 files already in shape\n' });
});
