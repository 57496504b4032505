// The steam cycle against worked examples of textbooks, its balances, and what efficiencies and pressures do to it.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import textbook from '../../../../reference/steam-cycles-textbook.json' with { type: 'json' };
import { pumped } from '../../../../../server/core/engine/steam/feed-heaters.ts';
import { steamCycle } from '../../../../../server/core/engine/steam/steam-cycle.ts';
import type {
  NoSteamCycle,
  SteamCycle,
  SteamCycleInput,
} from '../../../../../server/core/engine/steam/steam-question.ts';
import { saturatedWater } from '../../../../../server/core/engine/steam/water.ts';

const plain: SteamCycleInput = {
  boilerPressurePa: 8e6,
  steamTemperatureK: 753.15,
  condenserPressurePa: 8000,
  reheat: null,
  feedwaterTemperatureK: null,
  heaterCount: 1,
  turbineEfficiency: 1,
  efficiencyOf: 'section',
  pumpEfficiency: 1,
};

function cycleOf(input: SteamCycleInput): SteamCycle {
  const found = steamCycle(input);
  if (found.kind === 'none') throw new Error(JSON.stringify(found));
  return found;
}

interface Row {
  readonly example: string;
  readonly boilerPressurePa: number;
  readonly steamTemperatureK: number | null;
  readonly condenserPressurePa: number;
  readonly reheatPressurePa?: number;
  readonly reheatTemperatureK?: number;
  readonly heaterPressurePa?: number;
  readonly turbineEfficiency?: number;
  readonly pumpEfficiency?: number;
  readonly efficiencyOf?: string;
  readonly efficiency: number;
  readonly enthalpiesJPerKg: Readonly<Record<string, number>>;
}

/** The books give the heater's pressure, the program takes the temperature of what leaves the pump behind it. */
function feedwaterK(row: Row): number | null {
  if (row.heaterPressurePa === undefined) return null;
  const heater = saturatedWater(row.heaterPressurePa);
  if (heater.kind === 'none') throw new Error(heater.reason);
  const behind = pumped(heater.liquid, row.boilerPressurePa, row.pumpEfficiency ?? 1);
  if (behind.kind === 'none') throw new Error(behind.reason);
  return behind.temperatureK;
}

describe('worked examples', () => {
  test.each(textbook.rows as unknown as readonly Row[])('$example', (row) => {
    const { reheatPressurePa, reheatTemperatureK } = row;
    const found = cycleOf({
      ...plain,
      boilerPressurePa: row.boilerPressurePa,
      steamTemperatureK: row.steamTemperatureK,
      condenserPressurePa: row.condenserPressurePa,
      reheat:
        reheatPressurePa === undefined || reheatTemperatureK === undefined
          ? null
          : { pressurePa: reheatPressurePa, temperatureK: reheatTemperatureK },
      feedwaterTemperatureK: feedwaterK(row),
      turbineEfficiency: row.turbineEfficiency ?? 1,
      pumpEfficiency: row.pumpEfficiency ?? 1,
      efficiencyOf: row.efficiencyOf === 'group' ? 'group' : 'section',
    });
    // Books round their tables and take the pump's work as v dp: a tenth of a point, and a per mille of the enthalpies.
    expect(Math.abs(found.efficiency - row.efficiency)).toBeLessThan(0.001);
    for (const [name, enthalpyJPerKg] of Object.entries(row.enthalpiesJPerKg)) {
      const point = found.points.find((one) => one.point === name);
      expect(Math.abs((point?.state.enthalpyJPerKg ?? Number.NaN) / enthalpyJPerKg - 1)).toBeLessThan(0.001);
    }
  });

  test('a whole section of 85 % is a worse turbine than groups of 85 % each', () => {
    const input = { ...plain, turbineEfficiency: 0.85, feedwaterTemperatureK: 439 };
    const section = cycleOf(input).efficiency;
    const group = cycleOf({ ...input, efficiencyOf: 'group' }).efficiency;
    expect(group - section).toBeGreaterThan(0.003);
    expect(group - section).toBeLessThan(0.015);
  });
});

const anyInput = fc
  .record({
    boilerPressurePa: fc.double({ min: 1e6, max: 30e6, noNaN: true }),
    superheatShare: fc.double({ min: 0, max: 1, noNaN: true }),
    condenserPressurePa: fc.double({ min: 2000, max: 2e5, noNaN: true }),
    reheatShare: fc.option(fc.double({ min: 0.05, max: 0.9, noNaN: true })),
    feedShare: fc.option(fc.double({ min: 0.1, max: 0.9, noNaN: true })),
    heaterCount: fc.integer({ min: 1, max: 6 }),
    turbineEfficiency: fc.double({ min: 0.5, max: 1, noNaN: true }),
    pumpEfficiency: fc.double({ min: 0.4, max: 1, noNaN: true }),
    efficiencyOf: fc.constantFrom('section' as const, 'group' as const),
  })
  .map((any): SteamCycleInput => {
    const { boilerPressurePa, condenserPressurePa, reheatShare, feedShare } = any;
    const boiling = saturatedWater(boilerPressurePa);
    const boilsK = boiling.kind === 'none' ? 760 : boiling.temperatureK;
    const condenser = saturatedWater(condenserPressurePa);
    const coldK = (condenser.kind === 'none' ? 300 : condenser.temperatureK) + 3;
    const steamTemperatureK = boilsK + 5 + any.superheatShare * (1040 - boilsK);
    return {
      boilerPressurePa,
      condenserPressurePa,
      steamTemperatureK,
      reheat:
        reheatShare === null
          ? null
          : {
              pressurePa: condenserPressurePa * (boilerPressurePa / condenserPressurePa) ** reheatShare,
              temperatureK: 1050,
            },
      feedwaterTemperatureK: feedShare === null ? null : coldK + feedShare * (Math.min(boilsK, 600) - coldK),
      heaterCount: any.heaterCount,
      turbineEfficiency: any.turbineEfficiency,
      efficiencyOf: any.efficiencyOf,
      pumpEfficiency: any.pumpEfficiency,
    };
  });

describe('laws', () => {
  test('heat in and pump work are turbine work and heat out, and flows add up', () => {
    let solved = 0;
    fc.assert(
      fc.property(anyInput, (input) => {
        const found = steamCycle(input);
        // Reheat pressures above 16.5 MPa and some expansions end beside the critical point.
        if (found.kind === 'none') {
          expect(['outside', 'feedwater', 'reheat']).toContain(found.reason);
          return;
        }
        solved += 1;
        const inJ = found.boilerHeatJ + found.reheatJ + found.pumpWorkJ;
        const outJ = found.turbineWorkJ + found.condenserHeatJ;
        expect(Math.abs(inJ / outJ - 1)).toBeLessThan(1e-11);
        const bled = found.points.filter(({ point }) => point === 'bled-steam');
        const end = found.points.find(({ point }) => point === 'turbine-end');
        expect(bled.reduce((sum, { flow }) => sum + flow, end?.flow ?? 0)).toBeCloseTo(1, 12);
        for (const { flow } of bled) expect(flow).toBeGreaterThan(0);
        if (input.feedwaterTemperatureK !== null) {
          expect(found.feedwaterTemperatureK).toBeCloseTo(input.feedwaterTemperatureK, 6);
        }
        expect(found.efficiency).toBeGreaterThan(0);
        // Nothing beats Carnot's between the hottest steam and the condenser.
        const temperaturesK = found.points.map(({ state }) => state.temperatureK);
        expect(found.efficiency).toBeLessThan(1 - Math.min(...temperaturesK) / Math.max(...temperaturesK));
      }),
      { numRuns: 300, seed: 7 },
    );
    expect(solved).toBeGreaterThan(250);
  });

  test('a better turbine or pump never makes a worse plant', () => {
    fc.assert(
      fc.property(anyInput, fc.double({ min: 0, max: 1, noNaN: true }), (input, towards) => {
        const before = steamCycle(input);
        const better = (value: number): number => value + towards * (1 - value);
        const turbine = steamCycle({ ...input, turbineEfficiency: better(input.turbineEfficiency) });
        const pump = steamCycle({ ...input, pumpEfficiency: better(input.pumpEfficiency) });
        if (before.kind === 'none') return;
        if (pump.kind !== 'none' && input.feedwaterTemperatureK === null) {
          expect(pump.efficiency).toBeGreaterThanOrEqual(before.efficiency - 1e-12);
        }
        if (turbine.kind !== 'none' && input.reheat === null) {
          expect(turbine.efficiency).toBeGreaterThanOrEqual(before.efficiency - 1e-12);
        }
      }),
      { numRuns: 100, seed: 8 },
    );
  });

  test('more heaters come nearer to reversible feed heating', () => {
    const efficiencies = [1, 2, 3, 5, 8].map(
      (heaterCount) => cycleOf({ ...plain, feedwaterTemperatureK: 500, heaterCount }).efficiency,
    );
    expect([...efficiencies].sort((a, b) => a - b)).toEqual(efficiencies);
  });
});

describe('what is no cycle', () => {
  const cases: readonly (readonly [string, Partial<SteamCycleInput>, NoSteamCycle['reason']])[] = [
    ['condenser above boiler', { condenserPressurePa: 9e6 }, 'pressures'],
    ['reheat above boiler', { reheat: { pressurePa: 9e6, temperatureK: 753 } }, 'pressures'],
    ['efficiency of nothing', { turbineEfficiency: 0 }, 'efficiency'],
    ['efficiency above 1', { pumpEfficiency: 1.1 }, 'efficiency'],
    ['live steam that is water', { steamTemperatureK: 500 }, 'not-steam'],
    ['reheat that cools', { reheat: { pressurePa: 4e6, temperatureK: 600 } }, 'reheat'],
    ['feed water that boils', { feedwaterTemperatureK: 570 }, 'feedwater'],
    ['feed water colder than condensate', { feedwaterTemperatureK: 300 }, 'feedwater'],
    ['no heater', { feedwaterTemperatureK: 400, heaterCount: 0 }, 'heaters'],
    ['saturated steam beside the critical point', { boilerPressurePa: 20e6, steamTemperatureK: null }, 'outside'],
    ['steam hotter than the formulation', { steamTemperatureK: 1100 }, 'outside'],
    ['condenser below the triple point', { condenserPressurePa: 300 }, 'outside'],
  ];
  test.each(cases)('%s', (_name, change, reason) => {
    expect(steamCycle({ ...plain, ...change })).toMatchObject({ kind: 'none', reason });
  });
});
