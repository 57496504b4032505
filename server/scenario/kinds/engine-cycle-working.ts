// How a figure of an engine with pistons came about: what went in with the lines it comes from, the losses beside an
// efficiency, the corners beside a band, and what was assumed. Put together when somebody asks. Knows no sentences.
// Invariant: the places are made with the definition, since an answer's places are gathered then.

import { exhaustMatter } from '../../core/engine/exhaust.ts';
import { lossTree } from '../../core/engine/loss-tree.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Place } from '../place.ts';
import type { Working, WorkingInput } from '../working.ts';
import type { EngineKey, EngineRead } from './engine-entries.ts';
import { cycleAssumptions, type SolvedCycleQuestion } from './engine-cycle-solved.ts';
import type { WrittenCycle } from './engine-cycle-question.ts';

export type EntryPlaces = Partial<Record<EngineKey, Place>>;

/** The places of all entries that were read. */
export function placesOfEntries(read: EngineRead, context: Context): EntryPlaces {
  const places: EntryPlaces = {};
  for (const [key, found] of Object.entries(read)) {
    // The keys of what was read are those of the table.
    if (found) places[key as EngineKey] = context.place(found.entry.span);
  }
  return places;
}

const tables =
  'NIST-JANAF Thermochemical Tables, 4th edition (Chase 1998), fitted: enthalpies and entropies of all gases';
const limits = 'MARPOL Annex VI, regulation 13 (text of resolution MEPC.328(76))';

/** The working of one figure. */
export function cycleWorking(
  row: FigureRow,
  written: WrittenCycle,
  solved: SolvedCycleQuestion,
  places: EntryPlaces,
): Working {
  if (row.method === 'nitrogen-oxide-limit') {
    return {
      method: row.method,
      inputs: places.speed ? [{ label: 'rated speed', quantity: null, unit: 'rpm', place: places.speed }] : [],
      sources: [limits],
      assumptions: [],
    };
  }
  return {
    method: row.method,
    inputs: [...writtenInputs(written, places), ...ownInputs(row, solved)],
    sources: [...new Set([...written.fuel.stream.sources, ...written.oxidantStream.sources, tables])],
    assumptions: cycleAssumptions(solved),
  };
}

function writtenInputs(written: WrittenCycle, places: EntryPlaces): readonly WorkingInput[] {
  const input = (label: string, quantity: Quantity | null, unit: string, place: Place | undefined): WorkingInput[] =>
    quantity ? [{ label, quantity, unit, ...(place ? { place } : {}) }] : [];
  const { fuel, pilot } = written;
  return [
    ...input(`Enthalpy of ${fuel.material.name}, per kg`, fuel.stream.enthalpy, 'MJ/kg', places.fuel),
    ...input(`Lower heating value of ${fuel.material.name}`, fuel.lowerHeatingValue, 'MJ/kg', places.fuel),
    ...(pilot ? input(`Pilot, of all fuel by ${pilot.by}`, pilot.share, '%', places.pilot) : []),
    ...input('λ', written.lambda, '1', places.lambda),
    ...input('Compression ratio', written.compressionRatio, '1', places.compressionRatio),
    ...input('Pressure of the fresh gas', written.intakePressure, 'bar', places.boostPressure),
    ...input('Temperature of the fresh gas', written.intakeTemperature, 'degC', places.boostTemperature),
    ...input('Pressure behind the cylinder', written.exhaustPressure, 'bar', places.exhaustPressure),
    ...input('Limit of pressure', written.maximumFiringPressure, 'bar', places.maximumFiringPressure),
    ...input('Residual gas, by mass', written.residualShare, '%', places.residualGasShare),
    ...input('Heat to the walls, of the heating value', written.heatLoss, '%', places.heatLoss),
    ...input('Part of it that leaves while it burns', written.heatLossInCombustion, '%', places.heatLossInCombustion),
    ...input('Share of the fuel that burns', written.completeness, '%', places.combustionCompleteness),
    ...input('Frozen below', written.frozenBelow, 'degC', places.frozenBelow),
    ...input('Mechanical efficiency', written.mechanicalEfficiency, '%', places.mechanicalEfficiency),
  ];
}

function ownInputs(row: FigureRow, { engine }: SolvedCycleQuestion): readonly WorkingInput[] {
  const { cautious, cycles, charge } = engine;
  const { cycle } = cautious;
  const kelvin = (valueK: number): Quantity => quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
  const pascal = (valuePa: number): Quantity => quantityOf(valuePa, knownUnit('Pa').dimension);
  const points: readonly (readonly [string, number, number])[] = [
    ['1 filled', cycle.filled.temperatureK, cycle.filled.pressurePa],
    ['2 compressed', cycle.compressed.temperatureK, cycle.compressed.pressurePa],
    ['3 burnt', cycle.burnt.temperatureK, cycle.burnt.pressurePa],
    ['4 expanded', cycle.expanded.temperatureK, cycle.expanded.pressurePa],
    ['5 blown down', cycle.blownDown.temperatureK, cycle.blownDown.pressurePa],
  ];
  const corners = cycles.length > 1 ? cycles : [];
  return [
    ...points.flatMap(([name, temperatureK, pressurePa]) => [
      { label: `Temperature at ${name}`, quantity: kelvin(temperatureK), unit: 'K' },
      { label: `Pressure at ${name}`, quantity: pascal(pressurePa), unit: 'bar' },
    ]),
    ...(row.id.endsWith('efficiency') || row.id.endsWith('consumption')
      ? lossTree(charge, cautious).map(({ id, share }) => ({
          label: `Of the heating value: ${id.replaceAll('-', ' ')}`,
          quantity: quantityOf(share),
          unit: '%',
        }))
      : []),
    ...corners.map((solved) => ({
      label: `Brake work over the heating value, ${solved.cycle.corner.chemistry}, particles ${solved.cycle.corner.particles.replaceAll('-', ' ')}`,
      quantity: quantityOf(solved.cycle.balance.brakeWorkJ / charge.lowerHeatingValueJ),
      unit: '%',
    })),
    ...(row.method === 'exhaust-state'
      ? [
          {
            label: 'Condensed in the exhaust, by mass',
            quantity: quantityOf(exhaustMatter(cautious, charge.input.exhaustPressurePa).condensedMassShare),
            unit: '%',
          },
        ]
      : []),
  ];
}
