import { describe, expect, test } from 'vitest';
import { candidateSet } from '../../../../server/core/equilibrium/candidates.ts';
import type { Equilibrium, Held } from '../../../../server/core/equilibrium/equilibrium.ts';
import { sensitivitiesOf } from '../../../../server/core/equilibrium/sensitivity.ts';
import type { Movement } from '../../../../server/core/equilibrium/sensitivity.ts';
import { equilibriumSolver } from '../../../../server/core/equilibrium/solver.ts';

// A sodium-bearing charge with a condensed phase present, so that every kind of unknown is in the system.
const solver = equilibriumSolver(candidateSet(['C', 'H', 'O', 'N', 'Na', 'Cl']));
const elementMol = Float64Array.from([1, 2, 4.2, 14, 0.4, 0.01]);
const flame = solved(elementMol, { held: 'temperature-pressure', temperatureK: 1350, pressurePa: 2e6 });

const helds: readonly (readonly [Held, key: string, size: number])[] = [
  [{ held: 'temperature-pressure', temperatureK: 1350, pressurePa: 2e6 }, 'temperatureK', 1],
  [{ held: 'enthalpy-pressure', enthalpyJ: flame.enthalpyJ, pressurePa: 2e6 }, 'enthalpyJ', 200],
  [{ held: 'entropy-pressure', entropyJPerK: flame.entropyJPerK, pressurePa: 2e6 }, 'entropyJPerK', 0.1],
  [{ held: 'temperature-volume', temperatureK: 1350, volumeM3: flame.volumeM3 }, 'temperatureK', 1],
  [
    { held: 'energy-volume', energyJ: flame.enthalpyJ - 2e6 * flame.volumeM3, volumeM3: flame.volumeM3 },
    'energyJ',
    200,
  ],
  [{ held: 'entropy-volume', entropyJPerK: flame.entropyJPerK, volumeM3: flame.volumeM3 }, 'entropyJPerK', 0.1],
];

describe.each(helds)('derivatives with $held held', (held, key, size) => {
  const sensitivities = sensitivitiesOf(solved(elementMol, held), elementMol, held);

  test('by what is held are the differences of neighbouring states', () => {
    const value = (held as unknown as Record<string, number>)[key] ?? 0;
    const low = solved(elementMol, { ...held, [key]: value - size });
    const high = solved(elementMol, { ...held, [key]: value + size });
    expectMovement(sensitivities?.byHeld, low, high, 2 * size);
  });

  test('by pressure or volume are the differences of neighbouring states', () => {
    const mechanical = 'pressurePa' in held ? 'pressurePa' : 'volumeM3';
    const value = (held as unknown as Record<string, number>)[mechanical] ?? 0;
    const low = solved(elementMol, { ...held, [mechanical]: value * Math.exp(-1e-3) });
    const high = solved(elementMol, { ...held, [mechanical]: value * Math.exp(1e-3) });
    expectMovement(sensitivities?.byLogPressureOrVolume, low, high, 2e-3);
  });

  test.each(['C', 'H', 'O', 'N', 'Na', 'Cl'])(
    'by the amount of %s are the differences of neighbouring states',
    (symbol) => {
      const row = solver.candidates.elements.indexOf(symbol);
      const change = 1e-3 * (elementMol[row] ?? 0);
      const low = elementMol.slice();
      const high = elementMol.slice();
      low[row] = (low[row] ?? 0) - change;
      high[row] = (high[row] ?? 0) + change;
      expectMovement(sensitivities?.byElement[row], solved(low, held), solved(high, held), 2 * change);
    },
  );
});

test('an absent element has no derivative', () => {
  const held: Held = { held: 'temperature-pressure', temperatureK: 2000, pressurePa: 1e5 };
  const without = elementMol.slice();
  without[5] = 0;
  expect(sensitivitiesOf(solved(without, held), without, held)?.byElement[5]).toBeUndefined();
});

test('a melting metal keeps its temperature as heat is added, and its liquid grows', () => {
  const sodium = equilibriumSolver(candidateSet(['Na']));
  const one = Float64Array.of(1);
  const cold = sodium.solve(one, { held: 'temperature-pressure', temperatureK: 370, pressurePa: 1e5 });
  if (cold.kind === 'none') throw new Error(cold.reason);
  const held: Held = { held: 'enthalpy-pressure', enthalpyJ: cold.enthalpyJ + 1500, pressurePa: 1e5 };
  const melting = sodium.solve(one, held);
  if (melting.kind === 'none') throw new Error(melting.reason);
  expect(melting.pinned?.by).toBe('phase-change');
  const moved = sensitivitiesOf(melting, one, held)?.byHeld;
  expect(moved?.temperatureK).toBeCloseTo(0, 12);
  const liquid = sodium.candidates.phases.findIndex((phase) => phase.id === 'Na(l)');
  // Heat of fusion of sodium, 2.603 kJ/mol at 370.98 K (Chase 1998, table Na-002); the fit may miss it by some J.
  expect(1 / (moved?.amountsMol[liquid] ?? 0)).toBeCloseTo(2603, -1);
});

function solved(amounts: Float64Array, held: Held): Equilibrium {
  const answer = solver.solve(amounts, held);
  if (answer.kind === 'none') throw new Error(answer.reason);
  return answer;
}

/** Central differences: right to the square of their step, here some 1e-6 of the derivative. */
function expectMovement(movement: Movement | undefined, low: Equilibrium, high: Equilibrium, step: number): void {
  const temperature = (high.temperatureK - low.temperatureK) / step;
  expect(Math.abs((movement?.temperatureK ?? NaN) - temperature)).toBeLessThan(1e-4 * Math.abs(temperature) + 1e-9);
  const differences = high.amountsMol.map((amount, phase) => (amount - (low.amountsMol[phase] ?? 0)) / step);
  const largest = differences.reduce((most, difference) => Math.max(most, Math.abs(difference)), 0);
  differences.forEach((difference, phase) => {
    expect(Math.abs((movement?.amountsMol[phase] ?? NaN) - difference)).toBeLessThan(1e-4 * largest);
  });
}
