// Turns what a substance is made of (a formula, mass shares, a molar mixture) into moles of each element per kilogram.
// Knows no energies and no catalogue. Invariant: mass is kept, so the moles times the atomic weights give one kilogram
// (or the sum of the shares that were given). Atomic weights are the conventional ones of elements.ts.

import { atomicWeightKgPerMol } from './elements.ts';
import { molarMassKgPerMol } from './formula.ts';
import type { Formula } from './formula.ts';

/** mol of each element per kg of the formula's substance; undefined when its molar mass is unknown or zero. */
export function molPerKgOfFormula(formula: Formula): ReadonlyMap<string, number> | undefined {
  const molarMass = molarMassKgPerMol(formula);
  if (molarMass === undefined || !(molarMass > 0)) return undefined;
  return new Map([...formula.composition].map(([symbol, count]) => [symbol, count / molarMass]));
}

/**
 * mol of each element per kg from mass shares of elements (1 = all). The shares are taken as they are, not scaled.
 * Returns the symbols that have no atomic weight instead, when there are any.
 */
export function molPerKgOfMassShares(
  massShares: ReadonlyMap<string, number>,
): { readonly molPerKg: ReadonlyMap<string, number> } | { readonly withoutWeight: readonly string[] } {
  const molPerKg = new Map<string, number>();
  const withoutWeight: string[] = [];
  for (const [symbol, share] of massShares) {
    const weight = atomicWeightKgPerMol(symbol);
    if (weight === undefined) withoutWeight.push(symbol);
    else molPerKg.set(symbol, share / weight);
  }
  return withoutWeight.length > 0 ? { withoutWeight } : { molPerKg };
}
