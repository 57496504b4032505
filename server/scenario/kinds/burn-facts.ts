// What is to be said of a burn: that it cannot be worked out and why, that it leans on values beyond their data, and where
// what is written is hardly meant (cold air under pressure) or has a consequence that is easily missed (soot, no water).
// Reads the charge, the flame and its zone; of cooled states a few of those that are written, for walls their own (burn-deposits.ts
// says how many), and for sizes one more flame. Solves no path. Rounds and words nothing.

import type { Burn, BurnFault, Charge, MatterState, NoState } from '../../core/burn/burn.ts';
import { carbonFate, shareOfForm } from '../../core/burn/fates.ts';
import { amountOf, dryGasMol, productRows } from '../../core/burn/products.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { tablesK } from '../../core/equilibrium/solver.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { alkaliMetals, atomicWeightKgPerMol } from '../../core/substance/elements.ts';
import type { Span } from '../../../grammar/tree.ts';
import type { TemperatureRange } from '../burn-readers.ts';
import type { Context } from '../context.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import { judgedWalls } from './burn-deposits.ts';
import { reportColdCharge, reportRealGas } from './burn-gas-facts.ts';
import type { WrittenBurn } from './burn-question.ts';
import type { AskedOfBurn, SolvedBurn } from './burn-solved.ts';

/** Where in the text what belongs to which part of a burn is said. */
export interface BurnPlaces {
  readonly header: Span;
  readonly fuel: Span;
  readonly oxidant: Span;
  readonly amount: Span;
  readonly zone: Span;
  readonly held: Span;
  readonly heatLoss: Span;
  readonly size: Span;
  readonly residence: Span;
  readonly cooled: Span;
  /** Of the exhaust temperature, where one is written. */
  readonly exhaust: Span | null;
  readonly walls: Span;
  /** Of what names the products, where it is written. */
  readonly products: Span | null;
}

export interface BurnNames {
  readonly burn: string;
  readonly fuel: string;
  readonly oxidant: string;
}

/** Says why a charge cannot be burnt. */
export function reportFault(
  fault: BurnFault,
  written: WrittenBurn,
  names: BurnNames,
  places: BurnPlaces,
  context: Context,
): void {
  const flame = `the flame of ${names.burn}`;
  switch (fault.reason) {
    case 'no-energy': {
      const { missing } = written[fault.stream];
      context.report(places[fault.stream], { code: 'balance/no-data', what: flame, missing });
      return;
    }
    case 'no-heating-value': {
      const missing = [`the lower heating value of ${names.fuel}`];
      context.report(places.heatLoss, { code: 'balance/no-data', what: flame, missing });
      return;
    }
    case 'nothing':
      context.report(places.fuel, {
        code: 'balance/no-data',
        what: flame,
        missing: [`the composition of ${names.fuel}`],
      });
      return;
    case 'no-gas': {
      const noGas = { kind: 'fault', reason: 'no-gas' } as const;
      context.report(places.held, { code: 'balance/charge', fault: noGas, fuel: names.fuel, oxidant: names.oxidant });
      return;
    }
    case 'zone-leaner':
    case 'not-positive':
    case 'no-valence':
    case 'no-oxygen-needed':
    case 'no-oxygen-offered': {
      const isZone = fault.reason === 'zone-leaner' || (fault.reason === 'not-positive' && fault.of === 'zone');
      // A mass of oxidant has no λ to be at fault, so that of the zone is.
      const place =
        isZone || (written.amount.by === 'mass' && fault.reason !== 'not-positive') ? places.zone : places.amount;
      context.report(place, { code: 'balance/charge', fault, fuel: names.fuel, oxidant: names.oxidant });
    }
  }
}

/** Says why a state could not be had. */
export function reportNone(
  none: NoState,
  of: 'flame' | 'zone',
  names: BurnNames,
  places: BurnPlaces,
  context: Context,
): void {
  const place = of === 'zone' ? places.zone : places.header;
  switch (none.reason) {
    case 'cannot-form':
      context.report(places.products ?? place, { code: 'balance/no-equilibrium', name: names.burn, of, fault: none });
      return;
    case 'outside-tables':
      context.report(place, { code: 'balance/no-equilibrium', name: names.burn, of, fault: none });
      return;
    case 'no-gas': {
      const noGas = { reason: 'no-gas' } as const;
      context.report(places.products ?? places.held, {
        code: 'balance/no-equilibrium',
        name: names.burn,
        of,
        fault: noGas,
      });
      return;
    }
    // The charge was checked before, and nobody stops a state that is solved here: it is our bug.
    case 'nothing':
    case 'not-finite':
    case 'stopped':
      context.report(place, { code: 'program/failed', message: `No equilibrium of ${names.burn}: ${none.reason}` });
      return;
    case 'not-converged':
      context.report(place, { code: 'program/failed', message: `No equilibrium of ${names.burn}: ${none.detail}` });
  }
}

/** Says what is doubtful, or easily missed, about a burn that could be solved. */
export function reportStates(
  burn: Burn,
  flame: Equilibrium,
  written: WrittenBurn,
  { moleShares }: OxidantStream,
  names: BurnNames,
  places: BurnPlaces,
  context: Context,
): void {
  reportExtrapolated(flame, places.header, context);
  reportRich('flame', burn.charge, flame, places.amount, context);
  const zone = burn.zone();
  if (zone?.kind === 'none') reportNone(zone, 'zone', names, places, context);
  if (zone?.kind === 'equilibrium' && burn.zoneCharge) {
    reportExtrapolated(zone, places.zone, context);
    reportRich('zone', burn.zoneCharge, zone, places.zone, context);
  }
  reportMissingWater(burn.charge, names.burn, places.header, context);
  reportColdCharge(written, moleShares, places.oxidant, context);
  reportRealGas(burn, flame, places.header, context);
}

/** Says which states are asked for where there are none, and that an exhaust would be hotter than its flame. */
export function reportAskedTemperatures(
  burn: Burn,
  flame: Equilibrium,
  { cooledTo, exhaustTemperature }: WrittenBurn,
  walls: TemperatureRange | null,
  places: BurnPlaces,
  context: Context,
): void {
  const report = (what: 'cooled' | 'exhaust' | 'wall', temperature: Quantity, place: Span): void => {
    const range = [kelvin(tablesK.lowestK), kelvin(tablesK.highestK)] as const;
    context.report(place, { code: 'range/temperature', why: 'outside-tables', what, temperature, range });
  };
  const [cooled] = cooledTo.filter(({ value }) => isBeyondTables(burn, value));
  if (cooled) report('cooled', cooled, places.cooled);
  const wall = walls && [walls.from, walls.to].find(({ value }) => isBeyondTables(burn, value));
  if (wall) report('wall', wall, places.walls);
  if (!places.exhaust) return;
  if (isBeyondTables(burn, exhaustTemperature.value)) {
    report('exhaust', exhaustTemperature, places.exhaust);
  } else if (exhaustTemperature.value > flame.temperatureK) {
    context.report(places.exhaust, {
      code: 'range/temperature',
      why: 'hotter-than-flame',
      temperature: exhaustTemperature,
      flame: kelvin(flame.temperatureK),
    });
  }
}

/** Whether the cooling gas has no state at a temperature. A composition that froze within the tables is also told below. */
function isBeyondTables({ input }: Burn, temperatureK: number): boolean {
  const { frozenBelowK = -Infinity } = input;
  const solvedK = temperatureK <= frozenBelowK ? Math.min(frozenBelowK, tablesK.highestK) : temperatureK;
  return solvedK < tablesK.lowestK || solvedK > tablesK.highestK;
}

/** Says which of the walls given meet a deposit that sticks, or may stick; a state is solved for each wall. */
export function reportStickyWalls(burn: Burn, walls: TemperatureRange, place: Span, context: Context): void {
  const { sticky, notKnown } = judgedWalls(burn, walls);
  for (const met of [sticky, notKnown]) {
    if (!met) continue;
    const { firstMeltingK, stickyK, uncertaintyK, validity } = met.melting;
    context.report(place, {
      code: 'range/sticky',
      from: kelvin(met.fromK),
      to: kelvin(met.toK),
      firstMelting: firstMeltingK === null ? null : kelvin(firstMeltingK),
      sticky: stickyK === null ? null : kelvin(stickyK),
      uncertaintyK,
      leading: met.leading,
      vapours: met.vapours,
      validity,
    });
  }
}

/** Says what has no burn-out time, and what has too little time. Nothing is solved where no size is written. */
export function reportBurnOut(
  solved: SolvedBurn,
  { sizes }: AskedOfBurn,
  names: BurnNames,
  places: BurnPlaces,
  context: Context,
): void {
  if (!sizes.dropletSize && !sizes.particleSize) return;
  const burnOuts = solved.burnOuts();
  const what = `the burn-out of ${names.fuel}`;
  const missing = burnOuts.flatMap((one) => one.missing);
  if (burnOuts.length === 0) missing.push(`a portion of ${names.fuel} that is of such a size`);
  if (missing.length > 0) context.report(places.size, { code: 'balance/no-data', what, missing });
  const residence = sizes.residenceTime;
  const late = burnOuts.flatMap(({ name, burnOut, verdict }) =>
    burnOut && (verdict === 'unburnt' || verdict === 'open')
      ? [
          burnOut.law === 'none'
            ? { name, verdict, timeS: null, factor: null }
            : { name, verdict, timeS: burnOut.timeS, factor: burnOut.factor },
        ]
      : [],
  );
  if (residence && late.length > 0)
    context.report(places.residence, { code: 'range/burn-out', residence, portions: late });
}

/** A product below this share by mass may lean on anything: it moves no figure. */
const leastOfNoteShare = 1e-3;

interface BeyondData {
  readonly name: string;
  readonly range: readonly [from: Quantity, to: Quantity];
}

function beyondData(state: MatterState): readonly BeyondData[] {
  const beyond = new Set(state.extrapolated);
  return productRows(state, leastOfNoteShare).flatMap(({ phase, id }) => {
    const range = beyond.has(phase) ? state.candidates.phases[phase]?.validK : undefined;
    return range ? [{ name: id, range: [kelvin(range[0]), kelvin(range[1])] as const }] : [];
  });
}

/** A heat capacity carried on so far beyond its end moves an enthalpy less than the data themselves are good for. */
const harmlessBeyondK = 30;

/** Cooled states that are looked at for products beyond their data: those asked for, from the hottest, at most so many. */
const mostCooledStates = 8;

/** Says which products of cooled states lean on values beyond their data, each once, where it first does. */
export function reportCooledBeyondData(burn: Burn, flame: Equilibrium, place: Span, context: Context): void {
  const told = new Set(beyondData(flame).map(({ name }) => name));
  const falling = [...burn.cooled].sort((a, b) => b.temperatureK - a.temperatureK).slice(0, mostCooledStates);
  for (const { temperatureK, state: solve } of falling) {
    const state = solve();
    const species =
      state.kind === 'none'
        ? []
        : beyondData(state).filter(
            ({ name, range: [from, to] }) =>
              !told.has(name) &&
              // Water is liquid beyond its data only near its saturation under pressure, and that is told as such.
              !(name === 'H2O(l)' && temperatureK > to.value) &&
              Math.max(from.value - temperatureK, temperatureK - to.value) > harmlessBeyondK,
          );
    if (species.length === 0) continue;
    for (const { name } of species) told.add(name);
    const temperature = kelvin(temperatureK);
    const of = 'cooled-products' as const;
    context.report(place, { code: 'range/temperature', why: 'extrapolated', of, temperature, species });
  }
}

function reportExtrapolated(state: Equilibrium, place: Span, context: Context): void {
  const species = beyondData(state);
  if (species.length === 0) return;
  const temperature = kelvin(state.temperatureK);
  context.report(place, { code: 'range/temperature', why: 'extrapolated', of: 'burn', temperature, species });
}

/**
 * Carbon over oxygen from which on premixed flames soot, well before equilibrium has any carbon left: about 0.5 for most
 * hydrocarbons. Source: Haynes and Wagner 1981, Prog. Energy Combust. Sci. 7, 229 (from memory).
 */
const sootingCarbonPerOxygen = 0.5;

function reportRich(of: 'flame' | 'zone', charge: Charge, state: Equilibrium, place: Span, context: Context): void {
  const { lambda } = charge;
  if (lambda === null || lambda >= 1) return;
  const carbon = carbonFate(state);
  const sootShare = carbon ? shareOfForm(carbon, 'soot') : 0;
  const atoms = (symbol: string): number => charge.elementMol[charge.elements.indexOf(symbol)] ?? 0;
  const carbonPerOxygen = atoms('O') > 0 ? atoms('C') / atoms('O') : null;
  const isSooting = sootShare > 0 || (carbonPerOxygen !== null && carbonPerOxygen > sootingCarbonPerOxygen);
  // A zone is meant to be rich; it is told of where that has a price.
  if (of === 'zone' && !isSooting) return;
  const dryMol = dryGasMol(state);
  const shareOf = (id: string): number => (dryMol > 0 ? amountOf(state, id) / dryMol : 0);
  context.report(place, {
    code: 'range/rich',
    of,
    lambda,
    carbonMonoxideShare: shareOf('CO(g)'),
    hydrogenShare: shareOf('H2(g)'),
    sootShare,
    carbonPerOxygen,
    sootingFrom: sootingCarbonPerOxygen,
  });
}

/** What alkali is known not to be held by: beside acids and carbon, whatever else is there may bind it. */
const bystanders = new Set([
  'H',
  'C',
  'N',
  'O',
  'F',
  'Cl',
  'Br',
  'I',
  'S',
  'He',
  'Ne',
  'Ar',
  'Mg',
  'Ca',
  ...alkaliMetals,
]);

/** Alkali that neither acids nor carbon bind, and that the whole charge has too little hydrogen to make hydroxide of. */
function reportMissingWater({ elements, elementMol }: Charge, name: string, place: Span, context: Context): void {
  const atoms = (symbol: string): number => elementMol[elements.indexOf(symbol)] ?? 0;
  const alkali = alkaliMetals.reduce((sum, metal) => sum + atoms(metal), 0);
  // Silicates, borates, phosphates, aluminates and ferrites take an amount of alkali that only the products tell.
  const others = elements.reduce((sum, symbol) => sum + (bystanders.has(symbol) ? 0 : atoms(symbol)), 0);
  if (others > leastBinderShare * alkali) return;
  const halogens = atoms('F') + atoms('Cl') + atoms('Br') + atoms('I');
  const unbound = alkali - halogens - 2 * atoms('S') - 2 * atoms('C');
  const missingMol = (unbound - atoms('H')) / 2;
  if (!(missingMol > leastMissingShare * alkali)) return;
  const waterKgPerMol = 2 * (atomicWeightKgPerMol('H') ?? 0) + (atomicWeightKgPerMol('O') ?? 0);
  const waterKgPerKg = missingMol * waterKgPerMol;
  context.report(place, { code: 'balance/water-missing', of: 'burn', name, waterKgPerKg });
}

const leastMissingShare = 1e-6;
/** Fewer atoms than this, of those that may bind alkali, hold too little of it to matter. */
const leastBinderShare = 1e-3;

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
