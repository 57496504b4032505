// Searches the catalogue by anything a reader knows: part of a name, a formula, an element, a phase, where carbon comes
// from, or a property with or without a bound (`flash<60`, `boiling>300`, `K liquid`). Every word of a question must fit.
// Knows only the catalogue and prints nothing. Invariant: a substance's exact name or formula comes first; the rest keep
// the order best match, then catalogue.

import { allSubstances, findSubstance } from './catalogue.ts';
import { elementOfSymbol } from './elements.ts';
import type { Phase } from './formula.ts';
import type { Substance } from './substance.ts';

/**
 * The substances, phase by phase, that fit every word of the text; empty when nothing does. Words are parted by blanks,
 * and a text that is itself a name (`sodium oleate`) counts as one word first. Bounds are in °C, kg/m³, kJ/(kg K), g/mol
 * and per cent by volume, as the records have them.
 */
export function searchSubstances(text: string): readonly Substance[] {
  const asked = text.trim();
  if (asked === '') return [];
  const everything = allSubstances();
  const exact = findSubstance(asked);
  const whole = ranked(everything, [asked], exact);
  if (whole.length > 0) return whole;
  return ranked(everything, asked.replace(/\s*([<>])=?\s*/g, '$1').split(/[\s,]+/), exact);
}

/** How well a word fits, small is good; undefined when it does not fit. */
function rankOf(substance: Substance, word: string): number | undefined {
  const part = word.toLowerCase().replace(/\s+/g, '_');
  const names = [substance.name, ...substance.aliases];
  const formula = substance.formula?.text ?? '';
  if (names.includes(part)) return 0;
  if (formula === word || `${formula}(${substance.phase})` === word) return 0;
  if (elementOfSymbol(word) !== undefined) return substance.molPerKg.has(word) ? 3 : undefined;
  if (names.some((name) => name.startsWith(part))) return 1;
  if (names.some((name) => name.includes(part))) return 2;
  if (part.length > 1 && formula.toLowerCase().includes(part)) return 2;
  if (phaseWords[part] === substance.phase || substance.carbonOrigin === part) return 3;
  return fitsProperty(substance, part) ? 3 : undefined;
}

function ranked(
  substances: readonly Substance[],
  words: readonly string[],
  exact: Substance | undefined,
): readonly Substance[] {
  return substances
    .flatMap((substance) => {
      const ranks = words.map((word) => rankOf(substance, word));
      if (ranks.includes(undefined)) return [];
      const rank = substance === exact ? -1 : Math.max(...ranks.map((value) => value ?? 0));
      return [{ substance, rank }];
    })
    .sort((a, b) => a.rank - b.rank)
    .map(({ substance }) => substance);
}

/** `flash<60`, or `flash` alone for every substance that has one. */
function fitsProperty(substance: Substance, part: string): boolean {
  const [, word = part, bound, number = ''] = /^([a-z-]+)([<>])(-?[0-9.]+)$/.exec(part) ?? [];
  const property = properties.find(({ words }) => words.includes(word));
  const value = property?.valueOf(substance);
  if (value === undefined) return false;
  if (bound === undefined) return true;
  return bound === '<' ? value < Number(number) : value > Number(number);
}

const phaseWords: Readonly<Record<string, Phase>> = {
  gas: 'g',
  '(g)': 'g',
  liquid: 'l',
  '(l)': 'l',
  crystal: 'cr',
  solid: 'cr',
  '(cr)': 'cr',
  dissolved: 'aq',
  ion: 'aq',
  '(aq)': 'aq',
};

interface Property {
  readonly words: readonly string[];
  /** In the unit the records use. */
  readonly valueOf: (substance: Substance) => number | undefined;
}

function celsius(datum: { readonly value: number } | undefined): number | undefined {
  return datum && datum.value - 273.15;
}

function times(factor: number, datum: { readonly value: number } | undefined): number | undefined {
  return datum && datum.value * factor;
}

const properties: readonly Property[] = [
  { words: ['melting', 'melting-point'], valueOf: (substance) => celsius(substance.meltingPointK) },
  { words: ['boiling', 'boiling-point'], valueOf: (substance) => celsius(substance.boilingPointK) },
  { words: ['flash', 'flash-point'], valueOf: (substance) => celsius(substance.flashPointK) },
  { words: ['autoignition', 'ignition'], valueOf: (substance) => celsius(substance.autoignitionK) },
  { words: ['lower-limit', 'flammable'], valueOf: (substance) => times(100, substance.flammableLimits?.lower) },
  { words: ['upper-limit'], valueOf: (substance) => times(100, substance.flammableLimits?.upper) },
  { words: ['density'], valueOf: (substance) => substance.density?.value },
  { words: ['heat-capacity'], valueOf: (substance) => times(1e-3, substance.heatCapacityJPerKgK) },
  {
    words: ['molar-mass'],
    valueOf: ({ molarMassKgPerMol }) => (molarMassKgPerMol === undefined ? undefined : molarMassKgPerMol * 1000),
  },
  { words: ['rule'], valueOf: (substance) => (substance.rules.length > 0 ? substance.rules.length : undefined) },
];
