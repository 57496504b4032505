/**
 * The program itself failed while working this out. The scenario need not be at fault; everything else in it is still
 * answered.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const programFailed: Rule<FactOf<'program/failed'>> = {
  severity: 'error',
  message: ({ message }) =>
    `Working this out failed by a fault of the program, not of the scenario: ${quoted(message)}. Please report it with these lines.`,
};
