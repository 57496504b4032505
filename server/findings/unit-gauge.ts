/**
 * A gauge pressure (`barg`, `psig`: counted from the standard atmosphere) mixed with or used as an absolute one, or
 * multiplied. Nothing is converted silently; the absolute pressure is given, so that it can be written instead.
 */
import { formatNumber } from '../wording/numbers.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const PASCALS_PER_BAR = 1e5;

export const unitGauge: Rule<FactOf<'unit/gauge'>> = {
  severity: 'error',
  message: ({ why, text, absolutePa }) => {
    switch (why) {
      case 'absolute-needed': {
        const absolute =
          absolutePa === null ? null : quoted(`${formatNumber(absolutePa / PASCALS_PER_BAR, 'plain')} bar`);
        return sentences(
          `${quoted(text)} has a gauge pressure where an absolute one is needed.`,
          absolute && `Over the standard atmosphere it is ${absolute} absolute.`,
        );
      }
      case 'gauge-needed':
        return `${quoted(text)} is an absolute pressure, but a gauge pressure is needed here. Write it in \`barg\`.`;
      case 'scaled':
        return `${quoted(text)} multiplies, negates or adds gauge pressures, which are points on a scale. Use absolute pressures, in \`bar\`.`;
    }
  },
};
