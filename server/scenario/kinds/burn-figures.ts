// The figures of a burn: one row each, with what it reads of the states. Values are there once the states are; the
// uncertainty of a figure is worked out when its quantity is read. Knows no entries and no tables.
// Invariant: a figure that cannot be had is not there, never a number.
// Method of the uncertainty: to first order, by the slopes of the converged states (burn-uncertainty.ts); where these are not
// known, by burns solved anew on either side of each uncertain input (quantity/uncertainty.ts).

import { gasOfState } from '../../core/burn/gas-of-state.ts';
import type { MatterState } from '../../core/burn/burn.ts';
import { prepareBurn } from '../../core/burn/prepare-burn.ts';
import { amountOf, peakGases } from '../../core/burn/products.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import type { Parts } from '../../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate, type Propagated } from '../../core/quantity/uncertainty.ts';
import { lazily } from '../lazily.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Figure } from '../scenario.ts';
import type { Working } from '../working.ts';
import type { BurnQuestion } from './burn-question.ts';
import { longestBurnOutS } from './burn-out-times.ts';
import { readingsOf, solvedBurn, type AskedOfBurn, type BurnReadings, type SolvedBurn } from './burn-solved.ts';
import { carbonateShare } from './burn-tables.ts';
import { partsBySlope } from './burn-uncertainty.ts';
import { answerAt } from './kept-answer.ts';

/** Which states a figure needs: where states are solved anew, those of one group are solved together. */
type Group = 'flame' | 'zone' | 'slate' | 'exhaust' | 'burn-out';

interface BurnFigureRow extends FigureRow {
  readonly group: Group;
  readonly value: (readings: BurnReadings) => number | null;
}

/** Every figure a burn may have. Ids and units are the contract: they never change. */
export const burnFigures = [
  row(
    'flame',
    'flame-temperature',
    'Flame temperature, of the whole charge',
    'K',
    'flame-temperature',
    ({ flame }) => flame()?.temperatureK ?? null,
  ),
  row(
    'zone',
    'flame-zone-temperature',
    'Temperature of the flame zone',
    'K',
    'zone-temperature',
    ({ zone }) => zone()?.temperatureK ?? null,
  ),
  row(
    'flame',
    'pressure',
    'Pressure in the flame',
    'bar',
    'flame-pressure',
    ({ flame }) => flame()?.pressurePa ?? null,
  ),
  row(
    'flame',
    'condensed-share',
    'Condensed products in the flame, by mass',
    '1',
    'condensed-share',
    ({ flame }) => flame()?.condensedMassShare ?? null,
  ),
  row('flame', 'excess-air-ratio', 'Excess-air ratio λ', '1', 'excess-air', ({ charge }) => charge.lambda),
  row(
    'flame',
    'oxidant-fuel-ratio',
    'Oxidant, per kg of fuel',
    'kg/kg',
    'excess-air',
    ({ charge }) => charge.oxidantKgPerKg,
  ),
  row('flame', 'gas-molar-mass', 'Gas in the flame, molar mass', 'g/mol', 'flame-gas', ({ flame }) =>
    of(flame(), (state) => gasOfState(state)?.molarMassKgPerMol ?? null),
  ),
  row(
    'flame',
    'gas-heat-capacity',
    'Gas in the flame, heat capacity at constant composition, per kg of gas',
    'kJ/(kg K)',
    'flame-gas',
    ({ flame }) => of(flame(), (state) => gasOfState(state)?.heatCapacityJPerKgK ?? null),
  ),
  row(
    'flame',
    'frozen-heat-capacity',
    'All products, heat capacity at constant composition, per kg of products',
    'kJ/(kg K)',
    'flame-heat-capacity',
    ({ flame }) => of(flame(), ({ frozenHeatCapacityJPerK, massKg }) => frozenHeatCapacityJPerK / massKg),
  ),
  row(
    'flame',
    'heat-capacity',
    'All products, heat capacity with the reactions following, per kg of products',
    'kJ/(kg K)',
    'flame-heat-capacity',
    ({ flame, response }) => {
      const [state, capacityJPerK] = [flame(), response()?.heatCapacityJPerK ?? null];
      return state && capacityJPerK !== null ? capacityJPerK / state.massKg : null;
    },
  ),
  row(
    'flame',
    'frozen-gamma',
    'Ratio of heat capacities at constant composition',
    '1',
    'flame-gamma',
    ({ flame }) => flame()?.frozenGamma ?? null,
  ),
  row(
    'flame',
    'gamma',
    'Isentropic exponent with the reactions following',
    '1',
    'flame-gamma',
    ({ response }) => response()?.gamma ?? null,
  ),
  row(
    'flame',
    'speed-of-sound',
    'Speed of sound, condensed products moving with the gas',
    'm/s',
    'speed-of-sound',
    ({ response }) => response()?.speedOfSoundMPerS ?? null,
  ),
  row(
    'flame',
    'carbonate-carbon-share',
    'Carbon held in carbonate, in the flame',
    '1',
    'carbonate-share',
    ({ flame }) => of(flame(), carbonateShare),
  ),
  row(
    'slate',
    'heat-released',
    'Heat released down to 25 °C, per kg of fuel',
    'MJ/kg',
    'heat-released',
    ({ heat }) => heat()?.releasedJ ?? null,
  ),
  row(
    'slate',
    'preheat',
    'Heat brought in over 25 °C by fuel and oxidant, per kg of fuel',
    'MJ/kg',
    'preheat',
    ({ heat }) => heat()?.preheatJ ?? null,
  ),
  row(
    'slate',
    'released-share',
    'Heat released down to 25 °C less preheat, over the lower heating value (that has water as vapour)',
    '1',
    'heat-released',
    ({ heat }) => heat()?.shareOfHeatingValue ?? null,
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
    ({ flame }) => peakShare(flame(), 'NO(g)'),
  ),
  row(
    'flame',
    'carbon-monoxide-share',
    'CO if it froze in the flame, by mole, dry (order of magnitude, kinetics decide)',
    '1',
    'peak-gas',
    ({ flame }) => peakShare(flame(), 'CO(g)'),
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
    ({ burnOuts }) => longestBurnOutS(burnOuts() ?? []),
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

function of(state: MatterState | null, read: (state: MatterState) => number | null): number | null {
  return state && read(state);
}

function peakShare(state: MatterState | null, id: string): number | null {
  return (state && peakGases(state).find((gas) => gas.id === id)?.dryMoleShare) ?? null;
}

/** The figures that can be had of a solved burn; `workingOf` tells how one came about. */
export function figuresOf(
  solved: SolvedBurn,
  question: BurnQuestion,
  asked: AskedOfBurn,
  workingOf: (row: FigureRow) => Working,
): readonly Figure[] {
  const readings = readingsOf(solved);
  const bySlope = partsBySlope(solved, question, asked);
  const anew = new Map<Group, ReadonlyMap<string, Propagated>>();
  const partsAnew = (row: BurnFigureRow): Parts | undefined => {
    const known = anew.get(row.group) ?? propagateGroup(row.group, solved, question, asked);
    anew.set(row.group, known);
    return known.get(row.id)?.parts;
  };
  return burnFigures.flatMap((row: BurnFigureRow): Figure[] => {
    const value = row.value(readings);
    if (value === null || !Number.isFinite(value)) return [];
    const { id, unit, method } = row;
    const plain = figureQuantity(value, unit);
    const figure: Figure = {
      id,
      label: labelOf(row, solved),
      quantity: plain,
      unit,
      working: { method, inputs: [], sources: [], assumptions: [] },
    };
    return [
      lazily(figure, {
        quantity: () => ({ ...plain, parts: bySlope(row.value) ?? partsAnew(row) ?? plain.parts }),
        working: () => workingOf(row),
      }),
    ];
  });
}

/** What is made of the heat of condensation: a heating value leaves water as vapour, the products at 25 °C may not. */
function labelOf({ id, label }: FigureRow, { slate }: SolvedBurn): string {
  const state = id === 'heat-released' || id === 'released-share' ? slate()?.slate : undefined;
  if (!state?.candidates.elements.includes('H')) return label;
  const isCondensed = ['H2O(l)', 'H2O(cr)'].some((water) => amountOf(state, water) > 0);
  return `${label}, ${isCondensed ? 'water condensed as far as it does' : 'water as vapour'}`;
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
  const at = answerAt(quantities, solved, (values) => solveAt(input(values), { ...asked, ...askedAt(values) }));
  const outcomes = propagate(quantities, (values) => {
    const states = at(values);
    const readings = states && readingsOf(states);
    return rows.map(({ value }) => (readings && value(readings)) ?? NaN);
  });
  return new Map(rows.flatMap(({ id }, index) => (outcomes[index] ? [[id, outcomes[index]]] : [])));
}

function solveAt(input: ReturnType<BurnQuestion['input']>, asked: AskedOfBurn): SolvedBurn | null {
  const burn = prepareBurn(input);
  if (burn.kind === 'fault') return null;
  const flame = burn.flame();
  return flame.kind === 'equilibrium' ? solvedBurn(burn, flame, asked) : null;
}
