// What a sea asks of core: its entries as plain numbers by name, and the water worked out from such numbers. The numbers go
// through one function, so that their uncertainties, and those of the constants, can be propagated through it.
// Knows no findings and no wording. Invariant: at the values themselves it gives what `solveSea` gave, whatever else is asked.
// Method: core/account/sea.

import { carbonPerDioxide, uncertainConstants } from '../../core/account/sea/buffering.ts';
import type { CarbonateState } from '../../core/account/sea/carbonate-state.ts';
import { seaConstants, type SeaConstants } from '../../core/account/sea/constants-at-depth.ts';
import { constantUncertainty, moved } from '../../core/account/sea/constants-uncertainty.ts';
import type { BoronSource } from '../../core/account/sea/conserved-ions.ts';
import {
  deliveredForms,
  deliveryOf,
  dilutedDelivery,
  respondTo,
  type DeliveredForm,
  type Delivery,
  type SeaResponse,
} from '../../core/account/sea/delivery.ts';
import { pressureAtDepthBar, seaDensityKgPerM3 } from '../../core/account/sea/density.ts';
import { fugacityCoefficient, partialPressureOfDryShareAtm } from '../../core/account/sea/fugacity.ts';
import {
  settlingTimeS,
  shareReached,
  transferVelocityMPerS,
  transferVelocityUncertainty,
} from '../../core/account/sea/gas-exchange.ts';
import { solvePair, type CarbonateVariable, type PairSolution } from '../../core/account/sea/solve-pair.ts';
import { celsiusZeroK, standardAtmospherePa } from '../../core/quantity/constants.ts';
import { dimensionless } from '../../core/quantity/dimension.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { seaEntries } from './sea-entries.ts';

/** The entries that say something of the carbonate system, with what they say. */
export interface CarbonateEntry {
  readonly key: keyof typeof seaEntries;
  readonly variable: CarbonateVariable;
  readonly unit: string;
  /** mol/kg from the entry's SI value, and back from a state. */
  molPerKg(value: number, constants: SeaConstants, water: WaterNumbers): number;
  value(state: CarbonateState, water: WaterNumbers): number;
}

interface WaterNumbers {
  readonly salinity: number;
  readonly temperatureK: number;
}

const asWritten = (value: number): number => value;

export const carbonateEntries: readonly CarbonateEntry[] = [
  {
    key: 'totalAlkalinity',
    variable: 'total-alkalinity',
    unit: 'umol/kg',
    molPerKg: asWritten,
    value: ({ totalAlkalinity }) => totalAlkalinity,
  },
  {
    key: 'dissolvedInorganicCarbon',
    variable: 'dissolved-carbon',
    unit: 'umol/kg',
    molPerKg: asWritten,
    value: ({ dissolvedCarbon }) => dissolvedCarbon,
  },
  { key: 'ph', variable: 'hydrogen', unit: '1', molPerKg: (value) => 10 ** -value, value: ({ ph }) => ph },
  {
    key: 'partialPressure',
    variable: 'carbon-dioxide',
    unit: 'uatm',
    molPerKg: (value, { carbonDioxide }, { temperatureK }) =>
      (value / standardAtmospherePa) * fugacityCoefficient(temperatureK) * carbonDioxide,
    value: ({ fugacityAtm }, { temperatureK }) =>
      (fugacityAtm / fugacityCoefficient(temperatureK)) * standardAtmospherePa,
  },
  {
    key: 'fugacity',
    variable: 'carbon-dioxide',
    unit: 'uatm',
    molPerKg: (value, { carbonDioxide }) => (value / standardAtmospherePa) * carbonDioxide,
    value: ({ fugacityAtm }) => fugacityAtm * standardAtmospherePa,
  },
  {
    key: 'dryAirShare',
    variable: 'carbon-dioxide',
    unit: 'ppm',
    molPerKg: (value, { carbonDioxide }, { salinity, temperatureK }) =>
      partialPressureOfDryShareAtm(value, salinity, temperatureK) * fugacityCoefficient(temperatureK) * carbonDioxide,
    value: ({ fugacityAtm }, { salinity, temperatureK }) =>
      fugacityAtm / (fugacityCoefficient(temperatureK) * partialPressureOfDryShareAtm(1, salinity, temperatureK)),
  },
  {
    key: 'hydrogenCarbonate',
    variable: 'hydrogen-carbonate',
    unit: 'umol/kg',
    molPerKg: asWritten,
    value: ({ hydrogenCarbonate }) => hydrogenCarbonate,
  },
  {
    key: 'carbonate',
    variable: 'carbonate',
    unit: 'umol/kg',
    molPerKg: asWritten,
    value: ({ carbonate }) => carbonate,
  },
];

/** The numbers of a sea by name; a missing one is not there. */
export type SeaKey =
  | 'salinity'
  | 'temperature'
  | 'depth'
  | 'phosphate'
  | 'silicate'
  | 'first'
  | 'second'
  | 'dilution'
  | 'mixed-layer'
  | 'wind'
  | 'residence'
  | 'transfer velocity'
  | DeliveredForm
  | `constant ${string}`;

export interface SeaQuestion {
  readonly inputs: ReadonlyMap<SeaKey, Quantity>;
  readonly boron: BoronSource;
  readonly known: readonly [CarbonateEntry, CarbonateEntry] | null;
}

/** The water worked out; what could not be had is null. */
export interface SolvedSea {
  readonly water: WaterNumbers;
  readonly constants: SeaConstants;
  readonly pressureBar: number;
  readonly densityKgPerM3: number;
  readonly pair: PairSolution | null;
  readonly state: CarbonateState | null;
  /** Per kg of effluent; null without one. */
  readonly effluent: Delivery | null;
  /** Of the near field; null without an effluent, its dilution or a state. */
  readonly nearField: SeaResponse | null;
  readonly settlingS: number | null;
  readonly shareReached: number | null;
}

/** The inputs with those of the constants, which are zero and uncertain. */
export function withConstants(inputs: ReadonlyMap<SeaKey, Quantity>): ReadonlyMap<SeaKey, Quantity> {
  const all = new Map(inputs);
  for (const constant of uncertainConstants) {
    const parts = new Map([[constantInput(constant), constantUncertainty[constant]]]);
    all.set(`constant ${constant}`, quantityOf(0, dimensionless, parts));
  }
  const transfer = new Map([[constantInput('transfer velocity'), transferVelocityUncertainty]]);
  if (inputs.has('wind')) all.set('transfer velocity', quantityOf(0, dimensionless, transfer));
  return all;
}

/** One constant is one input, in whatever sea. */
function constantInput(constant: string): string {
  return `sea water/${constant}`;
}

/** The water at numbers by name, SI; `valueOf` gives undefined for what is not there. */
export function solveSea(question: SeaQuestion, valueOf: (key: SeaKey) => number | undefined): SolvedSea {
  const salinity = valueOf('salinity') ?? NaN;
  const temperatureK = valueOf('temperature') ?? NaN;
  const water = { salinity, temperatureK };
  const pressureBar = pressureAtDepthBar(valueOf('depth') ?? 0);
  const constants = moved(
    seaConstants({ salinity, temperatureK, appliedPressureBar: pressureBar, boron: question.boron }),
    (constant) => valueOf(`constant ${constant}`) ?? 0,
  );
  const medium = {
    constants,
    nutrients: { phosphate: valueOf('phosphate') ?? 0, silicate: valueOf('silicate') ?? 0 },
  };
  const [one, two] = question.known ?? [];
  const knownOf = (entry: CarbonateEntry, key: SeaKey): { variable: CarbonateVariable; molPerKg: number } => ({
    variable: entry.variable,
    molPerKg: entry.molPerKg(valueOf(key) ?? NaN, constants, water),
  });
  const pair = one && two ? solvePair(medium, knownOf(one, 'first'), knownOf(two, 'second')) : null;
  const state = pair?.kind === 'solved' ? pair.state : null;
  const amounts = deliveredForms.map((form) => [form, valueOf(form)] as const);
  const hasEffluent = amounts.some(([, amount]) => amount !== undefined);
  const effluent = hasEffluent ? deliveryOf(Object.fromEntries(amounts)) : null;
  const dilution = valueOf('dilution');
  const nearField =
    state && effluent && dilution !== undefined ? respondTo(state, dilutedDelivery(effluent, dilution)) : null;
  const settlingS = state && settling(state, temperatureK - celsiusZeroK, valueOf);
  const residenceS = valueOf('residence');
  return {
    water,
    constants,
    pressureBar,
    densityKgPerM3: seaDensityKgPerM3(salinity, temperatureK - celsiusZeroK, pressureBar),
    pair,
    state,
    effluent,
    nearField,
    settlingS,
    shareReached: settlingS !== null && residenceS !== undefined ? shareReached(residenceS, settlingS) : null,
  };
}

function settling(state: CarbonateState, celsius: number, valueOf: (key: SeaKey) => number | undefined): number | null {
  const layerM = valueOf('mixed-layer');
  const windMPerS = valueOf('wind');
  if (layerM === undefined || windMPerS === undefined) return null;
  const velocity = transferVelocityMPerS(windMPerS, celsius) * Math.exp(valueOf('transfer velocity') ?? 0);
  return settlingTimeS(layerM, velocity, carbonPerDioxide(state));
}
