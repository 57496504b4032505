// A gas turbine on the air standard: the same machine with a gas that stays what it is and heat from outside in place of fuel,
// so that an engineer can see what burning, dissociation and particles cost, and a textbook can be checked.
// Takes any mixture: air with its variable heat capacities, or a gas of constant ones (gas-by-heat-capacity.ts).
// Knows no fuel. Invariant: heat in is work and heat out, to rounding.
// Source: Joule–Brayton cycle with regeneration, intercooling and reheat as in any thermodynamics text.

import type { NoEquilibrium } from '../../equilibrium/equilibrium.ts';
import type { FrozenMixture, MixtureState } from '../frozen-mixture.ts';
import { compressorTrain, recuperated } from './compressor-train.ts';
import type { CompressorTrain, GasTurbineInput, TurbineFault } from './gas-turbine.ts';

export interface HeatedAirInput extends Pick<
  GasTurbineInput,
  | 'compressor'
  | 'ambientPressurePa'
  | 'recuperatorEffectiveness'
  | 'reheat'
  | 'combustorLossShare'
  | 'turbineEfficiency'
> {
  readonly gas: FrozenMixture;
  readonly inletTemperatureK: number;
  readonly turbineInletTemperatureK: number;
  readonly exhaustLossShare: number;
}

/** For the whole of the gas, J. */
export interface HeatedAirCycle {
  readonly kind: 'heated-air';
  readonly compressor: CompressorTrain;
  readonly heaterInlet: MixtureState;
  readonly turbineInlet: MixtureState;
  readonly beforeReheat: MixtureState | null;
  readonly reheated: MixtureState | null;
  readonly turbineOutlet: MixtureState;
  readonly heatInJ: number;
  readonly turbineWorkJ: number;
  readonly efficiency: number;
  /** Compressor work over turbine work. */
  readonly backWorkRatio: number;
}

/** The cycle of a gas with its turbine inlet at a temperature, or why there is none. */
export function heatedAirCycle(input: HeatedAirInput): HeatedAirCycle | TurbineFault {
  const { gas, ambientPressurePa, compressor, reheat, turbineEfficiency, combustorLossShare } = input;
  const train = compressorTrain(gas, input.inletTemperatureK, ambientPressurePa, compressor);
  if (train.kind === 'fault') return train;
  const inletPa = train.delivery.pressurePa * (1 - combustorLossShare);
  const endPa = ambientPressurePa / (1 - input.exhaustLossShare);
  const inlet = heated(gas, input.turbineInletTemperatureK, inletPa);
  if (inlet.kind === 'none') return noState(inlet);
  let last = inlet;
  let beforeReheat: MixtureState | null = null;
  let reheated: MixtureState | null = null;
  if (reheat !== null) {
    const middle = expanded(inlet, inletPa / (reheat.firstRatio ?? Math.sqrt(inletPa / endPa)), turbineEfficiency);
    if (middle.kind === 'none') return noState(middle);
    const second = heated(gas, reheat.temperatureK, middle.pressurePa * (1 - combustorLossShare));
    if (second.kind === 'none') return noState(second);
    beforeReheat = middle;
    reheated = second;
    last = second;
  }
  const outlet = expanded(last, endPa, turbineEfficiency);
  if (outlet.kind === 'none') return noState(outlet);
  const heaterInlet = recuperated(train.delivery, outlet.temperatureK, input.recuperatorEffectiveness);
  if (heaterInlet.kind === 'fault') return heaterInlet;
  const firstDropJ = beforeReheat === null ? 0 : inlet.enthalpyJ - beforeReheat.enthalpyJ;
  const turbineWorkJ = firstDropJ + last.enthalpyJ - outlet.enthalpyJ;
  const reheatJ = reheated === null || beforeReheat === null ? 0 : reheated.enthalpyJ - beforeReheat.enthalpyJ;
  const heatInJ = inlet.enthalpyJ - heaterInlet.enthalpyJ + reheatJ;
  return {
    kind: 'heated-air',
    compressor: train,
    heaterInlet,
    turbineInlet: inlet,
    beforeReheat,
    reheated,
    turbineOutlet: outlet,
    heatInJ,
    turbineWorkJ,
    efficiency: (turbineWorkJ - train.workJ) / heatInJ,
    backWorkRatio: train.workJ / turbineWorkJ,
  };
}

function heated(gas: FrozenMixture, temperatureK: number, pressurePa: number): MixtureState | NoEquilibrium {
  return gas.solve({ held: 'temperature-pressure', temperatureK, pressurePa });
}

function expanded(from: MixtureState, pressurePa: number, efficiency: number): MixtureState | NoEquilibrium {
  const { mixture, entropyJPerK, temperatureK } = from;
  const ideal = mixture.solve({ held: 'entropy-pressure', entropyJPerK, pressurePa }, temperatureK);
  if (ideal.kind === 'none') return ideal;
  const enthalpyJ = from.enthalpyJ - efficiency * (from.enthalpyJ - ideal.enthalpyJ);
  return mixture.solve({ held: 'enthalpy-pressure', enthalpyJ, pressurePa }, ideal.temperatureK);
}

function noState(why: NoEquilibrium): TurbineFault {
  return { kind: 'fault', reason: 'no-state', stage: 'turbine', why };
}
