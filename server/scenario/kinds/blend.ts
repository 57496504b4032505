// `blend`: portions of substances and other blends, by mass, amount or volume, with at most one `rest`. What it is as a
// material follows from its portions; its figures are those of any material (material-figures.ts), beside the table of
// its portions' shares on every basis.

import type { Definition } from '../../../grammar/tree.ts';
import type { EnergyFault } from '../../core/balance/formation-enthalpy.ts';
import type { GivenProductsFault } from '../../core/balance/given-products.ts';
import { alkaliMetals } from '../../core/substance/elements.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import type { Material, MissingProperty, PortionShare } from '../material.ts';
import { answerMaterial, materialFigures, type MaterialAnswer } from '../material-figures.ts';
import { mixParts, readParts, type Mixed, type Part } from '../mixing.ts';
import { reportMixtureFault } from '../portions.ts';
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

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, entries, context);
  refuseLines(definition, ['portion'], context);
  const name = definition.name?.text ?? '';
  const header = definition.name?.span ?? definition.header;
  const parts = readParts(definition, context);
  const isBroken = definition.lines.some((line) => line.kind === 'broken-line') || broken.has('products');
  if (!parts || (isBroken && parts.length === 0)) return unknownAnswer(evaluated);

  const mixed = mixParts(parts);
  if ('fault' in mixed) {
    // A line that could not be read may be the very portion that is missing: its own finding says enough.
    const named = parts.map((part) => ({ name: part.material.name, amount: part.amount }));
    if (!isBroken) reportMixtureFault(mixed, named, name, header, context);
    return unknownAnswer(evaluated);
  }
  if (isBroken) return unknownAnswer(evaluated);

  const material = materialOf(parts, mixed, name, read.products?.value ?? null);
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

function materialOf(parts: readonly Part[], mixed: Mixed, name: string, products: Material['products']): Material {
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
    species: mixed.species,
    elements: mixed.elements,
    molarMass: mixed.molarMass,
    formationEnthalpy: mixed.formationEnthalpy,
    entropy: null,
    density: mixed.density,
    biogenicShare: mixed.biogenicShare,
    products,
    portions: mixed.shares,
    assumptions: [...new Set([...inherited, ...own, ...(mixed.scaled ? (['shares-scaled'] as const) : [])])],
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
