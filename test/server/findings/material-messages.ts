// Rows of messages.test.ts of blends and equations that do not close, and of hazards: a shape of each fact and what a person reads of it.
import type { Fact } from '../../../server/scenario/facts.ts';
import type { HazardFact } from '../../../server/scenario/hazard-fact.ts';
import { quantity } from '../../support/scenario-builder.ts';

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

export const MATERIAL_ROWS: readonly (readonly [Fact, string])[] = [
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
    { code: 'balance/water-missing', of: 'burn', name: 'torch', waterKgPerKg: 0.39 },
    'Neither fuel nor oxidant of `torch` brings enough hydrogen for all the alkali to end as hydroxide or carbonate: 0.39 kg of water per kg of fuel is missing, so oxide and peroxide stay. Humid air or injected water would bring it.',
  ],
  [
    { code: 'balance/water-missing', of: 'blend', name: 'slurry', waterKgPerKg: 0.05214 },
    '`slurry` makes too little water for all its alkali to end as hydroxide: 0.05214 kg of water per kg would have to come from outside.',
  ],
  [
    { code: 'balance/products', fault: { kind: 'fault', reason: 'element-without-product', elements: ['Na', 'S'] } },
    'No product under `products` holds the Na and S of the fuel. Add one that does.',
  ],
];
