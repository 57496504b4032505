// One check function an editor feature, on marked fixtures: the only place of the tests that touches the features' calls.
// Knows no protocol. Invariant: a fixture is evaluated with all its files at hand, as the command line would.
import { expect } from 'vitest';
import { codeActions } from '../../server/features/code-actions.ts';
import { hover } from '../../server/features/hover.ts';
import { asPlainText } from '../../server/features/hover-text.ts';
import { symbols } from '../../server/features/symbols.ts';
import type { Finding } from '../../server/findings/finding.ts';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import type { EvaluatedScenario } from '../../server/scenario/scenario.ts';
import { readFixture, type Fixture } from './fixture.ts';

export interface EvaluatedFixture extends Fixture {
  readonly scenario: EvaluatedScenario;
  readonly findings: readonly Finding[];
}

export function evaluateFixture(marked: string): EvaluatedFixture {
  const fixture = readFixture(marked);
  const scenario = evaluate(fixture.file, (path) => {
    const text = fixture.files.get(path);
    return text === undefined ? { fault: 'missing' } : { text };
  });
  return { ...fixture, scenario, findings: findingsOf(scenario) };
}

/** What the hover at the cursor says, line by line in plain text, and the text it is about; null without one. */
export function hoverAt(marked: string): { lines: readonly string[]; about: string } | null {
  const { scenario, file, files, start } = evaluateFixture(marked);
  const found = hover(scenario, file, start);
  if (!found) return null;
  const { place } = found;
  expect(place.path).toBe(file);
  return { lines: asPlainText(found).split('\n'), about: (files.get(file) ?? '').slice(place.start, place.end) };
}

/**
 * Checks the hover at the cursor. Each expected line stands for one line, in this order; lines in between are free. A
 * text must be the whole line; null means that there is no hover.
 */
export function checkHover(marked: string, expected: readonly (string | RegExp)[] | null): void {
  const found = hoverAt(marked);
  if (expected === null || found === null) {
    expect(found?.lines ?? null).toBe(expected);
    return;
  }
  let next = 0;
  for (const line of expected) {
    const index = found.lines.findIndex(
      (one, at) => at >= next && (typeof line === 'string' ? one === line : line.test(one)),
    );
    expect(index, `${String(line)} in\n${found.lines.slice(next).join('\n')}\n`).toBeGreaterThanOrEqual(0);
    next = index + 1;
  }
}

/** Checks the outline: one `role name: detail` a symbol, in order. */
export function checkSymbols(marked: string, expected: readonly (string | RegExp)[]): void {
  const { scenario, file, files } = evaluateFixture(marked);
  const outline = symbols(scenario, file);
  const text = files.get(file) ?? '';
  for (const { place, namePlace, name } of outline) {
    expect(name).not.toBe('');
    expect(place.start).toBeLessThanOrEqual(namePlace.start);
    expect(namePlace.end).toBeLessThanOrEqual(place.end);
    expect(place.end).toBeLessThanOrEqual(text.length);
  }
  const told = outline.map(({ role, name, detail }) => `${role} ${name}: ${detail}`);
  expect(told).toHaveLength(expected.length);
  for (const [index, line] of expected.entries())
    expect(told[index]).toMatch(typeof line === 'string' ? exactly(line) : line);
}

/** Applies the preferred fix at the cursor, checks the text it gives, and that its finding is gone. */
export function checkFix(marked: string, code: string, after: string): void {
  const { files, file, start, end, findings } = evaluateFixture(marked);
  const fix = codeActions(findings, { path: file, start, end }).find(
    ({ finding, preferred }) => preferred && finding.code === code,
  );
  expect(fix, `a preferred fix among ${findings.map((finding) => finding.code).join(', ')}`).toBeDefined();
  const edits = [...(fix?.edits ?? [])].sort((left, right) => right.place.start - left.place.start);
  const text = edits.reduce(
    (all, { place, newText }) => all.slice(0, place.start) + newText + all.slice(place.end),
    files.get(file) ?? '',
  );
  expect(text).toBe(readFixture(after).files.get('main.stoke'));
  expect(evaluateFixture(text).findings.map((finding) => finding.code)).not.toContain(code);
}

function exactly(text: string): RegExp {
  return new RegExp(`^${text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}$`);
}
