// From the first message to the last: what is published, when, for which version, and that nothing a client sends ends
// the server. The server runs in this process; stdio.test.ts speaks to the built program.
import { CancellationTokenSource, ErrorCodes, HoverRequest, LSPErrorCodes } from 'vscode-languageserver/node';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
let client: ProtocolClient;

beforeEach(() => {
  client = ProtocolClient.inProcess({ files: new Map(), folders: ['file:///ships'] });
});
afterEach(async () => {
  await client.stop();
});

const codes = async (version: number): Promise<unknown[]> =>
  (await client.diagnosticsOf(MAIN, version)).diagnostics.map(({ code }) => code);

describe('the first answer', () => {
  it('says what can be asked, and that columns are UTF-16 units', async () => {
    const { capabilities, serverInfo } = await client.initialize();
    expect(serverInfo?.name).toBe('stokehold');
    expect(capabilities).toMatchObject({
      positionEncoding: 'utf-16',
      textDocumentSync: { openClose: true, change: 2, save: true },
      hoverProvider: true,
      documentSymbolProvider: true,
      documentFormattingProvider: true,
      documentRangeFormattingProvider: true,
      codeActionProvider: { codeActionKinds: ['quickfix'] },
    });
  });

  it('is followed by asking for news of settings and files', async () => {
    await client.initialize();
    await client.open(MAIN, '');
    await client.diagnosticsOf(MAIN, 1);
    await expect
      .poll(() => [...client.registered].sort())
      .toEqual(['workspace/didChangeConfiguration', 'workspace/didChangeWatchedFiles']);
  });
});

describe('an open document', () => {
  beforeEach(async () => {
    await client.initialize();
  });

  it('is answered with its version, also when nothing is wrong with it', async () => {
    await client.open(MAIN, 'let alpha = 1 kg\n', 7);
    expect(await codes(7)).toEqual([]);
  });

  it('shows what is wrong where it is', async () => {
    await client.open(MAIN, 'let alpha = 1 kg\nlet beta = nothing_known\n');
    const { diagnostics } = await client.diagnosticsOf(MAIN, 1);
    expect(diagnostics).toMatchObject([
      {
        code: 'name/unknown',
        source: 'stokehold',
        severity: 1,
        range: { start: { line: 1, character: 11 }, end: { line: 1, character: 24 } },
      },
    ]);
  });

  it('is looked at again after a change, and its list replaced without being cleared', async () => {
    await client.open(MAIN, 'let alpha = nothing_known\n');
    expect(await codes(1)).toEqual(['name/unknown']);
    await client.change(MAIN, 'let alpha = nothing_known\nlet beta = nor_this\n');
    expect(await codes(2)).toEqual(['name/unknown', 'name/unknown']);
    await client.change(MAIN, 'let alpha = 1\n');
    expect(await codes(3)).toEqual([]);
    expect(client.published.map(({ version, diagnostics }) => [version, diagnostics.length])).toEqual([
      [1, 1],
      [2, 2],
      [3, 0],
    ]);
  });

  it('is answered for the last of many quick changes', async () => {
    await client.open(MAIN, 'let alpha = 1\n');
    for (let key = 0; key < 30; key++) await client.change(MAIN, `let alpha = ${'x'.repeat(key + 1)}\n`);
    expect(await codes(31)).toEqual(['name/unknown']);
  });

  it('is cleared when it closes, and stays silent after', async () => {
    await client.open(MAIN, 'let alpha = nothing_known\n');
    await codes(1);
    await client.change(MAIN, 'let alpha = nothing_else\n');
    await client.close(MAIN);
    const last = await client.diagnostics(MAIN, ({ diagnostics }) => diagnostics.length === 0);
    expect(last.version).toBeUndefined();
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect(client.published.at(-1)).toBe(last);
  });

  it('opened again starts anew', async () => {
    await client.open(MAIN, 'let alpha = nothing_known\n');
    await codes(1);
    await client.close(MAIN);
    await client.open(MAIN, 'let alpha = 1\n', 1);
    expect(
      (await client.diagnostics(MAIN, ({ version, diagnostics }) => version === 1 && diagnostics.length === 0))
        .diagnostics,
    ).toEqual([]);
  });

  it('takes edits by range, in UTF-16 columns', async () => {
    await client.open(MAIN, '# 𝛼𝛽\nlet alpha = 1\n');
    await client.connection.sendNotification('textDocument/didChange', {
      textDocument: { uri: MAIN, version: 2 },
      contentChanges: [
        { range: { start: { line: 0, character: 4 }, end: { line: 0, character: 6 } }, text: '' },
        { range: { start: { line: 1, character: 12 }, end: { line: 1, character: 13 } }, text: 'unheard_of' },
      ],
    });
    const { diagnostics } = await client.diagnosticsOf(MAIN, 2);
    expect(diagnostics).toMatchObject([
      { range: { start: { line: 1, character: 12 }, end: { line: 1, character: 22 } } },
    ]);
  });
});

describe('settings', () => {
  it('are asked for, applied, and applied again when they change', async () => {
    client.settings = { pause: 0, severity: { 'name/unknown': 'hint' } };
    await client.initialize();
    await client.open(MAIN, 'let alpha = nothing_known\n');
    await client.diagnostics(MAIN, ({ diagnostics }) => diagnostics[0]?.severity === 4);
    client.settings = { pause: 0, severity: { 'name/unknown': 'off' } };
    await client.connection.sendNotification('workspace/didChangeConfiguration', { settings: null });
    await client.diagnostics(MAIN, ({ diagnostics }) => diagnostics.length === 0);
  });
});

describe('what makes no sense', () => {
  beforeEach(async () => {
    await client.initialize();
    await client.open(MAIN, 'let alpha = 2 kg\n');
    await client.diagnosticsOf(MAIN, 1);
  });
  afterEach(async () => {
    // Whatever was sent: the server still answers.
    await client.change(MAIN, 'let alpha = nothing_known\n');
    expect(await client.diagnostics(MAIN, ({ diagnostics }) => diagnostics.length > 0)).toBeDefined();
  });

  it('an unknown request is refused by its own error', async () => {
    await expect(client.connection.sendRequest('stokehold/unheardOf', {})).rejects.toMatchObject({
      code: ErrorCodes.MethodNotFound,
    });
  });

  it.each(['stokehold/unheardOf', '$/unheardOf', 'textDocument/didUnheardOf'])(
    'an unknown notification %s is passed over',
    async (method) => {
      await client.connection.sendNotification(method, { any: 'thing' });
    },
  );

  const requests = [
    'textDocument/hover',
    'textDocument/documentSymbol',
    'textDocument/formatting',
    'textDocument/rangeFormatting',
    'textDocument/codeAction',
  ];
  const params: [string, unknown][] = [
    ['with an empty record', {}],
    [
      'with a document that is not open',
      { textDocument: { uri: 'file:///none.stoke' }, position: { line: 0, character: 0 } },
    ],
    ['with a URI that is none', { textDocument: { uri: 7 }, position: 'here', range: [], context: null }],
  ];
  it.each(requests.flatMap((method) => params.map(([how, sent]) => [method, how, sent] as const)))(
    '%s %s is answered empty',
    async (method, _, sent) => {
      const answer: unknown = await client.connection.sendRequest(method, sent);
      expect(answer === null || (Array.isArray(answer) && answer.length === 0)).toBe(true);
    },
  );

  it.each(requests)('%s with a place outside the text is answered', async (method) => {
    const answer = client.connection.sendRequest(method, {
      textDocument: { uri: MAIN },
      position: { line: -3, character: 1e20 },
      range: { start: { line: 9, character: 9 }, end: { line: -1, character: NaN } },
      context: { diagnostics: [] },
    });
    await expect(answer).resolves.toBeDefined();
  });

  it.each(
    requests.flatMap(
      (method) =>
        [
          [method, undefined],
          [method, null],
        ] as const,
    ),
  )('%s with %s for parameters is refused as the protocol has it', async (method, sent) => {
    const answer =
      sent === undefined ? client.connection.sendRequest(method) : client.connection.sendRequest(method, sent);
    await expect(answer).rejects.toMatchObject({ code: ErrorCodes.InvalidParams });
  });

  it.each([
    ['textDocument/didOpen', {}],
    ['textDocument/didOpen', { textDocument: { uri: 'file:///x.stoke' } }],
    // A text that has no length would be read for ever.
    [
      'textDocument/didOpen',
      { textDocument: { uri: 'file:///x.stoke', languageId: 'stokehold', version: 1, text: {} } },
    ],
    ['textDocument/didOpen', { textDocument: { uri: 7, languageId: 'stokehold', version: 1, text: '' } }],
    ['textDocument/didChange', { textDocument: { uri: MAIN, version: 2 }, contentChanges: [{ text: { length: 9 } }] }],
    ['textDocument/didChange', { textDocument: { uri: MAIN, version: '2' }, contentChanges: [{ text: '' }] }],
    [
      'textDocument/didChange',
      {
        textDocument: { uri: MAIN, version: 2 },
        contentChanges: [
          { text: '', range: { start: { line: -1, character: 0 }, end: { line: 1e20, character: 0.5 } } },
        ],
      },
    ],
    ['textDocument/didClose', { textDocument: { uri: {} } }],
    ['textDocument/didChange', { textDocument: { uri: MAIN } }],
    ['textDocument/didChange', { textDocument: { uri: MAIN }, contentChanges: [{ text: 'let' }] }],
    [
      'textDocument/didChange',
      { textDocument: { uri: 'file:///none.stoke', version: 4 }, contentChanges: [{ text: '' }] },
    ],
    ['textDocument/didClose', { textDocument: { uri: 'file:///none.stoke' } }],
    ['textDocument/didSave', null],
    ['workspace/didChangeWatchedFiles', { changes: [{ uri: 'nonsense', type: 9 }] }],
    ['workspace/didChangeWatchedFiles', {}],
    ['workspace/didChangeConfiguration', null],
    ['workspace/didChangeWorkspaceFolders', { event: {} }],
    ['workspace/didChangeWorkspaceFolders', {}],
    ['workspace/didChangeWorkspaceFolders', { event: null }],
    ['$/cancelRequest', { id: 'never asked' }],
  ])('the notification %s with %j is passed over', async (method, sent) => {
    await client.connection.sendNotification(method, sent);
  });

  it('a version that goes backwards still gives the text that was sent last', async () => {
    await client.connection.sendNotification('textDocument/didChange', {
      textDocument: { uri: MAIN, version: 0 },
      contentChanges: [{ text: 'let alpha = nothing_known\n' }],
    });
    expect((await client.diagnosticsOf(MAIN, 0)).diagnostics).toHaveLength(1);
  });
});

describe('a cancelled request', () => {
  it('says that it was cancelled, and the next one is answered', async () => {
    await client.initialize();
    await client.open(MAIN, 'let alpha = 2 kg\n');
    const source = new CancellationTokenSource();
    const where = { textDocument: { uri: MAIN }, position: { line: 0, character: 12 } };
    const cancelled = client.connection.sendRequest(HoverRequest.type, where, source.token);
    source.cancel();
    await expect(cancelled).rejects.toMatchObject({ code: LSPErrorCodes.RequestCancelled });
    expect(await client.connection.sendRequest(HoverRequest.type, where)).not.toBeNull();
  });
});
