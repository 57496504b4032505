// Profiles out of text: time and energy are kept, and what is wrong is told with its row.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readProfile } from '../../../../server/core/duty/profile.ts';

describe('a profile', () => {
  test('holds power from row to row, in the units of its header', () => {
    const read = readProfile('time (min), power (kW)\r\n0, 100\r\n1, 300\r\n3, 0\r\n4, 0\r\n');
    expect(read).toEqual({
      kind: 'profile',
      rows: 4,
      steps: [
        { timeS: 60, powerW: 0 },
        { timeS: 60, powerW: 100e3 },
        { timeS: 120, powerW: 300e3 },
      ],
    });
  });

  test.each([
    ['power (MW);time (h)\n2;0\n2;1\n', 3600, 2e6],
    ['\uFEFF"Time [s]"\t"Power [W]"\n0\t5\n10\t5', 10, 5],
  ])('takes %j', (text, timeS, powerW) => {
    expect(readProfile(text)).toMatchObject({ steps: [{ timeS, powerW }] });
  });

  test('keeps time and energy of any rows', () => {
    const rows = fc.array(
      fc.record({ lasts: fc.integer({ min: 1, max: 1000 }), power: fc.integer({ min: 0, max: 9000 }) }),
      {
        minLength: 2,
        maxLength: 300,
      },
    );
    fc.assert(
      fc.property(rows, (list) => {
        let [time, energy] = [0, 0];
        const lines = list.map(({ lasts, power }) => {
          const line = `${time},${power}`;
          time += lasts;
          energy += lasts * power * 1e3;
          return line;
        });
        const read = readProfile(['time (s),power (kW)', ...lines, `${time},0`].join('\n'));
        if (read.kind === 'fault') throw new Error(read.why);
        expect(read.steps.length).toBeLessThan(1026);
        expect(read.steps.reduce((sum, step) => sum + step.timeS, 0)).toBeCloseTo(time, 6);
        const found = read.steps.reduce((sum, step) => sum + step.timeS * step.powerW, 0);
        expect(Math.abs(found - energy)).toBeLessThanOrEqual(1e-9 * energy);
      }),
      { numRuns: 50 },
    );
  });

  test.each([
    ['no header', '0,100\n1,100\n', 'no-header', 1],
    ['an unknown unit', 'time (s),power (hp)\n0,100\n1,100\n', 'no-header', 1],
    ['no rows', 'time (s),power (kW)\n0,100\n', 'no-rows', 2],
    ['a gap', 'time (s),power (kW)\n0,100\n1,\n2,100\n', 'gap', 3],
    ['an empty line between', 'time (s),power (kW)\n0,100\n\n2,100\n', 'gap', 3],
    ['text', 'time (s),power (kW)\n0,100\n1,off\n2,100\n', 'text', 3],
    ['a date', 'time (s),power (kW)\n2024-01-01,100\n', 'text', 2],
    ['time that stands still', 'time (s),power (kW)\n0,100\n1,100\n1,100\n', 'time-falls', 4],
    ['power below nothing', 'time (s),power (kW)\n0,100\n1,-5\n2,100\n', 'negative', 3],
  ])('%s is told with its row', (_, text, why, row) => {
    expect(readProfile(text)).toMatchObject({ kind: 'fault', why, row });
  });
});
