// Fuels and oxidants of the catalogue as a burn takes them, at 25 °C or warmer, for tests of burns.

import { formationEnthalpyOf } from '../../../../server/core/balance/formation-enthalpy.ts';
import type { Burn, BurnInput, BurnState, BurnStateOrNone, BurnStream } from '../../../../server/core/burn/burn.ts';
import { prepareBurn } from '../../../../server/core/burn/prepare-burn.ts';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { parseFormula, type Formula } from '../../../../server/core/substance/formula.ts';
import { phasesOfFormula, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';

/** A catalogue substance at 25 °C. */
export function stream(name: string): BurnStream {
  const substance = findSubstance(name);
  const enthalpy = substance && formationEnthalpyOf(substance);
  if (substance === undefined || enthalpy?.kind !== 'known') throw new Error(name);
  return {
    elementMolPerKg: substance.molPerKg,
    enthalpyJPerKg: enthalpy.jPerKg.value,
    referenceEnthalpyJPerKg: enthalpy.jPerKg.value,
    temperatureK: 298.15,
    gasMolPerKg: substance.phase === 'g' ? 1 / (substance.molarMassKgPerMol ?? Number.NaN) : 0,
  };
}

/** Streams mixed by mass; the shares add up to 1. */
export function mixed(...parts: readonly (readonly [share: number, stream: BurnStream])[]): BurnStream {
  const elements = new Map<string, number>();
  for (const [share, part] of parts) {
    for (const [symbol, mol] of part.elementMolPerKg) elements.set(symbol, (elements.get(symbol) ?? 0) + share * mol);
  }
  const sum = (of: (part: BurnStream) => number): number =>
    parts.reduce((total, [share, part]) => total + share * of(part), 0);
  return {
    elementMolPerKg: elements,
    enthalpyJPerKg: sum((part) => part.enthalpyJPerKg ?? Number.NaN),
    referenceEnthalpyJPerKg: sum((part) => part.referenceEnthalpyJPerKg ?? Number.NaN),
    temperatureK: 298.15,
    gasMolPerKg: sum((part) => part.gasMolPerKg),
  };
}

/** Oxygen and nitrogen, 21 to 79 by volume, at a temperature in K. */
export function plainAir(temperatureK = 298.15): BurnStream {
  const kgPerMol = 0.21 * 0.031998 + 0.79 * 0.028014;
  const enthalpy = (0.21 * gasEnthalpy('O2', temperatureK) + 0.79 * gasEnthalpy('N2', temperatureK)) / kgPerMol;
  return {
    elementMolPerKg: new Map([
      ['O', 0.42 / kgPerMol],
      ['N', 1.58 / kgPerMol],
    ]),
    enthalpyJPerKg: enthalpy,
    referenceEnthalpyJPerKg: 0,
    temperatureK,
    gasMolPerKg: 1 / kgPerMol,
  };
}

function gasEnthalpy(text: string, temperatureK: number): number {
  const formula = parseFormula(text, 'g');
  const phase = formula.kind === 'formula' ? phasesOfFormula(formula)[0] : undefined;
  return (phase && propertiesOfPhase(phase, temperatureK)?.enthalpyJPerMol) ?? Number.NaN;
}

/** A formula without a phase, unless one is written. */
export function formulaOf(text: string): Formula {
  const formula = parseFormula(text);
  if (formula.kind !== 'formula') throw new Error(text);
  return formula;
}

/** A burn of a fuel in plain air at 1 bar and λ = 1, adiabatic, with what is given changed. */
export function burn(fuel: BurnStream, more: Partial<BurnInput> = {}): Burn {
  const prepared = prepareBurn({
    fuel,
    oxidant: plainAir(),
    amount: { by: 'lambda', lambda: 1 },
    held: { held: 'pressure', pressurePa: 1e5 },
    heat: { heat: 'adiabatic', lossShare: 0 },
    lowerHeatingValueJPerKg: null,
    cooledToK: [],
    ...more,
  });
  if (prepared.kind === 'fault') throw new Error(prepared.reason);
  return prepared;
}

export function solved<State extends BurnStateOrNone>(state: State | null): Extract<State, BurnState> {
  if (state === null || state.kind === 'none') throw new Error(JSON.stringify(state));
  return state as Extract<State, BurnState>;
}

/** Largest relative gap between a state's atoms and those of its charge. */
export function atomGap(state: BurnState, elements: readonly string[], elementMol: Float64Array): number {
  const { candidates, amountsMol } = state;
  return Math.max(
    ...elements.map((symbol, index) => {
      const column = candidates.elements.indexOf(symbol);
      let found = 0;
      amountsMol.forEach((mol, phase) => {
        found += mol * (candidates.atoms[phase * candidates.elements.length + column] ?? 0);
      });
      const asked = elementMol[index] ?? 0;
      return Math.abs(found - asked) / asked;
    }),
  );
}
