// The methods and assumptions behind the figures of engines with pistons, by their ids; the words of each are
// wording/cycle-methods.ts'. Invariant: an id never changes its meaning.

export type CycleMethodId =
  | 'cycle-consumption'
  | 'indicated-work'
  | 'mean-effective-pressure'
  | 'cycle-state'
  | 'exhaust-state'
  | 'residual-gas'
  | 'air-standard';

export type CycleAssumptionId =
  | 'instant-combustion'
  | 'mean-temperature'
  | 'early-wall-heat'
  | 'particle-corners'
  | 'frozen-exhaust'
  | 'no-short-circuit'
  | 'turbocharger-outside';
