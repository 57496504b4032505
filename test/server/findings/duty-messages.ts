// Rows of messages.test.ts about duties and services: a shape of each fact and what a person reads of it, and which of them
// are no errors.
import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

export const DUTY_ROWS: readonly (readonly [Fact, string])[] = [
  [
    { code: 'engine/overload', leg: 'pull', engine: 'main', power: quantity(7.2, 'MW'), rating: quantity(6.4, 'MW') },
    '`pull` asks `main` for 7.2 MW, which is 112.5 % of its rating of 6.4 MW. Lower the load or the speed, or share it with another engine.',
  ],
  [
    { code: 'engine/measured-range', leg: 'wait', engine: 'main', load: 0.12, fromLoad: 0.25, toLoad: 1 },
    '`wait` runs `main` at a load of 12 %, but its consumption is known from 25 % to 100 %. It is extrapolated in a straight line. Add a point there, or `idle consumption`.',
  ],
  [
    { code: 'engine/measured-range', leg: 'push', engine: 'main', load: 1, fromLoad: 0.85, toLoad: 0.85 },
    '`push` runs `main` at a load of 100 %, but its consumption is known only at 85 %. It is extrapolated in a straight line. Add a point there.',
  ],
  [
    { code: 'engine/no-idle', leg: 'mode 5', engine: 'main' },
    '`mode 5` runs `main` without load, and its consumption at idle is not known. Give its `idle consumption`.',
  ],
  [
    { code: 'duty/speed', leg: 'sail', speed: quantity(13.5, 'kn'), service: quantity(13, 'kn') },
    '`sail` goes 13.5 kn, above the service speed of 13 kn. The propeller law underestimates the power there. Lower the speed, or raise the `exponent` of the service speed.',
  ],
  [
    { code: 'duty/leg-name', leg: 'boilr', near: ['boiler'] },
    '`boilr` is taken as a leg of that name. Did you mean the entry `boiler`?',
  ],
  [
    { code: 'duty/unused', entry: 'service speed' },
    'Nothing in this duty uses `service speed`. Take it out, or let a leg need it.',
  ],
  [
    { code: 'duty/test-cycle', cycle: 'E3' },
    'The test cycle E3 certifies an engine and does not describe what one does. For fuel over a year, write the legs.',
  ],
  [
    {
      code: 'service/tank',
      fuel: 'slurry',
      needed: quantity(19.9, 'm3'),
      capacity: quantity(15, 'm3'),
      leg: 'berth',
    },
    'The tanks hold 15 m³, but 19.9 m³ are needed for slurry with its reserve. It would run out on `berth`. Bunker more often, carry less reserve or give the tanks more room.',
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
];

export const DUTY_MILD: readonly string[] = [
  'hint duty/leg-name',
  'information duty/test-cycle',
  'warning duty/speed',
  'warning duty/unused',
  'warning engine/measured-range',
  'warning engine/measured-range',
  'warning engine/no-idle',
  'warning engine/overload',
  'warning service/tank',
];
