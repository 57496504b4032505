// The turbine inlet that a gas turbine comes to: with its air given, the temperature; with its temperature given, the air. With
// a recuperator either depends on the exhaust that it makes, without one on the combustor alone.
// Knows no works and no losses. Invariant: the combustor's energy balances to `closure` of the heating value.
// The search: for the energy that the inlet lacks to be none, in the mass of air or in the enthalpy of the air that a
// recuperator gives (it rises with either), bracketed, by Newton's step with the slope of the air alone.

import { findZero } from '../../equilibrium/bracket.ts';
import type { RisingEnd } from '../../equilibrium/bracket.ts';
import type { Equilibrium, NoEquilibrium } from '../../equilibrium/equilibrium.ts';
import type { Corner } from '../expansion.ts';
import type { GasTurbineCycle, TurbineFault } from './gas-turbine.ts';
import { closure, combustorPressurePa, downstream, elementsOf, fuelGivesJ, noState } from './turbine-passage.ts';
import type { Found, GasTurbine, Passage } from './turbine-passage.ts';

/** The passage that balances. `near`: a cycle of the same turbine in another corner. */
export function passageFor(turbine: GasTurbine, corner: Corner, near: GasTurbineCycle | undefined): Found {
  const { amount, recuperatorEffectiveness } = turbine.input;
  if (recuperatorEffectiveness === null) {
    const found = near === undefined ? inletAlone(turbine) : sameInlet(near);
    return found.kind === 'fault' ? found : downstream(turbine, corner, found.airKg, found.inlet, near);
  }
  return amount.by === 'mass'
    ? byAirTemperature(turbine, corner, amount.airKgPerKg, recuperatorEffectiveness, near)
    : byAir(turbine, corner, amount.temperatureK, near);
}

interface Inlet {
  readonly kind: 'inlet';
  /** Per kg of fuel in the first combustor. */
  readonly airKg: number;
  readonly inlet: Equilibrium;
}

/** Without a recuperator nothing behind the combustor acts back on it, so all corners have one inlet. */
function sameInlet({ airKgPerKg, firstFuelShare, turbineInlet }: GasTurbineCycle): Inlet {
  return { kind: 'inlet', airKg: airKgPerKg / firstFuelShare, inlet: turbineInlet };
}

function inletAlone(turbine: GasTurbine): Inlet | TurbineFault {
  const { input, train } = turbine;
  const { amount } = input;
  if (amount.by === 'mass') {
    const state = inletByEnthalpy(turbine, amount.airKgPerKg, train.delivery.enthalpyJ);
    return state.kind === 'none' ? noState('combustor', state) : inletOf(amount.airKgPerKg, state);
  }
  const leastKg = leastAirKg(turbine);
  const airJ = train.delivery.enthalpyJ;
  const hottest = inletByEnthalpy(turbine, leastKg, airJ);
  if (hottest.kind === 'none') return noState('combustor', hottest);
  if (hottest.temperatureK < amount.temperatureK) return notHotEnough(hottest);
  const hotAirJ = airEnthalpyJ(turbine, amount.temperatureK);
  if (typeof hotAirJ !== 'number') return noState('combustor', hotAirJ);
  if (!(hotAirJ > airJ)) return { kind: 'fault', reason: 'cold-inlet', airK: train.delivery.temperatureK };
  let why: NoEquilibrium | undefined;
  interface Tried {
    readonly airKg: number;
    readonly state: Equilibrium;
  }
  const end = findZero<Tried>(
    {
      stateAt: (airKg, near) => {
        const state = inletByTemperature(turbine, airKg, amount.temperatureK, near?.state ?? hottest);
        if (state.kind === 'equilibrium') return { airKg, state };
        why = state;
        return undefined;
      },
      valueOf: ({ airKg, state }) => state.enthalpyJ - airKg * airJ - fuelGivesJ(input),
      slopeOf: () => hotAirJ - airJ,
      nearEnough: closure * input.fuel.lowerHeatingValueJ,
    },
    [leastKg, mostAir * leastKg],
    3 * leastKg,
  );
  const nearest = nearestOf(end);
  return nearest ? inletOf(nearest.airKg, nearest.state) : notConverged(turbine, why);
}

/** With a recuperator and the air given. */
function byAirTemperature(
  turbine: GasTurbine,
  corner: Corner,
  airKg: number,
  effectiveness: number,
  near: GasTurbineCycle | undefined,
): Found {
  const { input, train } = turbine;
  const { delivery, inlet: drawnIn } = train;
  const hottestJ = airEnthalpyJ(turbine, hottestAirK);
  if (typeof hottestJ !== 'number') return noState('recuperator', hottestJ);
  let fault: TurbineFault | undefined;
  const end = findZero<Passage>(
    {
      stateAt: (airJ, nearby) => {
        const inlet = inletByEnthalpy(turbine, airKg, airJ, nearby?.inlet ?? near?.turbineInlet);
        const passage =
          inlet.kind === 'none'
            ? noState('combustor', inlet)
            : downstream(turbine, corner, airKg, inlet, nearby ?? near);
        if (passage.kind === 'found') return passage.passage;
        fault = passage;
        return undefined;
      },
      valueOf: ({ lackingJ }) => lackingJ,
      slopeOf: ({ inlet, outlet }) => {
        const taken = effectiveness * (outlet.temperatureK / inlet.temperatureK);
        const airJPerK = airKg * delivery.heatCapacityJPerK;
        return airKg * (1 - (taken * airJPerK) / Math.max(inlet.frozenHeatCapacityJPerK, airJPerK));
      },
      nearEnough: closure * input.fuel.lowerHeatingValueJ,
    },
    [drawnIn.enthalpyJ, hottestJ],
    near?.combustorInlet.enthalpyJ ?? delivery.enthalpyJ,
  );
  const passage = nearestOf(end);
  return passage ? { kind: 'found', passage } : (fault ?? notConverged(turbine, undefined));
}

/** With a recuperator and the temperature given. */
function byAir(turbine: GasTurbine, corner: Corner, inletK: number, near: GasTurbineCycle | undefined): Found {
  const { input } = turbine;
  let fault: TurbineFault | undefined;
  const tried = (airKg: number, nearby: Passage | undefined): Passage | undefined => {
    const inlet = inletByTemperature(turbine, airKg, inletK, nearby?.inlet ?? near?.turbineInlet);
    const passage =
      inlet.kind === 'none' ? noState('combustor', inlet) : downstream(turbine, corner, airKg, inlet, nearby ?? near);
    if (passage.kind === 'found') return passage.passage;
    fault = passage;
    return undefined;
  };
  const leastKg = leastAirKg(turbine);
  const atLeast = tried(leastKg, undefined);
  if (atLeast === undefined) return fault ?? notConverged(turbine, undefined);
  const { combustorInlet } = atLeast;
  if (atLeast.lackingJ > 0) {
    const hottest = inletByEnthalpy(turbine, leastKg, combustorInlet.enthalpyJ);
    return hottest.kind === 'none' ? noState('combustor', hottest) : notHotEnough(hottest);
  }
  const hotAirJ = airEnthalpyJ(turbine, inletK);
  if (typeof hotAirJ !== 'number') return noState('combustor', hotAirJ);
  if (!(hotAirJ > combustorInlet.enthalpyJ)) {
    return { kind: 'fault', reason: 'cold-inlet', airK: combustorInlet.temperatureK };
  }
  const end = findZero<Passage>(
    {
      stateAt: (airKg, nearby) => tried(airKg, nearby),
      valueOf: ({ lackingJ }) => lackingJ,
      // Of air that comes from the recuperator and leaves at the inlet's temperature.
      slopeOf: ({ combustorInlet: air }) => hotAirJ - air.enthalpyJ,
      nearEnough: closure * input.fuel.lowerHeatingValueJ,
    },
    [leastKg, mostAir * leastKg],
    near === undefined ? 3 * leastKg : near.airKgPerKg / near.firstFuelShare,
  );
  const passage = nearestOf(end);
  return passage ? { kind: 'found', passage } : (fault ?? notConverged(turbine, undefined));
}

/** Of air from a recuperator: above any exhaust's. */
const hottestAirK = 3500;
/** Times the least: warmer than the air by a kelvin or two. */
const mostAir = 2000;

function leastAirKg({ input }: GasTurbine): number {
  return input.stoichiometricAirKgPerKg * input.completeness;
}

/** A root; or, where a phase change holds the temperature, the nearer of its two sides. */
function nearestOf<State>(end: RisingEnd<State>): State | undefined {
  if (end.kind === 'root') return end.state;
  if (end.kind !== 'jump') return undefined;
  return -end.lowValue < end.highValue ? end.low : end.high;
}

function inletOf(airKg: number, inlet: Equilibrium): Inlet {
  return { kind: 'inlet', airKg, inlet };
}

/** J of 1 kg of air at the compressor's delivery pressure. */
function airEnthalpyJ({ train }: GasTurbine, temperatureK: number): number | NoEquilibrium {
  const { mixture, pressurePa } = train.delivery;
  const state = mixture.solve({ held: 'temperature-pressure', temperatureK, pressurePa });
  return state.kind === 'none' ? state : state.enthalpyJ;
}

function inletByEnthalpy(
  { input, train, reacting }: GasTurbine,
  airKg: number,
  airJ: number,
  near?: Equilibrium,
): Equilibrium | NoEquilibrium {
  const enthalpyJ = fuelGivesJ(input) + airKg * airJ;
  const pressurePa = combustorPressurePa(input, train);
  return reacting
    .withAmounts(elementsOf(input, airKg, 1))
    .burnt({ held: 'enthalpy-pressure', enthalpyJ, pressurePa }, near);
}

function inletByTemperature(
  { input, train, reacting }: GasTurbine,
  airKg: number,
  temperatureK: number,
  near?: Equilibrium,
): Equilibrium | NoEquilibrium {
  const pressurePa = combustorPressurePa(input, train);
  return reacting
    .withAmounts(elementsOf(input, airKg, 1))
    .burnt({ held: 'temperature-pressure', temperatureK, pressurePa }, near);
}

function notHotEnough({ temperatureK }: Equilibrium): TurbineFault {
  return { kind: 'fault', reason: 'not-hot-enough', of: 'inlet', reachesK: temperatureK };
}

function notConverged({ input: { amount } }: GasTurbine, why: NoEquilibrium | undefined): TurbineFault {
  return noState('combustor', why ?? { kind: 'none', reason: 'not-converged', detail: JSON.stringify({ amount }) });
}
