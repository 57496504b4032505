// A species of an equation with its enthalpy and entropy at the state asked for: at 25 °C those of its material; elsewhere
// the fitted tables, in the phase written or else the stable one; for what the tables lack, the material's own heat
// capacity. Says in its record what it was taken as and whether its data reach that far. Knows no syntax.

import { speciesAtTemperature } from '../core/balance/species-at-temperature.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { enthalpyRise, entropyRise } from '../core/substance/at-temperature.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import { formulaTextWithPhase, type Formula } from '../core/substance/formula.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { Material } from './material.ts';

export interface ValuedSpecies {
  /** The phase its values are of: `Na2CO3(l)`. */
  readonly takenAs: string;
  /** No phase was written: the stable one was taken. */
  readonly guessed: boolean;
  /** J/mol, elements at 298.15 K being zero; null when not known. */
  readonly enthalpy: Quantity | null;
  /** J/(mol K); null when not known. */
  readonly entropy: Quantity | null;
  /** The temperatures its data are good for, where the state lies outside them; null where it lies within. */
  readonly beyond: readonly [from: Quantity, to: Quantity] | null;
  readonly sources: readonly string[];
}

/** Values of a material of that formula; `phaseWritten` says that the phase is not to be chosen. */
export function valueSpecies(
  material: Material,
  formula: Formula,
  phaseWritten: boolean,
  temperatureK: number,
  pressurePa: number,
): ValuedSpecies {
  const own = ownValues(material, formula, phaseWritten);
  if (isReference(temperatureK)) return own;
  if (material.origin !== 'scenario') {
    const asked = phaseWritten || isNamedPhase(material) ? formula : withoutPhase(formula);
    const found = speciesAtTemperature(asked, temperatureK, pressurePa);
    if (found) {
      const { phase, properties, guessed } = found;
      return {
        takenAs: phase.id,
        guessed,
        enthalpy: quantityOf(properties.enthalpyJPerMol, molarEnergy),
        entropy: quantityOf(properties.entropyJPerMolK, molarEntropy),
        beyond: properties.extrapolated === 'no' ? null : range(properties.validK),
        sources: [phase.source],
      };
    }
  }
  return risenFrom(own, material, temperatureK);
}

/** Whether a temperature is 25 °C, where every material has its own values. */
export function isReference(temperatureK: number): boolean {
  return Math.abs(temperatureK - referenceTemperatureK) < 0.01;
}

const molarEnergy = knownUnit('J/mol').dimension;
const molarEntropy = knownUnit('J/(mol K)').dimension;

function ownValues(material: Material, formula: Formula, phaseWritten: boolean): ValuedSpecies {
  const { formationEnthalpy, molarMass, entropy, sources } = material;
  return {
    takenAs: formulaTextWithPhase(formula),
    guessed: !phaseWritten && material.origin === 'catalogue',
    enthalpy: formationEnthalpy && molarMass && scaled(formationEnthalpy, molarMass.value, molarEnergy),
    entropy,
    beyond: null,
    sources,
  };
}

/** From 25 °C by the material's own heat capacity; without one nothing is known elsewhere. */
function risenFrom(own: ValuedSpecies, material: Material, temperatureK: number): ValuedSpecies {
  const { heatCapacity, molarMass } = material;
  if (!heatCapacity || !molarMass) return { ...own, enthalpy: null, entropy: null };
  const enthalpyStep = enthalpyRise(heatCapacity, referenceTemperatureK, temperatureK) * molarMass.value;
  const entropyStep = entropyRise(heatCapacity, referenceTemperatureK, temperatureK) * molarMass.value;
  const isWithin = temperatureK >= heatCapacity.fromK && temperatureK <= heatCapacity.toK;
  return {
    ...own,
    enthalpy: own.enthalpy && { ...own.enthalpy, value: own.enthalpy.value + enthalpyStep },
    entropy: own.entropy && { ...own.entropy, value: own.entropy.value + entropyStep },
    beyond: isWithin ? null : range([heatCapacity.fromK, heatCapacity.toK]),
  };
}

function range([fromK, toK]: readonly [number, number]): readonly [Quantity, Quantity] {
  const temperature = (valueK: number): Quantity =>
    quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
  return [temperature(fromK), temperature(toK)];
}

/** `steam` names a phase that is not the usual one, so it means that phase at any state. */
export function isNamedPhase(material: Material): boolean {
  return material.formula !== null && findSubstance(material.formula.text)?.phase !== material.phase;
}

/** The formula as it is where no phase is asked for. */
export function withoutPhase({ kind, text, composition, charge }: Formula): Formula {
  return { kind, text, composition, charge };
}

function scaled(quantity: Quantity, factor: number, dimension: Quantity['dimension']): Quantity {
  const parts = new Map([...quantity.parts].map(([input, part]) => [input, part * factor]));
  return quantityOf(quantity.value * factor, dimension, parts);
}
