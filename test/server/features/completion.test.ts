// What is offered where: short scenarios with the cursor, the first offers or some of them, and what must not be there.
import { describe, expect, it } from 'vitest';
import { completion } from '../../../server/features/completion.ts';
import { completionDocumentation } from '../../../server/features/completion-documentation.ts';
import { evaluateFixture } from '../../support/features.ts';
import { checkNoOffers, checkOffers, offersAt, taken, type ExpectedOffers } from '../../support/completion.ts';

const SLURRY = 'blend slurry {\n  30 % mass sodium\n  rest methanol\n}\n';
const BURN = 'burn b {\n  fuel: sodium\n  oxidant: steam\n  oxidant per fuel: 2 kg/kg\n  cooled to: 350 degC\n}\n';
const SHIP = 'let days = 210 per year\nlet heat = 40 MJ/kg\n';

function checkAll(cases: readonly [what: string, marked: string, expected: ExpectedOffers][]): void {
  it.each(cases)('%s', (_, marked, expected) => {
    checkOffers(marked, expected);
  });
}

function checkNone(cases: readonly [what: string, marked: string][]): void {
  it.each(cases)('%s: nothing', (_, marked) => {
    checkNoOffers(marked);
  });
}

describe('at the top level', () => {
  checkAll([
    ['an empty file', '$0', { first: ['substance', 'blend'], has: ['let', 'expect', 'use', 'scenario'] }],
    ['a word begun', 'bl$0', { first: ['blend'], lacks: ['let'] }],
    ['between definitions', `${SLURRY}\n$0\n${SHIP}`, { has: ['blend', 'burn'], lacks: ['stored'] }],
    ['a kind typed whole', 'blend$0', { first: ['blend'] }],
  ]);
  checkNone([
    ['behind a kind, where a new name stands', 'blend sl$0'],
    ['behind `let`', 'let a$0'],
    ['in a comment', '# bl$0'],
    ['in a text', 'scenario "bl$0"'],
    ['in a path', 'use "bl$0'],
    ['behind a closing brace', `${SLURRY.trimEnd()} $0`.replace('} ', '} x ')],
  ]);
});

describe('at the start of a line in a definition', () => {
  checkAll([
    [
      'the entries of the kind',
      'blend f {\n  $0\n}\n',
      { has: ['stored', 'blanket', 'products', 'rest', 'acknowledge'] },
    ],
    ['not those that are given', 'blend f {\n  stored: 20 degC\n  $0\n}\n', { has: ['blanket'], lacks: ['stored'] }],
    ['the given one on its own line', 'blend f {\n  sto$0: 20 degC\n}\n', { first: ['stored'] }],
    ['several words', 'substance x {\n  lower hea$0\n}\n', { first: ['lower heating value'], lacks: ['density'] }],
    ['no second `rest`', 'blend f {\n  rest methanol\n  $0\n}\n', { lacks: ['rest'] }],
    ['without a closing brace', 'blend f {\n  $0', { has: ['stored'] }],
    ['before a definition that follows', `blend f {\n  $0\n\n${SLURRY}`, { has: ['stored'] }],
    ['a reaction takes species too', 'reaction r {\n  Na$0\n}\n', { has: ['Na(cr)', 'Na2CO3(cr)'] }],
    ['no portions in a reaction', 'reaction r {\n  $0\n}\n', { has: ['state'], lacks: ['rest'] }],
    ['a kind that is not worked out', 'fleet e {\n  $0\n}\n', { first: ['acknowledge'] }],
    ['an entry that is broken further on', 'blend f {\n  stored: (\n  $0\n}\n', { lacks: ['stored'] }],
    ['what holds otherwise', 'blend f {\n  st$0\n}\n', { has: ['stored: otherwise 25 °C, 1 bar'] }],
  ]);
});

describe('in the value of an entry', () => {
  checkAll([
    ['listed words', 'substance x {\n  phase: $0\n}\n', { first: ['gas', 'liquid', 'solid'] }],
    ['a listed word begun', 'substance x {\n  phase: li$0\n}\n', { first: ['liquid'], lacks: ['gas'] }],
    ['right behind the colon', 'substance x {\n  phase:$0\n}\n', { first: ['gas'] }],
    ['a substance', 'blend f {\n  blanket: ar$0\n}\n', { first: ['argon'], has: ['argon: Ar(g)'] }],
    [
      'a substance by alias',
      'blend f {\n  blanket: soda$0\n}\n',
      { first: ['soda_ash'], has: ['soda_ash: sodium_carbonate, Na2CO3(cr)'] },
    ],
    ['definitions before the catalogue', `${SLURRY}blend f {\n  blanket: $0\n}\n`, { first: ['slurry'] }],
    ['not the definition itself', 'blend f {\n  blanket: $0\n}\n', { lacks: ['f'] }],
    ['values that fit come first', `${SHIP}substance x {\n  lower heating value: $0\n}\n`, { first: ['heat', 'days'] }],
    [
      'units of a specific energy',
      'substance x {\n  lower heating value: 44 $0\n}\n',
      { first: ['MJ/kg', 'kWh/kg'], lacks: ['kg', 'bar'] },
    ],
    ['units of a temperature', 'substance x {\n  boiling point: 44 $0\n}\n', { has: ['degC', 'K'], lacks: ['bar'] }],
    ['a unit begun', 'substance x {\n  lower heating value: 44 kJ$0\n}\n', { first: ['kJ/kg'], lacks: ['MJ/kg'] }],
    ['a unit behind its slash', 'substance x {\n  lower heating value: 44 kJ/k$0\n}\n', { first: ['kJ/kg'] }],
    ['a unit in brackets', 'substance x {\n  heat capacity: 2.1 kJ/(kg K$0\n}\n', { first: ['kJ/(kg K)'] }],
    ['one of two dimensions', 'substance x {\n  formation enthalpy: 44 M$0\n}\n', { has: ['MJ/kg'] }],
    ['a temperature of a state', 'blend f {\n  stored: 20 $0\n}\n', { has: ['degC', 'bar'] }],
    ['then its pressure', 'blend f {\n  stored: 20 degC, 1 $0\n}\n', { first: ['bar'] }],
    ['on the next line', 'blend f {\n  stored: 20 degC,\n    1 $0\n}\n', { first: ['bar'] }],
    [
      'behind ±, a difference or a share',
      'substance x {\n  boiling point: 44 degC ± 2 $0\n}\n',
      { has: ['K', '%'], lacks: ['degC'] },
    ],
    ['`at` behind a density', 'substance x {\n  density: 780 kg/m3 $0\n}\n', { first: ['at'] }],
    [
      'a temperature behind `at`',
      'substance x {\n  density: 780 kg/m3 at 15 $0\n}\n',
      { has: ['degC'], lacks: ['kg/m3'] },
    ],
    [
      'elements of a composition',
      'substance x {\n  composition: 84 % $0\n}\n',
      { first: ['C', 'H'], lacks: ['sodium'] },
    ],
    ['an element by its name', 'substance x {\n  composition: 84 % C, 3 % Sul$0\n}\n', {}],
    ['products as formulas or names', 'blend f {\n  products: CO2(g), H2O$0\n}\n', { has: ['H2O(g)', 'H2O(l)'] }],
    ['formulas', 'substance x {\n  formula: Na2CO$0\n}\n', { first: ['Na2CO3(cr)'] }],
    ['a catalogue substance where nobody reads yet', 'burn b {\n  fuel: gas_o$0\n}\n', { first: ['gas_oil'] }],
    ['any name where nobody reads yet', `${SLURRY}burn b {\n  fuel: $0\n}\n`, { first: ['slurry'] }],
    ['connectives where nobody reads yet', 'duty d {\n  sail: 38 nmi $0\n}\n', { has: ['at', 'on'] }],
    [
      'names behind a connective there',
      'engine main {\n}\nduty d {\n  sail: 38 nmi at 11 kn on $0\n}\n',
      { first: ['main'] },
    ],
    ['units there', 'duty d {\n  sail: 38 nm$0\n}\n', { first: ['nm', 'nmi'] }],
  ]);
  checkNone([
    ['a number being typed', 'substance x {\n  density: 78$0\n}\n'],
    ['behind a text', 'substance x {\n  source: "a"$0\n}\n'],
    ['behind ±', 'substance x {\n  density: 780 ± $0\n}\n'],
    ['behind an acknowledged code', 'blend f {\n  acknowledge hazard/x$0\n}\n'],
  ]);
});

describe('in a portion', () => {
  checkAll([
    ['units of an amount', 'blend f {\n  30 $0\n}\n', { first: ['%'], has: ['kg', 'mol', 'L'], lacks: ['bar', 'MJ'] }],
    ['bases and substances', 'blend f {\n  30 % $0\n}\n', { first: ['mass', 'mole', 'volume'], has: ['sodium'] }],
    ['substances behind the basis', 'blend f {\n  30 % mass sod$0\n}\n', { first: ['sodium'], lacks: ['mass', 'bar'] }],
    ['substances behind `rest`', `${SLURRY}blend f {\n  rest $0\n}\n`, { first: ['slurry'], has: ['methanol'] }],
    ['what has a space is quoted', "blend f {\n  rest 'sodium ol$0'\n}\n", { first: ['sodium_oleate'] }],
    ['a formula', 'blend f {\n  2 mol Na2$0\n}\n', { has: ['Na2CO3(cr)', 'Na2O(cr)'] }],
    ['an alias', 'blend f {\n  rest diesel$0\n}\n', { first: ['diesel'] }],
    ['own substances', 'substance green {\n}\nblend f {\n  rest gre$0\n}\n', { first: ['green'] }],
    ['no engines', 'engine sodium_engine {\n}\nblend f {\n  rest sod$0\n}\n', { lacks: ['sodium_engine'] }],
    [
      'names of used files',
      'use "u.stoke"\nblend f {\n  rest gr$0\n}\n#- u.stoke\nsubstance green {\n}\n',
      { first: ['green'] },
    ],
  ]);
});

describe('in an equation', () => {
  checkAll([
    ['behind the arrow', 'reaction r {\n  2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2$0\n}\n', { has: ['Na2CO3(cr)'] }],
    ['behind a plus', 'reaction r {\n  2 Na(cr) + O$0\n}\n', { first: ['O2(g)'] }],
    ['behind a coefficient', 'reaction r {\n  2 Na$0\n}\n', { has: ['Na(cr)'], lacks: ['Nm'] }],
    ['by name', 'reaction r {\n  2 sodi$0\n}\n', { first: ['sodium'] }],
  ]);
});

describe('in an expression', () => {
  checkAll([
    [
      'values, figures and functions',
      `${SHIP}${SLURRY}let a = $0\n`,
      {
        first: ['heat'].slice(1),
        has: ['days', 'heat: 40 MJ/kg', 'min', 'lower heating value', 'sodium in slurry: 30 % by mass'],
      },
    ],
    ['not the value itself', 'let a = $0\n', { lacks: ['a'] }],
    [
      'figures with their values',
      `${SLURRY}expect lower hea$0\n`,
      { has: ['lower heating value', 'lower heating value of slurry'], lacks: ['density'] },
    ],
    [
      'names behind `of`',
      `${SLURRY}${SHIP}expect density of $0\n`,
      { first: ['slurry'], has: ['methanol'], lacks: ['days'] },
    ],
    ['`of` an unknown figure', `${SLURRY}expect nonsense of $0\n`, { lacks: ['slurry', 'methanol'] }],
    ['definitions that are not worked out', 'fleet b {\n}\nexpect flame temperature of $0\n', { first: ['b'] }],
    [
      'products in the flame, and none for which a state would have to be solved',
      `${BURN}expect mass share of $0\n`,
      { has: ['H2(g) in b'], lacks: ['H2(g) in b at 350 degC'] },
    ],
    [
      'a burn by its kind, not by what it comes to',
      `${BURN}expect flame temperature of $0\n`,
      { first: ['b'], has: ['b: burn'] },
    ],
    [
      'oxidants and substances, not blends',
      `${SLURRY}oxidant intake {\n  100 % air\n}\nburn b {\n  oxidant: $0\n}\n`,
      { first: ['intake'], has: ['air'], lacks: ['slurry'] },
    ],
    ['rows of a table', `${SLURRY}expect mass share of $0\n`, { has: ['sodium in slurry'] }],
    [
      'blends behind `in`',
      `${SLURRY}blend other {\n  rest methanol\n}\nexpect sodium in $0\n`,
      { first: ['slurry', 'other'] },
    ],
    ['bases behind `by`', `${SLURRY}expect sodium in slurry by $0\n`, { first: ['mass', 'mole', 'volume'] }],
    [
      'units as the left side has',
      `${SLURRY}expect lower heating value of slurry > 33 $0\n`,
      { first: ['MJ/kg'], lacks: ['bar', 'kg'] },
    ],
    [
      'units of a tolerance',
      `${SLURRY}expect density of slurry within 800 kg/m3 ± 5 $0\n`,
      { first: ['kg/m3'], has: ['%'] },
    ],
    ['units as the value has', `${SHIP}expect days > 3 $0\n`, { has: ['1/year'], lacks: ['kg'] }],
    ['a share in percent', `${SLURRY}expect sodium in slurry < 40 $0\n`, { first: ['%'] }],
    ['any unit begun', 'let a = 5 kW$0\n', { first: ['kW', 'kWh'] }],
    ['inside a call', `${SHIP}let a = min(d$0\n`, { first: ['days'] }],
    ['behind an operator', `${SHIP}let a = 2 * d$0\n`, { first: ['days'] }],
    ['behind a division', `${SHIP}let a = 2 kg / d$0\n`, { first: ['days'] }],
    ['on a line of its own', `${SHIP}let a = 2 *\n  d$0\n`, { first: ['days'] }],
    ['a quoted name', "let 'my value' = 1\nlet b = 'my$0\n", { first: ['my value'] }],
    ['substances inside a call that takes one', 'let a = molar_mass(Na2C$0\n', { first: ['Na2CO3(cr)'] }],
    ['substances with the figure asked for', 'expect flash point of $0\n', { has: ['methanol'], lacks: ['argon'] }],
    ['a claim behind a whole figure', `${SLURRY}expect density of slurry $0\n`, { first: ['within'], lacks: ['of'] }],
    ['a basis behind a whole share', `${SLURRY}expect sodium in slurry $0\n`, { first: ['by', 'within'] }],
    [
      'a figure, then whose',
      `${SLURRY}expect lo$0\n`,
      { first: ['lower heating value', 'lower heating value of slurry'] },
    ],
    ['before an unfinished rest', `${SHIP}let a = da$0 +\nlet b = (\n`, { first: ['days'] }],
  ]);
  checkNone([
    ['a number being typed', 'let a = 5$0\n'],
    ['behind a whole quantity', 'let a = 5 kg $0\n'.replace('5 kg $0', '"x" $0')],
  ]);
});

describe('an offer that is taken', () => {
  it.each<[what: string, marked: string, label: string, after: string]>([
    ['takes the place of what is typed', 'blend f {\n  rest sod$0\n}\n', 'sodium', 'blend f {\n  rest sodium\n}\n'],
    [
      'takes the place of all words of an entry',
      'substance x {\n  lower hea$0\n}\n',
      'lower heating value',
      'substance x {\n  lower heating value: \n}\n',
    ],
    [
      'leaves a colon that is there',
      'blend f {\n  sto$0r: 20 degC\n}\n',
      'stored',
      'blend f {\n  stored: 20 degC\n}\n',
    ],
    ['puts a space behind a colon', 'substance x {\n  phase:$0\n}\n', 'liquid', 'substance x {\n  phase: liquid\n}\n'],
    ['writes a whole unit', 'let a = 5 kJ/(k$0\n', 'kJ/(kg K)', 'let a = 5 kJ/(kg K)\n'],
    [
      'writes a whole figure',
      `${SLURRY}expect lower hea$0\n`,
      'lower heating value of slurry',
      `${SLURRY}expect lower heating value of slurry\n`,
    ],
    [
      'quotes a name that needs it',
      "let 'my value' = 1\nlet b = my$0\n",
      'my value',
      "let 'my value' = 1\nlet b = 'my value'\n",
    ],
    [
      'closes a quote once',
      "let 'my value' = 1\nlet b = 'm$0'\n",
      'my value',
      "let 'my value' = 1\nlet b = 'my value'\n",
    ],
    ['drops quotes that are not needed', "blend f {\n  rest 'sod$0'\n}\n", 'sodium', 'blend f {\n  rest sodium\n}\n'],
    ['writes a formula with its phase', 'reaction r {\n  2 Na$0\n}\n', 'Na(cr)', 'reaction r {\n  2 Na(cr)\n}\n'],
  ])('%s', (_, marked, label, after) => {
    expect(taken(marked, label)).toBe(after);
  });

  it.each([
    ['blend', 'blend ${1:name} {\n  ${2:30} % mass ${3:substance}\n  rest ${4:substance}\n}'],
    ['reaction', 'reaction ${1:name} {\n  ${2:2 H2(g) + O2(g)} -> ${3:2 H2O(l)}\n}'],
    ['fleet', 'fleet ${1:name} {\n  $0\n}'],
    ['engine', 'engine ${1:name} {\n  fuel: ${2:}\n}'],
    ['let', 'let ${1:name} = ${0:value}'],
  ])('%s writes a skeleton', (label, snippet) => {
    expect(taken('$0', label, 'snippet')).toBe(snippet);
  });

  it.each([
    ['substance', 'phase', 'phase: ${1|gas,liquid,solid|}'],
    ['substance', 'density', 'density: ${1:845} kg/m3 at 15 degC'],
    ['substance', 'lower heating value', 'lower heating value: ${1:42.7} MJ/kg'],
    ['blend', 'stored', 'stored: ${1:25 degC, 1 bar}'],
    ['blend', 'blanket', 'blanket: $1'],
  ])('an entry of a %s, %s, writes its example', (kind, label, snippet) => {
    expect(taken(`${kind} x {\n  $0\n}\n`, label, 'snippet')).toBe(`${kind} x {\n  ${snippet}\n}\n`);
  });

  it.each(['substance', 'blend', 'oxidant', 'reaction'])('the skeleton of %s parses', (kind) => {
    const snippet = taken('$0', kind, 'snippet').replace(
      /\$\{\d+:([^}]*)\}|\$\d+/g,
      (_, text: string | undefined) => text ?? '',
    );
    const codes = evaluateFixture(snippet).findings.map(({ code }) => code);
    expect(codes.filter((code) => code.startsWith('syntax/'))).toEqual([]);
  });
});

describe('beside an offer', () => {
  const documentationOf = (marked: string, label: string): string => {
    const { scenario, file } = evaluateFixture(marked);
    const item = offersAt(marked).find((one) => one.label === label);
    const found = item?.documentation ?? (item?.subject && completionDocumentation(scenario, file, item.subject));
    return JSON.stringify(found ?? null);
  };

  it.each<[what: string, marked: string, label: string, says: string]>([
    ['a substance has its card', 'blend f {\n  rest $0\n}\n', 'sodium', 'Na, solid'],
    ['an alias has the card of what it stands for', 'blend f {\n  rest soda$0\n}\n', 'soda_ash', 'sodium_carbonate'],
    ['a phase has its own', 'reaction r {\n  2 H2O$0\n}\n', 'H2O(g)', 'gas'],
    ['a definition has its figures', `${SLURRY}blend f {\n  rest $0\n}\n`, 'slurry', 'Lower heating value'],
    ['a value has its number', `${SHIP}let a = $0\n`, 'heat', '40 MJ/kg'],
    ['a figure has how it came about', `${SLURRY}let a = dens$0\n`, 'density of slurry', 'Density'],
    ['an entry has its help', 'blend f {\n  $0\n}\n', 'blanket', 'gas over it'],
    ['a unit has its definition', 'let a = 5 nmi$0\n', 'nmi', '1852'],
    ['a function has its help', 'let a = mi$0\n', 'min', 'smallest'],
  ])('%s', (_, marked, label, says) => {
    expect(documentationOf(marked, label)).toContain(says);
  });
});

describe('a list of offers', () => {
  const isRead = (of: object, key: string): boolean => Object.getOwnPropertyDescriptor(of, key)?.get === undefined;
  const places = [
    'let a = $0',
    'let a = fla$0',
    'expect $0',
    'expect flame temperature of $0',
    'expect mass share of $0',
  ];
  it.each([...places, 'expect sodium in $0', 'expect dew point of $0', 'burn c {\n  fuel: $0\n}'])(
    'behind `%s` has nothing worked out',
    (line) => {
      const { scenario, file, start } = evaluateFixture(`${SLURRY}${BURN}${line}\n`);
      completion(scenario, file, start);
      const definitions = scenario.files.flatMap((one) => one.definitions).filter(({ name }) => name !== 'c');
      expect(definitions.map((one) => [one.name, isRead(one, 'figures')])).toEqual([
        ['slurry', false],
        ['b', false],
      ]);
      const tables = definitions.flatMap((one) => one.tables);
      const solved = tables.filter(({ id }) => id === 'cooled-products' || id === 'condensation');
      expect(solved.map((table) => isRead(table, 'rows'))).toEqual([false, false]);
    },
  );
});
