/**
 * Files `use` each other in a circle. Everything they define is reached once all the same; the `use` that closes the circle
 * is reported, because which file stands on which can no longer be told.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameUseCycle: Rule<FactOf<'name/use-cycle'>> = {
  severity: 'error',
  message: ({ path }) => {
    if (path.length <= 2) return 'This file uses itself. Remove the `use`.';
    const steps = path.map((file) => quoted(file.slice(file.lastIndexOf('/') + 1))).join(', then ');
    return `These files use each other in a circle: ${steps}. Remove one of the \`use\` lines.`;
  },
};
