// What something is to burn in: its species with their mole shares, humidity included, and the state it is taken at. An
// oxidant definition makes one; a substance whose molecules are known, named as it is, is one at 25 °C and 1 bar.
// Plain data; knows no fuel. Invariant: the shares add up to 1.

import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { Material } from './material.ts';
import type { AssumptionId } from './working.ts';

export interface OxidantStream {
  readonly name: string;
  /** By formula with phase: `O2(g)`. */
  readonly moleShares: ReadonlyMap<string, Quantity>;
  readonly temperature: Quantity;
  readonly pressure: Quantity;
  readonly sources: readonly string[];
  readonly assumptions: readonly AssumptionId[];
}

/** A substance taken as it is; null where its molecules are not known. */
export function streamOfMaterial({ name, species, sources }: Material): OxidantStream | null {
  if (!species) return null;
  return {
    name,
    moleShares: new Map([...species].map(([formula, share]) => [formula, quantityOf(share)])),
    temperature: quantityOf(referenceTemperatureK, knownUnit('K').dimension, undefined, 'temperature'),
    pressure: quantityOf(1e5, knownUnit('Pa').dimension),
    sources,
    assumptions: ['ideal-gas'],
  };
}
