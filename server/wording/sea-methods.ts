// What each method of a sea is, in words and symbols, and each assumption. One row an id; the compiler asks for the missing
// one. Knows no numbers. Invariant: every symbol of an equation is named in the words beside it.
// Sources: Zeebe and Wolf-Gladrow 2001; Guide to best practices for ocean CO2 measurements (2007); Wanninkhof 2014; Unesco 1981.

import type { SeaAssumptionId, SeaMethodId } from '../scenario/sea-methods.ts';
import type { MethodText } from './method-text.ts';

export const seaMethods: Readonly<Record<SeaMethodId, MethodText>> = {
  'carbonate-system': {
    words: 'The state of the carbonate system that has both variables given, each acid and base in equilibrium.',
    equation:
      'A = [HCO₃⁻] + 2 [CO₃²⁻] + [B(OH)₄⁻] + [OH⁻] − [H⁺] − [HSO₄⁻] − [HF] + nutrients; C = [CO₂] + [HCO₃⁻] + [CO₃²⁻]',
    symbols: 'A total alkalinity, C dissolved inorganic carbon, brackets amounts per kg of sea water',
    validity: 'Salinity 19 to 43 and 2 to 35 °C, the range of the constants of carbonic acid; no organic alkalinity.',
  },
  'saturation-state': {
    words:
      'The ion product of calcium and carbonate over the solubility product at salinity, temperature and pressure.',
    equation: 'Ω = [Ca²⁺] [CO₃²⁻] / Ksp',
    symbols: 'brackets amounts per kg of sea water, calcium in proportion to salinity',
    validity: 'Above 1 the solid does not dissolve; how fast it forms is another matter.',
  },
  'revelle-factor': {
    words: 'How many times more its fugacity changes than its dissolved carbon, both by share, at constant alkalinity.',
    equation: 'R = (∂ ln f / ∂ ln C) at constant A',
    symbols: 'f fugacity of CO2, C dissolved inorganic carbon, A total alkalinity',
    validity: 'For small changes; exact at the state given.',
  },
  'uptake-efficiency': {
    words:
      'The carbon that the water holds more per alkalinity once its fugacity is what it was, less the carbon that was delivered.',
    equation: 'u = a (∂C/∂A at constant f) − c',
    symbols:
      'u CO2 taken up, a alkalinity and c dissolved carbon delivered, C dissolved inorganic carbon, A total alkalinity, f fugacity of CO2',
    validity: 'Once it is well diluted and at equilibrium with the air, which takes weeks to months.',
  },
  'effluent-sums': {
    words: 'Alkalinity and dissolved carbon that the effluent brings, form by form.',
    equation: 'a = OH⁻ + 2 CO₃²⁻ + HCO₃⁻ − H⁺; c = CO₃²⁻ + HCO₃⁻',
    symbols: 'a alkalinity, c dissolved carbon, the forms moles per kg of effluent',
    validity: 'Holds whatever the forms turn into when they meet.',
  },
  'near-field-mixing': {
    words: 'The state with the alkalinity and the carbon of the effluent mixed in, before any gas is exchanged.',
    equation: "A' = A + a / D; C' = C + c / D",
    symbols:
      'A total alkalinity, C dissolved inorganic carbon, a and c what a kg of effluent brings, D kg of sea water per kg of effluent',
    validity: 'For dilutions of some ten on, and while nothing precipitates.',
  },
  'equilibrium-uptake': {
    words: 'The carbon of the mixed water once it is back at the fugacity it had, less that before and that delivered.',
    equation: "u = C(A', f) − C(A, f) − c / D",
    symbols:
      "u CO2 taken up, C dissolved inorganic carbon at an alkalinity and fugacity, A and A' alkalinity before and after, f fugacity before, c carbon a kg of effluent brings, D kg of sea water per kg of effluent",
    validity:
      'If the water stays as it is mixed until it is at equilibrium with the air; it takes up a little more if it is diluted further.',
  },
  'equilibration-time': {
    words:
      'The depth of the layer over the transfer velocity, times the carbon that has to move for each mole of dissolved CO2.',
    equation: 'τ = (h / k) (∂C/∂[CO₂] at constant A); k = 0.251 U² (Sc/660)^−½ cm/h',
    symbols:
      'h depth of the layer, k transfer velocity, C dissolved inorganic carbon, A total alkalinity, U wind speed in m/s, Sc Schmidt number',
    validity: 'An open, even layer at winds of 3 to 15 m/s; the transfer velocity itself is known to 20 %.',
  },
  'mixed-layer-share': {
    words:
      'Water that leaves the layer at random, on average after its residence, has come so far towards equilibrium.',
    equation: 's = T / (T + τ)',
    symbols: 's share of the uptake, T mean residence in the mixed layer, τ equilibration time',
    validity: 'Water that comes back to the surface takes up the rest later.',
  },
  'sea-density': {
    words: 'The international equation of state of sea water 1980.',
    equation: 'ρ = ρ(S, t, 0) / (1 − p / K(S, t, p))',
    symbols: 'S practical salinity, t temperature, p applied pressure, K secant bulk modulus',
    validity: 'Salinity up to 42, −2 to 40 °C, up to 1000 bar.',
  },
  'hydrostatic-pressure': {
    words: 'The pressure of a standard ocean above that depth.',
    equation: 'z = (1 − c₁) p − c₂ p²',
    symbols: 'z depth in m, p applied pressure in dbar, c₁ by latitude, c₂ 2.21 × 10⁻⁶',
    validity: 'Open ocean at a latitude of 45 degrees; elsewhere within 0.3 %.',
  },
};

export const seaAssumptions: Readonly<Record<SeaAssumptionId, string>> = {
  'total-ph-scale':
    'pH is on the total scale; against freshwater (NBS) buffers a meter reads about 0.1 higher in sea water.',
  'surface-fugacity':
    'Fugacity and partial pressure are those the water would have if it were brought to 1 atm as it is.',
  'no-nutrients':
    'Phosphate and silicate are not given and taken as none; in surface water they move pH by less than 0.01.',
  'air-held':
    'The water comes back to the partial pressure it had before: the air, and what it would have exchanged anyway, stay as they are.',
  'carbon-once':
    'Carbon that is delivered with the alkali is taken off the response of the sea: what an exhaust fixed is not counted again.',
  'nothing-precipitates':
    'Nothing precipitates. Calcium carbonate that does is lost uptake: it takes away two moles of alkalinity with each of carbon.',
  'effluent-water': 'The water that the effluent brings is left aside: salinity and temperature stay those of the sea.',
  'no-gas-yet': 'No gas has been exchanged yet; that takes weeks to months.',
  'even-layer':
    'The mixed layer is even, and the wind blows over it as it is given; published times are weeks to months, and longer where water is taken down first.',
};
