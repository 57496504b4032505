// Tables that gas turbines and steam plants share: where the heating value goes, and what leaves. Each is worked out when
// somebody reads its rows. Invariant: column ids and units are those of an engine with pistons, so that all compare.

import type { MatterState } from '../../core/burn/burn.ts';
import { exhaustRows } from '../../core/engine/exhaust.ts';
import { lazily } from '../lazily.ts';
import type { Column, Table } from '../scenario.ts';
import { isSlow, leastMassShare } from './burn-products.ts';

export type Row = Table['rows'][number];

const lossLabels: Readonly<Record<string, string>> = {
  'brake-work': 'brake work',
  friction: 'friction and auxiliaries',
  'wall-heat': 'heat to the walls',
  'intercooler-heat': 'heat to the intercooler',
  'condenser-heat': 'heat to the condenser',
  'exhaust-sensible': 'sensible heat of the exhaust above 25 °C',
  'exhaust-latent': 'latent heat of vapours of metals and salts',
  'exhaust-chemical': 'dissociated and unreacted gas, short of the slate',
  'unburnt-fuel': 'unburnt fuel',
  'brought-in': 'brought in by air and fuel above 25 °C',
};

export interface PlantLoss {
  readonly id: string;
  readonly joulePerKg: number;
  readonly share: number;
}

/** The rows add up to the heating value. */
export function plantLossTable(losses: () => readonly PlantLoss[]): Table {
  const columns: readonly Column[] = [
    { id: 'loss', label: 'Where the heating value goes', unit: null },
    { id: 'energy', label: 'Energy, per kg of fuel', unit: 'MJ/kg' },
    { id: 'share', label: 'of the lower heating value', unit: '1' },
  ];
  return lazyTable({ id: 'losses', label: 'Work and losses', columns }, () => {
    const rows = losses();
    const sum = (read: (loss: PlantLoss) => number): number => rows.reduce((total, loss) => total + read(loss), 0);
    return [
      ...rows.map(({ id, joulePerKg, share }): Row => [lossLabels[id] ?? id, joulePerKg / 1e6, share]),
      ['lower heating value', sum(({ joulePerKg }) => joulePerKg) / 1e6, sum(({ share }) => share)],
    ];
  });
}

/** Of `fuelKg` of fuel. */
export function plantExhaustTable(matter: () => MatterState, fuelKg: number): Table {
  const columns: readonly Column[] = [
    { id: 'substance', label: 'Product', unit: null },
    { id: 'amount', label: 'Amount', unit: 'mol/kg' },
    { id: 'mass', label: 'Mass', unit: 'kg/kg' },
    { id: 'mass-share', label: 'by mass', unit: '1' },
    { id: 'wet-mole-share', label: 'by mole, wet gas', unit: '1' },
    { id: 'dry-mole-share', label: 'by mole, dry gas', unit: '1' },
    { id: 'reference-mole-share', label: 'by mole, dry, at 15 % O2', unit: '1' },
    { id: 'remark', label: 'Remark', unit: null },
  ];
  const rows = (keeps: (isShown: boolean) => boolean): Row[] => {
    const state = matter();
    return exhaustRows(state, fuelKg)
      .filter(({ massShare, isGas }) => keeps(massShare >= leastMassShare || !isGas))
      .map(({ phase, id, mol, massKg, massShare, wetMoleShare, dryMoleShare, shareAt15 }): Row => {
        const formula = state.candidates.phases[phase]?.formula;
        const remark = kinetic.has(id) ? 'kinetics decide' : formula && isSlow(formula) ? 'limit, not forecast' : null;
        return [id, mol, massKg, massShare, wetMoleShare, dryMoleShare, shareAt15, remark];
      });
  };
  const table: Table & { readonly traces: readonly Row[] } = {
    id: 'exhaust',
    label: 'Exhaust as it leaves, per kg of fuel',
    columns,
    rows: [],
    traces: [],
  };
  return lazily(table, { rows: () => rows((isShown) => isShown), traces: () => rows((isShown) => !isShown) });
}

const kinetic = new Set(['NO(g)', 'NO2(g)', 'N2O(g)', 'CO(g)', 'H2(g)', 'OH(g)', 'SO3(g)', 'NH3(g)']);

export function lazyTable(table: Pick<Table, 'id' | 'label' | 'columns'>, rows: () => readonly Row[]): Table {
  return lazily<Table>({ ...table, rows: [] }, { rows });
}
