// A steam plant's energy balance, its boiler against what is usual, and heat that cannot flow.
import { describe, expect, test } from 'vitest';
import { heatingValueOfFuel } from '../../../../../server/core/balance/heating-value.ts';
import type { BurnStream } from '../../../../../server/core/burn/burn.ts';
import type { FiredBoilerInput } from '../../../../../server/core/engine/steam/fired-boiler.ts';
import { steamPlant } from '../../../../../server/core/engine/steam/steam-plant.ts';
import type { SteamPlant, SteamPlantInput } from '../../../../../server/core/engine/steam/steam-plant.ts';
import { mixed, plainAir, stream } from '../../burn/streams.ts';

function heatingValues(fuel: BurnStream): { readonly lower: number; readonly higher: number } {
  const value = heatingValueOfFuel(fuel.elementMolPerKg, fuel.enthalpyJPerKg ?? Number.NaN, 'as-ruled');
  if (value.kind === 'fault') throw new Error(value.reason);
  return { lower: value.lowerJPerKg, higher: value.higherJPerKg };
}

function inputOf(fuel: BurnStream, lambda: number, change: Partial<FiredBoilerInput> = {}): SteamPlantInput {
  return {
    boiler: {
      burn: { fuel, oxidant: plainAir(), amount: { by: 'lambda', lambda } },
      pressurePa: 101325,
      lowerHeatingValueJPerKg: heatingValues(fuel).lower,
      stackTemperatureK: 430,
      completeness: 1,
      wallLossShare: 0,
      ...change,
    },
    cycle: {
      boilerPressurePa: 6e6,
      steamTemperatureK: 773.15,
      condenserPressurePa: 5000,
      reheat: null,
      feedwaterTemperatureK: 400,
      heaterCount: 1,
      turbineEfficiency: 0.87,
      efficiencyOf: 'section',
      pumpEfficiency: 0.75,
    },
    mechanicalEfficiency: 0.97,
  };
}

function plantOf(input: SteamPlantInput): SteamPlant {
  const found = steamPlant(input);
  if (found.kind !== 'steam-plant') throw new Error(JSON.stringify(found));
  return found;
}

const gasOil = stream('gas_oil');
const methane = stream('methane');
const slurry = mixed([0.3, stream('sodium')], [0.68, gasOil], [0.02, stream('sulfur')]);
const preheated: BurnStream = { ...methane, enthalpyJPerKg: (methane.enthalpyJPerKg ?? 0) + 3e5, temperatureK: 420 };

describe('the balance', () => {
  const cases: readonly (readonly [string, SteamPlantInput])[] = [
    ['gas oil', inputOf(gasOil, 1.15)],
    ['gas oil, rich', inputOf(gasOil, 0.8)],
    ['methane with losses', inputOf(methane, 1.1, { completeness: 0.97, wallLossShare: 0.02 })],
    [
      'preheated methane',
      inputOf(preheated, 1.1, { completeness: 0.9, lowerHeatingValueJPerKg: heatingValues(methane).lower }),
    ],
    ['a sodium slurry', inputOf(slurry, 1.4)],
    ['water condensed in the stack', inputOf(methane, 1.05, { stackTemperatureK: 300 })],
    [
      'gas frozen hot',
      inputOf(gasOil, 1.0, {
        burn: { fuel: gasOil, oxidant: plainAir(290), amount: { by: 'lambda', lambda: 1 }, frozenBelowK: 1900 },
      }),
    ],
  ];
  test.each(cases)('adds up to the lower heating value: %s', (_name, input) => {
    const { losses, brakeWorkJ, brakeEfficiency } = plantOf(input);
    const sumJ = losses.reduce((sum, { joulePerKg }) => sum + joulePerKg, 0);
    expect(Math.abs(sumJ / input.boiler.lowerHeatingValueJPerKg - 1)).toBeLessThan(1e-9);
    expect(brakeWorkJ / input.boiler.lowerHeatingValueJPerKg).toBe(brakeEfficiency);
  });

  test('the stack and the composition say where a loss is', () => {
    const term = (plant: SteamPlant, name: string): number =>
      plant.losses.find(({ id }) => id === name)?.joulePerKg ?? Number.NaN;
    const lean = plantOf(inputOf(methane, 1.1));
    // Complete combustion leaves nothing but traces; a rich one leaves carbon monoxide and hydrogen.
    expect(
      Math.abs(term(lean, 'exhaust-chemical') / inputOf(methane, 1.1).boiler.lowerHeatingValueJPerKg),
    ).toBeLessThan(1e-4);
    const rich = plantOf(inputOf(gasOil, 0.8));
    expect(term(rich, 'exhaust-chemical') / inputOf(gasOil, 0.8).boiler.lowerHeatingValueJPerKg).toBeGreaterThan(0.1);
    // Condensing gives back latent heat beyond the lower heating value.
    expect(term(plantOf(inputOf(methane, 1.05, { stackTemperatureK: 300 })), 'exhaust-chemical')).toBeLessThan(-3e6);
  });
});

describe('the boiler', () => {
  test('loses by its stack what the usual rule says', () => {
    // Siegert's rule for gas oil with 11 % carbon dioxide in dry gas: loss = (0.50/11 + 0.007) x (157 - 25) K = 6.9 %, common
    // practice and good to some tenths of a point. Excess air for 11 % (15.4 % at λ = 1) is about 1.37.
    const { boilerEfficiency } = plantOf(inputOf(gasOil, 1.37));
    expect(Math.abs(1 - boilerEfficiency - 0.069)).toBeLessThan(0.006);
  });

  test('gives less for a hotter stack, more air, walls and what does not burn', () => {
    const best = plantOf(inputOf(gasOil, 1.1)).boilerEfficiency;
    expect(plantOf(inputOf(gasOil, 1.1, { stackTemperatureK: 500 })).boilerEfficiency).toBeLessThan(best);
    expect(plantOf(inputOf(gasOil, 1.5)).boilerEfficiency).toBeLessThan(best);
    expect(plantOf(inputOf(gasOil, 1.1, { wallLossShare: 0.01 })).boilerEfficiency).toBeCloseTo(best - 0.01, 12);
    const unburnt = plantOf(inputOf(gasOil, 1.1, { completeness: 0.98 })).boilerEfficiency;
    expect(best - unburnt).toBeGreaterThan(0.02 * best);
    expect(best - unburnt).toBeLessThan(0.024);
  });
});

describe('heat that cannot flow', () => {
  test('a stack colder than the feed water', () => {
    expect(plantOf(inputOf(gasOil, 1.1, { stackTemperatureK: 390 })).pinch).toMatchObject({ at: 'stack' });
  });

  test('gas that has too little heat above boiling', () => {
    const wet = inputOf(gasOil, 6, { stackTemperatureK: 400.5 });
    expect(plantOf(wet).pinch).toMatchObject({ at: 'evaporator' });
  });

  test('none in an ordinary boiler', () => {
    expect(plantOf(inputOf(gasOil, 1.15)).pinch).toBeNull();
  });
});

test('what is no plant says which part fails', () => {
  expect(steamPlant(inputOf(gasOil, 1.1, { stackTemperatureK: 2500 }))).toMatchObject({
    of: 'boiler',
    why: { kind: 'none', reason: 'no-heat' },
  });
  expect(steamPlant(inputOf(gasOil, 1.1, { completeness: 0 }))).toMatchObject({
    of: 'boiler',
    why: { reason: 'not-share' },
  });
  expect(steamPlant({ ...inputOf(gasOil, 1.1), mechanicalEfficiency: 1.2 })).toMatchObject({ of: 'shaft' });
  const { cycle, ...others } = inputOf(gasOil, 1.1);
  expect(steamPlant({ ...others, cycle: { ...cycle, condenserPressurePa: 7e6 } })).toMatchObject({
    of: 'cycle',
    why: { reason: 'pressures' },
  });
});
