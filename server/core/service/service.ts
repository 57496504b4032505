// A duty done over and over: the fuel each engine and boiler takes, what that gives off, the tanks it needs, what stays on
// board. Plain numbers per duty; knows no names and no scenario.
// Invariants: what goes in as carbon is what leaves as carbon dioxide or in residue and slip; masses of fuels add up to the
// total; everything but ratios is proportional to the duty. Sources: sums and definitions; packing shares of tanks are given.

import type { PlannedLeg } from '../duty/plan.ts';
import { fuelPowerAt, type Band, type Consumption } from '../engine/consumption.ts';
import { total } from '../quantity/total.ts';

/** What a kilogram of a fuel is and gives; NaN where that is not known. */
export interface FuelNumbers {
  readonly heatingValueJPerKg: number;
  readonly densityKgPerM3: number;
  /** If all its carbon leaves as carbon dioxide. */
  readonly carbonDioxideKgPerKg: number;
  /** Carbon dioxide that the residue holds back as carbonate. */
  readonly heldCarbonDioxideKgPerKg: number;
  /** Solid or liquid at 25 °C of the products of complete combustion, water apart: salts of alkali, and the rest as ash. */
  readonly alkaliSaltKgPerKg: number;
  readonly ashKgPerKg: number;
  readonly alkaliMolPerKg: number;
  readonly waterMadeKgPerKg: number;
  /** Water to be carried for its alkali to end as hydroxide where no carbon takes it. */
  readonly waterMissingKgPerKg: number;
}

export interface ServiceEngine {
  readonly consumption: Consumption | null;
  /** Index of its fuel, and of its pilot's with the pilot's share of the energy. */
  readonly fuel: number;
  readonly pilot: { readonly fuel: number; readonly energyShare: number } | null;
  /** kg of each per kg of its fuel and per J of its work. */
  readonly slips: Readonly<Record<SlipName, SlipNumbers>>;
}

export type SlipName = 'methane' | 'nitrousOxide' | 'ammonia' | 'urea';
export const slipNames: readonly SlipName[] = ['methane', 'nitrousOxide', 'ammonia', 'urea'];

export interface SlipNumbers {
  readonly perFuel: number;
  readonly perWorkKgPerJ: number;
}

export interface ServiceInput {
  readonly plan: readonly PlannedLeg[];
  readonly engines: readonly ServiceEngine[];
  /** In the order of the plan's boilers. */
  readonly boilers: readonly { readonly fuel: number; readonly efficiency: number }[];
  readonly fuels: readonly FuelNumbers[];
  /** Carried beyond what the duties take, as a share of it. */
  readonly reserveShare: number;
  /** Duties between two bunkerings. */
  readonly dutiesPerBunkering: number;
  /** From one duty to the next; null where it is not known: fuel boils off on duty alone then. */
  readonly periodS: number | null;
  readonly tanks: Tanks;
  readonly keepsResidue: boolean;
  /** Water that the fuel lacks is carried. */
  readonly carriesWater: boolean;
}

export interface Tanks {
  /** Share of the tank that may be filled. */
  readonly maximumFilling: number;
  /** Share of the space a tank takes that is tank. */
  readonly packingShare: number;
  /** kg of tank per kg of each fuel carried. */
  readonly massPerFuel: readonly number[];
  /** Share of the fuel on board that boils off, 1/s. */
  readonly boilOffPerS: number;
}

/** Which end of the consumptions is reckoned with. */
export type Corner = keyof Band;

export interface ServiceSums {
  /** kg of each fuel. */
  readonly fuelKg: readonly number[];
  readonly fuelJ: number;
  readonly workJ: number;
  readonly timeS: number;
  readonly distanceM: number;
  readonly carbonDioxideKg: number;
  readonly heldCarbonDioxideKg: number;
  readonly alkaliSaltKg: number;
  readonly ashKg: number;
  readonly alkaliMol: number;
  readonly waterMadeKg: number;
  readonly waterCarriedKg: number;
  readonly slipKg: Readonly<Record<SlipName, number>>;
  readonly boiledOffKg: number;
  /** Fuel on board after bunkering. */
  readonly carriedKg: number;
  readonly carriedM3: number;
  readonly tankM3: number;
  readonly tankKg: number;
  /** Fuel, its tank and water for it after bunkering. */
  readonly onBoardKg: number;
  /** The most that these and the residue kept weigh after any leg of any duty between two bunkerings. */
  readonly heaviestKg: number;
  readonly enduranceS: number;
  readonly rangeM: number;
  readonly afterLegs: readonly OnBoard[];
}

/** Fuel and water that are left and residue that is kept, kg. */
export interface OnBoard {
  readonly fuelKg: number;
  readonly residueKg: number;
  readonly waterKg: number;
}

/** The sums of one duty at one corner. NaN where something is not known. */
export function serviceSums(input: ServiceInput, corner: Corner): ServiceSums {
  const byLeg = input.plan.map((leg) => legFuel(leg, input, corner));
  const fuelKg = input.fuels.map((_, fuel) => total(byLeg.map((leg) => leg.fuelKg[fuel] ?? 0)));
  const over = (of: (numbers: FuelNumbers) => number): number => overFuels(fuelKg, input.fuels, of);
  const timeS = total(input.plan.map((leg) => leg.timeS));
  const distanceM = total(input.plan.map((leg) => leg.distanceM ?? 0));
  const dutyKg = total(fuelKg);
  const { tanks, dutiesPerBunkering: duties } = input;
  const periodS = Math.max(timeS, input.periodS ?? timeS);
  const burntBetweenKg = dutyKg * duties;
  // What is on board falls evenly from the whole to the reserve: half of what is burnt, and all the reserve, boils off.
  const reserveKg = burntBetweenKg * input.reserveShare;
  const boiledOffKg = (burntBetweenKg / 2 + reserveKg) * tanks.boilOffPerS * periodS * duties;
  const carriedKg = burntBetweenKg + reserveKg + boiledOffKg;
  const volumePerKg = over(({ densityKgPerM3 }) => 1 / densityKgPerM3) / dutyKg;
  const carriedM3 = carriedKg * volumePerKg;
  const tankKg = carriedKg * total(fuelKg.map((kg, fuel) => ((tanks.massPerFuel[fuel] ?? 0) * kg) / dutyKg));
  const waterPerDutyKg = input.carriesWater ? over(({ waterMissingKgPerKg }) => waterMissingKgPerKg) : 0;
  const onBoardKg = carriedKg + tankKg + waterPerDutyKg * duties;
  const boiledPerDutyKg = boiledOffKg / duties;
  const left = afterLegs(byLeg, input, carriedKg, boiledPerDutyKg / periodS);
  const lastsS = (carriedKg - boiledOffKg) / (dutyKg / timeS);
  return {
    fuelKg,
    fuelJ: over(({ heatingValueJPerKg }) => heatingValueJPerKg),
    workJ: total(byLeg.map((leg) => leg.workJ)),
    timeS,
    distanceM,
    carbonDioxideKg: over(({ carbonDioxideKgPerKg }) => carbonDioxideKgPerKg),
    heldCarbonDioxideKg: over(({ heldCarbonDioxideKgPerKg }) => heldCarbonDioxideKgPerKg),
    alkaliSaltKg: over(({ alkaliSaltKgPerKg }) => alkaliSaltKgPerKg),
    ashKg: over(({ ashKgPerKg }) => ashKgPerKg),
    alkaliMol: over(({ alkaliMolPerKg }) => alkaliMolPerKg),
    waterMadeKg: over(({ waterMadeKgPerKg }) => waterMadeKgPerKg),
    waterCarriedKg: waterPerDutyKg,
    slipKg: sumSlips(byLeg),
    boiledOffKg: boiledOffKg / duties,
    carriedKg,
    carriedM3,
    tankM3: carriedM3 / tanks.maximumFilling / tanks.packingShare,
    tankKg,
    onBoardKg,
    heaviestKg: tankKg + heaviest(left, { fuelKg: carriedKg, residueKg: 0, waterKg: waterPerDutyKg * duties }, duties),
    enduranceS: lastsS,
    rangeM: (lastsS / timeS) * distanceM,
    afterLegs: left,
  };
}

interface LegFuel {
  readonly fuelKg: readonly number[];
  readonly workJ: number;
  readonly slipKg: Readonly<Record<SlipName, number>>;
}

function legFuel(leg: PlannedLeg, { engines, boilers, fuels }: ServiceInput, corner: Corner): LegFuel {
  const fuelKg = fuels.map(() => 0);
  const slipKg = { methane: 0, nitrousOxide: 0, ammonia: 0, urea: 0 };
  let workJ = 0;
  const burn = (fuel: number, energyJ: number): number => {
    const kg = energyJ === 0 ? 0 : energyJ / (fuels[fuel]?.heatingValueJPerKg ?? NaN);
    fuelKg[fuel] = (fuelKg[fuel] ?? 0) + kg;
    return kg;
  };
  for (const { engine, timeS, powerW } of leg.demands) {
    const running = engines[engine];
    const fuelW = (running?.consumption && fuelPowerAt(running.consumption, powerW).fuelW?.[corner]) ?? NaN;
    const energyJ = fuelW * timeS;
    const pilotJ = energyJ * (running?.pilot?.energyShare ?? 0);
    const mainKg = burn(running?.fuel ?? 0, energyJ - pilotJ);
    if (running?.pilot) burn(running.pilot.fuel, pilotJ);
    const work = powerW * timeS;
    workJ += work;
    for (const name of slipNames) {
      const slip = running?.slips[name];
      if (slip) slipKg[name] += slip.perFuel * mainKg + slip.perWorkKgPerJ * work;
    }
  }
  for (const [index, { fuel, efficiency }] of boilers.entries()) burn(fuel, (leg.boilerJ[index] ?? 0) / efficiency);
  return { fuelKg, workJ, slipKg };
}

/** After each leg of the first duty after bunkering. */
function afterLegs(
  byLeg: readonly LegFuel[],
  { plan, fuels, keepsResidue, carriesWater, dutiesPerBunkering }: ServiceInput,
  carriedKg: number,
  boilOffKgPerS: number,
): readonly OnBoard[] {
  const missing = byLeg.map(({ fuelKg }) =>
    carriesWater ? overFuels(fuelKg, fuels, ({ waterMissingKgPerKg }) => waterMissingKgPerKg) : 0,
  );
  let [fuelLeft, residue, waterLeft] = [carriedKg, 0, total(missing) * dutiesPerBunkering];
  return byLeg.map(({ fuelKg }, leg) => {
    const boiledOffKg = boilOffKgPerS === 0 ? 0 : boilOffKgPerS * (plan[leg]?.timeS ?? NaN);
    fuelLeft -= total(fuelKg) + boiledOffKg;
    waterLeft -= missing[leg] ?? 0;
    const made = overFuels(fuelKg, fuels, ({ alkaliSaltKgPerKg, ashKgPerKg }) => alkaliSaltKgPerKg + ashKgPerKg);
    residue += keepsResidue ? made : 0;
    // Without a reserve the last leg ends with nothing, but for rounding.
    const isEmpty = Math.abs(fuelLeft) < 1e-9 * carriedKg;
    return { fuelKg: isEmpty ? 0 : fuelLeft, residueKg: residue, waterKg: waterLeft };
  });
}

/**
 * A kilogram of fuel may leave more than a kilogram of residue, and another fuel none: what is on board may rise and fall
 * again. After the same leg it goes in a straight line with the duties done, so the first and the last tell the most.
 */
function heaviest(afterFirst: readonly OnBoard[], bunkered: OnBoard, duties: number): number {
  const massOf = ({ fuelKg, residueKg, waterKg }: OnBoard): number => fuelKg + residueKg + waterKg;
  const [start, first] = [massOf(bunkered), afterFirst.map(massOf)];
  const gainPerDutyKg = (first.at(-1) ?? start) - start;
  // With less than a duty between bunkerings the legs that are reached are not known: what a duty gains goes evenly.
  if (duties < 1) return Math.max(start, start + duties * gainPerDutyKg);
  return Math.max(start, ...first, ...first.map((kg) => kg + (duties - 1) * gainPerDutyKg));
}

/** A number of a fuel that is not known matters only where some of that fuel is burnt. */
function overFuels(
  fuelKg: readonly number[],
  fuels: readonly FuelNumbers[],
  of: (numbers: FuelNumbers) => number,
): number {
  return total(fuels.map((numbers, index) => ((fuelKg[index] ?? 0) === 0 ? 0 : (fuelKg[index] ?? 0) * of(numbers))));
}

function sumSlips(byLeg: readonly LegFuel[]): Readonly<Record<SlipName, number>> {
  const of = (name: SlipName): number => total(byLeg.map(({ slipKg }) => slipKg[name]));
  return { methane: of('methane'), nitrousOxide: of('nitrousOxide'), ammonia: of('ammonia'), urea: of('urea') };
}
