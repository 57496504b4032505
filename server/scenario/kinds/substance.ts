// `substance`: a new pure or technical substance. Its composition or formula, and either an enthalpy of formation or a
// heating value (from which the enthalpy of formation is worked back on the substance's own product slate), make it a
// material like any of the catalogue's.

import type { Definition } from '../../../grammar/tree.ts';
import { formationEnthalpyBehind } from '../../core/balance/heating-value.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { dimensionless, sameDimension } from '../../core/quantity/dimension.ts';
import { noParts } from '../../core/quantity/parts.ts';
import { isFault, multiply, divide, quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate } from '../../core/quantity/uncertainty.ts';
import { referenceTemperatureK, type HeatCapacity } from '../../core/substance/substance.ts';
import { molPerKgOfFormula } from '../../core/substance/composition.ts';
import { formulaTextWithPhase, molarMassKgPerMol, type Formula } from '../../core/substance/formula.ts';
import { compositionReader } from '../composition.ts';
import type { Context } from '../context.ts';
import { checkHeatingValue } from '../heating-value-check.ts';
import { readEntries, refuseLines, type EntriesRead, type EntryRow, type Reader } from '../entries.ts';
import { evaluateExpression } from '../expressions.ts';
import { givenFigureRows, givenFigures } from '../given-figures.ts';
import type { Material, MissingProperty } from '../material.ts';
import { answerMaterial, materialFigures, slateGaps } from '../material-figures.ts';
import {
  carbonOriginReader,
  formulaReader,
  formulasReader,
  quantityReader,
  refuse,
  textReader,
  wordReader,
} from '../readers.ts';
import type { CardProperty } from '../scenario.ts';
import type { AssumptionId } from '../working.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

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

const entries = {
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
  source: row('source', textReader('a text in quotes'), 'Where these numbers come from; shown wherever they are used.'),
};

type Entries = EntriesRead<typeof entries>;

const evaluated: EvaluatedKind = { entries, lines: [], figures: [...materialFigures, ...givenFigureRows], evaluate };

export const substance: Kind = {
  kind: 'substance',
  help: 'A pure or technical substance: what it is made of, its energy and its properties.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, entries, context);
  refuseLines(definition, [], context);
  const header = definition.name?.span ?? definition.header;
  const decisive = [
    'formula',
    'composition',
    'formationEnthalpy',
    'lowerHeatingValue',
    'higherHeatingValue',
    'products',
  ];
  if (decisive.some((key) => broken.has(key as keyof typeof entries))) return unknownAnswer(evaluated);
  if (!read.formula && !read.composition) {
    const name = definition.name?.text ?? '';
    context.report(header, {
      code: 'name/missing-entry',
      kind: 'substance',
      name,
      entries: ['formula', 'composition'],
    });
    return unknownAnswer(evaluated);
  }
  reportContradictions(read, context);
  const material = materialOf(read, definition.name?.text ?? '', header, context);
  if (!material) return unknownAnswer(evaluated);
  const answer = answerMaterial(material);
  const figures = [...answer.figures, ...givenFigures(material.card)];
  return { ...answer, figures, lines: [], material };
}

const phaseSymbols = { gas: 'g', liquid: 'l', solid: 'cr' } as const;

/** Two entries that say the same thing in different ways: the first rules, the second is named. */
function reportContradictions(read: Entries, context: Context): void {
  const pairs = [
    [read.formula, read.composition, 'what it is made of'],
    [read.formula, read.molarMass, 'its molar mass'],
    [read.formationEnthalpy, read.lowerHeatingValue ?? read.higherHeatingValue, 'its energy'],
    [read.lowerHeatingValue, read.higherHeatingValue, 'its energy'],
  ] as const;
  for (const [first, second, what] of pairs) {
    if (!first || !second) continue;
    context.report(second.entry.wordsSpan, {
      code: 'balance/contradiction',
      what,
      first: first.entry.words,
      second: second.entry.words,
    });
  }
}

function materialOf(
  read: Entries,
  name: string,
  header: { start: number; end: number },
  context: Context,
): Material | null {
  const formula = read.formula?.value ?? null;
  const composition = read.composition?.value;
  const elements = formula ? elementsOfFormula(formula) : (composition?.elements ?? new Map<string, Quantity>());
  const assumptions: AssumptionId[] = [];
  if (!formula && composition?.scaled) assumptions.push('shares-scaled');
  if (!read.carbonOrigin && (elements.get('C')?.value ?? 0) > 0) assumptions.push('fossil-by-default');
  const ownMolarMass = formula && molarMassKgPerMol(formula);
  const molarMass = ownMolarMass
    ? quantityOf(ownMolarMass, knownUnit('kg/mol').dimension)
    : (read.molarMass?.value.quantity ?? null);
  const formationEnthalpy = enthalpyOf(read, elements, molarMass, header, context);
  if (formationEnthalpy === undefined) return null;
  const density = read.density?.value.quantity ?? null;
  const missing = new Map<MissingProperty, readonly string[]>();
  if (!formationEnthalpy) missing.set('formationEnthalpy', [name]);
  if (!density) missing.set('density', [name]);
  if (!molarMass) missing.set('molarMass', [name]);
  const phase = phaseSymbols[read.phase?.value ?? 'liquid'];
  return {
    name,
    origin: 'scenario',
    formula,
    phase,
    species: formula && new Map([[formulaTextWithPhase({ ...formula, phase }), 1]]),
    elements,
    molarMass,
    formationEnthalpy,
    entropy: read.entropy?.value.quantity ?? null,
    energyFrom: read.formationEnthalpy ? 'formation-enthalpy' : 'heating-value',
    heatCapacity: heatCapacityOf(read),
    density,
    meltingPoint: read.meltingPoint?.value.quantity ?? null,
    boilingPoint: read.boilingPoint?.value.quantity ?? null,
    biogenicShare: read.carbonOrigin?.value ?? quantityOf(0, dimensionless),
    products: read.products?.value ?? null,
    portions: null,
    assumptions,
    sources: read.source ? [read.source.value] : [],
    card: {
      name,
      origin: 'scenario',
      formula: formula?.text ?? null,
      phase,
      aliases: [],
      properties: cardProperties(read, molarMass),
    },
    missing,
  };
}

/** One written number is good at its own temperature; elsewhere it is taken as constant, and said to be. */
function heatCapacityOf(read: Entries): HeatCapacity | null {
  if (!read.heatCapacity) return null;
  const { quantity, at } = read.heatCapacity.value;
  const atK = at?.value ?? referenceTemperatureK;
  const source = {
    id: '',
    author: '',
    year: 0,
    title: read.source?.value ?? '',
    where: '',
    provenance: 'seen',
  } as const;
  return { terms: [{ power: 0, jPerKgK: quantity.value }], fromK: atK, toK: atK, source };
}

/** J/kg; null when nothing says it, undefined when it cannot be worked out (said). */
function enthalpyOf(
  read: Entries,
  elements: ReadonlyMap<string, Quantity>,
  molarMass: Quantity | null,
  header: { start: number; end: number },
  context: Context,
): Quantity | null | undefined {
  const given = read.formationEnthalpy;
  if (given) {
    if (sameDimension(given.value.dimension, knownUnit('J/kg').dimension)) return given.value;
    const perKg = molarMass && divide(given.value, molarMass);
    if (perKg && !isFault(perKg)) return perKg;
    context.report(given.entry.span, { code: 'balance/no-density', substance: context.owner, why: 'molar-mass' });
    return undefined;
  }
  const heat = read.lowerHeatingValue ?? read.higherHeatingValue;
  if (!heat) return null;
  const basis = read.lowerHeatingValue ? 'lower' : 'higher';
  checkHeatingValue(heat.entry, heat.value.quantity, basis, context);
  const choice = read.products ? { products: read.products.value } : 'as-ruled';
  const symbols = [...elements.keys()];
  const behind = (value: number, amounts: readonly number[]) =>
    formationEnthalpyBehind(
      new Map(symbols.map((symbol, index) => [symbol, amounts[index] ?? 0])),
      basis,
      value,
      choice,
    );
  const answer = behind(
    heat.value.quantity.value,
    [...elements.values()].map((amount) => amount.value),
  );
  if (answer.kind === 'fault') {
    context.report(header, { code: 'balance/no-data', what: heat.entry.words, missing: slateGaps(answer) });
    return undefined;
  }
  const [outcome] = propagate([heat.value.quantity, ...elements.values()], ([value = NaN, ...amounts]) => {
    const moved = behind(value, amounts);
    return [moved.kind === 'fault' ? NaN : moved.jPerKg];
  });
  return quantityOf(answer.jPerKg, knownUnit('J/kg').dimension, outcome?.parts ?? noParts);
}

function elementsOfFormula(formula: Formula): ReadonlyMap<string, Quantity> {
  const { dimension } = knownUnit('mol/kg');
  const molPerKg = molPerKgOfFormula(formula) ?? new Map<string, number>();
  return new Map([...molPerKg].map(([symbol, mol]) => [symbol, quantityOf(mol, dimension)]));
}

function cardProperties(read: Entries, molarMass: Quantity | null): readonly CardProperty[] {
  const source = read.source?.value ?? 'this scenario';
  const properties: CardProperty[] = [];
  const add = (
    id: string,
    label: string,
    quantity: Quantity | null | undefined,
    unit: string,
    condition = '',
  ): void => {
    if (quantity) properties.push({ id, label, quantity, unit, source, condition });
  };
  add('molar-mass', 'Molar mass', molarMass, 'g/mol');
  const enthalpy = read.formationEnthalpy?.value;
  const isMolar = enthalpy && sameDimension(enthalpy.dimension, knownUnit('J/mol').dimension);
  const molar = enthalpy && molarMass && !isMolar ? multiply(enthalpy, molarMass) : enthalpy;
  if (molar && !isFault(molar) && sameDimension(molar.dimension, knownUnit('J/mol').dimension)) {
    add('formation-enthalpy', 'Enthalpy of formation', molar, 'kJ/mol', 'at 25 °C');
  }
  add('lower-heating-value', 'Lower heating value', read.lowerHeatingValue?.value.quantity, 'MJ/kg');
  add('higher-heating-value', 'Higher heating value', read.higherHeatingValue?.value.quantity, 'MJ/kg');
  add('density', 'Density', read.density?.value.quantity, 'kg/m3', atCelsius(read.density?.value.at));
  add(
    'heat-capacity',
    'Heat capacity',
    read.heatCapacity?.value.quantity,
    'kJ/(kg K)',
    atCelsius(read.heatCapacity?.value.at),
  );
  add('entropy', 'Entropy', read.entropy?.value.quantity, 'J/(mol K)', 'at 25 °C');
  add('melting-point', 'Melting point', read.meltingPoint?.value.quantity, 'K');
  add('boiling-point', 'Boiling point', read.boilingPoint?.value.quantity, 'K', 'at 1 atm');
  add('flash-point', 'Flash point', read.flashPoint?.value.quantity, 'K');
  add('autoignition-temperature', 'Autoignition temperature', read.autoignitionTemperature?.value.quantity, 'K');
  add(
    'lower-flammable-limit',
    'Lower flammable limit',
    read.lowerFlammableLimit?.value.quantity,
    '1',
    'by volume in air',
  );
  add(
    'upper-flammable-limit',
    'Upper flammable limit',
    read.upperFlammableLimit?.value.quantity,
    '1',
    'by volume in air',
  );
  return properties;
}

function atCelsius(temperature: Quantity | null | undefined): string {
  return temperature ? `at ${Number((temperature.value - celsiusZeroK).toPrecision(6))} °C` : '';
}
