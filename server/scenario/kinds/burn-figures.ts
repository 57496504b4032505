// The figures of a burn: one row each, with what it reads of the solved states. Values are there once the states are; the
// uncertainty of a figure, by slopes or by a burn more on either side of each uncertain input, is worked out when its
// quantity is read. Knows no entries and no tables. Invariant: a figure that cannot be had is not there, never a number.
// Method of the uncertainty: to first order, by the slopes of the converged states where there are some
// (burn-uncertainty.ts), else with states solved anew (quantity/uncertainty.ts).

import { gasOfState } from '../../core/burn/gas-of-state.ts';
import { prepareBurn } from '../../core/burn/prepare-burn.ts';
import { peakGases } from '../../core/burn/products.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate, type Propagated } from '../../core/quantity/uncertainty.ts';
import { lazily } from '../lazily.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Figure } from '../scenario.ts';
import type { Working } from '../working.ts';
import type { BurnQuestion } from './burn-question.ts';
import { longestBurnOutS } from './burn-out-times.ts';
import { solvedBurn, type AskedOfBurn, type SolvedBurn } from './burn-solved.ts';
import { carbonateShare } from './burn-tables.ts';
import { partsBySlope } from './burn-uncertainty.ts';

/** Which states a figure needs: those of one group are solved together. */
type Group = 'flame' | 'zone' | 'slate' | 'exhaust' | 'burn-out';

interface BurnFigureRow extends FigureRow {
  readonly group: Group;
  readonly value: (solved: SolvedBurn) => number | null;
}

/** Every figure a burn may have. Ids and units are the contract: they never change. */
export const burnFigures = [
  row(
    'flame',
    'flame-temperature',
    'Flame temperature, of the whole charge',
    'K',
    'flame-temperature',
    ({ flame }) => flame.temperatureK,
  ),
  row(
    'zone',
    'flame-zone-temperature',
    'Temperature of the flame zone',
    'K',
    'zone-temperature',
    ({ zone }) => zone()?.temperatureK ?? null,
  ),
  row('flame', 'pressure', 'Pressure in the flame', 'bar', 'flame-pressure', ({ flame }) => flame.pressurePa),
  row(
    'flame',
    'condensed-share',
    'Condensed products in the flame, by mass',
    '1',
    'condensed-share',
    ({ flame }) => flame.condensedMassShare,
  ),
  row('flame', 'excess-air-ratio', 'Excess-air ratio λ', '1', 'excess-air', ({ burn }) => burn.charge.lambda),
  row(
    'flame',
    'oxidant-fuel-ratio',
    'Oxidant, per kg of fuel',
    'kg/kg',
    'excess-air',
    ({ burn }) => burn.charge.oxidantKgPerKg,
  ),
  row(
    'flame',
    'gas-molar-mass',
    'Gas in the flame, molar mass',
    'g/mol',
    'flame-gas',
    ({ flame }) => gasOfState(flame)?.molarMassKgPerMol ?? null,
  ),
  row(
    'flame',
    'gas-heat-capacity',
    'Gas in the flame, heat capacity at constant composition, per kg of gas',
    'kJ/(kg K)',
    'flame-gas',
    ({ flame }) => gasOfState(flame)?.heatCapacityJPerKgK ?? null,
  ),
  row(
    'flame',
    'frozen-heat-capacity',
    'All products, heat capacity at constant composition, per kg of products',
    'kJ/(kg K)',
    'flame-heat-capacity',
    ({ flame }) => flame.frozenHeatCapacityJPerK / flame.massKg,
  ),
  row(
    'flame',
    'heat-capacity',
    'All products, heat capacity with the reactions following, per kg of products',
    'kJ/(kg K)',
    'flame-heat-capacity',
    ({ flame }) => (flame.heatCapacityJPerK === null ? null : flame.heatCapacityJPerK / flame.massKg),
  ),
  row(
    'flame',
    'frozen-gamma',
    'Ratio of heat capacities at constant composition',
    '1',
    'flame-gamma',
    ({ flame }) => flame.frozenGamma,
  ),
  row(
    'flame',
    'gamma',
    'Isentropic exponent with the reactions following',
    '1',
    'flame-gamma',
    ({ flame }) => flame.gamma,
  ),
  row(
    'flame',
    'speed-of-sound',
    'Speed of sound, condensed products moving with the gas',
    'm/s',
    'speed-of-sound',
    ({ flame }) => flame.speedOfSoundMPerS,
  ),
  row(
    'flame',
    'carbonate-carbon-share',
    'Carbon held in carbonate, in the flame',
    '1',
    'carbonate-share',
    ({ flame }) => carbonateShare(flame),
  ),
  row(
    'slate',
    'heat-released',
    'Heat released down to 25 °C, per kg of fuel',
    'MJ/kg',
    'heat-released',
    ({ slate }) => slate()?.releasedJ ?? null,
  ),
  row(
    'slate',
    'preheat',
    'Heat brought in over 25 °C by fuel and oxidant, per kg of fuel',
    'MJ/kg',
    'preheat',
    ({ slate }) => slate()?.preheatJ ?? null,
  ),
  row(
    'slate',
    'released-share',
    'Heat released down to 25 °C less preheat, over the lower heating value',
    '1',
    'heat-released',
    ({ slate }) => slate()?.shareOfHeatingValue ?? null,
  ),
  row(
    'exhaust',
    'heat-above-exhaust',
    'Heat released above exhaust temperature, per kg of fuel',
    'MJ/kg',
    'heat-above-exhaust',
    ({ heatAboveJ }) => heatAboveJ(),
  ),
  row(
    'flame',
    'nitric-oxide-share',
    'NO if it froze in the flame, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
    ({ flame }) => peakShare(flame, 'NO(g)'),
  ),
  row(
    'flame',
    'carbon-monoxide-share',
    'CO if it froze in the flame, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
    ({ flame }) => peakShare(flame, 'CO(g)'),
  ),
  row(
    'zone',
    'flame-zone-nitric-oxide-share',
    'NO if it froze in the flame zone, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
    ({ zone }) => peakShare(zone(), 'NO(g)'),
  ),
  row(
    'zone',
    'flame-zone-carbon-monoxide-share',
    'CO if it froze in the flame zone, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
    ({ zone }) => peakShare(zone(), 'CO(g)'),
  ),
  row(
    'burn-out',
    'burn-out-time',
    'Burn-out time of a single droplet or particle, the longest of all portions',
    'ms',
    'burn-out',
    ({ burnOuts }) => longestBurnOutS(burnOuts()),
  ),
] as const satisfies readonly BurnFigureRow[];

function row(
  group: Group,
  id: string,
  label: string,
  unit: string,
  method: FigureRow['method'],
  value: BurnFigureRow['value'],
): BurnFigureRow {
  return { group, id, label, unit, method, value };
}

function peakShare(state: Equilibrium | null, id: string): number | null {
  return (state && peakGases(state).find((gas) => gas.id === id)?.dryMoleShare) ?? null;
}

/** The figures that can be had of a solved burn; `workingOf` tells how one came about. */
export function figuresOf(
  solved: SolvedBurn,
  question: BurnQuestion,
  asked: AskedOfBurn,
  workingOf: (row: FigureRow) => Working,
): readonly Figure[] {
  const uncertain = new Map<Group, ReadonlyMap<string, Propagated>>();
  const propagatedOf = (row: BurnFigureRow): Propagated | undefined => {
    const known = uncertain.get(row.group) ?? propagateGroup(row.group, solved, question, asked);
    uncertain.set(row.group, known);
    return known.get(row.id);
  };
  return burnFigures.flatMap((row: BurnFigureRow): Figure[] => {
    const value = row.value(solved);
    if (value === null || !Number.isFinite(value)) return [];
    const { id, label, unit, method } = row;
    const plain = figureQuantity(value, unit);
    const figure: Figure = {
      id,
      label,
      quantity: plain,
      unit,
      working: { method, inputs: [], sources: [], assumptions: [] },
    };
    return [
      lazily(figure, {
        quantity: () => ({
          ...plain,
          parts: partsBySlope(id, solved, question) ?? propagatedOf(row)?.parts ?? plain.parts,
        }),
        working: () => workingOf(row),
      }),
    ];
  });
}

function figureQuantity(value: number, unit: string): Quantity {
  const kind = unit === 'K' ? 'temperature' : 'plain';
  return quantityOf(value, knownUnit(unit).dimension, undefined, kind);
}

/** The figures of a group with their uncertainty; the values as they are come from the burn that is solved already. */
function propagateGroup(
  group: Group,
  solved: SolvedBurn,
  { quantities, input, asked: askedAt }: BurnQuestion,
  asked: AskedOfBurn,
): ReadonlyMap<string, Propagated> {
  const rows = burnFigures.filter((row) => row.group === group);
  const centre = quantities.map(({ value }) => value);
  const outcomes = propagate(quantities, (values) => {
    const isCentre = values.every((value, index) => Object.is(value, centre[index]));
    const states = isCentre ? solved : solveAt(input(values), { ...asked, ...askedAt(values) });
    return rows.map(({ value }) => (states && value(states)) ?? NaN);
  });
  return new Map(rows.flatMap(({ id }, index) => (outcomes[index] ? [[id, outcomes[index]]] : [])));
}

function solveAt(input: ReturnType<BurnQuestion['input']>, asked: AskedOfBurn): SolvedBurn | null {
  const burn = prepareBurn(input);
  if (burn.kind === 'fault') return null;
  const flame = burn.flame();
  return flame.kind === 'equilibrium' ? solvedBurn(burn, flame, asked) : null;
}
