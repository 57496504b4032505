// `blend`: portions of substances and other blends, by mass, amount or volume, with at most one `rest`. What it is as a
// material follows from its portions; its figures are those of any material (material-figures.ts), beside the table of
// its portions' shares on every basis.

import type { Definition } from '../../../grammar/tree.ts';
import type { EnergyFault } from '../../core/balance/formation-enthalpy.ts';
import type { GivenProductsFault } from '../../core/balance/given-products.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import { contactMaterials } from '../../core/hazard/store.ts';
import { extinguishingAgents } from '../../core/substance/hazards.ts';
import { alkaliMetals } from '../../core/substance/elements.ts';
import { referenceTemperatureK } from '../../core/substance/substance.ts';
import { reportHazards } from '../blend-hazards.ts';
import {
  hazardFigures,
  hazardFiguresOf,
  hazardTables,
  type HazardFigures,
  type TankInputs,
} from '../blend-hazard-figures.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import { lazily } from '../lazily.ts';
import type { Material, MissingProperty, PortionShare } from '../material.ts';
import { answerMaterial, materialFigures, type FigureRow, type MaterialAnswer } from '../material-figures.ts';
import { mixOrReport, readParts, type Mixed, type Part } from '../mixing.ts';
import type { PortionState } from '../portion-state.ts';
import { formulasReader, materialReader, quantityReader, stateReader, wordsReader, type State } from '../readers.ts';
import type { Figure, LineResult, Table } from '../scenario.ts';
import { storedBlend, type Keeping } from '../stored-blend.ts';
import type { Screening } from '../screening.ts';
import { portionStates, solidsVolumeShare, type StoredAt } from '../storage.ts';
import type { AssumptionId, Working, WorkingInput } from '../working.ts';
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
  contact: {
    name: 'contact',
    reader: wordsReader(contactMaterials),
    help: 'What its tank, pipes and seals are of, so that what must not meet it is told.',
  },
  extinguishing: {
    name: 'extinguishing',
    reader: wordsReader(extinguishingAgents),
    help: 'What is kept ready to put its fire out.',
  },
  filling: {
    name: 'filling',
    reader: quantityReader('%', 'a share, such as `90 %`', { range: 'share' }),
    help: 'How far it fills its tank: what is left is where its vapour and hydrogen gather.',
    default: { text: '95 %', source: 'common practice: the fullest that fuel tanks are filled' },
  },
  products: {
    name: 'products',
    reader: formulasReader,
    help: 'The products its heating values are counted to, in place of the rule (carbonate first, then hydroxide, then oxide).',
  },
};

/** An enthalpy of formation per mole is asked of pure substances only. */
const blendFigures = materialFigures.filter(({ id }) => id !== 'formation-enthalpy');

const solidsRow = {
  id: 'solids-volume-share',
  label: 'Solids, by volume, as stored',
  unit: '1',
  method: 'solids-share',
} as const satisfies FigureRow;

const evaluated: EvaluatedKind = {
  entries,
  lines: ['portion'],
  figures: [...blendFigures, solidsRow, ...hazardFigures],
  evaluate,
};

export const blend: Kind = {
  kind: 'blend',
  help: 'A mixture of substances and other blends, by mass, amount or volume.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken, lacksPortion } = readEntries(definition, entries, context, evaluated.lines);
  refuseLines(definition, evaluated.lines, context);
  const name = definition.name?.text ?? '';
  const header = definition.name?.span ?? definition.header;
  const parts = readParts(definition, context);
  const isUnread = lacksPortion || definition.lines.some((line) => line.kind === 'broken-line');
  const isBroken = isUnread || broken.has('products');
  // A line that could not be read may be the very portion that is missing: its own finding says enough.
  const mixed = parts && !isBroken ? mixOrReport(definition, parts, context) : null;
  if (!parts || !mixed) return unknownAnswer(evaluated);

  const material = materialOf(parts, mixed, name, read.products?.value ?? null);
  const answer = answerMaterial(material);
  if (answer.fault && read.products && isOfProducts(answer.fault)) {
    context.report(read.products.entry.span, { code: 'balance/products', fault: answer.fault });
  }
  reportMissingWater(answer, material, header, context);
  const energy = energyShares(parts, mixed);
  const stored = storedAt(read.stored?.value);
  const states = portionStates(mixed.shares, stored);
  reportChangedPhases(definition, parts, states, context);
  const keeping: Keeping = {
    kind: 'tank',
    temperatureK: stored.temperature.value,
    pressurePa: stored.pressure.value,
    blanket: broken.has('blanket') ? undefined : (read.blanket?.value ?? null),
    contact: read.contact?.value ?? [],
    extinguishing: read.extinguishing?.value ?? [],
  };
  const inTank = broken.has('stored') ? null : storedBlend(mixed.shares, keeping);
  let screening: Screening | undefined;
  if (inTank) {
    const written = {
      stored: read.stored?.entry,
      blanket: read.blanket?.entry,
      contact: read.contact?.entry,
      extinguishing: read.extinguishing?.entry,
    };
    screening = reportHazards(definition, parts, inTank, keeping, written, context);
  }
  const tank: TankInputs = {
    ...stored,
    density: material.density,
    filling: read.filling?.value.quantity ?? quantityOf(usualFilling),
  };
  let found: HazardFigures | undefined;
  const ofHazards = (): HazardFigures =>
    (found ??= inTank ? hazardFiguresOf(inTank, tank) : { figures: [], absent: new Map() });
  return lazily<KindAnswer>(
    {
      figures: [],
      tables: [],
      absent: new Map(),
      lines: lineResults(parts, mixed.shares, energy, states),
      material,
      screening,
    },
    {
      figures: () => [...answer.figures, ...solidsFigure(mixed, states, stored, material), ...ofHazards().figures],
      tables: () => [portionsTable(mixed.shares, energy), ...answer.tables, ...(inTank ? hazardTables(inTank) : [])],
      absent: () => new Map([...answer.absent, ...ofHazards().absent]),
    },
  );
}

const usualFilling = 0.95;

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
    energyFrom: 'formation-enthalpy',
    heatCapacity: null,
    density: mixed.density,
    meltingPoint: null,
    boilingPoint: null,
    biogenicShare: mixed.biogenicShare,
    products,
    portions: mixed.shares,
    assumptions: [...new Set([...inherited, ...own, ...(mixed.scaled ? (['shares-scaled'] as const) : [])])],
    sources: [...new Set(parts.flatMap(({ material }) => material.sources))],
    card: { name, origin: 'scenario', formula: null, phase: null, aliases: [], properties: [], hazards: null },
    missing,
  };
}

function storedAt(state: State | undefined): StoredAt {
  const temperature = quantityOf(referenceTemperatureK, knownUnit('K').dimension, undefined, 'temperature');
  return {
    temperature: state?.temperature ?? temperature,
    pressure: state?.pressure ?? quantityOf(1e5, knownUnit('Pa').dimension),
  };
}

/** Only a mixture of solid and liquid has a share of solids worth telling. */
function solidsFigure(
  mixed: Mixed,
  states: readonly (PortionState | null)[],
  stored: StoredAt,
  material: Material,
): readonly Figure[] {
  const phases = new Set(states.map((state) => state?.phase ?? 'mixture'));
  const quantity = solidsVolumeShare(mixed.shares, stored.temperature);
  if (!quantity || phases.size < 2 || quantity.value === 0) return [];
  const inputs: WorkingInput[] = [
    { label: 'Stored temperature', quantity: stored.temperature, unit: 'degC' },
    ...mixed.shares.map(({ name, volume }) => ({ label: `${name}, by volume`, quantity: volume, unit: '%' })),
  ];
  const { sources } = material;
  const working: Working = { method: solidsRow.method, inputs, sources, assumptions: ['volumes-add', 'no-dissolving'] };
  return [{ id: solidsRow.id, label: solidsRow.label, quantity, unit: solidsRow.unit, working }];
}

/** A portion whose data are of another phase than the one it is stored in is told of, at its substance. */
function reportChangedPhases(
  definition: Definition,
  parts: readonly Part[],
  states: readonly (PortionState | null)[],
  context: Context,
): void {
  for (const [index, { line, material }] of parts.entries()) {
    const state = states[index];
    const portion = definition.lines[line];
    if (!state?.changed || portion?.kind !== 'portion' || !portion.substance) continue;
    context.report(portion.substance.span, { code: 'range/phase', substance: material.name, state });
  }
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
    context.report(header, { code: 'balance/water-missing', of: 'blend', name: material.name, waterKgPerKg: missing });
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
  states: readonly (PortionState | null)[],
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
    state: states[index] ?? null,
  }));
}
