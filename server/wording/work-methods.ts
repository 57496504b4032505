// What each method of measured engines, duties and services is, and each assumption, in words. One row an id; the compiler
// asks for the missing one. Knows no numbers. Invariant: every symbol of an equation is named in the words beside it.
// Sources: ISO 3046-1 (specific consumption, its tolerance, reference conditions), ISO 8178-4 (weighting of modes),
// MARPOL Annex VI regulation 13 (limits of nitrogen oxides), each named in its row.

import type { WorkAssumptionId, WorkMethodId } from '../scenario/work-methods.ts';
import type { MethodText } from './method-text.ts';

export const workMethods: Readonly<Record<WorkMethodId, MethodText>> = {
  'measured-consumption': {
    words:
      'The measured consumption at that load, on the heating value it was measured on; on another fuel, with the energy that sets free the same heat above exhaust temperature.',
    equation: 'h = b H₀ · (s₀ / s)',
    symbols:
      'h fuel energy for the work, b measured consumption, H₀ heating value it was measured on, s₀ and s shares of the heating value set free above exhaust temperature by the fuel measured and the fuel burnt',
    validity:
      'Between measured loads it is interpolated by a monotone cubic (Fritsch and Carlson); outside them it is extrapolated along the Willans line, which is a guess.',
  },
  'brake-efficiency': {
    words: 'Work at the shaft over the energy of all fuel, on the lower heating value.',
    equation: 'η = W / Q',
    symbols: 'W work at the shaft, Q lower heating value of the fuel burnt for it',
    validity: 'Says nothing about what the work costs; a heating value depends on the product slate printed beside it.',
  },
  'nitrogen-oxide-limit': {
    words: 'The limit of total weighted nitrogen oxides, as NO2, that goes with the rated speed.',
    equation: 'e = a n^(−k) between 130 and 2000 rpm, a constant below and above',
    symbols: 'e limit in g/kWh, n rated speed in rpm, a and k constants of the tier',
    validity:
      'MARPOL Annex VI, regulation 13: marine diesel engines above 130 kW, weighted over the test cycle of their use; tier III in its control areas.',
  },
  'duty-sum': {
    words: 'Added up over the legs, with the hotel load of every leg.',
    equation: 'E = Σ Pᵢ tᵢ',
    symbols: 'Pᵢ power at the shaft and tᵢ time of leg i',
    validity: 'Holds for steady legs: what starting, stopping and manoeuvring take is not in it.',
  },
  'weighted-mode-load': {
    words: 'The loads of the modes of the test cycle, weighted.',
    equation: 'L = Σ wᵢ Lᵢ',
    symbols: 'wᵢ weighting factor and Lᵢ load of mode i, over the rating',
    validity: 'ISO 8178-4:2020. A test cycle certifies an engine; it does not describe what one does.',
  },
  'propeller-law': {
    words: 'Power from speed through the propeller law, from the service speed and the power that goes with it.',
    equation: 'P = P₀ (v / v₀)ⁿ · (1 + m)(1 + f)',
    symbols:
      'P₀ power in calm water at the service speed v₀, v speed, n exponent of the propeller law (3 unless said), m sea margin, f fouling',
    validity:
      'Good for displacement hulls below hull speed at one draught; fast or shallow water takes an exponent of 4 and more.',
  },
  'service-fuel': {
    words: "Fuel energy of each leg from the engine's consumption at its load, over the heating value of the fuel.",
    equation: 'm = Σ hᵢ Eᵢ / H',
    symbols: 'hᵢ fuel energy for the work at the load of leg i, Eᵢ work of the leg, H lower heating value',
    validity: 'Holds for engines at the loads their consumption is known for; findings say where that is not so.',
  },
  'service-emission': {
    words: 'Mass of each fuel times its factor, added up.',
    equation: 'm = Σ mᵢ fᵢ',
    symbols: 'mᵢ mass of fuel i, fᵢ what 1 kg of it gives',
    validity: 'Complete combustion; what slips through is a figure of its own.',
  },
  'service-residue': {
    words: 'What is condensed at 25 °C among the products of complete combustion, and ash as given.',
    equation: 'r = Σ mᵢ Σ wⱼ',
    symbols: 'mᵢ mass of fuel i, wⱼ mass of condensed product j from 1 kg of it',
    validity:
      'On the product slate that the heating value rests on; carbonate is made on cooling and its share depends on time and temperature.',
  },
  'service-tank': {
    words:
      'Fuel carried, reserve included, over the maximum filling and the share of its space that a tank of that form uses.',
    equation: 'V = m / (ρ φ p)',
    symbols: 'm fuel carried, ρ its density, φ maximum filling, p packing share',
    validity: 'Cofferdams, pumps, lines and treatment rooms are not in it.',
  },
  'service-endurance': {
    words: 'How long the fuel carried lasts at the mean consumption of the duty.',
    equation: 't = m / ṁ',
    symbols: 'm fuel carried, ṁ mean consumption over the duty',
    validity: 'Holds for the duty as it is written; boil-off counted where it is given.',
  },
  'against-baseline': {
    words: 'The same work with every engine on the baseline fuel, and the difference.',
    equation: 'Δ = x − x₀',
    symbols: 'x figure of the service, x₀ of the same service on the baseline fuel',
    validity: 'Tanks of the baseline are taken as plain tanks with the same maximum filling.',
  },
};

export const workAssumptions: Readonly<Record<WorkAssumptionId, string>> = {
  'lower-heating-value-basis': 'Efficiency and specific consumption are on the lower heating value.',
  'tolerance-upwards':
    'The tolerance of the consumption is taken upwards: the value reckons with all of it, the lower end with none.',
  'same-use-of-heat':
    'On another fuel the engine makes the same work of the heat set free above exhaust temperature; what would form in gas colder than 1000 °C, or than it is written to freeze at, comes too late for work.',
  'reference-ambient':
    'Consumption holds at 25 °C and 100 kPa unless said otherwise; it is not carried over to other air.',
  'friction-kept':
    'Friction takes the same power at every load, and the indicated efficiency stays that of the rating.',
  'beyond-measured': 'At a load that was not measured, fuel is extrapolated in a straight line over the load.',
  'all-carbon-to-dioxide': 'All carbon of the fuel counts as carbon dioxide, also what ends in carbonate.',
  'slate-as-residue':
    'Residue is what is solid or liquid at 25 °C of the products of complete combustion, water apart.',
  'cubic-propeller': 'Power goes with the third power of speed.',
  'baseline-all-engines': 'On the baseline every engine burns the baseline fuel.',
  'bare-tanks':
    'Form of tanks and boil-off are for the main fuel alone: tanks of any other fuel take their volume, nothing boils off, and they weigh nothing unless the mass of tank names that fuel.',
  'boil-off-on-duty': 'Without a number of duties per year, fuel boils off while on duty only.',
};
