// The phases that may form from a set of elements, laid out for the minimiser: gases first, then condensed phases, each with
// its atoms, its molar mass and its place in one prepared property set.
// Knows no amounts and no state. Invariant: every phase consists of the set's elements only, and none is there twice.
// Data: every phase of the library but those left out of searches.

import { compositionKey } from '../substance/formula.ts';
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
  /** Temperatures between which each phase may be present; infinite where nothing ends it (see `rangeK`). */
  readonly startK: Float64Array;
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
  const ranges = rangesK(phases);
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
    startK: Float64Array.from(ranges, ([startK]) => startK),
    endK: Float64Array.from(ranges, ([, endK]) => endK),
    hasCharge: ions,
    properties: preparePropertySet(phases.map((phase) => phase.curve)),
  };
}

/**
 * Where each phase may be present. A crystal ends at its real end, where the data name one. Beyond the ends of its table a
 * condensed phase gives way to another of its composition that has data there: a crystal's heat capacity carried on far past its
 * melting point would make it stable again. Where no other has data, it is carried on, and the answer says so.
 */
function rangesK(phases: readonly ThermoPhase[]): readonly (readonly [startK: number, endK: number])[] {
  const keys = phases.map(({ formula }) => (formula.phase === 'g' ? '' : compositionKey(formula)));
  const forms = new Map<string, ThermoPhase[]>();
  phases.forEach((phase, index) => {
    const key = keys[index] ?? '';
    const same = forms.get(key);
    if (same === undefined) forms.set(key, [phase]);
    else same.push(phase);
  });
  return phases.map((phase, index) => {
    if (phase.formula.phase === 'g') return [-Infinity, Infinity];
    const [fromK, toK] = phase.validK;
    const others = forms.get(keys[index] ?? '') ?? [];
    return [
      others.some(({ validK }) => validK[0] < fromK && validK[1] >= fromK) ? fromK : -Infinity,
      Math.min(phase.endK, others.some(({ validK }) => validK[1] > toK && validK[0] <= toK) ? toK : Infinity),
    ];
  });
}
