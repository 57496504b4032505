// Which of a definition's figures a person looks for first. An order of ids and nothing else: figures that are not named
// here follow in the order the kind gives them. Invariant: every figure of the definition is there, once.
import type { EvaluatedDefinition, Figure } from '../scenario/scenario.ts';

/** The figures of a definition, the most asked-for first. */
export function leadingFigures({ figures }: EvaluatedDefinition): readonly Figure[] {
  const known = leading.get(figures);
  if (known) return known;
  const ordered = inLeadingOrder(figures);
  leading.set(figures, ordered);
  return ordered;
}

/** Of the definitions that a key leaves as they are, found once: a completion asks for those of all. */
const leading = new WeakMap<readonly Figure[], readonly Figure[]>();

export function inLeadingOrder<Row extends { readonly id: string }>(figures: readonly Row[]): readonly Row[] {
  return figures
    .map((figure, index) => ({ figure, rank: leadingRank(figure.id) + index / 1000 }))
    .sort((left, right) => left.rank - right.rank)
    .map(({ figure }) => figure);
}

/** How soon a figure is looked for: small is soon; one number for all that are not named here. */
export function leadingRank(id: string): number {
  return RANKS.get(id) ?? RANKS.size;
}

const RANKS: ReadonlyMap<string, number> = new Map(
  [
    'brake-efficiency',
    'specific-fuel-consumption',
    'specific-consumption',
    'mean-effective-pressure',
    'peak-pressure',
    'exhaust-temperature',
    'fuel-mass',
    'annual-fuel-mass',
    'annual-carbon-dioxide',
    'added-mass',
    'payload-lost',
    'endurance',
    'flame-temperature',
    'condensed-share',
    'flame-zone-temperature',
    'burn-out-time',
    'heat-above-exhaust',
    'ph-total-scale',
    'uptake-efficiency',
    'aragonite-saturation',
    'near-field-ph',
    'near-field-ph-change',
    'dissolved-inorganic-carbon',
    'enthalpy',
    'specific-enthalpy',
    'gibbs-energy',
    'log10-k',
    'lower-heating-value',
    'higher-heating-value',
    'stoichiometric-air',
    'density',
    'flash-point',
    'carbon-factor',
    'biogenic-carbon-share',
    'volumetric-lower-heating-value',
    'alkali-carbon-ratio',
    'water-missing',
    'molar-mass',
    'formation-enthalpy',
  ].map((id, rank) => [id, rank]),
);
