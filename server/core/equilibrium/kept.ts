// What a solver's work holds at a moment, kept aside while one way on is tried, so that another can start from the same place.
// Knows no way. Invariant: after a restore the work stands as it stood, fractions included.

import { takeFractions, takeTemperature } from './newton.ts';
import type { Aim } from './newton.ts';
import type { Work } from './work.ts';

export interface KeptBasis {
  readonly rank: number;
  readonly basis: Int32Array;
  readonly nu: Float64Array;
  readonly inverse: Float64Array;
  readonly isForced: Uint8Array;
  readonly amounts: Float64Array;
}

export function keepBasis({ rank, basis, nu, inverse, isForced, amounts }: Work): KeptBasis {
  return {
    rank,
    basis: basis.slice(),
    nu: nu.slice(),
    inverse: inverse.slice(),
    isForced: isForced.slice(),
    amounts: amounts.slice(),
  };
}

export function restoreBasis(work: Work, { rank, basis, nu, inverse, isForced, amounts }: KeptBasis): void {
  work.rank = rank;
  work.basis.set(basis);
  work.nu.set(nu);
  work.inverse.set(inverse);
  work.isForced.set(isForced);
  work.amounts.set(amounts);
}

export interface Kept {
  readonly potential: Float64Array;
  readonly present: Int32Array;
  readonly presentAmount: Float64Array;
  readonly presentCount: number;
  readonly gasAmount: number;
}

export function keep(work: Work): Kept {
  return {
    potential: work.potential.slice(),
    present: work.present.slice(),
    presentAmount: work.presentAmount.slice(),
    presentCount: work.presentCount,
    gasAmount: work.gasAmount,
  };
}

export function restore(work: Work, kept: Kept, aim: Aim): void {
  work.potential.set(kept.potential);
  work.present.set(kept.present);
  work.presentAmount.set(kept.presentAmount);
  work.presentCount = kept.presentCount;
  work.gasAmount = kept.gasAmount;
  takeTemperature(work, aim, work.temperatureK);
  takeFractions(work, aim);
}
