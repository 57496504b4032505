// Rows of messages.test.ts of what is written: syntax, names, units, claims and kinds: a shape of each fact and what a person reads of it.
import { dimensionOf } from '../../../server/core/quantity/dimension.ts';
import type { Fact, Sided } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

const place = { path: 'trial.stoke', start: 0, end: 1 };
const power = quantity(1, 'W');
const flow: Sided = { text: 'feed', ...quantity(1, 'kg/s') };
const warm: Sided = { text: '20 degC', ...quantity(20, 'degC', 0, 'temperature') };
const hot: Sided = { text: '100 degC', ...quantity(100, 'degC', 0, 'temperature') };
const pressure = dimensionOf({ mass: 1, length: -1, time: -2 });

export const LANGUAGE_ROWS: readonly (readonly [Fact, string])[] = [
  [
    {
      code: 'syntax/missing',
      problem: { code: 'syntax/missing', span: { start: 0, end: 1 }, message: 'A `}` is missing.' },
    },
    'A `}` is missing.',
  ],
  [
    { code: 'name/unknown', what: 'substance', word: 'H20', near: ['H2O'] },
    'Neither the catalogue nor this scenario has a substance or blend called `H20`. Did you mean `H2O`?',
  ],
  [
    { code: 'name/unknown', what: 'substance', word: 'Slurry X', near: [] },
    "Neither the catalogue nor this scenario has a substance or blend called `Slurry X`. Define it with `substance 'Slurry X' { … }`, or look for another name in the catalogue.",
  ],
  [
    { code: 'name/unknown', what: 'definition', word: 'main', near: [] },
    'Nothing in this scenario is called `main`. Define it here, or `use` the file that does.',
  ],
  [
    { code: 'name/unknown', what: 'figure', word: 'heating value', owner: 'slurry', near: ['lower-heating-value'] },
    '`slurry` has no figure called `heating value`. Did you mean `lower heating value`?',
  ],
  [
    { code: 'name/unknown', what: 'value', word: 'days', near: [] },
    'No value is called `days`. Give it one with `let`, or correct the name.',
  ],
  [
    { code: 'name/unknown', what: 'function', word: 'mni', near: ['min'] },
    'There is no function called `mni`. Did you mean `min`?',
  ],
  [{ code: 'name/unknown', what: 'element', word: 'Xx', near: [] }, '`Xx` is not the symbol of a chemical element.'],
  [
    { code: 'name/unknown', what: 'portion', word: 'sodium', owner: 'slurry', near: [] },
    '`sodium` is not a portion of `slurry`.',
  ],
  [{ code: 'name/unknown', what: 'code', word: 'hazard/x', near: [] }, 'No finding has the code `hazard/x`.'],
  [
    {
      code: 'name/unknown',
      what: 'word',
      word: 'solidd',
      owner: 'phase',
      near: [],
      allowed: ['solid', 'liquid', 'gas'],
    },
    '`phase` does not take the word `solidd`. It can be `solid`, `liquid` or `gas`.',
  ],
  [
    { code: 'name/unknown-kind', word: 'blnd', near: ['blend'] },
    '`blnd` is not a kind of definition. Did you mean `blend`?',
  ],
  [
    { code: 'name/duplicate', name: 'a', others: [{ ...place, path: 'house/b.stoke' }] },
    '`a` is defined more than once (also in house/b.stoke), so it could mean either. Rename one of them.',
  ],
  [
    { code: 'name/reserved', name: 'bar', why: 'unit' },
    '`bar` is a unit and cannot be a name. Choose another, for example `bar_1`.',
  ],
  [
    { code: 'name/like-catalogue', name: 'methanol', substance: 'methanol' },
    '`methanol` is also a substance of the catalogue. In this scenario it means this definition.',
  ],
  [{ code: 'name/cycle', path: ['a', 'a'] }, '`a` is defined by itself. Give it a value that does not need it.'],
  [
    { code: 'name/cycle', path: ['a', 'b', 'c', 'a'] },
    'These definitions depend on each other in a circle: `a` needs `b`, `b` needs `c` and `c` needs `a` again. Break the circle at one of them.',
  ],
  [
    { code: 'name/use-cycle', path: ['x/a.stoke', 'x/b.stoke', 'x/a.stoke'] },
    'These files use each other in a circle: `a.stoke`, then `b.stoke`, then `a.stoke`. Remove one of the `use` lines.',
  ],
  [{ code: 'name/use-cycle', path: ['a.stoke', 'a.stoke'] }, 'This file uses itself. Remove the `use`.'],
  [
    { code: 'name/missing-file', path: 'x.stoke', why: 'missing' },
    'No file `x.stoke` is found from the folder of this file. Correct the path, or create the file.',
  ],
  [
    { code: 'name/missing-file', path: 'x.stoke', why: 'unreadable', detail: 'It is a folder.' },
    'The file `x.stoke` is there but cannot be read. It is a folder.',
  ],
  [
    { code: 'name/missing-file', path: '../x.stoke', why: 'outside', detail: 'Only files in /home/a may be used.' },
    'The file `../x.stoke` lies outside the folder whose files may be used. Only files in /home/a may be used. Move it inside, or work from a folder higher up.',
  ],
  [
    { code: 'name/missing-file', path: 'C:\\x', why: 'not-relative' },
    '`C:\\x` is not a relative path. Write it as seen from the folder of this file, with `/` and without a drive or scheme.',
  ],
  [
    { code: 'name/unknown-entry', entry: 'colour', kind: 'engine', near: [], known: ['cycle', 'fuel'] },
    'An engine has no entry `colour`. It has `cycle` and `fuel`.',
  ],
  [
    { code: 'name/unknown-entry', entry: 'fule', kind: 'burn', near: ['fuel'], known: ['fuel'] },
    'A burn has no entry `fule`. Did you mean `fuel`?',
  ],
  [
    { code: 'name/repeated-entry', entry: 'density', first: place },
    '`density` is already given in this definition. Keep one of the two.',
  ],
  [
    { code: 'name/missing-entry', kind: 'substance', name: 'x', entries: ['formula', 'composition'] },
    'The substance `x` needs `formula: …` or `composition: …`. Add it inside the braces.',
  ],
  [
    { code: 'name/missing-entry', kind: 'reaction', name: 'x', entries: ['an equation'] },
    'The reaction `x` needs an equation. Add it inside the braces.',
  ],
  [
    { code: 'name/unknown-phrase', entry: 'stored', text: 'red', takes: 'a temperature and a pressure' },
    '`stored` cannot be read with `red`. It takes a temperature and a pressure.',
  ],
  [
    {
      code: 'name/unknown-state',
      text: '350 degC',
      owner: 'lamp',
      kind: 'burn',
      states: [quantity(900, 'degC', 0, 'temperature'), quantity(150, 'degC', 0, 'temperature')],
    },
    '`lamp` has no state at `350 degC`, only at 900 °C and 150 °C. List the temperature in its definition, under `cooled to`.',
  ],
  [
    { code: 'name/unknown-state', text: '350 degC', owner: 'lamp', kind: 'burn', states: [] },
    '`lamp` has no state at `350 degC`. List the temperature in its definition, under `cooled to`.',
  ],
  [
    {
      code: 'name/unknown-state',
      text: '900 K',
      owner: 'route',
      kind: 'reaction',
      states: [1, 2, 3, 4, 5, 6, 7, 8].map((value) => quantity(100 * value, 'degC', 0, 'temperature')),
    },
    '`route` has no state at `900 K`, only at 100 °C, 200 °C, 300 °C, 400 °C, 500 °C, 600 °C and 2 more.',
  ],
  [
    { code: 'name/arguments', name: 'min', takes: 'two values or more', given: 1 },
    '`min` is given 1 value. It takes two values or more.',
  ],
  [
    { code: 'name/unexpected-line', kind: 'blend', line: 'equation' },
    'A blend has no equation. Put it in a definition of its own: `reaction name { … }`.',
  ],
  [
    { code: 'name/unexpected-line', kind: 'reaction', line: 'equation' },
    'A reaction has one equation, and this is a second one. Put it in a reaction of its own.',
  ],
  [
    { code: 'name/unexpected-line', kind: 'reaction', line: 'portion' },
    'A reaction has no portions. If this is an entry, write a colon behind its words; portions belong in a `blend` or an `oxidant`.',
  ],
  [
    { code: 'name/wrong-kind', name: 'burnout', is: 'a reaction', needed: 'a substance or blend' },
    '`burnout` is a reaction, but a substance or blend is needed here.',
  ],
  [
    { code: 'name/acknowledged', why: 'not-a-hazard', acknowledged: 'unit/mismatch' },
    '`unit/mismatch` is not a hazard, and only hazards can be acknowledged. Mend what is found, or remove this line.',
  ],
  [
    { code: 'name/acknowledged', why: 'no-reason', acknowledged: 'hazard/fire' },
    'The reason is missing. Say why `hazard/fire` is in order here, in quotes: `acknowledge hazard/fire: "…"`.',
  ],
  [
    { code: 'name/acknowledged', why: 'unknown-code', acknowledged: 'hazard/fire' },
    'No hazard has the code `hazard/fire`. Completion lists those there are.',
  ],
  [
    { code: 'name/acknowledged', why: 'not-there', acknowledged: 'hazard/toxic', line: place },
    '`hazard/toxic` is not found here, or no longer: this line accepts nothing. Remove it.',
  ],
  [
    { code: 'unit/unknown', word: 'F', near: ['degF'], hint: 'F is fluorine here, not farad or Fahrenheit.' },
    '`F` is not a unit here. F is fluorine here, not farad or Fahrenheit. Did you mean `degF`?',
  ],
  [
    { code: 'unit/missing', needed: pressure, example: 'bar' },
    '`10` has no unit, but a pressure (Pa) is needed here. Write for example `10 bar`.',
  ],
  [
    { code: 'unit/mismatch', form: 'place', found: flow, needed: power, example: 'kW' },
    '`feed` is a mass flow (kg/s), but a power (W) is needed here. Give it for example in `kW`.',
  ],
  [
    { code: 'unit/mismatch', form: 'sides', operation: 'add', left: flow, right: warm },
    '`feed` is a mass flow (kg/s) and `20 degC` is a temperature (K); they cannot be added to each other.',
  ],
  [
    { code: 'unit/two-temperatures', left: warm, right: hot, asDifference: '100 K' },
    '`20 degC` and `100 degC` are both temperatures and cannot be added. Is the second one a difference? Write `100 K`.',
  ],
  [
    { code: 'unit/temperature', why: 'difference-needed', text: '5 degC' },
    '`5 degC` is a temperature, but a temperature difference is needed here. Write it in K, for example `100 K`.',
  ],
  [
    { code: 'unit/gauge', why: 'absolute-needed', text: '3 barg', absolutePa: 401325 },
    '`3 barg` has a gauge pressure where an absolute one is needed. Over the standard atmosphere it is `4.013 bar` absolute.',
  ],
  [
    { code: 'unit/exponent', text: '1.5', base: { text: '3 m', ...quantity(3, 'm') } },
    '`3 m` (a length (m)) cannot be raised to `1.5`. An exponent is a plain number, and a whole one where the base has a unit.',
  ],
  [
    { code: 'unit/uncertainty', text: '44 ± -2', why: 'negative' },
    '`44 ± -2` has an uncertainty below zero. Write it as a positive number.',
  ],
  [
    { code: 'unit/ambiguous', text: 'J/kg K', offers: ['J/(kg K)'], why: 'brackets' },
    '`J/kg K` can be read in two ways. Write `J/(kg K)`.',
  ],
  [
    {
      code: 'expect/failed',
      claim: 'lower heating value of slurry > 33 MJ/kg',
      found: quantity(32.1, 'MJ/kg'),
      unit: 'MJ/kg',
      limit: quantity(33, 'MJ/kg'),
      tolerance: null,
    },
    '`lower heating value of slurry > 33 MJ/kg` does not hold: found 32.1 MJ/kg, 0.9 MJ/kg below 33 MJ/kg.',
  ],
  [
    {
      code: 'expect/failed',
      claim: 'flame temperature of b within 2000 K ± 200 K',
      found: quantity(2250, 'K', 0, 'temperature'),
      unit: 'K',
      limit: quantity(2000, 'K', 0, 'temperature'),
      tolerance: quantity(200, 'K', 0, 'temperature-difference'),
    },
    '`flame temperature of b within 2000 K ± 200 K` does not hold: found 2250 K, 250 K above 2000 K, where 200 K is allowed.',
  ],
  [
    {
      code: 'expect/failed',
      claim: 'a < 2',
      found: quantity(2, '1'),
      unit: null,
      limit: quantity(2, '1'),
      tolerance: null,
    },
    '`a < 2` does not hold: found 2, exactly the limit.',
  ],
  [
    { code: 'kind/suspended', problems: 17, hidden: 2 },
    '2 further findings about this file are told once fewer than 16 of its lines are unreadable (now 17).',
  ],
  [
    { code: 'kind/not-evaluated', kind: 'engine', name: 'main' },
    '`main` is an engine, which this version reads but does not work out yet. What refers to it has no value.',
  ],
  [
    { code: 'program/failed', message: 'x is undefined' },
    'Working this out failed by a fault of the program, not of the scenario: `x is undefined`. Please report it with these lines.',
  ],
];
