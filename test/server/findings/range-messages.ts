// Rows of messages.test.ts of values and states out of their range: a shape of each fact and what a person reads of it.
import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

export const RANGE_ROWS: readonly (readonly [Fact, string])[] = [
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
];
