// `substance`: a new pure or technical substance. Its composition or formula, and either an enthalpy of formation or a
// heating value (from which the enthalpy of formation is worked back on the substance's own product slate), make it a
// material like any of the catalogue's.

import type { Definition } from '../../../grammar/tree.ts';
import { formationEnthalpyBehind } from '../../core/balance/heating-value.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { dimensionless, sameDimension } from '../../core/quantity/dimension.ts';
import { combineParts, noParts } from '../../core/quantity/parts.ts';
import { isFault, multiply, divide, quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate } from '../../core/quantity/uncertainty.ts';
import { referenceTemperatureK, type HeatCapacity } from '../../core/substance/substance.ts';
import type { SourceRecord } from '../../core/substance/record.ts';
import { molPerKgOfFormula } from '../../core/substance/composition.ts';
import { formulaTextWithPhase, molarMassKgPerMol, type Formula } from '../../core/substance/formula.ts';
import type { Context } from '../context.ts';
import { checkHeatingValue } from '../heating-value-check.ts';
import { readEntries, refuseLines, type EntriesRead } from '../entries.ts';
import { hazardsSaid } from '../hazards-reader.ts';
import { givenFigureRows, givenFigures } from '../given-figures.ts';
import type { Material, MissingProperty } from '../material.ts';
import { answerMaterial, materialFigures, slateGaps } from '../material-figures.ts';
import type { CardProperty, Figure } from '../scenario.ts';
import type { AssumptionId } from '../working.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';
import { substanceEntries } from './substance-entries.ts';

type Entries = EntriesRead<typeof substanceEntries>;

const evaluated: EvaluatedKind = {
  entries: substanceEntries,
  lines: [],
  figures: [...materialFigures, ...givenFigureRows],
  evaluate,
};

export const substance: Kind = {
  kind: 'substance',
  help: 'A pure or technical substance: what it is made of, its energy and its properties.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, substanceEntries, context);
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
  if (decisive.some((key) => broken.has(key as keyof typeof substanceEntries))) return unknownAnswer(evaluated);
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
  reportHeatingValues(read, answer.figures, context);
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
  ] as const;
  for (const [first, second, what] of pairs) {
    if (!first || !second) continue;
    context.report(second.entry.wordsSpan, {
      code: 'balance/contradiction',
      what,
      first: first.entry.words,
      second: second.entry.words,
      compared: null,
    });
  }
}

/** A certificate gives both heating values: fine as long as they differ by what the hydrogen makes of them. */
function reportHeatingValues(read: Entries, figures: readonly Figure[], context: Context): void {
  const { lowerHeatingValue: lower, higherHeatingValue: higher } = read;
  const worked = figures.find(({ id }) => id === 'higher-heating-value')?.quantity;
  if (!lower || !higher || !worked || read.formationEnthalpy) return;
  const written = higher.value.quantity;
  if (Math.abs(worked.value / written.value - 1) <= agreementOfHeatingValues) return;
  context.report(higher.entry.wordsSpan, {
    code: 'balance/contradiction',
    what: 'its energy',
    first: lower.entry.words,
    second: higher.entry.words,
    compared: { written, worked, unit: 'MJ/kg' },
  });
}

/** Reproducibility of a bomb calorimeter between laboratories is about half a per cent (common practice), on either value. */
const agreementOfHeatingValues = 0.01;

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
    ...heatCapacityPartsOf(read),
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
      hazards: read.hazards ? hazardsSaid(read.hazards.value, sourceSaid(read)) : null,
    },
    missing,
  };
}

/** One written number is good at its own temperature; elsewhere it is taken as constant, and said to be. */
function heatCapacityPartsOf(read: Entries): Pick<Material, 'heatCapacityParts'> {
  const quantity = read.heatCapacity?.value.quantity;
  if (!quantity || quantity.parts.size === 0) return {};
  return { heatCapacityParts: combineParts(quantity.parts, 1 / quantity.value, noParts, 0) };
}

function heatCapacityOf(read: Entries): HeatCapacity | null {
  if (!read.heatCapacity) return null;
  const { quantity, at } = read.heatCapacity.value;
  const atK = at?.value ?? referenceTemperatureK;
  return { terms: [{ power: 0, jPerKgK: quantity.value }], fromK: atK, toK: atK, source: sourceSaid(read) };
}

/** The definition's own word for where its numbers come from. */
function sourceSaid(read: Entries): SourceRecord {
  return { id: '', author: 'this scenario', year: 0, title: read.source?.value ?? '', where: '', provenance: 'seen' };
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
