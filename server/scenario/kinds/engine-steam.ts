// `engine` by the Rankine cycle: entries with their defaults taken, the boiler fired and the steam worked through its cycle,
// what is to be said of it, and what duties and services ask. The states are core/engine/steam's and core/burn's; this file
// joins entries to them. Solved with the definition, as findings rest on it; uncertainties and tables wait until somebody
// reads them.

import type { Span } from '../../../grammar/tree.ts';
import type { MatterState } from '../../core/burn/burn.ts';
import type { NoSteamCycle, SteamPoint } from '../../core/engine/steam/steam-question.ts';
import type { NoSteamPlant } from '../../core/engine/steam/steam-plant.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import { loadTable } from '../engine-consumption.ts';
import { propagatedFigures } from '../propagated-figures.ts';
import { reportMetal } from '../report-metal.ts';
import type { Figure } from '../scenario.ts';
import type { EngineAsked, EngineKey, EngineRead } from './engine-entries.ts';
import { placesOfEntries } from './engine-cycle-working.ts';
import { steamFigures, steamPointNames, steamTables, steamValues } from './engine-steam-figures.ts';
import {
  consumptionOfSteam,
  solvedSteamOf,
  steamAssumptions,
  steamMachine,
  writtenSteam,
  type SolvedSteamQuestion,
  type WrittenSteam,
} from './engine-steam-solved.ts';
import { lazyAnswer, unknownAnswer, type KindAnswer } from './kind.ts';
import { reportNoState } from './plant-facts.ts';
import { kelvin } from './plant-question.ts';
import { plantWorking } from './plant-working.ts';

export function evaluateSteam({ read, broken, context, definition }: EngineAsked): KindAnswer {
  const nothing = unknownAnswer({ figures: steamFigures });
  const header = definition.name?.span ?? definition.header;
  const missing = missingEntries(read, broken);
  if (missing.length > 0) {
    const what = { kind: 'engine', name: context.owner, entries: missing, all: true } as const;
    context.report(header, { code: 'name/missing-entry', ...what });
  }
  const isBroken = broken.size > 0 || definition.lines.some((line) => line.kind === 'broken-line');
  if (missing.length > 0 || isBroken || !read.fuel) return nothing;
  const written = writtenSteam(read, read.fuel.value);
  if ('missing' in written) {
    const what = `the boiler of ${context.owner}`;
    context.report(read.fuel.entry.span, { code: 'balance/no-data', what, missing: written.missing });
    return nothing;
  }
  const own = solvedSteamOf(written);
  if (own.kind !== 'solved') {
    reportNoPlant(own, written, read, header, context);
    return nothing;
  }
  reportPlant(own, read, header, context);
  const machine = steamMachine(context.owner, read, read.fuel.value, own);
  const places = placesOfEntries(read, context);
  const figures = (): readonly Figure[] =>
    propagatedFigures(
      steamFigures,
      own.question.quantities,
      (values) => {
        const at = own.at(values);
        return at ? steamValues(at) : {};
      },
      (row) =>
        plantWorking(row, {
          streams: written.streams,
          own: written.own,
          places,
          points: own.plant.cycle.points.map(({ point, number, state }) => ({
            name: number > 1 ? `${steamPointNames[point]} ${number}` : steamPointNames[point],
            temperature: kelvin(state.temperatureK),
            pressure: quantityOf(state.pressurePa, knownUnit('Pa').dimension),
          })),
          losses: own.plant.losses,
          more: [],
          sources: ['IAPWS R7-97(2012), Industrial Formulation 1997: water and steam'],
          assumptions: steamAssumptions(written),
        }),
    );
  return lazyAnswer(
    { machinery: machine },
    {
      figures,
      tables: () => {
        const consumption = own.ratedPowerW === null ? null : consumptionOfSteam(own, own.ratedPowerW);
        return [
          ...(consumption ? [loadTable(consumption, own.lowerJPerKg, [0.25, 0.5, 0.75, 0.85, 1])] : []),
          ...steamTables(own.plant),
        ];
      },
    },
  );
}

/** What the plant cannot do without and is not written. */
function missingEntries(read: EngineRead, broken: EngineAsked['broken']): readonly string[] {
  const needed: readonly (readonly [EngineKey, string])[] = [
    ['lambda', 'lambda'],
    ['exhaustTemperature', 'exhaust temperature'],
    ['boilerPressure', 'boiler pressure'],
    ['condenserPressure', 'condenser pressure'],
    ...(read.reheatedTo ? ([['reheatPressure', 'reheat pressure']] as const) : []),
    ...(read.reheatPressure ? ([['reheatedTo', 'reheated to']] as const) : []),
  ];
  return needed.filter(([key]) => !read[key] && !broken.has(key)).map(([, name]) => name);
}

/** Says why there is no plant. */
function reportNoPlant(
  none: NoSteamPlant,
  { streams, own }: WrittenSteam,
  read: EngineRead,
  header: Span,
  context: Context,
): void {
  const spanOf = (key: EngineKey): Span => read[key]?.entry.span ?? header;
  if (none.of === 'cycle') return reportNoCycle(none.why, own, spanOf, context);
  const why = none.why;
  if (why === null || why.reason === 'not-share') {
    return reportNoState('boiler', { kind: 'none', reason: 'nothing' }, header, context);
  }
  switch (why.reason) {
    case 'no-heat':
      context.report(spanOf('exhaustTemperature'), { code: 'engine/boiler-heat', why: 'none-left' });
      return;
    case 'no-valence':
    case 'no-oxygen-needed':
    case 'no-oxygen-offered':
    case 'not-positive': {
      const names = { fuel: streams.material.name, oxidant: streams.oxidant.name };
      context.report(spanOf('lambda'), { code: 'balance/charge', fault: why, ...names });
      return;
    }
    case 'zone-leaner':
    case 'no-energy':
    case 'no-heating-value':
      context.report(header, { code: 'program/failed', message: `No boiler: ${JSON.stringify(why)}` });
      return;
    case 'no-gas':
    case 'nothing':
      reportNoState('furnace', { kind: 'none', reason: why.reason }, header, context);
      return;
    case 'cannot-form':
    case 'outside-tables':
    case 'not-finite':
    case 'stopped':
    case 'not-converged':
      reportNoState('furnace', why, header, context);
  }
}

function reportNoCycle(
  none: NoSteamCycle,
  own: WrittenSteam['own'],
  spanOf: (key: EngineKey) => Span,
  context: Context,
): void {
  const code = 'engine/steam-states';
  const asked = (key: 'steamTemperature' | 'reheatedTo' | 'feedwaterTemperature'): Quantity =>
    own[key] ?? quantityOf(NaN);
  switch (none.reason) {
    case 'pressures':
      context.report(spanOf('boilerPressure'), { code, why: 'pressures' });
      return;
    case 'not-steam':
      context.report(spanOf('steamTemperature'), {
        code,
        why: 'not-steam',
        asked: asked('steamTemperature'),
        boils: kelvin(none.boilsK),
      });
      return;
    case 'reheat':
      context.report(spanOf('reheatedTo'), {
        code,
        why: 'reheat',
        asked: asked('reheatedTo'),
        from: kelvin(none.fromK),
      });
      return;
    case 'feedwater':
      context.report(spanOf('feedwaterTemperature'), {
        code,
        why: 'feedwater',
        asked: asked('feedwaterTemperature'),
        from: kelvin(none.fromK),
        to: kelvin(none.toK),
      });
      return;
    case 'outside': {
      const { at, key } = outsidePlaces[none.at];
      const limit = none.why === 'not-finite' ? 'pressure' : none.why;
      context.report(spanOf(key), { code, why: 'outside', at, limit });
      return;
    }
    // An efficiency of exactly nothing passes the entry's own range.
    case 'efficiency':
      reportNoState(
        none.of,
        { kind: 'none', reason: 'nothing' },
        spanOf(none.of === 'pump' ? 'pumpEfficiency' : 'turbineEfficiency'),
        context,
      );
      return;
    case 'heaters':
      context.report(spanOf('feedwaterTemperature'), { code: 'program/failed', message: 'No steam cycle: heaters' });
  }
}

const outsidePlaces: Readonly<
  Record<SteamPoint, { readonly at: 'condenser' | 'pump' | 'boiler' | 'turbine' | 'reheater'; readonly key: EngineKey }>
> = {
  condensate: { at: 'condenser', key: 'condenserPressure' },
  'behind-pump': { at: 'pump', key: 'boilerPressure' },
  'behind-heater': { at: 'pump', key: 'feedwaterTemperature' },
  'live-steam': { at: 'boiler', key: 'steamTemperature' },
  'bled-steam': { at: 'turbine', key: 'feedwaterTemperature' },
  'before-reheat': { at: 'turbine', key: 'reheatPressure' },
  reheated: { at: 'reheater', key: 'reheatedTo' },
  'turbine-end': { at: 'turbine', key: 'condenserPressure' },
};

/** Says what is doubtful about a plant that could be solved. */
function reportPlant({ plant, written }: SolvedSteamQuestion, read: EngineRead, header: Span, context: Context): void {
  const { pinch, cycle, boiler } = plant;
  const exhaustSpan = read.exhaustTemperature?.entry.span ?? header;
  const code = 'engine/boiler-heat';
  if (pinch?.at === 'stack') {
    const [stack, feedwater] = [kelvin(pinch.stackK), kelvin(pinch.feedwaterK)];
    context.report(exhaustSpan, { code, why: 'cold-stack', stack, feedwater });
  } else if (pinch?.at === 'evaporator') {
    const share = quantityOf(pinch.givenJ / pinch.neededJ);
    context.report(exhaustSpan, { code, why: 'pinch', boils: kelvin(pinch.boilsK), share });
  }
  if (cycle.largestWetness > usualWetness) {
    const place = read.steamTemperature?.entry.span ?? read.boilerPressure?.entry.span ?? header;
    const [wetness, usual] = [quantityOf(cycle.largestWetness), quantityOf(usualWetness)];
    context.report(place, { code: 'engine/wet-steam', wetness, usual });
  }
  const stateAt = (metalK: number): MatterState | null => {
    const state = boiler.burn.at(metalK);
    return state.kind === 'none' ? null : state;
  };
  const steamK = Math.max(...cycle.points.map(({ state }) => state.temperatureK));
  const given = read.metalTemperature?.value.quantity.value;
  const metal = given === undefined ? { fromK: steamK, toK: steamK + tubeAboveSteamK } : { fromK: given, toK: given };
  const vanadium = written.streams.fuel.elements.get('V')?.value ?? 0;
  const place = read.metalTemperature?.entry.span ?? read.steamTemperature?.entry.span ?? header;
  reportMetal(metal, stateAt, vanadium, place, context);
}

/** By mass, at the end of a steam turbine (common practice). */
const usualWetness = 0.12;
/** Tubes of superheaters are hotter than their steam by up to so much (common practice). */
const tubeAboveSteamK = 50;
