// Half-written files: prefixes of the examples are evaluated and put into words, and must never throw, lose the rest of
// the file, or report a bug of ours. The random ones use a fresh seed, which is printed when one fails.
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';

const FOLDER = path.resolve('examples');
const examples = readdirSync(FOLDER, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.stoke'));

/** Evaluates a text in place of an example's own, with the files it uses, and returns the codes found. */
function codesOf(name: string, text: string): string[] {
  const root = path.join(FOLDER, name);
  const scenario = evaluate(root, (file) => {
    if (file === root) return { text };
    try {
      return { text: readFileSync(file, 'utf8') };
    } catch {
      return { fault: 'missing' };
    }
  });
  return findingsOf(scenario).map((finding) => finding.code);
}

test('there are examples', () => {
  expect(examples.length).toBeGreaterThanOrEqual(3);
});

test.each(examples)('every prefix of %s that ends with a line', (name) => {
  const text = readFileSync(path.join(FOLDER, name), 'utf8');
  for (let end = text.indexOf('\n') + 1; end > 0; end = text.indexOf('\n', end) + 1) {
    expect(codesOf(name, text.slice(0, end))).not.toContain('program/failed');
  }
});

test('three hundred random prefixes', () => {
  const prefix = fc.record({ name: fc.constantFrom(...examples), share: fc.double({ min: 0, max: 1, noNaN: true }) });
  const holds = fc.property(prefix, ({ name, share }) => {
    const text = readFileSync(path.join(FOLDER, name), 'utf8');
    expect(codesOf(name, text.slice(0, Math.floor(share * text.length)))).not.toContain('program/failed');
  });
  fc.assert(holds, { numRuns: 300 });
});
