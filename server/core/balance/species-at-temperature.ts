// Enthalpy and entropy of a species at a temperature, in the phase written or, where none is written, in the phase that is
// stable at that temperature and pressure among all the tables have of its composition.
// Knows no equations. Invariant: on the scale where the elements in their reference states at 298.15 K have no enthalpy,
// so that sums over a balanced equation are those of the reaction. Method: lowest Gibbs energy, gases with R T ln(p / 1 bar).

import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import type { Formula } from '../substance/formula.ts';
import { phasesOfFormula, propertiesOfPhase, type PhaseProperties, type ThermoPhase } from '../substance/phases.ts';

export interface SpeciesAtTemperature {
  readonly phase: ThermoPhase;
  readonly properties: PhaseProperties;
  /** The formula carried no phase: the stable one was taken. */
  readonly guessed: boolean;
}

/** The species at a temperature in K and a pressure in Pa; undefined when the tables have nothing of it. */
export function speciesAtTemperature(
  formula: Formula,
  temperatureK: number,
  pressurePa: number,
): SpeciesAtTemperature | undefined {
  let best: { phase: ThermoPhase; properties: PhaseProperties; gibbs: number } | undefined;
  for (const phase of phasesOfFormula(formula)) {
    const properties = propertiesOfPhase(phase, temperatureK);
    if (!properties || phase.leftOut !== undefined) continue;
    const isGas = phase.formula.phase === 'g';
    const gibbs =
      properties.gibbsJPerMol +
      (isGas ? molarGasConstantJPerMolK * temperatureK * Math.log(pressurePa / standardPressurePa) : 0);
    // A phase beyond its data counts only where no other is within its own.
    const isBetter =
      !best ||
      (properties.extrapolated === 'no' && best.properties.extrapolated !== 'no') ||
      ((properties.extrapolated === 'no') === (best.properties.extrapolated === 'no') && gibbs < best.gibbs);
    if (isBetter) best = { phase, properties, gibbs };
  }
  return best && { phase: best.phase, properties: best.properties, guessed: formula.phase === undefined };
}
