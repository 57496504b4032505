// Times the way from text to tree, and from tree to findings, without a protocol: a large file parsed as a whole and after
// each key, and evaluated with nothing known by heart, once in a fresh program and then warm.
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

const first = await timed(work);
print({
  name: `whole evaluation cold (${lines} lines, first of the program)`,
  value: first.ms,
  cpu: first.cpuMs,
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

async function many(count: number, body: () => unknown): Promise<Round[]> {
  const rounds: Round[] = [];
  for (let round = 0; round < count; round++) rounds.push(await timed(body));
  return rounds;
}

/** The rate of the JSON language service's parser on a text of the same size, where that package is at hand. */
async function jsonRate(): Promise<string> {
  const name = 'vscode-json-languageservice';
  let service: JsonService;
  try {
    const loaded: unknown = await import(name);
    if (!isJsonService(loaded)) return 'not measured';
    service = loaded;
  } catch {
    return 'not measured';
  }
  const rows = Array.from({ length: 2000 }, (_, row) => ({ row, of: 'a list', share: row / 7 }));
  const json = JSON.stringify(rows, undefined, 1);
  const { parseJSONDocument } = service.getLanguageService({});
  const document = service.TextDocument.create('a:b', 'json', 1, json);
  const best = Math.min(...(await many(60, () => parseJSONDocument(document))).map(({ ms }) => ms));
  return `${(json.length / 1e6 / (best / 1000)).toPrecision(3)} MB/s`;
}

interface JsonService {
  getLanguageService(options: object): { readonly parseJSONDocument: (document: unknown) => unknown };
  readonly TextDocument: { create(uri: string, language: string, version: number, text: string): unknown };
}

function isJsonService(loaded: unknown): loaded is JsonService {
  return typeof loaded === 'object' && loaded !== null && 'getLanguageService' in loaded && 'TextDocument' in loaded;
}
