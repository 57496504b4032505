// A person makes a slip, is told of it in the Problems panel and mends it with a quick fix. What the panel says is what
// the command line says of the same file, before and after.
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { evaluateOnCommandLine } from '../../support/command-line.ts';
import { placeInText } from '../../support/place-in-text.ts';
import { openScenarios, type ScenarioWindow } from './scenarios.ts';

const UNBALANCED = 'reaction soda_route {\n  Na(cr) + O2(g) + CO2(g) -> Na2CO3(cr)\n}\n';
const NOT_CLOSED = 'blend two_parts {\n  60 % mass fame\n  30 % mass gas_oil\n}\n';

let window: ScenarioWindow;
beforeAll(async () => {
  window = await openScenarios({
    'unbalanced.stoke': UNBALANCED,
    'not-closed.stoke': NOT_CLOSED,
    'typed.stoke': 'let power = 5 kW\n',
  });
});
afterAll(async () => {
  await window.close();
});

/** Waits until the panel shows what the command line says of the file, finding by finding. */
async function expectPanelToAgree(name: string): Promise<string[]> {
  const findings = evaluateOnCommandLine(path.join(window.folder, name)).files[0]?.findings ?? [];
  const shown = await window.waitForProblems(name, findings.length);
  for (const { message } of findings) {
    expect(shown.some((row) => row.includes(message.replaceAll('`', '')) || row.includes(message))).toBe(true);
  }
  return findings.map(({ code }) => code);
}

async function focusEditor(): Promise<void> {
  await window.runCommand('View: Focus Active Editor Group');
}

test('an equation that does not balance is reported and balanced', async () => {
  await window.openFile('unbalanced.stoke');
  expect(await expectPanelToAgree('unbalanced.stoke')).toEqual(['balance/elements']);
  await window.screenshot('unbalanced');
  // The equation that the command line's message offers between backticks is the one the quick fix writes.
  const [finding] = evaluateOnCommandLine(path.join(window.folder, 'unbalanced.stoke')).files[0]?.findings ?? [];
  const balanced = finding?.message.split('`')[1] ?? 'no equation offered';
  await focusEditor();
  const { line, column } = placeInText(UNBALANCED, '-> Na2CO3');
  await window.placeCursor(line, column);
  await window.applyQuickFix('Balance');
  expect(await window.waitForProblems('unbalanced.stoke', 0)).toEqual([]);
  await window.screenshot('balanced');
  await focusEditor();
  expect(await window.saveChange('unbalanced.stoke')).toContain(balanced);
  expect(evaluateOnCommandLine(path.join(window.folder, 'unbalanced.stoke')).files[0]?.findings).toEqual([]);
});

test('shares that do not close are reported and closed', async () => {
  await window.openFile('not-closed.stoke');
  expect(await expectPanelToAgree('not-closed.stoke')).toEqual(['balance/shares']);
  await focusEditor();
  const [finding] = evaluateOnCommandLine(path.join(window.folder, 'not-closed.stoke')).files[0]?.findings ?? [];
  await window.placeCursor(finding?.line ?? 0, finding?.column ?? 0);
  await window.applyQuickFix('');
  expect(await window.waitForProblems('not-closed.stoke', 0)).toEqual([]);
  await focusEditor();
  await window.saveChange('not-closed.stoke');
  expect(evaluateOnCommandLine(path.join(window.folder, 'not-closed.stoke')).files[0]?.findings).toEqual([]);
});

test('a slip typed into a correct file appears, and goes when it is taken back', async () => {
  await window.openFile('typed.stoke');
  expect(await window.waitForProblems('typed.stoke', 0)).toEqual([]);
  await focusEditor();
  await window.placeCursor(1, 'let power = 5 kW'.length + 1);
  await window.typeText('x');
  expect(await window.waitForProblems('typed.stoke', 1)).toHaveLength(1);
  await focusEditor();
  await window.page.keyboard.press('Backspace');
  expect(await window.waitForProblems('typed.stoke', 0)).toEqual([]);
});
