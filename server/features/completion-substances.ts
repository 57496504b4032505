// Offers what the catalogue knows, by name, alias or formula with its phase, and the chemical elements. Where nothing is
// typed yet only the names are offered, or in an equation the formulas; what is typed brings the rest.
// Documentation is made when a person looks at an offer (completion-documentation.ts). Invariant: what is inserted finds
// the very substance that is offered, in its phase.
import { allElements } from '../core/substance/elements.ts';
import { allSubstances, findSubstance } from '../core/substance/catalogue.ts';
import { formulaTextWithPhase } from '../core/substance/formula.ts';
import type { Substance } from '../core/substance/substance.ts';
import { cardOfSubstance } from '../scenario/material-card.ts';
import { figureText } from '../wording/quantities.ts';
import { fitRank, fits, type CompletionItem } from './completion-item.ts';
import { writtenName } from './written-name.ts';

/**
 * @param typed the word so far, with an opening quote.
 * @param details where given, only the substances in it are offered, each with what stands there.
 */
export function substanceItems(
  form: 'names' | 'formulas',
  typed: string,
  start: number,
  details?: ReadonlyMap<string, string>,
): CompletionItem[] {
  const isQuoted = typed.startsWith("'");
  // In quotes a name may be written with blanks: `'sodium oleate'`.
  const bare = isQuoted ? typed.slice(1).replaceAll(' ', '_') : typed;
  return wordsOfCatalogue().flatMap(({ text, role, substance }) => {
    const order = ORDERS[form].indexOf(role);
    const told = details ? details.get(substance.name) : detailOf(substance, role);
    if (told === undefined) return [];
    if ((bare === '' && order !== 0) || (isQuoted && role === 'formula') || !fits(text, bare)) return [];
    const written = role === 'formula' ? text : writtenName(text);
    // Of names that begin alike the plain one comes first: `sodium` before `sodium_oleate`.
    const length = role === 'formula' ? 0 : text.length / 100;
    const rank = 100 + fitRank(text, bare) * 10 + order + (substance.stableAtReference ? 0 : 1) + length;
    return [
      {
        label: text,
        role: 'substance' as const,
        detail: told,
        insert: written,
        ...(isQuoted ? { filter: `'${typed.includes('_') ? text : text.replaceAll('_', ' ')}` } : {}),
        start,
        rank,
        subject: { kind: 'catalogue' as const, name: substance.name, phase: substance.phase },
      },
    ];
  });
}

/** The substances whose card has the property of this id, by name, each with its value. Made once an id. */
export function substancesWith(id: string): ReadonlyMap<string, string> {
  const known = propertyTexts.get(id);
  if (known) return known;
  const texts = new Map<string, string>();
  for (const substance of allSubstances()) {
    const property = cardOfSubstance(substance).properties.find((one) => one.id === id);
    if (property && !texts.has(substance.name)) texts.set(substance.name, figureText(property));
  }
  propertyTexts.set(id, texts);
  return texts;
}

const propertyTexts = new Map<string, ReadonlyMap<string, string>>();

/** The chemical elements, by symbol. */
export function elementItems(typed: string, start: number): CompletionItem[] {
  return allElements()
    .filter(({ symbol, name }) => fits(symbol, typed) || fits(name, typed))
    .map(({ symbol, name }) => ({
      label: symbol,
      role: 'element',
      detail: name,
      insert: symbol,
      start,
      rank: MAIN_ELEMENTS.includes(symbol) ? MAIN_ELEMENTS.indexOf(symbol) : 50,
    }));
}

const MAIN_ELEMENTS = ['C', 'H', 'O', 'N', 'S', 'Na', 'Cl', 'K'];

const ORDERS = {
  names: ['name', 'alias', 'formula'],
  formulas: ['formula', 'name', 'alias'],
} as const satisfies Readonly<Record<string, readonly CatalogueWord['role'][]>>;

interface CatalogueWord {
  readonly text: string;
  readonly role: 'name' | 'alias' | 'formula';
  readonly substance: Substance;
}

/** Every word that finds a substance: its names once, its formulas phase by phase. Made once. */
function wordsOfCatalogue(): readonly CatalogueWord[] {
  if (catalogueWords) return catalogueWords;
  const found = new Map<string, CatalogueWord>();
  for (const substance of allSubstances()) {
    const { name, aliases, formula } = substance;
    if (!found.has(name)) found.set(name, { text: name, role: 'name', substance });
    // An alias may be one phase's own (`steam`); the catalogue says which.
    for (const alias of aliases) {
      if (!found.has(alias))
        found.set(alias, { text: alias, role: 'alias', substance: findSubstance(alias) ?? substance });
    }
    const text = formula && formulaTextWithPhase(formula);
    if (text && !found.has(text)) found.set(text, { text, role: 'formula', substance });
  }
  catalogueWords = [...found.values()];
  return catalogueWords;
}

let catalogueWords: readonly CatalogueWord[] | undefined;

function detailOf({ name, label, formula }: Substance, role: CatalogueWord['role']): string {
  if (role === 'formula') return label;
  const text = formula ? formulaTextWithPhase(formula) : 'technical fuel or mixture';
  return role === 'alias' ? `${name}, ${text}` : text;
}
