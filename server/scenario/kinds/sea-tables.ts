// The tables of a sea: its species, the constants at its place, what each form of alkali comes to, and where the uncertainty of
// the leading figures comes from (by the slopes in closed form). Works out nothing that core does not.
// Invariant: the rows of the budget add up in squares to the uncertainty of the figures, to first order.

import { slopesByPair, uncertainConstants, type PairSlopes, type SlopeOf } from '../../core/account/sea/buffering.ts';
import type { CarbonateState } from '../../core/account/sea/carbonate-state.ts';
import { constantUncertainty } from '../../core/account/sea/constants-uncertainty.ts';
import { deliveredForms, formBrings, uptakePerMole } from '../../core/account/sea/delivery.ts';
import { standardUncertainty, type Quantity } from '../../core/quantity/quantity.ts';
import type { Table } from '../scenario.ts';
import { seaEntries } from './sea-entries.ts';
import { solveSea, type CarbonateEntry, type SeaKey, type SeaQuestion, type SolvedSea } from './sea-question.ts';

/** All tables that can be had. */
export function seaTables(question: SeaQuestion, sea: SolvedSea): readonly Table[] {
  const { state } = sea;
  const { known } = question;
  return [
    ...(state ? [speciesTable(state), uptakeTable(state)] : []),
    constantsTable(sea),
    ...(state && known ? [budgetTable(question, sea, state, known)] : []),
  ];
}

const micro = 1e6;

function speciesTable(state: CarbonateState): Table {
  const { others, medium } = state;
  const { ions } = medium.constants;
  const rows: readonly (readonly [string, number])[] = [
    ['CO2(aq)', state.carbonDioxide],
    ['HCO3-(aq)', state.hydrogenCarbonate],
    ['CO3--(aq)', state.carbonate],
    ['B(OH)3(aq)', ions.boron - others.borate],
    ['B(OH)4-(aq)', others.borate],
    ['OH-(aq)', others.hydroxide],
    ['H+(aq)', others.freeHydrogen],
    ['HSO4-(aq)', others.hydrogenSulphate],
    ['SO4--(aq)', ions.sulphate - others.hydrogenSulphate],
    ['HF(aq)', others.hydrogenFluoride],
    ['F-(aq)', ions.fluoride - others.hydrogenFluoride],
    ['Ca++(aq)', ions.calcium],
    ['Mg++(aq)', ions.magnesium],
  ];
  return {
    id: 'species',
    label: 'Species, ion pairs counted with their ions',
    columns: [
      { id: 'substance', label: 'Species', unit: null },
      { id: 'amount', label: 'per kg of sea water', unit: 'umol/kg' },
    ],
    rows: rows.map(([name, molPerKg]) => [name, molPerKg * micro]),
  };
}

function uptakeTable(state: CarbonateState): Table {
  return {
    id: 'uptake',
    label: 'Response to what is added, at equilibrium with the air, per mole',
    columns: [
      { id: 'delivered', label: 'Delivered', unit: null },
      { id: 'alkalinity', label: 'alkalinity', unit: 'mol/mol' },
      { id: 'response', label: 'carbon held at equilibrium', unit: 'mol/mol' },
      { id: 'carbon', label: 'carbon delivered', unit: 'mol/mol' },
      { id: 'uptake', label: 'CO2 taken up', unit: 'mol/mol' },
    ],
    rows: deliveredForms.map((form) => {
      const { alkalinity, carbon } = formBrings[form];
      const uptake = uptakePerMole(state, form);
      return [form, alkalinity, uptake + carbon, carbon, uptake];
    }),
  };
}

const constantNames = {
  carbonDioxide: 'K0, solubility of CO2',
  carbonic1: 'K1, carbonic acid',
  carbonic2: 'K2, hydrogen carbonate',
  boric: 'KB, boric acid',
  water: 'KW, water',
  boron: 'total boron',
  calcite: 'Ksp, calcite',
  aragonite: 'Ksp, aragonite',
} as const;

function constantsTable({ constants }: SolvedSea): Table {
  const uncertain = uncertainConstants.flatMap((constant) =>
    constant === 'boron'
      ? []
      : [[constantNames[constant], constants[constant], constantUncertainty[constant] / Math.LN10] as const],
  );
  const others = [
    ['KS, hydrogen sulphate (free scale)', constants.hydrogenSulphateFree, null],
    ['KF, hydrogen fluoride (free scale)', constants.hydrogenFluorideFree, null],
    ['KP1, phosphoric acid', constants.phosphoric1, null],
    ['KP2, phosphoric acid', constants.phosphoric2, null],
    ['KP3, phosphoric acid', constants.phosphoric3, null],
    ['KSi, silicic acid', constants.silicic, null],
  ] as const;
  return {
    id: 'constants',
    label: 'Constants in situ, total scale, per kg of sea water: pK = -log10 K',
    columns: [
      { id: 'constant', label: 'Constant', unit: null },
      { id: 'pk', label: 'pK', unit: '1' },
      { id: 'uncertainty', label: '±', unit: '1' },
    ],
    rows: [...uncertain, ...others].map(([name, value, uncertainty]) => [name, -Math.log10(value), uncertainty]),
  };
}

/** What the budget tells of: the number itself, its slope, and what turns that into the column's unit. */
const budgetColumns: readonly {
  readonly of: SlopeOf;
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  readonly value: (state: CarbonateState) => number;
  readonly scale: (state: CarbonateState) => number;
}[] = [
  { of: 'ph', id: 'ph-total-scale', label: 'pH', unit: '1', value: ({ ph }) => ph, scale: () => 1 },
  {
    of: 'total-alkalinity',
    id: 'total-alkalinity',
    label: 'alkalinity',
    unit: 'umol/kg',
    value: ({ totalAlkalinity }) => totalAlkalinity * micro,
    scale: () => micro,
  },
  {
    of: 'dissolved-carbon',
    id: 'dissolved-inorganic-carbon',
    label: 'dissolved carbon',
    unit: 'umol/kg',
    value: ({ dissolvedCarbon }) => dissolvedCarbon * micro,
    scale: () => micro,
  },
  {
    of: 'ln-fugacity',
    id: 'carbon-dioxide-fugacity',
    label: 'fugacity of CO2',
    unit: 'uatm',
    value: ({ fugacityAtm }) => fugacityAtm * micro,
    scale: ({ fugacityAtm }) => fugacityAtm * micro,
  },
  {
    of: 'ln-aragonite-saturation',
    id: 'aragonite-saturation',
    label: 'Ω aragonite',
    unit: '1',
    value: ({ aragoniteSaturation }) => aragoniteSaturation,
    scale: ({ aragoniteSaturation }) => aragoniteSaturation,
  },
];

function budgetTable(
  question: SeaQuestion,
  sea: SolvedSea,
  state: CarbonateState,
  [first, second]: readonly [CarbonateEntry, CarbonateEntry],
): Table {
  const { inputs } = question;
  const slopes = budgetColumns.map(({ of }) => slopesByPair(state, first.variable, second.variable, of));
  const bySlope = (name: string, changeOf: (slopes: PairSlopes) => number): BudgetRow => ({
    name,
    changes: budgetColumns.map(({ scale }, index) => {
      const column = slopes[index];
      return column ? changeOf(column) * scale(state) : NaN;
    }),
  });
  const measured = (['first', 'second'] as const).flatMap((key) => {
    const entry = key === 'first' ? first : second;
    const quantity = inputs.get(key);
    const step = quantity ? stepOf(entry, quantity, sea) : 0;
    if (step === 0) return [];
    const name = seaEntries[entry.key].name;
    return [bySlope(name, ({ byFirst, bySecond }) => (key === 'first' ? byFirst : bySecond) * step)];
  });
  // A fugacity is turned into dissolved gas by K0 before anything else.
  const gasOf = (entry: CarbonateEntry): number => (entry.variable === 'carbon-dioxide' ? state.carbonDioxide : 0);
  const constants = uncertainConstants.map((constant) =>
    bySlope(constantNames[constant], ({ byFirst, bySecond, byConstant }) => {
      const throughGas = constant === 'carbonDioxide' ? byFirst * gasOf(first) + bySecond * gasOf(second) : 0;
      return (byConstant[constant] + throughGas) * constantUncertainty[constant];
    }),
  );
  const rows = [...measured, ...waterRows(question), ...constants];
  const largest = budgetColumns.map((_, index) =>
    Math.max(...rows.map(({ changes }) => Math.abs(changes[index] ?? 0))),
  );
  return {
    id: 'uncertainty-budget',
    label: 'Uncertainty budget: change made by one standard uncertainty of each input',
    columns: [
      { id: 'input', label: 'Input', unit: null },
      ...budgetColumns.map(({ id, label, unit }) => ({ id, label, unit })),
    ],
    rows: rows
      .map(({ name, changes }) => ({
        name,
        // What is held leaves a rounding error where it makes no change.
        told: changes.map((change, index) => (Math.abs(change) > 1e-9 * (largest[index] ?? 0) ? change : 0)),
      }))
      .filter(({ told }) => told.some((change) => change !== 0))
      .map(({ name, told }) => [name, ...told]),
  };
}

interface BudgetRow {
  readonly name: string;
  /** In the units of the columns. */
  readonly changes: readonly number[];
}

const waterInputs = [
  ['salinity', seaEntries.practicalSalinity.name],
  ['temperature', seaEntries.temperature.name],
  ['depth', seaEntries.depth.name],
  ['phosphate', seaEntries.phosphate.name],
  ['silicate', seaEntries.silicate.name],
] as const satisfies readonly (readonly [SeaKey, string])[];

/** What the medium rests on goes through every constant, and is moved as a whole. */
function waterRows(question: SeaQuestion): readonly BudgetRow[] {
  return waterInputs.flatMap(([key, name]) => {
    const quantity = question.inputs.get(key);
    const uncertainty = quantity ? standardUncertainty(quantity) : 0;
    if (!quantity || uncertainty === 0) return [];
    const at = (value: number): readonly number[] => {
      const { state } = solveSea(question, (asked) => (asked === key ? value : question.inputs.get(asked)?.value));
      return budgetColumns.map(({ value: of }) => (state ? of(state) : NaN));
    };
    const [above, below] = [at(quantity.value + uncertainty), at(quantity.value - uncertainty)];
    return [{ name, changes: above.map((value, index) => (value - (below[index] ?? NaN)) / 2) }];
  });
}

/** mol/kg that the entry's own uncertainty moves its variable by. */
function stepOf(entry: CarbonateEntry, quantity: Quantity, { constants, water }: SolvedSea): number {
  const uncertainty = standardUncertainty(quantity);
  if (uncertainty === 0) return 0;
  const at = (value: number): number => entry.molPerKg(value, constants, water);
  return (at(quantity.value + uncertainty) - at(quantity.value - uncertainty)) / 2;
}
