// The mends on offer, applied: the text they give, and that the finding they belong to is gone.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Fix } from '../../../server/findings/finding.ts';
import { checkFix, evaluateFixture } from '../../support/features.ts';

describe('a preferred fix', () => {
  it('balances an equation', () => {
    checkFix(
      'reaction soda {\n  Na(cr) + O2(g) + C$0O2(g) -> Na2CO3(cr)\n}\n',
      'balance/elements',
      'reaction soda {\n  4 Na(cr) + O2(g) + 2 CO2(g) -> 2 Na2CO3(cr)\n}\n',
    );
  });

  it('closes the shares', () => {
    checkFix(
      'blend $0fuel {\n  30 % mass methanol\n  50 % mass ethanol\n}\n$0',
      'balance/shares',
      'blend fuel {\n  30 % mass methanol\n  rest ethanol\n}\n',
    );
  });

  it('writes the name that was meant', () => {
    checkFix('let dist = 38 nmi\nlet b = 2 * $0dits\n', 'name/unknown', 'let dist = 38 nmi\nlet b = 2 * dist\n');
  });
});

const ERRORS = 'examples/errors';
const fixes = readdirSync(ERRORS)
  .filter((name) => name.endsWith('.stoke'))
  .flatMap((name) => {
    const text = readFileSync(`${ERRORS}/${name}`, 'utf8');
    const { findings } = evaluateFixture(text);
    return findings.flatMap(({ code, fixes: offered }) =>
      offered.map((fix) => [name, fix.title, { text, code, fix }] as const),
    );
  });

describe('every fix of the examples of errors', () => {
  it('is there to be tried', () => {
    expect(fixes.length).toBeGreaterThan(5);
  });

  const isAcknowledgement = (title: string): boolean => title.startsWith('Acknowledge ');

  it.each(fixes.filter(([, title]) => !isAcknowledgement(title)))(
    '%s: %s, and there is one finding of its kind less',
    (_, _title, { text, code, fix }) => {
      const count = (of: string): number =>
        evaluateFixture(of).findings.filter((finding) => finding.code === code).length;
      expect(count(mended(text, fix))).toBeLessThan(count(text));
    },
  );

  it.each(fixes.filter(([, title]) => isAcknowledgement(title)))(
    '%s: %s, which asks for the reason and counts once it is there',
    (_, _title, { text, code, fix }) => {
      const counted = (of: string): number =>
        evaluateFixture(of).findings.filter((finding) => finding.code === code && finding.acknowledged).length;
      const unreasoned = (of: string): number =>
        evaluateFixture(of).findings.filter(({ code: own }) => own === 'name/acknowledged').length;
      const begun = mended(text, fix);
      expect(unreasoned(begun)).toBe(unreasoned(text) + 1);
      expect(counted(begun)).toBe(counted(text));
      const reasoned = begun.replace(`acknowledge ${code}: ""`, `acknowledge ${code}: "design note 7"`);
      expect(unreasoned(reasoned)).toBe(unreasoned(text));
      expect(counted(reasoned)).toBeGreaterThan(counted(text));
    },
  );
});

function mended(text: string, { edits }: Fix): string {
  return [...edits]
    .sort((left, right) => right.place.start - left.place.start)
    .reduce((all, { place, newText }) => all.slice(0, place.start) + newText + all.slice(place.end), text);
}
