// `blend`: portions of substances and other blends, by mass, amount or volume, with at most one `rest`. What it is as a
// material follows from its portions; its figures are those of any material (material-figures.ts), beside the table of
// its portions' shares on every basis.

import type { Definition, Portion } from '../../../grammar/tree.ts';
import type { EnergyFault } from '../../core/balance/formation-enthalpy.ts';
import type { GivenProductsFault } from '../../core/balance/given-products.ts';
import { massSharesOf, sharesOn, type MixturePart } from '../../core/balance/mixture.ts';
import { mixProperties, type PartProperties } from '../../core/balance/mixture-properties.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { dimensionless } from '../../core/quantity/dimension.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { noParts } from '../../core/quantity/parts.ts';
import { propagate, type Propagated } from '../../core/quantity/uncertainty.ts';
import { alkaliMetals } from '../../core/substance/elements.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import type { Material, MissingProperty, PortionShare } from '../material.ts';
import { answerMaterial, materialFigures, type MaterialAnswer } from '../material-figures.ts';
import { materialNamed } from '../materials.ts';
import { readAmount, reportMixtureFault, type WrittenAmount } from '../portions.ts';
import { formulasReader, materialReader, stateReader } from '../readers.ts';
import type { LineResult, Table } from '../scenario.ts';
import type { AssumptionId } from '../working.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

const entries = {
  stored: {
    name: 'stored',
    reader: stateReader,
    help: 'The temperature and pressure it is kept at.',
    default: { text: '25 °C, 1 bar', source: 'convention of this program' },
  },
  blanket: {
    name: 'blanket',
    reader: materialReader,
    help: 'The gas over it in its tank.',
    default: { text: 'air', source: 'the cautious case' },
  },
  products: {
    name: 'products',
    reader: formulasReader,
    help: 'The products its heating values are counted to, in place of the rule (carbonate first, then hydroxide, then oxide).',
  },
};

const evaluated: EvaluatedKind = { entries, lines: ['portion'], figures: materialFigures, evaluate };

export const blend: Kind = {
  kind: 'blend',
  help: 'A mixture of substances and other blends, by mass, amount or volume.',
  evaluated,
};

/** A portion whose amount and substance could both be read. */
interface Part {
  readonly line: number;
  readonly material: Material;
  readonly amount: WrittenAmount;
}

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, entries, context);
  refuseLines(definition, ['portion'], context);
  const name = definition.name?.text ?? '';
  const header = definition.name?.span ?? definition.header;
  const parts = readParts(definition, context);
  const isBroken = definition.lines.some((line) => line.kind === 'broken-line') || broken.has('products');
  if (!parts || (isBroken && parts.length === 0)) return unknownAnswer(evaluated);

  const inputs = inputsOf(parts);
  const centre = massSharesOf(
    mixtureParts(
      parts,
      inputs.map((input) => input.value),
    ),
  );
  if ('fault' in centre) {
    // A line that could not be read may be the very portion that is missing: its own finding says enough.
    const named = parts.map((part) => ({ name: part.material.name, amount: part.amount }));
    if (!isBroken) reportMixtureFault(centre, named, name, header, context);
    return unknownAnswer(evaluated);
  }
  if (isBroken) return unknownAnswer(evaluated);

  const mixed = mix(parts, inputs, centre.massShares);
  const material = materialOf(parts, mixed, centre.scaled, name, read.products?.value ?? null);
  const answer = answerMaterial(material);
  if (answer.fault && read.products && isOfProducts(answer.fault)) {
    context.report(read.products.entry.span, { code: 'balance/products', fault: answer.fault });
  }
  reportMissingWater(answer, material, header, context);
  const energy = energyShares(parts, mixed);
  return {
    figures: answer.figures,
    tables: [portionsTable(mixed.shares, energy), ...answer.tables],
    absent: answer.absent,
    lines: lineResults(parts, mixed.shares, energy),
    material,
  };
}

/** The portions in order; null when one could not be read (said). */
function readParts(definition: Definition, context: Context): readonly Part[] | null {
  const parts: Part[] = [];
  let isComplete = true;
  let ordinal = 0;
  for (const [line, portion] of definition.lines.entries()) {
    if (portion.kind !== 'portion') continue;
    context.startLine(`portion ${ordinal++}`);
    const part = readPart(portion, line, context);
    if (part) parts.push(part);
    else isComplete = false;
  }
  return isComplete ? parts : null;
}

function readPart(portion: Portion, line: number, context: Context): Part | null {
  const amount: WrittenAmount | null =
    portion.amount.kind === 'rest'
      ? { kind: 'rest', span: portion.amount.span }
      : readAmount(portion.amount, portion.basis?.basis, context);
  const material = portion.substance ? materialNamed(portion.substance, context) : null;
  return amount && material ? { line, material, amount } : null;
}

/** Everything a blend rests on as one list of uncertain numbers: amounts first, then five and the elements of each part. */
function inputsOf(parts: readonly Part[]): readonly Quantity[] {
  const unknown = quantityOf(NaN);
  return [
    ...parts.map(({ amount }) => (amount.kind === 'rest' ? quantityOf(0) : amount.quantity)),
    ...parts.flatMap(({ material }) => [
      material.formationEnthalpy ?? unknown,
      material.molarMass ?? unknown,
      material.density ?? unknown,
      material.biogenicShare,
      ...material.elements.values(),
    ]),
  ];
}

/** The parts with the numbers of one evaluation, in the order of `inputsOf`. */
function numbersOf(parts: readonly Part[], values: readonly number[]): PartProperties[] {
  let next = parts.length;
  const take = (): number | null => {
    const value = values[next++] ?? NaN;
    return Number.isNaN(value) ? null : value;
  };
  return parts.map(({ material }) => ({
    enthalpyJPerKg: take(),
    molarMassKgPerMol: take(),
    densityKgPerM3: take(),
    biogenicShare: take() ?? 0,
    molPerKg: new Map([...material.elements.keys()].map((symbol) => [symbol, take() ?? 0])),
  }));
}

function mixtureParts(parts: readonly Part[], values: readonly number[]): MixturePart[] {
  const numbers = numbersOf(parts, values);
  return parts.map(({ amount }, index) => ({
    amount:
      amount.kind === 'rest' ? { kind: 'rest' } : { kind: amount.kind, basis: amount.basis, value: values[index] ?? 0 },
    molarMassKgPerMol: numbers[index]?.molarMassKgPerMol ?? null,
    densityKgPerM3: numbers[index]?.densityKgPerM3 ?? null,
  }));
}

interface Mixed {
  readonly shares: readonly PortionShare[];
  readonly elements: ReadonlyMap<string, Quantity>;
  readonly formationEnthalpy: Quantity | null;
  readonly molarMass: Quantity | null;
  readonly density: Quantity | null;
  readonly biogenicShare: Quantity;
}

/** Shares and properties with their uncertainty. */
function mix(parts: readonly Part[], inputs: readonly Quantity[], centre: readonly number[]): Mixed {
  const symbols = [...new Set(parts.flatMap(({ material }) => [...material.elements.keys()]))];
  const outcomes = propagate(inputs, (values) => {
    const moved = massSharesOf(mixtureParts(parts, values));
    // Moved by its uncertainty a share may leave its range; the slope from the other side then serves.
    if ('fault' in moved && values.some((value, index) => value !== inputs[index]?.value)) return [];
    const massShares = 'fault' in moved ? centre : moved.massShares;
    const mixture = mixtureParts(parts, values);
    const properties = mixProperties(massShares, numbersOf(parts, values));
    const mole = sharesOn('mole', massShares, mixture);
    const volume = sharesOn('volume', massShares, mixture);
    return [
      properties.enthalpyJPerKg ?? NaN,
      properties.molarMassKgPerMol ?? NaN,
      properties.densityKgPerM3 ?? NaN,
      properties.biogenicShare,
      ...symbols.map((symbol) => properties.molPerKg.get(symbol) ?? 0),
      ...parts.flatMap((_, index) => [massShares[index] ?? 0, mole?.[index] ?? NaN, volume?.[index] ?? NaN]),
    ];
  });
  const known = (outcome: Propagated | undefined, unit: string): Quantity | null =>
    outcome && Number.isFinite(outcome.value)
      ? quantityOf(outcome.value, knownUnit(unit).dimension, outcome.parts ?? noParts)
      : null;
  const [enthalpy, molarMass, density, biogenic, ...others] = outcomes;
  const elementOutcomes = others.slice(0, symbols.length);
  const shareOutcomes = others.slice(symbols.length);
  return {
    formationEnthalpy: known(enthalpy, 'J/kg'),
    molarMass: known(molarMass, 'kg/mol'),
    density: known(density, 'kg/m3'),
    biogenicShare: known(biogenic, '1') ?? quantityOf(0),
    elements: new Map(
      symbols.map((symbol, index) => [
        symbol,
        known(elementOutcomes[index], 'mol/kg') ?? quantityOf(0, knownUnit('mol/kg').dimension),
      ]),
    ),
    shares: parts.map(({ material }, index) => ({
      name: material.name,
      mass: known(shareOutcomes[3 * index], '1') ?? quantityOf(centre[index] ?? 0, dimensionless),
      mole: known(shareOutcomes[3 * index + 1], '1'),
      volume: known(shareOutcomes[3 * index + 2], '1'),
    })),
  };
}

function materialOf(
  parts: readonly Part[],
  mixed: Mixed,
  scaled: boolean,
  name: string,
  products: Material['products'],
): Material {
  const missing = new Map<MissingProperty, readonly string[]>();
  for (const property of ['formationEnthalpy', 'density', 'molarMass'] as const) {
    if (mixed[property]) continue;
    missing.set(property, [...new Set(parts.flatMap(({ material }) => material.missing.get(property) ?? []))]);
  }
  const inherited = parts.flatMap(({ material }) => material.assumptions);
  const own: AssumptionId[] = ['ideal-mixing-enthalpy', ...(mixed.density ? (['volumes-add'] as const) : [])];
  return {
    name,
    origin: 'scenario',
    formula: null,
    phase: null,
    elements: mixed.elements,
    molarMass: mixed.molarMass,
    formationEnthalpy: mixed.formationEnthalpy,
    entropy: null,
    density: mixed.density,
    biogenicShare: mixed.biogenicShare,
    products,
    portions: mixed.shares,
    assumptions: [...new Set([...inherited, ...own, ...(scaled ? (['shares-scaled'] as const) : [])])],
    sources: [...new Set(parts.flatMap(({ material }) => material.sources))],
    card: { name, origin: 'scenario', formula: null, phase: null, aliases: [], properties: [] },
    missing,
  };
}

function isOfProducts(fault: EnergyFault): fault is GivenProductsFault {
  return fault.reason !== 'no-ruled-product' && fault.reason !== 'no-fuel-data' && fault.reason !== 'no-product-data';
}

/** Alkali that neither the blend's own carbon nor its hydrogen can bind ends as oxide: water would have to be added. */
function reportMissingWater(
  answer: MaterialAnswer,
  material: Material,
  header: Definition['header'],
  context: Context,
): void {
  const products = answer.tables.find((table) => table.id === 'complete-combustion-products');
  const oxides = alkaliMetals.map((metal) => `${metal}2O(cr)`);
  const hasOxide = products?.rows.some(([product]) => typeof product === 'string' && oxides.includes(product));
  const missing = answer.figures.find((figure) => figure.id === 'water-missing')?.quantity.value ?? 0;
  if (hasOxide && missing > 0) {
    context.report(header, { code: 'balance/water-missing', name: material.name, waterKgPerKg: missing });
  }
}

/** Each portion's share of the blend's lower heating value, where every portion has one and the sum is not nothing. */
function energyShares(parts: readonly Part[], mixed: Mixed): readonly (number | null)[] {
  const heats = parts.map(({ material }, index) => {
    const figure = answerMaterial(material).figures.find((candidate) => candidate.id === 'lower-heating-value');
    return figure ? figure.quantity.value * (mixed.shares[index]?.mass.value ?? 0) : null;
  });
  const sum = heats.reduce<number | null>((total, heat) => (total === null || heat === null ? null : total + heat), 0);
  return heats.map((heat) => (sum === null || heat === null || !(sum > 0) ? null : heat / sum));
}

function portionsTable(shares: readonly PortionShare[], energy: readonly (number | null)[]): Table {
  return {
    id: 'portions',
    label: 'Portions',
    columns: [
      { id: 'substance', label: 'Substance', unit: null },
      { id: 'mass-share', label: 'by mass', unit: '1' },
      { id: 'mole-share', label: 'by mole', unit: '1' },
      { id: 'volume-share', label: 'by volume', unit: '1' },
      { id: 'energy-share', label: 'by energy (each on its own slate)', unit: '1' },
    ],
    rows: shares.map((share, index) => [
      share.name,
      share.mass.value,
      share.mole?.value ?? null,
      share.volume?.value ?? null,
      energy[index] ?? null,
    ]),
  };
}

function lineResults(
  parts: readonly Part[],
  shares: readonly PortionShare[],
  energy: readonly (number | null)[],
): LineResult[] {
  return parts.map(({ line, material }, index) => ({
    kind: 'portion',
    line,
    material: material.card,
    shares: {
      mass: shares[index]?.mass.value ?? null,
      mole: shares[index]?.mole?.value ?? null,
      volume: shares[index]?.volume?.value ?? null,
      energy: energy[index] ?? null,
    },
  }));
}
