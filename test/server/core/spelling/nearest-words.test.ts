// Nearest words: order, bound and look-alikes.

import { expect, test } from 'vitest';
import { nearestWords } from '../../../../server/core/spelling/nearest-words.ts';

const words = ['main', 'mains', 'maine', 'auxiliary', 'slurry', 'H2O', 'CO2'];

test('nearest first, then the shorter, then the alphabet', () => {
  expect(nearestWords('mian', words, 1)).toEqual(['main']);
  expect(nearestWords('maim', words, 3)).toEqual(['main', 'maine', 'mains']);
});

test('look-alikes and case cost less than other slips', () => {
  expect(nearestWords('H20', words, 1)).toEqual(['H2O']);
  expect(nearestWords('c02', words, 1)).toEqual(['CO2']);
});

test('the bound grows with the word', () => {
  expect(nearestWords('sl', words, 3)).toEqual([]);
  expect(nearestWords('auxilary', words, 3)).toEqual(['auxiliary']);
  expect(nearestWords('auxxxxlry', words, 3)).toEqual([]);
});

test('the word itself is no suggestion, and none of nothing', () => {
  expect(nearestWords('main', ['main'], 3)).toEqual([]);
  expect(nearestWords('main', [], 3)).toEqual([]);
});
