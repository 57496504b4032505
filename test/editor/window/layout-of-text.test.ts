// "Format Document" in the editor writes what `stokehold format` writes, in a workspace that is not trusted too.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { formatOnCommandLine } from '../../support/command-line.ts';
import { openScenarios, type ScenarioWindow } from './scenarios.ts';

const UNTIDY = 'blend  slurry{\n30 %  mass sodium # metal\n    rest   methanol\n  stored:20 degC ,1 atm\n}\n';

let window: ScenarioWindow;
beforeAll(async () => {
  window = await openScenarios({ 'untidy.stoke': UNTIDY, 'tidied.stoke': UNTIDY }, { trusted: false });
});
afterAll(async () => {
  await window.close();
});

test('the editor and the command line format alike', async () => {
  const byCommandLine = path.join(window.folder, 'tidied.stoke');
  formatOnCommandLine(byCommandLine);
  const wanted = readFileSync(byCommandLine, 'utf8');
  expect(wanted).not.toBe(UNTIDY);

  const byEditor = path.join(window.folder, 'untidy.stoke');
  await window.openFile('untidy.stoke');
  await window.placeCursor(1, 1);
  await expect
    .poll(async () => {
      await window.formatDocument();
      await window.save();
      return readFileSync(byEditor, 'utf8');
    })
    .toBe(wanted);
  await window.screenshot('formatted');
});
