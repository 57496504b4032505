// Enthalpy, Gibbs energy and log10 K of a written equation at one temperature, from enthalpies and entropies.
// Does not balance and does not check the balance (equation.ts and elements.ts do): an unbalanced equation gets the sum of what
// is written. Invariant: reversing the sides changes every sign. Standard states: ideal gas and pure condensed phases at
// 1 bar. Method: sums over products less reactants; log10 K = -ΔG / (R T ln 10), R of the SI (2019).

import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import type { Substance } from '../substance/substance.ts';
import { formationEnthalpyOf } from './formation-enthalpy.ts';

/** A species with its stoichiometric amount in mol. What is not known is left undefined. */
export interface ReactionTerm {
  readonly name: string;
  readonly coefficient: number;
  readonly molarMassKgPerMol: number | undefined;
  /** J/mol at the temperature asked for, the elements in their reference states at 298.15 K being zero. */
  readonly enthalpyJPerMol: number | undefined;
  /** J/(mol K) at the temperature asked for and 1 bar. */
  readonly entropyJPerMolK: number | undefined;
}

export interface ReactionValues {
  readonly kind: 'reaction';
  /** J for the equation as written; negative when heat is released. */
  readonly enthalpyJ: number;
  /** J per kg of the left side; undefined when the left side weighs nothing. */
  readonly enthalpyJPerKgOfLeft: number | undefined;
  /** J for the equation as written, and log10 K; undefined when an entropy is missing (see `withoutEntropy`). */
  readonly gibbsEnergyJ: number | undefined;
  readonly log10K: number | undefined;
  readonly withoutEntropy: readonly string[];
}

/** No formation enthalpy, or no molar mass to weigh a mole with. */
export interface ReactionFault {
  readonly kind: 'fault';
  readonly reason: 'no-data';
  readonly substances: readonly string[];
}

/** A term of a known substance. */
export function reactionTermOf(substance: Substance, coefficient: number): ReactionTerm {
  const molarMass = substance.molarMassKgPerMol;
  const enthalpy = formationEnthalpyOf(substance);
  return {
    name: substance.name,
    coefficient,
    molarMassKgPerMol: molarMass,
    enthalpyJPerMol:
      enthalpy.kind === 'known' && molarMass !== undefined ? enthalpy.jPerKg.value * molarMass : undefined,
    entropyJPerMolK: substance.entropyJPerMolK?.value,
  };
}

/** Values of `left -> right` at the temperature its terms are given for; a fault says what is missing. */
export function reactionValues(
  left: readonly ReactionTerm[],
  right: readonly ReactionTerm[],
  temperatureK: number = referenceTemperatureK,
): ReactionValues | ReactionFault {
  const signed = [...left.map((term) => ({ ...term, sign: -1 })), ...right.map((term) => ({ ...term, sign: 1 }))];
  let enthalpyJ = 0;
  let entropyJPerK = 0;
  const missing = new Set<string>();
  const withoutEntropy = new Set<string>();
  for (const { name, coefficient, molarMassKgPerMol, enthalpyJPerMol, entropyJPerMolK, sign } of signed) {
    if (molarMassKgPerMol === undefined || enthalpyJPerMol === undefined) missing.add(name);
    else enthalpyJ += sign * coefficient * enthalpyJPerMol;
    if (entropyJPerMolK === undefined) withoutEntropy.add(name);
    else entropyJPerK += sign * coefficient * entropyJPerMolK;
  }
  if (missing.size > 0) return { kind: 'fault', reason: 'no-data', substances: [...missing] };
  const gibbsEnergyJ = withoutEntropy.size > 0 ? undefined : enthalpyJ - temperatureK * entropyJPerK;
  const leftKg = left.reduce((sum, term) => sum + term.coefficient * (term.molarMassKgPerMol ?? 0), 0);
  return {
    kind: 'reaction',
    enthalpyJ,
    enthalpyJPerKgOfLeft: leftKg > 0 ? enthalpyJ / leftKg : undefined,
    gibbsEnergyJ,
    log10K:
      gibbsEnergyJ === undefined ? undefined : -gibbsEnergyJ / (molarGasConstantJPerMolK * temperatureK * Math.LN10),
    withoutEntropy: [...withoutEntropy],
  };
}
