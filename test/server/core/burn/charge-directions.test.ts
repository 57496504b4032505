// Derivatives of a charge against differences of charges.

import { describe, expect, test } from 'vitest';
import type { BurnInput, Charge, OxidantAmount } from '../../../../server/core/burn/burn.ts';
import { chargeDirection } from '../../../../server/core/burn/charge-directions.ts';
import type { BurnParameter } from '../../../../server/core/burn/charge-directions.ts';
import { chargeOf } from '../../../../server/core/burn/charge.ts';
import { shiftedInput } from './shifted-input.ts';
import { burn, mixed, plainAir, stream } from './streams.ts';

const fuel = mixed([0.3, stream('sodium')], [0.5, stream('methane')], [0.2, stream('methanol')]);
const amounts: readonly OxidantAmount[] = [
  { by: 'lambda', lambda: 1.4 },
  { by: 'equivalence-ratio', ratio: 0.7 },
  { by: 'mass', kgPerKg: 15 },
];

function charge(input: BurnInput): Charge {
  const found = chargeOf(input.fuel, input.oxidant, input.amount, input.held);
  if (found.kind === 'fault') throw new Error(found.reason);
  return found;
}

const parameters: readonly [BurnParameter, number][] = [
  [{ of: 'enthalpy', stream: 'fuel' }, 1e3],
  [{ of: 'enthalpy', stream: 'oxidant' }, 1e3],
  [{ of: 'gas-temperature', stream: 'fuel' }, 0.1],
  [{ of: 'gas-temperature', stream: 'oxidant' }, 0.1],
  [{ of: 'gas-amount', stream: 'fuel' }, 1e-3],
  [{ of: 'gas-amount', stream: 'oxidant' }, 1e-3],
  [{ of: 'element', stream: 'fuel', symbol: 'C' }, 1e-3],
  [{ of: 'element', stream: 'fuel', symbol: 'Na' }, 1e-3],
  [{ of: 'element', stream: 'fuel', symbol: 'O' }, 1e-3],
  [{ of: 'element', stream: 'oxidant', symbol: 'O' }, 1e-4],
  [{ of: 'element', stream: 'oxidant', symbol: 'N' }, 1e-3],
  [{ of: 'amount' }, 1e-4],
];

describe.each(amounts)('oxidant by $by', (amount) => {
  const { input } = burn(fuel, { amount, oxidant: plainAir(600) });
  const here = charge(input);

  test.each(parameters)('%j', (parameter, step) => {
    const direction = chargeDirection(input, here, parameter);
    const up = charge(shiftedInput(input, parameter, step));
    const down = charge(shiftedInput(input, parameter, -step));
    if (direction === null) throw new Error();
    const slope = (of: (charge: Charge) => number): number => (of(up) - of(down)) / (2 * step);
    const pairs: [number, number][] = [
      [direction.enthalpyJ, slope((one) => one.enthalpyJ ?? Number.NaN)],
      [direction.pressureVolumeJ, slope((one) => one.pressureVolumeJ)],
      [direction.oxidantKgPerKg, slope((one) => one.oxidantKgPerKg)],
      ...here.elements.map((_, row): [number, number] => [
        direction.elementMol[row] ?? 0,
        slope((one) => one.elementMol[row] ?? 0),
      ]),
    ];
    for (const [given, found] of pairs)
      expect(Math.abs(given - found)).toBeLessThanOrEqual(1e-5 * Math.abs(found) + 1e-6);
  });
});

test('an element that is not there has no direction', () => {
  const { input, charge: here } = burn(fuel);
  expect(chargeDirection(input, here, { of: 'element', stream: 'fuel', symbol: 'S' })).toBeNull();
});

test('a loss takes energy out of the whole and not of the zone', () => {
  const lossy = burn(fuel, {
    heat: { heat: 'adiabatic', lossShare: 0.1 },
    lowerHeatingValueJPerKg: 3e7,
    zone: { by: 'lambda', lambda: 0.9 },
  });
  const { input, charge: here, zoneCharge } = lossy;
  if (zoneCharge === null) throw new Error();
  expect(chargeDirection(input, here, { of: 'loss-share' })?.enthalpyJ).toBe(-3e7);
  expect(chargeDirection(input, here, { of: 'heating-value' })?.enthalpyJ).toBe(-0.1);
  expect(chargeDirection(input, zoneCharge, { of: 'heating-value' }, 'zone')?.enthalpyJ).toBeCloseTo(0, 15);
  expect(chargeDirection(input, zoneCharge, { of: 'amount' }, 'zone')?.oxidantKgPerKg).toBeCloseTo(
    zoneCharge.oxidantKgPerKg / 0.9,
    9,
  );
});
