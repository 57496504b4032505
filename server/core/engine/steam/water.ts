// States of water and steam by pressure with temperature, enthalpy or entropy, liquid, vapour or both, and the saturation
// line, as a steam plant asks for them. Knows no plant. Invariant: a state's enthalpy and entropy are those of the fundamental
// equations at the temperature and pressure it names, also where it was found from one of them; where the formulation's region
// near the critical point (region 3) or beyond would be needed, there is no state and the answer says so.
// Source: IAPWS R7-97(2012). Temperatures are found from the fundamental equations themselves rather than from the release's
// backward equations, whose tolerance (25 mK) would show as a lack of closure in a plant's energy balance.

import { findZero } from '../../equilibrium/bracket.ts';
import { waterSaturationPressurePa, waterSaturationTemperatureK } from '../../substance/water-saturation.ts';
import { boundaryPressurePa, boundaryTemperatureK, liquidWater, steam } from './gibbs-regions.ts';
import type { SinglePhase } from './gibbs-regions.ts';

export interface WaterState {
  readonly kind: 'water';
  readonly phase: 'liquid' | 'vapour' | 'wet';
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly volumeM3PerKg: number;
  readonly enthalpyJPerKg: number;
  readonly entropyJPerKgK: number;
  /** At constant pressure; null where heat only evaporates. */
  readonly heatCapacityJPerKgK: number | null;
  /** Mass of vapour over the whole; 0 for liquid and 1 for vapour. */
  readonly dryness: number;
}

/**
 * Why there is no state. `near-critical`: region 3, above 623.15 K and denser than steam · `pressure`, `temperature`: beyond
 * 100 MPa (below the triple point's pressure for saturation), 273.15 or 1073.15 K · `not-finite`: a number given is none.
 */
export interface NoWater {
  readonly kind: 'none';
  readonly reason: 'near-critical' | 'pressure' | 'temperature' | 'not-finite';
}

export interface SaturatedWater {
  readonly kind: 'saturated';
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly liquid: WaterState;
  readonly vapour: WaterState;
}

export const waterRange = { lowestK: 273.15, highestK: 1073.15, highestPa: 100e6, regionThreeK: 623.15 } as const;

/** The state at a temperature in K and a pressure in Pa; on the saturation line itself, liquid. */
export function waterAt(temperatureK: number, pressurePa: number): WaterState | NoWater {
  const { lowestK, highestK, highestPa, regionThreeK } = waterRange;
  if (!Number.isFinite(temperatureK) || !Number.isFinite(pressurePa)) return { kind: 'none', reason: 'not-finite' };
  if (!(pressurePa > 0 && pressurePa <= highestPa)) return { kind: 'none', reason: 'pressure' };
  if (temperatureK < lowestK || temperatureK > highestK) return { kind: 'none', reason: 'temperature' };
  if (temperatureK <= regionThreeK) {
    return pressurePa >= saturationPa(temperatureK)
      ? liquidAt(temperatureK, pressurePa)
      : vapourAt(temperatureK, pressurePa);
  }
  if (pressurePa > regionThreePa && temperatureK < boundaryTemperatureK(pressurePa)) {
    return { kind: 'none', reason: 'near-critical' };
  }
  return vapourAt(temperatureK, pressurePa);
}

/** Boiling water and dry steam at a pressure in Pa, up to 16.529 MPa (623.15 K). */
export function saturatedWater(pressurePa: number): SaturatedWater | NoWater {
  if (!Number.isFinite(pressurePa)) return { kind: 'none', reason: 'not-finite' };
  const temperatureK = waterSaturationTemperatureK(pressurePa);
  if (temperatureK === undefined) {
    const isSupercritical = pressurePa > regionThreePa && pressurePa <= waterRange.highestPa;
    return { kind: 'none', reason: isSupercritical ? 'near-critical' : 'pressure' };
  }
  if (temperatureK > waterRange.regionThreeK) return { kind: 'none', reason: 'near-critical' };
  return {
    kind: 'saturated',
    temperatureK,
    pressurePa,
    liquid: liquidAt(temperatureK, pressurePa),
    vapour: vapourAt(temperatureK, pressurePa),
  };
}

/** The state of an enthalpy in J/kg at a pressure in Pa. */
export function waterAtEnthalpy(pressurePa: number, enthalpyJPerKg: number): WaterState | NoWater {
  return findState(pressurePa, enthalpyJPerKg, {
    of: ({ enthalpyJPerKg: found }) => found,
    slope: ({ heatCapacityJPerKgK }) => heatCapacityJPerKgK,
    nearEnough: 1e-6,
  });
}

/** The state of an entropy in J/(kg K) at a pressure in Pa. */
export function waterAtEntropy(pressurePa: number, entropyJPerKgK: number): WaterState | NoWater {
  return findState(pressurePa, entropyJPerKgK, {
    of: ({ entropyJPerKgK: found }) => found,
    slope: ({ heatCapacityJPerKgK, temperatureK }) =>
      heatCapacityJPerKgK === null ? null : heatCapacityJPerKgK / temperatureK,
    nearEnough: 1e-9,
  });
}

/** A property that rises with temperature at a held pressure. */
interface RisingProperty {
  readonly of: (state: WaterState) => number;
  readonly slope: (state: WaterState) => number | null;
  readonly nearEnough: number;
}

function findState(pressurePa: number, value: number, property: RisingProperty): WaterState | NoWater {
  const { lowestK, highestK, highestPa, regionThreeK } = waterRange;
  if (!Number.isFinite(value) || !Number.isFinite(pressurePa)) return { kind: 'none', reason: 'not-finite' };
  if (!(pressurePa > 0 && pressurePa <= highestPa)) return { kind: 'none', reason: 'pressure' };
  if (pressurePa > regionThreePa) {
    const boundaryK = boundaryTemperatureK(pressurePa);
    if (value <= property.of(liquidAt(regionThreeK, pressurePa))) {
      return search(pressurePa, value, property, liquidAt, [lowestK, regionThreeK]);
    }
    if (value < property.of(vapourAt(boundaryK, pressurePa))) return { kind: 'none', reason: 'near-critical' };
    return search(pressurePa, value, property, vapourAt, [boundaryK, highestK]);
  }
  const saturated = saturatedWater(pressurePa);
  // Below the triple point's pressure there is only steam (and ice, of which nothing is known here).
  if (saturated.kind === 'none') return search(pressurePa, value, property, vapourAt, [lowestK, highestK]);
  const { liquid, vapour, temperatureK } = saturated;
  const low = property.of(liquid);
  const high = property.of(vapour);
  if (value < low) return search(pressurePa, value, property, liquidAt, [lowestK, temperatureK]);
  if (value > high) return search(pressurePa, value, property, vapourAt, [temperatureK, highestK]);
  return wetState(saturated, (value - low) / (high - low));
}

/** The state of a dryness between 0 and 1 on the saturation line. */
export function wetState({ liquid, vapour, temperatureK, pressurePa }: SaturatedWater, dryness: number): WaterState {
  const mix = (a: number, b: number): number => a + dryness * (b - a);
  return {
    kind: 'water',
    phase: dryness <= 0 ? 'liquid' : dryness >= 1 ? 'vapour' : 'wet',
    temperatureK,
    pressurePa,
    volumeM3PerKg: mix(liquid.volumeM3PerKg, vapour.volumeM3PerKg),
    enthalpyJPerKg: mix(liquid.enthalpyJPerKg, vapour.enthalpyJPerKg),
    entropyJPerKgK: mix(liquid.entropyJPerKgK, vapour.entropyJPerKgK),
    heatCapacityJPerKgK: null,
    dryness,
  };
}

function search(
  pressurePa: number,
  value: number,
  property: RisingProperty,
  stateAt: (temperatureK: number, pressurePa: number) => WaterState,
  boundsK: readonly [number, number],
): WaterState | NoWater {
  const end = findZero<WaterState>(
    {
      stateAt: (temperatureK) => stateAt(temperatureK, pressurePa),
      valueOf: (state) => property.of(state) - value,
      slopeOf: property.slope,
      nearEnough: property.nearEnough,
    },
    boundsK,
    (boundsK[0] + boundsK[1]) / 2,
  );
  if (end.kind === 'root') return end.state;
  // The two neighbouring numbers on either side of the value: as near as numbers come.
  if (end.kind === 'jump') return end.low;
  return { kind: 'none', reason: 'temperature' };
}

function liquidAt(temperatureK: number, pressurePa: number): WaterState {
  return named('liquid', temperatureK, pressurePa, liquidWater(temperatureK, pressurePa), 0);
}

function vapourAt(temperatureK: number, pressurePa: number): WaterState {
  return named('vapour', temperatureK, pressurePa, steam(temperatureK, pressurePa), 1);
}

function named(
  phase: 'liquid' | 'vapour',
  temperatureK: number,
  pressurePa: number,
  properties: SinglePhase,
  dryness: number,
): WaterState {
  return { kind: 'water', phase, temperatureK, pressurePa, ...properties, dryness };
}

/** Saturation pressure, carried 10 mK down to 273.15 K, where the release's regions begin. */
function saturationPa(temperatureK: number): number {
  return waterSaturationPressurePa(Math.max(temperatureK, 273.16)) ?? Infinity;
}

/** Where region 3 begins on the saturation line: boundary pressure at 623.15 K, 16.529 MPa. */
const regionThreePa = boundaryPressurePa(waterRange.regionThreeK);
