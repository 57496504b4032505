// Gathers the hand-kept record files into one list; the only place that names the files.
// Does not check them: the tests run every record through schema.ts. Adding a family of substances is one line here.

import alkaliSalts from './data/substances/alkali-salts.json';
import aqueousIons from './data/substances/aqueous-ions.json';
import gases from './data/substances/gases.json';
import hydrides from './data/substances/hydrides.json';
import hydrocarbons from './data/substances/hydrocarbons.json';
import metalsAndElements from './data/substances/metals-and-elements.json';
import oxidesAndMinerals from './data/substances/oxides-and-minerals.json';
import oxygenates from './data/substances/oxygenates.json';
import soapsAndSolvents from './data/substances/soaps-and-solvents.json';
import sources from './data/substances/sources.json';
import technicalFuels from './data/substances/technical-fuels.json';
import type { SourceRecord, SubstanceRecord } from './record.ts';

// The compiler reads JSON strings as `string`, wider than a phase or a provenance; the schema test vouches for the rest.
export const substanceRecords = [
  ...gases,
  ...hydrocarbons,
  ...oxygenates,
  ...technicalFuels,
  ...metalsAndElements,
  ...hydrides,
  ...alkaliSalts,
  ...oxidesAndMinerals,
  ...aqueousIons,
  ...soapsAndSolvents,
] as readonly unknown[] as readonly SubstanceRecord[];

export const sourceRecords = sources as readonly unknown[] as readonly SourceRecord[];
