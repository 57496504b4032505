// What a client asks for, as it comes over the protocol: one case a request and each way a client may want it. What the
// answers say is tested beside each feature.
import {
  CodeActionRequest,
  DocumentFormattingRequest,
  DocumentRangeFormattingRequest,
  DocumentSymbolRequest,
  HoverRequest,
  type ClientCapabilities,
  type CodeAction,
  type Hover,
  type TextEdit,
} from 'vscode-languageserver/node';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { afterEach, describe, expect, it } from 'vitest';
import { FULL_CAPABILITIES, ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
const options = { tabSize: 2, insertSpaces: true };
let client: ProtocolClient;

async function open(text: string, capabilities: ClientCapabilities = FULL_CAPABILITIES): Promise<void> {
  client = ProtocolClient.inProcess({ capabilities, files: new Map() });
  await client.initialize();
  await client.open(MAIN, text);
}
afterEach(async () => {
  await client.stop();
});

const applied = (text: string, edits: TextEdit[] | null | undefined): string =>
  TextDocument.applyEdits(TextDocument.create(MAIN, 'stokehold', 1, text), edits ?? []);

async function fixes(text: string, only?: string[]): Promise<CodeAction[]> {
  const { diagnostics } = await client.diagnostics(MAIN);
  const end = { line: text.split('\n').length, character: 0 };
  const actions = await client.connection.sendRequest(CodeActionRequest.type, {
    textDocument: { uri: MAIN },
    range: { start: { line: 0, character: 0 }, end },
    context: { diagnostics, ...(only ? { only } : {}) },
  });
  return (actions ?? []).filter((action): action is CodeAction => 'edit' in action);
}

describe('a hover', () => {
  const at = { textDocument: { uri: MAIN }, position: { line: 0, character: 12 } };

  it('is Markdown for clients that show it, with the range it is about', async () => {
    await open('let alpha = 38 nmi\n');
    const hover = await client.connection.sendRequest(HoverRequest.type, at);
    expect(hover).toMatchObject({
      contents: { kind: 'markdown' },
      range: { start: { line: 0, character: 12 }, end: { line: 0, character: 18 } },
    });
    expect((hover as Hover & { contents: { value: string } }).contents.value).toMatch(/^\*\*38 nmi\*\*\n\n/);
  });

  it('is plain text for others', async () => {
    await open('let alpha = 38 nmi\n', {});
    const hover = await client.connection.sendRequest(HoverRequest.type, at);
    expect(hover).toMatchObject({ contents: { kind: 'plaintext' } });
    expect((hover as Hover & { contents: { value: string } }).contents.value).toMatch(/^38 nmi\n/);
  });

  it('answers for the text as it is after a change, without waiting for the findings', async () => {
    await open('let alpha = 38 nmi\n');
    await client.change(MAIN, 'let alpha = 7 kn\n');
    const hover = await client.connection.sendRequest(HoverRequest.type, at);
    expect(JSON.stringify(hover)).toContain('7 kn');
  });

  it('asked behind a change is answered before the list of findings goes out', async () => {
    await open('let alpha = 38 nmi\n');
    await client.diagnosticsOf(MAIN, 1);
    for (let round = 0; round < 5; round++) {
      const version = await client.change(MAIN, `let alpha = ${round} kn\n`);
      await client.connection.sendRequest(HoverRequest.type, at);
      expect(client.published.at(-1)?.version).toBe(version - 1);
      await client.diagnosticsOf(MAIN, version);
    }
  });

  it('is nothing where nothing is', async () => {
    await open('\n\nlet alpha = 38 nmi\n');
    expect(await client.connection.sendRequest(HoverRequest.type, at)).toBeNull();
  });
});

describe('the outline', () => {
  const text = 'scenario "Trial"\nlet alpha = 2 kg\n';

  it('is a tree with details', async () => {
    await open(text);
    const outline = await client.connection.sendRequest(DocumentSymbolRequest.type, { textDocument: { uri: MAIN } });
    expect(outline).toMatchObject([
      { name: 'Trial' },
      {
        name: 'alpha',
        detail: '2 kg',
        selectionRange: { start: { line: 1, character: 4 }, end: { line: 1, character: 9 } },
      },
    ]);
  });

  it('is a flat list for older clients', async () => {
    await open(text, {});
    const outline = await client.connection.sendRequest(DocumentSymbolRequest.type, { textDocument: { uri: MAIN } });
    expect(outline).toMatchObject([
      { name: 'Trial', location: { uri: MAIN } },
      { name: 'alpha', location: { uri: MAIN } },
    ]);
  });
});

describe('formatting', () => {
  const text = 'let   alpha=2   kg\n\nlet beta   =   3 kg\n';

  it('gives edits that lead to the formatted text', async () => {
    await open(text);
    const edits = await client.connection.sendRequest(DocumentFormattingRequest.type, {
      textDocument: { uri: MAIN },
      options,
    });
    expect(applied(text, edits)).toBe('let alpha = 2 kg\n\nlet beta = 3 kg\n');
  });

  it('of a range leaves the rest as it is', async () => {
    await open(text);
    const edits = await client.connection.sendRequest(DocumentRangeFormattingRequest.type, {
      textDocument: { uri: MAIN },
      range: { start: { line: 2, character: 0 }, end: { line: 2, character: 3 } },
      options,
    });
    expect(applied(text, edits)).toBe('let   alpha=2   kg\n\nlet beta = 3 kg\n');
  });

  it('of a formatted text gives none', async () => {
    await open('let alpha = 2 kg\n');
    expect(
      await client.connection.sendRequest(DocumentFormattingRequest.type, { textDocument: { uri: MAIN }, options }),
    ).toEqual([]);
  });
});

describe('a quick fix', () => {
  const unbalanced = 'reaction soda {\n  Na(cr) + O2(g) + CO2(g) -> Na2CO3(cr)\n}\n';
  const open80 = 'blend fuel {\n  30 % mass methanol\n  50 % mass ethanol\n}\n';

  it.each([
    ['balances an equation', unbalanced, 'balance/elements'],
    ['closes the shares', open80, 'balance/shares'],
  ])('%s, and its finding is gone', async (_, text, code) => {
    await open(text);
    const [fix] = (await fixes(text)).filter(({ diagnostics }) => diagnostics?.some((one) => one.code === code));
    expect(fix).toMatchObject({ kind: 'quickfix', isPreferred: true });
    const [change] = fix?.edit?.documentChanges ?? [];
    expect(change).toMatchObject({ textDocument: { uri: MAIN, version: 1 } });
    const edits = change && 'edits' in change ? change.edits.filter((edit): edit is TextEdit => 'newText' in edit) : [];
    const version = await client.change(MAIN, applied(text, edits));
    const { diagnostics } = await client.diagnosticsOf(MAIN, version);
    expect(diagnostics.map((one) => one.code)).not.toContain(code);
  });

  it('names no version for a client that knows plain changes only', async () => {
    await open(unbalanced, {
      textDocument: { codeAction: { codeActionLiteralSupport: { codeActionKind: { valueSet: [] } } } },
    });
    const [fix] = await fixes(unbalanced);
    expect(Object.keys(fix?.edit?.changes ?? {})).toEqual([MAIN]);
  });

  it.each([
    [['quickfix'], true],
    [[''], true],
    [['refactor'], false],
    [['source.fixAll'], false],
  ])('is offered when the client wants only %j: %s', async (only, offered) => {
    await open(unbalanced);
    expect((await fixes(unbalanced, only)).length > 0).toBe(offered);
  });

  it('is not offered to a client that cannot take edits', async () => {
    await open(unbalanced, {});
    expect(await fixes(unbalanced)).toEqual([]);
  });
});
