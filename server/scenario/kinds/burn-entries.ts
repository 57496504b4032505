// The entries of a burn: what is burnt in what, how much of it, what is held, how it cools, and what else is asked of it.
// One row an entry; nothing is worked out here. Defaults are the program's own and say so.

import {
  heatLossReader,
  heldReader,
  oxidantReader,
  productsReader,
  switchReader,
  temperatureRangeReader,
  temperaturesReader,
  zoneReader,
} from '../burn-readers.ts';
import { materialReader, quantityReader, stateReader } from '../readers.ts';

const convention = 'convention of this program';

/** The exhaust temperature where none is given, °C. */
export const defaultExhaustC = 150;

export const burnEntries = {
  fuel: { name: 'fuel', reader: materialReader, help: 'The blend or substance that is burnt.', needed: true },
  oxidant: {
    name: 'oxidant',
    reader: oxidantReader,
    help: 'What it is burnt in, at the state given there.',
    needed: true,
  },
  lambda: {
    name: 'lambda',
    reader: quantityReader('1', 'a number, such as `2.1`', { range: 'positive', bareUnlike: 'oxidant per fuel' }),
    help: 'The excess-air ratio λ: oxygen brought over oxygen needed, counted by valence. Give this, an equivalence ratio, or the oxidant per fuel.',
  },
  equivalenceRatio: {
    name: 'equivalence ratio',
    reader: quantityReader('1', 'a number, such as `0.476`', { range: 'positive' }),
    help: 'The inverse of λ: above 1 the mixture is rich in fuel.',
  },
  oxidantPerFuel: {
    name: 'oxidant per fuel',
    reader: quantityReader('kg/kg', 'a mass of oxidant per mass of fuel, such as `14.5 kg/kg`', { range: 'positive' }),
    help: 'Mass of oxidant per mass of fuel. The only way for an oxidant whose oxygen is bound, as in steam or carbon dioxide.',
  },
  fuelTemperature: {
    name: 'fuel temperature',
    reader: quantityReader('degC', 'a temperature, such as `120 degC`', { temperature: true, range: 'positive' }),
    help: 'The temperature the fuel comes in with; melting and boiling on the way from 25 °C are counted.',
    default: { text: '25 °C', source: convention },
  },
  oxidantState: {
    name: 'oxidant state',
    reader: stateReader,
    help: 'The temperature and pressure the oxidant comes in with, in place of its own. Its composition stays.',
    default: { text: "the oxidant's own state", source: convention },
  },
  held: {
    name: 'held',
    reader: heldReader,
    help: 'What stays the same while it burns: a pressure, or the volume of the charge before it burns.',
    default: { text: "the oxidant's pressure", source: convention },
  },
  temperature: {
    name: 'temperature',
    reader: quantityReader('degC', 'a temperature, such as `1200 degC`', { temperature: true, range: 'positive' }),
    help: 'The temperature of the products. Without it the burn is adiabatic, but for a heat loss.',
    default: { text: 'adiabatic', source: convention },
  },
  heatLoss: {
    name: 'heat loss',
    reader: heatLossReader,
    help: "Heat taken out while it burns, as a share of the fuel's lower heating value.",
    default: { text: 'none', source: convention },
  },
  flameZone: {
    name: 'flame zone',
    reader: zoneReader,
    help: 'A richer zone that burns first, with all the fuel, before the rest of the oxidant mixes in.',
    default: { text: 'one zone', source: convention },
  },
  cooledTo: {
    name: 'cooled to',
    reader: temperaturesReader,
    help: 'Temperatures at which the products are worked out as they cool, each in equilibrium unless frozen.',
  },
  coolingPressure: {
    name: 'cooling pressure',
    reader: quantityReader('bar', 'a pressure, such as `1 bar`', { range: 'positive' }),
    help: 'The pressure at which the products cool.',
    default: { text: 'what is held while it burns', source: convention },
  },
  frozenBelow: {
    name: 'frozen below',
    reader: quantityReader('degC', 'a temperature, such as `150 degC`', { temperature: true, range: 'positive' }),
    help: 'The composition stays as it is there from this temperature down.',
    default: { text: 'never', source: convention },
  },
  allowedProducts: {
    name: 'allowed products',
    reader: productsReader,
    help: 'The only products that may form. A formula without a phase allows all its phases.',
    default: { text: 'every substance of the tables', source: convention },
  },
  barredProducts: {
    name: 'barred products',
    reader: productsReader,
    help: 'Products that may not form. A formula without a phase bars all its phases.',
  },
  ions: {
    name: 'ions',
    reader: switchReader,
    help: 'Whether gas ions and the electron may form, above 2000 K.',
    default: { text: 'off', source: convention },
  },
  exhaustTemperature: {
    name: 'exhaust temperature',
    reader: quantityReader('degC', 'a temperature, such as `350 degC`', { temperature: true, range: 'positive' }),
    help: 'Where the heat above exhaust temperature is counted from.',
    default: { text: `${defaultExhaustC} °C`, source: 'common practice for a dry stack' },
  },
  dropletSize: {
    name: 'droplet size',
    reader: quantityReader('um', 'a diameter, such as `60 um`', { range: 'positive' }),
    help: 'The diameter of a fuel droplet, for the time it takes to burn out.',
  },
  particleSize: {
    name: 'particle size',
    reader: quantityReader('um', 'a diameter, such as `40 um`', { range: 'positive' }),
    help: 'The diameter of a solid fuel particle, for the time it takes to burn out.',
  },
  residenceTime: {
    name: 'residence time',
    reader: quantityReader('ms', 'a time, such as `20 ms`', { range: 'positive' }),
    help: 'The time it has to burn out.',
  },
  wallTemperature: {
    name: 'wall temperature',
    reader: temperatureRangeReader,
    help: 'The temperatures of walls or blades the products meet; deposits that are sticky there are told of.',
  },
};
