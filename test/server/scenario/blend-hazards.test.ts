// Hazards in a scenario: the table of verdicts written as text earns the same codes; each stands at its cause, with its
// partner beside it; and acknowledgements count.

import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import type { Finding } from '../../../server/findings/finding.ts';
import { checkFacts, evaluateText } from '../../support/facts.ts';
import { titleOf, verdicts } from '../core/hazard/verdicts.ts';
import type { Verdict } from '../core/hazard/verdicts.ts';

/** A row of the table as a file; a mixed gas over it is a blend of its own. */
function textOf({ kind, basis, percent, celsius, bar, blanket, contact, extinguishing }: Verdict): string {
  const portions = (shares: Readonly<Record<string, number>>, by: string): string[] =>
    Object.entries(shares).map(([name, share]) => `  ${String(share)} %${by} ${name}`);
  const state = `${String(celsius ?? 25)} degC, ${String(bar ?? 1)} bar`;
  if (kind === 'oxidant') {
    return ['oxidant tank {', ...portions(percent, ' mole'), `  state: ${state}`, '}'].join('\n');
  }
  const gases = Object.keys(blanket ?? { air: 100 });
  return [
    ...(gases.length > 1 ? ['blend over {', ...portions(blanket ?? {}, ' mole'), '}'] : []),
    'blend tank {',
    ...portions(percent, basis === 'mole' ? ' mole' : ' mass'),
    `  stored: ${state}`,
    `  blanket: ${gases.length > 1 ? 'over' : (gases[0] ?? 'air')}`,
    ...(contact === undefined ? [] : [`  contact: ${contact.join(', ')}`]),
    ...(extinguishing === undefined ? [] : [`  extinguishing: ${extinguishing.join(', ')}`]),
    '}',
  ].join('\n');
}

function hazardsIn(text: string): readonly Finding[] {
  return findingsOf(evaluateText(text)).filter(({ code }) => code.startsWith('hazard/'));
}

const rank = { error: 0, warning: 1, information: 2, hint: 3 };

test.each(verdicts.map((verdict) => [titleOf(verdict), verdict] as const))('%s', (_, verdict) => {
  const text = textOf(verdict);
  const own = text.indexOf(verdict.kind === 'oxidant' ? 'oxidant tank' : 'blend tank');
  const earned: Record<string, string> = {};
  const sorted = [...hazardsIn(text)].sort((a, b) => rank[a.severity] - rank[b.severity]);
  for (const { code, severity, place } of sorted) if (place.start >= own) earned[code] ??= severity;
  const expected: Readonly<Record<string, string>> = verdict.earns;
  // A liquefied gas may be said to have air over it, and then that counts; the table says nothing of it.
  const saidAir = verdict.blanket === undefined ? ['hazard/flammable-range', 'hazard/blanket'] : [];
  for (const code of saidAir) if (expected[code] === undefined) delete earned[code];
  expect(earned).toEqual(expected);
});

describe('where they stand', () => {
  test('at the portion, and at the entry that says how it is kept', () => {
    checkFacts(`
      blend slurry {
        30 % mass sodium
        #         ^^^^^^ hazard/water-reactive
        #         ^^^^^^ hazard/water-in-contact
        5 % mass water
        rest lubricating_oil
        stored: 25 degC
        blanket: carbon_dioxide
      # ^^^^^^^^^^^^^^^^^^^^^^^ hazard/blanket
      }
    `);
  });

  test('at the name where no entry says it', () => {
    checkFacts(`
      blend spirit {
      #     ^^^^^^ hazard/low-flash-point
      #     ^^^^^^ hazard/flammable-range
        100 % ethanol
      }
    `);
  });

  test('the partner is told beside it', () => {
    const text = 'blend slurry {\n  30 % mass sodium\n  5 % mass water\n  rest gas_oil\n  blanket: argon\n}\n';
    const found = hazardsIn(text).find(({ code }) => code === 'hazard/water-in-contact');
    expect(text.slice(found?.place.start, found?.place.end)).toBe('sodium');
    expect(found?.related.map(({ place }) => text.slice(place.start, place.end))).toEqual(['water']);
  });

  test('of a blend in a blend, at the line that brings it in', () => {
    const text =
      'blend concentrate {\n  50 % mass sodium\n  rest gas_oil\n  blanket: argon\n}\n' +
      'blend slurry {\n  60 % mass concentrate\n  rest glycerol\n  blanket: argon\n}\n';
    const found = hazardsIn(text).find(({ code }) => code === 'hazard/metal-and-alcohol');
    expect(text.slice(found?.place.start, found?.place.end)).toBe('concentrate');
    expect(found?.message).toContain('`sodium` with `glycerol`');
  });
});

test('air that nobody spoke of is no error, air that is written is', () => {
  const severity = (line: string): string | undefined =>
    hazardsIn(`blend spirit {\n  100 % ethanol\n${line}}\n`).find(({ code }) => code === 'hazard/flammable-range')
      ?.severity;
  expect(severity('')).toBe('warning');
  expect(severity('  blanket: air\n')).toBe('error');
  expect(severity('  blanket: nitrogen\n')).toBeUndefined();
});

test('another blanket is offered where one is written', () => {
  const text = 'blend metal {\n  30 % mass lithium\n  rest gas_oil\n  blanket: nitrogen\n}\n';
  const [fix, ...others] = hazardsIn(text).find(({ code }) => code === 'hazard/blanket')?.fixes ?? [];
  expect(others).toEqual([]);
  const [edit] = fix?.edits ?? [];
  expect(text.slice(0, edit?.place.start) + (edit?.newText ?? '') + text.slice(edit?.place.end)).toContain(
    'blanket: argon\n',
  );
});

test('a technical metal is known by its atoms', () => {
  const text =
    'substance drum_metal {\n  phase: solid\n  composition: 99.7 % Na, 0.2 % Ca, 0.1 % K\n  lower heating value: 9 MJ/kg\n}\n' +
    'blend slurry {\n  30 % mass drum_metal\n  5 % mass water\n  rest gas_oil\n  blanket: argon\n}\n';
  expect(
    hazardsIn(text)
      .map(({ code }) => code)
      .sort(),
  ).toEqual(['hazard/water-in-contact', 'hazard/water-reactive']);
  // The trace of potassium in it makes no superoxide.
  const inAir = text.replace('  blanket: argon\n', '  blanket: air\n');
  expect(hazardsIn(inAir).map(({ code }) => code)).toContain('hazard/blanket');
  expect(hazardsIn(inAir).map(({ code }) => code)).not.toContain('hazard/superoxide');
});

describe('acknowledge', () => {
  const blend = (lines: string): string =>
    `blend slurry {\n  30 % mass sodium\n  rest gas_oil\n  blanket: argon\n${lines}}\n`;

  test('with a reason it is information, and said to be acknowledged', () => {
    const [found] = hazardsIn(blend('  acknowledge hazard/water-reactive: "note 7"\n'));
    expect(found).toMatchObject({ severity: 'information', acknowledged: true });
    expect(hazardsIn(blend(''))[0]).toMatchObject({ severity: 'warning', acknowledged: false });
  });

  test('without a reason it does not count', () => {
    expect(hazardsIn(blend('  acknowledge hazard/water-reactive: ""\n'))[0]).toMatchObject({ acknowledged: false });
  });

  test('of what is not there it is idle, unless something is unknown', () => {
    const idle = (text: string): readonly Finding[] =>
      findingsOf(evaluateText(text)).filter(({ code }) => code === 'name/acknowledged');
    const line = '  acknowledge hazard/toxic: "note 8"\n';
    expect(idle(blend(line))).toMatchObject([{ severity: 'warning', fixes: [{ title: 'Remove this line' }] }]);
    const unknown =
      'substance additive {\n  phase: liquid\n  composition: 70 % C, 11 % H, 19 % O\n  density: 900 kg/m3\n}\n';
    expect(idle(unknown + blend(line).replace('  rest', '  2 % mass additive\n  rest'))).toEqual([]);
  });
});
