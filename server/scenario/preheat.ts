// What a material takes up between 25 °C and the temperature it is burnt from: by the fitted tables where they have it,
// else by its own heat capacity and the catalogue's other phases, so that melting and boiling on the way are counted.
// Knows no flames. Invariant: nothing is guessed; what is missing is named in words.

import { speciesAtTemperature } from '../core/balance/species-at-temperature.ts';
import { combineParts, noParts, type Parts } from '../core/quantity/parts.ts';
import { enthalpyRise } from '../core/substance/at-temperature.ts';
import { findSubstance, phasesOfSubstance } from '../core/substance/catalogue.ts';
import { harmlessBelowK, liquefiedGas } from '../core/substance/liquefied-gases.ts';
import { molarMassKgPerMol, parseFormula } from '../core/substance/formula.ts';
import { phasesOfFormula } from '../core/substance/phases.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { Material } from './material.ts';
import { isReference, withoutPhase } from './valued-species.ts';
import { storedPhase } from './storage.ts';

export type Preheat =
  | {
      readonly kind: 'preheat';
      /** J/kg taken up from 25 °C on, melting and boiling counted; negative below. */
      readonly jPerKg: number;
      /** What makes it uncertain besides the temperature: the portions' shares, and heat capacities that say so. */
      readonly parts: Parts;
      /** mol of gas per kg at the temperature. */
      readonly gasMolPerKg: number;
      readonly sources: readonly string[];
    }
  | { readonly kind: 'missing'; readonly missing: readonly string[] };

/** From 25 °C to a temperature in K at a pressure in Pa. */
export function preheatOf(material: Material, temperatureK: number, pressurePa: number): Preheat {
  if (material.portions) return ofPortions(material, temperatureK, pressurePa);
  if (isReference(temperatureK)) {
    return {
      kind: 'preheat',
      jPerKg: 0,
      parts: noParts,
      gasMolPerKg: material.phase === 'g' ? molPerKg(material) : 0,
      sources: [],
    };
  }
  if (isLiquefied(material, temperatureK, pressurePa)) return asLiquid(material, temperatureK, pressurePa);
  return (
    byTables(material, temperatureK, pressurePa) ??
    bySpecies(material, temperatureK) ??
    byHeatCapacity(material, temperatureK, pressurePa)
  );
}

function ofPortions(material: Material, temperatureK: number, pressurePa: number): Preheat {
  const missing: string[] = [];
  const sources: string[] = [];
  let jPerKg = 0;
  let parts: Parts = noParts;
  let gasMolPerKg = 0;
  for (const { material: portion, mass } of material.portions ?? []) {
    const own = preheatOf(portion, temperatureK, pressurePa);
    if (own.kind === 'missing') missing.push(...own.missing);
    else {
      jPerKg += mass.value * own.jPerKg;
      parts = combineParts(parts, 1, combineParts(own.parts, mass.value, mass.parts, own.jPerKg), 1);
      gasMolPerKg += mass.value * own.gasMolPerKg;
      sources.push(...own.sources);
    }
  }
  if (missing.length > 0) return { kind: 'missing', missing: [...new Set(missing)] };
  return { kind: 'preheat', jPerKg, parts, gasMolPerKg, sources: [...new Set(sources)] };
}

/** A gas below its boiling point. Under less than an atmosphere it may still be one. */
function isLiquefied({ phase, boilingPoint }: Material, temperatureK: number, pressurePa: number): boolean {
  return phase === 'g' && boilingPoint !== null && temperatureK < boilingPoint.value && pressurePa > leastLiquidPa;
}

const leastLiquidPa = 0.9e5;

/** As gas down to its boiling point, then the heat that boiling takes, then as liquid. */
function asLiquid(material: Material, temperatureK: number, pressurePa: number): Preheat {
  const { name, boilingPoint, molarMass, heatCapacity, origin } = material;
  const liquid = origin === 'catalogue' ? liquefiedGas(name) : undefined;
  if (!boilingPoint || !molarMass || !liquid)
    return { kind: 'missing', missing: [`the heat of vaporization of ${name}`] };
  const belowK = boilingPoint.value - temperatureK;
  if (belowK > harmlessBelowK) return { kind: 'missing', missing: [`the heat capacity of liquid ${name} so cold`] };
  const gas = byTables(material, boilingPoint.value + 0.01, Math.min(pressurePa, leastLiquidPa));
  const asGasJPerKg =
    gas?.kind === 'preheat'
      ? gas.jPerKg
      : heatCapacity && enthalpyRise(heatCapacity, referenceTemperatureK, boilingPoint.value);
  if (asGasJPerKg === null) return { kind: 'missing', missing: [`the heat capacity of ${name}`] };
  const condensingJPerKg = (liquid.latentJPerMol + liquid.liquidJPerMolK * belowK) / molarMass.value;
  return {
    kind: 'preheat',
    jPerKg: asGasJPerKg - condensingJPerKg,
    parts: noParts,
    gasMolPerKg: 0,
    sources: [...(gas?.kind === 'preheat' ? gas.sources : []), liquid.source],
  };
}

/** J/mol that a name's isomer may differ by and still be taken for it: less than any two isomers do. */
const sameSubstanceJPerMol = 3000;

/** By the tables, in the phase stable at the state. Another isomer of the formula betrays itself by its enthalpy. */
function byTables(material: Material, temperatureK: number, pressurePa: number): Preheat | null {
  const { formula, formationEnthalpy, molarMass } = material;
  if (!formula || !formationEnthalpy || !molarMass || material.origin === 'scenario') return null;
  const enthalpyJPerMol = formationEnthalpy.value * molarMass.value;
  const own = phasesOfFormula(formula).find(
    ({ formationEnthalpyJPerMol }) =>
      formationEnthalpyJPerMol !== undefined &&
      Math.abs(formationEnthalpyJPerMol - enthalpyJPerMol) < sameSubstanceJPerMol,
  );
  if (own?.formationEnthalpyJPerMol === undefined) return null;
  const found = speciesAtTemperature(withoutPhase(formula), temperatureK, pressurePa);
  if (!found || found.properties.extrapolated !== 'no') return null;
  return {
    kind: 'preheat',
    jPerKg: (found.properties.enthalpyJPerMol - own.formationEnthalpyJPerMol) / molarMass.value,
    parts: noParts,
    gasMolPerKg: found.phase.formula.phase === 'g' ? 1 / molarMass.value : 0,
    sources: [found.phase.source],
  };
}

/** A gas mixture whose molecules are known: each by the tables. */
function bySpecies({ species, formula, phase, molarMass }: Material, temperatureK: number): Preheat | null {
  if (!species || formula || phase !== 'g' || !molarMass) return null;
  const sources: string[] = [];
  let jPerMol = 0;
  for (const [name, share] of species) {
    const rise = gasRise(name, temperatureK);
    if (!rise) return null;
    jPerMol += share * rise.jPerMol;
    sources.push(rise.source);
  }
  return {
    kind: 'preheat',
    jPerKg: jPerMol / molarMass.value,
    parts: noParts,
    gasMolPerKg: 1 / molarMass.value,
    sources: [...new Set(sources)],
  };
}

function gasRise(name: string, temperatureK: number): { jPerMol: number; source: string } | null {
  const formula = parseFormula(name);
  if (formula.kind !== 'formula' || molarMassKgPerMol(formula) === undefined) return null;
  const hot = speciesAtTemperature(formula, temperatureK, 1e5);
  const cold = speciesAtTemperature(formula, referenceTemperatureK, 1e5);
  if (!hot || !cold) return null;
  return { jPerMol: hot.properties.enthalpyJPerMol - cold.properties.enthalpyJPerMol, source: hot.phase.source };
}

/** By its own heat capacity; through a change of phase where the catalogue has the other phase as well. */
function byHeatCapacity(material: Material, temperatureK: number, pressurePa: number): Preheat {
  const { name, heatCapacity, formationEnthalpy, molarMass } = material;
  const phase = storedPhase(material, temperatureK, pressurePa);
  const isGas = phase === 'gas';
  if (phase === null || phaseLetters[phase] === material.phase) {
    if (!heatCapacity) return { kind: 'missing', missing: [`the heat capacity of ${name}`] };
    const jPerKg = enthalpyRise(heatCapacity, referenceTemperatureK, temperatureK);
    const parts = combineParts(material.heatCapacityParts ?? noParts, jPerKg, noParts, 0);
    return { kind: 'preheat', jPerKg, parts, gasMolPerKg: isGas && molarMass ? 1 / molarMass.value : 0, sources: [] };
  }
  const substance = material.origin === 'catalogue' ? findSubstance(name) : undefined;
  const other = substance && phasesOfSubstance(substance.name).find((one) => one.phase === phaseLetters[phase]);
  const otherJPerKg = other?.energy.kind === 'formation-enthalpy' ? other.energy.jPerKg.value : undefined;
  if (!other?.heatCapacity || otherJPerKg === undefined || !formationEnthalpy) {
    const change = isGas || material.phase === 'g' ? 'vaporization' : phase === 'solid' ? 'freezing' : 'melting';
    return { kind: 'missing', missing: [`the heat of ${change} of ${name}`] };
  }
  const rise = enthalpyRise(other.heatCapacity, referenceTemperatureK, temperatureK);
  return {
    kind: 'preheat',
    jPerKg: otherJPerKg + rise - formationEnthalpy.value,
    parts: noParts,
    gasMolPerKg: isGas && molarMass ? 1 / molarMass.value : 0,
    sources: [],
  };
}

const phaseLetters = { solid: 'cr', liquid: 'l', gas: 'g' } as const;

function molPerKg({ molarMass }: Material): number {
  return molarMass ? 1 / molarMass.value : 0;
}
