// Finds substances: by name, by alias, by formula and phase, and suggests the nearest when a word finds nothing.
// Knows no user's definitions and no energies beyond what the records say.
// The index is built at the first question, once. Invariant: a word finds at most one substance, the same every time.

import { compositionKey, parseFormula } from './formula.ts';
import type { Formula, Phase } from './formula.ts';
import { substancesOfRecord } from './from-record.ts';
import type { RecordContext } from './from-record.ts';
import type { SourceRecord } from './record.ts';
import { sourceRecords, substanceRecords } from './records.ts';
import type { Substance } from './substance.ts';
import { nearestWords } from './suggestion.ts';

/** Every phase of every catalogue substance; within one substance the phase that is stable at 25 °C comes first. */
export function allSubstances(): readonly Substance[] {
  return catalogue().substances;
}

/**
 * The catalogue substance of a word: a name or alias (`gas_oil`, `'sodium oleate'`; blanks and `_` are alike), or a formula
 * (`Na2CO3`, `H2O(g)`). Case matters only where a word with capitals is a known formula: `MgO` is magnesium oxide, `mgo`
 * marine gas oil. Without a phase the one stable at 25 °C and 1 bar is meant.
 * Undefined when nothing is found, also when the substance is known but not in that phase.
 */
export function findSubstance(word: string, phase?: Phase): Substance | undefined {
  const { kept } = catalogue();
  const key = `${word} ${phase ?? ''}`;
  const known = kept.get(key);
  if (known !== undefined || kept.has(key)) return known;
  const found = lookUp(word, phase);
  // Slates and heating values ask for the same few words over and over; a text full of unknown ones must not pile up.
  if (kept.size >= mostKept) kept.clear();
  kept.set(key, found);
  return found;
}

function lookUp(word: string, phase: Phase | undefined): Substance | undefined {
  // Every formula but the electron's holds a capital, so most names need no second reading.
  const formula = /[A-Z]|^e-/.test(word) ? parseFormula(word, phase) : undefined;
  const written = formula?.kind === 'formula' ? findSubstanceOfFormula(formula) : undefined;
  if (written !== undefined) return written;
  const named = catalogue().byWord.get(wordKey(word));
  if (named === undefined || phase === undefined) return named;
  return phasesOfSubstance(named.name).find((substance) => substance.phase === phase);
}

/** The first of `substancesOfFormula`: a guess where isomers share a formula. */
export function findSubstanceOfFormula(formula: Formula): Substance | undefined {
  return substancesOfFormula(formula)[0];
}

/**
 * All catalogue substances with the formula's atoms and charge, in its phase where it carries one. A record written with
 * the very same formula comes first (`CH3OCH3` is dimethyl ether, not ethanol), then stable phases before others.
 */
export function substancesOfFormula(formula: Formula): readonly Substance[] {
  const known = ofFormula.get(formula);
  if (known) return known;
  const candidates = catalogue().byComposition.get(compositionKey(formula)) ?? [];
  const found = candidates
    .filter((substance) => formula.phase === undefined || substance.phase === formula.phase)
    .map((substance) => ({ substance, rank: substance.formula?.text === formula.text ? 0 : 1 }))
    .sort((a, b) => a.rank - b.rank || Number(b.substance.stableAtReference) - Number(a.substance.stableAtReference))
    .map(({ substance }) => substance);
  ofFormula.set(formula, found);
  return found;
}

/** The phases the catalogue has of the substance of that exact name, the stable one first. */
export function phasesOfSubstance(name: string): readonly Substance[] {
  return catalogue().byName.get(name) ?? [];
}

/**
 * Up to `most` catalogue words near a word that found nothing, nearest first; digits and letters that look alike count as
 * near (`H20` gives `H2O`). Empty when nothing is near.
 */
export function suggestSubstances(word: string, most = 3): readonly string[] {
  return nearestWords(word, catalogue().suggestible, most);
}

const mostKept = 2000;
const ofFormula = new WeakMap<Formula, readonly Substance[]>();

interface Catalogue {
  /** Answers of `findSubstance` so far. */
  readonly kept: Map<string, Substance | undefined>;
  readonly substances: readonly Substance[];
  readonly byName: ReadonlyMap<string, readonly Substance[]>;
  readonly byWord: ReadonlyMap<string, Substance>;
  readonly byComposition: ReadonlyMap<string, readonly Substance[]>;
  readonly suggestible: readonly string[];
}

let built: Catalogue | undefined;

function catalogue(): Catalogue {
  built ??= buildCatalogue();
  return built;
}

function buildCatalogue(): Catalogue {
  const sources = new Map(sourceRecords.map((source) => [source.id, source]));
  const byName = new Map<string, readonly Substance[]>();
  const byComposition = new Map<string, Substance[]>();
  const byWord = new Map<string, Substance>();
  const context: RecordContext = {
    sourceOf: (id) => sources.get(id) ?? unknownSource(id),
    gasOf: (formulaText) => {
      const formula = parseFormula(formulaText, 'g');
      const found = formula.kind === 'formula' ? byComposition.get(compositionKey(formula)) : undefined;
      return found?.find((substance) => substance.phase === 'g');
    },
  };
  // Mixtures are made of other records, so they are read last.
  const ordered = [...substanceRecords].sort(
    (a, b) => Number(a.mixtureByMole !== undefined) - Number(b.mixtureByMole !== undefined),
  );
  for (const record of ordered) {
    const substances = substancesOfRecord(record, context);
    byName.set(record.name, substances);
    const [stable] = substances;
    for (const word of [record.name, ...(record.aliases ?? [])]) if (stable) byWord.set(wordKey(word), stable);
    for (const substance of substances) {
      for (const alias of substance.aliases) if (!byWord.has(wordKey(alias))) byWord.set(wordKey(alias), substance);
      if (substance.formula === undefined) continue;
      const key = compositionKey(substance.formula);
      const sameComposition = byComposition.get(key);
      if (sameComposition === undefined) byComposition.set(key, [substance]);
      else sameComposition.push(substance);
    }
  }
  const substances = substanceRecords.flatMap((record) => byName.get(record.name) ?? []);
  const formulaTexts = new Set(substances.flatMap((substance) => substance.formula?.text ?? []));
  return { kept: new Map(), substances, byName, byWord, byComposition, suggestible: [...byWord.keys(), ...formulaTexts] };
}

/** Names are compared in lower case with `_` between words, so that a quoted `sodium oleate` meets `sodium_oleate`. */
function wordKey(word: string): string {
  return word
    .trim()
    .toLowerCase()
    .replace(/[\s_]+/g, '_');
}

/** A test keeps this from happening; a missing source must not take the catalogue down. */
function unknownSource(id: string): SourceRecord {
  return { id, author: 'unknown', year: 0, title: 'source not recorded', where: '', provenance: 'from memory' };
}
