// What a reader of the tables must know and the numbers do not say: phases that a search for equilibrium must not use, values
// the fit cannot follow, the reasons of those over its limits, and notes on irregular sources. Kept by hand.
// Invariant: a phase is over the limits if and only if it has a reason here, which the tests check.
// Source: the tables themselves (Chase 1998), compared with each other and with the integrals of their own heat capacities.

import type { SetAside } from './source-table.ts';

/** Why a phase must not take part in a search for the stable state. */
export const leftOut: Readonly<Record<string, string>> = {
  Na2SO4_cr_delta:
    'its tabulated Gibbs energy lies up to 0.2 kJ/mol below form I above 707 K, though the source keeps it out of the stable sequence V, IV, I, liquid',
};

/** By the tables' ids: values that are not followed. They are still judged. */
export const setAside: Readonly<Record<string, readonly SetAside[]>> = {
  NaCN_cr: [{ atK: 288.5, values: ['heatCapacity', 'enthalpy', 'entropy'], heatKJ: 3.18 }],
  KClO4_cr: [{ atK: 200, values: ['entropy'] }],
};

/** By our ids: why a phase is over the limits of the fit. */
export const reasonsOverLimits: Readonly<Record<string, string>> = {
  'NaCN(cr)':
    'the order-disorder peak at 288.5 K (1548 J/(mol K), 68 on either side) is narrower than the rows; its heat, 3.18 kJ/mol from the enthalpies at 200 and 298.15 K, is taken up at once',
  'KClO4(cr)':
    'the entropy at 200 K is 0.9 J/(mol K) above what the heat capacities and enthalpies at 200 and 298.15 K allow',
};

/** By the tables' ids. */
export const notes: Readonly<Record<string, string>> = {
  FeO_cr: 'the hypothetical stoichiometric oxide; real wustite is Fe0.947O(cr,wustite)',
  SiO2_cr_quartz: 'tridymite is not in the source; by the tabulated Gibbs energies high cristobalite follows quartz',
  NH4Cl_cr: 'a change of form near 243 K is spread over 200 to 298 K',
  TiCl3_cr: 'a change of form near 214 K is spread over 200 to 298 K',
  KOH_cr: 'a change of form near 232 K is spread over 200 to 298 K',
  K_g: 'above 4300 K the source cuts off electronic levels at a limit that depends on temperature, with steps in enthalpy',
  Na_g: 'above 4300 K the source cuts off electronic levels at a limit that depends on temperature, with steps in enthalpy',
  Al2SiO5_cr_kyanite: 'the stable form is decided by differences smaller than the uncertainty of the source',
  Al2SiO5_cr_andalusite: 'the stable form is decided by differences smaller than the uncertainty of the source',
  Al2SiO5_cr_sillimanite: 'the stable form is decided by differences smaller than the uncertainty of the source',
};
