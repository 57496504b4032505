// Services and comparisons in scenarios: through to the carbon factors of the rules, against a baseline, and side by side.
import { describe, expect, test } from 'vitest';
import rules from '../../../reference/fuel-rules.json' with { type: 'json' };
import { checkFacts, figureOf } from '../../../support/facts.ts';

/** Fuels of the rule with a factor of carbon; without ethane, whose heating value of the rule lies 2.3 % below the tables'. */
const ruled = rules.rows.flatMap(({ substance, rule, carbonDioxideFactor, mJPerKg }) =>
  rule === 'MEPC.364(79)' && carbonDioxideFactor !== undefined && substance !== 'ethane'
    ? [{ substance, carbonDioxideFactor, mJPerKg }]
    : [],
);

function service(fuel: string, more = ''): string {
  return `engine main {
        maximum continuous rating: 10 MW
        fuel: ${fuel}
        efficiency: 45 % at 50 %, 50 % at 100 %
      }
      duty crossing {
        sail: 10 h at 100 % on main
      }
      service line {
        duty: crossing
        repeated: 100 per year
        ${more}
      }
`;
}

describe('a service', () => {
  test.each(ruled)(
    'gives the carbon dioxide of MEPC.364(79) for $substance',
    ({ substance, carbonDioxideFactor, mJPerKg }) => {
      const scenario = checkFacts(service(substance));
      const fuel = figureOf(scenario, 'line', 'fuel-mass') ?? NaN;
      const carbon = figureOf(scenario, 'line', 'carbon-dioxide') ?? NaN;
      // The rule counts with whole atomic weights: 44/12 is 0.07 % above 44.01/12.011, and hydrogen of 1 in place of 1.008 makes
      // up to 0.13 % more carbon of a pure fuel (propane); its factors are higher by both, and rounded.
      const isHigher = 1 - carbon / fuel / carbonDioxideFactor;
      expect(isHigher).toBeGreaterThan(-0.0002);
      expect(isHigher).toBeLessThan(0.0022);
      // Half the last digit of the rule's heating values.
      expect(Math.abs((2 * 10 * 10 * 3.6) / fuel - mJPerKg)).toBeLessThan(0.05);
      expect(figureOf(scenario, 'line', 'annual-carbon-dioxide')).toBeCloseTo(100 * carbon, 6);
    },
  );

  test('against a baseline, with reserve and tanks', () => {
    const scenario = checkFacts(
      service(
        'methanol',
        'reserve: 25 % of duty fuel\n        against: gas_oil\n        tanks: maximum filling 90 %, 0.1 kg tank per kg methanol',
      ),
    );
    const fuel = figureOf(scenario, 'line', 'fuel-mass') ?? NaN;
    expect(figureOf(scenario, 'line', 'fuel-carried')).toBeCloseTo(1.25 * fuel, 9);
    expect(figureOf(scenario, 'line', 'tank-mass')).toBeCloseTo(0.125 * fuel, 9);
    const baseline = figureOf(scenario, 'line', 'baseline-fuel-mass') ?? NaN;
    expect(baseline).toBeLessThan(fuel / 2);
    expect(figureOf(scenario, 'line', 'added-mass')).toBeCloseTo(1.375 * fuel - 1.25 * baseline, 9);
    expect(figureOf(scenario, 'line', 'endurance')).toBeCloseTo((1.25 * 10) / 24, 9);
  });

  test('an alkali fuel leaves a residue, which stays or is discharged under a permit', () => {
    const blend = `blend slurry {
        30 % mass sodium
        rest gas_oil
        stored: 20 degC, 1 atm
        blanket: argon
      }
      `;
    const kept = checkFacts(blend + service('slurry', 'residue: kept on board'));
    const fuel = figureOf(kept, 'line', 'fuel-mass') ?? NaN;
    // 30 % sodium (22.98976928 g/mol) ends as half as much sodium carbonate (105.98844 g/mol); fuels
    // are told with conventional atomic weights of five digits.
    expect(figureOf(kept, 'line', 'residue')).toBeCloseTo((fuel * 0.3 * 105.98844) / (2 * 22.98976928), 3);
    expect(figureOf(kept, 'line', 'carbon-dioxide-held')).toBeCloseTo((fuel * 0.3 * 44.0095) / (2 * 22.98976928), 3);
    expect(figureOf(kept, 'line', 'alkali')).toBeCloseTo((fuel * 300) / 22.98976928, 2);
    const landed = checkFacts(blend + service('slurry', 'residue: discharged under "permit 12"'));
    expect(figureOf(landed, 'line', 'greatest-mass')).toBeCloseTo(fuel, 9);
  });

  test('without idle consumption says what is lacking', () => {
    const scenario = checkFacts(
      service('gas_oil').replace(
        'sail: 10 h at 100 % on main',
        'sail: 10 h at 100 % on main\n        wait: 1 h at 0 kW on main\n      # ^^^^^^^^^^^^^^^^^^^^^^^^^ engine/no-idle',
      ),
    );
    expect(figureOf(scenario, 'line', 'brake-energy')).toBeCloseTo(100, 9);
    const line = scenario.files[0]?.definitions.find(({ name }) => name === 'line');
    expect(line?.absent.get('fuel-mass')).toEqual(['the idle consumption of main']);
  });

  test('other fuels go without the form of tanks and boil-off of the main one, and that is said', () => {
    const scenario =
      checkFacts(`${service('gas_oil', 'against: methanol\n        boil-off: 0.1 % per d\n        tanks: cylindrical')}
      compare fuels {
        service: line
        across: gas_oil, methanol
      }
    `);
    const [line, fuels] = ['line', 'fuels'].map((of) => scenario.files[0]?.definitions.find(({ name }) => name === of));
    const added = line?.figures.find(({ id }) => id === 'added-volume');
    expect(added?.working.assumptions).toContain('bare-tanks');
    expect(fuels?.tables[0]?.label).toMatch(/form of tanks and boil-off for gas_oil alone/);
    // A hundred duties a year: 87.66 h from one to the next.
    const fuel = figureOf(scenario, 'line', 'fuel-mass') ?? NaN;
    expect(figureOf(scenario, 'line', 'boil-off')).toBeCloseTo((fuel / 2) * 0.001 * 3.6525, 9);
  });

  test('slips', () => {
    checkFacts(`${service('gas_oil')}
      service lost {
      #       ^^^^ name/missing-entry
        repeated: 3 per year
      }
      service wrong {
        duty: main
      #       ^^^^ name/wrong-kind
        tanks: round
      #        ^^^^^ name/unknown
        residue: thrown away
      #          ^^^^^^^^^^^ name/unknown-phrase
        reserve: 20 % of something
      #               ^^ name/unknown-phrase
      }
      service small {
        duty: crossing
        tanks: maximum filling 90 %, capacity 5 m3
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ service/tank
      }
    `);
  });
});

describe('a comparison', () => {
  test('sets fuels side by side, each as its own service would be', () => {
    const scenario = checkFacts(`${service('gas_oil')}
      compare fuels {
        service: line
        across: gas_oil, methanol, ethanol
      }
    `);
    const table = scenario.files[0]?.definitions.find(({ name }) => name === 'fuels')?.tables[0];
    expect(table?.rows.map(([name]) => name)).toEqual(['gas_oil', 'methanol', 'ethanol']);
    const own = table?.rows[0]?.[1];
    expect(own).toBeCloseTo(figureOf(scenario, 'line', 'fuel-mass') ?? NaN, 9);
    const alone = checkFacts(
      service('methanol').replace(
        'efficiency: 45 % at 50 %, 50 % at 100 %',
        'efficiency: 45 % at 50 %, 50 % at 100 %\n        measured on: gas_oil',
      ),
    );
    expect(table?.rows[1]?.[1]).toBeCloseTo(figureOf(alone, 'line', 'fuel-mass') ?? NaN, 9);
  });
});
