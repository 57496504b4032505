// `engine`: what an engine makes of its fuel, by the cycle it works or by its measured consumption against load. Reads the
// one entry table and hands on to the way that is written; works nothing out itself. Two ways at once contradict each
// other; none is asked for. Invariant: exactly one way answers a definition.

import type { Definition } from '../../../grammar/tree.ts';
import { reportFuelHazards } from '../blend-hazards.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import { evaluateCycle } from './engine-cycle.ts';
import { engineEntries, type CycleWord, type EngineAsked, type EngineWay } from './engine-entries.ts';
import { engineFigures } from './engine-figures.ts';
import { evaluateMeasured } from './engine-measured.ts';
import { evaluateSteam } from './engine-steam.ts';
import { evaluateTurbine } from './engine-turbine.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

/** The way of each cycle; null for one that is not worked out yet. */
const cycles: Readonly<Record<CycleWord, EngineWay | null>> = {
  otto: evaluateCycle,
  diesel: evaluateCycle,
  dual: evaluateCycle,
  brayton: evaluateTurbine,
  rankine: evaluateSteam,
};

const evaluated: EvaluatedKind = { entries: engineEntries, lines: [], figures: engineFigures, evaluate };

export const engine: Kind = {
  kind: 'engine',
  help: 'An engine, by the cycle it works or by its measured consumption against load.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, engineEntries, context);
  refuseLines(definition, [], context);
  const asked: EngineAsked = { read, broken, definition, context };
  const pilot = read.pilot && { value: read.pilot.value.fuel, entry: read.pilot.entry };
  const screening = reportFuelHazards(definition, [read.fuel, pilot], context);
  // The answer works its own fields out when they are read; this one is there already.
  return Object.defineProperty(answerOf(asked), 'screening', { value: screening, enumerable: true });
}

function answerOf(asked: EngineAsked): KindAnswer {
  const { read, broken, definition, context } = asked;
  const measured = read.specificFuelConsumption ?? read.efficiency;
  const isMeasured = measured !== undefined || broken.has('specificFuelConsumption') || broken.has('efficiency');
  if (read.cycle && measured) {
    context.report(measured.entry.wordsSpan, {
      code: 'balance/contradiction',
      what: 'how the engine is known',
      first: read.cycle.entry.words,
      second: measured.entry.words,
      compared: null,
    });
  }
  if (read.cycle) {
    const way = cycles[read.cycle.value];
    return way ? way(asked) : notEvaluated(definition, context);
  }
  if (measured) return evaluateMeasured(asked);
  if (isMeasured) return unknownAnswer(evaluated);
  if (!broken.has('cycle')) {
    const entries = [engineEntries.cycle, engineEntries.specificFuelConsumption, engineEntries.efficiency];
    context.report(definition.name?.span ?? definition.header, {
      code: 'name/missing-entry',
      kind: 'engine',
      name: context.owner,
      entries: entries.map(({ name }) => name),
    });
  }
  return unknownAnswer(evaluated);
}

function notEvaluated({ keyword }: Definition, context: Context): KindAnswer {
  context.report(keyword.span, { code: 'kind/not-evaluated', kind: 'engine', name: context.owner });
  return unknownAnswer(evaluated);
}
