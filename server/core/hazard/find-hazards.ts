// All hazards of a store: every rule looked at, pairs that no rule names found by their chemistry, and what is one cause
// told once.
// Knows no wording beyond its rules' own and no text. Invariant: a code stands at most once at a portion, with its worst
// partner; a pair of portions is told by one rule only; an answer is a pure function of the store.

import { aloneRules } from './alone-rules.ts';
import { contactRules } from './contact-rules.ts';
import { findPair, needsJudging } from './found-pairs.ts';
import { pairEquilibrium } from './pair-equilibrium.ts';
import type { PairEquilibrium } from './pair-equilibrium.ts';
import type { HazardCode, HazardSeverity } from './hazard-codes.ts';
import { meetingRules } from './meeting-rules.ts';
import type { HazardNumbers, HazardRule, Hit } from './rule.ts';
import { storageRules } from './storage-rules.ts';
import type { Store, StoredPortion } from './store.ts';

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

/** How many rules `hazardsOf` looks at for a store; without `allJudged` an answer about pairs is still awaited. */
export function rulesLookedAt(store: Store, allJudged: boolean): number {
  // What is in an oxidant is meant to be together.
  const ofPairs = store.kind === 'oxidant' ? 0 : meetingRules.length + (allJudged ? 1 : 0);
  return aloneRules.length + storageRules.length + contactRules.length + ofPairs;
}

/** Two portions whose reaction their state of lowest energy must decide, and what it says: that takes long. */
export interface PairQuestion {
  readonly giver: StoredPortion;
  readonly taker: StoredPortion;
}
export interface JudgedPair extends PairQuestion {
  /** Null where data are missing. */
  readonly equilibrium: PairEquilibrium | null;
}

/** The pairs of a store that no rule names and no family decides alone. */
export function pairsToJudge(store: Store): readonly PairQuestion[] {
  const questions: PairQuestion[] = [];
  walkMeetings(store, (giver, taker) => {
    if (needsJudging(giver, taker, store)) questions.push({ giver, taker });
    return null;
  });
  return questions;
}

/** Long work: the answers in the order of the questions. */
export function judgePairs(
  questions: readonly PairQuestion[],
  shouldStop: () => boolean = () => false,
): readonly JudgedPair[] | null {
  const judged: JudgedPair[] = [];
  for (const { giver, taker } of questions) {
    if (shouldStop()) return null;
    judged.push({ giver, taker, equilibrium: pairEquilibrium(giver, taker) ?? null });
  }
  return judged;
}

/**
 * Worst first. `judged` holds the answers for `pairsToJudge`; a pair without one is not told. Without the argument they
 * are worked out here.
 */
export function hazardsOf(
  store: Store,
  judged: readonly JudgedPair[] = judgePairs(pairsToJudge(store)) ?? [],
): readonly Hazard[] {
  const found: Hazard[] = [];
  for (const rule of [...aloneRules, ...storageRules, ...contactRules]) {
    for (const hit of rule.find(store)) found.push({ ...hit, ...wordsOf(rule) });
  }
  found.push(...meetings(store, judged));
  return onePerCause(found);
}

function meetings(store: Store, judged: readonly JudgedPair[]): readonly Hazard[] {
  return walkMeetings(store, (giver, taker, order) => {
    const answer = judged.find((one) => one.giver.name === giver.name && one.taker.name === taker.name);
    const pair = findPair(giver, taker, store, answer?.equilibrium);
    if (pair === null) return null;
    const share = giver.massShare + taker.massShare;
    const heat = pair.equilibrium === null ? {} : { heatJPerKg: pair.equilibrium.heatJPerKg * share };
    return hazardOf(foundPairWords, pair.severity, order, heat);
  });
}

/**
 * Hydrogen that the portions make of each other in their tank, mol per kg of the blend: the sum over the pairs that written
 * rules name. What takes part in two pairs counts in both, so it is an upper bound; walls are not counted.
 */
export function ownHydrogenMolPerKg(store: Store): number {
  return walkMeetings(store, () => null).reduce((sum, { numbers }) => sum + (numbers.gasMolPerKg?.['H2'] ?? 0), 0);
}

type Order = readonly [first: number, second: number];

/** What the written rules say of each pair; for one they do not name, what `byChemistry` says, in either order. */
function walkMeetings(
  store: Store,
  byChemistry: (giver: StoredPortion, taker: StoredPortion, order: Order) => Hazard | null,
): readonly Hazard[] {
  const found: Hazard[] = [];
  if (store.kind === 'oxidant') return found;
  for (const [i, a] of store.portions.entries()) {
    for (const [j, b] of store.portions.entries()) {
      if (j <= i) continue;
      const named = namedMeetings(store, [i, a], [j, b]);
      const hazard = named.length > 0 ? null : (byChemistry(a, b, [i, j]) ?? byChemistry(b, a, [j, i]));
      found.push(...named, ...(hazard ? [hazard] : []));
    }
  }
  return found;
}

function namedMeetings(
  store: Store,
  [i, a]: readonly [number, StoredPortion],
  [j, b]: readonly [number, StoredPortion],
): readonly Hazard[] {
  const found: Hazard[] = [];
  for (const rule of meetingRules) {
    // The one the finding stands at may come first or second in the text.
    const isForward = rule.first(a, store) && rule.second(b, store, a);
    if (!isForward && !(rule.first(b, store) && rule.second(a, store, b))) continue;
    const [first, second, order] = isForward ? ([a, b, [i, j]] as const) : ([b, a, [j, i]] as const);
    const numbers = rule.numbers(store, first, second);
    const severity = rule.severity(numbers, store, first, second);
    if (severity === null) continue;
    found.push(hazardOf(rule, severity, order, numbers));
    if (!alsoNames.has(rule.id)) break;
  }
  return found;
}

/** An emulsifier is ester and alcohol at once: these rules leave a pair open to the next. */
const alsoNames: ReadonlySet<string> = new Set(['metal-with-alcohol']);

function hazardOf(rule: RuleWords, severity: HazardSeverity, [first, second]: Order, numbers: HazardNumbers): Hazard {
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
