// The states of a cooling gas at falling temperatures, each started from the one before, and every condensed phase that
// comes or goes between them.
// Knows how to ask for a state and when a composition freezes, nothing of fuels. Invariant: the answer depends on the list
// of temperatures alone: its first state starts cold, so no earlier question reaches into it.

import type { CandidateSet } from '../equilibrium/candidates.ts';
import type { Equilibrium } from '../equilibrium/equilibrium.ts';
import type { BurnStateOrNone, CoolingPath, FrozenState, NoState, PathEvent, PathGap } from './burn.ts';
import { cooledPoint, eventsBetween, hiddenVisit } from './condensation.ts';
import type { CooledPoint } from './condensation.ts';

/** What a path needs to know of its gas. */
export interface PathGas {
  readonly candidates: CandidateSet;
  /** At a temperature in K; cold without `near`. */
  readonly solve: (temperatureK: number, near?: Equilibrium) => Equilibrium | NoState;
  /** Where the composition freezes, and the states below it. */
  readonly frozen?: {
    readonly atK: number;
    readonly from: Equilibrium | NoState;
    readonly state: (from: Equilibrium, temperatureK: number) => FrozenState;
  };
}

/** The path over the temperatures given, from the highest to the lowest. */
export function coolingPath(gas: PathGas, temperaturesK: readonly number[]): CoolingPath {
  const falling = [...temperaturesK].sort((a, b) => b - a);
  const freezeK = gas.frozen?.atK ?? -Infinity;
  const states: BurnStateOrNone[] = [];
  const points: CooledPoint[] = [];
  const missing: PathGap[] = [];
  let isStopped = false;
  for (const [index, temperatureK] of falling.entries()) {
    const around = { fromK: falling[index - 1] ?? temperatureK, toK: falling[index + 1] ?? temperatureK };
    if (temperatureK <= freezeK && gas.frozen !== undefined) {
      const { from, state } = gas.frozen;
      states.push(from.kind === 'equilibrium' ? state(from, temperatureK) : from);
      if (from.kind === 'none') missing.push(around);
      continue;
    }
    const solved = gas.solve(temperatureK, points.at(-1)?.state);
    states.push(solved);
    if (solved.kind === 'equilibrium') points.push(cooledPoint(solved));
    else missing.push(around);
    isStopped ||= solved.kind === 'none' && solved.reason === 'stopped';
    if (isStopped) break;
  }
  // The last stretch of live composition ends where it freezes, wherever the list's own temperatures lie.
  const from = gas.frozen?.from;
  const last = points.at(-1);
  const reachesFreezing = falling.some((temperatureK) => temperatureK <= freezeK);
  if (from?.kind === 'equilibrium' && last !== undefined && reachesFreezing && from.candidates === gas.candidates) {
    if (from.temperatureK < last.state.temperatureK) points.push(cooledPoint(from));
  }
  const events: PathEvent[] = [];
  for (let index = 1; index < points.length; index += 1) {
    const found = eventsOfStep(gas, points, index);
    events.push(...found.events);
    const [upper, lower] = [points[index - 1], points[index]];
    if (!found.complete && upper && lower)
      missing.push({ fromK: upper.state.temperatureK, toK: lower.state.temperatureK });
  }
  return {
    candidates: gas.candidates,
    temperaturesK: falling,
    states,
    presentAtStart: points[0]?.present ?? [],
    events,
    gaps: joined(missing),
    incomplete: isStopped || missing.length > 0,
  };
}

/** Gaps from the hottest down, those that meet as one. */
function joined(gaps: readonly PathGap[]): readonly PathGap[] {
  const falling = [...gaps].sort((a, b) => b.fromK - a.fromK);
  const whole: PathGap[] = [];
  for (const gap of falling) {
    const last = whole.at(-1);
    if (last && gap.fromK >= last.toK) whole[whole.length - 1] = { ...last, toK: Math.min(last.toK, gap.toK) };
    else whole.push(gap);
  }
  return whole;
}

/** Events between a point and the one before it. */
function eventsOfStep(gas: PathGas, points: readonly CooledPoint[], index: number): ReturnType<typeof eventsBetween> {
  const upper = points[index - 1];
  const lower = points[index];
  if (upper === undefined || lower === undefined) return { events: [], complete: false };
  const above = points[index - 2];
  const below = points[index + 1];
  const isUnchanged = String(upper.present) === String(lower.present);
  if (!isUnchanged) return eventsBetween(upper, lower, above, gas.solve);
  for (const beside of [above, below]) {
    const visit = beside && hiddenVisit(upper, lower, beside, gas.solve);
    if (visit === undefined) continue;
    const coming = eventsBetween(upper, visit, above, gas.solve);
    const going = eventsBetween(visit, lower, undefined, gas.solve);
    return { events: [...coming.events, ...going.events], complete: coming.complete && going.complete };
  }
  return { events: [], complete: true };
}
