// Help while typing and ways through the text, asked for through the editor's own programming interface: completion with
// what stands beside an offer, definition, rename over two files, colours by meaning.
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { placeInText } from '../../support/place-in-text.ts';
import { eventually, test } from './harness.ts';
import { openScenario } from './scenario.ts';

const BLEND = 'blend winter_fuel {\n  70 % mass methanol\n  rest ethanol\n}\n';

test('a half-written portion is completed with a substance and its card', async () => {
  const document = await openScenario('blend winter_fuel {\n  70 % mass metha\n}\n');
  const position = behind(document, 'metha');
  const item = await eventually('the offer', async () => {
    const { items } = await vscode.commands.executeCommand<vscode.CompletionList>(
      'vscode.executeCompletionItemProvider',
      document.uri,
      position,
      undefined,
      5,
    );
    return items.find(({ label }) => labelOf(label) === 'methanol');
  });
  const { documentation } = item;
  const text = documentation instanceof vscode.MarkdownString ? documentation.value : (documentation ?? '');
  assert.match(text, /CH3OH, liquid/);
});

test('a figure is offered, and its value stands beside the offer in focus', async () => {
  const document = await openScenario(`${BLEND}expect lower hea\n`);
  const item = await eventually('the offer', async () => {
    const { items } = await vscode.commands.executeCommand<vscode.CompletionList>(
      'vscode.executeCompletionItemProvider',
      document.uri,
      behind(document, 'lower hea'),
      undefined,
      1000, // resolved: the offer in focus may stand anywhere in the list
    );
    return items.find(({ label }) => labelOf(label) === 'lower heating value of winter_fuel');
  });
  const { detail = '', documentation = '' } = item;
  const beside = `${detail} ${typeof documentation === 'string' ? documentation : documentation.value}`;
  assert.match(beside, /\d MJ\/kg/);
});

test('a name leads to its definition', async () => {
  const document = await openScenario(`${BLEND}let heat = lower heating value of winter_fuel + 0 MJ/kg\n`);
  const [place] = await eventually('the definition', async () => {
    const places = await vscode.commands.executeCommand<(vscode.Location | vscode.LocationLink)[]>(
      'vscode.executeDefinitionProvider',
      document.uri,
      behind(document, 'value of winter'),
    );
    return places.length > 0 ? places : undefined;
  });
  const range = place && ('range' in place ? place.range : place.targetRange);
  assert.deepEqual([range?.start.line, range?.start.character], [0, 6]);
});

test('a rename reaches a used file', async () => {
  const used = await openScenario(BLEND.replace('winter_fuel', 'summer_fuel'));
  const name = used.uri.path.split('/').at(-1) ?? '';
  const document = await openScenario(`use "${name}"\nexpect density of summer_fuel > 1 kg/m3\n`);
  const edit = await eventually('the rename', async () => {
    const found = await vscode.commands.executeCommand<vscode.WorkspaceEdit>(
      'vscode.executeDocumentRenameProvider',
      document.uri,
      behind(document, 'summer'),
      'fuel of summer',
    );
    return found.size > 0 ? found : undefined;
  });
  assert.ok(await vscode.workspace.applyEdit(edit));
  assert.equal(document.getText(), `use "${name}"\nexpect density of 'fuel of summer' > 1 kg/m3\n`);
  assert.match(used.getText(), /^blend 'fuel of summer' \{/);
});

test('the editor knows the types of the colours by meaning', async () => {
  const document = await openScenario(BLEND);
  const legend = await eventually('the legend', async () =>
    vscode.commands.executeCommand<vscode.SemanticTokensLegend | undefined>(
      'vscode.provideDocumentSemanticTokensLegend',
      document.uri,
    ),
  );
  assert.ok(legend.tokenTypes.includes('substance'));
  const tokens = await vscode.commands.executeCommand<vscode.SemanticTokens>(
    'vscode.provideDocumentSemanticTokens',
    document.uri,
  );
  assert.ok(tokens.data.length > 0);
});

/** The place right behind words that stand once in the text. */
function behind(document: vscode.TextDocument, words: string): vscode.Position {
  const { line, column } = placeInText(document.getText(), words);
  return new vscode.Position(line - 1, column - 1 + words.length);
}

function labelOf(label: string | vscode.CompletionItemLabel): string {
  return typeof label === 'string' ? label : label.label;
}
