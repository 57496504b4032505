// What every code says, one row a shape of its fact: the messages are read here as a person reads them.
import { describe, expect, test } from 'vitest';
import { dimensionOf } from '../../../server/core/quantity/dimension.ts';
import { allCodes, findingsIn } from '../../../server/findings/registry.ts';
import type { Fact, Sided } from '../../../server/scenario/facts.ts';
import type { HazardFact } from '../../../server/scenario/hazard-fact.ts';
import { file, quantity } from '../../support/scenario-builder.ts';
import { SEA_MILD, SEA_ROWS } from './sea-messages.ts';
import { WORK_MILD, WORK_ROWS } from './work-messages.ts';

const place = { path: 'trial.stoke', start: 0, end: 1 };
const power = quantity(1, 'W');
const flow: Sided = { text: 'feed', ...quantity(1, 'kg/s') };
const warm: Sided = { text: '20 degC', ...quantity(20, 'degC', 0, 'temperature') };
const hot: Sided = { text: '100 degC', ...quantity(100, 'degC', 0, 'temperature') };
const pressure = dimensionOf({ mass: 1, length: -1, time: -2 });
const solution = { kind: 'unique', equation: '2 H2 + O2 -> 2 H2O' } as const;

const hazard: Omit<HazardFact, 'code' | 'severity'> = {
  acknowledged: false,
  blend: 'slurry',
  portion: 'sodium',
  partner: null,
  partnerPlace: null,
  happens: 'It reacts with the water that is there.',
  mend: 'Take the water out.',
  source: 'a book',
  numbers: {},
  mends: [],
};

const ROWS: readonly (readonly [Fact, string])[] = [
  ...WORK_ROWS,
  ...SEA_ROWS,
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
    'These definitions go round in a ring: `a` needs `b`, `b` needs `c` and `c` needs `a` again. Break it at one of them.',
  ],
  [
    { code: 'name/use-cycle', path: ['x/a.stoke', 'x/b.stoke', 'x/a.stoke'] },
    'These files use each other in a ring: `a.stoke`, then `b.stoke`, then `a.stoke`. Remove one of the `use` lines.',
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
    { code: 'duty/profile', path: 'x.csv', why: 'no-header', row: 1, text: 't,p' },
    'Row 1 of `x.csv` is `t,p`. Begin the file with `time (s), power (kW)`; time may be in s, min or h, power in W, kW or MW.',
  ],
  [
    { code: 'duty/profile', path: 'x.csv', why: 'no-rows', row: 2, text: '' },
    '`x.csv` has fewer than two rows of numbers. A power holds until the next row, so give two or more.',
  ],
  [
    { code: 'duty/profile', path: 'x.csv', why: 'gap', row: 3, text: '' },
    'Row 3 of `x.csv` is empty; a time or a power is missing. Give both, or take the row out.',
  ],
  [
    { code: 'duty/profile', path: 'x.csv', why: 'text', row: 3, text: '60,off' },
    'Row 3 of `x.csv` is `60,off`; these are not two numbers. Write a time and a power, with a point for decimals.',
  ],
  [
    { code: 'duty/profile', path: 'x.csv', why: 'negative', row: 3, text: '60,-5' },
    'Row 3 of `x.csv` is `60,-5`; its power is negative. Write 0 where the engine gives none.',
  ],
  [
    { code: 'duty/profile', path: 'x.csv', why: 'time-falls', row: 4, text: '60,5' },
    'Row 4 of `x.csv` is `60,5`; its time is not later than that of the row before. Put the rows in the order of time, each time once.',
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
    {
      ...hazard,
      code: 'hazard/water-in-contact',
      severity: 'error',
      partner: { kind: 'portion', name: 'water' },
      numbers: { heatJPerKg: 388_400, riseK: 211.4, gasMolPerKg: { H2: 1.388 } },
    },
    '`sodium` with `water`: it reacts with the water that is there. Up to 34.4 L of H2 and 388 kJ per kg of the blend (210 K of warming). Take the water out. Source: a book.',
  ],
  [
    { ...hazard, code: 'hazard/water-reactive', severity: 'information', acknowledged: true },
    '`sodium`: it reacts with the water that is there. Take the water out. Source: a book.',
  ],
  [
    {
      ...hazard,
      code: 'hazard/blanket',
      severity: 'warning',
      partner: { kind: 'gas', formula: 'O2', moleShare: 0.2095, assumed: true },
    },
    '`sodium` under air, as no blanket is given: it reacts with the water that is there. Take the water out. Source: a book.',
  ],
  [
    {
      ...hazard,
      code: 'hazard/flammable-range',
      severity: 'error',
      portion: null,
      partner: { kind: 'gas', formula: 'O2', moleShare: 0.15, assumed: false },
      numbers: { overLowerLimit: 2.53, vapourShare: 0.1341 },
    },
    '`slurry` under O2 (15 %): it reacts with the water that is there. The gas holds 13 % vapour, 2.5 times its lower limit. Take the water out. Source: a book.',
  ],
  [
    {
      ...hazard,
      code: 'hazard/low-flash-point',
      severity: 'information',
      portion: null,
      numbers: { flashPointK: 285.15 },
    },
    '`slurry`: it reacts with the water that is there. It flashes at about 12 °C. Take the water out. Source: a book.',
  ],
  [
    {
      ...hazard,
      code: 'hazard/metal-and-caustic',
      severity: 'error',
      partner: { kind: 'contact', material: 'galvanised-steel' },
    },
    '`sodium` in galvanised steel: it reacts with the water that is there. Take the water out. Source: a book.',
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
      code: 'balance/elements',
      differences: [
        { element: 'H', left: 2, right: 4 },
        { element: 'O', left: 2, right: 1.5 },
      ],
      solution,
    },
    'The equation is not balanced. H: 2 on the left, 4 on the right; O: 2 on the left, 1.5 on the right. Balanced it reads `2 H2 + O2 -> 2 H2O`.',
  ],
  [
    {
      code: 'balance/elements',
      differences: [{ element: 'H', left: 2, right: 4 }],
      solution: { ...solution, kind: 'several', freedom: 2 },
    },
    'The equation is not balanced. H: 2 on the left, 4 on the right. There are 2 independent ways to balance it; the simplest is `2 H2 + O2 -> 2 H2O`.',
  ],
  [
    {
      code: 'balance/elements',
      differences: [{ element: 'N', left: 2, right: 0 }],
      solution: { kind: 'none', why: { reason: 'one-sided', elements: [{ element: 'N', side: 'left' }] } },
    },
    'The equation is not balanced. N: 2 on the left, 0 on the right. No coefficients balance it: N stands on the left only.',
  ],
  [
    { code: 'balance/shares', why: 'sum', name: 'slurry', sum: 0.97, mends: [] },
    'The shares of `slurry` add up to 97 %: 3 % missing. Correct a share, or let one portion take the `rest`.',
  ],
  [
    { code: 'balance/shares', why: 'no-room', name: 'slurry', sum: 1.05, mends: [] },
    'The other shares of `slurry` add up to 105 %, so nothing is left for `rest`. Lower one of them.',
  ],
  [
    { code: 'balance/two-rests', name: 'slurry' },
    '`slurry` already has a portion that takes the `rest`; only one can. Give this one a share.',
  ],
  [{ code: 'balance/negative', text: '-3 %' }, '`-3 %` is less than nothing. An amount is zero or more.'],
  [
    { code: 'balance/no-density', substance: 'x', why: 'density' },
    'No density of `x` is known, so a volume of it cannot be turned into mass. Give the amount by mass, or a `density:` in its definition.',
  ],
  [
    { code: 'balance/no-data', what: 'the density of slurry', missing: ['the density of sodium', 'the density of x'] },
    'The density of slurry cannot be worked out. Missing: the density of sodium and x.',
  ],
  [
    {
      code: 'balance/contradiction',
      what: 'its energy',
      first: 'formation enthalpy',
      second: 'lower heating value',
      compared: null,
    },
    '`formation enthalpy` and `lower heating value` both say its energy. `formation enthalpy` is taken; remove one of the two.',
  ],
  [
    {
      code: 'balance/contradiction',
      what: 'its energy',
      first: 'lower heating value',
      second: 'higher heating value',
      compared: { written: quantity(48.5, 'MJ/kg'), worked: quantity(45.8, 'MJ/kg'), unit: 'MJ/kg' },
    },
    '`lower heating value` and the composition make `higher heating value` 45.8 MJ/kg, and 48.5 MJ/kg is written. `lower heating value` is taken; is one of the three mistyped?',
  ],
  [{ code: 'balance/no-portions', name: 'x' }, '`x` has no portions. Add one a line, for example `30 % mass sodium`.'],
  [
    {
      code: 'balance/charge',
      fault: { kind: 'fault', reason: 'no-oxygen-offered', molPerKg: 0 },
      fuel: 'metal',
      oxidant: 'H2O(g)',
    },
    '`H2O(g)` has no oxygen to spare as λ counts it: what it holds is bound already. Say how much there is with `oxidant per fuel: … kg/kg`.',
  ],
  [
    {
      code: 'balance/charge',
      fault: { kind: 'fault', reason: 'no-oxygen-needed', molPerKg: 0 },
      fuel: 'ash',
      oxidant: 'air',
    },
    '`ash` needs no oxygen, so λ says nothing of it. Say how much there is with `oxidant per fuel: … kg/kg`.',
  ],
  [
    {
      code: 'balance/charge',
      fault: { kind: 'fault', reason: 'no-valence', of: 'fuel', elements: ['Xe'] },
      fuel: 'odd',
      oxidant: 'air',
    },
    'In `odd`, Xe has no valence that λ counts. Say how much there is with `oxidant per fuel: … kg/kg`.',
  ],
  [
    {
      code: 'balance/charge',
      fault: { kind: 'fault', reason: 'zone-leaner', zoneKgPerKg: 14.5, wholeKgPerKg: 10 },
      fuel: 'gas_oil',
      oxidant: 'air',
    },
    'The flame zone would have 14.5 kg of oxidant per kg of fuel, more than the 10 kg of the whole. Make the zone richer, or the whole leaner.',
  ],
  [
    { code: 'balance/charge', fault: { kind: 'fault', reason: 'no-gas' }, fuel: 'metal', oxidant: 'water' },
    'Neither `metal` nor `water` is a gas before it burns, so there is no volume to hold. Hold a pressure instead: `held: pressure 10 bar`.',
  ],
  [
    {
      code: 'balance/charge',
      fault: { kind: 'fault', reason: 'not-positive', of: 'zone' },
      fuel: 'metal',
      oxidant: 'air',
    },
    'The oxidant of the flame zone must be more than nothing.',
  ],
  [
    {
      code: 'balance/no-equilibrium',
      name: 'lamp',
      of: 'flame',
      fault: { reason: 'no-gas' },
    },
    'The flame of `lamp` cannot be worked out: none of the products that may form is a gas, so nothing fills the volume that is held. Hold a pressure, or allow a gas.',
  ],
  [
    {
      code: 'balance/no-equilibrium',
      name: 'lamp',
      of: 'flame',
      fault: { kind: 'none', reason: 'cannot-form', elements: ['N', 'Ar'] },
    },
    'The flame of `lamp` cannot be worked out: no combination of the products that are known and allowed holds its N and Ar. Allow more products, or leave the element out.',
  ],
  [
    {
      code: 'balance/no-equilibrium',
      name: 'lamp',
      of: 'zone',
      fault: { kind: 'none', reason: 'outside-tables', side: 'above', limitK: 6000 },
    },
    'The flame zone of `lamp` would be hotter than 6000 K (5727 °C), where the data of all products end. Is a temperature or the oxidant mistyped?',
  ],
  [
    {
      code: 'balance/no-equilibrium',
      name: 'lamp',
      of: 'flame',
      fault: { kind: 'none', reason: 'outside-tables', side: 'below', limitK: 200 },
    },
    'The flame of `lamp` would be colder than 200 K (−73.15 °C), where the data of all products begin. Does the fuel burn at all?',
  ],
  [
    {
      code: 'range/rich',
      of: 'flame',
      lambda: 0.67,
      carbonMonoxideShare: 0.1023,
      hydrogenShare: 0.0863,
      sootShare: 0,
      carbonPerOxygen: 0.33,
      sootingFrom: 0.5,
    },
    'The charge is rich (λ 0.67): at equilibrium its dry gas holds 10.23 % CO and 8.63 % H2.',
  ],
  [
    {
      code: 'range/rich',
      of: 'zone',
      lambda: 0.5,
      carbonMonoxideShare: 0.2,
      hydrogenShare: 0.1,
      sootShare: 0,
      carbonPerOxygen: 0.68,
      sootingFrom: 0.5,
    },
    'The flame zone is rich (λ 0.5): at equilibrium its dry gas holds 20 % CO and 10 % H2. With 0.68 atoms of carbon per atom of oxygen a flame soots, though equilibrium has no soot.',
  ],
  [
    {
      code: 'range/rich',
      of: 'flame',
      lambda: 0.2,
      carbonMonoxideShare: 0.2,
      hydrogenShare: 0.2,
      sootShare: 0.3,
      carbonPerOxygen: 1.7,
      sootingFrom: 0.5,
    },
    'The charge is rich (λ 0.2): at equilibrium its dry gas holds 20 % CO and 20 % H2. 30 % of the carbon is soot even at equilibrium.',
  ],
  [
    {
      code: 'range/cold-charge',
      temperature: quantity(25, 'degC', 0, 'temperature'),
      pressure: quantity(40, 'bar'),
      compressed: quantity(582.2, 'degC', 0, 'temperature'),
    },
    'The air comes in at 25 °C and 40 bar. Was its compression forgotten? Without loss and cooling it would be at about 582.2 °C; give that with `oxidant state:`.',
  ],
  [
    {
      code: 'range/sticky',
      from: quantity(860, 'degC', 0, 'temperature'),
      to: quantity(950, 'degC', 0, 'temperature'),
      firstMelting: quantity(851, 'degC', 0, 'temperature'),
      sticky: quantity(855, 'degC', 0, 'temperature'),
      uncertaintyK: 30,
      leading: ['Na2CO3(l)', 'NaOH(l)'],
      vapours: ['Na2O2H2(g)', 'NaOH(g)'],
      validity: ['traces-left-out'],
    },
    'On walls from 860 °C to 950 °C the deposit (Na2CO3(l) and NaOH(l)) is sticky: it begins to melt at 851 °C (± 30 K) and sticks from 855 °C on. Among it is (NaOH)2(g) and NaOH(g) that froze as vapour in the gas and condenses where it is colder. It is judged without traces of other salts, which can make it stick some 30 K earlier. Keep walls colder than that, or so hot that nothing condenses.',
  ],
  [
    {
      code: 'range/sticky',
      from: quantity(900, 'degC', 0, 'temperature'),
      to: quantity(900, 'degC', 0, 'temperature'),
      firstMelting: quantity(500, 'degC', 0, 'temperature'),
      sticky: null,
      uncertaintyK: 10,
      leading: ['MgO(cr)', 'Li2CO3(l)'],
      vapours: [],
      validity: ['eutectic-of-some', 'much-else'],
    },
    'Whether the deposit (MgO(cr) and Li2CO3(l)) is sticky on walls of 900 °C is not known: it begins to melt at 500 °C (± 10 K), but how much of it is then molten is not published. That is the first melting of some of its salts; together they may melt earlier. Less than half of it is salt, and what stays solid stiffens it. Look at a trial deposit before relying on such walls.',
  ],
  [
    {
      code: 'range/sticky',
      from: quantity(300, 'degC', 0, 'temperature'),
      to: quantity(860, 'degC', 0, 'temperature'),
      firstMelting: null,
      sticky: null,
      uncertaintyK: null,
      leading: ['LiOH(cr)', 'NaOH(l)'],
      vapours: [],
      validity: [],
    },
    'Whether the deposit (LiOH(cr) and NaOH(l)) is sticky on walls from 300 °C to 860 °C is not known: how its salts melt together is not published. Look at a trial deposit before relying on such walls.',
  ],
  [
    {
      code: 'range/burn-out',
      residence: quantity(20, 'ms'),
      portions: [
        { name: 'gas_oil', verdict: 'open', timeS: 0.015, factor: 1.6 },
        { name: 'iron', verdict: 'unburnt', timeS: 0.08, factor: 1.5 },
        { name: 'sodium', verdict: 'unburnt', timeS: null, factor: null },
      ],
    },
    '`gas_oil` takes about 15 ms to burn out, good within a factor of 1.6, and has 20 ms: it may not be burnt. `iron` takes about 80 ms to burn out and has 20 ms. `sodium` finds too little free oxygen in this gas to keep a flame. All figures here count it as burnt.',
  ],
  [
    {
      code: 'range/burn-out',
      residence: quantity(20, 'ms'),
      portions: [{ name: 'gas_oil', verdict: 'open', timeS: 0.015, factor: 2 }],
    },
    '`gas_oil` takes about 15 ms to burn out, good within a factor of 2, and has 20 ms: it may not be burnt. All figures here count it as burnt.',
  ],
  [
    {
      code: 'range/temperature',
      why: 'outside-tables',
      what: 'wall',
      temperature: quantity(-100, 'degC', 0, 'temperature'),
      range: [quantity(200, 'K', 0, 'temperature'), quantity(6000, 'K', 0, 'temperature')],
    },
    'What meets the wall cannot be worked out at −100 °C: the data of all products lie between −73.15 °C and 5727 °C.',
  ],
  [
    {
      code: 'range/temperature',
      why: 'hotter-than-flame',
      temperature: quantity(3000, 'degC', 0, 'temperature'),
      flame: quantity(2100, 'degC', 0, 'temperature'),
    },
    'The exhaust would be at 3000 °C, hotter than the flame at 2100 °C: heat above it would have to be brought in. Is the temperature or its unit mistyped?',
  ],
  [
    {
      code: 'range/real-gas',
      temperature: quantity(260, 'degC', 0, 'temperature'),
      vapourPressure: quantity(39, 'bar'),
      saturation: quantity(248.9, 'degC', 0, 'temperature'),
    },
    'At 260 °C the water vapour (39 bar, saturated at 248.9 °C) is no ideal gas any more: take this state as a guess.',
  ],
  [
    { code: 'balance/water-missing', of: 'burn', name: 'torch', waterKgPerKg: 0.39 },
    'Neither fuel nor oxidant of `torch` brings enough hydrogen for all the alkali to end as hydroxide or carbonate: 0.39 kg of water per kg of fuel is missing, so oxide and peroxide stay. Humid air or injected water would bring it.',
  ],
  [
    { code: 'balance/water-missing', of: 'blend', name: 'slurry', waterKgPerKg: 0.05214 },
    '`slurry` makes too little water for all its alkali to end as hydroxide: 0.05214 kg of water per kg would have to come from outside.',
  ],
  [{ code: 'range/number', text: '1 / 0', why: 'division-by-zero' }, '`1 / 0` divides by zero, so it has no value.'],
  [
    { code: 'range/temperature', text: '-300 degC', why: 'below-absolute-zero' },
    '`-300 degC` is below absolute zero (−273.15 °C). Is the sign or the unit wrong?',
  ],
  [
    { code: 'range/humidity', temperature: quantity(120, 'degC', 0, 'temperature'), pressure: quantity(1, 'bar') },
    'There is no air of that relative humidity at 120 °C and 1 bar: its vapour alone would reach the whole pressure, or water has no saturation pressure there. Give the state it was measured at, or a humidity ratio such as `10 g/kg`.',
  ],
  [
    { code: 'range/heating-value', text: '400 MJ/kg', why: 'too-large', basis: 'lower', most: quantity(120, 'MJ/kg') },
    '`400 MJ/kg` is more than anything that burns sets free: hydrogen has 120 MJ/kg (lower). Is the unit wrong, such as MJ for kJ?',
  ],
  [
    {
      code: 'range/phase',
      substance: 'sodium',
      state: {
        phase: 'liquid',
        temperature: quantity(120, 'degC', 0, 'temperature'),
        changed: { from: 'solid', at: quantity(97.8, 'degC', 0, 'temperature') },
        excessDensity: null,
      },
    },
    '`sodium` is liquid at 120 °C: it melts at 97.8 °C. Its energy and density here are those of the solid at 25 °C.',
  ],
  [
    { code: 'range/share', text: '120 %', low: 0, high: 1 },
    '`120 %` is not possible here; it can be from 0 % to 100 %.',
  ],
  [
    { code: 'range/positive', text: '0 kg/m3', entry: 'density' },
    '`density` must be more than zero, and `0 kg/m3` is not.',
  ],
  [
    {
      code: 'range/temperature',
      why: 'extrapolated',
      temperature: quantity(900, 'degC', 0, 'temperature'),
      species: [
        { name: 'NaH(cr)', range: [quantity(-73, 'degC', 0, 'temperature'), quantity(425, 'degC', 0, 'temperature')] },
        { name: 'soot_oil', range: [quantity(25, 'degC', 0, 'temperature'), quantity(25, 'degC', 0, 'temperature')] },
      ],
    },
    'At 900 °C this reaction leans on values beyond their data: `NaH(cr)` has data from −73 °C to 425 °C; `soot_oil` has one heat capacity, at 25 °C, taken as constant. Take the result as a guess, or give a state within the data.',
  ],
  [
    { code: 'balance/products', fault: { kind: 'fault', reason: 'element-without-product', elements: ['Na', 'S'] } },
    'No product under `products` holds the Na and S of the fuel. Add one that does.',
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

test.each(ROWS)('%s', (fact, message) => {
  const [finding] = findingsIn(file('10', { facts: [['10', fact]] }));
  expect(finding?.message).toBe(message);
  expect(finding?.code).toBe(fact.code);
});

describe('every code', () => {
  test.each(allCodes())('%s has the form area/what', (code) => {
    expect(code).toMatch(/^[a-z]+\/[a-z]+(-[a-z]+)*$/);
  });

  test('has a row here', () => {
    const shown = new Set(ROWS.map(([fact]) => fact.code));
    const syntax = ['syntax/too-deep', 'syntax/too-large', 'syntax/unclosed', 'syntax/unexpected'];
    // All hazards are said by one file, from their rules' words; rows here show its shapes.
    const others = allCodes().filter((code) => !shown.has(code) && !code.startsWith('hazard/'));
    expect(others).toEqual(syntax);
  });

  test('is an error only where the program cannot mean anything', () => {
    const mild = ROWS.flatMap(([fact]) => {
      const [finding] = findingsIn(file('10', { facts: [['10', fact]] }));
      return finding && finding.severity !== 'error' ? [`${finding.severity} ${finding.code}`] : [];
    });
    const others = mild.filter((one) => !WORK_MILD.includes(one) && !SEA_MILD.includes(one));
    expect(mild.filter((one) => WORK_MILD.includes(one)).sort()).toEqual([...WORK_MILD].sort());
    expect(mild.filter((one) => SEA_MILD.includes(one)).sort()).toEqual([...SEA_MILD].sort());
    expect(others.sort()).toEqual([
      'information balance/water-missing',
      'information balance/water-missing',
      'information hazard/low-flash-point',
      'information hazard/water-reactive',
      'information kind/not-evaluated',
      'information kind/suspended',
      'information name/like-catalogue',
      'information range/burn-out',
      'information range/cold-charge',
      'information range/phase',
      'information range/real-gas',
      'information range/rich',
      'information range/rich',
      'warning balance/contradiction',
      'warning balance/contradiction',
      'warning balance/no-data',
      'warning hazard/blanket',
      'warning name/acknowledged',
      'warning range/burn-out',
      'warning range/heating-value',
      'warning range/rich',
      'warning range/sticky',
      'warning range/sticky',
      'warning range/sticky',
      'warning range/temperature',
      'warning range/temperature',
      'warning range/temperature',
    ]);
  });
});
