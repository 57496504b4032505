// Help while typing as it comes over the protocol: the forms a client may want it in, when a list opens by itself, and what
// is shown beside an offer. What is offered where is tested beside the feature.
import {
  CompletionRequest,
  CompletionResolveRequest,
  CompletionTriggerKind,
  SignatureHelpRequest,
  type ClientCapabilities,
  type CompletionItem,
  type CompletionList,
} from 'vscode-languageserver/node';
import { afterEach, describe, expect, it } from 'vitest';
import { FULL_CAPABILITIES, ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
let client: ProtocolClient;

/** Opens a text whose cursor is marked with `|`, and asks for a completion there. */
async function completed(
  marked: string,
  capabilities: ClientCapabilities = FULL_CAPABILITIES,
  triggerCharacter?: string,
): Promise<CompletionList> {
  client = ProtocolClient.inProcess({ capabilities, files: new Map() });
  await client.initialize();
  const at = marked.indexOf('|');
  await client.open(MAIN, marked.slice(0, at) + marked.slice(at + 1));
  const lines = marked.slice(0, at).split('\n');
  const list = await client.connection.sendRequest(CompletionRequest.type, {
    textDocument: { uri: MAIN },
    position: { line: lines.length - 1, character: lines.at(-1)?.length ?? 0 },
    ...(triggerCharacter === undefined
      ? {}
      : { context: { triggerKind: CompletionTriggerKind.TriggerCharacter, triggerCharacter } }),
  });
  return Array.isArray(list) ? { isIncomplete: false, items: list } : (list ?? { isIncomplete: false, items: [] });
}
const labelled = ({ items }: CompletionList, label: string): CompletionItem | undefined =>
  items.find((item) => item.label === label);

afterEach(async () => {
  await client.stop();
});

describe('a completion', () => {
  it('inserts or replaces, as the client likes', async () => {
    const item = labelled(await completed('blend f {\n  rest sod|ium\n}\n'), 'sodium');
    expect(item?.textEdit).toEqual({
      newText: 'sodium',
      insert: { start: { line: 1, character: 7 }, end: { line: 1, character: 10 } },
      replace: { start: { line: 1, character: 7 }, end: { line: 1, character: 13 } },
    });
    expect(item?.labelDetails).toEqual({ description: 'Na(cr)' });
  });

  it('has one range and a plain detail for older clients', async () => {
    const item = labelled(await completed('blend f {\n  rest sod|ium\n}\n', {}), 'sodium');
    expect(item?.textEdit).toEqual({
      newText: 'sodium',
      range: { start: { line: 1, character: 7 }, end: { line: 1, character: 10 } },
    });
    expect(item?.detail).toBe('Na(cr)');
  });

  it('tells the range of most items once to clients that take it so', async () => {
    const { textDocument } = FULL_CAPABILITIES;
    const completion = { ...textDocument?.completion, completionList: { itemDefaults: ['editRange'] } };
    const list = await completed('let b = lower heating val|ue\n', {
      ...FULL_CAPABILITIES,
      textDocument: { ...textDocument, completion },
    });
    const range = (start: number, end: number) => ({
      start: { line: 0, character: start },
      end: { line: 0, character: end },
    });
    expect(list.itemDefaults).toEqual({ editRange: { insert: range(8, 25), replace: range(8, 27) } });
    const figure = labelled(list, 'lower heating value');
    expect([figure?.textEdit, figure?.textEditText]).toEqual([undefined, 'lower heating value of ']);
    // It begins elsewhere.
    expect(labelled(list, 'of')?.textEdit).toEqual({ newText: 'of', insert: range(22, 25), replace: range(22, 27) });
  });

  it('writes skeletons for clients that have snippets, and plain words for others', async () => {
    expect(labelled(await completed('|'), 'blend')).toMatchObject({ insertTextFormat: 2 });
    await client.stop();
    expect(labelled(await completed('|', {}), 'blend')).toMatchObject({
      insertTextFormat: 1,
      textEdit: { newText: 'blend ' },
    });
  });

  it('is sorted by what fits the place', async () => {
    const { items } = await completed('substance x {\n  lower heating value: 44 |\n}\n');
    expect(items.slice(0, 2).map(({ label, sortText }) => [label, sortText])).toEqual([
      ['MJ/kg', '0000'],
      ['kWh/kg', '0001'],
    ]);
  });

  it('works in the document as it is after a change', async () => {
    await completed('let a = 1\nlet b = |\n');
    await client.change(MAIN, 'let other = 1\nlet b = \n');
    const list = await client.connection.sendRequest(CompletionRequest.type, {
      textDocument: { uri: MAIN },
      position: { line: 1, character: 8 },
    });
    expect(JSON.stringify(list)).toContain('"other"');
  });

  it.each([
    ['behind a share', 'blend f {\n  30 % mass |\n}\n', ' ', true],
    ['behind `of`', 'blend f {\n}\nexpect density of |\n', ' ', true],
    ['behind an entry with listed words', 'substance x {\n  phase: |\n}\n', ' ', true],
    ['behind a number that wants its unit', 'substance x {\n  density: 700 |\n}\n', ' ', true],
    ['behind a word', 'let a = b |\n', ' ', false],
    ['at the start of a line', 'blend f {\n |\n}\n', ' ', false],
    ['behind a plain number', 'let a = 5 |\n', ' ', false],
    ['behind the slash of a unit', 'let a = 5 kJ/|\n', '/', true],
    ['behind a slash that divides', 'let a = 5 kg /|\n', '/', false],
    ['in a comment', '# a |\n', ' ', false],
  ])('opens by itself %s', async (_, marked, trigger, opens) => {
    const { items } = await completed(marked, FULL_CAPABILITIES, trigger);
    expect(items.length > 0).toBe(opens);
  });

  it('is nothing in a document that is not open', async () => {
    await completed('|');
    const asked = { textDocument: { uri: 'file:///ships/other.stoke' }, position: { line: 0, character: 0 } };
    expect(await client.connection.sendRequest(CompletionRequest.type, asked)).toBeNull();
  });
});

describe('beside an offer', () => {
  it('stands the card of a substance', async () => {
    const item = labelled(await completed('blend f {\n  rest sod|\n}\n'), 'sodium');
    const resolved = await client.connection.sendRequest(CompletionResolveRequest.type, item ?? { label: '' });
    expect(resolved.documentation).toMatchObject({ kind: 'markdown' });
    expect(JSON.stringify(resolved.documentation)).toContain('Na, solid');
  });

  it.each([{ data: undefined }, { data: { uri: MAIN, subject: { kind: 'nothing' } } }, { data: { uri: 1 } }])(
    'an item with %j is given back as it is',
    async (more) => {
      await completed('|');
      const item = { label: 'x', ...more };
      expect(await client.connection.sendRequest(CompletionResolveRequest.type, item)).toEqual(
        JSON.parse(JSON.stringify(item)),
      );
    },
  );

  it('what a scenario says never becomes markup', async () => {
    const item = labelled(
      await completed('## [x](command:y)\nsubstance green {\n}\nblend f {\n  rest gr|\n}\n'),
      'green',
    );
    const resolved = await client.connection.sendRequest(CompletionResolveRequest.type, item ?? { label: '' });
    expect(JSON.stringify(resolved.documentation)).not.toContain('[x](');
  });
});

describe('a signature', () => {
  it.each<[marked: string, active: number | null]>([
    ['let a = min(|', 0],
    ['let a = min(1, |', 1],
    ['let a = min(1, 2, 3, 4, |', 2],
    ['let a = min(1, (2 + |', 1],
    ['let a = min(1, 2)|', null],
    ['let a = (|', null],
    ['let a = nothing(|', null],
    ['# min(|', null],
  ])('%s', async (marked, active) => {
    await completed(marked);
    const help = await client.connection.sendRequest(SignatureHelpRequest.type, {
      textDocument: { uri: MAIN },
      position: { line: 0, character: marked.indexOf('|') },
    });
    expect(help?.activeParameter ?? null).toBe(active);
  });
});
