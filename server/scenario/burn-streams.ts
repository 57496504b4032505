// Fuel and oxidant as a burn takes them in: elements and enthalpy per kilogram, each as an uncertain quantity, at the
// temperature they come in with. Joins materials and oxidants to what core/burn asks for; burns nothing.
// Invariant: an enthalpy that is not known is null, and `missing` says in words why.

import { speciesAtTemperature } from '../core/balance/species-at-temperature.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { combineParts, noParts } from '../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { molarMassKgPerMol, parseFormula, type Formula } from '../core/substance/formula.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { BurnStream } from '../core/burn/burn.ts';
import type { Material } from './material.ts';
import type { OxidantStream } from './oxidant-stream.ts';
import { preheatOf } from './preheat.ts';
import { withoutPhase } from './valued-species.ts';

/** A stream with its uncertainty. */
export interface UncertainStream {
  readonly elements: ReadonlyMap<string, Quantity>;
  /** J/kg at its temperature, and at 25 °C. */
  readonly enthalpy: Quantity | null;
  readonly referenceEnthalpy: Quantity | null;
  readonly temperature: Quantity;
  readonly gasMolPerKg: Quantity;
  /** Names of the data without which there is no enthalpy. */
  readonly missing: readonly string[];
  readonly sources: readonly string[];
}

/** The numbers of a stream as core takes them, out of the values of `quantitiesOf` in their order. */
export function streamNumbers(stream: UncertainStream, values: readonly number[]): BurnStream {
  const [enthalpy = NaN, reference = NaN, temperatureK = NaN, gasMolPerKg = NaN, ...amounts] = values;
  return {
    elementMolPerKg: new Map([...stream.elements.keys()].map((symbol, index) => [symbol, amounts[index] ?? 0])),
    enthalpyJPerKg: Number.isNaN(enthalpy) ? null : enthalpy,
    referenceEnthalpyJPerKg: Number.isNaN(reference) ? null : reference,
    temperatureK,
    gasMolPerKg,
  };
}

/** Everything uncertain about a stream as one list; what is not known is NaN. */
export function quantitiesOf({
  enthalpy,
  referenceEnthalpy,
  temperature,
  gasMolPerKg,
  elements,
}: UncertainStream): readonly Quantity[] {
  const unknown = quantityOf(NaN);
  return [enthalpy ?? unknown, referenceEnthalpy ?? unknown, temperature, gasMolPerKg, ...elements.values()];
}

/** A fuel at its temperature, its melting and boiling on the way from 25 °C counted. */
export function fuelStream(fuel: Material, temperature: Quantity, pressurePa: number): UncertainStream {
  const preheat = preheatOf(fuel, temperature.value, pressurePa);
  const { formationEnthalpy } = fuel;
  const missing = [
    ...(formationEnthalpy
      ? []
      : (fuel.missing.get('formationEnthalpy') ?? [fuel.name]).map((name) => `the enthalpy of formation of ${name}`)),
    ...(preheat.kind === 'missing' ? preheat.missing : []),
  ];
  const [outcome] =
    formationEnthalpy && preheat.kind === 'preheat'
      ? propagate([formationEnthalpy, temperature], ([enthalpy = NaN, temperatureK = NaN]) => {
          const moved = temperatureK === temperature.value ? preheat : preheatOf(fuel, temperatureK, pressurePa);
          return [moved.kind === 'preheat' ? enthalpy + moved.jPerKg : NaN];
        })
      : [];
  return {
    elements: fuel.elements,
    enthalpy:
      outcome && Number.isFinite(outcome.value) && preheat.kind === 'preheat'
        ? quantityOf(outcome.value, specificEnergy, combineParts(outcome.parts ?? noParts, 1, preheat.parts, 1))
        : null,
    referenceEnthalpy: formationEnthalpy,
    temperature,
    gasMolPerKg: quantityOf(preheat.kind === 'preheat' ? preheat.gasMolPerKg : 0, molPerKg),
    missing,
    sources: [...fuel.sources, ...(preheat.kind === 'preheat' ? preheat.sources : [])],
  };
}

interface OxidantSpecies {
  readonly name: string;
  readonly formula: Formula;
  readonly molarMass: number;
}

/** An oxidant at its state. Gases stay what they are; what is condensed takes the phase that is stable there. */
export function oxidantStream(oxidant: OxidantStream): UncertainStream {
  const { temperature, pressure, moleShares } = oxidant;
  const species = [...moleShares.keys()].flatMap((name): OxidantSpecies[] => {
    const formula = parseFormula(name);
    const molarMass = formula.kind === 'formula' ? molarMassKgPerMol(formula) : undefined;
    return formula.kind === 'formula' && molarMass !== undefined ? [{ name, formula, molarMass }] : [];
  });
  const symbols = [...new Set(species.flatMap(({ formula }) => [...formula.composition.keys()]))];
  const found = new Map(species.map((one) => [one.name, at(one, temperature.value, pressure.value)]));
  const missing = species
    .filter(({ name }) => !found.get(name))
    .map(({ name }) => `the enthalpy of ${name} at its state`);
  const outcomes = propagate([temperature, ...moleShares.values()], ([temperatureK = NaN, ...shares]) => {
    const massKg = species.reduce((sum, { molarMass }, index) => sum + (shares[index] ?? 0) * molarMass, 0);
    const total = (value: (one: OxidantSpecies) => number): number =>
      species.reduce((sum, one, index) => sum + (shares[index] ?? 0) * value(one), 0) / massKg;
    return [
      total((one) => at(one, temperatureK, pressure.value)?.jPerMol ?? NaN),
      total((one) => at(one, referenceTemperatureK, pressure.value)?.jPerMol ?? NaN),
      // What is gas stays gas over a small step.
      total(({ name }) => (found.get(name)?.isGas ? 1 : 0)),
      ...symbols.map((symbol) => total(({ formula }) => formula.composition.get(symbol) ?? 0)),
    ];
  });
  const quantity = (index: number, unit: string): Quantity | null => {
    const outcome = outcomes[index];
    return outcome && Number.isFinite(outcome.value)
      ? quantityOf(outcome.value, knownUnit(unit).dimension, outcome.parts)
      : null;
  };
  const sources = [...found.values()].flatMap((one) => (one ? [one.source] : []));
  return {
    elements: new Map(
      symbols.map((symbol, index) => [symbol, quantity(index + 3, 'mol/kg') ?? quantityOf(0, molPerKg)]),
    ),
    enthalpy: quantity(0, 'J/kg'),
    referenceEnthalpy: quantity(1, 'J/kg'),
    temperature,
    gasMolPerKg: quantity(2, 'mol/kg') ?? quantityOf(0, molPerKg),
    missing,
    sources: [...new Set([...oxidant.sources, ...sources])],
  };
}

/** J/mol of a species at a temperature in K and a pressure in Pa; null where the tables do not have it. */
function at(
  { formula }: OxidantSpecies,
  temperatureK: number,
  pressurePa: number,
): { readonly jPerMol: number; readonly isGas: boolean; readonly source: string } | null {
  const asked = formula.phase === 'g' ? formula : withoutPhase(formula);
  const found = speciesAtTemperature(asked, temperatureK, pressurePa);
  if (!found) return null;
  const { properties, phase } = found;
  return { jPerMol: properties.enthalpyJPerMol, isGas: phase.formula.phase === 'g', source: phase.source };
}

const specificEnergy = knownUnit('J/kg').dimension;
const molPerKg = knownUnit('mol/kg').dimension;
