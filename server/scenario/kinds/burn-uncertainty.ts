// The uncertainty of what a flame and its zone are, by the slopes of the converged states: one linear problem instead of two
// burns for each uncertain input. Knows temperatures and condensed shares; other figures are worked out anew.
// Invariant: to first order, as all propagation here; undefined where a slope is not known, never half an answer.
// Method: core/burn/burn-sensitivities.ts.

import { burnSensitivities, condensedShareMovement, type StateMovement } from '../../core/burn/burn-sensitivities.ts';
import type { BurnParameter } from '../../core/burn/charge-directions.ts';
import { combineParts, noParts, type Parts } from '../../core/quantity/parts.ts';
import type { BurnQuestion, QuantityRole } from './burn-question.ts';
import type { SolvedBurn } from './burn-solved.ts';

/** The parts of a figure by its id; undefined where its slopes are not known. */
export function partsBySlope(id: string, solved: SolvedBurn, question: BurnQuestion): Parts | undefined {
  const slopeOf = slopes(id, solved);
  if (!slopeOf) return undefined;
  let parts: Parts = noParts;
  for (const [index, quantity] of question.quantities.entries()) {
    if (quantity.parts.size === 0) continue;
    const slope = slopeOf(question.roles[index] ?? 'unknown');
    if (slope === undefined) return undefined;
    parts = combineParts(parts, 1, quantity.parts, slope);
  }
  return parts;
}

type SlopeOf = (role: QuantityRole) => number | undefined;

function slopes(id: string, { burn, flame }: SolvedBurn): SlopeOf | undefined {
  const sensitivities = burnSensitivities(burn);
  const ofFlame =
    (read: (movement: StateMovement) => number): SlopeOf =>
    (role) => {
      if (role === 'none' || role === 'zone-amount') return 0;
      return role === 'unknown' ? undefined : known(sensitivities.flame(role), read);
    };
  switch (id) {
    case 'flame-temperature':
      return ofFlame(({ temperatureK }) => temperatureK);
    case 'condensed-share':
      return ofFlame((movement) => condensedShareMovement(flame, movement));
    case 'flame-zone-temperature':
      return (role) => {
        if (role === 'none' || (role !== 'unknown' && role !== 'zone-amount' && isOfWhole(role))) return 0;
        const parameter: BurnParameter | 'unknown' = role === 'zone-amount' ? { of: 'amount' } : role;
        return parameter === 'unknown' ? undefined : known(sensitivities.zone(parameter), (one) => one.temperatureK);
      };
    default:
      return undefined;
  }
}

/** What the zone has nothing of: its own amount, no loss, and never a given temperature. */
function isOfWhole({ of }: BurnParameter): boolean {
  return of === 'amount' || of === 'loss-share' || of === 'heating-value' || of === 'temperature';
}

function known(movement: StateMovement | null, read: (movement: StateMovement) => number): number | undefined {
  const slope = movement ? read(movement) : NaN;
  return Number.isFinite(slope) ? slope : undefined;
}
