// What the extension answers through the editor's own programming interface: hovers, findings, quick fixes, formatting,
// outline. Numbers and findings are compared with the command line's for the same file.
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { evaluateOnCommandLine, figureIn } from '../../support/command-line.ts';
import { placeInText } from '../../support/place-in-text.ts';
import { isRounded, numbersShown } from '../../support/shown-number.ts';
import { eventually, test } from './harness.ts';
import { openScenario } from './scenario.ts';

const BLEND = `blend winter_fuel {
  70 % mass methanol
  rest ethanol
}
`;

const UNBALANCED = `reaction soda_route {
  Na(cr) + O2(g) + CO2(g) -> Na2CO3(cr)
}
`;

for (const share of ['70', '20']) {
  test(`the hover on a blend of ${share} % methanol shows the command line's heating value`, async () => {
    const document = await openScenario(BLEND.replace('70', share));
    const computed = figureIn(evaluateOnCommandLine(document.uri.fsPath), 'winter_fuel', 'lower-heating-value');
    const hover = await eventually('the hover', async () => hoverAt(document, 'winter_fuel'));
    const [shown] = numbersShown(hover, 'MJ/kg');
    assert.ok(shown, `no heating value in: ${hover}`);
    assert.ok(isRounded(shown, computed), `shown ${shown.value}, computed ${computed}`);
  });
}

test('after a restart the server answers again', async () => {
  const document = await openScenario(BLEND);
  await vscode.commands.executeCommand('stokehold.restartServer');
  const hover = await eventually('the hover', async () => hoverAt(document, 'winter_fuel'));
  assert.ok(numbersShown(hover, 'MJ/kg').length > 0, `no heating value in: ${hover}`);
});

test("the findings are the command line's, with code, severity and place", async () => {
  const document = await openScenario(UNBALANCED);
  const computed = evaluateOnCommandLine(document.uri.fsPath).files[0]?.findings ?? [];
  assert.deepEqual(
    computed.map(({ code }) => code),
    ['balance/elements'],
  );
  const shown = await eventually('the finding', () => {
    const diagnostics = vscode.languages.getDiagnostics(document.uri);
    return diagnostics.length === computed.length ? diagnostics : undefined;
  });
  assert.deepEqual(
    shown.map(({ code, message, range }) => ({
      code: typeof code === 'object' ? code.value : code,
      message,
      place: [range.start.line + 1, range.start.character + 1, range.end.line + 1, range.end.character + 1],
    })),
    computed.map(({ code, message, line, column, endLine, endColumn }) => ({
      code,
      message,
      place: [line, column, endLine, endColumn],
    })),
  );
  assert.equal(shown[0]?.severity, vscode.DiagnosticSeverity.Error);
});

test("a hazard's code leads to its page, which is in the installed extension", async () => {
  const document = await openScenario('blend metal {\n  100 % sodium\n}\n');
  const target = await eventually('the hazard', () => {
    const codes = vscode.languages.getDiagnostics(document.uri).map(({ code }) => code);
    return codes.find((code) => typeof code === 'object' && code.value === 'hazard/water-reactive');
  });
  assert.ok(typeof target === 'object');
  assert.equal(target.target.scheme, 'command');
  const args = JSON.parse(target.target.query) as unknown[];
  await vscode.commands.executeCommand(target.target.path, ...args);
  const tab = await eventually('the page', () =>
    vscode.window.tabGroups.all.flatMap(({ tabs }) => tabs).find(({ label }) => label.includes('hazards.md')),
  );
  // Without a preview it is the page's text, at the heading.
  const shown = vscode.window.activeTextEditor;
  if (shown?.document.uri.path.endsWith('hazards.md')) {
    assert.equal(shown.document.lineAt(shown.selection.active.line).text, '## `hazard/water-reactive`');
  }
  await vscode.window.tabGroups.close(tab);
});

test('the quick fix that balances the equation is offered as the preferred one', async () => {
  const document = await openScenario(UNBALANCED);
  const actions = await eventually('the quick fix', async () => {
    const offered = await vscode.commands.executeCommand<vscode.CodeAction[]>(
      'vscode.executeCodeActionProvider',
      document.uri,
      rangeOf(document, 'Na2CO3'),
      vscode.CodeActionKind.QuickFix.value,
    );
    return offered.length > 0 ? offered : undefined;
  });
  const preferred = actions.find(({ isPreferred }) => isPreferred);
  assert.ok(preferred?.edit, 'no preferred quick fix with an edit');
  assert.ok(await vscode.workspace.applyEdit(preferred.edit));
  assert.notEqual(document.getText(), UNBALANCED);
  await eventually('the finding to go', () =>
    vscode.languages.getDiagnostics(document.uri).length === 0 ? true : undefined,
  );
  assert.ok(await document.save());
  assert.deepEqual(evaluateOnCommandLine(document.uri.fsPath).files[0]?.findings, []);
});

test('a text that is in order is left as it is by the formatter', async () => {
  const document = await openScenario('blend winter_fuel {\n  70 % mass  methanol\n  rest       ethanol\n}\n');
  const edits = await vscode.commands.executeCommand<vscode.TextEdit[] | undefined>(
    'vscode.executeFormatDocumentProvider',
    document.uri,
    { tabSize: 2, insertSpaces: true },
  );
  assert.deepEqual(edits ?? [], []);
});

test('the outline names the definitions', async () => {
  const document = await openScenario(BLEND + UNBALANCED);
  const symbols = await eventually('the outline', async () => {
    const found = await vscode.commands.executeCommand<vscode.DocumentSymbol[] | undefined>(
      'vscode.executeDocumentSymbolProvider',
      document.uri,
    );
    return found && found.length > 0 ? found : undefined;
  });
  assert.deepEqual(
    symbols.map(({ name }) => name),
    ['winter_fuel', 'soda_route'],
  );
});

test('a used file is read through the editor, and a missing one is a finding', async () => {
  const supplier = await openScenario('let certified_density = 780 kg/m3\n');
  const name = supplier.uri.path.split('/').at(-1) ?? '';
  await vscode.commands.executeCommand('workbench.action.closeActiveEditor');
  const good = await openScenario(`use "${name}"\nlet twice = 2 * certified_density\n`);
  const bad = await openScenario('use "nowhere.stoke"\n');
  const missing = await eventually('the finding', () => vscode.languages.getDiagnostics(bad.uri)[0]);
  assert.equal(typeof missing.code === 'object' ? missing.code.value : missing.code, 'name/missing-file');
  assert.deepEqual(vscode.languages.getDiagnostics(good.uri), []);
});

function rangeOf(document: vscode.TextDocument, words: string): vscode.Range {
  const { line, column } = placeInText(document.getText(), words);
  return new vscode.Range(line - 1, column - 1, line - 1, column - 1 + words.length);
}

async function hoverAt(document: vscode.TextDocument, words: string): Promise<string | undefined> {
  const hovers = await vscode.commands.executeCommand<vscode.Hover[]>(
    'vscode.executeHoverProvider',
    document.uri,
    rangeOf(document, words).start,
  );
  const text = hovers
    .flatMap(({ contents }) => contents)
    .map((content) => (typeof content === 'string' ? content : content.value))
    .join('\n');
  return text === '' ? undefined : text;
}
