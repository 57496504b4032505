import { expect, test } from 'vitest';
import { unitOfClaim, unitOfValue } from '../../../server/wording/written-unit.ts';
import { file, placeIn, quantity } from '../../support/scenario-builder.ts';

const TEXT = `let days = 210 per year
let both = 2 kW + 3 kW
expect sodium in slurry > 30 %
expect f of b within 200 degC ± 5 K
expect f of b > f of c
`;
const trial = file(TEXT);
const at = (words: string) => placeIn('trial.stoke', TEXT, words);

test('the unit of a value is the one it was given in', () => {
  expect(unitOfValue(at('let days'), quantity(1, '1/s'), trial)).toBe('1/year');
  expect(unitOfValue(at('let both'), quantity(5, 'kW'), trial)).toBeNull();
});

test('the unit of a claim is the one of its right side', () => {
  expect(unitOfClaim(at('expect sodium'), quantity(0.3, '1'), trial)).toBe('%');
  expect(unitOfClaim(at('expect f of b within'), quantity(500, 'K', 0, 'temperature'), trial)).toBe('degC');
  expect(unitOfClaim(at('expect f of b > f'), quantity(500, 'K'), trial)).toBeNull();
});

test('a unit that does not fit is none', () => {
  expect(unitOfClaim(at('expect sodium'), quantity(3, 'kg'), trial)).toBeNull();
  expect(unitOfValue(at('let days'), quantity(3, 'kg'), trial)).toBeNull();
});
