// Two phases side by side: boiling points and decompositions as the temperature that an amount of heat between two states finds,
// saturation pressures as the pressure over a liquid in a volume, and what the answer says of being held there.

import { describe, expect, test } from 'vitest';
import steam from '../../../reference/steam-iapws.json' with { type: 'json' };
import twoPhase from '../../../reference/two-phase-temperatures.json' with { type: 'json' };
import {
  equilibriumAt,
  equilibriumOf,
  molOf,
  phaseCalled,
  presentIn,
  solverOf,
  solverOver,
} from '../../../support/equilibrium.ts';

const elementsOf = (formula: string): string => [...phaseOf(formula).formula.composition.keys()].join(' ');
const phaseOf = (formula: string): ReturnType<typeof phaseCalled> =>
  phaseCalled(formula.includes('(OH)') || formula === 'MgCO3' ? `${formula}(cr)` : `${formula}(l)`);

describe('heat half-way between two states finds the temperature at which they meet', () => {
  test.each(twoPhase.rows.filter(({ kind }) => kind !== 'flame held by its oxide'))(
    '$formula $kind at $heldK K, $pressurePa Pa',
    ({ formula, kind, into, pressurePa, heldK, withinK }) => {
      const solver =
        kind === 'boils'
          ? solverOf(elementsOf(formula))
          : solverOver(elementsOf(formula), [phaseOf(formula).id, ...(into ?? '').split(' ')]);
      const [below, above] = [heldK - 15, heldK + 15].map((temperatureK) =>
        equilibriumAt(solver, { [formula]: 1 }, temperatureK, pressurePa),
      );
      if (below === undefined || above === undefined) throw new Error('no states');
      const middle = equilibriumOf(
        solver,
        { [formula]: 1 },
        { held: 'enthalpy-pressure', enthalpyJ: (below.enthalpyJ + above.enthalpyJ) / 2, pressurePa },
      );
      expect(Math.abs(middle.temperatureK - heldK)).toBeLessThan(withinK);
      expect(presentIn(below)).toEqual([phaseOf(formula).id]);
      expect(molOf(above, phaseOf(formula).id)).toBe(0);
      expect(molOf(middle, phaseOf(formula).id)).toBeGreaterThan(0.2);
      expect(molOf(middle, phaseOf(formula).id)).toBeLessThan(0.8);
      expect(middle.pinned?.gasGrows).toBe(true);
      expect(middle.pinned?.leaving.map((index) => middle.candidates.phases[index]?.id)).toEqual([phaseOf(formula).id]);
      expect(middle.heatCapacityJPerK).toBeNull();
      expect(below.pinned).toBeNull();
    },
  );
});

describe(`saturation pressure of water: ${steam.source}`, () => {
  // Ideal vapour over a liquid without volume: right to a per cent as long as the vapour is thin.
  const rows = (steam.rows as readonly Partial<Record<string, unknown>>[]).filter(
    ({ over, temperatureK }) => over === 'liquid' && Number(temperatureK) < 335,
  );
  test.each(rows)('at $temperatureK K', ({ temperatureK, pressurePa }) => {
    const answer = equilibriumOf(
      solverOf('H O'),
      { H2O: 1 },
      { held: 'temperature-volume', temperatureK: Number(temperatureK), volumeM3: 1e-3 },
    );
    expect(Math.abs(answer.pressurePa / Number(pressurePa) - 1)).toBeLessThan(0.01);
    expect(presentIn(answer)).toContain('H2O(l)');
  });
});

test('melting holds the temperature as boiling does, and without gas', () => {
  const solver = solverOf('Na');
  const states = [360, 380].map((temperatureK) => equilibriumAt(solver, { Na: 1 }, temperatureK, 1e5));
  const enthalpyJ = states.reduce((sum, state) => sum + state.enthalpyJ / 2, 0);
  const answer = equilibriumOf(solver, { Na: 1 }, { held: 'enthalpy-pressure', enthalpyJ, pressurePa: 1e5 });
  // CRC Handbook of Chemistry and Physics, 95th ed. (2014): 370.944 K.
  expect(Math.abs(answer.temperatureK - 370.944)).toBeLessThan(0.3);
  expect(answer.pinned).toMatchObject({ by: 'phase-change', gasGrows: false });
  expect(answer.gasMol).toBe(0);
  expect(answer.speedOfSoundMPerS).toBeNull();
});
