// Offers the units that may stand behind a number: where the place asks for a dimension, those the trade uses first and
// then the rest of that dimension; elsewhere every unit that fits what is typed. All come from the unit table.
// Invariant: whatever is offered can be read as a unit.
import { knownUnit, tradeUnitsOf } from '../core/quantity/convert.ts';
import { sameDimension, type Dimension } from '../core/quantity/dimension.ts';
import type { QuantityKind } from '../core/quantity/quantity.ts';
import { unitCard } from '../core/quantity/read-unit.ts';
import { listUnitWords, unitWordsOf, type UnitWord } from '../core/quantity/unit-words.ts';
import { kinds } from '../scenario/kinds/registry.ts';
import { dimensionPhrase } from '../wording/quantities.ts';
import { fitRank, fits, type CompletionItem, type Documentation } from './completion-item.ts';

/** What a number at a place must measure. */
export interface Wanted {
  readonly dimension: Dimension;
  readonly kind: QuantityKind;
}

/** What a unit of ours measures; a temperature unit asks for a temperature, not a difference. */
export function wantedOf(unit: string): Wanted {
  const { dimension, scale } = knownUnit(unit);
  const isTemperature = scale === 'temperature' || (unit === 'K' && sameDimension(dimension, knownUnit('K').dimension));
  return { dimension, kind: isTemperature ? 'temperature' : 'plain' };
}

/** What `±` behind such a number takes: a step of the same dimension, or a share of it. */
export function toleranceOf({ dimension, kind }: Wanted): readonly Wanted[] {
  const step = kind === 'temperature' ? 'temperature-difference' : kind;
  return [{ dimension, kind: step }, wantedOf('%')];
}

/** The units of the wanted dimensions, in their order. With none wanted, all that fit `typed`. */
export function unitItems(wanted: readonly Wanted[], typed: string, start: number): CompletionItem[] {
  const texts = wanted.length > 0 ? wanted.flatMap(unitsOf) : [...FIRST, ...commonUnits(), ...allWords(typed === '')];
  const list = [...new Set(texts)].filter((text) => fits(text, typed));
  // Where anything may stand, what is typed says most: `kW` before `kWh/kg`.
  if (wanted.length === 0 && typed !== '') {
    list.sort((left, right) => fitRank(left, typed) - fitRank(right, typed) || left.length - right.length);
  }
  return list.map((text, rank) => ({
    label: text,
    role: 'unit',
    detail: unitName(text),
    insert: text,
    start,
    rank,
    ...documented(text),
  }));
}

function unitsOf({ dimension, kind }: Wanted): string[] {
  const words = unitWordsOf(dimension).filter(({ scale }) => kind === 'temperature' || scale !== 'temperature');
  const isGauge = kind === 'gauge-pressure';
  return [
    ...tradeUnitsOf(dimension, kind),
    ...words.filter(({ scale }) => (scale === 'gauge-pressure') === isGauge).map(({ symbol }) => symbol),
  ];
}

/** The units figures are given in, with their neighbours: what an engineer writes most. */
function commonUnits(): readonly string[] {
  common ??= [
    ...new Set(
      kinds
        .flatMap(({ evaluated }) => evaluated?.figures.map(({ unit }) => unit) ?? [])
        .flatMap((unit) => (unit === '1' ? ['%'] : tradeUnitsOf(knownUnit(unit).dimension))),
    ),
  ];
  return common;
}

function allWords(withoutPrefixes: boolean): readonly string[] {
  words ??= [...new Set(listUnitWords().values())];
  return words.filter(({ prefix }) => prefix === '' || !withoutPrefixes).map(({ symbol }) => symbol);
}

/** Of those without a wanted dimension, what an engineer writes most stands first. */
const FIRST = ['%', 'kg', 't', 'm3', 'kW', 'MW', 'MJ/kg', 'degC', 'bar', 'h', 'nmi', 'kn'];

let common: readonly string[] | undefined;
let words: readonly UnitWord[] | undefined;

function unitName(text: string): string {
  return unitCard(text)?.name ?? dimensionPhrase({ dimension: knownUnit(text).dimension, kind: 'plain' });
}

function documented(text: string): { documentation?: Documentation } {
  const card = unitCard(text);
  if (!card) return {};
  const { symbol, name, definition, source } = card;
  return {
    documentation: { title: `${symbol}: ${name}`, origin: definition, lines: [{ label: 'Source', text: source }] },
  };
}
