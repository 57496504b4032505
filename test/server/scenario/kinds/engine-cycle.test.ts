// Engines by an Otto, Diesel or dual cycle: their figures and tables, what duties ask of them, and what is told of entries that
// no engine has.

import { describe, expect, test } from 'vitest';
import { checkFacts, definitionOf, figureOf as figureOrNone, tableOf, uncertaintyOf } from '../../../support/facts.ts';
import type { EvaluatedScenario } from '../../../../server/scenario/scenario.ts';

const MAIN = `
  cycle: dual
  compression ratio: 14
  maximum firing pressure: 180 bar
  maximum continuous rating: 6.4 MW
  lambda: 2.1
  boost pressure: 3.4 bar
  boost temperature: 45 degC
  exhaust pressure: 2.9 bar
  heat loss: 14 % of fuel energy
  mechanical efficiency: 92 %`;

const SLURRY = `blend slurry {
  30 % mass sodium
  rest gas_oil
  blanket: argon
}
`;

function figureOf(scenario: EvaluatedScenario, name: string, id: string): number {
  return figureOrNone(scenario, name, id) ?? NaN;
}

function table(
  scenario: EvaluatedScenario,
  name: string,
  id: string,
): readonly (readonly (string | number | null)[])[] {
  return tableOf(scenario, name, id).rows;
}

describe('an engine by its cycle', () => {
  const scenario = checkFacts(`engine main {${MAIN}
      fuel: gas_oil
    }
  `);

  test('has the air-standard efficiency of its written equation, whatever is lost to the walls', () => {
    const otto = checkFacts(`engine spark {
      cycle: otto
      compression ratio: 9
      lambda: 1.6
      boost pressure: 1 bar
      boost temperature: 45 degC
      exhaust pressure: 1 bar
      heat loss: 20 % of fuel energy
      fuel: methane
    }
  `);
    expect(figureOf(otto, 'spark', 'air-standard-efficiency')).toBeCloseTo(1 - 9 ** -0.4, 9);
  });

  test('holds the limit of pressure, and has an efficiency between the air standard and nothing', () => {
    expect(figureOf(scenario, 'main', 'peak-pressure')).toBeCloseTo(180, 6);
    const brake = figureOf(scenario, 'main', 'brake-efficiency');
    expect(brake).toBeGreaterThan(0.4);
    expect(brake).toBeLessThan(figureOf(scenario, 'main', 'indicated-efficiency'));
    expect(figureOf(scenario, 'main', 'indicated-efficiency')).toBeLessThan(
      figureOf(scenario, 'main', 'air-standard-efficiency'),
    );
    expect(figureOf(scenario, 'main', 'specific-consumption')).toBeCloseTo(3.6 / brake, 9);
  });

  test('has no band without particles, and no idle fuel is guessed without friction', () => {
    expect(definitionOf(scenario, 'main').figures.filter(({ band }) => band)).toEqual([]);
    const free = checkFacts(
      'engine free {\n  cycle: otto\n  compression ratio: 9\n  lambda: 1.2\n  fuel: methane\n}\n',
    );
    const ids = definitionOf(free, 'free').figures.map(({ id }) => id);
    expect(ids).not.toContain('idle-consumption');
    expect(ids).not.toContain('rated-power');
    expect(figureOf(free, 'free', 'cut-off-ratio')).toBeCloseTo(1, 9);
  });

  test('tells its states, losses that add up, its exhaust and its diagram', () => {
    const names = table(scenario, 'main', 'cycle-states').map(([name]) => String(name).split(' ')[0]);
    expect(names).toEqual(['1', '2', '3a', '3', '4', '5', '6']);
    const losses = table(scenario, 'main', 'losses');
    const total = losses.slice(0, -1).reduce((sum, [, , share]) => sum + Number(share), 0);
    expect(Math.abs(total - 1)).toBeLessThan(1e-9);
    expect(losses.at(-1)?.[2]).toBeCloseTo(1, 9);
    const exhaust = table(scenario, 'main', 'exhaust');
    const oxygen = exhaust.find(([id]) => id === 'O2(g)');
    expect(oxygen?.[5]).toBeCloseTo(figureOf(scenario, 'main', 'exhaust-oxygen-share'), 9);
    const diagram = table(scenario, 'main', 'diagram');
    expect(diagram.filter(([stroke]) => stroke === 'expansion').length).toBe(21);
    expect(definitionOf(scenario, 'main').tables.map(({ id }) => id)).not.toContain('particle-corners');
  });

  test('carries what is uncertain about its entries', () => {
    const uncertain = checkFacts(`engine main {${MAIN.replace('14 %', '14 ± 1 %').replace('45 degC', '45 ± 3 degC')}
      fuel: gas_oil
    }
  `);
    expect(uncertaintyOf(uncertain, 'main', 'brake-efficiency')).toBeGreaterThan(0.003);
    expect(uncertaintyOf(uncertain, 'main', 'brake-efficiency')).toBeLessThan(0.01);
    expect(uncertaintyOf(uncertain, 'main', 'exhaust-temperature')).toBeGreaterThan(1);
  });
});

describe('an engine on a fuel with metal in it', () => {
  const scenario = checkFacts(`${SLURRY}engine main {${MAIN}
      fuel: slurry
    # ^^^^^^^^^^^^ engine/no-standard-fuel
      pilot: 5 % energy gas_oil
    }
  `);

  test('has a band of four corners, and reckons with the lowest efficiency', () => {
    const figure = definitionOf(scenario, 'main').figures.find(({ id }) => id === 'brake-efficiency');
    expect(figure?.quantity.value).toBe(figure?.band?.low.value);
    const corners = table(scenario, 'main', 'particle-corners');
    expect(corners.length).toBe(4);
    const efficiencies = corners.map(([, , efficiency]) => Number(efficiency));
    expect(Math.min(...efficiencies)).toBeCloseTo(figure?.band?.low.value ?? NaN, 12);
    expect(Math.max(...efficiencies)).toBeCloseTo(figure?.band?.high.value ?? NaN, 12);
    expect(corners.filter((row) => row.at(-1) === 'counts').length).toBe(1);
    expect(figureOf(scenario, 'main', 'exhaust-condensed-share')).toBeGreaterThan(0.01);
  });
});

describe('a premixed fuel', () => {
  test('is in the charge, with its latent heat where it comes in liquid', () => {
    const engine = (fuel: string, mixture: string): string =>
      `engine gas {\n  cycle: otto\n  compression ratio: 10\n  lambda: 1.5\n  fuel: ${fuel}\n  mixture: ${mixture}\n  pilot: 3 % energy gas_oil\n}\n`;
    const at = (text: string): number => figureOf(checkFacts(text), 'gas', 'compression-temperature');
    expect(at(engine('ammonia', 'premixed'))).toBeLessThan(at(engine('ammonia', 'injected')));
  });

  test('whose vapour is not known is told', () => {
    checkFacts(`
      engine gas {
        cycle: otto
        compression ratio: 9
        lambda: 1.2
        fuel: gas_oil
#       ^^^^^^^^^^^^^ balance/no-data
      }
    `);
  });
});

describe('entries that no engine has', () => {
  test('a compression ratio of 1 or less', () => {
    checkFacts(`
      engine launch {
        cycle: diesel
        compression ratio: 1
#       ^^^^^^^^^^^^^^^^^^^^ engine/compression-ratio
        fuel: gas_oil
        lambda: 2
      }
    `);
  });

  test('a cycle without its compression ratio or λ, a dual one without its limit', () => {
    checkFacts(`
      engine launch {
#            ^^^^^^ name/missing-entry
        cycle: dual
        fuel: gas_oil
      }
    `);
  });

  test('a limit of pressure passed by compression alone; the other figures are given', () => {
    const scenario = checkFacts(`
      engine launch {
        cycle: dual
        compression ratio: 18
        maximum firing pressure: 40 bar
#       ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/firing-pressure
        fuel: gas_oil
        lambda: 2
      }
    `);
    expect(figureOf(scenario, 'launch', 'brake-efficiency')).toBeGreaterThan(0.3);
  });

  test('an exhaust pressure that leaves no room, and air that is too cold', () => {
    checkFacts(`
      engine choked {
        cycle: diesel
        compression ratio: 14
        fuel: gas_oil
        lambda: 2
        exhaust pressure: 20 bar
#       ^^^^^^^^^^^^^^^^^^^^^^^^ engine/no-cycle
      }
      engine frosty {
        cycle: diesel
        compression ratio: 14
        fuel: gas_oil
        lambda: 2
        boost temperature: 100 K
#       ^^^^^^^^^^^^^^^^^^^^^^^^ engine/no-cycle
      }
    `);
  });

  test('a negative loss and an efficiency above 1', () => {
    checkFacts(`
      engine launch {
        cycle: diesel
        compression ratio: 14
        fuel: gas_oil
        lambda: 2
        heat loss: -3 %
#                  ^^^^ range/share
        mechanical efficiency: 102 %
#                              ^^^^^ range/share
      }
    `);
  });
});

describe('indicators', () => {
  test('knock by octane number and speed, only where both are given', () => {
    const engine = (octane: number, mark = ''): string => `
      engine sparked {
        cycle: otto
        compression ratio: 9
        lambda: 1.4
        fuel: methane
        speed: 3000 rpm
        octane number: ${octane}
${mark}
      }
    `;
    checkFacts(engine(60, '      # ^^^^^^^^^^^^^^^^^ engine/knock'));
    checkFacts(engine(120));
  });

  test('a spray that does not light: too cold for the fuel, or too late for the speed', () => {
    checkFacts(`
      engine ammonia_engine {
           # ^^^^^^^^^^^^^^ engine/misfire
        cycle: diesel
        compression ratio: 14
        lambda: 2
        fuel: ammonia
      }
      engine cold_start {
           # ^^^^^^^^^^ engine/misfire
        cycle: diesel
        compression ratio: 9
        lambda: 2
        fuel: gas_oil
        speed: 1500 rpm
      }
      engine with_pilot {
        cycle: diesel
        compression ratio: 14
        lambda: 2
        fuel: ammonia
        pilot: 5 % energy gas_oil
      }
    `);
  });

  test('a charge too lean for a flame', () => {
    checkFacts(`
      engine gas {
        cycle: otto
        compression ratio: 9
        fuel: methane
        lambda: 5
      # ^^^^^^^^^ engine/misfire
      }
    `);
  });
});

describe('metal in the exhaust', () => {
  test('of a temperature that is given meets what the products are there, molten caustic and carbonate among them', () => {
    checkFacts(`${SLURRY}engine main {${MAIN}
      fuel: slurry
    # ^^^^^^^^^^^^ engine/no-standard-fuel
      metal temperature: 900 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/deposits
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/basic-attack
    }
    engine cool {${MAIN}
      fuel: slurry
    # ^^^^^^^^^^^^ engine/no-standard-fuel
      metal temperature: 180 degC
    }
  `);
  });
});
