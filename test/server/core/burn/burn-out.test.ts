// Burn-out of single droplets and particles: laws, limits, and published burning rates.

import { describe, expect, test } from 'vitest';
import {
  burnOutOfAluminium,
  burnOutOfVapour,
  burnOutOnSurface,
  burnOutWithin,
  burntShareAfter,
} from '../../../../server/core/burn/burn-out.ts';
import type { BurnOut, NoBurnOut, Surroundings, VapourFuel } from '../../../../server/core/burn/burn-out.ts';
import { airConductivityWPerMK } from '../../../../server/core/burn/film-properties.ts';
import { vaporisationOf } from '../../../../server/core/burn/vaporisation.ts';
import { atomicWeightKgPerMol } from '../../../../server/core/substance/elements.ts';
import { phaseOfId } from '../../../../server/core/substance/phases.ts';
import droplets from '../../../reference/droplet-burning-rates.json' with { type: 'json' };
import metals from '../../../reference/metal-particles.json' with { type: 'json' };

const air: Surroundings = {
  temperatureK: 300,
  pressurePa: 101325,
  oxygenMoleShare: 0.2095,
  waterMoleShare: 0,
  carbonDioxideMoleShare: 0,
  oxygenMassShare: 0.2314,
  flameK: 2250,
};

function known(burnOut: BurnOut | NoBurnOut): BurnOut {
  if (burnOut.law === 'none') throw new Error(burnOut.reason);
  return burnOut;
}

function published(quantity: string): { readonly low: number; readonly high: number } {
  const row = metals.rows.find((one) => one.quantity.startsWith(quantity));
  if (row === undefined) throw new Error(quantity);
  return row;
}

type Droplet = (typeof droplets.rows)[number];

function liquid(row: Droplet): VapourFuel {
  const atoms: Readonly<Partial<Record<string, number>>> = row.atoms;
  const weigh = (symbol: string): number => (atoms[symbol] ?? 0) * (atomicWeightKgPerMol(symbol) ?? 0);
  const molarMassKgPerMol = weigh('C') + weigh('H') + weigh('O');
  const oxygenMol = (atoms['C'] ?? 0) + (atoms['H'] ?? 0) / 4 - (atoms['O'] ?? 0) / 2;
  return {
    densityKgPerM3: row.kgPerM3,
    boilingK: row.boilingK,
    latentJPerKg: row.latentMJPerKg * 1e6,
    heatingValueJPerKg: row.lowerMJPerKg * 1e6,
    oxygenKgPerKg: (oxygenMol * 2 * (atomicWeightKgPerMol('O') ?? 0)) / molarMassKgPerMol,
    vapour: {
      molarMassKgPerMol,
      elementMolPerKg: new Map(
        Object.entries(atoms).map(([symbol, count]) => [symbol, (count ?? 0) / molarMassKgPerMol]),
      ),
    },
  };
}

const heptane = droplets.rows[0];
if (heptane === undefined) throw new Error('no heptane');

describe('vapour flames', () => {
  test.each(droplets.rows)('$fuel burns at about $mm2PerS mm²/s', (row) => {
    const burnOut = known(burnOutOfVapour(liquid(row), 1e-3, air));
    const found = 1 / burnOut.timeS;
    // Diffusion alone is slower than the same drop in its own buoyant draught, and not by more than the factor claimed.
    expect(row.mm2PerS / found).toBeGreaterThan(1);
    expect(row.mm2PerS / found).toBeLessThanOrEqual(burnOut.factor);
  });

  test('twice the diameter takes four times as long', () => {
    const one = known(burnOutOfVapour(liquid(heptane), 50e-6, air));
    const two = known(burnOutOfVapour(liquid(heptane), 100e-6, air));
    expect(two.timeS / one.timeS).toBeCloseTo(4, 12);
  });

  test('the zone of heat release around magnesium stands where it was seen', () => {
    const row = published('magnesium: diameter');
    const boiling = vaporisationOf('Mg', air.pressurePa);
    const oxide = phaseOfId('MgO(cr)');
    const magnesiumKgPerMol = atomicWeightKgPerMol('Mg') ?? Number.NaN;
    if (boiling === undefined || oxide?.formationEnthalpyJPerMol === undefined) throw new Error();
    const oxygenKgPerKg = (atomicWeightKgPerMol('O') ?? Number.NaN) / magnesiumKgPerMol;
    const heatingValueJPerKg = -oxide.formationEnthalpyJPerMol / magnesiumKgPerMol;
    const fuel: VapourFuel = { densityKgPerM3: 1530, ...boiling, heatingValueJPerKg, oxygenKgPerKg, vapour: null };
    const burnOut = known(burnOutOfVapour(fuel, 3e-3, { ...air, flameK: 3300 }));
    // Where fuel and oxygen meet in stoichiometric flux.
    const ratio = Math.log1p(burnOut.transferNumber ?? 0) / Math.log1p(air.oxygenMassShare / oxygenKgPerKg);
    expect(ratio).toBeGreaterThan(row.low * 0.9);
    expect(ratio).toBeLessThan(row.high * 1.1);
  });

  test('more oxygen and hotter air are quicker', () => {
    const base = known(burnOutOfVapour(liquid(heptane), 1e-4, air)).timeS;
    expect(known(burnOutOfVapour(liquid(heptane), 1e-4, { ...air, oxygenMassShare: 0.4 })).timeS).toBeLessThan(base);
    expect(known(burnOutOfVapour(liquid(heptane), 1e-4, { ...air, temperatureK: 900 })).timeS).toBeLessThan(base);
  });

  test('without oxygen, or with so little that the flame cannot boil the liquid, there is no time', () => {
    expect(burnOutOfVapour(liquid(heptane), 1e-4, { ...air, oxygenMassShare: 0 })).toEqual({
      law: 'none',
      reason: 'no-oxygen',
    });
    expect(burnOutOfVapour(liquid(heptane), 1e-4, { ...air, oxygenMassShare: 0.01 })).toEqual({
      law: 'none',
      reason: 'no-flame',
    });
  });

  test('small drops and high pressures are doubted', () => {
    expect(known(burnOutOfVapour(liquid(heptane), 5e-6, air)).doubts).toEqual(['kinetics']);
    expect(known(burnOutOfVapour(liquid(heptane), 5e-5, { ...air, pressurePa: 1e7 })).doubts).toEqual([
      'near-critical',
    ]);
  });
});

describe('aluminium', () => {
  const hot: Surroundings = {
    ...air,
    temperatureK: 2400,
    pressurePa: 20 * 101325,
    oxygenMoleShare: 0.1,
    waterMoleShare: 0.2,
    carbonDioxideMoleShare: 0.1,
  };

  test('the constant, in the units of its source', () => {
    const timeMs = known(burnOutOfAluminium(80e-6, hot)).timeS * 1000;
    const effective = 0.1 + 0.6 * 0.2 + 0.22 * 0.1;
    expect((timeMs * effective * 20 ** 0.1 * 2400 ** 0.2) / 80 ** 1.8).toBeCloseTo(published('aluminium: time').low, 8);
  });

  test('oxygen, steam and carbon dioxide in their ranks', () => {
    const only = (share: Partial<Surroundings>): number =>
      known(
        burnOutOfAluminium(8e-5, {
          ...hot,
          oxygenMoleShare: 0,
          waterMoleShare: 0,
          carbonDioxideMoleShare: 0,
          ...share,
        }),
      ).timeS;
    const oxygen = only({ oxygenMoleShare: 0.2 });
    for (const [rank, quantity] of [
      [only({ waterMoleShare: 0.2 }) / oxygen, 'aluminium: oxygen over steam'],
      [only({ carbonDioxideMoleShare: 0.2 }) / oxygen, 'aluminium: oxygen over carbon'],
    ] as const) {
      expect(rank).toBeGreaterThan(published(quantity).low);
      expect(rank).toBeLessThan(published(quantity).high);
    }
  });

  test('below 20 µm the time is doubted', () => {
    expect(known(burnOutOfAluminium(1.9e-5, hot)).doubts).toEqual(['kinetics']);
    expect(known(burnOutOfAluminium(2.1e-5, hot)).doubts).toEqual([]);
  });
});

describe('burning on the surface', () => {
  const iron = { densityKgPerM3: 7000, oxygenKgPerKg: 16 / 55.845, surfaceK: 2400 };

  test('time goes with the square of the diameter and falls with oxygen', () => {
    const base = known(burnOutOnSurface(iron, 5e-5, air)).timeS;
    expect(known(burnOutOnSurface(iron, 1e-4, air)).timeS / base).toBeCloseTo(4, 12);
    expect(known(burnOutOnSurface(iron, 5e-5, { ...air, oxygenMassShare: 0.4 })).timeS).toBeLessThan(base);
  });

  test.each([0.05, 0.2314, 0.5])('far from it stands the oxygen the flux was worked out for, %f by mass', (share) => {
    const diameterM = 5e-5;
    const { timeS } = known(burnOutOnSurface(iron, diameterM, { ...air, oxygenMassShare: share }));
    const fluxKgPerS = (iron.oxygenKgPerKg * iron.densityKgPerM3 * Math.PI * diameterM ** 3) / 6 / timeS;
    // ρD at 1350 K, by hand: 1 atm nitrogen and 2.1e-5 (1350/298.15)^1.75 m²/s.
    const densityKgPerM3 = (101325 * 0.0280134) / (8.31446261815324 * 1350);
    const diffusionKgPerMS = densityKgPerM3 * 2.1e-5 * (1350 / 298.15) ** 1.75;
    // All that flows inward is oxygen: ṁ = ṁ Y + 4 π r² ρD dY/dr, integrated in u = 1/r from the surface, where Y = 0, outward.
    const slope = (oxygen: number): number => (fluxKgPerS * (1 - oxygen)) / (4 * Math.PI * diffusionKgPerMS);
    const steps = 1000;
    const step = 2 / diameterM / steps;
    let oxygen = 0;
    for (let index = 0; index < steps; index += 1) {
      oxygen += step * slope(oxygen + (step / 2) * slope(oxygen));
    }
    expect(oxygen).toBeCloseTo(share, 5);
  });

  test('nearly pure oxygen leaves a finite time, in doubt', () => {
    const pure = known(burnOutOnSurface(iron, 5e-5, { ...air, oxygenMassShare: 1 }));
    expect(pure.timeS).toBeGreaterThan(0);
    expect(pure.timeS).toBeLessThan(known(burnOutOnSurface(iron, 5e-5, { ...air, oxygenMassShare: 0.7 })).timeS);
    expect(pure.doubts).toEqual(['kinetics']);
    expect(burnOutWithin(pure, 1e3)).toBe('open');
    expect(known(burnOutOnSurface(iron, 5e-5, { ...air, oxygenMassShare: 0.4 })).doubts).toEqual([]);
  });
});

describe('against a residence', () => {
  const burnOut = known(burnOutOfVapour(liquid(heptane), 1e-4, air));

  test('the burnt share rises from 0 to 1', () => {
    const shares = [0, 0.25, 0.5, 1, 2].map((part) => burntShareAfter(burnOut, part * burnOut.timeS));
    expect(shares[0]).toBe(0);
    expect(shares[1]).toBeCloseTo(1 - 0.75 ** 1.5, 12);
    expect(shares.slice(3)).toEqual([1, 1]);
  });

  test('long is burnt, short is unburnt, between is open', () => {
    expect(burnOutWithin(burnOut, 2 * burnOut.timeS)).toBe('burnt');
    expect(burnOutWithin(burnOut, burnOut.timeS)).toBe('open');
    expect(burnOutWithin(burnOut, burnOut.timeS / 2)).toBe('unburnt');
  });

  test('a doubted time is never burnt, and none is unburnt', () => {
    const doubted = known(burnOutOfVapour(liquid(heptane), 5e-6, air));
    expect(burnOutWithin(doubted, 100 * doubted.timeS)).toBe('open');
    expect(burnOutWithin({ law: 'none', reason: 'no-oxygen' }, 1e9)).toBe('unburnt');
  });
});

describe('properties behind', () => {
  test.each(['Li', 'Na', 'K', 'Mg', 'Al'])('boiling point of %s', (symbol) => {
    const found = vaporisationOf(symbol, 101325)?.boilingK ?? Number.NaN;
    const { low, high } = published(`boiling point of ${symbol} `);
    // Monatomic vapour only: the pairs of a real one bring the boiling point down, by 16 K for sodium.
    expect(found).toBeGreaterThan(low - 1);
    expect(found).toBeLessThan(high * 1.015);
  });

  test('what the tables have no liquid of has no boiling point', () => {
    expect(vaporisationOf('C', 101325)).toBeUndefined();
  });

  test('air conducts 26 mW/(m K) at 300 K', () => {
    expect(airConductivityWPerMK(300)).toBeCloseTo(0.0262, 3);
  });
});
