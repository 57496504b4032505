// The charge model: mixtures that do not react, their compression, and products that expand in each corner. Laws that need no
// source, closed forms of gases whose heat capacity does not vary, and the same state from two solvers.

import { describe, expect, test } from 'vitest';
import { compressed, gasOf, joined, scaled } from '../../../../server/core/engine/charge.ts';
import type { Compressed } from '../../../../server/core/engine/charge.ts';
import { corners, expansionFrom } from '../../../../server/core/engine/expansion.ts';
import type { ExpandingState } from '../../../../server/core/engine/expansion.ts';
import { gasByHeatCapacity } from '../../../../server/core/engine/gas-by-heat-capacity.ts';
import { frozenMixture, mixtureFrozenFrom } from '../../../../server/core/engine/frozen-mixture.ts';
import type { FrozenMixture, MixtureState } from '../../../../server/core/engine/frozen-mixture.ts';
import { reactingCharge } from '../../../../server/core/engine/reacting-charge.ts';

const gasConstant = 8.31446261815324;

function gas(amounts: Readonly<Record<string, number>>): FrozenMixture {
  const found = gasOf(new Map(Object.entries(amounts)));
  if ('kind' in found) throw new Error(found.ids.join());
  return found;
}

function sure<State extends { readonly kind: string }>(state: State): Exclude<State, { readonly kind: 'none' }> {
  if (state.kind === 'none') throw new Error(JSON.stringify(state));
  return state as Exclude<State, { readonly kind: 'none' }>;
}

const air = gas({ 'O2(g)': 0.21, 'N2(g)': 0.79 });
const intake: MixtureState = sure(air.solve({ held: 'temperature-pressure', temperatureK: 300, pressurePa: 1e5 }));

describe('a mixture that does not react', () => {
  test('has one state whichever two properties are held', () => {
    const { enthalpyJ, energyJ, entropyJPerK, pressurePa, volumeM3 } = intake;
    for (const held of [
      { held: 'enthalpy-pressure', enthalpyJ, pressurePa },
      { held: 'energy-volume', energyJ, volumeM3 },
      { held: 'entropy-pressure', entropyJPerK, pressurePa },
      { held: 'entropy-volume', entropyJPerK, volumeM3 },
      { held: 'temperature-volume', temperatureK: 300, volumeM3 },
    ] as const) {
      for (const nearK of [250, 1000, 5000]) {
        const state = sure(air.solve(held, nearK));
        expect(state.temperatureK / 300).toBeCloseTo(1, 12);
        expect(state.pressurePa / 1e5).toBeCloseTo(1, 12);
      }
    }
  });

  test('of constant heat capacity follows the closed form', () => {
    const monatomic = gasByHeatCapacity({
      id: 'monatomic',
      composition: new Map(),
      molarMassKgPerMol: 0.04,
      enthalpyJPerMol: 0,
      heatCapacityJPerMolK: 2.5 * gasConstant,
      heatCapacityRiseJPerMolK2: 0,
      validK: [200, 6000],
    });
    const held = { held: 'temperature-pressure', temperatureK: 300, pressurePa: 1e5 } as const;
    const from = sure(frozenMixture([{ species: monatomic, mol: 2 }]).solve(held));
    expect(from.gamma).toBeCloseTo(5 / 3, 12);
    const { state, pistonWorkJ } = sure(compressed(from, { volumeM3: from.volumeM3 / 8 }, { law: 'isentropic' }));
    expect(state.temperatureK / 1200).toBeCloseTo(1, 12);
    expect(pistonWorkJ / (2 * 1.5 * gasConstant * 900)).toBeCloseTo(1, 12);
  });

  test('gains the entropy of mixing', () => {
    const held = { held: 'temperature-pressure', temperatureK: 300, pressurePa: 1e5 } as const;
    const apart = [gas({ 'O2(g)': 0.21 }), gas({ 'N2(g)': 0.79 })].map((one) => sure(one.solve(held)).entropyJPerK);
    const mixing = -gasConstant * (0.21 * Math.log(0.21) + 0.79 * Math.log(0.79));
    expect(intake.entropyJPerK - apart.reduce((sum, one) => sum + one, 0)).toBeCloseTo(mixing, 9);
  });

  test('melts on the way, both forms sharing what is held', () => {
    const charge = reactingCharge(new Map(Object.entries({ C: 1, Na: 2, O: 8, N: 20 })));
    const hot = sure(charge.burnt({ held: 'temperature-pressure', temperatureK: 1200, pressurePa: 1e5 }));
    const mixture = mixtureFrozenFrom(hot);
    expect(mixture.parts.find(({ species }) => species.id === 'Na2CO3(l)')?.mol).toBeCloseTo(1, 2);
    const at = (temperatureK: number): MixtureState =>
      sure(mixture.solve({ held: 'temperature-pressure', temperatureK, pressurePa: 1e5 }));
    const [cold, warm] = [at(1120), at(1140)];
    // Na2CO3 melts at 1123 K, which takes more than all the rest warms by.
    for (const share of [0.4, 0.5, 0.6]) {
      const enthalpyJ = cold.enthalpyJ + share * (warm.enthalpyJ - cold.enthalpyJ);
      const state = sure(mixture.solve({ held: 'enthalpy-pressure', enthalpyJ, pressurePa: 1e5 }));
      expect(state.temperatureK).toBeCloseTo(1123, 0);
      expect(state.enthalpyJ / enthalpyJ).toBeCloseTo(1, 12);
      const { entropyJPerK } = state;
      const same = sure(mixture.solve({ held: 'entropy-pressure', entropyJPerK, pressurePa: 1e5 }));
      expect(same.enthalpyJ / enthalpyJ).toBeCloseTo(1, 10);
    }
  });

  test('adds up and scales', () => {
    const twice = joined(air, scaled(air, 1));
    expect(twice.gasMol).toBeCloseTo(2, 12);
    expect(twice.parts.length).toBe(2);
    expect(scaled(air, 0).parts.length).toBe(0);
    expect(twice.elementMol.get('N')).toBeCloseTo(4 * 0.79, 12);
  });

  test('is told from gases that the tables do not have', () => {
    expect(
      gasOf(
        new Map([
          ['Xy(g)', 1],
          ['O2(g)', 1],
        ]),
      ),
    ).toEqual({ kind: 'unknown-gases', ids: ['Xy(g)'] });
  });
});

describe('compression', () => {
  const sureOf = (result: ReturnType<typeof compressed>): Compressed => sure(result);

  test('to a volume and on to the pressure found there and back is reversible', () => {
    const { state } = sureOf(compressed(intake, { volumeM3: intake.volumeM3 / 16 }, { law: 'isentropic' }));
    const back = sureOf(compressed(state, { pressurePa: 1e5 }, { law: 'isentropic' })).state;
    expect(back.temperatureK).toBeCloseTo(300, 8);
    expect(state.entropyJPerK).toBeCloseTo(intake.entropyJPerK, 9);
  });

  test('by an exponent gives the walls what it does not keep', () => {
    for (const exponent of [1, 1 + 1e-10, 1.2, 1.3]) {
      const { state, pistonWorkJ, heatOutJ } = sureOf(
        compressed(intake, { volumeM3: intake.volumeM3 / 16 }, { law: 'exponent', exponent }),
      );
      expect(state.temperatureK).toBeCloseTo(300 * 16 ** (exponent - 1), 6);
      // Simpson's rule over p = p1 (V1/V)^n.
      const steps = 20000;
      let integral = 0;
      for (let k = 0; k <= steps; k += 1) {
        const logV = (k / steps) * Math.log(16);
        const weight = k === 0 || k === steps ? 1 : k % 2 === 1 ? 4 : 2;
        integral += weight * intake.pressurePa * intake.volumeM3 * Math.exp((exponent - 1) * logV);
      }
      integral *= Math.log(16) / steps / 3;
      expect(pistonWorkJ / integral).toBeCloseTo(1, 9);
      expect(pistonWorkJ - heatOutJ).toBeCloseTo(state.energyJ - intake.energyJ, 9);
      expect(heatOutJ).toBeGreaterThan(0);
    }
  });

  test('by a polytropic efficiency is that of many small isentropic ones', () => {
    const whole = sureOf(compressed(intake, { pressurePa: 2e6 }, { law: 'polytropic-efficiency', efficiency: 0.9 }));
    let state = intake;
    const steps = 4000;
    for (let k = 1; k <= steps; k += 1) {
      const pressurePa = 1e5 * 20 ** (k / steps);
      state = sureOf(compressed(state, { pressurePa }, { law: 'isentropic-efficiency', efficiency: 0.9 })).state;
    }
    expect(state.temperatureK).toBeCloseTo(whole.state.temperatureK, 1);
    expect(whole.shaftWorkJ).toBeGreaterThan(
      sureOf(compressed(intake, { pressurePa: 2e6 }, { law: 'isentropic' })).shaftWorkJ,
    );
  });
});

const equalTo = (a: number, b: number): void => {
  expect(Math.abs(a / b - 1)).toBeLessThan(1e-8);
};

describe('products that expand', () => {
  const burnt = (amounts: Readonly<Record<string, number>>, enthalpyJ: number, pressurePa: number) => {
    const charge = reactingCharge(new Map(Object.entries(amounts)));
    return { charge, start: sure(charge.burnt({ held: 'enthalpy-pressure', enthalpyJ, pressurePa })) };
  };
  const methane = burnt({ C: 1, H: 4, O: 5, N: 18.8 }, -74_600 + 150_000, 1e7);
  const magnesium = burnt({ Mg: 1, C: 1, H: 2, O: 8, N: 30 }, 100_000, 1e7);

  test('have where they start the state that they come from, frozen or not', () => {
    for (const { charge, start } of [methane, magnesium]) {
      for (const corner of corners) {
        const expansion = expansionFrom(charge, start, corner, null);
        equalTo(expansion.start.temperatureK, start.temperatureK);
        equalTo(expansion.start.enthalpyJ, start.enthalpyJ);
        const { entropyJPerK } = expansion.start;
        const same = sure(expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3: start.volumeM3 }));
        equalTo(same.temperatureK, start.temperatureK);
        equalTo(same.enthalpyJ, start.enthalpyJ);
        equalTo(same.pressurePa, start.pressurePa);
      }
    }
  });

  test('do the work of their pressure over the volume of the gas, in every corner', () => {
    for (const { charge, start } of [methane, magnesium]) {
      for (const corner of corners) {
        const expansion = expansionFrom(charge, start, corner, 1800);
        const { entropyJPerK } = expansion.start;
        const steps = 400;
        let near: ExpandingState = expansion.start;
        let integral = 0;
        for (let k = 0; k <= steps; k += 1) {
          const volumeM3 = start.volumeM3 * 12 ** (k / steps);
          near = sure(expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3 }, near));
          const weight = k === 0 || k === steps ? 1 : k % 2 === 1 ? 4 : 2;
          integral += weight * near.pressurePa * volumeM3;
        }
        integral *= Math.log(12) / steps / 3;
        // Simpson's rule is coarse at the kinks where phases come and go.
        expect(integral / (expansion.start.energyJ - near.energyJ)).toBeCloseTo(1, 5);
        expect(near.isFrozen).toBe(corner.chemistry === 'frozen');
      }
    }
  });

  test('freeze where the isentrope passes the temperature, and the composition then stays', () => {
    const corner = { chemistry: 'frozen', particles: 'with-gas' } as const;
    const expansion = expansionFrom(methane.charge, methane.start, corner, 1800);
    const { entropyJPerK } = expansion.start;
    const end = sure(expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3: methane.start.volumeM3 * 40 }));
    const later = sure(expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3: methane.start.volumeM3 * 80 }));
    expect([...end.matter().amountsMol]).toEqual([...later.matter().amountsMol]);
    const at = mixtureFrozenFrom(methane.start).solve({ held: 'entropy-volume', entropyJPerK, volumeM3: end.volumeM3 });
    // Frozen from the start is colder: what recombines on the way warms.
    expect(end.temperatureK).toBeGreaterThan(sure(at).temperatureK);
  });

  test('do less work the less their particles give back', () => {
    const work = corners.map((corner) => {
      const expansion = expansionFrom(magnesium.charge, magnesium.start, corner, null);
      const { entropyJPerK } = expansion.start;
      const end = sure(expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3: magnesium.start.volumeM3 * 12 }));
      return expansion.start.energyJ - end.energyJ;
    });
    const [best = NaN, apart = NaN, frozen = NaN, both = NaN] = work;
    expect(best).toBeGreaterThan(apart);
    expect(best).toBeGreaterThan(frozen);
    expect(apart).toBeGreaterThan(both);
    expect(frozen).toBeGreaterThan(both);
  });
});
