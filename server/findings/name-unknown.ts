/**
 * A name stands for nothing: no definition, value or catalogue substance is called so, or the definition it is looked
 * for in has no such figure or portion. Names are case-sensitive; a name with spaces or capitals is quoted with `'…'`.
 * The nearest spellings are offered.
 */
import { didYouMean, listed, quoted, sentences } from '../wording/words.ts';
import { nameReplacements, replacements, type FactOf, type Rule, type Site } from './rule.ts';

type Unknown = FactOf<'name/unknown'>;

export const nameUnknown: Rule<Unknown> = {
  severity: 'error',
  message: (fact) => {
    const near = fact.near.map((name) => spoken(fact, name));
    return sentences(said(fact), near.length > 0 ? didYouMean(near) : nextStep(fact));
  },
  fixes: (fact, site) => mends(fact, site),
};

function said({ what, word, owner }: Unknown): string {
  const name = quoted(word);
  switch (what) {
    case 'substance':
      return `Neither the catalogue nor this scenario has a substance or blend called ${name}.`;
    case 'definition':
      return `Nothing in this scenario is called ${name}.`;
    case 'figure':
      return owner === undefined
        ? `There is no figure called ${name}.`
        : `${quoted(owner)} has no figure called ${name}.`;
    case 'value':
      return `No value is called ${name}.`;
    case 'function':
      return `There is no function called ${name}.`;
    case 'element':
      return `${name} is not the symbol of a chemical element.`;
    case 'portion':
      return owner === undefined ? `${name} is not a portion here.` : `${name} is not a portion of ${quoted(owner)}.`;
    case 'code':
      return `No finding has the code ${name}.`;
    case 'word':
      return owner === undefined
        ? `${name} is not a word that can stand here.`
        : `${quoted(owner)} does not take the word ${name}.`;
  }
}

function nextStep({ what, word, allowed }: Unknown): string {
  if (allowed && allowed.length > 0) return `It can be ${listed(allowed.map(quoted), 'or')}.`;
  switch (what) {
    case 'substance':
      return `Define it with \`substance ${/^[a-z][a-z0-9_]*$/.test(word) ? word : `'${word}'`} { … }\`, or look for another name in the catalogue.`;
    case 'definition':
      return 'Define it here, or `use` the file that does.';
    case 'value':
      return 'Give it one with `let`, or correct the name.';
    default:
      return '';
  }
}

/** Figures are known by ids with hyphens and written with spaces. */
function spoken({ what }: Unknown, name: string): string {
  return what === 'figure' ? name.replaceAll('-', ' ') : name;
}

function mends(fact: Unknown, site: Site): ReturnType<typeof replacements> {
  const near = fact.near.map((name) => spoken(fact, name));
  const isName =
    fact.what === 'substance' || fact.what === 'definition' || fact.what === 'portion' || fact.what === 'value';
  return isName ? nameReplacements(site, near) : replacements(site, near);
}
