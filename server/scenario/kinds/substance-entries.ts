// The entries of a `substance`, one row each: what it is made of, its energy, its properties, where its numbers come from.
// Readers and help only; what follows from them is in substance.ts.

import { knownUnit } from '../../core/quantity/convert.ts';
import { sameDimension } from '../../core/quantity/dimension.ts';
import type { Quantity } from '../../core/quantity/quantity.ts';
import { compositionReader } from '../composition.ts';
import type { EntryRow, Reader } from '../entries.ts';
import { evaluateExpression } from '../expressions.ts';
import { hazardsReader } from '../hazards-reader.ts';
import {
  carbonOriginReader,
  formulaReader,
  formulasReader,
  quantityReader,
  refuse,
  textReader,
  wordReader,
} from '../readers.ts';

const row = <T>(name: string, reader: Reader<T>, help: string, more: Partial<EntryRow<T>> = {}): EntryRow<T> => ({
  name,
  reader,
  help,
  ...more,
});

/** An enthalpy of formation may be given per mole or per kilogram. */
const formationEnthalpyReader: Reader<Quantity> = {
  takes: 'a molar or specific energy, such as `-285.8 kJ/mol`',
  unit: 'kJ/mol',
  otherUnits: ['MJ/kg'],
  read(entry, context) {
    const [phrase, second] = entry.phrases;
    const [item, ...rest] = phrase?.items ?? [];
    if (!phrase || !item) return undefined;
    const isOne = !second && rest.length === 0 && item.kind !== 'connective';
    if (!isOne) return refuse(entry, second ?? phrase, formationEnthalpyReader.takes, context);
    const quantity = evaluateExpression(item, context);
    if (!quantity) return undefined;
    const units = [knownUnit('kJ/mol'), knownUnit('MJ/kg')];
    if (units.some((unit) => sameDimension(unit.dimension, quantity.dimension))) return quantity;
    const found = { text: context.written(item.span), dimension: quantity.dimension, kind: quantity.kind };
    const needed = { dimension: knownUnit('kJ/mol').dimension, kind: 'plain' } as const;
    context.report(item.span, { code: 'unit/mismatch', form: 'place', found, needed, example: 'kJ/mol' });
    return undefined;
  },
};

export const substanceEntries = {
  formula: row('formula', formulaReader, 'The chemical formula of a pure substance. Give this or a composition.'),
  composition: row(
    'composition',
    compositionReader,
    'The elements of a technical substance, by mass unless `mole` is written, adding up to 100 %.',
  ),
  phase: row('phase', wordReader(['gas', 'liquid', 'solid']), 'The phase it is in at 25 °C and 1 bar.', {
    default: { text: 'liquid', source: 'convention of this program' },
  }),
  molarMass: row(
    'molar mass',
    quantityReader('g/mol', 'a molar mass, such as `226 g/mol`', { range: 'positive' }),
    'The mean molar mass of a technical substance. A formula has its own.',
  ),
  formationEnthalpy: row(
    'formation enthalpy',
    formationEnthalpyReader,
    'The enthalpy of formation from the elements at 25 °C. Give this or a heating value.',
  ),
  lowerHeatingValue: row(
    'lower heating value',
    quantityReader('MJ/kg', 'a specific energy, such as `42.7 MJ/kg`'),
    'The heat of complete combustion at 25 °C with the water left as vapour, per kg.',
  ),
  higherHeatingValue: row(
    'higher heating value',
    quantityReader('MJ/kg', 'a specific energy, such as `45.6 MJ/kg`'),
    'The heat of complete combustion at 25 °C with the water condensed, per kg.',
  ),
  products: row(
    'products',
    formulasReader,
    'The products its heating value was measured to, where they differ from the rule (carbonate first, then hydroxide, then oxide).',
  ),
  density: row(
    'density',
    quantityReader('kg/m3', 'a density, such as `845 kg/m3 at 15 degC`', { range: 'positive', at: true }),
    'The density, with the temperature it holds at.',
    { default: { text: 'at 15 °C when no temperature is given', source: 'common practice for marine fuels' } },
  ),
  heatCapacity: row(
    'heat capacity',
    quantityReader('kJ/(kg K)', 'a specific heat capacity, such as `2.1 kJ/(kg K)`', { range: 'positive', at: true }),
    'The specific heat capacity at constant pressure.',
  ),
  entropy: row(
    'entropy',
    quantityReader('J/(mol K)', 'a molar entropy, such as `126.8 J/(mol K)`', { range: 'positive' }),
    'The absolute entropy at 25 °C and 1 bar; reactions need it for their Gibbs energy.',
  ),
  meltingPoint: row(
    'melting point',
    quantityReader('degC', 'a temperature, such as `97.8 degC`', { temperature: true }),
    'The melting point at 1 atm.',
  ),
  boilingPoint: row(
    'boiling point',
    quantityReader('degC', 'a temperature, such as `64.7 degC`', { temperature: true }),
    'The boiling point at 1 atm.',
  ),
  autoignitionTemperature: row(
    'autoignition temperature',
    quantityReader('degC', 'a temperature, such as `220 degC`', { temperature: true }),
    'The lowest temperature at which it takes fire in air by itself.',
  ),
  lowerFlammableLimit: row(
    'lower flammable limit',
    quantityReader('%', 'a share by volume, such as `5 %`', { range: 'share' }),
    'The least share of its vapour in air, by volume, that a flame passes through.',
  ),
  upperFlammableLimit: row(
    'upper flammable limit',
    quantityReader('%', 'a share by volume, such as `15 %`', { range: 'share' }),
    'The largest share of its vapour in air, by volume, that a flame passes through.',
  ),
  flashPoint: row(
    'flash point',
    quantityReader('degC', 'a temperature, such as `61 degC`', { temperature: true }),
    'The closed-cup flash point.',
  ),
  carbonOrigin: row(
    'carbon origin',
    carbonOriginReader,
    'Where its carbon comes from: biogenic carbon was taken from the air lately, fossil carbon was not.',
    { default: { text: 'fossil', source: 'convention of this program: nothing is credited unasked' } },
  ),
  hazards: row(
    'hazards',
    hazardsReader,
    'Its dangers by GHS statement code, its UN number, and what it reacts as; what is not written is not known, which does not make it harmless.',
  ),
  source: row('source', textReader('a text in quotes'), 'Where these numbers come from; shown wherever they are used.'),
};
