// Heat capacity, its integrals and density of the hand-kept records at a temperature.
// Knows neither records nor the fitted phases of the tables (phase-curve.ts has those). Everything per kilogram.
// Invariant: enthalpy and entropy rises are the exact integrals of the heat capacity that is given back at each temperature.
// Outside the source's range the value of the nearer end is held, and the answer says so; nothing is extrapolated.

import type { Density, HeatCapacity } from './substance.ts';

/** J/(kg K) at a temperature in K; `inRange` is false where the nearer end of the source's range was taken. */
export function heatCapacityAt(
  heatCapacity: HeatCapacity,
  temperatureK: number,
): { readonly jPerKgK: number; readonly inRange: boolean } {
  const nearest = Math.min(Math.max(temperatureK, heatCapacity.fromK), heatCapacity.toK);
  const t = nearest / 1000;
  const jPerKgK = heatCapacity.terms.reduce((sum, term) => sum + term.jPerKgK * t ** term.power, 0);
  return { jPerKgK, inRange: nearest === temperatureK };
}

/** J/kg taken up between two temperatures in K at constant pressure, without a change of phase; negative when cooled. */
export function enthalpyRise(heatCapacity: HeatCapacity, fromK: number, toK: number): number {
  return integral(
    heatCapacity,
    fromK,
    toK,
    (power, t) => 1000 * primitive(power, t),
    (end, from, to) => end * (to - from),
  );
}

/** J/(kg K) of entropy between two temperatures in K at constant pressure, without a change of phase. */
export function entropyRise(heatCapacity: HeatCapacity, fromK: number, toK: number): number {
  return integral(
    heatCapacity,
    fromK,
    toK,
    (power, t) => primitive(power - 1, t),
    (end, from, to) => end * Math.log(to / from),
  );
}

/**
 * kg/m³ at a temperature in K: on straight lines between the source's points; else by the expansion from the one point,
 * within 60 K of it; else the one point, within 10 K of it. `inRange` is false where the nearer end was taken.
 */
export function densityAt(
  density: Density,
  temperatureK: number,
): { readonly kgPerM3: number; readonly inRange: boolean } {
  const { points, expansionPerK } = density;
  const first = points[0] ?? { temperatureK: density.temperatureK, kgPerM3: density.value };
  const last = points[points.length - 1] ?? first;
  if (points.length < 2) {
    const reachK = expansionPerK === undefined ? 10 : 60;
    const offset = Math.min(Math.max(temperatureK - first.temperatureK, -reachK), reachK);
    return {
      kgPerM3: density.value / (1 + (expansionPerK?.value ?? 0) * offset),
      inRange: first.temperatureK + offset === temperatureK,
    };
  }
  const nearest = Math.min(Math.max(temperatureK, first.temperatureK), last.temperatureK);
  const next = points.findIndex((point) => point.temperatureK >= nearest);
  const right = points[Math.max(next, 1)] ?? last;
  const left = points[Math.max(next, 1) - 1] ?? first;
  const share = (nearest - left.temperatureK) / (right.temperatureK - left.temperatureK);
  return { kgPerM3: left.kgPerM3 + share * (right.kgPerM3 - left.kgPerM3), inRange: nearest === temperatureK };
}

/** The primitive of t^power. */
function primitive(power: number, t: number): number {
  return power === -1 ? Math.log(t) : t ** (power + 1) / (power + 1);
}

/** Inside the range by the terms' primitives, outside with the end's value held. */
function integral(
  heatCapacity: HeatCapacity,
  fromK: number,
  toK: number,
  ofTerm: (power: number, t: number) => number,
  ofConstant: (jPerKgK: number, fromK: number, toK: number) => number,
): number {
  if (toK < fromK) return -integral(heatCapacity, toK, fromK, ofTerm, ofConstant);
  const start = Math.min(Math.max(fromK, heatCapacity.fromK), heatCapacity.toK);
  const end = Math.min(Math.max(toK, heatCapacity.fromK), heatCapacity.toK);
  const inside = heatCapacity.terms.reduce(
    (sum, term) => sum + term.jPerKgK * (ofTerm(term.power, end / 1000) - ofTerm(term.power, start / 1000)),
    0,
  );
  const at = (temperatureK: number) => heatCapacityAt(heatCapacity, temperatureK).jPerKgK;
  const below =
    Math.min(toK, heatCapacity.fromK) - fromK > 0 ? ofConstant(at(fromK), fromK, Math.min(toK, heatCapacity.fromK)) : 0;
  const above =
    toK - Math.max(fromK, heatCapacity.toK) > 0 ? ofConstant(at(toK), Math.max(fromK, heatCapacity.toK), toK) : 0;
  return inside + below + above;
}
