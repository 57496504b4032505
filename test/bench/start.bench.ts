// Times how soon a person sees something: from the start of the server's program (first argument) to the first findings on
// the example Dunlin, beside the start of an empty Node process in the same minutes.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { ProtocolClient } from '../support/protocol-client.ts';
import { print, quantile } from './measured.ts';

const ROUNDS = 9;
const server = process.argv[2];
if (!server) throw new Error('the first argument is the server to start');
const file = path.resolve('examples/dunlin.stoke');
const uri = pathToFileURL(file).href;
const text = readFileSync(file, 'utf8');
const files = new Map(
  ['examples/house/suppliers.stoke'].map((used) => [
    pathToFileURL(path.resolve(used)).href,
    readFileSync(used, 'utf8'),
  ]),
);

const empty: number[] = [];
const first: number[] = [];
for (let round = 0; round < ROUNDS; round++) {
  empty.push(await startEmpty());
  first.push(await startServer(server));
}
const emptyMs = quantile(empty, 0.5);
const firstMs = quantile(first, 0.5);
print({ name: 'start of an empty Node process, median', value: emptyMs, unit: 'ms' });
print({ name: 'first findings on the tour, median', value: firstMs, unit: 'ms', budget: 500 });
print({ name: 'the same, in starts of an empty Node process', value: firstMs / emptyMs, unit: 'x', budget: 4 });

async function startEmpty(): Promise<number> {
  const start = performance.now();
  await once(spawn(process.execPath, ['-e', '0'], { stdio: 'ignore' }), 'exit');
  return performance.now() - start;
}

async function startServer(program: string): Promise<number> {
  const start = performance.now();
  const client = ProtocolClient.ofProgram(process.execPath, [program, '--stdio'], {
    files,
    folders: [pathToFileURL(path.dirname(file)).href],
    settings: { pause: 0 },
  });
  await client.initialize();
  await client.open(uri, text);
  await client.diagnosticsOf(uri, 1);
  const took = performance.now() - start;
  await client.stop();
  return took;
}
