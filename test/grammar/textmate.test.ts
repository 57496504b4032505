// The colouring that stands before (and without) the language server, run by the very engine the editor uses.
// Cases are written as a line and the scopes of its parts; the engine's rule stack is compared too, because the
// grammar is flat on purpose: a broken line must never colour the next one.
import { readFileSync, readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import fc from 'fast-check';
import { createOnigScanner, createOnigString, loadWASM } from 'vscode-oniguruma';
import { INITIAL, Registry, parseRawGrammar, type IGrammar } from 'vscode-textmate';
import { beforeAll, describe, expect, test } from 'vitest';
import { BASIS_WORDS, KIND_WORDS, PHASE_WORDS, RESERVED_WORDS } from '../../grammar/words.ts';
import { listUnitWords } from '../../server/core/quantity/unit-words.ts';

const grammarPath = 'grammar/stokehold.tmLanguage.json';
let grammar: IGrammar;

beforeAll(async () => {
  const wasm = readFileSync(createRequire(import.meta.url).resolve('vscode-oniguruma/release/onig.wasm'));
  await loadWASM(Uint8Array.from(wasm).buffer);
  const registry = new Registry({
    onigLib: Promise.resolve({ createOnigScanner, createOnigString }),
    loadGrammar: () => Promise.resolve(parseRawGrammar(readFileSync(grammarPath, 'utf8'), grammarPath)),
  });
  const loaded = await registry.loadGrammar('source.stokehold');
  if (!loaded) throw new Error('the grammar did not load');
  grammar = loaded;
});

/** Short names for the scopes, so that a case stays readable. */
const shortNames: Record<string, string> = {
  'storage.type.kind': 'kind',
  'entity.name.type': 'name',
  'variable.parameter.entry': 'entry',
  'constant.numeric': 'number',
  'keyword.other.unit': 'unit',
  'variable.other': 'word',
  'keyword.operator.word': 'connective',
  'support.type.formula': 'formula',
  'storage.modifier.phase': 'phase',
  'support.variable.figure': 'figure',
  'keyword.operator.arithmetic': 'arithmetic',
  'keyword.operator.uncertainty': 'uncertainty',
  'constant.numeric.coefficient': 'coefficient',
  'keyword.other.basis': 'basis',
  'keyword.control.scenario': 'scenario',
  'string.quoted.double': 'text',
  'keyword.control.import': 'use',
  'comment.line.number-sign': 'comment',
  'comment.line.documentation': 'doc',
  'storage.type.let': 'let',
  'variable.other.constant': 'constant',
  'keyword.operator.assignment': 'equals',
  'entity.name.type.quoted': 'quoted-name',
  'keyword.other.rest': 'rest',
  'variable.other.quoted': 'quoted',
  'keyword.operator.arrow': 'arrow',
  'keyword.control.acknowledge': 'acknowledge',
  'constant.other.finding-code': 'code',
  'keyword.control.expect': 'expect',
  'keyword.operator.comparison': 'comparison',
  'support.function': 'function',
};

/** A line as `scope[text] scope[text] …`, punctuation left out. */
function colour(line: string): string {
  const parts: { scope: string; start: number; end: number }[] = [];
  for (const { startIndex, endIndex, scopes } of grammar.tokenizeLine(line, INITIAL).tokens) {
    const inner = scopes.filter((scope) => !/^(source|meta|punctuation)\./.test(scope)).at(-1);
    if (inner === undefined) continue;
    const scope = inner.replace('.stokehold', '');
    const last = parts.at(-1);
    if (last && last.scope === scope && last.end === startIndex) last.end = endIndex;
    else parts.push({ scope, start: startIndex, end: endIndex });
  }
  return parts
    .map(({ scope, start, end }) => `${shortNames[scope] ?? scope}[${line.slice(start, end).trim()}]`)
    .join(' ');
}

const cases: [line: string, colours: string][] = [
  ['scenario "a # b"', 'scenario[scenario] text["a # b"]'],
  ['use "x.stoke" # more', 'use[use] text["x.stoke"] comment[# more]'],
  ['## doc', 'doc[## doc]'],
  ['let loss = 3 kW', 'let[let] constant[loss] equals[=] number[3] unit[kW]'],
  ['blend slurry {', 'kind[blend] name[slurry]'],
  ["  blend 'winter mix' {", "kind[blend] quoted-name['winter mix']"],
  ['blend half_typed', 'kind[blend] name[half_typed]'],
  ['blned slurry {', 'word[blned] name[slurry]'],
  ['service: dredging', 'entry[service] word[dredging]'],
  ['  service: dredging', 'entry[service] word[dredging]'],
  ['  cooled to: 900 degC, 350 degC', 'entry[cooled to] number[900] unit[degC] number[350] unit[degC]'],
  ['  by-product: 1.54 kg/kg chlorine', 'entry[by-product] number[1.54] unit[kg/kg] word[chlorine]'],
  ['  of: sodium', 'entry[of] word[sodium]'],
  ['  pCO2: 424 uatm', 'entry[pCO2] number[424] unit[uatm]'],
  ['  a: 1; b: 2 }', 'entry[a] number[1] entry[b] number[2]'],
  ['  x: 2.1 kJ/(kg K)', 'entry[x] number[2.1] unit[kJ/(kg K)]'],
  ['  x: 9.81 m s^-2', 'entry[x] number[9.81] unit[m s^-2]'],
  ['  x: 1e3 W/m²/K', 'entry[x] number[1e3] unit[W/m²/K]'],
  ['  x: −20 °C', 'entry[x] number[−20] unit[°C]'],
  ['  x: 44.0 ± 0.2 MJ/kg', 'entry[x] number[44.0] uncertainty[±] number[0.2] unit[MJ/kg]'],
  ['  x: 44 MJ/kg +/- 2 %', 'entry[x] number[44] unit[MJ/kg] uncertainty[+/-] number[2] unit[%]'],
  ['  x: 210 per year', 'entry[x] number[210] connective[per] unit[year]'],
  [
    '  x: 0.45 kg tank per kg slurry',
    'entry[x] number[0.45] unit[kg] word[tank] connective[per] unit[kg] word[slurry]',
  ],
  [
    '  dredge: 5.5 h at 85 % on main',
    'entry[dredge] number[5.5] unit[h] connective[at] number[85] unit[%] connective[on] word[main]',
  ],
  ['  vary: x at 33 points', 'entry[vary] word[x] connective[at] number[33] word[points]'],
  ['  test cycle: E3', 'entry[test cycle] word[E3]'],
  ["  30 % mass  'sodium oleate'", "number[30] unit[%] basis[mass] quoted['sodium oleate']"],
  ['  rest       diesel', 'rest[rest] word[diesel]'],
  ['  2 mol K', 'number[2] unit[mol] formula[K]'],
  ['  84.9 % C, 15.1 % H', 'number[84.9] unit[%] formula[C] number[15.1] unit[%] formula[H]'],
  ['  5 g K(l)', 'number[5] unit[g] formula[K] phase[l]'],
  [
    '  2 Na(cr) + 1/2 O2(g) -> Na2O(cr)',
    'coefficient[2] formula[Na] phase[cr] arithmetic[+] coefficient[1/2] formula[O2] phase[g] arrow[->] formula[Na2O] phase[cr]',
  ],
  ['  3.76 N2 + 2 CO → x', 'coefficient[3.76] formula[N2] arithmetic[+] coefficient[2] formula[CO] arrow[→] word[x]'],
  [
    '  Na+ + CO3^2-(aq) + e- -> X',
    'formula[Na+] arithmetic[+] formula[CO3^2-] phase[aq] arithmetic[+] formula[e-] arrow[->] word[X]',
  ],
  [
    '  x: MgCl2.6H2O, Fe0.947O, Ca(OH)2, MgCl2·6H₂O',
    'entry[x] formula[MgCl2.6H2O] formula[Fe0.947O] formula[Ca(OH)2] formula[MgCl2·6H₂O]',
  ],
  ['  acknowledge hazard/water-reactive: "note"', 'acknowledge[acknowledge] code[hazard/water-reactive] text["note"]'],
  [
    'expect lower heating value of slurry > 33 MJ/kg',
    'expect[expect] figure[lower heating value] connective[of] word[slurry] comparison[>] number[33] unit[MJ/kg]',
  ],
  [
    'expect sodium in slurry by mole within 40 % ± 2 %',
    'expect[expect] word[sodium] connective[in] word[slurry] connective[by] basis[mole] connective[within] number[40] unit[%] uncertainty[±] number[2] unit[%]',
  ],
  [
    'let a = min(3 kW, power of main)',
    'let[let] constant[a] equals[=] function[min] number[3] unit[kW] figure[power] connective[of] word[main]',
  ],
  ["  fuel: 'never closed", "entry[fuel] quoted['never closed]"],
  ['  source: "never closed # {', 'entry[source] text["never closed # {]'],
];

test.each(cases)('%s', (line, expected) => {
  expect(colour(line)).toEqual(expected);
});

describe('word lists', () => {
  /** Every alternation of the grammar file that begins with a word, as its words. */
  const alternations = (first: string): string[][] =>
    [...readFileSync(grammarPath, 'utf8').matchAll(new RegExp(`\\((?:\\?[:!])?(${first}\\|[a-z|]+)\\)`, 'g'))].map(
      (match) => (match[1] ?? '').split('|'),
    );

  test.each([
    ['reserved words', 'let', RESERVED_WORDS],
    ['kinds', 'substance', KIND_WORDS],
    ['bases', 'mass', BASIS_WORDS],
    ['phases', 'g', PHASE_WORDS],
  ])('the %s are those of words.ts wherever they are listed', (_, first, words) => {
    const lists = alternations(first);
    expect(lists.length).toBeGreaterThan(0);
    // Behind the reserved words a list may name further words that are no unit.
    const noUnits = new Set<string>([...BASIS_WORDS, 'points']);
    for (const list of lists) {
      const bare = first === 'let' ? list.filter((word) => !noUnits.has(word)) : list;
      expect(bare.toSorted()).toEqual(words.toSorted());
    }
  });

  test.each(KIND_WORDS)('%s opens a definition, with or without its brace', (word) => {
    expect(colour(`${word} x {`)).toBe(`kind[${word}] name[x]`);
    expect(colour(`${word} x`)).toBe(`kind[${word}] name[x]`);
    expect(colour(`  ${word}: x`)).toBe(`entry[${word}] word[x]`);
  });

  test.each(RESERVED_WORDS)('%s is never coloured as a name', (word) => {
    expect(colour(`  x: a ${word} b`)).toMatch(new RegExp(`connective\\[${word}\\]`));
  });
});

test('every unit of the table is coloured behind a number, under a stroke, with a power and behind `per`', () => {
  const plain: string[] = [];
  for (const unit of listUnitWords().keys()) {
    for (const [line, shown] of [
      [`x: 3 ${unit}`, `unit[${unit}]`],
      [`x: 3 kg/${unit}`, `unit[kg/${unit}]`],
      // Only units spelt with letters are ever raised.
      /^\p{L}/u.test(unit) ? [`x: 3 ${unit}^2`, `unit[${unit}^2]`] : [`x: 3 ${unit}`, `unit[${unit}]`],
      [`x: 3 kg air per ${unit} ash`, `connective[per] unit[${unit}]`],
    ] as const) {
      if (!colour(line).includes(shown)) plain.push(line);
    }
  }
  expect(plain).toEqual([]);
});

describe('laws over all examples and any text', () => {
  const examples = readdirSync('examples', { recursive: true, encoding: 'utf8' }).filter(
    // Broken on purpose, some with characters that mean nothing.
    (path) => path.endsWith('.stoke') && !path.startsWith('errors'),
  );

  test.each(examples)('no visible character of %s is left without a scope', (path) => {
    for (const line of readFileSync(`examples/${path}`, 'utf8').split(/\r?\n/)) {
      const bare = grammar
        .tokenizeLine(line, INITIAL)
        .tokens.filter((token) => token.scopes.every((scope) => /^(source|meta)\./.test(scope)))
        .map((token) => line.slice(token.startIndex, token.endIndex).trim())
        .filter((text) => text !== '');
      expect(bare, line).toEqual([]);
    }
  });

  test('no line changes the colours of the next', () => {
    const pieces = fc.constantFrom(
      ...' "\'#{}():;,-+>abC2./%'.split(''),
      'let ',
      'blend x {',
      '-> ',
      'Na+',
      ' kg',
      '1',
    );
    fc.assert(
      fc.property(fc.array(pieces, { maxLength: 40 }), (parts) => {
        const after = grammar.tokenizeLine(parts.join(''), INITIAL).ruleStack;
        expect(after.depth).toBe(1);
      }),
      { numRuns: 300 },
    );
  });
});
