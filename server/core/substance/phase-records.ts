// Gathers the fitted records and the limits kept by hand into lists; the only place that names the files.
// The record files are written by `npm run fit` and never edited; the tests check both against their laws.

import alkaliMetals from './data/phases/alkali-metals.json';
import alkalineEarths from './data/phases/alkaline-earths.json';
import boronAndAluminium from './data/phases/boron-and-aluminium.json';
import ironSiliconTitanium from './data/phases/iron-silicon-titanium.json';
import nonMetals from './data/phases/non-metals.json';
import limits from './data/phase-limits.json';
import type { PhaseFit, PhaseLimit } from './phase-fit.ts';

// The compiler reads JSON strings as `string` and arrays as of any length; the tests vouch for the rest.
export const phaseFits = [
  alkaliMetals,
  alkalineEarths,
  boronAndAluminium,
  ironSiliconTitanium,
  nonMetals,
].flat() as readonly unknown[] as readonly PhaseFit[];

export const phaseLimits = limits as readonly unknown[] as readonly PhaseLimit[];
