// What the property tests of equilibria draw from: temperatures, pressures and amounts over the ranges that a burn may meet, a
// fixed seed, and the relative distance of two numbers. Knows no solver. Invariant: the same seed gives the same cases.

import fc from 'fast-check';

export const runs = { seed: 20_261_201, numRuns: 60 };

export const temperatureK = fc.double({ min: 300, max: 5000, noNaN: true });
export const logPressureBar = fc.double({ min: -4, max: 3, noNaN: true });
/** Amounts over six powers of ten. */
export const share = fc.double({ min: -6, max: 0, noNaN: true }).map((power) => 10 ** power);

/** Relative, or absolute next to 0. */
export const near = (found: number, expected: number): number =>
  Math.abs(found - expected) / Math.max(Math.abs(expected), 1e-300);
