// `duty`: what engines have to do, leg by leg or as a test cycle. Reads entries and legs, says which of them cannot be done
// or do not count, and hands the duty on to services. The plan is core/duty's.
// Invariant: a leg that could not be read leaves the sums out, since they would be of another duty; hours and loads of
// the others stand in no figure then.

import type { Definition, Entry, Span } from '../../../grammar/tree.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { near, type Context } from '../context.ts';
import { dutyFigures, dutyTables, figuresOfDuty, modeTable, weightedLoadOf } from '../duty-figures.ts';
import { dutyMachineOf, type NamedLeg, type WrittenDuty } from '../duty-machine.ts';
import { legReader, startsWithExtent } from '../duty-readers.ts';
import { readEntries, refuseLines, type EntriesRead } from '../entries.ts';
import type { DutyMachine } from '../machinery.ts';
import type { Figure } from '../scenario.ts';
import { unmeasuredLoads } from '../unmeasured-loads.ts';
import type { Working, WorkingInput } from '../working.ts';
import { defaultExponent, defaultIntermediate, dutyEntries } from './duty-entries.ts';
import { reportDuty, reportLegName, type LegPlaces } from './duty-facts.ts';
import { lazyAnswer, unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

const evaluated: EvaluatedKind = { entries: dutyEntries, legs: legReader, lines: [], figures: dutyFigures, evaluate };

export const duty: Kind = {
  kind: 'duty',
  help: 'What engines have to do: legs by time or by distance and speed, or a named test cycle of ISO 8178-4.',
  evaluated,
};

type Read = EntriesRead<typeof dutyEntries>;

function evaluate(definition: Definition, context: Context): KindAnswer {
  const legs: (NamedLeg & { readonly entry: Entry })[] = [];
  let unreadLegs = 0;
  const takeLeg = (entry: Entry): boolean => {
    if (!startsWithExtent(entry, context)) return false;
    context.startLine(`${entry.words}#${legs.length + unreadLegs}`);
    reportLegName(
      entry,
      near(
        entry.words,
        Object.values(dutyEntries).map(({ name }) => name),
      ),
      context,
    );
    const leg = legReader.read(entry, context);
    if (leg) legs.push({ name: entry.words, leg, entry });
    else unreadLegs += 1;
    return true;
  };
  const { entries: read, broken } = readEntries(definition, dutyEntries, context, [], takeLeg);
  refuseLines(definition, [], context);
  const header = definition.name?.span ?? definition.header;
  if (
    !read.testCycle &&
    !broken.has('testCycle') &&
    !read.profile &&
    !broken.has('profile') &&
    legs.length + unreadLegs === 0
  ) {
    const entries = ['a leg, such as `sail: 38 nmi at 11 kn on main`,', dutyEntries.testCycle.name];
    context.report(header, { code: 'name/missing-entry', kind: 'duty', name: context.owner, entries });
  }
  if (read.profile) {
    const { value: leg, entry } = read.profile;
    legs.push({ name: entry.words, leg, entry });
    legs.sort((left, right) => left.entry.span.start - right.entry.span.start);
  }
  const [firstLeg] = legs;
  if (read.testCycle && firstLeg) {
    context.report(firstLeg.entry.wordsSpan, {
      code: 'balance/contradiction',
      what: 'what is to be done',
      first: read.testCycle.entry.words,
      second: firstLeg.entry.words,
      compared: null,
    });
  }
  if (read.testCycle)
    context.report(read.testCycle.entry.span, { code: 'duty/test-cycle', cycle: read.testCycle.value.cycle.name });
  const isBroken = broken.size > 0 || unreadLegs > 0 || definition.lines.some(({ kind }) => kind === 'broken-line');
  if (isBroken || (legs.length === 0 && !read.testCycle)) return unknownAnswer(evaluated);
  const written = writtenDuty(read, legs, context);
  const machine = dutyMachineOf(written);
  reportDuty(machine, written, placesOf(read, legs, header), context);
  const working = workingOf(written, machine, read, context);
  return lazyAnswer(
    { machinery: machine },
    {
      figures: () => [...withCycleLoad(figuresOfDuty(machine, working), written, working)],
      tables: () => [
        ...(written.cycle ? [modeTable(written.cycle.cycle, written.intermediate.value)] : []),
        ...(written.cycle && !written.cycle.engine ? [] : dutyTables(machine)),
      ],
    },
  );
}

function writtenDuty(read: Read, legs: readonly NamedLeg[], context: Context): WrittenDuty {
  const cycle = read.testCycle?.value ?? null;
  return {
    name: context.owner,
    legs: cycle ? [] : legs,
    cycle,
    runningTimeS: read.runningTime?.value.quantity ?? quantityOf(3600, knownUnit('s').dimension),
    intermediate: read.intermediateSpeed?.value.quantity ?? quantityOf(defaultIntermediate),
    service: read.serviceSpeed?.value ?? null,
    defaultExponent,
    hotel: read.hotelLoad?.value ?? [],
    auxiliaries: read.auxiliaries?.value ?? [],
    boiler: read.boiler?.value ?? null,
  };
}

function placesOf(read: Read, legs: readonly (NamedLeg & { readonly entry: Entry })[], header: Span): LegPlaces {
  return {
    header,
    legs: legs.map(({ entry }) => entry),
    cycle: read.testCycle?.entry ?? null,
    serviceSpeed: read.serviceSpeed?.entry ?? null,
    standing: [read.hotelLoad?.entry, read.auxiliaries?.entry].flatMap((entry) => entry ?? []),
  };
}

/** The weighted load of a test cycle is known without an engine. */
function withCycleLoad(
  figures: readonly Figure[],
  { cycle, intermediate }: WrittenDuty,
  working: (row: (typeof dutyFigures)[number]) => Working,
): readonly Figure[] {
  const row = dutyFigures.find(({ id }) => id === 'weighted-load');
  if (!cycle || cycle.engine || !row) return figures;
  const { id, label, unit } = row;
  const quantity: Quantity = quantityOf(weightedLoadOf(cycle.cycle, intermediate.value));
  return [{ id, label, unit, quantity, working: working(row) }];
}

function workingOf(
  written: WrittenDuty,
  machine: DutyMachine,
  read: Read,
  context: Context,
): (row: { readonly id: string; readonly method: Working['method'] }) => Working {
  const legInputs = written.legs.flatMap(({ name, leg }): WorkingInput[] => {
    const extent = leg.time ?? leg.distance;
    return extent ? [{ label: `leg ${name}`, quantity: extent, unit: leg.time ? 'h' : 'nmi' }] : [];
  });
  const service = written.service;
  const place = read.serviceSpeed && context.place(read.serviceSpeed.entry.span);
  const serviceInputs: WorkingInput[] = service
    ? [
        { label: 'service speed', quantity: service.speed, unit: 'kn', ...(place ? { place } : {}) },
        { label: 'load at the service speed', quantity: service.load, unit: '%' },
      ]
    : [];
  const isCubic = service !== null && service.exponent === null;
  return ({ method }) => ({
    method,
    inputs: [...legInputs, ...serviceInputs],
    sources: written.cycle ? ['ISO 8178-4:2020, modes and weighting factors'] : [],
    assumptions: [
      ...(isCubic ? (['cubic-propeller'] as const) : []),
      ...(method === 'service-fuel' && unmeasuredLoads(machine).isBeyond ? (['beyond-measured'] as const) : []),
    ],
  });
}
