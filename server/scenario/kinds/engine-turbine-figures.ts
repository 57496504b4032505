// The figures of a gas turbine: what it reads of its solved corners, as bands where particles make them.
// Knows no entries. Invariant: of a band `value` is the corner with the lowest brake work, whatever the figure; a figure that
// cannot be had is not there. What a duty or a service asks of an engine has the ids that a measured engine has.

import { amountOf, dryGasMol, peakGases } from '../../core/burn/products.ts';
import type { Band } from '../../core/engine/consumption.ts';
import type { GasTurbineCycle } from '../../core/engine/turbine/gas-turbine.ts';
import { heatedAirCycle } from '../../core/engine/turbine/heated-air.ts';
import { consumptionFigures, consumptionValues } from '../engine-consumption.ts';
import type { FigureRow } from '../material-figures.ts';
import type { FigureValues } from '../propagated-figures.ts';
import { bandOverTurbine, consumptionOfTurbine, type TurbineAt } from './engine-turbine-solved.ts';

/** Those besides consumption. Ids and units are the contract: they never change. */
export const turbineOwnFigures = [
  row(
    'net-efficiency',
    'Net efficiency (turbine less compressor work), on the lower heating value',
    '1',
    'turbine-work',
  ),
  row('turbine-inlet-temperature', 'Temperature of the gas at the turbine inlet', 'K', 'turbine-state'),
  row('turbine-outlet-temperature', 'Temperature of the gas behind the turbine', 'K', 'turbine-exhaust'),
  row('exhaust-temperature', 'Temperature of the exhaust as it leaves', 'K', 'turbine-exhaust'),
  row('compressor-temperature', 'Temperature of the air behind the compressor', 'K', 'turbine-work'),
  row('combustor-air-temperature', 'Temperature of the air as it enters the combustor', 'K', 'turbine-exhaust'),
  row('excess-air-ratio', 'Excess-air ratio λ', '1', 'turbine-state'),
  row('oxidant-fuel-ratio', 'Air–fuel ratio, by mass', 'kg/kg', 'turbine-state'),
  row('specific-work', 'Specific work at the coupling, per kg of air', 'kJ/kg', 'turbine-work'),
  row('back-work-ratio', 'Back work ratio (compressor over turbine work)', '1', 'turbine-work'),
  row('turbine-inlet-condensed-share', 'Condensed products at the turbine inlet, by mass', '1', 'turbine-state'),
  row('exhaust-condensed-share', 'Condensed products in the exhaust, by mass', '1', 'turbine-exhaust'),
  row('exhaust-oxygen-share', 'Oxygen in the exhaust, by mole, dry', '1', 'turbine-exhaust'),
  row('air-flow', 'Air mass flow at the rating', 'kg/s', 'turbine-consumption'),
  row(
    'air-standard-efficiency',
    'Air-standard efficiency of the same machines at the same turbine inlet temperature',
    '1',
    'heated-air',
  ),
  row(
    'nitric-oxide-share',
    'NO if it froze at the turbine inlet, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
  ),
] as const satisfies readonly FigureRow[];

/** All of a gas turbine: with those of consumption, worked out from the cycle. */
export const turbineFigures: readonly FigureRow[] = [
  ...consumptionFigures
    .filter(({ method }) => method !== 'nitrogen-oxide-limit')
    .map((figure): FigureRow =>
      figure.method === 'measured-consumption' ? { ...figure, method: 'turbine-consumption' } : figure,
    ),
  ...turbineOwnFigures,
];

function row<Id extends string>(
  id: Id,
  label: string,
  unit: string,
  method: FigureRow['method'],
): FigureRow & { readonly id: Id } {
  return { id, label, unit, method };
}

/** The numbers of `turbineFigures`, in SI. */
export function turbineValues(at: TurbineAt): FigureValues {
  const { solved, stoichiometricKgPerKg, lowerJPerKg, ratedPowerW } = at;
  const over = (read: (cycle: GasTurbineCycle) => number): Band => bandOverTurbine(solved, read);
  // Without a rating what does not hang on one is still told.
  const consumption = consumptionOfTurbine(at, ratedPowerW ?? 1);
  const consumed = consumption ? consumptionValues(consumption, lowerJPerKg, null) : {};
  const unrated = { 'rated-power': undefined, 'idle-consumption': undefined };
  return {
    ...consumed,
    ...(ratedPowerW === null ? unrated : {}),
    'net-efficiency': over(({ netEfficiency }) => netEfficiency),
    'turbine-inlet-temperature': over(({ turbineInlet }) => turbineInlet.temperatureK),
    'turbine-outlet-temperature': over(({ turbineOutlet }) => turbineOutlet.temperatureK),
    'exhaust-temperature': over(({ exhaust }) => exhaust.temperatureK),
    'compressor-temperature': over(({ compressor }) => compressor.delivery.temperatureK),
    'combustor-air-temperature': over(({ combustorInlet }) => combustorInlet.temperatureK),
    'excess-air-ratio': over(({ airKgPerKg }) => airKgPerKg / stoichiometricKgPerKg),
    'oxidant-fuel-ratio': over(({ airKgPerKg }) => airKgPerKg),
    'specific-work': over(({ brakeWorkJ, airKgPerKg }) => brakeWorkJ / airKgPerKg),
    'back-work-ratio': over(({ compressorWorkJ, turbineWorkJ }) => compressorWorkJ / turbineWorkJ),
    'turbine-inlet-condensed-share': over(({ turbineInlet }) => turbineInlet.condensedMassShare),
    'exhaust-condensed-share': over(({ exhaust }) => exhaust.matter().condensedMassShare),
    'exhaust-oxygen-share': over(({ exhaust }) => {
      const state = exhaust.matter();
      return amountOf(state, 'O2(g)') / dryGasMol(state);
    }),
    'air-flow':
      ratedPowerW === null ? undefined : over(({ airKgPerKg, brakeWorkJ }) => (ratedPowerW * airKgPerKg) / brakeWorkJ),
    'air-standard-efficiency': airStandard(at) ?? undefined,
    'nitric-oxide-share': over(
      ({ turbineInlet }) => peakGases(turbineInlet).find(({ id }) => id === 'NO(g)')?.dryMoleShare ?? NaN,
    ),
  };
}

function airStandard({ solved }: TurbineAt): number | null {
  const { input } = solved.turbine;
  const cycle = heatedAirCycle({
    gas: input.air,
    inletTemperatureK: input.airTemperatureK,
    ambientPressurePa: input.ambientPressurePa,
    turbineInletTemperatureK: solved.cautious.turbineInlet.temperatureK,
    compressor: input.compressor,
    recuperatorEffectiveness: input.recuperatorEffectiveness,
    reheat: input.reheat,
    combustorLossShare: input.combustorLossShare,
    exhaustLossShare: input.exhaustLossShare,
    turbineEfficiency: input.turbineEfficiency,
  });
  return cycle.kind === 'fault' ? null : cycle.efficiency;
}
