// What each method of engines with pistons is, and each assumption, in words. One row an id; the compiler asks for the
// missing one. Knows no numbers. Invariant: every symbol of an equation is named in the words beside it.

import type { CycleAssumptionId, CycleMethodId } from '../scenario/cycle-methods.ts';
import type { MethodText } from './method-text.ts';

export const cycleMethods: Readonly<Record<CycleMethodId, MethodText>> = {
  'cycle-consumption': {
    words:
      'From the cycle at the rating: the work on the piston is kept for the fuel at every load, and the power lost to friction at every load as at the rating.',
    equation: 'h = (P + Pf) / (ηi P),  Pf = P₀ (1/ηm − 1)',
    symbols:
      'h fuel energy for the work, P power at the shaft, Pf power lost to friction, P₀ rated power, ηi work on the piston less gas exchange over the heating value, ηm mechanical efficiency',
    validity: 'A straight line of fuel over load (Willans); a boost that falls with load is not followed.',
  },
  'indicated-work': {
    words:
      'Work of expansion less work of compression while the cylinder is closed, by the energies of the states; the work of gas exchange is told apart.',
    equation: 'Wi = p₃ (V₃ − V₂) + U₃ − U₄ − (U₂ − U₁)',
    symbols: 'p pressure, V volume and U energy at 1 filled, 2 compressed, 3 burnt, 4 expanded',
    validity:
      'An engine that burns at once, breathes without throttling and keeps its gas mixed does as much; a real one less.',
  },
  'mean-effective-pressure': {
    words: 'Work of a cycle over the volume that the piston sweeps.',
    equation: 'pm = W / (V₁ − V₂)',
    symbols: 'W work, V₁ largest and V₂ smallest volume',
    validity: 'For one cycle; power takes the swept volume and the cycles in a time.',
  },
  'cycle-state': {
    words:
      'Compressed without change of composition and without exchange of heat; burnt to chemical equilibrium at the smallest volume, at a held pressure, or at that volume up to the limit of pressure and then at that.',
    equation: 'U₃ + p₃V₃ = U₂ + p₃V₂ + Hf − Qw  (at a pressure),  U₃ = U₂ + Hf − Qw  (at the volume)',
    symbols: 'U energy, p pressure, V volume, Hf enthalpy of the injected fuel, Qw heat to the walls while it burns',
    validity:
      'Mean temperature of the whole charge: flames are hotter. Ideal gas, which errs by some per cent above 150 bar.',
  },
  'exhaust-state': {
    words:
      'What leaves while the gas blows down and is pushed out, mixed, by the first law over the exchange of gas; the composition stays as it was at the end of expansion.',
    equation: 'He = Hin + U₄ − U₁ + Wp',
    symbols:
      'He enthalpy of the exhaust, Hin of the fresh gas, U₁ and U₄ energy at the start and the end of the closed cylinder, Wp work of the piston on the gas between',
    validity: 'Behind the valve and before any turbine; heat lost in ports is not counted.',
  },
  'residual-gas': {
    words:
      'What fills the smallest volume at the pressure of the exhaust, at the temperature that gas which stays has after blow-down, or the share that is given; found so that it is what the same cycle leaves.',
    equation: 'm_r h_r + m_f h_f + (pi − pe) V₂ = H₁',
    symbols:
      'm mass and h enthalpy of residual gas r and fresh gas f, pi and pe pressures of intake and exhaust, V₂ smallest volume, H₁ enthalpy as compression begins',
    validity: 'Valves that open and close at dead centre; overlap scavenges more, short circuits are not followed.',
  },
  'air-standard': {
    words:
      'The same moles of a gas with constant heat capacities, from the same state, compressed as much and given the heat in the same way.',
    equation: 'η = 1 − (α βᵞ − 1) / (r^(γ−1) (α − 1 + γ α (β − 1)))',
    symbols: 'r compression ratio, α pressure ratio at the smallest volume, β cut-off ratio, γ = 1.4',
    validity: 'What lies between it and the cycle is the price of hot gas, dissociation, residual gas and particles.',
  },
};

export const cycleAssumptions: Readonly<Record<CycleAssumptionId, string>> = {
  'instant-combustion': 'It burns at once at the smallest volume, or just as fast as keeps the pressure.',
  'mean-temperature': 'The charge has one temperature throughout; the flame itself is hotter.',
  'early-wall-heat':
    'Heat to the walls leaves while it burns, where it costs most work, unless the entry says what part of it does.',
  'particle-corners':
    'Particles share the temperature of the gas or keep their heat, and the composition follows or is frozen: the value is the corner with the least work, the ends are those of all four.',
  'frozen-exhaust': 'From the end of expansion on nothing reacts.',
  'no-short-circuit': 'No fresh gas leaves unused.',
  'turbocharger-outside':
    'Pressures before and behind the cylinder are as given; whether a turbocharger can hold them is not asked.',
};
