// What the trade calls an entry or a figure that has another name here: `LHV`, net calorific value, heat of formation.
// Offers the name of this language for them, before any likeness of spelling. Knows no kinds: it is given the names that
// are known where the word stands. Invariant: whatever is offered is among those.

import { near } from './context.ts';

/** Up to three known names that may be meant: what the trade means by these words, else those nearest in spelling. */
export function nearByTrade(words: string, known: readonly string[]): readonly string[] {
  const plain = words
    .toLowerCase()
    .replace(/[-_\s]+/g, ' ')
    .trim();
  const meant = known.filter((name) => tradeNames.get(name)?.test(plain));
  return meant.length > 0 ? meant.slice(0, 3) : near(words, known);
}

const tradeNames: ReadonlyMap<string, RegExp> = new Map([
  [
    'lower heating value',
    /^(?:lhv|ncv|lcv|hu|net (?:calorific|heating) value|lower calorific value|(?:calorific|heating) value)$/,
  ],
  [
    'higher heating value',
    /^(?:hhv|gcv|hcv|ho|gross (?:calorific|heating) value|(?:higher|upper) calorific value|(?:calorific|heating) value)$/,
  ],
  ['formation enthalpy', /^(?:(?:standard )?(?:enthalpy|heat) of formation|hf)$/],
  ['molar mass', /^(?:molecular (?:weight|mass)|mol(?:ar)? weight|mw)$/],
  ['heat capacity', /^(?:specific heat(?: capacity)?|cp)$/],
  ['density', /^(?:specific gravity|rho|mass density)$/],
  ['flash point', /^flash ?(?:point|temperature)$|^flashpoint$/],
  ['stoichiometric air', /^(?:afr|air fuel ratio|stoichiometric (?:afr|air fuel ratio)|stoich(?:iometric)? air)$/],
  ['carbon factor', /^(?:cf|emission factor|co2 factor|carbon (?:emission|conversion) factor)$/],
  ['stored', /^(?:state|storage|stored at)$/],
  ['state', /^(?:temperature|pressure|at)$/],
]);
