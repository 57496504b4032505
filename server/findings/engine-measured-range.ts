/**
 * A leg runs an engine at a load at which its consumption was not measured. Its fuel is extrapolated in a straight line with
 * the load from the nearest measured points, which is a guess.
 */
import { formatPercent } from '../wording/numbers.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineMeasuredRange: Rule<FactOf<'engine/measured-range'>> = {
  severity: 'warning',
  message: ({ leg, engine, load, fromLoad, toLoad }) => {
    const known =
      fromLoad === toLoad
        ? `only at ${formatPercent(fromLoad)}`
        : `from ${formatPercent(fromLoad)} to ${formatPercent(toLoad)}`;
    const mend = load < fromLoad ? 'Add a point there, or `idle consumption`.' : 'Add a point there.';
    return `${quoted(leg)} runs ${quoted(engine)} at a load of ${formatPercent(load)}, but its consumption is known ${known}. It is extrapolated in a straight line. ${mend}`;
  },
};
