// The cursor at every place of the examples, in the whole text and at the end of the text before it, as while typing:
// everything asked for at a cursor answers, and what it answers lies where it may. The evaluation of the texts in between
// is taken from the whole one, because it is not what is tried here; a few are evaluated for themselves.
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parse } from '../../grammar/parse.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { completion } from '../../server/features/completion.ts';
import { completionDocumentation } from '../../server/features/completion-documentation.ts';
import { signatureAt } from '../../server/features/completion-functions.ts';
import { definition } from '../../server/features/definition.ts';
import { highlights } from '../../server/features/highlights.ts';
import { hover } from '../../server/features/hover.ts';
import { prepareRename, rename } from '../../server/features/rename.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import type { EvaluatedScenario } from '../../server/scenario/scenario.ts';

const FOLDER = path.resolve('examples');
const names = readdirSync(FOLDER, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.stoke'));
const texts = new Map(names.map((name) => [path.join(FOLDER, name), readFileSync(path.join(FOLDER, name), 'utf8')]));

function evaluated(root: string, text = texts.get(root) ?? ''): EvaluatedScenario {
  return evaluate(root, (file) => {
    const found = file === root ? text : texts.get(file);
    return found === undefined ? { fault: 'missing' } : { text: found };
  });
}

/** The scenario with another text in its first file, for what asks the text and not the numbers. */
function retyped(scenario: EvaluatedScenario, text: string): EvaluatedScenario {
  const [first, ...others] = scenario.files;
  return first
    ? { ...scenario, files: [{ ...first, tree: parse(text, isUnitWord, { previous: first.tree }) }, ...others] }
    : scenario;
}

function complete(scenario: EvaluatedScenario, root: string, text: string, offset: number): number {
  const { items, end, wordEnd } = completion(scenario, root, offset);
  expect(end).toBeGreaterThanOrEqual(offset);
  expect(wordEnd).toBeGreaterThanOrEqual(end);
  expect(wordEnd).toBeLessThanOrEqual(text.length);
  for (const { start, label, insert } of items) {
    if (start > offset || label === '' || insert === '' || /[\r\n]/.test(text.slice(start, wordEnd))) {
      throw new Error(`${label} from ${start} to ${wordEnd} at ${offset} of ${root}`);
    }
  }
  signatureAt({ text }, offset);
  return items.length;
}

describe.each([...texts])('%s', (root, text) => {
  const scenario = evaluated(root);

  it('completes at every place, and at the end of every prefix', () => {
    let offered = 0;
    for (let offset = 0; offset <= text.length; offset++) {
      offered += complete(scenario, root, text, offset);
      const before = text.slice(0, offset);
      complete(retyped(scenario, before), root, before, offset);
    }
    expect(offered).toBeGreaterThan(0);
  });

  it('hovers, goes to definitions and renames at every place', () => {
    const { files } = scenario;
    for (let offset = -1; offset <= text.length + 1; offset++) {
      hover(scenario, root, offset);
      definition(files, root, offset);
      for (const { place } of highlights(files, root, offset)) expect(place.path).toBe(root);
      const offer = prepareRename(files, root, offset);
      if ('refusal' in offer) continue;
      const edits = rename(files, root, offset, 'a new name');
      expect('refusal' in edits ? [] : edits).toContainEqual({ place: offer.place, newText: "'a new name'" });
    }
  });
});

it('thirty prefixes evaluated for themselves complete at their end', () => {
  const prefix = fc.record({
    root: fc.constantFrom(...texts.keys()),
    share: fc.double({ min: 0, max: 1, noNaN: true }),
  });
  const answers = fc.property(prefix, ({ root, share }) => {
    const whole = texts.get(root) ?? '';
    const text = whole.slice(0, Math.floor(share * whole.length));
    complete(evaluated(root, text), root, text, text.length);
  });
  fc.assert(answers, { numRuns: 30 });
});

it('everything offered for a name or substance has something to show beside it', () => {
  const root = path.join(FOLDER, 'dunlin.stoke');
  const text = `${texts.get(root) ?? ''}\nblend last {\n  rest `;
  const scenario = evaluated(root, text);
  const { items } = completion(scenario, root, text.length);
  const subjects = items.flatMap(({ subject }) => subject ?? []);
  expect(subjects.length).toBeGreaterThan(300);
  for (const subject of subjects)
    expect(completionDocumentation(scenario, root, subject), JSON.stringify(subject)).not.toBeNull();
});
