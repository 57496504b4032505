// What a fuel needs and makes by its elements alone: oxygen by valence, air, water, alkali against carbon.
// Knows no energies. Invariant: the oxygen demand by valence does not depend on where the alkali ends; only sulphate and
// peroxide would take more. All amounts are per kg of fuel, with conventional atomic weights.

import { findSubstance } from '../substance/catalogue.ts';
import { alkaliMetals, atomicWeightKgPerMol, elementOfSymbol } from '../substance/elements.ts';
import type { Slate } from './combustion.ts';

/** mol O2 per kg for λ = 1, and the elements for which λ has no valence (they count as nothing). */
export interface OxygenDemand {
  /** Negative for what brings more oxygen (or halogen) than it can use. */
  readonly molPerKg: number;
  readonly withoutValence: readonly string[];
}

/**
 * Oxygen demand by valence: C 4, H 1, S 4, P 5, alkali 1, Mg Ca Zn 2, Al B Fe 3, Si Ti 4, V 5, O -2, halogens -1, over
 * 4 electrons per O2. Nitrogen and noble gases count nothing.
 */
export function oxygenDemand(fuelMolPerKg: ReadonlyMap<string, number>): OxygenDemand {
  let electrons = 0;
  const withoutValence: string[] = [];
  for (const [symbol, mol] of fuelMolPerKg) {
    const valence = elementOfSymbol(symbol)?.valence;
    if (valence !== undefined) electrons += mol * valence;
    else if (mol > 0) withoutValence.push(symbol);
  }
  return { molPerKg: electrons / 4, withoutValence };
}

/** kg of dry air per kg of fuel for λ = 1; undefined when an element has no valence or the catalogue no air. */
export function stoichiometricAirKgPerKg(fuelMolPerKg: ReadonlyMap<string, number>): number | undefined {
  const demand = oxygenDemand(fuelMolPerKg);
  const air = findSubstance('air');
  // Air's oxygen as λ counts it: what its O2 and the O of its CO2 bring, less what its carbon needs.
  const offered = air === undefined ? undefined : -oxygenDemand(air.molPerKg).molPerKg;
  if (demand.withoutValence.length > 0 || offered === undefined || !(offered > 0)) return undefined;
  return demand.molPerKg / offered;
}

/** Water on a slate, kg per kg of fuel. */
export function waterMadeKgPerKg(slate: Slate): number {
  return slate.products.reduce(
    (sum, product) => (product.formula.text === 'H2O' ? sum + product.molPerKg * waterKgPerMol() : sum),
    0,
  );
}

/**
 * Water that is missing on the hydroxide slate, kg per kg of fuel: alkali that the fuel's own hydrogen cannot turn into
 * hydroxide ends as oxide there, and each such atom would take half a water (M2O + H2O -> 2 MOH). 0 when hydrogen
 * reaches. `hydroxideSlate` is the slate of the rule `hydroxide`.
 */
export function waterMissingKgPerKg(hydroxideSlate: Slate): number {
  const oxides = new Set(alkaliMetals.map((metal) => `${metal}2O`));
  return hydroxideSlate.products.reduce(
    (sum, product) => (oxides.has(product.formula.text) ? sum + product.molPerKg * waterKgPerMol() : sum),
    0,
  );
}

/** mol of alkali metal per mol of carbon; undefined without carbon. */
export function alkaliCarbonRatio(fuelMolPerKg: ReadonlyMap<string, number>): number | undefined {
  const carbon = fuelMolPerKg.get('C') ?? 0;
  const alkali = alkaliMetals.reduce((sum, metal) => sum + (fuelMolPerKg.get(metal) ?? 0), 0);
  return carbon > 0 ? alkali / carbon : undefined;
}

function waterKgPerMol(): number {
  return 2 * (atomicWeightKgPerMol('H') ?? 0) + (atomicWeightKgPerMol('O') ?? 0);
}
