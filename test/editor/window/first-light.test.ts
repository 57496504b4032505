// A person opens a scenario of one line in the editor with the packaged extension installed.
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Workbench } from '../host/workbench.ts';
import { openScenarios } from './scenarios.ts';

let workbench: Workbench;
beforeAll(async () => {
  workbench = await openScenarios({ 'one-line.stoke': 'let days_worked = 210 per year # while the ice allows\n' });
});
afterAll(async () => {
  await workbench.close();
});

test('the file is shown as a scenario, coloured by the grammar', async () => {
  await workbench.openFile('one-line.stoke');
  await expect.poll(() => workbench.readLanguage()).toBe('Stokehold scenario');
  await expect.poll(() => workbench.readColour('# while the ice allows')).toBe('rgb(106, 153, 85)'); // a comment's green
  await workbench.screenshot('one-line');
});

test('a correct line shows no problem', async () => {
  expect(await workbench.readProblems()).toEqual([]);
});
