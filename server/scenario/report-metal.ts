// Attacks on hot metal (core/engine/deposits.ts) as facts at the entry that gives the metal's temperature, or the engine.
// Knows no machine and words nothing. Invariant: each kind of attack is told once.

import { attacksOn, type Attack, type Metal } from '../core/engine/deposits.ts';
import type { MatterState } from '../core/burn/burn.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import type { Span } from '../../grammar/tree.ts';
import type { Context } from './context.ts';
import type { MetalFact } from './metal-facts.ts';

/** Says what products do to metal of these temperatures. `stateAt`: their equilibrium at a temperature in K. */
export function reportMetal(
  metal: Metal,
  stateAt: (temperatureK: number) => MatterState | null,
  vanadiumMolPerKg: number,
  place: Span,
  context: Context,
): void {
  for (const attack of attacksOn(metal, stateAt, vanadiumMolPerKg)) context.report(place, factOf(attack));
}

function factOf({ kind, fromK, toK, salts, melting }: Attack): MetalFact {
  const from = kelvin(fromK);
  const to = kelvin(toK);
  const firstMelting = orNull(melting?.firstMeltingK);
  switch (kind) {
    case 'sticky':
    case 'not-known':
      return {
        code: 'engine/deposits',
        from,
        to,
        firstMelting,
        sticky: orNull(melting?.stickyK),
        uncertaintyK: melting?.uncertaintyK ?? null,
        salts,
        validity: melting?.validity ?? [],
      };
    case 'basic':
      return { code: 'engine/basic-attack', from, to, salts, firstMelting };
    case 'sulphate-type-1':
    case 'sulphate-type-2':
    case 'vanadate':
      return { code: 'engine/hot-corrosion', by: kind, from, to, salts };
  }
}

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}

function orNull(valueK: number | null | undefined): Quantity | null {
  return valueK === null || valueK === undefined ? null : kelvin(valueK);
}
