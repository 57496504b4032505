// Cycles of engines with pistons: energy and mass close, the residual gas is the one that stays, and what an engineer knows
// of compression, boost, losses and particles comes out.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cyclePath, limitReached } from '../../../../server/core/engine/cycle-path.ts';
import { exhaustMatter, exhaustRows } from '../../../../server/core/engine/exhaust.ts';
import { corners } from '../../../../server/core/engine/expansion.ts';
import { lossTree } from '../../../../server/core/engine/loss-tree.ts';
import type { ReciprocatingInput } from '../../../../server/core/engine/reciprocating.ts';
import { solveEngine } from '../../../../server/core/engine/solved-engine.ts';
import type { SolvedEngine } from '../../../../server/core/engine/solved-engine.ts';
import { engineCharge } from '../../../../server/core/engine/work-cycle.ts';
import type { EngineCharge, SolvedCycle } from '../../../../server/core/engine/work-cycle.ts';
import { mixed, stream } from '../burn/streams.ts';
import { engine, gas, injected, solvedCycle } from './engines.ts';

const gasOil = stream('gas_oil');
const slurry = mixed([0.3, stream('sodium')], [0.7, gasOil]);
const aluminium = mixed([0.4, stream('aluminium')], [0.6, gasOil]);

/** Methane in the fresh gas, of 1 kg. */
const methane = { ...injected(stream('methane')), vapour: gas({ 'CH4(g)': 1 / 0.01604246 }) };

/** A gas engine with a pilot, as a share of the mass. */
function gasEngine(pilotShare: number, more: Partial<ReciprocatingInput> = {}): EngineCharge {
  const share = (fuel: typeof methane, by: number): typeof methane => ({
    ...fuel,
    massKg: by,
    elementMol: new Map([...fuel.elementMol].map(([symbol, mol]) => [symbol, by * mol])),
    enthalpyJ: by * fuel.enthalpyJ,
    referenceEnthalpyJ: by * fuel.referenceEnthalpyJ,
    lowerHeatingValueJ: by * fuel.lowerHeatingValueJ,
  });
  const main = { ...share(methane, 1 - pilotShare), vapour: gas({ 'CH4(g)': (1 - pilotShare) / 0.01604246 }) };
  const pilot = { ...share({ ...injected(gasOil), vapour: methane.vapour }, pilotShare), vapour: null };
  const fuels = pilotShare > 0 ? [main, pilot] : [main];
  return engine(stream('methane'), 1.9, { fuels, heatRelease: { at: 'volume' }, compressionRatio: 12, ...more });
}

const closureOf = (charge: EngineCharge, solved: SolvedCycle): number =>
  lossTree(charge, solved).reduce((sum, { share }) => sum + share, 0) - 1;

function sure(input: ReciprocatingInput): SolvedEngine {
  const solved = solveEngine(input);
  if (solved.kind === 'fault') throw new Error(JSON.stringify(solved));
  return solved;
}

describe('the losses', () => {
  const inputs = fc.record({
    compressionRatio: fc.double({ min: 8, max: 22, noNaN: true }),
    lambda: fc.double({ min: 1, max: 3.5, noNaN: true }),
    intakePressurePa: fc.double({ min: 0.7e5, max: 5e5, noNaN: true }),
    exhaustPressurePa: fc.double({ min: 0.9e5, max: 4e5, noNaN: true }),
    intakeTemperatureK: fc.double({ min: 270, max: 380, noNaN: true }),
    wallLossShare: fc.double({ min: 0, max: 0.25, noNaN: true }),
    wallLossInCombustion: fc.double({ min: 0, max: 1, noNaN: true }),
    completeness: fc.double({ min: 0.9, max: 1, noNaN: true }),
    mechanicalEfficiency: fc.double({ min: 0.7, max: 1, noNaN: true }),
    strokes: fc.constantFrom(2 as const, 4 as const),
    compression: fc.constantFrom({ law: 'isentropic' } as const, { law: 'exponent', exponent: 1.34 } as const),
    heatRelease: fc.constantFrom(
      { at: 'volume' } as const,
      { at: 'pressure' } as const,
      { at: 'limited', maximumPressurePa: 1.6e7 } as const,
    ),
    residual: fc.constantFrom({ by: 'clearance' } as const, { by: 'share', share: 0.06 } as const),
    frozenBelowK: fc.constantFrom(null, 1700),
    corner: fc.constantFrom(...corners),
    fuel: fc.constantFrom(gasOil, slurry, aluminium),
  });

  test('and the work add up to the heating value in every engine and corner', () => {
    fc.assert(
      fc.property(inputs, ({ lambda, fuel, corner, ...more }) => {
        const charge = engine(fuel, lambda, more);
        const solved = solvedCycle(charge, corner);
        expect(Math.abs(closureOf(charge, solved))).toBeLessThan(1e-9);
        const { massKg, volumeM3 } = solved.cycle.expanded.matter();
        const inKg = charge.input.freshGas.massKg + more.completeness;
        expect(Math.abs(massKg / (inKg * solved.contentTimes) - 1)).toBeLessThan(1e-9);
        expect(volumeM3 / solved.cycle.filled.volumeM3).toBeCloseTo(1, 9);
      }),
      { numRuns: 120 },
    );
  });

  test('add up for a premixed fuel, its latent heat and its pilot', () => {
    for (const charge of [
      gasEngine(0),
      gasEngine(0.02),
      gasEngine(0.02, { completeness: 0.96 }),
      gasEngine(0.02, { heatRelease: { at: 'limited', maximumPressurePa: 4e6 } }),
    ]) {
      expect(Math.abs(closureOf(charge, solvedCycle(charge)))).toBeLessThan(1e-9);
    }
  });

  test('tell unburnt fuel, walls, latent heat and particles apart', () => {
    const given = { wallLossShare: 0.12, wallLossInCombustion: 0.5, completeness: 0.98, mechanicalEfficiency: 0.9 };
    const charge = engine(slurry, 1.8, given);
    const shares = new Map(lossTree(charge, solvedCycle(charge, corners[3])).map(({ id, share }) => [id, share]));
    expect(shares.get('wall-heat')).toBeCloseTo(0.12, 12);
    expect(shares.get('unburnt-fuel')).toBeCloseTo(0.02, 12);
    // Sodium leaves in part as vapour of its hydroxide.
    expect(shares.get('exhaust-latent')).toBeGreaterThan(0.001);
    expect(shares.get('friction')).toBeCloseTo((shares.get('brake-work') ?? NaN) / 9, 9);
  });
});

describe('the residual gas', () => {
  test('fills the smallest volume at the temperature after blow-down', () => {
    const charge = engine(gasOil, 1.5, { compressionRatio: 10, heatRelease: { at: 'volume' } });
    const solved = solvedCycle(charge);
    const { blownDown, filled, residualShare } = solved.cycle;
    const volumeM3 = residualShare * blownDown.volumeM3;
    expect(volumeM3 / (filled.volumeM3 / 10)).toBeCloseTo(1, 9);
    expect(filled.temperatureK).toBeGreaterThan(300);
  });

  // The losses close whatever the cylinder is filled with, as the exhaust is what is left of the balance; this does not.
  test('and the fresh gas fill the cylinder by the first law, the piston drawing them in', () => {
    const [intakePressurePa, exhaustPressurePa] = [3e5, 2e5];
    const charge = engine(gasOil, 2, { intakePressurePa, exhaustPressurePa });
    const { blownDown, filled, residualShare } = solvedCycle(charge).cycle;
    const clearanceM3 = residualShare * blownDown.volumeM3;
    const stayingJ = residualShare * blownDown.enthalpyJ - exhaustPressurePa * clearanceM3;
    const pistonJ = intakePressurePa * (filled.volumeM3 - clearanceM3);
    const energyJ = filled.enthalpyJ - intakePressurePa * filled.volumeM3;
    expect((energyJ - stayingJ - charge.fresh.enthalpyJ + pistonJ) / pistonJ).toBeCloseTo(0, 9);
  });

  test('is the share that is asked for, or none', () => {
    const share = solvedCycle(engine(gasOil, 2, { residual: { by: 'share', share: 0.1 } }));
    expect(share.cycle.residualShare).toBeCloseTo(0.1, 12);
    const none = solvedCycle(engine(gasOil, 2, { residual: { by: 'share', share: 0 } }));
    expect(none.cycle.residualShare).toBe(0);
    expect(none.cycle.rounds).toBe(1);
    expect(none.cycle.filled.temperatureK).toBeCloseTo(300, 9);
  });

  test('that would fill the whole cylinder is told', () => {
    const { input } = engine(gasOil, 2);
    expect(solveEngine({ ...input, exhaustPressurePa: 2e6 })).toEqual({ kind: 'fault', reason: 'no-fresh-gas' });
  });
});

describe('work', () => {
  const indicated = (more: Partial<ReciprocatingInput>, lambda = 1.6): number => {
    const charge = engine(gasOil, lambda, more);
    return solvedCycle(charge).cycle.balance.indicatedWorkJ / charge.lowerHeatingValueJ;
  };

  test('grows with compression, and with air', () => {
    const at = (compressionRatio: number): number => indicated({ compressionRatio });
    expect(at(12)).toBeLessThan(at(15));
    expect(at(15)).toBeLessThan(at(20));
    expect(indicated({}, 1.1)).toBeLessThan(indicated({}, 1.6));
    expect(indicated({}, 1.6)).toBeLessThan(indicated({}, 3));
  });

  test('is more the earlier the heat comes, and a limit on pressure lies between', () => {
    const [pressure, limited, volume] = [
      indicated({ heatRelease: { at: 'pressure' } }),
      indicated({ heatRelease: { at: 'limited', maximumPressurePa: 7e6 } }),
      indicated({ heatRelease: { at: 'volume' } }),
    ] as [number, number, number];
    expect(pressure).toBeLessThan(limited);
    expect(limited).toBeLessThan(volume);
  });

  test('is lost more by heat that leaves in the fire than by heat that leaves at the end', () => {
    const early = indicated({ wallLossShare: 0.1, wallLossInCombustion: 1 });
    const late = indicated({ wallLossShare: 0.1, wallLossInCombustion: 0 });
    const none = indicated({});
    expect(early).toBeLessThan(late);
    // Late heat costs nothing but what colder residual gas changes.
    expect(Math.abs(late - none)).toBeLessThan(0.002);
  });

  test('of gas exchange follows the pressures and the swept volume', () => {
    const boosted = solvedCycle(engine(gasOil, 2, { intakePressurePa: 3e5, exhaustPressurePa: 2.5e5 }));
    const { pumpingWorkJ, sweptM3 } = boosted.cycle.balance;
    expect(pumpingWorkJ).toBeCloseTo(-0.5e5 * sweptM3, 6);
    const twoStroke = solvedCycle(engine(gasOil, 2, { strokes: 2, residual: { by: 'share', share: 0.05 } }));
    expect(twoStroke.cycle.balance.pumpingWorkJ).toBe(0);
  });

  test('equals the area in the diagram of pressure over volume', () => {
    const charge = engine(gasOil, 1.6, { heatRelease: { at: 'limited', maximumPressurePa: 7e6 } });
    const solved = solvedCycle(charge);
    const path = cyclePath(charge, solved, 401, 401);
    expect(path.incomplete).toBe(false);
    const area = (states: readonly { readonly pressurePa: number; readonly volumeM3: number }[]): number => {
      const step = Math.log((states.at(-1)?.volumeM3 ?? NaN) / (states[0]?.volumeM3 ?? NaN)) / (states.length - 1);
      return states.reduce((sum, { pressurePa, volumeM3 }, k) => {
        const weight = k === 0 || k === states.length - 1 ? 1 : k % 2 === 1 ? 4 : 2;
        return sum + (weight * pressurePa * volumeM3 * step) / 3;
      }, 0);
    };
    const { burnt, compressed, expanded, balance } = solved.cycle;
    const held = burnt.pressurePa * (burnt.volumeM3 - compressed.volumeM3);
    const found = held + area(path.expansion) + area(path.compression);
    expect(found / balance.indicatedWorkJ).toBeCloseTo(1, 7);
    expect(path.expansion.at(-1)?.temperatureK).toBeCloseTo(expanded.temperatureK, 6);
    expect(path.compression.at(-1)?.temperatureK).toBeCloseTo(compressed.temperatureK, 6);
  });
});

describe('a limit on pressure', () => {
  const limited = (bar: number): SolvedEngine =>
    sure(engine(gasOil, 1.6, { heatRelease: { at: 'limited', maximumPressurePa: bar * 1e5 } }).input);

  test('is kept, reached, or passed by compression alone', () => {
    expect(limited(300).cautious.cycle.limit).toBe('kept');
    const reached = limited(70).cautious.cycle;
    expect(reached.limit).toBe('reached');
    expect(reached.burnt.pressurePa).toBeCloseTo(7e6, 3);
    const passed = limited(20).cautious.cycle;
    expect(passed.limit).toBe('passed-by-compression');
    expect(passed.burnt.pressurePa).toBeGreaterThan(2e6);
  });

  test('is reached with part of the fuel burnt, at the smallest volume', () => {
    const { charge, cautious } = limited(70);
    const found = limitReached(charge, cautious);
    if (found?.kind !== 'limit-reached') throw new Error(JSON.stringify(found));
    expect(found.burntShare).toBeGreaterThan(0.1);
    expect(found.burntShare).toBeLessThan(0.9);
    expect(found.state.pressurePa / 7e6).toBeCloseTo(1, 9);
    expect(found.state.volumeM3 / cautious.cycle.compressed.volumeM3).toBeCloseTo(1, 9);
    expect(found.state.temperatureK).toBeLessThan(cautious.cycle.burnt.temperatureK);
    const free = limited(300);
    expect(limitReached(free.charge, free.cautious)).toBeNull();
  });
});

describe('particles', () => {
  test('make a band of four corners, of which the lowest counts', () => {
    for (const fuel of [slurry, aluminium]) {
      const { cycles, cautious } = sure(engine(fuel, 1.5).input);
      expect(cycles.map(({ cycle }) => cycle.corner)).toEqual(corners);
      const works = cycles.map(({ cycle }) => cycle.balance.brakeWorkJ);
      expect(cautious.cycle.balance.brakeWorkJ).toBe(Math.min(...works));
      expect(cautious.cycle.corner.chemistry).toBe('frozen');
      expect(Math.max(...works)).toBe(works[0]);
    }
    // Alumina is there from the start; what sodium makes is gas until it has expanded.
    expect(sure(engine(aluminium, 1.5).input).cautious.cycle.corner.particles).toBe('no-heat-back');
  });

  test('are none in a hydrocarbon, which has one cycle', () => {
    expect(sure(engine(gasOil, 1.5).input).cycles.length).toBe(1);
    const frozen = sure(engine(gasOil, 1.5, { frozenBelowK: 1800 }).input).cautious.cycle;
    expect(frozen.corner.chemistry).toBe('frozen');
    expect(frozen.expanded.isFrozen).toBe(true);
  });
});

describe('the exhaust', () => {
  test('holds what went in, and is hotter than the gas that stays', () => {
    const charge = engine(gasOil, 2);
    const solved = solvedCycle(charge);
    const { exhaustTemperatureK, blownDown } = solved.cycle;
    expect(exhaustTemperatureK).toBeGreaterThan(blownDown.temperatureK);
    const rows = exhaustRows(exhaustMatter(solved, 1e5), solved.contentTimes);
    const kg = rows.reduce((sum, { massKg }) => sum + massKg, 0);
    expect(kg / (charge.input.freshGas.massKg + 1)).toBeCloseTo(1, 9);
    const oxygen = rows.find(({ id }) => id === 'O2(g)');
    const carbonDioxide = rows.find(({ id }) => id === 'CO2(g)');
    expect(carbonDioxide?.shareAt15).toBeCloseTo(
      ((carbonDioxide?.dryMoleShare ?? NaN) * 0.05946) / (0.20946 - (oxygen?.dryMoleShare ?? NaN)),
      12,
    );
    expect(oxygen?.shareAt15).toBeNull();
    // λ = 2 burns half of the oxygen.
    expect(oxygen?.dryMoleShare).toBeGreaterThan(0.1);
    expect(oxygen?.dryMoleShare).toBeLessThan(0.12);
  });
});

describe('what no engine has', () => {
  test.each([
    [{ compressionRatio: 1 }, 'compressionRatio'],
    [{ compressionRatio: NaN }, 'compressionRatio'],
    [{ wallLossShare: -0.1 }, 'wallLossShare'],
    [{ wallLossInCombustion: 1.1 }, 'wallLossInCombustion'],
    [{ completeness: 0 }, 'completeness'],
    [{ mechanicalEfficiency: 1.2 }, 'mechanicalEfficiency'],
    [{ residual: { by: 'share', share: 1 } }, 'residual'],
    [{ intakePressurePa: 0 }, 'intakePressurePa'],
    [{ heatRelease: { at: 'limited', maximumPressurePa: 0 } }, 'heatRelease'],
  ] as const)('%o is told by its name', (more, of) => {
    const { input } = engine(gasOil, 2);
    expect(engineCharge({ ...input, ...more })).toEqual({
      kind: 'fault',
      reason: 'not-in-range',
      of,
    });
  });

  test('a state beyond all data is told with its place', () => {
    const { input } = engine(gasOil, 1);
    const solved = solveEngine({ ...input, intakeTemperatureK: 190 });
    expect(solved).toMatchObject({ kind: 'fault', reason: 'no-state', state: 'intake' });
  });
});
