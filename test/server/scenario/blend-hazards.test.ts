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

describe('mends', () => {
  /** The text after each mend of the code's first finding, by the mend's title; acknowledgements apart. */
  const mendsIn = (text: string, code: string): Readonly<Record<string, string>> => {
    const fixes = hazardsIn(text).find((finding) => finding.code === code)?.fixes ?? [];
    return Object.fromEntries(
      fixes
        .filter(({ title }) => !title.startsWith('Acknowledge'))
        .map(({ title, edits: [edit] }) => [
          title,
          text.slice(0, edit?.place.start) + (edit?.newText ?? '') + text.slice(edit?.place.end),
        ]),
    );
  };
  const isGone = (text: string, code: string): boolean => hazardsIn(text).every((finding) => finding.code !== code);

  test('another blanket where one is written, and only one that mends', () => {
    const text = 'blend metal {\n  30 % mass lithium\n  rest gas_oil\n  blanket: nitrogen\n}\n';
    const mends = mendsIn(text, 'hazard/blanket');
    expect(Object.keys(mends)).toEqual(['Blanket it with argon']);
    expect(Object.values(mends)[0]).toContain('\n  blanket: argon\n');
    expect(isGone(Object.values(mends)[0] ?? '', 'hazard/blanket')).toBe(true);
  });

  test('a line with a blanket where none is, behind the comment of the last one', () => {
    const text = 'blend spirit {\r\n\t100 % ethanol # neat }\r\n}\r\n';
    const mends = mendsIn(text, 'hazard/flammable-range');
    expect(mends['Blanket it with nitrogen']).toBe(
      'blend spirit {\r\n\t100 % ethanol # neat }\r\n  blanket: nitrogen\n}\r\n',
    );
    expect(isGone(mends['Blanket it with nitrogen'] ?? '', 'hazard/flammable-range')).toBe(true);
  });

  test('on one line as well', () => {
    const mends = mendsIn('blend spirit { 100 % ethanol }\n', 'hazard/flammable-range');
    expect(isGone(mends['Blanket it with nitrogen'] ?? '', 'hazard/flammable-range')).toBe(true);
  });

  test.each([
    ['hazard/near-flash-point', '100 % gas_oil', '55 degC', 'Store it at 50 degC, 10 K below its flash point'],
    ['hazard/near-flash-point', '100 % gas_oil', '328 K', 'Store it at 323 K, 10 K below its flash point'],
    ['hazard/flammable-range', '100 % gas_oil', '70 degC', 'Store it at 50 degC, 10 K below its flash point'],
    ['hazard/molten-metal', '100 % sodium', '120 degC', 'Store it at 87 degC, 10 K below its melting point'],
    ['hazard/molten-metal', '100 % sodium', '120 ± 5 degC', 'Store it at 87 degC, 10 K below its melting point'],
  ])('%s: a lower temperature for %s at %s', (code, portion, stored, title) => {
    const text = `blend it {\n  ${portion}\n  stored: ${stored}, 1 atm\n}\n`;
    const mended = mendsIn(text, code)[title] ?? '';
    expect(mended).toContain(', 1 atm');
    expect(isGone(mended, code)).toBe(true);
  });

  test('no cold below freezing, and none where the temperature is not the matter or not a number', () => {
    const titles = (text: string, code: string): string => Object.keys(mendsIn(text, code)).join();
    expect(titles('blend it {\n  100 % petrol\n  stored: 20 degC\n}\n', 'hazard/flammable-range')).not.toContain(
      'Store',
    );
    const named = 'let warm = 120 degC\nblend it {\n  100 % sodium\n  stored: warm\n  blanket: argon\n}\n';
    expect(titles(named, 'hazard/molten-metal')).toBe('');
  });
});

test.each([
  ['H260', 'hazard/water-reactive'],
  ['H261', 'hazard/water-reactive'],
  ['H250', 'hazard/pyrophoric'],
  ['H272', 'hazard/oxidiser'],
  ['H242', 'hazard/unstable'],
  ['H330', 'hazard/toxic'],
])('a class said of a substance of the scenario counts: %s', (statement, code) => {
  const text = (hazards: string): string =>
    `substance additive {\n  phase: solid\n  composition: 40 % C, 40 % Na, 20 % O\n${hazards}}\nblend it {\n  100 % additive\n  blanket: argon\n}\n`;
  const codes = (hazards: string): readonly string[] => hazardsIn(text(hazards)).map((finding) => finding.code);
  expect(codes(`  hazards: ${statement}\n`)).toContain(code);
  expect(codes('')).toEqual([]);
});

describe('a fuel named without a blend', () => {
  const flame = 'oxidant o {\n  100 % air\n}\nburn fire {\n  fuel: FUEL\n  oxidant: o\n  lambda: 2\n}\n';

  test('is told where it is named, by what it is and not by how it may be kept', () => {
    const text = flame.replace('FUEL', 'sodium');
    const found = hazardsIn(text);
    expect(found.map(({ code }) => code)).toEqual(['hazard/water-reactive']);
    expect(text.slice(found[0]?.place.start, found[0]?.place.end)).toBe('sodium');
    const acknowledged = text.replace('  lambda', '  acknowledge hazard/water-reactive: "note 7"\n  lambda');
    expect(hazardsIn(acknowledged)).toMatchObject([{ severity: 'information', acknowledged: true }]);
  });

  test('a blend is told where it is defined, and there alone', () => {
    const text = `blend slurry {\n  30 % mass sodium\n  rest gas_oil\n  blanket: argon\n}\n${flame.replace('FUEL', 'slurry')}`;
    expect(hazardsIn(text).map(({ code }) => code)).toEqual(['hazard/water-reactive']);
    const idle = text.replace('  lambda', '  acknowledge hazard/water-reactive: "note 7"\n  lambda');
    expect(findingsOf(evaluateText(idle)).map(({ code }) => code)).toContain('name/acknowledged');
  });

  test('an engine and its pilot fuel, each at its entry', () => {
    const text =
      'engine main {\n  cycle: diesel\n  compression ratio: 16\n  fuel: ammonia\n  oxidant: air\n  lambda: 2\n  pilot: 5 % energy methanol\n  mechanical efficiency: 92 %\n  boost pressure: 2 bar\n}\n';
    const places = hazardsIn(text).map(({ code, place }) => [code, text.slice(place.start, place.end)]);
    expect(places).toContainEqual(['hazard/toxic', 'ammonia']);
    expect(places).toContainEqual(['hazard/toxic', '5 % energy methanol']);
  });

  test('one that cannot be read leaves an acknowledgement alone', () => {
    const text = flame.replace('FUEL', 'sodum').replace('  lambda', '  acknowledge hazard/toxic: "note 7"\n  lambda');
    expect(findingsOf(evaluateText(text)).map(({ code }) => code)).not.toContain('name/acknowledged');
  });

  test('one of the scenario by what it says of itself', () => {
    const substance =
      'substance drum {\n  phase: solid\n  composition: 99.7 % Na, 0.3 % Ca\n  lower heating value: 9 MJ/kg\n  hazards: H260, alkali-metal\n}\n';
    expect(hazardsIn(substance + flame.replace('FUEL', 'drum')).map(({ code }) => code)).toContain(
      'hazard/water-reactive',
    );
  });
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
