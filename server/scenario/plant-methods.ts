// The methods and assumptions behind the figures of gas turbines and steam plants, by their ids; the words of each are
// wording/plant-methods.ts'. Invariant: an id never changes its meaning.

export type PlantMethodId =
  | 'turbine-consumption'
  | 'turbine-work'
  | 'turbine-state'
  | 'turbine-exhaust'
  | 'heated-air'
  | 'plant-consumption'
  | 'boiler-efficiency'
  | 'steam-cycle-efficiency'
  | 'steam-flow'
  | 'steam-state'
  | 'boiler-flame';

export type PlantAssumptionId =
  | 'adiabatic-machines'
  | 'turbine-corners'
  | 'no-cooling-air'
  | 'no-pressure-loss-in-pipes'
  | 'mixing-heater'
  | 'losses-before-steam';
