// What sea water holds of the ions that keep to its salinity: boron, sulphate, fluoride, calcium and magnesium.
// It knows no equilibrium. Invariant: mol per kg of sea water, in proportion to the practical salinity.
// Sources: Guide to best practices for ocean CO2 measurements (2007), chapter 5: Uppström 1974 (boron), Morris and Riley 1966
// (sulphate), Riley 1965 (fluoride), Riley and Tongudai 1967 (calcium); Lee et al. 2010 (boron); Millero et al. 2008
// (magnesium, reference composition).

/** Mol per kg of sea water. */
export interface ConservedIons {
  readonly boron: number;
  readonly sulphate: number;
  readonly fluoride: number;
  readonly calcium: number;
  readonly magnesium: number;
}

/** By whose measurement boron follows from salinity: they differ by 4 %. */
export type BoronSource = 'uppstrom' | 'lee';

const salinityPerChlorinity = 1.80655;

/** Grams of boron per kg and per ‰ of chlorinity, over its molar mass. */
const boronPerChlorinity: Readonly<Record<BoronSource, number>> = {
  uppstrom: 0.000232 / 10.811,
  lee: 0.0002414 / 10.811,
};

/** The ions at a practical salinity. */
export function conservedIons(salinity: number, boronSource: BoronSource = 'uppstrom'): ConservedIons {
  const chlorinity = salinity / salinityPerChlorinity;
  return {
    boron: boronPerChlorinity[boronSource] * chlorinity,
    sulphate: (0.14 / 96.062) * chlorinity,
    fluoride: (0.000067 / 18.998) * chlorinity,
    calcium: (0.02128 / 40.087) * chlorinity,
    magnesium: (0.0528171 * salinity) / 35,
  };
}
