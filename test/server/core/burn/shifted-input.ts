// A burn's input with one parameter moved, for differences to hold derivatives against.

import type { BurnInput, BurnStream } from '../../../../server/core/burn/burn.ts';
import type { BurnParameter } from '../../../../server/core/burn/charge-directions.ts';

export function shiftedInput(input: BurnInput, parameter: BurnParameter, step: number): BurnInput {
  switch (parameter.of) {
    case 'enthalpy': {
      const from = input[parameter.stream];
      return { ...input, [parameter.stream]: { ...from, enthalpyJPerKg: (from.enthalpyJPerKg ?? 0) + step } };
    }
    case 'gas-temperature': {
      const from = input[parameter.stream];
      return { ...input, [parameter.stream]: { ...from, temperatureK: from.temperatureK + step } };
    }
    case 'gas-amount': {
      const from = input[parameter.stream];
      return { ...input, [parameter.stream]: { ...from, gasMolPerKg: from.gasMolPerKg + step } };
    }
    case 'element':
      return { ...input, [parameter.stream]: withElement(input[parameter.stream], parameter.symbol, step) };
    case 'amount': {
      const { amount } = input;
      if (amount.by === 'lambda') return { ...input, amount: { by: 'lambda', lambda: amount.lambda + step } };
      if (amount.by === 'mass') return { ...input, amount: { by: 'mass', kgPerKg: amount.kgPerKg + step } };
      return { ...input, amount: { by: 'equivalence-ratio', ratio: amount.ratio + step } };
    }
    case 'pressure': {
      const { held } = input;
      return held.held === 'pressure'
        ? { ...input, held: { held: 'pressure', pressurePa: held.pressurePa + step } }
        : { ...input, held: { held: 'volume', chargePressurePa: held.chargePressurePa + step } };
    }
    case 'temperature':
      if (input.heat.heat !== 'temperature') return input;
      return { ...input, heat: { heat: 'temperature', temperatureK: input.heat.temperatureK + step } };
    case 'loss-share':
      if (input.heat.heat !== 'adiabatic') return input;
      return { ...input, heat: { heat: 'adiabatic', lossShare: input.heat.lossShare + step } };
    case 'heating-value':
      return { ...input, lowerHeatingValueJPerKg: (input.lowerHeatingValueJPerKg ?? 0) + step };
  }
}

function withElement(from: BurnStream, symbol: string, step: number): BurnStream {
  const elements = new Map(from.elementMolPerKg);
  elements.set(symbol, (elements.get(symbol) ?? 0) + step);
  return { ...from, elementMolPerKg: elements };
}
