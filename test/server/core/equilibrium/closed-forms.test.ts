// Single reactions, whose composition has a closed form, and the heat capacities and exponents of an answer as differences of
// neighbouring answers. Knows no reference value: both sides come from the same data. Random cases by fast-check, fixed seed.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { gasConstantJPerMolK } from '../../../../server/core/substance/heat-capacity-terms.ts';
import { propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import {
  equilibriumAt,
  equilibriumOf,
  molOf,
  phaseCalled,
  solverOf,
  solverOver,
} from '../../../support/equilibrium.ts';
import { logPressureBar, near, runs, share, temperatureK } from '../../../support/random-equilibria.ts';

function constantOf(terms: Readonly<Record<string, number>>, temperature: number): number {
  let change = 0;
  for (const [id, count] of Object.entries(terms)) {
    change += count * (propertiesOfPhase(phaseCalled(id), temperature)?.gibbsJPerMol ?? NaN);
  }
  return Math.exp(-change / (gasConstantJPerMolK * temperature));
}

describe('a single reaction has the composition of its closed form', () => {
  test('N2 = 2 N: the degree is the root of K / (K + 4 p)', () => {
    const solver = solverOver('N', ['N2(g)', 'N(g)']);
    fc.assert(
      fc.property(temperatureK, logPressureBar, (temperature, logPressure) => {
        const constant = constantOf({ 'N2(g)': -1, 'N(g)': 2 }, temperature);
        const pressure = 10 ** logPressure;
        const degree = Math.sqrt(constant / (constant + 4 * pressure));
        const answer = equilibriumAt(solver, { N2: 1 }, temperature, pressure * 1e5);
        expect(near(molOf(answer, 'N(g)'), 2 * degree)).toBeLessThan(1e-9);
      }),
      runs,
    );
  });

  test('H2 + Cl2 = 2 HCl in any proportion, as without pressure', () => {
    const solver = solverOver('H Cl', ['H2(g)', 'Cl2(g)', 'HCl(g)']);
    fc.assert(
      fc.property(temperatureK, logPressureBar, share, (temperature, logPressure, chlorine) => {
        const constant = constantOf({ 'H2(g)': -1, 'Cl2(g)': -1, 'HCl(g)': 2 }, temperature);
        const answer = equilibriumAt(solver, { H2: 1, Cl2: chlorine }, temperature, 10 ** logPressure * 1e5);
        // 4 x² = K (1 - x)(c - x), of which the smaller root; here solved for the chlorine that is left, u = c - x.
        const [a, b, c] = [constant - 4, constant * (1 - chlorine) + 8 * chlorine, -4 * chlorine ** 2];
        const left = (-2 * c) / (b + Math.sqrt(b * b - 4 * a * c));
        expect(near(molOf(answer, 'Cl2(g)'), left)).toBeLessThan(1e-8);
        expect(near(answer.gasMol, 1 + chlorine)).toBeLessThan(1e-12);
      }),
      runs,
    );
  });

  test('H2O = H2 + O2/2 with steam in excess of either: the cube of its degree', () => {
    const solver = solverOver('H O', ['H2O(g)', 'H2(g)', 'O2(g)']);
    fc.assert(
      fc.property(fc.double({ min: 1000, max: 5000, noNaN: true }), logPressureBar, (temperature, logPressure) => {
        const pressure = 10 ** logPressure;
        const answer = equilibriumAt(solver, { H2O: 1 }, temperature, pressure * 1e5);
        const degree = molOf(answer, 'H2(g)');
        const constant = constantOf({ 'H2O(g)': -1, 'H2(g)': 1, 'O2(g)': 0.5 }, temperature);
        const closed = (degree * Math.sqrt((degree * pressure) / (2 + degree))) / molOf(answer, 'H2O(g)');
        expect(near(closed, constant)).toBeLessThan(1e-9);
      }),
      runs,
    );
  });

  test('MgO + CO2 = MgCO3: all or nothing, on the side of the dissociation pressure', () => {
    const solver = solverOver('Mg C O', ['MgO(cr)', 'MgCO3(cr)', 'CO2(g)']);
    fc.assert(
      fc.property(fc.double({ min: 400, max: 900, noNaN: true }), logPressureBar, (temperature, logPressure) => {
        const dissociationBar = constantOf({ 'MgCO3(cr)': -1, 'MgO(cr)': 1, 'CO2(g)': 1 }, temperature);
        const pressure = 10 ** logPressure;
        fc.pre(Math.abs(Math.log(pressure / dissociationBar)) > 1e-6);
        const answer = equilibriumAt(solver, { MgCO3: 1, CO2: 0.5 }, temperature, pressure * 1e5);
        expect(near(molOf(answer, 'CO2(g)'), pressure > dissociationBar ? 0.5 : 1.5)).toBeLessThan(1e-12);
        expect(molOf(answer, pressure > dissociationBar ? 'MgO(cr)' : 'MgCO3(cr)')).toBe(0);
      }),
      runs,
    );
  });

  test('inert gas alone stays what it is', () => {
    const answer = equilibriumAt(solverOf('He Ar'), { He: 1, Ar: 3 }, 1000, 1e5);
    expect(near(molOf(answer, 'He(g)'), 1)).toBeLessThan(1e-14);
    expect(near(molOf(answer, 'Ar(g)'), 3)).toBeLessThan(1e-14);
    // The fit leaves 1e-5 of the heat capacity of 5/2 R that a gas of single atoms has.
    expect(near(answer.heatCapacityJPerK ?? NaN, 10 * gasConstantJPerMolK)).toBeLessThan(1e-4);
    expect(near(answer.frozenGamma ?? NaN, 5 / 3)).toBeLessThan(1e-4);
    expect(near(answer.gamma ?? NaN, answer.frozenGamma ?? NaN)).toBeLessThan(1e-12);
  });
});

describe('derivatives are those of neighbouring states', () => {
  test.each([
    ['a flame', 'C H O N', { CH4: 1, O2: 2, N2: 7.52 }, 2400, 101_325],
    ['a rich flame', 'C H O N', { CH4: 1.4, O2: 2, N2: 7.52 }, 2000, 3e6],
    ['splitting steam', 'H O', { H2O: 1 }, 3500, 1e4],
    ['soot beside gas', 'C H O', { CH4: 2, H2O: 1 }, 1200, 1e5],
    ['a melt beside gas', 'Al O', { Al: 2, O2: 2 }, 3600, 1e5],
    ['sodium in air', 'Na O N H', { Na: 1, O2: 1, N2: 3.76, H2: 0.5 }, 1800, 1e5],
    ['cool air', 'O N', { O2: 0.21, N2: 0.79 }, 400, 1e5],
  ] as const)('%s', (_, elements, mixture, temperature, pressurePa) => {
    const solver = solverOf(elements);
    const state = equilibriumAt(solver, mixture, temperature, pressurePa);
    const step = 0.05;
    const [cooler, warmer] = [-step, step].map((by) => equilibriumAt(solver, mixture, temperature + by, pressurePa));
    if (cooler === undefined || warmer === undefined) throw new Error('no neighbours');
    const heatCapacity = (warmer.enthalpyJ - cooler.enthalpyJ) / (2 * step);
    expect(near(state.heatCapacityJPerK ?? NaN, heatCapacity)).toBeLessThan(1e-6);

    const entropyJPerK = state.entropyJPerK;
    const [lower, higher] = [1 - 1e-4, 1 + 1e-4].map((factor) =>
      equilibriumOf(solver, mixture, { held: 'entropy-pressure', entropyJPerK, pressurePa: pressurePa * factor }),
    );
    if (lower === undefined || higher === undefined) throw new Error('no neighbours');
    const gamma = -Math.log(higher.pressurePa / lower.pressurePa) / Math.log(higher.volumeM3 / lower.volumeM3);
    expect(near(state.gamma ?? NaN, gamma)).toBeLessThan(1e-6);
    const densityKgPerM3 = state.massKg / state.volumeM3;
    expect(near(state.speedOfSoundMPerS ?? NaN, Math.sqrt((gamma * pressurePa) / densityKgPerM3))).toBeLessThan(1e-6);

    const gasOnly =
      state.frozenHeatCapacityJPerK / (state.frozenHeatCapacityJPerK - state.gasMol * gasConstantJPerMolK);
    expect(near(state.frozenGamma ?? NaN, gasOnly)).toBeLessThan(1e-12);
  });
});
