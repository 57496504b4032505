/**
 * A claim written with `expect` does not hold. The value found and the distance to the limit are given. It is an error,
 * so that a check in a pipeline fails with it.
 */
import { canBeIn, knownUnit } from '../core/quantity/convert.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { formatNumber, SIGNIFICANT_DIGITS } from '../wording/numbers.ts';
import { distanceText, handyUnit, quantityText, readingIn } from '../wording/quantities.ts';
import { unitForPeople, withUnit } from '../wording/units.ts';
import { unitOfClaim } from '../wording/written-unit.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const expectFailed: Rule<FactOf<'expect/failed'>> = {
  severity: 'error',
  messageAt: ({ claim, found, unit, limit, tolerance }, { place, file }) => {
    // In the unit the claim is written in, so that found and limit are compared at sight.
    const told = unitOfClaim(place, found, file) ?? unit;
    const shown = `${quoted(claim)} does not hold: found ${toldApart(found, limit, told)}`;
    const difference = found.value - limit.value;
    if (difference === 0) return `${shown}, exactly the limit.`;
    const side = difference > 0 ? 'above' : 'below';
    const distance = `${distanceText(found, limit, told)} ${side} ${quantityText(limit, told)}`;
    return tolerance === null
      ? sentences(`${shown}, ${distance}.`, isEquality(claim) && 'For a margin, write `within … ± …`.')
      : `${shown}, ${distance}, where ${quantityText(tolerance, toleranceUnit(tolerance, told))} is allowed.`;
  },
};

const isEquality = (claim: string): boolean => /(?<![<>])=/.test(claim);

/** The value found, with more digits than usual where it would otherwise read like the limit that it misses. */
function toldApart(found: Quantity, limit: Quantity, unit: string | null): string {
  const usual = quantityText(found, unit);
  if (usual !== quantityText(limit, unit)) return usual;
  const { value, uncertainty, unit: shown } = readingIn(found, unit ?? handyUnit(found));
  const { value: limitValue } = readingIn(limit, unit ?? handyUnit(found));
  if (uncertainty !== null) return usual;
  for (let digits = SIGNIFICANT_DIGITS + 1; digits <= MOST_DIGITS; digits++) {
    if (value.toPrecision(digits) === limitValue.toPrecision(digits)) continue;
    return withUnit(formatNumber(value, 'people', digits), unitForPeople(shown));
  }
  return usual;
}

const MOST_DIGITS = 12;

/** A tolerance on a temperature is a difference, which has no scale such as degC. */
function toleranceUnit(tolerance: Quantity, told: string | null): string | null {
  return told !== null && canBeIn(tolerance, knownUnit(told)) ? told : null;
}
