// How a unit looks to a person: `kg/m³`, `µmol/kg`, `°C`, where the language and the JSON contract write `kg/m3`,
// `umol/kg`, `degC`. Works on the text of a unit alone and knows no factors, so it can say nothing wrong about a value.
// Invariant: the form for people is a form the language reads back as the same unit.

import { superscript } from './numbers.ts';

/** The unit as people read it (`per year` for `1/year`); the dimensionless `1` is an empty text. */
export function unitForPeople(unit: string): string {
  if (unit === '1') return '';
  return unit
    .replace(/^1\//, 'per ')
    .replace(/\bdeg([CF])\b/g, '°$1')
    .replace(/\bu(?=(?:mol|g|m|s|L|bar|atm|Pa|J|W|A|V)\b)/g, 'µ')
    .replace(/\^(-?\d+)/g, (_, power: string) => superscript(power))
    .replace(/(?<=[A-Za-z])(\d)(?![\d.])/g, (_, power: string) => superscript(power))
    .replace(/\*/g, '·');
}

/** A number's text with its unit: `44.0 MJ/kg`, `25 °C`, `1.2` for a plain number. */
export function withUnit(numberText: string, unit: string): string {
  return unit === '' ? numberText : `${numberText} ${unit}`;
}

/** A number with ± stands in brackets before a unit, so that the unit belongs to both. */
export function bracketed(numberText: string): string {
  return /±|\+\/-/.test(numberText) && !numberText.startsWith('(') ? `(${numberText})` : numberText;
}
