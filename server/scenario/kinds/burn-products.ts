// Cells of products as the tables of a burn show them. Solves nothing. Knows no wording but the remark.
// Invariant: every candidate has its cells, one that is not there with nothing: who asks for its share is told 0.

import type { MatterState } from '../../core/burn/burn.ts';
import { productRows } from '../../core/burn/products.ts';
import type { Formula } from '../../core/substance/formula.ts';
import type { Column, Table } from '../scenario.ts';

type Row = Table['rows'][number];

export const substanceColumn: Column = { id: 'substance', label: 'Product', unit: null };
export const productColumns: readonly Column[] = [
  { id: 'amount', label: 'Amount', unit: 'mol/kg' },
  { id: 'mass-share', label: 'by mass', unit: '1' },
  { id: 'wet-mole-share', label: 'by mole, wet gas', unit: '1' },
  { id: 'dry-mole-share', label: 'by mole, dry gas', unit: '1' },
];
export const remarkColumn: Column = { id: 'remark', label: 'Remark', unit: null };

/** Products below this share by mass stand among the traces, unless they are condensed. */
export const leastMassShare = 1e-6;

export interface ProductCell {
  readonly isGas: boolean;
  readonly mol: number;
  readonly massShare: number;
}

export function isShown({ isGas, mol, massShare }: ProductCell): boolean {
  return massShare >= leastMassShare || (!isGas && mol > 0);
}

export function productCells(state: MatterState, keeps: (row: ProductCell) => boolean): Row[] {
  const present = productRows(state);
  const known = new Set(present.map(({ phase }) => phase));
  const absent = state.candidates.phases.flatMap(({ id }, phase) => {
    const isGas = phase < state.candidates.gasCount;
    const share = isGas && state.gasMol > 0 ? 0 : null;
    return known.has(phase)
      ? []
      : [{ phase, id, isGas, mol: 0, massShare: 0, wetMoleShare: share, dryMoleShare: share }];
  });
  return [...present, ...absent].filter(keeps).map((row) => {
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
