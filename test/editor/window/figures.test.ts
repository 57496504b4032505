// A person points at a blend and reads what it is worth. Every number is compared with what the command line prints for
// the same file, before and after an edit, so that a hover that shows yesterday's number fails.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { evaluateOnCommandLine, figureIn } from '../../support/command-line.ts';
import { placeInText } from '../../support/place-in-text.ts';
import { isRounded, numbersShown } from '../../support/shown-number.ts';
import { exampleFiles, openScenarios, type ScenarioWindow } from './scenarios.ts';

let window: ScenarioWindow;
beforeAll(async () => {
  window = await openScenarios(exampleFiles('dunlin.stoke', 'house/suppliers.stoke'));
  await window.openFile('dunlin.stoke');
});
afterAll(async () => {
  await window.close();
});

/** The heating value the hover on the blend shows, once it is the one the command line prints for the saved file. */
async function expectHoverToAgree(): Promise<number> {
  const file = path.join(window.folder, 'dunlin.stoke');
  const computed = figureIn(evaluateOnCommandLine(file), 'slurry', 'lower-heating-value');
  const { line, column } = placeInText(readFileSync(file, 'utf8'), 'slurry {');
  let hover = '';
  await expect
    .poll(async () => {
      await window.placeCursor(line, column + 1);
      hover = (await window.readHover()).join('\n');
      const [shown] = numbersShown(hover, 'MJ/kg');
      return shown !== undefined && isRounded(shown, computed);
    })
    .toBe(true);
  expect(hover).toMatch(/lower heating value/i);
  return computed;
}

test('the hover on a blend shows the heating value that the command line prints', async () => {
  const computed = await expectHoverToAgree();
  expect(computed).toBeGreaterThan(30); // MJ/kg: a hydrocarbon thinned with a metal, not a slip of a unit
  await window.screenshot('hover-blend');
});

test('after an edit it shows the new value, and the two differ', async () => {
  const before = figureIn(
    evaluateOnCommandLine(path.join(window.folder, 'dunlin.stoke')),
    'slurry',
    'lower-heating-value',
  );
  const { line, column } = placeInText(
    readFileSync(path.join(window.folder, 'dunlin.stoke'), 'utf8'),
    '30 % mass  sodium',
  );
  await window.placeCursor(line, column + 1);
  await window.page.keyboard.press('Shift+ArrowLeft');
  await window.typeText('5');
  await window.saveChange('dunlin.stoke');
  const after = await expectHoverToAgree();
  expect(Math.abs(after - before)).toBeGreaterThan(1);
});

test('the hover on a portion shows its shares', async () => {
  const { line, column } = placeInText(
    readFileSync(path.join(window.folder, 'dunlin.stoke'), 'utf8'),
    '% mass  sodium',
  );
  await window.placeCursor(line, column);
  await expect.poll(async () => (await window.readHover()).join('\n')).toMatch(/^50 % by mass: sodium/);
  await window.screenshot('hover-portion');
});
