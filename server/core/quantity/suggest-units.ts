// "Did you mean": known units near a word that is no unit. First the words people write for a unit we spell otherwise
// (`knots`, `kph`, `C`), then the units' English names, then spellings that differ in case or by a slip of the finger.
// It offers at most three and explains those where every guess would be dangerous (a `ton` is three things).
// Invariant: whatever is offered can be read by read-unit.ts, which a test checks for the whole table.

import { editDistance } from '../spelling/edit-distance.ts';
import { isUnitWord, listUnitWords } from './unit-words.ts';

/** Near spellings, best first, and a sentence where the word needs one. */
export interface UnitSuggestions {
  readonly offers: readonly string[];
  readonly why?: string;
}

const mostOffers = 3;

/** Up to three units a misspelt or foreign unit word may stand for; an empty list when nothing is near. */
export function suggestUnits(word: string): readonly string[] {
  return explainUnitWord(word).offers;
}

/**
 * `suggestUnits` with a sentence for words that are no slip but have no single meaning here. The offers carry the word's
 * power (`in3` gets `inch3`); what cannot carry one is not offered then.
 */
export function explainUnitWord(word: string, power = 1): UnitSuggestions {
  const known = findOtherSpelling(power === 1 ? word : `${word}${power}`);
  if (known) return known;
  const sure = [...byName(word), ...byCase(word)];
  const bare = findOtherSpelling(word) ?? { offers: sure.length > 0 ? sure : bySlip(word) };
  const offers = power === 1 ? bare.offers : bare.offers.filter(isUnitWord).map((offer) => raised(offer, power));
  return { ...bare, offers: [...new Set(offers)].slice(0, mostOffers) };
}

/** The words that `explainUnitWord` answers from its table: units of other papers, and no slips of the finger. */
export function listOtherSpellings(): ReadonlyMap<string, UnitSuggestions> {
  return otherSpellings;
}

const referenceState =
  'A volume of gas at a reference state is not one unit: 0, 15 or 20 °C and 1 atm or 1 bar are all in use.';
const threeTons = 'A ton is 1000 kg, 2000 lb or 2240 lb.';
const ofWhat = 'Say which: the units of this name differ.';

const otherSpellings: ReadonlyMap<string, UnitSuggestions> = new Map(
  (
    [
      ['C', ['degC', 'A s'], 'C is carbon here, not coulomb or Celsius.'],
      ['F', ['degF'], 'F is fluorine here, not farad or Fahrenheit.'],
      ['H', ['h'], 'H is hydrogen here, not henry or hour.'],
      ['S', ['s'], 'S is sulphur here, not siemens or second.'],
      ['in', ['inch'], '`in` is a word of the language.'],
      ['ton', ['t', 'short_ton', 'long_ton'], threeTons],
      ['tons', ['t', 'short_ton', 'long_ton'], threeTons],
      ['mt', ['t', 'Mt'], 'It is used for the tonne of 1000 kg.'],
      ['Mg', ['t', 'mg'], 'Mg is magnesium here.'],
      ['Nm', ['N m']],
      ['Nm3', ['m3'], referenceState],
      ['Sm3', ['m3'], referenceState],
      ['scf', ['ft3'], referenceState],
      ['month', ['d', 'week', 'year'], 'Months differ in length.'],
      ['months', ['d', 'week', 'year'], 'Months differ in length.'],
      ['at', ['atm', 'bar'], '`at` is a word of the language.'],
      ['ppt', ['ppb', '\u2030'], 'It is used both for per mille and for parts per trillion.'],
      ['ata', ['bar', 'atm'], ofWhat],
      ['bhp', ['hp', 'PS', 'kW'], ofWhat],
      ['HP', ['hp', 'PS', 'kW'], ofWhat],
      ['bara', ['bar']],
      ['psia', ['psi']],
      ['knot', ['kn']],
      ['knots', ['kn']],
      ['kts', ['kn']],
      ['kph', ['km/h']],
      ['kmh', ['km/h']],
      ['mph', ['mile/h']],
      ['mi', ['mile', 'nmi']],
      ['sec', ['s']],
      ['secs', ['s']],
      ['mins', ['min']],
      ['hr', ['h']],
      ['hrs', ['h']],
      ['yr', ['year']],
      ['yrs', ['year']],
      ['annum', ['year']],
      ['kilo', ['kg']],
      ['kilos', ['kg']],
      ['gr', ['g']],
      ['gm', ['g']],
      ['lbs', ['lb']],
      ['cc', ['cm3']],
      ['ccm', ['cm3']],
      ['sqm', ['m2']],
      ['sqft', ['ft2']],
      ['cuft', ['ft3']],
      ['cbm', ['m3']],
      ['gallon', ['gal', 'gal_imp']],
      ['gallons', ['gal', 'gal_imp']],
      ['barrel', ['bbl']],
      ['celsius', ['degC']],
      ['centigrade', ['degC']],
      ['fahrenheit', ['degF']],
      ['degk', ['K']],
      ['\u00b0k', ['K']],
      ['deg', ['degC', 'degF', 'K']],
      ['micron', ['um']],
      ['percent', ['%']],
      ['pct', ['%']],
      ['ev', ['J', 'kJ/mol']],
      ['wt', ['%']],
      ['vol', ['%']],
      ['\u20ac', ['EUR']],
      ['$', ['USD']],
      ['\u00a3', ['GBP']],
      ['dollar', ['USD']],
      ['dollars', ['USD']],
      ['therm', ['Btu', 'MMBtu']],
      ['mbtu', ['MMBtu', 'Btu'], 'M is a thousand in one tradition and a million in another.'],
    ] as const
  ).map(([word, offers, why]) => [word, why === undefined ? { offers } : { offers, why }]),
);

function findOtherSpelling(word: string): UnitSuggestions | undefined {
  return otherSpellings.get(word) ?? otherSpellings.get(word.toLowerCase());
}

function raised(word: string, power: number): string {
  return power < 0 ? `${word}^${power}` : `${word}${power}`;
}

function byName(word: string): string[] {
  const lower = word.toLowerCase();
  const found: string[] = [];
  for (const unit of new Set(listUnitWords().values())) {
    for (const name of [unit.name, unit.plural]) {
      // "joules per kilogram" is no single name, but `kilojoules` and `liters` are.
      if (name === lower || americanSpelling(name) === lower) found.push(unit.symbol);
    }
  }
  return found;
}

function americanSpelling(name: string): string {
  return name.replace(/tre(s?)$/, 'ter$1').replace(/tonne/, 'ton');
}

function byCase(word: string): string[] {
  const lower = word.toLowerCase();
  return spellings().filter((spelling) => spelling.toLowerCase() === lower);
}

/** Spellings one edit away (two for long words), those that share the first letter first. */
function bySlip(word: string): string[] {
  if (word.length < 2) return [];
  const bound = word.length >= 6 ? 2 : 1;
  const near: { spelling: string; rank: number }[] = [];
  for (const spelling of spellings()) {
    // One-letter units are near everything and help nobody.
    if (spelling.length < 2) continue;
    const distance = editDistance(word, spelling, bound);
    if (distance > bound) continue;
    near.push({
      spelling,
      rank: distance * 4 + (spelling[0] === word[0] ? 0 : 2) + (spelling.length >= word.length ? 0 : 1),
    });
  }
  return near.sort((left, right) => left.rank - right.rank).map(({ spelling }) => spelling);
}

function spellings(): string[] {
  return [...listUnitWords().keys()].filter((spelling) => !/[\u00b5\u03bc\u2103\u2109]/.test(spelling));
}
