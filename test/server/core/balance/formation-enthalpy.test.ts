// Formation enthalpies of substances, recorded or worked back from a heating value.

import { expect, test } from 'vitest';
import { formationEnthalpyOf } from '../../../../server/core/balance/formation-enthalpy.ts';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import type { Substance } from '../../../../server/core/substance/substance.ts';

function substance(word: string): Substance {
  const found = findSubstance(word);
  if (found === undefined) throw new Error(word);
  return found;
}

test('a recorded one is given as it is, with its source', () => {
  const enthalpy = formationEnthalpyOf(substance('CO2'));
  expect(enthalpy).toMatchObject({ kind: 'known', jPerKg: { source: { id: 'chase-1998' } } });
  if (enthalpy.kind === 'known') expect(enthalpy.jPerKg.value * 0.044009).toBeCloseTo(-393_522, 3);
});

test('one from a lower heating value rests on that value and its slate', () => {
  const enthalpy = formationEnthalpyOf(substance('gas_oil'));
  if (enthalpy.kind !== 'known') throw new Error();
  expect(enthalpy.derivedFrom).toMatchObject({
    basis: 'lower',
    heatingValueJPerKg: 42.7e6,
    slate: { rule: 'as-ruled' },
  });
  // 72.80 mol CO2 and 62.30 mol of water vapour: 42.7 - 28.649 - 15.066 MJ/kg.
  expect(enthalpy.jPerKg.value / 1e6).toBeCloseTo(-1.015, 3);
  expect(enthalpy.jPerKg.source.id).toBe('mepc-364-79');
});

test('a higher heating value counts the water as liquid', () => {
  const gasOil = substance('gas_oil');
  if (gasOil.energy.kind !== 'heating-value') throw new Error();
  const lower = formationEnthalpyOf(gasOil);
  const higher = formationEnthalpyOf({ ...gasOil, energy: { ...gasOil.energy, basis: 'higher' } });
  if (lower.kind !== 'known' || higher.kind !== 'known') throw new Error();
  const waterMolPerKg = (gasOil.molPerKg.get('H') ?? 0) / 2;
  expect(lower.jPerKg.value - higher.jPerKg.value).toBeCloseTo(waterMolPerKg * 44_004, 0);
});

test('without any energy the substance is named; with an unruled element the element', () => {
  const unknown: Substance = { ...substance('gas_oil'), name: 'mystery', energy: { kind: 'unknown' } };
  expect(formationEnthalpyOf(unknown)).toEqual({ kind: 'fault', reason: 'no-fuel-data', substances: ['mystery'] });
  const brominated: Substance = { ...substance('gas_oil'), molPerKg: new Map([['Br', 1]]) };
  expect(formationEnthalpyOf(brominated)).toMatchObject({
    kind: 'fault',
    reason: 'no-ruled-product',
    elements: ['Br'],
  });
});
