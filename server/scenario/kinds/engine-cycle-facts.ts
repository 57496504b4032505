// What is to be said of an engine with pistons: that it has no cycle and why, and where its pressures pass what is stated.
// Reads the solved cycle; rounds and words nothing.

import type { Span } from '../../../grammar/tree.ts';
import type { BurnFault } from '../../core/burn/burn.ts';
import { knockOf, lowerLimitAt, sprayDelayS } from '../../core/engine/ignition.ts';
import type { CycleFault } from '../../core/engine/reciprocating.ts';
import { hasParticles, type SolvedEngine } from '../../core/engine/solved-engine.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import { autoignitionOf, lowerLimitOf, outsideStandard } from '../fuel-ignition.ts';
import { reportMetal } from '../report-metal.ts';
import type { EngineRead } from './engine-entries.ts';
import type { WrittenCycle } from './engine-cycle-question.ts';

/** Where in the text what belongs to which part of a cycle is said. */
export interface CyclePlaces {
  readonly header: Span;
  readonly fuel: Span;
  readonly lambda: Span;
  readonly intake: Span;
  readonly exhaust: Span;
  readonly limit: Span;
  readonly products: Span;
}

export function cyclePlaces(read: EngineRead, header: Span): CyclePlaces {
  return {
    header,
    fuel: read.fuel?.entry.span ?? header,
    lambda: read.lambda?.entry.span ?? header,
    intake: read.boostTemperature?.entry.span ?? read.oxidant?.entry.span ?? header,
    exhaust: read.exhaustPressure?.entry.span ?? read.boostPressure?.entry.span ?? header,
    limit: read.maximumFiringPressure?.entry.span ?? header,
    products: read.metalTemperature?.entry.span ?? read.cycle?.entry.span ?? header,
  };
}

/** Says why there is no cycle. */
export function reportNoCycle(
  fault: CycleFault | BurnFault,
  { fuel, oxidant }: WrittenCycle,
  places: CyclePlaces,
  context: Context,
): void {
  switch (fault.reason) {
    case 'no-fresh-gas':
      context.report(places.exhaust, { code: 'engine/no-cycle', why: 'no-fresh-gas' });
      return;
    case 'no-state':
      reportNoState(fault, places, context);
      return;
    case 'no-valence':
    case 'no-oxygen-needed':
    case 'no-oxygen-offered':
    case 'not-positive': {
      const names = { fuel: fuel.material.name, oxidant: oxidant.name };
      context.report(places.lambda, { code: 'balance/charge', fault, ...names });
      return;
    }
    // Every entry is read within its range, and every fuel here has an energy: it is our bug.
    case 'not-in-range':
    case 'zone-leaner':
    case 'no-energy':
    case 'no-heating-value':
    case 'no-gas':
    case 'nothing':
      context.report(places.header, { code: 'program/failed', message: `No cycle: ${JSON.stringify(fault)}` });
  }
}

function reportNoState(
  { state, why }: Extract<CycleFault, { readonly reason: 'no-state' }>,
  places: CyclePlaces,
  context: Context,
): void {
  const isBug = why.reason === 'not-converged' || why.reason === 'not-finite';
  if (isBug) {
    context.report(places.header, { code: 'program/failed', message: `No cycle: ${JSON.stringify({ state, why })}` });
    return;
  }
  const isOutside = why.reason === 'outside-tables';
  context.report(state === 'intake' ? places.intake : places.header, {
    code: 'engine/no-cycle',
    why: 'no-state',
    state,
    side: isOutside ? why.side : null,
    limit: isOutside ? kelvin(why.limitK) : null,
  });
}

/** Says what is doubtful about a cycle that could be solved. */
export function reportCycle(
  engine: SolvedEngine,
  written: WrittenCycle,
  read: EngineRead,
  places: CyclePlaces,
  context: Context,
): void {
  reportPressure(engine, written.maximumFiringPressure, places.limit, context);
  reportStandardFuel(written, places.fuel, context);
  reportHotMetal(engine, written, read, places.products, context);
  const speedPerS = read.speed?.value.quantity.value ?? null;
  if (written.fuel.vapour) {
    if (!written.pilot) reportLean(engine, written, places.lambda, context);
    if (read.octaneNumber && speedPerS !== null) {
      reportKnock(engine, read.octaneNumber.value.quantity, speedPerS, read.octaneNumber.entry.span, context);
    }
  } else if (!written.pilot) reportSpray(engine, written, speedPerS, places.header, context);
}

/**
 * What the exhaust leaves on metal: of the temperature that is given, or, where none is, of the exhaust behind the valve in all
 * corners. Valves may be hotter, and cooled seats colder.
 */
function reportHotMetal(
  { cycles, charge }: SolvedEngine,
  { fuel }: WrittenCycle,
  read: EngineRead,
  place: Span,
  context: Context,
): void {
  if (!hasParticles(charge.burningMol.keys())) return;
  const given = read.metalTemperature?.value.quantity.value;
  const exhaustK = cycles.map(({ cycle }) => cycle.exhaustTemperatureK);
  const metal =
    given === undefined ? { fromK: Math.min(...exhaustK), toK: Math.max(...exhaustK) } : { fromK: given, toK: given };
  const pressurePa = charge.input.exhaustPressurePa;
  const stateAt = (temperatureK: number): Equilibrium | null => {
    const state = charge.reacting.burnt({ held: 'temperature-pressure', temperatureK, pressurePa });
    return state.kind === 'none' ? null : state;
  };
  const vanadiumMolPerKg = fuel.material.elements.get('V')?.value ?? 0;
  reportMetal(metal, stateAt, vanadiumMolPerKg, place, context);
}

/** A gas has standards of its own; this one is for what is stored as a liquid, with solids in it or not. */
function reportStandardFuel({ fuel }: WrittenCycle, place: Span, context: Context): void {
  if (fuel.material.phase === 'g') return;
  const why = outsideStandard(fuel.material);
  if (why.length > 0) context.report(place, { code: 'engine/no-standard-fuel', fuel: fuel.material.name, why });
}

function reportKnock(
  { cautious }: SolvedEngine,
  octaneNumber: Quantity,
  speedPerS: number,
  place: Span,
  context: Context,
): void {
  const knock = knockOf(cautious.cycle, octaneNumber.value, speedPerS);
  if (!knock || knock.integral < 1) return;
  context.report(place, {
    code: 'engine/knock',
    integral: knock.integral,
    endGas: kelvin(knock.endGasK),
    octaneNumber,
  });
}

function reportLean({ cautious, charge }: SolvedEngine, { fuel }: WrittenCycle, place: Span, context: Context): void {
  const limit = lowerLimitOf(fuel.material);
  if (limit === null) return;
  const { temperatureK } = cautious.cycle.compressed;
  const hotLimit = lowerLimitAt(limit, temperatureK);
  const share = 1 - charge.input.freshGas.gasMol / charge.fresh.gas.gasMol;
  if (share >= hotLimit) return;
  context.report(place, {
    code: 'engine/misfire',
    why: 'lean',
    share: quantityOf(share),
    limit: quantityOf(hotLimit),
    temperature: kelvin(temperatureK),
  });
}

/** A spray that lights later than this turn of the crankshaft lights in the expansion, if at all (common practice). */
const latestDegrees = 20;

function reportSpray(
  { cautious }: SolvedEngine,
  { fuel }: WrittenCycle,
  speedPerS: number | null,
  place: Span,
  context: Context,
): void {
  const { temperatureK, pressurePa } = cautious.cycle.compressed;
  const temperature = kelvin(temperatureK);
  const autoignitionK = autoignitionOf(fuel.material);
  if (autoignitionK !== null && temperatureK < autoignitionK) {
    const autoignition = kelvin(autoignitionK);
    context.report(place, { code: 'engine/misfire', why: 'autoignition', temperature, autoignition });
    return;
  }
  if (speedPerS === null || outsideStandard(fuel.material).some((why) => why !== 'metal')) return;
  const delayS = sprayDelayS(pressurePa, temperatureK);
  const degrees = 360 * delayS * speedPerS;
  if (degrees <= latestDegrees) return;
  const delay = quantityOf(delayS, knownUnit('s').dimension);
  context.report(place, { code: 'engine/misfire', why: 'delay', delay, degrees, temperature });
}

/** Rounding of a pressure that is held at its limit. */
const roundingOfPressure = 1e-9;

function reportPressure({ cycles }: SolvedEngine, maximum: Quantity | null, place: Span, context: Context): void {
  if (!maximum) return;
  const highest = (read: (cycle: (typeof cycles)[number]['cycle']) => number): number =>
    Math.max(...cycles.map(({ cycle }) => read(cycle)));
  const compressedPa = highest((cycle) => cycle.compressed.pressurePa);
  const peakPa = highest((cycle) => cycle.burnt.pressurePa);
  const limitPa = maximum.value * (1 + roundingOfPressure);
  if (peakPa <= limitPa) return;
  const by = compressedPa > limitPa ? 'compression' : 'burning';
  const peak = quantityOf(by === 'compression' ? compressedPa : peakPa, knownUnit('Pa').dimension);
  context.report(place, { code: 'engine/firing-pressure', by, peak, maximum });
}

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
