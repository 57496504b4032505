// What the condensed products of a burn would do on its walls: where their deposit sticks. Knows no walls but their
// temperatures.
// Invariant: a wall is looked at in the products' equilibrium at its own temperature, as what meets it is cooled to that.

import type { Burn } from '../../core/burn/burn.ts';
import { depositOf } from '../../core/burn/deposit.ts';
import { productRows } from '../../core/burn/products.ts';
import { vapourOnWall } from '../../core/burn/wall-condensation.ts';
import type { SaltMelting } from '../../core/equilibrium/melts.ts';
import type { TemperatureRange } from '../burn-readers.ts';

/** Where walls of a range are met by a sticky deposit, or by one of which that is not known. */
export interface DoubtfulWalls {
  /** Of the walls looked at, the coldest and the hottest of the kind. */
  readonly fromK: number;
  readonly toK: number;
  /** On the coldest of them. */
  readonly melting: SaltMelting;
  /** The most of it by mass, at most three. */
  readonly leading: readonly string[];
  /** Vapours that froze in the gas and condense on the wall. */
  readonly vapours: readonly string[];
}

export interface JudgedWalls {
  readonly sticky: DoubtfulWalls | null;
  readonly notKnown: DoubtfulWalls | null;
}

/** Walls looked at: both ends and what lies evenly between them. */
const mostWalls = 7;

/** Both null where nothing that is there can stick. */
export function judgedWalls(burn: Burn, { from, to }: TemperatureRange): JudgedWalls {
  const count = from.value === to.value ? 1 : mostWalls;
  const walls = Array.from(
    { length: count },
    (_, index) => from.value + (index * (to.value - from.value)) / Math.max(1, count - 1),
  );
  const met = walls.flatMap((wallK, index) => {
    const state = burn.at(wallK);
    if (state.kind === 'none') return [];
    // In equilibrium what can condense has; of a frozen gas, vapour may arrive that the wall is too cold for.
    const condensed = state.kind === 'frozen' ? vapourOnWall(state) : null;
    const there = condensed?.state ?? state;
    const melting = depositOf(there);
    if (!melting) return [];
    const vapours = condensed?.vapours.map((gas) => state.candidates.phases[gas]?.id ?? '') ?? [];
    const leading = productRows(there)
      .filter(({ isGas }) => !isGas)
      .slice(0, 3)
      .map(({ id }) => id);
    const colderK = walls[index - 1] ?? wallK;
    return [{ wallK, colderK, melting, leading, vapours, verdict: stickinessAt(wallK, melting) }];
  });
  const walled = (verdict: Stickiness): DoubtfulWalls | null => {
    const alike = met.filter((one) => one.verdict === verdict);
    const [coldest] = alike;
    const hottest = alike.at(-1);
    if (!coldest || !hottest) return null;
    const { wallK, colderK, melting, leading, vapours } = coldest;
    // Between the last wall that is not met so and the first that is, the deposit's own limit is known better.
    const limitK = verdict === 'sticky' ? melting.stickyK : surelySolidBelowK(melting);
    const fromK = limitK === null ? wallK : Math.min(wallK, Math.max(colderK, limitK));
    return { fromK, toK: hottest.wallK, melting, leading, vapours };
  };
  return { sticky: walled('sticky'), notKnown: walled('not-known') };
}

type Stickiness = 'sticky' | 'dry' | 'not-known';

function stickinessAt(wallK: number, melting: SaltMelting): Stickiness {
  if (melting.stickyK !== null) return wallK >= melting.stickyK ? 'sticky' : 'dry';
  const solidBelowK = surelySolidBelowK(melting);
  return solidBelowK !== null && wallK < solidBelowK ? 'dry' : 'not-known';
}

/** Below it nothing of the deposit melts; null where that is not known, as other salts in it may melt earlier. */
function surelySolidBelowK({ firstMeltingK, validity }: SaltMelting): number | null {
  return validity.includes('eutectic-of-some') ? null : firstMeltingK;
}
