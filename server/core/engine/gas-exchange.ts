// How the cylinder is filled: fresh gas and what stayed of the exhaust, mixed without loss, and how much that is.
// Knows no combustion. Invariant: over the exchange of gas the first law holds to rounding; with the piston drawing in, its
// work at the two pressures is counted, and at the largest volume (two-stroke) there is none.
// Source: energy balance of an ideal intake and exhaust process, adiabatic, the valves opening at dead centre: as in textbooks
// of engines (J. B. Heywood, Internal Combustion Engine Fundamentals, 1988, ch. 5), written with enthalpies that vary freely.

import type { NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { joined, scaled } from './charge.ts';
import type { FrozenMixture, MixtureState } from './frozen-mixture.ts';
import type { CycleFault, ReciprocatingInput } from './reciprocating.ts';

/** What stayed, of the products of 1 kg of fuel, at the temperature after blow-down and the exhaust's pressure. */
export interface Staying {
  readonly gas: FrozenMixture;
  readonly temperatureK: number;
  readonly gasEnthalpyJ: number;
  /** Of its particles, which pass through compression with the heat that they have. */
  readonly particlesEnthalpyJ: number;
}

export interface Filling {
  readonly kind: 'filling';
  /** State 1, of the gas. */
  readonly state: MixtureState;
  /** How many times the products of 1 kg of fuel stay. */
  readonly staysTimes: number;
}

/** Fresh gas with its vaporised fuel, of 1 kg of fuel, and its enthalpy as it enters. */
export interface Fresh {
  readonly gas: FrozenMixture;
  readonly enthalpyJ: number;
}

/** State 1, or why the cylinder cannot be filled. */
export function fill(input: ReciprocatingInput, fresh: Fresh, staying: Staying | null): Filling | CycleFault {
  if (staying === null) return filled(input, fresh, null, 0);
  const { residual, intakePressurePa, exhaustPressurePa, compressionRatio } = input;
  if (residual.by === 'share') return filled(input, fresh, staying, residual.share / (1 - residual.share));
  // Of constant heat capacities the amounts times temperatures add up, and the answer is this.
  const room = intakePressurePa * compressionRatio - exhaustPressurePa;
  if (!(room > 0)) return { kind: 'fault', reason: 'no-fresh-gas' };
  const times =
    (exhaustPressurePa * fresh.gas.gasMol * input.intakeTemperatureK) /
    (staying.gas.gasMol * staying.temperatureK * room);
  return withClearanceFilled(input, fresh, staying, times);
}

/** Secants until the residual gas fills the smallest volume. */
function withClearanceFilled(
  input: ReciprocatingInput,
  fresh: Fresh,
  staying: Staying,
  firstTimes: number,
): Filling | CycleFault {
  const { exhaustPressurePa, compressionRatio } = input;
  /** Clearance over what the residual gas takes, less 1. */
  const misfit = ({ state, staysTimes }: Filling): number => {
    const residualM3 =
      (staysTimes * staying.gas.gasMol * molarGasConstantJPerMolK * staying.temperatureK) / exhaustPressurePa;
    return state.volumeM3 / compressionRatio / residualM3 - 1;
  };
  let before: { readonly times: number; readonly misfit: number } | undefined;
  let times = firstTimes;
  for (let step = 0; step < 60; step += 1) {
    const filling = filled(input, fresh, staying, times);
    if (filling.kind === 'fault') return filling;
    const now = { times, misfit: misfit(filling) };
    if (Math.abs(now.misfit) < 1e-13) return filling;
    const plain = times * (1 + now.misfit);
    const secant =
      before === undefined || before.misfit === now.misfit
        ? plain
        : times - (now.misfit * (times - before.times)) / (now.misfit - before.misfit);
    // Rounding is all that is left where a secant no longer moves.
    const next = secant > times / 4 && secant < times * 4 ? secant : plain;
    if (Math.abs(next - times) <= 1e-14 * times) return filling;
    before = now;
    times = next;
  }
  return { kind: 'fault', reason: 'no-fresh-gas' };
}

function filled(
  input: ReciprocatingInput,
  fresh: Fresh,
  staying: Staying | null,
  staysTimes: number,
): Filling | CycleFault {
  const { intakePressurePa, exhaustPressurePa, strokes, residual } = input;
  const gas = staying === null ? fresh.gas : joined(fresh.gas, scaled(staying.gas, staysTimes));
  const stayingJ = staying === null ? 0 : staysTimes * staying.gasEnthalpyJ;
  // Gas that stayed at the exhaust's pressure is pressed together (or swells) as the intake opens.
  const pressedJ =
    staying !== null && residual.by === 'clearance' && strokes === 4
      ? ((intakePressurePa - exhaustPressurePa) *
          (staysTimes * staying.gas.gasMol * molarGasConstantJPerMolK * staying.temperatureK)) /
        exhaustPressurePa
      : 0;
  const held = {
    held: 'enthalpy-pressure',
    enthalpyJ: fresh.enthalpyJ + stayingJ + pressedJ,
    pressurePa: intakePressurePa,
  } as const;
  const state: MixtureState | NoEquilibrium = gas.solve(held, input.intakeTemperatureK);
  return state.kind === 'none'
    ? { kind: 'fault', reason: 'no-state', state: 'intake', why: state }
    : { kind: 'filling', state, staysTimes };
}

/** Done by the piston on the gas while it draws in and pushes out, J. */
export function pumpingWork(input: ReciprocatingInput, sweptM3: number): number {
  return input.strokes === 4 ? (input.exhaustPressurePa - input.intakePressurePa) * sweptM3 : 0;
}
