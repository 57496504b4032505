// Spoilt scenarios: mutations of all examples go through parser, formatter, evaluation and findings. Nothing may throw, hang
// for a second, or lose a character that is no white space; formatting must be stable. Runs for FUZZ_SECONDS, or until
// FUZZ_INPUTS were tried, with a fresh seed that is printed and can be given back as FUZZ_SEED.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { format } from '../../grammar/printer.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import { fuzzRun, workedMs } from '../support/fuzz-run.ts';
import { spoilt } from '../support/spoilt.ts';

const SLOWEST_MS = 1000;
const run = fuzzRun();

test(`spoilt scenarios, ${run.title}`, { timeout: run.timeoutMs }, () => {
  let count = 0;
  const holds = fc.property(spoilt, (text) => {
    count++;
    // Collecting garbage may hold one run up; the same input twice over the limit is a hang.
    if (survivedMs(text) > SLOWEST_MS) expect(survivedMs(text)).toBeLessThan(SLOWEST_MS);
  });
  fc.assert(holds, run.parameters);
  console.log(`fuzz: ${count} spoilt scenarios, seed ${run.seed}`);
  expect(count).toBeGreaterThan(run.leastCount);
});

describe('texts with odd characters', () => {
  test.each<[what: string, text: string]>([
    ['a half character at the end', 'let a = 1 # \ud83d'],
    ['a null character in a name', "blend 'a\0b' { rest water }"],
  ])('%s', (_, text) => {
    survive(text);
  });
});

function survive(text: string): void {
  const scenario = evaluate('main.stoke', (asked) => (asked === 'main.stoke' ? { text } : { fault: 'missing' }));
  expect(findingsOf(scenario).filter(({ code }) => code === 'program/failed')).toEqual([]);
  const formatted = format(text, isUnitWord);
  expect(solid(formatted)).toBe(solid(text));
  expect(format(formatted, isUnitWord)).toBe(formatted);
}

function solid(text: string): string {
  return text.replace(/\s/g, '');
}

/** How long it took. */
function survivedMs(text: string): number {
  const before = process.cpuUsage();
  survive(text);
  return workedMs(before);
}
