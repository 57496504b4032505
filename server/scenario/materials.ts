// From a word to a material: a definition in reach, a catalogue substance by name, alias or formula, or, where only the
// composition matters, any formula at all. Also builds the material of a catalogue substance, once each.
// Says at the word what it could not make of it. Knows no entries and no blends.

import type { Word } from '../../grammar/tree.ts';
import { formationEnthalpyOf } from '../core/balance/formation-enthalpy.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { dimensionless } from '../core/quantity/dimension.ts';
import { quantityOf, type Parts, type Quantity } from '../core/quantity/quantity.ts';
import { findSubstance, phasesOfSubstance, suggestSubstances } from '../core/substance/catalogue.ts';
import { molPerKgOfFormula } from '../core/substance/composition.ts';
import { formulaTextWithPhase, molarMassKgPerMol, parseFormula, type Formula } from '../core/substance/formula.ts';
import type { Datum, Substance } from '../core/substance/substance.ts';
import { near, type Context } from './context.ts';
import type { Material, MissingProperty } from './material.ts';
import { cardOfSubstance, sourceText } from './material-card.ts';
import type { MaterialCard } from './scenario.ts';

/**
 * `data`: a material whose numbers are wanted. `composition`: any formula will do, in the catalogue or not.
 * `quiet`: as `data`, but nothing is said when there is none.
 */
export type Wanted = 'data' | 'composition' | 'quiet';

/** The material a word stands for; null when there is none (said at the word, unless the cause was said elsewhere). */
export function materialNamed(word: Word, context: Context, wanted: Wanted = 'data'): Material | null {
  const named = word.phase === undefined ? context.scope.lookup(word.text) : undefined;
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') {
    context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
    return null;
  }
  if (named?.kind === 'definition') {
    context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
    if (named.material) return named.material;
    const { kind } = named.definition;
    if (wanted !== 'quiet' && kind !== 'blend' && kind !== 'substance') {
      context.report(word.span, {
        code: 'name/wrong-kind',
        name: word.text,
        is: `a ${kind}`,
        needed: 'a substance or blend',
      });
    }
    return null;
  }
  if (named) {
    if (wanted !== 'quiet') {
      context.report(word.span, {
        code: 'name/wrong-kind',
        name: word.text,
        is: 'a number',
        needed: 'a substance or blend',
      });
    }
    return null;
  }
  const substance = findSubstance(word.text, word.phase);
  if (substance) {
    const material = materialOfSubstance(substance);
    context.mean(word.span, { kind: 'catalogue', card: material.card });
    return material;
  }
  if (wanted === 'composition') {
    const formula = formulaOfWord(word, context);
    const meant = formula && formulaWithLetterO(word);
    if (meant) context.report(word.span, { code: 'name/unknown', what: 'substance', word: word.text, near: [meant] });
    return meant ? null : formula && materialOfFormula(formula);
  }
  if (wanted === 'data') reportUnknownSubstance(word, context);
  return null;
}

/** The formula a word is; null when it is none (said). */
export function formulaOfWord(word: Word, context: Context): Formula | null {
  const formula = parseFormula(word.text, word.phase);
  if (formula.kind === 'formula') return formula;
  reportUnknownSubstance(word, context);
  return null;
}

/** `H20` written with a zero is a formula too, but hardly meant: the catalogue's formula with the letter, if there is one. */
function formulaWithLetterO(word: Word): string | null {
  const text = word.text.replace(/(?<![.\d])0|(?<=[A-Z]\d)0$/g, 'O');
  return text !== word.text && findSubstance(text) ? text : null;
}

function reportUnknownSubstance(word: Word, context: Context): void {
  const text = word.phase === undefined ? word.text : `${word.text}(${word.phase})`;
  const otherPhases = word.phase === undefined ? [] : phasesOfWord(word.text);
  const suggestions = otherPhases.length > 0 ? otherPhases : nearMaterials(word.text, context);
  context.report(word.span, { code: 'name/unknown', what: 'substance', word: text, near: suggestions.slice(0, 3) });
}

/** Names of materials near a word. One that differs in capitals alone is meant, and a formula is no slip for another. */
function nearMaterials(text: string, context: Context): readonly string[] {
  const named = near(text, context.scope.names()).filter((name) => {
    const found = context.scope.lookup(name);
    return found?.kind !== 'value' && (found?.kind !== 'definition' || isMaterial(found.definition.kind));
  });
  const all = [...new Set([...named, ...suggestSubstances(text)])];
  const sameLetters = all.filter((name) => alike(name) === alike(text));
  const isFormula = parseFormula(text).kind === 'formula';
  return sameLetters.length > 0 ? sameLetters : isFormula ? [] : all;
}

const isMaterial = (kind: string): boolean => kind === 'blend' || kind === 'substance';

/** In small letters, with the zero for the letter O. */
const alike = (text: string): string => text.toLowerCase().replaceAll('0', 'o');

/** The phases a known substance does have, spelt out, for one that was asked for in a phase the catalogue lacks. */
function phasesOfWord(text: string): readonly string[] {
  const stable = findSubstance(text);
  if (!stable) return [];
  return phasesOfSubstance(stable.name).map((substance) =>
    substance.formula ? formulaTextWithPhase(substance.formula) : substance.name,
  );
}

/** The material of a catalogue substance; the same object every time. */
export function materialOfSubstance(substance: Substance): Material {
  const known = substances.get(substance);
  if (known) return known;
  const material = buildMaterial(substance);
  substances.set(substance, material);
  return material;
}

const substances = new WeakMap<Substance, Material>();

/** A material of which only the formula is known. */
function materialOfFormula(formula: Formula): Material {
  const text = formulaTextWithPhase(formula);
  const molPerKg = molPerKgOfFormula(formula) ?? new Map<string, number>();
  const molarMass = molarMassKgPerMol(formula);
  const card: MaterialCard = {
    name: text,
    origin: 'formula',
    formula: formula.text,
    phase: formula.phase ?? null,
    aliases: [],
    properties: [],
    hazards: null,
  };
  return {
    name: text,
    origin: 'formula',
    formula,
    phase: formula.phase ?? null,
    species: new Map([[text, 1]]),
    elements: elementsOf(molPerKg),
    molarMass: molarMass === undefined ? null : quantityOf(molarMass, units.molarMass),
    formationEnthalpy: null,
    entropy: null,
    energyFrom: 'formation-enthalpy',
    heatCapacity: null,
    density: null,
    meltingPoint: null,
    boilingPoint: null,
    biogenicShare: quantityOf(0, dimensionless),
    products: null,
    portions: null,
    assumptions: [],
    sources: [],
    card,
    missing: new Map([
      ['formationEnthalpy', [text]],
      ['density', [text]],
    ]),
  };
}

function buildMaterial(substance: Substance): Material {
  const text = substance.formula ? formulaTextWithPhase(substance.formula) : substance.name;
  // A phase that is not the usual one goes by its formula, so that `Na(l)` and sodium are two portions of a blend.
  const label = substance.stableAtReference ? substance.name : text;
  const energy = formationEnthalpyOf(substance);
  const energyDatum = energy.kind === 'fault' ? undefined : energy.jPerKg;
  const enthalpy = datumQuantity(energyDatum, units.specificEnergy, `${text}/energy`);
  const density = datumQuantity(substance.density, units.density, `${text}/density`);
  const molarMass =
    substance.molarMassKgPerMol === undefined ? null : quantityOf(substance.molarMassKgPerMol, units.molarMass);
  const missing = new Map<MissingProperty, readonly string[]>();
  if (!enthalpy) missing.set('formationEnthalpy', [label]);
  if (!density) missing.set('density', [label]);
  if (!molarMass) missing.set('molarMass', [label]);
  const used = [energyDatum?.source, substance.compositionSource, substance.density?.source];
  return {
    name: label,
    origin: 'catalogue',
    formula: substance.formula ?? null,
    phase: substance.phase,
    species: speciesOf(substance),
    elements: elementsOf(substance.molPerKg),
    molarMass,
    formationEnthalpy: enthalpy,
    entropy: datumQuantity(substance.entropyJPerMolK, units.molarEntropy, `${text}/entropy`),
    energyFrom: substance.energy.kind === 'heating-value' ? 'heating-value' : 'formation-enthalpy',
    heatCapacity: substance.heatCapacity ?? null,
    density,
    meltingPoint: temperatureOf(substance.meltingPointK),
    boilingPoint: temperatureOf(substance.boilingPointK),
    biogenicShare: quantityOf(substance.carbonBiogenicShare, dimensionless),
    products: null,
    portions: null,
    assumptions: [],
    sources: [...new Set(used.flatMap((source) => (source ? [sourceText(source)] : [])))],
    card: cardOfSubstance(substance),
    missing,
  };
}

function speciesOf({ formula, members }: Substance): ReadonlyMap<string, number> | null {
  if (formula) return new Map([[formulaTextWithPhase(formula), 1]]);
  return members ? new Map(members.map((member) => [formulaTextWithPhase(member.formula), member.moleShare])) : null;
}

function elementsOf(molPerKg: ReadonlyMap<string, number>): ReadonlyMap<string, Quantity> {
  return new Map([...molPerKg].map(([symbol, mol]) => [symbol, quantityOf(mol, units.molPerMass)]));
}

/** A catalogue number is one independent input where its source gives an uncertainty. */
function datumQuantity(datum: Datum | undefined, dimension: Quantity['dimension'], input: string): Quantity | null {
  if (!datum) return null;
  const parts: Parts = datum.uncertainty ? new Map([[`catalogue/${input}`, datum.uncertainty]]) : new Map();
  return quantityOf(datum.value, dimension, parts);
}

function temperatureOf(datum: Datum | undefined): Quantity | null {
  return datum ? quantityOf(datum.value, units.temperature, undefined, 'temperature') : null;
}

const units = {
  temperature: knownUnit('K').dimension,
  molarMass: knownUnit('kg/mol').dimension,
  molPerMass: knownUnit('mol/kg').dimension,
  specificEnergy: knownUnit('J/kg').dimension,
  molarEntropy: knownUnit('J/(mol K)').dimension,
  density: knownUnit('kg/m3').dimension,
};
