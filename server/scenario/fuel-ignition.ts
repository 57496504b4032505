// What the catalogue has of how a fuel lights, and whether it is a fuel of the trade at all. Joins materials to data and
// judges nothing. Invariant: a limit of a mixture is there only where that of each of its substances is.
// Sources: Le Chatelier's rule for the lower limit of a mixture; ISO 8217:2024 (from memory): petroleum products, synthetic and
// renewable hydrocarbons and fatty acid methyl esters, with sodium, aluminium and silicon limited to parts in a million.

import { findSubstance } from '../core/substance/catalogue.ts';
import { atomicWeightKgPerMol } from '../core/substance/elements.ts';
import { canCondense } from '../core/engine/loss-tree.ts';
import type { Material } from './material.ts';

/** The lowest autoignition temperature of a fuel's substances, K; null where none is known. */
export function autoignitionOf(fuel: Material): number | null {
  const found = leavesOf(fuel).flatMap(({ material }) => dataOf(material)?.autoignitionK?.value ?? []);
  return found.length > 0 ? Math.min(...found) : null;
}

/** Mole share in air at 25 °C, by Le Chatelier; null where that of any of its substances is not known. */
export function lowerLimitOf(fuel: Material): number | null {
  let mols = 0;
  let sum = 0;
  for (const { material, mass } of leavesOf(fuel)) {
    const lower = dataOf(material)?.flammableLimits?.lower.value;
    if (lower === undefined || !material.molarMass) return null;
    const mol = mass / material.molarMass.value;
    mols += mol;
    sum += mol / lower;
  }
  return mols > 0 ? mols / sum : null;
}

function dataOf({ name, origin }: Material): ReturnType<typeof findSubstance> {
  return origin === 'scenario' ? undefined : findSubstance(name);
}

/** The substances of a fuel with their mass shares. */
function leavesOf(fuel: Material): readonly { readonly material: Material; readonly mass: number }[] {
  if (!fuel.portions) return [{ material: fuel, mass: 1 }];
  return fuel.portions.flatMap(({ material, mass }) =>
    leavesOf(material).map((leaf) => ({ material: leaf.material, mass: leaf.mass * mass.value })),
  );
}

/** Why something that is stored and injected is no marine fuel of the standard; empty where it may be one. */
export type NoStandardFuel = 'metal' | 'oxygenate' | 'nitrogen';

/** By its elements alone: what else the standard asks (viscosity, flash point, …) is not looked at. */
export function outsideStandard({ elements }: Material): readonly NoStandardFuel[] {
  let metal = 0;
  const share = (symbol: string): number => (elements.get(symbol)?.value ?? 0) * (atomicWeightKgPerMol(symbol) ?? 0);
  for (const symbol of elements.keys()) if (canCondense([symbol])) metal += share(symbol);
  return [
    ...(metal > leastMetal ? (['metal'] as const) : []),
    ...(share('O') > mostOxygen ? (['oxygenate'] as const) : []),
    ...(share('N') > mostNitrogen ? (['nitrogen'] as const) : []),
  ];
}

/** The ash of a residual fuel may reach 0.15 %; fatty acid methyl esters hold 11 % of oxygen. */
const leastMetal = 0.0015;
const mostOxygen = 0.13;
const mostNitrogen = 0.02;
