// What is asked of a burn besides its flame: temperatures it has no state at, and what the uncertainty of such entries does.
import { expect, test } from 'vitest';
import { checkFacts, figureOf, uncertaintyOf } from '../../../support/facts.ts';

test('cooled states, walls and exhausts beyond all data are told, and an exhaust above the flame', () => {
  const scenario = checkFacts(`
    burn beyond {
      fuel: hydrogen
      oxidant: air
      lambda: 1
      cooled to: 900 degC, -100 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/temperature
      exhaust temperature: 7000 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/temperature
      wall temperature: -100 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/temperature
    }
    burn hotter {
      fuel: hydrogen
      oxidant: air
      lambda: 1
      exhaust temperature: 3000 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/temperature
    }
    burn tepid {
      fuel: hydrogen
      oxidant: air
      lambda: 1
      temperature: 100 degC
    }
    burn frozen {
      fuel: hydrogen
      oxidant: air
      lambda: 1
      frozen below: 900 degC
      cooled to: -80 degC
    }
  `);
  const definitions = scenario.files.flatMap((file) => file.definitions);
  const beyond = definitions.find(({ name }) => name === 'beyond');
  expect(beyond?.absent.get('heat-above-exhaust')).toEqual(['a state of the products at the exhaust temperature']);
  const states = beyond?.tables.find(({ id }) => id === 'cooled-states');
  expect(states?.rows.map((row) => row.at(-1))).toEqual(['equilibrium', 'beyond all data']);
  const frozen = definitions.find(({ name }) => name === 'frozen')?.tables.find(({ id }) => id === 'cooled-states');
  expect(frozen?.rows.map((row) => row.at(-1))).toEqual(['frozen']);
});

/** A burn of methanol in air with one further entry. */
function methanolBurn(entry: string): ReturnType<typeof checkFacts> {
  return checkFacts(['burn flame {', 'fuel: methanol', 'oxidant: air', 'lambda: 1.2', entry, '}'].join('\n'));
}

test('the uncertainty of an exhaust temperature, a freezing temperature and a droplet reaches what rests on them', () => {
  const valueOf = (entry: string, id: string): number => figureOf(methanolBurn(entry), 'flame', id) ?? NaN;
  const cases = [
    ['exhaust temperature', 'heat-above-exhaust', '150', '20', 'degC'],
    ['droplet size', 'burn-out-time', '200', '10', 'um'],
    ['frozen below', 'heat-released', '1500', '50', 'degC'],
  ] as const;
  for (const [entry, id, value, deviation, unit] of cases) {
    const at = (number: number): number => valueOf(`${entry}: ${number} ${unit}`, id);
    const [centre, step] = [Number(value), Number(deviation)];
    // Uncertainties are carried to first order: by the slope, not by how the figure bends over a whole deviation.
    const half = (Math.abs(at(centre + step / 100) - at(centre - step / 100)) / 2) * 100;
    const told = uncertaintyOf(methanolBurn(`${entry}: ${value} ± ${deviation} ${unit}`), 'flame', id) ?? 0;
    const without = uncertaintyOf(methanolBurn(`${entry}: ${value} ${unit}`), 'flame', id) ?? 0;
    expect(half, id).toBeGreaterThan(0);
    expect(told ** 2 - without ** 2, id).toBeCloseTo(half ** 2, 6);
  }
});

test('no water is missing where silicon binds the alkali; a bottle of nitrous oxide is no cold air', () => {
  checkFacts(`
    blend silicide {
      40 % mass  silicon
      rest       sodium
    }
    burn glassy {
    #    ^^^^^^ range/temperature
      fuel: silicide
      oxidant: air
      lambda: 1.5
    }
    burn bottle {
      fuel: methanol
      oxidant: nitrous_oxide
      lambda: 1.5
      held: pressure 30 bar
    }
  `);
});

test("a zone's λ at fault is told at the zone where the oxidant is given by mass; its figures say what they lack", () => {
  const scenario = checkFacts(`
    burn bound {
      fuel: magnesium
      oxidant: steam
      oxidant per fuel: 2 kg/kg
      flame zone: lambda 0.8
    # ^^^^^^^^^^^^^^^^^^^^^^ balance/charge
    }
    substance unmeasured {
      formula: C6H14O
    }
    burn given {
      fuel: unmeasured
      oxidant: air
      lambda: 1.5
      flame zone: lambda 0.9
      temperature: 1200 degC
    }
  `);
  const given = scenario.files.flatMap((file) => file.definitions).find(({ name }) => name === 'given');
  expect(given?.absent.get('flame-zone-temperature')).toEqual(given?.absent.get('heat-released'));
  expect(given?.absent.get('flame-zone-temperature')?.length).toBeGreaterThan(0);
});
