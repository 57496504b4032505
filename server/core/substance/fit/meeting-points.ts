// Where two condensed phases of one composition have the same Gibbs energy by their tables: marked transitions and the ends of
// stable ranges. Both fits are held to one common value there, so that an error of the fit cannot shift a transition: where the
// entropy of transition is small, 0.005 in G/RT would move it by many kelvin. Knows no polynomials.
// Invariant: each pair of phases has at most one point at a temperature.

import { gibbsInTable } from './source-table.ts';
import type { SourceTable, TransitionKind } from './source-table.ts';

export interface MeetingPoint {
  readonly temperatureK: number;
  /** Ids of the tables; the first is the stable one below. */
  readonly phases: readonly [string, string];
  readonly kind: TransitionKind;
  /** Heat taken up going from the first to the second; undefined where the source does not state it. */
  readonly enthalpyKJ: number | undefined;
  /** On the element scale. */
  readonly gibbsKJ: number;
}

/** All meeting points among the tables. */
export function findMeetingPoints(tables: readonly SourceTable[]): readonly MeetingPoint[] {
  const byId = new Map(tables.map((table) => [table.record.id, table]));
  const points = new Map<string, MeetingPoint>();
  const add = (below: string, above: string, temperatureK: number, kind: TransitionKind, enthalpyKJ?: number): void => {
    const key = `${[below, above].sort().join(' ')} ${temperatureK}`;
    const gibbsKJ = commonGibbs([byId.get(below), byId.get(above)], temperatureK);
    if (points.has(key) || gibbsKJ === undefined) return;
    points.set(key, { temperatureK, phases: [below, above], kind, enthalpyKJ, gibbsKJ });
  };
  for (const { record } of tables) {
    for (const transition of record.transitions) {
      if (transition.with === undefined || transition.kind === 'boiling') continue;
      const other = byId.get(transition.with);
      if (other === undefined) continue;
      const [below, above] = startsAt(other, transition.T_K)
        ? [record.id, other.record.id]
        : [other.record.id, record.id];
      // Both tables carry the transition; the one that is stable above, or the liquid, names the order.
      if (record.phase === 'liquid' && other.record.phase !== 'liquid')
        add(other.record.id, record.id, transition.T_K, transition.kind, transition.dH_kJ_per_mol);
      else add(below, above, transition.T_K, transition.kind, transition.dH_kJ_per_mol);
    }
  }
  for (const { record } of tables) {
    for (const [, endK] of record.stableRanges_K) {
      const next = tables.find(
        (other) =>
          other.record.id !== record.id &&
          other.record.phase !== 'gas' &&
          other.record.formula === record.formula &&
          startsAt(other, endK),
      );
      if (record.phase === 'gas' || next === undefined) continue;
      const kind = next.record.phase === 'liquid' ? 'melting' : 'crystal-crystal';
      const stated = record.transitions.find((each) => each.T_K === endK)?.dH_kJ_per_mol;
      add(record.id, next.record.id, endK, kind, stated);
    }
  }
  return [...points.values()];
}

function startsAt(table: SourceTable, temperatureK: number): boolean {
  return table.record.stableRanges_K.some(([startK]) => startK === temperatureK);
}

/** The mean of both tables, or the value of the one that has no row at 298.15 K and is anchored right there. */
function commonGibbs(tables: readonly (SourceTable | undefined)[], temperatureK: number): number | undefined {
  const values: number[] = [];
  for (const table of tables) {
    const value = table === undefined ? undefined : gibbsInTable(table, temperatureK);
    if (table === undefined || value === undefined) return undefined;
    if (table.record.S298_J_per_mol_K === null) return value;
    values.push(value);
  }
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
