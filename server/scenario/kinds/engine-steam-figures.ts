// The figures and tables of a fired steam plant, as read of its solved boiler and cycle.
// Knows no entries. Invariant: a figure that cannot be had is not there; column ids and units are the contract. What a duty or a
// service asks of an engine has the ids that a measured engine has.

import { amountOf, dryGasMol } from '../../core/burn/products.ts';
import type { SteamPoint } from '../../core/engine/steam/steam-question.ts';
import type { SteamPlant } from '../../core/engine/steam/steam-plant.ts';
import { consumptionFigures, consumptionValues } from '../engine-consumption.ts';
import type { FigureRow } from '../material-figures.ts';
import type { FigureValues } from '../propagated-figures.ts';
import type { Column, Table } from '../scenario.ts';
import { consumptionOfSteam, type SteamAt } from './engine-steam-solved.ts';
import { lazyTable, plantExhaustTable, plantLossTable, type Row } from './plant-tables.ts';

/** Those besides consumption. Ids and units are the contract: they never change. */
export const steamOwnFigures = [
  row('boiler-efficiency', 'Boiler efficiency, on the lower heating value', '1', 'boiler-efficiency'),
  row('higher-boiler-efficiency', 'Boiler efficiency, on the higher heating value', '1', 'boiler-efficiency'),
  row(
    'steam-cycle-efficiency',
    'Steam cycle efficiency (turbine less pump work over the heat to the steam)',
    '1',
    'steam-cycle-efficiency',
  ),
  row('steam-fuel-ratio', 'Live steam, per kg of fuel', 'kg/kg', 'steam-flow'),
  row('steam-consumption', 'Specific steam consumption', 'kg/kWh', 'steam-flow'),
  row('steam-flow', 'Live steam flow at the rating', 'kg/s', 'steam-flow'),
  row('turbine-exhaust-wetness', 'Wetness of the steam at the turbine exhaust, by mass', '1', 'steam-state'),
  row('feedwater-temperature', 'Feedwater temperature', 'K', 'steam-state'),
  row('flame-temperature', 'Flame temperature, of the whole charge before it gives off heat', 'K', 'boiler-flame'),
  row('excess-air-ratio', 'Excess-air ratio λ', '1', 'boiler-flame'),
  row('oxidant-fuel-ratio', 'Air–fuel ratio, by mass', 'kg/kg', 'boiler-flame'),
  row('exhaust-temperature', 'Stack gas temperature', 'K', 'boiler-efficiency'),
  row('exhaust-condensed-share', 'Condensed products in the exhaust, by mass', '1', 'boiler-efficiency'),
  row('exhaust-oxygen-share', 'Oxygen in the exhaust, by mole, dry', '1', 'boiler-efficiency'),
] as const satisfies readonly FigureRow[];

/** All of a steam plant: with those of consumption, worked out from boiler and cycle. */
export const steamFigures: readonly FigureRow[] = [
  ...consumptionFigures
    .filter(({ method }) => method !== 'nitrogen-oxide-limit')
    .map((figure): FigureRow =>
      figure.method === 'measured-consumption' ? { ...figure, method: 'plant-consumption' } : figure,
    ),
  ...steamOwnFigures,
];

function row<Id extends string>(
  id: Id,
  label: string,
  unit: string,
  method: FigureRow['method'],
): FigureRow & { readonly id: Id } {
  return { id, label, unit, method };
}

/** The numbers of `steamFigures`, in SI. */
export function steamValues(at: SteamAt): FigureValues {
  const { plant, lowerJPerKg, higherJPerKg, ratedPowerW } = at;
  const { boiler, cycle, steamKgPerKg, brakeWorkJ } = plant;
  // Without a rating what does not hang on one is still told.
  const consumption = consumptionOfSteam(at, ratedPowerW ?? 1);
  const consumed = consumption ? consumptionValues(consumption, lowerJPerKg, null) : {};
  const unrated = { 'rated-power': undefined, 'idle-consumption': undefined };
  return {
    ...consumed,
    ...(ratedPowerW === null ? unrated : {}),
    'boiler-efficiency': plant.boilerEfficiency,
    'higher-boiler-efficiency': higherJPerKg === null ? undefined : boiler.steamHeatJ / higherJPerKg,
    'steam-cycle-efficiency': plant.cycleEfficiency,
    'steam-fuel-ratio': steamKgPerKg,
    'steam-consumption': steamKgPerKg / brakeWorkJ,
    'steam-flow': ratedPowerW === null ? undefined : (ratedPowerW * steamKgPerKg) / brakeWorkJ,
    'turbine-exhaust-wetness': cycle.endWetness,
    'feedwater-temperature': cycle.feedwaterTemperatureK,
    'flame-temperature': boiler.flame.temperatureK,
    'excess-air-ratio': boiler.lambda ?? undefined,
    'oxidant-fuel-ratio': boiler.oxidantKgPerKg,
    'exhaust-temperature': boiler.stack.temperatureK,
    'exhaust-condensed-share': boiler.stack.condensedMassShare,
    'exhaust-oxygen-share': amountOf(boiler.stack, 'O2(g)') / dryGasMol(boiler.stack),
  };
}

export function steamTables(plant: SteamPlant): readonly Table[] {
  return [
    statesTable(plant),
    plantLossTable(() => plant.losses),
    // Amounts of the states are for a kilogram of fuel that burns.
    plantExhaustTable(() => plant.boiler.stack, 1 / plant.boiler.burntShare),
  ];
}

export const steamPointNames: Readonly<Record<SteamPoint, string>> = {
  condensate: 'condensate',
  'behind-pump': 'behind pump',
  'behind-heater': 'behind feed heater',
  'live-steam': 'live steam',
  'bled-steam': 'bled steam',
  'before-reheat': 'before the reheater',
  reheated: 'behind the reheater',
  'turbine-end': 'turbine exhaust',
};

function statesTable({ cycle }: SteamPlant): Table {
  const columns: readonly Column[] = [
    { id: 'state', label: 'State', unit: null },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'temperature', label: 'Temperature', unit: 'K' },
    { id: 'enthalpy', label: 'Enthalpy, per kg of water', unit: 'kJ/kg' },
    { id: 'entropy', label: 'Entropy, per kg of water', unit: 'kJ/(kg K)' },
    { id: 'dryness', label: 'Dryness fraction', unit: '1' },
    { id: 'flow', label: 'Flow, per kg of live steam', unit: 'kg/kg' },
  ];
  return lazyTable({ id: 'steam-states', label: 'States of water and steam', columns }, () =>
    cycle.points.map(({ point, number, state, flow }): Row => {
      const name = steamPointNames[point];
      return [
        number > 1 || (number === 1 && point === 'behind-pump') ? `${name} ${number}` : name,
        state.pressurePa / 1e5,
        state.temperatureK,
        state.enthalpyJPerKg / 1e3,
        state.entropyJPerKgK / 1e3,
        state.dryness,
        flow,
      ];
    }),
  );
}
