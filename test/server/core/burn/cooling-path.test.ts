// Cooling paths: each event lies between states that bear it out, whatever list of temperatures found it.

import { describe, expect, test } from 'vitest';
import type { Burn, CoolingPath, PathEvent } from '../../../../server/core/burn/burn.ts';
import { condensedPhases, cooledPoint, eventsBetween, hiddenVisit } from '../../../../server/core/burn/condensation.ts';
import type { StateAt } from '../../../../server/core/burn/condensation.ts';
import { defaultPathK } from '../../../../server/core/burn/prepare-burn.ts';
import type { Equilibrium } from '../../../../server/core/equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../../../../server/core/quantity/constants.ts';
import { phaseOfId, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import { waterSaturationPressurePa } from '../../../../server/core/substance/water-saturation.ts';
import { handMadeState } from './hand-made-state.ts';
import { burn, mixed, solved, stream } from './streams.ts';

/** Sodium, gas oil, a little salt and potassium: carbonates, chlorides, water. */
const salty = mixed(
  [0.25, stream('sodium')],
  [0.05, stream('potassium')],
  [0.68, stream('gas_oil')],
  [0.02, stream('NaCl')],
);
const lean = burn(salty, { amount: { by: 'lambda', lambda: 1.6 } });
const list = (fromK: number, toK: number, stepK: number): number[] =>
  Array.from({ length: Math.floor((fromK - toK) / stepK) + 1 }, (_, index) => fromK - index * stepK);

function named(path: CoolingPath, event: PathEvent): string {
  return `${event.kind} ${path.candidates.phases[event.phase]?.id ?? '?'}`;
}

function presentAt(gas: Burn, temperatureK: number): readonly number[] {
  return condensedPhases(solved(gas.at(temperatureK)));
}

describe('events of a salty gas', () => {
  const path = lean.path(list(1800, 300, 25));

  test('there are some, and all of the path was solved', () => {
    expect(path.incomplete).toBe(false);
    expect(path.presentAtStart).toEqual([]);
    expect(path.events.map((event) => named(path, event))).toContain('appears Na2CO3(l)');
    expect(path.events.map((event) => named(path, event))).toContain('appears H2O(l)');
  });

  test('states solved cold on either side bear each of them out', () => {
    for (const event of path.events) {
      const above = presentAt(lean, event.temperatureK + 0.02).includes(event.phase);
      const below = presentAt(lean, event.temperatureK - 0.02).includes(event.phase);
      expect([named(path, event), event.temperatureK, above, below]).toEqual([
        named(path, event),
        event.temperatureK,
        event.kind === 'leaves',
        event.kind === 'appears',
      ]);
    }
  });

  test('played back from the start they give what is there at every temperature of the list', () => {
    const there = new Set(path.presentAtStart);
    const events = [...path.events];
    path.temperaturesK.forEach((temperatureK, index) => {
      while (events[0] !== undefined && events[0].temperatureK > temperatureK) {
        const event = events.shift();
        if (event?.kind === 'appears') there.add(event.phase);
        else if (event !== undefined) there.delete(event.phase);
      }
      const present = condensedPhases(solved(path.states[index] ?? null));
      expect([temperatureK, present]).toEqual([temperatureK, [...there].sort((a, b) => a - b)]);
    });
  });

  test('another list finds the same events at the same temperatures', () => {
    const other = lean.path(list(1790, 300, 12.5));
    expect(other.events.map((event) => named(other, event))).toEqual(path.events.map((event) => named(path, event)));
    other.events.forEach((event, index) => {
      expect(Math.abs(event.temperatureK - (path.events[index]?.temperatureK ?? 0))).toBeLessThan(0.01);
    });
  });

  test('the order of the list does not matter, nor what was asked before', () => {
    expect(lean.path(list(1800, 300, 25).reverse())).toEqual(path);
  });

  test('sodium carbonate freezes where its crystal and its melt meet', () => {
    const melt = path.events.find((event) => named(path, event) === 'leaves Na2CO3(l)');
    const crystal = phaseOfId('Na2CO3(cr)');
    const liquid = phaseOfId('Na2CO3(l)');
    if (melt === undefined || crystal === undefined || liquid === undefined) throw new Error();
    const gap = (temperatureK: number): number =>
      (propertiesOfPhase(crystal, temperatureK)?.gibbsJPerMol ?? 0) -
      (propertiesOfPhase(liquid, temperatureK)?.gibbsJPerMol ?? 0);
    expect(gap(melt.temperatureK + 0.01)).toBeGreaterThan(0);
    expect(gap(melt.temperatureK - 0.01)).toBeLessThan(0);
    expect(melt.with.map((phase) => path.candidates.phases[phase]?.id)).toEqual(['Na2CO3(cr)']);
  });
});

test('a phase with nothing but rounding in it is no event', () => {
  const lithium = mixed([0.305, stream('lithium')], [0.695, stream('NaCl')]);
  const path = burn(lithium, { amount: { by: 'lambda', lambda: 2.05 }, oxidant: stream('air') }).path(
    list(900, 300, 25),
  );
  expect(path.incomplete).toBe(false);
  expect(path.events.map((event) => named(path, event))).not.toContain('appears Na2CO3(cr)');
});

describe('water', () => {
  const clean = burn(stream('methane'), { amount: { by: 'lambda', lambda: 1.1 } });
  const path = clean.path();

  test('the dew point is where its partial pressure meets saturation', () => {
    expect(path.events.map((event) => named(path, event))).toEqual(['appears H2O(l)']);
    const dewK = path.events[0]?.temperatureK ?? Number.NaN;
    const state = solved(clean.at(dewK + 0.02));
    const water = state.candidates.phases.findIndex(({ id }) => id === 'H2O(g)');
    const partialPa = (1e5 * (state.amountsMol[water] ?? 0)) / state.gasMol;
    // The tables' water lies within 0.3 % of the steam tables' vapour pressure here.
    expect(partialPa / (waterSaturationPressurePa(dewK) ?? Number.NaN)).toBeCloseTo(1, 2);
    expect(dewK).toBeGreaterThan(328);
    expect(dewK).toBeLessThan(334);
  });

  test('the path runs from the flame to 25 °C', () => {
    expect(path.temperaturesK).toHaveLength(60);
    expect(path.temperaturesK[0]).toBe(solved(clean.flame()).temperatureK);
    expect(path.temperaturesK.at(-1)).toBeCloseTo(298.15, 9);
    expect(defaultPathK(298.15).every((temperatureK) => temperatureK === 298.15)).toBe(true);
  });
});

describe('a frozen stretch', () => {
  const frozen = burn(salty, { amount: { by: 'lambda', lambda: 1.6 }, frozenBelowK: 900 });
  const path = frozen.path(list(1800, 300, 40));

  test('has no events, and those above are as without it', () => {
    expect(path.events.every((event) => event.temperatureK >= 900)).toBe(true);
    const free = lean.path(list(1800, 300, 40));
    const above = free.events.filter((event) => event.temperatureK > 900);
    expect(path.events.map((event) => named(path, event))).toEqual(above.map((event) => named(free, event)));
  });

  test('its states are frozen', () => {
    path.states.forEach((state, index) => {
      expect(state.kind).toBe((path.temperaturesK[index] ?? 0) <= 900 ? 'frozen' : 'equilibrium');
    });
  });
});

describe('the search for events', () => {
  /** Water whose affinity is a parabola: 0.5 at 335 K and nothing 7.07 K to either side. */
  const affinityAt = (temperatureK: number): number => 0.5 - ((temperatureK - 335) / 10) ** 2;
  let asked = 0;
  const stateAt: StateAt = (temperatureK): Equilibrium => {
    asked += 1;
    const liquid = phaseOfId('H2O(l)');
    const gibbs = (liquid && propertiesOfPhase(liquid, temperatureK)?.gibbsJPerMol) ?? Number.NaN;
    const affinity = affinityAt(temperatureK);
    const state = handMadeState(['H', 'O'], { 'H2O(g)': 1, 'H2O(l)': Math.max(0, affinity) }, temperatureK);
    const potential = (gibbs / (molarGasConstantJPerMolK * temperatureK) + Math.min(0, affinity)) / 2;
    return {
      ...state,
      potentials: Float64Array.from(state.candidates.elements, (symbol) => (symbol === 'H' ? potential : 0)),
    };
  };
  const pointAt = (temperatureK: number): ReturnType<typeof cooledPoint> =>
    cooledPoint(solved(stateAt(temperatureK, undefined as never)));

  test('closes in on a change in few states', () => {
    asked = 0;
    const { events, complete } = eventsBetween(pointAt(370), pointAt(335), pointAt(380), stateAt);
    expect(complete).toBe(true);
    expect(events.map(({ kind }) => kind)).toEqual(['appears']);
    expect(Math.abs((events[0]?.temperatureK ?? 0) - (335 + Math.sqrt(50)))).toBeLessThan(0.005);
    // Bisection alone would take 12 from a bracket of 35 K, besides the three to start with.
    expect(asked).toBeLessThanOrEqual(3 + 12);
  });

  test('notices a phase that comes and goes between two temperatures', () => {
    const visit = hiddenVisit(pointAt(350), pointAt(320), pointAt(365), stateAt);
    expect(visit?.state.temperatureK).toBeCloseTo(335, 6);
    expect(hiddenVisit(pointAt(380), pointAt(350), pointAt(395), stateAt)).toBeUndefined();
  });
});

test('each state says by itself which of its phases lean on data carried on', () => {
  const frozen = burn(salty, { amount: { by: 'lambda', lambda: 1.6 }, frozenBelowK: 900 });
  const seen = new Set<string>();
  for (const state of [...lean.path(list(2600, 220, 20)).states, ...frozen.path(list(2000, 160, 20)).states]) {
    if (state.kind === 'none') throw new Error(state.reason);
    const { candidates, amountsMol, temperatureK, massKg, extrapolated } = state;
    const beyond = candidates.phases.flatMap(({ id, validK: [fromK, toK], molarMassKgPerMol }, index) => {
      const isOutside = temperatureK < fromK - 1e-6 || temperatureK > toK + 1e-6;
      if (!isOutside || ((amountsMol[index] ?? NaN) * molarMassKgPerMol) / massKg <= 1e-6) return [];
      seen.add(id);
      return [index];
    });
    expect([temperatureK, extrapolated]).toEqual([temperatureK, beyond]);
  }
  // Some do and most do not, or this shows nothing.
  expect(seen.size).toBeGreaterThan(0);
  expect(lean.path([1500]).states.map((state) => (state.kind === 'none' ? null : state.extrapolated))).toEqual([[]]);
});
