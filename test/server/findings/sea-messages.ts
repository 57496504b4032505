// What is said of seas: a row a shape of its fact, read as a person reads it. The table of all others is in messages.test.ts.
import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

/** Each fact, and what is said of it. */
export const SEA_ROWS: readonly (readonly [Fact, string])[] = [
  [
    {
      code: 'range/sea-water',
      what: 'temperature',
      quantity: quantity(1, 'degC', 0, 'temperature'),
      beyond: [
        { of: 'one', low: quantity(2, 'degC', 0, 'temperature'), high: quantity(35, 'degC', 0, 'temperature') },
        { of: 'another', low: quantity(5, 'degC', 0, 'temperature'), high: quantity(40, 'degC', 0, 'temperature') },
      ],
      refused: null,
    },
    'The constants are extrapolated to a temperature of 1 °C: they were measured for one from 2 °C to 35 °C and another from 5 °C to 40 °C. Take the figures as rough.',
  ],
  [
    {
      code: 'range/sea-water',
      what: 'salinity',
      quantity: quantity(120, '1'),
      beyond: [],
      refused: { low: quantity(0, '1'), high: quantity(50, '1') },
    },
    'There are no constants for sea water at a practical salinity of 120; from 0 to 50 there are.',
  ],
  [
    { code: 'account/sea-variables', why: 'too-few', name: 'bay', given: [] },
    'The carbonate system of `bay` needs two of its variables, and none is given. Add for example `total alkalinity` and `pCO2`.',
  ],
  [
    { code: 'account/sea-variables', why: 'too-few', name: 'bay', given: ['pCO2', 'fCO2'] },
    'The carbonate system of `bay` needs two of its variables, and `pCO2` and `fCO2` say the same thing. Add for example `total alkalinity`.',
  ],
  [
    {
      code: 'account/sea-variables',
      why: 'too-many',
      taken: ['total alkalinity', 'pCO2'],
      extra: 'dissolved inorganic carbon',
      line: { path: 'trial.stoke', start: 0, end: 1 },
      written: quantity(2100, 'umol/kg'),
      worked: quantity(2131, 'umol/kg'),
      unit: 'umol/kg',
    },
    '`total alkalinity` and `pCO2` settle the carbonate system already: they make `dissolved inorganic carbon` 2131 µmol/kg, and 2100 µmol/kg is written. `total alkalinity` and `pCO2` are taken; remove one of the three.',
  ],
  [
    {
      code: 'account/sea-variables',
      why: 'too-many',
      taken: ['total alkalinity', 'pCO2'],
      extra: 'pH',
      line: { path: 'trial.stoke', start: 0, end: 1 },
      written: quantity(8, '1'),
      worked: null,
      unit: '1',
    },
    '`total alkalinity` and `pCO2` settle the carbonate system already. `total alkalinity` and `pCO2` are taken, and `pH` is not looked at; remove one of the three.',
  ],
  [
    { code: 'account/sea-state', why: 'none', first: 'pH', second: 'total alkalinity' },
    'No sea water has this `pH` and this `total alkalinity` together. Look at both numbers and their units.',
  ],
  [
    { code: 'account/sea-state', why: 'two', first: 'total alkalinity', second: 'carbonate', ph: 8.09, other: 11 },
    'Two waters have this `total alkalinity` and this `carbonate`: one of pH 8.09, which is taken, and one of pH 11. Give another variable in place of one of them where that is in doubt.',
  ],
  [
    { code: 'account/receiving-limit', of: 'near-field', why: 'above', ph: 9.25, limit: 9, enough: 61.2 },
    'In the near field the water has a pH of 9.25 (total scale), above the limit of 9. At a dilution of 62 it would keep the limit.',
  ],
  [
    { code: 'account/receiving-limit', of: 'near-field', why: 'change', ph: 0.45, limit: 0.2, enough: null },
    'The near field moves the pH by 0.45, and 0.2 is the most that is allowed.',
  ],
  [
    { code: 'account/receiving-limit', of: 'water', why: 'below', ph: 7.6, limit: 7.8, enough: null },
    'The water by itself has a pH of 7.6 (total scale), below the limit of 7.8.',
  ],
  ...(
    [
      [
        'runaway',
        'With particles in it the near field is at an aragonite saturation of 9: above about 7 aragonite was seen to precipitate on them and to run away, taking more alkalinity than was added. Keep it below 5.',
      ],
      [
        'careful',
        'With particles in it the near field is at an aragonite saturation of 9: nothing was seen to precipitate up to about 5, and a runaway above about 7. Keep it below 5.',
      ],
      [
        'brucite',
        'The near field is at pH 10.5: above about 10 magnesium hydroxide was seen to precipitate within hours, and aragonite after it within a day.',
      ],
      [
        'aragonite',
        'The near field is at an aragonite saturation of 9: above about 30 aragonite was seen to precipitate from dissolved alkali.',
      ],
    ] as const
  ).map(([risk, said]): readonly [Fact, string] => [
    { code: 'account/precipitation', risk, ph: 10.5, aragoniteSaturation: 9, enough: 176.4 },
    `${said} Calcium carbonate that precipitates is lost uptake: each mole takes away two of alkalinity. A dilution of 177 would do.`,
  ]),
];

/** Those that are no errors. */
export const SEA_MILD: readonly string[] = [
  'information account/sea-state',
  'warning account/precipitation',
  'warning account/precipitation',
  'warning account/precipitation',
  'warning account/precipitation',
  'warning account/receiving-limit',
  'warning account/receiving-limit',
  'warning account/receiving-limit',
  'warning account/sea-variables',
  'warning account/sea-variables',
  'warning range/sea-water',
];
