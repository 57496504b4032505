// Opening a scenario starts the installed extension and its server. Knows nothing of what the server answers.
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { eventually, test } from './harness.ts';
import { openScenario } from './scenario.ts';

const EXTENSION_ID = 'stokehold.stokehold';

test('a .stoke file is a scenario and starts the installed extension', async () => {
  const document = await openScenario('let days_worked = 210 per year\n');
  assert.equal(document.languageId, 'stokehold');
  const extension = vscode.extensions.getExtension(EXTENSION_ID);
  assert.ok(extension, 'the extension is not installed');
  await eventually('the extension to become active', () => (extension.isActive ? true : undefined));
  await (extension.exports as { ready: Promise<void> }).ready;
});

test('the extension comes from the package, not from the source tree', () => {
  const extension = vscode.extensions.getExtension(EXTENSION_ID);
  assert.ok(extension, 'the extension is not installed');
  assert.match(extension.extensionPath, /stokehold\.stokehold-\d+\.\d+\.\d+/);
  return Promise.resolve();
});

test('a correct line gets no finding', async () => {
  const document = await openScenario('let days_worked = 210 per year\n');
  assert.deepEqual(vscode.languages.getDiagnostics(document.uri), []);
});
