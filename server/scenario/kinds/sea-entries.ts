// The entries of a sea: its water, any two variables of its carbonate system, what is let into it, and what it is held to.
// One row an entry; nothing is worked out here. Defaults are the program's own and say so.

import { deliveryWays } from '../../core/account/sea/precipitation.ts';
import { quantityReader, wordReader } from '../readers.ts';
import { effluentReader, receivingLimitReader } from '../sea-readers.ts';

const convention = 'convention of this program';
const oneOfTwo = 'Any two variables of the carbonate system settle the others.';

function concentrationReader(what: string): ReturnType<typeof quantityReader> {
  return quantityReader('umol/kg', `an amount per kg of sea water, such as \`${what}\``, { range: 'positive' });
}

const fugacityTakes = 'a pressure, such as `424 uatm`';

export const seaEntries = {
  practicalSalinity: {
    name: 'practical salinity',
    reader: quantityReader('1', 'a number, such as `34.5`', { range: 'positive' }),
    help: 'The practical salinity, a bare number: about the grams of salt per kg of sea water.',
    needed: true,
  },
  temperature: {
    name: 'temperature',
    reader: quantityReader('degC', 'a temperature, such as `11 degC`', { temperature: true, range: 'positive' }),
    help: 'The temperature of the water, where it is.',
    needed: true,
  },
  depth: {
    name: 'depth',
    reader: quantityReader('m', 'a depth, such as `200 m`'),
    help: 'The depth the constants are taken at. Fugacities stay those the water would have at the surface.',
    default: { text: 'the surface', source: convention },
  },
  totalAlkalinity: {
    name: 'total alkalinity',
    reader: quantityReader('umol/kg', 'an amount per kg of sea water, such as `2310 umol/kg`'),
    help: `The excess of proton acceptors over donors, as titrated. ${oneOfTwo}`,
  },
  dissolvedInorganicCarbon: {
    name: 'dissolved inorganic carbon',
    reader: concentrationReader('2080 umol/kg'),
    help: `Carbon dioxide, hydrogen carbonate and carbonate together. ${oneOfTwo}`,
  },
  ph: {
    name: 'pH',
    reader: quantityReader('1', 'a number, such as `8.05`', { range: 'positive' }),
    help: `The pH on the total scale at the water's own temperature; against freshwater (NBS) buffers it reads about 0.1 higher. ${oneOfTwo}`,
  },
  partialPressure: {
    name: 'pCO2',
    reader: quantityReader('uatm', fugacityTakes, { range: 'positive' }),
    help: `The partial pressure of carbon dioxide in moist air the water would be in equilibrium with. ${oneOfTwo}`,
  },
  fugacity: {
    name: 'fCO2',
    reader: quantityReader('uatm', fugacityTakes, { range: 'positive' }),
    help: `The fugacity of carbon dioxide, 0.3 to 0.4 % below its partial pressure. ${oneOfTwo}`,
  },
  dryAirShare: {
    name: 'dry-air CO2',
    reader: quantityReader('ppm', 'a share by mole, such as `421 ppm`', { range: 'share' }),
    help: `The share of carbon dioxide in the dry air over the water, by mole, at 1 atm and with the water's own vapour. ${oneOfTwo}`,
  },
  hydrogenCarbonate: {
    name: 'hydrogen carbonate',
    reader: concentrationReader('1890 umol/kg'),
    help: `Hydrogen carbonate ions. ${oneOfTwo}`,
  },
  carbonate: {
    name: 'carbonate',
    reader: concentrationReader('180 umol/kg'),
    help: `Carbonate ions. ${oneOfTwo}`,
  },
  phosphate: {
    name: 'phosphate',
    reader: quantityReader('umol/kg', 'an amount per kg of sea water, such as `0.8 umol/kg`'),
    help: 'All dissolved phosphate; it takes part in the alkalinity.',
    default: { text: 'none', source: convention },
  },
  silicate: {
    name: 'silicate',
    reader: quantityReader('umol/kg', 'an amount per kg of sea water, such as `6 umol/kg`'),
    help: 'All dissolved silicate; it takes part in the alkalinity.',
    default: { text: 'none', source: convention },
  },
  boron: {
    name: 'boron',
    reader: wordReader(['uppstrom', 'lee']),
    help: 'Whose boron per salinity is taken: Uppström 1974, or Lee et al. 2010, 4 % more.',
    default: { text: 'uppstrom', source: 'Guide to best practices for ocean CO2 measurements (2007)' },
  },
  effluent: {
    name: 'effluent',
    reader: effluentReader,
    help: 'What is let into the water: moles of hydroxide, carbonate, hydrogen carbonate or acid per kg of effluent. A mole of sulphuric acid is two of `acid`.',
  },
  nearFieldDilution: {
    name: 'near-field dilution',
    reader: quantityReader('kg/kg', 'a mass of sea water per mass of effluent, such as `500`', { range: 'positive' }),
    help: 'How much sea water a kilogram of effluent has met where it is looked at: far enough to be mixed, too near for gas to have been exchanged.',
  },
  deliveredAs: {
    name: 'delivered as',
    reader: wordReader(deliveryWays),
    help: 'Whether the alkali comes dissolved or with particles, on which carbonate precipitates far sooner.',
    default: { text: 'solution', source: convention },
  },
  receivingLimit: {
    name: 'receiving limit',
    reader: receivingLimitReader,
    help: 'What the receiving water is held to: a band of pH, and how far it may be moved.',
  },
  mixedLayer: {
    name: 'mixed layer',
    reader: quantityReader('m', 'a depth, such as `40 m`', { range: 'positive' }),
    help: 'The depth to which the water is mixed; with the wind, how long it takes to come to equilibrium with the air.',
  },
  wind: {
    name: 'wind',
    reader: quantityReader('m/s', 'a speed, such as `7 m/s`', { range: 'positive' }),
    help: 'The wind 10 m above the water (its root mean square over time).',
  },
  mixedLayerResidence: {
    name: 'mixed-layer residence',
    reader: quantityReader('d', 'a time, such as `200 d`', { range: 'positive' }),
    help: 'How long water stays in the mixed layer on average before it is taken down.',
  },
};
