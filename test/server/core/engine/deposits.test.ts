// What products do to hot metal: sulphate in its windows, carbonate molten and solid, nothing from a clean fuel.
import { describe, expect, test } from 'vitest';
import type { BurnStream, MatterState } from '../../../../server/core/burn/burn.ts';
import { attacksOn } from '../../../../server/core/engine/deposits.ts';
import type { AttackKind } from '../../../../server/core/engine/deposits.ts';
import { burn, mixed, stream } from '../burn/streams.ts';

function kindsAt(
  parts: readonly (readonly [number, BurnStream])[],
  celsius: number | readonly [number, number],
  vanadium = 0,
): readonly AttackKind[] {
  const burning = burn(mixed(...parts), { amount: { by: 'lambda', lambda: 2 } });
  const stateAt = (temperatureK: number): MatterState | null => {
    const state = burning.at(temperatureK);
    return state.kind === 'none' ? null : state;
  };
  const [fromC, toC] = typeof celsius === 'number' ? [celsius, celsius] : celsius;
  return attacksOn({ fromK: fromC + 273.15, toK: toC + 273.15 }, stateAt, vanadium).map(({ kind }) => kind);
}

const clean = [[1, stream('gas_oil')]] as const;
const salty = [
  [0.998, stream('gas_oil')],
  [0.001, stream('sulfur')],
  [0.001, stream('NaCl')],
] as const;
const carbonate = [
  [0.3, stream('sodium')],
  [0.7, stream('gas_oil')],
] as const;

describe('hot metal', () => {
  test('meets nothing from a clean fuel', () => {
    expect(kindsAt(clean, [400, 1000])).toEqual([]);
  });

  test('meets sulphate of type II, then of type I, then of neither', () => {
    expect(kindsAt(salty, 600)).not.toContain('sulphate-type-2');
    expect(kindsAt(salty, 700)).toContain('sulphate-type-2');
    expect(kindsAt(salty, 700)).not.toContain('sulphate-type-1');
    expect(kindsAt(salty, 860)).toContain('sulphate-type-1');
    expect(kindsAt(salty, 860)).not.toContain('sulphate-type-2');
    // The windows' ends as they are written down, 650, 800 and 950 °C.
    expect(kindsAt(salty, 645)).not.toContain('sulphate-type-2');
    expect(kindsAt(salty, 655)).toContain('sulphate-type-2');
    expect(kindsAt(salty, 795)).not.toContain('sulphate-type-1');
    expect(kindsAt(salty, 805)).toContain('sulphate-type-1');
    // Sulphate of so little alkali has evaporated there.
    expect(kindsAt(salty, 1300)).toEqual([]);
  });

  test('meets sulphate where it is at least 2 % of the deposit', () => {
    const withSulphur = (share: number): readonly (readonly [number, BurnStream])[] => [
      [0.7 - share, stream('gas_oil')],
      [share, stream('sulfur')],
      [0.3, stream('sodium')],
    ];
    // 13 mol of sodium make 690 g of carbonate; 0.07 mol of sulphur makes 10 g of sulphate of it, 0.18 mol 26 g.
    expect(kindsAt(withSulphur(0.0022), 700)).not.toContain('sulphate-type-2');
    expect(kindsAt(withSulphur(0.0058), 700)).toContain('sulphate-type-2');
    // Enough that it lasts to the end of its window.
    expect(kindsAt(withSulphur(0.1), 945)).toContain('sulphate-type-1');
    expect(kindsAt(withSulphur(0.1), 955)).not.toContain('sulphate-type-1');
  });

  test('is attacked by carbonate where it melts, which is no matter of sulphur', () => {
    expect(kindsAt(carbonate, 600)).not.toContain('basic');
    const molten = kindsAt(carbonate, 900);
    expect(molten).toContain('basic');
    expect(molten).toContain('sticky');
    expect(molten).not.toContain('sulphate-type-1');
  });

  test('meets vanadates where the fuel has vanadium, whatever else it has', () => {
    expect(kindsAt(clean, 700, 1e-3)).toEqual(['vanadate']);
    expect(kindsAt(clean, 585, 1e-3)).toEqual([]);
    expect(kindsAt(clean, 595, 1e-3)).toEqual(['vanadate']);
    expect(kindsAt(clean, 945, 1e-3)).toEqual(['vanadate']);
    expect(kindsAt(clean, 955, 1e-3)).toEqual([]);
  });

  test('is looked at between its ends, and tells where it is met', () => {
    const burning = burn(mixed(...carbonate), { amount: { by: 'lambda', lambda: 2 } });
    const stateAt = (temperatureK: number): MatterState | null => {
      const state = burning.at(temperatureK);
      return state.kind === 'none' ? null : state;
    };
    const found = attacksOn({ fromK: 700, toK: 1300 }, stateAt).find(({ kind }) => kind === 'basic');
    // Pure sodium carbonate melts at 851 °C.
    expect(found?.fromK).toBeGreaterThan(1100);
    // Looked at every 100 K, told by what the deposit's own melting says.
    expect(found?.fromK).toBe(found?.melting?.firstMeltingK);
    expect(found?.toK).toBe(1300);
    expect(found?.salts).toContain('Na2CO3');
  });
});
