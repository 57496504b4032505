// How a charge moves when one of its inputs does: the first derivatives of its elements, its energy and its volume, for
// whoever carries uncertainties from a fuel's certificate to the flame.
// Knows no products and no uncertainties. Invariant: λ stays as it was given, so a fuel that needs more oxygen brings more
// oxidant with it; one input moves at a time, also where masses would no longer add up to a kilogram (the caller's shares
// see to that).

import { elementOfSymbol } from '../substance/elements.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { BurnInput, BurnStream, Charge } from './burn.ts';
import { oxidantForLambda } from './charge.ts';

/**
 * An input of a burn. `amount` is λ, the equivalence ratio or the mass, whichever was given; `pressure` the held pressure or
 * that of the charge whose volume is held.
 */
export type BurnParameter =
  | { readonly of: 'enthalpy'; readonly stream: 'fuel' | 'oxidant' }
  | { readonly of: 'element'; readonly stream: 'fuel' | 'oxidant'; readonly symbol: string }
  /** Temperature and mol per kg of what is gas as it comes in, its enthalpy apart: they make the volume where that is held. */
  | { readonly of: 'gas-temperature' | 'gas-amount'; readonly stream: 'fuel' | 'oxidant' }
  | { readonly of: 'amount' | 'pressure' | 'loss-share' | 'heating-value' | 'temperature' };

/** Per unit of the parameter, in its SI unit: mol, J, J of pressure times volume, Pa and K. */
export interface ChargeDirection {
  /** In the order of the charge's elements. */
  readonly elementMol: Float64Array;
  /** Of the energy that is held in an adiabatic burn, its loss taken out. */
  readonly enthalpyJ: number;
  readonly pressureVolumeJ: number;
  readonly oxidantKgPerKg: number;
  readonly pressurePa: number;
  readonly temperatureK: number;
}

/**
 * The direction of a parameter in the charge of a burn, or of its zone (which has its own amount and no loss). Null where
 * the charge does not hold the element: the way there is one-sided.
 */
export function chargeDirection(
  input: BurnInput,
  charge: Charge,
  parameter: BurnParameter,
  of: 'whole' | 'zone' = 'whole',
): ChargeDirection | null {
  const lossShare = of === 'whole' && input.heat.heat === 'adiabatic' ? input.heat.lossShare : 0;
  switch (parameter.of) {
    case 'enthalpy':
      return moved(charge, { enthalpyJ: parameter.stream === 'fuel' ? 1 : charge.oxidantKgPerKg });
    case 'heating-value':
      return moved(charge, { enthalpyJ: -lossShare });
    case 'loss-share':
      return moved(charge, { enthalpyJ: of === 'whole' ? -(input.lowerHeatingValueJPerKg ?? 0) : 0 });
    case 'pressure':
      return moved(charge, { pressurePa: 1 });
    case 'temperature':
      return moved(charge, { temperatureK: 1 });
    case 'amount':
      return withOxidant(input.oxidant, charge, amountSlope(input, charge, of), moved(charge, {}));
    case 'gas-temperature':
    case 'gas-amount': {
      const kg = parameter.stream === 'fuel' ? 1 : charge.oxidantKgPerKg;
      const { gasMolPerKg, temperatureK } = input[parameter.stream];
      const other = parameter.of === 'gas-amount' ? temperatureK : gasMolPerKg;
      return moved(charge, { pressureVolumeJ: kg * other * molarGasConstantJPerMolK });
    }
    case 'element':
      return elementDirection(input, charge, parameter, of);
  }
}

/** kg of oxidant per unit of the amount as it was given. */
function amountSlope(input: BurnInput, charge: Charge, of: 'whole' | 'zone'): number {
  const amount = of === 'whole' ? input.amount : input.zone;
  if (amount === undefined) return 0;
  switch (amount.by) {
    case 'mass':
      return 1;
    case 'lambda':
      return charge.oxidantKgPerKg / amount.lambda;
    case 'equivalence-ratio':
      return -charge.oxidantKgPerKg / amount.ratio;
  }
}

function elementDirection(
  input: BurnInput,
  charge: Charge,
  { stream, symbol }: Extract<BurnParameter, { of: 'element' }>,
  of: 'whole' | 'zone',
): ChargeDirection | null {
  const row = charge.elements.indexOf(symbol);
  if (row < 0) return null;
  const elementMol = new Float64Array(charge.elements.length);
  elementMol[row] = stream === 'fuel' ? 1 : charge.oxidantKgPerKg;
  const own = moved(charge, { elementMol });
  const amount = of === 'whole' ? input.amount : input.zone;
  const ratio = oxidantForLambda(input.fuel, input.oxidant);
  if (amount === undefined || amount.by === 'mass' || typeof ratio !== 'number') return own;
  // The oxidant is in proportion to the fuel's demand over what a kg of oxidant offers, each by valence over four.
  const demandPerMol = (elementOfSymbol(symbol)?.valence ?? 0) / 4;
  const demand = demandOf(input.fuel);
  const offer = -demandOf(input.oxidant);
  const relative = stream === 'fuel' ? demandPerMol / demand : demandPerMol / offer;
  return withOxidant(input.oxidant, charge, charge.oxidantKgPerKg * relative, own);
}

function demandOf({ elementMolPerKg }: BurnStream): number {
  let electrons = 0;
  for (const [symbol, mol] of elementMolPerKg) electrons += mol * (elementOfSymbol(symbol)?.valence ?? 0);
  return electrons / 4;
}

/** A direction with a change of the oxidant's mass on top. */
function withOxidant(oxidant: BurnStream, charge: Charge, kg: number, own: ChargeDirection): ChargeDirection {
  return {
    ...own,
    elementMol: Float64Array.from(
      charge.elements,
      (symbol, row) => (own.elementMol[row] ?? 0) + kg * (oxidant.elementMolPerKg.get(symbol) ?? 0),
    ),
    enthalpyJ: own.enthalpyJ + kg * (oxidant.enthalpyJPerKg ?? Number.NaN),
    pressureVolumeJ: own.pressureVolumeJ + kg * oxidant.gasMolPerKg * molarGasConstantJPerMolK * oxidant.temperatureK,
    oxidantKgPerKg: own.oxidantKgPerKg + kg,
  };
}

/** The direction in which nothing of a charge moves. */
export function still(charge: Charge): ChargeDirection {
  return moved(charge, {});
}

function moved(charge: Charge, by: Partial<ChargeDirection>): ChargeDirection {
  return {
    elementMol: new Float64Array(charge.elements.length),
    enthalpyJ: 0,
    pressureVolumeJ: 0,
    oxidantKgPerKg: 0,
    pressurePa: 0,
    temperatureK: 0,
    ...by,
  };
}
