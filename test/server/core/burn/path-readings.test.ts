// Dew points, sticky stretches and carbon against freezing, read off real paths.

import { expect, test } from 'vitest';
import {
  carbonAgainstFreezing,
  dewPoints,
  meltShare,
  stickyRanges,
} from '../../../../server/core/burn/path-readings.ts';
import { handMadeState } from './hand-made-state.ts';
import { burn, mixed, solved, stream } from './streams.ts';

const slurry = mixed([0.29, stream('sodium')], [0.69, stream('gas_oil')], [0.02, stream('NaCl')]);
const lean = burn(slurry, { amount: { by: 'lambda', lambda: 1.6 } });
const temperaturesK = Array.from({ length: 61 }, (_, index) => 1800 - 25 * index);
const path = lean.path(temperaturesK);

test('each formula condenses once, at the temperature of its first phase', () => {
  const points = dewPoints(path);
  expect(new Set(points.map(({ formula }) => formula)).size).toBe(points.length);
  const carbonate = points.find(({ formula }) => formula === 'Na2CO3');
  expect(carbonate).toMatchObject({ substance: 'carbonate' });
  expect(path.candidates.phases[carbonate?.phase ?? -1]?.id).toBe('Na2CO3(l)');
  expect(carbonate?.temperatureK).toBe(path.events[0]?.temperatureK);
  expect(points.find(({ formula }) => formula === 'NaCl')).toMatchObject({ substance: 'chloride' });
  expect(points.find(({ formula }) => formula === 'H2O')).toMatchObject({ substance: 'water' });
});

test('what is there from the start has no dew point in the path', () => {
  const points = dewPoints(lean.path([1500, 1400]));
  expect(points.find(({ formula }) => formula === 'Na2CO3')).toMatchObject({ temperatureK: null });
});

test('deposits stick from the dew point of the carbonate to its freezing', () => {
  const melt = (kind: string): number | undefined =>
    path.events.find((event) => event.kind === kind && path.candidates.phases[event.phase]?.id === 'Na2CO3(l)')
      ?.temperatureK;
  expect(stickyRanges(path)).toEqual([{ fromK: melt('appears'), toK: melt('leaves') }]);
  expect(stickyRanges(lean.path([1500, 1400]))).toEqual([{ fromK: null, toK: null }]);
  expect(stickyRanges(lean.path([1000, 900]))).toEqual([]);
});

test('the molten share is 1 between and 0 below, and water does not count', () => {
  expect(meltShare(solved(lean.at(1400)))).toBeCloseTo(1, 12);
  expect(meltShare(solved(lean.at(1000)))).toBe(0);
  expect(meltShare(handMadeState(['H', 'O', 'Na'], { 'H2O(l)': 1, 'NaOH(l)': 1 }, 600))).toBeCloseTo(
    39.997 / 58.012,
    4,
  );
  expect(meltShare(handMadeState(['H', 'O'], { 'H2O(g)': 1 }))).toBe(0);
});

test('the lower the gas freezes, the more carbon is carbonate, until alkali is used up', () => {
  const shares = carbonAgainstFreezing(path).filter(({ temperatureK }) => temperatureK > 400);
  for (let index = 1; index < shares.length; index += 1) {
    // Salt condensing takes a millionth of it back from hydrogen chloride.
    expect(shares[index]?.carbonateShare).toBeGreaterThanOrEqual((shares[index - 1]?.carbonateShare ?? 0) - 1e-5);
  }
  // Half a mole of carbon to each of sodium beyond the chloride.
  const sodium = lean.charge.elementMol[lean.charge.elements.indexOf('Na')] ?? 0;
  const chlorine = lean.charge.elementMol[lean.charge.elements.indexOf('Cl')] ?? 0;
  const carbon = lean.charge.elementMol[lean.charge.elements.indexOf('C')] ?? 0;
  expect(shares.at(-1)?.carbonateShare).toBeCloseTo((sodium - chlorine) / 2 / carbon, 4);
  const last = shares.at(-1);
  expect((last?.carbonateShare ?? 0) + (last?.carbonDioxideShare ?? 0)).toBeCloseTo(1, 9);
});

test('frozen states are not asked again', () => {
  const frozen = burn(slurry, { amount: { by: 'lambda', lambda: 1.6 }, frozenBelowK: 900 }).path(temperaturesK);
  expect(carbonAgainstFreezing(frozen).every(({ temperatureK }) => temperatureK > 900)).toBe(true);
});
