// Flash points, lower limits and ranges: laws, published flash points of mixtures, and Le Chatelier's own sum.

import { describe, expect, test } from 'vitest';
import { gasMixtureOf } from '../../../../server/core/hazard/gas-mixtures.ts';
import { flashPointK, lowerLimitAt, ullageOf } from '../../../../server/core/hazard/vapour.ts';
import mixtures from '../../../reference/le-chatelier-mixtures.json' with { type: 'json' };
import published from '../../../reference/flash-points-of-mixtures.json' with { type: 'json' };
import { storeOf } from './stores.ts';

const pure = ['methanol', 'ethanol', 'toluene', 'octane', 'acetone', 'hexane', 'diethyl_ether', 'gas_oil', 'kerosene'];

describe('flash points', () => {
  test.each(pure)('%s alone reaches its lower limit at its own flash point', (name) => {
    const store = storeOf({ percent: { [name]: 100 }, bar: 1.01325 });
    const flash = store.portions[0]?.flashPointK ?? Number.NaN;
    expect(ullageOf(store, flash)?.overLowerLimit).toBeCloseTo(1, 9);
    expect(flashPointK(store)).toBe(flash);
  });

  test.each(published.rows)(
    'ethanol, $ethanolVolumePercent % by volume in water',
    ({ ethanolVolumePercent, celsius }) => {
      const [ethanol, water] = [ethanolVolumePercent * 0.7893, (100 - ethanolVolumePercent) * 0.9982];
      const total = ethanol + water;
      const found = flashPointK(
        storeOf({ percent: { ethanol: (100 * ethanol) / total, water: (100 * water) / total } }),
      );
      // The method's authors claim 5 K; where it errs it must not be far on the side that hides a danger.
      const error = (found ?? Number.NaN) - 273.15 - celsius;
      expect(error).toBeGreaterThan(-5);
      expect(error).toBeLessThan(2);
    },
  );

  test('more of the volatile part never raises it', () => {
    for (const [light, heavy] of [
      ['petrol', 'gas_oil'],
      ['methanol', 'fame'],
      ['ethanol', 'water'],
      ['kerosene', 'gas_oil'],
    ] as const) {
      const flashes = [0.01, 0.1, 1, 5, 20, 50, 90].map(
        (share) => flashPointK(storeOf({ percent: { [light]: share, [heavy]: 100 - share } })) ?? Infinity,
      );
      expect(flashes).toEqual([...flashes].sort((a, b) => b - a));
    }
  });

  test('solids and water have none', () => {
    expect(flashPointK(storeOf({ percent: { water: 100 } }))).toBeNull();
    expect(flashPointK(storeOf({ percent: { sodium: 100 } }))).toBeNull();
    const dispersion = flashPointK(storeOf({ percent: { sodium: 30, gas_oil: 70 } }));
    expect(dispersion).toBe(flashPointK(storeOf({ percent: { gas_oil: 100 } })));
  });
});

describe('vapour over a liquid at 25 °C', () => {
  // Antoine's constants for log10 of mmHg over °C (Poling et al. 2001 and its forerunners) and vapour pressures at 25 °C in
  // kPa (CRC Handbook, 95th ed., section 6), both from memory; they agree within 1 % (decane's two digits: 3 %).
  const antoine = {
    methanol: [8.08097, 1582.271, 239.726, 16.9],
    ethanol: [8.20417, 1642.89, 230.3, 7.87],
    acetone: [7.11714, 1210.595, 229.664, 30.8],
    toluene: [6.95464, 1344.8, 219.482, 3.79],
    octane: [6.91868, 1351.99, 209.155, 1.86],
    hexane: [6.87601, 1171.17, 224.41, 20.2],
    diethyl_ether: [6.92032, 1064.07, 228.8, 71.7],
    decane: [6.94363, 1495.17, 193.86, 0.17],
  } as const;

  // The line through the lower limit at the flash point and 1 atm at the boiling point differs from the true curve for two
  // reasons, and for no other. A cup flashes a little late: there the true pressure is 5 to 16 % above the recorded limit
  // (hexane 62 %: its flash point and its limit are from different apparatus; decane 4 % below). And the curve is bent, as
  // the heat of vaporisation falls with temperature: by an eighth of that fall, times the step in 1/T, over R, which is at
  // most 7 % between the two points; below the flash point the line runs on above the curve. The bounds on that side (20 %) and
  // on how late a cup flashes are what these records show: no source sets them, they hold the records and the line together.
  test.each(Object.entries(antoine))('%s', (name, [a, b, c, kPaAt25]) => {
    const store = storeOf({ percent: { [name]: 100 } });
    const [portion] = store.portions;
    const { flashPointK: flash, boilingPointK: boiling, flammableLimits } = portion ?? {};
    if (!flash || !boiling || !flammableLimits) throw new Error(`no flash point, boiling point or limits of ${name}`);
    const truePa = (temperatureK: number): number => (10 ** (a - b / (temperatureK - 273.15 + c)) * 101325) / 760;
    expect(Math.abs(truePa(298.15) / 1000 / kPaAt25 - 1)).toBeLessThan(kPaAt25 < 1 ? 0.03 : 0.01);
    // How far the line starts beside the curve, and what is left of that at 25 °C.
    const late = truePa(flash) / (flammableLimits.lower * 101325);
    const left = (1 / 298.15 - 1 / boiling) / (1 / flash - 1 / boiling);
    const found = (ullageOf(store)?.vapourShare ?? Number.NaN) * store.pressurePa;
    const bent = (found * late ** left) / truePa(298.15);
    const isBetween = flash < 298.15;
    expect(bent).toBeGreaterThan(isBetween ? 0.93 : 1);
    expect(bent).toBeLessThan(isBetween ? 1.005 : 1.2);
    expect(late).toBeGreaterThan(0.95);
    expect(late).toBeLessThan(name === 'hexane' ? 1.65 : 1.17);
  });
});

describe('lower limits', () => {
  test('fall by 0.75 kcal/mol over the heat of combustion a kelvin', () => {
    const methane = storeOf({ percent: { methane: 100 } }).portions[0];
    if (methane === undefined) throw new Error();
    // 802.3 kJ/mol net: 0.75 kcal is 3138 J, so 0.003911 percentage points a kelvin.
    const fall = lowerLimitAt(methane, 0.05, 298.15) - lowerLimitAt(methane, 0.05, 398.15);
    expect(fall * 100).toBeCloseTo(0.3911, 3);
  });

  test('stay as they are where the vapour is not of C, H and O', () => {
    for (const name of ['hydrogen', 'ammonia', 'carbon_disulphide', 'nitromethane']) {
      const portion = storeOf({ percent: { [name]: 100 } }).portions[0];
      if (portion === undefined) throw new Error();
      expect(lowerLimitAt(portion, 0.04, 400)).toBe(0.04);
    }
  });

  test('add up by Le Chatelier: half of each limit is the limit', () => {
    const [methane, propane] = ['methane', 'propane'].map(
      (name) => storeOf({ percent: { [name]: 100 } }).portions[0]?.flammableLimits?.lower ?? Number.NaN,
    );
    const [a, b] = [50 * (methane ?? 0), 50 * (propane ?? 0)];
    const mixture = gasMixtureOf(storeOf({ basis: 'mole', percent: { methane: a, propane: b, air: 100 - a - b } }));
    expect(mixture?.overLowerLimit).toBeCloseTo(1, 2);
  });
});

describe('limits of mixtures against published worked examples', () => {
  test.each(mixtures.rows)('$limit limit of $substances', (row) => {
    const { substances, percentOfFuel, limitPercent, mixturePercent } = row;
    const store = storeOf({
      basis: 'mole',
      percent: Object.fromEntries(substances.map((name, index) => [name, percentOfFuel[index] ?? 0])),
    });
    // With the limits of the example in place of the catalogue's.
    const portions = store.portions.map((portion, index) => {
      const limit = (limitPercent[index] ?? Number.NaN) / 100;
      return { ...portion, flammableLimits: { lower: limit, upper: limit, temperatureK: 298.15 } };
    });
    const mixture = gasMixtureOf({ ...store, portions, temperatureK: 298.15 });
    const over = row.limit === 'lower' ? mixture?.overLowerLimit : mixture?.overUpperLimit;
    expect(100 / (over ?? Number.NaN)).toBeCloseTo(mixturePercent, 9);
  });
});

describe('gas that burns in air whatever the mixture', () => {
  // ISO 10156 gives 5.5 % of hydrogen and 8.7 % of methane in nitrogen as the most that never burns (from memory); the
  // geometry here rests on limits and limiting oxygen of another apparatus.
  test.each([
    ['hydrogen', 4.2, 6],
    ['methane', 8, 14.5],
    ['propane', 3.5, 6],
  ] as const)('%s in nitrogen begins between %f and %f %', (name, low, high) => {
    const burns = (share: number): boolean | undefined =>
      gasMixtureOf(storeOf({ basis: 'mole', percent: { [name]: share, nitrogen: 100 - share } }))?.isFlammableInAir;
    expect(burns(low)).toBe(false);
    expect(burns(high)).toBe(true);
    expect(burns(100)).toBe(true);
  });

  test('carbon dioxide holds more fuel harmless than nitrogen does', () => {
    const most = (inert: string): number => {
      for (let share = 1; share < 100; share += 0.1) {
        const mixture = gasMixtureOf(storeOf({ basis: 'mole', percent: { methane: share, [inert]: 100 - share } }));
        if (mixture?.isFlammableInAir === true) return share;
      }
      return 100;
    };
    expect(most('carbon_dioxide')).toBeGreaterThan(most('nitrogen'));
    expect(most('argon')).toBeLessThan(most('nitrogen'));
  });
});
