// Engines by a Joule–Brayton or a Rankine cycle: their figures and tables, what duties ask of them, and what is told of entries
// that no plant has.

import { describe, expect, test } from 'vitest';
import { checkFacts, definitionOf, figureOf as figureOrNone, tableOf, uncertaintyOf } from '../../../support/facts.ts';
import type { EvaluatedScenario } from '../../../../server/scenario/scenario.ts';

const TURBINE = `
  cycle: brayton
  pressure ratio: 16
  compressor efficiency: 86 %
  turbine efficiency: 89 %
  combustor pressure loss: 4 %
  mechanical efficiency: 98 %`;

const PLANT = `
  cycle: rankine
  lambda: 1.2
  exhaust temperature: 150 degC
  boiler pressure: 100 bar
  steam temperature: 520 degC
  condenser pressure: 80 mbar
  turbine efficiency: 80 %
  pump efficiency: 75 %
  mechanical efficiency: 97 %`;

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

/** Share of the heating value that a row of the losses has. */
function loss(scenario: EvaluatedScenario, name: string, label: string): number {
  const share = table(scenario, name, 'losses').find(([words]) => words === label)?.[2];
  return typeof share === 'number' ? share : NaN;
}

describe('a gas turbine', () => {
  const scenario = checkFacts(`engine jet {${TURBINE}
      turbine inlet temperature: 1200 ± 10 degC
      fuel: gas_oil
      maximum continuous rating: 5 MW
    }
  `);

  test('has the inlet that was asked, and the usual efficiency and air', () => {
    expect(figureOf(scenario, 'jet', 'turbine-inlet-temperature')).toBeCloseTo(1473.15, 6);
    const brake = figureOf(scenario, 'jet', 'brake-efficiency');
    // Simple-cycle machines of this ratio and inlet: 33 to 39 % (common practice).
    expect(brake).toBeGreaterThan(0.33);
    expect(brake).toBeLessThan(0.39);
    expect(figureOf(scenario, 'jet', 'specific-consumption')).toBeCloseTo(3.6 / brake, 9);
    expect(figureOf(scenario, 'jet', 'net-efficiency')).toBeCloseTo(brake / 0.98, 9);
    expect(figureOf(scenario, 'jet', 'excess-air-ratio')).toBeGreaterThan(2.5);
    expect(figureOf(scenario, 'jet', 'air-standard-efficiency')).toBeGreaterThan(brake);
  });

  test('carries the uncertainty of its inlet', () => {
    // Hotter by 10 K: some 0.1 points of efficiency and a few hundredths of λ.
    expect(uncertaintyOf(scenario, 'jet', 'turbine-inlet-temperature')).toBeCloseTo(10, 3);
    expect(uncertaintyOf(scenario, 'jet', 'excess-air-ratio')).toBeGreaterThan(0.01);
    expect(uncertaintyOf(scenario, 'jet', 'excess-air-ratio')).toBeLessThan(0.1);
  });

  test('tells states and losses that add up to the heating value', () => {
    expect(table(scenario, 'jet', 'turbine-states').map(([name]) => name)).toEqual([
      '1 inlet',
      '2 behind the compressor',
      '3 turbine inlet',
      '4 behind the turbine',
    ]);
    expect(loss(scenario, 'jet', 'lower heating value')).toBeCloseTo(1, 9);
    const rows = table(scenario, 'jet', 'losses');
    expect(rows[0]?.[2]).toBeCloseTo(figureOf(scenario, 'jet', 'brake-efficiency'), 9);
  });

  test('gives a duty its consumption over the load', () => {
    const rows = table(scenario, 'jet', 'load');
    expect(rows.at(-1)?.[6]).toBeCloseTo(figureOf(scenario, 'jet', 'brake-efficiency'), 9);
    const efficiencies = rows.map(([, , , , , , efficiency]) => Number(efficiency));
    expect([...efficiencies].sort((a, b) => a - b)).toEqual(efficiencies);
  });

  test('with its own λ has its own inlet back', () => {
    const lambda = figureOf(scenario, 'jet', 'excess-air-ratio');
    const back = checkFacts(`engine jet {${TURBINE}
      lambda: ${lambda}
      fuel: gas_oil
    }
    `);
    expect(figureOf(back, 'jet', 'turbine-inlet-temperature')).toBeCloseTo(1473.15, 4);
  });

  test('on a metal-bearing fuel is a band of four corners, the least work counting, and told for its solids', () => {
    const dirty = checkFacts(`blend aluminised {
  10 % mass aluminium
  rest gas_oil
  stored: 20 degC, 1 atm
  blanket: argon
}
engine jet {${TURBINE}
  turbine inlet temperature: 1100 degC
# ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/turbine-solids
  fuel: aluminised
}
`);
    const brake = definitionOf(dirty, 'jet').figures.find(({ id }) => id === 'brake-efficiency');
    expect(brake?.band?.low.value).toBe(brake?.quantity.value);
    const corners = table(dirty, 'jet', 'turbine-corners');
    expect(corners).toHaveLength(4);
    expect(corners.filter(([, , , , , , counts]) => counts === 'counts')).toHaveLength(1);
  });

  test('reheated, intercooled and recuperated has all its states', () => {
    const all = checkFacts(`engine jet {${TURBINE}
      turbine inlet temperature: 1150 degC
      intercooled to: 40 degC
      reheated to: 1100 degC
      recuperator effectiveness: 80 %
      heat loss: 1 % of fuel energy
      combustion completeness: 99 %
      fuel: methane
    }
    `);
    expect(table(all, 'jet', 'turbine-states')).toHaveLength(10);
    expect(loss(all, 'jet', 'lower heating value')).toBeCloseTo(1, 9);
    expect(figureOf(all, 'jet', 'exhaust-temperature')).toBeLessThan(
      figureOf(all, 'jet', 'turbine-outlet-temperature'),
    );
  });
});

describe('a steam plant', () => {
  const scenario = checkFacts(`engine station {${PLANT}
      heat loss: 1 % of fuel energy
      fuel: gas_oil
      maximum continuous rating: 20 MW
    }
  `);

  test('is boiler, cycle and shaft', () => {
    const [boiler, cycle, brake] = ['boiler-efficiency', 'steam-cycle-efficiency', 'brake-efficiency'].map((id) =>
      figureOf(scenario, 'station', id),
    );
    expect((boiler ?? NaN) * (cycle ?? NaN) * 0.97).toBeCloseTo(brake ?? NaN, 12);
    expect(boiler).toBeGreaterThan(0.9);
    expect(boiler).toBeLessThan(0.95);
    expect(figureOf(scenario, 'station', 'higher-boiler-efficiency')).toBeLessThan(boiler ?? NaN);
    const flow = figureOf(scenario, 'station', 'steam-flow');
    expect(figureOf(scenario, 'station', 'steam-consumption')).toBeCloseTo((flow * 3600) / 20000, 9);
  });

  test('tells states of water and steam and losses that add up to the heating value', () => {
    expect(table(scenario, 'station', 'steam-states').map(([name]) => name)).toEqual([
      'condensate',
      'behind pump',
      'live steam',
      'turbine exhaust',
    ]);
    expect(loss(scenario, 'station', 'lower heating value')).toBeCloseTo(1, 9);
  });

  test('may be reheated and have a feed heater', () => {
    const better = checkFacts(`engine station {${PLANT}
      reheat pressure: 20 bar
      reheated to: 520 degC
      feedwater temperature: 140 degC
      fuel: gas_oil
    }
    `);
    expect(figureOf(better, 'station', 'feedwater-temperature')).toBeCloseTo(413.15, 6);
    expect(figureOf(better, 'station', 'steam-cycle-efficiency')).toBeGreaterThan(
      figureOf(scenario, 'station', 'steam-cycle-efficiency'),
    );
  });
});

describe('entries that no plant has', () => {
  test('missing ones are asked for at the name', () => {
    checkFacts(`engine jet {
#      ^^^ name/missing-entry
  cycle: brayton
  turbine inlet temperature: 1100 degC
  fuel: methane
}
engine hot {
#      ^^^ name/missing-entry
  cycle: brayton
  pressure ratio: 10
  fuel: methane
}
engine reheated {
#      ^^^^^^^^ name/missing-entry
  cycle: brayton
  pressure ratio: 10
  lambda: 3
  reheated to: 1000 degC
  fuel: methane
}
engine station {
#      ^^^^^^^ name/missing-entry
  cycle: rankine
  lambda: 1.2
  fuel: methane
}
`);
  });

  test('the inlet and λ contradict each other', () => {
    checkFacts(`engine jet {${TURBINE}
  turbine inlet temperature: 1100 degC
  lambda: 3
# ^^^^^^ balance/contradiction
  fuel: methane
}
`);
  });

  test('heat and steam that cannot be', () => {
    checkFacts(`engine station {${PLANT}
  feedwater temperature: 400 degC
# ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/steam-states
  fuel: methane
}
engine supercritical {
  cycle: rankine
  lambda: 1.2
  exhaust temperature: 150 degC
  boiler pressure: 250 bar
  steam temperature: 390 degC
# ^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/steam-states
  condenser pressure: 80 mbar
  fuel: methane
}
engine hot {
  cycle: rankine
  lambda: 1.2
  exhaust temperature: 2500 degC
# ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/boiler-heat
  boiler pressure: 100 bar
  condenser pressure: 80 mbar
  fuel: methane
}
`);
  });

  test('a turbine on what does not burn', () => {
    checkFacts(`engine jet {${TURBINE}
  turbine inlet temperature: 1100 degC
  fuel: nitrogen
# ^^^^^^^^^^^^^^ balance/no-data
}
`);
  });
});

describe.each([
  ['a gas turbine', `${TURBINE}\n  turbine inlet temperature: 1200 degC`, 5, 250],
  ['a steam plant', PLANT, 20, 1000],
])('%s away from its rating', (_, entries, megawatts, idleKgPerH) => {
  const engine = `engine plant {${entries}
      fuel: gas_oil
      maximum continuous rating: ${megawatts} MW`;

  test('is a guess where only the rating is known', () => {
    checkFacts(`${engine}
    }
    duty peak_hours {
        slow: 10 h at 40 % on plant
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/measured-range
    }
  `);
  });

  test('goes in a straight line from its idle consumption', () => {
    const scenario = checkFacts(`${engine}
      idle consumption: ${idleKgPerH} kg/h
    }
    duty peak_hours {
      slow: 10 h at 40 % on plant
    }
  `);
    const rated = figureOf(scenario, 'plant', 'specific-fuel-consumption') * megawatts;
    expect(figureOf(scenario, 'plant', 'idle-consumption')).toBeCloseTo(idleKgPerH, 6);
    const burnt = table(scenario, 'plant', 'load')
      .find(([load]) => load === 0.5)
      ?.at(-1);
    expect(burnt).toBeCloseTo((idleKgPerH + rated) / 2, 6);
  });
});
