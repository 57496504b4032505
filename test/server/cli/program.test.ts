// The program as a shell runs it: bundled, with real streams.
import { spawn, spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';
import { beforeAll, expect, test } from 'vitest';
import { folderWith } from '../../support/command-run.ts';

const bundle = path.resolve('node_modules/.cache/stokehold-cli-test/cli.cjs');

beforeAll(async () => {
  const options = { bundle: true, platform: 'node', format: 'cjs', target: 'node20', logLevel: 'warning' } as const;
  await build({ ...options, entryPoints: [path.resolve('server/cli.ts')], outfile: bundle });
});

function stokehold(words: readonly string[], input = '') {
  return spawnSync(process.execPath, [bundle, ...words], { encoding: 'utf8', input, cwd: path.resolve('examples') });
}

test('prints figures and exits with the verdict', () => {
  const good = stokehold(['evaluate', 'dunlin.stoke']);
  expect([good.status, good.stderr]).toEqual([0, '']);
  expect(good.stdout).toContain('blend slurry');
  expect(good.stdout).not.toContain('\u001b');
  expect(stokehold(['check', '-'], 'blend a {\n  rest  nothing_known\n}\n').status).toBe(1);
  expect(stokehold(['chek']).status).toBe(2);
});

test('prints the version of the package', () => {
  expect(stokehold(['--version']).stdout).toMatch(/^\d+\.\d+\.\d+\n$/);
});

test('a closed pipe is not an error', async () => {
  // More than a pipe holds, so that the program is still writing when nobody reads any more.
  const many = 'expect 3 kg\n'.repeat(1000);
  const folder = folderWith({ 'many.stoke': many });
  const child = spawn(process.execPath, [bundle, 'check', 'many.stoke'], { cwd: folder });
  let problem = '';
  child.stderr.on('data', (piece: Buffer) => {
    problem += piece.toString();
  });
  child.stdout.once('data', () => child.stdout.destroy());
  const code = await new Promise((resolve) => child.on('close', resolve));
  expect([code, problem]).toEqual([1, '']);
});

test.runIf(existsSync('/dev/full'))('output that cannot be written is told in plain words', () => {
  const full = openSync('/dev/full', 'w');
  const ran = spawnSync(process.execPath, [bundle, 'evaluate', 'dunlin.stoke'], {
    encoding: 'utf8',
    stdio: ['ignore', full, 'pipe'],
    cwd: path.resolve('examples'),
  });
  closeSync(full);
  expect(ran.status).toBe(2);
  expect(ran.stderr).toMatch(/^stokehold: the output cannot be written: .*\n$/);
});

test('serve speaks the protocol on the standard streams', async () => {
  const child = spawn(process.execPath, [bundle, 'serve', '--stdio']);
  const say = (content: object): void => {
    const text = JSON.stringify({ jsonrpc: '2.0', ...content });
    child.stdin.write(`Content-Length: ${Buffer.byteLength(text)}\r\n\r\n${text}`);
  };
  let heard = '';
  child.stdout.on('data', (piece: Buffer) => {
    heard += piece.toString();
    if (!heard.includes('"id":1')) return;
    say({ id: 2, method: 'shutdown' });
    say({ method: 'exit' });
  });
  say({ id: 1, method: 'initialize', params: { processId: null, rootUri: null, capabilities: {} } });
  expect(await new Promise((resolve) => child.on('close', resolve))).toBe(0);
  expect(heard).toContain('"name":"stokehold"');
});
