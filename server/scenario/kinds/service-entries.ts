// The entries of a service and of a comparison over one. One row an entry; nothing is worked out here.

import { quantityReader, materialReader, wordReader } from '../readers.ts';
import { fuelsReader, machineryReader, reserveReader, residueReader, tanksReader } from '../service-readers.ts';

const convention = 'convention of this program';

/** Of a tank where it is not said. */
export const defaultFilling = 0.95;

export const serviceEntries = {
  duty: {
    name: 'duty',
    reader: machineryReader('duty'),
    help: 'The duty that is done over and over.',
    needed: true,
  },
  repeated: {
    name: 'repeated',
    reader: quantityReader('1/year', 'how often, such as `210 per year`', { range: 'positive' }),
    help: 'How often the duty is done. Figures per year rest on it.',
  },
  reserve: {
    name: 'reserve',
    reader: reserveReader,
    help: 'Fuel carried beyond what the duties take.',
    default: { text: 'none', source: convention },
  },
  dutiesBetween: {
    name: 'duties between bunkerings',
    reader: quantityReader('1', 'a number, such as `5`', { range: 'positive' }),
    help: 'For how many duties fuel is carried.',
    default: { text: '1', source: convention },
  },
  tanks: {
    name: 'tanks',
    reader: tanksReader,
    help: 'How far tanks may be filled, what they weigh per fuel, their form (which share of the space they take is tank), and the volume there is.',
    default: {
      text: 'filled to 95 %, no mass, and all of the space; prismatic tanks use 95 % of their space, inerted 90 %, cylindrical 65 %, cryogenic 50 %',
      source: 'common practice of tank arrangements',
    },
  },
  boilOff: {
    name: 'boil-off',
    reader: quantityReader('1/d', 'a share per time, such as `0.12 % per d`', { range: 'positive' }),
    help: 'Share of the fuel on board that boils off and is not burnt.',
    default: { text: 'none', source: convention },
  },
  residue: {
    name: 'residue',
    reader: residueReader,
    help: 'What becomes of the solids: kept on board, so that weight rises as fuel burns, or discharged under a permit that is named.',
    default: { text: 'kept on board', source: convention },
  },
  water: {
    name: 'water',
    reader: wordReader(['carried', 'made']),
    help: 'Whether water that the fuel lacks to take its alkali to hydroxide is carried with it or made on board.',
    default: { text: 'made', source: convention },
  },
  against: {
    name: 'against',
    reader: materialReader,
    help: 'The baseline: the same work with every engine and boiler on this fuel.',
  },
};

export const compareEntries = {
  service: {
    name: 'service',
    reader: machineryReader('service'),
    help: 'The service over which fuels are set side by side.',
    needed: true,
  },
  across: {
    name: 'across',
    reader: fuelsReader,
    help: 'The fuels. Each takes the place of the fuel that most of the energy of the service comes from; engines and boilers on other fuels keep theirs.',
    needed: true,
  },
};
