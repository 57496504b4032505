// What is told of a cooling gas between its flame and 25 °C: each condensed phase's stay, out of what it came, where the
// carbon would be if the gas froze, and where the path is not known. Plain data from plain data: a path takes too long for
// the typing path, so that it is worked out as a job where there are workers.
// Knows no tables and no wording. Invariant: read off the path's own events and states; the same input gives the same account
// on any thread.

import type { BurnInput, CoolingPath, PathGap } from './burn.ts';
import { carbonAgainstFreezing } from './path-readings.ts';
import type { CarbonAtFreezing } from './path-readings.ts';
import { prepareBurn } from './prepare-burn.ts';

/** One condensed phase from where it comes to where it goes. A phase that comes again has another stay. */
export interface PhaseStay {
  /** `Na2CO3(l)` */
  readonly id: string;
  /** Null where it is there in the flame. */
  readonly appearsK: number | null;
  /** Null where it is still there at the path's end. */
  readonly leavesK: number | null;
  /** Condensed phases of its own composition that it comes from, by melting or a change of crystal. */
  readonly changedFrom: readonly string[];
  /** Condensed phases that go as it comes and hold an element of it that gas seldom brings. */
  readonly madeFrom: readonly string[];
  /** Others that go as it comes. */
  readonly asGo: readonly string[];
}

export interface PathAccount {
  /** In falling temperature. */
  readonly stays: readonly PhaseStay[];
  readonly carbon: readonly CarbonAtFreezing[];
  readonly gaps: readonly PathGap[];
}

/** The account of the default path of a question, as a job; null where it was told to stop. A charge at fault has none. */
export function pathAccountOf(input: BurnInput, shouldStop: () => boolean): PathAccount | null {
  let isStopped = false;
  const burn = prepareBurn(input, () => (isStopped ||= shouldStop()));
  if (burn.kind === 'fault') return { stays: [], carbon: [], gaps: [] };
  const account = accountOfPath(burn.path());
  return isStopped ? null : account;
}

/** Says all of a question: equal keys, equal questions. */
export function burnKey(input: BurnInput): string {
  return JSON.stringify(input, (_, value: unknown) =>
    value instanceof Map ? [...(value as Map<unknown, unknown>)] : value,
  );
}

/** The account of a path that is known. */
export function accountOfPath(path: CoolingPath): PathAccount {
  return { stays: staysOf(path), carbon: carbonAgainstFreezing(path), gaps: path.gaps };
}

function staysOf({ candidates, presentAtStart, events }: CoolingPath): readonly PhaseStay[] {
  const idOf = (phase: number): string => candidates.phases[phase]?.id ?? '';
  const compositionOf = (phase: number): ReadonlyMap<string, number> =>
    candidates.phases[phase]?.formula.composition ?? new Map<string, number>();
  const none = { changedFrom: [], madeFrom: [], asGo: [] };
  const stays: PhaseStay[] = presentAtStart.map((phase) => ({
    id: idOf(phase),
    appearsK: null,
    leavesK: null,
    ...none,
  }));
  for (const { kind, phase, temperatureK, with: others } of events) {
    const id = idOf(phase);
    if (kind === 'leaves') {
      const open = stays.findLastIndex((stay) => stay.id === id && stay.leavesK === null);
      const stay = stays[open];
      if (stay) stays[open] = { ...stay, leavesK: temperatureK };
      continue;
    }
    const own = compositionOf(phase);
    const changedFrom = others.filter((other) => isSameComposition(own, compositionOf(other)));
    const madeFrom = others.filter((other) => !changedFrom.includes(other) && sharesElement(own, compositionOf(other)));
    const asGo = others.filter((other) => !changedFrom.includes(other) && !madeFrom.includes(other));
    stays.push({
      id,
      appearsK: temperatureK,
      leavesK: null,
      changedFrom: changedFrom.map(idOf),
      madeFrom: madeFrom.map(idOf),
      asGo: asGo.map(idOf),
    });
  }
  return stays;
}

function isSameComposition(one: ReadonlyMap<string, number>, other: ReadonlyMap<string, number>): boolean {
  return one.size === other.size && [...one].every(([symbol, atoms]) => other.get(symbol) === atoms);
}

/** Of a burnt gas, what it brings and takes up everywhere: sharing these says nothing of where a phase comes from. */
const broughtByGas: ReadonlySet<string> = new Set(['H', 'C', 'N', 'O']);

function sharesElement(one: ReadonlyMap<string, number>, other: ReadonlyMap<string, number>): boolean {
  return [...one.keys()].some((symbol) => !broughtByGas.has(symbol) && other.has(symbol));
}
