// Times the thermochemical data: loading all phases in a fresh process, and g/RT of 400 phases at one temperature.
// Prints one JSON line a measurement: name, value, unit, budget. Knows no other bench. A measurement over its budget is
// printed like any other; whoever runs the bench judges. The value is the median of several rounds.

import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'esbuild';

const root = path.resolve(import.meta.dirname, '../..');
const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-bench-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true }));

const bundle = path.join(scratch, 'phases.mjs');
await build({
  stdin: {
    contents: `export { allPhases } from './phases.ts';
export { fillEnthalpies, fillGibbs, preparePropertySet } from './property-set.ts';`,
    resolveDir: path.join(root, 'server/core/substance'),
    loader: 'ts',
  },
  bundle: true,
  minify: true,
  format: 'esm',
  outfile: bundle,
  logLevel: 'error',
});

const address = pathToFileURL(bundle).href;
const loading = `const start = performance.now();
const { allPhases } = await import(${JSON.stringify(address)});
allPhases();
console.log(performance.now() - start);`;
const loads = Array.from({ length: 9 }, () =>
  Number(spawnSync(process.execPath, ['--input-type=module', '-e', loading], { encoding: 'utf8' }).stdout),
);
print('all phases loaded', median(loads), 'ms', 25);

const { allPhases, fillEnthalpies, fillGibbs, preparePropertySet } = await import(address);
const set = preparePropertySet(
  allPhases()
    .slice(0, 400)
    .map((phase) => phase.curve),
);
const gibbs = new Float64Array(set.size);
const enthalpies = new Float64Array(set.size);
const heatCapacities = new Float64Array(set.size);
// A search moves by a few kelvin a step, and now and then far.
const temperaturesK = Array.from({ length: 1000 }, (_, k) => 1000 + 3 * (k % 50) + (k % 97 === 0 ? 1500 : 0));
print(
  'g/RT of 400 phases at one temperature',
  time((temperatureK) => fillGibbs(set, temperatureK, gibbs)),
  'µs',
  8,
);
print(
  'h/RT and cp/R of 400 phases at one temperature',
  time((temperatureK) => fillEnthalpies(set, temperatureK, enthalpies, heatCapacities)),
  'µs',
);

/** Microseconds a call, the median of twenty rounds after one to warm up. */
function time(evaluate) {
  const rounds = Array.from({ length: 21 }, () => {
    const start = performance.now();
    for (const temperatureK of temperaturesK) evaluate(temperatureK);
    return ((performance.now() - start) * 1000) / temperaturesK.length;
  });
  return median(rounds.slice(1));
}

function median(values) {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];
}

function print(name, value, unit, budget) {
  console.log(JSON.stringify({ name, value: Number(value.toPrecision(3)), unit, budget }));
}
