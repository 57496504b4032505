// A gas turbine's cycle in one corner, from its compressor to what leaves behind the recuperator, per kilogram of fuel.
// Knows no figures. Invariant: what comes in with fuel and air leaves as work, heat and exhaust, and so the losses add up to the
// lower heating value, to `closure`.

import type { Corner } from '../expansion.ts';
import { reactingCharge } from '../reacting-charge.ts';
import { compressorTrain } from './compressor-train.ts';
import type { GasTurbineCycle, GasTurbineInput, TurbineFault } from './gas-turbine.ts';
import { lossesOf } from './turbine-losses.ts';
import { elementsOf, noState } from './turbine-passage.ts';
import type { GasTurbine, Passage } from './turbine-passage.ts';
import { passageFor } from './turbine-search.ts';

/** The compressor and the solvers of a gas turbine, or what is amiss with its numbers. */
export function gasTurbine(input: GasTurbineInput): GasTurbine | TurbineFault {
  const bad = outOfRange(input);
  if (bad !== undefined) return { kind: 'fault', reason: 'not-in-range', of: bad };
  if (input.reheat !== null && input.amount.by !== 'turbine-inlet')
    return { kind: 'fault', reason: 'reheat-needs-inlet' };
  const { air, airTemperatureK, ambientPressurePa, compressor } = input;
  const train = compressorTrain(air, airTemperatureK, ambientPressurePa, compressor);
  if (train.kind === 'fault') return train;
  return { kind: 'turbine', input, train, reacting: reactingCharge(elementsOf(input, 1, 1), input.admits) };
}

function outOfRange(input: GasTurbineInput): string | undefined {
  const isPositive = (value: number): boolean => value > 0 && Number.isFinite(value);
  const isShare = (value: number): boolean => value > 0 && value <= 1;
  const isLoss = (value: number): boolean => value >= 0 && value < 1;
  const { compressor, amount, reheat, recuperatorEffectiveness } = input;
  const isCut = (ratio: number | null | undefined): boolean => ratio === null || ratio === undefined || ratio >= 1;
  if (!isPositive(input.airTemperatureK)) return 'airTemperatureK';
  if (!isPositive(input.ambientPressurePa)) return 'ambientPressurePa';
  if (!(compressor.pressureRatio > 1) || !Number.isFinite(compressor.pressureRatio)) return 'pressureRatio';
  if (!isCut(compressor.intercooling?.firstRatio) || !isCut(reheat?.firstRatio)) return 'firstRatio';
  if ('efficiency' in compressor.law && !isShare(compressor.law.efficiency)) return 'compressorEfficiency';
  if (!isShare(input.turbineEfficiency)) return 'turbineEfficiency';
  if (!isLoss(compressor.intakeLossShare)) return 'intakeLossShare';
  if (!isLoss(input.combustorLossShare)) return 'combustorLossShare';
  if (!isLoss(input.exhaustLossShare)) return 'exhaustLossShare';
  if (!isShare(input.completeness)) return 'completeness';
  if (!isLoss(input.wallLossShare)) return 'wallLossShare';
  if (!isShare(input.mechanicalEfficiency)) return 'mechanicalEfficiency';
  if (recuperatorEffectiveness !== null && !(recuperatorEffectiveness >= 0 && recuperatorEffectiveness <= 1)) {
    return 'recuperatorEffectiveness';
  }
  if (!isPositive(input.stoichiometricAirKgPerKg)) return 'stoichiometricAirKgPerKg';
  if (!isPositive(amount.by === 'mass' ? amount.airKgPerKg : amount.temperatureK)) return 'amount';
  return undefined;
}

/** The cycle in a corner. `near`: one of another corner, to start from. */
export function gasTurbineCycle(
  turbine: GasTurbine,
  corner: Corner,
  near?: GasTurbineCycle,
): GasTurbineCycle | TurbineFault {
  const found = passageFor(turbine, corner, near);
  if (found.kind === 'fault') return found;
  const { reheatReachesK } = found.passage;
  return reheatReachesK === null
    ? finished(turbine, corner, found.passage)
    : { kind: 'fault', reason: 'not-hot-enough', of: 'reheat', reachesK: reheatReachesK };
}

/** Behind the recuperator, and everything for 1 kg of fuel in all. */
function finished(turbine: GasTurbine, corner: Corner, passage: Passage): GasTurbineCycle | TurbineFault {
  const { input, train } = turbine;
  const { airKg, inlet, beforeReheat, reheated, reheatFuelKg, expansion, outlet, combustorInlet } = passage;
  const fuelKg = 1 + reheatFuelKg;
  const takenJ = airKg * (combustorInlet.enthalpyJ - train.delivery.enthalpyJ);
  const exhaust =
    input.recuperatorEffectiveness === null && input.exhaustLossShare === 0
      ? outlet
      : expansion.to(
          {
            held: 'enthalpy-pressure',
            enthalpyJ: outlet.enthalpyJ - takenJ,
            pressurePa: input.ambientPressurePa,
          },
          outlet,
        );
  if (exhaust.kind === 'none') return noState('exhaust', exhaust);
  const firstDropJ = beforeReheat === null ? 0 : inlet.enthalpyJ - beforeReheat.enthalpyJ;
  const turbineWorkJ = (firstDropJ + (reheated ?? inlet).enthalpyJ - outlet.enthalpyJ) / fuelKg;
  const compressorWorkJ = (airKg * train.workJ) / fuelKg;
  const netWorkJ = turbineWorkJ - compressorWorkJ;
  const brakeWorkJ = netWorkJ > 0 ? input.mechanicalEfficiency * netWorkJ : netWorkJ;
  const { lowerHeatingValueJ } = input.fuel;
  return {
    kind: 'gas-turbine',
    corner,
    airKgPerKg: airKg / fuelKg,
    firstFuelShare: 1 / fuelKg,
    compressor: train,
    combustorInlet,
    turbineInlet: inlet,
    beforeReheat,
    reheated,
    turbineOutlet: outlet,
    exhaust,
    compressorWorkJ,
    turbineWorkJ,
    netWorkJ,
    brakeWorkJ,
    losses: lossesOf(input, train, { fuelKg, airKg, exhaust, netWorkJ, brakeWorkJ }),
    brakeEfficiency: brakeWorkJ / lowerHeatingValueJ,
    netEfficiency: netWorkJ / lowerHeatingValueJ,
  };
}
