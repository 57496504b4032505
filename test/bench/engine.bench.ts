// Times a cycle of an engine with pistons: the cycle with its residual gas and a hundred states of its expansion in chemical
// equilibrium, for a hydrocarbon and for a fuel with metal in it, the latter with all four corners of its particles.
// A time is the least of several rounds: other work on the machine only ever adds to it. Judges nothing.

import { cyclePath } from '../../server/core/engine/cycle-path.ts';
import { corners } from '../../server/core/engine/expansion.ts';
import { engineCharge, workCycle } from '../../server/core/engine/work-cycle.ts';
import type { ReciprocatingInput } from '../../server/core/engine/reciprocating.ts';
import type { SolvedCycle } from '../../server/core/engine/work-cycle.ts';
import { engine } from '../server/core/engine/engines.ts';
import { mixed, stream } from '../server/core/burn/streams.ts';
import { print } from './measured.ts';

const limited = { heatRelease: { at: 'limited', maximumPressurePa: 1.8e7 } } as const;
const losses = { wallLossShare: 0.14, mechanicalEfficiency: 0.92, intakePressurePa: 3e5, exhaustPressurePa: 2.6e5 };
const gasOil = engine(stream('gas_oil'), 2.1, { ...limited, ...losses }).input;
const slurry = mixed([0.3, stream('sodium')], [0.7, stream('gas_oil')]);
const metal = engine(slurry, 2.1, { ...limited, ...losses }).input;

function time(calls: number, call: () => unknown): number {
  let least = Infinity;
  for (let round = 0; round < 24; round += 1) {
    const start = performance.now();
    for (let k = 0; k < calls; k += 1) call();
    const took = (performance.now() - start) / calls;
    if (round >= 6) least = Math.min(least, took);
  }
  return least;
}

/** From the input on: candidates laid out, cycles solved, and the expansion in a hundred states. */
function solveAll(input: ReciprocatingInput, count: number): number {
  const charge = engineCharge(input);
  if ('kind' in charge) throw new Error(JSON.stringify(charge));
  let first: SolvedCycle | undefined;
  let lowest: SolvedCycle | undefined;
  for (const corner of corners.slice(0, count)) {
    const solved = workCycle(charge, corner, first);
    if (solved.kind === 'fault') throw new Error(JSON.stringify(solved));
    first ??= solved;
    if (!lowest || solved.cycle.balance.brakeWorkJ < lowest.cycle.balance.brakeWorkJ) lowest = solved;
  }
  if (first === undefined || lowest === undefined) throw new Error('no corner');
  const path = cyclePath(charge, first);
  if (path.incomplete || path.expansion.length !== 100) throw new Error('incomplete');
  return lowest.cycle.balance.brakeWorkJ;
}

for (const [name, input, count, budget] of [
  ['a hydrocarbon', gasOil, 1, 10],
  ['sodium in a hydrocarbon, four corners', metal, 4, 40],
] as const) {
  print({
    name: `limited-pressure cycle on ${name}, 100 states in equilibrium`,
    value: time(3, () => solveAll(input, count)),
    unit: 'ms',
    budget,
  });
}
