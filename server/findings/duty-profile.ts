/**
 * The file of a profile cannot be read as rows of time and power. It begins with a line that names both and their units,
 * `time (s), power (kW)` in either order (s, min or h; W, kW or MW), with `,`, `;` or a tab between; times rise from row to
 * row, and no power is negative. A gap is not filled, since nobody knows what the engine did meanwhile.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const dutyProfile: Rule<FactOf<'duty/profile'>> = {
  severity: 'error',
  message: ({ path, why, row, text }) => {
    const at = `Row ${row} of ${quoted(path)}`;
    const holds = text === '' ? 'is empty' : `is ${quoted(text)}`;
    switch (why) {
      case 'no-header':
        return `${at} ${holds}. Begin the file with \`time (s), power (kW)\`; time may be in s, min or h, power in W, kW or MW.`;
      case 'no-rows':
        return `${quoted(path)} has fewer than two rows of numbers. A power holds until the next row, so give two or more.`;
      case 'gap':
        return `${at} ${holds}; a time or a power is missing. Give both, or take the row out.`;
      case 'text':
        return `${at} ${holds}; these are not two numbers. Write a time and a power, with a point for decimals.`;
      case 'negative':
        return `${at} ${holds}; its power is negative. Write 0 where the engine gives none.`;
      case 'time-falls':
        return `${at} ${holds}; its time is not later than that of the row before. Put the rows in the order of time, each time once.`;
    }
  },
};
