// `burn`: a fuel burnt in an oxidant to chemical equilibrium, and its products as they cool. What findings rest on is solved
// with the definition: the flame and its zone, and where they are written the states at walls, some that are cooled to and,
// for sizes, the flame at λ = 1; all else (uncertainty, other states, the path) when somebody reads it. The states are core/burn's; this file joins entries to them.
// The path is long work, asked for by whoever looks at it (burn-path-tables.ts).

import type { Definition, Entry, Span } from '../../../grammar/tree.ts';
import { prepareBurn } from '../../core/burn/prepare-burn.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { referenceTemperatureK } from '../../core/substance/substance.ts';
import { reportFuelHazards } from '../blend-hazards.ts';
import { fuelStream, oxidantStream } from '../burn-streams.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines, type DefinitionRead, type EntriesRead } from '../entries.ts';
import { figuresOfMaterial } from '../material-figures.ts';
import type { Absent } from '../scenario.ts';
import { burnEntries, defaultExhaustC } from './burn-entries.ts';
import {
  reportAskedTemperatures,
  reportBurnOut,
  reportCooledBeyondData,
  reportFault,
  reportNone,
  reportStates,
  reportStickyWalls,
  type BurnPlaces,
} from './burn-facts.ts';
import { burnFigures, figuresOf } from './burn-figures.ts';
import { burnOutTable } from './burn-out-times.ts';
import { questionOf, type WrittenAmount, type WrittenBurn } from './burn-question.ts';
import { solvedBurn, type AskedOfBurn, type SolvedBurn } from './burn-solved.ts';
import { burnTables } from './burn-tables.ts';
import { burnWorking, workingPlaces } from './burn-working.ts';
import { lazyAnswer, unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';

const evaluated: EvaluatedKind = { entries: burnEntries, lines: [], figures: burnFigures, evaluate };

export const burn: Kind = {
  kind: 'burn',
  help: 'A fuel burnt in an oxidant to chemical equilibrium, and its products as they cool. Carbonate is made on cooling, seldom in the flame.',
  evaluated,
};

type Read = EntriesRead<typeof burnEntries>;

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, burnEntries, context);
  refuseLines(definition, [], context);
  const header = definition.name?.span ?? definition.header;
  const amount = amountOf(read, broken, header, context);
  reportContradictions(read, context);
  const screening = reportFuelHazards(definition, [read.fuel], context);
  // A line that could not be read may be the very one the flame rests on: its own finding says enough.
  const isBroken = broken.size > 0 || definition.lines.some((line) => line.kind === 'broken-line');
  if (!read.fuel || !read.oxidant || !amount || isBroken) return unknownAnswer(evaluated);
  const written = writtenBurn(read, amount, read.fuel.value, read.oxidant.value);
  const names = { burn: context.owner, fuel: read.fuel.value.name, oxidant: read.oxidant.value.name };
  const places = placesOf(read, header);
  const question = questionOf(written);
  const burning = prepareBurn(question.input(question.quantities.map(({ value }) => value)));
  if (burning.kind === 'fault') {
    reportFault(burning, written, names, places, context);
    return unknownAnswer(evaluated);
  }
  const flame = burning.flame();
  if (flame.kind === 'none') {
    reportNone(flame, 'flame', names, places, context);
    return unknownAnswer(evaluated);
  }
  const asked: AskedOfBurn = {
    exhaustK: written.exhaustTemperature.value,
    fuel: read.fuel.value,
    oxidant: read.oxidant.value,
    sizes: written.sizes,
  };
  const solved = solvedBurn(burning, flame, asked);
  reportStates(burning, flame, written, read.oxidant.value, names, places, context);
  reportAskedTemperatures(burning, flame, written, read.wallTemperature?.value ?? null, places, context);
  if (read.wallTemperature) {
    const { value, entry } = read.wallTemperature;
    reportStickyWalls(burning, value, entry.span, context);
  }
  reportBurnOut(solved, asked, names, places, context);
  reportCooledBeyondData(burning, flame, places.cooled, context);
  const hasSize = asked.sizes.dropletSize !== null || asked.sizes.particleSize !== null;
  const entryPlaces = workingPlaces(read, context);
  return lazyAnswer(
    { screening },
    {
      figures: () => figuresOf(solved, question, asked, (row) => burnWorking(row, written, solved, names, entryPlaces)),
      tables: () => [
        ...burnTables(burning, flame),
        ...(hasSize ? [burnOutTable(solved.burnOuts, asked.sizes.residenceTime)] : []),
      ],
      absent: () => absentOf(written, solved, names.fuel),
    },
  );
}

/** How much oxidant, the first way it is written; null where that is not known (said). */
function amountOf(
  read: Read,
  broken: DefinitionRead<typeof burnEntries>['broken'],
  header: Span,
  context: Context,
): WrittenAmount | null {
  const ways = [
    ...(read.lambda ? [{ by: 'lambda', read: read.lambda } as const] : []),
    ...(read.equivalenceRatio ? [{ by: 'equivalence-ratio', read: read.equivalenceRatio } as const] : []),
    ...(read.oxidantPerFuel ? [{ by: 'mass', read: read.oxidantPerFuel } as const] : []),
  ];
  const [first, ...others] = ways;
  for (const { read: other } of others) {
    reportTwice('how much oxidant there is', first?.read.entry, other.entry, context);
  }
  if (first) return { by: first.by, quantity: first.read.value.quantity };
  const { lambda, equivalenceRatio, oxidantPerFuel } = burnEntries;
  if (!broken.has('lambda') && !broken.has('equivalenceRatio') && !broken.has('oxidantPerFuel')) {
    const entries = [lambda, equivalenceRatio, oxidantPerFuel].map(({ name }) => name);
    context.report(header, { code: 'name/missing-entry', kind: 'burn', name: context.owner, entries });
  }
  return null;
}

function reportContradictions(read: Read, context: Context): void {
  reportTwice('what heat leaves', read.temperature?.entry, read.heatLoss?.entry, context);
}

function reportTwice(what: string, first: Entry | undefined, second: Entry | undefined, context: Context): void {
  if (!first || !second) return;
  const words = { first: first.words, second: second.words };
  context.report(second.wordsSpan, { code: 'balance/contradiction', what, ...words, compared: null });
}

function writtenBurn(
  read: Read,
  amount: WrittenAmount,
  fuel: NonNullable<Read['fuel']>['value'],
  oxidant: NonNullable<Read['oxidant']>['value'],
): WrittenBurn {
  const state = read.oxidantState?.value;
  const taken = {
    ...oxidant,
    temperature: state?.temperature ?? oxidant.temperature,
    pressure: state?.pressure ?? oxidant.pressure,
  };
  const held = read.held?.value ?? { held: 'pressure' as const, pressure: taken.pressure };
  const chargePressurePa = held.held === 'pressure' ? held.pressure.value : taken.pressure.value;
  const temperature = read.temperature?.value.quantity ?? null;
  return {
    fuel: fuelStream(fuel, read.fuelTemperature?.value.quantity ?? kelvin(referenceTemperatureK), chargePressurePa),
    oxidant: oxidantStream(taken),
    amount,
    zone: read.flameZone?.value ?? null,
    held,
    chargePressure: taken.pressure,
    temperature,
    heatLoss: temperature ? null : (read.heatLoss?.value ?? null),
    lowerHeatingValue: figuresOfMaterial(fuel).find(({ id }) => id === 'lower-heating-value')?.quantity ?? null,
    cooledTo: read.cooledTo?.value ?? [],
    coolingPressure: read.coolingPressure?.value.quantity ?? null,
    frozenBelow: read.frozenBelow?.value.quantity ?? null,
    exhaustTemperature: read.exhaustTemperature?.value.quantity ?? kelvin(defaultExhaustC + celsiusZeroK),
    sizes: {
      dropletSize: read.dropletSize?.value.quantity ?? null,
      particleSize: read.particleSize?.value.quantity ?? null,
      residenceTime: read.residenceTime?.value.quantity ?? null,
    },
    allowed: read.allowedProducts?.value ?? null,
    barred: read.barredProducts?.value ?? [],
    ions: read.ions?.value ?? false,
  };
}

function placesOf(read: Read, header: Span): BurnPlaces {
  const amount = read.lambda ?? read.equivalenceRatio ?? read.oxidantPerFuel;
  return {
    header,
    fuel: read.fuel?.entry.span ?? header,
    oxidant: read.oxidantState?.entry.span ?? read.oxidant?.entry.span ?? header,
    amount: amount?.entry.span ?? header,
    zone: read.flameZone?.entry.span ?? header,
    held: read.held?.entry.span ?? header,
    heatLoss: read.heatLoss?.entry.span ?? header,
    size: read.dropletSize?.entry.span ?? read.particleSize?.entry.span ?? header,
    residence: read.residenceTime?.entry.span ?? header,
    cooled: read.cooledTo?.entry.span ?? header,
    exhaust: read.exhaustTemperature?.entry.span ?? null,
    walls: read.wallTemperature?.entry.span ?? header,
    products: read.allowedProducts?.entry.span ?? read.barredProducts?.entry.span ?? null,
  };
}

/** Figures that rest on energies, where a temperature is given and an energy is not known; and on states there are none of. */
function absentOf(
  { fuel, oxidant, zone, lowerHeatingValue }: WrittenBurn,
  solved: SolvedBurn,
  fuelName: string,
): Absent {
  const absent = new Map<string, readonly string[]>();
  const missing = [...(fuel.enthalpy ? [] : fuel.missing), ...(oxidant.enthalpy ? [] : oxidant.missing)];
  if (missing.length > 0) {
    for (const id of ['heat-released', 'preheat', 'released-share', 'heat-above-exhaust']) absent.set(id, missing);
    if (zone) for (const id of zoneFigures) absent.set(id, missing);
  } else if (!lowerHeatingValue) {
    absent.set('released-share', [`the lower heating value of ${fuelName}`]);
  }
  if (missing.length > 0) return absent;
  if (solved.heatAboveJ() === null)
    absent.set('heat-above-exhaust', ['a state of the products at the exhaust temperature']);
  if (solved.slate() === null) {
    for (const id of ['heat-released', 'preheat', 'released-share'])
      absent.set(id, ['a state of the products at 25 °C']);
  }
  return absent;
}

const zoneFigures = ['flame-zone-temperature', 'flame-zone-nitric-oxide-share', 'flame-zone-carbon-monoxide-share'];

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
