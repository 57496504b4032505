// How much of an answer is printed, and how wide: a burn has some twenty figures and a dozen tables.
import { describe, expect, test } from 'vitest';
import { folderWith, runIn } from '../../support/command-run.ts';

const FURNACE = `blend slurry {
  30 % mass sodium
  rest methanol
}
burn furnace {
  fuel: slurry
  oxidant: air
  lambda: 1.3
  cooled to: 900 degC, 350 degC
  flame zone: lambda 1.0
}
`;

describe('evaluate --brief', () => {
  test('gives the figures a person looks for first, without tables, and the findings', async () => {
    const folder = folderWith({ 'a.stoke': FURNACE });
    const brief = await runIn(folder, ['evaluate', 'a.stoke', '--brief']);
    const whole = await runIn(folder, ['evaluate', 'a.stoke']);
    const burn = brief.out.slice(brief.out.indexOf('burn furnace')).split('\n\n')[0]?.split('\n') ?? [];
    expect(burn).toHaveLength(7);
    expect(burn[1]).toMatch(/^ {2}Flame temperature, of the whole charge +\d+(\.\d+)? +K \(/);
    expect(brief.out).not.toContain('Products');
    expect(whole.out.split('\n').length).toBeGreaterThan(4 * brief.out.split('\n').length);
    const findings = (out: string): string[] => out.split('\n').filter((line) => line.startsWith('a.stoke:'));
    expect(findings(brief.out)).toEqual(findings(whole.out));
    expect(findings(brief.out).length).toBeGreaterThan(0);
  });

  test('is for text alone', async () => {
    const ran = await runIn(folderWith({ 'a.stoke': FURNACE }), ['evaluate', 'a.stoke', '--brief', '--format', 'json']);
    expect([ran.code, ran.out, ran.problem]).toEqual([2, '', expect.stringContaining('--brief is for text; json gives everything')]); // prettier-ignore
  });
});

describe('on a terminal', () => {
  test.each([100, 80])('of %i columns figures and tables stay within it', async (columns) => {
    const folder = folderWith({ 'a.stoke': FURNACE });
    const { out } = await runIn(folder, ['evaluate', 'a.stoke'], { columns });
    // A finding stands on one line, for tools; its line of source is cut elsewhere.
    const lines = out.split('\n').filter((line) => !line.startsWith('a.stoke:'));
    expect(lines.filter((line) => Array.from(line).length > columns)).toEqual([]);
    expect(lines.length).toBeGreaterThan(100);
  });

  test('temperatures of tables are in °C where the scenario is written so, else in K', async () => {
    const kelvins = FURNACE.replace('900 degC, 350 degC', '1173.15 K, 623.15 K');
    const folder = folderWith({ 'c.stoke': FURNACE, 'k.stoke': kelvins });
    const inCelsius = await runIn(folder, ['evaluate', 'c.stoke']);
    const inKelvins = await runIn(folder, ['evaluate', 'k.stoke']);
    expect(inCelsius.out).toMatch(/Na2CO3\(cr\) +350 /);
    expect(inCelsius.out).not.toContain('Temperature, K');
    expect(inKelvins.out).toMatch(/Na2CO3\(cr\) +623\.1 /);
  });
});
