// The pages made from the program's own tables are those of the tables as they are.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { allCodes } from '../../../server/findings/registry.ts';
import { codesPage, openingComment } from '../../../server/report/codes-page.ts';
import { hazardsPage } from '../../../server/report/hazards-page.ts';
import { languagePage } from '../../../server/report/language-page.ts';
import { kinds } from '../../../server/scenario/kinds/registry.ts';
import { codeEntries } from '../../support/code-entries.ts';

test('the language page is not stale (npm run pages writes it)', () => {
  expect(readFileSync('examples/reference/language.md', 'utf8')).toBe(languagePage('npm run pages'));
});

test('the page of codes is not stale (npm run pages writes it)', () => {
  expect(readFileSync('examples/reference/codes.md', 'utf8')).toBe(codesPage(codeEntries('.'), 'npm run pages'));
});

test('the page of hazards is not stale (npm run pages writes it)', () => {
  expect(readFileSync('examples/reference/hazards.md', 'utf8')).toBe(hazardsPage('npm run pages'));
});

test("every code says what it means, and all but the program's own fault and huge files have an example", () => {
  const entries = codeEntries('.');
  expect(entries.map(({ code }) => code)).toEqual(allCodes());
  expect(entries.filter(({ meaning }) => meaning.length < 20)).toEqual([]);
  const without = entries.filter(({ example }) => !example).map(({ code }) => code);
  expect(without).toEqual(['program/failed', 'syntax/too-large']);
});

test('every entry and figure of every kind is on the language page', () => {
  const page = languagePage('npm run pages');
  for (const { kind, evaluated } of kinds) {
    expect(page).toContain(`### ${kind}\n`);
    for (const { name } of Object.values(evaluated?.entries ?? {})) expect(page).toContain(`| \`${name}\` |`);
    for (const { id } of evaluated?.figures ?? []) expect(page).toContain(`| \`${id}\` |`);
  }
});

test('the opening comment of a file loses its marks', () => {
  expect(openingComment('/**\n * One.\n *\n * Two.\n */\nimport')).toBe('One.\n\nTwo.');
});
