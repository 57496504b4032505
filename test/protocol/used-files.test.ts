// Files that a scenario uses: asked of the client, taken from open documents first, looked at again when they change,
// never read outside the limit, and never a reason to wait for ever.
import { afterEach, describe, expect, it } from 'vitest';
import { ProtocolClient, type ClientOptions } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
const HOUSE = 'file:///ships/house/suppliers.stoke';
const USE = 'use "house/suppliers.stoke"\nlet beta = 2 * alpha\n';
let client: ProtocolClient;

async function start(options: ClientOptions): Promise<void> {
  client = ProtocolClient.inProcess({ folders: ['file:///ships'], ...options });
  await client.initialize();
}
afterEach(async () => {
  await client.stop();
});

const codes = (uri: string, wanted: readonly string[]): Promise<unknown> =>
  client.diagnostics(
    uri,
    ({ diagnostics }) => JSON.stringify(diagnostics.map(({ code }) => code)) === JSON.stringify(wanted),
  );
const changed = (uri: string, type = 2): Promise<void> =>
  client.connection.sendNotification('workspace/didChangeWatchedFiles', { changes: [{ uri, type }] });

describe('a used file', () => {
  it('is asked of the client, once', async () => {
    await start({ files: new Map([[HOUSE, 'let alpha = 1 kg\n']]) });
    await client.open(MAIN, USE);
    await codes(MAIN, []);
    await client.change(MAIN, `${USE}let gamma = 3\n`);
    expect((await client.diagnosticsOf(MAIN, 2)).diagnostics).toEqual([]);
    expect(client.asked).toEqual([HOUSE]);
  });

  it('that is missing is one finding, at the use', async () => {
    await start({ files: new Map() });
    await client.open(MAIN, USE);
    const { diagnostics } = await client.diagnosticsOf(MAIN, 1);
    expect(diagnostics.map(({ code, range }) => [code, range.start.line])).toContainEqual(['name/missing-file', 0]);
  });

  it('that comes into being, changes and goes is looked at again each time', async () => {
    const files = new Map<string, string>();
    await start({ files });
    await client.open(MAIN, 'use "house/suppliers.stoke"\n');
    await codes(MAIN, ['name/missing-file']);
    files.set(HOUSE, 'let alpha = 1\n');
    await changed(HOUSE, 1);
    await codes(MAIN, []);
    files.set(HOUSE, 'let alpha = nothing_known\n');
    await changed(HOUSE, 2);
    await codes(HOUSE, ['name/unknown']);
    files.delete(HOUSE);
    await changed(HOUSE, 3);
    await codes(MAIN, ['name/missing-file']);
    await codes(HOUSE, []);
  });

  it('shows its own findings while it is closed, without version, and none once nobody uses it', async () => {
    await start({ files: new Map([[HOUSE, 'let alpha = nothing_known\n']]) });
    await client.open(MAIN, 'use "house/suppliers.stoke"\n');
    await codes(HOUSE, ['name/unknown']);
    expect(client.published.find(({ uri }) => uri === HOUSE)?.version).toBeUndefined();
    await client.change(MAIN, 'let alpha = 1\n');
    await codes(HOUSE, []);
  });

  it('is taken from the editor while it is open there, saved or not', async () => {
    await start({ files: new Map([[HOUSE, 'let other = 1\n']]) });
    await client.open(HOUSE, 'let alpha = 1 kg\n');
    await client.open(MAIN, USE);
    await codes(MAIN, []);
    expect(client.asked).toEqual([]);
    await client.change(HOUSE, 'let gamma = 1 kg\n');
    await codes(MAIN, ['name/unknown']);
    await client.change(HOUSE, 'let alpha = 5 kg\n');
    await codes(MAIN, []);
    await client.close(HOUSE);
    await codes(MAIN, ['name/unknown']); // now from the disk
  });

  it('is known however its name is escaped', async () => {
    await start({ files: new Map([['file:///ships/my%20house/it%27s.stoke', 'let alpha = 1\n']]) });
    await client.open(MAIN, `use "my house/it's.stoke"\nlet beta = alpha\n`);
    await codes(MAIN, []);
    await client.open("file:///ships/my house/it's.stoke", 'let alpha = 2\n');
    await client.change("file:///ships/my house/it's.stoke", 'let zeta = 2\n');
    await codes(MAIN, ['name/unknown']);
  });

  it('is followed to the files it uses itself', async () => {
    const chain = new Map(
      Array.from({ length: 20 }, (_, link) => [`file:///ships/f${link}.stoke`, `use "f${link + 1}.stoke"\n`]),
    );
    chain.set('file:///ships/f20.stoke', 'let alpha = 1\n');
    await start({ files: chain });
    await client.open(MAIN, 'use "f0.stoke"\nlet beta = alpha\n');
    await codes(MAIN, []);
    expect(client.asked).toHaveLength(21);
  });
});

describe('two files that name the same thing', () => {
  it('are both told so, each with the place of the other', async () => {
    await start({ files: new Map([[HOUSE, 'let alpha = 1\n']]) });
    await client.open(MAIN, 'use "house/suppliers.stoke"\nlet alpha = 2\n');
    const { diagnostics } = await client.diagnostics(MAIN, (params) => params.diagnostics.length > 0);
    expect(diagnostics).toMatchObject([
      {
        code: 'name/duplicate',
        relatedInformation: [{ location: { uri: HOUSE, range: { start: { line: 0, character: 4 } } } }],
      },
    ]);
    await codes(HOUSE, ['name/duplicate']);
  });
});

describe('the limit', () => {
  it('is the workspace folder', async () => {
    await start({ files: new Map([['file:///secret.stoke', 'let alpha = 1\n']]) });
    await client.open(MAIN, 'use "../secret.stoke"\n');
    await codes(MAIN, ['name/missing-file']);
    expect(client.asked).toEqual([]);
  });

  it('of a document outside every folder is its own folder', async () => {
    await start({
      folders: [],
      files: new Map([
        ['file:///else/b.stoke', 'let alpha = 1\n'],
        [HOUSE, ''],
      ]),
    });
    await client.open('file:///else/main.stoke', 'use "b.stoke"\nlet beta = alpha\n');
    await codes('file:///else/main.stoke', []);
    await client.open('file:///else/out.stoke', 'use "../ships/house/suppliers.stoke"\n');
    await codes('file:///else/out.stoke', ['name/missing-file']);
    expect(client.asked).toEqual(['file:///else/b.stoke']);
  });

  it('moves with the folders of the workspace', async () => {
    await start({ folders: ['file:///ships/deep'], files: new Map([[HOUSE, 'let alpha = 1\n']]) });
    await client.open('file:///ships/deep/main.stoke', 'use "../house/suppliers.stoke"\n');
    await codes('file:///ships/deep/main.stoke', ['name/missing-file']);
    await client.connection.sendNotification('workspace/didChangeWorkspaceFolders', {
      event: { added: [{ uri: 'file:///ships', name: 'ships' }], removed: [] },
    });
    await codes('file:///ships/deep/main.stoke', []);
  });

  it('of a document that was never saved lets it use nothing, and says what to do', async () => {
    await start({ files: new Map() });
    await client.open('untitled:Untitled-1', 'use "b.stoke"\n');
    const { diagnostics } = await client.diagnostics('untitled:Untitled-1', (params) => params.diagnostics.length > 0);
    expect(diagnostics[0]?.message).toContain('Save it first.');
    expect(client.asked).toEqual([]);
  });
});

describe('a client that hands over no files', () => {
  it('is served by the reader of the host', async () => {
    const read: string[] = [];
    await start({
      host: { readFile: (uri) => Promise.resolve(void read.push(uri)).then(() => ({ text: 'let alpha = 1 kg\n' })) },
    });
    await client.open(MAIN, USE);
    await codes(MAIN, []);
    expect(read).toEqual([HOUSE]);
  });

  it('without such a reader gets one finding that says so', async () => {
    await start({});
    await client.open(MAIN, 'use "house/suppliers.stoke"\n');
    const { diagnostics } = await client.diagnosticsOf(MAIN, 1);
    expect(diagnostics).toMatchObject([{ code: 'name/missing-file' }]);
  });

  it('and tells of no changes has the files looked at again with each save', async () => {
    const texts = ['let alpha = 1 kg\n', 'let zeta = 1 kg\n'];
    await start({ capabilities: {}, host: { readFile: () => Promise.resolve({ text: texts.shift() ?? '' }) } });
    await client.open(MAIN, USE);
    await codes(MAIN, []);
    await client.connection.sendNotification('textDocument/didSave', { textDocument: { uri: MAIN } });
    await codes(MAIN, ['name/unknown']);
  });
});
