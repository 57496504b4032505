// Slips in a portion and in the writing of ions: one finding at the place, and its mend leaves none of its kind.
import { expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { evaluateText } from '../../support/facts.ts';

const told = (text: string): ReturnType<typeof findingsOf> =>
  findingsOf(evaluateText(text)).filter(({ code }) => !code.startsWith('hazard/'));

test.each([
  ['blend a {\n  sodium: 30 %\n  rest gas_oil\n}', 'blend a {\n  30 % sodium\n  rest gas_oil\n}'],
  ['blend a {\n  30 % sodium\n  rest: gas_oil\n}', 'blend a {\n  30 % sodium\n  rest gas_oil\n}'],
  ['blend a {\n  Na: 30 %\n  rest gas_oil\n}', 'blend a {\n  30 % Na\n  rest gas_oil\n}'],
  ['oxidant a {\n  air: 50 %\n  rest O2\n}', 'oxidant a {\n  50 % air\n  rest O2\n}'],
  ['blend a {\n  30 % mol sodium\n  rest gas_oil\n}', 'blend a {\n  30 % mole sodium\n  rest gas_oil\n}'],
  ['blend a {\n  30 % kg sodium\n  rest gas_oil\n}', 'blend a {\n  30 % mass sodium\n  rest gas_oil\n}'],
  ['reaction a {\n  Ca^2+ + CO32- -> CaCO3(cr)\n}', 'reaction a {\n  Ca^2+ + CO3^2- -> CaCO3(cr)\n}'],
])('%j', (text, meant) => {
  const [finding, ...others] = told(text);
  expect(others).toEqual([]);
  const edits = finding?.fixes.find(({ preferred }) => preferred)?.edits ?? [];
  const mended = edits.reduce(
    (all, { place, newText }) => all.slice(0, place.start) + newText + all.slice(place.end),
    text,
  );
  expect(mended).toBe(meant);
  expect(told(mended).filter(({ code }) => code === finding?.code)).toEqual([]);
});

test('an entry that names no substance is no portion, and neither is one whose value is no amount', () => {
  for (const line of ['colour: 30 %', 'sodium: "red"', 'rest: 30 %']) {
    const [finding] = told(`blend a {\n  ${line}\n  rest gas_oil\n}`);
    expect(finding?.code).toBe('name/unknown-entry');
    expect(finding?.message).not.toContain('portion');
  }
});
