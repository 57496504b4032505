// The state of the carbonate system of a sea water: everything that follows from its medium, its hydrogen ions and its dissolved
// carbon. It solves nothing; solve-pair.ts finds those two from any two measured variables.
// Invariant: the species add up to the dissolved carbon, and their charges to the total alkalinity.
// Source: Guide to best practices for ocean CO2 measurements (2007), chapter 2.

import { carbonShares, otherSpecies, type CarbonShares, type OtherSpecies, type SeaMedium } from './speciation.ts';

/** Concentrations in mol per kg of sea water. */
export interface CarbonateState {
  readonly medium: SeaMedium;
  /** Total scale. */
  readonly hydrogen: number;
  readonly ph: number;
  readonly totalAlkalinity: number;
  readonly dissolvedCarbon: number;
  /** Dissolved CO2 and carbonic acid together. */
  readonly carbonDioxide: number;
  readonly hydrogenCarbonate: number;
  readonly carbonate: number;
  /** atm, the water being at 1 atm. */
  readonly fugacityAtm: number;
  readonly calciteSaturation: number;
  readonly aragoniteSaturation: number;
  readonly shares: CarbonShares;
  readonly others: OtherSpecies;
}

/** The state at a hydrogen ion concentration (total scale) and a dissolved inorganic carbon, mol/kg. */
export function carbonateState(medium: SeaMedium, hydrogen: number, dissolvedCarbon: number): CarbonateState {
  const { constants } = medium;
  const shares = carbonShares(constants, hydrogen);
  const others = otherSpecies(medium, hydrogen);
  const carbonate = dissolvedCarbon * shares.carbonate;
  const carbonDioxide = dissolvedCarbon * shares.dioxide;
  const ionProduct = constants.ions.calcium * carbonate;
  return {
    medium,
    hydrogen,
    ph: -Math.log10(hydrogen),
    totalAlkalinity: dissolvedCarbon * shares.charge + others.alkalinity,
    dissolvedCarbon,
    carbonDioxide,
    hydrogenCarbonate: dissolvedCarbon * shares.hydrogenCarbonate,
    carbonate,
    fugacityAtm: carbonDioxide / constants.carbonDioxide,
    calciteSaturation: ionProduct / constants.calcite,
    aragoniteSaturation: ionProduct / constants.aragonite,
    shares,
    others,
  };
}
