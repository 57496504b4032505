/**
 * The portions of a blend do not make a whole: shares that add up to less or more than 100 %, shares that contradict
 * each other, no room left for `rest`, or shares in percent mixed with amounts such as `2 kg`. Where a plain edit closes
 * the sum it is offered.
 */
import { formatPercent } from '../wording/numbers.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

type Shares = FactOf<'balance/shares'>;

export const balanceShares: Rule<Shares> = {
  severity: 'error',
  message: (fact) => said(fact),
  fixes: ({ mends }) =>
    mends.map(({ title, place, newText }, index) => ({
      title,
      preferred: index === 0,
      edits: [{ place, newText }],
    })),
};

function said({ why, name, sum }: Shares): string {
  const owner = quoted(name);
  switch (why) {
    case 'sum': {
      if (sum === null) return `The shares of ${owner} do not add up to 100 %.`;
      const gap = Math.abs(1 - sum);
      const side = sum < 1 ? 'missing' : 'too much';
      return `The shares of ${owner} add up to ${formatPercent(sum)}: ${formatPercent(gap)} ${side}. Correct a share, or let one portion take the \`rest\`.`;
    }
    case 'inconsistent':
      return `The shares by mass, mole and volume of ${owner} contradict each other: no make-up meets them all. Give them on one basis, or leave one portion open as \`rest\`.`;
    case 'no-room':
      return sum === null
        ? `Nothing is left for the \`rest\` of ${owner}. Lower the other shares.`
        : `The other shares of ${owner} add up to ${formatPercent(sum)}, so nothing is left for \`rest\`. Lower one of them.`;
    case 'mixed-amounts':
      return `${owner} mixes shares in % with amounts. Give all portions as shares, or all as amounts.`;
    case 'rest-with-amounts':
      return `${owner} gives its portions as amounts, so there is no whole for \`rest\` to fill. Give shares in %, or an amount instead of \`rest\`.`;
  }
}
