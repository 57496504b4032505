// The hazards of a blend or oxidant as facts at their places: at the portion, or at the entry that says how it is kept;
// and what its `acknowledge` lines come to.
// Knows no rule and no wording. Invariants: one fact a code and place; what could not be read is not judged, and then no
// acknowledgement is said to be idle.

import type { Definition, Entry, Span } from '../../grammar/tree.ts';
import { isPartly } from '../core/hazard/blanket-rules.ts';
import { hazardsOf, judgePairs, pairsToJudge, rulesLookedAt } from '../core/hazard/find-hazards.ts';
import type { Hazard } from '../core/hazard/find-hazards.ts';
import { isMetal } from '../core/hazard/store.ts';
import type { Store } from '../core/hazard/store.ts';
import type { Context } from './context.ts';
import { isHazardCode } from './hazard-fact.ts';
import type { HazardFact, HazardPartner } from './hazard-fact.ts';
import type { Screening } from './screening.ts';
import type { Keeping, StoredBlend } from './stored-blend.ts';

/** The entries that say how it is kept, as far as they are written. */
export interface KeepingEntries {
  readonly stored?: Entry | undefined;
  readonly blanket?: Entry | undefined;
  readonly contact?: Entry | undefined;
  readonly extinguishing?: Entry | undefined;
}

export interface HazardPart {
  /** Index of its line in the definition. */
  readonly line: number;
}

export function reportHazards(
  definition: Definition,
  parts: readonly HazardPart[],
  stored: StoredBlend,
  keeping: Pick<Keeping, 'blanket'>,
  entries: KeepingEntries,
  context: Context,
): Screening {
  const { store, partOf } = stored;
  const questions = pairsToJudge(store);
  const judged =
    questions.length === 0 ? [] : context.scope.longWork(judgePairs, `hazard pairs ${keyOf(questions)}`, questions);
  const acknowledged = new Set(
    definition.lines.flatMap((line) =>
      line.kind === 'acknowledge' && line.code && line.reason?.value.trim() ? [line.code.text] : [],
    ),
  );
  const spanOfPortion = (index: number | null): Span | null => {
    const line = index === null ? undefined : definition.lines[parts[partOf[index] ?? -1]?.line ?? -1];
    return line?.kind === 'portion' ? (line.substance?.span ?? line.span) : null;
  };
  const header = definition.name?.span ?? definition.header;
  const told = new Set<string>();
  const hazards = hazardsOf(store, judged ?? []);
  for (const hazard of hazards) {
    const { place, other } = placesOf(hazard, spanOfPortion, entries, header);
    const key = `${hazard.code} ${String(place.start)}`;
    if (told.has(key)) continue;
    told.add(key);
    const portion = hazard.portion === null ? null : (store.portions[hazard.portion]?.name ?? null);
    const fact: HazardFact = {
      code: hazard.code,
      severity: acknowledged.has(hazard.code) ? 'information' : severityOf(hazard, store),
      acknowledged: acknowledged.has(hazard.code),
      blend: definition.name?.text ?? '',
      portion,
      partner: partnerOf(hazard, store),
      partnerPlace: other && context.place(other),
      happens: hazard.happens,
      mend: hazard.mend,
      source: hazard.source,
      numbers: hazard.numbers,
      mends: mendsOf(hazard, store, entries, context),
    };
    context.report(place, fact);
  }
  const found = new Set(hazards.map(({ code }) => code));
  const unrecorded = store.portions.filter(({ hazards: own }) => own.families.length + own.classes.length === 0);
  if (unrecorded.length === 0 && judged !== null && keeping.blanket !== undefined)
    reportIdle(definition, found, context);
  return {
    rulesLookedAt: rulesLookedAt(store, judged !== null),
    found: [...found],
    unrecorded: [...new Set(unrecorded.map(({ name }) => name))],
    substances: [
      ...new Map(stored.materials.map(({ name, card: { hazards: own } }) => [name, { name, hazards: own }])).values(),
    ],
  };
}

/** Air that nobody spoke of is a cautious guess, and a guess is no error. */
function severityOf({ severity, partner }: Hazard, store: Store): HazardFact['severity'] {
  return severity === 'error' && partner?.kind === 'gas' && store.blanket.assumed ? 'warning' : severity;
}

function keyOf(questions: ReturnType<typeof pairsToJudge>): string {
  return questions
    .flatMap(({ giver, taker }) =>
      [giver, taker].map(
        ({ name, massShare, molPerKg, formationEnthalpyJPerKg }) =>
          `${name} ${String(massShare)} ${JSON.stringify([...molPerKg])} ${String(formationEnthalpyJPerKg)}`,
      ),
    )
    .join('\n');
}

/** Where a hazard is told, and where its partner stands. */
function placesOf(
  { portion, partner, code }: Hazard,
  spanOfPortion: (index: number | null) => Span | null,
  { stored, blanket, contact, extinguishing }: KeepingEntries,
  header: Span,
): { readonly place: Span; readonly other: Span | null } {
  const own = spanOfPortion(portion);
  const entry =
    partner?.kind === 'gas'
      ? blanket
      : partner?.kind === 'contact'
        ? contact
        : partner?.kind === 'agent'
          ? extinguishing
          : partner === null && storageCodes.includes(code)
            ? stored
            : undefined;
  if (entry) return { place: entry.span, other: own };
  return {
    place: own ?? header,
    other: partner?.kind === 'portion' ? spanOfPortion(partner.index) : null,
  };
}

/** What the stored state decides, when there is no partner. */
const storageCodes: readonly string[] = [
  'hazard/molten-metal',
  'hazard/near-flash-point',
  'hazard/flammable-range',
  'hazard/above-autoignition',
];

function partnerOf({ partner }: Hazard, store: Store): HazardPartner | null {
  switch (partner?.kind) {
    case undefined:
      return null;
    case 'portion':
      return { kind: 'portion', name: store.portions[partner.index]?.name ?? '' };
    case 'gas':
      return { kind: 'gas', formula: partner.formula, moleShare: partner.moleShare, assumed: store.blanket.assumed };
    case 'contact':
      return { kind: 'contact', material: partner.material };
    case 'agent':
      return { kind: 'agent', agent: partner.agent };
  }
}

/** Another blanket, where one is written and would do. */
function mendsOf(
  { code, partner }: Hazard,
  store: Store,
  { blanket }: KeepingEntries,
  context: Context,
): HazardFact['mends'] {
  const span = blanket?.phrases[0]?.span;
  if (!span || partner?.kind !== 'gas') return [];
  if (!['hazard/blanket', 'hazard/superoxide', 'hazard/flammable-range', 'hazard/oxygen-enriched'].includes(code))
    return [];
  // Argon suits all; nitrogen is cheaper, and wrong over lithium alone.
  const holdsLithium = store.portions.some((portion) => isMetal(portion) && isPartly(portion, ['Li']));
  return (holdsLithium ? ['argon'] : ['nitrogen', 'argon']).map((gas) => ({
    title: `Blanket it with ${gas}`,
    place: context.place(span),
    newText: gas,
  }));
}

/** Acknowledgements of what is not there. */
function reportIdle(definition: Definition, found: ReadonlySet<string>, context: Context): void {
  for (const line of definition.lines) {
    // One without a reason has been told of already.
    if (line.kind !== 'acknowledge' || !line.code || !line.reason?.value.trim()) continue;
    if (!isHazardCode(line.code.text)) continue;
    if (!found.has(line.code.text)) {
      context.report(line.code.span, {
        code: 'name/acknowledged',
        why: 'not-there',
        acknowledged: line.code.text,
        line: context.place(line.span),
      });
    }
  }
}
