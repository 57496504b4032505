// From a service as it was read to what core adds up: which fuels its engines and boilers burn, what is uncertain, and the
// numbers for any values of that; the same on another fuel. Reports nothing.
// Invariant: the same duty gives the same plan whatever is burnt; an engine that does not run on a fuel is named in `missing`.

import type {
  Corner,
  ServiceEngine,
  ServiceInput,
  ServiceSums,
  SlipName,
  SlipNumbers,
} from '../core/service/service.ts';
import { serviceSums, slipNames } from '../core/service/service.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { fuelNumbers } from './fuel-numbers.ts';
import { lowerHeatingValueOf } from './heat-above-exhaust.ts';
import type { BurningEngine, DutyMachine, ServiceMachine, SlipEntry } from './machinery.ts';
import type { Material } from './material.ts';
import { pilotShareIn } from './pilot-share.ts';
import { QuantityList } from './quantity-list.ts';
import { tankForms, type TanksEntry } from './service-readers.ts';

export interface WrittenService {
  readonly name: string;
  readonly duty: DutyMachine;
  /** 1/s; null where it is not said. */
  readonly repeated: Quantity | null;
  readonly reserve: Quantity | null;
  readonly dutiesBetween: Quantity | null;
  readonly tanks: TanksEntry | null;
  readonly defaultFilling: number;
  readonly boilOff: Quantity | null;
  readonly keepsResidue: boolean;
  readonly carriesWater: boolean;
  readonly against: Material | null;
}

/** A service on given fuels, for any values of what is uncertain. */
export interface FuelledService {
  readonly fuels: readonly Material[];
  /** Names of data without which its fuel is not known; empty where all is there or the cause has been said. */
  readonly missing: readonly string[];
  readonly sumsAt: (values: readonly number[], corner: Corner) => ServiceSums;
}

/** Which fuel an engine or boiler burns in place of its own. */
export type FuelChoice = (own: Material) => Material;

/**
 * Adds what is uncertain to the list. The form of the tanks and the boil-off belong to the fuel under study: with
 * `isOther` fuel they are left out, and so is a mass of tank but for the fuel that it names.
 */
export function fuelledService(
  written: WrittenService,
  choose: FuelChoice,
  list: QuantityList,
  isOther: boolean,
): FuelledService {
  const { duty } = written;
  const fuels: Material[] = [];
  const indexOf = (fuel: Material): number => {
    const found = fuels.findIndex(({ name }) => name === fuel.name);
    return found >= 0 ? found : fuels.push(fuel) - 1;
  };
  const missing: string[] = [];
  const engines = duty.engines.map(({ machine }) => {
    if (!machine) return null;
    const fuel = choose(machine.fuel);
    const burning = machine.burning(fuel);
    if (burning.kind === 'not-burning') {
      missing.push(...burning.missing);
      return null;
    }
    return { burning, fuel: indexOf(fuel), pilot: pilotIn(burning, fuel, indexOf, list), at: engineIn(burning, list) };
  });
  const boilers = duty.boilers.map(({ fuel, efficiency }) => ({
    fuel: indexOf(choose(fuel)),
    efficiency: list.add(efficiency),
  }));
  const own = list.addAll(duty.uncertain);
  const numbers = fuels.map((fuel) => fuelNumbers(fuel, list));
  const tanks = tanksIn(written, fuels, list, isOther);
  const reserve = list.add(written.reserve, 0);
  const between = list.add(written.dutiesBetween, 1);
  const repeated = list.add(written.repeated);
  const boilOff = list.add(isOther ? null : written.boilOff, 0);
  const inputAt = (values: readonly number[]): ServiceInput => ({
    plan: duty.planAt(own(values)),
    engines: engines.map((engine): ServiceEngine => {
      if (!engine) return unknownEngine;
      return { ...engine.at(values), fuel: engine.fuel, pilot: engine.pilot?.(values) ?? null };
    }),
    boilers: boilers.map(({ fuel, efficiency }) => ({ fuel, efficiency: efficiency(values) })),
    fuels: numbers.map((one) => one(values)),
    reserveShare: reserve(values),
    dutiesPerBunkering: between(values),
    tanks: { ...tanks(values), boilOffPerS: boilOff(values) },
    periodS: written.repeated ? 1 / repeated(values) : null,
    keepsResidue: written.keepsResidue,
    carriesWater: written.carriesWater,
  });
  // All corners are asked of the same values, and a cycle may have to be worked out for them.
  let last: { readonly values: readonly number[]; readonly input: ServiceInput } | null = null;
  const inputOf = (values: readonly number[]): ServiceInput => {
    if (last?.values !== values) last = { values, input: inputAt(values) };
    return last.input;
  };
  return { fuels, missing, sumsAt: (values, corner) => serviceSums(inputOf(values), corner) };
}

/** Whether what is given of tanks and boil-off is left out on other fuels. */
export function hasOwnTanks({ tanks, boilOff }: WrittenService): boolean {
  return (tanks?.form ?? tanks?.massPerFuel ?? boilOff) !== null;
}

/** What a comparison asks of a service. */
export function serviceMachineOf(
  written: WrittenService,
  mainFuel: Material | null,
  baseline: () => ServiceSums | null,
): ServiceMachine {
  const known = new Map<Material, ReturnType<ServiceMachine['burning']>>();
  const workOut = (fuel: Material): ReturnType<ServiceMachine['burning']> => {
    const list = new QuantityList();
    const on = fuelledService(
      written,
      (own) => (own.name === mainFuel?.name ? fuel : own),
      list,
      fuel.name !== mainFuel?.name,
    );
    return { ...on, values: list.values };
  };
  return {
    machinery: 'service',
    name: written.name,
    mainFuel,
    ownTanksFor: hasOwnTanks(written) ? (mainFuel?.name ?? null) : null,
    baseline,
    repeated: written.repeated,
    burning(fuel) {
      const found = known.get(fuel) ?? workOut(fuel);
      known.set(fuel, found);
      return found;
    },
  };
}

/** The fuel that most of the energy comes from. */
export function mainFuelOf(fuelled: FuelledService, values: readonly number[]): Material | null {
  const { fuelKg } = fuelled.sumsAt(values, 'value');
  const energies = fuelled.fuels.map((fuel, index) => (fuelKg[index] ?? 0) * (lowerHeatingValueOf(fuel)?.value ?? 0));
  const most = energies.reduce((best, energy, index) => (energy > (energies[best] ?? -1) ? index : best), 0);
  return fuelled.fuels[most] ?? null;
}

const noSlip: SlipNumbers = { perFuel: 0, perWorkKgPerJ: 0 };
const unknownEngine: ServiceEngine = {
  consumption: null,
  fuel: 0,
  pilot: null,
  slips: { methane: noSlip, nitrousOxide: noSlip, ammonia: noSlip, urea: noSlip },
};

function engineIn(
  burning: BurningEngine,
  list: QuantityList,
): (values: readonly number[]) => Pick<ServiceEngine, 'consumption' | 'slips'> {
  const own = list.addAll(burning.uncertain);
  const slips = slipNames.map((name) => [name, slipIn(burning.slips[name], list)] as const);
  return (values) => ({
    consumption: burning.consumptionAt(own(values)),
    slips: Object.fromEntries(slips.map(([name, at]) => [name, at(values)])) as Record<SlipName, SlipNumbers>,
  });
}

function slipIn(slip: SlipEntry | null, list: QuantityList): (values: readonly number[]) => SlipNumbers {
  if (!slip) return () => noSlip;
  const number = list.add(slip.quantity);
  return (values) =>
    slip.per === 'fuel' ? { perFuel: number(values), perWorkKgPerJ: 0 } : { perFuel: 0, perWorkKgPerJ: number(values) };
}

/** The pilot with its share of the energy, where it is another fuel. */
function pilotIn(
  { pilot }: BurningEngine,
  fuel: Material,
  indexOf: (fuel: Material) => number,
  list: QuantityList,
): ((values: readonly number[]) => ServiceEngine['pilot']) | null {
  if (!pilot || pilot.fuel.name === fuel.name) return null;
  const index = indexOf(pilot.fuel);
  const share = pilotShareIn(pilot, list);
  const [main, own] = [list.add(lowerHeatingValueOf(fuel)), list.add(lowerHeatingValueOf(pilot.fuel))];
  return (values) => ({ fuel: index, energyShare: share(values, main(values), own(values)) });
}

function tanksIn(
  { tanks, defaultFilling }: WrittenService,
  fuels: readonly Material[],
  list: QuantityList,
  isOther: boolean,
): (values: readonly number[]) => Omit<ServiceInput['tanks'], 'boilOffPerS'> {
  const filling = list.add(tanks?.maximumFilling ?? quantityOf(defaultFilling));
  const mass = list.add(tanks?.massPerFuel ?? null, 0);
  const massFuel = tanks?.massFuel ?? null;
  const isFor = (fuel: Material): boolean => (massFuel ? massFuel.name === fuel.name : !isOther);
  const form = isOther ? null : (tanks?.form ?? null);
  return (values) => ({
    maximumFilling: filling(values),
    packingShare: form ? tankForms[form] : 1,
    massPerFuel: fuels.map((fuel) => (isFor(fuel) ? mass(values) : 0)),
  });
}
