// What an engine's consumption comes to, for people: at the rating and over the load, per energy and beside it per mass of
// its fuel. The same for an engine that was measured and one whose cycle was worked out. Works no cycle out.
// Invariant: consumption per energy always stands beside that per mass, since only the first compares fuels.

import { noxLimitKgPerJ } from '../core/engine/nox-tier.ts';
import type { Band, Consumption } from '../core/engine/consumption.ts';
import type { FigureValues } from './propagated-figures.ts';
import type { FigureRow } from './material-figures.ts';
import type { Table } from './scenario.ts';

/** Ids and units are the contract: they never change. */
export const consumptionFigures = [
  {
    id: 'brake-efficiency',
    label: 'Brake efficiency at the rating, on the lower heating value',
    unit: '1',
    method: 'brake-efficiency',
  },
  {
    id: 'specific-consumption',
    label: 'Brake specific energy consumption at the rating, on the lower heating value',
    unit: 'MJ/kWh',
    method: 'measured-consumption',
  },
  {
    id: 'specific-fuel-consumption',
    label: 'Brake specific fuel consumption at the rating',
    unit: 'g/kWh',
    method: 'measured-consumption',
  },
  {
    id: 'least-specific-consumption',
    label: 'Lowest brake specific energy consumption over the load, on the lower heating value',
    unit: 'MJ/kWh',
    method: 'measured-consumption',
  },
  {
    id: 'best-load',
    label: 'Load of the lowest specific consumption, of the rating',
    unit: '1',
    method: 'measured-consumption',
  },
  { id: 'idle-consumption', label: 'Idle fuel consumption', unit: 'kg/h', method: 'measured-consumption' },
  { id: 'rated-power', label: 'Rated brake power (100 % load)', unit: 'kW', method: 'as-given' },
  {
    id: 'nox-limit-i',
    label: 'NOx limit (as NO2) at the rated speed, tier I',
    unit: 'g/kWh',
    method: 'nitrogen-oxide-limit',
  },
  {
    id: 'nox-limit-ii',
    label: 'NOx limit (as NO2) at the rated speed, tier II',
    unit: 'g/kWh',
    method: 'nitrogen-oxide-limit',
  },
  {
    id: 'nox-limit-iii',
    label: 'NOx limit (as NO2) at the rated speed, tier III, in its control areas',
    unit: 'g/kWh',
    method: 'nitrogen-oxide-limit',
  },
] as const satisfies readonly FigureRow[];

/** The numbers of `consumptionFigures`, in SI. `heatingValue` is the fuel's, J/kg; `speedPerS` the rated speed, 1/s. */
export function consumptionValues(
  consumption: Consumption,
  heatingValue: number,
  speedPerS: number | null,
): FigureValues {
  const { heatRate } = consumption.heatRateAt(1);
  const best = bestLoad(consumption);
  const { idleFuelW, ratedPowerW } = consumption;
  return {
    'brake-efficiency': { value: 1 / heatRate.value, low: 1 / heatRate.high, high: 1 / heatRate.low },
    'specific-consumption': heatRate,
    'specific-fuel-consumption': divided(heatRate, heatingValue),
    'least-specific-consumption': best === null ? undefined : consumption.heatRateAt(best).heatRate,
    'best-load': best ?? undefined,
    'idle-consumption': idleFuelW ? divided(idleFuelW, heatingValue) : undefined,
    'rated-power': ratedPowerW,
    ...noxLimits(speedPerS),
  };
}

/** The limits that go with a rated speed in 1/s. */
export function noxLimits(speedPerS: number | null): FigureValues {
  if (speedPerS === null) return {};
  const rpm = speedPerS * 60;
  return {
    'nox-limit-i': noxLimitKgPerJ(1, rpm),
    'nox-limit-ii': noxLimitKgPerJ(2, rpm),
    'nox-limit-iii': noxLimitKgPerJ(3, rpm),
  };
}

/** The table over the load: at `loads` (shares of the rating, rising), those that are known. */
export function loadTable(consumption: Consumption, heatingValue: number, loads: readonly number[]): Table {
  const rows = loads
    .filter((load) => consumption.heatRateAt(load).range === 'within')
    .map((load) => {
      const { heatRate } = consumption.heatRateAt(load);
      const powerW = load * consumption.ratedPowerW;
      return [
        load,
        powerW / 1e3,
        heatRate.value * joulesPerMJ,
        heatRate.low * joulesPerMJ,
        heatRate.high * joulesPerMJ,
        (heatRate.value / heatingValue) * 3.6e9,
        1 / heatRate.value,
        ((heatRate.value * powerW) / heatingValue) * 3600,
      ];
    });
  return {
    id: 'load',
    label: 'Consumption over the load',
    columns: [
      { id: 'load', label: 'Load', unit: '1' },
      { id: 'power', label: 'Power', unit: 'kW' },
      { id: 'specific-consumption', label: 'Specific energy consumption', unit: 'MJ/kWh' },
      { id: 'specific-consumption-low', label: 'at least', unit: 'MJ/kWh' },
      { id: 'specific-consumption-high', label: 'at most', unit: 'MJ/kWh' },
      { id: 'specific-fuel-consumption', label: 'Specific fuel consumption', unit: 'g/kWh' },
      { id: 'brake-efficiency', label: 'Brake efficiency', unit: '1' },
      { id: 'fuel-flow', label: 'Fuel', unit: 'kg/h' },
    ],
    rows,
  };
}

/** MJ/kWh in one J/J. */
const joulesPerMJ = 3.6;

/** Where it takes least, to a hundredth of the rating, the highest of equal ones; null where no load is known. */
function bestLoad(consumption: Consumption): number | null {
  let best: number | null = null;
  let least = Infinity;
  for (let percent = 1; percent <= 110; percent += 1) {
    const load = percent / 100;
    const { heatRate, range } = consumption.heatRateAt(load);
    if (range !== 'within' || heatRate.value > least * (1 + equalRates)) continue;
    best = load;
    least = Math.min(least, heatRate.value);
  }
  return best;
}

/** Heat rates that differ by less, relative, differ by rounding alone. */
const equalRates = 1e-12;

function divided({ value, low, high }: Band, by: number): Band {
  return { value: value / by, low: low / by, high: high / by };
}
