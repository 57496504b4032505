// What the findings of engines with pistons say, one row a shape of its fact; read by messages.test.ts.

import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

export const CYCLE_ROWS: readonly (readonly [Fact, string])[] = [
  [
    { code: 'engine/compression-ratio', ratio: quantity(0.9, '1') },
    'A compression ratio is the cylinder volume at bottom dead centre over the clearance volume, so it is above 1; 0.9 is not. Write for example `16.5`.',
  ],
  [
    {
      code: 'engine/firing-pressure',
      by: 'burning',
      peak: quantity(75.35, 'bar'),
      maximum: quantity(60, 'bar'),
    },
    'The peak pressure is 75.35 bar, above the maximum firing pressure of 60 bar. Lower the compression ratio or the boost pressure, or take `cycle: dual`, which holds that pressure.',
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
    'There is no state for combustion with these entries. Check temperatures, λ and the compression ratio.',
  ],
  [
    {
      code: 'engine/knock',
      integral: 1.62,
      endGas: quantity(950, 'K', 0, 'temperature'),
      octaneNumber: quantity(85, '1'),
    },
    'Knock is likely: at 676.9 °C and an octane number of 85 the ignition integral of the end gas reaches 1.62, and it ignites at 1 (Livengood and Wu, delays of Douaud and Eyzat). Lower the compression ratio, the boost or its temperature, or burn leaner.',
  ],
  [
    {
      code: 'engine/misfire',
      why: 'autoignition',
      temperature: quantity(850, 'K', 0, 'temperature'),
      autoignition: quantity(924, 'K', 0, 'temperature'),
    },
    'Compression ends at 576.9 °C, below the autoignition temperature of the fuel (650.9 °C): without a pilot it does not light. Raise the compression ratio or the boost temperature, or write a `pilot`.',
  ],
  [
    {
      code: 'engine/misfire',
      why: 'delay',
      delay: quantity(6.7, 'ms'),
      degrees: 60.3,
      temperature: quantity(720, 'K', 0, 'temperature'),
    },
    'At 446.9 °C the ignition delay of the spray is 6.7 ms (Wolfer), 60.3 degrees of the crankshaft at its speed: it is likely to misfire. Raise the compression ratio or the boost temperature.',
  ],
  [
    {
      code: 'engine/misfire',
      why: 'lean',
      share: quantity(0.02, '1'),
      limit: quantity(0.03, '1'),
      temperature: quantity(700, 'K', 0, 'temperature'),
    },
    'The charge holds 2 % of fuel by volume, below the lower flammable limit of 3 % at 426.9 °C (Zabetakis): it is likely to misfire. Lower λ or write a `pilot`.',
  ],
  [
    { code: 'engine/no-standard-fuel', fuel: 'slurry', why: ['metal', 'oxygenate'] },
    "`slurry` holds metal beyond any ash limit and holds more oxygen than fatty acid methyl esters do: it is no fuel of ISO 8217:2024 at all, rather than one above its limits. Ask the engine's maker.",
  ],
  [
    { code: 'engine/no-standard-fuel', fuel: 'hydrazine', why: ['nitrogen'] },
    "`hydrazine` holds nitrogen as no hydrocarbon does: it is no fuel of ISO 8217:2024 at all, rather than one above its limits. Ask the engine's maker.",
  ],
];

export const CYCLE_MILD: readonly string[] = [
  'information engine/no-standard-fuel',
  'information engine/no-standard-fuel',
  'warning engine/firing-pressure',
  'warning engine/firing-pressure',
  'warning engine/knock',
  'warning engine/misfire',
  'warning engine/misfire',
  'warning engine/misfire',
];
