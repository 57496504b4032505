// An oxidant as the gas that an engine draws in, and which of its species no engine can draw in so. Knows no engine.
// Invariant: the masses of the parts add up to what is asked for, where no species is foreign.

import { frozenMixture, type FrozenMixture } from '../core/engine/frozen-mixture.ts';
import { phaseOfId } from '../core/substance/phases.ts';
import { kgPerMolOf } from './fuel-vapour.ts';
import type { OxidantStream } from './oxidant-stream.ts';

/** So many kilograms of an oxidant, all of whose species are gases of the tables. */
export function gasOfOxidant({ moleShares }: OxidantStream, massKg: number): FrozenMixture {
  const parts = [...moleShares].map(([id, share]) => ({ species: phaseOfId(id), share: share.value }));
  const kgPerMol = parts.reduce((sum, { species, share }) => sum + (species?.molarMassKgPerMol ?? 0) * share, 0);
  return frozenMixture(
    parts.flatMap(({ species, share }) => (species ? [{ species, mol: (share * massKg) / kgPerMol }] : [])),
  );
}

/** Species of an oxidant that are not among the gases of the tables. */
export function foreignSpecies({ moleShares }: OxidantStream): readonly string[] {
  return [...moleShares.keys()].filter((id) => phaseOfId(id)?.formula.phase !== 'g' || kgPerMolOf(id) === undefined);
}
