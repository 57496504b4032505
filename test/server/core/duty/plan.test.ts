// Duties as core works them out: the propeller law and its inverse, plans of legs, what they add up to, test cycles.
import { describe, expect, test } from 'vitest';
import { loadHistogram, planOf, sumsOf, type DutyInput, type LegInput } from '../../../../server/core/duty/plan.ts';
import { loadAtSpeed, speedAtLoad } from '../../../../server/core/duty/propeller-law.ts';
import { loadsOfModes, testCycleNamed, testCycles } from '../../../../server/core/duty/test-cycles.ts';
import { noxLimitKgPerJ, noxTiers } from '../../../../server/core/engine/nox-tier.ts';
import tiers from '../../../reference/nox-tiers.json' with { type: 'json' };
import cycles from '../../../reference/test-cycles.json' with { type: 'json' };

const service = { speedMPerS: 6.5, load: 0.85, seaMargin: 0.15, fouling: 0, exponent: 3 };
const idleLeg: LegInput = {
  timeS: 3600,
  distanceM: null,
  speedMPerS: null,
  calm: false,
  engines: [],
  isOnShore: false,
  shoreW: 0,
};
const duty: DutyInput = {
  ratedPowerW: [6.4e6, 900e3],
  legs: [
    { ...idleLeg, timeS: 7200, engines: [{ engine: 0, asked: { by: 'load', load: 0.5 } }] },
    { ...idleLeg, timeS: null, distanceM: 65e3, speedMPerS: 6.5, engines: [{ engine: 0, asked: { by: 'speed' } }] },
    { ...idleLeg, engines: [{ engine: 1, asked: { by: 'power', powerW: 220e3 } }] },
  ],
  service,
  hotel: [{ engine: 1, asked: { by: 'power', powerW: 180e3 } }],
  auxiliaries: [],
  boilerHeatW: [],
};

describe('the propeller law', () => {
  test('gives the service load at the service speed, and an eighth of it at half speed', () => {
    expect(loadAtSpeed(service, 6.5, false)).toBeCloseTo(0.85, 12);
    expect(loadAtSpeed(service, 3.25, false)).toBeCloseTo(0.85 / 8, 12);
    expect(loadAtSpeed(service, 6.5, true)).toBeCloseTo(0.85 / 1.15, 12);
    expect(loadAtSpeed({ ...service, fouling: 0.1, exponent: 4 }, 3.25, false)).toBeCloseTo((0.85 * 1.1) / 16, 12);
  });

  test.each([2.5, 3, 4.2])('is undone by its inverse, exponent %f', (exponent) => {
    for (const calm of [true, false]) {
      const point = { ...service, exponent, fouling: 0.08 };
      expect(speedAtLoad(point, loadAtSpeed(point, 4.4, calm), calm)).toBeCloseTo(4.4, 12);
    }
  });
});

describe('a plan', () => {
  const plan = planOf(duty);

  test('has times from distances, powers from speeds, and the hotel load on every leg', () => {
    expect(plan.map(({ timeS }) => timeS)).toEqual([7200, 1e4, 3600]);
    expect(plan[1]?.demands[0]?.powerW).toBeCloseTo(0.85 * 6.4e6, 6);
    expect(plan.map(({ demands }) => demands.find(({ engine }) => engine === 1)?.powerW)).toEqual([
      180e3, 180e3, 400e3,
    ]);
  });

  test('adds up: legs, engines and the histogram hold the same work', () => {
    const { energyJ, runningS } = sumsOf(plan, duty.ratedPowerW);
    const byEngine = [0, 1].map((engine) => sumsOf(plan, duty.ratedPowerW, engine));
    expect(byEngine.reduce((sum, one) => sum + one.energyJ, 0)).toBeCloseTo(energyJ, 3);
    const bins = loadHistogram(plan, duty.ratedPowerW);
    expect(bins.reduce((sum, bin) => sum + bin.energyJ, 0)).toBeCloseTo(energyJ, 3);
    expect(bins.reduce((sum, bin) => sum + bin.timeS, 0)).toBeCloseTo(runningS, 6);
    expect(bins[0]).toMatchObject({ engine: 0, fromLoad: 0.4, toLoad: 0.5, timeS: 7200 });
  });

  test('what is not known makes only what rests on it unknown', () => {
    const unknown = planOf({ ...duty, service: null });
    expect(unknown[1]?.demands[0]?.powerW).toBeNaN();
    expect(unknown[0]?.demands[0]?.powerW).toBe(3.2e6);
    expect(unknown[1]?.timeS).toBe(1e4);
  });

  test('on the shore the hotel load comes from there', () => {
    const [leg] = planOf({ ...duty, legs: [{ ...idleLeg, isOnShore: true, shoreW: 50e3 }] });
    expect(leg?.demands).toEqual([]);
    expect(leg?.shoreJ).toBe(230e3 * 3600);
  });

  test('on the shore it comes from there also while an engine runs', () => {
    const running = { ...idleLeg, engines: [{ engine: 0, asked: { by: 'power', powerW: 100e3 } as const }] };
    const auxiliaries = [{ engine: 1, asked: { by: 'power', powerW: 40e3 } as const }];
    const [leg] = planOf({ ...duty, auxiliaries, legs: [{ ...running, isOnShore: true, shoreW: 300e3 }] });
    expect(leg?.demands).toEqual([
      { engine: 0, timeS: 3600, powerW: 100e3 },
      { engine: 1, timeS: 3600, powerW: 40e3 },
    ]);
    expect(leg?.shoreJ).toBe(480e3 * 3600);
  });

  test('a distance at a load takes the time of the speed that the load makes', () => {
    const asked = { ...idleLeg, timeS: null, distanceM: 65e3 };
    const [leg] = planOf({
      ...duty,
      legs: [{ ...asked, engines: [{ engine: 0, asked: { by: 'load', load: 0.85 / 8 } }] }],
    });
    expect(leg?.timeS).toBeCloseTo(2e4, 6);
  });
});

describe('test cycles', () => {
  test('all that are asked for are there, each with factors that add up to 1', () => {
    expect(testCycles.map(({ name }) => name)).toEqual('C1 C2 D1 D2 E1 E2 E3 E4 E5 F G1 G2 G3 H'.split(' '));
    for (const { modes } of testCycles) expect(modes.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 12);
  });

  test.each(cycles.rows)('$cycle has the modes of $readIn ($provenance)', ({ cycle, modes }) => {
    const found = testCycleNamed(cycle)?.modes.map(({ speed, share, weight }) => [speed, share, weight]);
    expect(found).toEqual(modes);
  });

  test('torque at the intermediate speed makes power in proportion to the speed', () => {
    const cycle = testCycleNamed('C1');
    expect(cycle && loadsOfModes(cycle, 0.65).map((load) => Number(load.toFixed(4)))).toEqual([
      1, 0.75, 0.5, 0.1, 0.65, 0.4875, 0.325, 0,
    ]);
  });
});

describe('limits of nitrogen oxides', () => {
  test.each(tiers.rows)('tier $tier', ({ tier, below130rpm, factor, exponent, from2000rpm }) => {
    const known = noxTiers.find((one) => one === tier);
    const limit = (rpm: number): number => (known ? noxLimitKgPerJ(known, rpm) * 3.6e9 : NaN);
    expect(limit(100)).toBeCloseTo(below130rpm, 12);
    expect(limit(720)).toBeCloseTo(factor * 720 ** exponent, 12);
    expect(limit(2000)).toBeCloseTo(from2000rpm, 12);
    // The pieces meet to the digits they are given with.
    expect(limit(130)).toBeCloseTo(below130rpm, 1);
  });
});
