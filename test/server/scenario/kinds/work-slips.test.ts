// Slips in engines and duties whose answers would be absurd: each is told where it stands, with the mend where it is
// mechanical, and never as the program's own fault.
import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../../server/findings/registry.ts';
import { evaluateText } from '../../../support/facts.ts';

const told = (text: string): ReturnType<typeof findingsOf> =>
  findingsOf(evaluateText(text)).filter(({ code }) => !code.startsWith('hazard/'));

const engine = (line: string): string => `engine main {
  cycle: diesel
  compression ratio: 16.5
  maximum continuous rating: 6.4 MW
  fuel: gas_oil
  lambda: 2.1
  ${line}
}
`;

describe('shares that no engine has', () => {
  test.each([
    ['mechanical efficiency: 0 %', 'range/positive'],
    ['mechanical efficiency: 120 %', 'range/share'],
    ['combustion completeness: 0 %', 'range/positive'],
    ['residual gas share: 95 %', 'range/share'],
    ['residual gas share: 100 %', 'range/share'],
  ])('%s', (line, code) => {
    expect(told(engine(line)).map((finding) => finding.code)).toEqual([code]);
  });

  test('all of the charge may burn, and none of it may stay', () => {
    expect(told(engine('combustion completeness: 100 %\n  residual gas share: 0 %'))).toEqual([]);
  });
});

test('a distance in nanometres is told, and the nautical mile offered', () => {
  const duty = `duty day {\n  sail: 38 nm at 85 % on main\n}\n`;
  const [finding, ...others] = told(engine('mechanical efficiency: 92 %') + duty).filter(
    ({ code }) => code === 'unit/unknown' || code.startsWith('program/'),
  );
  expect(others).toEqual([]);
  expect(finding?.message).toContain('a nautical mile is `nmi`');
  expect(finding?.fixes[0]?.edits[0]?.newText).toBe('nmi');
});
