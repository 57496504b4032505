// The account of a cooling path: one stay a time a phase is there, where it comes from, the gaps; and that a job gives the
// very account the path itself does.

import { describe, expect, test } from 'vitest';
import type { Burn, CoolingPath, PathEvent } from '../../../../server/core/burn/burn.ts';
import { coolingPath } from '../../../../server/core/burn/cooling-path.ts';
import { accountOfPath, burnKey, pathAccountOf } from '../../../../server/core/burn/path-account.ts';
import { burn, formulaOf, mixed, solved, stream } from './streams.ts';

const salty = mixed([0.25, stream('sodium')], [0.7, stream('gas_oil')], [0.05, stream('NaCl')]);
const never = (): boolean => false;

function phaseOf({ candidates }: CoolingPath, id: string): number {
  const phase = candidates.phases.findIndex((one) => one.id === id);
  if (phase < 0) throw new Error(id);
  return phase;
}

/** The path of a burn with other events. */
function withEvents(gas: Burn, events: readonly [PathEvent['kind'], string, number, readonly string[]][]): CoolingPath {
  const path = gas.path([900]);
  return {
    ...path,
    presentAtStart: [],
    events: events.map(([kind, id, temperatureK, others]) => ({
      kind,
      phase: phaseOf(path, id),
      temperatureK,
      with: others.map((other) => phaseOf(path, other)),
    })),
  };
}

describe('stays', () => {
  const gas = burn(salty, { amount: { by: 'lambda', lambda: 1.6 } });

  test('a phase that goes and comes again has two', () => {
    const path = withEvents(gas, [
      ['appears', 'NaCl(l)', 1200, []],
      ['leaves', 'NaCl(l)', 1000, []],
      ['appears', 'NaCl(l)', 900, []],
    ]);
    expect(accountOfPath(path).stays.map(({ id, appearsK, leavesK }) => [id, appearsK, leavesK])).toEqual([
      ['NaCl(l)', 1200, 1000],
      ['NaCl(l)', 900, null],
    ]);
  });

  test('where it comes from: its own melt, a salt of its metal beside the gas, or the gas as another goes', () => {
    const path = withEvents(gas, [
      ['appears', 'Na2CO3(cr)', 1100, ['Na2CO3(l)']],
      ['appears', 'Na2CO3(l)', 1050, ['NaOH(l)']],
      ['appears', 'H2O(l)', 320, ['NaOH(l)']],
      ['appears', 'NaCl(cr)', 300, []],
    ]);
    const origins = accountOfPath(path).stays.map(({ changedFrom, madeFrom, asGo }) => [changedFrom, madeFrom, asGo]);
    expect(origins).toEqual([
      [['Na2CO3(l)'], [], []],
      [[], ['NaOH(l)'], []],
      [[], [], ['NaOH(l)']],
      [[], [], []],
    ]);
  });
});

describe('as a job', () => {
  const input = burn(salty, { amount: { by: 'lambda', lambda: 1.6 }, frozenBelowK: 420 }).input;

  test('what has crossed to another thread and back is the account of the path', () => {
    const carried = structuredClone(pathAccountOf(structuredClone(input), never));
    expect(carried).toEqual(accountOfPath(burn(salty, input).path()));
    expect(carried?.stays.length).toBeGreaterThan(2);
    expect(carried?.carbon.length).toBeGreaterThan(20);
    expect(carried?.gaps).toEqual([]);
  });

  test('which products may form crosses too', () => {
    const barred = { ...input, barred: [formulaOf('NaCl')] };
    const stays = pathAccountOf(structuredClone(barred), never)?.stays.map(({ id }) => id) ?? [];
    expect(stays.some((id) => id.startsWith('NaCl('))).toBe(false);
    expect(pathAccountOf(input, never)?.stays.some(({ id }) => id.startsWith('NaCl('))).toBe(true);
  });

  test('stops when it is told to', () => {
    let asked = 0;
    expect(pathAccountOf(input, () => (asked += 1) > 5)).toBeNull();
    expect(asked).toBeLessThan(12);
  });

  test('stops for good, however late on the path and however shortly it is told to', () => {
    let whole = 0;
    pathAccountOf(input, () => (whole += 1) < 0);
    for (const turn of [1, Math.floor(whole / 2), whole]) {
      let asked = 0;
      expect(pathAccountOf(input, () => (asked += 1) === turn)).toBeNull();
      expect(asked).toBe(turn);
    }
  });

  test('the key tells questions apart by every number, element and product', () => {
    const fuel = new Map(input.fuel.elementMolPerKg);
    fuel.set('Na', (fuel.get('Na') ?? 0) * (1 + 1e-15 * 4));
    const others = [
      { ...input, fuel: { ...input.fuel, elementMolPerKg: fuel } },
      { ...input, barred: [formulaOf('NaCl')] },
      { ...input, barred: [formulaOf('NaCl(l)')] },
      { ...input, allowed: [formulaOf('NaCl')] },
      { ...input, frozenBelowK: 421 },
    ];
    expect(new Set([input, ...others].map(burnKey)).size).toBe(others.length + 1);
    expect(burnKey(structuredClone(input))).toBe(burnKey(input));
  });
});

test('a state that cannot be had leaves a gap that says where', () => {
  const gas = burn(salty, { amount: { by: 'lambda', lambda: 1.6 } });
  const { candidates } = solved(gas.flame());
  const path = coolingPath(
    {
      candidates,
      solve(temperatureK) {
        const state = gas.at(temperatureK);
        const isMissing = temperatureK === 800 || temperatureK === 750 || state.kind === 'frozen';
        return isMissing ? { kind: 'none', reason: 'not-finite' } : state;
      },
    },
    [900, 850, 800, 750, 700, 650],
  );
  expect([path.gaps, path.incomplete]).toEqual([[{ fromK: 850, toK: 700 }], true]);
  expect(accountOfPath(path).gaps).toEqual(path.gaps);
});
