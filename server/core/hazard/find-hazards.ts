// All hazards of a store: every rule looked at, pairs that no rule names found by their chemistry, and what is one cause
// told once.
// Knows no wording beyond its rules' own and no text. Invariant: a code stands at most once at a portion, with its worst
// partner; a pair of portions is told by one rule only; an answer is a pure function of the store.

import { aloneRules } from './alone-rules.ts';
import { contactRules } from './contact-rules.ts';
import { findPair } from './found-pairs.ts';
import type { HazardCode, HazardSeverity } from './hazard-codes.ts';
import { meetingRules } from './meeting-rules.ts';
import type { HazardNumbers, HazardRule, Hit } from './rule.ts';
import { storageRules } from './storage-rules.ts';
import type { Store } from './store.ts';

/** A hazard at its place, with the rule that found it. */
export interface Hazard extends Hit {
  readonly code: HazardCode;
  readonly rule: string;
  readonly happens: string;
  readonly mend: string;
  readonly source: string;
}

/** What is shown of a rule: every one there is, for the reference and for telling which were looked at. */
export type RuleWords = Pick<HazardRule, 'id' | 'code' | 'happens' | 'mend' | 'source'>;

const foundPairWords: RuleWords = {
  id: 'found-pair',
  code: 'hazard/reactive-pair',
  happens: 'Together they are far more stable than apart, and their families are known to react.',
  mend: 'Keep them apart, or show by test that they are quiet together.',
  source: 'state of lowest energy of the two against each alone (this program)',
};

export const allRules: readonly RuleWords[] = [
  ...aloneRules,
  ...storageRules,
  ...meetingRules,
  ...contactRules,
  foundPairWords,
].map(({ id, code, happens, mend, source }) => ({ id, code, happens, mend, source }));

/** Worst first, then by code and portion. */
export function hazardsOf(store: Store): readonly Hazard[] {
  const found: Hazard[] = [];
  for (const rule of [...aloneRules, ...storageRules, ...contactRules]) {
    for (const hit of rule.find(store)) found.push({ ...hit, ...wordsOf(rule) });
  }
  found.push(...meetings(store));
  return onePerCause(found);
}

function meetings(store: Store): readonly Hazard[] {
  const found: Hazard[] = [];
  if (store.kind === 'oxidant') return found;
  for (const [i, a] of store.portions.entries()) {
    for (const [j, b] of store.portions.entries()) {
      if (j <= i) continue;
      let isNamed = false;
      for (const rule of meetingRules) {
        // The one the finding stands at may come first or second in the text.
        const order =
          rule.first(a, store) && rule.second(b, store, a)
            ? ([i, j] as const)
            : rule.first(b, store) && rule.second(a, store, b)
              ? ([j, i] as const)
              : null;
        if (order === null) continue;
        const [first, second] = order[0] === i ? [a, b] : [b, a];
        const numbers = rule.numbers(store, first, second);
        const severity = rule.severity(numbers, store, first, second);
        if (severity === null) continue;
        found.push(hazardOf(rule, severity, order, numbers));
        isNamed = true;
        if (!alsoNames.has(rule.id)) break;
      }
      if (!isNamed) found.push(...byChemistry(store, i, j));
    }
  }
  return found;
}

/** An emulsifier is ester and alcohol at once: these rules leave a pair open to the next. */
const alsoNames: ReadonlySet<string> = new Set(['metal-with-alcohol']);

function byChemistry(store: Store, i: number, j: number): readonly Hazard[] {
  for (const [giver, taker] of [
    [i, j],
    [j, i],
  ] as const) {
    const [a, b] = [store.portions[giver], store.portions[taker]];
    const pair = a && b ? findPair(a, b, store) : null;
    if (!a || !b || pair === null) continue;
    const share = a.massShare + b.massShare;
    const heat = pair.equilibrium === null ? {} : { heatJPerKg: pair.equilibrium.heatJPerKg * share };
    return [hazardOf(foundPairWords, pair.severity, [giver, taker], heat)];
  }
  return [];
}

function hazardOf(
  rule: RuleWords,
  severity: HazardSeverity,
  [first, second]: readonly [number, number],
  numbers: HazardNumbers,
): Hazard {
  return { ...wordsOf(rule), severity, portion: first, partner: { kind: 'portion', index: second }, numbers };
}

function wordsOf({ id, code, happens, mend, source }: RuleWords): Pick<Hazard, 'rule' | keyof Omit<RuleWords, 'id'>> {
  return { rule: id, code, happens, mend, source };
}

const rank: Readonly<Record<HazardSeverity, number>> = { error: 0, warning: 1, information: 2 };

function onePerCause(found: readonly Hazard[]): readonly Hazard[] {
  const sorted = [...found].sort((a, b) => rank[a.severity] - rank[b.severity]);
  const kept = new Map<string, Hazard>();
  for (const hazard of sorted) {
    const key = `${hazard.code} ${String(hazard.portion)}`;
    if (!kept.has(key)) kept.set(key, hazard);
  }
  return [...kept.values()];
}
