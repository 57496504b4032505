// Burn-out of droplets and particles in a burn: what their times go with, and what is said where no law or property is known.
import { expect, test } from 'vitest';
import { checkFacts, evaluateText, figureOf, tableOf } from '../../../support/facts.ts';
import type { EvaluatedScenario } from '../../../../server/scenario/scenario.ts';

test('burn-out times go with the square of the diameter, the longest portion counting', () => {
  const scenario = checkFacts(`
    burn fine {
      fuel: methanol
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
    }
    burn coarse {
      fuel: methanol
      oxidant: air
      lambda: 1.3
      droplet size: 100 um
      residence time: 1 s
    }
  `);
  const [fine, coarse] = ['fine', 'coarse'].map((name) => figureOf(scenario, name, 'burn-out-time') ?? NaN);
  expect((coarse ?? NaN) / (fine ?? NaN)).toBeCloseTo(4, 9);
  const [row] = tableOf(scenario, 'coarse', 'burn-out').rows;
  expect(row?.slice(-3)).toEqual([1, 'flame of its vapour', 'burnt']);
});

test('water in a blend has no burn-out time and hides none', () => {
  const scenario = checkFacts(`
    blend spirit {
      70 % mass ethanol
      rest water
    }
    burn wet {
      fuel: spirit
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
      residence time: 1 s
    }
  `);
  expect(tableOf(scenario, 'wet', 'burn-out').rows.map(([name]) => name)).toEqual(['ethanol']);
  expect(figureOf(scenario, 'wet', 'burn-out-time')).toBeGreaterThan(0);
});

test('a zone, leaner than λ = 1 or not, does not move the flame around a droplet', () => {
  const timeOf = (...entries: readonly string[]): number =>
    figureOf(
      evaluateText(
        ['burn lamp {', 'fuel: methanol', 'oxidant: air', 'lambda: 3', 'droplet size: 50 um', ...entries, '}'].join(
          '\n',
        ),
      ),
      'lamp',
      'burn-out-time',
    ) ?? NaN;
  expect(timeOf('flame zone: lambda 1.5')).toBeCloseTo(timeOf(), 9);
});

test.each([
  ['magnesium', 'carbon_dioxide', 'particle', 'carbon dioxide'],
  ['magnesium', 'steam', 'particle', 'steam'],
  ['sodium', 'steam', 'particle', 'steam'],
  ['methanol', 'nitrous_oxide', 'droplet', 'an oxidant other than oxygen'],
])('%s in %s has no law of burn-out, and is not said to be out', (fuel, oxidant, kind, told) => {
  const scenario = evaluateText(`
    burn reactor {
      fuel: ${fuel}
      oxidant: ${oxidant}
      ${oxidant === 'nitrous_oxide' ? 'lambda: 0.9' : 'oxidant per fuel: 2 kg/kg'}
      oxidant state: 200 degC, 1 bar
      ${kind} size: 50 um
      residence time: 10 ms
    }
  `);
  expect(figureOf(scenario, 'reactor', 'burn-out-time')).toBeUndefined();
  const rows = tableOf(scenario, 'reactor', 'burn-out').rows;
  expect(rows.map((row) => [row[0], row[2], row.at(-1)])).toEqual([[fuel, null, null]]);
  const facts = scenario.files.flatMap((file) => file.facts.map(({ fact }) => fact));
  expect(facts.map(({ code }) => code)).not.toContain('range/burn-out');
  expect(JSON.stringify(facts)).toContain(`a published law of burn-out for ${fuel} in ${told}`);
});

test('a distillate burns out by what is typical of its trade, and says so; its own data go before', () => {
  const text = (fuel: string): string => `
    substance own_oil {
      phase: liquid
      composition: 87 % C, 13 % H
      lower heating value: 42.7 MJ/kg
      density: 845 kg/m3
      boiling point: 260 degC
      molar mass: 215 g/mol
    }
    burn lamp {
      fuel: ${fuel}
      oxidant: air
      lambda: 1.3
      droplet size: 60 um
      residence time: 50 ms
    }
  `;
  const [typical, own] = ['gas_oil', 'own_oil'].map((fuel) => evaluateText(text(fuel))) as [EvaluatedScenario, EvaluatedScenario]; // prettier-ignore
  const timeOf = (scenario: EvaluatedScenario): number => figureOf(scenario, 'lamp', 'burn-out-time') ?? NaN;
  // 0.5 to 1 mm²/s: 3.6 to 7.2 ms for 60 µm.
  expect(timeOf(typical)).toBeGreaterThan(3.6);
  expect(timeOf(typical)).toBeLessThan(7.2);
  expect(timeOf(own) / timeOf(typical)).toBeCloseTo(1, 1);
  const lawOf = (scenario: EvaluatedScenario): unknown => tableOf(scenario, 'lamp', 'burn-out').rows[0]?.at(-2);
  expect([lawOf(typical), lawOf(own)]).toEqual(['flame of its vapour, typical of its trade', 'flame of its vapour']);
  const sources = typical.files[0]?.definitions
    .find(({ name }) => name === 'lamp')
    ?.figures.find(({ id }) => id === 'burn-out-time')?.working.sources;
  expect(sources?.some((source) => source.startsWith('typical of the trade'))).toBe(true);
});
