// The working of a material's figures: which slate, which products and which assumptions each rests on.
import { describe, expect, test } from 'vitest';
import { checkFacts } from '../../support/facts.ts';

describe('several slates', () => {
  test('the working of a figure tells the slate it rests on', () => {
    const { files } = checkFacts(`
      blend fuel {
        20 % sodium
        10 % potassium
        rest methanol
      }
    `);
    const workingOf = (id: string) => files[0]?.definitions[0]?.figures.find((figure) => figure.id === id)?.working;
    const labels = (id: string) => workingOf(id)?.inputs.map(({ label }) => label);
    expect(labels('lower-heating-value')).toContain('K2CO3(cr)');
    expect(labels('hydroxide-lower-heating-value')).toContain('KOH(cr)');
    expect(labels('hydroxide-lower-heating-value')).not.toContain('K2CO3(cr)');
    expect(labels('oxide-lower-heating-value')).toContain('K2O(cr)');
    expect(workingOf('oxide-lower-heating-value')?.assumptions).toEqual(
      expect.arrayContaining(['oxide-slate', 'several-alkalis-proportional']),
    );
  });
});
