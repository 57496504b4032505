// Hazards in words: the caution tells the gravest few and no more, every code has words, and nothing is ever called safe.

import { describe, expect, test } from 'vitest';
import { allSubstances, findSubstance } from '../../../server/core/substance/catalogue.ts';
import { ghsClasses } from '../../../server/core/substance/ghs.ts';
import type { Hazards } from '../../../server/core/substance/hazards.ts';
import type { Screening } from '../../../server/scenario/screening.ts';
import {
  cautionText,
  dangerText,
  exposureText,
  hazardRows,
  reportCaution,
  screeningText,
  transportText,
} from '../../../server/wording/hazards.ts';
import { evaluateText } from '../../support/facts.ts';

function hazardsOf(name: string): Hazards {
  const hazards = findSubstance(name)?.hazards;
  if (hazards === undefined) throw new Error(`no hazards of ${name}`);
  return hazards;
}

const caution = (name: string): string | null => cautionText(name, hazardsOf(name));
const standing =
  ' Screening only: follow the safety data sheet, class, flag and local rules; a competent person approves the design.';

describe('the caution', () => {
  test.each([
    ['sodium', 'Caution, sodium: water makes flammable gas that may take fire; burns skin and eyes.'],
    [
      'caesium',
      'Caution, caesium: takes fire in air; water makes flammable gas that may take fire; burns skin and eyes.',
    ],
    [
      'sodium_potassium_alloy',
      'Caution, sodium_potassium_alloy: takes fire in air; water makes flammable gas that may take fire; burns skin and eyes.',
    ],
    ['methanol', 'Caution, methanol: toxic; highly flammable liquid; damages organs.'],
    ['ammonia', 'Caution, ammonia: toxic; burns skin and eyes; flammable gas.'],
    [
      'magnesium',
      'Caution, magnesium: as powder takes fire in air; as powder water makes flammable gas that may take fire; as coated powder water makes flammable gas.',
    ],
    ['hydrogen_chloride', 'Caution, hydrogen_chloride: as liquefied gas toxic; burns skin and eyes.'],
    ['nitrogen', 'Caution, nitrogen: displaces the air to breathe.'],
    ['gas_oil', 'Caution, gas_oil: flammable liquid; may be deadly if swallowed and drawn into the lungs.'],
  ])('of %s', (name, text) => {
    expect(caution(name)).toBe(text + standing);
  });

  test.each(['sodium_carbonate', 'water', 'calcium_carbonate', 'zinc_oxide', 'air', 'glycerol', 'vegetable_oil'])(
    'is not printed for %s',
    (name) => {
      expect(caution(name)).toBeNull();
    },
  );

  test('is short, and never says safe', () => {
    for (const { name, hazards } of allSubstances()) {
      if (hazards === undefined) continue;
      const text = cautionText(name, hazards) ?? '';
      expect(text.replace(standing, '').length, name).toBeLessThanOrEqual(180);
      const rows = hazardRows(hazards).map(({ label, text: value }) => `${label} ${value}`);
      expect(`${text} ${rows.join(' ')}`.toLowerCase(), name).not.toMatch(/\bsafe\b|harmless/);
    }
  });
});

test('every statement code of the table has words', () => {
  for (const code of ghsClasses.flatMap(({ statements }) => statements)) expect(dangerText(code)).not.toBe(code);
});

describe('rows', () => {
  test('say a limit with its time and what it is measured as', () => {
    const [ammonia] = hazardsOf('ammonia').exposure;
    expect(ammonia && exposureText(ammonia)).toBe('25 ppm over up to 10 h');
    const silica = hazardsOf('silicon_dioxide').exposure.find(({ authority }) => authority === 'OSHA');
    expect(silica && exposureText(silica)).toBe('0.05 mg/m³ over 8 h (crystalline, respirable)');
  });

  test('say how it is carried, with strength and form', () => {
    const texts = hazardsOf('ammonia').transport.map(transportText);
    expect(texts).toContain('UN 1005 AMMONIA, ANHYDROUS, class 2.3 (8)');
    expect(texts).toContain('UN 2672 AMMONIA SOLUTION, class 8, packing group III, 10 to 35 % by mass, in solution');
    expect(texts).toContain('UN 3318 AMMONIA SOLUTION, class 2.3 (8), above 50 % by mass, in solution');
  });

  test('each have a source', () => {
    for (const { name, hazards } of allSubstances()) {
      for (const { source, text } of hazards ? hazardRows(hazards) : []) {
        expect(source, name).not.toBe('');
        expect(text, name).not.toBe('');
      }
    }
  });
});

describe('a report', () => {
  const screeningOf = (lines: string): Screening => {
    const screening = evaluateText(`blend it {\n${lines}\n}\n`).files[0]?.definitions[0]?.screening;
    if (!screening) throw new Error('not screened');
    return screening;
  };
  const grave = ['sodium', 'hydrazine', 'methanol', 'ethanol', 'gas_oil', 'carbon_monoxide', 'petrol'];

  test('says how many rules were looked at, which fired, and never that it is safe', () => {
    const quiet = screeningText(screeningOf('  100 % vegetable_oil'));
    expect(quiet).toMatch(/^Hazard rules: \d{2} looked at, none fired\.$/);
    expect(screeningText(screeningOf('  30 % mass sodium\n  rest gas_oil\n  blanket: argon'))).toContain(
      'found water reactive.',
    );
  });

  test('names what it cannot see', () => {
    const text =
      'substance additive {\n  phase: liquid\n  composition: 70 % C, 11 % H, 19 % O\n  density: 900 kg/m3\n}\n' +
      'blend it {\n  2 % mass additive\n  rest gas_oil\n}\n';
    const screening = evaluateText(text).files[0]?.definitions[1]?.screening;
    expect(screening && screeningText(screening)).toContain('Nothing is recorded of the hazards of additive');
  });

  test('bears one caution, the gravest substances first and each once', () => {
    const [first, second] = [
      screeningOf(grave.map((name) => `  14 % ${name}`).join('\n') + '\n  2 % water'),
      screeningOf('  100 % sodium'),
    ];
    const text = reportCaution([first, second]) ?? '';
    expect(text.match(/sodium:/g)).toHaveLength(1);
    expect(text).toContain('2 more with dangers of their own.');
    expect(text.endsWith(standing.trim())).toBe(true);
    expect(text.indexOf('sodium:')).toBeLessThan(text.indexOf('methanol:'));
    expect(reportCaution([screeningOf('  100 % water')])).toBeNull();
  });

  test('of any substance: the word safe is never printed', () => {
    for (const { name } of allSubstances().slice(0, 400)) {
      const screening = screeningOf(`  100 % '${name}'`);
      expect(`${screeningText(screening)} ${reportCaution([screening]) ?? ''}`).not.toMatch(/\bsafe\b/i);
    }
  });
});
