// The server as the program that ships, spoken to over real pipes: it answers, survives bytes that are no messages, reads
// used files from the disk for an editor that does not hand them over, and ends when it should and how it should.
import { spawn, type ChildProcessWithoutNullStreams } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'esbuild';
import { HoverRequest } from 'vscode-languageserver/node';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ProtocolClient } from '../support/protocol-client.ts';

const folder = mkdtempSync(path.join(tmpdir(), 'stokehold-'));
const server = path.join(folder, 'server.cjs');

beforeAll(async () => {
  await build({
    entryPoints: [path.resolve(import.meta.dirname, '../../server/main.ts')],
    outfile: server,
    bundle: true,
    platform: 'node',
    format: 'cjs',
    target: 'node20',
    logLevel: 'warning',
  });
  mkdirSync(path.join(folder, 'house'));
  writeFileSync(path.join(folder, 'house/suppliers.stoke'), 'let alpha = 1 kg\n');
}, 60_000);
afterAll(() => {
  rmSync(folder, { recursive: true });
});

const uri = pathToFileURL(path.join(folder, 'main.stoke')).href;
const ended = (program: {
  once(event: 'exit', listener: (code: number | null) => void): unknown;
}): Promise<number | null> => new Promise((resolve) => program.once('exit', resolve));

describe('the built server', () => {
  it('answers, reads a used file from the disk, and ends well when told to', async () => {
    const client = ProtocolClient.ofProgram(process.execPath, [server, '--stdio'], {
      folders: [pathToFileURL(folder).href],
    });
    await client.initialize();
    await client.open(uri, 'use "house/suppliers.stoke"\nlet beta = 2 * alpha\nlet gamma = nothing_known\n');
    const { diagnostics } = await client.diagnosticsOf(uri, 1);
    expect(diagnostics.map(({ code, range }) => [code, range.start.line])).toEqual([['name/unknown', 2]]);
    const hover = await client.connection.sendRequest(HoverRequest.type, {
      textDocument: { uri },
      position: { line: 1, character: 4 },
    });
    expect(JSON.stringify(hover)).toContain('2 kg');
    const end = ended(client.program ?? expect.fail('no program'));
    await client.stop();
    expect(await end).toBe(0);
  });

  it.runIf(process.platform !== 'win32')('follows no link out of the workspace folder', async () => {
    mkdirSync(path.join(folder, 'ship'));
    symlinkSync(path.join(folder, 'house'), path.join(folder, 'ship/house'));
    const client = ProtocolClient.ofProgram(process.execPath, [server, '--stdio'], {
      folders: [pathToFileURL(path.join(folder, 'ship')).href],
    });
    await client.initialize();
    const ship = pathToFileURL(path.join(folder, 'ship/main.stoke')).href;
    await client.open(ship, 'use "house/suppliers.stoke"\n');
    const { diagnostics } = await client.diagnosticsOf(ship, 1);
    expect(diagnostics.map(({ code }) => code)).toEqual(['name/missing-file']);
    expect(diagnostics[0]?.message).toContain('outside');
    await client.stop();
  });

  it('ends with 1 when it is told to exit before it was shut down', async () => {
    const program = start();
    say(program, { jsonrpc: '2.0', method: 'exit' });
    expect(await ended(program)).toBe(1);
  });

  it('ends when the pipe to it closes', async () => {
    const program = start();
    const end = ended(program);
    program.stdin.end();
    expect(await end).toBeTypeOf('number');
  });
});

describe('bytes that are no messages', () => {
  const bodies = [
    '{"jsonrpc": "2.0", "id":',
    'null',
    '[]',
    '7',
    '"text"',
    '{}',
    '{"jsonrpc":"2.0","id":{},"method":5}',
    '\u0000',
    '{"jsonrpc":"2.0","id":99,"result":1}',
  ];

  it.each(bodies)('%j as a message is passed over', async (body) => {
    const program = start();
    frame(program, body);
    expect(await initialized(program)).toMatchObject({ result: { serverInfo: { name: 'stokehold' } } });
    program.kill();
  });

  it('a foreign header beside the length is passed over', async () => {
    const program = start();
    const body = JSON.stringify({ jsonrpc: '2.0', method: '$/nothing' });
    program.stdin.write(`X-Other: 1\r\nContent-Length: ${Buffer.byteLength(body)}\r\n\r\n${body}`);
    expect(await initialized(program)).toMatchObject({ result: { serverInfo: { name: 'stokehold' } } });
    program.kill();
  });

  const notice = JSON.stringify({ jsonrpc: '2.0', method: '$/nothing' });
  it.each([
    ['a header without a length', 'Content-Nonsense: 12\r\n\r\n'],
    ['a length that is too short', `Content-Length: 7\r\n\r\n${notice}`],
    ['a length that is too long', `Content-Length: 70000\r\n\r\n${notice}`],
  ])('%s costs its own message only', async (_, bytes) => {
    const program = start();
    program.stdin.write(bytes);
    expect(await initialized(program)).toMatchObject({ result: { serverInfo: { name: 'stokehold' } } });
    program.kill();
  });
});

function start(): ChildProcessWithoutNullStreams {
  return spawn(process.execPath, [server, '--stdio'], { stdio: 'pipe' });
}

function frame(program: ChildProcessWithoutNullStreams, body: string): void {
  program.stdin.write(`Content-Length: ${Buffer.byteLength(body)}\r\n\r\n${body}`);
}

function say(program: ChildProcessWithoutNullStreams, message: unknown): void {
  frame(program, JSON.stringify(message));
}

/** Introduces itself and gives the server's answer to that, whatever else the server says before. */
function initialized(program: ChildProcessWithoutNullStreams): Promise<unknown> {
  return new Promise((resolve, reject) => {
    let heard = '';
    program.once('exit', (code) => reject(new Error(`The server ended with ${code}.`)));
    program.stdout.on('data', (chunk: Buffer) => {
      heard += chunk.toString();
      const answer = /\{"jsonrpc":"2\.0","id":1,.*?\}\}\}(?=Content-Length|$)/s.exec(heard);
      if (answer) resolve(JSON.parse(answer[0]));
    });
    say(program, {
      jsonrpc: '2.0',
      id: 1,
      method: 'initialize',
      params: { processId: null, rootUri: null, capabilities: {}, workspaceFolders: null },
    });
  });
}
