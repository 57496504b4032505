// The physical constants the program computes with, in SI base units, each with the place it is laid down.
// It holds only constants that are fixed by definition or convention; measured property data live with the substances.
// Invariant: a value here is exact, so none of them contributes to an uncertainty.
// Sources: SI Brochure, 9th edition (BIPM, 2019), which fixes the constants of CODATA 2018; ISO 80000; NIST SP 811.

/** Molar gas constant, J/(mol K): the product of the exact Boltzmann and Avogadro constants (CODATA 2018). */
export const molarGasConstantJPerMolK = 8.31446261815324;

/** Standard acceleration of gravity, m/s2 (3rd General Conference on Weights and Measures, 1901). */
export const standardGravityMPerS2 = 9.80665;

/** Standard atmosphere, Pa (10th General Conference on Weights and Measures, 1954): the zero of gauge pressures here. */
export const standardAtmospherePa = 101325;

/** Zero of the Celsius scale, K (SI Brochure, section 2.3.1). */
export const celsiusZeroK = 273.15;

/** The year of this program, s: 365.25 days (the Julian year; neither the calendar's nor the sun's). */
export const yearS = 31557600;
