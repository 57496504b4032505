import { describe, expect, test } from 'vitest';
import { explain, explanationParagraphs } from '../../../server/wording/explain.ts';
import { assumptionText } from '../../../server/wording/assumptions.ts';
import { methodText } from '../../../server/wording/methods.ts';
import { figure, quantity } from '../../support/scenario-builder.ts';

const place = { path: 'trial.stoke', start: 10, end: 20 };
const density = figure('density', 850, 'kg/m3', {
  working: {
    method: 'ideal-volume-mixing',
    inputs: [
      { label: 'density of gas_oil', quantity: quantity(850, 'kg/m3'), unit: 'kg/m3', place },
      { label: 'density of sodium', quantity: null, unit: 'kg/m3', source: 'Handbook 1999' },
    ],
    sources: ['Handbook 1999', 'Handbook 1999'],
    assumptions: ['volumes-add'],
  },
});

test('the working in words, with lines, sources and assumptions', () => {
  const paragraphs = explanationParagraphs(explain(density, () => 'line 12'));
  expect(paragraphs).toEqual([
    'The mass over the sum of the volumes that the portions have by themselves.',
    'ρ = 1 / Σ (wᵢ / ρᵢ)\nwith wᵢ mass share and ρᵢ density of portion i',
    'From:\n- density of gas_oil = 850 kg/m³ (line 12)\n- density of sodium = not known (Handbook 1999)',
    'The volumes of the portions add up.',
    expect.stringMatching(/^Good for oils/),
    'Source: Handbook 1999',
  ]);
});

test('places that need no saying are not said, and empty parts are left out', () => {
  const given = figure('flash-point', 338.15, 'K');
  expect(explanationParagraphs(explain(given, () => null))).toHaveLength(2);
});

describe('every method and assumption has its text', () => {
  test('equations come with their symbols', () => {
    for (const method of ['lower-heating-value', 'stoichiometric-air', 'equilibrium-constant'] as const) {
      expect(methodText(method).equation).not.toBeNull();
      expect(methodText(method).symbols).not.toBe('');
    }
  });

  test('an assumption is a sentence', () => {
    expect(assumptionText('carbonate-slate')).toMatch(/^[A-Z].*\.$/);
  });
});
