// What a fuel is as a gas in the charge that an engine compresses: its molecules by the tables, or its vapour by the heat
// capacity that the catalogue has of it. Joins materials to core/engine's mixtures.
// Knows no engine. Invariant: per kilogram of fuel; what is missing is named in words, and nothing is guessed.

import { gasByHeatCapacity } from '../core/engine/gas-by-heat-capacity.ts';
import type { MixturePart } from '../core/engine/frozen-mixture.ts';
import { heatCapacityAt } from '../core/substance/at-temperature.ts';
import { findSubstance, phasesOfSubstance } from '../core/substance/catalogue.ts';
import { molarMassKgPerMol, parseFormula } from '../core/substance/formula.ts';
import { phaseOfId, phasesOfFormula } from '../core/substance/phases.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { Material } from './material.ts';
import { withoutPhase } from './valued-species.ts';

export type FuelVapour =
  | { readonly kind: 'vapour'; readonly parts: readonly MixturePart[] }
  | { readonly kind: 'missing'; readonly missing: readonly string[] };

/** Of 1 kg. */
export function vapourOf(fuel: Material): FuelVapour {
  if (fuel.portions) {
    const parts: MixturePart[] = [];
    const missing: string[] = [];
    for (const { material, mass } of fuel.portions) {
      const own = vapourOf(material);
      if (own.kind === 'missing') missing.push(...own.missing);
      else parts.push(...own.parts.map(({ species, mol }) => ({ species, mol: mol * mass.value })));
    }
    return missing.length > 0 ? { kind: 'missing', missing: [...new Set(missing)] } : { kind: 'vapour', parts };
  }
  return byTables(fuel) ?? bySpecies(fuel) ?? byHeatCapacity(fuel);
}

/** J/mol that a name's isomer may differ by and still be taken for it. */
const sameSubstanceJPerMol = 3000;

/** A gas of the tables with the fuel's formula, and with its energy where the fuel is that gas itself. */
function byTables({ formula, molarMass, phase, formationEnthalpy }: Material): FuelVapour | null {
  if (!formula || !molarMass) return null;
  const gases = phasesOfFormula({ ...withoutPhase(formula), phase: 'g' });
  const enthalpyJPerMol = phase === 'g' && formationEnthalpy ? formationEnthalpy.value * molarMass.value : null;
  const species = gases.find(
    ({ formationEnthalpyJPerMol: own }) =>
      enthalpyJPerMol === null || (own !== undefined && Math.abs(own - enthalpyJPerMol) < sameSubstanceJPerMol),
  );
  return species ? { kind: 'vapour', parts: [{ species, mol: 1 / molarMass.value }] } : null;
}

function bySpecies({ species, molarMass, phase }: Material): FuelVapour | null {
  if (!species || phase !== 'g' || !molarMass) return null;
  const parts: MixturePart[] = [];
  for (const [id, share] of species) {
    const found = phaseOfId(id);
    if (!found) return null;
    parts.push({ species: found, mol: share / molarMass.value });
  }
  return { kind: 'vapour', parts };
}

/** The catalogue's gas of the name, whose energy and heat capacity are there. */
function byHeatCapacity({ name, origin, molarMass, elements }: Material): FuelVapour {
  const substance = origin === 'catalogue' ? findSubstance(name) : undefined;
  const gas = substance && phasesOfSubstance(substance.name).find(({ phase }) => phase === 'g');
  const kgPerMol = gas?.molarMassKgPerMol ?? molarMass?.value;
  const heatCapacity = gas?.heatCapacity;
  if (!gas || !heatCapacity || gas.energy.kind !== 'formation-enthalpy' || kgPerMol === undefined) {
    return { kind: 'missing', missing: [`the energy and the heat capacity of the vapour of ${name}`] };
  }
  const at = (temperatureK: number): number => heatCapacityAt(heatCapacity, temperatureK).jPerKgK;
  const { fromK, toK } = heatCapacity;
  const hotK = Math.min(toK, lineToK);
  const [cold, hot] = [at(referenceTemperatureK), at(hotK)];
  const riseJPerKgK2 = hotK > referenceTemperatureK + 1 ? (hot - cold) / (hotK - referenceTemperatureK) : 0;
  const species = gasByHeatCapacity({
    id: `vapour of ${name}`,
    composition: new Map([...elements].map(([symbol, mol]) => [symbol, mol.value * kgPerMol])),
    molarMassKgPerMol: kgPerMol,
    enthalpyJPerMol: gas.energy.jPerKg.value * kgPerMol,
    heatCapacityJPerMolK: cold * kgPerMol,
    heatCapacityRiseJPerMolK2: riseJPerKgK2 * kgPerMol,
    validK: [fromK, toK],
  });
  return { kind: 'vapour', parts: [{ species, mol: 1 / kgPerMol }] };
}

/** The line of heat capacity is laid between 25 °C and about the end of compression. */
const lineToK = 700;

/** kg/mol of a species by its formula with phase; undefined where it is none. */
export function kgPerMolOf(id: string): number | undefined {
  const formula = parseFormula(id);
  return formula.kind === 'formula' ? molarMassKgPerMol(formula) : undefined;
}
