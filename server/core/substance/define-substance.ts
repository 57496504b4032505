// Builds a substance from somebody's own definition: a formula or mass shares of elements, an energy, a density and so on.
// Knows no syntax, no units but SI, and does not judge plausibility. Invariant: the result is as complete as the definition;
// what cannot be had (an atomic weight, a composition) is a fault, and numbers left out stay absent.

import { molPerKgOfFormula, molPerKgOfMassShares } from './composition.ts';
import { molarMassKgPerMol } from './formula.ts';
import type { Formula, Phase } from './formula.ts';
import type { SourceRecord } from './record.ts';
import type { Energy, Substance } from './substance.ts';

/** All in SI; uncertainties are standard uncertainties in the unit of their number. */
export interface SubstanceDefinition {
  readonly name: string;
  readonly phase: Phase;
  readonly formula?: Formula;
  /** Mass share of each element by symbol, adding up to 1; used when there is no formula. */
  readonly massShares?: ReadonlyMap<string, number>;
  /** For a substance given by mass shares whose molar mass is known. */
  readonly molarMassKgPerMol?: number;
  /** One of these at most; a formation enthalpy goes before a heating value. */
  readonly formationEnthalpyJPerKg?: DefinedNumber;
  readonly formationEnthalpyJPerMol?: DefinedNumber;
  readonly lowerHeatingValueJPerKg?: DefinedNumber;
  readonly higherHeatingValueJPerKg?: DefinedNumber;
  readonly densityKgPerM3?: DefinedNumber & { readonly temperatureK: number };
  readonly heatCapacityJPerKgK?: DefinedNumber;
  readonly flashPointK?: DefinedNumber;
  /** 0 to 1; absent counts as 0. */
  readonly carbonBiogenicShare?: number;
  /** What the definition gives as its source; absent means the scenario itself. */
  readonly source?: string;
}

export interface DefinedNumber {
  readonly value: number;
  readonly uncertainty?: number;
}

export type DefinitionFault =
  | { readonly kind: 'fault'; readonly reason: 'no-composition' }
  | { readonly kind: 'fault'; readonly reason: 'unknown-elements'; readonly elements: readonly string[] }
  /** A formation enthalpy per mole of something without a molar mass. */
  | { readonly kind: 'fault'; readonly reason: 'no-molar-mass' };

/** The substance of a definition, or what keeps it from being one. */
export function defineSubstance(
  definition: SubstanceDefinition,
): { readonly kind: 'substance'; readonly substance: Substance } | DefinitionFault {
  const { name, phase, formula, massShares } = definition;
  const molPerKg = compositionOf(formula, massShares);
  if ('kind' in molPerKg) return molPerKg;
  const molarMass = (formula === undefined ? undefined : molarMassKgPerMol(formula)) ?? definition.molarMassKgPerMol;
  if (definition.formationEnthalpyJPerMol !== undefined && molarMass === undefined) {
    return { kind: 'fault', reason: 'no-molar-mass' };
  }
  const source = sourceOf(definition);
  const datum = (number: DefinedNumber, scale = 1) => ({
    value: number.value * scale,
    source,
    ...(number.uncertainty === undefined ? {} : { uncertainty: number.uncertainty * scale }),
  });
  const { densityKgPerM3: density, heatCapacityJPerKgK: heatCapacity, flashPointK: flashPoint } = definition;
  const substance: Substance = {
    name,
    label: name.replaceAll('_', ' '),
    aliases: [],
    phase,
    ...(formula === undefined ? {} : { formula: { ...formula, phase } }),
    molPerKg,
    chargeMolPerKg: formula === undefined || molarMass === undefined ? 0 : formula.charge / molarMass,
    ...(molarMass === undefined ? {} : { molarMassKgPerMol: molarMass }),
    energy: energyOf(definition, molarMass, datum),
    ...(density === undefined ? {} : { density: { ...datum(density), temperatureK: density.temperatureK } }),
    ...(heatCapacity === undefined ? {} : { heatCapacityJPerKgK: datum(heatCapacity) }),
    ...(flashPoint === undefined ? {} : { flashPointK: datum(flashPoint) }),
    carbonBiogenicShare: definition.carbonBiogenicShare ?? 0,
    ...(formula === undefined ? { compositionSource: source } : {}),
    rules: [],
    stableAtReference: true,
  };
  return { kind: 'substance', substance };
}

function compositionOf(
  formula: Formula | undefined,
  massShares: ReadonlyMap<string, number> | undefined,
): ReadonlyMap<string, number> | DefinitionFault {
  if (formula !== undefined) {
    const molPerKg = molPerKgOfFormula(formula);
    return molPerKg ?? { kind: 'fault', reason: 'unknown-elements', elements: [...formula.composition.keys()] };
  }
  if (massShares === undefined || massShares.size === 0) return { kind: 'fault', reason: 'no-composition' };
  const composition = molPerKgOfMassShares(massShares);
  return 'molPerKg' in composition
    ? composition.molPerKg
    : { kind: 'fault', reason: 'unknown-elements', elements: composition.withoutWeight };
}

function energyOf(
  definition: SubstanceDefinition,
  molarMass: number | undefined,
  datum: (number: DefinedNumber, scale?: number) => { value: number; source: SourceRecord; uncertainty?: number },
): Energy {
  const { formationEnthalpyJPerKg: perKg, formationEnthalpyJPerMol: perMol } = definition;
  const { lowerHeatingValueJPerKg: lower, higherHeatingValueJPerKg: higher } = definition;
  if (perKg !== undefined) return { kind: 'formation-enthalpy', jPerKg: datum(perKg) };
  if (perMol !== undefined && molarMass !== undefined) {
    return { kind: 'formation-enthalpy', jPerKg: datum(perMol, 1 / molarMass) };
  }
  if (lower !== undefined) return { kind: 'heating-value', basis: 'lower', jPerKg: datum(lower) };
  if (higher !== undefined) return { kind: 'heating-value', basis: 'higher', jPerKg: datum(higher) };
  return { kind: 'unknown' };
}

function sourceOf(definition: SubstanceDefinition): SourceRecord {
  const title = definition.source ?? `the definition of ${definition.name}`;
  return { id: 'scenario', author: '', year: 0, title, where: '', provenance: 'stated' };
}
