// What each method of the working is, in words and symbols, where it holds, and where it comes from in the literature.
// One row a method; the compiler asks for the missing one. Knows no numbers: those are in the working itself.
// Invariant: every symbol of an equation is named in the words beside it.
// Sources of the methods: language reference, "Conventions the answers rest on", and the textbooks named in the rows.

import type { MethodId } from '../scenario/working.ts';
import type { MethodText } from './method-text.ts';
import { cycleMethods } from './cycle-methods.ts';
import { plantMethods } from './plant-methods.ts';
import { seaMethods } from './sea-methods.ts';
import { workMethods } from './work-methods.ts';

/** The text of a method. */
export function methodText(method: MethodId): MethodText {
  return methods[method];
}

const methods: Readonly<Record<MethodId, MethodText>> = {
  ...workMethods,
  ...cycleMethods,
  ...plantMethods,
  ...seaMethods,
  'as-given': {
    words: 'Taken as it is given.',
    equation: null,
    symbols: '',
    validity: 'As good as its source, at the condition stated there.',
  },
  'molar-mass': {
    words: 'The standard atomic weights of the formula, added up.',
    equation: 'M = Σ nᵢ Aᵢ',
    symbols: 'nᵢ atoms of element i in the formula, Aᵢ its standard atomic weight',
    validity: 'Holds for elements of ordinary isotopic make-up.',
  },
  'mean-molar-mass': {
    words: 'The mass of the blend over its amount of substance.',
    equation: 'M = 1 / Σ (wᵢ / Mᵢ)',
    symbols: 'wᵢ mass share and Mᵢ molar mass of portion i',
    validity: 'Holds where every portion has a molar mass of its own.',
  },
  'ideal-volume-mixing': {
    words: 'The mass over the sum of the volumes that the portions have by themselves.',
    equation: 'ρ = 1 / Σ (wᵢ / ρᵢ)',
    symbols: 'wᵢ mass share and ρᵢ density of portion i',
    validity:
      'Good for oils among themselves and for solids in a liquid; water with alcohols or salts takes up to a few percent less.',
  },
  'lower-heating-value': {
    words:
      'Heat set free when 1 kg burns completely at 25 °C and the products are brought back to 25 °C, water staying vapour.',
    equation: 'LHV = (Σ nᵣ ΔfHᵣ − Σ nₚ ΔfHₚ) / m',
    symbols:
      'nᵣ, ΔfHᵣ amount and enthalpy of formation of what burns (oxygen has none), nₚ, ΔfHₚ of each product of the slate, m mass of what burns',
    validity: 'Holds for complete oxidation to the products listed; it is not the work an engine can have of the fuel.',
  },
  'higher-heating-value': {
    words: 'The lower heating value and the heat of condensing the water made.',
    equation: 'HHV = LHV + n(H₂O) ΔvapH / m',
    symbols:
      'n(H₂O) water vapour made, ΔvapH its enthalpy of condensation at 25 °C (44.0 kJ/mol), m mass of what burns',
    validity: 'Holds for complete oxidation to the products listed, all the water made being liquid at 25 °C.',
  },
  'volumetric-heating-value': {
    words: 'The heating value per mass times the density.',
    equation: 'H(volume) = H ρ',
    symbols: 'H heating value per mass, ρ density at the stored state',
    validity: 'Per litre of what stands in the tank at its stored state, without its blanket gas.',
  },
  'stoichiometric-air': {
    words: 'The oxygen demand by valence, and the dry air that brings it.',
    equation: 'L = (Σ nᵢ vᵢ / 4) M(air) / x(O₂)',
    symbols:
      'nᵢ moles of element i per kg, vᵢ its valence (C 4, H 1, O −2, Na 1, Mg 2 …), M(air) molar mass of dry air, x(O₂) its mole share of oxygen',
    validity: 'The same whether alkali ends as oxide, hydroxide or carbonate; sulphates and peroxides take more.',
  },
  'carbon-factor': {
    words: 'Carbon dioxide per kg if all the carbon left as carbon dioxide.',
    equation: 'C = w(C) M(CO₂) / M(C)',
    symbols: 'w(C) mass share of carbon',
    validity: 'An upper bound: carbon held back as carbonate or soot is still counted here.',
  },
  'biogenic-carbon-share': {
    words: 'The share of the carbon that is of biological origin.',
    equation: 'b = Σ w(C)ᵢ bᵢ / Σ w(C)ᵢ',
    symbols: 'w(C)ᵢ carbon brought by portion i, bᵢ its biogenic share',
    validity: 'As good as what is stated of each portion.',
  },
  'water-made': {
    words: 'Water among the products of complete combustion, what the fuel brings along as water included.',
    equation: null,
    symbols: '',
    validity: 'Holds for the product slate listed.',
  },
  'water-missing': {
    words: 'Water that would have to come from outside for all the alkali to end as hydroxide.',
    equation: null,
    symbols: '',
    validity: 'Counts the hydrogen of the blend itself; moisture of the air is not counted.',
  },
  'alkali-carbon-ratio': {
    words: 'Moles of alkali metal over moles of carbon; 2 is just enough alkali to hold all carbon as carbonate.',
    equation: 'r = n(alkali) / n(C)',
    symbols: 'n(alkali) moles of Li, Na, K, Rb and Cs, n(C) moles of carbon',
    validity: 'A count of atoms; it says nothing of how far the exhaust really goes.',
  },
  'formation-enthalpy': {
    words: 'The enthalpy of making it from the elements in their reference states.',
    equation: 'ΔfH = Σ nᵢ ΔfHᵢ',
    symbols: 'nᵢ, ΔfHᵢ amount and enthalpy of formation of each portion',
    validity: 'At 25 °C and 1 bar.',
  },
  'formation-enthalpy-from-heating-value': {
    words: 'Worked back from the heating value and the products of complete combustion.',
    equation: 'ΔfH = LHV m + Σ nₚ ΔfHₚ',
    symbols: 'LHV lower heating value, m mass, nₚ, ΔfHₚ amount and enthalpy of formation of each product',
    validity: 'As good as the heating value and the composition together, at 25 °C.',
  },
  'reaction-enthalpy': {
    words: 'Enthalpies of formation of what is made, less those of what is used up.',
    equation: 'ΔH = Σ νₚ ΔfHₚ − Σ νᵣ ΔfHᵣ',
    symbols: 'νₚ, νᵣ coefficients of the equation as written; negative means that heat is set free',
    validity: 'Per equation as written, all at the state given, ideal gases and pure condensed phases.',
  },
  'reaction-gibbs-energy': {
    words: 'Gibbs energies of formation of what is made, less those of what is used up.',
    equation: 'ΔG = Σ νₚ ΔfGₚ − Σ νᵣ ΔfGᵣ',
    symbols: 'νₚ, νᵣ coefficients of the equation as written',
    validity: 'Per equation as written, each substance in its standard state at 1 bar.',
  },
  'equilibrium-constant': {
    words: 'The equilibrium constant of the equation as written.',
    equation: 'log₁₀ K = −ΔG / (R T ln 10)',
    symbols: 'ΔG reaction Gibbs energy, R gas constant, T temperature',
    validity: 'For the equation as written, gases against 1 bar.',
  },
  'equilibrium-temperature': {
    words: 'Where the Gibbs energy of the equation changes sign, so that it turns from one direction to the other.',
    equation: 'ΔH(T) − T ΔS(T) = 0',
    symbols: 'ΔH(T), ΔS(T) enthalpy and entropy of the reaction at that temperature',
    validity: 'All in their standard states, gases at 1 bar each: at another partial pressure it turns elsewhere.',
  },
  'specific-reaction-enthalpy': {
    words: 'The enthalpy of the reaction per kg of everything on its left side.',
    equation: 'Δh = ΔH / Σ νᵣ Mᵣ',
    symbols: 'νᵣ, Mᵣ coefficient and molar mass of each substance on the left',
    validity: 'Oxygen on the left side counts in the mass; negative means that heat is set free.',
  },
  'solids-share': {
    words: 'The volume of the portions that are solid at the stored temperature, over the whole volume.',
    equation: 'φ = Σ (wₛ / ρₛ) / Σ (wᵢ / ρᵢ)',
    symbols: 'wᵢ mass share and ρᵢ density of portion i, the sum above over the solid ones',
    validity: 'Holds for dispersions of substances that do not dissolve in each other; a pumping limit is not implied.',
  },
  'wet-gas': {
    words: 'The species of the portions, with the water vapour that the humidity brings.',
    equation: 'yᵥ = φ pₛ(T) / p; yᵢ = (1 − yᵥ) xᵢ; M = Σ yᵢ Mᵢ',
    symbols:
      'φ relative humidity, pₛ saturation pressure of water, xᵢ mole share of species i in the portions, yᵢ and yᵥ mole shares of species and vapour as it is',
    validity: 'Holds up to about 10 bar: above it air itself raises the vapour pressure by more than a few percent.',
  },
  'humidity-ratio': {
    words: 'The mass of vapour over the mass of all else.',
    equation: 'W = yᵥ Mᵥ / ((1 − yᵥ) M₀)',
    symbols: 'yᵥ mole share and Mᵥ molar mass of water vapour, M₀ molar mass of the dry gas',
    validity: 'Holds where the mole share of the vapour does.',
  },
  'ideal-gas-density': {
    words: 'The density of an ideal gas at the state given.',
    equation: 'ρ = p M / (R T)',
    symbols: 'p pressure, M molar mass, R gas constant, T temperature',
    validity: 'Within 1 % for air below about 30 bar at room temperature; worse above.',
  },
  'flame-temperature': {
    words:
      'The temperature at which the products, in the state of lowest Gibbs energy, hold all the energy the charge brought in less the loss.',
    equation: 'Σ nₚ hₚ(T) = h(fuel) + L h(oxidant) − q LHV, with Σ nₚ gₚ(T, p) least',
    symbols:
      'nₚ, hₚ, gₚ amount, enthalpy and Gibbs energy of product p, h enthalpies of fuel and oxidant as they come in, L oxidant per fuel, q share of the lower heating value LHV that is lost; at constant volume energies stand in the place of enthalpies',
    validity:
      'Ideal gases and pure condensed phases. Real flames stay below it by what they radiate and by unburnt fuel.',
  },
  'flame-at-temperature': {
    words: 'The products in the state of lowest Gibbs energy at the temperature that is given.',
    equation: 'Σ nₚ gₚ(T, p) least',
    symbols: 'nₚ, gₚ amount and Gibbs energy of product p',
    validity: 'Ideal gases and pure condensed phases.',
  },
  'zone-temperature': {
    words: 'The same for the fuel with the oxidant of its zone alone, before the rest mixes in; no loss is taken here.',
    equation: 'Σ nₚ hₚ(T) = h(fuel) + L h(oxidant), with Σ nₚ gₚ(T, p) least',
    symbols: 'nₚ, hₚ, gₚ amount, enthalpy and Gibbs energy of product p, L oxidant per fuel in the zone',
    validity: 'Ideal gases and pure condensed phases, the zone evenly mixed.',
  },
  'flame-pressure': {
    words: 'The pressure that is held, or the one that the products make in the volume that is held.',
    equation: 'p = n R T / V',
    symbols: 'n amount of gas, R gas constant, T temperature, V volume of the charge',
    validity: 'Ideal gas; above 100 bar the real pressure is several percent higher.',
  },
  'condensed-share': {
    words: 'The mass of all liquid and solid products over the mass of all products.',
    equation: 'w = Σ nₖ Mₖ / m',
    symbols: 'nₖ, Mₖ amount and molar mass of each condensed product, m mass of fuel and oxidant',
    validity: 'At the state told, pure condensed phases.',
  },
  'excess-air': {
    words: 'The oxygen that the oxidant brings over the oxygen that the fuel needs, both counted by valence.',
    equation: 'λ = L ν(oxidant) / ν(fuel)',
    symbols: 'L oxidant per fuel, ν oxygen brought or needed per kg by valence (C 4, H 1, O −2, Na 1, Mg 2 …)',
    validity: 'The same whether alkali ends as oxide, hydroxide or carbonate; sulphates and peroxides take more.',
  },
  'flame-gas': {
    words: 'The gas of the products alone, without what floats in it.',
    equation: 'M = Σ nᵢ Mᵢ / Σ nᵢ; c = Σ nᵢ cᵢ / Σ nᵢ Mᵢ',
    symbols: 'nᵢ, Mᵢ, cᵢ amount, molar mass and molar heat capacity of each gas',
    validity: 'Ideal gas at the temperature of the flame, composition held.',
  },
  'flame-heat-capacity': {
    words:
      'The heat capacity of all products at constant pressure, with the composition held or following its equilibrium.',
    equation: 'c = (∂H/∂T)ₚ / m',
    symbols: 'H enthalpy of all products, m their mass',
    validity:
      'Where two phases of one substance hold the temperature, the one that follows is without bound and not told.',
  },
  'flame-gamma': {
    words: 'How steeply the pressure rises as the products are compressed, with the composition held or following.',
    equation: 'γ = cₚ / (cₚ − n R); γₛ = −(∂ ln p / ∂ ln V)ₛ',
    symbols:
      'cₚ heat capacity of all products, n amount of gas, R gas constant, p pressure, V volume, s at constant entropy',
    validity: 'Condensed products warm and cool with the gas and take no room.',
  },
  'speed-of-sound': {
    words: 'The speed of sound in the products, the reactions following it.',
    equation: 'a = √(γₛ n R T / m)',
    symbols: 'γₛ isentropic exponent, n amount of gas, m mass of all products, T temperature',
    validity: 'For slow sound and fine particles, which move with the gas.',
  },
  'carbonate-share': {
    words: 'The carbon that is in carbonate, in any phase, over all the carbon of the charge.',
    equation: 'c = n(C in carbonate) / n(C)',
    symbols: 'n moles of carbon atoms',
    validity: 'At the state told. Carbonate is made on cooling, seldom in the flame.',
  },
  'heat-released': {
    words:
      'The enthalpy of fuel and oxidant as they come in, less that of the products at 25 °C; the energy where they cool in a held volume.',
    equation: 'q = h(fuel) + L h(oxidant) − Σ nₚ hₚ(25 °C); held volume: u = h − p V in place of h',
    symbols:
      'h enthalpies as they come in, L oxidant per fuel, nₚ, hₚ amount and enthalpy of each product at 25 °C, u energy, p pressure and V volume of the gas',
    validity:
      'Products in equilibrium at 25 °C, or as they froze. Heating values are by enthalpies: a share of one is off by some tenths of a per cent in a held volume. Water counts as liquid where it condenses, so it can be more than the lower heating value.',
  },
  preheat: {
    words: 'What fuel and oxidant hold over their enthalpy at 25 °C.',
    equation: 'q = h(T) − h(25 °C); held volume: u = h − p V in place of h',
    symbols:
      'h enthalpy of fuel and oxidant together, per kg of fuel, u their energy, p pressure and V volume of their gases',
    validity: 'It is part of the heat released and no part of a heating value.',
  },
  'heat-above-exhaust': {
    words:
      'The enthalpy of fuel and oxidant as they come in, less that of the products at the exhaust temperature; the energy where they cool in a held volume.',
    equation: 'q = h(fuel) + L h(oxidant) − Σ nₚ hₚ(T); held volume: u = h − p V in place of h',
    symbols:
      'T exhaust temperature, h enthalpies as they come in, L oxidant per fuel, nₚ, hₚ amount and enthalpy of each product there, u energy, p pressure and V volume of the gas',
    validity: 'What a boiler without other losses could pass on; it is not work.',
  },
  'peak-gas': {
    words: 'The share of the dry gas at the peak of temperature, if nothing of it reacted back on cooling.',
    equation: null,
    symbols: '',
    validity: 'Order of magnitude only: rates of reaction and the time in the flame decide.',
  },
  'burn-out': {
    words:
      'How long a single droplet or particle burns where diffusion decides, in gas halfway between the oxidant as it comes and the burnt gas.',
    equation: 't = ρ d² / (8 (λ/c) ln(1 + B))',
    symbols:
      'ρ density, d diameter, λ and c conductivity and heat capacity of the film, B transfer number; iron and other metals that do not boil take up oxygen at their surface, aluminium follows its own correlation',
    validity:
      'Single particles without slip or ignition delay: good within a factor of 1.5 to 2, told beside each time. Sprays burn out later, as neighbours share the oxygen. A blend is judged portion by portion, as if each came by itself.',
  },
  'blend-flash-point': {
    words: 'The temperature at which the vapours over the liquid portions together reach their lower flammable limit.',
    equation: 'Σ xᵢ γᵢ pᵢ(T) / (p Lᵢ(T)) = 1',
    symbols:
      'xᵢ mole share of portion i in its layer, γᵢ activity coefficient (1 but for alcohols and acetone with water), pᵢ its vapour pressure through its own flash and boiling points, p 1 atm, Lᵢ its lower limit',
    validity:
      'Alcohol with water: within 5 K of published values. Other blends: an estimate for screening, to be measured (ISO 2719, ISO 3679) before anything rests on it. A single liquid has its own flash point.',
  },
  'le-chatelier': {
    words: 'The limits of the vapours, each weighed by its share of the vapour over the blend (Le Chatelier 1891).',
    equation: '1 / L = Σ yᵢ / Lᵢ(T);  Lᵢ(T) = Lᵢ − 3138 J/mol (T − 25 °C) / ΔHᵢ per cent',
    symbols:
      'yᵢ share of vapour i without air, Lᵢ its limit, ΔHᵢ its net heat of combustion; the second equation (Burgess and Wheeler, after Zabetakis 1965) is for the lower limit and for vapours of C, H and O alone',
    validity:
      'In air at about 1 atm. Good for paraffins among themselves; hydrogen, ethers and carbon disulphide, cool flames, mist and foam keep to no such rule.',
  },
  'limiting-oxygen': {
    words: 'The least oxygen in nitrogen in which each vapour burns, weighed by the oxygen that each needs.',
    equation: 'O = Σ yᵢ / Σ (yᵢ / Oᵢ)',
    symbols: 'yᵢ share of vapour i without air, Oᵢ its limiting oxygen, or its lower limit times its oxygen demand',
    validity:
      'At room temperature and about 1 atm, nitrogen as the inert gas; inerted tanks are kept well below it (8 % by volume and less).',
  },
  'water-contact': {
    words:
      'Everything that reacts with water does so to hydroxide and gas, in so much water that what can dissolve does.',
    equation: 'q = Σ wᵢ qᵢ / Mᵢ;  V = Σ wᵢ νᵢ Vm / Mᵢ',
    symbols:
      'wᵢ mass share of portion i, Mᵢ its molar mass, qᵢ heat and νᵢ mol of gas by a mol of it, Vm 24.79 L/mol (25 °C, 1 bar)',
    validity:
      'An upper bound without a rate: oil around a metal, crusts and little water slow it down, and hydrogen that burns gives further heat.',
  },
  'own-hydrogen': {
    words: 'Hydrogen by the written reactions of the portions with each other, pair by pair.',
    equation: 'V = Σ n(H₂) Vm',
    symbols: 'n(H₂) mol of hydrogen of a pair by kg of the blend, Vm 24.79 L/mol (25 °C, 1 bar)',
    validity:
      'An upper bound: what reacts with two portions is counted with both. Walls and moisture let in are not counted.',
  },
  'ullage-hydrogen': {
    words: 'Hydrogen made in the tank washes the gas out over the blend, well mixed, at the stored pressure.',
    equation: 'y = 1 − exp(−n ρ R T / (p u));  u = (1 − f) / f',
    symbols:
      'n mol of hydrogen by kg of the blend, ρ its density, f filled share of the tank, T and p its state, R gas constant',
    validity:
      'As if all that can be made were made at once. Above the lower limit (4 % in air) the gas burns where it meets air.',
  },
  'ullage-pressure': {
    words: 'Hydrogen made in a closed tank adds its pressure.',
    equation: 'Δp = n ρ R T / u;  u = (1 − f) / f',
    symbols:
      'n mol of hydrogen by kg of the blend, ρ its density, f filled share of the tank, T its temperature, R gas constant',
    validity:
      'As if all that can be made were made and nothing were let out, at the stored temperature: the reaction’s heat adds to it.',
  },
  'ullage-water': {
    words:
      'How much water has to get in for its hydrogen to bring the gas over the blend to the lower limit of hydrogen.',
    equation: 'w = −ln(1 − L) p u M(H₂O) / (R T ρ h);  u = (1 − f) / f',
    symbols:
      'L lower limit of hydrogen in air, h mol of hydrogen by mol of water, ρ density of the blend, f filled share of the tank, T and p its state, R gas constant, M(H₂O) molar mass of water',
    validity:
      'All that water reacts, and the tank is vented and well mixed. Under a full tank’s small ullage it is little.',
  },
};
