// What a reaction comes to over temperature: the table of its energies and log10 K, and the figure where its Gibbs energy
// changes sign. All of it is worked out when somebody looks, since a species is valued some hundreds of times for it.
// Invariant: nothing is told beyond the data of any species; what the state's own figures say is not changed by it.

import type { Term } from '../../../grammar/tree.ts';
import {
  reactionCrossings,
  reactionPoints,
  type Crossing,
  type ReactionAt,
} from '../../core/balance/reaction-over-temperature.ts';
import { reactionValues, type ReactionTerm, type ReactionValues } from '../../core/balance/reaction.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import type { Formula } from '../../core/substance/formula.ts';
import { lazily } from '../lazily.ts';
import type { Material } from '../material.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Absent, Figure, Table } from '../scenario.ts';
import { valueSpecies } from '../valued-species.ts';
import type { Working } from '../working.ts';

/** A term of the equation. */
export interface SpeciesTerm {
  readonly term: Term;
  readonly coefficient: number;
  readonly material: Material;
  readonly formula: Formula;
}

export interface ReactionSides {
  readonly left: readonly SpeciesTerm[];
  readonly right: readonly SpeciesTerm[];
}

export const equilibriumTemperature = {
  id: 'equilibrium-temperature',
  label: 'Equilibrium temperature (ΔG = 0, K = 1)',
  unit: 'K',
  method: 'equilibrium-temperature',
} as const satisfies FigureRow;

export interface OverTemperature {
  readonly tables: readonly Table[];
  /** The lowest crossing, if there is one. */
  readonly figures: () => readonly Figure[];
  /** Without a crossing, what was missing. */
  readonly absent: () => Absent;
}

/**
 * What an equation comes to over temperature at a pressure in Pa; gases count in their standard state at 1 bar. `missing`
 * is what a Gibbs energy lacks, if it is not known.
 */
export function overTemperature(
  sides: ReactionSides,
  pressurePa: number,
  missing: readonly string[],
  workingAt: (temperatureK: number) => Working,
): OverTemperature {
  const reactionAt = valuesOf(sides, pressurePa);
  let found: { readonly crossings: readonly Crossing[] | undefined } | undefined;
  const crossings = (): readonly Crossing[] | undefined =>
    (found ??= { crossings: reactionCrossings(reactionAt) }).crossings;
  return {
    tables: [overTemperatureTable(reactionAt), crossingsTable(() => crossings() ?? [])],
    figures: () => {
      const lowest = crossings()?.[0];
      if (!lowest) return [];
      const quantity = quantityOf(lowest.temperatureK, knownUnit('K').dimension, undefined, 'temperature');
      const { id, label, unit, method } = equilibriumTemperature;
      const working: Working = { method, inputs: [], sources: [], assumptions: [] };
      const figure: Figure = { id, label, quantity, unit, working };
      return [lazily(figure, { working: () => workingAt(lowest.temperatureK) })];
    },
    absent: () => {
      const found = crossings();
      if (found?.length) return new Map();
      return new Map([[equilibriumTemperature.id, found ? [noCrossing] : missing]]);
    },
  };
}

const noCrossing = 'a change of sign of the Gibbs energy above 25 °C and within the data of all species';

/** The equation's values at a temperature, as long as every species has data there. */
function valuesOf({ left, right }: ReactionSides, pressurePa: number): ReactionAt {
  return (temperatureK) => {
    let isWithin = true;
    const termOf = ({ term, coefficient, material, formula }: SpeciesTerm): ReactionTerm => {
      const species = valueSpecies(material, formula, term.species.phase !== undefined, temperatureK, pressurePa);
      isWithin &&= species.enthalpy !== null && species.beyond === null;
      return {
        name: material.name,
        coefficient,
        molarMassKgPerMol: material.molarMass?.value,
        enthalpyJPerMol: species.enthalpy?.value,
        entropyJPerMolK: species.entropy?.value,
      };
    };
    const [leftTerms, rightTerms] = [left.map(termOf), right.map(termOf)];
    if (!isWithin) return undefined;
    const values = reactionValues(leftTerms, rightTerms, temperatureK);
    return values.kind === 'reaction' ? values : undefined;
  };
}

function overTemperatureTable(reactionAt: ReactionAt): Table {
  const kilo = (joule: number | undefined): number | null => (joule === undefined ? null : joule / 1000);
  const row = (temperatureK: number, { enthalpyJ, gibbsEnergyJ, log10K }: ReactionValues) => [
    temperatureK,
    kilo(enthalpyJ),
    kilo(gibbsEnergyJ),
    log10K ?? null,
  ];
  const table: Table = {
    id: 'over-temperature',
    label: 'Over temperature, per equation as written',
    columns: [
      { id: 'temperature', label: 'Temperature', unit: 'K' },
      { id: 'enthalpy', label: 'Enthalpy', unit: 'kJ' },
      { id: 'gibbs-energy', label: 'Gibbs energy', unit: 'kJ' },
      { id: 'log10-k', label: 'log10 K', unit: '1' },
    ],
    rows: [],
  };
  return lazily(table, {
    rows: () => reactionPoints(reactionAt).map(({ temperatureK, values }) => row(temperatureK, values)),
  });
}

/** The figure tells the lowest crossing; this, where there are several, all, and which side each favours above. */
function crossingsTable(crossings: () => readonly Crossing[]): Table {
  const table: Table = {
    id: 'equilibrium-temperatures',
    label: 'Where the Gibbs energy changes sign',
    columns: [
      { id: 'favoured-above', label: 'Favoured above', unit: null },
      { id: 'equilibrium-temperature', label: 'Temperature', unit: 'K' },
    ],
    rows: [],
  };
  return lazily(table, {
    rows: () => {
      const found = crossings();
      return found.length < 2 ? [] : found.map(({ temperatureK, favours }) => [`${favours} side`, temperatureK]);
    },
  });
}
