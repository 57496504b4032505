/**
 * This version reads definitions of this kind but does not work them out yet. Said once a definition; whatever refers
 * to it stays without a value and without further findings.
 */
import { quoted, withArticle } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const kindNotEvaluated: Rule<FactOf<'kind/not-evaluated'>> = {
  severity: 'information',
  message: ({ kind, name }) =>
    `${quoted(name)} is ${withArticle(kind)}, which this version reads but does not work out yet. What refers to it has no value.`,
};
