// Gas turbines of the catalogue's fuels, for tests.

import { heatingValueOfFuel } from '../../../../../server/core/balance/heating-value.ts';
import type { BurnStream } from '../../../../../server/core/burn/burn.ts';
import { oxidantForLambda } from '../../../../../server/core/burn/charge.ts';
import { gasOf } from '../../../../../server/core/engine/charge.ts';
import { frozenMixture } from '../../../../../server/core/engine/frozen-mixture.ts';
import type { FrozenMixture } from '../../../../../server/core/engine/frozen-mixture.ts';
import type { GasTurbineInput } from '../../../../../server/core/engine/turbine/gas-turbine.ts';

/** 1 kg of oxygen and nitrogen, 21 to 79 by volume. */
export function simpleAir(): FrozenMixture {
  const kgPerMol = 0.21 * 0.031998 + 0.79 * 0.028014;
  const gas = gasOf(
    new Map([
      ['O2(g)', 0.21 / kgPerMol],
      ['N2(g)', 0.79 / kgPerMol],
    ]),
  );
  if ('kind' in gas) throw new Error(gas.ids.join());
  return frozenMixture(gas.parts);
}

/** A simple-cycle turbine with good machines. */
export function turbineOn(fuel: BurnStream, change: Partial<GasTurbineInput> = {}): GasTurbineInput {
  const air = simpleAir();
  const value = heatingValueOfFuel(fuel.elementMolPerKg, fuel.enthalpyJPerKg ?? Number.NaN, 'as-ruled');
  if (value.kind === 'fault') throw new Error(value.reason);
  const stoichiometric = oxidantForLambda(fuel, {
    elementMolPerKg: new Map([...air.elementMol].map(([symbol, mol]) => [symbol, mol / air.massKg])),
    enthalpyJPerKg: 0,
    referenceEnthalpyJPerKg: 0,
    temperatureK: 298.15,
    gasMolPerKg: air.gasMol / air.massKg,
  });
  if (typeof stoichiometric !== 'number') throw new Error(stoichiometric.reason);
  return {
    fuel: {
      elementMol: fuel.elementMolPerKg,
      enthalpyJ: fuel.enthalpyJPerKg ?? Number.NaN,
      referenceEnthalpyJ: fuel.referenceEnthalpyJPerKg ?? Number.NaN,
      lowerHeatingValueJ: value.lowerJPerKg,
    },
    air,
    airTemperatureK: 288.15,
    ambientPressurePa: 101325,
    compressor: {
      pressureRatio: 16,
      law: { law: 'isentropic-efficiency', efficiency: 0.86 },
      intercooling: null,
      intakeLossShare: 0.01,
    },
    amount: { by: 'turbine-inlet', temperatureK: 1500 },
    stoichiometricAirKgPerKg: stoichiometric,
    recuperatorEffectiveness: null,
    reheat: null,
    combustorLossShare: 0.04,
    exhaustLossShare: 0.015,
    turbineEfficiency: 0.89,
    completeness: 1,
    wallLossShare: 0,
    frozenBelowK: null,
    mechanicalEfficiency: 0.985,
    ...change,
  };
}
