// Finds substances: by name, by alias, by formula and phase, and suggests the nearest when a word finds nothing.
// Knows no user's definitions, no energies beyond what the records say, and no search by part of a name (search.ts).
// Words are indexed at the first question, compositions at the first formula that no record writes alike, and a record is
// turned into substances when it is first asked for: a run that needs three reads three. Invariant: a word finds at most one substance, always the same.

import { compositionKey, parseFormula } from './formula.ts';
import type { Formula, Phase } from './formula.ts';
import { substancesOfRecord } from './from-record.ts';
import type { RecordContext } from './from-record.ts';
import { hazardRecordOf, hazardSourceRecords } from './hazard-records.ts';
import type { SourceRecord, SubstanceRecord } from './record.ts';
import { sourceRecords, substanceRecords } from './records.ts';
import type { Substance } from './substance.ts';
import { nearestWords } from '../spelling/nearest-words.ts';

/** Every phase of every catalogue substance; within one substance the phase that is stable at 25 °C comes first. */
export function allSubstances(): readonly Substance[] {
  return substanceRecords.flatMap(substancesOf);
}

/**
 * The catalogue substance of a word: a name or alias (`gas_oil`, `'sodium oleate'`; blanks and `_` are alike), or a formula
 * (`Na2CO3`, `H2O(g)`). Case matters only where a word with capitals is a known formula: `MgO` is magnesium oxide, `mgo`
 * marine gas oil. Without a phase the one stable at 25 °C and 1 bar is meant.
 * Undefined when nothing is found, also when the substance is known but not in that phase.
 */
export function findSubstance(word: string, phase?: Phase): Substance | undefined {
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
  const named = indexOfWords().get(wordKey(word));
  if (named === undefined) return undefined;
  const [stable, ...others] = substancesOf(named.record);
  const wanted = phase ?? named.phase;
  return wanted === undefined || stable?.phase === wanted
    ? stable
    : others.find((substance) => substance.phase === wanted);
}

/** The first of `substancesOfFormula`: a guess where isomers share a formula. */
export function findSubstanceOfFormula(formula: Formula): Substance | undefined {
  // Most formulas are written as a record has them, and then the others need not be read.
  const alike = indexOfTexts().get(formula.text);
  const found =
    alike && substancesOf(alike).find(({ phase }) => formula.phase === undefined || phase === formula.phase);
  return found ?? substancesOfFormula(formula)[0];
}

/**
 * All catalogue substances with the formula's atoms and charge, in its phase where it carries one. A record written with
 * the very same formula comes first (`CH3OCH3` is dimethyl ether, not ethanol), then stable phases before others.
 */
export function substancesOfFormula(formula: Formula): readonly Substance[] {
  const known = ofFormula.get(formula);
  if (known) return known;
  const candidates = indexOfCompositions().get(compositionKey(formula)) ?? [];
  const found = candidates
    .flatMap(substancesOf)
    .filter((substance) => formula.phase === undefined || substance.phase === formula.phase)
    .map((substance) => ({ substance, rank: substance.formula?.text === formula.text ? 0 : 1 }))
    .sort((a, b) => a.rank - b.rank || Number(b.substance.stableAtReference) - Number(a.substance.stableAtReference))
    .map(({ substance }) => substance);
  ofFormula.set(formula, found);
  return found;
}

/** The phases the catalogue has of the substance of that exact name, the stable one first. */
export function phasesOfSubstance(name: string): readonly Substance[] {
  const named = indexOfWords().get(name);
  return named?.record.name === name ? substancesOf(named.record) : [];
}

/**
 * Up to `most` catalogue words near a word that found nothing, nearest first; digits and letters that look alike count as
 * near (`H20` gives `H2O`). Empty when nothing is near.
 */
export function suggestSubstances(word: string, most = 3): readonly string[] {
  suggestible ??= [...indexOfWords().keys(), ...indexOfTexts().keys()];
  return nearestWords(word, suggestible, most);
}

const mostKept = 2000;
/** Answers of `findSubstance` so far. */
const kept = new Map<string, Substance | undefined>();
const ofFormula = new WeakMap<Formula, readonly Substance[]>();
const ofRecord = new Map<SubstanceRecord, readonly Substance[]>();
let suggestible: readonly string[] | undefined;
let words: ReadonlyMap<string, Named> | undefined;
let texts: ReadonlyMap<string, SubstanceRecord> | undefined;
let compositions: ReadonlyMap<string, readonly SubstanceRecord[]> | undefined;
let sources: ReadonlyMap<string, SourceRecord> | undefined;

/** What a word names: a record, and a phase of it where the word is that phase's own (`steam`). */
interface Named {
  readonly record: SubstanceRecord;
  readonly phase?: Phase;
}

function substancesOf(record: SubstanceRecord): readonly Substance[] {
  const known = ofRecord.get(record);
  if (known !== undefined) return known;
  const substances = substancesOfRecord(record, context);
  ofRecord.set(record, substances);
  return substances;
}

/** Names and aliases are kept in the records as `wordKey` writes them; a phase's own alias names that phase. */
function indexOfWords(): ReadonlyMap<string, Named> {
  if (words !== undefined) return words;
  const index = new Map<string, Named>();
  for (const record of substanceRecords) {
    const named = { record };
    index.set(record.name, named);
    for (const alias of record.aliases ?? []) index.set(alias, named);
    for (const { phase, aliases = [] } of record.phases) {
      for (const alias of aliases) index.set(alias, { record, phase });
    }
  }
  words = index;
  return index;
}

/** By the formula as the record writes it, which is its canonical text. */
function indexOfTexts(): ReadonlyMap<string, SubstanceRecord> {
  if (texts !== undefined) return texts;
  const index = new Map<string, SubstanceRecord>();
  for (const record of substanceRecords) if (record.formula !== undefined) index.set(record.formula, record);
  texts = index;
  return index;
}

function indexOfCompositions(): ReadonlyMap<string, readonly SubstanceRecord[]> {
  if (compositions !== undefined) return compositions;
  const index = new Map<string, SubstanceRecord[]>();
  for (const record of indexOfTexts().values()) {
    const formula = parseFormula(record.formula ?? '');
    if (formula.kind === 'fault') continue;
    const key = compositionKey(formula);
    const alike = index.get(key);
    if (alike === undefined) index.set(key, [record]);
    else alike.push(record);
  }
  compositions = index;
  return index;
}

/** Mixtures are made of other records, which are looked up by formula; a mixture has none, so this ends. */
const context: RecordContext = {
  sourceOf: (id) => {
    sources ??= new Map([...sourceRecords, ...hazardSourceRecords].map((source) => [source.id, source]));
    return sources.get(id) ?? unknownSource(id);
  },
  gasOf: (formulaText) => {
    const formula = parseFormula(formulaText, 'g');
    return formula.kind === 'formula' ? findSubstanceOfFormula(formula) : undefined;
  },
  hazardsOf: hazardRecordOf,
};

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
