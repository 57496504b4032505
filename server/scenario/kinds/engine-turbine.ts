// `engine` by the Joule–Brayton cycle: entries with their defaults taken, the gas turbine solved in all corners of its
// particles, what is to be said of it, and what duties and services ask. The states are core/engine/turbine's; this file
// joins entries to them. Solved with the definition, as findings rest on it; uncertainties and tables wait until somebody
// reads them.

import type { Span } from '../../../grammar/tree.ts';
import type { BurnFault, MatterState } from '../../core/burn/burn.ts';
import { hasParticles } from '../../core/engine/solved-engine.ts';
import type { TurbineFault } from '../../core/engine/turbine/gas-turbine.ts';
import { elementsOf } from '../../core/engine/turbine/turbine-passage.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import type { Context } from '../context.ts';
import { loadTable } from '../engine-consumption.ts';
import { propagatedFigures } from '../propagated-figures.ts';
import { reportMetal } from '../report-metal.ts';
import type { Figure } from '../scenario.ts';
import type { EngineAsked, EngineRead } from './engine-entries.ts';
import { placesOfEntries } from './engine-cycle-working.ts';
import { turbineFigures, turbineValues } from './engine-turbine-figures.ts';
import {
  consumptionOfTurbine,
  solvedTurbineOf,
  turbineAssumptions,
  turbineMachine,
  writtenTurbine,
  type SolvedTurbineQuestion,
  type WrittenTurbine,
} from './engine-turbine-solved.ts';
import { turbineTables } from './engine-turbine-tables.ts';
import { lazyAnswer, unknownAnswer, type KindAnswer } from './kind.ts';
import { reportNoState } from './plant-facts.ts';
import { kelvin } from './plant-question.ts';
import { plantWorking, type WorkingPoint } from './plant-working.ts';

export function evaluateTurbine({ read, broken, context, definition }: EngineAsked): KindAnswer {
  const nothing = unknownAnswer({ figures: turbineFigures });
  const header = definition.name?.span ?? definition.header;
  const missing = missingEntries(read, broken);
  if (missing) context.report(header, { code: 'name/missing-entry', kind: 'engine', name: context.owner, ...missing });
  const { lambda, turbineInletTemperature: inlet, pressureRatio, fuel } = read;
  if (lambda && inlet) {
    const words = { first: inlet.entry.words, second: lambda.entry.words };
    context.report(lambda.entry.wordsSpan, {
      code: 'balance/contradiction',
      what: 'how hot the gas becomes',
      ...words,
      compared: null,
    });
  }
  const ratio = pressureRatio?.value.quantity;
  if (pressureRatio && ratio && !(ratio.value > 1)) {
    context.report(pressureRatio.entry.span, { code: 'engine/pressure-ratio', ratio });
    return nothing;
  }
  const isBroken = broken.size > 0 || definition.lines.some((line) => line.kind === 'broken-line');
  if (missing || isBroken || !fuel || (lambda && inlet)) return nothing;
  const written = writtenTurbine(read, fuel.value);
  if ('missing' in written) {
    const what = `the cycle of ${context.owner}`;
    context.report(fuel.entry.span, { code: 'balance/no-data', what, missing: written.missing });
    return nothing;
  }
  const own = solvedTurbineOf(written);
  if (own.kind !== 'solved') {
    reportFault(own, written, read, header, context);
    return nothing;
  }
  reportTurbine(own, read, header, context);
  const machine = turbineMachine(context.owner, read, fuel.value, own);
  const places = placesOfEntries(read, context);
  const figures = (): readonly Figure[] =>
    propagatedFigures(
      turbineFigures,
      own.question.quantities,
      (values) => {
        const at = own.at(values);
        return at ? turbineValues(at) : {};
      },
      (row) =>
        plantWorking(row, {
          streams: written.streams,
          own: written.own,
          places,
          points: pointsOf(own),
          losses: own.solved.cautious.losses,
          more:
            own.solved.cycles.length > 1
              ? own.solved.cycles.map(({ corner, brakeEfficiency }) => ({
                  label: `Brake work over the heating value, ${corner.chemistry}, particles ${corner.particles.replaceAll('-', ' ')}`,
                  quantity: quantityOf(brakeEfficiency),
                  unit: '%',
                }))
              : [],
          sources: [],
          assumptions: turbineAssumptions(own),
        }),
    );
  return lazyAnswer(
    { machinery: machine },
    {
      figures,
      tables: () => {
        const consumption = own.ratedPowerW === null ? null : consumptionOfTurbine(own, own.ratedPowerW);
        return [
          ...(consumption ? [loadTable(consumption, own.lowerJPerKg, [0.25, 0.5, 0.75, 0.85, 1])] : []),
          ...turbineTables(own.solved),
        ];
      },
    },
  );
}

/** What the cycle cannot do without and is not written. */
function missingEntries(
  read: EngineRead,
  broken: EngineAsked['broken'],
): { readonly entries: readonly string[]; readonly all?: true } | null {
  if (!read.pressureRatio && !broken.has('pressureRatio')) return { entries: ['pressure ratio'], all: true };
  const { lambda, turbineInletTemperature: inlet, reheatedTo } = read;
  const isUnread = broken.has('lambda') || broken.has('turbineInletTemperature');
  if (inlet || isUnread) return null;
  // With a reheat the air follows from the turbine inlet alone.
  if (reheatedTo) return { entries: ['turbine inlet temperature'], all: true };
  return lambda ? null : { entries: ['turbine inlet temperature', 'lambda'] };
}

function pointsOf({ solved: { cautious } }: SolvedTurbineQuestion): readonly WorkingPoint[] {
  const { compressor, combustorInlet, turbineInlet, turbineOutlet, exhaust } = cautious;
  const point = (
    name: string,
    state: { readonly temperatureK: number; readonly pressurePa: number },
  ): WorkingPoint => ({
    name,
    temperature: kelvin(state.temperatureK),
    pressure: quantityOf(state.pressurePa, knownUnit('Pa').dimension),
  });
  return [
    point('1 inlet', compressor.inlet),
    point('2 behind the compressor', compressor.delivery),
    point('2x before the combustor', combustorInlet),
    point('3 turbine inlet', turbineInlet),
    point('4 behind the turbine', turbineOutlet),
    point('5 as it leaves', exhaust),
  ];
}

/** Says why there is no cycle. */
function reportFault(
  fault: TurbineFault | BurnFault,
  { streams }: WrittenTurbine,
  read: EngineRead,
  header: Span,
  context: Context,
): void {
  const { lambda, turbineInletTemperature: inlet, reheatedTo } = read;
  const inletSpan = inlet?.entry.span ?? lambda?.entry.span ?? header;
  const asked = (of: 'inlet' | 'reheat'): Quantity =>
    (of === 'inlet' ? inlet : reheatedTo)?.value.quantity ?? quantityOf(NaN);
  const span = (of: 'inlet' | 'reheat'): Span => (of === 'inlet' ? inletSpan : (reheatedTo?.entry.span ?? header));
  const code = 'engine/turbine-inlet';
  switch (fault.reason) {
    case 'not-hot-enough':
      context.report(span(fault.of), {
        code,
        why: 'not-hot-enough',
        of: fault.of,
        asked: asked(fault.of),
        reaches: kelvin(fault.reachesK),
      });
      return;
    case 'cold-inlet':
    case 'cold-reheat': {
      const of = fault.reason === 'cold-inlet' ? 'inlet' : 'reheat';
      const comes = kelvin(fault.reason === 'cold-inlet' ? fault.airK : fault.fromK);
      context.report(span(of), { code, why: 'comes-hotter', of, asked: asked(of), comes });
      return;
    }
    case 'no-state':
      reportNoState(fault.stage, fault.why, header, context);
      return;
    case 'no-valence':
    case 'no-oxygen-needed':
    case 'no-oxygen-offered':
    case 'not-positive': {
      const names = { fuel: streams.material.name, oxidant: streams.oxidant.name };
      context.report(lambda?.entry.span ?? read.fuel?.entry.span ?? header, {
        code: 'balance/charge',
        fault,
        ...names,
      });
      return;
    }
    // A number out of its range that the entry's own range lets pass: a loss or an efficiency of exactly nothing or all.
    case 'not-in-range':
      reportNoState('cycle', { kind: 'none', reason: 'nothing' }, header, context);
      return;
    case 'reheat-needs-inlet':
    case 'zone-leaner':
    case 'no-energy':
    case 'no-heating-value':
    case 'no-gas':
    case 'nothing':
      context.report(header, { code: 'program/failed', message: `No gas turbine: ${JSON.stringify(fault)}` });
  }
}

/** Says what is doubtful about a turbine that could be solved. */
function reportTurbine({ solved }: SolvedTurbineQuestion, read: EngineRead, header: Span, context: Context): void {
  const { turbine, cautious, cycles } = solved;
  const inletSpan = read.turbineInletTemperature?.entry.span ?? read.lambda?.entry.span ?? header;
  if (!(cautious.netWorkJ > 0)) context.report(header, { code: 'engine/no-plant', why: 'no-work' });
  const share = Math.max(...cycles.map(({ turbineInlet }) => turbineInlet.condensedMassShare));
  if (share > someSolids) {
    context.report(inletSpan, {
      code: 'engine/turbine-solids',
      share: quantityOf(share),
      inlet: kelvin(cautious.turbineInlet.temperatureK),
    });
  }
  const { input, reacting } = turbine;
  const elements = elementsOf(input, cautious.airKgPerKg, 1);
  const vanadium = input.fuel.elementMol.get('V') ?? 0;
  if (!hasParticles(elements.keys()) && vanadium === 0) return;
  const charge = reacting.withAmounts(elements);
  const { pressurePa, temperatureK } = cautious.turbineOutlet;
  const stateAt = (metalK: number): MatterState | null => {
    const state = charge.burnt({ held: 'temperature-pressure', temperatureK: metalK, pressurePa });
    return state.kind === 'none' ? null : state;
  };
  const given = read.metalTemperature?.value.quantity.value;
  // Blades lie between the gas that leaves and that which enters, and are cooled to what their alloys stand.
  const hottestK = Math.min(cautious.turbineInlet.temperatureK, hottestBladeC + celsiusZeroK);
  const metal =
    given === undefined ? { fromK: Math.min(temperatureK, hottestK), toK: hottestK } : { fromK: given, toK: given };
  reportMetal(metal, stateAt, vanadium, read.metalTemperature?.entry.span ?? inletSpan, context);
}

/** By mass of the gas: more than dust that filters let through (some parts per million, common practice). */
const someSolids = 5e-6;
/** Of cooled blades (common practice). */
const hottestBladeC = 900;
