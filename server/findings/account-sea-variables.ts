/**
 * A carbonate system is settled by any two of its variables that say different things. With fewer, it is not known; with more, the
 * first two are taken, and the others can only agree or not.
 */
import { quantityText } from '../wording/quantities.ts';
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const accountSeaVariables: Rule<FactOf<'account/sea-variables'>> = {
  severity: ({ why }) => (why === 'too-few' ? 'error' : 'warning'),
  fixes: (fact) =>
    fact.why === 'too-many'
      ? [{ title: `Remove ${quoted(fact.extra)}`, preferred: true, edits: [{ place: fact.line, newText: '' }] }]
      : [],
  message: (fact) => {
    if (fact.why === 'too-few') {
      const { name, given } = fact;
      const has =
        given.length === 0
          ? 'none is given'
          : given.length === 1
            ? `only ${quoted(given[0] ?? '')} is given`
            : `${listed(given.map(quoted))} say the same thing`;
      return `The carbonate system of ${quoted(name)} needs two of its variables, and ${has}. Add for example ${listed(examples(given).map(quoted))}.`;
    }
    const { taken, extra, written, worked, unit } = fact;
    const pair = listed(taken.map(quoted));
    const settled = `${pair} settle the carbonate system already`;
    return worked
      ? `${settled}: they make ${quoted(extra)} ${quantityText(worked, unit)}, and ${quantityText(written, unit)} is written. ${pair} are taken; remove one of the three.`
      : `${settled}. ${pair} are taken, and ${quoted(extra)} is not looked at; remove one of the three.`;
  },
};

const usual = ['total alkalinity', 'pCO2'] as const;

function examples(given: readonly string[]): readonly string[] {
  if (given.length === 0) return usual;
  return [given.includes(usual[0]) ? usual[1] : usual[0]];
}
