// Times the thermochemical data: loading all phases in a fresh process, and g/RT of 400 phases at one temperature.
// Prints one JSON line a measurement: name, value, unit, budget. Knows no other bench. A measurement over its budget is
// printed like any other; whoever runs the bench judges. The value is the least of several rounds: other work on the machine
// only ever adds to it.

import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import os from 'node:os';
import path from 'node:path';
import { build } from 'esbuild';

const root = path.resolve(import.meta.dirname, '../..');
const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-bench-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true }));

const bundle = path.join(scratch, 'phases.cjs');
await build({
  stdin: {
    contents: `export { allPhases } from './phases.ts';
export { fillEnthalpies, fillGibbs, preparePropertySet } from './property-set.ts';`,
    resolveDir: path.join(root, 'server/core/substance'),
    loader: 'ts',
  },
  bundle: true,
  minify: true,
  format: 'cjs', // as the programs are bundled
  outfile: bundle,
  logLevel: 'error',
});

const loading = `const start = performance.now();
const { allPhases } = require(${JSON.stringify(bundle)});
allPhases();
console.log(performance.now() - start);`;
print('all phases loaded', leastOfFreshProcesses(loading), 'ms', 25);

const preparing = `const { allPhases, preparePropertySet } = require(${JSON.stringify(bundle)});
const phases = allPhases().slice(0, 400);
const start = performance.now();
preparePropertySet(phases.map((phase) => phase.curve));
console.log(performance.now() - start);`;
print('400 phases prepared for a search, the first time', leastOfFreshProcesses(preparing), 'ms');

const { allPhases, fillEnthalpies, fillGibbs, preparePropertySet } = createRequire(import.meta.url)(bundle);
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

/** What a script prints, the least of fifteen fresh processes. */
function leastOfFreshProcesses(script) {
  const run = () => Number(spawnSync(process.execPath, ['-e', script], { encoding: 'utf8' }).stdout);
  return Math.min(...Array.from({ length: 15 }, run));
}

/** Microseconds a call, the least of forty rounds after some to warm up. */
function time(evaluate) {
  const rounds = Array.from({ length: 45 }, () => {
    const start = performance.now();
    for (const temperatureK of temperaturesK) evaluate(temperatureK);
    return ((performance.now() - start) * 1000) / temperaturesK.length;
  });
  return Math.min(...rounds.slice(5));
}

function print(name, value, unit, budget) {
  console.log(JSON.stringify({ name, value: Number(value.toPrecision(3)), unit, budget }));
}
