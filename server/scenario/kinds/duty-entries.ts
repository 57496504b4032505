// The entries of a duty beside its legs. One row an entry; nothing is worked out here. A line that is no entry here and
// begins with a time or a distance is a leg, and legs may repeat.

import { boilerReader, demandsReader, serviceSpeedReader, testCycleReader } from '../duty-readers.ts';
import { profileReader } from '../profile-reader.ts';
import { quantityReader } from '../readers.ts';

const convention = 'convention of this program';

/** Intermediate over rated speed where none is given: the least the standard knows. */
export const defaultIntermediate = 0.6;
export const defaultExponent = 3;

export const dutyEntries = {
  testCycle: {
    name: 'test cycle',
    reader: testCycleReader,
    help: 'A steady test cycle of ISO 8178-4, by name, in place of legs. It certifies an engine and does not describe what one does.',
  },
  profile: {
    name: 'profile',
    reader: profileReader,
    help: 'A leg as it was logged: a file of comma-separated rows of time and power behind the line `time (s), power (kW)`. Each power holds until the next row; the last row ends the leg.',
  },
  runningTime: {
    name: 'running time',
    reader: quantityReader('h', 'a time, such as `1 h`', { range: 'positive' }),
    help: 'How long the test cycle is run: each mode takes its weighting factor of it.',
    default: { text: '1 h', source: convention },
  },
  intermediateSpeed: {
    name: 'intermediate speed',
    reader: quantityReader('%', 'a share of the rated speed, such as `65 %`', { range: 'positive' }),
    help: 'The intermediate speed of a test cycle, over the rated speed. The torque of the rating is taken there.',
    default: { text: '60 %', source: 'the least of ISO 8178-4, which has 60 to 75 %' },
  },
  serviceSpeed: {
    name: 'service speed',
    reader: serviceSpeedReader,
    help: 'The speed at a share of the rating, sea margin included. Speeds of legs become powers from here by the propeller law; `fouling` comes on top, and a leg that says `calm` goes without the sea margin.',
    default: { text: 'exponent 3, no sea margin, no fouling', source: 'law of a propeller at constant advance' },
  },
  hotelLoad: {
    name: 'hotel load',
    reader: demandsReader,
    help: 'Power for the crew and the ship, on every leg; from the shore where a leg lies there.',
    default: { text: 'none', source: convention },
  },
  auxiliaries: {
    name: 'auxiliaries',
    reader: demandsReader,
    help: 'Power for pumps, fans and treatment on every leg on which an engine drives.',
    default: { text: 'none', source: convention },
  },
  boiler: {
    name: 'boiler',
    reader: boilerReader,
    help: 'Heat from a boiler on every leg, its fuel and its efficiency.',
    default: { text: 'none', source: convention },
  },
};
