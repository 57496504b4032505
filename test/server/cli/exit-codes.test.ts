// The table of exit codes: scripts rely on it.
import { describe, expect, test } from 'vitest';
import { folderWith, runIn } from '../../support/command-run.ts';

const FILES = {
  'good.stoke':
    'blend fuel {\n  30 % mass  ethanol\n  rest       methanol\n}\nexpect lower heating value of fuel > 1 MJ/kg\n',
  'wrong.stoke': 'blend fuel {\n  30 % mass  ethanolx\n  rest       methanol\n}\n',
  'failed.stoke':
    'blend fuel {\n  30 % mass  ethanol\n  rest       methanol\n}\nexpect lower heating value of fuel > 99 MJ/kg\n',
  'noted.stoke': 'fleet ferries {\n  ships: 12\n}\nexpect sodium of ferries > 8 t\n',
  'shapeless.stoke': 'blend   fuel {\n30 % mass ethanol\nrest methanol\n}\n',
};

const TABLE: readonly (readonly [number, string])[] = [
  [0, 'check good.stoke'],
  [0, 'evaluate good.stoke'],
  [0, 'evaluate good.stoke --format json'],
  [0, 'evaluate good.stoke -f csv'],
  [0, 'check noted.stoke'],
  [0, 'check noted.stoke --strict'],
  [1, 'check wrong.stoke'],
  [1, 'check failed.stoke'],
  [1, 'evaluate failed.stoke --format json'],
  [1, 'check good.stoke wrong.stoke'],
  [2, 'check missing.stoke'],
  [2, 'check missing.stoke wrong.stoke'],
  [2, 'check .'],
  [2, ''],
  [2, 'check'],
  [2, 'chek good.stoke'],
  [2, 'check good.stoke --loud'],
  [2, 'check good.stoke --format csv'],
  [2, 'evaluate good.stoke --format html'],
  [2, 'evaluate good.stoke --format sarif'],
  [2, 'evaluate good.stoke --format'],
  [0, '--version'],
  [0, '--help'],
  [0, 'help evaluate'],
  [0, 'format good.stoke --check'],
  [1, 'format shapeless.stoke --check'],
  [0, 'format shapeless.stoke'],
  [2, 'format missing.stoke'],
  [0, 'catalogue'],
  [0, 'catalogue sodium'],
  [1, 'catalogue unobtainium'],
  [0, 'serve --stdio'],
  [2, 'serve --port 1'],
];

test.each(TABLE)('%d: stokehold %s', async (code, words) => {
  const ran = await runIn(
    folderWith(FILES),
    words.split(' ').filter((word) => word !== ''),
  );
  expect(ran.code, ran.problem).toBe(code);
});

describe('with an unreadable file among others', () => {
  test('the rest is still printed, and the file named on standard error', async () => {
    const ran = await runIn(folderWith(FILES), ['check', 'missing.stoke', 'wrong.stoke']);
    expect(ran.problem).toBe('stokehold: cannot read missing.stoke: There is no such file.\n');
    expect(ran.out).toContain('wrong.stoke:2:14: error:');
  });

  test('a document is still a document', async () => {
    const ran = await runIn(folderWith(FILES), ['check', 'missing.stoke', '--format', 'json']);
    expect(JSON.parse(ran.out)).toEqual({ schema: 1, files: [] });
  });
});

test('wrong usage says how it is used, and prints no figures', async () => {
  const ran = await runIn(folderWith(FILES), ['evaluate', 'good.stoke', '--format', 'html']);
  expect(ran.out).toBe('');
  expect(ran.problem).toContain("'html' is not written yet by this version; take text, json, csv");
});
