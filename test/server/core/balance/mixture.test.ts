// Shares on every basis: laws that need no source, and the worked cases a person would do by hand.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  massSharesOf,
  sharesOn,
  type Basis,
  type MixturePart,
  type PartAmount,
} from '../../../../server/core/balance/mixture.ts';
import { mixProperties } from '../../../../server/core/balance/mixture-properties.ts';

const share = (basis: Basis, value: number): PartAmount => ({ kind: 'share', basis, value });
const amount = (basis: Basis, value: number): PartAmount => ({ kind: 'amount', basis, value });
const rest: PartAmount = { kind: 'rest' };
const part = (of: PartAmount, molarMass: number | null = 0.02, density: number | null = 800): MixturePart => ({
  amount: of,
  molarMassKgPerMol: molarMass,
  densityKgPerM3: density,
});

function sharesIn(parts: readonly MixturePart[]): readonly number[] {
  const answer = massSharesOf(parts);
  if ('fault' in answer) throw new Error(answer.fault);
  return answer.massShares;
}

describe('by hand', () => {
  test('half by volume of two densities', () => {
    const found = sharesIn([part(share('volume', 0.5), null, 1000), part(share('volume', 0.5), null, 500)]);
    expect(found[0]).toBeCloseTo(2 / 3, 12);
  });

  test('air of 21 and 79 by mole', () => {
    const [oxygen] = sharesIn([part(share('mole', 0.21), 0.031998), part(rest, 0.028014)]);
    expect(oxygen).toBeCloseTo((0.21 * 31.998) / (0.21 * 31.998 + 0.79 * 28.014), 12);
  });

  test('amounts of different kinds', () => {
    const found = sharesIn([part(amount('mass', 1)), part(amount('mole', 50)), part(amount('volume', 0.00125))]);
    expect(found).toHaveLength(3);
    for (const value of found) expect(value).toBeCloseTo(1 / 3, 12);
  });

  test('mass and volume together', () => {
    // 30 % by mass of 2000 kg/m3; of the rest, water and oil, water is 20 % of the whole volume.
    const parts = [part(share('mass', 0.3), null, 2000), part(share('volume', 0.2), null, 1000), part(rest, null, 800)];
    const [heavy = NaN, water = NaN, oil = NaN] = sharesIn(parts);
    const volume = heavy / 2000 + water / 1000 + oil / 800;
    expect(heavy).toBeCloseTo(0.3, 12);
    expect(water / 1000 / volume).toBeCloseTo(0.2, 12);
  });
});

describe('laws', () => {
  const basis = fc.constantFrom<Basis>('mass', 'mole', 'volume');
  const property = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
  const mixture = fc.array(fc.record({ basis, weight: property, molarMass: property, density: property }), {
    minLength: 2,
    maxLength: 6,
  });

  test('given shares hold in the finished mixture, on whatever bases they are given', () => {
    const holds = fc.property(mixture, (rows) => {
      // Any true mixture, described on mixed bases with its last part as the rest, must come back.
      const total = rows.reduce((sum, row) => sum + row.weight, 0);
      const massShares = rows.map((row) => row.weight / total);
      const bare = rows.map((row) => part(rest, row.molarMass, row.density));
      const parts = rows.map((row, index) => {
        const own = sharesOn(row.basis, massShares, bare)?.[index] ?? 0;
        return part(index === rows.length - 1 ? rest : share(row.basis, own), row.molarMass, row.density);
      });
      const found = sharesIn(parts);
      for (const [index, value] of found.entries()) expect(value).toBeCloseTo(massShares[index] ?? NaN, 6);
      expect(found.reduce((sum, value) => sum + value, 0)).toBeCloseTo(1, 12);
    });
    fc.assert(holds);
  });

  test('mixing parts with the same properties changes nothing', () => {
    const same = {
      molPerKg: new Map([['C', 70]]),
      enthalpyJPerKg: -2e6,
      molarMassKgPerMol: 0.2,
      densityKgPerM3: 800,
      biogenicShare: 0.3,
    };
    const mixed = mixProperties([0.2, 0.8], [same, same]);
    expect(mixed.densityKgPerM3).toBeCloseTo(800, 9);
    expect(mixed.molarMassKgPerMol).toBeCloseTo(0.2, 12);
    expect(mixed.enthalpyJPerKg).toBeCloseTo(-2e6, 6);
    expect(mixed.biogenicShare).toBeCloseTo(0.3, 12);
    expect(mixed.molPerKg.get('C')).toBeCloseTo(70, 9);
  });

  test('a property that a part lacks is lacking, unless nothing of the part is there', () => {
    const known = { molPerKg: new Map(), enthalpyJPerKg: 1, molarMassKgPerMol: 1, densityKgPerM3: 1, biogenicShare: 0 };
    const lacking = { ...known, densityKgPerM3: null };
    expect(mixProperties([0.5, 0.5], [known, lacking]).densityKgPerM3).toBeNull();
    expect(mixProperties([1, 0], [known, lacking]).densityKgPerM3).toBeCloseTo(1, 12);
  });
});

describe('faults', () => {
  test.each<[string, readonly MixturePart[], object]>([
    ['nothing', [], { fault: 'nothing' }],
    ['zeros', [part(share('mass', 0)), part(rest)], { massShares: [0, 1], scaled: false }],
    ['a sum below one', [part(share('mass', 0.3)), part(share('mass', 0.6))], { fault: 'sum' }],
    ['no room', [part(share('mass', 0.7)), part(share('mass', 0.6)), part(rest)], { fault: 'no-room' }],
    ['two rests', [part(rest), part(rest)], { fault: 'two-rests', index: 1 }],
    ['a negative share', [part(share('mass', -0.1)), part(rest)], { fault: 'negative', index: 0 }],
    ['a share beside an amount', [part(share('mass', 0.1)), part(amount('mass', 1))], { fault: 'mixed-amounts' }],
    ['a rest beside an amount', [part(amount('mass', 1)), part(rest)], { fault: 'rest-with-amounts', index: 1 }],
    ['no density', [part(share('volume', 0.1)), part(rest, 0.02, null)], { fault: 'no-density', index: 1 }],
    ['no molar mass', [part(share('mole', 0.1), null), part(rest)], { fault: 'no-molar-mass', index: 0 }],
    [
      'bases that contradict each other',
      [part(share('mass', 0.3), null, 1000), part(share('volume', 0.5), null, 1000)],
      { fault: 'inconsistent', index: 1 },
    ],
    [
      'mixed bases without room',
      [part(share('mass', 0.8), null, 1000), part(share('volume', 0.6), null, 1000), part(rest, null, 1000)],
      { fault: 'no-room' },
    ],
  ])('%s', (_, parts, expected) => {
    expect(massSharesOf(parts)).toMatchObject(expected);
  });
});
