// Two tempos as a client sees them: while an evaluation takes long, what is known at once goes out first, with the version
// it belongs to, and the full list takes its place. No list is ever cleared in between. The evaluation is held up by the
// test, not by the clock.
import { HoverRequest } from 'vscode-languageserver/node';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { TEMPO } from '../../server/lsp/stepping.ts';
import { ProtocolClient } from '../support/protocol-client.ts';

const MAIN = 'file:///ships/main.stoke';
const TEXT = `let alpha = 1 kg
let beta = 1 kg + 2 m
let = 4
let gamma = nothing_known
expect alpha = 3 kg
`;

let client: ProtocolClient;
/** Evaluations that pause, each waiting to be let on. */
let paused: (() => void)[];
let isHeld: boolean;

beforeEach(async () => {
  paused = [];
  isHeld = true;
  const turn = (): Promise<void> =>
    isHeld ? new Promise((resolve) => paused.push(resolve)) : new Promise((resolve) => setTimeout(resolve, 0));
  let clockMs = 0;
  client = ProtocolClient.inProcess({
    files: new Map(),
    folders: ['file:///ships'],
    host: { tempo: { ...TEMPO, sliceMs: 0, quickAfterMs: 0, now: () => clockMs++, turn } },
  });
  await client.initialize();
});
afterEach(async () => {
  letOn();
  await client.stop();
});

function letOn(): void {
  isHeld = false;
  for (const resume of paused.splice(0)) resume();
}
function hold(): void {
  isHeld = true;
}
const lists = (): [number | undefined, string[]][] =>
  client.published
    .filter(({ uri }) => uri === MAIN)
    .map(({ version, diagnostics }) => [version, diagnostics.map(({ code, range }) => `${code} ${range.start.line}`)]);
const length = (count: number) => client.diagnostics(MAIN, ({ diagnostics }) => diagnostics.length === count);

const FULL = ['unit/mismatch 1', 'syntax/missing 2', 'name/unknown 3', 'expect/failed 4'];

describe('a scenario that takes long', () => {
  it('shows what is known at once, then all, both with its version', async () => {
    await client.open(MAIN, TEXT, 7);
    await client.diagnosticsOf(MAIN, 7);
    expect(paused.length).toBeGreaterThan(0);
    expect(lists()).toEqual([[7, ['syntax/missing 2']]]);
    letOn();
    await length(4);
    expect(lists()).toEqual([
      [7, ['syntax/missing 2']],
      [7, FULL],
    ]);
  });

  it('keeps what an edit does not touch, on its new line, while the rest is worked out', async () => {
    letOn();
    await client.open(MAIN, TEXT);
    await length(4);
    hold();
    const version = await client.change(MAIN, `# Moved down.\n${TEXT.replace('alpha = 1 kg', 'alpha = 2 kg')}`);
    await client.diagnosticsOf(MAIN, version);
    expect(paused.length).toBeGreaterThan(0);
    // The claim rests on the edited value and is not told of until it is worked out; the rest never went.
    expect(lists().at(-1)).toEqual([2, ['unit/mismatch 2', 'syntax/missing 3', 'name/unknown 4']]);
    letOn();
    await length(4);
    expect(lists().filter(([of]) => of === 2)).toEqual([
      [2, ['unit/mismatch 2', 'syntax/missing 3', 'name/unknown 4']],
      [2, ['unit/mismatch 2', 'syntax/missing 3', 'name/unknown 4', 'expect/failed 5']],
    ]);
  });

  it('never shows an empty list while it is typed in, and ends with the last version', async () => {
    letOn();
    await client.open(MAIN, TEXT);
    await length(4);
    let version = 1;
    // Sometimes the next key is waited with until a list has come, and sometimes not.
    for (let key = 1; key <= 20; key++) {
      version = await client.change(MAIN, `${'\n'.repeat(key)}${TEXT.replace('alpha = 1 kg', `alpha = ${key}1 kg`)}`);
      if (key % 3 === 0) await client.diagnosticsOf(MAIN, version);
    }
    await client.diagnostics(MAIN, (one) => one.version === version && one.diagnostics.length === 4);
    for (const [, list] of lists().slice(1)) expect(list.length).toBeGreaterThanOrEqual(3);
    const versions = lists().map(([of]) => of ?? 0);
    expect(new Set(versions).size).toBeGreaterThan(6);
    expect(versions).toEqual([...versions].sort((one, other) => one - other));
  });

  it('answers a request when it is done, for the text as it is then', async () => {
    await client.open(MAIN, TEXT);
    await client.diagnosticsOf(MAIN, 1);
    const hover = client.connection.sendRequest(HoverRequest.type, {
      textDocument: { uri: MAIN },
      position: { line: 0, character: 5 },
    });
    const version = await client.change(MAIN, TEXT.replace('1 kg', '5 kg'));
    letOn();
    expect(JSON.stringify(await hover)).toContain('5 kg');
    await client.diagnostics(MAIN, (one) => one.version === version && one.diagnostics.length === 4);
  });

  it('that is closed meanwhile is cleared, and nothing of it comes after', async () => {
    await client.open(MAIN, TEXT);
    await client.diagnosticsOf(MAIN, 1);
    await client.close(MAIN);
    await length(0);
    letOn();
    await client.open('file:///ships/other.stoke', TEXT);
    await client.diagnostics('file:///ships/other.stoke', ({ diagnostics }) => diagnostics.length === 4);
    expect(lists().at(-1)).toEqual([undefined, []]);
  });
});
