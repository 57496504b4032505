// What was assumed on the way to a figure, one sentence an assumption; shown under "why?" and in reports.
// One row an id; the compiler asks for the missing one. Knows no numbers. Invariant: each sentence stands by itself.
// Source: language reference, "Conventions the answers rest on".

import type { AssumptionId } from '../scenario/working.ts';
import { cycleAssumptions } from './cycle-methods.ts';
import { plantAssumptions } from './plant-methods.ts';
import { seaAssumptions } from './sea-methods.ts';
import { workAssumptions } from './work-methods.ts';

/** The sentence of an assumption. */
export function assumptionText(assumption: AssumptionId): string {
  return assumptions[assumption];
}

const assumptions: Readonly<Record<AssumptionId, string>> = {
  ...workAssumptions,
  ...cycleAssumptions,
  ...plantAssumptions,
  ...seaAssumptions,
  'reference-state': 'Everything starts and ends at the reference state, 25 °C and 1 bar.',
  'ideal-mixing-enthalpy': 'Mixing the portions sets no heat free and takes none up.',
  'volumes-add': 'The volumes of the portions add up.',
  'carbonate-slate':
    'Alkali ends as chloride, fluoride and sulphate, then as carbonate as far as the carbon reaches, then as hydroxide, then as oxide.',
  'hydroxide-slate': 'Alkali ends as hydroxide as far as the hydrogen reaches; all carbon leaves as carbon dioxide.',
  'oxide-slate': 'Alkali ends as oxide; all carbon leaves as carbon dioxide.',
  'given-slate': 'The products are those named under `products:`.',
  'dry-air': 'Dry air by mole: N2 78.084 %, O2 20.946 %, Ar 0.934 %, CO2 0.036 %.',
  'shares-scaled': 'The composition given does not add up to 100 % exactly and was scaled to it.',
  'stable-phase': 'Where no phase is written, the phase stable at the state given is meant.',
  'ideal-gas': 'Gases are ideal.',
  'no-dissolving': 'Nothing dissolves in anything else; melting points are those of the pure substances.',
  'element-scale':
    'Enthalpies count the elements in their reference states at 25 °C as zero; standard states at 1 bar.',
  'dry-gas': 'No humidity is given: the gas is taken as dry.',
  'fossil-by-default': 'Carbon whose origin is not stated is taken as fossil.',
  'several-alkalis-proportional':
    'Several alkali metals share the acids and the carbon in proportion to their amounts.',
  'complete-equilibrium': 'Every reaction reaches its equilibrium: time and mixing are no limit.',
  'pure-condensed': 'What is condensed is pure: melts and solids do not dissolve in each other.',
  'dense-gas': 'Above 100 bar real gases differ from ideal ones by several percent.',
  'no-other-loss': 'No heat is lost but what is stated: radiation and walls take none.',
  'kinetics-decide': 'What freezes in a flame is decided by kinetics; equilibrium gives the order of magnitude.',
  'carbonate-on-cooling': 'Carbonate is made as the gas cools, seldom in the flame itself.',
  'slow-solids':
    'Hydrogen carbonates and hydrates take hours and moisture: where they appear they are a limit, not a forecast.',
  'usual-carbon-origin':
    'Substances of the catalogue count with the usual origin of their carbon (ethanol as fermented, methanol as made of natural gas); a substance of the scenario can say another.',
  'vapours-by-layers':
    'Vapours follow Raoult’s law; water and polar liquids on one side and oils on the other exert their pressures as if they did not mix, which errs towards danger.',
  'usual-oil-limit': 'Where no lower limit of an oil’s vapour is recorded, 0.7 % is taken.',
  'everything-reacts': 'All that can react does, whatever the time it takes: an upper bound.',
};
