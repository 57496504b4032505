// The physical constants the program computes with, in SI base units, each with the place it is laid down.
// It holds only constants that are fixed by definition or convention; measured property data live with the substances.
// Invariant: a value here is exact, so none of them contributes to an uncertainty.
// Units, the year among them, are defined in units.ts. Sources: SI Brochure, 9th edition (BIPM, 2019); CODATA 2018.

/** Molar gas constant, J/(mol K): the product of the exact Boltzmann and Avogadro constants (CODATA 2018). */
export const molarGasConstantJPerMolK = 8.31446261815324;

/** Standard atmosphere, Pa (10th General Conference on Weights and Measures, 1954): the zero of gauge pressures here. */
export const standardAtmospherePa = 101325;

/** Standard pressure of the tables and of every standard state here, Pa (IUPAC 1982). */
export const standardPressurePa = 1e5;

/** Zero of the Celsius scale, K (SI Brochure, section 2.3.1). */
export const celsiusZeroK = 273.15;
