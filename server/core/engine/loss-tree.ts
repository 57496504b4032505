// Where the heating value of a kilogram of fuel goes in one cycle, and what comes in besides it: rows that add up to it.
// Knows no words and no rounding. Invariant: each row is worked out from states by itself, none is what the others leave, and
// yet they add up, as every state lies on one scale of energies.

import { stableCondensedPhase } from '../substance/phases.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import type { MatterState } from '../burn/burn.ts';
import type { EngineCharge, SolvedCycle } from './work-cycle.ts';

export type LossId =
  | 'brake-work'
  | 'friction'
  | 'wall-heat'
  | 'exhaust-sensible'
  | 'exhaust-latent'
  | 'exhaust-chemical'
  | 'unburnt-fuel'
  | 'brought-in';

export interface Loss {
  readonly id: LossId;
  readonly joulePerKg: number;
  readonly share: number;
}

/**
 * `exhaust-sensible`: down to 25 °C with the composition it leaves with, melts solidifying on the way · `exhaust-latent`:
 * vapours of metals and salts that would be condensed there · `exhaust-chemical`: what the composition is short of complete
 * combustion to the heating value's slate, dissociated and unreacted gas above all; negative where it goes further
 * (hydroxide to carbonate) · `brought-in`: heat of fuel and fresh gas above 25 °C, negative. Pumping is no loss of its own: brake
 * work and friction are what the cycle leaves after it, and what it gives the gas leaves with the exhaust.
 */
export function lossTree(engine: EngineCharge, { cycle, contentTimes }: SolvedCycle): readonly Loss[] {
  const { balance, exhaustEnthalpyJ, exhaustColdEnthalpyJ } = cycle;
  const { input, lowerHeatingValueJ, completeColdJ } = engine;
  const cold = cycle.expanded.matter({
    temperatureK: referenceTemperatureK,
    pressurePa: input.exhaustPressurePa,
  });
  const latentJ = latentHeat(cold) / contentTimes;
  const rows: readonly (readonly [LossId, number])[] = [
    ['brake-work', balance.brakeWorkJ],
    ['friction', balance.frictionWorkJ],
    ['wall-heat', balance.compressionHeatJ + balance.combustionHeatJ + balance.expansionHeatJ],
    ['exhaust-sensible', exhaustEnthalpyJ - exhaustColdEnthalpyJ + balance.unburntSensibleJ],
    ['exhaust-latent', latentJ],
    ['exhaust-chemical', exhaustColdEnthalpyJ - completeColdJ - latentJ],
    ['unburnt-fuel', (1 - input.completeness) * lowerHeatingValueJ],
    ['brought-in', -(balance.freshSensibleJ + balance.fuelSensibleJ)],
  ];
  return rows.map(([id, joulePerKg]) => ({ id, joulePerKg, share: joulePerKg / lowerHeatingValueJ }));
}

/** J that gases with a metal in them would give off, condensing at 25 °C into the same substance. */
export function latentHeat({ candidates, amountsMol }: MatterState): number {
  let heatJ = 0;
  for (let phase = 0; phase < candidates.gasCount; phase += 1) {
    const mol = amountsMol[phase] ?? 0;
    const gas = candidates.phases[phase];
    if (!(mol > 0) || gas === undefined || !canCondense(gas.formula.composition.keys())) continue;
    const condensed = stableCondensedPhase(gas.formula, referenceTemperatureK);
    const { formationEnthalpyJPerMol: ofGas } = gas;
    if (condensed.kind !== 'phase' || ofGas === undefined) continue;
    heatJ += mol * (ofGas - condensed.properties.enthalpyJPerMol);
  }
  return heatJ;
}

const makesGasesOnly = new Set(['H', 'He', 'C', 'N', 'O', 'F', 'Ne', 'S', 'Cl', 'Ar', 'Br', 'Kr', 'I', 'Xe']);

/** Whether any of these elements makes products that condense at an engine's temperatures, as metals do. */
export function canCondense(symbols: Iterable<string>): boolean {
  for (const symbol of symbols) if (!makesGasesOnly.has(symbol)) return true;
  return false;
}
