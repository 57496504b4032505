// How acids and bases of sea water share themselves out at one pH: the carbonate species per dissolved carbon, and the
// alkalinity of everything else. It does not know what was measured, nor solves for anything.
// Invariant: alkalinity is Dickson's (1981): proton acceptors over donors against a zero level of pK 4.5 at 25 °C and zero
// ionic strength, and its slope by ln [H+] is exact and never positive.
// Source: Dickson 1981 (Deep-Sea Research 28A, 609); Guide to best practices for ocean CO2 measurements (2007), chapter 2.

import type { SeaConstants } from './constants-at-depth.ts';

/** Nutrients that take part, mol per kg of sea water. */
export interface Nutrients {
  readonly phosphate: number;
  readonly silicate: number;
}

export const noNutrients: Nutrients = { phosphate: 0, silicate: 0 };

/** The water, but for its carbon. */
export interface SeaMedium {
  readonly constants: SeaConstants;
  readonly nutrients: Nutrients;
}

/** Shares of the dissolved carbon, which add up to one. */
export interface CarbonShares {
  readonly dioxide: number;
  readonly hydrogenCarbonate: number;
  readonly carbonate: number;
  /** Alkalinity per dissolved carbon: the mean number of protons given away. */
  readonly charge: number;
  /** Variance of that number; minus the slope of `charge` by ln [H+]. */
  readonly spread: number;
}

/** The carbonate shares at a hydrogen ion concentration on the total scale, mol/kg. */
export function carbonShares({ carbonic1, carbonic2 }: SeaConstants, hydrogen: number): CarbonShares {
  const first = carbonic1 / hydrogen;
  const second = (first * carbonic2) / hydrogen;
  const sum = 1 + first + second;
  const hydrogenCarbonate = first / sum;
  const carbonate = second / sum;
  const charge = hydrogenCarbonate + 2 * carbonate;
  const spread = hydrogenCarbonate + 4 * carbonate - charge ** 2;
  return { dioxide: 1 / sum, hydrogenCarbonate, carbonate, charge, spread };
}

/** Everything but carbon that takes part in alkalinity, mol/kg; free hydrogen on its own scale. */
export interface OtherSpecies {
  readonly borate: number;
  readonly hydroxide: number;
  readonly freeHydrogen: number;
  readonly hydrogenSulphate: number;
  readonly hydrogenFluoride: number;
  /** HPO4-- + 2 PO4--- − H3PO4, as alkalinity. */
  readonly phosphateAlkalinity: number;
  readonly silicateAlkalinity: number;
  /** Their sum as alkalinity, and its slope by ln [H+]. */
  readonly alkalinity: number;
  readonly slope: number;
}

/** All species but those of carbon at a hydrogen ion concentration on the total scale, mol/kg. */
export function otherSpecies({ constants, nutrients }: SeaMedium, hydrogen: number): OtherSpecies {
  const { ions } = constants;
  const borate = dissociated(ions.boron, constants.boric, hydrogen);
  const silicate = dissociated(nutrients.silicate, constants.silicic, hydrogen);
  const hydroxide = constants.water / hydrogen;
  const freeHydrogen = hydrogen / constants.totalPerFree;
  const sulphate = dissociated(ions.sulphate, constants.hydrogenSulphateFree, freeHydrogen);
  const fluoride = dissociated(ions.fluoride, constants.hydrogenFluorideFree, freeHydrogen);
  const phosphate = phosphoric(constants, nutrients.phosphate, hydrogen);
  const hydrogenSulphate = ions.sulphate - sulphate.base;
  const hydrogenFluoride = ions.fluoride - fluoride.base;
  const alkalinity =
    borate.base + silicate.base + hydroxide + phosphate.base - freeHydrogen - hydrogenSulphate - hydrogenFluoride;
  const slope =
    borate.slope + silicate.slope + phosphate.slope + sulphate.slope + fluoride.slope - hydroxide - freeHydrogen;
  return {
    borate: borate.base,
    hydroxide,
    freeHydrogen,
    hydrogenSulphate,
    hydrogenFluoride,
    phosphateAlkalinity: phosphate.base,
    silicateAlkalinity: silicate.base,
    alkalinity,
    slope,
  };
}

/** An acid that gives one proton: its base, and the base's slope by ln [H+]. */
function dissociated(total: number, constant: number, hydrogen: number): { base: number; slope: number } {
  const share = constant / (constant + hydrogen);
  return { base: total * share, slope: -total * share * (hydrogen / (constant + hydrogen)) };
}

/** Phosphoric acid, whose zero level is H2PO4-: its alkalinity and that one's slope. */
function phosphoric(constants: SeaConstants, total: number, hydrogen: number): { base: number; slope: number } {
  if (total === 0) return { base: 0, slope: 0 };
  const first = constants.phosphoric1 / hydrogen;
  const second = (first * constants.phosphoric2) / hydrogen;
  const third = (second * constants.phosphoric3) / hydrogen;
  const sum = 1 + first + second + third;
  const mean = (first + 2 * second + 3 * third) / sum;
  const meanSquare = (first + 4 * second + 9 * third) / sum;
  return { base: total * (mean - 1), slope: -total * (meanSquare - mean ** 2) };
}
