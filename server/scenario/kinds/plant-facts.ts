// What is to be said of a state that a gas turbine or a steam plant would need and that cannot be had.
// Knows no machine. Invariant: what only this program can be to blame for is told as its own failure.

import type { Span } from '../../../grammar/tree.ts';
import type { NoState } from '../../core/burn/burn.ts';
import type { Context } from '../context.ts';
import { kelvin } from './plant-question.ts';

export function reportNoState(stage: string, why: NoState, place: Span, context: Context): void {
  const isBug = why.reason === 'not-converged' || why.reason === 'not-finite' || why.reason === 'stopped';
  if (isBug) {
    context.report(place, { code: 'program/failed', message: `No state for the ${stage}: ${JSON.stringify(why)}` });
    return;
  }
  const isOutside = why.reason === 'outside-tables';
  context.report(place, {
    code: 'engine/no-plant',
    why: 'no-state',
    stage,
    side: isOutside ? why.side : null,
    limit: isOutside ? kelvin(why.limitK) : null,
  });
}
