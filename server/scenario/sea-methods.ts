// How the figures of seas come about: the ids of methods and assumptions; the words of each are
// wording/sea-methods.ts'. Invariant: an id never changes its meaning.

export type SeaMethodId =
  | 'carbonate-system'
  | 'saturation-state'
  | 'revelle-factor'
  | 'uptake-efficiency'
  | 'effluent-sums'
  | 'near-field-mixing'
  | 'equilibrium-uptake'
  | 'equilibration-time'
  | 'mixed-layer-share'
  | 'sea-density'
  | 'hydrostatic-pressure';

export type SeaAssumptionId =
  | 'total-ph-scale'
  | 'surface-fugacity'
  | 'no-nutrients'
  | 'air-held'
  | 'carbon-once'
  | 'nothing-precipitates'
  | 'effluent-water'
  | 'no-gas-yet'
  | 'even-layer';
