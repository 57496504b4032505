// From the entries of a burn to what core is asked: the uncertain quantities in one list, and the question that any values
// of them make. Knows no states. Invariant: everything uncertain that a figure rests on is in the list, so that correlations
// (the same portion in elements, energy and heating value) are kept. Temperatures the products are cooled to make tables
// alone, whose cells have no uncertainty.

import type { BurnInput, OxidantAmount } from '../../core/burn/burn.ts';
import type { BurnMove } from '../../core/burn/moved-burn.ts';
import type { Formula } from '../../core/substance/formula.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { quantitiesOf, streamNumbers, type UncertainStream } from '../burn-streams.ts';
import type { AmountEntry, HeldEntry } from '../burn-readers.ts';
import type { BurnOutEntries } from './burn-out-times.ts';

/** How much oxidant, as it is written. */
export type WrittenAmount = AmountEntry | { readonly by: 'mass'; readonly quantity: Quantity };

/** A burn as it is written, with its streams. */
export interface WrittenBurn {
  readonly fuel: UncertainStream;
  readonly oxidant: UncertainStream;
  readonly amount: WrittenAmount;
  readonly zone: WrittenAmount | null;
  readonly held: HeldEntry;
  /** Of the charge before it burns. */
  readonly chargePressure: Quantity;
  /** null: adiabatic. */
  readonly temperature: Quantity | null;
  /** Share of the lower heating value; null: none. */
  readonly heatLoss: Quantity | null;
  readonly lowerHeatingValue: Quantity | null;
  readonly cooledTo: readonly Quantity[];
  readonly coolingPressure: Quantity | null;
  readonly frozenBelow: Quantity | null;
  readonly exhaustTemperature: Quantity;
  readonly sizes: BurnOutEntries;
  readonly allowed: readonly Formula[] | null;
  readonly barred: readonly Formula[];
  readonly ions: boolean;
}

/** The uncertain quantities, and the question their values make (in the same order). */
export interface BurnQuestion {
  readonly quantities: readonly Quantity[];
  /** What each is to the states. */
  readonly roles: readonly BurnMove[];
  readonly input: (values: readonly number[]) => BurnInput;
  /** What those values ask of the states besides. */
  readonly asked: (values: readonly number[]) => { readonly exhaustK: number; readonly sizes: BurnOutEntries };
}

/** The question a written burn asks. */
export function questionOf(written: WrittenBurn): BurnQuestion {
  const { fuel, oxidant, amount, zone, held, chargePressure, temperature, heatLoss, lowerHeatingValue } = written;
  const unknown = quantityOf(NaN);
  const [ofFuel, ofOxidant] = [quantitiesOf(fuel), quantitiesOf(oxidant)];
  const scalars = [
    amount.quantity,
    zone?.quantity ?? unknown,
    held.held === 'pressure' ? held.pressure : chargePressure,
    temperature ?? unknown,
    heatLoss ?? quantityOf(0),
    lowerHeatingValue ?? unknown,
    written.frozenBelow ?? unknown,
    written.coolingPressure ?? unknown,
    written.exhaustTemperature,
    written.sizes.dropletSize ?? unknown,
    written.sizes.particleSize ?? unknown,
  ];
  return {
    quantities: [...scalars, ...ofFuel, ...ofOxidant],
    roles: [...scalarRoles, ...streamRoles('fuel', fuel), ...streamRoles('oxidant', oxidant)],
    input(values) {
      const [amountValue = NaN, zoneValue = NaN, pressurePa = NaN, temperatureK = NaN, lossShare = 0, ...others] =
        values;
      const [heating = NaN, frozenBelowK = NaN, coolingPressurePa = NaN] = others;
      const fuelValues = values.slice(scalars.length, scalars.length + ofFuel.length);
      return {
        fuel: streamNumbers(fuel, fuelValues),
        oxidant: streamNumbers(oxidant, values.slice(scalars.length + ofFuel.length)),
        amount: amountOf(amount.by, amountValue),
        held:
          held.held === 'pressure'
            ? { held: 'pressure', pressurePa }
            : { held: 'volume', chargePressurePa: pressurePa },
        heat: temperature ? { heat: 'temperature', temperatureK } : { heat: 'adiabatic', lossShare },
        lowerHeatingValueJPerKg: Number.isNaN(heating) ? null : heating,
        cooledToK: written.cooledTo.map(({ value }) => value),
        ...(zone ? { zone: amountOf(zone.by, zoneValue) } : {}),
        ...(written.frozenBelow ? { frozenBelowK } : {}),
        ...(written.coolingPressure ? { coolingPressurePa } : {}),
        ...(written.allowed ? { allowed: written.allowed } : {}),
        ...(written.barred.length > 0 ? { barred: written.barred } : {}),
        ...(written.ions ? { ions: true } : {}),
      };
    },
    asked(values) {
      const [exhaustK = NaN, dropletM = NaN, particleM = NaN] = values.slice(firstAsked, scalars.length);
      const { dropletSize, particleSize, residenceTime } = written.sizes;
      return {
        exhaustK,
        sizes: {
          dropletSize: dropletSize && quantityOf(dropletM, dropletSize.dimension),
          particleSize: particleSize && quantityOf(particleM, particleSize.dimension),
          residenceTime,
        },
      };
    },
  };
}

/** In the order of the scalars of `questionOf`. */
const scalarRoles: readonly BurnMove[] = [
  { of: 'amount' },
  { of: 'zone-amount' },
  { of: 'pressure' },
  { of: 'temperature' },
  { of: 'loss-share' },
  { of: 'heating-value' },
  { of: 'frozen-temperature' },
  { of: 'cooling-pressure' },
  // What is asked besides moves no state.
  { of: 'bystander' },
  { of: 'bystander' },
  { of: 'bystander' },
];

/** Where in the scalars begins what is asked besides the states. */
const firstAsked = 8;

/** In the order of `quantitiesOf`. The enthalpy at 25 °C is that of no state. */
function streamRoles(stream: 'fuel' | 'oxidant', { elements }: UncertainStream): BurnMove[] {
  return [
    { of: 'enthalpy', stream },
    { of: 'bystander' },
    { of: 'gas-temperature', stream },
    { of: 'gas-amount', stream },
    ...[...elements.keys()].map((symbol): BurnMove => ({ of: 'element', stream, symbol })),
  ];
}

function amountOf(by: WrittenAmount['by'], value: number): OxidantAmount {
  if (by === 'lambda') return { by, lambda: value };
  return by === 'equivalence-ratio' ? { by, ratio: value } : { by, kgPerKg: value };
}
