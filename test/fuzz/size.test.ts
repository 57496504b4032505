// Texts of up to a megabyte that repeat one thing: each is answered, none runs out of stack, memory or patience.
// A quadratic walk over any of them would take minutes, which the runner's own limit turns into a failure.
import { describe, expect, test } from 'vitest';
import { format } from '../../grammar/printer.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { findingsOf } from '../../server/findings/registry.ts';
import { noPaint } from '../../server/report/paint.ts';
import { gatherFiles } from '../../server/report/gather.ts';
import { textReport } from '../../server/report/text.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';

function codesOf(text: string): ReadonlyMap<string, number> {
  const scenario = evaluate('large.stoke', () => ({ text }));
  const findings = findingsOf(scenario);
  const files = gatherFiles([{ scenario, findings }]);
  expect(textReport(files, { extent: 'evaluate', paint: noPaint, width: 100 })).not.toBe('');
  const counts = new Map<string, number>();
  for (const { code } of findings) counts.set(code, (counts.get(code) ?? 0) + 1);
  return counts;
}

const rings = Array.from({ length: 20_000 }, (_, index) => `let a${index} = a0 + a${index + 1}\n`).join('');
const kinds = Array.from({ length: 20_000 }, (_, index) => `fleet s${index} {\n}\n`).join('');

describe('a large text', () => {
  test.each<[what: string, text: string, code: string, count: number]>([
    ['one name given 20,000 times', 'let a = 1\n'.repeat(20_000), 'name/duplicate', 20_000],
    ['20,000 names that all lead back to the first', rings, 'name/cycle', 20_000],
    ['a blend of 130,000 portions', `blend b {\n${'1 % K\n'.repeat(130_000)}}`, 'balance/shares', 1],
    [
      'a blend with 130,000 entries that it does not have',
      `blend b {\n${'a:1\n'.repeat(130_000)}}`,
      'name/unknown-entry',
      130_000,
    ],
    ['a call with 130,000 arguments', `let a = max(${'1,'.repeat(130_000)}1)`, 'program/failed', 0],
    ['130,000 entries without a value', `blend b {\n${'a:\n'.repeat(130_000)}}`, 'syntax/missing', 128],
    ['30,000 claims that fail', 'expect 1 > 2\n'.repeat(30_000), 'expect/failed', 30_000],
    ['20,000 definitions of a kind that is not worked out', kinds, 'kind/not-evaluated', 20_000],
  ])('%s', (_, text, code, count) => {
    expect(codesOf(text).get(code) ?? 0).toBe(count);
  });

  test('a run of 130,000 portions is formatted', () => {
    const text = `blend b {\n${'1 % K\n'.repeat(130_000)}}\n`;
    expect(format(text, isUnitWord)).toBe(`blend b {\n${'  1 %  K\n'.repeat(130_000)}}\n`);
  });
});
