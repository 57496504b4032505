// The phases the fitted tables lack, as they are kept by hand from handbooks, and what the library makes of them: a record
// of the fitted shape, so that curves, searches and the minimiser know no difference. Every number names its source.
// Knows no catalogue; the tests hold both against each other at 298.15 K. Invariant: terms and constants are those of the
// record, converted, never adjusted: a liquid takes its enthalpy and entropy from its crystal at the melting point.
// Sources: those named in data/phases-by-hand/sources.json.

import { gasConstantJPerMolK, termCount } from './heat-capacity-terms.ts';
import type { Phase } from './formula.ts';
import { compileCurve, evaluateCurve } from './phase-curve.ts';
import type { PhaseFit, PhaseLimit } from './phase-fit.ts';
import type { SourceRecord } from './record.ts';

export interface HandPhaseRecord {
  /** As in the fitted files; unique among both. */
  readonly id: string;
  readonly label: string;
  readonly formula: string;
  readonly phase: Phase;
  readonly form?: string;
  /** At 298.15 K and 1 bar; both absent where the phase is set on its crystal instead. */
  readonly formationEnthalpy?: { readonly kJPerMol: number; readonly source: string };
  readonly entropy?: { readonly jPerMolK: number; readonly source: string };
  /** A liquid's melting point and heat of fusion from a phase of the fitted tables. */
  readonly meltsFrom?: {
    readonly phase: string;
    readonly atK: number;
    readonly kJPerMol: number;
    readonly source: string;
  };
  /** One range after the other, each up to where the next begins. */
  readonly heatCapacity: readonly HandHeatCapacity[];
  /** Where the last range's equation is followed beyond what its source states, and why that may be done. */
  readonly extended?: { readonly toK: number; readonly because: string };
  readonly limit?: Omit<PhaseLimit, 'phase' | 'provenance'>;
  /** Forms or falls apart in hours and with moisture: what equilibrium gives of it is a limit, not a forecast. */
  readonly slow?: true;
  readonly note?: string;
}

/** Factors of powers of T/1000 K from -2 to 4. */
export interface HandHeatCapacity {
  readonly jPerMolKTerms: Readonly<Record<string, number>>;
  readonly fromK: number;
  readonly toK: number;
  readonly source: string;
}

/** A hand-kept phase in the shape of the fitted ones. */
export interface HandPhase {
  readonly fit: Omit<PhaseFit, 'table'>;
  readonly limit: PhaseLimit | undefined;
  readonly isSlow: boolean;
  /** Author and year of each source. */
  readonly source: string;
}

/** The fitted shape of a record; `fitted` finds the crystal a liquid is set on. */
export function handPhase(
  record: HandPhaseRecord,
  sources: ReadonlyMap<string, SourceRecord>,
  fitted: ReadonlyMap<string, PhaseFit>,
): HandPhase {
  const { heatCapacity, formationEnthalpy, entropy, meltsFrom, extended, limit } = record;
  const used = [
    formationEnthalpy?.source,
    entropy?.source,
    meltsFrom?.source,
    ...heatCapacity.map(({ source }) => source),
  ];
  const toK = extended?.toK ?? heatCapacity.at(-1)?.toK ?? 0;
  const startK = meltsFrom?.atK ?? heatCapacity[0]?.fromK ?? 0;
  const endK = Math.min(toK, limit?.atK ?? toK);
  return {
    fit: {
      id: record.id,
      label: record.label,
      formula: record.formula,
      phase: record.phase,
      ...(record.form !== undefined && { form: record.form }),
      ...(formationEnthalpy && { formationKJPerMol: formationEnthalpy.kJPerMol }),
      ...(entropy && { entropyJPerMolK: entropy.jPerMolK }),
      ...(meltsFrom && { anchor: anchorAtMelting(meltsFrom, fitted) }),
      pieces: heatCapacity.map(({ fromK, jPerMolKTerms }) => ({ fromK, terms: termsOverR(jPerMolKTerms) })),
      toK,
      ...(record.phase !== 'g' && { stableK: [[startK, endK] as const] }),
      ...(meltsFrom && {
        changes: [
          { atK: meltsFrom.atK, kind: 'melting' as const, kJPerMol: meltsFrom.kJPerMol, with: meltsFrom.phase },
        ],
      }),
      ...(record.note !== undefined && { note: record.note }),
    },
    limit: limit && {
      phase: record.id,
      ...limit,
      source: sources.get(limit.source)?.title ?? '',
      provenance: sources.get(limit.source)?.provenance === 'seen' ? 'seen' : 'from memory',
    },
    isSlow: record.slow === true,
    source: [...new Set(used.flatMap((id) => (id === undefined ? [] : [sourceText(sources.get(id))])))].join('; '),
  };
}

/** A liquid's enthalpy and entropy where it is in equilibrium with its crystal. */
function anchorAtMelting(
  { phase, atK, kJPerMol }: NonNullable<HandPhaseRecord['meltsFrom']>,
  fitted: ReadonlyMap<string, PhaseFit>,
): NonNullable<PhaseFit['anchor']> {
  const crystal = fitted.get(phase);
  // The tests see to it that every crystal is there; without one the liquid would have no energy at all.
  if (crystal === undefined) throw new Error(`no fitted phase ${phase} to melt from`);
  const { enthalpyJPerMol, entropyJPerMolK } = evaluateCurve(compileCurve(crystal), atK);
  return {
    atK,
    kJPerMol: enthalpyJPerMol / 1000 + kJPerMol,
    jPerMolK: entropyJPerMolK + (kJPerMol * 1000) / atK,
  };
}

/** Factors of t^-2 to t^4 in cp/R. */
function termsOverR(jPerMolKTerms: Readonly<Record<string, number>>): readonly number[] {
  const terms = new Array<number>(termCount).fill(0);
  for (const [power, factor] of Object.entries(jPerMolKTerms)) terms[Number(power) + 2] = factor / gasConstantJPerMolK;
  return terms;
}

/** `Haynes 2014`; of an estimate how it was made. */
function sourceText(source: SourceRecord | undefined): string {
  if (source === undefined) return '';
  if (source.provenance === 'estimate') return source.title;
  const [author = ''] = source.author.split(',');
  const surname = author.replace(/ \(ed\.\)| et al\./, '').replace(/^([A-Z]\.[ -]?)+/, '');
  return `${surname} ${source.year}`;
}
