// The library's own checks of the tokens' patterns and of the rules (ambiguities, left recursion, empty alternatives),
// which the programs leave out.
import { expect, test } from 'vitest';
import { LineParser } from '../../grammar/parser.ts';
import { makeLexer } from '../../grammar/tokens.ts';

test('the patterns of the tokens are sound', () => {
  expect(makeLexer(false).lexerDefinitionErrors).toEqual([]);
});

test('the rules are sound', () => {
  expect(() => new LineParser(false)).not.toThrow();
});
