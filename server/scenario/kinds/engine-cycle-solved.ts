// The cycle of an engine with pistons as its figures read it, at its values and at others; and the engine as duties and
// services use it, on its own fuel and on another, which it then burns at the same λ, pressures and shares of loss.
// Reports nothing. Invariant: one input has one answer, and the values as written are solved once.

import type { BurnFault } from '../../core/burn/burn.ts';
import type { Consumption } from '../../core/engine/consumption.ts';
import type { CycleFault } from '../../core/engine/reciprocating.ts';
import { solveEngine, type SolvedEngine } from '../../core/engine/solved-engine.ts';
import type { BurningEngine, EngineMachine, NotBurning } from '../machinery.ts';
import type { Material } from '../material.ts';
import type { AssumptionId } from '../working.ts';
import { consumptionOfEngine, netIndicatedEfficiency } from './engine-cycle-figures.ts';
import { questionOfCycle, type CycleInput, type CycleQuestion, type WrittenCycle } from './engine-cycle-question.ts';
import { writtenCycle } from './engine-cycle-written.ts';
import type { EngineRead } from './engine-entries.ts';
import { engineMachine, slipsOf } from './engine-machine.ts';
import { answerAt } from './kept-answer.ts';

export interface CycleAt {
  readonly engine: SolvedEngine;
  readonly input: CycleInput;
}

export interface SolvedCycleQuestion extends CycleAt {
  readonly kind: 'solved';
  readonly question: CycleQuestion;
  /** At other values of the question's quantities; null where there is no cycle. */
  readonly at: (values: readonly number[]) => CycleAt | null;
}

/** The cycle at the values as written, or why there is none. */
export function solvedOf(written: WrittenCycle): SolvedCycleQuestion | CycleFault | BurnFault {
  const question = questionOfCycle(written);
  const input = question.input(question.quantities.map(({ value }) => value));
  if (input.kind === 'fault') return input;
  const engine = solveEngine(input.reciprocating);
  if (engine.kind === 'fault') return engine;
  const own: CycleAt = { engine, input };
  return {
    kind: 'solved',
    question,
    ...own,
    at: answerAt<CycleAt>(question.quantities, own, (values) => {
      const moved = question.input(values);
      if (moved.kind === 'fault') return null;
      const solved = solveEngine(moved.reciprocating);
      return solved.kind === 'fault' ? null : { engine: solved, input: moved };
    }),
  };
}

/** What the figures of a cycle rest on. */
export function cycleAssumptions({ engine }: CycleAt): readonly AssumptionId[] {
  return [
    'lower-heating-value-basis',
    'instant-combustion',
    'mean-temperature',
    ...(engine.cycles.length > 1 ? (['particle-corners'] as const) : []),
    ...(engine.charge.input.wallLossShare > 0 ? (['early-wall-heat'] as const) : []),
    'frozen-exhaust',
    'no-short-circuit',
    'turbocharger-outside',
    'complete-equilibrium',
    'ideal-gas',
    ...(engine.cautious.cycle.burnt.pressurePa > densePa ? (['dense-gas'] as const) : []),
  ];
}

const densePa = 1e7;

/** The engine as others use it. */
export function machineOf(name: string, read: EngineRead, fuel: Material, own: SolvedCycleQuestion): EngineMachine {
  return engineMachine(name, read, fuel, (other) => burningOn(other === fuel ? own : onFuel(read, other), read));
}

function onFuel(read: EngineRead, fuel: Material): SolvedCycleQuestion | NotBurning {
  const written = writtenCycle(read, fuel);
  if ('missing' in written) return { kind: 'not-burning', missing: written.missing };
  const solved = solvedOf(written);
  return solved.kind === 'solved' ? solved : { kind: 'not-burning', missing: [`a cycle on ${fuel.name}`] };
}

function burningOn(solved: SolvedCycleQuestion | NotBurning, read: EngineRead): BurningEngine | NotBurning {
  if (solved.kind === 'not-burning') return solved;
  const consumptionOf = (at: CycleAt | null): Consumption | null =>
    at && at.input.ratedPowerW !== null ? consumptionOfEngine(at.engine, at.input.ratedPowerW) : null;
  const net = netIndicatedEfficiency(solved.engine);
  if (!(net.low > 0)) return { kind: 'not-burning', missing: ['work of the cycle: it takes more than it gives'] };
  const { mechanicalEfficiency } = solved.engine.charge.input;
  const heatRate = (efficiency: number): number => 1 / (efficiency * mechanicalEfficiency);
  return {
    kind: 'burning',
    consumption: consumptionOf(solved),
    ratedHeatRate: { value: heatRate(net.low), low: heatRate(net.high), high: heatRate(net.low) },
    uncertain: solved.question.quantities,
    consumptionAt: (values) => consumptionOf(solved.at(values)),
    pilot: read.pilot?.value ?? null,
    slips: slipsOf(read),
    assumptions: [...cycleAssumptions(solved), 'friction-kept'],
  };
}
