// Burns by their laws: what λ, preheat, loss, volume and a zone do to the flame, what cooled and frozen states keep, what an
// uncertainty comes to, and that nothing of a cooling path is solved before somebody reads it.
import { describe, expect, test } from 'vitest';
import { checkFacts, definitionOf, evaluateText, figureOf, tableOf, uncertaintyOf } from '../../../support/facts.ts';
import type { Table } from '../../../../server/scenario/scenario.ts';

/** A burn of hydrogen in dry air with further entries. */
function hydrogenBurn(...entries: readonly string[]): string {
  return ['burn flame {', 'fuel: hydrogen', 'oxidant: air', ...entries, '}'].join('\n');
}

function temperatureOf(...entries: readonly string[]): number {
  return figureOf(checkFacts(hydrogenBurn(...entries)), 'flame', 'flame-temperature') ?? NaN;
}

/** Numbers of a column, in the order of the rows. */
function column(table: Table, id: string): number[] {
  const index = table.columns.findIndex((one) => one.id === id);
  return table.rows.flatMap((row) => (typeof row[index] === 'number' ? [row[index]] : []));
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

describe('the flame', () => {
  test('λ, its inverse and the mass of air say the same', () => {
    const byLambda = temperatureOf('lambda: 1.25');
    expect(temperatureOf('equivalence ratio: 0.8')).toBeCloseTo(byLambda, 6);
    const scenario = checkFacts(hydrogenBurn('lambda: 1.25'));
    const ratio = figureOf(scenario, 'flame', 'oxidant-fuel-ratio') ?? NaN;
    // H2 takes 1/2 O2: 34.2 kg of dry air per kg at λ = 1, from atomic weights and 20.946 % O2.
    expect(ratio).toBeCloseTo((1.25 * 0.5 * 28.9651) / 0.20946 / 2.01588, 1);
    expect(temperatureOf(`oxidant per fuel: ${ratio} kg/kg`)).toBeCloseTo(byLambda, 6);
  });

  test('is hottest a little rich of λ = 1, and colder with more air', () => {
    const [rich, even, lean, leaner] = ['0.9', '1', '1.5', '3'].map((lambda) =>
      figureOf(evaluateText(hydrogenBurn(`lambda: ${lambda}`)), 'flame', 'flame-temperature'),
    ) as [number, number, number, number];
    expect(even).toBeGreaterThan(2350);
    expect(even).toBeLessThan(2420);
    expect(rich).toBeGreaterThan(even - 30);
    expect(lean).toBeLessThan(even);
    expect(leaner).toBeLessThan(lean);
  });

  test('pressure holds back dissociation; a held volume is hotter than a held pressure, by more pressure', () => {
    const atOne = temperatureOf('lambda: 1', 'held: pressure 1 bar');
    const warm = 'oxidant state: 600 degC, 50 bar';
    const pressed = temperatureOf('lambda: 1', warm);
    expect(pressed).toBeGreaterThan(temperatureOf('lambda: 1', 'oxidant state: 600 degC, 1 bar'));
    const closed = checkFacts(hydrogenBurn('lambda: 1', 'held: volume'));
    expect(figureOf(closed, 'flame', 'flame-temperature')).toBeGreaterThan(atOne + 200);
    // p/p₀ = n T / (n₀ T₀): 9 times hotter with 15 % less gas.
    expect(figureOf(closed, 'flame', 'pressure')).toBeGreaterThan(7);
    expect(figureOf(closed, 'flame', 'pressure')).toBeLessThan(9);
  });

  test('a heat loss takes its share of the heating value out of the exhaust, and nothing else', () => {
    const scenario = checkFacts(`
      ${hydrogenBurn('lambda: 1.5', 'cooled to: 150 degC')}
      burn cooled_flame {
        fuel: hydrogen
        oxidant: air
        lambda: 1.5
        heat loss: 20 % of fuel energy
        cooled to: 150 degC
      }
    `);
    const [plain, lossy] = ['flame', 'cooled_flame'].map(
      (name) => figureOf(scenario, name, 'flame-temperature') ?? NaN,
    );
    expect(lossy).toBeLessThan((plain ?? NaN) - 200);
    expect(figureOf(scenario, 'cooled_flame', 'heat-above-exhaust')).toBeCloseTo(
      figureOf(scenario, 'flame', 'heat-above-exhaust') ?? NaN,
      9,
    );
  });

  test('a given temperature is kept, and an unknown energy is then no matter', () => {
    const scenario = checkFacts(`
      substance lees {
        phase: liquid
        composition: 50 % C, 7 % H, 43 % O
      }
      burn kiln {
        fuel: lees
        oxidant: air
        lambda: 1.2
        temperature: 1200 degC
      }
    `);
    expect(figureOf(scenario, 'kiln', 'flame-temperature')).toBeCloseTo(1473.15, 9);
    expect(figureOf(scenario, 'kiln', 'heat-released')).toBeUndefined();
    expect(definitionOf(scenario, 'kiln').absent.get('heat-released')).toEqual(['the enthalpy of formation of lees']);
  });

  test('preheat of the fuel counts its melting on the way', () => {
    const scenario = checkFacts(`
      oxidant moist_oxygen {
        20 % mole oxygen
        80 % mole steam
        state: 25 degC, 1 bar
      }
      burn torch {
        fuel: sodium
        oxidant: moist_oxygen
        lambda: 1
        fuel temperature: 150 degC
      }
    `);
    // Sodium from 25 °C to 150 °C: 125 K at about 30.3 J/(mol K) and 2.6 kJ/mol of melting, over 22.99 g/mol.
    expect(figureOf(scenario, 'torch', 'preheat')).toBeCloseTo((0.125 * 30.3 + 2.6) / 22.99, 2);
  });

  test('a richer zone has its own temperature and products, and the whole is as without it', () => {
    const zoned = checkFacts(hydrogenBurn('lambda: 2', 'flame zone: lambda 1'));
    expect(figureOf(zoned, 'flame', 'flame-zone-temperature')).toBeCloseTo(temperatureOf('lambda: 1'), 6);
    expect(figureOf(zoned, 'flame', 'flame-temperature')).toBeCloseTo(temperatureOf('lambda: 2'), 6);
    expect(sum(column(tableOf(zoned, 'flame', 'flame-zone-products'), 'flame-zone-mass-share'))).toBeCloseTo(1, 5);
    const inverse = checkFacts(hydrogenBurn('lambda: 2', 'flame zone: equivalence ratio 1'));
    expect(figureOf(inverse, 'flame', 'flame-zone-temperature')).toBeCloseTo(temperatureOf('lambda: 1'), 6);
  });

  test('products: shares add up, elements balance, the certificate holds', () => {
    const scenario = checkFacts(hydrogenBurn('lambda: 1.1'));
    const products = tableOf(scenario, 'flame', 'products');
    expect(sum(column(products, 'mass-share'))).toBeCloseTo(1, 5);
    expect(sum(column(products, 'wet-mole-share'))).toBeCloseTo(1, 5);
    expect(sum(column(products, 'dry-mole-share'))).toBeCloseTo(1, 5);
    for (const difference of column(tableOf(scenario, 'flame', 'element-balance'), 'relative-difference')) {
      expect(Math.abs(difference)).toBeLessThan(1e-10);
    }
    const [balance] = column(tableOf(scenario, 'flame', 'certificate'), 'residual');
    expect(balance).toBeLessThan(1e-10);
  });

  test('barred products do not form, and allowed ones alone do', () => {
    const barred = checkFacts(hydrogenBurn('lambda: 1', 'barred products: NO, OH(g)'));
    const names = tableOf(barred, 'flame', 'products').rows.map(([name]) => name);
    expect(names).not.toContain('NO(g)');
    expect(names).not.toContain('OH(g)');
    const allowed = checkFacts(hydrogenBurn('lambda: 1.1', 'allowed products: N2, O2, Ar, CO2, H2O(g)'));
    const formed = tableOf(allowed, 'flame', 'products').rows.map(([name]) => name);
    expect(formed).toHaveLength(5);
    // Without dissociation the flame is hotter.
    expect(figureOf(allowed, 'flame', 'flame-temperature')).toBeGreaterThan(temperatureOf('lambda: 1.1') + 50);
  });
});

test.each(['hydrogen', 'methane', 'propane', 'methanol', 'benzene', 'gas_oil', 'mixed_alcohols'])(
  'exactly the air needed by %s, and nothing but its fully burnt products',
  (fuel) => {
    // Written out, every amount is a rounded number; the products take the elements in one proportion only.
    const text = `
      blend mixed_alcohols {
        37.3 % mass methanol
        12.1 % mass benzene
        rest ethanol
      }
      burn flame {
        fuel: ${fuel}
        oxidant: air
        lambda: 1
        allowed products: N2, Ar, CO2, H2O(g), SO2
        cooled to: 900 degC, 200 degC
      }
    `;
    const scenario = checkFacts(text);
    const kelvin = figureOf(scenario, 'flame', 'flame-temperature') ?? NaN;
    expect(kelvin).toBeGreaterThan(2200);
    expect(kelvin).toBeLessThan(2600);
    const names = tableOf(scenario, 'flame', 'products').rows.map(([name]) => name);
    expect(names).not.toContain('O2(g)');
    expect(names).toContain('H2O(g)');
  },
);

describe('as it cools', () => {
  const SODIUM = `
    blend dispersion {
      30 % mass sodium
      rest gas_oil
    }
    burn furnace {
      fuel: dispersion
      oxidant: air
      lambda: 1.2
      cooled to: 900 degC, 350 degC
    }
  `;

  test('sodium goes from hydroxide vapour to carbonate, and its rows are told at their temperature', () => {
    const scenario = checkFacts(`${SODIUM}
      let melt = mass share of Na2CO3(l) in furnace at 900 degC
      let crystal = mass share of Na2CO3(cr) in furnace at 350 degC
      let melt_when_cold = mass share of Na2CO3(l) in furnace at 350 degC
      let condensed = condensed share of furnace at 350 degC
      let dew = dew point of Na2CO3(l) in furnace
    `);
    const value = (name: string): number =>
      scenario.files.flatMap(({ values }) => values).find((one) => one.name === name)?.quantity?.value ?? NaN;
    expect(value('melt')).toBeGreaterThan(0.01);
    // Na2CO3 melts at 858 °C; below that the melt's row is there with nothing in it.
    expect(value('crystal')).toBeGreaterThan(0.01);
    expect(value('melt_when_cold')).toBe(0);
    expect(value('condensed')).toBeGreaterThanOrEqual(value('crystal'));
    expect(value('dew')).toBeGreaterThan(1131);
    const alkali = tableOf(scenario, 'furnace', 'alkali-fate').rows;
    expect(alkali.find(([form, temperatureK]) => form === 'carbonate' && temperatureK === 623.15)?.[4]).toBeCloseTo(
      1,
      2,
    );
  });

  test('a frozen composition is that of where it froze', () => {
    const frozen = checkFacts(
      SODIUM.replace('cooled to: 900 degC, 350 degC', 'cooled to: 700 degC, 350 degC\n frozen below: 700 degC'),
    );
    const rows = tableOf(frozen, 'furnace', 'cooled-states').rows;
    const condensed = column(tableOf(frozen, 'furnace', 'cooled-states'), 'condensed-share');
    expect(rows.map((row) => row.at(-1))).toEqual(['frozen', 'frozen']);
    expect(condensed[1]).toBeCloseTo(condensed[0] ?? NaN, 12);
  });

  test('nothing of the path, nor a figure, is worked out before it is read', () => {
    const definition = definitionOf(evaluateText(SODIUM), 'furnace');
    const isRead = (of: object, key: string): boolean => Object.getOwnPropertyDescriptor(of, key)?.get === undefined;
    expect(isRead(definition, 'figures')).toBe(false);
    expect(isRead(definition, 'tables')).toBe(false);
    const { tables, figures } = definition;
    expect(tables.map(({ id }) => id)).toContain('condensation');
    const fresh = definitionOf(evaluateText(SODIUM), 'furnace').tables;
    // The flame is solved for what is found wrong with it.
    expect(fresh.filter((table) => isRead(table, 'rows')).map(({ id }) => id)).toEqual(['products']);
    expect(figures.filter((figure) => isRead(figure, 'quantity'))).toEqual([]);
  });
});

test('heat above the flame in a held volume is none', () => {
  const closed = hydrogenBurn('lambda: 1', 'held: volume');
  const flameK = figureOf(evaluateText(closed), 'flame', 'flame-temperature') ?? NaN;
  const scenario = evaluateText(hydrogenBurn('lambda: 1', 'held: volume', `cooled to: ${flameK} K`));
  expect(column(tableOf(scenario, 'flame', 'cooled-states'), 'heat-above')[0]).toBeCloseTo(0, 3);
});

test('carbon against freezing is at least what the coldest live state has', () => {
  const scenario = evaluateText(`
    blend dispersion {
      30 % mass sodium
      rest gas_oil
    }
    burn furnace {
      fuel: dispersion
      oxidant: air
      lambda: 1.2
      cooled to: 700 degC
    }
  `);
  const frozen = column(tableOf(scenario, 'furnace', 'carbon-against-freezing'), 'frozen-carbonate-share');
  const [cooled] = column(tableOf(scenario, 'furnace', 'cooled-states'), 'carbonate-carbon-share');
  expect(frozen[0]).toBeLessThan(1e-3);
  expect(Math.max(...frozen)).toBeGreaterThanOrEqual(cooled ?? NaN);
  const [melting] = column(tableOf(scenario, 'furnace', 'cooled-states'), 'first-melting');
  // Carbonate alone: 850 °C as tabled, or lower with the hydroxide that is there.
  expect(melting).toBeLessThan(1125);
});

describe('uncertainty', () => {
  test('of λ reaches the flame as its slope says', () => {
    const scenario = checkFacts(hydrogenBurn('lambda: 2.1 ± 0.01', 'flame zone: equivalence ratio 0.9 ± 0.001'));
    const [high, low] = [temperatureOf('lambda: 2.09'), temperatureOf('lambda: 2.11')];
    expect(uncertaintyOf(scenario, 'flame', 'flame-temperature')).toBeCloseTo((high - low) / 2, 3);
    expect(figureOf(scenario, 'flame', 'flame-temperature')).toBeCloseTo(temperatureOf('lambda: 2.1'), 6);
    const [rich, lean] = [temperatureOf('equivalence ratio: 0.901'), temperatureOf('equivalence ratio: 0.899')];
    expect(uncertaintyOf(scenario, 'flame', 'flame-zone-temperature')).toBeCloseTo((rich - lean) / 2, 3);
    // A figure without a slope of its own is worked out anew, and comes to the same.
    const ratio = uncertaintyOf(scenario, 'flame', 'oxidant-fuel-ratio') ?? NaN;
    expect(ratio / (figureOf(scenario, 'flame', 'oxidant-fuel-ratio') ?? NaN)).toBeCloseTo(0.01 / 2.1, 6);
  });

  test('of the oxidant, the fuel and the held pressure come through, each once', () => {
    const scenario = checkFacts(`
      oxidant intake {
        100 % air
        state: 300 ± 1 degC, 1 bar
      }
      burn flame {
        fuel: hydrogen
        oxidant: intake
        lambda: 2
      }
    `);
    const at = (celsius: number): number => temperatureOf('lambda: 2', `oxidant state: ${celsius} degC`);
    expect(uncertaintyOf(scenario, 'flame', 'flame-temperature')).toBeCloseTo((at(301) - at(299)) / 2, 3);
  });
});

test('a fuel of uncertain make-up and a loss move the flame as they would if they were given so', () => {
  const certified = (heating: number, loss: number, held: string): string => `
    substance oil {
      phase: liquid
      composition: 86 % C, 14 % H
      lower heating value: ${heating} MJ/kg
    }
    burn flame {
      fuel: oil
      oxidant: air
      lambda: 1.3
      heat loss: ${loss} %
      held: ${held}
    }
  `;
  const at = (heating: number, loss: number, held: string): number =>
    figureOf(evaluateText(certified(heating, loss, held)), 'flame', 'flame-temperature') ?? NaN;
  for (const held of ['pressure 1 bar', 'volume']) {
    const uncertain = evaluateText(certified(43, 10, held).replace('43 MJ/kg', '43 ± 0.1 MJ/kg'));
    const slope = (at(43.1, 10, held) - at(42.9, 10, held)) / 2;
    expect(uncertaintyOf(uncertain, 'flame', 'flame-temperature')).toBeCloseTo(slope, 2);
    const lossy = evaluateText(certified(43, 10, held).replace('10 %', '10 ± 0.1 %'));
    const lossSlope = (at(43, 9.9, held) - at(43, 10.1, held)) / 2;
    expect(uncertaintyOf(lossy, 'flame', 'flame-temperature')).toBeCloseTo(lossSlope, 2);
  }
});

test('a claim about a flame is worked out', () => {
  const scenario = checkFacts(`
    ${hydrogenBurn('lambda: 1')}
    expect flame temperature of flame within 2400 K ± 50 K
    expect mass share of H2O(g) in flame > 15 %
    expect mass share of Na2CO3(l) in flame = 0
    #                    ^^^^^^^^^ name/unknown
  `);
  const [warm, water] = scenario.files[0]?.expectations ?? [];
  expect(warm).toMatchObject({ holds: true, unit: 'K' });
  expect(water).toMatchObject({ holds: true, unit: '1' });
});

test('heat that counts hydrogen carbonate says first that this takes hours; the product is marked so', () => {
  const scenario = evaluateText(`
    blend dispersion {
      30 % mass sodium
      rest gas_oil
    }
    burn furnace {
      fuel: dispersion
      oxidant: air
      lambda: 1.2
      cooled to: 40 degC
      exhaust temperature: 40 degC
    }
  `);
  const { figures } = definitionOf(scenario, 'furnace');
  const assumptionsOf = (id: string): readonly string[] =>
    figures.find((figure) => figure.id === id)?.working.assumptions ?? [];
  expect(assumptionsOf('heat-above-exhaust')[0]).toBe('slow-solids');
  expect(assumptionsOf('flame-temperature')).not.toContain('slow-solids');
  const slow = tableOf(scenario, 'furnace', 'cooled-products').rows.filter(
    (row) => row.at(-1) === 'limit, not forecast',
  );
  expect(slow.map(([name]) => name)).toContain('NaHCO3(cr)');
});
