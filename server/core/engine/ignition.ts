// Whether a charge lights when it should, and not before: indicators by published correlations, each named, and no forecast.
// Knows the states of a cycle and no fuel but by its numbers. Invariant: delays fall with pressure and with temperature.
// Sources (from memory): ignition delay of sprays by H. H. Wolfer, VDI-Forschungsheft 392 (1938), of fuels with a cetane number
// above 50; of end gas by A. M. Douaud, P. Eyzat, SAE 780080 (1978), by octane number; the integral by J. C. Livengood, P. C.
// Wu, 5th Symp. (Int.) on Combustion (1955) 347; the lower flammable limit over temperature by M. G. Zabetakis, US Bureau of
// Mines Bulletin 627 (1965).

import { standardAtmospherePa } from '../quantity/constants.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import { compressed } from './charge.ts';
import type { WorkCycle } from './reciprocating.ts';

/** Seconds from injection to fire of a spray of diesel fuel. */
export function sprayDelayS(pressurePa: number, temperatureK: number): number {
  return 0.44e-3 * (pressurePa / standardAtmospherePa) ** -1.19 * Math.exp(4650 / temperatureK);
}

/** Seconds until a premixed charge of an octane number lights by itself. */
export function endGasDelayS(octaneNumber: number, pressurePa: number, temperatureK: number): number {
  return (
    17.68e-3 *
    (octaneNumber / 100) ** 3.402 *
    (pressurePa / standardAtmospherePa) ** -1.7 *
    Math.exp(3800 / temperatureK)
  );
}

export interface Knock {
  /** Time over delay, summed until the flame has burnt all: from 1 on the end gas lights first. */
  readonly integral: number;
  /** Of the last of the unburnt gas. */
  readonly endGasK: number;
}

/** Turn of the crankshaft while it burns, common practice of engines lit by a spark; not a question of the cycle. */
export const burnTurn = 40 / 360;

/**
 * How much of the rise of pressure the end gas sees: fire that takes time meets a piston that goes down already, and peaks at
 * about two thirds of the rise at constant volume (common practice; no source was seen for it). With no heat lost to the walls
 * the integral errs towards knock all the same: petrol of 95 octane at λ = 1 and a ratio of 9, from 300 K, gives 1.7 at
 * 3000 rpm, where engines run without.
 */
const reachedRise = 2 / 3;

/**
 * The end gas is compressed without exchange of heat from the end of compression up to `reachedRise`, while the crankshaft
 * turns by `burnTurn` at `speedPerS` turns a second. Null where it has no state.
 */
export function knockOf(
  { compressed: start, burnt }: WorkCycle,
  octaneNumber: number,
  speedPerS: number,
): Knock | null {
  const steps = 40;
  let integral = 0;
  let endGasK = start.temperatureK;
  for (let step = 0; step < steps; step += 1) {
    const share = (1 - Math.cos((Math.PI * (step + 0.5)) / steps)) / 2;
    const pressurePa = start.pressurePa + share * reachedRise * (burnt.pressurePa - start.pressurePa);
    const endGas = compressed(start, { pressurePa }, { law: 'isentropic' });
    if (endGas.kind === 'none') return null;
    endGasK = endGas.state.temperatureK;
    integral += burnTurn / speedPerS / steps / endGasDelayS(octaneNumber, pressurePa, endGasK);
  }
  return { integral, endGasK };
}

/** The lower flammable limit (mole share in air) at a temperature, from that at 25 °C. */
export function lowerLimitAt(limit: number, temperatureK: number): number {
  return Math.max(0, limit * (1 - 7.21e-4 * (temperatureK - referenceTemperatureK)));
}
