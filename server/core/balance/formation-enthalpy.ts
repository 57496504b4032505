// Formation enthalpies per kilogram: as recorded, or worked back from a heating value on the substance's own slate; and the
// enthalpy of a slate's products. Knows no mixtures (heating-value.ts does).
// Invariant: burning a substance that was given by a heating value, on the ruled slate, gives that very value back.
// Reference: elements at 298.15 K and 1 bar; products from the catalogue, water as vapour.

import { findSubstance, findSubstanceOfFormula } from '../substance/catalogue.ts';
import type { SourceRecord } from '../substance/record.ts';
import type { Datum, Substance } from '../substance/substance.ts';
import { completeCombustion } from './combustion.ts';
import type { Slate, SlateFault } from './combustion.ts';
import type { GivenProductsFault } from './given-products.ts';

/** Why there is no heating value or formation enthalpy. */
export type EnergyFault =
  | SlateFault
  | GivenProductsFault
  /** These fuel substances (by name) have no formation enthalpy and no heating value. */
  | { readonly kind: 'fault'; readonly reason: 'no-fuel-data'; readonly substances: readonly string[] }
  /** The catalogue has no formation enthalpy of these products. */
  | { readonly kind: 'fault'; readonly reason: 'no-product-data'; readonly species: readonly string[] };

export interface FormationEnthalpy {
  readonly kind: 'known';
  /** J/kg; the source is that of the number it rests on. */
  readonly jPerKg: Datum;
  /** Where it was worked back from a heating value: that value and the slate it rests on. */
  readonly derivedFrom?: {
    readonly basis: 'lower' | 'higher';
    readonly heatingValueJPerKg: number;
    readonly slate: Slate;
  };
}

/** The formation enthalpy of a substance at 298.15 K and 1 bar; a fault says why there is none. */
export function formationEnthalpyOf(substance: Substance): FormationEnthalpy | EnergyFault {
  const { energy } = substance;
  if (energy.kind === 'unknown') return { kind: 'fault', reason: 'no-fuel-data', substances: [substance.name] };
  if (energy.kind === 'formation-enthalpy') return { kind: 'known', jPerKg: energy.jPerKg };
  const slate = completeCombustion(substance.molPerKg);
  if (slate.kind === 'fault') return slate;
  const jPerKg = enthalpyBehindHeatingValue(slate, energy.basis, energy.jPerKg.value);
  if (typeof jPerKg !== 'number') return jPerKg;
  return {
    kind: 'known',
    jPerKg: { ...energy.jPerKg, value: jPerKg },
    derivedFrom: { basis: energy.basis, heatingValueJPerKg: energy.jPerKg.value, slate },
  };
}

/** The formation enthalpy of a fuel, J/kg, that gives this heating value (J/kg) on a slate. */
export function enthalpyBehindHeatingValue(
  slate: Slate,
  basis: 'lower' | 'higher',
  heatingValueJPerKg: number,
): number | EnergyFault {
  const products = enthalpyOfProducts(slate);
  if (products.kind === 'fault') return products;
  return heatingValueJPerKg + products.jPerKg - (basis === 'lower' ? 0 : products.condensationJPerKg);
}

export interface ProductsEnthalpy {
  readonly kind: 'products';
  /** Formation enthalpy of the products of 1 kg of fuel, water as vapour. */
  readonly jPerKg: number;
  /** Heat that the slate's water gives up when it condenses at 25 °C. */
  readonly condensationJPerKg: number;
  readonly sources: readonly SourceRecord[];
}

/** Enthalpy of what 1 kg of fuel burns to, worked out once a slate; a fault names the products without data. */
export function enthalpyOfProducts(slate: Slate): ProductsEnthalpy | EnergyFault {
  const known = ofSlate.get(slate);
  if (known) return known;
  const answer = addUpProducts(slate);
  ofSlate.set(slate, answer);
  return answer;
}

const ofSlate = new WeakMap<Slate, ProductsEnthalpy | EnergyFault>();

function addUpProducts(slate: Slate): ProductsEnthalpy | EnergyFault {
  let jPerKg = 0;
  let condensationJPerKg = 0;
  const sources = new Set<SourceRecord>();
  const missing: string[] = [];
  for (const { formula, species, molPerKg } of slate.products) {
    const molar = molarEnthalpy(findSubstanceOfFormula(formula));
    if (molar === undefined) {
      missing.push(species);
      continue;
    }
    jPerKg += molPerKg * molar.jPerMol;
    sources.add(molar.source);
    if (formula.text === 'H2O') condensationJPerKg += molPerKg * condensationJPerMol();
  }
  if (missing.length > 0) return { kind: 'fault', reason: 'no-product-data', species: missing };
  return { kind: 'products', jPerKg, condensationJPerKg, sources: [...sources] };
}

/** J/mol and source of a catalogue substance. */
function molarEnthalpy(
  substance: Substance | undefined,
): { readonly jPerMol: number; readonly source: SourceRecord } | undefined {
  if (substance?.molarMassKgPerMol === undefined || substance.energy.kind !== 'formation-enthalpy') return undefined;
  const { value, source } = substance.energy.jPerKg;
  return { jPerMol: value * substance.molarMassKgPerMol, source };
}

/** About 44 kJ/mol. A catalogue without its water is a mistake in the program, and throws. */
function condensationJPerMol(): number {
  const [vapour, liquid] = [findSubstance('water', 'g'), findSubstance('water', 'l')].map(molarEnthalpy);
  if (!vapour || !liquid) throw new Error('The catalogue has no enthalpy of water as liquid and vapour.');
  return vapour.jPerMol - liquid.jPerMol;
}
