// The tables of a gas turbine: its state points, where the heating value goes, the corners of its particles, and what leaves
// it. Invariant: column ids and units are the contract; tables are those of the corner that counts, and all corners stand
// beside each other in one of their own.

import type { GasTurbineCycle } from '../../core/engine/turbine/gas-turbine.ts';
import type { SolvedTurbine } from '../../core/engine/turbine/solved-turbine.ts';
import type { Column, Table } from '../scenario.ts';
import { lazyTable, plantExhaustTable, plantLossTable, type Row } from './plant-tables.ts';

export function turbineTables(solved: SolvedTurbine): readonly Table[] {
  const { cautious, cycles } = solved;
  return [
    statesTable(cautious),
    plantLossTable(() => cautious.losses),
    ...(cycles.length > 1 ? [cornersTable(solved)] : []),
    // Amounts of the states are for the fuel of the first combustor, 1 kg of it.
    plantExhaustTable(() => cautious.exhaust.matter(), 1 / cautious.firstFuelShare),
  ];
}

interface Point {
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly enthalpyJ: number;
}

function statesTable(cycle: GasTurbineCycle): Table {
  const columns: readonly Column[] = [
    { id: 'state', label: 'State', unit: null },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'temperature', label: 'Temperature', unit: 'K' },
    { id: 'enthalpy', label: 'Enthalpy, per kg of fuel', unit: 'MJ/kg' },
    { id: 'composition', label: 'Composition', unit: null },
  ];
  return lazyTable({ id: 'turbine-states', label: 'States of the cycle', columns }, () => {
    const { compressor, combustorInlet, turbineInlet, beforeReheat, reheated, turbineOutlet, exhaust } = cycle;
    const { airKgPerKg, firstFuelShare } = cycle;
    const row = (name: string, point: Point, perFuel: number, composition: string): Row => [
      name,
      point.pressurePa / 1e5,
      point.temperatureK,
      (point.enthalpyJ * perFuel) / 1e6,
      composition,
    ];
    const air = (name: string, point: Point | null): Row[] => (point ? [row(name, point, airKgPerKg, 'air')] : []);
    const gas = (name: string, point: (Point & { readonly isFrozen?: boolean }) | null): Row[] =>
      point ? [row(name, point, firstFuelShare, point.isFrozen === true ? 'frozen' : 'equilibrium')] : [];
    return [
      ...air('1 inlet', compressor.inlet),
      ...air('1a before the intercooler', compressor.beforeCooler),
      ...air('1b behind the intercooler', compressor.behindCooler),
      ...air('2 behind the compressor', compressor.delivery),
      ...air('2x behind the recuperator', combustorInlet === compressor.delivery ? null : combustorInlet),
      ...gas('3 turbine inlet', turbineInlet),
      ...gas('3a before the reheat', beforeReheat),
      ...gas('3b behind the reheat', reheated),
      ...gas('4 behind the turbine', turbineOutlet),
      ...gas('5 as it leaves', exhaust === turbineOutlet ? null : exhaust),
    ];
  });
}

function cornersTable({ cycles, cautious }: SolvedTurbine): Table {
  const columns: readonly Column[] = [
    { id: 'chemistry', label: 'Composition', unit: null },
    { id: 'particles', label: 'Particles', unit: null },
    { id: 'brake-efficiency', label: 'Brake efficiency', unit: '1' },
    { id: 'net-efficiency', label: 'Net efficiency', unit: '1' },
    { id: 'exhaust-temperature', label: 'Exhaust', unit: 'K' },
    { id: 'condensed-share', label: 'Condensed in the exhaust, by mass', unit: '1' },
    { id: 'counts', label: '', unit: null },
  ];
  return lazyTable({ id: 'turbine-corners', label: 'Limiting cases of particles and reactions', columns }, () =>
    cycles.map((cycle): Row => {
      const { corner, brakeEfficiency, netEfficiency, exhaust } = cycle;
      return [
        corner.chemistry === 'frozen' ? 'frozen' : 'equilibrium',
        corner.particles === 'with-gas' ? 'at the temperature of the gas' : 'keep their heat',
        brakeEfficiency,
        netEfficiency,
        exhaust.temperatureK,
        exhaust.matter().condensedMassShare,
        cycle === cautious ? 'counts' : null,
      ];
    }),
  );
}
