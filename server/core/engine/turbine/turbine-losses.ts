// Where the heating value of a kilogram of fuel goes in a gas turbine, and what comes in besides it: rows that add up to it.
// Knows no words and no rounding. Invariant: each row is worked out from states by itself, none is what the others leave.
// The rows are those of a cycle with pistons (loss-tree.ts), and the intercooler's heat.

import { referenceTemperatureK } from '../../substance/substance.ts';
import type { ExpandingState } from '../expansion.ts';
import { latentHeat } from '../loss-tree.ts';
import type { CompressorTrain, GasTurbineInput, TurbineLoss } from './gas-turbine.ts';

/** Of a cycle that burnt `fuelKg` in `airKg`; works are for 1 kg of fuel. */
export interface TurbineEnd {
  readonly fuelKg: number;
  readonly airKg: number;
  readonly exhaust: ExpandingState;
  readonly netWorkJ: number;
  readonly brakeWorkJ: number;
}

export function lossesOf(
  input: GasTurbineInput,
  train: CompressorTrain,
  { fuelKg, airKg, exhaust, netWorkJ, brakeWorkJ }: TurbineEnd,
): readonly TurbineLoss[] {
  const { fuel, completeness, wallLossShare, air, ambientPressurePa: pressurePa } = input;
  const { lowerHeatingValueJ, enthalpyJ, referenceEnthalpyJ } = fuel;
  const airPerFuel = airKg / fuelKg;
  const coldAir = air.solve({ held: 'temperature-pressure', temperatureK: referenceTemperatureK, pressurePa });
  const coldAirJ = airPerFuel * (coldAir.kind === 'none' ? Number.NaN : coldAir.enthalpyJ);
  const cold = exhaust.matter({ temperatureK: referenceTemperatureK, pressurePa });
  const coldJ = cold.enthalpyJ / fuelKg;
  const latentJ = latentHeat(cold) / fuelKg;
  const completeColdJ = coldAirJ + completeness * (referenceEnthalpyJ - lowerHeatingValueJ);
  const fuelSensibleJ = enthalpyJ - referenceEnthalpyJ;
  const unburnt = 1 - completeness;
  const rows: readonly (readonly [TurbineLoss['id'], number])[] = [
    ['brake-work', brakeWorkJ],
    ['friction', netWorkJ - brakeWorkJ],
    ['wall-heat', wallLossShare * lowerHeatingValueJ],
    ['intercooler-heat', airPerFuel * train.coolerHeatJ],
    ['exhaust-sensible', exhaust.enthalpyJ / fuelKg - coldJ + unburnt * fuelSensibleJ],
    ['exhaust-latent', latentJ],
    ['exhaust-chemical', coldJ - completeColdJ - latentJ],
    ['unburnt-fuel', unburnt * lowerHeatingValueJ],
    ['brought-in', -(airPerFuel * train.inlet.enthalpyJ - coldAirJ + fuelSensibleJ)],
  ];
  return rows.map(([id, joulePerKg]) => ({ id, joulePerKg, share: joulePerKg / lowerHeatingValueJ }));
}
