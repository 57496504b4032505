// Figures about flames, spills and ullages of a blend: against stoichiometry and the published limits of their portions,
// with their uncertainty, and absent with a reason where a bound would be too low.
import { describe, expect, test } from 'vitest';
import { findSubstance } from '../../../server/core/substance/catalogue.ts';
import type { EvaluatedDefinition } from '../../../server/scenario/scenario.ts';
import { evaluateText, figureOf, uncertaintyOf } from '../../support/facts.ts';

const litresPerMol = ((8.31446261815324 * 298.15) / 1e5) * 1000;

function blend(lines: string): EvaluatedDefinition {
  const found = evaluateText(`blend it {\n${lines}\n}\n`).files[0]?.definitions[0];
  if (!found) throw new Error('no definition');
  return found;
}

const inBlend = (lines: string, id: string): number | undefined =>
  figureOf(evaluateText(`blend it {\n${lines}\n}\n`), 'it', id);

describe('a spilled kilogram in water', () => {
  test('hydrogen by stoichiometry, with the uncertainty of the share', () => {
    const text = 'blend it {\n  30 ± 1 % mass sodium\n  rest gas_oil\n  blanket: argon\n}\n';
    const perKg = (0.5 / 0.02298976928) * litresPerMol;
    expect(figureOf(evaluateText(text), 'it', 'water-contact-hydrogen')).toBeCloseTo(0.3 * perKg, 2);
    expect(uncertaintyOf(evaluateText(text), 'it', 'water-contact-hydrogen')).toBeCloseTo(0.01 * perKg, 2);
  });

  test('of a blend in a blend the shares multiply', () => {
    const text =
      'blend concentrate {\n  50 % mass sodium\n  rest gas_oil\n}\nblend it {\n  60 % mass concentrate\n  rest gas_oil\n}\n';
    const direct = inBlend('  30 % mass sodium\n  rest gas_oil', 'water-contact-hydrogen') ?? NaN;
    expect(figureOf(evaluateText(text), 'it', 'water-contact-hydrogen')).toBeCloseTo(direct, 6);
  });

  test('gases other than hydrogen are a table', () => {
    const [row] = blend('  100 % calcium_carbide').tables.find(({ id }) => id === 'water-contact-gases')?.rows ?? [];
    // CaC2 + 2 H2O -> Ca(OH)2 + C2H2
    expect(row?.[0]).toBe('C2H2');
    expect(row?.[1]).toBeCloseTo(1000 / 64.0992, 1);
  });

  test('what water makes of a portion is not known: no number, and it is said which', () => {
    const { figures, absent } = blend('  20 % ammonia_borane\n  30 % sodium\n  rest gas_oil');
    expect(figures.map(({ id }) => id)).not.toContain('water-contact-hydrogen');
    expect(absent.get('water-contact-hydrogen')).toEqual(['what water makes of ammonia_borane']);
    expect(absent.get('water-contact-heat')).toEqual(['what water makes of ammonia_borane']);
  });

  test('what does not react has none', () => {
    expect(blend('  100 % gas_oil').figures.filter(({ id }) => id.startsWith('water-contact'))).toEqual([]);
  });
});

describe('flash point and range', () => {
  test('a single liquid has its own flash point and limits', () => {
    const ethanol = findSubstance('ethanol');
    expect(inBlend('  100 % ethanol', 'flash-point')).toBe(ethanol?.flashPointK?.value);
    expect(inBlend('  100 % ethanol', 'upper-flammable-limit')).toBeCloseTo(
      ethanol?.flammableLimits?.upper?.value ?? NaN,
      12,
    );
  });

  test('they have their sources in the working', () => {
    const flash = blend('  50 % ethanol\n  rest water').figures.find(({ id }) => id === 'flash-point');
    expect(flash?.working.inputs.map(({ label }) => label)).toEqual([
      'Flash point of ethanol',
      'Boiling point of ethanol',
      'Boiling point of water',
    ]);
    expect(flash?.working.sources.length).toBeGreaterThan(0);
  });

  test('a gas thinned with inert gas: its lower limit by the share that burns, no upper one', () => {
    // Its limit is on record at 20 °C.
    const lower = findSubstance('methane')?.flammableLimits?.lower.value ?? NaN;
    const biogas = blend('  60 % mole methane\n  rest carbon_dioxide\n  stored: 20 degC, 1 bar').figures;
    expect(biogas.find(({ id }) => id === 'lower-flammable-limit')?.quantity.value).toBeCloseTo(lower / 0.6, 9);
    expect(biogas.map(({ id }) => id)).not.toContain('upper-flammable-limit');
    expect(inBlend('  3 % mole methane\n  rest nitrogen', 'lower-flammable-limit')).toBeUndefined();
  });

  test('a substance of the scenario brings its own limits', () => {
    const text =
      'substance spirit {\n  phase: liquid\n  composition: 84 % C, 16 % H\n  lower heating value: 44 MJ/kg\n  density: 700 kg/m3\n' +
      '  molar mass: 100 g/mol\n  boiling point: 98 degC\n  flash point: -4 degC\n  lower flammable limit: 1.2 %\n  upper flammable limit: 6.9 %\n}\n' +
      'blend it {\n  100 % spirit\n}\n';
    expect(figureOf(evaluateText(text), 'it', 'upper-flammable-limit')).toBeCloseTo(0.069, 12);
    expect(figureOf(evaluateText(text), 'it', 'flash-point')).toBeCloseTo(269.15, 9);
  });
});

describe('hydrogen over it in its tank', () => {
  const slurry = (filling: string): string =>
    `  30 % mass sodium\n  2 % mass water\n  rest gas_oil\n  stored: 25 degC, 1 bar\n  filling: ${filling}`;

  test('made of its own water', () => {
    // Na + H2O -> NaOH + 1/2 H2, the water in the minority.
    const made = (0.02 / 0.01801528) * 0.5 * litresPerMol;
    expect(inBlend(slurry('95 %'), 'own-hydrogen')).toBeCloseTo(made, 2);
    const density = inBlend(slurry('50 %'), 'density') ?? NaN;
    // Half full: a litre of gas over a litre of blend, so each litre of hydrogen per litre adds a bar.
    expect(inBlend(slurry('50 %'), 'ullage-pressure-rise')).toBeCloseTo((made * density) / 1000, 2);
    expect(inBlend(slurry('50 %'), 'ullage-hydrogen-share')).toBeCloseTo(1 - Math.exp((-made * density) / 1000), 4);
  });

  test('a smaller ullage bears less water', () => {
    const water = (filling: string): number =>
      inBlend(`  30 % mass sodium\n  rest gas_oil\n  filling: ${filling}`, 'ullage-water-limit') ?? NaN;
    expect(water('50 %') / water('90 %')).toBeCloseTo(9, 9);
    // 4 % of the gas over a kilogram, by two mol of water a mol of hydrogen.
    const density = inBlend('  30 % mass sodium\n  rest gas_oil', 'density') ?? NaN;
    const gasMol = 1000 / density / litresPerMol;
    expect(water('50 %')).toBeCloseTo(-Math.log(0.96) * gasMol * 2 * 18015.28, 1);
  });

  test('a tank full to the brim has no gas over it', () => {
    const ids = blend(slurry('100 %')).figures.map(({ id }) => id);
    expect(ids).toContain('own-hydrogen');
    expect(ids.filter((id) => id.startsWith('ullage'))).toEqual([]);
  });
});

describe('the route aboard a ship', () => {
  test.each([
    ['  100 % gas_oil', 'SOLAS II-2/4.2', 'mandatory'],
    ['  85 % ethanol\n  rest petrol', 'MSC.1/Circ.1621', 'interim'],
    ['  30 % mass sodium\n  rest gas_oil', 'no prescriptive code', 'none'],
  ])('%s', (lines, instrument, status) => {
    const [row] = blend(lines).tables.find(({ id }) => id === 'approval-route')?.rows ?? [];
    expect(row?.[0]).toContain(instrument);
    expect(row?.[1]).toBe(status);
    expect(row?.[3]).toMatch(/^\d{4}-\d{2}$/);
  });

  test('what does not burn has none', () => {
    expect(blend('  100 % argon').tables.map(({ id }) => id)).not.toContain('approval-route');
  });
});
