// `oxidant`: what a blend is burnt in, by portions as in a blend, dry or with water vapour at its state. Its composition by
// species is what a burn takes from it; here it gives the oxygen it brings, its humidity and its density.

import type { Definition } from '../../../grammar/tree.ts';
import {
  humidityRatioOf,
  idealGasDensityKgPerM3,
  vapourShareAt,
  vapourShareOfRatio,
} from '../../core/balance/humid-gas.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { dimensionless } from '../../core/quantity/dimension.ts';
import { noParts } from '../../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate } from '../../core/quantity/uncertainty.ts';
import { molarMassKgPerMol, parseFormula } from '../../core/substance/formula.ts';
import { reportHazards } from '../blend-hazards.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines, type EntriesRead } from '../entries.ts';
import type { FigureRow } from '../material-figures.ts';
import { mixOrReport, readParts, type Part } from '../mixing.ts';
import type { PortionShare } from '../material.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import { quantityReader, stateReader } from '../readers.ts';
import type { Figure, LineResult, Table } from '../scenario.ts';
import { storedBlend, type Keeping } from '../stored-blend.ts';
import type { Working, WorkingInput } from '../working.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

const entries = {
  state: {
    name: 'state',
    reader: stateReader,
    help: 'The temperature and pressure it is taken at; a relative humidity is counted at this state.',
    default: { text: '25 °C, 1 bar', source: 'convention of this program' },
  },
  relativeHumidity: {
    name: 'relative humidity',
    reader: quantityReader('%', 'a share, such as `60 %`', { range: 'share' }),
    help: 'Vapour pressure over the saturation pressure at its temperature, over ice below the triple point of water. What the portions bring is taken as dry.',
    default: { text: 'dry', source: 'convention of this program' },
  },
  humidityRatio: {
    name: 'humidity ratio',
    reader: quantityReader('g/kg', 'a mass of vapour per mass of dry gas, such as `10 g/kg`'),
    help: 'Mass of water vapour per mass of dry gas, in place of a relative humidity.',
  },
};

const figures = [
  { id: 'molar-mass', label: 'Molar mass, as it is', unit: 'g/mol', method: 'wet-gas' },
  { id: 'oxygen-share', label: 'Oxygen (O2), by mole, as it is', unit: '1', method: 'wet-gas' },
  { id: 'oxygen-mass-share', label: 'Oxygen (O2), by mass, as it is', unit: '1', method: 'wet-gas' },
  { id: 'vapour-share', label: 'Water vapour, by mole', unit: '1', method: 'wet-gas' },
  { id: 'humidity-ratio', label: 'Water vapour, per kg of dry gas', unit: 'kg/kg', method: 'humidity-ratio' },
  { id: 'density', label: 'Density at its state', unit: 'kg/m3', method: 'ideal-gas-density' },
] as const satisfies readonly FigureRow[];

const evaluated: EvaluatedKind = { entries, lines: ['portion'], figures, evaluate };

export const oxidant: Kind = {
  kind: 'oxidant',
  help: 'What a blend is burnt in: dry or humid air, oxygen, steam, or any portions.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken, lacksPortion } = readEntries(definition, entries, context, evaluated.lines);
  refuseLines(definition, evaluated.lines, context);
  const name = definition.name?.text ?? '';
  const header = definition.name?.span ?? definition.header;
  const isBroken = lacksPortion || broken.size > 0 || definition.lines.some((line) => line.kind === 'broken-line');
  const parts = readParts(definition, context);
  const mixed = parts && !isBroken ? mixOrReport(definition, parts, context) : null;
  if (!parts || !mixed) return unknownAnswer(evaluated);
  if (read.relativeHumidity && read.humidityRatio) {
    const { wordsSpan } = read.humidityRatio.entry;
    const [first, second] = [read.relativeHumidity.entry.words, read.humidityRatio.entry.words];
    context.report(wordsSpan, { code: 'balance/contradiction', what: 'its humidity', first, second, compared: null });
  }
  const gas = dryGasOf(mixed.species);
  if (!gas) {
    const unknown = parts.filter(({ material }) => !material.species).map(({ material }) => material.name);
    const missing = unknown.map((part) => `the molecules of ${part}`);
    context.report(header, { code: 'balance/no-data', what: `the composition of ${name}`, missing });
    return unknownAnswer(evaluated);
  }
  return answerGas(gas, read, parts, mixed.shares, definition, context);
}

/** The portions as a gas before humidity: mole shares and molar masses of its species. */
interface DryGas {
  readonly species: readonly { readonly name: string; readonly share: number; readonly molarMass: number }[];
  readonly molarMass: number;
  readonly isGas: boolean;
}

function dryGasOf(species: ReadonlyMap<string, number> | null): DryGas | null {
  if (!species) return null;
  const found: { name: string; share: number; molarMass: number }[] = [];
  let isGas = true;
  for (const [name, share] of species) {
    const formula = parseFormula(name);
    const molarMass = formula.kind === 'formula' ? molarMassKgPerMol(formula) : undefined;
    if (formula.kind !== 'formula' || molarMass === undefined) return null;
    isGas &&= formula.phase === 'g';
    found.push({ name, share, molarMass });
  }
  const molarMass = found.reduce((sum, { share, molarMass: own }) => sum + share * own, 0);
  return { species: found, molarMass, isGas };
}

const vapour = 'H2O(g)';
const waterKgPerMol = ((): number => {
  const water = parseFormula(vapour);
  return (water.kind === 'formula' && molarMassKgPerMol(water)) || NaN;
})();

function answerGas(
  gas: DryGas,
  read: EntriesRead<typeof entries>,
  parts: readonly Part[],
  shares: readonly PortionShare[],
  definition: Definition,
  context: Context,
): KindAnswer {
  const state = read.state?.value;
  const temperature =
    state?.temperature ?? quantityOf(25 + celsiusZeroK, knownUnit('K').dimension, noParts, 'temperature');
  const pressure = state?.pressure ?? quantityOf(1e5, knownUnit('Pa').dimension);
  const relative = read.relativeHumidity?.value.quantity ?? null;
  const ratio = relative ? null : (read.humidityRatio?.value.quantity ?? null);
  const vapourShare = (of: DryGas, temperatureK: number, pressurePa: number, humidity: number): number => {
    if (relative) return vapourShareAt(humidity, temperatureK, pressurePa) ?? NaN;
    return ratio ? vapourShareOfRatio(humidity, of.molarMass, waterKgPerMol) : 0;
  };
  const humidity = relative ?? ratio ?? quantityOf(0);
  const added = vapourShare(gas, temperature.value, pressure.value, humidity.value);
  if (Number.isNaN(added)) {
    const { span } = read.relativeHumidity?.entry ?? { span: context.placed.section.statement.span };
    context.report(span, { code: 'range/humidity', temperature, pressure });
    return unknownAnswer(evaluated);
  }
  const portions = shares.flatMap(({ mole }) => mole ?? []);
  const gasAt = (moles: readonly number[]): DryGas =>
    moles.every((mole, index) => mole === portions[index]?.value) ? gas : (gasOfPortions(parts, moles) ?? gas);
  const outcomes = propagate(
    [temperature, pressure, humidity, ...portions],
    ([t = NaN, p = NaN, h = NaN, ...moles]) => {
      const moved = gasAt(moles);
      const values = valuesOf(moved, vapourShare(moved, t, p, h), t, p);
      return figures.map((row) => values[row.id] ?? NaN);
    },
  );
  const working = workingOf(temperature, pressure, relative, ratio, parts);
  const found: Figure[] = [];
  for (const [index, row] of figures.entries()) {
    const outcome = outcomes[index];
    if (!outcome || !Number.isFinite(outcome.value)) continue;
    const quantity = quantityOf(outcome.value, knownUnit(row.unit).dimension, outcome.parts ?? noParts);
    found.push({ id: row.id, label: row.label, quantity, unit: row.unit, working: { ...working, method: row.method } });
  }
  const lines = parts.map(({ line, material }, index): LineResult => {
    const { mass, mole, volume } = shares[index] ?? { mass: quantityOf(0, dimensionless), mole: null, volume: null };
    const values = { mass: mass.value, mole: mole?.value ?? null, volume: volume?.value ?? null, energy: null };
    return { kind: 'portion', line, material: material.card, shares: values, state: null };
  });
  const absent = new Map(gas.isGas ? [] : [['density', ['a density of what is no gas']]]);
  const stream: OxidantStream = {
    name: context.owner,
    moleShares: moleSharesOf(gas, gasAt, [temperature, pressure, humidity, ...portions], vapourShare),
    temperature,
    pressure,
    sources: working.sources,
    assumptions: working.assumptions,
  };
  const keeping: Keeping = {
    kind: 'oxidant',
    temperatureK: temperature.value,
    pressurePa: pressure.value,
    blanket: null,
    contact: [],
    extinguishing: [],
  };
  const screening = reportHazards(
    definition,
    parts,
    storedBlend(shares, keeping),
    keeping,
    { stored: undefined },
    context,
  );
  return { figures: found, tables: [compositionTable(gas, added)], absent, lines, material: null, stream, screening };
}

/** The gas of portions whose mole shares have moved; null where those of a portion, or its molecules, are not known. */
function gasOfPortions(parts: readonly Part[], moles: readonly number[]): DryGas | null {
  if (moles.length !== parts.length) return null;
  const species = new Map<string, number>();
  for (const [index, { material }] of parts.entries()) {
    if (!material.species) return null;
    for (const [name, share] of material.species)
      species.set(name, (species.get(name) ?? 0) + share * (moles[index] ?? 0));
  }
  return dryGasOf(species);
}

/** Mole shares of the wet gas, uncertain where its state, its humidity or its portions are. */
function moleSharesOf(
  gas: DryGas,
  gasAt: (moles: readonly number[]) => DryGas,
  inputs: readonly Quantity[],
  vapourShare: (of: DryGas, temperatureK: number, pressurePa: number, humidity: number) => number,
): ReadonlyMap<string, Quantity> {
  const names = [...new Set([...gas.species.map(({ name }) => name), vapour])];
  const outcomes = propagate(inputs, ([t = NaN, p = NaN, h = NaN, ...moles]) => {
    const moved = gasAt(moles);
    const added = vapourShare(moved, t, p, h);
    const ofPortions = new Map(moved.species.map(({ name, share }) => [name, share * (1 - added)]));
    return names.map((name) => (ofPortions.get(name) ?? 0) + (name === vapour ? added : 0));
  });
  return new Map(
    names.flatMap((name, index) => {
      const { value = 0, parts } = outcomes[index] ?? {};
      return value > 0 ? [[name, quantityOf(value, dimensionless, parts)] as const] : [];
    }),
  );
}

type FigureId = (typeof figures)[number]['id'];

/** All figures of the gas with that share of vapour added; the vapour that portions bring counts too. */
function valuesOf(
  gas: DryGas,
  added: number,
  temperatureK: number,
  pressurePa: number,
): Partial<Record<FigureId, number>> {
  const shareOf = (name: string): number => gas.species.find((species) => species.name === name)?.share ?? 0;
  const molarMass = (1 - added) * gas.molarMass + added * waterKgPerMol;
  const oxygen = (1 - added) * shareOf('O2(g)');
  const water = added + (1 - added) * shareOf(vapour);
  const oxygenKgPerMol = gas.species.find((species) => species.name === 'O2(g)')?.molarMass ?? 0;
  const dryKgPerMol = water < 1 ? (molarMass - water * waterKgPerMol) / (1 - water) : NaN;
  return {
    'molar-mass': molarMass,
    'oxygen-share': oxygen,
    'oxygen-mass-share': (oxygen * oxygenKgPerMol) / molarMass,
    'vapour-share': water,
    'humidity-ratio': humidityRatioOf(water, dryKgPerMol, waterKgPerMol),
    ...(gas.isGas ? { density: idealGasDensityKgPerM3(molarMass, temperatureK, pressurePa) } : {}),
  };
}

function workingOf(
  temperature: Quantity,
  pressure: Quantity,
  relative: Quantity | null,
  ratio: Quantity | null,
  parts: readonly Part[],
): Omit<Working, 'method'> {
  const inputs: WorkingInput[] = [
    { label: 'Temperature', quantity: temperature, unit: 'degC' },
    { label: 'Pressure', quantity: pressure, unit: 'bar' },
    ...(relative ? [{ label: 'Relative humidity', quantity: relative, unit: '%' }] : []),
    ...(ratio ? [{ label: 'Humidity ratio', quantity: ratio, unit: 'g/kg' }] : []),
  ];
  const saturation = relative
    ? ['IAPWS-IF97, equation 30 (Wagner et al. 2000), and IAPWS R14-08(2011) over ice: saturation pressure of water']
    : [];
  const sources = [...parts.flatMap(({ material }) => material.sources), ...saturation];
  return {
    inputs,
    sources: [...new Set(sources)],
    assumptions: ['ideal-gas', ...(relative || ratio ? [] : (['dry-gas'] as const))],
  };
}

function compositionTable(gas: DryGas, added: number): Table {
  const wet = gas.species.map(({ name, share, molarMass }) => ({ name, share: share * (1 - added), molarMass }));
  if (added > 0) {
    const own = wet.find((species) => species.name === vapour);
    if (own) own.share += added;
    else wet.push({ name: vapour, share: added, molarMass: waterKgPerMol });
  }
  const molarMass = wet.reduce((sum, species) => sum + species.share * species.molarMass, 0);
  return {
    id: 'composition',
    label: 'Composition, as it is',
    columns: [
      { id: 'substance', label: 'Species', unit: null },
      { id: 'mole-share', label: 'by mole', unit: '1' },
      { id: 'mass-share', label: 'by mass', unit: '1' },
    ],
    rows: wet.map((species) => [species.name, species.share, (species.share * species.molarMass) / molarMass]),
  };
}
