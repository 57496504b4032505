// Runs the benches of test/bench/, each in a process of its own, and prints all measurements with their budgets as a
// table; `--json FILE` writes them down too, `--long` types for a minute, and words name the benches to run. A measurement
// over its budget is marked and fails nothing: machines differ, and are busy. Fails when a bench itself fails.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { build } from 'esbuild';
import { jsonAsText } from './json-text.mjs';

const root = path.resolve(import.meta.dirname, '..');
process.chdir(root);
const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-bench-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true }));

const args = process.argv.slice(2);
const jsonAt = args.indexOf('--json');
const jsonFile = jsonAt < 0 ? undefined : args.splice(jsonAt, 2)[1];
const isLong = args.includes('--long');
const words = args.filter((word) => !word.startsWith('--'));

const folder = 'test/bench';
const benches = readdirSync(folder)
  .filter((name) => /\.bench\.(ts|mjs)$/.test(name))
  .filter((name) => words.length === 0 || words.some((word) => name.startsWith(word)));

// As the package has it.
const server = await bundle('server/main.ts', 'server.cjs', { format: 'cjs', minify: true });
await bundle('server/jobs/worker.ts', 'worker.cjs', { format: 'cjs', minify: true });
const worker = await bundle('test/support/job-worker.ts', 'job-worker.cjs', { format: 'cjs', minify: true });

const measurements = [];
let failed = 0;
for (const name of benches) {
  const source = path.join(folder, name);
  const program = name.endsWith('.ts') ? await bundle(source, name.replace(/ts$/, 'mjs'), { format: 'esm' }) : source;
  const flags = isLong ? ['--long'] : [];
  const { status, stdout } = spawnSync(process.execPath, [program, server, worker, ...flags], {
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  if (status !== 0) failed++;
  const lines = stdout.split('\n').filter((line) => line.startsWith('{'));
  const found = lines.map((line) => ({ bench: name.replace(/\.bench\..*$/, ''), ...JSON.parse(line) }));
  measurements.push(...found);
  printTable(found);
}

if (jsonFile !== undefined) {
  const machine = { node: process.version, cpu: os.cpus()[0]?.model, cores: os.cpus().length, load: os.loadavg() };
  writeFileSync(jsonFile, `${JSON.stringify({ machine, measurements }, undefined, 1)}\n`);
}
const over = measurements.filter(({ value, budget }) => budget !== undefined && value > budget);
console.log(
  `\n${measurements.length} measurements, ${over.length} over their budgets; load ${os.loadavg()[0].toFixed(1)}`,
);
process.exit(failed === 0 ? 0 : 1);

function printTable(rows) {
  for (const { name, value, unit, budget, cpu, note } of rows) {
    const shown = value === null ? '-' : `${value} ${unit}`;
    const limit = budget === undefined ? '' : `under ${budget}`;
    const mark = budget !== undefined && value > budget ? 'OVER' : '';
    const beside = [cpu === undefined ? '' : `cpu ${cpu} ${unit}`, note ?? ''].filter((word) => word !== '').join('; ');
    console.log(`${name.padEnd(74)} ${shown.padStart(11)}  ${limit.padEnd(10)} ${mark.padEnd(5)} ${beside}`.trimEnd());
  }
}

async function bundle(source, name, options) {
  const outfile = path.join(scratch, name);
  await build({
    absWorkingDir: root,
    entryPoints: [source],
    outfile,
    bundle: true,
    platform: 'node',
    target: 'node20',
    logLevel: 'error',
    plugins: [jsonAsText],
    // Packages in CommonJS look for `require`, which a module does not have by itself. Where a package has modules too,
    // they are taken: not every other form of one can be bundled.
    ...(options.format === 'esm'
      ? {
          mainFields: ['module', 'main'],
          banner: {
            js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);",
          },
        }
      : {}),
    ...options,
  });
  return outfile;
}
