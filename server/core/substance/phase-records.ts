// Gathers the fitted records and what is kept by hand beside them into lists; the only place that names the files.
// The files of data/phases/ are written by `npm run fit` and never edited; the tests check all against their laws.

import alkaliMetals from './data/phases/alkali-metals.json';
import alkalineEarths from './data/phases/alkaline-earths.json';
import boronAndAluminium from './data/phases/boron-and-aluminium.json';
import ironSiliconTitanium from './data/phases/iron-silicon-titanium.json';
import nonMetals from './data/phases/non-metals.json';
import carbonates from './data/phases-by-hand/carbonates.json';
import hydrates from './data/phases-by-hand/hydrates.json';
import oxidesAndCalciumSalts from './data/phases-by-hand/oxides-and-calcium-salts.json';
import handSources from './data/phases-by-hand/sources.json';
import hypothetical from './data/hypothetical-phases.json';
import limits from './data/phase-limits.json';
import type { HandPhaseRecord } from './hand-phase.ts';
import type { HypotheticalPhase, PhaseFit, PhaseLimit } from './phase-fit.ts';
import type { SourceRecord } from './record.ts';

// The compiler reads JSON strings as `string` and arrays as of any length; the tests vouch for the rest.
export const phaseFits = [
  alkaliMetals,
  alkalineEarths,
  boronAndAluminium,
  ironSiliconTitanium,
  nonMetals,
].flat() as readonly unknown[] as readonly PhaseFit[];

export const phaseLimits = limits as readonly unknown[] as readonly PhaseLimit[];

export const handPhaseRecords = [
  carbonates,
  hydrates,
  oxidesAndCalciumSalts,
].flat() as readonly unknown[] as readonly HandPhaseRecord[];

/** Those that the substances do not cite already. */
export const handPhaseSources = handSources as readonly unknown[] as readonly SourceRecord[];

export const hypotheticalPhases = hypothetical as readonly unknown[] as readonly HypotheticalPhase[];
