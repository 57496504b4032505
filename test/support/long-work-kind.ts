// A definition kind for the tests of long work, in the place of `compare`: `compare a { of: 4 }` has the figure `total`, the
// sum of the whole numbers up to that one, and has it worked out as long work (sumUpTo of job-table.ts,
// or the same under watch).
import { quantityOf } from '../../server/core/quantity/quantity.ts';
import type { Kind } from '../../server/scenario/kinds/kind.ts';
import type { sumUpTo } from './job-table.ts';

/** The kind, with the long work that it asks for. */
export function compareOf(work: typeof sumUpTo): Kind {
  const row = { id: 'total', label: 'Total', unit: '1', method: 'as-given' } as const;
  return {
    kind: 'compare',
    help: 'A sum.',
    evaluated: {
      entries: {},
      lines: [],
      figures: [row],
      evaluate(definition, context) {
        const last = Number(/of: +(\d+)/.exec(context.written(definition.span))?.[1]);
        const sum = context.scope.longWork(work, String(last), last);
        const working = { method: row.method, inputs: [], sources: [], assumptions: [] } as const;
        const figures = sum === null ? [] : [{ ...row, quantity: quantityOf(sum), working }];
        const absent = new Map(sum === null ? [[row.id, null]] : []);
        return { figures, tables: [], absent, lines: [], material: null };
      },
    },
  };
}
