// A blend of the scenario as the store the hazard rules see: blends within it taken apart into their own portions, each with
// its phase where it is kept, and the gas over it by species.
// Knows no rule. Invariant: every portion of the store remembers the line of the definition it came from.

import { hazardsOfOwn } from '../core/hazard/proven-hazards.ts';
import { gasOver, phaseAt, portionOf } from '../core/hazard/store.ts';
import type { ContactMaterial, GasOver, Store, StoredPhase, StoredPortion } from '../core/hazard/store.ts';
import { quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import type { Phase } from '../core/substance/formula.ts';
import type { ExtinguishingAgent } from '../core/substance/hazards.ts';
import type { Substance } from '../core/substance/substance.ts';
import type { Material, PortionShare } from './material.ts';

export interface StoredBlend {
  readonly store: Store;
  /** By index of the store's portions: which of the definition's own portions it belongs to. */
  readonly partOf: readonly number[];
  /** By the same index: what it is a portion of, with its card. */
  readonly materials: readonly Material[];
  /** The same kept at another temperature. */
  readonly storeAt: (temperatureK: number) => Store;
  /** By the same index: mass shares of the whole with their uncertainty. */
  readonly massShares: () => readonly Quantity[];
}

export interface Keeping {
  readonly kind: Store['kind'];
  readonly temperatureK: number;
  readonly pressurePa: number;
  /** Null where none was written; undefined where what was written could not be read. */
  readonly blanket: Material | null | undefined;
  readonly contact: readonly ContactMaterial[];
  readonly extinguishing: readonly ExtinguishingAgent[];
}

export function storedBlend(shares: readonly PortionShare[], keeping: Keeping): StoredBlend {
  const portions: StoredPortion[] = [];
  const partOf: number[] = [];
  const materials: Material[] = [];
  const chains: (readonly Quantity[])[] = [];
  const add = (material: Material, massShare: number, chain: readonly Quantity[], part: number): void => {
    if (material.portions) {
      for (const own of material.portions) add(own.material, massShare * own.mass.value, [...chain, own.mass], part);
    } else if (massShare > 0) {
      portions.push(storedPortion(material, massShare, keeping));
      partOf.push(part);
      materials.push(material);
      chains.push(chain);
    }
  };
  shares.forEach(({ material, mass }, part) => {
    add(material, mass.value, [mass], part);
  });
  const { kind, temperatureK, pressurePa, contact, extinguishing } = keeping;
  const store = {
    kind,
    portions,
    temperatureK,
    pressurePa,
    blanket: gasOverOf(keeping.blanket),
    contact,
    extinguishing,
  };
  const storeAt = (otherK: number): Store => {
    const otherwise = { ...keeping, temperatureK: otherK };
    const moved = materials.map((material, index) =>
      storedPortion(material, portions[index]?.massShare ?? 0, otherwise),
    );
    return { ...store, temperatureK: otherK, portions: moved };
  };
  return { store, partOf, materials, storeAt, massShares: () => chains.map(productOf) };
}

/** The share of a share of a share. */
function productOf(chain: readonly Quantity[]): Quantity {
  const [only, ...others] = chain;
  if (only && others.length === 0) return only;
  const [product] = propagate(chain, (values) => [values.reduce((left, right) => left * right, 1)]);
  return product ? quantityOfOutcome(product) : quantityOf(NaN);
}

function gasOverOf(blanket: Material | null | undefined): GasOver {
  const air = findSubstance('air');
  if (blanket === null) return gasOver(air ? [{ substance: air, moleShare: 1 }] : [], true);
  const moleShares = new Map<string, number>();
  for (const [species, share] of blanket?.species ?? []) {
    const formula = species.replace(/\((g|l|cr|aq)\)$/, '');
    moleShares.set(formula, (moleShares.get(formula) ?? 0) + share);
  }
  return { moleShares, assumed: false };
}

function storedPortion(material: Material, massShare: number, { temperatureK, pressurePa }: Keeping): StoredPortion {
  const substance = catalogueSubstance(material);
  if (substance) return portionOf(substance, massShare, temperatureK, pressurePa);
  const { formula, elements, molarMass, formationEnthalpy, heatCapacity, meltingPoint, boilingPoint, card } = material;
  const points = { meltingPointK: meltingPoint?.value ?? null, boilingPointK: boilingPoint?.value ?? null };
  const usualPhase = phaseWords[material.phase ?? ''] ?? null;
  const molPerKg = new Map([...elements].map(([symbol, quantity]) => [symbol, quantity.value]));
  const property = (id: string): number | null => card.properties.find((one) => one.id === id)?.quantity.value ?? null;
  const lower = property('lower-flammable-limit');
  return {
    name: material.name,
    massShare,
    phase: phaseAt(usualPhase, points, temperatureK, pressurePa),
    usualPhase,
    hazards: hazardsOfOwn(card.hazards, molPerKg),
    formula,
    molPerKg,
    molarMassKgPerMol: molarMass?.value ?? null,
    formationEnthalpyJPerKg: formationEnthalpy?.value ?? null,
    heatCapacityJPerKgK: heatCapacity?.terms.length === 1 ? (heatCapacity.terms[0]?.jPerKgK ?? null) : null,
    flashPointK: property('flash-point'),
    autoignitionK: property('autoignition-temperature'),
    ...points,
    decompositionPointK: null,
    flammableLimits: lower === null ? null : { lower, upper: property('upper-flammable-limit'), temperatureK: null },
  };
}

const phaseWords: Readonly<Record<string, StoredPhase>> = { cr: 'solid', l: 'liquid', g: 'gas' };

function catalogueSubstance({ origin, name, phase, formula }: Material): Substance | undefined {
  if (origin === 'scenario') return undefined;
  return findSubstance(
    origin === 'catalogue' ? name : (formula?.text ?? name),
    (phase ?? undefined) as Phase | undefined,
  );
}
