// Enthalpy, Gibbs energy and log10 K of a written equation at 298.15 K, from formation enthalpies and entropies.
// Does not balance and does not check the balance (equation.ts and elements.ts do): an unbalanced equation gets the sum of what
// is written. Invariant: reversing the sides changes every sign. Standard states: ideal gas and pure condensed phases at
// 1 bar. Method: sums over products less reactants; log10 K = -ΔG / (R T ln 10), R of the SI (2019).

import { referenceTemperatureK } from '../substance/substance.ts';
import type { Substance } from '../substance/substance.ts';
import type { SourceRecord } from '../substance/record.ts';
import { formationEnthalpyOf } from './formation-enthalpy.ts';

/** A species with its stoichiometric amount in mol. */
export interface ReactionTerm {
  readonly coefficient: number;
  readonly substance: Substance;
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
  readonly sources: readonly SourceRecord[];
}

export type ReactionFault =
  /** Property functions over temperature are not there; only 298.15 K can be answered. */
  | { readonly kind: 'fault'; readonly reason: 'temperature-not-available'; readonly temperatureK: number }
  /** No formation enthalpy, or no molar mass to count a mole with. */
  | { readonly kind: 'fault'; readonly reason: 'no-data'; readonly substances: readonly string[] };

/** Values of `left -> right` at a temperature, 298.15 K within 0.005 K; a fault says what is missing. */
export function reactionValues(
  left: readonly ReactionTerm[],
  right: readonly ReactionTerm[],
  temperatureK: number = referenceTemperatureK,
): ReactionValues | ReactionFault {
  if (!(Math.abs(temperatureK - referenceTemperatureK) < 0.005)) {
    return { kind: 'fault', reason: 'temperature-not-available', temperatureK };
  }
  const signed = [...left.map((term) => ({ ...term, sign: -1 })), ...right.map((term) => ({ ...term, sign: 1 }))];
  let enthalpyJ = 0;
  let entropyJPerK = 0;
  const sources = new Set<SourceRecord>();
  const missing: string[] = [];
  const withoutEntropy: string[] = [];
  for (const { coefficient, substance, sign } of signed) {
    const molarMass = substance.molarMassKgPerMol;
    const enthalpy = formationEnthalpyOf(substance);
    if (molarMass === undefined || enthalpy.kind === 'fault') {
      missing.push(substance.name);
      continue;
    }
    enthalpyJ += sign * coefficient * enthalpy.jPerKg.value * molarMass;
    sources.add(enthalpy.jPerKg.source);
    if (substance.entropyJPerMolK === undefined) withoutEntropy.push(substance.name);
    else {
      entropyJPerK += sign * coefficient * substance.entropyJPerMolK.value;
      sources.add(substance.entropyJPerMolK.source);
    }
  }
  if (missing.length > 0) return { kind: 'fault', reason: 'no-data', substances: [...new Set(missing)] };
  const gibbsEnergyJ = withoutEntropy.length > 0 ? undefined : enthalpyJ - referenceTemperatureK * entropyJPerK;
  const leftKg = left.reduce((sum, term) => sum + term.coefficient * (term.substance.molarMassKgPerMol ?? 0), 0);
  return {
    kind: 'reaction',
    enthalpyJ,
    enthalpyJPerKgOfLeft: leftKg > 0 ? enthalpyJ / leftKg : undefined,
    gibbsEnergyJ,
    log10K:
      gibbsEnergyJ === undefined
        ? undefined
        : -gibbsEnergyJ / (gasConstantJPerMolK * referenceTemperatureK * Math.LN10),
    withoutEntropy: [...new Set(withoutEntropy)],
    sources: [...sources],
  };
}

const gasConstantJPerMolK = 8.31446261815324;
