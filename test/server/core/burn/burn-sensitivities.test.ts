// Movements of states against burns solved anew with a moved input.

import { describe, expect, test } from 'vitest';
import type { Burn, BurnInput, BurnState } from '../../../../server/core/burn/burn.ts';
import {
  burnSensitivities,
  condensedShareMovement,
  wetShareMovement,
} from '../../../../server/core/burn/burn-sensitivities.ts';
import type { StateMovement } from '../../../../server/core/burn/burn-sensitivities.ts';
import type { BurnParameter } from '../../../../server/core/burn/charge-directions.ts';
import { burn, mixed, plainAir, solved, stream } from './streams.ts';
import { shiftedInput } from './shifted-input.ts';

const fuel = mixed([0.3, stream('sodium')], [0.5, stream('methane')], [0.2, stream('methanol')]);
const lean: Partial<BurnInput> = { amount: { by: 'lambda', lambda: 1.7 }, cooledToK: [1300], oxidant: plainAir(400) };

/** Each with a step at which differences are good to some 1e-5. */
const parameters: readonly [BurnParameter, number][] = [
  [{ of: 'enthalpy', stream: 'fuel' }, 2e4],
  [{ of: 'enthalpy', stream: 'oxidant' }, 1e3],
  [{ of: 'element', stream: 'fuel', symbol: 'C' }, 0.02],
  [{ of: 'element', stream: 'fuel', symbol: 'Na' }, 0.01],
  [{ of: 'element', stream: 'oxidant', symbol: 'O' }, 0.01],
  [{ of: 'amount' }, 1e-3],
  [{ of: 'pressure' }, 100],
];

/** To what differences give: two parts in ten thousand, and the digits that a difference of states has. */
function expectNear(found: number, difference: number, floor: number): void {
  expect(Math.abs(found - difference)).toBeLessThanOrEqual(2e-4 * Math.abs(difference) + floor);
}

function compare(
  from: Burn,
  parameter: BurnParameter,
  step: number,
  movement: StateMovement | null,
  stateOf: (burn: Burn) => BurnState,
): void {
  if (movement === null) throw new Error('no movement');
  const up = stateOf(burn(from.input.fuel, shiftedInput(from.input, parameter, step)));
  const here = stateOf(from);
  const down = stateOf(burn(from.input.fuel, shiftedInput(from.input, parameter, -step)));
  const slope = (of: (state: BurnState) => number): number => (of(up) - of(down)) / (2 * step);
  expectNear(
    movement.temperatureK,
    slope((state) => state.temperatureK),
    1e-7 / step,
  );
  const largest = Math.max(
    ...here.amountsMol.map((_, phase) => Math.abs(slope((state) => state.amountsMol[phase] ?? 0))),
  );
  here.candidates.phases.forEach((_, phase) => {
    const found = slope((state) => state.amountsMol[phase] ?? 0);
    expect(Math.abs((movement.amountsMol[phase] ?? 0) - found)).toBeLessThanOrEqual(
      2e-4 * Math.abs(found) + 1e-6 * largest,
    );
  });
  const water = here.candidates.phases.findIndex(({ id }) => id === 'H2O(g)');
  const wet = slope((state) => (state.amountsMol[water] ?? 0) / state.gasMol);
  expectNear(wetShareMovement(here, movement, water), wet, 1e-12 / step);
  const condensed = slope((state) => state.condensedMassShare);
  expectNear(condensedShareMovement(here, movement), condensed, 1e-12 / step);
}

describe('at held pressure', () => {
  const from = burn(fuel, { ...lean, zone: { by: 'lambda', lambda: 1 } });
  const sensitivities = burnSensitivities(from);

  test.each(parameters)('flame by %j', (parameter, step) => {
    compare(from, parameter, step, sensitivities.flame(parameter), (one) => solved(one.flame()));
  });

  test.each(parameters.filter(([{ of }]) => of !== 'amount'))('zone by %j', (parameter, step) => {
    compare(from, parameter, step, sensitivities.zone(parameter), (one) => solved(one.zone()));
  });

  test.each(parameters)('cooled by %j', (parameter, step) => {
    compare(from, parameter, step, sensitivities.cooled(0, parameter), (one) => solved(one.cooled[0]?.state() ?? null));
  });
});

describe('in a held volume', () => {
  const from = burn(fuel, { ...lean, held: { held: 'volume', chargePressurePa: 2e5 } });
  const sensitivities = burnSensitivities(from);

  test.each(parameters)('flame by %j', (parameter, step) => {
    compare(from, parameter, step, sensitivities.flame(parameter), (one) => solved(one.flame()));
  });
});

describe('with a loss, at a temperature, frozen', () => {
  test.each<[BurnParameter, number]>([
    [{ of: 'loss-share' }, 1e-3],
    [{ of: 'heating-value' }, 1e5],
  ])('flame by %j', (parameter, step) => {
    const from = burn(fuel, { ...lean, heat: { heat: 'adiabatic', lossShare: 0.1 }, lowerHeatingValueJPerKg: 3e7 });
    compare(from, parameter, step, burnSensitivities(from).flame(parameter), (one) => solved(one.flame()));
  });

  test('a given temperature moves itself', () => {
    const from = burn(fuel, { ...lean, heat: { heat: 'temperature', temperatureK: 1500 } });
    const parameter = { of: 'temperature' } as const;
    expect(burnSensitivities(from).flame(parameter)?.temperatureK).toBeCloseTo(1, 12);
    compare(from, parameter, 0.1, burnSensitivities(from).flame(parameter), (one) => solved(one.flame()));
  });

  test('a frozen state has no movement of its own; the composition it comes from has', () => {
    const from = burn(fuel, { ...lean, frozenBelowK: 1350 });
    expect(burnSensitivities(from).cooled(0, { of: 'amount' })).toBeNull();
    compare(from, { of: 'amount' }, 1e-3, burnSensitivities(from).frozenAt({ of: 'amount' }), (one) =>
      solved(one.frozenAt()),
    );
  });

  test('the pressure of the burn does not move what cools at its own', () => {
    const from = burn(fuel, { ...lean, held: { held: 'pressure', pressurePa: 1e6 }, coolingPressurePa: 1e5 });
    const movement = burnSensitivities(from).cooled(0, { of: 'pressure' });
    expect(movement?.amountsMol.every((mol) => mol === 0)).toBe(true);
  });
});
