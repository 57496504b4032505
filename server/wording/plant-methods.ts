// What each method of gas turbines and steam plants is, and each assumption, in words. One row an id; the compiler asks for the
// missing one. Knows no numbers. Invariant: every symbol of an equation is named in the words beside it.
// Sources: first law over each machine; IAPWS R7-97(2012) for water and steam.

import type { PlantAssumptionId, PlantMethodId } from '../scenario/plant-methods.ts';
import type { MethodText } from './method-text.ts';

const steady = 'For steady running at the rating; starts and part load are not in it.';

export const plantMethods: Readonly<Record<PlantMethodId, MethodText>> = {
  'turbine-consumption': {
    words:
      'The lower heating value over the work at the coupling that the turbine leaves after its compressor and friction.',
    equation: 'h = H / (η (w_t − w_c))',
    symbols:
      'h fuel energy for the work, H lower heating value, η mechanical efficiency, w_t and w_c work of turbine and compressor per kg of fuel',
    validity: steady,
  },
  'turbine-work': {
    words: 'The drop of enthalpy over the turbine, or its rise over the compressor, per kg of fuel.',
    equation: 'w = h₁ − h₂, h₁ − h₂ = η_s (h₁ − h_s)',
    symbols:
      'h₁ and h₂ enthalpies before and behind, h_s at the end pressure with the entropy of the start, η_s isentropic efficiency',
    validity: steady,
  },
  'turbine-state': {
    words:
      'The gas in equilibrium at the pressure behind the combustor, with air added until it has the temperature, or with the energy that fuel and air bring.',
    equation: 'h(T, p) = h_fuel + m h_air − q',
    symbols: 'h enthalpy of the gas per kg of fuel, m air per kg of fuel, q heat through the walls',
    validity: 'Mixed evenly; a real combustor has hotter and colder streaks.',
  },
  'turbine-exhaust': {
    words: 'The gas behind the turbine, and behind the recuperator where there is one.',
    equation: 'h_out = h₄ − m (h_x − h₂)',
    symbols:
      'h₄ enthalpy behind the turbine, m air per kg of fuel, h₂ and h_x enthalpy of the air before and behind the recuperator',
    validity: 'Nitric oxide and carbon monoxide are those of equilibrium: kinetics decide them.',
  },
  'heated-air': {
    words:
      'The same machines with air of variable heat capacity, heated through a wall to the same turbine inlet temperature.',
    equation: 'η = (w_t − w_c) / q',
    symbols: 'w_t and w_c work of turbine and compressor, q heat taken in, all per kg of air',
    validity: 'Shows what the fuel’s own mass, dissociation and particles change.',
  },
  'plant-consumption': {
    words: 'The lower heating value over the work at the coupling of the steam plant.',
    equation: 'h = 1 / (η_b η_c η_m)',
    symbols: 'η_b boiler efficiency, η_c efficiency of the steam cycle, η_m mechanical efficiency',
    validity: steady,
  },
  'boiler-efficiency': {
    words: 'Heat taken up by water and steam, over the heating value of the fuel.',
    equation: 'η_b = (h_fuel + m h_air − h_exhaust − q) / H',
    symbols: 'h enthalpies per kg of fuel, m air per kg of fuel, q heat through the walls, H heating value',
    validity: 'On the lower heating value it may pass 100 % where water condenses or the fuel is preheated.',
  },
  'steam-cycle-efficiency': {
    words: 'Work of the turbine less that of the pumps, over the heat that water and steam take up.',
    equation: 'η_c = (w_t − w_p) / q',
    symbols: 'w_t and w_p work of turbine and pumps, q heat in boiler and reheater, per kg of live steam',
    validity: steady,
  },
  'steam-flow': {
    words: 'Heat to the steam over what a kilogram of live steam takes up.',
    equation: 'm = η_b H / q',
    symbols: 'η_b boiler efficiency, H lower heating value, q heat in boiler and reheater per kg of live steam',
    validity: 'Without blow-down, leaks and steam for soot blowing.',
  },
  'steam-state': {
    words: 'Water and steam by the industrial formulation of 1997.',
    equation: 'g(p, T); h = g − T (∂g/∂T), s = −∂g/∂T',
    symbols: 'g specific Gibbs energy, h enthalpy, s entropy, p pressure, T temperature',
    validity: '0 to 800 °C, up to 100 MPa, but not near the critical point (above 350 °C and denser than steam).',
  },
  'boiler-flame': {
    words: 'The flame before it gives off any heat.',
    equation: 'h(T, p) = h_fuel + m h_air',
    symbols: 'h enthalpy of the products per kg of fuel, m air per kg of fuel',
    validity: 'In a furnace the flame radiates at once and is colder.',
  },
};

export const plantAssumptions: Readonly<Record<PlantAssumptionId, string>> = {
  'adiabatic-machines': 'Compressor and turbine lose no heat; their inefficiency stays in the gas.',
  'turbine-corners':
    'Where solids are in the gas the figure is a band: particles keep their heat or follow the gas, the composition follows or stays. The least work counts.',
  'no-cooling-air': 'No air is bled off to cool blades; with it, the same inlet temperature gives some points less.',
  'no-pressure-loss-in-pipes': 'No pressure is lost in pipes, boiler, reheater and valves of the water and steam.',
  'mixing-heater': 'Feedwater is warmed in one mixing heater by steam bled at its own pressure.',
  'losses-before-steam': 'Heat through the walls and fuel that does not burn are lost before the steam has its heat.',
};
