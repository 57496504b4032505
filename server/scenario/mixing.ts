// Portions together: reads a definition's portion lines into parts, and mixes parts into shares on every basis and the
// mixture's own properties, with uncertainty by the law of propagation so that correlations are kept. Used by every kind
// that is made of portions. The arithmetic is core/balance's; this file only arranges the uncertain numbers for it.

import type { Definition, Portion } from '../../grammar/tree.ts';
import { massSharesOf, sharesOn, type MixtureFault, type MixturePart } from '../core/balance/mixture.ts';
import { mixProperties, type PartProperties } from '../core/balance/mixture-properties.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { dimensionless } from '../core/quantity/dimension.ts';
import { quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate, type Propagated } from '../core/quantity/uncertainty.ts';
import type { Context } from './context.ts';
import { deepestUnread, type Material, type PortionShare } from './material.ts';
import { materialNamed } from './materials.ts';
import { readAmount, reportMixtureFault, type WrittenAmount } from './portions.ts';

/** A portion whose amount and substance could both be read. */
export interface Part {
  readonly line: number;
  readonly material: Material;
  readonly amount: WrittenAmount;
}

/** The portions in order; null when one could not be read (said). */
export function readParts(definition: Definition, context: Context): readonly Part[] | null {
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

export interface Mixed {
  /** Shares missed 1 by rounding and were scaled. */
  readonly scaled: boolean;
  readonly shares: readonly PortionShare[];
  readonly species: Material['species'];
  readonly elements: ReadonlyMap<string, Quantity>;
  readonly formationEnthalpy: Quantity | null;
  readonly molarMass: Quantity | null;
  readonly density: Quantity | null;
  readonly biogenicShare: Quantity;
}

/** The parts of a definition mixed; null when they do not make a whole, which is said at the part to blame. */
export function mixOrReport(definition: Definition, parts: readonly Part[], context: Context): Mixed | null {
  const mixed = mixParts(parts);
  if (!('fault' in mixed)) return mixed;
  const named = parts.map(({ material, amount }) => ({ name: material.name, amount }));
  const header = definition.name?.span ?? definition.header;
  reportMixtureFault(mixed, named, definition.name?.text ?? '', header, context);
  return null;
}

/** The shares and properties of the parts together, with their uncertainty; a fault says why there are none. */
function mixParts(parts: readonly Part[]): Mixed | MixtureFault {
  const inputs = inputsOf(parts);
  const values = inputs.map((input) => input.value);
  const centre = massSharesOf(mixtureParts(parts, values, numbersOf(parts, values)));
  return 'fault' in centre ? centre : mixedOf(parts, inputs, centre.massShares, centre.scaled);
}

/** Everything a blend rests on as one list of uncertain numbers: amounts first, then four and the elements of each part. */
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

function mixtureParts(
  parts: readonly Part[],
  values: readonly number[],
  numbers: readonly PartProperties[],
): MixturePart[] {
  return parts.map(({ amount }, index) => ({
    amount:
      amount.kind === 'rest' ? { kind: 'rest' } : { kind: amount.kind, basis: amount.basis, value: values[index] ?? 0 },
    molarMassKgPerMol: numbers[index]?.molarMassKgPerMol ?? null,
    densityKgPerM3: numbers[index]?.densityKgPerM3 ?? null,
  }));
}

function mixedOf(
  parts: readonly Part[],
  inputs: readonly Quantity[],
  centre: readonly number[],
  scaled: boolean,
): Mixed {
  const symbols = [...new Set(parts.flatMap(({ material }) => [...material.elements.keys()]))];
  const outcomes = propagate(inputs, (values) => {
    const numbers = numbersOf(parts, values);
    const mixture = mixtureParts(parts, values, numbers);
    const moved = massSharesOf(mixture, Infinity);
    // Moved by its uncertainty a share may leave its range; the slope from the other side then serves.
    if ('fault' in moved) return [];
    const { massShares } = moved;
    const properties = mixProperties(massShares, numbers);
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
  // Parts rest on the parts of the portions, so that reading those of a long chain of blends would go as deep as it is long.
  const depth = 1 + Math.max(0, ...parts.map(({ material }) => depthOf(material)));
  if (depth % deepestUnread === 0) for (const outcome of outcomes) void outcome.parts;
  const known = (outcome: Propagated | undefined, unit: string): Quantity | null =>
    outcome && Number.isFinite(outcome.value) ? quantityOfOutcome(outcome, knownUnit(unit).dimension) : null;
  const [enthalpy, molarMass, density, biogenic, ...others] = outcomes;
  const elementOutcomes = others.slice(0, symbols.length);
  const shareOutcomes = others.slice(symbols.length);
  const shares: readonly PortionShare[] = parts.map(({ material }, index) => ({
    name: material.name,
    material,
    mass: known(shareOutcomes[3 * index], '1') ?? quantityOf(centre[index] ?? 0, dimensionless),
    mole: known(shareOutcomes[3 * index + 1], '1'),
    volume: known(shareOutcomes[3 * index + 2], '1'),
  }));
  return {
    scaled,
    species: speciesOf(parts, shares),
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
    shares,
  };
}

/** How many blends stand in each other in a material; asked of its portions before it is asked of the material. */
function depthOf(material: Material): number {
  const known = depths.get(material);
  if (known !== undefined) return known;
  const depth = material.portions
    ? 1 + Math.max(0, ...material.portions.map((portion) => depthOf(portion.material)))
    : 0;
  depths.set(material, depth);
  return depth;
}

const depths = new WeakMap<Material, number>();

/** Mole shares of the species of all parts together; null where the molecules of one are not known. */
function speciesOf(parts: readonly Part[], shares: readonly PortionShare[]): Material['species'] {
  const species = new Map<string, number>();
  for (const [index, { material }] of parts.entries()) {
    const mole = shares[index]?.mole;
    if (!material.species || !mole) return null;
    for (const [formula, share] of material.species) {
      species.set(formula, (species.get(formula) ?? 0) + share * mole.value);
    }
  }
  return species;
}
