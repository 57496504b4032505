// The walk over an expression: every part once, in the order of the text, whatever its depth.
import { expect, test } from 'vitest';
import { parse } from '../../grammar/parse.ts';
import { expressionsIn } from '../../grammar/walk.ts';
import { isTestUnit } from '../support/units.ts';

function kindsIn(text: string): string[] {
  const [section] = parse(text, isTestUnit).sections;
  const statement = section?.section.statement;
  if (statement?.kind === 'let') return [...expressionsIn(statement.value)].map(({ kind }) => kind);
  return statement?.kind === 'expect' ? [...expressionsIn(statement.claim)].map(({ kind }) => kind) : [];
}

test('parts follow the whole, left before right', () => {
  expect(kindsIn('let x = -(2 kg) + min(y, 3 kg)')).toEqual([
    'binary',
    'unary',
    'bracket',
    'quantity',
    'call',
    'word',
    'quantity',
  ]);
  expect(kindsIn('expect density of oil at limit < sodium in slurry')).toEqual([
    'comparison',
    'reference',
    'word',
    'membership',
  ]);
  expect(kindsIn('expect x within 3 kg ± 1 kg')).toEqual(['within', 'word', 'quantity']);
});

test('nothing is nothing', () => {
  expect([...expressionsIn(undefined)]).toEqual([]);
});
