// Fits the published thermochemical tables and writes what the program carries: `npm run fit -- DIR`, where DIR holds
// index.json and tables/. Writes server/core/substance/data/phases/, examples/reference/fit.md with its plot, and the
// rows and records of the second fit that the tests read. The numbers are those of server/core/substance/fit/.
// `npm run fit -- --page` rewrites the page and its plot alone, from the records as they are, and needs no tables.
// Ends with exit code 1 when a species is over the limits without a written reason, or has one without need.

import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';

const root = path.resolve(import.meta.dirname, '..');
const dataFolder = path.join(root, 'server/core/substance/data');
const families = ['alkali-metals', 'alkaline-earths', 'boron-and-aluminium', 'iron-silicon-titanium', 'non-metals'];
const [argument] = process.argv.slice(2);
const fit = await load('server/core/substance/fit/fit.ts');

if (argument === undefined) {
  console.error('Which folder holds index.json and tables/? Write: npm run fit -- DIR, or npm run fit -- --page.');
  process.exitCode = 1;
} else if (argument === '--page') {
  const records = families.flatMap((family) => readJson(path.join(dataFolder, 'phases', `${family}.json`)));
  writePage(records, readJson(path.join(dataFolder, 'phases', 'residuals.json')));
} else {
  fitAll(path.resolve(argument));
}

function fitAll(folder) {
  const started = Date.now();
  const tables = readJson(path.join(folder, 'index.json')).map((record) =>
    fit.readSourceTable(record, readFileSync(path.join(folder, 'tables', `${record.id}.csv`), 'utf8')),
  );
  const context = fit.fitContext(tables);
  const fitted = tables.map((table, index) => {
    if (process.stdout.isTTY) process.stdout.write(`\r${index + 1} of ${tables.length} `);
    return fit.fitTable(table, context);
  });
  fitted.sort((a, b) => (a.fit.id < b.fit.id ? -1 : 1));
  const records = fitted.map((each) => each.fit);
  const residuals = fitted.map((each) => each.residuals);
  for (const family of families) {
    const own = records.filter((record) => fit.familyOf(record.formula) === family);
    writeFileSync(path.join(dataFolder, 'phases', `${family}.json`), lines(own));
  }
  writeFileSync(path.join(dataFolder, 'phases', 'residuals.json'), lines(residuals));
  writePage(records, residuals);
  writeHeldOut(tables, context);
  const pieces = records.reduce((sum, record) => sum + record.pieces.length, 0);
  console.log(`\n${records.length} phases in ${pieces} pieces, ${Math.round((Date.now() - started) / 1000)} s.`);
  reportOverLimits(residuals);
}

function reportOverLimits(residuals) {
  for (const each of residuals) {
    const over = fit.overLimits(each);
    const reason = fit.reasonsOverLimits[each.phase];
    if (over.length > 0)
      console.log(`${each.phase} is over the limits: ${over.join(', ')}. ${reason ?? 'NO REASON GIVEN'}`);
    else if (reason !== undefined) console.log(`${each.phase} has a reason and is not over the limits.`);
    if (over.length > 0 !== (reason !== undefined)) process.exitCode = 1;
  }
}

function writePage(records, residuals) {
  const limits = readJson(path.join(dataFolder, 'phase-limits.json'));
  const folder = path.join(root, 'examples/reference');
  writeFileSync(path.join(folder, 'fit.md'), fit.fitPage(records, residuals, limits, 'fit-worst.svg'));
  writeFileSync(path.join(folder, 'fit-worst.svg'), fit.fitPlot(residuals));
}

function writeHeldOut(tables, context) {
  const { rows, records } = fit.fitHeldOut(tables, context);
  const source =
    'M. W. Chase Jr., NIST-JANAF Thermochemical Tables, 4th ed. (1998): rows that the fit in test/support/held-out-phases.json did not see; log Kf from G of the row and of the elements in their reference states';
  writeFileSync(
    path.join(root, 'test/reference/janaf-held-out.json'),
    `{\n"source": ${JSON.stringify(source)},\n"rows": ${lines(rows)}}\n`,
  );
  writeFileSync(path.join(root, 'test/support/held-out-phases.json'), lines(records));
}

/** A JSON list with one record a line, so that a change shows as one line. */
function lines(records) {
  return `[\n${records.map((record) => JSON.stringify(record)).join(',\n')}\n]\n`;
}

function readJson(file) {
  return JSON.parse(readFileSync(file, 'utf8'));
}

/** Loads one of our own TypeScript modules. */
async function load(module) {
  const { outputFiles } = await build({
    entryPoints: [path.join(root, module)],
    bundle: true,
    write: false,
    format: 'esm',
    platform: 'node',
    logLevel: 'error',
  });
  return import(`data:text/javascript;base64,${Buffer.from(outputFiles[0].text).toString('base64')}`);
}
