// Gas turbines on their own charge: what is conserved, that a temperature and the air it takes are one question, which way
// efficiencies move a turbine, and what particles and dissociation do.
import { describe, expect, test } from 'vitest';
import { corners } from '../../../../../server/core/engine/expansion.ts';
import type { Corner } from '../../../../../server/core/engine/expansion.ts';
import { gasTurbine, gasTurbineCycle } from '../../../../../server/core/engine/turbine/gas-turbine-cycle.ts';
import type {
  GasTurbineCycle,
  GasTurbineInput,
  TurbineFault,
} from '../../../../../server/core/engine/turbine/gas-turbine.ts';
import { heatedAirCycle } from '../../../../../server/core/engine/turbine/heated-air.ts';
import { mixed, stream } from '../../burn/streams.ts';
import { turbineOn } from './turbines.ts';

const live: Corner = { chemistry: 'equilibrium', particles: 'with-gas' };
const frozen: Corner = { chemistry: 'frozen', particles: 'with-gas' };

function cycleOrFault(input: GasTurbineInput, corner: Corner = live): GasTurbineCycle | TurbineFault {
  const turbine = gasTurbine(input);
  return turbine.kind === 'fault' ? turbine : gasTurbineCycle(turbine, corner);
}

function cycleOf(input: GasTurbineInput, corner: Corner = live): GasTurbineCycle {
  const found = cycleOrFault(input, corner);
  if (found.kind === 'fault') throw new Error(JSON.stringify(found));
  return found;
}

const gasOil = stream('gas_oil');
const methane = stream('methane');
const slurry = mixed([0.25, stream('sodium')], [0.73, gasOil], [0.02, stream('sulfur')]);
const aluminised = mixed([0.2, stream('aluminium')], [0.8, gasOil]);
const reheat = { temperatureK: 1450, firstRatio: null };
const intercooled = { temperatureK: 300, firstRatio: null };

describe('losses add up to the lower heating value', () => {
  const compressor = turbineOn(gasOil).compressor;
  const cases: readonly (readonly [string, GasTurbineInput, readonly Corner[]])[] = [
    ['gas oil', turbineOn(gasOil), [live, frozen]],
    [
      'recuperated',
      turbineOn(methane, { recuperatorEffectiveness: 0.85, compressor: { ...compressor, pressureRatio: 6 } }),
      [live],
    ],
    ['intercooled', turbineOn(gasOil, { compressor: { ...compressor, intercooling: intercooled } }), [live]],
    ['reheated', turbineOn(gasOil, { reheat }), [live, frozen]],
    [
      'everything',
      turbineOn(methane, {
        reheat,
        recuperatorEffectiveness: 0.8,
        compressor: { ...compressor, intercooling: intercooled },
      }),
      [live],
    ],
    ['unburnt and cooled', turbineOn(gasOil, { completeness: 0.985, wallLossShare: 0.01 }), [live]],
    ['frozen below', turbineOn(gasOil, { frozenBelowK: 1300 }), [frozen]],
    ['λ given', turbineOn(gasOil, { amount: { by: 'mass', airKgPerKg: 45 } }), [live]],
    [
      'λ given, recuperated',
      turbineOn(gasOil, { amount: { by: 'mass', airKgPerKg: 70 }, recuperatorEffectiveness: 0.7 }),
      [live],
    ],
    ['a rich gas', turbineOn(methane, { amount: { by: 'mass', airKgPerKg: 12 } }), [live]],
    ['a sodium slurry', turbineOn(slurry), corners],
    ['an aluminised fuel, recuperated', turbineOn(aluminised, { recuperatorEffectiveness: 0.6 }), corners],
  ];
  test.each(cases)('%s', (_name, input, which) => {
    for (const corner of which) {
      const { losses, netWorkJ, turbineWorkJ, compressorWorkJ } = cycleOf(input, corner);
      const sum = losses.reduce((total, { share }) => total + share, 0);
      expect(Math.abs(sum - 1)).toBeLessThan(1e-9);
      expect(netWorkJ).toBe(turbineWorkJ - compressorWorkJ);
    }
  });
});

describe('the turbine inlet', () => {
  test.each([
    ['gas oil', turbineOn(gasOil)],
    ['recuperated', turbineOn(methane, { recuperatorEffectiveness: 0.8 })],
    ['a sodium slurry', turbineOn(slurry)],
  ])('has the temperature that was asked, and its air gives that temperature back: %s', (_name, input) => {
    const found = cycleOf(input);
    expect(found.turbineInlet.temperatureK).toBe(1500);
    const back = cycleOf({ ...input, amount: { by: 'mass', airKgPerKg: found.airKgPerKg } });
    expect(back.turbineInlet.temperatureK).toBeCloseTo(1500, 5);
    expect(back.brakeEfficiency).toBeCloseTo(found.brakeEfficiency, 8);
  });

  test('with reheat both are as hot as asked, and the fuel is shared', () => {
    const found = cycleOf(turbineOn(gasOil, { reheat }));
    expect(found.turbineInlet.temperatureK).toBe(1500);
    expect(found.reheated?.temperatureK).toBe(1450);
    expect(found.firstFuelShare).toBeGreaterThan(0.5);
    expect(found.firstFuelShare).toBeLessThan(0.8);
    expect(found.turbineOutlet.temperatureK).toBeGreaterThan(cycleOf(turbineOn(gasOil)).turbineOutlet.temperatureK);
  });

  test('is known in the usual range of a simple cycle', () => {
    // Common practice for a turbine of this inlet temperature and ratio: 34 to 38 % and about 3 % fuel by mass of air.
    const { brakeEfficiency, airKgPerKg, exhaust } = cycleOf(turbineOn(methane));
    expect(brakeEfficiency).toBeGreaterThan(0.32);
    expect(brakeEfficiency).toBeLessThan(0.38);
    expect(airKgPerKg).toBeGreaterThan(40);
    expect(airKgPerKg).toBeLessThan(60);
    expect(exhaust.temperatureK).toBeGreaterThan(750);
    expect(exhaust.temperatureK).toBeLessThan(900);
  });
});

describe('which way it moves', () => {
  const base = turbineOn(gasOil);
  const law = (efficiency: number): GasTurbineInput['compressor'] => ({
    ...base.compressor,
    law: { law: 'isentropic-efficiency', efficiency },
  });
  test('better machines, fewer losses and a recuperator of a low ratio give more', () => {
    const of = (change: Partial<GasTurbineInput>): number => cycleOf({ ...base, ...change }).brakeEfficiency;
    const rising = (values: readonly number[]): void => {
      expect([...values].sort((a, b) => a - b)).toEqual(values);
    };
    rising([0.7, 0.8, 0.9, 1].map((turbineEfficiency) => of({ turbineEfficiency })));
    rising([0.7, 0.8, 0.9, 1].map((efficiency) => of({ compressor: law(efficiency) })));
    rising([0.08, 0.04, 0].map((combustorLossShare) => of({ combustorLossShare })));
    rising([0.04, 0.02, 0].map((wallLossShare) => of({ wallLossShare })));
    rising([0.96, 0.98, 1].map((completeness) => of({ completeness })));
    const low = { ...base.compressor, pressureRatio: 5 };
    rising([0, 0.4, 0.7, 0.9].map((recuperatorEffectiveness) => of({ compressor: low, recuperatorEffectiveness })));
  });

  test('air heated from outside differs only by the gas it burns', () => {
    // The air standard has no fuel's mass and air's heat capacity throughout: some points of a per cent apart.
    const air = heatedAirCycle({
      gas: base.air,
      inletTemperatureK: base.airTemperatureK,
      ambientPressurePa: base.ambientPressurePa,
      turbineInletTemperatureK: 1500,
      compressor: base.compressor,
      recuperatorEffectiveness: null,
      reheat: null,
      combustorLossShare: base.combustorLossShare,
      exhaustLossShare: base.exhaustLossShare,
      turbineEfficiency: base.turbineEfficiency,
    });
    if (air.kind === 'fault') throw new Error(air.reason);
    const { netEfficiency } = cycleOf(base);
    expect(Math.abs(netEfficiency - air.efficiency)).toBeLessThan(0.015);
  });

  test('particles that keep their heat, and a composition that stays, do less work', () => {
    const [all, apart, frozenWith, frozenApart] = corners.map((corner) => cycleOf(turbineOn(aluminised), corner));
    if (all === undefined || apart === undefined || frozenWith === undefined || frozenApart === undefined)
      throw new Error();
    expect(all.turbineInlet.condensedMassShare).toBeGreaterThan(0.001);
    expect(apart.brakeEfficiency).toBeLessThan(all.brakeEfficiency);
    expect(frozenApart.brakeEfficiency).toBeLessThan(frozenWith.brakeEfficiency);
    expect(frozenWith.brakeEfficiency).toBeLessThanOrEqual(all.brakeEfficiency + 1e-9);
    expect(apart.exhaust.apart?.temperatureK).toBe(1500);
  });
});

describe('what is no turbine', () => {
  const of = (change: Partial<GasTurbineInput>): GasTurbineCycle | TurbineFault =>
    cycleOrFault(turbineOn(gasOil, change));
  const { compressor } = turbineOn(gasOil);
  test.each([
    [
      'a ratio below 1',
      { compressor: { ...compressor, pressureRatio: 0.9 } },
      { reason: 'not-in-range', of: 'pressureRatio' },
    ],
    ['an efficiency above 1', { turbineEfficiency: 1.1 }, { reason: 'not-in-range', of: 'turbineEfficiency' }],
    ['a negative wall loss', { wallLossShare: -0.1 }, { reason: 'not-in-range', of: 'wallLossShare' }],
    [
      'hotter than any flame',
      { amount: { by: 'turbine-inlet' as const, temperatureK: 3500 } },
      { reason: 'not-hot-enough', of: 'inlet' },
    ],
    ['colder than its air', { amount: { by: 'turbine-inlet' as const, temperatureK: 600 } }, { reason: 'cold-inlet' }],
    ['reheat with λ', { reheat, amount: { by: 'mass' as const, airKgPerKg: 50 } }, { reason: 'reheat-needs-inlet' }],
    ['a reheat that cools', { reheat: { temperatureK: 900, firstRatio: null } }, { reason: 'cold-reheat' }],
    [
      'a reheat hotter than any flame',
      { reheat: { temperatureK: 2600, firstRatio: null } },
      { reason: 'not-hot-enough', of: 'reheat' },
    ],
  ])('%s', (_name, change, fault) => {
    expect(of(change)).toMatchObject({ kind: 'fault', ...fault });
  });

  test('says how hot it gets', () => {
    const fault = of({ amount: { by: 'turbine-inlet', temperatureK: 3500 } });
    // Gas oil at λ = 1 with air of about 720 K and 16 bar.
    expect(fault).toMatchObject({ reason: 'not-hot-enough' });
    if (fault.kind === 'fault' && fault.reason === 'not-hot-enough') {
      expect(fault.reachesK).toBeGreaterThan(2450);
      expect(fault.reachesK).toBeLessThan(2700);
    }
  });
});
