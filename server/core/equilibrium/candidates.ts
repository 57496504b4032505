// The phases that may form from a set of elements, laid out for the minimiser: gases first, then condensed phases, each with
// its atoms, its molar mass and its place in one prepared property set.
// Knows no amounts and no state. Invariant: every phase consists of the set's elements only, and none is there twice.
// Data: every phase of the library but those left out of searches.

import { candidatePhases } from '../substance/phases.ts';
import type { ThermoPhase } from '../substance/phases.ts';
import { preparePropertySet } from '../substance/property-set.ts';
import type { PropertySet } from '../substance/property-set.ts';

export interface CandidateSet {
  /** Symbols in the order given; `charge` stands last where ions are included. */
  readonly elements: readonly string[];
  /** Gases first. */
  readonly phases: readonly ThermoPhase[];
  readonly gasCount: number;
  /** Atoms: `atoms[phase * elements.length + element]`; in the column of the charge, elementary charges. */
  readonly atoms: Float64Array;
  /** Atoms of all elements in one formula unit; 1 for the electron. */
  readonly atomCount: Float64Array;
  readonly molarMassKgPerMol: Float64Array;
  /** Ends of each condensed phase: outside them it may not be present (the real end of a crystal); infinite where none. */
  readonly endK: Float64Array;
  /** The last row is the charge. */
  readonly hasCharge: boolean;
  readonly properties: PropertySet;
}

export interface CandidateOptions {
  /** Gas ions and the electron, the whole staying neutral. */
  readonly ions?: boolean;
  /** False keeps a phase out. */
  readonly admits?: (phase: ThermoPhase) => boolean;
}

/** The name of the row that keeps the whole neutral. */
export const charge = 'charge';

/** All phases over the elements given (symbols, each once). */
export function candidateSet(elements: readonly string[], options: CandidateOptions = {}): CandidateSet {
  const { ions = false, admits = () => true } = options;
  const known = new Set(elements);
  const found = candidatePhases().filter(
    (phase) =>
      (ions || phase.formula.charge === 0) &&
      [...phase.formula.composition.keys()].every((symbol) => known.has(symbol)) &&
      admits(phase),
  );
  const gases = found.filter((phase) => phase.formula.phase === 'g');
  const phases = [...gases, ...found.filter((phase) => phase.formula.phase !== 'g')];
  const rows = ions ? [...elements, charge] : [...elements];
  const atoms = new Float64Array(phases.length * rows.length);
  phases.forEach(({ formula }, index) => {
    rows.forEach((row, column) => {
      atoms[index * rows.length + column] = row === charge ? formula.charge : (formula.composition.get(row) ?? 0);
    });
  });
  return {
    elements: rows,
    phases,
    gasCount: gases.length,
    atoms,
    atomCount: Float64Array.from(phases, ({ formula }) => {
      let count = 0;
      for (const atomsOfOne of formula.composition.values()) count += atomsOfOne;
      return count || 1;
    }),
    molarMassKgPerMol: Float64Array.from(phases, (phase) => phase.molarMassKgPerMol),
    endK: Float64Array.from(phases, (phase) => phase.endK),
    hasCharge: ions,
    properties: preparePropertySet(phases.map((phase) => phase.curve)),
  };
}
