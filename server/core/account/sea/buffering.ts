// How the carbonate system answers small changes, in closed form: the slopes of every variable by hydrogen ions, dissolved carbon
// and the equilibrium constants; the Revelle factor; how much carbon a mole of alkalinity takes up at a held fugacity; and
// the slopes of every variable by the two that were measured.
// It knows no finite doses (delivery.ts) and no uncertainties. Invariant: the slopes are derivatives of carbonateState itself.
// Sources: Zeebe and Wolf-Gladrow 2001, section 1.5; Egleston, Sabine and Morel 2010 (Global Biogeochem. Cycles 24, GB1002);
// JCGM 100:2008 (GUM), 5.1. The slopes follow from the variance of the charge per carbon; see speciation.ts.

import type { CarbonateState } from './carbonate-state.ts';
import type { CarbonateVariable } from './solve-pair.ts';

/** The constants that have a published uncertainty, and boron. */
export const uncertainConstants = [
  'carbonDioxide',
  'carbonic1',
  'carbonic2',
  'boric',
  'water',
  'boron',
  'calcite',
  'aragonite',
] as const;

export type UncertainConstant = (typeof uncertainConstants)[number];

/** What slopes are told of: the variables in mol/kg, pH, and the natural logarithm of the rest. */
export type SlopeOf = CarbonateVariable | 'ph' | 'ln-fugacity' | 'ln-calcite-saturation' | 'ln-aragonite-saturation';

/** Slopes of one variable by ln [H+], by dissolved carbon (mol/kg), and by the logarithm of each constant. */
interface Gradient {
  readonly lnHydrogen: number;
  readonly carbon: number;
  readonly constants: Readonly<Partial<Record<UncertainConstant, number>>>;
}

/** Relative change of the fugacity per relative change of dissolved carbon, alkalinity held. */
export function revelleFactor(state: CarbonateState): number {
  return 1 + (state.dissolvedCarbon * state.shares.charge ** 2) / bufferCapacity(state);
}

/** Moles of carbon taken up per mole of alkalinity added, the fugacity held (both small). */
export function uptakePerAlkalinity(state: CarbonateState): number {
  const { dissolvedCarbon, shares } = state;
  const charge = dissolvedCarbon * shares.charge;
  return charge / (charge * shares.charge + bufferCapacity(state));
}

/** Dissolved carbon that leaves or enters per change of dissolved CO2, alkalinity held. */
export function carbonPerDioxide(state: CarbonateState): number {
  return state.dissolvedCarbon / (revelleFactor(state) * state.carbonDioxide);
}

/** Alkalinity lost per ln [H+], dissolved carbon held, mol/kg. */
function bufferCapacity({ dissolvedCarbon, shares, others }: CarbonateState): number {
  return dissolvedCarbon * shares.spread - others.slope;
}

/** Slopes of a variable by the two known ones (in mol/kg, hydrogen too) and by ln of each constant, those being held. */
export interface PairSlopes {
  readonly byFirst: number;
  readonly bySecond: number;
  readonly byConstant: Readonly<Record<UncertainConstant, number>>;
}

/** Slopes of `of` where `first` and `second` are what is known. */
export function slopesByPair(
  state: CarbonateState,
  first: CarbonateVariable,
  second: CarbonateVariable,
  of: SlopeOf,
): PairSlopes {
  const [one, two, own] = [gradientOf(state, first), gradientOf(state, second), gradientOf(state, of)];
  // Cramer's rule for d(ln h) and d(carbon) that leave the known two as they are told.
  const determinant = one.lnHydrogen * two.carbon - one.carbon * two.lnHydrogen;
  const byFirst = (own.lnHydrogen * two.carbon - own.carbon * two.lnHydrogen) / determinant;
  const bySecond = (own.carbon * one.lnHydrogen - own.lnHydrogen * one.carbon) / determinant;
  const byConstant = (constant: UncertainConstant): number =>
    (own.constants[constant] ?? 0) -
    byFirst * (one.constants[constant] ?? 0) -
    bySecond * (two.constants[constant] ?? 0);
  return {
    byFirst,
    bySecond,
    byConstant: {
      carbonDioxide: byConstant('carbonDioxide'),
      carbonic1: byConstant('carbonic1'),
      carbonic2: byConstant('carbonic2'),
      boric: byConstant('boric'),
      water: byConstant('water'),
      boron: byConstant('boron'),
      calcite: byConstant('calcite'),
      aragonite: byConstant('aragonite'),
    },
  };
}

function gradientOf(state: CarbonateState, of: SlopeOf): Gradient {
  const { shares, others, medium, dissolvedCarbon, hydrogen } = state;
  const { constants } = medium;
  const { dioxide, carbonate, charge } = shares;
  switch (of) {
    case 'total-alkalinity':
      return {
        lnHydrogen: -bufferCapacity(state),
        carbon: charge,
        constants: {
          carbonic1: dissolvedCarbon * charge * dioxide,
          carbonic2: dissolvedCarbon * carbonate * (2 - charge),
          boric: (others.borate * hydrogen) / (constants.boric + hydrogen),
          water: others.hydroxide,
          boron: others.borate,
        },
      };
    case 'dissolved-carbon':
      return { lnHydrogen: 0, carbon: 1, constants: {} };
    case 'hydrogen':
      return { lnHydrogen: hydrogen, carbon: 0, constants: {} };
    case 'ph':
      return { lnHydrogen: -1 / Math.LN10, carbon: 0, constants: {} };
    case 'carbon-dioxide':
      return scaled(lnSpecies(state, 0), state.carbonDioxide);
    case 'hydrogen-carbonate':
      return scaled(lnSpecies(state, 1), state.hydrogenCarbonate);
    case 'carbonate':
      return scaled(lnSpecies(state, 2), state.carbonate);
    case 'ln-fugacity':
      return withConstant(lnSpecies(state, 0), 'carbonDioxide');
    case 'ln-calcite-saturation':
      return withConstant(lnSpecies(state, 2), 'calcite');
    case 'ln-aragonite-saturation':
      return withConstant(lnSpecies(state, 2), 'aragonite');
  }
}

/** Of the logarithm of the species that has given away so many protons. */
function lnSpecies({ shares, dissolvedCarbon }: CarbonateState, protons: 0 | 1 | 2): Gradient {
  return {
    lnHydrogen: shares.charge - protons,
    carbon: 1 / dissolvedCarbon,
    constants: {
      carbonic1: (protons >= 1 ? 1 : 0) - (1 - shares.dioxide),
      carbonic2: (protons >= 2 ? 1 : 0) - shares.carbonate,
    },
  };
}

function scaled({ lnHydrogen, carbon, constants }: Gradient, by: number): Gradient {
  const { carbonic1 = 0, carbonic2 = 0 } = constants;
  return {
    lnHydrogen: lnHydrogen * by,
    carbon: carbon * by,
    constants: { carbonic1: carbonic1 * by, carbonic2: carbonic2 * by },
  };
}

/** A quotient that the constant stands under. */
function withConstant(gradient: Gradient, constant: UncertainConstant): Gradient {
  return { ...gradient, constants: { ...gradient.constants, [constant]: -1 } };
}
