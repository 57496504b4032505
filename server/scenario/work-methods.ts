// The methods and assumptions behind the figures of measured engines, duties and services, by their ids; the words of each
// are wording/work-methods.ts'. Invariant: an id never changes its meaning.

export type WorkMethodId =
  | 'measured-consumption'
  | 'brake-efficiency'
  | 'nitrogen-oxide-limit'
  | 'duty-sum'
  | 'weighted-mode-load'
  | 'propeller-law'
  | 'service-fuel'
  | 'service-emission'
  | 'service-residue'
  | 'service-tank'
  | 'service-endurance'
  | 'against-baseline';

export type WorkAssumptionId =
  | 'lower-heating-value-basis'
  | 'tolerance-upwards'
  | 'same-use-of-heat'
  | 'reference-ambient'
  | 'friction-kept'
  | 'beyond-measured'
  | 'all-carbon-to-dioxide'
  | 'slate-as-residue'
  | 'cubic-propeller'
  | 'baseline-all-engines'
  | 'bare-tanks'
  | 'boil-off-on-duty';
