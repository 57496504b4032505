// Duties in scenarios: legs in their forms, standing demands, test cycles, and what is told of what cannot be done.
import { describe, expect, test } from 'vitest';
import { checkFacts, evaluateText, figureOf, uncertaintyOf } from '../../../support/facts.ts';

const ENGINES = `engine main {
        maximum continuous rating: 6.4 MW
        fuel: gas_oil
        specific fuel consumption: 199 g/kWh at 25 %, 181 g/kWh at 75 %, 184 g/kWh at 100 %
        idle consumption: 150 kg/h
      }
      engine auxiliary {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        specific fuel consumption: 231 g/kWh at 10 %, 209 g/kWh at 50 %, 205 g/kWh at 100 %
      }
`;

describe('legs', () => {
  test('by time or by distance and speed, at a load, a power or a speed', () => {
    const scenario = checkFacts(
      `${ENGINES}
      let stay = 10 h
      duty round {
        dredge: 5.5 h at 85 % on main
        sail: 38 nmi at 11 kn on main
        shift: 2 h at 6 kn at 30 % on main, 300 kW on auxiliary
        crossing back: 13 nmi at 40 % on main
        berth: stay at 220 kW on auxiliary
        berth: 2 h at 100 kW on shore
        hotel load: 180 kW on auxiliary
        service speed: 13 kn at 85 %, sea margin 15 %
      }
    `,
    );
    const hours = 5.5 + 38 / 11 + 2 + 13 / (13 * (0.4 / 0.85) ** (1 / 3)) + 10 + 2;
    expect(figureOf(scenario, 'round', 'hours')).toBeCloseTo(hours, 9);
    expect(figureOf(scenario, 'round', 'distance')).toBeCloseTo(38 + 12 + 13, 9);
    expect(figureOf(scenario, 'round', 'shore-energy')).toBeCloseTo(2 * 280, 9);
    const main = 6400 * (0.85 * 5.5 + 0.85 * (11 / 13) ** 3 * (38 / 11) + 0.3 * 2 + 0.4 * (hours - 5.5 - 38 / 11 - 14));
    const auxiliary = 180 * (hours - 2) + 300 * 2 + 220 * 10;
    expect(figureOf(scenario, 'round', 'energy')).toBeCloseTo(main + auxiliary, 6);
  });

  test('a leg on the shore takes the hotel load from there though an engine runs', () => {
    const scenario = checkFacts(`${ENGINES}
      duty berth {
        lie: 10 h at 300 kW on shore, 1600 kW on main
        hotel load: 180 kW on auxiliary
      }
    `);
    expect(figureOf(scenario, 'berth', 'shore-energy')).toBeCloseTo(4800, 9);
    expect(figureOf(scenario, 'berth', 'energy')).toBeCloseTo(16000, 9);
  });

  test('calm water and a fouled hull', () => {
    const scenario = checkFacts(`${ENGINES}
      duty calm_day {
        sail: 1 h at 13 kn on main, calm
        service speed: 13 kn at 85 %, sea margin 15 %, fouling 5 %, exponent 3.2
      }
    `);
    expect(figureOf(scenario, 'calm_day', 'energy')).toBeCloseTo((6400 * 0.85 * 1.05) / 1.15, 6);
  });

  test('boiler, auxiliaries, and the consumption as sum over sum', () => {
    const scenario = checkFacts(`${ENGINES}
      duty round {
        sail: 2 h at 75 % on main
        wait: 1 h at 25 % on main
        boiler: 400 kW of gas_oil at 88 %
      }
    `);
    expect(figureOf(scenario, 'round', 'boiler-heat')).toBeCloseTo(1200, 9);
    const [high, low] = [2 * 4800, 1600];
    expect(figureOf(scenario, 'round', 'specific-fuel-consumption')).toBeCloseTo(
      (181 * high + 199 * low) / (high + low),
      6,
    );
  });

  test('slips', () => {
    checkFacts(
      `${ENGINES}
      duty round {
        sail: 2 h at 75 % of main
      #                   ^^ name/unknown-phrase
        wait: 2 h
      #       ^^^ name/unknown-phrase
        run: 2 kg at 75 % on main
      # ^^^ name/unknown-entry
        go: 2 h at 75 kg on main
      #            ^^^^^ unit/mismatch
        drive: 2 h at 75 % on nothing_there
      #                       ^^^^^^^^^^^^^ name/unknown
        lounge: 2 h at 75 % on day_blend
      #                        ^^^^^^^^^ name/wrong-kind
        hold: 2 h at 75 on main
      #              ^^ unit/mismatch
        crawl: 0 h at 75 % on main
      #        ^^^ range/positive
      }
      blend day_blend { 100 % methanol }
    `,
    );
  });
});

describe('fuel of a duty', () => {
  const piloted = (share: string): string => `engine main {
        cycle: diesel
        compression ratio: 18
        lambda: 1.9
        fuel: methanol
        pilot: ${share} gas_oil
        maximum continuous rating: 2 MW
      }
      duty run {
        sail: 1 h at 100 % on main
      }
      service line {
        duty: run
      }
`;

  test('with a pilot of another fuel, mass over work is that of the service', () => {
    const scenario = evaluateText(piloted('30 % energy'));
    const perWork =
      (figureOf(scenario, 'line', 'fuel-mass') ?? NaN) / (figureOf(scenario, 'line', 'brake-energy') ?? NaN);
    expect(figureOf(scenario, 'run', 'specific-fuel-consumption')).toBeCloseTo(perWork * 1e3, 6);
  });

  test('the share of a pilot brings its uncertainty', () => {
    const [sure, unsure] = ['30 % energy', '30 ± 5 % energy'].map((share) => evaluateText(piloted(share)));
    for (const [name, id] of [
      ['run', 'specific-fuel-consumption'],
      ['line', 'fuel-mass'],
    ] as const) {
      const [less, more] = [sure, unsure].map((one) => (one && uncertaintyOf(one, name, id)) ?? 0);
      expect(more).toBeGreaterThan((less ?? NaN) * 1.0001);
    }
  });

  test('work without end has no consumption over it', () => {
    const scenario = checkFacts(`${ENGINES}
      duty endless {
        sail: 1e303 h at 75 % on main
      }
    `);
    expect(figureOf(scenario, 'endless', 'specific-fuel-consumption')).toBeUndefined();
  });

  test('a load that was not measured is told as an assumption', () => {
    const scenario = checkFacts(`${ENGINES}
      duty low {
        wait: 1 h at 5 % on auxiliary
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/measured-range
      }
      duty high {
        sail: 1 h at 75 % on auxiliary
      }
    `);
    const assumed = (name: string): readonly string[] =>
      scenario.files[0]?.definitions
        .find((one) => one.name === name)
        ?.figures.find(({ id }) => id === 'specific-fuel-consumption')?.working.assumptions ?? [];
    expect(assumed('low')).toContain('beyond-measured');
    expect(assumed('high')).not.toContain('beyond-measured');
  });
});

describe('what cannot be done, or does not count', () => {
  test('loads above the rating and outside what was measured, speeds above the service speed', () => {
    checkFacts(`${ENGINES}
      duty round {
        push: 1 h at 7 MW on main
      # ^^^^^^^^^^^^^^^^^^^^^^^^^ engine/overload
        run: 1 h at 14 kn on main
      # ^^^^^^^^^^^^^^^^^^^^^^^^^ duty/speed
      # ^^^^^^^^^^^^^^^^^^^^^^^^^ engine/overload
        lie: 1 h at 8 % on auxiliary
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/measured-range
        service speed: 13 kn at 85 %
      }
    `);
  });

  test('a standing demand is told once, where it is asked', () => {
    checkFacts(`${ENGINES}
      duty round {
        sail: 1 h at 85 % on main
        wait: 1 h at 25 % on main
        hotel load: 50 kW on auxiliary
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/measured-range
      }
    `);
  });

  test('a leg without power, an entry without use, a leg spelt like an entry, a speed without a service speed', () => {
    checkFacts(`${ENGINES}
      duty idle_day {
        sail: 1 h at 85 % on main
        service speed: 13 kn at 85 %
      # ^^^^^^^^^^^^^ duty/unused
      }
      duty near_day {
        boilr: 1 h at 85 % on main
      # ^^^^^ duty/leg-name
      }
      duty fast_day {
        sail: 1 h at 12 kn on main
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^ name/missing-entry
      }
      duty empty_day {
      #    ^^^^^^^^^ name/missing-entry
        hotel load: 180 kW on auxiliary
      }
    `);
  });

  test('a duty on an engine that could not be worked out keeps its hours', () => {
    const scenario = checkFacts(`
      engine lost {
      #      ^^^^ name/missing-entry
        fuel: gas_oil
      }
      duty round {
        sail: 3 h at 85 % on lost
      }
    `);
    expect(figureOf(scenario, 'round', 'hours')).toBeCloseTo(3, 12);
    expect(figureOf(scenario, 'round', 'energy')).toBeUndefined();
  });
});

describe('test cycles', () => {
  test('without an engine the loads alone are known', () => {
    const scenario = checkFacts(`
      duty type_test {
        test cycle: E3
      # ^^^^^^^^^^^^^^ duty/test-cycle
      }
    `);
    expect(figureOf(scenario, 'type_test', 'weighted-load')).toBeCloseTo(0.2 + 0.375 + 0.075 + 0.0375, 12);
    const definition = scenario.files[0]?.definitions[0];
    expect(definition?.tables.map(({ id }) => id)).toEqual(['modes']);
    expect(definition?.figures.map(({ id }) => id)).toEqual(['weighted-load']);
  });

  test('on an engine, fuel is weighted as the standard does: sums of flows over sums of powers', () => {
    const scenario = checkFacts(`${ENGINES}
      duty type_test {
        test cycle: E3 on main
      # ^^^^^^^^^^^^^^^^^^^^^^ duty/test-cycle
        running time: 10 h
      }
      let half = specific fuel consumption of type_test
    `);
    const fifty = scenario.files[0]?.definitions
      .find(({ name }) => name === 'main')
      ?.tables[0]?.rows.find(([load]) => load === 0.5)?.[5];
    const [weights, loads, rates] = [
      [0.2, 0.5, 0.15, 0.15],
      [1, 0.75, 0.5, 0.25],
      [184, 181, Number(fifty), 199],
    ];
    const sum = (of: (index: number) => number): number => [0, 1, 2, 3].reduce((total, index) => total + of(index), 0);
    const power = (index: number): number => (weights[index] ?? 0) * (loads[index] ?? 0);
    const mean = sum((index) => power(index) * (rates[index] ?? 0)) / sum(power);
    expect(figureOf(scenario, 'type_test', 'specific-fuel-consumption')).toBeCloseTo(mean, 6);
    expect(figureOf(scenario, 'type_test', 'energy')).toBeCloseTo(10 * 6400 * sum(power), 6);
  });

  test('an idle mode takes idle consumption, and asks for it', () => {
    const scenario = checkFacts(`${ENGINES}
      duty idle_test {
        test cycle: G3 on auxiliary
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ duty/test-cycle
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/no-idle
      }
      duty main_test {
        test cycle: G3 on main
      # ^^^^^^^^^^^^^^^^^^^^^^ duty/test-cycle
      }
    `);
    expect(figureOf(scenario, 'idle_test', 'specific-fuel-consumption')).toBeUndefined();
    const flow = 0.9 * 6400 * 0.184 + 0.1 * 150;
    expect(figureOf(scenario, 'main_test', 'specific-fuel-consumption')).toBeCloseTo((1e3 * flow) / (0.9 * 6400), 6);
  });

  test('slips', () => {
    checkFacts(`${ENGINES}
      duty a {
        test cycle: E9
      #             ^^ name/unknown
      }
      duty b {
        test cycle: D2
      # ^^^^^^^^^^^^^^ duty/test-cycle
        sail: 1 h at 85 % on main
      # ^^^^ balance/contradiction
      }
    `);
  });
});
