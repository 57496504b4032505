// The uncertainty of a burn's figures by the slopes of the converged states: what a figure reads of the states on either side
// of a small step along each uncertain input, no burn solved anew.
// Knows no figures but that each reads the states. Invariant: to first order, as all propagation here; undefined where a
// slope is not known, never half an answer.
// Method: core/burn/moved-burn.ts; the step is so small that what is left out lies below 1e-7 of a slope.

import { heatGivenOff, heatReleased } from '../../core/burn/burn-held.ts';
import { burnSensitivities } from '../../core/burn/burn-sensitivities.ts';
import { movedBurn, movementsOf, relativeSpeed, type BurnMovements } from '../../core/burn/moved-burn.ts';
import { combineParts, noParts, type Parts } from '../../core/quantity/parts.ts';
import type { BurnQuestion } from './burn-question.ts';
import type { AskedOfBurn, BurnReadings, SolvedBurn } from './burn-solved.ts';

/** Gives the parts of what is read of a burn's states; undefined where slopes are not known. */
export type PartsOfReading = (read: (readings: BurnReadings) => number | null) => Parts | undefined;

/** For one solved burn; its movements are worked out when the first figure asks. */
export function partsBySlope(solved: SolvedBurn, question: BurnQuestion, asked: AskedOfBurn): PartsOfReading {
  const sides = new Map<number, Sides | null>();
  const uncertain = question.quantities.flatMap(({ parts }, index) => (parts.size > 0 ? [{ index, parts }] : []));
  const sidesOf = (index: number): Sides | null => {
    if (!sides.has(index)) sides.set(index, sidesAlong(index, solved, question, asked));
    return sides.get(index) ?? null;
  };
  return (read) => {
    let sum: Parts = noParts;
    for (const { index, parts } of uncertain) {
      const found = sidesOf(index);
      if (!found) return undefined;
      const slope = ((read(found.above) ?? NaN) - (read(found.below) ?? NaN)) / (2 * found.step);
      if (!Number.isFinite(slope)) return undefined;
      sum = combineParts(sum, 1, parts, slope);
    }
    return sum;
  };
}

/** What is read on either side of a step. */
interface Sides {
  readonly step: number;
  readonly above: BurnReadings;
  readonly below: BurnReadings;
}

/** Of what moves at all, the fastest moves by this share of itself. */
const relativeStep = 1e-4;

function sidesAlong(index: number, solved: SolvedBurn, question: BurnQuestion, asked: AskedOfBurn): Sides | null {
  const { burn } = solved;
  const values = question.quantities.map(({ value }) => value);
  const move = question.roles[index];
  if (!move) return null;
  const movements = movementsOf(burn, (solved.sensitivities ??= burnSensitivities(burn)), move);
  const step = relativeStep / (fastest(solved, movements) || 1 / Math.abs(values[index] || 1));
  const side = (by: number): BurnReadings | null => {
    const there = values.map((value, other) => (other === index ? value + by : value));
    const { exhaustK } = question.asked(there);
    return readingsAt(solved, movements, question.input(there), by, { ...asked, exhaustK });
  };
  const [above, below] = [side(step), side(-step)];
  return above && below ? { step, above, below } : null;
}

function fastest(solved: SolvedBurn, movements: BurnMovements): number {
  const zone = solved.zone();
  const slate = solved.slate()?.slate;
  return Math.max(
    relativeSpeed(solved.flame, movements.flame()),
    zone ? relativeSpeed(zone, movements.zone()) : 0,
    slate ? relativeSpeed(slate, movements.cooled(slate)) : 0,
  );
}

function readingsAt(
  solved: SolvedBurn,
  movements: BurnMovements,
  input: ReturnType<BurnQuestion['input']>,
  by: number,
  { exhaustK }: AskedOfBurn,
): BurnReadings | null {
  const there = movedBurn(solved.burn, movements, input, by);
  if (!there) return null;
  const { charge } = there;
  return {
    charge,
    flame: there.flame,
    // The heat capacity that follows the reactions is itself a slope: how it moves, the first slopes do not say.
    response: () => null,
    zone: there.zone,
    heat: () => {
      const slate = solved.slate();
      const moved = slate && there.cooled(slate.slate, slate.slate.temperatureK);
      return moved && heatReleased(input, charge, moved);
    },
    heatAboveJ: () => {
      const exhaust = solved.exhaust();
      const moved = exhaust && there.cooled(exhaust, exhaustK);
      return moved && heatGivenOff(input, charge, moved);
    },
    burnOuts: () => null,
  };
}
