// Long work in the programs that ship, with a table of jobs and a kind of the tests built in: the server, started either
// way, finds the worker beside itself and survives its end; the command line comes to the same without one.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { build, type Plugin } from 'esbuild';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { ProtocolClient } from '../support/protocol-client.ts';

const folder = mkdtempSync(path.join(tmpdir(), 'stokehold-'));
const support = path.resolve(import.meta.dirname, '../support');
const URI = 'file:///ships/main.stoke';

/** Puts the jobs of the tests in the place of the product's, and their kind in that of `compare`. */
const withTestWork: Plugin = {
  name: 'with-test-work',
  setup(bundling) {
    const loaded = (contents: string) => ({ contents, loader: 'ts' as const, resolveDir: support });
    bundling.onLoad({ filter: /server\/jobs\/jobs\.ts$/ }, () =>
      loaded(`export { jobTable as jobs } from './job-table.ts';`),
    );
    bundling.onLoad({ filter: /scenario\/kinds\/registry\.ts$/ }, ({ path: file }) => {
      const kind = /^ {2}compare,$/m;
      const source = readFileSync(file, 'utf8');
      if (!kind.test(source)) throw new Error("the registry has no 'compare' to put the test's kind in for");
      const imports = `import { compareOf } from '${support}/long-work-kind.ts';\nimport { sumUpTo } from '${support}/job-table.ts';\n`;
      return { ...loaded(imports + source.replace(kind, '  compareOf(sumUpTo),')), resolveDir: path.dirname(file) };
    });
  },
};

beforeAll(async () => {
  const source = (file: string): string => path.resolve(import.meta.dirname, '../../server', file);
  await build({
    entryPoints: { server: source('main.ts'), cli: source('cli.ts'), worker: source('jobs/worker.ts') },
    outdir: folder,
    outExtension: { '.js': '.cjs' },
    plugins: [withTestWork],
    bundle: true,
    platform: 'node',
    format: 'cjs',
    target: 'node20',
    logLevel: 'warning',
  });
}, 60_000);
afterAll(() => {
  rmSync(folder, { recursive: true });
});

const TEXT = 'compare a {\n  of: 4\n}\nexpect total of a = 11\n';

it.each([['server.cjs'], ['cli.cjs', 'serve']])(
  '%s has it done by the worker beside it, and survives it',
  async (...words) => {
    const [program = '', ...rest] = words.filter((word) => word !== undefined);
    const client = ProtocolClient.ofProgram(process.execPath, [path.join(folder, program), ...rest, '--stdio'], {
      folders: ['file:///ships'],
    });
    await client.initialize();
    // On the server's own thread, this would end the server.
    await client.open(URI, `${TEXT}compare b {\n  of: 666\n}\n`);
    const codes = ['expect/failed', 'program/failed'];
    const { diagnostics } = await client.diagnostics(URI, (sent) => sent.diagnostics.length === codes.length);
    expect(diagnostics.map(({ code }) => code).sort()).toEqual(codes);
    expect(JSON.stringify(diagnostics)).toContain('the worker ended under the job');
    const version = await client.change(URI, TEXT.replace('11', '10'));
    expect((await client.diagnosticsOf(URI, version)).diagnostics).toEqual([]);
    expect(client.logged).toEqual([]);
    await client.stop();
  },
);

it('the command line does it on the spot', () => {
  const args = [path.join(folder, 'cli.cjs'), 'evaluate', '-', '--format', 'json'];
  const { stdout, stderr, status } = spawnSync(process.execPath, args, { input: TEXT, encoding: 'utf8' });
  expect([status, stderr]).toEqual([1, '']);
  expect(stdout).toMatch(/"total"[^}]*10\b/s);
});
