// When what is added to sea water comes out of it as a solid again: brucite, then aragonite where a dissolved alkali makes it very
// basic; aragonite on its own grains, and running away, where the alkali came as particles. Published experiments, not a model.
// It knows no rates. Invariant: calcium carbonate that precipitates takes two moles of alkalinity for one of carbon, so that
// what it takes of the alkali delivered is uptake lost; a runaway takes some of the sea's own as well.
// Sources: Ringham et al. 2024 (Biogeosciences 21, 3551): with sodium hydroxide solids formed when pH passed 10.0 and aragonite 30,
// magnesium hydroxide first, aragonite within a day; Moras et al. 2022 (Biogeosciences 19, 3537): on particles of lime none at an
// aragonite saturation of about 5, runaway above 7; Hartmann et al. 2023 (Biogeosciences 20, 781).

import type { CarbonateState } from './carbonate-state.ts';

/** How alkali reaches the water. */
export const deliveryWays = ['solution', 'particles'] as const;

export type DeliveryWay = (typeof deliveryWays)[number];

/** `careful`: above what particles were seen to bear, below a runaway. */
export type PrecipitationRisk = 'none' | 'careful' | 'runaway' | 'brucite' | 'aragonite';

export const precipitationLimits = {
  /** pH (total scale) from which magnesium hydroxide comes out of a dissolved alkali. */
  brucitePh: 10,
  /** Aragonite saturation from which aragonite follows it. */
  dissolvedAragonite: 30,
  /** Aragonite saturation to keep below where there are particles, and that of a runaway. */
  particleAragonite: 5,
  runawayAragonite: 7,
} as const;

/** What comes out of a water that has just been given alkali. */
export function precipitationRisk(mixed: CarbonateState, way: DeliveryWay): PrecipitationRisk {
  const { brucitePh, dissolvedAragonite, particleAragonite, runawayAragonite } = precipitationLimits;
  const { ph, aragoniteSaturation } = mixed;
  if (way === 'particles' && aragoniteSaturation > runawayAragonite) return 'runaway';
  if (ph > brucitePh) return 'brucite';
  if (aragoniteSaturation > dissolvedAragonite) return 'aragonite';
  return way === 'particles' && aragoniteSaturation > particleAragonite ? 'careful' : 'none';
}
