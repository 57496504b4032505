// The tables of an engine with pistons: its state points, where the heating value goes, the corners of its particles, what
// leaves it, and the diagram of pressure over volume. Each is worked out when somebody reads its rows.
// Invariant: column ids and units are the contract; a number that could not be had is null. Tables are those of the corner
// that counts; all corners stand beside each other in one of their own.

import { cyclePath, limitReached } from '../../core/engine/cycle-path.ts';
import { exhaustMatter, exhaustRows } from '../../core/engine/exhaust.ts';
import { lossTree, type LossId } from '../../core/engine/loss-tree.ts';
import type { SolvedEngine } from '../../core/engine/solved-engine.ts';
import { lazily } from '../lazily.ts';
import type { Column, Table } from '../scenario.ts';
import { isSlow } from './burn-products.ts';

type Row = Table['rows'][number];

export function cycleTables(engine: SolvedEngine): readonly Table[] {
  return [
    statesTable(engine),
    lossesTable(engine),
    ...(engine.cycles.length > 1 ? [cornersTable(engine)] : []),
    exhaustTable(engine),
    diagramTable(engine),
  ];
}

interface Point {
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly volumeM3: number;
  readonly enthalpyJ: number;
}

/** Energies per kg of fuel, of the whole content of the cylinder. */
function statesTable(engine: SolvedEngine): Table {
  const columns: readonly Column[] = [
    { id: 'state', label: 'State', unit: null },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'temperature', label: 'Temperature', unit: 'K' },
    { id: 'volume-ratio', label: 'Volume over clearance volume', unit: '1' },
    { id: 'enthalpy', label: 'Enthalpy, per kg of fuel', unit: 'MJ/kg' },
    { id: 'composition', label: 'Composition', unit: null },
  ];
  return lazyTable({ id: 'cycle-states', label: 'States of the cycle', columns }, () => {
    const { cycle, contentTimes } = engine.cautious;
    const { filled, compressed, burnt, expanded, cooled, blownDown } = cycle;
    const smallestM3 = compressed.volumeM3;
    const row = (
      name: string,
      point: Point,
      composition: string,
      ratio: number | null = point.volumeM3 / smallestM3,
    ): Row => [name, point.pressurePa / 1e5, point.temperatureK, ratio, point.enthalpyJ / 1e6, composition];
    const reached = limitReached(engine.charge, engine.cautious);
    const apartJ = expanded.apart?.enthalpyJ ?? 0;
    const { wallLossShare, wallLossInCombustion } = engine.charge.input;
    const hasLateLoss = wallLossShare > 0 && wallLossInCombustion < 1;
    const frozen = expanded.isFrozen ? 'frozen' : 'equilibrium';
    return [
      row('1 filled', filled, 'unburnt'),
      row('2 compressed', compressed, 'unburnt'),
      ...(reached?.kind === 'limit-reached'
        ? [row('3a limit of pressure reached', reached.state, 'equilibrium, part of the fuel')]
        : []),
      row('3 burnt', burnt, 'equilibrium'),
      row('4 expanded', expanded, frozen),
      ...(hasLateLoss
        ? [row('4a after the late heat loss', { ...cooled, enthalpyJ: cooled.enthalpyJ + apartJ }, 'frozen')]
        : []),
      row('5 blown down', { ...blownDown, enthalpyJ: blownDown.enthalpyJ + apartJ }, 'frozen', null),
      [
        '6 exhaust, mixed',
        engine.charge.input.exhaustPressurePa / 1e5,
        cycle.exhaustTemperatureK,
        null,
        (cycle.exhaustEnthalpyJ * contentTimes) / 1e6,
        'frozen',
      ],
    ];
  });
}

const lossLabels: Readonly<Record<LossId, string>> = {
  'brake-work': 'brake work',
  friction: 'friction and auxiliaries',
  'wall-heat': 'heat to the walls',
  'exhaust-sensible': 'sensible heat of the exhaust above 25 °C',
  'exhaust-latent': 'latent heat of vapours of metals and salts',
  'exhaust-chemical': 'dissociated and unreacted gas, short of the slate',
  'unburnt-fuel': 'unburnt fuel',
  'brought-in': 'brought in by fresh gas and fuel above 25 °C',
};

/** The rows add up to the heating value. */
function lossesTable(engine: SolvedEngine): Table {
  const columns: readonly Column[] = [
    { id: 'loss', label: 'Where the heating value goes', unit: null },
    { id: 'energy', label: 'Energy, per kg of fuel', unit: 'MJ/kg' },
    { id: 'share', label: 'of the lower heating value', unit: '1' },
  ];
  return lazyTable({ id: 'losses', label: 'Work and losses', columns }, () => {
    const rows = lossTree(engine.charge, engine.cautious);
    const totalJ = rows.reduce((sum, { joulePerKg }) => sum + joulePerKg, 0);
    return [
      ...rows.map(({ id, joulePerKg, share }): Row => [lossLabels[id], joulePerKg / 1e6, share]),
      ['lower heating value', totalJ / 1e6, totalJ / engine.charge.lowerHeatingValueJ],
    ];
  });
}

function cornersTable(engine: SolvedEngine): Table {
  const columns: readonly Column[] = [
    { id: 'chemistry', label: 'Composition', unit: null },
    { id: 'particles', label: 'Particles', unit: null },
    { id: 'brake-efficiency', label: 'Brake efficiency', unit: '1' },
    { id: 'indicated-efficiency', label: 'Indicated efficiency', unit: '1' },
    { id: 'exhaust-temperature', label: 'Exhaust', unit: 'K' },
    { id: 'condensed-share', label: 'Condensed in the exhaust, by mass', unit: '1' },
    { id: 'counts', label: '', unit: null },
  ];
  return lazyTable({ id: 'particle-corners', label: 'Limiting cases of particles and reactions', columns }, () =>
    engine.cycles.map((solved): Row => {
      const { corner, balance, exhaustTemperatureK } = solved.cycle;
      const { lowerHeatingValueJ, input } = engine.charge;
      return [
        corner.chemistry === 'frozen' ? 'frozen' : 'equilibrium',
        corner.particles === 'with-gas' ? 'at the temperature of the gas' : 'keep their heat',
        balance.brakeWorkJ / lowerHeatingValueJ,
        balance.indicatedWorkJ / lowerHeatingValueJ,
        exhaustTemperatureK,
        exhaustMatter(solved, input.exhaustPressurePa).condensedMassShare,
        solved === engine.cautious ? 'counts' : null,
      ];
    }),
  );
}

function exhaustTable(engine: SolvedEngine): Table {
  const columns: readonly Column[] = [
    { id: 'substance', label: 'Product', unit: null },
    { id: 'amount', label: 'Amount', unit: 'mol/kg' },
    { id: 'mass', label: 'Mass', unit: 'kg/kg' },
    { id: 'mass-share', label: 'by mass', unit: '1' },
    { id: 'wet-mole-share', label: 'by mole, wet gas', unit: '1' },
    { id: 'dry-mole-share', label: 'by mole, dry gas', unit: '1' },
    { id: 'reference-mole-share', label: 'by mole, dry, at 15 % O2', unit: '1' },
    { id: 'remark', label: 'Remark', unit: null },
  ];
  const rows = (keeps: (massShare: number, isGas: boolean) => boolean): Row[] => {
    const state = exhaustMatter(engine.cautious, engine.charge.input.exhaustPressurePa);
    return exhaustRows(state, engine.cautious.contentTimes)
      .filter(({ massShare, isGas }) => keeps(massShare, isGas))
      .map(({ phase, id, mol, massKg, massShare, wetMoleShare, dryMoleShare, shareAt15 }): Row => {
        const formula = state.candidates.phases[phase]?.formula;
        const remark = kinetic.has(id) ? 'kinetics decide' : formula && isSlow(formula) ? 'limit, not forecast' : null;
        return [id, mol, massKg, massShare, wetMoleShare, dryMoleShare, shareAt15, remark];
      });
  };
  const isShown = (massShare: number, isGas: boolean): boolean => massShare >= leastExhaustShare || !isGas;
  const table: Table & { readonly traces: readonly Row[] } = {
    id: 'exhaust',
    label: 'Exhaust behind the valve, per kg of fuel',
    columns,
    rows: [],
    traces: [],
  };
  return lazily(table, {
    rows: () => rows(isShown),
    traces: () => rows((massShare, isGas) => !isShown(massShare, isGas)),
  });
}

/** Below this share by mass a gas stands among the traces. */
const leastExhaustShare = 1e-5;

const kinetic = new Set(['NO(g)', 'NO2(g)', 'N2O(g)', 'CO(g)', 'H2(g)', 'OH(g)', 'SO3(g)', 'NH3(g)']);

function diagramTable(engine: SolvedEngine): Table {
  const columns: readonly Column[] = [
    { id: 'stroke', label: 'Stroke', unit: null },
    { id: 'volume-ratio', label: 'Volume over clearance volume', unit: '1' },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'temperature', label: 'Temperature', unit: 'K' },
    { id: 'condensed-share', label: 'Condensed, by mass', unit: '1' },
  ];
  return lazyTable({ id: 'diagram', label: 'Pressure over volume', columns }, () => {
    const path = cyclePath(engine.charge, engine.cautious, shownExpansion, shownCompression);
    const smallestM3 = engine.cautious.cycle.compressed.volumeM3;
    const row = (
      stroke: string,
      { volumeM3, pressurePa, temperatureK }: Omit<Point, 'enthalpyJ'>,
      condensed: number | null,
    ): Row => [stroke, volumeM3 / smallestM3, pressurePa / 1e5, temperatureK, condensed];
    return [
      ...path.compression.map((state) => row('compression', state, null)),
      ...path.expansion.map((state) => row('expansion', state, state.matter().condensedMassShare)),
    ];
  });
}

/** Points of the diagram that are told; in equal ratios of volume they are smooth enough to draw. */
const shownExpansion = 21;
const shownCompression = 11;

function lazyTable(table: Pick<Table, 'id' | 'label' | 'columns'>, rows: () => readonly Row[]): Table {
  return lazily<Table>({ ...table, rows: [] }, { rows });
}
