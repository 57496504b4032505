// Limits of nitrogen oxides of marine diesel engines by rated speed. Formulas and their bounds; knows no engine.
// Invariant: below 2000 rpm the limit never rises with speed; the rule's own rounding lets it rise by under 2 % there
// (tier I 9.84 to 9.8 falls, tier II 7.66 to 7.7 and tier III 1.97 to 2 rise). Source: MARPOL Annex VI, regulation 13, paragraphs 3 to 5 (in the text of
// resolution MEPC.328(76)): total weighted emission in g/kWh as NO2, by the test cycles of the NOx Technical Code 2008.

export type NoxTier = 1 | 2 | 3;

export const noxTiers: readonly NoxTier[] = [1, 2, 3];

interface TierRow {
  /** g/kWh below 130 rpm. */
  readonly slow: number;
  /** g/kWh at n rpm between 130 and 2000: factor · n^-exponent. */
  readonly factor: number;
  readonly exponent: number;
  /** g/kWh from 2000 rpm on. */
  readonly fast: number;
}

const rows: Readonly<Record<NoxTier, TierRow>> = {
  1: { slow: 17, factor: 45, exponent: 0.2, fast: 9.8 },
  2: { slow: 14.4, factor: 44, exponent: 0.23, fast: 7.7 },
  3: { slow: 3.4, factor: 9, exponent: 0.2, fast: 2 },
};

/** The limit in kg of NO2 per J of work at the shaft, at a rated speed in revolutions per minute above 0. */
export function noxLimitKgPerJ(tier: NoxTier, ratedRpm: number): number {
  const { slow, factor, exponent, fast } = rows[tier];
  const gPerKwh = ratedRpm < 130 ? slow : ratedRpm >= 2000 ? fast : factor * ratedRpm ** -exponent;
  return gPerKwh / kwhGPerKgJ;
}

/** g/kWh in one kg/J. */
const kwhGPerKgJ = 3.6e9;
