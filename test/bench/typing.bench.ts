// Times the answers while a large file is typed, through the real protocol with the pause set to 0: from a key to the
// final findings of its version, hovers and completions between keys, and what sixty keys a second do to the memory.
// Against a server in this process, and against the server as a program of its own (its path is the first argument).
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import {
  CompletionRequest,
  DidChangeTextDocumentNotification,
  HoverRequest,
  type DidChangeTextDocumentParams,
  type InitializeResult,
} from 'vscode-languageserver/node';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { ProtocolClient, type ClientOptions } from '../support/protocol-client.ts';
import { keystrokes, type Keystroke } from './keystrokes.ts';
import { largeScenario } from './large-scenario.ts';
import { print, printRounds, timed, type Round } from './measured.ts';

const URI = 'file:///bench/large.stoke';
const KEYS = 300;
const text = largeScenario();
const server = process.argv[2];
const fastSeconds = process.argv.includes('--long') ? 60 : 8;
const options: ClientOptions = { files: new Map(), folders: ['file:///bench'], settings: { pause: 0 } };

const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-typing-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true }));
const memoryFile = path.join(scratch, 'memory.json');

await type('in this process', ProtocolClient.inProcess(options));
if (server) {
  const tell = ['--expose-gc', '--require', path.resolve('test/bench/server-memory.cjs')];
  process.env['STOKEHOLD_BENCH_MEMORY'] = memoryFile;
  await type('as a program', ProtocolClient.ofProgram(process.execPath, [...tell, server, '--stdio'], options));
}
// The server in this process watches over its client for as long as the process lives.
process.exit(0);

async function type(where: string, client: ProtocolClient): Promise<void> {
  const { capabilities } = await client.initialize();
  const opened = await timed(async () => {
    await client.open(URI, text);
    await client.diagnosticsOf(URI, 1);
  });
  print({ name: `opening the large file ${where}`, value: opened.ms, unit: 'ms' });
  const rounds = await pressKeys(client, capabilities);
  printRounds(`key to final findings ${where}`, rounds.findings, { of: 'p95', budget: 30 });
  printRounds(`hover ${where}`, rounds.hovers, { of: 'p95', budget: 20 });
  if (capabilities.completionProvider) {
    printRounds(`completion ${where}`, rounds.completions, { of: 'p95', budget: 20 });
  } else print({ name: `completion ${where}`, value: NaN, unit: 'ms', budget: 20, note: 'not offered' });
  await pressFast(client, where, rounds.text);
  await client.stop();
}

interface Rounds {
  readonly findings: Round[];
  readonly hovers: Round[];
  readonly completions: Round[];
  readonly text: string;
}

async function pressKeys(client: ProtocolClient, capabilities: InitializeResult['capabilities']): Promise<Rounds> {
  const rounds = { findings: [] as Round[], hovers: [] as Round[], completions: [] as Round[], text };
  let version = 1;
  for (const key of keystrokes(text, KEYS)) {
    version++;
    const message = messageOf(rounds.text, key, version);
    rounds.findings.push(
      await timed(async () => {
        await press(client, message);
        await client.diagnosticsOf(URI, version);
      }),
    );
    rounds.text = key.text;
    client.published.length = 0;
    const document = TextDocument.create(URI, 'stokehold', version, key.text);
    const here = { textDocument: { uri: URI }, position: document.positionAt(key.start + key.newText.length) };
    // Asked right behind a key, as an editor does: the answer waits for the evaluation of that key's text.
    version++;
    const spaced = `${key.text.slice(0, key.start)} ${key.text.slice(key.start)}`;
    await press(client, messageOf(key.text, { start: key.start, end: key.start, newText: ' ', text: spaced }, version));
    rounds.hovers.push(await timed(() => client.connection.sendRequest(HoverRequest.type, here)));
    version++;
    const back = { start: key.start, end: key.start + 1, newText: '', text: key.text };
    await press(client, messageOf(spaced, back, version));
    if (capabilities.completionProvider) {
      rounds.completions.push(await timed(() => client.connection.sendRequest(CompletionRequest.type, here)));
    }
    await client.diagnosticsOf(URI, version);
  }
  return rounds;
}

/**
 * Sixty keys a second, without waiting for any answer. In the end the findings must be those of the same text opened
 * afresh, and once the text is again what it was before, so must be the memory.
 */
async function pressFast(client: ProtocolClient, where: string, from: string): Promise<void> {
  const before = await memoryOf(client);
  let version = 1_000_000;
  let current = from;
  const start = performance.now();
  for (const key of keystrokes(from, fastSeconds * 60)) {
    const due = start + ((version - 1_000_000) * 1000) / 60;
    await new Promise((resolve) => setTimeout(resolve, Math.max(0, due - performance.now())));
    await press(client, messageOf(current, key, ++version));
    current = key.text;
  }
  const name = `after ${fastSeconds} s of sixty keys a second ${where}`;
  const last = await timed(() => client.diagnosticsOf(URI, version));
  print({ name: `last findings ${name}`, value: last.ms, unit: 'ms' });
  const after = await memoryOf(client);
  const fresh = ProtocolClient.inProcess(options);
  await fresh.initialize();
  await fresh.open(URI, current, version);
  const [findings, afresh] = [await finalFindings(client, version), await finalFindings(fresh, version)];
  await fresh.stop();
  const lost = afresh.filter((one) => !findings.includes(one)).length + Math.abs(findings.length - afresh.length);
  print({ name: `findings lost or left over ${name}`, value: lost, unit: '', budget: 0, note: `of ${afresh.length}` });
  if (!before || !after) return;
  const note = `without garbage; ${before.heapMb.toFixed(1)} MB before; the process has ${after.residentMb.toFixed(0)} MB`;
  print({ name: `memory of the server thread ${name}`, value: after.heapMb, unit: 'MB', budget: 150, note });
  const back = { start: 0, end: current.length, newText: from, text: from };
  await press(client, messageOf(current, back, ++version));
  await client.diagnosticsOf(URI, version);
  const kept = await memoryOf(client);
  if (kept)
    print({
      name: `the same with the text as before, over that before`,
      value: kept.heapMb - before.heapMb,
      unit: 'MB',
      budget: 3,
    });
}

/** The findings of a version once all of it is worked out; what was told early is replaced by then. */
async function finalFindings(client: ProtocolClient, version: number): Promise<readonly string[]> {
  await client.diagnosticsOf(URI, version);
  const here = { textDocument: { uri: URI }, position: { line: 0, character: 0 } };
  await client.connection.sendRequest(HoverRequest.type, here);
  await new Promise((resolve) => setTimeout(resolve, 500));
  const list = client.published.findLast((one) => one.uri === URI && one.version === version);
  return (list?.diagnostics ?? []).map(({ range, code, message }) => JSON.stringify([range, code, message]));
}

/** The message of a key, made before the clock runs. */
function messageOf(before: string, key: Keystroke, version: number): DidChangeTextDocumentParams {
  const document = TextDocument.create(URI, 'stokehold', version, before);
  const range = { start: document.positionAt(key.start), end: document.positionAt(key.end) };
  return { textDocument: { uri: URI, version }, contentChanges: [{ range, text: key.newText }] };
}

function press(client: ProtocolClient, message: DidChangeTextDocumentParams): Promise<void> {
  return client.connection.sendNotification(DidChangeTextDocumentNotification.type, message);
}

interface Memory {
  readonly heapMb: number;
  readonly residentMb: number;
}

/** The server's memory with no garbage in it, as it tells when asked (server-memory.cjs); null for one in this process. */
async function memoryOf({ program }: ProtocolClient): Promise<Memory | null> {
  if (!program) return null;
  rmSync(memoryFile, { force: true });
  program.kill('SIGUSR2');
  while (!existsSync(memoryFile)) await new Promise((resolve) => setTimeout(resolve, 20));
  const told = readFileSync(memoryFile, 'utf8');
  const bytes = (key: string): number => Number(new RegExp(`"${key}":(\\d+)`).exec(told)?.[1]) / 1e6;
  return { heapMb: bytes('heapUsed') + bytes('external'), residentMb: bytes('rss') };
}
