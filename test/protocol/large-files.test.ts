// A file that is too large to be read as a whole, as it comes over the protocol: what is on the screen is read and worked
// out, the rest is not spoken of, and one finding says so. The setting moves the limit.
import {
  DefinitionRequest,
  DocumentFormattingRequest,
  FoldingRangeRequest,
  HoverRequest,
  RenameRequest,
} from 'vscode-languageserver/node';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { visibleRangesNotification } from '../../server/lsp/connection.ts';
import { ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
const HOUSE = 'file:///ships/house.stoke';
/** Lines of 25 characters, 50,000 in all; each tenth has a slip. */
const LINES = Array.from({ length: 2000 }, (_, line) => {
  const value = line % 10 === 0 ? '1 kg + 2 m' : '1';
  return `let v${line} = ${value}`.padEnd(24);
});
const LARGE = LINES.map((line) => `${line}\n`).join('');
const files = new Map<string, string>();
let client: ProtocolClient;

beforeEach(async () => {
  files.clear();
  client = ProtocolClient.inProcess({ files, folders: ['file:///ships'], settings: { pause: 0, largestFile: 0.03 } });
  await client.initialize();
});
afterEach(async () => {
  await client.stop();
});

const show = (from: number, to: number, uri = MAIN): Promise<void> =>
  client.connection.sendNotification(visibleRangesNotification, {
    uri,
    ranges: [{ start: { line: from, character: 0 }, end: { line: to, character: 0 } }],
  });
/** Codes with their lines, once the list has this many. */
const found = async (count: number, uri = MAIN): Promise<string[]> =>
  (await client.diagnostics(uri, ({ diagnostics }) => diagnostics.length === count)).diagnostics.map(
    ({ code, range }) => `${code} ${range.start.line}`,
  );
const at = (line: number, character: number) => ({ textDocument: { uri: MAIN }, position: { line, character } });

describe('a file over the limit', () => {
  it('is read where it is looked at, and follows the eye', async () => {
    await client.open(MAIN, LARGE);
    // Before anything is shown: the beginning, as far as the limit goes.
    expect((await found(121)).slice(0, 3)).toEqual(['syntax/too-large 0', 'unit/mismatch 0', 'unit/mismatch 10']);
    await show(1985, 1995);
    expect(await found(2)).toEqual(['syntax/too-large 0', 'unit/mismatch 1990']);
    await show(5, 25);
    expect(await found(3)).toEqual(['syntax/too-large 0', 'unit/mismatch 10', 'unit/mismatch 20']);
  });

  it('is answered where it is looked at', async () => {
    await client.open(MAIN, LARGE.replace(LINES[1993] ?? '', 'let total = v1992 '));
    await show(1985, 1995);
    await found(2);
    expect(JSON.stringify(await client.connection.sendRequest(HoverRequest.type, at(1993, 5)))).toContain('total');
    expect(await client.connection.sendRequest(DefinitionRequest.type, at(1993, 14))).toMatchObject([
      { range: { start: { line: 1992 } } },
    ]);
    expect(await client.connection.sendRequest(HoverRequest.type, at(500, 5))).toBeNull();
  });

  it('calls no name unknown that may stand in the unread part, and knows the catalogue all the same', async () => {
    const text = `${LARGE}let sum = v3 + v1999\nblend fuel {\n  30 % mass sodium\n  rest v5\n}\nlet wrong = 1 kg + 2 m\n`;
    await client.open(MAIN, text);
    await show(2000, 2006);
    expect(await found(2)).toEqual(['syntax/too-large 0', 'unit/mismatch 2005']);
    expect(JSON.stringify(await client.connection.sendRequest(HoverRequest.type, at(2002, 13)))).toContain('Na');
  });

  it('is neither renamed in nor formatted, because half of it would be left as it is', async () => {
    await client.open(MAIN, LARGE);
    await show(5, 25);
    await found(3);
    const renamed = client.connection.sendRequest(RenameRequest.type, { ...at(11, 5), newName: 'other' });
    await expect(renamed).rejects.toThrow('only a part of it is read');
    const edits = await client.connection.sendRequest(DocumentFormattingRequest.type, {
      textDocument: { uri: MAIN },
      options: { tabSize: 2, insertSpaces: true },
    });
    expect(edits).toEqual([]);
  });

  it('is folded where it is looked at', async () => {
    await client.open(MAIN, `${LARGE}blend fuel {\n  rest water\n}\n`);
    await show(1998, 2002);
    expect(await client.connection.sendRequest(FoldingRangeRequest.type, { textDocument: { uri: MAIN } })).toEqual([
      { startLine: 2000, endLine: 2002 },
    ]);
  });

  it('keeps what is seen in step with the typing', async () => {
    await client.open(MAIN, LARGE);
    await show(5, 25);
    await found(3);
    const version = await client.change(MAIN, LARGE.replace('let v11 = 1', 'let v11 = 1 m + 2 kg'));
    const { diagnostics } = await client.diagnosticsOf(MAIN, version);
    expect(diagnostics.map(({ range }) => range.start.line)).toEqual([0, 10, 11, 20]);
  });

  it('is whole again once it is small enough, or the limit is high enough', async () => {
    await client.open(MAIN, LARGE);
    await show(5, 25);
    await found(3);
    client.settings = { pause: 0, largestFile: 1 };
    await client.connection.sendNotification('workspace/didChangeConfiguration', { settings: null });
    expect(await found(200)).not.toContain('syntax/too-large 0');
    client.settings = { pause: 0, largestFile: 0.03 };
    await client.connection.sendNotification('workspace/didChangeConfiguration', { settings: null });
    await found(3);
    await client.change(MAIN, LINES.slice(0, 100).join('\n'));
    expect(await found(10)).not.toContain('syntax/too-large 0');
  });
});

describe('a used file over the limit', () => {
  it('is read at its beginning while it is closed, and where it is looked at while it is open', async () => {
    files.set(HOUSE, LARGE);
    await client.open(MAIN, 'use "house.stoke"\nlet first = v1 + v1993\n');
    expect(await found(121, HOUSE)).toContain('syntax/too-large 0');
    expect((await client.diagnostics(MAIN)).diagnostics).toEqual([]);
    await client.open(HOUSE, LARGE);
    await show(1985, 1995, HOUSE);
    expect(await found(2, HOUSE)).toEqual(['syntax/too-large 0', 'unit/mismatch 1990']);
    const places = await client.connection.sendRequest(DefinitionRequest.type, at(1, 18));
    expect(places).toMatchObject([{ uri: HOUSE, range: { start: { line: 1993 } } }]);
  });
});

describe('a message of what is seen', () => {
  it.each([null, {}, { uri: MAIN, ranges: [{}] }, { uri: 'file:///closed.stoke', ranges: [] }])(
    '%j is survived',
    async (message) => {
      await client.open(MAIN, LARGE);
      await client.connection.sendNotification('stokehold/visibleRanges', message);
      await show(5, 25);
      await found(3);
    },
  );
});
