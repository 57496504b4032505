// `check` and `evaluate` end to end, from text to what is printed.
import { symlinkSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { checkContract, evaluateContract } from '../../support/json-contract.ts';
import { folderWith, runIn } from '../../support/command-run.ts';

const FUEL = 'blend fuel {\n  30 % mass  fame\n  rest       gas_oil\n}\n';
const EXAMPLES = path.resolve('examples');

/** Units fixed by the language reference, section 5. */
const UNITS: Readonly<Record<string, string>> = {
  'molar-mass': 'g/mol',
  'formation-enthalpy': 'kJ/mol',
  'lower-heating-value': 'MJ/kg',
  'higher-heating-value': 'MJ/kg',
  'volumetric-lower-heating-value': 'MJ/L',
  'volumetric-higher-heating-value': 'MJ/L',
  density: 'kg/m3',
  'heat-capacity': 'kJ/(kg K)',
  'carbon-factor': 'kg/kg',
  'stoichiometric-air': 'kg/kg',
  'water-made': 'kg/kg',
  'water-missing': 'kg/kg',
  'alkali-carbon-ratio': '1',
  'flash-point': 'K',
  enthalpy: 'kJ',
  'gibbs-energy': 'kJ',
  'specific-enthalpy': 'kJ/kg',
  'log10-k': '1',
};

describe('the examples', () => {
  const burning = ['hydrogen-burner.stoke', 'sodium-dispersion.stoke', 'magnesium-in-steam.stoke'];

  test.each(['dunlin.stoke', 'house/suppliers.stoke', 'ostwick-power-station.stoke', ...burning])(
    '%s: the document keeps the contract and its units',
    async (example) => {
      const ran = await runIn(EXAMPLES, ['evaluate', example, '--format', 'json']);
      const document = evaluateContract.parse(JSON.parse(ran.out));
      const figures = document.files.flatMap(({ definitions }) =>
        definitions.flatMap((definition) => definition.figures),
      );
      expect(figures.length).toBeGreaterThan(10);
      for (const { id, unit } of figures)
        if (UNITS[id] !== undefined) expect(`${id} in ${unit}`).toBe(`${id} in ${UNITS[id]}`);
      expect(ran.code).toBe(0);
    },
  );

  test.each(burning)('%s: all that is expected holds', async (example) => {
    const ran = await runIn(EXAMPLES, ['check', example, '--format', 'json', '--strict']);
    const [file] = checkContract.parse(JSON.parse(ran.out)).files;
    expect(file?.expectations.length).toBeGreaterThan(3);
    expect(file?.expectations.map(({ holds }) => holds)).toEqual(file?.expectations.map(() => true));
    expect(ran.code).toBe(0);
  });

  test('dunlin: check prints the same without figures', async () => {
    const words = ['dunlin.stoke', '--format', 'json'];
    const checked = checkContract.parse(JSON.parse((await runIn(EXAMPLES, ['check', ...words])).out));
    const evaluated = evaluateContract.parse(JSON.parse((await runIn(EXAMPLES, ['evaluate', ...words])).out));
    expect(checked.files).toEqual(
      evaluated.files.map(({ path: name, used, findings, expectations }) => ({
        path: name,
        used,
        findings,
        expectations,
      })),
    );
  });

  test('dunlin: the claim about the slurry holds, with the value found', async () => {
    const ran = await runIn(EXAMPLES, ['evaluate', 'dunlin.stoke', '--format', 'json']);
    const [dunlin, suppliers] = evaluateContract.parse(JSON.parse(ran.out)).files;
    expect([dunlin?.path, dunlin?.used, suppliers?.path, suppliers?.used]).toEqual([
      'dunlin.stoke',
      false,
      'house/suppliers.stoke',
      true,
    ]);
    const [claim] = dunlin?.expectations ?? [];
    expect(claim).toMatchObject({ holds: true, unit: 'MJ/kg' });
    expect(claim?.found).toBeCloseTo(35.5, 0);
  });

  test('ids and units of schema 1 stay: what is in this list is never changed, only added to', async () => {
    const ran = await runIn(EXAMPLES, [
      'evaluate',
      'dunlin.stoke',
      'constructs.stoke',
      'receiving-water.stoke',
      'ostwick-power-station.stoke',
      '--format',
      'json',
    ]);
    const promised = new Set<string>();
    for (const { definitions } of evaluateContract.parse(JSON.parse(ran.out)).files) {
      for (const { kind, figures, tables } of definitions) {
        for (const { id, unit } of figures) promised.add(`${kind} figure ${id}: ${unit}`);
        for (const { id, columns } of tables) {
          for (const column of columns) promised.add(`${kind} table ${id}, ${column.id}: ${column.unit ?? 'text'}`);
        }
      }
    }
    await expect(`${[...promised].sort().join('\n')}\n`).toMatchFileSnapshot('snapshots/contract.txt');
  });

  test('dunlin: as a person reads it', async () => {
    const ran = await runIn(EXAMPLES, ['evaluate', 'dunlin.stoke']);
    await expect(ran.out).toMatchFileSnapshot('snapshots/dunlin.txt');
  });

  test('the same command gives the same bytes', async () => {
    const words = ['evaluate', 'dunlin.stoke', '--format', 'json'];
    expect((await runIn(EXAMPLES, words)).out).toBe((await runIn(EXAMPLES, words)).out);
  });
});

test('csv: the figures, one a row', async () => {
  const ran = await runIn(folderWith({ 'a.stoke': FUEL }), ['evaluate', 'a.stoke', '--format', 'csv']);
  const rows = ran.out.trimEnd().split('\r\n');
  expect(rows[0]).toBe('file,definition,kind,id,label,value,unit,uncertainty');
  expect(rows.find((row) => row.includes('lower-heating-value'))).toMatch(
    /^a\.stoke,fuel,blend,lower-heating-value,"?Lower.*,4\d\.\d+,MJ\/kg,/,
  );
});

describe('files', () => {
  test('paths are told as given, lines and columns from 1', async () => {
    const folder = folderWith({ 'in/a.stoke': '\n\nblend fuel {\n  rest  nothing_known\n}\n' });
    const ran = await runIn(folder, ['check', 'in/a.stoke', '--format', 'json']);
    const [file] = checkContract.parse(JSON.parse(ran.out)).files;
    expect(file?.path).toBe('in/a.stoke');
    expect(file?.findings).toMatchObject([{ code: 'name/unknown', line: 4, column: 9, endLine: 4, endColumn: 22 }]);
  });

  test('standard input is called -', async () => {
    const ran = await runIn(folderWith({}), ['evaluate', '-', '--format', 'json'], { input: FUEL });
    expect(evaluateContract.parse(JSON.parse(ran.out)).files[0]?.path).toBe('-');
  });

  test('a byte order mark moves no column, and CRLF no line', async () => {
    const text = '\ufeffblend fuel {\r\n  rest  nothing_known\r\n}\r\n';
    const ran = await runIn(folderWith({ 'a.stoke': text, 'b.stoke': '\ufefflet days = 3 nothing_known\r\n' }), [
      'check',
      'a.stoke',
      'b.stoke',
    ]);
    expect(ran.out).toContain('a.stoke:2:9: error:');
    expect(ran.out).not.toContain('\ufeff');
  });

  test.each([
    ['not UTF-8', new Uint8Array([0x6c, 0x65, 0x74, 0xff, 0xfe]), 'It is not UTF-8 text.'],
    ['gigantic', new Uint8Array(17 * 2 ** 20).fill(0x20), 'It is larger than 16 MB.'],
  ])('a file that is %s is unreadable', async (_, content, words) => {
    const ran = await runIn(folderWith({ 'a.stoke': content }), ['check', 'a.stoke']);
    expect(ran).toMatchObject({ code: 2, problem: `stokehold: cannot read a.stoke: ${words}\n` });
  });

  test('null bytes and other rubbish are findings, never an exception', async () => {
    const ran = await runIn(folderWith({ 'a.stoke': 'let a\0b = \u0001\n}}{{\n' }), ['check', 'a.stoke']);
    expect(ran).toMatchObject({ code: 1, problem: '' });
  });

  test('an empty file has nothing wrong', async () => {
    expect(await runIn(folderWith({ 'a.stoke': '' }), ['evaluate', 'a.stoke'])).toMatchObject({ code: 0, problem: '' });
  });

  test('a file named twice is told once', async () => {
    const ran = await runIn(folderWith({ 'a.stoke': FUEL }), ['check', 'a.stoke', './a.stoke', '--format', 'json']);
    expect(checkContract.parse(JSON.parse(ran.out)).files).toHaveLength(1);
  });
});

describe('used files', () => {
  const found = async (folder: string, words: readonly string[], within = '.'): Promise<string[]> => {
    const ran = await runIn(folder, ['check', ...words, '--format', 'json'], { within });
    return checkContract
      .parse(JSON.parse(ran.out))
      .files.flatMap(({ findings }) => findings.map(({ code, message }) => `${code}: ${message}`));
  };

  test('are found from the file that uses them, and reach on', async () => {
    const folder = folderWith({
      'in/a.stoke': 'use "more/b.stoke"\nblend top {\n  rest  fuel\n}\n',
      'in/more/b.stoke': 'use "../c.stoke"\n',
      'in/c.stoke': FUEL,
    });
    expect(await found(folder, ['in/a.stoke'])).toEqual([]);
  });

  test('are found the same however the using file is named', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "../b.stoke"\n', 'b.stoke': FUEL, 'in/b.stoke': 'rubbish' });
    expect(await found(folder, ['./in/a.stoke'])).toEqual([]);
    expect(await found(folder, [path.join(folder, 'in/a.stoke')])).toEqual([]);
  });

  test('may lie anywhere in the current folder if it holds the named one', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "../b.stoke"\n', 'b.stoke': FUEL });
    expect(await found(folder, ['in/a.stoke'])).toEqual([]);
  });

  test('otherwise in the folder of the named one only', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "../b.stoke"\n', 'b.stoke': FUEL, 'elsewhere/x': '' });
    expect(await found(folder, ['../in/a.stoke'], 'elsewhere')).toEqual([
      expect.stringMatching(/^name\/missing-file: .* lies outside/),
    ]);
    const inside = folderWith({ 'in/a.stoke': 'use "b.stoke"\n', 'in/b.stoke': FUEL, 'elsewhere/x': '' });
    expect(await found(inside, ['../in/a.stoke'], 'elsewhere')).toEqual([]);
  });

  test('a link out of the limit is outside', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "b.stoke"\n', 'b.stoke': FUEL, 'elsewhere/x': '' });
    symlinkSync(path.join(folder, 'b.stoke'), path.join(folder, 'in/b.stoke'));
    expect(await found(folder, ['a.stoke'], 'in')).toEqual([
      expect.stringMatching(/^name\/missing-file: .* lies outside/),
    ]);
  });

  test.each([
    ['that is not there', 'use "b.stoke"\n', 'No file `b.stoke` is found'],
    ['that is a folder', 'use "folder"\n', 'cannot be read. It is not a file.'],
    ['by an absolute path', 'use "/etc/hosts"\n', 'is not a relative path'],
    ['that is not UTF-8', 'use "latin.stoke"\n', 'cannot be read. It is not UTF-8 text.'],
  ])('one %s is an error, and no wrong usage', async (_, text, words) => {
    const folder = folderWith({ 'a.stoke': text, 'folder/x': '', 'latin.stoke': new Uint8Array([0xe9, 0x0a]) });
    const ran = await runIn(folder, ['check', 'a.stoke']);
    expect(ran.out).toContain(words);
    expect(ran.code).toBe(1);
  });

  test.each([
    ['in two spellings by one file', ['a.stoke'], 'use "b.stoke"\nuse "./b.stoke"\n'],
    ['by way of the folder above', ['a.stoke'], 'use "b.stoke"\nuse "../in/b.stoke"\n'],
    ['and named in another spelling', ['a.stoke', './b.stoke'], 'use "b.stoke"\n'],
    ['and named before, from the folder above', ['../in/b.stoke', './a.stoke'], 'use "b.stoke"\n'],
  ])('one used %s is reported once', async (_, names, text) => {
    const folder = folderWith({ 'in/a.stoke': text, 'in/b.stoke': 'let b = nothing_known\n' });
    expect(await found(folder, names, 'in')).toEqual([expect.stringMatching(/^name\/unknown/)]);
  });

  test('one that uses itself in another spelling is a ring', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "../in/a.stoke"\nlet b = 1\n' });
    expect(await found(folder, ['a.stoke'], 'in')).toEqual([expect.stringMatching(/^name\/use-cycle/)]);
  });

  test('one missing in three spellings is one finding', async () => {
    const folder = folderWith({ 'in/a.stoke': 'use "b.stoke"\nuse "./b.stoke"\nuse "../in/b.stoke"\n' });
    expect(await found(folder, ['a.stoke'], 'in')).toEqual([expect.stringMatching(/^name\/missing-file/)]);
  });

  test('a ring of files ends', async () => {
    const folder = folderWith({ 'a.stoke': 'use "b.stoke"\n', 'b.stoke': 'use "a.stoke"\n' });
    expect(await found(folder, ['a.stoke'])).toEqual([expect.stringMatching(/^name\/use-cycle/)]);
  });
});

describe('colour', () => {
  const coloured = async (surroundings: Parameters<typeof runIn>[2], ...words: string[]): Promise<boolean> => {
    const ran = await runIn(folderWith({ 'a.stoke': FUEL }), ['evaluate', 'a.stoke', ...words], surroundings);
    return ran.out.includes('\u001b');
  };

  test('only on a terminal, and only where it is wanted', async () => {
    expect(await coloured({ isTerminal: true })).toBe(true);
    expect(await coloured({ isTerminal: false })).toBe(false);
    expect(await coloured({ isTerminal: true, environment: { NO_COLOR: '1' } })).toBe(false);
    expect(await coloured({ isTerminal: true, environment: { NO_COLOR: '' } })).toBe(true);
    expect(await coloured({ isTerminal: true }, '--no-color')).toBe(false);
    expect(await coloured({ isTerminal: true }, '--format', 'json')).toBe(false);
  });
});
