// Engines by their measured consumption: on what it was measured, on which fuel, and what is told of points that cannot be.
import { describe, expect, test } from 'vitest';
import { checkFacts, evaluateText, figureOf, uncertaintyOf } from '../../../support/facts.ts';

const AUXILIARY = `
  maximum continuous rating: 900 kW
  fuel: test_oil
  specific fuel consumption: 231 g/kWh at 25 %, 209 g/kWh at 50 %, 202 g/kWh at 75 %, 205 g/kWh at 100 %`;
const OIL = `substance test_oil {
  phase: liquid
  composition: 86.5 % C, 13.5 % H
  lower heating value: 42.0 MJ/kg
  density: 850 kg/m3
}
`;

describe('measured consumption', () => {
  test('is energy for work, on the heating value it was measured on', () => {
    const scenario = checkFacts(`${OIL}
      engine auxiliary {${AUXILIARY}
        measured on: 42.7 MJ/kg lower
      }
    `);
    expect(figureOf(scenario, 'auxiliary', 'specific-consumption')).toBeCloseTo(0.205 * 42.7, 9);
    // Fuel of its own has less in a kilogram, so it takes more kilograms.
    expect(figureOf(scenario, 'auxiliary', 'specific-fuel-consumption')).toBeCloseTo((205 * 42.7) / 42, 9);
    expect(figureOf(scenario, 'auxiliary', 'brake-efficiency')).toBeCloseTo(3.6 / (0.205 * 42.7), 9);
    expect(figureOf(scenario, 'auxiliary', 'rated-power')).toBeCloseTo(900, 9);
  });

  test('the tolerance makes a band, reckoned with in full', () => {
    const scenario = checkFacts(`${OIL}
      engine auxiliary {${AUXILIARY}
        measured on: 42.7 MJ/kg lower, tolerance 5 %
      }
    `);
    const definition = scenario.files[0]?.definitions.find(({ name }) => name === 'auxiliary');
    const figure = definition?.figures.find(({ id }) => id === 'specific-consumption');
    expect(figure?.quantity.value).toBeCloseTo((1.05 * 0.205 * 42.7) / 3.6, 9);
    expect(figure?.band?.low.value).toBeCloseTo((0.205 * 42.7) / 3.6, 9);
    expect(figure?.band?.high.value).toBeCloseTo((1.05 * 0.205 * 42.7) / 3.6, 9);
    const efficiency = definition?.figures.find(({ id }) => id === 'brake-efficiency');
    expect(efficiency?.quantity.value).toBe(efficiency?.band?.low.value);
    const load = definition?.tables.find(({ id }) => id === 'load');
    expect(load?.rows.map(([at]) => at)).toEqual([0.25, 0.5, 0.75, 0.85, 1]);
  });

  test('a higher heating value is brought to the lower one', () => {
    const scenario = checkFacts(`${OIL}
      engine auxiliary {${AUXILIARY}
        measured on: 44.95 MJ/kg higher
      }
    `);
    // 13.5 % hydrogen makes 1.2064 kg of water, whose condensation gives 2.442 MJ/kg.
    expect(figureOf(scenario, 'auxiliary', 'specific-consumption')).toBeCloseTo(0.205 * (44.95 - 1.2064 * 2.442), 3);
  });

  test('efficiencies serve as well, and carry their uncertainty', () => {
    const scenario = checkFacts(`${OIL}
      engine genset {
        maximum continuous rating: 2 MW
        fuel: test_oil
        efficiency: 38 % at 50 %, 42 ± 1 % at 100 %
      }
    `);
    expect(figureOf(scenario, 'genset', 'brake-efficiency')).toBeCloseTo(0.42, 12);
    expect(uncertaintyOf(scenario, 'genset', 'brake-efficiency')).toBeCloseTo(0.01, 9);
    expect(figureOf(scenario, 'genset', 'specific-consumption')).toBeCloseTo(3.6 / 0.42, 9);
  });

  test('an efficiency on the higher heating value is brought to the lower one', () => {
    const scenario = checkFacts(`
      engine genset {
        maximum continuous rating: 2 MW
        fuel: methane
        efficiency: 40 % at 100 %
        measured on: 55.5 MJ/kg higher
      }
    `);
    // 2.246 kg of water a kilogram, whose condensation gives 2.442 MJ/kg.
    expect(figureOf(scenario, 'genset', 'brake-efficiency')).toBeCloseTo((0.4 * 55.5) / (55.5 - 2.246 * 2.442), 4);
  });

  test('points may be written in any order', () => {
    const scenario = checkFacts(`${OIL}
      engine genset {
        maximum continuous rating: 2 MW
        fuel: test_oil
        efficiency: 42 % at 100 %, 38 % at 50 %
      }
    `);
    expect(figureOf(scenario, 'genset', 'brake-efficiency')).toBeCloseTo(0.42, 12);
  });

  test('limits of nitrogen oxides go by the rated speed', () => {
    const scenario = checkFacts(`${OIL}
      engine auxiliary {${AUXILIARY}
        speed: 720 rpm
      }
    `);
    expect(figureOf(scenario, 'auxiliary', 'nox-limit-i')).toBeCloseTo(45 * 720 ** -0.2, 9);
    expect(figureOf(scenario, 'auxiliary', 'nox-limit-iii')).toBeCloseTo(9 * 720 ** -0.2, 9);
  });

  test('idle consumption is a figure', () => {
    const scenario = checkFacts(`${OIL}
      engine auxiliary {${AUXILIARY}
        idle consumption: 14 kg/h
      }
    `);
    expect(figureOf(scenario, 'auxiliary', 'idle-consumption')).toBeCloseTo(14, 9);
  });
});

describe('another fuel', () => {
  test('takes the energy that sets free as much heat above exhaust temperature', () => {
    const scenario = checkFacts(`
      engine genset {
        maximum continuous rating: 900 kW
        fuel: methanol
        specific fuel consumption: 209 g/kWh at 50 %, 205 g/kWh at 100 %
        measured on: gas_oil, 42.7 MJ/kg lower
      }
      burn on_oil {
        fuel: gas_oil
        oxidant: air
        lambda: 2.2
        exhaust temperature: 350 degC
        frozen below: 1000 degC
      }
      burn on_methanol {
        fuel: methanol
        oxidant: air
        lambda: 2.2
        exhaust temperature: 350 degC
        frozen below: 1000 degC
      }
      let oil = heat above exhaust of on_oil / lower heating value of gas_oil
      let alcohol = heat above exhaust of on_methanol / lower heating value of methanol
    `);
    const [oil = NaN, alcohol = NaN] = scenario.files[0]?.values.map(({ quantity }) => quantity?.value) ?? [];
    expect(figureOf(scenario, 'genset', 'specific-consumption')).toBeCloseTo((0.205 * 42.7 * oil) / alcohol, 6);
    expect(oil / alcohol).not.toBeCloseTo(1, 3);
  });

  test('makes no work of the carbonate that would form in the exhaust', () => {
    const engine = (name: string, fuel: string, more = ''): string => `
      engine ${name} {
        maximum continuous rating: 900 kW
        fuel: ${fuel}
        specific fuel consumption: 209 g/kWh at 50 %, 205 g/kWh at 100 %
        measured on: gas_oil, 42.7 MJ/kg lower
        exhaust temperature: 245 degC
        ${more}
      }`;
    const scenario = evaluateText(`
      blend thick { 40 % mass magnesium; rest gas_oil }
      ${engine('oil', 'gas_oil')}${engine('late', 'thick', 'frozen below: 100 degC')}${engine('frozen', 'thick')}`);
    const [oil, late, frozen] = ['oil', 'late', 'frozen'].map((name) => figureOf(scenario, name, 'brake-efficiency'));
    expect(frozen).toBeGreaterThan(oil ?? NaN);
    expect(late).toBeGreaterThan((frozen ?? NaN) + 0.01);
  });

  test('is asked for where the heating value is none of its own', () => {
    const scenario = checkFacts(`
      engine genset {
        maximum continuous rating: 900 kW
        fuel: methanol
        specific fuel consumption: 209 g/kWh at 50 %, 205 g/kWh at 100 %
        measured on: 42.7 MJ/kg lower
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ engine/measured-fuel
      }
    `);
    expect(figureOf(scenario, 'genset', 'specific-consumption')).toBeCloseTo(0.205 * 42.7, 9);
  });

  test('of which nothing is known leaves the figures out', () => {
    const scenario = evaluateText(`substance mystery {
        composition: 80 % C, 20 % H
        phase: liquid
      }
      engine genset {
        maximum continuous rating: 900 kW
        fuel: mystery
        efficiency: 40 % at 100 %
      }
    `);
    const genset = scenario.files[0]?.definitions.find(({ name }) => name === 'genset');
    expect(genset?.figures).toEqual([]);
    expect(genset?.absent.get('specific-consumption')).toEqual(['the lower heating value of mystery']);
  });
});

describe('slips', () => {
  test('two points at a load, two ways, a load without a share, no rating', () => {
    checkFacts(`
      engine a {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        specific fuel consumption: 209 g/kWh at 50 %, 214 g/kWh at 50 %
      #                                               ^^^^^^^^^ engine/repeated-load
      }
      engine b {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        specific fuel consumption: 209 g/kWh at 50 %
        efficiency: 40 % at 50 %
      # ^^^^^^^^^^ balance/contradiction
      }
      engine c {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        specific fuel consumption: 209 g/kWh
      #                            ^^^^^^^^^ name/unknown-phrase
      }
      engine no_rating {
      #      ^^^^^^^^^ name/missing-entry
        fuel: gas_oil
        efficiency: 40 % at 100 %
      }
      engine no_way {
      #      ^^^^^^ name/missing-entry
        fuel: gas_oil
      }
      engine nothing {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        efficiency: 0 % at 100 %, 140 % at 50 %
      #             ^^^ range/positive
      }
      engine above {
        maximum continuous rating: 900 kW
        fuel: gas_oil
        efficiency: 140 % at 50 %
      #             ^^^^^ range/share
      }
    `);
  });

  test('a cycle beside a measurement contradicts it', () => {
    checkFacts(`
        engine a {
          cycle: otto
          compression ratio: 9
          lambda: 1.2
          maximum continuous rating: 900 kW
          fuel: methane
          efficiency: 40 % at 100 %
      #   ^^^^^^^^^^ balance/contradiction
        }
    `);
  });
});
