// The way of the gas through a turbine from an inlet that is assumed: over both sections and the reheat between them to the
// outlet, and what the recuperator then makes of the air; with the energy that the inlet lacks.
// Knows no search for the inlet. Invariant: the energy lacking rises with the air and with the inlet's temperature.
// Source: first law over combustors; expansion ../expansion.ts.

import { findZero } from '../../equilibrium/bracket.ts';
import type { Equilibrium, NoEquilibrium } from '../../equilibrium/equilibrium.ts';
import { expansionFrom } from '../expansion.ts';
import type { Corner, Expansion, ExpandingState } from '../expansion.ts';
import type { MixtureState } from '../frozen-mixture.ts';
import type { ReactingCharge } from '../reacting-charge.ts';
import { recuperated } from './compressor-train.ts';
import type { CompressorTrain, GasTurbineCycle, GasTurbineInput, TurbineFault, TurbineStage } from './gas-turbine.ts';

/** Energy that may be missing in a combustor, over the heating value. */
export const closure = 1e-11;

/** What all corners share. */
export interface GasTurbine {
  readonly kind: 'turbine';
  readonly input: GasTurbineInput;
  readonly train: CompressorTrain;
  readonly reacting: ReactingCharge;
}

/** Of so much air and burnt fuel, mol. */
export function elementsOf(
  { air, fuel, completeness }: GasTurbineInput,
  airKg: number,
  fuelKg: number,
): ReadonlyMap<string, number> {
  const amounts = new Map([...air.elementMol].map(([symbol, mol]) => [symbol, (airKg / air.massKg) * mol]));
  for (const [symbol, mol] of fuel.elementMol) {
    amounts.set(symbol, (amounts.get(symbol) ?? 0) + completeness * fuelKg * mol);
  }
  return amounts;
}

/** The way of the gas from an assumed turbine inlet to the recuperator, for 1 kg of fuel in the first combustor. */
export interface Passage {
  readonly airKg: number;
  readonly inlet: Equilibrium;
  readonly beforeReheat: ExpandingState | null;
  readonly reheated: Equilibrium | null;
  readonly reheatFuelKg: number;
  /** Where the air does not suffice for the reheat asked for, the hottest that it makes; a search may pass there. */
  readonly reheatReachesK: number | null;
  readonly expansion: Expansion;
  readonly outlet: ExpandingState;
  readonly combustorInlet: MixtureState;
  /** J more than there is; rises with air and with the temperature. */
  readonly lackingJ: number;
}

export type Found = { readonly kind: 'found'; readonly passage: Passage } | TurbineFault;

/** From the turbine inlet on. */
export function downstream(
  turbine: GasTurbine,
  corner: Corner,
  airKg: number,
  inlet: Equilibrium,
  near: Passage | GasTurbineCycle | undefined,
): Found {
  const { input, train, reacting } = turbine;
  const { reheat, exhaustLossShare, ambientPressurePa } = input;
  const endPa = ambientPressurePa / (1 - exhaustLossShare);
  let expansion = expansionFrom(reacting.withAmounts(elementsOf(input, airKg, 1)), inlet, corner, input.frozenBelowK);
  let beforeReheat: ExpandingState | null = null;
  let reheated: Equilibrium | null = null;
  let reheatFuelKg = 0;
  let reheatReachesK: number | null = null;
  if (reheat !== null) {
    const middlePa = inlet.pressurePa / (reheat.firstRatio ?? Math.sqrt(inlet.pressurePa / endPa));
    const middle = expanded(expansion, middlePa, input.turbineEfficiency);
    if (middle.kind === 'none') return noState('turbine', middle);
    beforeReheat = middle;
    const second = reheatedTo(turbine, airKg, middle, reheat.temperatureK);
    if (second.kind === 'fault') return second;
    reheated = second.state;
    reheatFuelKg = second.fuelKg;
    reheatReachesK = second.isShort ? second.state.temperatureK : null;
    const more = reacting.withAmounts(elementsOf(input, airKg, 1 + reheatFuelKg));
    expansion = expansionFrom(more, reheated, corner, input.frozenBelowK);
  }
  const nearOutlet = near === undefined ? undefined : 'outlet' in near ? near.outlet : undefined;
  const outlet = expanded(expansion, endPa, input.turbineEfficiency, nearOutlet);
  if (outlet.kind === 'none') return noState('turbine', outlet);
  const combustorInlet = recuperated(train.delivery, outlet.temperatureK, input.recuperatorEffectiveness);
  if (combustorInlet.kind === 'fault') return combustorInlet;
  return {
    kind: 'found',
    passage: {
      airKg,
      inlet,
      beforeReheat,
      reheated,
      reheatFuelKg,
      reheatReachesK,
      expansion,
      outlet,
      combustorInlet,
      lackingJ: inlet.enthalpyJ - airKg * combustorInlet.enthalpyJ - fuelGivesJ(input),
    },
  };
}

/** Through a section of the turbine: the drop of enthalpy is its efficiency times that at constant entropy. */
function expanded(
  expansion: Expansion,
  pressurePa: number,
  efficiency: number,
  near?: ExpandingState,
): ExpandingState | NoEquilibrium {
  const { start } = expansion;
  const ideal = expansion.to({ held: 'entropy-pressure', entropyJPerK: start.entropyJPerK, pressurePa }, near);
  if (ideal.kind === 'none' || efficiency === 1) return ideal;
  const enthalpyJ = start.enthalpyJ - efficiency * (start.enthalpyJ - ideal.enthalpyJ);
  return expansion.to({ held: 'enthalpy-pressure', enthalpyJ, pressurePa }, ideal);
}

interface Reheat {
  readonly kind: 'reheated';
  readonly state: Equilibrium;
  readonly fuelKg: number;
  readonly isShort: boolean;
}

/** As much more fuel as makes the gas as hot as asked, for 1 kg burnt before; or as the air allows, which is then short. */
function reheatedTo(
  { input, reacting }: GasTurbine,
  airKg: number,
  from: ExpandingState,
  temperatureK: number,
): Reheat | TurbineFault {
  const { fuel, completeness, combustorLossShare, stoichiometricAirKgPerKg } = input;
  if (!(from.temperatureK < temperatureK)) return { kind: 'fault', reason: 'cold-reheat', fromK: from.temperatureK };
  const pressurePa = from.pressurePa * (1 - combustorLossShare);
  const givenJPerKg = fuelGivesJ(input);
  const chargeOf = (fuelKg: number): ReactingCharge => reacting.withAmounts(elementsOf(input, airKg, 1 + fuelKg));
  const most = Math.max(0, airKg / (stoichiometricAirKgPerKg * completeness) - 1);
  const enthalpyJ = from.enthalpyJ + most * givenJPerKg;
  const hottest = chargeOf(most).burnt({ held: 'enthalpy-pressure', enthalpyJ, pressurePa });
  if (hottest.kind === 'none') return noState('reheat', hottest);
  if (hottest.temperatureK < temperatureK) return { kind: 'reheated', state: hottest, fuelKg: most, isShort: true };
  let why: NoEquilibrium | undefined;
  interface Tried {
    readonly state: Equilibrium;
    readonly fuelKg: number;
    readonly surplusJ: number;
  }
  const end = findZero<Tried>(
    {
      stateAt: (fuelKg, near) => {
        const held = { held: 'temperature-pressure', temperatureK, pressurePa } as const;
        const state = chargeOf(fuelKg).burnt(held, near?.state ?? hottest);
        if (state.kind === 'none') {
          why = state;
          return undefined;
        }
        return { state, fuelKg, surplusJ: from.enthalpyJ + fuelKg * givenJPerKg - state.enthalpyJ };
      },
      valueOf: ({ surplusJ }) => surplusJ,
      // Most of the heating value is left to warm the gas, the fuel's own products take the rest.
      slopeOf: () => 0.9 * completeness * fuel.lowerHeatingValueJ,
      nearEnough: closure * fuel.lowerHeatingValueJ,
    },
    [0, most],
    0.5 * most,
  );
  if (end.kind === 'root')
    return { kind: 'reheated', state: end.state.state, fuelKg: end.state.fuelKg, isShort: false };
  if (end.kind === 'jump') return { kind: 'reheated', state: end.low.state, fuelKg: end.low.fuelKg, isShort: false };
  // Reactions that went on as the gas was reheated to less than asked: it is hotter without any more fuel.
  if (end.kind === 'below') return { kind: 'fault', reason: 'cold-reheat', fromK: from.temperatureK };
  const failed: NoEquilibrium = {
    kind: 'none',
    reason: 'not-converged',
    detail: JSON.stringify({ temperatureK, airKg }),
  };
  return noState('reheat', why ?? failed);
}

/** What 1 kg of fuel brings into a combustor, its loss taken out. */
export function fuelGivesJ({ fuel, completeness, wallLossShare }: GasTurbineInput): number {
  return completeness * fuel.enthalpyJ - wallLossShare * fuel.lowerHeatingValueJ;
}

export function combustorPressurePa({ combustorLossShare }: GasTurbineInput, { delivery }: CompressorTrain): number {
  return delivery.pressurePa * (1 - combustorLossShare);
}

export function noState(stage: TurbineStage, why: NoEquilibrium): TurbineFault {
  return { kind: 'fault', reason: 'no-state', stage, why };
}
