// What the findings of engines with pistons say, one row a shape of its fact; read by messages.test.ts.

import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

export const CYCLE_ROWS: readonly (readonly [Fact, string])[] = [
  [
    { code: 'engine/compression-ratio', ratio: quantity(0.9, '1') },
    'A compression ratio is the largest over the smallest volume of the cylinder, so it is above 1; 0.9 is not. Write for example `16.5`.',
  ],
  [
    {
      code: 'engine/firing-pressure',
      by: 'burning',
      peak: quantity(75.35, 'bar'),
      maximum: quantity(60, 'bar'),
    },
    'It burns up to 75.35 bar, above the maximum firing pressure of 60 bar. Lower the compression ratio or the boost pressure, or take `cycle: dual`, which holds that pressure.',
  ],
  [
    {
      code: 'engine/firing-pressure',
      by: 'compression',
      peak: quantity(128.3, 'bar'),
      maximum: quantity(120, 'bar'),
    },
    'Compression alone reaches 128.3 bar, above the maximum firing pressure of 120 bar. Lower the compression ratio or the boost pressure.',
  ],
  [
    { code: 'engine/no-cycle', why: 'no-fresh-gas' },
    'Gas that stays at this exhaust pressure would fill the whole cylinder, so no fresh gas comes in. Lower the exhaust pressure or raise the boost pressure.',
  ],
  [
    {
      code: 'engine/no-cycle',
      why: 'no-state',
      state: 'expansion',
      side: 'below',
      limit: quantity(200, 'K', 0, 'temperature'),
    },
    'For expansion it would be colder than all data (−73.15 °C). Check temperatures, λ and the compression ratio.',
  ],
  [
    { code: 'engine/no-cycle', why: 'no-state', state: 'combustion', side: null, limit: null },
    'There is no state for combustion with these entries.',
  ],
];

export const CYCLE_MILD: readonly string[] = ['warning engine/firing-pressure', 'warning engine/firing-pressure'];
