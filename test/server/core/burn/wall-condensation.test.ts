// Alkali vapour of a frozen gas on a wall: what condenses, down to its saturation and no atom lost.

import { describe, expect, test } from 'vitest';
import { matterState } from '../../../../server/core/burn/matter-state.ts';
import { amountOf } from '../../../../server/core/burn/products.ts';
import { vapourOnWall } from '../../../../server/core/burn/wall-condensation.ts';
import { phaseOfId, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import { molarGasConstantJPerMolK, standardPressurePa } from '../../../../server/core/quantity/constants.ts';
import { burn, mixed, solved, stream } from './streams.ts';

const slurry = mixed([0.4, stream('sodium')], [0.6, stream('methanol')]);
const gas = burn(slurry, { amount: { by: 'lambda', lambda: 1.2 }, frozenBelowK: 1473 });

/** Pressure over which a liquid's own vapour stands, from the two phases' Gibbs energies. */
function saturationPa(liquid: string, vapour: string, temperatureK: number): number {
  const gibbs = (id: string): number => {
    const phase = phaseOfId(id);
    return (phase && propertiesOfPhase(phase, temperatureK)?.gibbsJPerMol) ?? Number.NaN;
  };
  const excess = (gibbs(liquid) - gibbs(vapour)) / (molarGasConstantJPerMolK * temperatureK);
  return standardPressurePa * Math.exp(excess);
}

describe('hydroxide that froze as vapour', () => {
  const arriving = solved(gas.at(800));
  const met = vapourOnWall(arriving);

  test('condenses as melt, pairs as two, down to its saturation', () => {
    if (met === null) throw new Error();
    const names = met.vapours.map((phase) => arriving.candidates.phases[phase]?.id);
    expect(names).toEqual(['NaOH(g)', 'Na2O2H2(g)']);
    const lost = (id: string): number => amountOf(arriving, id) - amountOf(met.state, id);
    expect(amountOf(met.state, 'NaOH(l)')).toBeCloseTo(lost('NaOH(g)') + 2 * lost('Na2O2H2(g)'), 12);
    const left = (amountOf(met.state, 'NaOH(g)') / arriving.gasMol) * arriving.pressurePa;
    expect(left / saturationPa('NaOH(l)', 'NaOH(g)', 800)).toBeCloseTo(1, 9);
  });

  test('keeps its atoms and its mass', () => {
    if (met === null) throw new Error();
    const { phases } = arriving.candidates;
    const atoms = (amounts: Float64Array, symbol: string): number =>
      phases.reduce(
        (sum, { formula }, phase) => sum + (formula.composition.get(symbol) ?? 0) * (amounts[phase] ?? 0),
        0,
      );
    for (const symbol of ['Na', 'O', 'H', 'C', 'N'])
      expect(atoms(met.state.amountsMol, symbol) / atoms(arriving.amountsMol, symbol)).toBeCloseTo(1, 12);
    expect(met.state.massKg / arriving.massKg).toBeCloseTo(1, 12);
    expect(met.state.condensedMassShare).toBeGreaterThan(arriving.condensedMassShare);
  });

  test('leaves nothing more to condense', () => {
    expect(met && vapourOnWall(met.state)).toBeNull();
  });

  test('stays vapour on a wall hot enough', () => {
    expect(vapourOnWall(solved(gas.at(1450)))).toBeNull();
  });
});

test('water is no alkali vapour, and an equilibrium has condensed already', () => {
  const clean = burn(stream('methane'), { frozenBelowK: 500 });
  expect(vapourOnWall(solved(clean.at(300)))).toBeNull();
  const cooled = solved(burn(slurry, { amount: { by: 'lambda', lambda: 1.2 } }).at(800));
  expect(vapourOnWall(cooled)).toBeNull();
  expect(vapourOnWall(matterState(cooled.candidates, cooled.amountsMol, 800, cooled.pressurePa))).toBeNull();
});
