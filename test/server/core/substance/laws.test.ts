// Laws that hold over the whole catalogue and need no source: names, ranges, orders of temperatures and limits, heating
// values that come back, and rules that fit their fuels. A new record runs through all of them unasked.

import { describe, expect, test } from 'vitest';
import { completeCombustion } from '../../../../server/core/balance/combustion.ts';
import { formationEnthalpyOf } from '../../../../server/core/balance/formation-enthalpy.ts';
import { heatingValueOfFuel } from '../../../../server/core/balance/heating-value.ts';
import {
  densityAt,
  enthalpyRise,
  entropyRise,
  heatCapacityAt,
} from '../../../../server/core/substance/at-temperature.ts';
import { allSubstances, phasesOfSubstance } from '../../../../server/core/substance/catalogue.ts';
import { atomicWeightKgPerMol } from '../../../../server/core/substance/elements.ts';
import { sourceRecords, substanceRecords } from '../../../../server/core/substance/records.ts';
import type { Substance } from '../../../../server/core/substance/substance.ts';

const everything = allSubstances();
const named = (substance: Substance) => `${substance.name}(${substance.phase})`;

test('there are enough substances, and most of what is known was seen', () => {
  expect(substanceRecords.length).toBeGreaterThanOrEqual(120);
  const provenance = new Map(sourceRecords.map((source) => [source.id, source.provenance]));
  const counts = { seen: 0, other: 0 };
  JSON.stringify(substanceRecords, (key, value: unknown) => {
    if (/source$/i.test(key) && typeof value === 'string') {
      counts[provenance.get(value) === 'seen' ? 'seen' : 'other'] += 1;
    }
    return value;
  });
  expect(counts.seen).toBeGreaterThan(2 * counts.other);
});

describe('a record', () => {
  test.each(substanceRecords)('$name has the substances of all its phases', (record) => {
    expect(
      phasesOfSubstance(record.name)
        .map(({ phase }) => phase)
        .sort(),
    ).toEqual(record.phases.map(({ phase }) => phase).sort());
  });

  test('of something that burns to carbon dioxide says where its carbon comes from', () => {
    const silent = everything
      .filter(({ molPerKg, energy }) => (molPerKg.get('C') ?? 0) > 0 && energy.kind === 'heating-value')
      .filter(({ carbonOrigin }) => carbonOrigin === undefined);
    expect(silent.map(named)).toEqual([]);
  });

  test('calls carbon biogenic when most of it is, and only then', () => {
    for (const substance of everything) {
      if (substance.carbonOrigin === undefined) continue;
      expect(substance.carbonBiogenicShare > 0.5, named(substance)).toBe(substance.carbonOrigin === 'biogenic');
    }
  });
});

describe('molar masses', () => {
  test('come from the formula alone', () => {
    for (const { formula, molarMassKgPerMol, chargeMolPerKg } of everything) {
      if (formula === undefined || molarMassKgPerMol === undefined) continue;
      const atoms = [...formula.composition].reduce(
        (sum, [symbol, count]) => sum + count * (atomicWeightKgPerMol(symbol) ?? Number.NaN),
        0,
      );
      const electrons = formula.charge * 5.4857990888e-7;
      expect(molarMassKgPerMol).toBeCloseTo(atoms - electrons, 12);
      expect(chargeMolPerKg * molarMassKgPerMol).toBeCloseTo(formula.charge, 9);
    }
  });
});

describe('heat capacities', () => {
  const known = everything.flatMap((substance) =>
    substance.heatCapacity && substance.phase !== 'aq' ? [{ substance, heatCapacity: substance.heatCapacity }] : [],
  );

  test('are positive over their range and between 0.1 and 30 kJ/(kg K)', () => {
    for (const { substance, heatCapacity } of known) {
      const { fromK, toK } = heatCapacity;
      for (let step = 0; step <= 20; step += 1) {
        const { jPerKgK, inRange } = heatCapacityAt(heatCapacity, fromK + ((toK - fromK) * step) / 20);
        expect(jPerKgK, named(substance)).toBeGreaterThan(100);
        expect(jPerKgK, named(substance)).toBeLessThan(30_000);
        expect(inRange).toBe(true);
      }
    }
  });

  test('of a gas are at least 5/2 R a mole and grow with temperature above 300 K', () => {
    for (const { substance, heatCapacity } of known) {
      if (substance.phase !== 'g' || substance.molarMassKgPerMol === undefined) continue;
      const molar = (temperatureK: number) =>
        heatCapacityAt(heatCapacity, temperatureK).jPerKgK * (substance.molarMassKgPerMol ?? 0);
      expect(molar(298.15), named(substance)).toBeGreaterThan(20.78);
      if (heatCapacity.toK >= 1000) expect(molar(1000), named(substance)).toBeGreaterThan(molar(300));
    }
  });
});

describe('densities', () => {
  const known = everything.flatMap((substance) =>
    substance.density ? [{ substance, density: substance.density }] : [],
  );

  test('are positive, and fall as it gets warmer unless it is water', () => {
    for (const { substance, density } of known) {
      expect(density.value, named(substance)).toBeGreaterThan(0.05);
      expect(density.value, named(substance)).toBeLessThan(9000);
      if (substance.name === 'water') continue;
      for (const [index, { kgPerM3 }] of density.points.entries()) {
        const before = density.points[index - 1];
        if (before) expect(kgPerM3, named(substance)).toBeLessThan(before.kgPerM3);
      }
    }
  });

  test('are the given number at the given temperature', () => {
    for (const { density } of known) {
      expect(densityAt(density, density.temperatureK)).toEqual({ kgPerM3: density.value, inRange: true });
    }
  });

  test('of liquids expand by no more than 2 % a kelvin, but for hydrogen near its critical point', () => {
    for (const { substance, density } of known) {
      for (const [index, point] of density.points.entries()) {
        const before = density.points[index - 1];
        if (!before) continue;
        const perKelvin = (before.kgPerM3 / point.kgPerM3 - 1) / (point.temperatureK - before.temperatureK);
        expect(perKelvin, named(substance)).toBeLessThan(substance.name === 'hydrogen' ? 0.06 : 0.02);
      }
    }
  });
});

describe('temperatures', () => {
  test('melting is below boiling, and neither stands beside sublimation', () => {
    for (const substance of everything) {
      const { meltingPointK, boilingPointK, sublimationPointK } = substance;
      if (meltingPointK && boilingPointK) {
        expect(meltingPointK.value, named(substance)).toBeLessThan(boilingPointK.value);
      }
      if (sublimationPointK) expect(meltingPointK ?? boilingPointK, named(substance)).toBeUndefined();
    }
  });

  test('the stable phase is the one its melting and boiling points give at 25 °C', () => {
    for (const substance of everything.filter(({ stableAtReference, phase }) => stableAtReference && phase !== 'aq')) {
      const { meltingPointK, boilingPointK, phase } = substance;
      if (meltingPointK && meltingPointK.value > 298.15) expect(phase, named(substance)).toBe('cr');
      if (boilingPointK && boilingPointK.value < 298.15) expect(phase, named(substance)).toBe('g');
      if (meltingPointK && meltingPointK.value < 298.15) expect(phase, named(substance)).not.toBe('cr');
      if (boilingPointK && boilingPointK.value > 298.15) expect(phase, named(substance)).not.toBe('g');
    }
  });

  test('a flash point is below the boiling point and the autoignition temperature', () => {
    for (const substance of everything) {
      const { flashPointK, boilingPointK, autoignitionK } = substance;
      if (flashPointK && boilingPointK) expect(flashPointK.value).toBeLessThan(boilingPointK.value);
      if (flashPointK && autoignitionK) expect(flashPointK.value).toBeLessThan(autoignitionK.value);
    }
  });

  test('the lower flammable limit is below the upper, and on the lean side of a stoichiometric mixture', () => {
    for (const substance of everything) {
      const { flammableLimits, molarMassKgPerMol, molPerKg } = substance;
      if (flammableLimits === undefined) continue;
      const { lower, upper } = flammableLimits;
      if (upper) expect(lower.value, named(substance)).toBeLessThan(upper.value);
      expect(upper?.value ?? 1).toBeLessThanOrEqual(1);
      if (molarMassKgPerMol === undefined) continue;
      const oxygen =
        (molPerKg.get('C') ?? 0) +
        (molPerKg.get('H') ?? 0) / 4 +
        (molPerKg.get('S') ?? 0) -
        (molPerKg.get('O') ?? 0) / 2;
      const stoichiometric = 1 / (1 + (oxygen * molarMassKgPerMol) / 0.20946);
      expect(lower.value, named(substance)).toBeLessThan(stoichiometric);
    }
  });
});

describe('energies', () => {
  test('a heating value that was given comes back', () => {
    for (const substance of everything) {
      if (substance.energy.kind !== 'heating-value') continue;
      const enthalpy = formationEnthalpyOf(substance);
      if (enthalpy.kind === 'fault') throw new Error(`${named(substance)}: ${enthalpy.reason}`);
      const value = heatingValueOfFuel(substance.molPerKg, enthalpy.jPerKg.value);
      if (value.kind === 'fault') throw new Error(`${named(substance)}: ${value.reason}`);
      const found = substance.energy.basis === 'lower' ? value.lowerJPerKg : value.higherJPerKg;
      expect(found / substance.energy.jPerKg.value, named(substance)).toBeCloseTo(1, 12);
    }
  });

  test('a gas holds more than its liquid, and a liquid more than its crystal', () => {
    for (const { name } of substanceRecords) {
      const byPhase = new Map(phasesOfSubstance(name).map((substance) => [substance.phase, substance]));
      const order = (['cr', 'l', 'g'] as const).flatMap((phase) => {
        const energy = byPhase.get(phase)?.energy;
        return energy?.kind === 'formation-enthalpy' ? [energy.jPerKg.value] : [];
      });
      expect(order, name).toEqual([...order].sort((a, b) => a - b));
    }
  });

  test('technical fuels of hydrogen and carbon have the heating value that their elements suggest', () => {
    // Boie's formula gives lower heating values of oils, fats and solid fuels to about 4 %; ethers of oxymethylene are off.
    for (const substance of everything) {
      if (substance.energy.kind !== 'heating-value' || substance.energy.basis !== 'lower') continue;
      if (completeCombustion(substance.molPerKg).kind === 'fault') continue;
      const share = (symbol: string) =>
        (substance.molPerKg.get(symbol) ?? 0) * (atomicWeightKgPerMol(symbol) ?? Number.NaN);
      const boie = 35 * share('C') + 94.3 * share('H') + 10.4 * share('S') + 6.3 * share('N') - 10.8 * share('O');
      const found = substance.energy.jPerKg.value / 1e6;
      expect(Math.abs(found / boie - 1), `${named(substance)} ${found} ${boie}`).toBeLessThan(0.08);
    }
  });
});

describe('rules', () => {
  const ruled = everything.flatMap((substance) =>
    substance.stableAtReference ? substance.rules.map((rule) => ({ substance, rule })) : [],
  );

  test('are there for every fuel of the lists, with when they apply and when they were read', () => {
    expect(ruled.length).toBeGreaterThan(25);
    for (const { rule } of ruled) {
      expect(rule.inForceFrom <= rule.seenOn).toBe(true);
      expect(
        rule.lowerHeatingValueJPerKg ?? rule.carbonContentKgPerKg ?? rule.carbonDioxideFactorKgPerKg,
      ).toBeDefined();
    }
  });

  test('carbon content and CO2 factor fit each other and the composition', () => {
    for (const { substance, rule } of ruled) {
      const { carbonContentKgPerKg: content, carbonDioxideFactorKgPerKg: factor } = rule;
      // A rule works with 44/12; content to four digits, factor to three decimals.
      if (content !== undefined && factor !== undefined) expect(factor / content).toBeCloseTo(44 / 12, 2);
      const carbon = (substance.molPerKg.get('C') ?? 0) * 0.012011;
      if (content !== undefined) expect(Math.abs(carbon / content - 1), substance.name).toBeLessThan(0.003);
      if (factor !== undefined && factor > 0) {
        expect(Math.abs((carbon * 44.009) / 12.011 / factor - 1), substance.name).toBeLessThan(0.005);
      }
    }
  });
});

describe('integrals of heat capacities', () => {
  const known = everything.flatMap(({ heatCapacity }) => (heatCapacity ? [heatCapacity] : []));

  test('are what small steps add up to, inside the range and beyond its ends', () => {
    for (const heatCapacity of known) {
      const [fromK, toK, steps] = [heatCapacity.fromK - 20, heatCapacity.toK + 20, 4000];
      const stepK = (toK - fromK) / steps;
      let enthalpy = 0;
      let entropy = 0;
      for (let step = 0; step < steps; step += 1) {
        const middleK = fromK + (step + 0.5) * stepK;
        const { jPerKgK } = heatCapacityAt(heatCapacity, middleK);
        enthalpy += jPerKgK * stepK;
        entropy += (jPerKgK / middleK) * stepK;
      }
      expect(enthalpyRise(heatCapacity, fromK, toK) / enthalpy).toBeCloseTo(1, 5);
      expect(entropyRise(heatCapacity, fromK, toK) / entropy).toBeCloseTo(1, 4);
      expect(enthalpyRise(heatCapacity, toK, fromK)).toBeCloseTo(-enthalpyRise(heatCapacity, fromK, toK), 6);
    }
  });

  test('outside the range the answer says so', () => {
    const [first] = known;
    if (first === undefined) throw new Error();
    expect(heatCapacityAt(first, first.toK + 1).inRange).toBe(false);
    expect(heatCapacityAt(first, first.fromK - 1).inRange).toBe(false);
  });
});
