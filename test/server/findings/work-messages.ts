// Rows of messages.test.ts about engines, duties and services: a shape of each fact and what a person reads of it, and
// which of them are no errors.
import type { Fact } from '../../../server/scenario/facts.ts';
import { CYCLE_MILD, CYCLE_ROWS } from './cycle-messages.ts';
import { PLANT_MILD, PLANT_ROWS } from './plant-messages.ts';
import { DUTY_MILD, DUTY_ROWS } from './duty-messages.ts';
import { quantity } from '../../support/scenario-builder.ts';

export const WORK_ROWS: readonly (readonly [Fact, string])[] = [
  ...CYCLE_ROWS,
  ...PLANT_ROWS,
  ...DUTY_ROWS,
  [
    { code: 'engine/repeated-load', load: quantity(0.5, '1') },
    'There is more than one measured point at a load of 50 %. Keep one for each load.',
  ],
  [
    {
      code: 'engine/measured-fuel',
      fuel: 'methanol',
      measured: quantity(42.7, 'MJ/kg'),
      own: quantity(19.9, 'MJ/kg'),
    },
    'The consumption was measured on 42.7 MJ/kg, but `methanol` has 19.9 MJ/kg. Was it another fuel? Name it, as in `measured on: gas_oil, 42.7 MJ/kg`: then the heat that leaves with the exhaust is counted for both.',
  ],
];

export const WORK_MILD: readonly string[] = [
  ...CYCLE_MILD,
  ...PLANT_MILD,
  ...DUTY_MILD,
  'warning engine/measured-fuel',
];
