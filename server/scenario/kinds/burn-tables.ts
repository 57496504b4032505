// The tables of a burn: products of the flame, of its zone and of each cooled state, where the carbon and the alkali went,
// what condenses when, the state at each temperature, and the certificate of the flame. Each is worked out when somebody
// reads its rows: no cooled state and no path is solved before. Knows no wording but labels.
// Invariant: column ids and units are the contract; a number that could not be had is null.

import type { Burn, BurnStateOrNone, MatterState } from '../../core/burn/burn.ts';
import { heatGivenOff } from '../../core/burn/burn-held.ts';
import { alkaliFates, carbonFate, carbonFormOf, shareOfForm, type Fate } from '../../core/burn/fates.ts';
import { gasOfState } from '../../core/burn/gas-of-state.ts';
import { carbonAgainstFreezing } from '../../core/burn/path-readings.ts';
import { productRows } from '../../core/burn/products.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { alkaliMetals } from '../../core/substance/elements.ts';
import type { Formula } from '../../core/substance/formula.ts';
import { lazily } from '../lazily.ts';
import { depositOf } from './burn-deposits.ts';
import type { Column, Table } from '../scenario.ts';

type Row = Table['rows'][number];
type Read<T> = () => T;

/** Products below this share by mass stand among the traces, unless they are condensed. */
const leastMassShare = 1e-6;

/** All tables a burn has; `flame` is its solved flame. */
export function burnTables(burn: Burn, flame: Equilibrium): readonly Table[] {
  const zone = burn.zoneCharge ? burn.zone() : null;
  return [
    productsTable(flame),
    ...(zone?.kind === 'equilibrium' ? [zoneTable(zone)] : []),
    statesTable(burn),
    cooledProductsTable(burn),
    fateTable('carbon-fate', 'Where the carbon is', burn, flame, (state) => [carbonFate(state)]),
    fateTable('alkali-fate', 'Where the alkali is', burn, flame, alkaliFates),
    condensationTable(burn),
    freezingTable(burn),
    balanceTable(burn, flame),
    certificateTable(flame),
  ];
}

const substance: Column = { id: 'substance', label: 'Product', unit: null };
const temperature: Column = { id: 'temperature', label: 'Temperature', unit: 'K' };
const productColumns: readonly Column[] = [
  { id: 'amount', label: 'Amount', unit: 'mol/kg' },
  { id: 'mass-share', label: 'by mass', unit: '1' },
  { id: 'wet-mole-share', label: 'by mole, wet gas', unit: '1' },
  { id: 'dry-mole-share', label: 'by mole, dry gas', unit: '1' },
];
const remark: Column = { id: 'remark', label: 'Remark', unit: null };

function productsTable(flame: Equilibrium): Table {
  return lazyTable(
    { id: 'products', label: 'Products in the flame, per kg of fuel', columns: [substance, ...productColumns, remark] },
    () => productCells(flame, isShown),
    () => productCells(flame, (row) => !isShown(row)),
  );
}

function zoneTable(zone: Equilibrium): Table {
  const columns = [
    substance,
    ...productColumns.map((column) => ({ ...column, id: `flame-zone-${column.id}` })),
    remark,
  ];
  return lazyTable(
    { id: 'flame-zone-products', label: 'Products in the flame zone, per kg of fuel', columns },
    () => productCells(zone, isShown),
    () => productCells(zone, (row) => !isShown(row)),
  );
}

function cooledProductsTable(burn: Burn): Table {
  const columns = [substance, temperature, ...productColumns, remark];
  const rows = (admits: (row: ProductCell) => boolean): Row[] =>
    burn.cooled.flatMap((cooled) => {
      const solved = cooled.state();
      if (solved.kind === 'none') return [];
      return productCells(solved, admits).map(([name = null, ...cells]) => [name, cooled.temperatureK, ...cells]);
    });
  return lazyTable(
    { id: 'cooled-products', label: 'Products as they cool, per kg of fuel', columns },
    () => rows(isShown),
    () => rows((row) => !isShown(row)),
  );
}

interface ProductCell {
  readonly isGas: boolean;
  readonly mol: number;
  readonly massShare: number;
}

function isShown({ isGas, mol, massShare }: ProductCell): boolean {
  return massShare >= leastMassShare || (!isGas && mol > 0);
}

/** Every candidate has its cells, one that is not there with nothing: who asks for its share is told 0. */
function productCells(state: MatterState, admits: (row: ProductCell) => boolean): Row[] {
  const present = productRows(state);
  const known = new Set(present.map(({ phase }) => phase));
  const absent = state.candidates.phases.flatMap(({ id }, phase) => {
    const isGas = phase < state.candidates.gasCount;
    const share = isGas && state.gasMol > 0 ? 0 : null;
    return known.has(phase)
      ? []
      : [{ phase, id, isGas, mol: 0, massShare: 0, wetMoleShare: share, dryMoleShare: share }];
  });
  return [...present, ...absent].filter(admits).map((row) => {
    const formula = state.candidates.phases[row.phase]?.formula;
    const slow = formula && isSlow(formula) ? 'limit, not forecast' : null;
    return [row.id, row.mol, row.massShare, row.wetMoleShare, row.dryMoleShare, slow];
  });
}

/** Hydrogen carbonates, double carbonates with water and hydrates form over hours and in moisture, if at all. */
export function isSlow({ composition, phase, text }: Formula): boolean {
  if (phase === 'g' || phase === 'l') return false;
  const has = (symbol: string): boolean => composition.has(symbol);
  const isHydrate = /[.·]\d*\.?\d*H2O/.test(text);
  return isHydrate || (has('H') && has('C') && (composition.get('O') ?? 0) >= 3 && composition.size >= 4);
}

/** One row a cooled state: what `condensed share of … at 350 degC` reads. */
function statesTable(burn: Burn): Table {
  const columns: readonly Column[] = [
    temperature,
    { id: 'condensed-share', label: 'Condensed, by mass', unit: '1' },
    { id: 'gas-molar-mass', label: 'Gas, molar mass', unit: 'g/mol' },
    { id: 'carbonate-carbon-share', label: 'Carbon in carbonate', unit: '1' },
    { id: 'heat-above', label: 'Heat released above', unit: 'MJ/kg' },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'first-melting', label: 'Deposit melts from', unit: 'K' },
    { id: 'sticky-point', label: 'sticks from', unit: 'K' },
    { id: 'flow-point', label: 'runs from', unit: 'K' },
    { id: 'composition', label: 'Composition', unit: null },
  ];
  const row = (state: BurnStateOrNone, temperatureK: number): Row => {
    if (state.kind === 'none') {
      const why = state.reason === 'outside-tables' ? 'beyond all data' : 'not found';
      return [temperatureK, null, null, null, null, null, null, null, null, why];
    }
    const heatJ = heatGivenOff(burn.input, burn.charge, state);
    const deposit = depositOf(state);
    return [
      temperatureK,
      state.condensedMassShare,
      inGrams(gasOfState(state)?.molarMassKgPerMol),
      carbonateShare(state),
      heatJ === null ? null : heatJ / 1e6,
      state.gasMol > 0 ? state.pressurePa / 1e5 : null,
      deposit?.firstMeltingK ?? null,
      deposit?.stickyK ?? null,
      deposit?.flowingK ?? null,
      state.kind === 'frozen' ? 'frozen' : 'equilibrium',
    ];
  };
  return lazyTable({ id: 'cooled-states', label: 'States as it cools, per kg of fuel', columns }, () =>
    burn.cooled.map((cooled) => row(cooled.state(), cooled.temperatureK)),
  );
}

/** Share of the carbon that is in carbonate, in any phase; null where there is no carbon or no carbonate could form. */
export function carbonateShare(state: MatterState): number | null {
  const fate = state.candidates.phases.some(({ formula }) => carbonFormOf(formula) === 'carbonate')
    ? carbonFate(state)
    : undefined;
  return fate ? shareOfForm(fate, 'carbonate') : null;
}

/** Where an element went: one row a form that holds any of it in some state, one column a state. */
function fateTable<Form extends string>(
  id: string,
  label: string,
  burn: Burn,
  flame: Equilibrium,
  fatesOf: (state: MatterState) => readonly (Fate<Form> | undefined)[],
): Table {
  const columns: readonly Column[] = [
    { id: 'form', label: 'Form', unit: null },
    temperature,
    { id: 'element', label: 'Element', unit: null },
    { id: 'gas-share', label: 'in gas', unit: '1' },
    { id: 'condensed-share', label: 'condensed', unit: '1' },
  ];
  const rowsOf = (state: BurnStateOrNone): Row[] => {
    if (state.kind === 'none') return [];
    return fatesOf(state).flatMap((fate) =>
      (fate?.rows ?? [])
        .filter(({ gasShare, condensedShare }) => gasShare + condensedShare >= leastMassShare)
        .map((row): Row => [
          row.form.replaceAll('-', ' '),
          state.temperatureK,
          fate?.element ?? '',
          row.gasShare,
          row.condensedShare,
        ]),
    );
  };
  return lazyTable({ id, label, columns }, () => [
    ...rowsOf(flame),
    ...burn.cooled.flatMap((cooled) => rowsOf(cooled.state())),
  ]);
}

/** What condenses, and what condensed goes again, between the flame and 25 °C. */
function condensationTable(burn: Burn): Table {
  const columns: readonly Column[] = [
    substance,
    { id: 'dew-point', label: 'Appears at', unit: 'K' },
    { id: 'end-point', label: 'is gone at', unit: 'K' },
    { id: 'source', label: 'out of', unit: null },
    remark,
  ];
  return lazyTable({ id: 'condensation', label: 'What condenses as it cools', columns }, () => {
    const { candidates, presentAtStart, events } = burn.path();
    const name = (phase: number): string => candidates.phases[phase]?.id ?? '';
    const rows = new Map<number, { appears: number | null; leaves: number | null; from: readonly number[] }>();
    for (const phase of presentAtStart) rows.set(phase, { appears: null, leaves: null, from: [] });
    for (const { kind, phase, temperatureK, with: others } of events) {
      const known = rows.get(phase) ?? { appears: null, leaves: null, from: others };
      if (kind === 'appears') known.appears ??= temperatureK;
      else known.leaves = temperatureK;
      rows.set(phase, known);
    }
    return [...rows].map(([phase, { appears, leaves, from }]) => {
      const formula = candidates.phases[phase]?.formula;
      const origin = appears === null ? 'there in the flame' : from.length > 0 ? from.map(name).join(', ') : 'gas';
      return [name(phase), appears, leaves, origin, formula && isSlow(formula) ? 'limit, not forecast' : null];
    });
  });
}

/** What would become of the carbon if the gas froze at each temperature: the answer to "where would it have to freeze". */
function freezingTable(burn: Burn): Table {
  const columns: readonly Column[] = [
    { id: 'frozen-at', label: 'Frozen at', unit: 'K' },
    { id: 'frozen-carbonate-share', label: 'Carbon in carbonate', unit: '1' },
    { id: 'frozen-carbon-dioxide-share', label: 'Carbon in carbon dioxide', unit: '1' },
  ];
  const hasCarbonate = burn.charge.elements.includes('C') && burn.charge.elements.some((symbol) => binds(symbol));
  return lazyTable({ id: 'carbon-against-freezing', label: 'Carbon, if the gas froze', columns }, () =>
    hasCarbonate
      ? carbonAgainstFreezing(burn.path()).map((row): Row => [
          row.temperatureK,
          row.carbonateShare,
          row.carbonDioxideShare,
        ])
      : [],
  );
}

/** Metals whose carbonates are among the products. */
function binds(symbol: string): boolean {
  return alkaliMetals.includes(symbol) || symbol === 'Mg' || symbol === 'Ca';
}

function balanceTable({ charge }: Burn, flame: Equilibrium): Table {
  const columns: readonly Column[] = [
    { id: 'element', label: 'Element', unit: null },
    { id: 'given', label: 'in the charge', unit: 'mol/kg' },
    { id: 'found', label: 'in the products', unit: 'mol/kg' },
    { id: 'relative-difference', label: 'Difference', unit: '1' },
  ];
  return lazyTable({ id: 'element-balance', label: 'Elements, per kg of fuel', columns }, () => {
    const { candidates, amountsMol } = flame;
    return charge.elements.map((symbol, index) => {
      const given = charge.elementMol[index] ?? 0;
      const found = candidates.phases.reduce(
        (sum, { formula }, phase) => sum + (formula.composition.get(symbol) ?? 0) * (amountsMol[phase] ?? 0),
        0,
      );
      return [symbol, given, found, given > 0 ? (found - given) / given : null];
    });
  });
}

/** How far the answer is from the exact one. */
export const certificateRows = [
  ['elementBalance', 'Largest relative imbalance of an element'],
  ['largestAffinity', 'Largest affinity of an absent phase, over RT'],
  ['potentialResidual', 'Largest residual of a present phase, over RT'],
  ['heldResidual', 'Residual of the held energy, over RT per atom'],
] as const;

function certificateTable({ certificate }: Equilibrium): Table {
  const columns: readonly Column[] = [
    { id: 'check', label: 'Check', unit: null },
    { id: 'residual', label: 'Residual', unit: '1' },
  ];
  return lazyTable({ id: 'certificate', label: 'Certificate of the equilibrium', columns }, () =>
    certificateRows.map(([key, label]) => [label, finite(certificate[key])]),
  );
}

function lazyTable(
  table: Pick<Table, 'id' | 'label' | 'columns'>,
  rows: Read<readonly Row[]>,
  traces?: Read<readonly Row[]>,
): Table {
  if (!traces) return lazily<Table>({ ...table, rows: [] }, { rows });
  // `traces` may be absent of a table, so the compiler does not know that it is there to be worked out.
  const full: Table & { readonly traces: readonly Row[] } = { ...table, rows: [], traces: [] };
  return lazily(full, { rows, traces });
}

function inGrams(kg: number | undefined): number | null {
  return kg === undefined ? null : kg * 1000;
}

function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}
