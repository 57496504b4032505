// What is to be said of a burn's gas before and after: air that comes in cold under pressure, as nobody compresses it, and
// vapour near its saturation at a high pressure, which is no ideal gas.
// Reads the charge and the flame alone. Rounds and words nothing.

import type { Burn, Charge } from '../../core/burn/burn.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { waterSaturationPressurePa } from '../../core/substance/water-saturation.ts';
import type { Span } from '../../../grammar/tree.ts';
import type { Context } from '../context.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import type { WrittenBurn } from './burn-question.ts';

/** From this pressure on, and up to this temperature, a gas that was not told to be compressed was forgotten so. */
const coldPressurePa = 5e5;
const coldTemperatureK = 333.15;

export function reportColdCharge(
  { oxidant, chargePressure, held }: WrittenBurn,
  moleShares: OxidantStream['moleShares'],
  place: Span,
  context: Context,
): void {
  const pressure = held.held === 'pressure' ? held.pressure : chargePressure;
  const { temperature } = oxidant;
  if (
    !isAir(moleShares) ||
    oxidant.gasMolPerKg.value === 0 ||
    pressure.value < coldPressurePa ||
    temperature.value > coldTemperatureK
  )
    return;
  const compressedK = temperature.value * (pressure.value / 1e5) ** (1 - 1 / gammaOfAir);
  context.report(place, { code: 'range/cold-charge', temperature, pressure, compressed: kelvin(compressedK) });
}

/** Nitrogen and oxygen about as in air, with at most some vapour and other gases beside them. */
function isAir(moleShares: OxidantStream['moleShares']): boolean {
  const [nitrogen, oxygen] = ['N2(g)', 'O2(g)'].map((id) => moleShares.get(id)?.value ?? 0) as [number, number];
  const oxygenOfBoth = oxygen / (nitrogen + oxygen);
  return nitrogen + oxygen > 0.85 && oxygenOfBoth > 0.18 && oxygenOfBoth < 0.24;
}

/** Of cold air. */
const gammaOfAir = 1.4;

/** Vapour from 5 bar on is told of where a cooled state lies within 30 K of its saturation, or below it. */
const vapourPressurePa = 5e5;
const nearSaturationK = 30;

export function reportRealGas(burn: Burn, flame: Equilibrium, place: Span, context: Context): void {
  const { input, charge } = burn;
  const held = input.coolingPressurePa ?? (input.held.held === 'pressure' ? input.held.pressurePa : null);
  const share = vapourShareBurntOut(charge);
  for (const temperatureK of input.cooledToK) {
    const atPa = held ?? (flame.pressurePa * temperatureK) / flame.temperatureK;
    const vapourPa = share * atPa;
    const saturationK = vapourPa >= vapourPressurePa ? saturationTemperatureK(vapourPa) : null;
    if (saturationK === null || temperatureK > saturationK + nearSaturationK) continue;
    context.report(place, {
      code: 'range/real-gas',
      temperature: kelvin(temperatureK),
      vapourPressure: quantityOf(vapourPa, knownUnit('Pa').dimension),
      saturation: kelvin(saturationK),
    });
    return;
  }
}

/** Water vapour in the cool gas, before it condenses: all hydrogen as water as far as oxygen reaches, carbon as dioxide. */
function vapourShareBurntOut({ elements, elementMol }: Charge): number {
  const atoms = (symbol: string): number => elementMol[elements.indexOf(symbol)] ?? 0;
  const water = Math.min(atoms('H') / 2, atoms('O'));
  const left = Math.max(0, atoms('O') - water - 2 * atoms('C')) / 2;
  const gas = water + (atoms('H') / 2 - water) + atoms('C') + atoms('N') / 2 + atoms('Ar') + atoms('He') + left;
  return gas > 0 ? water / gas : 0;
}

/** By bisection of the saturation pressure; null above the critical point. */
function saturationTemperatureK(pressurePa: number): number | null {
  let [low, high] = [273.16, 647.096];
  if (pressurePa > (waterSaturationPressurePa(high) ?? 0)) return null;
  while (high - low > 1e-3) {
    const middle = (low + high) / 2;
    if ((waterSaturationPressurePa(middle) ?? Infinity) < pressurePa) low = middle;
    else high = middle;
  }
  return low;
}

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
