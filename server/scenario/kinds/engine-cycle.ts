// `engine` by an Otto, Diesel or dual cycle: entries with their defaults taken, the cycle solved in all corners of its
// particles, and what duties and services ask of it. The states are core/engine's; this file joins entries to them.
// Solved with the definition, as findings rest on it: some milliseconds, four times that with particles. Uncertainties, the
// diagram and the exhaust's table wait until somebody reads them.

import { loadTable } from '../engine-consumption.ts';
import { propagatedFigures } from '../propagated-figures.ts';
import type { Figure } from '../scenario.ts';
import { cyclePlaces, reportCycle, reportNoCycle } from './engine-cycle-facts.ts';
import { consumptionOfEngine, cycleFigures, cycleValues } from './engine-cycle-figures.ts';
import { machineOf, solvedOf } from './engine-cycle-solved.ts';
import { cycleTables } from './engine-cycle-tables.ts';
import { cycleWorking, placesOfEntries } from './engine-cycle-working.ts';
import { missingEntries, writtenCycle } from './engine-cycle-written.ts';
import type { EngineAsked } from './engine-entries.ts';
import { lazyAnswer, unknownAnswer, type KindAnswer } from './kind.ts';

export function evaluateCycle(asked: EngineAsked): KindAnswer {
  const { read, broken, context, definition } = asked;
  const nothing = unknownAnswer({ figures: cycleFigures });
  const header = definition.name?.span ?? definition.header;
  const missing = missingEntries(asked);
  if (missing.length > 0) {
    context.report(header, {
      code: 'name/missing-entry',
      kind: 'engine',
      name: context.owner,
      entries: missing,
      all: true,
    });
  }
  const isBroken = broken.size > 0 || definition.lines.some((line) => line.kind === 'broken-line');
  const { compressionRatio } = read;
  if (compressionRatio && !(compressionRatio.value.quantity.value > 1)) {
    context.report(compressionRatio.entry.span, {
      code: 'engine/compression-ratio',
      ratio: compressionRatio.value.quantity,
    });
    return nothing;
  }
  if (missing.length > 0 || isBroken || !read.fuel) return nothing;
  const places = cyclePlaces(read, header);
  const written = writtenCycle(read, read.fuel.value);
  if ('missing' in written) {
    context.report(places.fuel, {
      code: 'balance/no-data',
      what: `the cycle of ${context.owner}`,
      missing: written.missing,
    });
    return nothing;
  }
  const solved = solvedOf(written);
  if (solved.kind !== 'solved') {
    reportNoCycle(solved, written, places, context);
    return nothing;
  }
  reportCycle(solved.engine, written, read, places, context);
  const machine = machineOf(context.owner, read, read.fuel.value, solved);
  const speed = read.speed?.value.quantity.value ?? null;
  const entryPlaces = placesOfEntries(read, context);
  const figures = (): readonly Figure[] =>
    propagatedFigures(
      cycleFigures,
      solved.question.quantities,
      (values) => {
        const moved = solved.at(values);
        return moved ? cycleValues(moved.engine, moved.input, speed) : {};
      },
      (row) => cycleWorking(row, written, solved, entryPlaces),
    );
  const loads = [0.25, 0.5, 0.75, 0.85, 1];
  return lazyAnswer(
    { machinery: machine },
    {
      figures,
      tables: () => {
        const consumption =
          solved.input.ratedPowerW === null ? null : consumptionOfEngine(solved.engine, solved.input.ratedPowerW);
        const { lowerHeatingValueJPerKg } = solved.input;
        return [
          ...(consumption ? [loadTable(consumption, lowerHeatingValueJPerKg, loads)] : []),
          ...cycleTables(solved.engine),
        ];
      },
    },
  );
}
