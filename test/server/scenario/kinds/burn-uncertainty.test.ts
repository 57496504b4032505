// Uncertainty of a burn's figures by slopes, against burns solved anew with the input moved: every figure, every input that
// can carry ±, held pressure and held volume, frozen and not.
import { describe, expect, test } from 'vitest';
import { evaluate } from '../../../../server/scenario/evaluate.ts';
import { standardUncertainty } from '../../../../server/core/quantity/quantity.ts';
import type { Figure } from '../../../../server/scenario/scenario.ts';

/** Tokens `{name}` in the text stand for a number; with `±` where its uncertainty is asked for. */
const TEXT = `substance oil {
  phase: liquid
  composition: {c} % C, 13.0 % H, 1.0 % O
  lower heating value: {lhv} MJ/kg
  density: 850 kg/m3
  heat capacity: {cp} kJ/(kg K)
}
blend slurry {
  {na} % mass sodium
  rest oil
}
oxidant gas {
  {o2} % mole O2
  rest N2
  state: {ti} degC, {p} bar
}
burn furnace {
  fuel: slurry
  oxidant: gas
  {amount}
  fuel temperature: {tf} degC
  held: {held}
  heat loss: {q} %
  flame zone: lambda {zone}
  frozen below: {freeze} degC
  exhaust temperature: {exhaust} degC
  {cooling}
}
`;
const NUMBERS: Readonly<Record<string, readonly [number, number]>> = {
  c: [86, 0.3],
  lhv: [42.7, 0.2],
  cp: [2, 0.1],
  na: [25, 0.5],
  o2: [24, 0.4],
  ti: [300, 10],
  p: [1.5, 0.05],
  l: [1.7, 0.04],
  tf: [60, 5],
  q: [6, 1],
  zone: [1.1, 0.03],
  freeze: [700, 20],
  exhaust: [900, 15],
  pc: [1.2, 0.05],
};

interface Case {
  readonly name: string;
  readonly text: string;
}

function caseOf(name: string, amount: string, held: string, cooling: string, exhaust?: number): Case {
  const text = TEXT.replace('{amount}', amount).replace('{held}', held).replace('{cooling}', cooling);
  return { name, text: exhaust === undefined ? text : text.replace('{exhaust}', String(exhaust)) };
}

const CASES: readonly Case[] = [
  caseOf('held pressure, by λ', 'lambda: {l}', 'pressure {p} bar', 'cooling pressure: {pc} bar'),
  caseOf('held volume, by mass', 'oxidant per fuel: 19 kg/kg', 'volume', ''),
  caseOf('exhaust frozen, by equivalence ratio', 'equivalence ratio: 0.6', 'volume', '', 150),
];

function figures(text: string, values: Readonly<Record<string, string>>): readonly Figure[] {
  const source = text.replaceAll(/\{(\w+)\}/g, (_, name: string) => values[name] ?? '?');
  const scenario = evaluate('a.stoke', () => ({ text: source }));
  const found = scenario.files[0]?.definitions.find(({ kind }) => kind === 'burn');
  if (!found || found.figures.length === 0) throw new Error(source);
  return found.figures;
}

const plain = Object.fromEntries(Object.entries(NUMBERS).map(([name, [value]]) => [name, String(value)]));
/** These are told by burns solved anew: how the response of a state moves is no first slope. */
const SOLVED_ANEW = new Set(['heat-capacity', 'gamma', 'speed-of-sound']);

describe.each(CASES)('$name', ({ text }) => {
  const names = Object.keys(NUMBERS).filter((name) => text.includes(`{${name}}`));
  // One input at a time, so that no part hides another.
  test.each(names)('%s', (name) => {
    const [value, sigma] = NUMBERS[name] ?? [0, 0];
    const told = figures(text, { ...plain, [name]: `${String(value)} ± ${String(sigma)}` });
    const step = sigma / 100;
    const at = (moved: number): readonly Figure[] => figures(text, { ...plain, [name]: String(moved) });
    const [above, below] = [at(value + step), at(value - step)];
    let moving = 0;
    for (const { id, quantity } of told) {
      const [up, down] = [above, below].map((list) => list.find((one) => one.id === id)?.quantity.value ?? NaN) as [number, number]; // prettier-ignore
      const expected = (Math.abs(up - down) / 2) * 100;
      const found = standardUncertainty(quantity);
      if (expected > 1e-9 * Math.abs(quantity.value)) moving += 1;
      // Differences of states have nine to ten digits; figures solved anew a whole σ away are bent by a few per cent.
      const allowed = (SOLVED_ANEW.has(id) ? 0.05 : 2e-3) * expected + 2e-7 * Math.abs(quantity.value);
      expect([id, found, expected, Math.abs(found - expected) <= allowed]).toEqual([id, found, expected, true]);
    }
    expect(moving).toBeGreaterThan(0);
  });
});

test('an uncertain portion, its heating value and what follows of them together are one input', () => {
  const text = CASES[0]?.text ?? '';
  const told = figures(text, { ...plain, na: '25 ± 0.5', l: '1.7 ± 0.04' });
  const flame = told.find(({ id }) => id === 'flame-temperature');
  expect(flame?.quantity.parts.size).toBe(2);
});
