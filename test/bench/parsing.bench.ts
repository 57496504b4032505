// Times the way from text to tree, and from tree to findings, without a protocol: a large file parsed as a whole and after
// each key, and evaluated with nothing known by heart, once in a fresh program and then warm.
import { spawnSync } from 'node:child_process';
import { getLanguageService, TextDocument } from 'vscode-json-languageservice';
import { parse } from '../../grammar/parse.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import { keystrokes } from './keystrokes.ts';
import { largeScenario } from './large-scenario.ts';
import { print, printRounds, timed, type Round } from './measured.ts';

const text = largeScenario();
const lines = text.split('\n').length;
const work = (): unknown => findingsOf(evaluate('large.stoke', () => ({ text })));

// Started by itself below, to do the one thing that can be done only once in a program.
if (process.argv.includes('--cold')) {
  console.log(JSON.stringify(await timed(work)));
  process.exit(0);
}
const colds = Array.from({ length: 7 }, coldRound);
print({
  name: `whole evaluation cold, first of the program (${lines} lines), least of seven programs`,
  value: Math.min(...colds.map(({ ms }) => ms)),
  cpu: Math.min(...colds.map(({ cpuMs }) => cpuMs)),
  unit: 'ms',
  budget: 250,
});
printRounds('whole evaluation, program warm, nothing known by heart', await many(15, work), { of: 'median' });

const parses = await many(60, () => parse(text, isUnitWord));
printRounds('parse of the whole file, warm', parses, { of: 'median', budget: 25 });
const megabytes = text.length / 1e6;
const rate = megabytes / (Math.min(...parses.map(({ ms }) => ms)) / 1000);
print({ name: 'parse rate, best', value: rate, unit: 'MB/s', note: `JSON language service: ${await jsonRate()}` });

const reparses: Round[] = [];
let previous = parse(text, isUnitWord);
for (const key of keystrokes(text, 600)) {
  reparses.push(
    await timed(() => {
      previous = parse(key.text, isUnitWord, { previous });
    }),
  );
}
printRounds('re-parse after a key', reparses, { of: 'p95', budget: 3 });

/** Other work on the machine only ever adds to it, so the least of several is the nearest to the truth. */
function coldRound(): Round {
  const { stdout } = spawnSync(process.execPath, [process.argv[1] ?? '', '--cold'], { encoding: 'utf8' });
  const number = (key: string): number => Number(new RegExp(`"${key}":([\\d.e+-]+)`).exec(stdout)?.[1]);
  return { ms: number('ms'), cpuMs: number('cpuMs') };
}

async function many(count: number, body: () => unknown): Promise<Round[]> {
  const rounds: Round[] = [];
  for (let round = 0; round < count; round++) rounds.push(await timed(body));
  return rounds;
}

/** The rate of the JSON language service's parser, on a text of about the same size. */
async function jsonRate(): Promise<string> {
  const rows = Array.from({ length: 1000 }, (_, row) => ({ row, of: 'a list', share: row / 7 }));
  const json = JSON.stringify(rows, undefined, 1);
  const service = getLanguageService({});
  const document = TextDocument.create('a:b', 'json', 1, json);
  const best = Math.min(...(await many(60, () => service.parseJSONDocument(document))).map(({ ms }) => ms));
  return `${(json.length / 1e6 / (best / 1000)).toPrecision(3)} MB/s`;
}
