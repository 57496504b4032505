// Air from the surroundings through a compressor of one stage, or of two with a cooler between them.
// Knows no fuel and no turbine. Invariant: work of the stages less the cooler's heat is the rise of enthalpy.
// Source: efficiencies and variable specific heats charge.ts; equal ratios need the least work where the cooler goes back to
// the inlet's temperature.

import type { MixtureState } from '../frozen-mixture.ts';
import type { FrozenMixture } from '../frozen-mixture.ts';
import { compressed } from '../charge.ts';
import type { CompressorInput, CompressorTrain, TurbineFault } from './gas-turbine.ts';

/** The states of 1 kg of air, or why there are none. */
export function compressorTrain(
  air: FrozenMixture,
  temperatureK: number,
  ambientPressurePa: number,
  { pressureRatio, law, intercooling, intakeLossShare }: CompressorInput,
): ({ readonly kind: 'train' } & CompressorTrain) | TurbineFault {
  const inlet = air.solve({
    held: 'temperature-pressure',
    temperatureK,
    pressurePa: ambientPressurePa * (1 - intakeLossShare),
  });
  if (inlet.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'compressor', why: inlet };
  const deliveryPa = inlet.pressurePa * pressureRatio;
  if (intercooling === null) {
    const stage = compressed(inlet, { pressurePa: deliveryPa }, law);
    if (stage.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'compressor', why: stage };
    const { state: delivery, shaftWorkJ: workJ } = stage;
    return { kind: 'train', inlet, beforeCooler: null, behindCooler: null, delivery, workJ, coolerHeatJ: 0 };
  }
  const middlePa = inlet.pressurePa * (intercooling.firstRatio ?? Math.sqrt(pressureRatio));
  const first = compressed(inlet, { pressurePa: middlePa }, law);
  if (first.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'compressor', why: first };
  const cooled = air.solve({
    held: 'temperature-pressure',
    temperatureK: intercooling.temperatureK,
    pressurePa: middlePa,
  });
  if (cooled.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'intercooler', why: cooled };
  const second = compressed(cooled, { pressurePa: deliveryPa }, law);
  if (second.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'compressor', why: second };
  return {
    kind: 'train',
    inlet,
    beforeCooler: first.state,
    behindCooler: cooled,
    delivery: second.state,
    workJ: first.shaftWorkJ + second.shaftWorkJ,
    coolerHeatJ: first.state.enthalpyJ - cooled.enthalpyJ,
  };
}

/** What an exhaust of a temperature makes of compressed air: the state behind a recuperator of an effectiveness. */
export function recuperated(
  delivery: MixtureState,
  exhaustK: number,
  effectiveness: number | null,
): MixtureState | TurbineFault {
  if (effectiveness === null) return delivery;
  const { mixture, pressurePa } = delivery;
  const hottest = mixture.solve({ held: 'temperature-pressure', temperatureK: exhaustK, pressurePa });
  if (hottest.kind === 'none') return { kind: 'fault', reason: 'no-state', stage: 'recuperator', why: hottest };
  const enthalpyJ = delivery.enthalpyJ + effectiveness * (hottest.enthalpyJ - delivery.enthalpyJ);
  const state = mixture.solve({ held: 'enthalpy-pressure', enthalpyJ, pressurePa }, exhaustK);
  return state.kind === 'none' ? { kind: 'fault', reason: 'no-state', stage: 'recuperator', why: state } : state;
}
