// What a service comes to, per duty and per year, and against its baseline; and its tables: fuels, what is on board leg by
// leg, and the two side by side. Reads sums that core made. Reports nothing.
// Invariant: a figure is a band where the consumptions are; differences are taken at the same end of both.

import type { Corner, ServiceSums } from '../core/service/service.ts';
import type { Band } from '../core/engine/consumption.ts';
import { total } from '../core/quantity/total.ts';
import { finiteCell } from './finite-cell.ts';
import type { FigureRow } from './material-figures.ts';
import type { FigureValues } from './propagated-figures.ts';
import type { FuelledService } from './service-machine.ts';
import type { Table } from './scenario.ts';

/** Ids and units are the contract: they never change. */
export const serviceFigures = [
  { id: 'fuel-mass', label: 'Fuel, per duty', unit: 't', method: 'service-fuel' },
  { id: 'fuel-volume', label: 'Fuel by volume, per duty', unit: 'm3', method: 'service-fuel' },
  { id: 'fuel-energy', label: 'Fuel energy (lower heating value), per duty', unit: 'GJ', method: 'service-fuel' },
  { id: 'brake-energy', label: 'Brake energy of all engines, per duty', unit: 'MWh', method: 'duty-sum' },
  {
    id: 'carbon-dioxide',
    label: 'Carbon dioxide if all carbon of the fuel leaves as CO2, tank to wake, per duty',
    unit: 't',
    method: 'service-emission',
  },
  {
    id: 'carbon-dioxide-held',
    label: 'Carbon dioxide held in the residue as carbonate, per duty',
    unit: 't',
    method: 'service-residue',
  },
  { id: 'residue', label: 'Solids made, per duty', unit: 't', method: 'service-residue' },
  { id: 'ash', label: 'Ash (solids without alkali), per duty', unit: 't', method: 'service-residue' },
  { id: 'alkali', label: 'Alkali metal that leaves, per duty', unit: 'kmol', method: 'service-emission' },
  { id: 'combustion-water', label: 'Water made by burning, per duty', unit: 't', method: 'service-emission' },
  { id: 'water-carried', label: 'Water carried for the fuel, per duty', unit: 't', method: 'service-emission' },
  { id: 'methane', label: 'Methane slip, per duty', unit: 'kg', method: 'service-emission' },
  { id: 'nitrous-oxide', label: 'Nitrous oxide, per duty', unit: 'kg', method: 'service-emission' },
  { id: 'ammonia', label: 'Ammonia slip, per duty', unit: 'kg', method: 'service-emission' },
  { id: 'urea', label: 'Urea consumed, per duty', unit: 'kg', method: 'service-emission' },
  { id: 'boil-off', label: 'Boil-off, per duty', unit: 't', method: 'service-tank' },
  { id: 'annual-fuel-mass', label: 'Fuel, per year', unit: 't/year', method: 'service-fuel' },
  {
    id: 'annual-fuel-energy',
    label: 'Fuel energy (lower heating value), per year',
    unit: 'GJ/year',
    method: 'service-fuel',
  },
  {
    id: 'annual-carbon-dioxide',
    label: 'Carbon dioxide if all carbon of the fuel leaves as CO2, tank to wake, per year',
    unit: 't/year',
    method: 'service-emission',
  },
  { id: 'annual-residue', label: 'Solids made, per year', unit: 't/year', method: 'service-residue' },
  { id: 'annual-alkali', label: 'Alkali metal that leaves, per year', unit: 'kmol/year', method: 'service-emission' },
  { id: 'fuel-carried', label: 'Fuel on board after bunkering, reserve included', unit: 't', method: 'service-tank' },
  { id: 'tank-volume', label: 'Tank volume', unit: 'm3', method: 'service-tank' },
  { id: 'tank-mass', label: 'Tank mass', unit: 't', method: 'service-tank' },
  {
    id: 'mass-on-board',
    label: 'Fuel, its tanks and its water after bunkering',
    unit: 't',
    method: 'service-tank',
  },
  {
    id: 'greatest-mass',
    label: 'Greatest mass of fuel, tanks, water and kept residue between two bunkerings',
    unit: 't',
    method: 'service-residue',
  },
  {
    id: 'endurance',
    label: 'Endurance on the fuel carried, reserve included',
    unit: 'd',
    method: 'service-endurance',
  },
  {
    id: 'range',
    label: 'Range on the fuel carried, reserve included',
    unit: 'nmi',
    method: 'service-endurance',
  },
  { id: 'baseline-fuel-mass', label: 'Fuel on the baseline, per duty', unit: 't', method: 'against-baseline' },
  {
    id: 'baseline-carbon-dioxide',
    label: 'Carbon dioxide on the baseline if all carbon leaves as CO2, tank to wake, per duty',
    unit: 't',
    method: 'against-baseline',
  },
  {
    id: 'added-mass',
    label: 'Added mass against the baseline, at its greatest',
    unit: 't',
    method: 'against-baseline',
  },
  { id: 'added-volume', label: 'Added tank volume against the baseline', unit: 'm3', method: 'against-baseline' },
  { id: 'payload-lost', label: 'Payload lost to the added mass', unit: 't', method: 'against-baseline' },
  {
    id: 'extra-bunkering-calls',
    label: 'Extra bunkering calls against the baseline, in the tank space of the baseline, per year',
    unit: '1/year',
    method: 'against-baseline',
  },
] as const satisfies readonly FigureRow[];

const corners: readonly Corner[] = ['value', 'low', 'high'];

/** The numbers of `serviceFigures`, in SI, as bands over the corners of the consumptions. */
export function serviceValues(
  sumsAt: (corner: Corner) => ServiceSums,
  baselineAt: ((corner: Corner) => ServiceSums) | null,
  repeatedPerS: number | null,
  dutiesBetween: number,
): FigureValues {
  const at = corners.map((corner) =>
    valuesAt(sumsAt(corner), baselineAt?.(corner) ?? null, repeatedPerS, dutiesBetween),
  );
  const [value = {}, low = {}, high = {}] = at;
  return Object.fromEntries(Object.keys(value).map((id) => [id, bandOf(value[id], low[id], high[id])]));
}

/** The unfavourable end is that of the higher consumption, whichever way the figure goes with it. */
function bandOf(value: number | undefined, low: number | undefined, high: number | undefined): Band | undefined {
  if (value === undefined || low === undefined || high === undefined) return undefined;
  return { value, low: Math.min(low, high), high: Math.max(low, high) };
}

function valuesAt(
  sums: ServiceSums,
  baseline: ServiceSums | null,
  repeated: number | null,
  between: number,
): Readonly<Record<string, number | undefined>> {
  const some = (value: number): number | undefined => (value === 0 ? undefined : value);
  const fuelKg = total(sums.fuelKg);
  const residueKg = sums.alkaliSaltKg + sums.ashKg;
  const perYear = (value: number | undefined): number | undefined =>
    repeated === null || value === undefined ? undefined : value * repeated;
  return {
    'fuel-mass': fuelKg,
    'fuel-volume': (sums.carriedM3 / sums.carriedKg) * fuelKg,
    'fuel-energy': sums.fuelJ,
    'brake-energy': sums.workJ,
    'carbon-dioxide': sums.carbonDioxideKg,
    'carbon-dioxide-held': some(sums.heldCarbonDioxideKg),
    residue: residueKg,
    ash: some(sums.ashKg),
    alkali: some(sums.alkaliMol),
    'combustion-water': sums.waterMadeKg,
    'water-carried': some(sums.waterCarriedKg),
    methane: some(sums.slipKg.methane),
    'nitrous-oxide': some(sums.slipKg.nitrousOxide),
    ammonia: some(sums.slipKg.ammonia),
    urea: some(sums.slipKg.urea),
    'boil-off': some(sums.boiledOffKg),
    'annual-fuel-mass': perYear(fuelKg),
    'annual-fuel-energy': perYear(sums.fuelJ),
    'annual-carbon-dioxide': perYear(sums.carbonDioxideKg),
    'annual-residue': perYear(residueKg),
    'annual-alkali': perYear(some(sums.alkaliMol)),
    'fuel-carried': sums.carriedKg,
    'tank-volume': sums.tankM3,
    'tank-mass': some(sums.tankKg),
    'mass-on-board': sums.onBoardKg,
    'greatest-mass': sums.heaviestKg,
    endurance: sums.enduranceS,
    range: sums.distanceM > 0 ? sums.rangeM : undefined,
    ...(baseline ? againstValues(sums, baseline, repeated, between) : {}),
  };
}

function againstValues(
  sums: ServiceSums,
  baseline: ServiceSums,
  repeated: number | null,
  between: number,
): Readonly<Record<string, number | undefined>> {
  const addedKg = sums.heaviestKg - baseline.heaviestKg;
  // In the baseline's tank space fuel for fewer duties fits, and calls are so many times as frequent.
  const calls = repeated === null ? undefined : (repeated * Math.max(0, sums.tankM3 / baseline.tankM3 - 1)) / between;
  return {
    'baseline-fuel-mass': total(baseline.fuelKg),
    'baseline-carbon-dioxide': baseline.carbonDioxideKg,
    'added-mass': addedKg,
    'added-volume': sums.tankM3 - baseline.tankM3,
    'payload-lost': Math.max(0, addedKg),
    'extra-bunkering-calls': calls,
  };
}

/** Each fuel with what it is of the whole. */
export function fuelTable(service: FuelledService, sums: ServiceSums, repeated: number | null): Table {
  return {
    id: 'fuels',
    label: 'Fuels, per duty',
    columns: [
      { id: 'substance', label: 'Fuel', unit: null },
      { id: 'mass', label: 'Mass', unit: 't' },
      { id: 'mass-share', label: 'Share by mass', unit: '1' },
      { id: 'annual-mass', label: 'Per year', unit: 't/year' },
    ],
    rows: service.fuels.map(({ name }, index) => {
      const kg = sums.fuelKg[index] ?? 0;
      return [
        name,
        finiteCell(kg / 1e3),
        finiteCell(kg / total(sums.fuelKg)),
        repeated === null ? null : finiteCell((kg * repeated * yearS) / 1e3),
      ];
    }),
  };
}

/** What is left and kept after each leg of the first duty after bunkering. */
export function onBoardTable(legs: readonly string[], sums: ServiceSums): Table {
  return {
    id: 'on-board',
    label: 'On board after each leg of the first duty',
    columns: [
      { id: 'leg', label: 'Leg', unit: null },
      { id: 'fuel', label: 'Fuel left', unit: 't' },
      { id: 'residue', label: 'Residue kept', unit: 't' },
      { id: 'together', label: 'Together', unit: 't' },
    ],
    rows: sums.afterLegs.map(({ fuelKg, residueKg }, index) => [
      legs[index] ?? '',
      finiteCell(fuelKg / 1e3),
      finiteCell(residueKg / 1e3),
      finiteCell((fuelKg + residueKg) / 1e3),
    ]),
  };
}

export interface Compared {
  readonly name: string;
  readonly sums: ServiceSums;
}

/** Services side by side, the baseline among them where there is one. */
export function compareTable(
  compared: readonly Compared[],
  baseline: ServiceSums | null,
  repeated: number | null,
  ownTanksFor: string | null,
): Table {
  const isOther = ownTanksFor !== null && compared.some(({ name }) => name !== ownTanksFor);
  return {
    id: 'fuels-compared',
    label: `The same service on each fuel, per duty${isOther ? `; form of tanks and boil-off for ${ownTanksFor} alone` : ''}`,
    columns: [
      { id: 'substance', label: 'Fuel', unit: null },
      { id: 'fuel-mass', label: 'Fuel', unit: 't' },
      { id: 'fuel-energy', label: 'Energy', unit: 'GJ' },
      { id: 'carbon-dioxide', label: 'CO2, all carbon', unit: 't' },
      { id: 'annual-carbon-dioxide', label: 'CO2 per year', unit: 't/year' },
      { id: 'residue', label: 'Solids', unit: 't' },
      { id: 'tank-volume', label: 'Tank space', unit: 'm3' },
      { id: 'greatest-mass', label: 'Greatest mass', unit: 't' },
      { id: 'added-mass', label: 'Added mass', unit: 't' },
      { id: 'endurance', label: 'Endurance', unit: 'd' },
    ],
    rows: compared.map(({ name, sums }) => [
      name,
      finiteCell(total(sums.fuelKg) / 1e3),
      finiteCell(sums.fuelJ / 1e9),
      finiteCell(sums.carbonDioxideKg / 1e3),
      repeated === null ? null : finiteCell((sums.carbonDioxideKg * repeated * yearS) / 1e3),
      finiteCell((sums.alkaliSaltKg + sums.ashKg) / 1e3),
      finiteCell(sums.tankM3),
      finiteCell(sums.heaviestKg / 1e3),
      baseline && finiteCell((sums.heaviestKg - baseline.heaviestKg) / 1e3),
      finiteCell(sums.enduranceS / 86400),
    ]),
  };
}

const yearS = 365.25 * 86400;
