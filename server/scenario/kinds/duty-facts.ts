// What is to be said of a duty that could be read: loads above the rating or outside what is known of an engine, speeds above
// the service speed, entries that no leg uses, a leg that is spelt almost like an entry.
// Works nothing out but the plan at its own values. Invariant: one cause, one finding, at the leg that asks for it.

import type { Entry, Span } from '../../../grammar/tree.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import type { WrittenDuty } from '../duty-machine.ts';
import type { DutyMachine } from '../machinery.ts';

export interface LegPlaces {
  readonly header: Span;
  readonly legs: readonly Entry[];
  readonly cycle: Entry | null;
  readonly serviceSpeed: Entry | null;
  /** Hotel load and auxiliaries. */
  readonly standing: readonly Entry[];
}

/** A leg whose name is one edit from an entry may be that entry. */
export function reportLegName({ words, wordsSpan }: Entry, meant: readonly string[], context: Context): void {
  const close = meant.filter((name) => isOneEdit(words, name));
  if (close.length > 0) context.report(wordsSpan, { code: 'duty/leg-name', leg: words, near: close });
}

export function reportDuty(machine: DutyMachine, written: WrittenDuty, places: LegPlaces, context: Context): void {
  const values = machine.uncertain.map(({ value }) => value);
  const plan = machine.planAt(values);
  const rated = machine.ratedPowerAt(values);
  const told = new Set<string>();
  for (const [index, leg] of plan.entries()) {
    const entry = places.cycle ?? places.legs[index];
    const name = machine.legNames[index] ?? '';
    const span = entry?.span ?? places.header;
    const isOwn = (engine: number): boolean => {
      const own = machine.engines[engine]?.name;
      return (
        written.cycle !== null || (written.legs[index]?.leg.engines.some((one) => one.engine.name === own) ?? false)
      );
    };
    for (const engine of new Set(leg.demands.map((demand) => demand.engine))) {
      const standing = isOwn(engine) ? undefined : places.standing[0];
      // What asks the same on every leg is told once, where it is asked.
      const key = standing ? `standing ${engine}` : `${index} ${engine}`;
      const powers = leg.demands.filter((demand) => demand.engine === engine).map(({ powerW }) => powerW);
      if (told.has(key)) continue;
      const isTold = reportLoads(machine, engine, powers, rated[engine] ?? NaN, name, standing?.span ?? span, context);
      if (isTold) told.add(key);
    }
    reportSpeed(leg.speedMPerS, name, written, span, context);
  }
  reportUnused(machine, written, places, context);
}

/** Says where an engine is asked for more than its rating, or for what is not known of it. */
function reportLoads(
  { engines }: DutyMachine,
  engine: number,
  powers: readonly number[],
  ratedW: number,
  leg: string,
  span: Span,
  context: Context,
): boolean {
  const named = engines[engine];
  const loads = powers.map((powerW) => powerW / ratedW).filter(Number.isFinite);
  if (!named?.machine || loads.length === 0) return false;
  const watts = (value: number): ReturnType<typeof quantityOf> => quantityOf(value, knownUnit('W').dimension);
  const most = Math.max(...loads);
  if (most > 1 + rounding) {
    const [power, rating] = [watts(most * ratedW), watts(ratedW)];
    context.report(span, { code: 'engine/overload', leg, engine: named.name, power, rating });
    return true;
  }
  const burning = named.machine.burning(named.machine.fuel);
  const consumption = burning.kind === 'burning' ? burning.consumption : null;
  if (!consumption) return false;
  const outside = loads.filter((load) => load > 0 && consumption.heatRateAt(load).range !== 'within');
  const idles = loads.some((load) => load === 0) && consumption.idleFuelW === null;
  const [load] = outside;
  if (load !== undefined) {
    context.report(span, {
      code: 'engine/measured-range',
      leg,
      engine: named.name,
      load,
      fromLoad: consumption.fromLoad,
      toLoad: consumption.toLoad,
    });
  } else if (idles) context.report(span, { code: 'engine/no-idle', leg, engine: named.name });
  return load !== undefined || idles;
}

function reportSpeed(
  speedMPerS: number | null,
  leg: string,
  { service }: WrittenDuty,
  span: Span,
  context: Context,
): void {
  if (speedMPerS === null || !service || !(speedMPerS > service.speed.value * (1 + rounding))) return;
  const speed = quantityOf(speedMPerS, knownUnit('kn').dimension);
  context.report(span, { code: 'duty/speed', leg, speed, service: service.speed });
}

/** Entries that nothing in the duty uses; and legs that need one that is not there. */
function reportUnused(machine: DutyMachine, written: WrittenDuty, places: LegPlaces, context: Context): void {
  const needsSpeed = written.legs.findIndex(
    ({ leg }) => leg.engines[0]?.by === 'speed' || (leg.distance && !leg.speed),
  );
  const usesSpeed = needsSpeed >= 0 || written.legs.some(({ leg }) => leg.speed !== null || leg.calm);
  if (needsSpeed >= 0 && !written.service) {
    context.report(places.legs[needsSpeed]?.span ?? places.header, {
      code: 'name/missing-entry',
      kind: 'duty',
      name: machine.name,
      entries: ['service speed'],
      all: true,
    });
  }
  if (places.serviceSpeed && !usesSpeed) {
    context.report(places.serviceSpeed.wordsSpan, { code: 'duty/unused', entry: places.serviceSpeed.words });
  }
  for (const entry of written.cycle ? places.standing : []) {
    context.report(entry.wordsSpan, { code: 'duty/unused', entry: entry.words });
  }
}

const rounding = 1e-9;

/** One letter more, less, other, or two exchanged. */
function isOneEdit(left: string, right: string): boolean {
  if (Math.abs(left.length - right.length) > 1) return false;
  let start = 0;
  while (start < left.length && left[start] === right[start]) start += 1;
  const [leftRest, rightRest] = [left.slice(start), right.slice(start)];
  return (
    leftRest.slice(1) === rightRest ||
    rightRest.slice(1) === leftRest ||
    leftRest.slice(1) === rightRest.slice(1) ||
    (leftRest[0] === rightRest[1] && leftRest[1] === rightRest[0] && leftRest.slice(2) === rightRest.slice(2))
  );
}
