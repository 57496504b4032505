// How a figure came about: the record behind "why?". It names the method, the inputs with their places, the sources of
// the constants, what was assumed and where the result is valid. It holds no sentences: wording/ turns the ids into text.

import type { Quantity } from '../core/quantity/quantity.ts';
import type { CycleAssumptionId, CycleMethodId } from './cycle-methods.ts';
import type { Place } from './place.ts';
import type { PlantAssumptionId, PlantMethodId } from './plant-methods.ts';
import type { SeaAssumptionId, SeaMethodId } from './sea-methods.ts';
import type { WorkAssumptionId, WorkMethodId } from './work-methods.ts';

export interface Working {
  readonly method: MethodId;
  readonly inputs: readonly WorkingInput[];
  /** Each source once, in words (author, year, title). */
  readonly sources: readonly string[];
  readonly assumptions: readonly AssumptionId[];
}

export interface WorkingInput {
  readonly label: string;
  readonly quantity: Quantity | null;
  /** The unit to show it in. */
  readonly unit: string;
  /** Where in the text it comes from, if it does. */
  readonly place?: Place;
  readonly source?: string;
}

export type MethodId =
  | WorkMethodId
  | CycleMethodId
  | PlantMethodId
  | SeaMethodId
  | 'as-given'
  | 'molar-mass'
  | 'mean-molar-mass'
  | 'ideal-volume-mixing'
  | 'lower-heating-value'
  | 'higher-heating-value'
  | 'volumetric-heating-value'
  | 'stoichiometric-air'
  | 'carbon-factor'
  | 'biogenic-carbon-share'
  | 'water-made'
  | 'water-missing'
  | 'alkali-carbon-ratio'
  | 'formation-enthalpy'
  | 'formation-enthalpy-from-heating-value'
  | 'reaction-enthalpy'
  | 'reaction-gibbs-energy'
  | 'equilibrium-constant'
  | 'equilibrium-temperature'
  | 'specific-reaction-enthalpy'
  | 'solids-share'
  | 'wet-gas'
  | 'humidity-ratio'
  | 'ideal-gas-density'
  | 'flame-temperature'
  | 'flame-at-temperature'
  | 'zone-temperature'
  | 'flame-pressure'
  | 'condensed-share'
  | 'excess-air'
  | 'flame-gas'
  | 'flame-heat-capacity'
  | 'flame-gamma'
  | 'speed-of-sound'
  | 'carbonate-share'
  | 'heat-released'
  | 'preheat'
  | 'heat-above-exhaust'
  | 'peak-gas'
  | 'burn-out'
  | 'blend-flash-point'
  | 'le-chatelier'
  | 'limiting-oxygen'
  | 'water-contact'
  | 'own-hydrogen'
  | 'ullage-hydrogen'
  | 'ullage-pressure'
  | 'ullage-water';

export type AssumptionId =
  | WorkAssumptionId
  | CycleAssumptionId
  | PlantAssumptionId
  | SeaAssumptionId
  | 'reference-state'
  | 'ideal-mixing-enthalpy'
  | 'volumes-add'
  | 'carbonate-slate'
  | 'hydroxide-slate'
  | 'oxide-slate'
  | 'given-slate'
  | 'dry-air'
  | 'shares-scaled'
  | 'stable-phase'
  | 'ideal-gas'
  | 'dry-gas'
  | 'element-scale'
  | 'no-dissolving'
  | 'fossil-by-default'
  | 'several-alkalis-proportional'
  | 'complete-equilibrium'
  | 'pure-condensed'
  | 'dense-gas'
  | 'no-other-loss'
  | 'kinetics-decide'
  | 'carbonate-on-cooling'
  | 'slow-solids'
  | 'usual-carbon-origin'
  | 'vapours-by-layers'
  | 'usual-oil-limit'
  | 'everything-reacts';
