/**
 * A definition or value needs itself, directly or through others, so there is nothing to start from. Reported once, at
 * the name that closes the circle; everything in it stays unknown until it is broken.
 */
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameCycle: Rule<FactOf<'name/cycle'>> = {
  severity: 'error',
  message: ({ path, leftOut = 0 }) => {
    const [first = '', second] = path;
    if (path.length <= 2) return `${quoted(first)} is defined by itself. Give it a value that does not need it.`;
    const steps = path.slice(1, -1).map((name, index) => `${quoted(path[index] ?? '')} needs ${quoted(name)}`);
    // The last step of a long ring leads over those that are left out.
    if (leftOut > 0) steps.splice(-1, 1, `so on through ${leftOut} more`);
    const closing = `${quoted(path.at(-2) ?? second ?? '')} needs ${quoted(path.at(-1) ?? first)} again`;
    return `These definitions depend on each other in a circle: ${listed([...steps, closing])}. Break the circle at one of them.`;
  },
};
