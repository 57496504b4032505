// The hazards of a blend or oxidant as facts at their places: at the portion, or at the entry that says how it is kept; those
// of a fuel named without a blend, at the entry that names it; and what the `acknowledge` lines come to.
// Knows no rule and no wording. Invariants: one fact a code and place; what could not be read is not judged, and then no
// acknowledgement is said to be idle.

import type { Definition, Entry, Span } from '../../grammar/tree.ts';
import { aloneRules } from '../core/hazard/alone-rules.ts';
import { hazardsOf, judgePairs, pairsToJudge, rulesLookedAt } from '../core/hazard/find-hazards.ts';
import type { Hazard } from '../core/hazard/find-hazards.ts';
import type { Store } from '../core/hazard/store.ts';
import { standardPressurePa } from '../core/quantity/constants.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import type { Context } from './context.ts';
import { hazardCodes, isHazardCode } from './hazard-fact.ts';
import type { HazardFact, HazardPartner } from './hazard-fact.ts';
import { acknowledgement, mendsOf } from './hazard-mends.ts';
import type { Material } from './material.ts';
import type { Screening } from './screening.ts';
import { storedBlend, type Keeping, type StoredBlend } from './stored-blend.ts';

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
  const judge = (one: Store): readonly Hazard[] => hazardsOf(one, judged ?? []);
  const hazards = judge(store);
  const spanOfPortion = (index: number | null): Span | null => {
    const line = index === null ? undefined : definition.lines[parts[partOf[index] ?? -1]?.line ?? -1];
    return line?.kind === 'portion' ? (line.substance?.span ?? line.span) : null;
  };
  const header = definition.name?.span ?? definition.header;
  const mendable = { definition, store, ...entries, hazards, storeAt: stored.storeAt, judge };
  tell(hazards, definition, store, context, (hazard) => ({
    ...placesOf(hazard, spanOfPortion, entries, header),
    mends: mendsOf(hazard, mendable, context),
  }));
  const screening = screeningOf(stored, hazards, rulesLookedAt(store, judged !== null));
  if (screening.unrecorded.length === 0 && judged !== null && keeping.blanket !== undefined)
    reportIdle(definition, screening.found, context);
  return screening;
}

/** A fuel and the entry that names it. */
export interface NamedFuel {
  readonly value: Material;
  readonly entry: Entry;
}

/**
 * The hazards of fuels that are named without a blend, at the places that name them: what they earn by themselves, for
 * nothing is said of how they are kept. Those of a blend are told where it is defined. The first fuel is the one that the
 * definition cannot do without.
 */
export function reportFuelHazards(
  definition: Definition,
  fuels: readonly (NamedFuel | undefined)[],
  context: Context,
): Screening | undefined {
  // Of a fuel that could not be read nothing is known, nor whether an acknowledgement is idle.
  if (!fuels[0]) return undefined;
  const screenings = fuels.flatMap((fuel) => {
    if (!fuel || fuel.value.portions) return [];
    const { value, entry } = fuel;
    const whole = { name: value.name, material: value, mass: quantityOf(1), mole: null, volume: null };
    const stored = storedBlend([whole], unsaidKeeping);
    const hazards = hazardsOf(stored.store, []).filter(({ code }) => hazardCodes[code].cause === 'alone');
    const place = entry.phrases[0]?.span ?? entry.span;
    tell(hazards, definition, stored.store, context, () => ({ place, other: null, mends: [] }));
    return [screeningOf(stored, hazards, aloneRules.length)];
  });
  const [first, ...others] = screenings;
  const all = first && others.reduce(joined, first);
  if (!all || all.unrecorded.length === 0) reportIdle(definition, all?.found ?? [], context);
  return all;
}

function joined(left: Screening, right: Screening): Screening {
  return {
    rulesLookedAt: left.rulesLookedAt,
    found: [...new Set([...left.found, ...right.found])],
    unrecorded: [...new Set([...left.unrecorded, ...right.unrecorded])],
    substances: [...left.substances, ...right.substances],
  };
}

const unsaidKeeping: Keeping = {
  kind: 'tank',
  temperatureK: referenceTemperatureK,
  pressurePa: standardPressurePa,
  blanket: undefined,
  contact: [],
  extinguishing: [],
};

/** Reports each code once a place, as acknowledged where a line of the definition says why. */
function tell(
  hazards: readonly Hazard[],
  definition: Definition,
  store: Store,
  context: Context,
  siteOf: (hazard: Hazard) => {
    readonly place: Span;
    readonly other: Span | null;
    readonly mends: HazardFact['mends'];
  },
): void {
  const acknowledged = new Set(
    definition.lines.flatMap((line) =>
      line.kind === 'acknowledge' && line.code && line.reason?.value.trim() ? [line.code.text] : [],
    ),
  );
  // A line whose reason is still to be written is not offered again.
  const begun = new Set(definition.lines.flatMap((line) => (line.kind === 'acknowledge' ? [line.code?.text] : [])));
  const told = new Set<string>();
  for (const hazard of hazards) {
    const { place, other, mends } = siteOf(hazard);
    const key = `${hazard.code} ${String(place.start)}`;
    if (told.has(key)) continue;
    told.add(key);
    context.report(place, {
      code: hazard.code,
      severity: acknowledged.has(hazard.code) ? 'information' : severityOf(hazard, store),
      acknowledged: acknowledged.has(hazard.code),
      blend: definition.name?.text ?? '',
      portion: hazard.portion === null ? null : (store.portions[hazard.portion]?.name ?? null),
      partner: partnerOf(hazard, store),
      partnerPlace: other && context.place(other),
      happens: hazard.happens,
      mend: hazard.mend,
      source: hazard.source,
      numbers: hazard.numbers,
      mends: [...mends, ...(begun.has(hazard.code) ? [] : [acknowledgement(hazard.code, definition, context)])],
    });
  }
}

function screeningOf({ store, materials }: StoredBlend, hazards: readonly Hazard[], looked: number): Screening {
  const unrecorded = store.portions.filter(({ hazards: own }) => own.families.length + own.classes.length === 0);
  return {
    rulesLookedAt: looked,
    found: [...new Set(hazards.map(({ code }) => code))],
    unrecorded: [...new Set(unrecorded.map(({ name }) => name))],
    substances: [
      ...new Map(materials.map(({ name, card: { hazards: own } }) => [name, { name, hazards: own }])).values(),
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

/** Acknowledgements of what is not there. */
function reportIdle(definition: Definition, found: readonly string[], context: Context): void {
  for (const line of definition.lines) {
    // One without a reason has been told of already.
    if (line.kind !== 'acknowledge' || !line.code || !line.reason?.value.trim()) continue;
    if (!isHazardCode(line.code.text)) continue;
    if (!found.includes(line.code.text)) {
      context.report(line.code.span, {
        code: 'name/acknowledged',
        why: 'not-there',
        acknowledged: line.code.text,
        line: context.place(line.span),
      });
    }
  }
}
