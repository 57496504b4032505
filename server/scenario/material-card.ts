// The card of a catalogue substance: every number the catalogue has of it, in its contract unit, each with its source and the
// condition it holds at. Works nothing out; wording turns it into text.

import { formationEnthalpyOf } from '../core/balance/formation-enthalpy.ts';
import { celsiusZeroK } from '../core/quantity/constants.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type QuantityKind } from '../core/quantity/quantity.ts';
import type { SourceRecord } from '../core/substance/record.ts';
import type { Datum, Substance } from '../core/substance/substance.ts';
import type { CardProperty, MaterialCard } from './scenario.ts';

export function cardOfSubstance(substance: Substance): MaterialCard {
  return {
    name: substance.name,
    origin: 'catalogue',
    formula: substance.formula?.text ?? null,
    phase: substance.phase,
    aliases: substance.aliases,
    properties: [...matterOf(substance), ...temperaturesOf(substance), ...rulesOf(substance)],
    hazards: substance.hazards ?? null,
  };
}

/** A source in words: author, year, title, where; and how its number is known when it was not read in the source itself. */
export function sourceText(source: SourceRecord): string {
  const year = source.year > 0 ? ` (${source.year})` : '';
  const where = source.where ? `, ${source.where}` : '';
  const known = source.provenance === 'seen' ? '' : ` [${source.provenance}]`;
  return `${source.author}${year}, ${source.title}${where}${known}`;
}

const atReference = 'at 25 °C';

function matterOf(substance: Substance): CardProperty[] {
  const { molarMassKgPerMol: molarMass, density } = substance;
  const energy = formationEnthalpyOf(substance);
  const weights = 'standard atomic weights, IUPAC 2021';
  const properties: CardProperty[] = [];
  if (molarMass !== undefined) properties.push(property('molar-mass', molarMass, 'g/mol', weights));
  if (energy.kind === 'known' && molarMass !== undefined) {
    const { value, source } = energy.jPerKg;
    properties.push(property('formation-enthalpy', value * molarMass, 'kJ/mol', sourceText(source), atReference));
  }
  if (substance.energy.kind === 'heating-value') {
    const { basis, jPerKg } = substance.energy;
    properties.push(property(`${basis}-heating-value`, jPerKg.value, 'MJ/kg', sourceText(jPerKg.source)));
  }
  properties.push(
    ...datum('entropy', substance.entropyJPerMolK, 'J/(mol K)', atReference),
    ...datum('density', density, 'kg/m3', density && `at ${celsius(density.temperatureK)}`),
    ...datum('heat-capacity', substance.heatCapacityJPerKgK, 'kJ/(kg K)', 'near 25 °C'),
  );
  return properties;
}

function temperaturesOf(substance: Substance): CardProperty[] {
  const { flammableLimits: limits, flashPointCup: cup } = substance;
  const atLimits =
    limits?.temperatureK === undefined ? 'by volume in air' : `by volume in air at ${celsius(limits.temperatureK)}`;
  return [
    ...datum('melting-point', substance.meltingPointK, 'K', ''),
    ...datum('boiling-point', substance.boilingPointK, 'K', 'at 1 atm'),
    ...datum('sublimation-point', substance.sublimationPointK, 'K', 'at 1 atm'),
    ...datum('decomposition-point', substance.decompositionPointK, 'K', ''),
    ...datum('flash-point', substance.flashPointK, 'K', cup && `${cup} cup`),
    ...datum('autoignition-temperature', substance.autoignitionK, 'K', ''),
    ...datum('lower-flammable-limit', limits?.lower, '1', atLimits),
    ...datum('upper-flammable-limit', limits?.upper, '1', atLimits),
  ];
}

/** What rules prescribe stands beside the physical values, each with the rule's own words for the fuel and its dates. */
function rulesOf(substance: Substance): CardProperty[] {
  return substance.rules.flatMap((rule) => {
    const condition = `as ${rule.fuel}; in force from ${rule.inForceFrom}, seen on ${rule.seenOn}`;
    const source = `${rule.rule}, ${rule.version}: ${sourceText(rule.source)}`;
    const numbers = [
      ['rule-lower-heating-value', rule.lowerHeatingValueJPerKg, 'MJ/kg'],
      ['rule-carbon-content', rule.carbonContentKgPerKg, 'kg/kg'],
      ['rule-carbon-factor', rule.carbonDioxideFactorKgPerKg, 'kg/kg'],
    ] as const;
    return numbers.flatMap(([id, value, unit]) =>
      value === undefined ? [] : [property(id, value, unit, source, condition)],
    );
  });
}

const labels: Readonly<Record<string, string>> = {
  'molar-mass': 'Molar mass',
  'formation-enthalpy': 'Enthalpy of formation',
  'lower-heating-value': 'Lower heating value',
  'higher-heating-value': 'Higher heating value',
  entropy: 'Entropy',
  density: 'Density',
  'heat-capacity': 'Heat capacity',
  'melting-point': 'Melting point',
  'boiling-point': 'Boiling point',
  'sublimation-point': 'Sublimation point',
  'decomposition-point': 'Decomposition',
  'flash-point': 'Flash point',
  'autoignition-temperature': 'Autoignition temperature',
  'lower-flammable-limit': 'Lower flammable limit',
  'upper-flammable-limit': 'Upper flammable limit',
  'rule-lower-heating-value': 'Lower heating value by rule',
  'rule-carbon-content': 'Carbon content by rule',
  'rule-carbon-factor': 'Carbon dioxide factor by rule',
};

function datum(id: string, known: Datum | undefined, unit: string, condition: string | undefined): CardProperty[] {
  return known ? [property(id, known.value, unit, sourceText(known.source), condition)] : [];
}

/** A value in SI as a property in its unit. */
function property(id: string, value: number, unit: string, source: string, condition = ''): CardProperty {
  const kind: QuantityKind = unit === 'K' ? 'temperature' : 'plain';
  const quantity = quantityOf(value, knownUnit(unit).dimension, undefined, kind);
  return { id, label: labels[id] ?? id, quantity, unit, source, condition };
}

function celsius(temperatureK: number): string {
  return `${Math.round((temperatureK - celsiusZeroK) * 100) / 100} °C`;
}
