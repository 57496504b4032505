// The figures of an engine with pistons: what it reads of its solved corners, as bands where particles make them.
// Knows no entries. Invariant: of a band `value` is the corner with the lowest brake work, whatever the figure; a figure that
// cannot be had is not there. What a duty or a service asks of an engine has the ids that a measured engine has.

import { airCycle, constantPropertyGas, stagesOf } from '../../core/engine/air-cycle.ts';
import { compressed } from '../../core/engine/charge.ts';
import { consumptionOfCycle, type Band, type Consumption } from '../../core/engine/consumption.ts';
import { exhaustMatter } from '../../core/engine/exhaust.ts';
import type { SolvedEngine } from '../../core/engine/solved-engine.ts';
import type { SolvedCycle } from '../../core/engine/work-cycle.ts';
import { peakGases, dryGasMol, amountOf } from '../../core/burn/products.ts';
import { consumptionFigures, consumptionValues, noxLimits } from '../engine-consumption.ts';
import type { FigureRow } from '../material-figures.ts';
import type { FigureValues } from '../propagated-figures.ts';
import type { CycleInput } from './engine-cycle-question.ts';

/** Those that only an engine with pistons has. Ids and units are the contract: they never change. */
export const pistonFigures = [
  row(
    'indicated-efficiency',
    'Indicated efficiency (gross, cylinder closed), on the lower heating value',
    '1',
    'indicated-work',
  ),
  row('mean-effective-pressure', 'Brake mean effective pressure', 'bar', 'mean-effective-pressure'),
  row('indicated-mean-effective-pressure', 'Indicated mean effective pressure', 'bar', 'mean-effective-pressure'),
  row('peak-pressure', 'Peak cylinder pressure', 'bar', 'cycle-state'),
  row('peak-temperature', 'Peak mean gas temperature', 'K', 'cycle-state'),
  row('compression-pressure', 'Pressure at the end of compression', 'bar', 'cycle-state'),
  row('compression-temperature', 'Temperature at the end of compression', 'K', 'cycle-state'),
  row('exhaust-temperature', 'Exhaust temperature behind the valve, mixed', 'K', 'exhaust-state'),
  row('exhaust-oxygen-share', 'Oxygen in the exhaust, by mole, dry', '1', 'exhaust-state'),
  row('exhaust-condensed-share', 'Condensed products in the exhaust, by mass', '1', 'exhaust-state'),
  row('residual-gas-share', 'Residual gas, by mass of the trapped charge', '1', 'residual-gas'),
  row('cut-off-ratio', 'Cut-off ratio (volume at the end of combustion over clearance volume)', '1', 'cycle-state'),
  row('oxidant-fuel-ratio', 'Oxidant–fuel ratio of the trapped charge, by mass', 'kg/kg', 'excess-air'),
  row(
    'air-standard-efficiency',
    'Air-standard efficiency of the same cycle (constant properties, γ = 1.4)',
    '1',
    'air-standard',
  ),
  row(
    'nitric-oxide-share',
    'NO if it froze at the end of combustion, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
  ),
] as const satisfies readonly FigureRow[];

/** All of an engine with pistons: with those of consumption, worked out from the cycle. */
export const cycleFigures: readonly FigureRow[] = [
  ...consumptionFigures.map((figure): FigureRow =>
    figure.method === 'measured-consumption' ? { ...figure, method: 'cycle-consumption' } : figure,
  ),
  ...pistonFigures,
];

function row<Id extends string>(
  id: Id,
  label: string,
  unit: string,
  method: FigureRow['method'],
): FigureRow & { readonly id: Id } {
  return { id, label, unit, method };
}

/** A reading of every corner: one number where they agree or there is one. */
export function bandOver(engine: SolvedEngine, read: (solved: SolvedCycle) => number): Band {
  const values = engine.cycles.map(read);
  return { value: read(engine.cautious), low: Math.min(...values), high: Math.max(...values) };
}

/** Net of gas exchange: what friction is taken from. */
export function netIndicatedEfficiency(engine: SolvedEngine): Band {
  const { lowerHeatingValueJ } = engine.charge;
  return bandOver(
    engine,
    ({ cycle: { balance } }) => (balance.indicatedWorkJ - balance.pumpingWorkJ) / lowerHeatingValueJ,
  );
}

/** What a duty asks, of a rated power in W; null where the cycle gives no work. */
export function consumptionOfEngine(engine: SolvedEngine, ratedPowerW: number): Consumption | null {
  const net = netIndicatedEfficiency(engine);
  if (!(net.low > 0)) return null;
  return consumptionOfCycle(net, engine.charge.input.mechanicalEfficiency, ratedPowerW);
}

/** The numbers of `cycleFigures`, in SI. */
export function cycleValues(engine: SolvedEngine, input: CycleInput, speedPerS: number | null): FigureValues {
  const { lowerHeatingValueJ, input: asked } = engine.charge;
  const over = (read: (solved: SolvedCycle) => number): Band => bandOver(engine, read);
  const exhaust = (solved: SolvedCycle) => exhaustMatter(solved, asked.exhaustPressurePa);
  // Without a rating what does not hang on one is still told.
  const consumption = consumptionOfEngine(engine, input.ratedPowerW ?? 1);
  const consumed = consumption ? consumptionValues(consumption, input.lowerHeatingValueJPerKg, speedPerS) : {};
  const unrated = { 'rated-power': undefined, 'idle-consumption': undefined };
  return {
    ...noxLimits(speedPerS),
    ...consumed,
    ...(input.ratedPowerW === null ? unrated : {}),
    'indicated-efficiency': over(({ cycle }) => cycle.balance.indicatedWorkJ / lowerHeatingValueJ),
    'mean-effective-pressure': over(({ cycle }) => cycle.balance.brakeWorkJ / cycle.balance.sweptM3),
    'indicated-mean-effective-pressure': over(({ cycle }) => cycle.balance.indicatedWorkJ / cycle.balance.sweptM3),
    'peak-pressure': over(({ cycle }) => cycle.burnt.pressurePa),
    'peak-temperature': over(({ cycle }) => cycle.burnt.temperatureK),
    'compression-pressure': over(({ cycle }) => cycle.compressed.pressurePa),
    'compression-temperature': over(({ cycle }) => cycle.compressed.temperatureK),
    'exhaust-temperature': over(({ cycle }) => cycle.exhaustTemperatureK),
    'exhaust-oxygen-share': over((solved) => {
      const state = exhaust(solved);
      return amountOf(state, 'O2(g)') / dryGasMol(state);
    }),
    'exhaust-condensed-share': over((solved) => exhaust(solved).condensedMassShare),
    'residual-gas-share': over(({ cycle }) => cycle.residualShare),
    'cut-off-ratio': over(({ cycle }) => cycle.burnt.volumeM3 / cycle.compressed.volumeM3),
    'oxidant-fuel-ratio': input.oxidantKgPerKg,
    'air-standard-efficiency': airStandardEfficiency(engine) ?? undefined,
    'nitric-oxide-share': over(
      ({ cycle }) => peakGases(cycle.burnt).find(({ id }) => id === 'NO(g)')?.dryMoleShare ?? NaN,
    ),
  };
}

/** Of cold air. */
const gammaOfAir = 1.4;

/**
 * The same moles from the same state, compressed as much and given the heat that the fire leaves in the cylinder, in the same
 * way; null where that air would be hotter than any data.
 */
export function airStandardEfficiency({ charge, cautious }: SolvedEngine): number | null {
  const { filled, balance } = cautious.cycle;
  const { input, lowerHeatingValueJ } = charge;
  const gas = constantPropertyGas(filled.mixture.gasMol, gammaOfAir);
  const { temperatureK, pressurePa } = filled;
  const start = gas.solve({ held: 'temperature-pressure', temperatureK, pressurePa });
  if (start.kind === 'none') return null;
  const squeezed = compressed(start, { volumeM3: start.volumeM3 / input.compressionRatio }, { law: 'isentropic' });
  if (squeezed.kind === 'none') return null;
  const heatJ = input.completeness * lowerHeatingValueJ - balance.combustionHeatJ;
  const stages = stagesOf(input.heatRelease, heatJ, squeezed.state);
  if ('kind' in stages) return null;
  const cycle = airCycle({ gas, compressionRatio: input.compressionRatio, temperatureK, pressurePa, ...stages });
  return cycle.kind === 'none' ? null : cycle.workJ / heatJ;
}
