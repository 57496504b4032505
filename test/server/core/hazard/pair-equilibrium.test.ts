// Pairs as states of lowest energy: nothing comes of nothing, and known reactions give their known heats.

import { describe, expect, test } from 'vitest';
import { findPair } from '../../../../server/core/hazard/found-pairs.ts';
import { pairEquilibrium } from '../../../../server/core/hazard/pair-equilibrium.ts';
import type { PairEquilibrium } from '../../../../server/core/hazard/pair-equilibrium.ts';
import { storeOf } from './stores.ts';

function pair(percent: Readonly<Record<string, number>>): PairEquilibrium {
  const [first, second] = storeOf({ percent }).portions;
  const answer = first && second && pairEquilibrium(first, second);
  if (answer === undefined) throw new Error('no state');
  return answer;
}

describe('heat', () => {
  test.each([
    [{ sodium: 50, sodium_chloride: 50 }],
    [{ magnesium: 50, magnesium_oxide: 50 }],
    [{ sodium: 50, magnesium_oxide: 50 }],
    [{ sodium_chloride: 50, potassium_chloride: 50 }],
  ])('none between %o', (percent) => {
    const { heatJPerKg, gibbsJPerKg } = pair(percent);
    expect(Math.abs(heatJPerKg)).toBeLessThan(1);
    expect(Math.abs(gibbsJPerKg)).toBeLessThan(1);
  });

  test('thermite gives 852 kJ for two atoms of aluminium and stops where iron boils', () => {
    const kgPerEquation = 2 * 0.0269815 + 0.1596882;
    const { heatJPerKg, adiabaticK } = pair({ aluminium: 25.2565, iron_oxide: 74.7435 });
    // Enthalpies of formation by the CRC Handbook: -1675.7 and -824.2 kJ/mol.
    expect((heatJPerKg * kgPerEquation) / 1000).toBeGreaterThan(845);
    expect((heatJPerKg * kgPerEquation) / 1000).toBeLessThan(856);
    // 3135 K is published for this mixture (Fischer and Grubelich 1998, from memory); iron boils at 3130 K.
    expect(adiabaticK ?? Number.NaN).toBeGreaterThan(3050);
    expect(adiabaticK ?? Number.NaN).toBeLessThan(3200);
  });

  test('own decomposition is not counted: a fuel beside an inert salt gives nothing though soot and methane are stabler', () => {
    expect(Math.abs(pair({ hexane: 50, magnesium_oxide: 50 }).heatJPerKg)).toBeLessThan(1e5);
  });

  test('free energy alone would call sodium in oil dangerous; families do not', () => {
    const { gibbsJPerKg } = pair({ sodium: 33, gas_oil: 67 });
    expect(gibbsJPerKg).toBeLessThan(-1e5);
    const store = storeOf({ percent: { sodium: 33, gas_oil: 67 } });
    const [sodium, oil] = store.portions;
    if (!sodium || !oil) throw new Error();
    expect(findPair(sodium, oil, store, pairEquilibrium(sodium, oil))).toBeNull();
  });

  test('never more free energy together than apart', () => {
    for (const percent of [
      { sodium: 30, water: 70 },
      { ammonium_nitrate: 94, gas_oil: 6 },
      { sodium: 40, titanium_dioxide: 60 },
      { ethanol: 50, water: 50 },
    ] as readonly Record<string, number>[]) {
      expect(pair(percent).gibbsJPerKg).toBeLessThan(1);
    }
  });
});
