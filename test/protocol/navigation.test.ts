// Going from place to place as it comes over the protocol: one case a request, and what differs between clients. What the
// answers say is tested beside each feature.
import {
  DefinitionRequest,
  DocumentHighlightRequest,
  FoldingRangeRequest,
  PrepareRenameRequest,
  ReferencesRequest,
  RenameRequest,
  SemanticTokensRangeRequest,
  SemanticTokensRequest,
  type ClientCapabilities,
  type Range,
  type TextDocumentPositionParams,
} from 'vscode-languageserver/node';
import { afterEach, describe, expect, it } from 'vitest';
import { FULL_CAPABILITIES, ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
const USED = 'file:///ships/used.stoke';
let client: ProtocolClient;

async function open(text: string, capabilities: ClientCapabilities = FULL_CAPABILITIES): Promise<unknown> {
  client = ProtocolClient.inProcess({ capabilities, files: new Map([[USED, 'let a = 1\n']]) });
  const answer = await client.initialize();
  await client.open(MAIN, text);
  return answer.capabilities.renameProvider;
}
afterEach(async () => {
  await client.stop();
});

const at = (line: number, character: number, uri = MAIN): TextDocumentPositionParams => ({
  textDocument: { uri },
  position: { line, character },
});
const range = (line: number, from: number, to: number): Range => ({
  start: { line, character: from },
  end: { line, character: to },
});

describe('definition and references', () => {
  it('reach into used files', async () => {
    await open('use "used.stoke"\nlet b = a\n');
    const places = await client.connection.sendRequest(DefinitionRequest.type, at(1, 8));
    expect(places).toEqual([{ uri: USED, range: range(0, 4, 5) }]);
  });

  it('of a used file that is open reach its users', async () => {
    await open('use "used.stoke"\nlet b = a\n');
    await client.diagnostics(MAIN);
    await client.open(USED, 'let a = 1\n');
    const places = await client.connection.sendRequest(ReferencesRequest.type, {
      ...at(0, 4, USED),
      context: { includeDeclaration: false },
    });
    expect(places).toEqual([{ uri: MAIN, range: range(1, 8, 9) }]);
  });

  it('are none in a document that is not open', async () => {
    await open('let a = 1\n');
    expect(await client.connection.sendRequest(DefinitionRequest.type, at(0, 4, USED))).toEqual([]);
  });
});

describe('highlights', () => {
  it('tell writing from reading', async () => {
    await open('let a = 1\nlet b = a\n');
    expect(await client.connection.sendRequest(DocumentHighlightRequest.type, at(0, 4))).toEqual([
      { range: range(0, 4, 5), kind: 3 },
      { range: range(1, 8, 9), kind: 2 },
    ]);
  });
});

describe('a rename', () => {
  it('is prepared with the name without its quotes', async () => {
    expect(await open("let 'my a' = 1\n")).toEqual({ prepareProvider: true });
    const offer = await client.connection.sendRequest(PrepareRenameRequest.type, at(0, 6));
    expect(offer).toEqual({ range: range(0, 4, 10), placeholder: 'my a' });
  });

  it('gives edits that name their versions', async () => {
    await open('use "used.stoke"\nlet b = a\n');
    const edit = await client.connection.sendRequest(RenameRequest.type, { ...at(1, 8), newName: 'my a' });
    expect(edit?.documentChanges).toEqual([
      { textDocument: { uri: MAIN, version: 1 }, edits: [{ range: range(1, 8, 9), newText: "'my a'" }] },
      { textDocument: { uri: USED, version: null }, edits: [{ range: range(0, 4, 5), newText: "'my a'" }] },
    ]);
  });

  it('gives plain edits to clients that know no versions', async () => {
    expect(await open('let a = 1\n', {})).toBe(true);
    const edit = await client.connection.sendRequest(RenameRequest.type, { ...at(0, 4), newName: 'b' });
    expect(edit).toEqual({ changes: { [MAIN]: [{ range: range(0, 4, 5), newText: 'b' }] } });
  });

  it('that cannot be says why', async () => {
    await open('let a = 1\nlet b = 2\n');
    await expect(client.connection.sendRequest(RenameRequest.type, { ...at(0, 4), newName: 'b' })).rejects.toThrow(
      '`b` is taken already (line 2).',
    );
    await expect(client.connection.sendRequest(PrepareRenameRequest.type, at(0, 8))).rejects.toThrow('no name');
  });
});

describe('folds', () => {
  it('tell comments from definitions', async () => {
    await open('# a\n# b\nblend f {\n}\n');
    expect(await client.connection.sendRequest(FoldingRangeRequest.type, { textDocument: { uri: MAIN } })).toEqual([
      { startLine: 0, endLine: 1, kind: 'comment' },
      { startLine: 2, endLine: 3 },
    ]);
  });
});

describe('colours by meaning', () => {
  const document = { textDocument: { uri: MAIN } };

  it('are five numbers a token, told from the one before', async () => {
    await open('let a = 2 kg\nlet b = a\n');
    const tokens = await client.connection.sendRequest(SemanticTokensRequest.type, document);
    expect(tokens?.data).toEqual([0, 4, 1, 2, 3, 0, 6, 2, 7, 0, 1, 4, 1, 2, 3, 0, 4, 1, 2, 2]);
  });

  it('can be asked for a part', async () => {
    await open('let a = 2 kg\nlet b = a\n');
    const tokens = await client.connection.sendRequest(SemanticTokensRangeRequest.type, {
      ...document,
      range: range(1, 0, 9),
    });
    expect(tokens?.data).toEqual([1, 4, 1, 2, 3, 0, 4, 1, 2, 2]);
  });
});
